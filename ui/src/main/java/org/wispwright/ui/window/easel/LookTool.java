package org.wispwright.ui.window.easel;

/** Looks: the easel itself pans and reads the picture, so this does nothing. */
final class LookTool implements Tool {
}

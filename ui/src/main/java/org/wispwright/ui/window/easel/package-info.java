/** Room: the picture, and what the hand does to it. Door: {@link org.wispwright.ui.window.easel.EaselPanel}. */
package org.wispwright.ui.window.easel;

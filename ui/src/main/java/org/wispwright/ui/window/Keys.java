package org.wispwright.ui.window;

import java.awt.Toolkit;
import java.awt.event.InputEvent;
import java.awt.event.KeyEvent;
import javax.swing.KeyStroke;

/** Shortcuts: written with "ctrl", and on the platform's own menu key where that is another. */
final class Keys {
    private Keys() {
    }

    /** @param text as {@link KeyStroke#getKeyStroke(String)} reads it */
    static KeyStroke stroke(String text) {
        KeyStroke stroke = KeyStroke.getKeyStroke(text);
        if (stroke == null) {
            throw new IllegalArgumentException("key: got '" + text + "', which is no key stroke");
        }
        int menu = Toolkit.getDefaultToolkit().getMenuShortcutKeyMaskEx();
        if ((stroke.getModifiers() & InputEvent.CTRL_DOWN_MASK) == 0 || menu == InputEvent.CTRL_DOWN_MASK) {
            return stroke;
        }
        int others = stroke.getModifiers() & (InputEvent.SHIFT_DOWN_MASK | InputEvent.ALT_DOWN_MASK);
        return KeyStroke.getKeyStroke(stroke.getKeyCode(), others | menu);
    }

    /** For people: "Ctrl+Z". */
    static String inWords(KeyStroke stroke) {
        String modifiers = InputEvent.getModifiersExText(stroke.getModifiers());
        String key = KeyEvent.getKeyText(stroke.getKeyCode());
        return modifiers.isEmpty() ? key : modifiers + "+" + key;
    }
}

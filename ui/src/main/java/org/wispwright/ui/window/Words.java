package org.wispwright.ui.window;

import java.text.MessageFormat;
import java.util.Locale;
import java.util.ResourceBundle;

/** Every word on the screen, from one bundle: {@code words.properties}. */
public final class Words {
    private static final ResourceBundle BUNDLE = ResourceBundle.getBundle("org.wispwright.ui.window.words", Locale.ROOT);

    private Words() {
    }

    /**
     * The text of a key, its places {@code {0}}, {@code {1}} filled. Numbers are written as they are, without grouping.
     *
     * @throws java.util.MissingResourceException if there is no such key
     */
    public static String of(String key, Object... values) {
        String pattern = BUNDLE.getString(key);
        Object[] texts = new Object[values.length];
        for (int n = 0; n < values.length; n++) {
            texts[n] = String.valueOf(values[n]);
        }
        return new MessageFormat(pattern, Locale.ROOT).format(texts);
    }

    /** True if there is such a key. */
    public static boolean has(String key) {
        return BUNDLE.containsKey(key);
    }
}

package org.wispwright.ui.window;

import com.formdev.flatlaf.FlatDarkLaf;
import com.formdev.flatlaf.FlatLaf;
import com.formdev.flatlaf.FlatLightLaf;
import java.awt.Color;
import java.awt.Font;
import javax.swing.UIManager;

/**
 * Colours, type and spacing of the desk. Greys are neutral, because a tinted surround spoils the judgement of pictures; marks and plots use
 * the palette of Okabe and Ito (2008), "Color Universal Design", which colour-blind eyes tell apart. A colour never says anything alone: a
 * form, a word or a pattern says it too.
 */
public enum Palette {
    /** Around the picture. */ SURROUND("surround"),
    /** Of panels. */ PANEL("panel"),
    /** Of cards on a panel. */ CARD("card"),
    /** Of words. */ TEXT("text"),
    /** Of words that matter less. */ QUIET("quiet"),
    /** Thin lines between things. */ LINE("line"),
    /** The one accent: what is chosen, what has the focus. */ ACCENT("accent"),
    /** A wish that is met. Bluish green. */ MET("met"),
    /** A wish, and its outline. Orange. */ WANTED("wanted"),
    /** What must stay. Sky blue. */ HELD("held"),
    /** A fault. Vermilion. */ FAULT("fault"),
    /** Change from the original. Reddish purple. */ CHANGE("change");

    /** One step of space; everything is set in multiples of it, before scaling. */
    public static final int STEP = 4;

    private final String key;

    Palette(String key) {
        this.key = "Desk." + key;
    }

    /** The colour in the theme of the moment. */
    public Color colour() {
        return UIManager.getColor(key);
    }

    /** Puts a theme in place for all that is made from now on; windows that are there follow by {@link FlatLaf#updateUI}. Swing's thread. */
    public static void use(boolean dark, double textScale) {
        FlatLaf.registerCustomDefaultsSource("org.wispwright.ui.window.theme");
        if (dark) {
            FlatDarkLaf.setup();
        } else {
            FlatLightLaf.setup();
        }
        Font font = UIManager.getFont("defaultFont");
        UIManager.put("defaultFont", font.deriveFont((float) (13 * textScale)));
    }

    /** The smaller of the two sizes of type. */
    public static Font small() {
        Font font = UIManager.getFont("defaultFont");
        return font.deriveFont(font.getSize2D() * 11 / 13);
    }

    /** The one weight for emphasis. */
    public static Font strong() {
        return UIManager.getFont("defaultFont").deriveFont(Font.BOLD);
    }
}

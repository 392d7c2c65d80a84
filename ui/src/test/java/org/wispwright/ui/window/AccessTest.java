package org.wispwright.ui.window;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Color;
import java.awt.Component;
import java.awt.Dimension;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import javax.swing.AbstractButton;
import javax.swing.JComboBox;
import javax.swing.JComponent;
import javax.swing.JList;
import javax.swing.JScrollBar;
import javax.swing.JSlider;
import javax.swing.JSpinner;
import javax.swing.UIManager;
import javax.swing.text.JTextComponent;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.ui.command.SmallShot;

/** What everyone needs to work the desk: names for those who hear it, contrast for those who see little, keys for those without a pointer. */
class AccessTest {
    /** WCAG 2.x, 1.4.3: text needs 4.5 to 1 against what is behind it. */
    private static final double LEAST_CONTRAST = 4.5;

    @TempDir
    private Path folder;

    @ParameterizedTest
    @ValueSource(booleans = {true, false})
    void textStandsOutFromWhatIsBehindIt(boolean dark) {
        DeskDriver.onSwing(() -> {
            Palette.use(dark, 1);
            List<String> faint = new ArrayList<>();
            for (Palette ink : new Palette[] {Palette.TEXT, Palette.QUIET, Palette.ACCENT, Palette.MET, Palette.WANTED, Palette.HELD,
                Palette.FAULT, Palette.CHANGE}) {
                for (Palette paper : new Palette[] {Palette.PANEL, Palette.CARD}) {
                    check(ink.name() + " on " + paper.name(), ink.colour(), paper.colour(), faint);
                }
            }
            String[][] pairs = {{"Label.foreground", "Panel.background"}, {"Button.foreground", "Button.background"},
                {"TextField.foreground", "TextField.background"}, {"ComboBox.foreground", "ComboBox.background"},
                {"MenuItem.foreground", "MenuItem.background"}, {"List.selectionForeground", "List.selectionBackground"},
                {"MenuItem.selectionForeground", "MenuItem.selectionBackground"}, {"ToolTip.foreground", "ToolTip.background"},
                {"TextField.selectionForeground", "TextField.selectionBackground"}, {"Spinner.foreground", "Spinner.background"},
                {"Button.default.foreground", "Button.default.background"}};
            for (String[] pair : pairs) {
                check(pair[0] + " on " + pair[1], UIManager.getColor(pair[0]), UIManager.getColor(pair[1]), faint);
            }
            assertEquals(List.of(), faint);
            return null;
        });
    }

    private static void check(String what, Color ink, Color paper, List<String> faint) {
        double contrast = contrast(ink, paper);
        if (!(contrast >= LEAST_CONTRAST)) {
            faint.add(String.format("%s: %.2f", what, contrast));
        }
    }

    /** WCAG 2.x, "contrast ratio": (L1 + 0.05) / (L2 + 0.05) of the relative luminances. */
    static double contrast(Color a, Color b) {
        double x = luminance(a);
        double y = luminance(b);
        return (Math.max(x, y) + 0.05) / (Math.min(x, y) + 0.05);
    }

    /** WCAG 2.x, "relative luminance", with its own constants (0.03928 for the joint of the two pieces). */
    private static double luminance(Color c) {
        double[] linear = new double[3];
        int[] codes = {c.getRed(), c.getGreen(), c.getBlue()};
        for (int n = 0; n < 3; n++) {
            double code = codes[n] / 255.0;
            linear[n] = code <= 0.03928 ? code / 12.92 : Math.pow((code + 0.055) / 1.055, 2.4);
        }
        return 0.2126 * linear[0] + 0.7152 * linear[1] + 0.0722 * linear[2];
    }

    /** White on black is 21 to 1, #767676 on white the lightest grey that passes: WCAG 2.x, 1.4.3 and its understanding document. */
    @Test
    void theMeasureOfContrastIsWcags() {
        assertEquals(21, contrast(Color.WHITE, Color.BLACK), 1e-9);
        assertTrue(contrast(new Color(0x767676), Color.WHITE) >= 4.5 && contrast(new Color(0x777777), Color.WHITE) < 4.5);
    }

    @Test
    void everyControlHasANameAndWhatItDoes() {
        try (DeskDriver driver = new DeskDriver(new Dimension(1440, 900)).open(SmallShot.in(folder.resolve("shot")).folder())) {
            List<String> nameless = new ArrayList<>();
            for (Component c : driver.everything()) {
                if (isControl(c)) {
                    String name = c.getAccessibleContext() == null ? null : c.getAccessibleContext().getAccessibleName();
                    if (name == null || name.isBlank()) {
                        nameless.add(where(c));
                    }
                }
            }
            assertEquals(List.of(), nameless);
        }
    }

    /** Controls that the person works with; the parts of a control, such as a combo box's arrow, belong to it. */
    private static boolean isControl(Component c) {
        boolean kind = c instanceof AbstractButton || c instanceof JComboBox || c instanceof JList || c instanceof JSlider || c instanceof JSpinner
                || c instanceof JTextComponent;
        if (!kind || !c.isFocusable()) {
            return false;
        }
        for (Component up = c.getParent(); up != null; up = up.getParent()) {
            if (up instanceof JComboBox || up instanceof JSpinner || up instanceof JScrollBar
                    || up instanceof JComponent bar && bar.getClass().getName().contains("TitlePane")) {
                return false;
            }
        }
        return true;
    }

    private static String where(Component c) {
        StringBuilder path = new StringBuilder(c.getClass().getSimpleName() + " '" + c.getName() + "'");
        for (Component up = c.getParent(); up != null && !(up instanceof java.awt.Window); up = up.getParent()) {
            if (up.getName() != null) {
                path.append(" in ").append(up.getName());
            }
        }
        return path.toString();
    }

    @Test
    void everyActionHasWordsAndItsKeyInItsToolTip() {
        try (DeskDriver driver = new DeskDriver(DeskWindow.SMALLEST)) {
            for (DeskAction action : driver.window().actions().all()) {
                Object tip = driver.window().actions().get(action.id()).getValue(javax.swing.Action.SHORT_DESCRIPTION);
                assertTrue(tip != null && !tip.toString().isBlank(), action.id());
                assertTrue(action.key() == null || tip.toString().endsWith(")"), action.id());
            }
        }
    }
}

package org.wispwright.ui.report;

import java.awt.Color;
import java.awt.Font;
import java.awt.Graphics2D;
import java.awt.image.BufferedImage;

/**
 * Words on a sheet. A machine without any font (a bare server) draws none: Java then fails at the first letter with an Error, so this is
 * found out once, and the sheet keeps its pictures and bars.
 */
public final class Lettering {
    private static final boolean FONTS = tryALetter();

    private Lettering() {
    }

    /** False on a machine without fonts. */
    public static boolean works() {
        return FONTS;
    }

    private static boolean tryALetter() {
        Graphics2D g = new BufferedImage(8, 8, BufferedImage.TYPE_INT_RGB).createGraphics();
        try {
            return g.getFontMetrics(font(Font.PLAIN, 14)).stringWidth("a") > 0;
        } catch (LinkageError | InternalError | RuntimeException missing) {
            return false;
        } finally {
            g.dispose();
        }
    }

    static Font font(int style, int size) {
        return new Font(Font.SANS_SERIF, style, size);
    }

    static int width(Graphics2D g, String words, Font font) {
        return FONTS ? g.getFontMetrics(font).stringWidth(words) : 0;
    }

    /** The words, cut short with an ellipsis to fit. */
    private static String shortened(Graphics2D g, String words, Font font, int most) {
        String fit = words;
        while (width(g, fit, font) > most && fit.length() > 2) {
            fit = fit.substring(0, fit.length() - 2).stripTrailing() + "\u2026";
        }
        return fit;
    }

    /** Draws the words, cut short to fit. */
    static void line(Graphics2D g, String words, int most, int x, int baseline, Font font, Color colour) {
        text(g, shortened(g, words, font, most), x, baseline, font, colour);
    }

    static void text(Graphics2D g, String words, int x, int baseline, Font font, Color colour) {
        if (FONTS) {
            g.setFont(font);
            g.setColor(colour);
            g.drawString(words, x, baseline);
        }
    }
}

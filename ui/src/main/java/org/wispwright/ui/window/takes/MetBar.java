package org.wispwright.ui.window.takes;

import java.awt.Dimension;
import java.awt.FontMetrics;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import javax.swing.JPanel;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;

/** How far a note is met: its name, a number, and a bar below them that is full at 100 %. */
final class MetBar extends JPanel {
    private static final int BAR = Palette.STEP;

    private String name = "";
    private double share;

    MetBar() {
        setFont(Palette.small());
        setOpaque(false);
    }

    /** @param note its id, or what else is shown @param met 1 when it is there; below 0 it has become worse */
    void show(String note, double met) {
        name = note;
        share = met;
        String words = Words.of("takes.met", note, Amounts.percent(met));
        getAccessibleContext().setAccessibleName(words);
        setToolTipText(words + ". " + Words.of("takes.met.tip"));
        repaint();
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(80, getFontMetrics(getFont()).getHeight() + 2 * BAR);
    }

    @Override
    public Dimension getMinimumSize() {
        return new Dimension(40, getPreferredSize().height);
    }

    @Override
    protected void paintComponent(Graphics g) {
        Graphics2D on = (Graphics2D) g.create();
        on.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
        FontMetrics font = on.getFontMetrics();
        String number = Amounts.percent(share);
        int room = getWidth() - font.stringWidth(number) - 2 * Palette.STEP;
        on.setColor(Palette.TEXT.colour());
        on.drawString(number, getWidth() - font.stringWidth(number), font.getAscent());
        on.drawString(cut(name, font, room), 0, font.getAscent());
        int top = font.getHeight() + BAR / 2;
        on.setColor(Palette.LINE.colour());
        on.fillRect(0, top, getWidth(), BAR);
        on.setColor(Palette.MET.colour());
        on.fillRect(0, top, (int) Math.round(Math.max(0, Math.min(1, share)) * getWidth()), BAR);
        on.dispose();
    }

    private static String cut(String text, FontMetrics font, int room) {
        if (font.stringWidth(text) <= room) {
            return text;
        }
        int n = text.length();
        while (n > 0 && font.stringWidth(text.substring(0, n) + "\u2026") > room) {
            n--;
        }
        return text.substring(0, n) + "\u2026";
    }
}

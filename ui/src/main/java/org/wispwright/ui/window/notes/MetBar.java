package org.wispwright.ui.window.notes;

import java.awt.Dimension;
import java.awt.FontMetrics;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalInt;
import org.wispwright.ui.desk.MetWatch;
import org.wispwright.ui.desk.Source;
import org.wispwright.ui.window.DrawnPart;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Sources;
import org.wispwright.ui.window.Words;

/** How far something is met: in words, and as a bar below them. */
final class MetBar extends DrawnPart {
    private static final int BAR = 4;

    private String words = "";
    private String brief = "";
    private double share;

    /**
     * Shows how far a take meets a note.
     *
     * @param take  the take; empty if there is none to judge
     * @param found what came out; empty if it is still being worked out
     */
    void show(OptionalInt take, Optional<MetWatch.Met> found) {
        brief = "";
        if (take.isEmpty()) {
            setToolTipText(Words.of("notes.met.none.tip"));
            show(Words.of("notes.met.none"), 0);
            return;
        }
        String by = Sources.inWords(new Source.Take(take.getAsInt()));
        setToolTipText(Words.of("notes.met.tip", by));
        if (found.isEmpty()) {
            show(Words.of("notes.met.coming"), 0);
        } else if (found.get().share().isEmpty()) {
            show(Words.of("notes.met.nothing"), 0);
        } else {
            double part = found.get().share().getAsDouble();
            String percent = String.format(Locale.ROOT, "%.0f", 100 * part);
            brief = Words.of("notes.met.short", percent);
            show(Words.of("notes.met", percent, by), part);
        }
    }

    private void show(String inWords, double part) {
        if (!inWords.equals(words) || part != share) {
            words = inWords;
            share = part;
            getAccessibleContext().setAccessibleName(inWords);
            repaint();
        }
    }

    /** What it says. */
    String words() {
        return words;
    }

    @Override
    public Dimension getPreferredSize() {
        return new Dimension(80, getFontMetrics(Palette.small()).getHeight() + BAR + 2);
    }

    @Override
    public Dimension getMinimumSize() {
        return new Dimension(40, getPreferredSize().height);
    }

    @Override
    protected void paintComponent(Graphics g) {
        Graphics2D g2 = (Graphics2D) g.create();
        g2.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
        g2.setFont(Palette.small());
        FontMetrics metrics = g2.getFontMetrics();
        g2.setColor(Palette.TEXT.colour());
        g2.drawString(metrics.stringWidth(words) <= getWidth() || brief.isEmpty() ? words : brief, 0, metrics.getAscent());
        int top = getHeight() - BAR;
        g2.setColor(Palette.LINE.colour());
        g2.fillRect(0, top, getWidth(), BAR);
        g2.setColor(Palette.MET.colour());
        g2.fillRect(0, top, (int) Math.round(getWidth() * Math.max(0, Math.min(1, share))), BAR);
        g2.dispose();
    }
}

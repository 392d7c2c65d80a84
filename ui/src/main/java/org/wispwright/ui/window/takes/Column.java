package org.wispwright.ui.window.takes;

import java.awt.Dimension;
import java.awt.Rectangle;
import javax.swing.JPanel;
import javax.swing.Scrollable;
import net.miginfocom.swing.MigLayout;
import org.wispwright.ui.window.Palette;

/** Boxes below each other, as wide as the panel and as high as they need; scrolled when that is too high. */
final class Column extends JPanel implements Scrollable {
    private static final int ROW = 16;

    Column() {
        super(new MigLayout("insets 8, fillx, wrap 1, hidemode 3, gapy 8", "[grow,fill]"));
        setBackground(Palette.PANEL.colour());
    }

    /** A box of the column: a title, and what is set below each other in it. */
    static JPanel box(String name, String title) {
        JPanel box = new JPanel(new MigLayout("insets 8, fillx, wrap 1, hidemode 3, gapy 4", "[grow,fill]"));
        box.setName(name);
        box.setBackground(Palette.CARD.colour());
        box.getAccessibleContext().setAccessibleName(title);
        Sentence words = new Sentence(name + "-title");
        words.setFont(Palette.strong());
        words.say(title);
        box.add(words, "wmin 0");
        return box;
    }

    @Override
    public Dimension getPreferredScrollableViewportSize() {
        return getPreferredSize();
    }

    @Override
    public int getScrollableUnitIncrement(Rectangle visible, int orientation, int direction) {
        return ROW;
    }

    @Override
    public int getScrollableBlockIncrement(Rectangle visible, int orientation, int direction) {
        return Math.max(ROW, visible.height - ROW);
    }

    @Override
    public boolean getScrollableTracksViewportWidth() {
        return true;
    }

    @Override
    public boolean getScrollableTracksViewportHeight() {
        return false;
    }
}

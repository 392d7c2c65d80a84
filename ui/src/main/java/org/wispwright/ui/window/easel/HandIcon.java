package org.wispwright.ui.window.easel;

import java.awt.BasicStroke;
import java.awt.Component;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import javax.swing.Icon;
import org.wispwright.ui.window.Palette;

/** A hand as a drawing of lines. Brushes are a round tip with the sign that their strokes have on a sheet. */
record HandIcon(HandKind kind) implements Icon {
    private static final int SIDE = 5 * Palette.STEP;
    private static final double TIP = 8;

    @Override
    public int getIconWidth() {
        return SIDE;
    }

    @Override
    public int getIconHeight() {
        return SIDE;
    }

    @Override
    public void paintIcon(Component c, Graphics graphics, int x, int y) {
        Graphics2D g = (Graphics2D) graphics.create();
        g.translate(x + SIDE / 2.0, y + SIDE / 2.0);
        g.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        g.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
        g.setColor(c.isEnabled() ? c.getForeground() : Palette.QUIET.colour());
        g.setStroke(new BasicStroke(1.5f, BasicStroke.CAP_ROUND, BasicStroke.JOIN_ROUND));
        if (kind.brush().isPresent()) {
            g.draw(new Ellipse2D.Double(-TIP, -TIP, 2 * TIP, 2 * TIP));
        }
        switch (kind) {
            case LOOK -> {
                g.draw(path(-9, 0, -5, -4.5, 0, -5.5, 5, -4.5, 9, 0, 5, 4.5, 0, 5.5, -5, 4.5, -9, 0));
                g.fill(new Ellipse2D.Double(-2.5, -2.5, 5, 5));
            }
            case ADD -> {
                g.draw(path(-4, 0, 4, 0));
                g.draw(path(0, -4, 0, 4));
            }
            case REMOVE -> g.draw(path(-4, 0, 4, 0));
            case SOFTEN -> g.draw(new Ellipse2D.Double(-3.5, -3.5, 7, 7));
            case PUSH -> g.draw(path(-4.5, 2, 0, -1, 4, -1, 2, -3.5, 4, -1, 2, 1.5));
            case EVEN -> {
                g.draw(path(-4, -2, 4, -2));
                g.draw(path(-4, 2, 4, 2));
            }
            case LIFT -> {
                g.draw(path(-2, -4, -2, 4));
                g.draw(path(2, -4, 2, 4));
            }
            case RESTORE -> g.draw(new Rectangle2D.Double(-3, -3, 6, 6));
            case PULL -> {
                g.draw(path(-8, 8, -8, -2, 2, 8, -8, 8));
                g.draw(path(-8, -2, 7, -7, 2, 8));
                g.fill(new Ellipse2D.Double(4.5, -9.5, 5, 5));
            }
            case OUTLINE -> {
                g.draw(path(-8, 3, -7, -3, -2, -5, 1, -8, 6, -7, 8, -2, 6, 3, 7, 7, 1, 8, -5, 7, -8, 3));
                g.fill(new Ellipse2D.Double(-0.5, -10, 5, 5));
            }
            case HOLD -> {
                g.fill(new Ellipse2D.Double(-2, -2, 4, 4));
                g.setStroke(new BasicStroke(1.5f, BasicStroke.CAP_BUTT, BasicStroke.JOIN_MITER, 10, new float[] {3.5f, 2.5f}, 0));
                g.draw(new Rectangle2D.Double(-8, -7, 16, 14));
            }
        }
        g.dispose();
    }

    private static Path2D path(double... xy) {
        Path2D path = new Path2D.Double();
        path.moveTo(xy[0], xy[1]);
        for (int n = 2; n < xy.length; n += 2) {
            path.lineTo(xy[n], xy[n + 1]);
        }
        return path;
    }
}

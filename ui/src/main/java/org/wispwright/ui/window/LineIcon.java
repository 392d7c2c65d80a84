package org.wispwright.ui.window;

import java.awt.BasicStroke;
import java.awt.Component;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.geom.Path2D;
import javax.swing.Icon;

/** Icons drawn as lines on a square of 16, as large as the type. Each stands beside words or has them as its tool tip. */
public enum LineIcon implements Icon {
    /** Play. */ PLAY("M4 3 L13 8 L4 13 Z"),
    /** Pause. */ PAUSE("M5 3 L5 13 M11 3 L11 13"),
    /** One frame on. */ NEXT("M6 3 L11 8 L6 13"),
    /** One frame back. */ PREVIOUS("M10 3 L5 8 L10 13"),
    /** The last frame. */ LAST("M4 3 L9 8 L4 13 M12 3 L12 13"),
    /** The first frame. */ FIRST("M12 3 L7 8 L12 13 M4 3 L4 13"),
    /** On to a note. */ NEXT_NOTE("M5 4 L9 8 L5 12 L1 8 Z M11 5 L14 8 L11 11"),
    /** Back to a note. */ PREVIOUS_NOTE("M11 4 L15 8 L11 12 L7 8 Z M5 5 L2 8 L5 11"),
    /** What must stay: corners round a place. */ HOLD("M2 6 L2 2 L6 2 M10 2 L14 2 L14 6 M14 10 L14 14 L10 14 M6 14 L2 14 L2 10 M6 8 L10 8"),
    /** More to do. */ MORE("M3 8 L4 8 M7.5 8 L8.5 8 M12 8 L13 8");

    private static final int SQUARE = 16;

    private final Path2D path = new Path2D.Double();

    /** @param lines M and L with places, Z to close */
    LineIcon(String lines) {
        String[] parts = lines.split(" ");
        for (int n = 0; n < parts.length; n++) {
            char what = parts[n].charAt(0);
            if (what == 'Z') {
                path.closePath();
                continue;
            }
            double x = Double.parseDouble(parts[n].substring(1));
            double y = Double.parseDouble(parts[++n]);
            if (what == 'M') {
                path.moveTo(x, y);
            } else {
                path.lineTo(x, y);
            }
        }
    }

    @Override
    public void paintIcon(Component c, Graphics g, int x, int y) {
        Graphics2D g2 = (Graphics2D) g.create();
        g2.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        g2.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
        g2.setColor(c.isEnabled() ? c.getForeground() : Palette.LINE.colour());
        g2.translate(x, y);
        double scale = (double) getIconWidth() / SQUARE;
        g2.scale(scale, scale);
        g2.setStroke(new BasicStroke(1.6f, BasicStroke.CAP_ROUND, BasicStroke.JOIN_ROUND));
        g2.draw(path);
        g2.dispose();
    }

    @Override
    public int getIconWidth() {
        return Math.round(SQUARE * Palette.strong().getSize2D() / 13);
    }

    @Override
    public int getIconHeight() {
        return getIconWidth();
    }
}

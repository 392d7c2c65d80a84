package org.wispwright.ui.window.easel;

import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.Shape;
import java.awt.geom.AffineTransform;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Point2D;
import org.wispwright.ui.window.Palette;

/** What the easel itself draws over its pictures: the wanted outline, and what divides two pictures. Each line has a dark rim. */
final class Overlays {
    private static final Color RIM = new Color(0, 0, 0, 150);
    private static final int KNOB = 16;

    private Overlays() {
    }

    /** The wanted outline, dashed. @param outline in heights; null for none */
    static void outline(Graphics2D g, Path2D outline, Placement placement) {
        if (outline == null) {
            return;
        }
        AffineTransform place = new AffineTransform(placement.scale(), 0, 0, placement.scale(), placement.left(), placement.top());
        Shape line = place.createTransformedShape(outline);
        g.setColor(RIM);
        g.setStroke(new BasicStroke(3));
        g.draw(line);
        g.setColor(Palette.WANTED.colour());
        g.setStroke(new BasicStroke(1.4f, BasicStroke.CAP_ROUND, BasicStroke.JOIN_ROUND, 1, new float[] {6, 3}, 0));
        g.draw(line);
    }

    /** The line between two pictures, with its knob. */
    static void divider(Graphics2D g, DividerLine line) {
        double[] ends = line.ends();
        Line2D through = new Line2D.Double(ends[0], ends[1], ends[2], ends[3]);
        g.setColor(RIM);
        g.setStroke(new BasicStroke(4));
        g.draw(through);
        g.setColor(Color.WHITE);
        g.setStroke(new BasicStroke(1.5f));
        g.draw(through);
        Point2D knob = line.knob();
        Ellipse2D disc = new Ellipse2D.Double(knob.getX() - KNOB / 2.0, knob.getY() - KNOB / 2.0, KNOB, KNOB);
        g.setColor(RIM);
        g.fill(disc);
        g.setColor(Color.WHITE);
        g.draw(disc);
    }

    /** The line between two pictures side by side. */
    static void halves(Graphics2D g, int width, int height) {
        g.setColor(Palette.LINE.colour());
        g.fillRect(width / 2 - 1, 0, 2, height);
    }
}

package org.wispwright.ui.window.easel;

import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.Shape;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import java.awt.geom.Point2D;
import org.wispwright.ui.window.Palette;
import org.wispwright.warp.retouch.Folds;
import org.wispwright.warp.retouch.Handle;

/** Lines over a picture, each with a rim lighter or darker than itself, so that it shows on any picture. */
final class Marks {
    /** How near the pointer must be to take hold of something, in the easel's pixels. */
    static final double GRASP = 10;
    private static final Color DARK = new Color(0, 0, 0, 170);
    private static final Color LIGHT = new Color(255, 255, 255, 200);
    private static final double DOT = 4;

    private Marks() {
    }

    static void line(Graphics2D g, Shape shape, Color colour, float width) {
        line(g, shape, colour, width, null);
    }

    static void dashed(Graphics2D g, Shape shape, Color colour, float width) {
        line(g, shape, colour, width, new float[] {6, 4});
    }

    private static void line(Graphics2D g, Shape shape, Color colour, float width, float[] dash) {
        g.setColor(rim(colour));
        g.setStroke(new BasicStroke(width + 2, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 10, dash, 0));
        g.draw(shape);
        g.setColor(colour);
        g.setStroke(new BasicStroke(width, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 10, dash, 0));
        g.draw(shape);
    }

    private static Color rim(Color colour) {
        return 0.299 * colour.getRed() + 0.587 * colour.getGreen() + 0.114 * colour.getBlue() > 110 ? DARK : LIGHT;
    }

    static Shape circle(double x, double y, double radius) {
        return new Ellipse2D.Double(x - radius, y - radius, 2 * radius, 2 * radius);
    }

    /** A filled dot. */
    static void dot(Graphics2D g, Point2D at, Color colour) {
        Shape dot = circle(at.getX(), at.getY(), DOT);
        line(g, dot, colour, 1.5f);
        g.fill(dot);
    }

    /** A ring around what the pointer would take hold of. */
    static void hover(Graphics2D g, Point2D at) {
        line(g, circle(at.getX(), at.getY(), GRASP), Palette.ACCENT.colour(), 2);
    }

    /** A dot for what stays in its place, an arrow for what is pulled; a ring at the end that is taken hold of. */
    static void handle(Graphics2D g, Handle handle, Placement placement) {
        Point2D from = placement.toScreen(handle.from());
        Point2D to = placement.toScreen(handle.to());
        double length = from.distance(to);
        if (length < 2) {
            dot(g, to, Palette.HELD.colour());
            return;
        }
        double ux = (to.getX() - from.getX()) / length;
        double uy = (to.getY() - from.getY()) / length;
        double head = Math.min(10, 0.6 * length);
        Path2D arrow = new Path2D.Double();
        arrow.moveTo(from.getX(), from.getY());
        arrow.lineTo(to.getX(), to.getY());
        arrow.moveTo(to.getX() - head * (ux - 0.5 * uy), to.getY() - head * (uy + 0.5 * ux));
        arrow.lineTo(to.getX(), to.getY());
        arrow.lineTo(to.getX() - head * (ux + 0.5 * uy), to.getY() - head * (uy - 0.5 * ux));
        line(g, arrow, Palette.WANTED.colour(), 2);
        line(g, circle(to.getX(), to.getY(), DOT), Palette.WANTED.colour(), 1.5f);
    }

    /** Crossed squares where a warp turns the picture over. */
    static void folds(Graphics2D g, Folds folds, Placement placement) {
        double side = Math.max(3, placement.scale() / Folds.ROWS);
        folds.places().forEach(place -> {
            Point2D at = placement.toScreen(place);
            double x = at.getX() - side / 2;
            double y = at.getY() - side / 2;
            Path2D cross = new Path2D.Double();
            cross.moveTo(x, y);
            cross.lineTo(x + side, y + side);
            cross.moveTo(x + side, y);
            cross.lineTo(x, y + side);
            line(g, cross, Palette.FAULT.colour(), 1.5f);
        });
    }
}

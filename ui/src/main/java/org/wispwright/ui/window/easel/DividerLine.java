package org.wispwright.ui.window.easel;

import java.awt.Rectangle;
import java.awt.Shape;
import java.awt.geom.Path2D;
import java.awt.geom.Point2D;
import org.wispwright.ui.desk.Showing.Divider;

/**
 * The line between two pictures on the screen: through its knob, at an angle. The knob moves the line; the line itself, pulled farther out,
 * turns it about the knob.
 */
final class DividerLine {
    private static final double GRIP = 7;
    private static final double KNOB = 14;
    private final Divider divider;
    private final double x;
    private final double y;
    private final double nx;
    private final double ny;

    /** What of the line the pointer is on. */
    enum Part { NONE, KNOB, LINE }

    /** @param aspect of the picture: width over height */
    DividerLine(Divider divider, Placement placement, double aspect) {
        this.divider = divider;
        x = placement.left() + placement.scale() * aspect * divider.x();
        y = placement.top() + placement.scale() * divider.y();
        nx = Math.cos(divider.radians());
        ny = Math.sin(divider.radians());
    }

    Point2D knob() {
        return new Point2D.Double(x, y);
    }

    /** Both ends, far outside any screen. */
    double[] ends() {
        double far = 20_000;
        return new double[] {x + far * ny, y - far * nx, x - far * ny, y + far * nx};
    }

    /** The box of all that it draws in an easel of that size. */
    Rectangle reach(int width, int height) {
        Rectangle box = new Rectangle((int) (x - KNOB), (int) (y - KNOB), (int) (2 * KNOB), (int) (2 * KNOB));
        double atTop = Math.abs(nx) > 1e-9 ? x + y * ny / nx : Double.NaN;
        double atBottom = Math.abs(nx) > 1e-9 ? x + (y - height) * ny / nx : Double.NaN;
        double atLeft = Math.abs(ny) > 1e-9 ? y + x * nx / ny : Double.NaN;
        double atRight = Math.abs(ny) > 1e-9 ? y + (x - width) * nx / ny : Double.NaN;
        add(box, atTop, 0, width, height);
        add(box, atBottom, height, width, height);
        add(box, 0, atLeft, width, height);
        add(box, width, atRight, width, height);
        box.grow((int) KNOB, (int) KNOB);
        return box;
    }

    private static void add(Rectangle box, double px, double py, int width, int height) {
        if (px >= 0 && px <= width && py >= 0 && py <= height) {               // false for NaN: it does not cross there
            box.add((int) px, (int) py);
        }
    }

    /** All that lies on the far side. */
    Shape farSide() {
        double far = 20_000;
        Path2D side = new Path2D.Double();
        side.moveTo(x + far * ny, y - far * nx);
        side.lineTo(x - far * ny, y + far * nx);
        side.lineTo(x - far * ny + far * nx, y + far * nx + far * ny);
        side.lineTo(x + far * ny + far * nx, y - far * nx + far * ny);
        side.closePath();
        return side;
    }

    Part at(double px, double py) {
        if (Math.hypot(px - x, py - y) <= KNOB) {
            return Part.KNOB;
        }
        return Math.abs((px - x) * nx + (py - y) * ny) <= GRIP ? Part.LINE : Part.NONE;
    }

    /** Pulled at a part to a place. */
    Divider pulled(Part part, double px, double py, Placement placement, double aspect, Point2D grabbed) {
        if (part == Part.KNOB) {
            return new Divider((px - placement.left()) / (placement.scale() * aspect), (py - placement.top()) / placement.scale(),
                    divider.radians());
        }
        double turned = Math.atan2(py - y, px - x) - Math.atan2(grabbed.getY() - y, grabbed.getX() - x);
        return new Divider(divider.x(), divider.y(), divider.radians() + turned);
    }
}

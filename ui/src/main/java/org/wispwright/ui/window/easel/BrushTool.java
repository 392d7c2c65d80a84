package org.wispwright.ui.window.easel;

import java.awt.Color;
import java.awt.Cursor;
import java.awt.Graphics2D;
import java.awt.geom.Line2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.Drawing;
import org.wispwright.ui.desk.Hand.Brushing;
import org.wispwright.ui.desk.Retouching;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Pressure;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.retouch.Stroke;

/**
 * Brushes: a drag draws, a drag with Shift makes the brush wider (to the right) or narrower. The cursor is as large as the brush: the outer
 * circle is where it ends, the inner one where its soft edge begins. What brush it is, is asked of the desk each time.
 */
final class BrushTool extends RetouchTool {
    private static final Color RING = new Color(255, 255, 255);
    private static final double SEEN = 3;

    private Pointer at;
    private Optional<Drawing> drawing = Optional.empty();
    private final List<Point> points = new ArrayList<>();
    private final List<Double> pressures = new ArrayList<>();
    private Pointer resizedFrom;
    private double radiusBefore;

    BrushTool(Desk desk, Retouching retouching, Surface surface) {
        super(desk, retouching, surface);
    }

    private Optional<Brushing> brush() {
        return desk.state().hand() instanceof Brushing brushing ? Optional.of(brushing) : Optional.empty();
    }

    @Override
    public void moved(Pointer pointer) {
        cursorTo(pointer);
    }

    @Override
    public void pressed(Pointer pointer) {
        cursorTo(pointer);
        brush().ifPresent(brush -> {
            if (pointer.shift()) {
                resizedFrom = pointer;
                radiusBefore = brush.radius();
            } else {
                double pressure = pressure(brush, pointer);
                Sweep sweep = new Sweep(brush.radius(), brush.strength(), brush.softEdge(), List.of(pointer.place()),
                        new Pressure(Pressure.On.STRENGTH, pressure == 1 ? List.of() : List.of(pressure)), 0);
                drawing = retouching.draw(new Stroke(brush.brush(), sweep, Optional.empty()));
            }
        });
    }

    private static double pressure(Brushing brush, Pointer pointer) {
        return brush.pressure() ? pointer.pressure() : 1;
    }

    @Override
    public void dragged(Pointer pointer) {
        if (resizedFrom != null) {
            double radius = radiusBefore + (pointer.x() - resizedFrom.x()) * resizedFrom.heights();
            desk.look(s -> brush().map(brush -> s.withHand(brush.withRadius(radius))).orElse(s));
            surface.overlayChanged();
            return;
        }
        cursorTo(pointer);
        brush().filter(brush -> drawing.isPresent()).ifPresent(brush -> {
            points.add(pointer.place());
            pressures.add(pressure(brush, pointer));
            soon();
        });
    }

    @Override
    void follow() {
        drawing.ifPresent(d -> d.extend(points, pressures));
        points.clear();
        pressures.clear();
    }

    @Override
    public void released(Pointer pointer) {
        now();
        resizedFrom = null;
        Optional<Drawing> ended = drawing;
        drawing = Optional.empty();
        ended.ifPresent(Drawing::end);
    }

    @Override
    public void exited() {
        cursorTo(null);
    }

    @Override
    public void cancel() {
        resizedFrom = null;
        drawing = Optional.empty();
        points.clear();
        pressures.clear();
        super.cancel();
    }

    private void cursorTo(Pointer pointer) {
        cursorChanged();
        at = pointer;
        cursorChanged();
    }

    private void cursorChanged() {
        if (at != null) {
            double radius = brush().map(Brushing::radius).orElse(0.0) / at.heights() + 8;
            surface.overlayChanged((int) Math.floor(at.x() - radius), (int) Math.floor(at.y() - radius), (int) Math.ceil(2 * radius) + 2,
                    (int) Math.ceil(2 * radius) + 2);
        }
    }

    @Override
    public void paint(Graphics2D g, Placement placement) {
        Pointer middle = resizedFrom == null ? at : resizedFrom;
        if (middle == null) {
            return;
        }
        brush().ifPresent(brush -> {
            double outer = brush.radius() * placement.scale();
            double inner = outer * (1 - brush.softEdge());
            Marks.line(g, Marks.circle(middle.x(), middle.y(), Math.max(1, outer)), RING, 1.2f);
            if (inner >= SEEN && outer - inner >= SEEN) {
                Marks.dashed(g, Marks.circle(middle.x(), middle.y(), inner), RING, 1);
            }
            if (outer < 2 * SEEN) {
                for (int side = -1; side <= 1; side += 2) {
                    Marks.line(g, new Line2D.Double(middle.x() + side * 4, middle.y(), middle.x() + side * 10, middle.y()), RING, 1);
                    Marks.line(g, new Line2D.Double(middle.x(), middle.y() + side * 4, middle.x(), middle.y() + side * 10), RING, 1);
                }
            }
        });
    }

    @Override
    public Cursor cursor() {
        return Cursor.getPredefinedCursor(Cursor.CROSSHAIR_CURSOR);
    }
}

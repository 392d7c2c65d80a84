package org.wispwright.ui.report;

import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.Shape;
import java.awt.geom.Area;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Line2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.EnumSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Folds;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.OutlineWarp;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.measure.Plane;
import org.wispwright.warp.outline.Loop;
import org.wispwright.warp.outline.OutlineTracer;
import org.wispwright.warp.retouch.Repaint;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Stroke;

/**
 * A retouch drawn as lines: strokes as the outline of what they cover, with a sign (push: its line), handles as
 * arrows, pins as dots, paint-overs as the outline of what they change, holds and regions dashed, folds as squares with a cross at the
 * worst. Every line has a dark rim, so it shows on any picture.
 */
final class RetouchMarks {
    /** What a mark's colour says. */
    enum Meaning {
        /** A hold, or a pin of a mesh warp. */ KEEP(0x9BD18B, "stays"),
        /** The matte that an operation may act in. */ WITHIN(0xC3B1E1, "acts within"),
        /** The matte that a note weighs by. */ WEIGHS(0x8FA8E8, "counts"),
        /** Restore brush. */ RESTORE(0xB7B07A, "restore"),
        /** Soften brush. */ SOFTEN(0xD9D9D9, "soften"),
        /** Even out brush. */ EVEN(0x8FB8A8, "even out"),
        /** Lift contrast brush. */ LIFT(0xF0907A, "lift contrast"),
        /** Push brush. */ PUSH(0xD98CB3, "push"),
        /** Remove brush. */ REMOVE(0x6EC1E4, "remove"),
        /** Handles of a mesh warp, drags of an outline. */ PULL(0xE58A5C, "pull"),
        /** Where a warp turns the picture over. */ FOLD(0xFF5555, "folds"),
        /** Painted over in another program. */ PAINTED(0xE0A0F0, "painted over"),
        /** Add brush. */ ADD(0xF2C14E, "add");

        private final Color colour;
        private final String words;

        Meaning(int rgb, String words) {
            this.colour = new Color(rgb);
            this.words = words;
        }

        Color colour() {
            return colour;
        }

        String words() {
            return words;
        }
    }

    private static final Color RIM = new Color(0, 0, 0, 110);

    private final Graphics2D g;
    private final double height;
    private final Picture original;

    /**
     * Draws onto a picture of this height whose top left corner is at the graphics' origin.
     *
     * @param original what the retouch works on, at any raster: gives the outlines of mattes that depend on the smoke or are pixels
     */
    RetouchMarks(Graphics2D g, double height, Picture original) {
        this.g = g;
        this.height = height;
        this.original = original;
    }

    /** What the marks of a retouch say; its legend needs no more. */
    static Set<Meaning> meanings(Retouch retouch, List<Matte> holds, Optional<Matte> weighBy, Folds folds) {
        Set<Meaning> all = EnumSet.noneOf(Meaning.class);
        weighBy.ifPresent(matte -> all.add(Meaning.WEIGHS));
        if (!holds.isEmpty()) {
            all.add(Meaning.KEEP);
        }
        for (Operation operation : retouch.operations()) {
            if (operation.within().isPresent()) {
                all.add(Meaning.WITHIN);
            }
            if (operation instanceof Stroke stroke) {
                all.add(meaning(stroke.brush()));
            } else if (operation instanceof MeshWarp warp) {
                warp.handles().forEach(h -> all.add(h.from().equals(h.to()) ? Meaning.KEEP : Meaning.PULL));
            } else if (operation instanceof OutlineWarp outline) {
                outline.drags().forEach(h -> all.add(h.from().equals(h.to()) ? Meaning.KEEP : Meaning.PULL));
            } else if (operation instanceof Repaint) {
                all.add(Meaning.PAINTED);
            }
        }
        if (folds.cells() > 0) {
            all.add(Meaning.FOLD);
        }
        return all;
    }

    private static Meaning meaning(Brush brush) {
        return switch (brush) {
            case ADD -> Meaning.ADD;
            case REMOVE -> Meaning.REMOVE;
            case SOFTEN -> Meaning.SOFTEN;
            case RESTORE -> Meaning.RESTORE;
            case PUSH -> Meaning.PUSH;
            case EVEN -> Meaning.EVEN;
            case LIFT -> Meaning.LIFT;
        };
    }

    void draw(Retouch retouch, List<Matte> holds, Optional<Matte> weighBy, Folds folds) {
        weighBy.ifPresent(matte -> line(outline(matte), Meaning.WEIGHS.colour(), dashed()));
        for (Matte hold : holds) {
            line(outline(hold), Meaning.KEEP.colour(), dashed());
        }
        for (Operation operation : retouch.operations()) {
            operation.within().ifPresent(region -> line(outline(region), Meaning.WITHIN.colour(), dashed()));
            if (operation instanceof Stroke stroke) {
                draw(stroke);
            } else if (operation instanceof MeshWarp warp) {
                warp.handles().forEach(this::draw);
            } else if (operation instanceof OutlineWarp outline) {
                outline.drags().forEach(drag -> draw(outline, drag));
            } else if (operation instanceof Repaint repaint) {
                draw(repaint);
            }
        }
        draw(folds);
    }

    /** An arrow, and dashed how far it bends the outline. */
    private void draw(OutlineWarp outline, Handle drag) {
        double radius = outline.reach() * height;
        line(new Ellipse2D.Double(drag.from().x() * height - radius, drag.from().y() * height - radius, 2 * radius, 2 * radius),
                Meaning.PULL.colour(), dashed());
        draw(drag);
    }

    /** A small square over every folded place, and a cross at the worst. */
    private void draw(Folds folds) {
        double side = Math.max(3, height / Folds.ROWS);
        g.setColor(Meaning.FOLD.colour());
        for (Point p : folds.places()) {
            g.fill(new Rectangle2D.Double(p.x() * height - side / 2, p.y() * height - side / 2, side, side));
        }
        folds.worst().ifPresent(p -> {
            double x = p.x() * height;
            double y = p.y() * height;
            Path2D cross = new Path2D.Double();
            cross.moveTo(x - 7, y - 7);
            cross.lineTo(x + 7, y + 7);
            cross.moveTo(x - 7, y + 7);
            cross.lineTo(x + 7, y - 7);
            line(cross, Meaning.FOLD.colour(), solid(2.4f));
        });
    }

    private void draw(Stroke stroke) {
        Color colour = meaning(stroke.brush()).colour();
        Path2D path = new Path2D.Double();
        Point first = stroke.line().get(0);
        path.moveTo(first.x() * height, first.y() * height);
        for (Point p : stroke.line()) {
            path.lineTo(p.x() * height, p.y() * height);
        }
        float width = (float) Math.max(1, 2 * stroke.radius() * height);
        Shape covered = new BasicStroke(width, BasicStroke.CAP_ROUND, BasicStroke.JOIN_ROUND).createStrokedShape(path);
        Area whole = new Area(covered);
        g.setColor(new Color(colour.getRed(), colour.getGreen(), colour.getBlue(), 26));
        g.fill(whole);
        line(whole, colour, solid(1.6f));
        Point middle = stroke.line().get(stroke.line().size() / 2);
        double x = middle.x() * height;
        double y = middle.y() * height;
        double arm = Math.min(6, 0.5 * stroke.radius() * height);
        switch (stroke.brush()) {
            case ADD -> {
                line(new Line2D.Double(x - arm, y, x + arm, y), colour, solid(1.6f));
                line(new Line2D.Double(x, y - arm, x, y + arm), colour, solid(1.6f));
            }
            case REMOVE -> line(new Line2D.Double(x - arm, y, x + arm, y), colour, solid(1.6f));
            case SOFTEN -> line(new Ellipse2D.Double(x - arm / 2, y - arm / 2, arm, arm), colour, solid(1.6f));
            case PUSH -> line(path, colour, solid(1.6f));
            case EVEN -> {
                line(new Line2D.Double(x - arm, y - arm / 3, x + arm, y - arm / 3), colour, solid(1.6f));
                line(new Line2D.Double(x - arm, y + arm / 3, x + arm, y + arm / 3), colour, solid(1.6f));
            }
            case LIFT -> {
                line(new Line2D.Double(x - arm / 3, y - arm, x - arm / 3, y + arm), colour, solid(1.6f));
                line(new Line2D.Double(x + arm / 3, y - arm, x + arm / 3, y + arm), colour, solid(1.6f));
            }
            case RESTORE -> line(new Rectangle2D.Double(x - arm / 2, y - arm / 2, arm, arm), colour, solid(1.6f));
        }
    }

    /** The outline of what was painted, where its mask passes a half. */
    private void draw(Repaint repaint) {
        float[] layers = repaint.layers();
        double[] mask = new double[layers.length / Repaint.LAYERS];
        for (int p = 0; p < mask.length; p++) {
            mask[p] = layers[Repaint.LAYERS * p + 3];
        }
        for (Loop loop : OutlineTracer.trace(new Plane(repaint.width(), repaint.height(), mask), 0.5)) {
            Path2D path = new Path2D.Double();
            path.moveTo(loop.x()[0] * height, loop.y()[0] * height);
            for (int n = 1; n < loop.size(); n++) {
                path.lineTo(loop.x()[n] * height, loop.y()[n] * height);
            }
            path.closePath();
            line(path, Meaning.PAINTED.colour(), solid(1.6f));
        }
    }

    private void draw(Handle handle) {
        double x0 = handle.from().x() * height;
        double y0 = handle.from().y() * height;
        double x1 = handle.to().x() * height;
        double y1 = handle.to().y() * height;
        double length = Math.hypot(x1 - x0, y1 - y0);
        if (length < 1) {
            Shape dot = new Ellipse2D.Double(x0 - 2.8, y0 - 2.8, 5.6, 5.6);
            line(dot, Meaning.KEEP.colour(), solid(1.6f));
            g.setColor(Meaning.KEEP.colour());
            g.fill(dot);
            return;
        }
        double ux = (x1 - x0) / length;
        double uy = (y1 - y0) / length;
        double head = Math.min(9, 0.6 * length);
        Path2D arrow = new Path2D.Double();
        arrow.moveTo(x0, y0);
        arrow.lineTo(x1, y1);
        arrow.moveTo(x1 - head * (ux - 0.5 * uy), y1 - head * (uy + 0.5 * ux));
        arrow.lineTo(x1, y1);
        arrow.lineTo(x1 - head * (ux + 0.5 * uy), y1 - head * (uy - 0.5 * ux));
        line(arrow, Meaning.PULL.colour(), solid(2f));
        line(new Ellipse2D.Double(x0 - 2, y0 - 2, 4, 4), Meaning.PULL.colour(), solid(1.6f));
    }

    /** A region as it was drawn; any other matte where its value is 1/2. */
    private Shape outline(Matte matte) {
        if (!(matte instanceof Region region)) {
            Path2D path = new Path2D.Double();
            for (Loop loop : OutlineTracer.trace(Plane.of(original.width(), original.height(), matte.values(original)), 0.5)) {
                path.moveTo(loop.x()[0] * height, loop.y()[0] * height);
                for (int n = 1; n < loop.size(); n++) {
                    path.lineTo(loop.x()[n] * height, loop.y()[n] * height);
                }
                path.closePath();
            }
            return path;
        }
        if (region instanceof Region.Rectangle r) {
            return new Rectangle2D.Double(r.left() * height, r.top() * height, (r.right() - r.left()) * height,
                    (r.bottom() - r.top()) * height);
        }
        if (region instanceof Region.Ellipse e) {
            return new Ellipse2D.Double((e.centre().x() - e.radiusX()) * height, (e.centre().y() - e.radiusY()) * height,
                    2 * e.radiusX() * height, 2 * e.radiusY() * height);
        }
        List<Point> corners = ((Region.Polygon) region).outline();
        Path2D path = new Path2D.Double();
        path.moveTo(corners.get(0).x() * height, corners.get(0).y() * height);
        corners.forEach(p -> path.lineTo(p.x() * height, p.y() * height));
        path.closePath();
        return path;
    }

    private void line(Shape shape, Color colour, BasicStroke pen) {
        g.setColor(RIM);
        g.setStroke(new BasicStroke(pen.getLineWidth() + 1.6f, pen.getEndCap(), pen.getLineJoin(), pen.getMiterLimit(), pen.getDashArray(),
                0));
        g.draw(shape);
        g.setColor(colour);
        g.setStroke(pen);
        g.draw(shape);
    }

    private static BasicStroke solid(float width) {
        return new BasicStroke(width, BasicStroke.CAP_ROUND, BasicStroke.JOIN_ROUND);
    }

    private static BasicStroke dashed() {
        return new BasicStroke(1.6f, BasicStroke.CAP_BUTT, BasicStroke.JOIN_ROUND, 10, new float[] {5, 4}, 0);
    }
}

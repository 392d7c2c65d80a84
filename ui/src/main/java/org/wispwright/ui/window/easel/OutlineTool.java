package org.wispwright.ui.window.easel;

import java.awt.Graphics2D;
import java.awt.geom.AffineTransform;
import java.awt.geom.Path2D;
import java.awt.geom.Point2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.Hand;
import org.wispwright.ui.desk.OutlineDrag;
import org.wispwright.ui.desk.Retouching;
import org.wispwright.ui.desk.Retouching.Edit;
import org.wispwright.ui.window.Palette;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.outline.Loop;
import org.wispwright.warp.outline.Outlines;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.OutlineWarp;
import org.wispwright.warp.retouch.WarpKind;

/**
 * * Drags the outline of the original's smoke at an opacity; the inside follows. A drag begins at any place of the line, or at the end of
 * an arrow set before; a click with Ctrl or Alt takes an arrow off. New drags go to the note's last operation, if that is of the same
 * level and reach, else a new one begins. A dashed circle shows how far a drag bends the line.
 */
final class OutlineTool extends RetouchTool {
    /** A drag set before. */
    private record Grip(int operation, int drag) {
    }

    private Optional<Outlines> drawn = Optional.empty();
    private final Path2D line = new Path2D.Double();
    private Optional<Grip> hover = Optional.empty();
    private Optional<Point> hoverOnLine = Optional.empty();
    private Optional<OutlineDrag> dragging = Optional.empty();
    private Pointer at;

    OutlineTool(Desk desk, Retouching retouching, Surface surface) {
        super(desk, retouching, surface);
        rest();
    }

    private Optional<Hand.Outlining> hand() {
        return desk.state().hand() instanceof Hand.Outlining outlining ? Optional.of(outlining) : Optional.empty();
    }

    @Override
    void handChanged() {
        rest();
    }

    @Override
    public void rested() {
        if (dragging.isEmpty()) {
            rest();
        }
        super.rested();
    }

    private void rest() {
        hand().ifPresent(outlining -> retouching.trace(outlining.level()));
        List<Operation> operations = retouching.operations();
        if (retouching.isAtRest()) {
            retouching.fold(operations.isEmpty() ? Optional.empty() : Optional.of(operations.get(operations.size() - 1)));
        }
        if (!retouching.outlines().equals(drawn)) {
            drawn = retouching.outlines();
            line.reset();
            drawn.ifPresent(outlines -> outlines.loops().forEach(loop -> add(loop, line)));
        }
    }

    private static void add(Loop loop, Path2D path) {
        path.moveTo(loop.x()[0], loop.y()[0]);
        for (int n = 1; n < loop.size(); n++) {
            path.lineTo(loop.x()[n], loop.y()[n]);
        }
        path.closePath();
    }

    private Optional<OutlineWarp> warp(int operation) {
        if (dragging.isPresent() && dragging.get().at() == operation) {
            return dragging.map(OutlineDrag::warp);
        }
        List<Operation> operations = retouching.operations();
        return operation < operations.size() && operations.get(operation) instanceof OutlineWarp warp ? Optional.of(warp)
                : Optional.empty();
    }

    private Optional<Grip> near(Pointer pointer) {
        Grip best = null;
        double least = Marks.GRASP * pointer.heights();
        for (int n = retouching.operations().size() - 1; n >= 0 && best == null; n--) {
            List<Handle> drags = warp(n).map(OutlineWarp::drags).orElse(List.of());
            for (int d = 0; d < drags.size(); d++) {
                double distance = drags.get(d).to().distanceTo(pointer.place());
                if (distance < least) {
                    best = new Grip(n, d);
                    least = distance;
                }
            }
        }
        return Optional.ofNullable(best);
    }

    @Override
    public void moved(Pointer pointer) {
        Optional<Grip> found = near(pointer);
        Optional<Point> onLine = found.isPresent() ? Optional.empty() : retouching.outlines()
                .flatMap(o -> o.nearest(pointer.place().x(), pointer.place().y(), Marks.GRASP * pointer.heights()))
                .map(place -> new Point(place.x(), place.y()));
        if (!found.equals(hover) || !onLine.equals(hoverOnLine)) {
            hover = found;
            hoverOnLine = onLine;
            surface.overlayChanged();
        }
    }

    @Override
    public void pressed(Pointer pointer) {
        moved(pointer);
        if (retouching.note().isEmpty()) {
            return;
        }
        if (hover.isPresent()) {
            Grip grip = hover.get();
            if (pointer.ctrl() || pointer.alt()) {
                remove(grip);
            } else {
                dragging = warp(grip.operation()).flatMap(warp -> retouching.drag(grip.operation(), warp, grip.drag()));
            }
        } else if (hoverOnLine.isPresent() && !pointer.ctrl() && !pointer.alt()) {
            begin(hoverOnLine.get());
        }
    }

    private void begin(Point from) {
        Hand.Outlining outlining = hand().orElseThrow();
        List<Operation> operations = retouching.operations();
        int last = operations.size() - 1;
        try {
            if (last >= 0 && operations.get(last) instanceof OutlineWarp warp && warp.level() == outlining.level()
                    && warp.reach() == outlining.reach()) {
                List<Handle> drags = new ArrayList<>(warp.drags());
                drags.add(Handle.pin(from));
                OutlineWarp more = new OutlineWarp(warp.level(), drags, warp.reach(), warp.inside(), warp.within());
                dragging = retouching.drag(last, more, drags.size() - 1);
            } else {
                OutlineWarp fresh = new OutlineWarp(outlining.level(), List.of(Handle.pin(from)), outlining.reach(), WarpKind.SPLINE,
                        Optional.empty());
                dragging = retouching.drag(operations.size(), fresh, 0);
            }
        } catch (IllegalArgumentException refused) {
            desk.say(org.wispwright.ui.desk.Message.Kind.NOTICE, refused.getMessage());
        }
    }

    private void remove(Grip off) {
        OutlineWarp warp = warp(off.operation()).orElseThrow();
        retouching.edit(Edit.REMOVE_DRAG, operations -> {
            List<Operation> changed = new ArrayList<>(operations);
            List<Handle> drags = new ArrayList<>(warp.drags());
            drags.remove(off.drag());
            if (drags.isEmpty()) {
                changed.remove(off.operation());
            } else {
                changed.set(off.operation(), new OutlineWarp(warp.level(), drags, warp.reach(), warp.inside(), warp.within()));
            }
            return changed;
        });
        hover = Optional.empty();
    }

    @Override
    public void dragged(Pointer pointer) {
        at = pointer;
        soon();
    }

    @Override
    void follow() {
        dragging.ifPresent(drag -> drag.to(at.place()));
        surface.overlayChanged();
    }

    @Override
    public void released(Pointer pointer) {
        now();
        Optional<OutlineDrag> ended = dragging;
        dragging = Optional.empty();
        ended.ifPresent(OutlineDrag::end);
        moved(pointer);
        surface.overlayChanged();
    }

    @Override
    public void exited() {
        hover = Optional.empty();
        hoverOnLine = Optional.empty();
        surface.overlayChanged();
    }

    @Override
    public void cancel() {
        dragging = Optional.empty();
        super.cancel();
    }

    @Override
    public void paint(Graphics2D g, Placement placement) {
        if (retouching.note().isEmpty()) {
            return;
        }
        AffineTransform place = new AffineTransform(placement.scale(), 0, 0, placement.scale(), placement.left(), placement.top());
        Marks.line(g, place.createTransformedShape(line), Palette.TEXT.colour(), 1.2f);
        Marks.folds(g, retouching.folds(), placement);
        int count = Math.max(retouching.operations().size(), dragging.map(drag -> drag.at() + 1).orElse(0));
        for (int n = 0; n < count; n++) {
            warp(n).ifPresent(warp -> warp.drags().forEach(drag -> Marks.handle(g, drag, placement)));
        }
        Optional<Point> ring = dragging.map(drag -> drag.warp().drags().get(drag.drag()).to())
                .or(() -> hover.flatMap(h -> warp(h.operation()).map(warp -> warp.drags().get(h.drag()).to()))).or(() -> hoverOnLine);
        ring.ifPresent(r -> {
            Point2D middle = placement.toScreen(r);
            Marks.hover(g, middle);
            hand().ifPresent(outlining -> Marks.dashed(g, Marks.circle(middle.getX(), middle.getY(), outlining.reach() * placement.scale()),
                    Palette.WANTED.colour(), 1));
        });
    }
}

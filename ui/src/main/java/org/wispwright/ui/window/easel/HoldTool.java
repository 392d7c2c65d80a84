package org.wispwright.ui.window.easel;

import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.Shape;
import java.awt.FontMetrics;
import java.awt.geom.AffineTransform;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.desk.Desk;
import org.wispwright.ui.desk.Hand;
import org.wispwright.ui.desk.Retouching;
import org.wispwright.ui.desk.Retouching.Edit;
import org.wispwright.ui.shot.Hold;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.window.Palette;
import org.wispwright.ui.window.Words;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Window;

/**
 * * Draws regions that must stay, for the open note, at first on its own frame alone. A drag draws one in the hand's form; a click chooses
 * the smallest under the pointer, whose frames the strip then asks about. Held regions are dashed and tagged.
 */
final class HoldTool implements Tool, Retouching.Follower {
    private static final double SMALLEST = 4;
    private static final double APART = 0.002;
    private static final Color UNDER_WORDS = new Color(0, 0, 0, 170);

    private final Desk desk;
    private final Retouching retouching;
    private final Surface surface;
    private final Runnable unlisten;
    private final Map<Matte, Shape> shapes = new IdentityHashMap<>();
    private final List<Point> drawn = new ArrayList<>();
    private Pointer start;

    HoldTool(Desk desk, Retouching retouching, Surface surface) {
        this.desk = desk;
        this.retouching = retouching;
        this.surface = surface;
        unlisten = retouching.listen(this);
    }

    @Override
    public void live(Optional<Picture> picture) {
        shapes.clear();
        surface.overlayChanged();
    }

    @Override
    public void changed(Window pixels) {
        // Nothing here changes pixels.
    }

    @Override
    public void rested() {
        shapes.clear();
        surface.overlayChanged();
    }

    /** The holds that lie in the note's own view, with their numbers in its list. */
    private Map<Integer, Hold> holds() {
        Map<Integer, Hold> here = new java.util.TreeMap<>();
        retouching.note().ifPresent(note -> {
            for (int n = 0; n < note.holds().size(); n++) {
                if (note.holds().get(n).view().map(note.view()::equals).orElse(true)) {
                    here.put(n, note.holds().get(n));
                }
            }
        });
        return here;
    }

    private Shape shape(Matte matte) {
        return shapes.computeIfAbsent(matte, m -> HoldShapes.of(m, retouching.smallOriginal()));
    }

    @Override
    public void pressed(Pointer pointer) {
        if (retouching.note().isPresent()) {
            start = pointer;
            drawn.clear();
            drawn.add(pointer.place());
        }
    }

    @Override
    public void dragged(Pointer pointer) {
        if (start != null && pointer.place().distanceTo(drawn.get(drawn.size() - 1)) >= APART
                && drawn.size() < Region.Polygon.MOST_POINTS) {
            drawn.add(pointer.place());
            surface.overlayChanged();
        }
    }

    @Override
    public void released(Pointer pointer) {
        if (start == null) {
            return;
        }
        dragged(pointer);
        Point from = drawn.get(0);
        boolean clicked = drawn.stream().allMatch(p -> p.distanceTo(from) < SMALLEST * pointer.heights());
        Optional<Region> region = clicked ? Optional.empty() : region();
        start = null;
        drawn.clear();
        if (region.isPresent()) {
            Note note = retouching.note().orElseThrow();
            retouching.holds(Edit.ADD_HOLD, holds -> {
                List<Hold> more = new ArrayList<>(holds);
                more.add(new Hold(region.get(), note.frame(), note.frame()));
                return more;
            });
            retouching.choose(OptionalInt.of(note.holds().size()));
        } else if (clicked) {
            retouching.choose(under(pointer.place()));
        }
        surface.overlayChanged();
    }

    private OptionalInt under(Point place) {
        OptionalInt best = OptionalInt.empty();
        double least = Double.POSITIVE_INFINITY;
        for (Map.Entry<Integer, Hold> one : holds().entrySet()) {
            Optional<Shape> shape = one.getValue().region().map(this::shape);
            Rectangle2D box = shape.map(Shape::getBounds2D).orElse(new Rectangle2D.Double());
            if (shape.isPresent() && shape.get().contains(place.x(), place.y()) && box.getWidth() * box.getHeight() < least) {
                best = OptionalInt.of(one.getKey());
                least = box.getWidth() * box.getHeight();
            }
        }
        return best;
    }

    /** What was drawn so far in the hand's form; empty if it has no inside. */
    private Optional<Region> region() {
        if (!(desk.state().hand() instanceof Hand.Holding holding)) {
            return Optional.empty();
        }
        Point a = drawn.get(0);
        Point b = drawn.get(drawn.size() - 1);
        double left = Math.min(a.x(), b.x());
        double right = Math.max(a.x(), b.x());
        double top = Math.min(a.y(), b.y());
        double bottom = Math.max(a.y(), b.y());
        if (holding.form() == Hand.Form.FREEHAND) {
            return drawn.size() < 3 ? Optional.empty() : Optional.of(new Region.Polygon(drawn, holding.feather()));
        }
        if (!(left < right && top < bottom)) {
            return Optional.empty();
        }
        return Optional.of(holding.form() == Hand.Form.RECTANGLE ? new Region.Rectangle(left, top, right, bottom, holding.feather())
                : new Region.Ellipse(new Point((left + right) / 2, (top + bottom) / 2), (right - left) / 2, (bottom - top) / 2,
                holding.feather()));
    }

    @Override
    public void cancel() {
        start = null;
        drawn.clear();
        surface.overlayChanged();
    }

    @Override
    public void leave() {
        cancel();
        unlisten.run();
    }

    @Override
    public void paint(Graphics2D g, Placement placement) {
        AffineTransform place = new AffineTransform(placement.scale(), 0, 0, placement.scale(), placement.left(), placement.top());
        for (Map.Entry<Integer, Hold> one : holds().entrySet()) {
            Hold hold = one.getValue();
            boolean chosen = retouching.chosenHold().equals(OptionalInt.of(one.getKey()));
            hold.region().ifPresent(matte -> {
                Shape outline = place.createTransformedShape(shape(matte));
                Marks.dashed(g, outline, chosen ? Palette.ACCENT.colour() : Palette.HELD.colour(), chosen ? 3 : 1.5f);
                tag(g, inWords(hold), outline.getBounds2D());
            });
        }
        if (start != null) {
            if (drawn.size() < 3 || !(desk.state().hand() instanceof Hand.Holding holding) || holding.form() != Hand.Form.FREEHAND) {
                region().ifPresent(region -> Marks.dashed(g, place.createTransformedShape(HoldShapes.of(region, Optional.empty())),
                        Palette.HELD.colour(), 1.5f));
            } else {
                Path2D path = new Path2D.Double();
                path.moveTo(drawn.get(0).x(), drawn.get(0).y());
                drawn.forEach(p -> path.lineTo(p.x(), p.y()));
                Marks.dashed(g, place.createTransformedShape(path), Palette.HELD.colour(), 1.5f);
            }
        }
    }

    private static String inWords(Hold hold) {
        int first = hold.spans().stream().mapToInt(span -> span.first()).min().orElseThrow();
        int last = hold.spans().stream().mapToInt(span -> span.last()).max().orElseThrow();
        return first == last ? Words.of("hold.tag", first) : Words.of("hold.tag.span", first, last);
    }

    private static void tag(Graphics2D g, String words, Rectangle2D box) {
        g.setFont(Palette.small());
        FontMetrics metrics = g.getFontMetrics();
        int x = (int) Math.round(box.getX()) + Palette.STEP;
        int y = (int) Math.round(box.getY()) + Palette.STEP;
        g.setColor(UNDER_WORDS);
        g.fillRect(x, y, metrics.stringWidth(words) + 2 * Palette.STEP, metrics.getHeight() + Palette.STEP);
        g.setColor(Color.WHITE);
        g.drawString(words, x + Palette.STEP, y + metrics.getAscent() + Palette.STEP / 2);
    }
}

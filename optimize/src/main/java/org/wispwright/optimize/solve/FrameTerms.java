package org.wispwright.optimize.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.Supplier;
import org.wispwright.optimize.flow.Clock;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.march.Look;
import org.wispwright.render.march.RayMarcher;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.ScalarGrid;
import org.wispwright.warp.loss.PictureLoss;

/**
 * All pictures that the loss looks at, and the terms on each: a term compares the picture of one frame in one view with one
 * wanted picture, and its loss enters the total times a scale.
 *
 * <p>Forward: {@code J = sum over terms of scale * loss(picture(density))}. Pullback: the loss's picture gradient is kept
 * from the forward run (16 bytes a pixel of each picture), and marched back to the density when the reversal comes to the frame.
 */
final class FrameTerms {
    private final Map<Integer, List<Shown>> byFrame = new TreeMap<>();
    private final List<Supplier<RayMarcher>> makers = new ArrayList<>();
    /** Made when first needed: each takes about 25 bytes a cell, and not every view has a note. */
    private final RayMarcher[] marchers;
    private final Look look;
    private final Clock clock;
    private int terms;

    /** One picture and its terms. */
    private static final class Shown {
        final int view;
        final Picture got;
        final float[] bar;
        final List<Term> terms = new ArrayList<>();

        Shown(int view, Picture got) {
            this.view = view;
            this.got = got;
            bar = new float[got.rgba().length];
        }
    }

    /** One comparison; its number tells where its loss is written. */
    private record Term(int number, PictureLoss loss, double scale) { }

    FrameTerms(GridShape shape, List<View> views, Look look, double stepMetres, Clock clock, Lanes lanes) {
        this.look = look;
        this.clock = clock;
        for (View view : views) {
            makers.add(() -> new RayMarcher(shape, view, stepMetres, lanes));
        }
        marchers = new RayMarcher[makers.size()];
    }

    private RayMarcher marcher(int view) {
        if (marchers[view] == null) {
            marchers[view] = makers.get(view).get();
        }
        return marchers[view];
    }

    /** A new term. @return its number */
    int add(int frame, int view, PictureLoss loss, double scale) {
        List<Shown> there = byFrame.computeIfAbsent(frame, f -> new ArrayList<>());
        Shown shown = there.stream().filter(s -> s.view == view).findFirst().orElse(null);
        if (shown == null) {
            shown = new Shown(view, marcher(view).view().raster().picture());
            there.add(shown);
        }
        shown.terms.add(new Term(terms, loss, scale));
        return terms++;
    }

    /** Number of terms. */
    int count() {
        return terms;
    }

    /** Number of pictures that are drawn for each evaluation. */
    int pictures() {
        return byFrame.values().stream().mapToInt(List::size).sum();
    }

    /** The picture of a density in a view, into a new picture. */
    Picture picture(ScalarGrid density, int view) {
        Picture out = marcher(view).view().raster().picture();
        marcher(view).picture(density, look, out);
        return out;
    }

    /**
     * A copy of the picture of a frame in a view as the last {@link #forward} drew it.
     *
     * @throws IllegalArgumentException if no term looks at it
     */
    Picture last(int frame, int view) {
        return byFrame.getOrDefault(frame, List.of()).stream().filter(shown -> shown.view == view).findFirst()
                .orElseThrow(() -> new IllegalArgumentException("terms: there is none on frame " + frame + " in view " + view)).got.copy();
    }

    /**
     * Draws a frame's pictures and adds up its terms.
     *
     * @param losses overwritten at the numbers of this frame's terms: their losses, before the scale
     * @return the sum of scale times loss
     */
    double forward(int frame, ScalarGrid density, double[] losses) {
        double sum = 0;
        for (Shown shown : byFrame.getOrDefault(frame, List.of())) {
            long since = System.nanoTime();
            marcher(shown.view).picture(density, look, shown.got);
            since = clock.lap(Clock.Part.PICTURE, since);
            Arrays.fill(shown.bar, 0f);
            for (Term term : shown.terms) {
                losses[term.number] = term.loss.valueAndPullback(shown.got, shown.bar, term.scale);
                sum += term.scale * losses[term.number];
            }
            clock.lap(Clock.Part.LOSS, since);
        }
        return sum;
    }

    /** Adds the derivative by a frame's density; its last {@link #forward} must have been with this density. */
    void pullback(int frame, ScalarGrid density, ScalarGrid densityBar) {
        for (Shown shown : byFrame.getOrDefault(frame, List.of())) {
            long since = System.nanoTime();
            marcher(shown.view).pullback(density, look, shown.got, shown.bar, densityBar);
            clock.lap(Clock.Part.PICTURE_BACK, since);
        }
    }
}

package org.wispwright.ui.shot;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.wispwright.optimize.solve.SolveProblem;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Matte;

/**
 * What must stay as in the original.
 *
 * @param region where; empty for the whole frame
 * @param view   name of the view; empty for that of the note it belongs to
 * @param spans  frames that it holds, at least one span
 * @param held   what of the picture stays
 * @param weight above 0; 1 is usual
 */
public record Hold(Optional<Matte> region, Optional<String> view, List<SolveProblem.Span> spans, SolveProblem.Held held, double weight) {
    /** Copies the list and checks. @throws IllegalArgumentException if there is no span, or the weight is not a finite number above 0 */
    public Hold {
        spans = List.copyOf(spans);
        if (spans.isEmpty() || !(weight > 0) || Double.isInfinite(weight)) {
            throw new IllegalArgumentException("hold: got " + spans.size() + " spans of frames and a weight of " + weight
                    + ", needs at least one and a finite number above 0");
        }
    }

    /** A region's picture in the view of the note it belongs to, on a span of frames. */
    public Hold(Matte matte, int firstFrame, int lastFrame) {
        this(Optional.of(matte), Optional.empty(), List.of(new SolveProblem.Span(firstFrame, lastFrame)), SolveProblem.Held.PICTURE, 1);
    }

    /** True if the frame is held. */
    public boolean holds(int frame) {
        return spans.stream().anyMatch(span -> span.contains(frame));
    }

    /** True if it holds this frame and no other. */
    public boolean isOf(int frame) {
        return spans.stream().allMatch(span -> span.first() == frame && span.last() == frame);
    }

    /** True if it lies in its note's own picture: its view, its frame, and what it looks like there. */
    public boolean isIn(String noteView, int noteFrame) {
        return held == SolveProblem.Held.PICTURE && holds(noteFrame) && view.map(noteView::equals).orElse(true);
    }

    /** How much of each pixel is held: 1 in the region or, without one, everywhere. */
    public float[] values(Picture original) {
        if (region.isPresent()) {
            return region.get().values(original);
        }
        float[] ones = new float[original.width() * original.height()];
        Arrays.fill(ones, 1f);
        return ones;
    }

    /** The same on one frame alone. */
    public Hold at(int frame) {
        return new Hold(region, view, List.of(new SolveProblem.Span(frame, frame)), held, weight);
    }

    /** The same elsewhere. */
    public Hold in(Optional<Matte> other) {
        return new Hold(other, view, spans, held, weight);
    }
}

package org.wispwright.ui.job;

import java.util.List;
import org.wispwright.render.view.Raster;
import org.wispwright.warp.measure.Likeness;

/**
 * What a comparison measures for a review, beside met.
 *
 * @param regions of every note: its whole frame, where it is retouched, each of its holds on that frame, and elsewhere
 * @param views   every view that has a note, over all frames
 */
public record Review(List<OfRegion> regions, List<OfView> views) {
    /** Opacity from which a pixel belongs to a silhouette: smoke that a person sees against a plain background. */
    public static final double LEVEL = 0.1;

    /** Keeps copies. */
    public Review {
        regions = List.copyOf(regions);
        views = List.copyOf(views);
    }

    /**
     * One region of a note's frame, at the view's raster.
     *
     * @param note     the note's id
     * @param region   "frame", "retouched", "hold 1" (2, and so on, in the note's order), or "elsewhere"
     * @param got      the judged take against what is wanted
     * @param original take 0 against what is wanted: what there was to do
     */
    public record OfRegion(String note, String region, Likeness got, Likeness original) {
    }

    /**
     * A view over the shot's frames, at the raster of a solve (about a pixel a cell).
     *
     * @param view   its name
     * @param raster of the pictures that were measured
     * @param frames one entry a frame, the shot's first too
     */
    public record OfView(String view, Raster raster, List<OfFrame> frames) {
        /** Keeps a copy. */
        public OfView {
            frames = List.copyOf(frames);
        }
    }

    /**
     * One frame. All are means over pixels and RGBA of absolute differences; the first three, from the frame before, are 0 on the first.
     *
     * @param frame        its number
     * @param before       change of the take that is compared against
     * @param after        change of the judged take
     * @param added        difference of both changes: what flickers though it did not before
     * @param fromOriginal how far the judged take is from take 0 on this frame
     */
    public record OfFrame(int frame, double before, double after, double added, double fromOriginal) {
    }
}

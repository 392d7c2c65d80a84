package org.wispwright.warp.loss;

import java.util.Locale;
import org.wispwright.render.picture.Picture;

/** The losses that a note can be solved with; each says what it sees. */
public enum LossKind {
    /** {@link PyramidLoss}: colour and opacity at all scales. A note's {@code met} is always this one's. */
    PYRAMID {
        @Override
        public PictureLoss of(Picture original, Picture wanted, float[] weights) {
            return new PyramidLoss(wanted, weights);
        }
    },
    /** {@link EdgeLoss}: differences from pixel to pixel, above all where the wanted picture has edges. */
    EDGES {
        @Override
        public PictureLoss of(Picture original, Picture wanted, float[] weights) {
            return new EdgeLoss(wanted, weights);
        }
    },
    /**
     * {@link SlicedWassersteinLoss}: how far the smoke has to travel, inside the part of the frame that the change spans
     * ({@link RetouchMeasure#span}), so that standing smoke beside it has no part. The note's weights are left out: smoke that got heavier
     * as it crosses the frame would be rewarded for staying where it weighs more.
     */
    TRANSPORT {
        @Override
        public PictureLoss of(Picture original, Picture wanted, float[] weights) {
            return new SlicedWassersteinLoss(wanted, RetouchMeasure.span(original, wanted));
        }
    },
    /**
     * {@link SilhouetteLoss}: overlap of the outlines at half the wanted smoke's own opacity, softened by a sixth of it, so that it works
     * for thin smoke too.
     */
    SILHOUETTE {
        @Override
        public PictureLoss of(Picture original, Picture wanted, float[] weights) {
            double opacity = Math.min(1, Math.max(LEAST_OPACITY, RetouchMeasure.opacity(wanted)));
            return new SilhouetteLoss(wanted, weights, opacity / 2, opacity / 6);
        }
    };

    /** The opacity by which an outline is taken if the wanted picture is (almost) empty. */
    private static final double LEAST_OPACITY = 0.05;

    /**
     * The loss of this kind against a wanted picture.
     *
     * @param original read: what the note starts from
     * @param wanted  kept, not copied: do not change it afterwards
     * @param weights read: one number a pixel of wanted, finite, 0 or more
     * @throws IllegalArgumentException if the count differs, or a weight is negative or not finite
     */
    public abstract PictureLoss of(Picture original, Picture wanted, float[] weights);

    /** As notes name it. */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }
}

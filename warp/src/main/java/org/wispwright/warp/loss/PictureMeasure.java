package org.wispwright.warp.loss;

import org.wispwright.render.picture.Picture;

/** Plain figures of pictures for reports. Sums in double. */
public final class PictureMeasure {
    /** The opacity that counts at the most in {@link #depth}: what lies behind is hidden, and could be any amount. */
    public static final double MOST_OPACITY = 0.998;

    private PictureMeasure() {
    }

    /**
     * Mean absolute difference inside weights: {@code sum M sum_RGBA |a - b| / (4 sum M)}; 0 if all weights are 0.
     *
     * @param weights one number a pixel, 0 or more
     * @throws IllegalArgumentException if rasters or counts differ
     */
    public static double meanAbsoluteDifference(Picture a, Picture b, float[] weights) {
        int pixels = a.width() * a.height();
        if (b.width() != a.width() || b.height() != a.height() || weights.length != pixels) {
            throw new IllegalArgumentException("mean absolute difference: got pictures of " + a.width() + "x" + a.height() + " and "
                    + b.width() + "x" + b.height() + " and " + weights.length + " weights, needs one raster");
        }
        double sum = 0;
        double weight = 0;
        for (int p = 0, n = 0; p < pixels; p++, n += 4) {
            double difference = 0;
            for (int c = 0; c < 4; c++) {
                difference += Math.abs((double) a.rgba()[n + c] - b.rgba()[n + c]);
            }
            sum += weights[p] * difference;
            weight += 4.0 * weights[p];
        }
        return weight > 0 ? sum / weight : 0;
    }

    /**
     * Mass of the smoke seen: the integral of alpha over the picture, in squared heights, so it does not depend on the raster.
     * Taken before and after a warp it shows how much the warp made or lost.
     */
    public static double mass(Picture picture) {
        double sum = 0;
        float[] rgba = picture.rgba();
        for (int n = 3; n < rgba.length; n += 4) {
            sum += rgba[n];
        }
        return sum / ((double) picture.height() * picture.height());
    }

    /**
     * Optical depth of the smoke seen: the integral of {@code -ln(1 - min(alpha, 0.998))} over the picture, in squared heights. Seen in
     * parallel it is extinction times the smoke there is, wherever along the rays (Max 1995), as far as the smoke is not opaque.
     */
    public static double depth(Picture picture) {
        double sum = 0;
        float[] rgba = picture.rgba();
        for (int n = 3; n < rgba.length; n += 4) {
            sum -= Math.log1p(-Math.max(0, Math.min(MOST_OPACITY, rgba[n])));
        }
        return sum / ((double) picture.height() * picture.height());
    }
}

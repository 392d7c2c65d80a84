package org.wispwright.warp.measure;

/**
 * Differences of two planes, pixel by pixel. Sums in double, in pixel order. Each comes for the whole plane and for a region given
 * by weights M: then a mean is {@code sum M d / sum M}, and 0 where all weights are 0.
 */
public final class PlaneDifference {
    private PlaneDifference() {
    }

    /**
     * Mean squared error, {@code mean((a - b)^2)}.
     *
     * @throws IllegalArgumentException if the rasters differ
     */
    public static double meanSquare(Plane a, Plane b) {
        Plane.requireSame("mean squared error", a, b);
        double sum = 0;
        for (int p = 0; p < a.values().length; p++) {
            double d = a.values()[p] - b.values()[p];
            sum += d * d;
        }
        return sum / a.values().length;
    }

    /**
     * Mean squared error within a region.
     *
     * @param weights one a pixel, finite, 0 or more
     * @throws IllegalArgumentException if the rasters differ, or a weight is out of range
     */
    public static double meanSquare(Plane a, Plane b, float[] weights) {
        Plane.requireSame("mean squared error", a, b);
        Plane.requireWeights("mean squared error", a, weights);
        double sum = 0;
        double weight = 0;
        for (int p = 0; p < weights.length; p++) {
            double d = a.values()[p] - b.values()[p];
            sum += weights[p] * d * d;
            weight += weights[p];
        }
        return weight > 0 ? sum / weight : 0;
    }

    /**
     * Mean absolute error, {@code mean(|a - b|)}.
     *
     * @throws IllegalArgumentException if the rasters differ
     */
    public static double meanAbsolute(Plane a, Plane b) {
        Plane.requireSame("mean absolute error", a, b);
        double sum = 0;
        for (int p = 0; p < a.values().length; p++) {
            sum += Math.abs(a.values()[p] - b.values()[p]);
        }
        return sum / a.values().length;
    }

    /**
     * Mean absolute error within a region.
     *
     * @param weights one a pixel, finite, 0 or more
     * @throws IllegalArgumentException if the rasters differ, or a weight is out of range
     */
    public static double meanAbsolute(Plane a, Plane b, float[] weights) {
        Plane.requireSame("mean absolute error", a, b);
        Plane.requireWeights("mean absolute error", a, weights);
        double sum = 0;
        double weight = 0;
        for (int p = 0; p < weights.length; p++) {
            sum += weights[p] * Math.abs(a.values()[p] - b.values()[p]);
            weight += weights[p];
        }
        return weight > 0 ? sum / weight : 0;
    }

    /**
     * Peak signal to noise ratio in decibels, {@code 10 log10(peak^2 / meanSquare)}; infinite where nothing differs.
     *
     * @param meanSquare a mean squared error, 0 or more
     * @param peak       the largest value the data can take, above 0
     * @throws IllegalArgumentException if a number is out of range
     */
    public static double peakSignalToNoise(double meanSquare, double peak) {
        if (!(meanSquare >= 0 && peak > 0)) {
            throw new IllegalArgumentException("peak signal to noise: got mean squared error " + meanSquare + " and peak " + peak
                    + ", needs 0 or more and above 0");
        }
        return meanSquare == 0 ? Double.POSITIVE_INFINITY : 10 * Math.log10(peak * peak / meanSquare);
    }
}

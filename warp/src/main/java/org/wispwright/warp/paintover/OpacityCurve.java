package org.wispwright.warp.paintover;

import java.util.Arrays;

/**
 * How far a frame's colour goes from the background towards the smoke, as a non-decreasing function G of our opacity, and back.
 * <p>Fit: opacities in {@value #BINS} equal bins, in each the median of what was seen, made monotone by {@link Isotonic}, straight between
 * the bins, through (0, 0); scaled so that G(b) = b at the middle b of the last bin that was seen, and G(a) = a beyond it, where
 * nothing is known. Ours.
 */
final class OpacityCurve {
    private static final int BINS = 48;
    /** A bin with fewer pixels than this says nothing. */
    private static final int FEWEST = 4;
    /** Least rise from knot to knot, so that the way back is a function. */
    private static final double LEAST_RISE = 1e-6;

    private final double[] opacity;
    private final double[] reach;

    private OpacityCurve(double[] opacity, double[] reach) {
        this.opacity = opacity;
        this.reach = reach;
    }

    /** G(a) = a. */
    static OpacityCurve straight() {
        return new OpacityCurve(new double[] {0, 1}, new double[] {0, 1});
    }

    /**
     * Fits G.
     *
     * @param a    our opacity of every pixel
     * @param seen where the frame's colour lies on the way from background (0) to smoke, as many
     * @param from pixels with less opacity are left out
     */
    static OpacityCurve fit(float[] a, double[] seen, double from) {
        double most = 0;
        for (float value : a) {
            most = Math.max(most, value);
        }
        int[] count = new int[BINS];
        for (float value : a) {
            if (value > from) {
                count[bin(value, most)]++;
            }
        }
        double[][] members = new double[BINS][];
        for (int b = 0; b < BINS; b++) {
            members[b] = new double[count[b]];
        }
        for (int p = 0; p < a.length; p++) {
            if (a[p] > from) {
                int b = bin(a[p], most);
                members[b][--count[b]] = seen[p];
            }
        }
        double[] middles = new double[BINS];
        double[] medians = new double[BINS];
        double[] weights = new double[BINS];
        int n = 0;
        for (int b = 0; b < BINS; b++) {
            if (members[b].length >= FEWEST) {
                Arrays.sort(members[b]);
                middles[n] = (b + 0.5) * most / BINS;
                medians[n] = members[b][members[b].length / 2];
                weights[n++] = members[b].length;
            }
        }
        double[] fitted = Isotonic.fit(Arrays.copyOf(medians, n), Arrays.copyOf(weights, n));
        if (n == 0 || !(fitted[n - 1] > 0)) {
            return straight();
        }
        double[] opacity = new double[n + 2];
        double[] reach = new double[n + 2];
        for (int k = 0; k < n; k++) {
            opacity[k + 1] = middles[k];
            reach[k + 1] = Math.max(fitted[k] * middles[n - 1] / fitted[n - 1], reach[k] + LEAST_RISE);
        }
        opacity[n + 1] = 1 + LEAST_RISE;
        reach[n + 1] = Math.max(1, reach[n]) + LEAST_RISE;
        return new OpacityCurve(opacity, reach);
    }

    /** G of an opacity of 0 to 1. */
    double reach(double a) {
        return between(opacity, reach, a);
    }

    /** The opacity of 0 to 1 that G takes there. */
    double opacity(double seen) {
        return Math.min(1, between(reach, opacity, seen));
    }

    private static int bin(double a, double most) {
        return Math.min(BINS - 1, (int) (BINS * a / most));
    }

    private static double between(double[] x, double[] y, double at) {
        double inside = Math.min(x[x.length - 1], Math.max(x[0], at));
        int k = 1;
        while (k < x.length - 1 && x[k] < inside) {
            k++;
        }
        return y[k - 1] + (y[k] - y[k - 1]) * (inside - x[k - 1]) / (x[k] - x[k - 1]);
    }
}

package org.wispwright.warp.measure;

import java.util.Arrays;

/**
 * Structural similarity. In a Gaussian window w of 11 x 11 pixels, sigma 1.5, sum 1, with means m, variances v and covariance c
 * (population, not sample): {@code s = (2 m_a m_b + C1)(2 c + C2) / ((m_a^2 + m_b^2 + C1)(v_a + v_b + C2))},
 * {@code C1 = (0.01 range)^2}, {@code C2 = (0.03 range)^2}; the mean of s over all pixels where the window fits, so a rim of 5 pixels
 * counts only as surroundings. 1 for equal planes; below 0 where structure is reversed.
 * <p>Source: Wang, Bovik, Sheikh and Simoncelli (2004), IEEE TIP 13(4), 600-612. Differences from it: no halving of large pictures
 * beforehand. The window is separable and applied so; variances as {@code E[a^2] - E[a]^2}, in double.
 */
public final class StructuralSimilarity {
    /** Pixels from the middle of the window to its end; the shortest side a plane may have is twice that and one. */
    public static final int REACH = 5;
    private static final double SIGMA = 1.5;
    private static final double K1 = 0.01;
    private static final double K2 = 0.03;

    private StructuralSimilarity() {
    }

    /**
     * The mean over the whole plane.
     *
     * @param range largest value minus smallest that the data can take (1 for alpha, 255 for codes), above 0
     * @throws IllegalArgumentException if the rasters differ, a side is under 11 pixels, or the range is out of range
     */
    public static double of(Plane a, Plane b, double range) {
        float[] ones = new float[a.values().length];
        Arrays.fill(ones, 1f);
        return of(a, b, range, ones);
    }

    /**
     * The mean within a region, {@code sum M s / sum M} over pixels where the window fits; 1 if there all weights are 0.
     *
     * @param range   as above
     * @param weights one a pixel, finite, 0 or more
     * @throws IllegalArgumentException as above, or if a weight is out of range
     */
    public static double of(Plane a, Plane b, double range, float[] weights) {
        Plane.requireSame("structural similarity", a, b);
        Plane.requireWeights("structural similarity", a, weights);
        int width = a.width();
        int height = a.height();
        if (Math.min(width, height) < 2 * REACH + 1) {
            throw new IllegalArgumentException("structural similarity: got " + width + "x" + height + " pixels, needs sides of "
                    + (2 * REACH + 1) + " or more");
        }
        if (!(range > 0 && range < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("structural similarity: got range " + range + ", needs a finite number above 0");
        }
        double c1 = K1 * range * K1 * range;
        double c2 = K2 * range * K2 * range;
        double[] window = window();
        double[] lines = new double[5 * width];
        double sum = 0;
        double weight = 0;
        for (int y = REACH; y < height - REACH; y++) {
            downColumns(a, b, y, window, lines);
            for (int x = REACH; x < width - REACH; x++) {
                float m = weights[x + width * y];
                if (m > 0) {
                    sum += m * at(lines, width, x, window, c1, c2);
                    weight += m;
                }
            }
        }
        return weight > 0 ? sum / weight : 1;
    }

    /** The weights of the window along one axis, from its middle outwards; both halves together sum to 1. */
    static double[] window() {
        double[] window = new double[REACH + 1];
        double sum = 0;
        for (int k = 0; k <= REACH; k++) {
            window[k] = Math.exp(-0.5 * k * k / (SIGMA * SIGMA));
            sum += k == 0 ? window[k] : 2 * window[k];
        }
        for (int k = 0; k <= REACH; k++) {
            window[k] /= sum;
        }
        return window;
    }

    /** Window along y about row y, for every column: lines of a, b, a^2, b^2 and a b, one after the other. */
    private static void downColumns(Plane a, Plane b, int y, double[] window, double[] lines) {
        int width = a.width();
        Arrays.fill(lines, 0);
        for (int k = -REACH; k <= REACH; k++) {
            double w = window[Math.abs(k)];
            int row = width * (y + k);
            for (int x = 0; x < width; x++) {
                double va = a.values()[row + x];
                double vb = b.values()[row + x];
                lines[x] += w * va;
                lines[width + x] += w * vb;
                lines[2 * width + x] += w * va * va;
                lines[3 * width + x] += w * vb * vb;
                lines[4 * width + x] += w * va * vb;
            }
        }
    }

    private static double at(double[] lines, int width, int x, double[] window, double c1, double c2) {
        double ma = 0;
        double mb = 0;
        double aa = 0;
        double bb = 0;
        double ab = 0;
        for (int k = -REACH; k <= REACH; k++) {
            double w = window[Math.abs(k)];
            int n = x + k;
            ma += w * lines[n];
            mb += w * lines[width + n];
            aa += w * lines[2 * width + n];
            bb += w * lines[3 * width + n];
            ab += w * lines[4 * width + n];
        }
        double luminance = (2 * ma * mb + c1) / (ma * ma + mb * mb + c1);
        double structure = (2 * (ab - ma * mb) + c2) / (aa - ma * ma + bb - mb * mb + c2);
        return luminance * structure;
    }
}

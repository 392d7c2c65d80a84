package org.wispwright.warp.measure;

import java.util.Arrays;
import java.util.Comparator;

/**
 * Wasserstein distances of distributions on a line, exact for weighted points. With Q the quantile function of each distribution,
 * scaled to weight 1: {@code W_p = (integral over u in 0..1 of |Q_a(u) - Q_b(u)|^p)^(1/p)}; Q is constant between the cumulated
 * weights, so the integral is a finite sum over both sets of steps together.
 * <p>Source: Vallender (1974), Theory of Probability and its Applications 18(4), 784-786, for p = 1; Villani (2003), Topics in Optimal
 * Transportation, 2.2, for any p.
 */
public final class EarthMover {
    private EarthMover() {
    }

    /**
     * W1: mean distance that weight has to move, in the unit of the values.
     *
     * @param a        read: places, one or more, finite
     * @param weightsA read: one a place, finite, 0 or more, not all 0
     * @param b        as a
     * @param weightsB as weightsA; the sums need not agree, both are scaled to 1
     * @throws IllegalArgumentException if a count differs or a number is out of range
     */
    public static double w1(double[] a, double[] weightsA, double[] b, double[] weightsB) {
        return integral(a, weightsA, b, weightsB, false);
    }

    /** W2: root of the mean squared distance; otherwise as {@link #w1(double[], double[], double[], double[])}. */
    public static double w2(double[] a, double[] weightsA, double[] b, double[] weightsB) {
        return Math.sqrt(integral(a, weightsA, b, weightsB, true));
    }

    /** W1 of samples that count alike. */
    public static double w1(double[] a, double[] b) {
        return w1(a, ones(a.length), b, ones(b.length));
    }

    /** W2 of samples that count alike. */
    public static double w2(double[] a, double[] b) {
        return w2(a, ones(a.length), b, ones(b.length));
    }

    /**
     * W1 of two histograms over the same bins, all weight of a bin at its middle.
     *
     * @param a        read: one weight a bin, finite, 0 or more, not all 0
     * @param b        as a, as many
     * @param binWidth above 0; the result has its unit
     * @throws IllegalArgumentException if the counts differ or a number is out of range
     */
    public static double w1OfHistograms(double[] a, double[] b, double binWidth) {
        double[] places = places(a, b, binWidth);
        return w1(places, a, places, b);
    }

    /** W2 of two histograms; otherwise as {@link #w1OfHistograms}. */
    public static double w2OfHistograms(double[] a, double[] b, double binWidth) {
        double[] places = places(a, b, binWidth);
        return w2(places, a, places, b);
    }

    private static double integral(double[] a, double[] weightsA, double[] b, double[] weightsB, boolean squared) {
        double sumA = checkedSum("a", a, weightsA);
        double sumB = checkedSum("b", b, weightsB);
        Integer[] orderA = order(a);
        Integer[] orderB = order(b);
        double integral = 0;
        int i = 0;
        int j = 0;
        double leftA = weightsA[orderA[0]] / sumA;
        double leftB = weightsB[orderB[0]] / sumB;
        while (true) {
            double step = Math.min(leftA, leftB);
            double distance = Math.abs(a[orderA[i]] - b[orderB[j]]);
            integral += step * (squared ? distance * distance : distance);
            leftA -= step;
            leftB -= step;
            // Whichever is used up goes on; at the very end rounding may leave a crumb on the other side, which no longer counts.
            if (leftA <= 0) {
                if (++i == a.length) {
                    return integral;
                }
                leftA = weightsA[orderA[i]] / sumA;
            }
            if (leftB <= 0) {
                if (++j == b.length) {
                    return integral;
                }
                leftB = weightsB[orderB[j]] / sumB;
            }
        }
    }

    private static Integer[] order(double[] values) {
        Integer[] order = new Integer[values.length];
        Arrays.setAll(order, n -> n);
        Arrays.sort(order, Comparator.comparingDouble(n -> values[n]));
        return order;
    }

    private static double checkedSum(String name, double[] values, double[] weights) {
        if (values.length == 0 || weights.length != values.length) {
            throw new IllegalArgumentException("Wasserstein distance: '" + name + "' has " + values.length + " places and "
                    + weights.length + " weights, needs one or more and one weight each");
        }
        double sum = 0;
        for (int n = 0; n < values.length; n++) {
            if (!Double.isFinite(values[n]) || !(weights[n] >= 0 && weights[n] < Double.POSITIVE_INFINITY)) {
                throw new IllegalArgumentException("Wasserstein distance: entry " + n + " of '" + name + "' is at " + values[n]
                        + " with weight " + weights[n] + ", needs a finite place and a finite weight of 0 or more");
            }
            sum += weights[n];
        }
        if (!(sum > 0)) {
            throw new IllegalArgumentException("Wasserstein distance: all weights of '" + name + "' are 0; there is nothing to move");
        }
        return sum;
    }

    private static double[] places(double[] a, double[] b, double binWidth) {
        if (a.length != b.length || !(binWidth > 0 && binWidth < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("Wasserstein distance: got histograms of " + a.length + " and " + b.length
                    + " bins of width " + binWidth + ", needs the same bins and a width above 0");
        }
        double[] places = new double[a.length];
        Arrays.setAll(places, n -> n * binWidth);
        return places;
    }

    private static double[] ones(int count) {
        double[] ones = new double[count];
        Arrays.fill(ones, 1);
        return ones;
    }
}

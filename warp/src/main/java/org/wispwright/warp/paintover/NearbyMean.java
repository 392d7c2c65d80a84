package org.wispwright.warp.paintover;

import org.wispwright.warp.resample.Blur;
import org.wispwright.warp.resample.Resized;

/**
 * Mean of numbers near each place, also where there are none: normalised convolution {@code (K * w v) / (K * w)} with the kernel
 * {@code K = sum_k 100^-k G(2^k sigma)} and the mean over the picture as its last and widest member, so numbers close by decide and
 * far ones only where there are none close by. Worked on at most {@value #ROWS} rows.
 * <p>Source: Knutsson and Westin (1993), CVPR 93, 515-523; the sum of kernels is ours.
 */
final class NearbyMean {
    private static final int ROWS = 96;
    private static final double WIDER = 0.01;

    private NearbyMean() {
    }

    /**
     * A new array: {@code channels} means a pixel.
     *
     * @param weighted read: w v, channels numbers a pixel
     * @param weights  read: w, one a pixel, 0 or more, not all 0
     * @param sigma    narrowest kernel, heights
     */
    static float[] of(float[] weighted, float[] weights, int channels, int width, int height, double sigma) {
        int rows = Math.min(ROWS, height);
        int columns = Math.max(1, (int) Math.round((double) width * rows / height));
        float[] v = Resized.values(weighted, channels, width, height, columns, rows);
        float[] w = Resized.values(weights, 1, width, height, columns, rows);
        double[] top = new double[v.length];
        double[] bottom = new double[w.length];
        double factor = 1;
        double widest = Math.max(columns, rows) / 2.0;
        for (double s = Math.max(0.75, sigma * rows); s < widest; s *= 2) {
            add(top, factor, Blur.gaussian(v, channels, columns, rows, s));
            add(bottom, factor, Blur.gaussian(w, 1, columns, rows, s));
            factor *= WIDER;
        }
        double[] mean = new double[channels];
        double meanWeight = 0;
        for (int p = 0; p < w.length; p++) {
            meanWeight += w[p] / (double) w.length;
            for (int c = 0; c < channels; c++) {
                mean[c] += v[channels * p + c] / (double) w.length;
            }
        }
        for (int p = 0; p < w.length; p++) {
            for (int c = 0; c < channels; c++) {
                v[channels * p + c] = (float) ((top[channels * p + c] + factor * mean[c]) / (bottom[p] + factor * meanWeight));
            }
        }
        return Resized.values(v, channels, columns, rows, width, height);
    }

    private static void add(double[] sums, double factor, float[] values) {
        for (int n = 0; n < sums.length; n++) {
            sums[n] += factor * values[n];
        }
    }
}

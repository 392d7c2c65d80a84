package org.wispwright.warp.paintover;

/**
 * The non-decreasing sequence nearest to a given one in weighted least squares, by pooling adjacent violators: as long as a block's
 * mean is below that of the block before it, the two become one.
 * <p>Source: Barlow, Bartholomew, Bremner and Brunk (1972), Statistical Inference under Order Restrictions, ch. 1.
 */
final class Isotonic {
    private Isotonic() {
    }

    /**
     * A new array.
     *
     * @param values  read
     * @param weights read: above 0, as many
     */
    static double[] fit(double[] values, double[] weights) {
        int n = values.length;
        double[] mean = new double[n];
        double[] weight = new double[n];
        int[] size = new int[n];
        int blocks = 0;
        for (int i = 0; i < n; i++) {
            mean[blocks] = values[i];
            weight[blocks] = weights[i];
            size[blocks++] = 1;
            while (blocks > 1 && mean[blocks - 2] > mean[blocks - 1]) {
                double both = weight[blocks - 2] + weight[blocks - 1];
                mean[blocks - 2] = (weight[blocks - 2] * mean[blocks - 2] + weight[blocks - 1] * mean[blocks - 1]) / both;
                weight[blocks - 2] = both;
                size[blocks - 2] += size[blocks - 1];
                blocks--;
            }
        }
        double[] out = new double[n];
        for (int b = 0, i = 0; b < blocks; b++) {
            for (int k = 0; k < size[b]; k++) {
                out[i++] = mean[b];
            }
        }
        return out;
    }
}

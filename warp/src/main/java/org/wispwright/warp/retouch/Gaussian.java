package org.wispwright.warp.retouch;

/**
 * Separable Gaussian blur of numbers on a raster: weights {@code exp(-k^2 / (2 sigma^2))}, |k| up to 3 sigma, scaled to sum 1.
 * Beyond the border stands the border pixel.
 */
final class Gaussian {
    private Gaussian() {
    }

    /** A new array: the blurred values, {@code channels} numbers a pixel. sigma in pixels, 0 or more. */
    static float[] blurred(float[] in, int channels, int width, int height, double sigma) {
        double[] weights = weights(sigma);
        float[] across = new float[in.length];
        int row = width * channels;
        double[] line = new double[row + 2 * channels * (weights.length - 1)];
        double[] sums = new double[row];
        for (int y = 0; y < height; y++) {
            alongRow(in, across, y * row, channels, width, weights, line, sums);
        }
        float[] out = new float[in.length];
        for (int y = 0; y < height; y++) {
            acrossRows(across, out, y, row, height, weights, sums);
        }
        return out;
    }

    private static double[] weights(double sigma) {
        int reach = (int) Math.ceil(3 * sigma);
        double[] weights = new double[reach + 1];
        double sum = 0;
        for (int k = 0; k <= reach; k++) {
            weights[k] = k == 0 ? 1 : Math.exp(-0.5 * k * k / (sigma * sigma));
            sum += k == 0 ? weights[k] : 2 * weights[k];
        }
        for (int k = 0; k <= reach; k++) {
            weights[k] /= sum;
        }
        return weights;
    }

    /** One row, {@code at} its first float: laid into {@code line} with the border pixels repeated, then summed tap by tap. */
    private static void alongRow(float[] in, float[] out, int at, int channels, int width, double[] weights, double[] line, double[] sums) {
        int reach = weights.length - 1;
        for (int i = -reach; i < width + reach; i++) {
            int from = at + channels * Math.min(width - 1, Math.max(0, i));
            for (int c = 0; c < channels; c++) {
                line[(i + reach) * channels + c] = in[from + c];
            }
        }
        int middle = reach * channels;
        for (int n = 0; n < sums.length; n++) {
            sums[n] = weights[0] * line[middle + n];
        }
        for (int k = 1; k <= reach; k++) {
            double w = weights[k];
            int left = middle - k * channels;
            int right = middle + k * channels;
            for (int n = 0; n < sums.length; n++) {
                sums[n] += w * (line[left + n] + line[right + n]);
            }
        }
        for (int n = 0; n < sums.length; n++) {
            out[at + n] = (float) sums[n];
        }
    }

    /** Row y of the result from the rows above and below it. */
    private static void acrossRows(float[] in, float[] out, int y, int row, int height, double[] weights, double[] sums) {
        for (int n = 0; n < row; n++) {
            sums[n] = weights[0] * in[y * row + n];
        }
        for (int k = 1; k < weights.length; k++) {
            double w = weights[k];
            int above = row * Math.max(0, y - k);
            int below = row * Math.min(height - 1, y + k);
            for (int n = 0; n < row; n++) {
                sums[n] += w * ((double) in[above + n] + in[below + n]);
            }
        }
        for (int n = 0; n < row; n++) {
            out[y * row + n] = (float) sums[n];
        }
    }
}

package org.wispwright.warp.resample;

/**
 * Separable Gaussian blur of numbers on a raster: weights {@code exp(-k^2 / (2 sigma^2))}, |k| up to 3 sigma, scaled to sum 1.
 * Beyond the border stands the border pixel.
 */
public final class Blur {
    private Blur() {
    }

    /**
     * Blurs every channel for itself.
     *
     * @param in       read: {@code channels} numbers a pixel
     * @param sigma    in pixels, 0 or more; time grows with it
     * @return a new array of as many numbers
     */
    public static float[] gaussian(float[] in, int channels, int width, int height, double sigma) {
        double[] weights = weights(sigma);
        int reach = weights.length - 1;
        int row = width * channels;
        float[] across = new float[row * height];
        double[] line = new double[row + 2 * channels * reach];
        double[] sums = new double[row];
        for (int y = 0; y < height; y++) {
            layOut(in, y * row, channels, width, -reach, line);
            alongRow(across, y * row, channels, weights, line, sums);
        }
        float[] out = new float[row * height];
        for (int y = 0; y < height; y++) {
            acrossRows(across, y, height, out, y * row, weights, sums);
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

    /** Pixels from {@code first} on of the row that begins at {@code rowAt}, border pixels repeated beyond the border. */
    private static void layOut(float[] in, int rowAt, int channels, int width, int first, double[] line) {
        for (int n = 0, i = first; n < line.length; i++) {
            int from = rowAt + channels * Math.min(width - 1, Math.max(0, i));
            for (int c = 0; c < channels; c++) {
                line[n++] = in[from + c];
            }
        }
    }

    /** One row, {@code at} its first float in out: {@code line} summed tap by tap. */
    private static void alongRow(float[] out, int at, int channels, double[] weights, double[] line, double[] sums) {
        int reach = weights.length - 1;
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

    /** The row at {@code outAt} from row y of {@code in}, which has {@code rows}, and those above and below it. */
    private static void acrossRows(float[] in, int y, int rows, float[] out, int outAt, double[] weights, double[] sums) {
        int row = sums.length;
        for (int n = 0; n < row; n++) {
            sums[n] = weights[0] * in[y * row + n];
        }
        for (int k = 1; k < weights.length; k++) {
            double w = weights[k];
            int above = row * Math.max(0, y - k);
            int below = row * Math.min(rows - 1, y + k);
            for (int n = 0; n < row; n++) {
                sums[n] += w * ((double) in[above + n] + in[below + n]);
            }
        }
        for (int n = 0; n < row; n++) {
            out[outAt + n] = (float) sums[n];
        }
    }
}

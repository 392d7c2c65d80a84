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
        pass(in, across, channels, height, width * channels, width, channels, weights);
        float[] out = new float[in.length];
        pass(across, out, channels, width, channels, height, width * channels, weights);
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

    /** Blurs {@code lines} lines, {@code lineStep} floats apart, of n entries that are {@code step} floats apart. */
    private static void pass(float[] in, float[] out, int channels, int lines, int lineStep, int n, int step, double[] weights) {
        for (int line = 0; line < lines; line++) {
            for (int i = 0; i < n; i++) {
                for (int c = 0; c < channels; c++) {
                    int at = line * lineStep + c;
                    double sum = weights[0] * in[at + i * step];
                    for (int k = 1; k < weights.length; k++) {
                        sum += weights[k] * ((double) in[at + Math.max(0, i - k) * step] + in[at + Math.min(n - 1, i + k) * step]);
                    }
                    out[at + i * step] = (float) sum;
                }
            }
        }
    }
}

package org.wispwright.warp.resample;

import java.util.Arrays;
import org.wispwright.render.picture.Picture;

/**
 * A whole picture, or any numbers on a raster, brought to another raster; the edges of the frame stay its edges. Along an axis
 * that gets fewer pixels each new one is the mean over the part of the old ones that it covers, so nothing is stepped over; along
 * one that gets more it is read bicubically ({@link Kernel#KEYS}), the border pixel standing beyond the border. Linear in the
 * values. The same raster gives the same bits.
 * <p>Source of the interpolation: Keys (1981), IEEE ASSP 29(6), 1153-1160, a = -1/2; of the mean: the integral over a pixel.
 */
public final class Resized {
    private Resized() {
    }

    /**
     * A new array: the values on another raster, {@code channels} numbers a pixel. Values may overshoot a little where it grows.
     *
     * @param in read: channels x width x height
     * @throws IllegalArgumentException if a size is below 1 or the count is not channels x width x height
     */
    public static float[] values(float[] in, int channels, int width, int height, int newWidth, int newHeight) {
        if (channels < 1 || width < 1 || height < 1 || newWidth < 1 || newHeight < 1 || in.length != (long) channels * width * height) {
            throw new IllegalArgumentException("resized: got " + in.length + " values for " + channels + " channels of " + width + "x"
                    + height
                    + " pixels to bring to " + newWidth + "x" + newHeight
                    + ", needs sizes of at least 1 and one value a channel and pixel");
        }
        float[] across = newWidth == width ? in : new float[channels * newWidth * height];
        if (newWidth != width) {
            axis(in, channels * width, channels, width, across, channels * newWidth, channels, newWidth, height, channels);
        }
        if (newHeight == height) {
            return across == in ? in.clone() : across;
        }
        float[] out = new float[channels * newWidth * newHeight];
        axis(across, channels, channels * newWidth, height, out, channels, channels * newWidth, newHeight, newWidth, channels);
        return out;
    }

    /** A new picture on another raster, overshoot taken away ({@link Resampling#clamp}) where it grows. */
    public static Picture picture(Picture in, int newWidth, int newHeight) {
        float[] rgba = values(in.rgba(), 4, in.width(), in.height(), newWidth, newHeight);
        if (newWidth > in.width() || newHeight > in.height()) {
            for (int n = 0; n < rgba.length; n += 4) {
                Resampling.clamp(rgba, n);
            }
        }
        return new Picture(newWidth, newHeight, rgba);
    }

    /** Along one axis: {@code lines} lines that begin {@code inLine} apart, {@code n} samples {@code inStep} apart, to m samples. */
    private static void axis(float[] in, int inLine, int inStep, int n, float[] out, int outLine, int outStep, int m, int lines,
            int channels) {
        double[] weights = new double[(int) Math.ceil((double) n / m) + 4];
        for (int i = 0; i < m; i++) {
            int first = weights(i, n, m, weights);
            for (int line = 0; line < lines; line++) {
                for (int c = 0; c < channels; c++) {
                    double sum = 0;
                    for (int k = 0; k < weights.length; k++) {
                        if (weights[k] != 0) {
                            int from = Math.min(n - 1, Math.max(0, first + k));
                            sum += weights[k] * in[line * inLine + from * inStep + c];
                        }
                    }
                    out[line * outLine + i * outStep + c] = (float) sum;
                }
            }
        }
    }

    /** Overwrites the weights of new sample i and gives the old sample that the first of them is for. */
    private static int weights(int i, int n, int m, double[] weights) {
        Arrays.fill(weights, 0);
        double ratio = (double) n / m;
        if (m < n) {
            double from = i * ratio;
            double to = Math.min(n, (i + 1) * ratio);
            int first = (int) from;
            for (int k = first; k < n && k < to; k++) {
                weights[k - first] = (Math.min(to, k + 1) - Math.max(from, k)) / (to - from);
            }
            return first;
        }
        double place = (i + 0.5) * ratio - 0.5;
        int before = (int) Math.floor(place);
        Kernel.KEYS.weights(place - before, weights);
        return before - 1;
    }
}

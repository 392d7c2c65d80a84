package org.wispwright.warp.matte;

import java.util.Arrays;
import java.util.Optional;
import java.util.function.UnaryOperator;
import org.wispwright.render.picture.Luminance;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Srgb;

/**
 * A matte that was painted or drawn elsewhere, as pixels; it spans the whole frame, whatever the raster. Along each axis a raster with
 * fewer pixels gets the mean over each of its pixels (area by area), one with as many the pixels themselves, one with more is linear
 * between the middles of the pixels, the border pixel repeated beyond.
 *
 * @param width   pixels along a row, 1 or more
 * @param height  rows, 1 or more
 * @param pixels  kept, not copied: 0 to 1, {@code pixels[x + width * y]}, row 0 at the top
 * @param feather width of the soft edge, laid on afterwards, fraction of the height, 0 or more
 * @param source  where the pixels are from, if they are from a file
 */
public record ImageMatte(int width, int height, float[] pixels, double feather, Optional<Source> source) implements Matte {
    /** Which numbers of a picture are the matte. */
    public enum Channel {
        /** How bright it looks over black: luminance, coded by the curve of sRGB, so that code 128 of 255 counts 128/255. */ GREY,
        /** Its opacity. */ ALPHA
    }

    /**
     * A picture file.
     *
     * @param file    its path inside the shot folder
     * @param channel the numbers that were taken
     */
    public record Source(String file, Channel channel) { }

    /** A matte of pixels that are from no file. @throws IllegalArgumentException as below */
    public ImageMatte(int width, int height, float[] pixels, double feather) {
        this(width, height, pixels, feather, Optional.empty());
    }

    /**
     * Checks the shape and every number.
     *
     * @throws IllegalArgumentException if a side is below 1, the count differs, or a number is not 0 to 1
     */
    public ImageMatte {
        Needs.feather("image matte", feather);
        if (width < 1 || height < 1 || pixels.length != Math.multiplyExact(width, height)) {
            throw new IllegalArgumentException("image matte: got " + width + "x" + height + " pixels and " + pixels.length
                    + " numbers, needs sides of 1 or more and one number a pixel");
        }
        for (int p = 0; p < pixels.length; p++) {
            if (!(pixels[p] >= 0 && pixels[p] <= 1)) {
                throw new IllegalArgumentException("image matte: pixel (" + p % width + ", " + p / width + ") is " + pixels[p]
                        + ", needs 0 to 1");
            }
        }
    }

    /**
     * One channel of a picture as pixels of a matte.
     *
     * @param picture read
     * @return a new array of picture.width() x picture.height() numbers, 0 to 1
     */
    public static float[] pixels(Picture picture, Channel channel) {
        float[] rgba = picture.rgba();
        float[] pixels = new float[picture.width() * picture.height()];
        for (int p = 0, n = 0; p < pixels.length; p++, n += 4) {
            double value = channel == Channel.ALPHA ? rgba[n + 3] : Srgb.encode(Luminance.of(rgba[n], rgba[n + 1], rgba[n + 2]));
            pixels[p] = (float) Math.min(1, Math.max(0, value));
        }
        return pixels;
    }

    /** Pixels have no position that could be taken along. @throws IllegalArgumentException always */
    @Override
    public ImageMatte moved(UnaryOperator<Point> map) {
        throw new IllegalArgumentException("image matte" + source.map(s -> " '" + s.file() + "'").orElse("")
                + ": its pixels cannot be carried along; draw it as a region or with a brush");
    }

    @Override
    public float[] values(Picture original, Window window) {
        return Feather.applied(feather, original, window, w -> resampled(original.width(), original.height(), w));
    }

    private float[] resampled(int rasterWidth, int rasterHeight, Window window) {
        Taps across = new Taps(width, rasterWidth, window.left(), window.width());
        Taps down = new Taps(height, rasterHeight, window.top(), window.height());
        int top = down.first[0];
        int rows = down.first[window.height() - 1] + down.count - top;
        float[] lines = new float[rows * window.width()];
        for (int y = 0, n = 0; y < rows; y++) {
            int row = width * Math.min(height - 1, Math.max(0, top + y));
            for (int x = 0; x < window.width(); x++, n++) {
                double sum = 0;
                for (int k = 0; k < across.count; k++) {
                    double w = across.weights[across.count * x + k];
                    sum += w == 0 ? 0 : w * pixels[row + Math.min(width - 1, Math.max(0, across.first[x] + k))];
                }
                lines[n] = (float) sum;
            }
        }
        float[] out = new float[window.pixels()];
        double[] sums = new double[window.width()];
        for (int y = 0; y < window.height(); y++) {
            Arrays.fill(sums, 0);
            for (int k = 0; k < down.count; k++) {
                double w = down.weights[down.count * y + k];
                int row = window.width() * (down.first[y] + k - top);
                for (int x = 0; w != 0 && x < sums.length; x++) {
                    sums[x] += w * lines[row + x];
                }
            }
            for (int x = 0; x < sums.length; x++) {
                out[window.width() * y + x] = (float) sums[x];
            }
        }
        return out;
    }

    /** Which pixels along one axis make each pixel of a raster, and their shares, which sum to 1; pixels beyond the border are meant. */
    private static final class Taps {
        private final int count;
        private final int[] first;
        private final double[] weights;

        /** Of n pixels for those from {@code from} on, {@code wanted} of them, of a raster of {@code size}. */
        Taps(int n, int size, int from, int wanted) {
            double step = (double) n / size;
            boolean fewer = size < n;
            count = fewer ? (int) Math.ceil(step) + 1 : 2;
            first = new int[wanted];
            weights = new double[count * wanted];
            for (int i = 0; i < wanted; i++) {
                if (fewer) {
                    double low = (from + i) * step;
                    double high = (from + i + 1) * step;
                    first[i] = (int) Math.floor(low);
                    for (int k = 0; k < count; k++) {
                        double part = Math.min(high, first[i] + k + 1.0) - Math.max(low, first[i] + k);
                        weights[count * i + k] = Math.max(0, part) / step;
                    }
                } else {
                    double middle = (from + i + 0.5) * step - 0.5;
                    first[i] = (int) Math.floor(middle);
                    weights[count * i + 1] = middle - first[i];
                    weights[count * i] = 1 - weights[count * i + 1];
                }
            }
        }
    }
}

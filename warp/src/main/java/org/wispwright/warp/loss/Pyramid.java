package org.wispwright.warp.loss;

import java.util.Arrays;

/**
 * The shape of a Gaussian pyramid and its one step down and back up the gradient.
 * <p>Forward, one axis: {@code out[i] = sum_{k=-2..2} g_k in[2i + k]}, g = (1, 4, 6, 4, 1)/16, i below (n + 1)/2, so odd sizes work;
 * beyond a border the picture is mirrored about its border pixel: -1 is read at 1, n at n - 2. Both axes, x first.
 * <p>Pullback, the exact transpose: {@code inBar[mirror(2i + k)] += g_k outBar[i]}.
 * <p>Source: Burt and Adelson (1983), IEEE Trans. Communications 31(4), 532-540, a = 3/8. Difference: they leave borders to the
 * caller; mirroring keeps a constant constant. Checked by {@code PyramidTest}.
 */
public final class Pyramid {
    /** Levels end before the shorter side would fall under this many pixels. */
    public static final int SHORTEST_SIDE = 8;

    private final int[] widths;
    private final int[] heights;

    /**
     * The levels of a raster: each has half the pixels a side, rounded up, as long as the shorter side keeps {@value #SHORTEST_SIDE}.
     *
     * @throws IllegalArgumentException if a side is below 1
     */
    public Pyramid(int width, int height) {
        if (width < 1 || height < 1) {
            throw new IllegalArgumentException("pyramid: got " + width + "x" + height + " pixels, needs sides of 1 or more");
        }
        int count = 1;
        for (int side = (Math.min(width, height) + 1) / 2; side >= SHORTEST_SIDE; side = (side + 1) / 2) {
            count++;
        }
        widths = new int[count];
        heights = new int[count];
        widths[0] = width;
        heights[0] = height;
        for (int l = 1; l < count; l++) {
            widths[l] = (widths[l - 1] + 1) / 2;
            heights[l] = (heights[l - 1] + 1) / 2;
        }
    }

    /** Number of levels, level 0 included. */
    public int levels() {
        return widths.length;
    }

    /** Pixels along a row of a level. */
    public int width(int level) {
        return widths[level];
    }

    /** Rows of a level. */
    public int height(int level) {
        return heights[level];
    }

    /** Pixels of a level. */
    public int pixels(int level) {
        return widths[level] * heights[level];
    }

    /** Floats that {@link #down} and {@link #downPullback} need as scratch space, for any level. */
    public int scratchFloats(int channels) {
        return channels * ((widths[0] + 1) / 2) * heights[0];
    }

    /**
     * One level down.
     *
     * @param level    the level of {@code in}; not the last
     * @param channels numbers a pixel, 4 or 1, next to each other
     * @param in       read: channels x pixels(level)
     * @param out      overwritten: channels x pixels(level + 1)
     * @param scratch  overwritten: {@link #scratchFloats}
     */
    public void down(int level, int channels, float[] in, float[] out, float[] scratch) {
        int w = widths[level];
        int h = heights[level];
        int half = widths[level + 1];
        for (int y = 0; y < h; y++) {
            PyramidKernel.reduce(in, y * w * channels, channels, w, scratch, y * half * channels, channels, half, channels);
        }
        int row = half * channels;
        PyramidKernel.reduce(scratch, 0, row, h, out, 0, row, heights[level + 1], row);
    }

    /** The transpose of {@link #down}: adds into {@code inBar}; {@code scratch} is overwritten. */
    public void downPullback(int level, int channels, float[] outBar, float[] inBar, float[] scratch) {
        int w = widths[level];
        int h = heights[level];
        int half = widths[level + 1];
        int row = half * channels;
        Arrays.fill(scratch, 0, row * h, 0f);
        PyramidKernel.reducePullback(outBar, 0, row, heights[level + 1], scratch, 0, row, h, row);
        for (int y = 0; y < h; y++) {
            PyramidKernel.reducePullback(scratch, y * half * channels, channels, half, inBar, y * w * channels, channels, w, channels);
        }
    }
}

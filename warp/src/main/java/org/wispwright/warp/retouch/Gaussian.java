package org.wispwright.warp.retouch;

import java.util.Arrays;
import org.wispwright.render.picture.Picture;

/**
 * Gaussian blur of a picture, or of its opacity alone, in tiles of {@value #TILE} pixels a side, each made where it is asked for. Beyond
 * the border stands the border pixel.
 * <p>A Gaussian of sigma pixels is made on the picture's {@link Blocks} of k pixels, k the largest power of two with sigma / k at least
 * {@value #LEAST} (up to 64; 1: the pixels themselves), and read between them with cubic B-splines. Making blocks, the Gaussian and
 * the spline each blur; variances add, so the Gaussian on the blocks, in blocks, has
 * {@code s^2 = sigma^2 / k^2 - 1/3 - (1 - 1/k^2) / 4}. What is left of the difference is in the fourth moment,
 * {@code -(7/120) (k / sigma)^4} of excess: the step response is within 0.0005 of the true one. Weights
 * {@code exp(-n^2 / (2 s^2))}, |n| up to {@value #CUT} s, sum 1.
 * <p>k follows the brush, so the same brush at rasters of 256, 512 and 2048 rows blurs the same blocks. The bits of a pixel do not depend
 * on which tiles were asked for before.
 * <p>Sources: Burt (1981), Computer Graphics and Image Processing 16, 20-51 (blurring at reduced resolution); Unser, Aldroubi and Eden
 * (1993), IEEE Trans. Signal Processing 41(2), 821-833 (B-splines; the variance of the cubic one is 1/3). The bookkeeping is ours.
 */
final class Gaussian {
    /** Pixels a side of a tile. */
    static final int TILE = Blocks.WIDEST;
    private static final double LEAST = 2;
    private static final double CUT = 4;
    private static final int CHUNK = 16;

    private final Blocks blocks;
    private final float[] rgba;
    private final int width;
    private final int height;
    private final int channels;
    private final int level;
    private final float[] weights;
    private final float[] splines;
    private final float[][] chunks;
    private final int chunksAcross;

    /**
     * Reads the picture and its blocks whenever a tile is asked for, so they must not change in between.
     *
     * @param channels 4: all of RGBA; 1: alpha
     * @param sigma    in pixels, 0 or more
     */
    Gaussian(Blocks blocks, float[] rgba, int width, int height, int channels, double sigma) {
        this.blocks = blocks;
        this.rgba = rgba;
        this.width = width;
        this.height = height;
        this.channels = channels;
        level = level(sigma, LEAST);
        int k = 1 << level;
        weights = weights(level == 0 ? sigma : Math.sqrt(sigma * sigma / (k * (double) k) - 1 / 3.0 - (1 - 1.0 / k / k) / 4));
        splines = splines(level);
        chunksAcross = (blocks.columns(level) + 4 + CHUNK - 1) / CHUNK;
        chunks = new float[chunksAcross * ((blocks.rows(level) + 4 + CHUNK - 1) / CHUNK)][];
    }

    /** A whole plane of width x height numbers blurred: a new array. It reads them as the opacity of a picture of their own. */
    static float[] blurred(float[] plane, int width, int height, double sigma) {
        Picture picture = new Picture(width, height);
        for (int n = 0; n < plane.length; n++) {
            picture.rgba()[4 * n + 3] = plane[n];
        }
        return blurred(picture, 1, sigma);
    }

    /** A whole picture blurred, all of RGBA or its alpha alone: a new array, {@code channels} numbers a pixel. */
    static float[] blurred(Picture picture, int channels, double sigma) {
        int width = picture.width();
        int height = picture.height();
        Gaussian gaussian = new Gaussian(new Blocks(picture), picture.rgba(), width, height, channels, sigma);
        float[] out = new float[channels * width * height];
        float[] tile = new float[channels * TILE * TILE];
        for (int ty = 0; ty * TILE < height; ty++) {
            for (int tx = 0; tx * TILE < width; tx++) {
                gaussian.tile(tx, ty, tile);
                int row = channels * Math.min(TILE, width - tx * TILE);
                for (int y = ty * TILE; y < Math.min(height, (ty + 1) * TILE); y++) {
                    System.arraycopy(tile, channels * TILE * (y - ty * TILE), out, channels * (tx * TILE + width * y), row);
                }
            }
        }
        return out;
    }

    /** The level whose blocks a Gaussian of sigma pixels is made on: the highest with sigma at least {@code least} blocks. */
    static int level(double sigma, double least) {
        int level = 0;
        while (level < Blocks.TOP && sigma / (2 << level) >= least) {
            level++;
        }
        return level;
    }

    /** Weights for 0, 1, 2, ... steps of a Gaussian of s steps; they sum to 1 over both sides. */
    static float[] weights(double s) {
        int reach = (int) Math.ceil(CUT * s);
        double[] weights = new double[reach + 1];
        double sum = 0;
        for (int n = 0; n <= reach; n++) {
            weights[n] = n == 0 ? 1 : Math.exp(-0.5 * n * n / (s * s));
            sum += n == 0 ? weights[n] : 2 * weights[n];
        }
        float[] out = new float[reach + 1];
        for (int n = 0; n <= reach; n++) {
            out[n] = (float) (weights[n] / sum);
        }
        return out;
    }

    /** Cubic B-spline weights of four blocks for each of the 2^level pixels of a block: of block -2..1 or -1..2, see {@link #first}. */
    static float[] splines(int level) {
        int k = 1 << level;
        float[] splines = new float[4 * k];
        for (int n = 0; n < k; n++) {
            double t = (n + 0.5) / k - 0.5;
            t -= Math.floor(t);
            splines[4 * n] = (float) ((1 - t) * (1 - t) * (1 - t) / 6);
            splines[4 * n + 1] = (float) ((3 * t * t * t - 6 * t * t + 4) / 6);
            splines[4 * n + 2] = (float) ((-3 * t * t * t + 3 * t * t + 3 * t + 1) / 6);
            splines[4 * n + 3] = (float) (t * t * t / 6);
        }
        return splines;
    }

    /** The first of the four blocks that pixel x is read from. */
    static int first(int x, int level) {
        return (x >> level) - (2 * (x & (1 << level) - 1) + 1 < 1 << level ? 2 : 1);
    }

    /**
     * Blurred values of a tile.
     *
     * @param out overwritten: channels x {@value #TILE} x {@value #TILE}, tile (tx,ty) from its top left pixel; pixels beyond the picture
     *            mean nothing
     */
    void tile(int tx, int ty, float[] out) {
        int wide = Math.min(TILE, width - tx * TILE);
        int high = Math.min(TILE, height - ty * TILE);
        if (level == 0) {
            direct(tx * TILE, ty * TILE, wide, high, out);
            return;
        }
        int i0 = first(tx * TILE, level);
        int j0 = first(ty * TILE, level);
        int across = first(tx * TILE + wide - 1, level) + 4 - i0;
        int down = first(ty * TILE + high - 1, level) + 4 - j0;
        float[] coarse = new float[channels * across * down];
        for (int j = 0; j < down; j++) {
            for (int i = 0; i < across; i++) {
                block(i0 + i, j0 + j, coarse, channels * (i + across * j));
            }
        }
        spread(coarse, across, down, channels, level, splines, i0, j0, tx * TILE, ty * TILE, wide, high, out, channels * TILE);
    }

    /** Reads wide x high pixels from (x,y) on between blocks i0.., j0.. (across x down of them) into rows of {@code stride} floats. */
    static void spread(float[] coarse, int across, int down, int channels, int level, float[] splines, int i0, int j0, int x, int y,
            int wide, int high, float[] out, int stride) {
        int mask = (1 << level) - 1;
        int row = channels * wide;
        float[][] lines = new float[down][];
        for (int j = first(y, level) - j0; j < first(y + high - 1, level) - j0 + 4; j++) {
            lines[j] = new float[row];
            for (int i = 0; i < wide; i++) {
                int w = 4 * (x + i & mask);
                mixOne(coarse, channels * (first(x + i, level) - i0 + across * j), channels, splines[w], splines[w + 1], splines[w + 2],
                        splines[w + 3], lines[j], channels * i);
            }
        }
        float[] mixed = new float[row];
        for (int j = 0; j < high; j++) {
            int w = 4 * (y + j & mask);
            int n = first(y + j, level) - j0;
            mixRows(lines[n], lines[n + 1], lines[n + 2], lines[n + 3], splines[w], splines[w + 1], splines[w + 2], splines[w + 3], mixed);
            System.arraycopy(mixed, 0, out, stride * j, row);
        }
    }

    // The loops stand in methods of their own, however few their lines: the compiler then makes each of them quick on its own, whichever
    // brush came first. Where all arrays have one index it does several numbers at a time, so rows are copied to where that is so.
    private static void mixOne(float[] in, int from, int channels, float a, float b, float c, float d, float[] out, int at) {
        for (int n = 0; n < channels; n++) {
            int i = from + n;
            out[at + n] = a * in[i] + b * in[i + channels] + c * in[i + 2 * channels] + d * in[i + 3 * channels];
        }
    }

    private static void mixRows(float[] first, float[] second, float[] third, float[] fourth, float a, float b, float c, float d,
            float[] out) {
        for (int n = 0; n < out.length; n++) {
            out[n] = a * first[n] + b * second[n] + c * third[n] + d * fourth[n];
        }
    }

    /** The blurred block (i,j), -2 to columns + 1, from its chunk. */
    private void block(int i, int j, float[] out, int at) {
        int n = (i + 2) / CHUNK + chunksAcross * ((j + 2) / CHUNK);
        if (chunks[n] == null) {
            chunks[n] = chunk((i + 2) / CHUNK * CHUNK - 2, (j + 2) / CHUNK * CHUNK - 2);
        }
        int from = channels * ((i + 2) % CHUNK + CHUNK * ((j + 2) % CHUNK));
        for (int c = 0; c < channels; c++) {
            out[at + c] = chunks[n][from + c];
        }
    }

    private float[] chunk(int i0, int j0) {
        int reach = weights.length - 1;
        blocks.make(level, i0 - reach, j0 - reach, i0 + CHUNK - 1 + reach, j0 + CHUNK - 1 + reach);
        float[] out = new float[channels * CHUNK * CHUNK];
        convolve(new Lines(blocks.level(level), 0, blocks.columns(level) + 4, blocks.rows(level) + 4), i0 + 2, j0 + 2,
                CHUNK, CHUNK, channels, weights, out, channels * CHUNK);
        return out;
    }

    private void direct(int x0, int y0, int wide, int high, float[] out) {
        convolve(new Lines(rgba, 0, width, height), x0, y0, wide, high, channels, weights, out, channels * TILE);
    }

    /** RGBA of a raster, and how large it is. */
    record Lines(float[] rgba, int start, int columns, int rows) {
    }

    /** wide x high blurred values from (i0,j0) on, border values repeated beyond the border; {@code stride} floats a row of out. */
    static void convolve(Lines in, int i0, int j0, int wide, int high, int channels, float[] weights, float[] out, int stride) {
        int reach = weights.length - 1;
        int row = channels * wide;
        int top = Math.max(0, Math.min(in.rows() - 1, j0 - reach));
        int bottom = Math.max(0, Math.min(in.rows() - 1, j0 + high - 1 + reach));
        float[][] lines = new float[bottom - top + 1][row];
        float[] line = new float[row + 2 * channels * reach];
        float[] shifted = new float[row];
        for (int j = top; j <= bottom; j++) {
            for (int i = i0 - reach, n = 0; n < line.length; i++) {
                int from = in.start() + 4 * (Math.min(in.columns() - 1, Math.max(0, i)) + in.columns() * j) + 4 - channels;
                for (int c = 0; c < channels; c++) {
                    line[n++] = in.rgba()[from + c];
                }
            }
            for (int n = -reach; n <= reach; n++) {
                System.arraycopy(line, channels * (reach + n), shifted, 0, row);
                add(lines[j - top], weights[Math.abs(n)], shifted);
            }
        }
        float[] sums = new float[row];
        for (int j = 0; j < high; j++) {
            Arrays.fill(sums, 0f);
            for (int n = -reach; n <= reach; n++) {
                add(sums, weights[Math.abs(n)], lines[Math.min(bottom, Math.max(top, j0 + j + n)) - top]);
            }
            System.arraycopy(sums, 0, out, stride * j, row);
        }
    }

    private static void add(float[] sums, float weight, float[] in) {
        for (int n = 0; n < sums.length; n++) {
            sums[n] += weight * in[n];
        }
    }
}

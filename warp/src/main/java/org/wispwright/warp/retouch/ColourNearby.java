package org.wispwright.warp.retouch;

import org.wispwright.render.picture.Picture;

/**
 * The un-premultiplied colour of the smoke near each place, also where there is none: normalised convolution,
 * {@code c = (K * rgb) / (K * a)} for premultiplied rgb, with the kernel {@code K = sum_k 100^-k G(2^k sigma)} and the mean over the
 * picture as its last and widest member. So smoke close by decides, and far smoke only where there is none close by. White if the
 * picture has no smoke.
 * <p>Works on the picture's {@link Blocks}: of at most {@value #ROWS} rows, and coarser yet for a wide brush, whose colour is as smooth;
 * each wider Gaussian on blocks as wide as it allows. That is enough for a colour and independent of the raster. Between blocks, cubic
 * B-splines.
 * <p>Source: Knutsson and Westin (1993), CVPR 93, 515-523.
 */
final class ColourNearby {
    private static final int ROWS = 96;
    private static final double WIDER = 0.01;
    /** Narrowest Gaussian on blocks, in blocks. */
    private static final double LEAST = 1.5;
    private static final double NARROWEST = 0.75;

    private final Blocks blocks;
    private final int width;
    private final int height;
    private final int level;
    private final int across;
    private final int down;
    private final float[] splines;
    /** Colours of blocks -2..columns+1, -2..rows+1. */
    private final float[] colour;

    /** Prepares the colours of a picture, whose blocks these are, for new smoke whose size is about {@code sigma}, in pixels. */
    ColourNearby(Blocks blocks, Picture picture, double sigma) {
        this.blocks = blocks;
        width = picture.width();
        height = picture.height();
        int coarse = 1;
        while (coarse < Blocks.TOP && blocks.rows(coarse) > ROWS) {
            coarse++;
        }
        level = Math.max(coarse, Gaussian.level(sigma, LEAST));
        across = blocks.columns(level) + 4;
        down = blocks.rows(level) + 4;
        splines = Gaussian.splines(level);
        blocks.make(Blocks.TOP, -1, -1, blocks.columns(Blocks.TOP), blocks.rows(Blocks.TOP));
        colour = colours(Math.max(sigma, NARROWEST * (1 << level)));
    }

    /** Colours of a tile: out is overwritten, 3 x {@link Gaussian#TILE} x {@link Gaussian#TILE}. */
    void tile(int tx, int ty, float[] out) {
        int tile = Gaussian.TILE;
        int wide = Math.min(tile, width - tx * tile);
        int high = Math.min(tile, height - ty * tile);
        int i0 = Gaussian.first(tx * tile, level);
        int j0 = Gaussian.first(ty * tile, level);
        int columns = Gaussian.first(tx * tile + wide - 1, level) + 4 - i0;
        int rows = Gaussian.first(ty * tile + high - 1, level) + 4 - j0;
        float[] part = new float[3 * columns * rows];
        for (int j = 0; j < rows; j++) {
            System.arraycopy(colour, 3 * (i0 + 2 + across * (j0 + 2 + j)), part, 3 * columns * j, 3 * columns);
        }
        Gaussian.spread(part, columns, rows, 3, level, splines, i0, j0, tx * tile, ty * tile, wide, high, out, 3 * tile);
    }

    /** Colours of the whole picture: a new array, 3 numbers a pixel. */
    float[] all() {
        float[] out = new float[3 * width * height];
        float[] part = new float[3 * Gaussian.TILE * Gaussian.TILE];
        for (int ty = 0; ty * Gaussian.TILE < height; ty++) {
            for (int tx = 0; tx * Gaussian.TILE < width; tx++) {
                tile(tx, ty, part);
                int row = 3 * Math.min(Gaussian.TILE, width - tx * Gaussian.TILE);
                for (int y = ty * Gaussian.TILE; y < Math.min(height, (ty + 1) * Gaussian.TILE); y++) {
                    System.arraycopy(part, 3 * Gaussian.TILE * (y - ty * Gaussian.TILE), out, 3 * (tx * Gaussian.TILE + width * y), row);
                }
            }
        }
        return out;
    }

    private float[] colours(double narrowest) {
        float[] sums = new float[4 * across * down];
        double factor = 1;
        double widest = Math.max(width, height) / 2.0;
        for (double s = narrowest; s < widest; s *= 2) {
            float[] blurred = blurred(s);
            for (int n = 0; n < sums.length; n++) {
                sums[n] += (float) (factor * blurred[n]);
            }
            factor *= WIDER;
        }
        double[] mean = mean();
        float[] out = new float[3 * across * down];
        for (int p = 0; p < across * down; p++) {
            double alpha = sums[4 * p + 3] + factor * mean[3];
            for (int c = 0; c < 3; c++) {
                out[3 * p + c] = alpha > 0 ? (float) Math.max(0, (sums[4 * p + c] + factor * mean[c]) / alpha) : 1f;
            }
        }
        return out;
    }

    /** The picture blurred with sigma pixels, at all blocks of the level and two more on each side. */
    private float[] blurred(double sigma) {
        int wider = Math.max(level, Gaussian.level(sigma, LEAST));
        double k = 1 << wider;
        float[] weights = Gaussian.weights(Math.sqrt(Math.max(NARROWEST * NARROWEST, sigma * sigma / (k * k) - (wider > level ? 1 / 3.0 : 0)
                - 1 / 4.0)));
        Gaussian.Lines lines = new Gaussian.Lines(blocks.level(wider), 0, blocks.columns(wider) + 4, blocks.rows(wider) + 4);
        if (wider == level) {
            float[] out = new float[4 * across * down];
            Gaussian.convolve(lines, 0, 0, across, down, 4, weights, out, 4 * across);
            return out;
        }
        int columns = blocks.columns(wider) + 6;
        int rows = blocks.rows(wider) + 6;
        float[] coarse = new float[4 * columns * rows];
        Gaussian.convolve(lines, -1, -1, columns, rows, 4, weights, coarse, 4 * columns);
        float[] out = new float[4 * across * down];
        Gaussian.spread(coarse, columns, rows, 4, wider - level, Gaussian.splines(wider - level), -3, -3, -2, -2, across, down, out,
                4 * across);
        return out;
    }

    private double[] mean() {
        double[] mean = new double[4];
        float[] widest = blocks.level(Blocks.TOP);
        int count = blocks.columns(Blocks.TOP) * blocks.rows(Blocks.TOP);
        for (int j = 0; j < blocks.rows(Blocks.TOP); j++) {
            for (int i = 0; i < blocks.columns(Blocks.TOP); i++) {
                for (int c = 0; c < 4; c++) {
                    mean[c] += widest[blocks.at(Blocks.TOP, i, j) + c] / (double) count;
                }
            }
        }
        return mean;
    }
}

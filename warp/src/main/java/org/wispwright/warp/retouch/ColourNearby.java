package org.wispwright.warp.retouch;

import org.wispwright.render.picture.Picture;

/**
 * The un-premultiplied colour of the smoke near each place, also where there is none: normalised convolution,
 * {@code c = (K * rgb) / (K * a)} for premultiplied rgb, with the kernel {@code K = sum_k 100^-k G(2^k sigma)} and the mean over the
 * picture as its last and widest member. So smoke close by decides, and far smoke only where there is none close by. White if the
 * picture has no smoke.
 * <p>Works on the picture's {@link Blocks}: of at most {@value #ROWS} rows, and coarser yet for a wide brush, whose colour is as smooth;
 * each wider Gaussian on blocks as wide as it allows. That is enough for a colour and independent of the raster. Between blocks, cubic
 * B-splines. Gaussians on wider blocks are made for the whole picture, the others, and the colours, {@value #CHUNK} x {@value #CHUNK}
 * blocks at a time, where they are asked for.
 * <p>Source: Knutsson and Westin (1993), CVPR 93, 515-523.
 */
final class ColourNearby {
    private static final int ROWS = 96;
    private static final double WIDER = 0.01;
    /** Narrowest Gaussian on blocks, in blocks. */
    private static final double LEAST = 1.5;
    private static final double NARROWEST = 0.75;
    private static final int CHUNK = 8;

    private final Blocks blocks;
    private final int width;
    private final int height;
    private final int level;
    private final int across;
    private final int down;
    private final float[] splines;
    private final double narrowest;
    /** By level: the sum of the kernel's Gaussians on its blocks, -3..columns+2, -3..rows+2; null for none. */
    private final float[][] wide = new float[Blocks.TOP + 1][];
    /** The mean's part of the kernel. */
    private final double[] mean;
    /** Colours of blocks -2..columns+1, -2..rows+1, in chunks. */
    private final float[][] chunks;
    private final int chunksAcross;

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
        narrowest = Math.max(sigma, NARROWEST * (1 << level));
        double factor = 1;
        for (double s = narrowest; s < widest(); s *= 2) {
            if (levelOf(s) > level) {
                addWide(levelOf(s), s, (float) factor);
            }
            factor *= WIDER;
        }
        mean = mean(factor);
        chunksAcross = (across + CHUNK - 1) / CHUNK;
        chunks = new float[chunksAcross * ((down + CHUNK - 1) / CHUNK)][];
    }

    private double widest() {
        return Math.max(width, height) / 2.0;
    }

    /** The level whose blocks a Gaussian of sigma pixels is made on. */
    private int levelOf(double sigma) {
        return Math.max(level, Gaussian.level(sigma, LEAST));
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
            for (int i = 0; i < columns; i++) {
                block(i0 + 2 + i, j0 + 2 + j, part, 3 * (i + columns * j));
            }
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

    /** The colour of a block, counted from the outermost ring. */
    private void block(int i, int j, float[] out, int at) {
        int n = i / CHUNK + chunksAcross * (j / CHUNK);
        if (chunks[n] == null) {
            chunks[n] = chunk(i / CHUNK * CHUNK, j / CHUNK * CHUNK);
        }
        System.arraycopy(chunks[n], 3 * (i % CHUNK + CHUNK * (j % CHUNK)), out, at, 3);
    }

    /** Colours of the blocks from (i0,j0) on, counted from the outermost ring. */
    private float[] chunk(int i0, int j0) {
        int columns = Math.min(CHUNK, across - i0);
        int rows = Math.min(CHUNK, down - j0);
        float[] sums = new float[4 * columns * rows];
        float[] one = new float[4 * columns * rows];
        double factor = 1;
        for (double s = narrowest; s < widest() && levelOf(s) == level; s *= 2) {
            Gaussian.convolve(lines(level), i0, j0, columns, rows, 4, weights(s, level), one, 4 * columns);
            add(sums, (float) factor, one);
            factor *= WIDER;
        }
        for (int wider = level + 1; wider <= Blocks.TOP; wider++) {
            if (wide[wider] != null) {
                Gaussian.spread(wide[wider], blocks.columns(wider) + 6, blocks.rows(wider) + 6, 4, wider - level,
                        Gaussian.splines(wider - level), -3, -3, i0 - 2, j0 - 2, columns, rows, one, 4 * columns);
                add(sums, 1, one);
            }
        }
        float[] out = new float[3 * CHUNK * CHUNK];
        for (int p = 0; p < columns * rows; p++) {
            double alpha = sums[4 * p + 3] + mean[3];
            for (int c = 0; c < 3; c++) {
                out[3 * (p % columns + CHUNK * (p / columns)) + c] = alpha > 0 ? (float) Math.max(0, (sums[4 * p + c] + mean[c]) / alpha)
                        : 1f;
            }
        }
        return out;
    }

    private static void add(float[] sums, float factor, float[] one) {
        for (int n = 0; n < sums.length; n++) {
            sums[n] += factor * one[n];
        }
    }

    private void addWide(int wider, double sigma, float factor) {
        int columns = blocks.columns(wider) + 6;
        int rows = blocks.rows(wider) + 6;
        float[] one = new float[4 * columns * rows];
        Gaussian.convolve(lines(wider), -1, -1, columns, rows, 4, weights(sigma, wider), one, 4 * columns);
        if (wide[wider] == null) {
            wide[wider] = new float[4 * columns * rows];
        }
        add(wide[wider], factor, one);
    }

    private Gaussian.Lines lines(int level) {
        return new Gaussian.Lines(blocks.level(level), 0, blocks.columns(level) + 4, blocks.rows(level) + 4);
    }

    /** What a Gaussian of sigma pixels leaves to do on blocks of a level. */
    private float[] weights(double sigma, int wider) {
        double k = 1 << wider;
        return Gaussian.weights(Math.sqrt(Math.max(NARROWEST * NARROWEST, sigma * sigma / (k * k) - (wider > level ? 1 / 3.0 : 0)
                - 1 / 4.0)));
    }

    /** The picture's mean RGBA times a factor. */
    private double[] mean(double factor) {
        double[] mean = new double[4];
        float[] widest = blocks.level(Blocks.TOP);
        int count = blocks.columns(Blocks.TOP) * blocks.rows(Blocks.TOP);
        for (int j = 0; j < blocks.rows(Blocks.TOP); j++) {
            for (int i = 0; i < blocks.columns(Blocks.TOP); i++) {
                for (int c = 0; c < 4; c++) {
                    mean[c] += factor * widest[blocks.at(Blocks.TOP, i, j) + c] / count;
                }
            }
        }
        return mean;
    }
}

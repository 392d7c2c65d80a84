package org.wispwright.warp.retouch;

import java.util.Arrays;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Window;

/**
 * A picture at one half, one quarter, ... 1/{@value #WIDEST} of its raster: blocks of 2, 4, ... pixels a side, aligned to its top left
 * corner, made where they are asked for and made anew where the picture changed since. Beyond the border stands the border pixel: every
 * level has two rings of blocks around it, and those beyond the second are like it.
 * <p>Level l has blocks of k = 2^l pixels, {@code columns(l) x rows(l)} of them and the rings. From level to level along both axes
 * {@code out[i] = (in[2i-1] + 3 in[2i] + 3 in[2i+1] + in[2i+2]) / 8}, the refinement of the quadratic B-spline, so a block is the picture
 * weighed with about that spline, of variance {@code (k^2 - 1) / 4} pixels. A plain mean over the block would be cheaper, but lets a
 * pattern of blocks through: an edge is then blurred by its place in its block, ten times what is left here.
 * <p>Source: Burt and Adelson (1983), IEEE Trans. Communications 31(4), 532-540, with the even kernel.
 */
final class Blocks {
    /** Pixels a side of the widest block, and of the tiles in which blocks are made. */
    static final int WIDEST = 64;
    /** The level of the widest blocks. */
    static final int TOP = 6;

    private final int width;
    private final int height;
    private final int tilesAcross;
    private final int tilesDown;
    private final float[][] levels = new float[TOP + 1][];
    /** By level, four numbers a tile: the first and last column and row of its blocks that are yet to be made; none if 0 comes before. */
    private final int[][] stale = new int[TOP + 1][];
    private float[] rgba;

    Blocks(Picture picture) {
        width = picture.width();
        height = picture.height();
        tilesAcross = (width + WIDEST - 1) / WIDEST;
        tilesDown = (height + WIDEST - 1) / WIDEST;
        rgba = picture.rgba();
    }

    /**
     * From now on reads this picture of the same raster; what was made stays, so where it differs, {@link #changed} or {@link #forget}
     * must be told.
     */
    void from(Picture picture) {
        rgba = picture.rgba();
    }

    /** Nothing made so far holds. */
    void forget() {
        for (int level = 1; level <= TOP && stale[level] != null; level++) {
            everything(level);
        }
    }

    /** The picture changed in a window: what was made there, and nothing else, is made anew when it is asked for. */
    void changed(Window window) {
        int left = window.left();
        int right = window.left() + window.width() - 1;
        int top = window.top();
        int bottom = window.top() + window.height() - 1;
        for (int level = 1; level <= TOP && stale[level] != null; level++) {
            // Near a border the rings beyond it change too.
            left = left <= 1 ? -2 : left - 2 >> 1;
            top = top <= 1 ? -2 : top - 2 >> 1;
            right = right + 1 >> 1;
            bottom = bottom + 1 >> 1;
            right = right >= columns(level) - 1 ? columns(level) + 1 : right;
            bottom = bottom >= rows(level) - 1 ? rows(level) + 1 : bottom;
            int inTile = TOP - level;
            for (int ty = tile(top, inTile, tilesDown); ty <= tile(bottom, inTile, tilesDown); ty++) {
                for (int tx = tile(left, inTile, tilesAcross); tx <= tile(right, inTile, tilesAcross); tx++) {
                    stale(level, tx, ty, left, top, right, bottom);
                }
            }
        }
    }

    private void everything(int level) {
        for (int ty = 0; ty < tilesDown; ty++) {
            for (int tx = 0; tx < tilesAcross; tx++) {
                none(level, 4 * (tx + tilesAcross * ty));
                stale(level, tx, ty, -2, -2, columns(level) + 1, rows(level) + 1);
            }
        }
    }

    /** The blocks of a tile within left..right, top..bottom are to be made anew. */
    private void stale(int level, int tx, int ty, int left, int top, int right, int bottom) {
        int[] box = stale[level];
        int at = 4 * (tx + tilesAcross * ty);
        boolean none = box[at] > box[at + 1];
        int l = Math.max(left, first(level, tx));
        int r = Math.min(right, last(level, tx, tilesAcross, columns(level)));
        int t = Math.max(top, first(level, ty));
        int b = Math.min(bottom, last(level, ty, tilesDown, rows(level)));
        box[at] = none ? l : Math.min(l, box[at]);
        box[at + 1] = none ? r : Math.max(r, box[at + 1]);
        box[at + 2] = none ? t : Math.min(t, box[at + 2]);
        box[at + 3] = none ? b : Math.max(b, box[at + 3]);
    }

    /** Blocks across the picture at a level, those outside not counted. */
    int columns(int level) {
        return (width + (1 << level) - 1) >> level;
    }

    /** Blocks down the picture at a level. */
    int rows(int level) {
        return (height + (1 << level) - 1) >> level;
    }

    /** Index of the first float of block (i,j) in {@link #level}; i from -2 to columns(level) + 1, j likewise. */
    int at(int level, int i, int j) {
        return 4 * (i + 2 + (columns(level) + 4) * (j + 2));
    }

    /** RGBA of a level of 1 to {@value #TOP}; valid in what {@link #make} was asked for. */
    float[] level(int level) {
        return levels[level];
    }

    /** Sees to it that blocks i0..i1, j0..j1 of a level, cut to the picture and its rings, are those of the picture. */
    void make(int level, int i0, int j0, int i1, int j1) {
        if (level == 0) {
            return;
        }
        if (stale[level] == null) {
            stale[level] = new int[4 * tilesAcross * tilesDown];
            levels[level] = new float[4 * (columns(level) + 4) * (rows(level) + 4)];
            everything(level);
        }
        int inTile = TOP - level;
        for (int ty = tile(j0, inTile, tilesDown); ty <= tile(j1, inTile, tilesDown); ty++) {
            for (int tx = tile(i0, inTile, tilesAcross); tx <= tile(i1, inTile, tilesAcross); tx++) {
                makeTile(level, 4 * (tx + tilesAcross * ty));
            }
        }
    }

    private static int tile(int block, int inTile, int tiles) {
        return Math.min(tiles - 1, Math.max(0, block) >> inTile);
    }

    /** First block of a tile along an axis, the rings before the picture belonging to its first tile. */
    private static int first(int level, int tile) {
        return tile == 0 ? -2 : tile * (WIDEST >> level);
    }

    private static int last(int level, int tile, int tiles, int blocks) {
        return tile == tiles - 1 ? blocks + 1 : (tile + 1) * (WIDEST >> level) - 1;
    }

    private void makeTile(int level, int at) {
        int[] box = stale[level];
        int left = box[at];
        int right = box[at + 1];
        int top = box[at + 2];
        int bottom = box[at + 3];
        if (left <= right) {
            make(level - 1, 2 * left - 1, 2 * top - 1, 2 * right + 2, 2 * bottom + 2);
            fill(level, left, top, right, bottom);
            none(level, at);
        }
    }

    private void none(int level, int at) {
        stale[level][at] = 0;
        stale[level][at + 1] = -1;
    }

    /** Blocks left..right, top..bottom of a level from the one before. */
    private void fill(int level, int left, int top, int right, int bottom) {
        float[] in = level == 1 ? rgba : levels[level - 1];
        float[] line = new float[4 * (2 * (right - left) + 4)];
        float[][] four = new float[4][line.length];
        for (int j = top; j <= bottom; j++) {
            down(level - 1, in, 2 * left - 1, j, four, line);
            across(line, levels[level], at(level, left, j));
        }
    }

    private static void across(float[] line, float[] out, int first) {
        for (int n = 0, at = first; n < line.length - 8; n += 8, at += 4) {
            out[at] = 0.125f * (line[n] + line[n + 12] + 3 * (line[n + 4] + line[n + 8]));
            out[at + 1] = 0.125f * (line[n + 1] + line[n + 13] + 3 * (line[n + 5] + line[n + 9]));
            out[at + 2] = 0.125f * (line[n + 2] + line[n + 14] + 3 * (line[n + 6] + line[n + 10]));
            out[at + 3] = 0.125f * (line[n + 3] + line[n + 15] + 3 * (line[n + 7] + line[n + 11]));
        }
    }

    /** Four rows of a level, those of row j of the next, into one; columns from {@code first} on. */
    private void down(int level, float[] in, int first, int j, float[][] four, float[] line) {
        int least = level == 0 ? 0 : -2;
        int most = level == 0 ? width - 1 : columns(level) + 1;
        int count = line.length / 4;
        int low = Math.min(count, Math.max(0, least - first));
        int high = Math.max(low, Math.min(count, most - first + 1));
        for (int n = 0; n < 4; n++) {
            System.arraycopy(in, start(level, 2 * j - 1 + n) + 4 * (first + low), four[n], 4 * low, 4 * (high - low));
        }
        rows(four[0], four[1], four[2], four[3], line);
        for (int i = 0; i < low; i++) {
            System.arraycopy(line, 4 * low, line, 4 * i, 4);
        }
        for (int i = high; i < count; i++) {
            System.arraycopy(line, 4 * (high - 1), line, 4 * i, 4);
        }
    }

    /** One index for all arrays, so that the compiler does several numbers at a time. */
    private static void rows(float[] a, float[] b, float[] c, float[] d, float[] line) {
        for (int n = 0; n < line.length; n++) {
            line[n] = 0.125f * (a[n] + d[n] + 3 * (b[n] + c[n]));
        }
    }

    /** Index of the first float of block (0, j) of a level, level 0 being the pixels; j is cut to what there is. */
    private int start(int level, int j) {
        return level == 0 ? 4 * width * Math.min(height - 1, Math.max(0, j)) : at(level, 0, Math.min(rows(level) + 1, Math.max(-2, j)));
    }
}

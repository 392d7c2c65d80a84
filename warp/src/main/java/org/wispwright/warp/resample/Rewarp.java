package org.wispwright.warp.resample;

import org.wispwright.render.picture.Picture;

/**
 * A picture read anew where each pixel comes from: {@code out[p] = in[p + d(p)]}, clamped, clear outside the frame. Arithmetic is float
 * away from the border: within 1e-6 of {@link Resampling}. A pixel with d = 0 keeps its bits.
 */
public final class Rewarp {
    private final boolean draft;
    private final Resampling border;

    /**
     * A reader; it keeps scratch space, so one a thread.
     *
     * @param kernel KEYS, or LINEAR for a draft while the hand moves
     * @throws IllegalArgumentException for another kernel
     */
    public Rewarp(Kernel kernel) {
        if (kernel != Kernel.KEYS && kernel != Kernel.LINEAR) {
            throw new IllegalArgumentException("rewarp: got " + kernel + ", needs KEYS or LINEAR");
        }
        draft = kernel == Kernel.LINEAR;
        border = new Resampling(kernel);
    }

    /**
     * Overwrites part of a row.
     *
     * @param in     read: the picture before
     * @param left   first column
     * @param row    the row
     * @param count  columns
     * @param dx     read from {@code from}: pixels to the right; NaN where nothing comes, which is written clear
     * @param dy     read from {@code from}: pixels downwards
     * @param mask   share of the displacement to take, read at {@code left + width * row}; null means all of it. Where nothing comes,
     *               the share of the picture that goes
     * @param out    overwritten: same raster; not {@code in}
     */
    public void row(Picture in, int left, int row, int count, double[] dx, double[] dy, int from, float[] mask, Picture out) {
        if (draft) {
            RewarpKernel.linearRow(in.rgba(), in.width(), in.height(), left, row, count, dx, dy, from, mask, border, out.rgba());
        } else {
            RewarpKernel.cubicRow(in.rgba(), in.width(), in.height(), left, row, count, dx, dy, from, mask, border, out.rgba());
        }
    }
}

package org.wispwright.warp.resample;

import org.wispwright.render.picture.Picture;

/**
 * Reads premultiplied RGBA at fixed positions: {@code out[p] = sum over 4x4 neighbours of wy wx in[neighbour]}, clear outside the
 * frame. Linear in the picture as long as nothing is clamped; its pullback is the transpose,
 * {@code inBar[neighbour] += wy wx outBar[p]}. Clamping is a separate step ({@link #clamp}).
 * <p>Keys (1981), IEEE ASSP 29(6), 1153-1160, applied along x and y. A position on a pixel centre copies that pixel's bits.
 */
public final class Resampling {
    private final Kernel kernel;
    private final double[] wx = new double[4];
    private final double[] wy = new double[4];

    /** A reader with this kernel; it keeps a few numbers of scratch space, so one a thread. */
    public Resampling(Kernel kernel) {
        this.kernel = kernel;
    }

    /**
     * Overwrites {@code out[at..at+3]} with the picture's RGBA at the sample position (px,py).
     *
     * @param in read
     * @param px in pixels, 0 at the centre of the leftmost
     * @param py in pixels, 0 at the centre of the top row
     */
    public void read(Picture in, double px, double py, float[] out, int at) {
        read(in.rgba(), in.width(), in.height(), px, py, out, at);
    }

    /** The same from plain numbers. */
    void read(float[] values, int width, int height, double px, double py, float[] out, int at) {
        if (!(px > -2 && py > -2 && px < width + 1 && py < height + 1)) {
            out[at] = 0;
            out[at + 1] = 0;
            out[at + 2] = 0;
            out[at + 3] = 0;
            return;
        }
        int x0 = (int) Math.floor(px);
        int y0 = (int) Math.floor(py);
        kernel.weights(px - x0, wx);
        kernel.weights(py - y0, wy);
        double r = 0;
        double g = 0;
        double b = 0;
        double a = 0;
        for (int n = 0; n < 4; n++) {
            int y = y0 - 1 + n;
            if (y < 0 || y >= height || wy[n] == 0) {
                continue;
            }
            for (int m = 0; m < 4; m++) {
                int x = x0 - 1 + m;
                if (x < 0 || x >= width || wx[m] == 0) {
                    continue;
                }
                double w = wy[n] * wx[m];
                int i = 4 * (x + width * y);
                r += w * values[i];
                g += w * values[i + 1];
                b += w * values[i + 2];
                a += w * values[i + 3];
            }
        }
        out[at] = (float) r;
        out[at + 1] = (float) g;
        out[at + 2] = (float) b;
        out[at + 3] = (float) a;
    }

    /** The transpose of {@link #read}: adds {@code w outBar[at..at+3]} into every neighbour that was read, in the shape (width, height). */
    public void readPullback(int width, int height, double px, double py, float[] outBar, int at, float[] inBar) {
        if (!(px > -2 && py > -2 && px < width + 1 && py < height + 1)) {
            return;
        }
        int x0 = (int) Math.floor(px);
        int y0 = (int) Math.floor(py);
        kernel.weights(px - x0, wx);
        kernel.weights(py - y0, wy);
        for (int n = 0; n < 4; n++) {
            int y = y0 - 1 + n;
            for (int m = 0; m < 4; m++) {
                int x = x0 - 1 + m;
                if (y < 0 || y >= height || x < 0 || x >= width) {
                    continue;
                }
                double w = wy[n] * wx[m];
                int i = 4 * (x + width * y);
                for (int c = 0; c < 4; c++) {
                    inBar[i + c] += (float) (w * outBar[at + c]);
                }
            }
        }
    }

    /**
     * Takes the overshoot of a kernel with negative lobes away: where alpha passes 1 all four are scaled down by it, so the
     * un-premultiplied colour stays; where alpha falls under 0 the pixel is clear; colour never falls under 0.
     */
    public static void clamp(float[] rgba, int at) {
        float alpha = rgba[at + 3];
        float factor = alpha > 1 ? 1 / alpha : alpha > 0 ? 1 : 0;
        for (int c = 0; c < 3; c++) {
            rgba[at + c] = Math.max(0f, factor * rgba[at + c]);
        }
        rgba[at + 3] = Math.min(1f, Math.max(0f, alpha));
    }
}

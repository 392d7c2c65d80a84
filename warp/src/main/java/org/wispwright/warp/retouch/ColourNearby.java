package org.wispwright.warp.retouch;

import org.wispwright.render.picture.Picture;

/**
 * The un-premultiplied colour of the smoke near each place, also where there is none: normalised convolution,
 * {@code c = (K * rgb) / (K * a)} for premultiplied rgb, with the kernel {@code K = sum_k 100^-k G(2^k sigma)} and the mean over the
 * picture as its last and widest member. So smoke close by decides, and far smoke only where there is none close by. White if the
 * picture has no smoke.
 * <p>Works on a picture averaged down to at most {@value #ROWS} rows, which is enough for a colour and independent of the raster.
 * <p>Source: Knutsson and Westin (1993), CVPR 93, 515-523.
 */
final class ColourNearby {
    private static final int ROWS = 96;
    private static final double WIDER = 0.01;

    private final int width;
    private final int height;
    private final double perPixelX;
    private final double perPixelY;
    private final float[] colour;

    /** Prepares the colours of a picture for new smoke whose size is about {@code sigma}, in heights. */
    ColourNearby(Picture picture, double sigma) {
        height = Math.min(ROWS, picture.height());
        width = Math.max(1, (int) Math.round((double) picture.width() * height / picture.height()));
        perPixelX = (double) width / picture.width();
        perPixelY = (double) height / picture.height();
        float[] rgba = averaged(picture, width, height);
        double[] sums = new double[rgba.length];
        double factor = 1;
        double widest = Math.max(width, height) / 2.0;
        for (double s = Math.max(0.75, sigma * height); s < widest; s *= 2) {
            float[] blurred = Gaussian.blurred(rgba, 4, width, height, s);
            for (int n = 0; n < sums.length; n++) {
                sums[n] += factor * blurred[n];
            }
            factor *= WIDER;
        }
        double[] mean = new double[4];
        for (int n = 0; n < rgba.length; n++) {
            mean[n & 3] += rgba[n] / (double) (width * height);
        }
        colour = new float[3 * width * height];
        for (int p = 0; p < width * height; p++) {
            double alpha = sums[4 * p + 3] + factor * mean[3];
            for (int c = 0; c < 3; c++) {
                colour[3 * p + c] = alpha > 0 ? (float) Math.max(0, (sums[4 * p + c] + factor * mean[c]) / alpha) : 1f;
            }
        }
    }

    /** Channel c of the colour at pixel (x,y) of the picture, between the coarse pixels linearly. */
    float at(int x, int y, int c) {
        double px = Math.min(width - 1, Math.max(0, (x + 0.5) * perPixelX - 0.5));
        double py = Math.min(height - 1, Math.max(0, (y + 0.5) * perPixelY - 0.5));
        int x0 = (int) px;
        int y0 = (int) py;
        int x1 = Math.min(width - 1, x0 + 1);
        int y1 = Math.min(height - 1, y0 + 1);
        double tx = px - x0;
        double ty = py - y0;
        double top = (1 - tx) * colour[3 * (x0 + width * y0) + c] + tx * colour[3 * (x1 + width * y0) + c];
        double bottom = (1 - tx) * colour[3 * (x0 + width * y1) + c] + tx * colour[3 * (x1 + width * y1) + c];
        return (float) ((1 - ty) * top + ty * bottom);
    }

    /** Mean over the part of the picture that each coarse pixel covers. */
    private static float[] averaged(Picture picture, int width, int height) {
        float[] across = new float[4 * width * picture.height()];
        average(picture.rgba(), 4 * picture.width(), 4, picture.width(), across, 4 * width, 4, width, picture.height());
        float[] out = new float[4 * width * height];
        average(across, 4, 4 * width, picture.height(), out, 4, 4 * width, height, width);
        return out;
    }

    private static void average(float[] in, int inLine, int inStep, int n, float[] out, int outLine, int outStep, int m, int lines) {
        double ratio = (double) n / m;
        for (int i = 0; i < m; i++) {
            double from = i * ratio;
            double to = Math.min(n, (i + 1) * ratio);
            for (int line = 0; line < lines; line++) {
                for (int c = 0; c < 4; c++) {
                    double sum = 0;
                    for (int k = (int) from; k < n && k < to; k++) {
                        sum += (Math.min(to, k + 1) - Math.max(from, k)) * in[line * inLine + k * inStep + c];
                    }
                    out[line * outLine + i * outStep + c] = (float) (sum / ratio);
                }
            }
        }
    }
}

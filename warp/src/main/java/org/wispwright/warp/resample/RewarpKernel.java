package org.wispwright.warp.resample;

/**
 * Part of a row of a picture read anew at moved positions, in float: the loops behind {@link Rewarp}. Arguments as there. Pixels too near
 * the frame's border for the plain loop are read by {@code border}.
 */
final class RewarpKernel {
    private RewarpKernel() {
    }

    /** Keys' cubic, a = -1/2, clamped. */
    static void cubicRow(float[] in, int width, int height, int left, int row, int count, double[] dx, double[] dy, int from, float[] mask,
                         Resampling border, float[] out) {
        for (int n = 0; n < count; n++) {
            int pixel = left + n + width * row;
            int at = 4 * pixel;
            double m = mask == null ? 1 : mask[pixel];
            double x = m * dx[from + n];
            double y = m * dy[from + n];
            if (stays(in, at, m, x, y, out)) {
                continue;
            }
            x += left + n;
            y += row;
            if (!(x >= 1 && y >= 1 && x < width - 2 && y < height - 2)) {
                border.read(in, width, height, x, y, out, at);
                Resampling.clamp(out, at);
                continue;
            }
            int x0 = (int) x;
            int y0 = (int) y;
            float t = (float) (x - x0);
            float s = (float) (y - y0);
            float t1 = 1 - t;
            float s1 = 1 - s;
            float a = -0.5f * t * t1 * t1;
            float b = (1.5f * t - 2.5f) * t * t + 1;
            float c = (1.5f * t1 - 2.5f) * t1 * t1 + 1;
            float d = -0.5f * t1 * t * t;
            float w0 = -0.5f * s * s1 * s1;
            float w1 = (1.5f * s - 2.5f) * s * s + 1;
            float w2 = (1.5f * s1 - 2.5f) * s1 * s1 + 1;
            float w3 = -0.5f * s1 * s * s;
            int i = 4 * (x0 - 1 + width * (y0 - 1));
            int j = i + 4 * width;
            int k = j + 4 * width;
            int l = k + 4 * width;
            for (int h = 0; h < 4; h++) {
                out[at + h] = w0 * (a * in[i + h] + b * in[i + 4 + h] + c * in[i + 8 + h] + d * in[i + 12 + h])
                        + w1 * (a * in[j + h] + b * in[j + 4 + h] + c * in[j + 8 + h] + d * in[j + 12 + h])
                        + w2 * (a * in[k + h] + b * in[k + 4 + h] + c * in[k + 8 + h] + d * in[k + 12 + h])
                        + w3 * (a * in[l + h] + b * in[l + 4 + h] + c * in[l + 8 + h] + d * in[l + 12 + h]);
            }
            Resampling.clamp(out, at);
        }
    }

    /** Linear between four neighbours, which makes no new extremes, so nothing is clamped. */
    static void linearRow(float[] in, int width, int height, int left, int row, int count, double[] dx, double[] dy, int from, float[] mask,
                          Resampling border, float[] out) {
        for (int n = 0; n < count; n++) {
            int pixel = left + n + width * row;
            int at = 4 * pixel;
            double m = mask == null ? 1 : mask[pixel];
            double x = m * dx[from + n];
            double y = m * dy[from + n];
            if (stays(in, at, m, x, y, out)) {
                continue;
            }
            x += left + n;
            y += row;
            if (!(x >= 0 && y >= 0 && x < width - 1 && y < height - 1)) {
                border.read(in, width, height, x, y, out, at);
                continue;
            }
            int x0 = (int) x;
            int y0 = (int) y;
            float t = (float) (x - x0);
            float s = (float) (y - y0);
            float a = (1 - t) * (1 - s);
            float b = t * (1 - s);
            float c = (1 - t) * s;
            float d = t * s;
            int i = 4 * (x0 + width * y0);
            int j = i + 4 * width;
            out[at] = a * in[i] + b * in[i + 4] + c * in[j] + d * in[j + 4];
            out[at + 1] = a * in[i + 1] + b * in[i + 5] + c * in[j + 1] + d * in[j + 5];
            out[at + 2] = a * in[i + 2] + b * in[i + 6] + c * in[j + 2] + d * in[j + 6];
            out[at + 3] = a * in[i + 3] + b * in[i + 7] + c * in[j + 3] + d * in[j + 7];
        }
    }

    /** Writes a pixel that is not read elsewhere: one that is not moved, and one that nothing comes to. */
    private static boolean stays(float[] in, int at, double m, double x, double y, float[] out) {
        if (m == 0 || x == 0 && y == 0) {
            out[at] = in[at];
            out[at + 1] = in[at + 1];
            out[at + 2] = in[at + 2];
            out[at + 3] = in[at + 3];
            return true;
        }
        // An infinite number, or none, is no place.
        if (x - x != 0 || y - y != 0) {
            float left = m < 1 ? (float) (1 - m) : 0;
            for (int c = at; c < at + 4; c++) {
                out[c] = left * in[c];
            }
            return true;
        }
        return false;
    }
}

package org.wispwright.warp.matte;

import java.util.function.Function;
import org.wispwright.render.picture.Picture;

/**
 * Softens the values of a matte that has no outline of its own to fade along.
 * <p>A feather of width F makes a hard, straight edge about as soft as a {@link Region}'s: {@code s^2 (3 - 2 s)} over F spreads with the
 * variance {@code F^2 / 20}, and so does this. It is two passes of a running mean along each axis, their ends weighted so that the
 * variance is right at every raster: {@code out = (sum of |k| <= r in + f (in[-r-1] + in[r+1])) / (2 r + 1 + 2 f)}. Beyond the border
 * stands the border pixel.
 * <p>Source: Gwosdek, Grewenig, Bruhn and Weickert (2011), LNCS 6667, 447-458, eq. 7 and 8. Difference from it: values are held as whole
 * numbers of {@code 2^-24}, so a running sum is exact, and a pixel has the same bits in every window. 0 and 1 stay 0 and 1 where
 * nothing else is near.
 */
final class Feather {
    private static final int PASSES = 2;
    private static final double ONE = 1 << 24;

    private final int radius;
    private final double ends;
    private final double scale;

    /** @param variance of one pass along one axis, in squared pixels, above 0 */
    private Feather(double variance) {
        radius = (int) Math.floor(0.5 * Math.sqrt(12 * variance + 1) - 0.5);
        double next = radius + 1.0;
        ends = (2 * radius + 1) * (radius * next - 3 * variance) / (6 * (variance - next * next));
        scale = 1 / (2 * radius + 1 + 2 * ends);
    }

    /**
     * Values of a window, softened.
     *
     * @param feather fraction of the height, 0 or more; 0 gives the plain values
     * @param plain   makes the values of any window before they are softened; asked for one somewhat larger
     * @return a new array, one a pixel of the window
     */
    static float[] applied(double feather, Picture original, Window window, Function<Window, float[]> plain) {
        double pixels = feather * original.height();
        if (pixels == 0) {
            return plain.apply(window);
        }
        Feather kernel = new Feather(pixels * pixels / (20 * PASSES));
        Window grown = window.grown(PASSES * (kernel.radius + 1), original.width(), original.height());
        float[] values = plain.apply(grown);
        int[] a = new int[values.length];
        int[] b = new int[values.length];
        for (int p = 0; p < a.length; p++) {
            a[p] = (int) (values[p] * ONE + 0.5);
        }
        for (int pass = 0; pass < PASSES; pass++) {
            kernel.alongRows(a, b, grown.width(), grown.height());
            kernel.downColumns(b, a, grown.width(), grown.height());
        }
        float[] out = new float[window.pixels()];
        for (int y = 0, n = 0; y < window.height(); y++) {
            int p = window.left() - grown.left() + grown.width() * (window.top() - grown.top() + y);
            for (int x = 0; x < window.width(); x++) {
                out[n++] = (float) (a[p++] / ONE);
            }
        }
        return out;
    }

    private void alongRows(int[] in, int[] out, int width, int height) {
        int last = width - 1;
        for (int y = 0, row = 0; y < height; y++, row += width) {
            long sum = 0;
            for (int k = -radius; k <= radius; k++) {
                sum += in[row + Math.min(last, Math.max(0, k))];
            }
            for (int x = 0; x < width; x++) {
                int before = in[row + Math.max(0, x - radius - 1)];
                int after = in[row + Math.min(last, x + radius + 1)];
                out[row + x] = (int) ((sum + ends * ((long) before + after)) * scale + 0.5);
                sum += after - in[row + Math.max(0, x - radius)];
            }
        }
    }

    private void downColumns(int[] in, int[] out, int width, int height) {
        int last = height - 1;
        long[] sums = new long[width];
        for (int k = -radius; k <= radius; k++) {
            int row = width * Math.min(last, Math.max(0, k));
            for (int x = 0; x < width; x++) {
                sums[x] += in[row + x];
            }
        }
        for (int y = 0; y < height; y++) {
            int before = width * Math.max(0, y - radius - 1);
            int after = width * Math.min(last, y + radius + 1);
            int leaves = width * Math.max(0, y - radius);
            for (int x = 0; x < width; x++) {
                out[width * y + x] = (int) ((sums[x] + ends * ((long) in[before + x] + in[after + x])) * scale + 0.5);
                sums[x] += in[after + x] - in[leaves + x];
            }
        }
    }
}

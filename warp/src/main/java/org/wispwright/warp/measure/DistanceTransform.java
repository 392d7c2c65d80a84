package org.wispwright.warp.measure;

import java.util.Arrays;

/**
 * The squared distance from each pixel's centre to the nearest pixel inside a silhouette, exact, in squared pixels.
 * <p>{@code D(x,y) = min over inside (u,v) of (x - u)^2 + (y - v)^2}, taken down the columns first and then along the rows; each
 * pass is {@code d[q] = min_p (q - p)^2 + f[p]}, the lower envelope of parabolas, in time linear in the count.
 * <p>Source: Felzenszwalb and Huttenlocher (2012), Theory of Computing 8, 415-428. Differences from it: places with no source yet
 * (f infinite) are left out of the envelope instead of standing in it with a large number, so nothing is rounded.
 */
public final class DistanceTransform {
    private DistanceTransform() {
    }

    /** One squared distance a pixel, whole numbers in double; all infinite if the silhouette is empty. */
    public static double[] squared(Silhouette silhouette) {
        int width = silhouette.width();
        int height = silhouette.height();
        double[] out = new double[width * height];
        int longest = Math.max(width, height);
        double[] f = new double[longest];
        double[] d = new double[longest];
        int[] roots = new int[longest];
        double[] starts = new double[longest];
        for (int x = 0; x < width; x++) {
            for (int y = 0; y < height; y++) {
                f[y] = silhouette.inside()[x + width * y] ? 0 : Double.POSITIVE_INFINITY;
            }
            line(f, height, d, roots, starts);
            for (int y = 0; y < height; y++) {
                out[x + width * y] = d[y];
            }
        }
        for (int y = 0; y < height; y++) {
            System.arraycopy(out, width * y, f, 0, width);
            line(f, width, d, roots, starts);
            System.arraycopy(d, 0, out, width * y, width);
        }
        return out;
    }

    /** {@code d[q] = min_p (q - p)^2 + f[p]} for q, p below n; {@code starts[k]} is where the parabola of {@code roots[k]} takes over. */
    private static void line(double[] f, int n, double[] d, int[] roots, double[] starts) {
        int count = 0;
        for (int q = 0; q < n; q++) {
            if (f[q] == Double.POSITIVE_INFINITY) {
                continue;
            }
            double start = Double.NEGATIVE_INFINITY;
            while (count > 0) {
                int p = roots[count - 1];
                start = (f[q] + (double) q * q - (f[p] + (double) p * p)) / (2.0 * (q - p));
                if (start > starts[count - 1]) {
                    break;
                }
                count--;
                start = Double.NEGATIVE_INFINITY;
            }
            roots[count] = q;
            starts[count] = start;
            count++;
        }
        if (count == 0) {
            Arrays.fill(d, 0, n, Double.POSITIVE_INFINITY);
            return;
        }
        int k = 0;
        for (int q = 0; q < n; q++) {
            while (k + 1 < count && starts[k + 1] < q) {
                k++;
            }
            double away = q - roots[k];
            d[q] = away * away + f[roots[k]];
        }
    }
}

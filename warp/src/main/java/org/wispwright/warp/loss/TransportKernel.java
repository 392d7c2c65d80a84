package org.wispwright.warp.loss;

/** The loop of {@link SlicedWassersteinLoss}: two distributions on one row of bins, bin i from i to i + 1, mass even in each bin. */
final class TransportKernel {
    private TransportKernel() {
    }

    /**
     * {@code integral over u in 0..1 of (F^-1(u) - G^-1(u))^2}, and in each bin the mean of the potential phi,
     * {@code phi'(s) = 2 (s - T(s))}, {@code T(s) = G^-1(F(s))}, phi = 0 at the first edge.
     * <p>Goes through the bins of F; each is cut where F passes an edge value of G, so T is linear in every piece. Where F and G are
     * both flat at one value strictly between 0 and 1 any T between the ends of G's gap would do; the one nearest to s is taken, so
     * equal distributions have the potential 0.
     *
     * @param f         read: cumulated mass at the n + 1 edges, from 0 up to 1, never falling
     * @param g         read: as f, for the other distribution
     * @param potential overwritten: n means of phi, in squared bins
     */
    static double squaredDistance(double[] f, double[] g, double[] potential) {
        int n = f.length - 1;
        int last = n - 1;
        while (last > 0 && g[last] >= 1) {
            last--;
        }
        double squared = 0;
        double phi = 0;
        int j = 0;
        for (int i = 0; i < n; i++) {
            double moment = 0;
            double change = 0;
            while (j < last && g[j + 1] <= f[i]) {
                j++;
            }
            if (f[i + 1] > f[i]) {
                double rise = f[i + 1] - f[i];
                double u0 = f[i];
                double s0 = i;
                while (true) {
                    boolean cut = j < last && g[j + 1] < f[i + 1];
                    double u1 = cut ? g[j + 1] : f[i + 1];
                    double s1 = cut ? i + (u1 - f[i]) / rise : i + 1;
                    double d0 = s0 - inverse(g, j, u0);
                    double d1 = s1 - inverse(g, j, u1);
                    squared += (u1 - u0) * (d0 * d0 + d0 * d1 + d1 * d1) / 3;
                    change += (d0 + d1) * (s1 - s0);
                    moment += moment(i + 1, s0, s1, d0, d1);
                    if (!cut) {
                        break;
                    }
                    u0 = u1;
                    s0 = s1;
                    while (j < last && g[j + 1] <= u1) {
                        j++;
                    }
                }
            } else {
                double d0 = i - flatTarget(g, j, f[i], i);
                double d1 = i + 1 - flatTarget(g, j, f[i], i + 1);
                change = d0 + d1;
                moment = moment(i + 1, i, i + 1, d0, d1);
            }
            potential[i] = phi + moment;
            phi += change;
        }
        return squared;
    }

    /** {@code integral over s in s0..s1 of (end - s) 2 d(s)}, d linear from d0 to d1: Simpson's rule, exact for a quadratic. */
    private static double moment(double end, double s0, double s1, double d0, double d1) {
        double middle = (end - 0.5 * (s0 + s1)) * (d0 + d1);
        return (s1 - s0) / 3 * ((end - s0) * d0 + 2 * middle + (end - s1) * d1);
    }

    /** {@code G^-1(u)} for u in bin j of G, which has mass. */
    private static double inverse(double[] g, int j, double u) {
        double rise = g[j + 1] - g[j];
        double share = rise > 0 ? (u - g[j]) / rise : 0;
        return j + Math.min(1, Math.max(0, share));
    }

    /** T at s where F is flat at u; j is the bin of G that begins at or below u and ends above it (the last filled one at 1). */
    private static double flatTarget(double[] g, int j, double u, double s) {
        double upper = inverse(g, j, u);
        if (u <= 0 || u >= 1 || g[j] < u) {
            return upper;
        }
        int k = j;
        while (k > 0 && g[k - 1] == u) {
            k--;
        }
        return Math.min(upper, Math.max(k, s));
    }
}

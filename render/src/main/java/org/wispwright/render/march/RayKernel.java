package org.wispwright.render.march;

/**
 * Emission and absorption along one ray whose samples are already taken, and the pullback. Max (1995), "Optical models for
 * direct volume rendering", IEEE TVCG 1(2), 99-108, with the step opacity {@code 1 - exp(-tau)}.
 * <p>Forward, near sample first, {@code T_0 = 1}, {@code w_n = T_n (1 - exp(-tau_n))}, {@code T_(n+1) = T_n exp(-tau_n)}:
 * <pre>
 *   alpha = sum w_n          shine = sum w_n lit_n          through = T_N = 1 - alpha
 * </pre>
 * A sample of tau 0 changes no bit of the three, so it may be left out.
 * <p>Pullback: with {@code behind_n = sum over m above n of w_m lit_m},
 * <pre>
 *   tauBar_n = alphaBar T_N + shineBar (T_(n+1) lit_n - behind_n)          litBar_n = shineBar w_n
 * </pre>
 * {@code behind} is summed from the far end, so nothing cancels; the ray's own samples are kept for that, two numbers each.
 * <p>Any colour that is {@code a + b lit_n} with constant a, b follows: {@code a alpha + b shine}.
 */
final class RayKernel {
    /** Places in the array of sums. */
    static final int ALPHA = 0;
    static final int SHINE = 1;
    static final int THROUGH = 2;

    private RayKernel() {
    }

    /** {@code 1 - exp(-sum tau)}: alpha where only alpha is wanted. */
    static double opacity(double[] tau, int count) {
        return -FastExp.minusOpacity(sum(tau, count));
    }

    /** {@code exp(-sum tau)}, with its full relative precision. */
    static double through(double[] tau, int count) {
        return StrictMath.exp(-sum(tau, count));
    }

    private static double sum(double[] tau, int count) {
        double sum = 0;
        for (int n = 0; n < count; n++) {
            sum += tau[n];
        }
        return sum;
    }

    /** Overwrites sums[0..2] with alpha, shine and what gets through. */
    static void march(double[] tau, double[] lit, int count, double[] sums) {
        double alpha = 0;
        double shine = 0;
        double through = 1;
        for (int n = 0; n < count; n++) {
            double m = FastExp.minusOpacity(tau[n]);
            double w = -through * m;
            alpha += w;
            shine += w * lit[n];
            through += through * m;
        }
        sums[ALPHA] = alpha;
        sums[SHINE] = shine;
        sums[THROUGH] = through;
    }

    /**
     * Overwrites tauBar and litBar.
     *
     * @param weight scratch, one number a sample
     * @param after scratch, one number a sample
     */
    static void pullback(double[] tau, double[] lit, int count, double alphaBar, double shineBar,
                         double[] weight, double[] after, double[] tauBar, double[] litBar) {
        double through = 1;
        for (int n = 0; n < count; n++) {
            double m = FastExp.minusOpacity(tau[n]);
            weight[n] = -through * m;
            through += through * m;
            after[n] = through;
        }
        double even = alphaBar * through;
        double behind = 0;
        for (int n = count - 1; n >= 0; n--) {
            tauBar[n] = even + shineBar * (after[n] * lit[n] - behind);
            litBar[n] = shineBar * weight[n];
            behind += weight[n] * lit[n];
        }
    }
}

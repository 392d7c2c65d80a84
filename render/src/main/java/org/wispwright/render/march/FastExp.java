package org.wispwright.render.march;

/**
 * {@code exp(-tau) - 1} for an optical depth, in double, to about two units in the last place, relative also for tiny tau.
 * <p>{@code tau = k/64 + r}, |r| at most 1/128: {@code exp(-tau) - 1 = E_k + (1 + E_k) p(r)} with a table
 * {@code E_k = exp(-k/64) - 1} and p the Taylor sum of {@code exp(-r) - 1} to r^6; the term left out is below 5e-17 of r.
 * The split of tau is exact, since k/64 is. Table method: Tang (1989), ACM TOMS 15(2), 144-157. Differences: steps of 1/64
 * and not of ln 2 / 32, as the range is short. Measured against {@code StrictMath.expm1} in {@code FastExpTest}.
 */
final class FastExp {
    private static final double STEPS = 64;
    /** From here on exp(-tau) is below half a unit in the last place of 1. */
    private static final double LAST = 40;
    private static final double[] TABLE = table();

    private FastExp() {
    }

    /** {@code exp(-tau) - 1}; any tau: outside 0..40, and for NaN, by the slow library function. */
    static double minusOpacity(double tau) {
        if (!(tau >= 0 && tau < LAST)) {
            return StrictMath.expm1(-tau);
        }
        int k = (int) (tau * STEPS + 0.5);
        double r = k * (1 / STEPS) - tau;
        double p = r * (1 + r * (1.0 / 2 + r * (1.0 / 6 + r * (1.0 / 24 + r * (1.0 / 120 + r * (1.0 / 720))))));
        double e = TABLE[k];
        return e + (1 + e) * p;
    }

    private static double[] table() {
        double[] table = new double[(int) (LAST * STEPS) + 2];
        for (int k = 0; k < table.length; k++) {
            table[k] = StrictMath.expm1(-k / STEPS);
        }
        return table;
    }
}

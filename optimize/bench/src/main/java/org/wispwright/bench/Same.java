package org.wispwright.bench;

import org.wispwright.optimize.flow.SmokeState;

/** Do both sides of a benchmark give the same answer? If not, it must not run. */
public final class Same {
    private Same() {
    }

    /**
     * Refuses values that differ by more than a share of the largest expected one.
     *
     * @param share 0 asks for the same bits
     * @throws IllegalStateException naming the worst place
     */
    public static void close(String what, float[] got, float[] expected, double share) {
        require(what, got.length, expected.length);
        double[] g = new double[got.length];
        double[] e = new double[got.length];
        for (int n = 0; n < g.length; n++) {
            g[n] = got[n];
            e[n] = expected[n];
        }
        close(what, g, e, share);
    }

    /** As for floats. */
    public static void close(String what, double[] got, double[] expected, double share) {
        require(what, got.length, expected.length);
        double largest = 0;
        double most = -1;
        int worst = 0;
        for (int n = 0; n < got.length; n++) {
            largest = Math.max(largest, Math.abs(expected[n]));
            double difference = Math.abs(got[n] - expected[n]);
            // NaN is the worst of all, and stays so: no later difference is above it.
            if (difference > most || Double.isNaN(difference) && !Double.isNaN(most)) {
                most = difference;
                worst = n;
            }
        }
        if (!(largest > 0)) {
            throw new IllegalStateException(what + ": everything expected is 0, so the check shows nothing; give it other values");
        }
        if (!(most <= share * largest)) {
            throw new IllegalStateException(what + ": the two sides differ; worst at " + worst + ": got " + got[worst] + ", expected "
                    + expected[worst] + ", needs a difference of at most " + share * largest);
        }
    }

    /** Refuses states that differ in a bit. */
    public static void bits(String what, SmokeState got, SmokeState expected) {
        close(what + ", density", got.density().values(), expected.density().values(), 0);
        close(what + ", x velocity", got.velocity().x(), expected.velocity().x(), 0);
        close(what + ", y velocity", got.velocity().y(), expected.velocity().y(), 0);
        close(what + ", z velocity", got.velocity().z(), expected.velocity().z(), 0);
    }

    private static void require(String what, int got, int expected) {
        if (got != expected) {
            throw new IllegalStateException(what + ": got " + got + " values, expected " + expected);
        }
    }
}

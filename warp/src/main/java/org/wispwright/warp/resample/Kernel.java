package org.wispwright.warp.resample;

/** Interpolation from samples at -1, 0, 1, 2 to a place t in [0,1). Weights sum to 1. */
public enum Kernel {
    /** {@code (0, 1-t, t, 0)}: second order. */
    LINEAR {
        @Override
        public void weights(double t, double[] out) {
            out[0] = 0;
            out[1] = 1 - t;
            out[2] = t;
            out[3] = 0;
        }
    },
    /** Keys (1981), IEEE ASSP 29(6), 1153-1160, with a = -1/2: third order; what this tool resamples with. */
    KEYS {
        @Override
        public void weights(double t, double[] out) {
            keys(-0.5, t, out);
        }
    },
    /** The same formula with a = -3/4: sharper, second order. */
    KEYS_SHARP {
        @Override
        public void weights(double t, double[] out) {
            keys(-0.75, t, out);
        }
    },
    /** Mitchell and Netravali (1988), SIGGRAPH 88, 221-228, with B = C = 1/3; it does not pass through the samples. */
    MITCHELL_NETRAVALI {
        @Override
        public void weights(double t, double[] out) {
            familyBC(1.0 / 3, 1.0 / 3, t, out);
        }
    },
    /** Uniform cubic B-spline, the member B = 1, C = 0 of the same family; it does not pass through the samples. */
    CUBIC_B_SPLINE {
        @Override
        public void weights(double t, double[] out) {
            familyBC(1, 0, t, out);
        }
    };

    /** Overwrites {@code out[0..3]} with the weights of the samples at -1, 0, 1, 2 for the place t in [0,1). */
    public abstract void weights(double t, double[] out);

    /** {@code |s| < 1: (a+2)|s|^3 - (a+3)|s|^2 + 1; 1 <= |s| < 2: a|s|^3 - 5a|s|^2 + 8a|s| - 4a = a (|s|-1) (2-|s|)^2}. */
    private static void keys(double a, double t, double[] out) {
        for (int n = 0; n < 4; n++) {
            double s = Math.abs(t - (n - 1));
            out[n] = s < 1 ? ((a + 2) * s - (a + 3)) * s * s + 1 : a * (s - 1) * (2 - s) * (2 - s);
        }
    }

    /** Equation 8 of Mitchell and Netravali (1988); the outer piece in powers of 2 - s, which rounds less. */
    private static void familyBC(double b, double c, double t, double[] out) {
        for (int n = 0; n < 4; n++) {
            double s = Math.abs(t - (n - 1));
            double q = 2 - s;
            out[n] = s < 1 ? (((12 - 9 * b - 6 * c) * s + (-18 + 12 * b + 6 * c)) * s * s + (6 - 2 * b)) / 6
                    : (b / 6 * q - c * (s - 1)) * q * q;
        }
    }
}

package org.wispwright.warp.resample;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Outside checks W22-W29. Keys (1981), IEEE ASSP 29(6), 1153-1160; Mitchell and Netravali (1988), SIGGRAPH 88. */
class KernelTest {
    private static final double EXACT = Double.MIN_VALUE;

    /** W22: weights with a = -1/2, exact in binary (only the sign of a zero is left open). */
    @Test
    void w22_keysWeights() {
        assertArrayEquals(new double[] {0, 1, 0, 0}, weights(Kernel.KEYS, 0), EXACT);
        assertArrayEquals(new double[] {-0.0478515625, 0.9638671875, 0.0908203125, -0.0068359375}, weights(Kernel.KEYS, .125), EXACT);
        assertArrayEquals(new double[] {-0.0703125, 0.8671875, 0.2265625, -0.0234375}, weights(Kernel.KEYS, .25), EXACT);
        assertArrayEquals(new double[] {-1.0 / 16, 9.0 / 16, 9.0 / 16, -1.0 / 16}, weights(Kernel.KEYS, .5), EXACT);
        assertArrayEquals(new double[] {-0.0234375, 0.2265625, 0.8671875, -0.0703125}, weights(Kernel.KEYS, .75), EXACT);
    }

    /** W23: a = -3/4, which must not be mistaken for it. */
    @Test
    void w23_keysSharpWeights() {
        assertArrayEquals(new double[] {-0.09375, 0.59375, 0.59375, -0.09375}, weights(Kernel.KEYS_SHARP, .5), EXACT);
        assertArrayEquals(new double[] {-0.10546875, 0.87890625, 0.26171875, -0.03515625}, weights(Kernel.KEYS_SHARP, .25), EXACT);
    }

    /** W24: 1, 3, 2, 5. */
    @Test
    void w24_keysOnFourSamples() {
        assertEquals(2.8671875, at(Kernel.KEYS, .25, 1, 3, 2, 5));
        assertEquals(2.4375, at(Kernel.KEYS, .5, 1, 3, 2, 5));
    }

    /** W25: quadratics are reproduced, cubics are not. */
    @Test
    void w25_keysReproducesQuadraticsOnly() {
        assertEquals(0.09, at(Kernel.KEYS, .3, 1, 0, 1, 4), 1e-12);
        assertEquals(0.111, at(Kernel.KEYS, .3, -1, 0, 1, 8), 1e-12);
    }

    /** W26: largest error on sin(2 pi x), N samples, at a quarter, a half and three quarters between them. */
    @Test
    void w26_orderOnASine() {
        double[] linear = {1.8845514148e-2, 4.7920864706e-3, 1.2030928691e-3, 3.0109059362e-4};
        double[] keys = {9.8799425255e-4, 1.1975347108e-4, 1.4832361048e-5, 1.8496105327e-6};
        for (int k = 0; k < 4; k++) {
            int n = 16 << k;
            assertEquals(linear[k], largestError(Kernel.LINEAR, n), 1e-8 * linear[k]);
            assertEquals(keys[k], largestError(Kernel.KEYS, n), 1e-8 * keys[k]);
        }
    }

    /** W27: Mitchell and Netravali, B = C = 1/3. */
    @Test
    void w27_mitchellNetravali() {
        assertArrayEquals(new double[] {1.0 / 18, 16.0 / 18, 1.0 / 18, 0}, weights(Kernel.MITCHELL_NETRAVALI, 0), 1e-15);
        assertArrayEquals(new double[] {-0.034722222222222, 0.534722222222222, 0.534722222222222, -0.034722222222222},
                weights(Kernel.MITCHELL_NETRAVALI, .5), 1e-14);
    }

    /** W28: cubic B-spline. */
    @Test
    void w28_cubicBSpline() {
        assertArrayEquals(new double[] {1.0 / 6, 2.0 / 3, 1.0 / 6, 0}, weights(Kernel.CUBIC_B_SPLINE, 0), 1e-15);
        assertArrayEquals(new double[] {1.0 / 48, 23.0 / 48, 23.0 / 48, 1.0 / 48}, weights(Kernel.CUBIC_B_SPLINE, .5), 1e-15);
    }

    /** W29: weights sum to 1, within 1e-15. */
    @ParameterizedTest
    @EnumSource(Kernel.class)
    void w29_weightsSumToOne(Kernel kernel) {
        for (int n = 0; n < 64; n++) {
            double[] w = weights(kernel, n / 64.0);
            assertEquals(1, w[0] + w[1] + w[2] + w[3], 1e-15, kernel + " at " + n / 64.0);
        }
    }

    @Test
    void theErrorsOfW26FallWithTheirOrder() {
        assertTrue(largestError(Kernel.KEYS, 64) / largestError(Kernel.KEYS, 128) > 7.9);
        assertTrue(largestError(Kernel.KEYS_SHARP, 64) / largestError(Kernel.KEYS_SHARP, 128) < 4.5, "a = -3/4 is of second order only");
    }

    private static double largestError(Kernel kernel, int n) {
        DoubleUnaryOperator f = x -> Math.sin(2 * Math.PI * x);
        double worst = 0;
        for (int i = 0; i < n; i++) {
            for (double t : new double[] {.25, .5, .75}) {
                double[] w = weights(kernel, t);
                double value = 0;
                for (int k = 0; k < 4; k++) {
                    value += w[k] * f.applyAsDouble((i - 1 + k) / (double) n);
                }
                worst = Math.max(worst, Math.abs(value - f.applyAsDouble((i + t) / n)));
            }
        }
        return worst;
    }

    private static double[] weights(Kernel kernel, double t) {
        double[] w = new double[4];
        kernel.weights(t, w);
        return w;
    }

    private static double at(Kernel kernel, double t, double... samples) {
        double[] w = weights(kernel, t);
        return w[0] * samples[0] + w[1] * samples[1] + w[2] * samples[2] + w[3] * samples[3];
    }
}

package org.wispwright.optimize.search;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;

/** O71: the contract's own Taylor test on a function whose remainders are known to the last digit. */
class RosenbrockTaylorTest extends PullbackContract {
    private static final double[] AT = {-1.2, 1};
    private static final double[] ALONG = {.6, .8};

    @Override
    protected Operator operator() {
        return new Operator("Rosenbrock", 2, 1, false, AT, new double[] {.1 * ALONG[0], .1 * ALONG[1]},
                (in, out) -> out[0] = value(in), (in, outBar, inBar) -> {
            double[] g = new double[2];
            MoreGarbowHillstrom.objective(1).evaluate(in, g);
            inBar[0] += outBar[0] * g[0];
            inBar[1] += outBar[0] * g[1];
        });
    }

    @Override
    protected double noise() {
        return 1e-14;                                                          // all in double
    }

    @Override
    protected double dotTolerance() {
        return 1e-10;                                                          // a quartic: Richardson leaves rounding only
    }

    /** O71: worked table, h = .1 x 2^-k, k = 0..6, digits as given; slopes between neighbours to the digits given. */
    @Test
    void o71_remaindersOfRosenbrock() {
        double[] r0 = {14.797984, 8.673579, 4.6628899375, 2.41390843359, 1.22768779272, 0.619042030014, 0.310822392501};
        double[] r1 = {5.178016, 1.314421, 0.3311100625, 0.0830915664062, 0.0208122072754, 0.00520796998595, 0.00130260749912};
        double[] slopes0 = {.7707, .8954, .9499, .9754, .9878, .9939};
        double[] slopes1 = {1.9780, 1.9890, 1.9945, 1.9973, 1.9986, 1.9993};
        double[] g = new double[2];
        double f = MoreGarbowHillstrom.objective(1).evaluate(AT, g);
        assertArrayEquals(new double[] {-215.6, -88}, g, 1e-12);
        double slope = CurvaturePairs.dot(g, ALONG);
        assertEquals(-199.76, slope, 1e-12);
        double before0 = 0;
        double before1 = 0;
        for (int k = 0; k <= 6; k++) {
            double h = .1 * Math.pow(2, -k);
            double change = value(new double[] {AT[0] + h * ALONG[0], AT[1] + h * ALONG[1]}) - f;
            double now0 = Math.abs(change);
            double now1 = Math.abs(change - h * slope);
            assertEquals(r0[k], now0, 1e-12 * 24.2, "R0, k " + k);
            assertEquals(r1[k], now1, 1e-14 * 24.2, "R1, k " + k);
            if (k > 0) {
                assertEquals(slopes0[k - 1], Math.log(before0 / now0) / Math.log(2), 5.1e-5, "R0, k " + k);
                assertEquals(slopes1[k - 1], Math.log(before1 / now1) / Math.log(2), 5.1e-5, "R1, k " + k);
            }
            before0 = now0;
            before1 = now1;
        }
        double h = 1e-3;                                                       // half d.H.d is exact up to the cubic term
        double twoSided = (value(moved(h)) - 2 * f + value(moved(-h))) / (2 * h * h);
        assertEquals(533.8, twoSided, 1e-4);
    }

    private static double[] moved(double h) {
        return new double[] {AT[0] + h * ALONG[0], AT[1] + h * ALONG[1]};
    }

    private static double value(double[] x) {
        return MoreGarbowHillstrom.objective(1).evaluate(x, new double[2]);
    }
}

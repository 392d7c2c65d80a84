package org.wispwright.optimize.search;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.junit.jupiter.api.Test;

class CurvaturePairsTest {

    /** O64: Nocedal and Wright (2006), Numerical Optimization, algorithm 7.4, worked by hand; the dense formula is the slow twin. */
    @Test
    void o64_twoPairs() {
        CurvaturePairs pairs = new CurvaturePairs(8);
        assertTrue(pairs.add(new double[] {1, 0, 1}, new double[] {1, 0, 9}));
        assertTrue(pairs.add(new double[] {0, 1, -1}, new double[] {0, 4, -9}));
        double[] d = new double[3];
        pairs.direction(new double[] {1, 2, 3}, d);
        assertArrayEquals(new double[] {-0.492212529738303, -0.353768071737937, -0.268341365216861}, d, 1e-13);
        assertArrayEquals(dense(pairs, new double[] {1, 2, 3}, 13 / 97.), d, 1e-13);
        pairs.direction(new double[] {0, 4, -9}, d);
        assertArrayEquals(new double[] {0, -1, 1}, d, 1e-13, "H y2 = s2");
    }

    /** O65: the same with the last pair only, because only one is kept. */
    @Test
    void o65_theLastPairOnly() {
        CurvaturePairs pairs = new CurvaturePairs(1);
        pairs.add(new double[] {1, 0, 1}, new double[] {1, 0, 9});
        pairs.add(new double[] {0, 1, -1}, new double[] {0, 4, -9});
        double[] d = new double[3];
        pairs.direction(new double[] {1, 2, 3}, d);
        assertArrayEquals(new double[] {-13 / 97., -443 / 1261., -337 / 1261.}, d, 1e-15);
        assertArrayEquals(new double[] {-0.134020618556701, -0.351308485329104, -0.267248215701824}, d, 1e-13);
    }

    /** O66: steepest descent (no pairs) with exact steps on (x^2 + 10 y^2)/2 from (10,1) reaches the Kantorovich bound (9/11)^2. */
    @Test
    void o66_steepestDescentReachesTheKantorovichBound() {
        double[] x = {10, 1};
        double[] f = {55, 36.818181818181820, 24.646882043576260, 16.499152442394024};
        CurvaturePairs none = new CurvaturePairs(0);
        for (int n = 0; n < 4; n++) {
            assertEquals(f[n], bowl(x), 1e-13 * f[n]);
            double before = bowl(x);
            exactStep(x, none);
            assertEquals(0.6694214876033058, bowl(x) / before, 1e-14);
        }
        assertEquals(0, none.count());
    }

    /** O67: L-BFGS with exact steps on the same function is conjugate gradients (Nazareth 1979): it ends in 2 steps. */
    @Test
    void o67_exactStepsEndInTwo() {
        double[] x = {10, 1};
        CurvaturePairs pairs = new CurvaturePairs(8);
        exactStep(x, pairs);
        assertArrayEquals(new double[] {8.181818181818182, -.818181818181818}, x, 1e-14);
        assertEquals(36.8181818, bowl(x), 5e-8);
        exactStep(x, pairs);
        assertArrayEquals(new double[] {0, 0}, x, 1e-14);
        assertEquals(0, bowl(x), 1e-27);
    }

    /** O68: pairs with s.y at or below 0 are skipped, and the direction goes downhill whatever pairs were offered. */
    @Test
    void o68_skippedPairsAndDownhillDirections() {
        CurvaturePairs pairs = new CurvaturePairs(8);
        assertFalse(pairs.add(new double[] {1, 0}, new double[] {0, 1}), "s.y = 0");
        assertFalse(pairs.add(new double[] {1, 0}, new double[] {-1, 5}), "s.y < 0");
        assertFalse(pairs.add(new double[] {1, 0}, new double[] {Double.NaN, 1}), "s.y is NaN");
        assertFalse(pairs.add(new double[2], new double[2]), "no move");
        assertEquals(0, pairs.count());
        Random random = new Random(42);
        CurvaturePairs many = new CurvaturePairs(8);
        int kept = 0;
        int skipped = 0;
        for (int n = 0; n < 400; n++) {
            double[] s = random.doubles(5, -1, 1).toArray();
            double[] y = random.doubles(5, -1, 1).toArray();
            boolean positive = CurvaturePairs.dot(s, y) > 0;
            assertEquals(positive, many.add(s, y));
            kept += positive ? 1 : 0;
            skipped += positive ? 0 : 1;
            double[] g = random.doubles(5, -1, 1).toArray();
            double[] d = new double[5];
            many.direction(g, d);
            assertTrue(CurvaturePairs.dot(g, d) < 0, "seed 42, offer " + n);
        }
        assertTrue(kept > 100 && skipped > 100, "both kinds were met");
        assertEquals(8, many.count());
    }

    /**
     * Padding by zeros: the old unknowns' direction does not change, the new ones get the least scale s.y / y.y of the pairs, here 10/82 of
     * 10/82 and 13/97, times their gradient; once a pair knows of them, its own: 1/2. By hand from O64.
     */
    @Test
    void paddedPairsSayNothingOfNewUnknownsButTheirScale() {
        CurvaturePairs pairs = new CurvaturePairs(8);
        pairs.add(new double[] {1, 0, 1}, new double[] {1, 0, 9});
        pairs.add(new double[] {0, 1, -1}, new double[] {0, 4, -9});
        pairs.extend(5);
        double[] d = new double[5];
        pairs.direction(new double[] {1, 2, 3, 97, -194}, d);
        assertArrayEquals(new double[] {-0.492212529738303, -0.353768071737937, -0.268341365216861, -97 * 10 / 82.0, 194 * 10 / 82.0}, d,
                1e-12);
        pairs.add(new double[] {0, 0, 0, 0, 1}, new double[] {0, 0, 0, 0, 2});
        pairs.direction(new double[] {0, 0, 0, 4, 4}, d);
        assertArrayEquals(new double[] {0, 0, 0, -2, -2}, d, 1e-12);
    }

    private static double bowl(double[] x) {
        return (x[0] * x[0] + 10 * x[1] * x[1]) / 2;
    }

    private static void exactStep(double[] x, CurvaturePairs pairs) {
        double[] g = {x[0], 10 * x[1]};
        double[] d = new double[2];
        pairs.direction(g, d);
        double a = -CurvaturePairs.dot(g, d) / (d[0] * d[0] + 10 * d[1] * d[1]);
        double[] s = {a * d[0], a * d[1]};
        double[] y = {s[0], 10 * s[1]};
        x[0] += s[0];
        x[1] += s[1];
        pairs.add(s, y);
    }

    /** Minus H g by H' = (I - rho s y^T) H (I - rho y s^T) + rho s s^T, oldest pair first. */
    private static double[] dense(CurvaturePairs pairs, double[] g, double gamma) {
        int n = g.length;
        double[][] h = new double[n][n];
        for (int i = 0; i < n; i++) {
            h[i][i] = gamma;
        }
        for (int p = 0; p < pairs.count(); p++) {
            double[] s = pairs.s(p);
            double[] y = pairs.y(p);
            double rho = 1 / CurvaturePairs.dot(s, y);
            double[][] left = new double[n][n];
            double[][] next = new double[n][n];
            for (int i = 0; i < n; i++) {
                for (int j = 0; j < n; j++) {
                    for (int k = 0; k < n; k++) {
                        left[i][j] += ((i == k ? 1 : 0) - rho * s[i] * y[k]) * h[k][j];
                    }
                }
            }
            for (int i = 0; i < n; i++) {
                for (int j = 0; j < n; j++) {
                    next[i][j] = rho * s[i] * s[j];
                    for (int k = 0; k < n; k++) {
                        next[i][j] += left[i][k] * ((k == j ? 1 : 0) - rho * y[k] * s[j]);
                    }
                }
            }
            h = next;
        }
        double[] out = new double[n];
        for (int i = 0; i < n; i++) {
            out[i] = -CurvaturePairs.dot(h[i], g);
        }
        return out;
    }
}

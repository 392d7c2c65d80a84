package org.wispwright.warp.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Outside checks 4.2: Wasserstein distances on a line. */
class EarthMoverTest {
    /** U44: a published manual's three examples. */
    @Test
    void u44_publishedExamples() {
        assertEquals(5, EarthMover.w1(new double[] {0, 1, 3}, new double[] {5, 6, 8}), 1e-12);
        double[] two = {0, 1};
        assertEquals(.25, EarthMover.w1(two, new double[] {3, 1}, two, new double[] {2, 2}), 1e-12);
        assertEquals(4.078133143804786, EarthMover.w1(new double[] {3.4, 3.9, 7.5, 7.8}, new double[] {1.4, .9, 3.1, 7.2},
                new double[] {4.5, 1.4}, new double[] {3.2, 3.5}), 1e-12);
    }

    /** U45: a shift by c costs c, whatever the shape and the order of the values. */
    @Test
    void u45_shift() {
        double[] a = normal();
        double[] b = new double[a.length];
        Arrays.setAll(b, n -> a[a.length - 1 - n] + 1.75);
        assertEquals(1.75, EarthMover.w1(a, b), 1e-12);
        assertEquals(1.75, EarthMover.w2(a, b), 1e-12);
    }

    /** U45: normals (0,1) and (3,2): sqrt 10. Samples scaled to mean 0, variance 1 exactly, so the closed form holds for them too. */
    @Test
    void u45_normals() {
        double[] a = normal();
        double[] b = new double[a.length];
        Arrays.setAll(b, n -> 3 + 2 * a[n]);
        assertEquals(3.1622776601683795, EarthMover.w2(a, b), 1e-12);
    }

    /** U45: uniform [0,1] to [0,2]: W1 1/2; W2 1/sqrt 3, where n samples at the middles give sqrt(1/3 - 1/(12 n^2)). */
    @Test
    void u45_uniforms() {
        int n = 100_000;
        double[] a = new double[n];
        double[] b = new double[n];
        Arrays.setAll(a, i -> (i + .5) / n);
        Arrays.setAll(b, i -> 2 * (i + .5) / n);
        assertEquals(.5, EarthMover.w1(a, b), 1e-10);
        assertEquals(0.5773502691896258, EarthMover.w2(a, b), 1e-10);
    }

    /** U46: histograms, weight at the middle of each bin. */
    @Test
    void u46_histograms() {
        double[] a = {0, 1, 2, 1, 0, 0};
        double[] b = {0, 0, 1, 2, 1, 0};
        assertEquals(1, EarthMover.w1OfHistograms(a, b, 1));
        double[] ends = {.5, 0, 0, 0, 0, .5};
        double[] middle = {0, 0, .5, .5, 0, 0};
        assertEquals(2, EarthMover.w1OfHistograms(ends, middle, 1));
        assertEquals(2, EarthMover.w2OfHistograms(ends, middle, 1));
        assertEquals(.5, EarthMover.w1OfHistograms(ends, middle, .25));
    }

    /** Against {@code integral |F - G| dx} (Vallender 1974), which W1 equals, on samples of different counts with ties and zero weights. */
    @Test
    void w1EqualsTheAreaBetweenTheDistributionFunctions() {
        Random random = new Random(7);
        for (int run = 0; run < 50; run++) {
            double[][] v = new double[2][];
            double[][] w = new double[2][];
            for (int s = 0; s < 2; s++) {
                int n = 1 + random.nextInt(9);
                v[s] = new double[n];
                w[s] = new double[n];
                Arrays.setAll(v[s], i -> random.nextInt(12));
                Arrays.setAll(w[s], i -> random.nextInt(4));
                w[s][0] += 1;
            }
            double area = 0;
            for (int x = 0; x < 12; x++) {
                area += Math.abs(below(v[0], w[0], x) - below(v[1], w[1], x));
            }
            assertEquals(area, EarthMover.w1(v[0], w[0], v[1], w[1]), 1e-12, "run " + run + ", seed 7");
        }
    }

    @Test
    void refusesWhatHasNoDistance() {
        double[] one = {1};
        assertThrows(IllegalArgumentException.class, () -> EarthMover.w1(new double[0], one));
        assertThrows(IllegalArgumentException.class, () -> EarthMover.w1(one, new double[] {0}, one, one));
        assertThrows(IllegalArgumentException.class, () -> EarthMover.w1(one, new double[] {-1}, one, one));
        assertThrows(IllegalArgumentException.class, () -> EarthMover.w2(new double[] {Double.NaN}, one));
        assertThrows(IllegalArgumentException.class, () -> EarthMover.w1OfHistograms(one, new double[2], 1));
        assertThrows(IllegalArgumentException.class, () -> EarthMover.w2OfHistograms(one, one, 0));
    }

    private static double below(double[] v, double[] w, int x) {
        double sum = 0;
        double all = 0;
        for (int n = 0; n < v.length; n++) {
            sum += v[n] <= x ? w[n] : 0;
            all += w[n];
        }
        return sum / all;
    }

    private static double[] normal() {
        Random random = new Random(3);
        double[] a = new double[1000];
        Arrays.setAll(a, n -> random.nextGaussian());
        double mean = Arrays.stream(a).average().orElseThrow();
        double deviation = Math.sqrt(Arrays.stream(a).map(v -> (v - mean) * (v - mean)).average().orElseThrow());
        for (int n = 0; n < a.length; n++) {
            a[n] = (a[n] - mean) / deviation;
        }
        return a;
    }
}

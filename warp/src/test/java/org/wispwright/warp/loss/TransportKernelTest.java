package org.wispwright.warp.loss;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.warp.measure.EarthMover;

/** Transport between bins against closed forms, against weighted points, and its potential against differences. */
class TransportKernelTest {
    /** U45's closed forms with mass spread in bins: a shift by 3 bins costs 9; uniform [0,1] to [0,2] costs 1/3. */
    @Test
    void u45_closedForms() {
        double[] potential = new double[7];
        double[] f = cumulated(1, 2, 0, 1, 0, 0, 0);
        double[] g = cumulated(0, 0, 0, 1, 2, 0, 1);
        assertEquals(9, TransportKernel.squaredDistance(f, g, potential), 1e-14);
        assertEquals(9, TransportKernel.squaredDistance(g, f, potential), 1e-14);
        double[] one = cumulated(1, 0, 0);
        double[] two = cumulated(1, 1, 0);
        assertEquals(1.0 / 3, TransportKernel.squaredDistance(one, two, new double[3]), 1e-15);
        assertEquals(1.0 / 3, TransportKernel.squaredDistance(two, one, new double[3]), 1e-15);
    }

    /** U46: two ends (.5 at 0 and 5) to the middle (.5 at 2 and 3): every bin moves by 2. */
    @Test
    void u46_endsToTheMiddle() {
        assertEquals(4, TransportKernel.squaredDistance(cumulated(1, 0, 0, 0, 0, 1), cumulated(0, 0, 1, 1, 0, 0), new double[6]), 1e-15);
    }

    /** Equal distributions, gaps included, cost nothing and pull at nothing. */
    @Test
    void equalDistributionsPullAtNothing() {
        double[] potential = new double[8];
        double[] f = cumulated(0, 1, 2, 0, 0, .5, 1, 0);
        assertEquals(0, TransportKernel.squaredDistance(f, f.clone(), potential), 1e-30);
        for (int i = 1; i < 7; i++) {
            assertEquals(0, potential[i] - potential[1], 1e-14, "bin " + i);
        }
    }

    /** By hand: mass new at the far left of G has to go to G's left end, so the potential there is the squared distance. */
    @Test
    void massBeyondTheEndsByHand() {
        double[] potential = new double[6];
        double[] f = cumulated(0, 0, 0, 1, 0, 0);
        TransportKernel.squaredDistance(f, f.clone(), potential);
        // From bin 3's edge at 3, phi(s) = (s - 3)^2 leftwards: means over bins 2, 1, 0 are 1/3, 7/3, 19/3; to the right alike.
        double[] expected = {19.0 / 3, 7.0 / 3, 1.0 / 3, 0, 1.0 / 3, 7.0 / 3};
        for (int i = 0; i < 6; i++) {
            assertEquals(expected[i], potential[i] - potential[3], 1e-13, "bin " + i);
        }
    }

    /** Each bin as 400 weighted points, carried by {@link EarthMover}: the slow twin. */
    @ParameterizedTest
    @CsvSource({"1,1", "2,2", "5,3", "17,4", "40,5"})
    void equalsManyPoints(int bins, long seed) {
        Random random = new Random(seed);
        double[] a = masses(bins, random, .3);
        double[] b = masses(bins, random, .3);
        int fine = 400;
        double[] places = new double[bins * fine];
        double[] weightsA = new double[places.length];
        double[] weightsB = new double[places.length];
        for (int n = 0; n < places.length; n++) {
            places[n] = (n + .5) / fine;
            weightsA[n] = a[n / fine];
            weightsB[n] = b[n / fine];
        }
        double expected = Math.pow(EarthMover.w2(places, weightsA, places, weightsB), 2);
        double got = TransportKernel.squaredDistance(cumulated(a), cumulated(b), new double[bins]);
        assertEquals(expected, got, 5e-3 * Math.max(.01, expected), "seed " + seed);
    }

    /** The potential is the derivative: central differences, moving a little mass from each bin to the next. */
    @ParameterizedTest
    @CsvSource({"3,1,0", "9,2,0", "30,3,0", "12,4,.3"})
    void potentialIsTheDerivative(int bins, long seed, double empty) {
        Random random = new Random(seed);
        double[] a = masses(bins, random, 0);
        double[] b = masses(bins, random, empty);
        double[] potential = new double[bins];
        TransportKernel.squaredDistance(cumulated(a), cumulated(b), potential);
        double sum = 0;
        for (double m : a) {
            sum += m;
        }
        for (int i = 0; i + 1 < bins; i++) {
            double e = 1e-5;
            double[] plus = a.clone();
            plus[i] -= e * sum;
            plus[i + 1] += e * sum;
            double[] minus = a.clone();
            minus[i] += e * sum;
            minus[i + 1] -= e * sum;
            double slope = (TransportKernel.squaredDistance(cumulated(plus), cumulated(b), new double[bins])
                    - TransportKernel.squaredDistance(cumulated(minus), cumulated(b), new double[bins])) / (2 * e);
            assertEquals(slope, potential[i + 1] - potential[i], 2e-3 * bins, "bins " + i + " and " + (i + 1) + ", seed " + seed);
        }
    }

    private static double[] masses(int bins, Random random, double empty) {
        double[] m = new double[bins];
        for (int i = 0; i < bins; i++) {
            m[i] = random.nextDouble() < empty ? 0 : .2 + random.nextDouble();
        }
        m[bins / 2] += .1;
        return m;
    }

    private static double[] cumulated(double... masses) {
        double[] out = new double[masses.length + 1];
        for (int i = 0; i < masses.length; i++) {
            out[i + 1] = out[i] + masses[i];
        }
        double sum = out[masses.length];
        for (int i = 0; i < out.length; i++) {
            out[i] /= sum;
        }
        return out;
    }
}

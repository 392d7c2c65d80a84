package org.wispwright.optimize.force;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.volume.GridShape;

/** Outside checks O50-O55: bands under Kolmogorov's (1941) k^(-5/3) law. */
class BandPlanTest {

    /** O50: share of the energy above k/k0. */
    @ParameterizedTest @CsvSource({"2,0.629960524947", "2.8284271247461903,.5", "4,0.396850262992", "8,.25", "10,0.215443469003",
        "16,0.157490131237", "32,0.099212565748", "64,.0625", "128,0.0393725328092"})
    void o50_energyAbove(double ratio, double expected) {
        assertEquals(expected, BandPlan.energyAbove(ratio), 1e-12);
    }

    /** O51: the ratio that halves what remains, and the turn-over time k^(-2/3) with it. */
    @Test void o51_growthHalvesWhatRemains() {
        assertEquals(2.8284271247461903, BandPlan.GROWTH, 1e-15);
        assertEquals(0.5, BandPlan.energyAbove(BandPlan.GROWTH), 1e-15);
    }

    /** O52, O53: cut-offs from 1 and from 2 times 2^1.5 up to N/2. */
    @ParameterizedTest @CsvSource(delimiter = ';', value = {
        "1;16;1 2.828 8 16", "1;32;1 2.828 8 22.627 32", "1;64;1 2.828 8 22.627 64", "1;128;1 2.828 8 22.627 64 128",
        "2;16;2 5.657 16", "2;32;2 5.657 16 32", "2;64;2 5.657 16 45.255 64", "2;128;2 5.657 16 45.255 128"})
    void o52_o53_cutoffs(double first, double last, String expected) {
        List<Double> cuts = BandPlan.cutoffs(first, last);
        String[] numbers = expected.split(" ");
        assertEquals(numbers.length, cuts.size());
        for (int n = 0; n < numbers.length; n++) {
            assertEquals(Double.parseDouble(numbers[n]), cuts.get(n), 5e-4);
        }
    }

    /** O54: with an upper end K at N/2 the remaining shares are not halves: (E(k) - E(K)) / (1 - E(K)). */
    @ParameterizedTest @CsvSource(delimiter = ';', value = {"32;1 .406535142 .109802712", "64;1 .444930090 .167395135 .028627658",
        "128;1 .466666667 .2 .066666667 0", "256;1 .479506867 .219260301 .089137017 .024075376"})
    void o54_remainingWithAnUpperEnd(int n, String expected) {
        double top = BandPlan.energyAbove(n / 2.0);
        String[] numbers = expected.split(" ");
        for (int c = 0; c < numbers.length; c++) {
            double left = (BandPlan.energyAbove(Math.pow(BandPlan.GROWTH, c)) - top) / (1 - top);
            assertEquals(Double.parseDouble(numbers[c]), left, 1e-9);
        }
    }

    /** O55: bands of equal energy under that law; the plan does not use them, its law must still give them. */
    @ParameterizedTest @CsvSource(delimiter = ';', value = {"32;1 1.639678 3.445903 16", "64;1 1.466267 2.454271 5.412025 32",
        "128;1 1.492711 2.582567 6.18215 64", "256;1 1.377159 2.069638 3.626853 8.977989 128"})
    void o55_equalEnergyBands(int n, String expected) {
        String[] numbers = expected.split(" ");
        double top = BandPlan.energyAbove(n / 2.0);
        int bands = numbers.length - 1;
        for (int b = 0; b < bands; b++) {
            double low = BandPlan.energyAbove(Double.parseDouble(numbers[b]));
            double high = BandPlan.energyAbove(Double.parseDouble(numbers[b + 1]));
            assertEquals(1.0 / bands, (low - high) / (1 - top), 1e-6);
        }
    }

    /** The plan of a box: bands join without a gap, splines double, the last wave spans no fewer cells than stated. */
    @Test void aBoxGetsJoiningBands() {
        List<Band> bands = BandPlan.of(new GridShape(48, 64, 48, 0.1), 47);
        assertEquals(0, bands.get(0).low());
        for (int b = 1; b < bands.size(); b++) {
            assertEquals(bands.get(b - 1).high(), bands.get(b).low());
            assertEquals(2 * bands.get(b - 1).splines(), bands.get(b).splines());
        }
        assertEquals(1 / (BandPlan.LEAST_CELLS_A_CYCLE * 0.1), bands.get(bands.size() - 1).high(), 1e-12);
        assertTrue(bands.size() >= 2);
        assertEquals(1, BandPlan.of(new GridShape(8, 8, 8, 1), 2).get(0).splines() / 2);
    }
}

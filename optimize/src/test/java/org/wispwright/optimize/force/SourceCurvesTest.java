package org.wispwright.optimize.force;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;

/** Outside checks O69, O70 for strengths of sources; and what follows by hand from splines that add up to 1. */
class SourceCurvesTest extends PullbackContract {
    private static final int STEPS = 21;
    /** All steps; six in the middle; none; one. */
    private static final SourceCurves CURVES = new SourceCurves(STEPS, List.of(new SourceCurves.Span(0, STEPS), new SourceCurves.Span(9,
            15),
            new SourceCurves.Span(4, 4), new SourceCurves.Span(20, 21)), 0.7);

    @Override protected Operator operator() {
        int count = CURVES.unknowns();
        int out = STEPS * CURVES.sources();
        Random random = new Random(3);
        double[] point = random.doubles(count, -0.8, 0.8).toArray();
        double[] way = random.doubles(count, -0.1, 0.1).toArray();
        return new Operator("source curves", count, out, false, point, way, (in, to) -> {
            double[][] strengths = CURVES.strengths(in);
            for (int n = 0; n < out; n++) {
                to[n] = strengths[n / CURVES.sources()][n % CURVES.sources()];
            }
        }, (in, toBar, inBar) -> {
            double[][] bar = new double[STEPS][CURVES.sources()];
            for (int n = 0; n < out; n++) {
                bar[n / CURVES.sources()][n % CURVES.sources()] = toBar[n];
            }
            CURVES.pullback(in, bar, inBar);
        });
    }

    /**
     * By hand: round(21 / 8) = 3 spans of cubics are 6 splines, round(6 / 8) = 1 is 4; a source that feeds nothing has none, one
     * step one.
     */
    @Test void countsItsUnknowns() {
        assertEquals(6 + 4 + 0 + 1, CURVES.unknowns());
    }

    /** By hand: g(0) = ln(1 + e - 1) = 1, so nothing changes at x = 0; outside its span a source has strength 1 whatever x. */
    @Test void oneAtZeroAndOutside() {
        for (double[] row : CURVES.strengths(new double[CURVES.unknowns()])) {
            for (double strength : row) {
                assertEquals(1, strength, 1e-15);
            }
        }
        double[] x = new double[CURVES.unknowns()];
        Arrays.fill(x, 3);
        double[][] strengths = CURVES.strengths(x);
        for (int t = 0; t < STEPS; t++) {
            assertEquals(t >= 9 && t < 15, strengths[t][1] > 1.5, "step " + t);
            assertEquals(1, strengths[t][2]);
            assertEquals(t == 20, strengths[t][3] != 1);
        }
    }

    /** By hand: equal y make a steady strength g(y), g(1) = ln(1 + (e - 1) e) = 1.73533; and they have the norm of the unit. */
    @Test void aSteadyStrengthHasTheUnitsNorm() {
        double[] x = new double[CURVES.unknowns()];
        Arrays.fill(x, 0, 6, 0.7 / Math.sqrt(6));
        assertEquals(0.7, Math.sqrt(Arrays.stream(x).map(v -> v * v).sum()), 1e-12);
        for (double[] row : CURVES.strengths(x)) {
            assertEquals(Math.log(1 + (Math.E - 1) * Math.E), row[0], 1e-12);
            assertEquals(1.73533, row[0], 5e-6);
        }
    }

    /** A source can be shut and cannot be turned round; very large unknowns stay finite. */
    @Test void neverNegativeAlwaysFinite() {
        double[] x = new double[CURVES.unknowns()];
        Arrays.fill(x, -1e6);
        assertTrue(Arrays.stream(CURVES.strengths(x)).allMatch(row -> row[0] >= 0 && row[0] < 1e-12));
        Arrays.fill(x, 1e6);
        assertTrue(Arrays.stream(CURVES.strengths(x)).allMatch(row -> row[0] > 1e6 && Double.isFinite(row[0])));
    }

    @Test void refusesWhatItCannotUse() {
        List<SourceCurves.Span> spans = List.of(new SourceCurves.Span(0, 5));
        assertThrows(IllegalArgumentException.class, () -> new SourceCurves(4, spans, 1));
        assertThrows(IllegalArgumentException.class, () -> new SourceCurves(5, List.of(new SourceCurves.Span(-1, 5)), 1));
        for (double unit : new double[] {0, -1, Double.NaN, Double.POSITIVE_INFINITY}) {
            assertThrows(IllegalArgumentException.class, () -> new SourceCurves(5, spans, unit));
        }
    }
}

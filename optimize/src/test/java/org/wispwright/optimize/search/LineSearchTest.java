package org.wispwright.optimize.search;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.optimize.search.LineSearch.End;
import org.wispwright.optimize.search.LineSearch.Found;
import org.wispwright.optimize.search.LineSearch.Rule;

class LineSearchTest {

    /**
     * O62: Moré and Thuente (1994), ACM TOMS 20(3), 286-307, tables I-VI; evaluations, step and slope as the authors' routine gives them.
     * A step is checked to half a unit of its last printed digit, and so is a slope.
     */
    @ParameterizedTest(name = "O62 function {0} from {3}")
    @CsvSource({
        "1, .001, .1, 1e-3, 6, 1.3650, -9.1645e-3", "1, .001, .1, 1e-1, 3, 1.44137, 4.6645e-3",
        "1, .001, .1, 10, 1, 10, 9.4195e-3", "1, .001, .1, 1000, 4, 36.8876, 7.3169e-4",
        "2, .1, .1, 1e-3, 12, 1.5960, ~", "2, .1, .1, 1e-1, 8, 1.5960, 1.01e-10",
        "2, .1, .1, 10, 8, 1.5960, -4.9725e-9", "2, .1, .1, 1000, 11, 1.5960, -2.3091e-8",
        "3, .1, .1, 1e-3, 12, 1.000, -5.1440e-5", "3, .1, .1, 1e-1, 12, 1.000, -1.9224e-4",
        "3, .1, .1, 10, 10, 1.000, -1.9892e-6", "3, .1, .1, 1000, 13, 1.000, -1.5789e-5",
        "4, .001, .001, 1e-3, 4, 0.0850, -6.8531e-5", "4, .001, .001, 1e-1, 1, 0.1000, -4.9330e-5",
        "4, .001, .001, 10, 3, 0.349105, -2.9195e-6", "4, .001, .001, 1000, 4, 0.829401, 1.6436e-5",
        "5, .001, .001, 1e-3, 6, 0.0750109, 1.9025e-4", "5, .001, .001, 1e-1, 3, 0.0775104, 7.3935e-4",
        "5, .001, .001, 10, 7, 0.0731420, -2.5691e-4", "5, .001, .001, 1000, 8, 0.0761593, 4.4913e-4",
        "6, .001, .001, 1e-3, 13, 0.927903, 5.2203e-4", "6, .001, .001, 1e-1, 11, 0.926150, 8.3588e-5",
        "6, .001, .001, 10, 8, 0.924782, -2.3788e-4", "6, .001, .001, 1000, 11, 0.924398, -3.2498e-4"})
    void o62_tablesOneToSix(int function, double mu, double eta, double first, int evaluations, String step, String slope) {
        MoreThuenteSlices.Counted slice = (MoreThuenteSlices.Counted) MoreThuenteSlices.slice(function);
        double value0 = slice.evaluate(0);
        double slope0 = slice.slope();
        slice.evaluations = 0;
        Rule rule = new Rule(mu, eta, 1e-10, 0, 4 * Math.max(1, first), 40, 0);
        Found found = new LineSearch(rule).search(slice, value0, slope0, first);
        assertEquals(evaluations, found.evaluations(), found.toString());
        assertEquals(Double.parseDouble(step), found.step(), halfOfLastDigit(step), found.toString());
        if (slope.equals("~")) {
            assertTrue(Math.abs(found.slope()) <= 7e-9, () -> "the row gives a range, up to 7e-9; " + found);
        } else {
            assertEquals(Double.parseDouble(slope), found.slope(), halfOfLastDigit(slope), found.toString());
        }
        assertEquals(End.WOLFE, found.end(), found.toString());
        assertTrue(found.value() <= value0 + mu * found.step() * slope0, found.toString());
        assertTrue(Math.abs(found.slope()) <= eta * Math.abs(slope0), found.toString());
        assertEquals(slice.evaluations, found.evaluations());
    }

    /** O62: start values of the same six functions, so that a match above is a match on the right functions. */
    @ParameterizedTest(name = "O62 start of function {0}")
    @CsvSource({"1, 0, -.5, 1.4142135623730951, -.3535533905932738", "2, -5.10976e-10, -5.1072e-7, 1.596, -2.62144",
        "3, 1, -.01, 1, -0.01116034806779", "4, 1, -.9990000005, .5, .999002497998877",
        "5, 1.00004049877494, -.990049503725434, .07419870787308, .991384812242598",
        "6, 1.00004049877494, -.998950553720815, .925801292126919, .991384812242598"})
    void o62_startsAndMinima(int function, double value0, double slope0, double minimiser, double minimum) {
        LineSearch.Slice slice = MoreThuenteSlices.slice(function);
        assertEquals(value0, slice.evaluate(0), function == 2 ? 1e-21 : 2e-14);
        assertEquals(slope0, slice.slope(), function == 2 ? 1e-18 : 1e-14);
        assertEquals(minimum, slice.evaluate(minimiser), 1e-12);
    }

    /**
     * O63: Nocedal and Wright (2006), Numerical Optimization, 3.1, on phi = (a-1)^2/2 - 1/2: the ends are accepted, just outside
     * is not.
     */
    @Test
    void o63_whichStepsTheConditionsAccept() {
        assertAccepted(new Rule(1e-4, .9, 0, 0, 10, 20, 0), .1, 1.9);
        assertAccepted(new Rule(1e-4, .1, 0, 0, 10, 20, 0), .9, 1.1);
        Rule rule = new Rule(1e-4, .9, 0, 0, 10, 20, 0);
        assertTrue(rule.decreases(0, -1, 1.9998 - 1e-12, parabola(1.9998 - 1e-12)));
        assertFalse(rule.decreases(0, -1, 1.9998 + 1e-12, parabola(1.9998 + 1e-12)));
    }

    /**
     * Backing off, derived by hand: phi = -a while a &lt;= 0.03, NaN beyond. From 1 the trials are 1, 0.1, 0.01; then never past
     * 0.09.
     */
    @Test
    void aValueThatIsNotFiniteIsNeverAccepted() {
        for (double bad : new double[] {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY}) {
            MoreThuenteSlices.Counted cliff = new MoreThuenteSlices.Counted(a -> a <= .03 ? -a : bad, a -> a <= .03 ? -1 : bad);
            Found found = new LineSearch(Rule.forQuasiNewton()).search(cliff, 0, -1, 1);
            assertTrue(found.step() > 0 && found.step() <= .03, found.toString());
            assertEquals(-found.step(), found.value());
            assertTrue(found.badStep() > .03, found.toString());
            assertEquals(bad, found.badValue());
        }
        MoreThuenteSlices.Counted slopeOnly = new MoreThuenteSlices.Counted(a -> (a - .2) * (a - .2),
                a -> a > .5 ? Double.NaN : 2 * (a - .2));
        Found found = new LineSearch(Rule.forQuasiNewton()).search(slopeOnly, .04, -.4, 1);
        assertEquals(End.WOLFE, found.end(), found.toString());
        MoreThuenteSlices.Counted nothing = new MoreThuenteSlices.Counted(a -> Double.NaN, a -> Double.NaN);
        Found none = new LineSearch(Rule.forQuasiNewton()).search(nothing, 0, -1, 1);
        assertEquals(End.NOT_FINITE, none.end());
        assertEquals(0, none.step());
        assertEquals(9, none.evaluations(), "the first trial and 8 back-offs");
        assertEquals(1e-8, none.badStep(), 1e-20);
    }

    /** The other ends, each by a function made for it. */
    @Test
    void everyEndIsReached() {
        MoreThuenteSlices.Counted slide = new MoreThuenteSlices.Counted(a -> -a, a -> -1);
        Found longest = new LineSearch(new Rule(1e-4, .9, 0, 0, 8, 20, 0)).search(slide, 0, -1, 1);
        assertEquals(End.LONGEST, longest.end());
        assertEquals(8, longest.step());
        Found shortest = new LineSearch(new Rule(1e-4, .1, 0, 3, 8, 20, 0)).search(
                new MoreThuenteSlices.Counted(LineSearchTest::parabola, a -> a - 1), 0, -1, 1);
        assertEquals(End.SHORTEST, shortest.end());
        assertEquals(0, shortest.step());
        assertEquals(3, shortest.lastStep());
        MoreThuenteSlices.Counted kink = new MoreThuenteSlices.Counted(a -> Math.abs(a - .3), a -> a < .3 ? -1 : 1);
        Found narrow = new LineSearch(new Rule(1e-4, .1, 1e-3, 0, 8, 100, 0)).search(kink, .3, -1, 1);
        assertEquals(End.TOO_NARROW, narrow.end(), narrow.toString());
        assertEquals(.3, narrow.step(), 1e-3);
        Found few = new LineSearch(new Rule(1e-4, .1, 0, 0, 8, 3, 0)).search(kink, .3, -1, 1);
        assertEquals(End.TOO_MANY, few.end());
        assertEquals(3, few.evaluations());
        assertNotEquals(0, few.step());
    }

    @Test
    void aRuleOrStartThatCannotWorkIsRefused() {
        assertThrows(IllegalArgumentException.class, () -> new Rule(0, .9, 0, 0, 1, 1, 0));
        assertThrows(IllegalArgumentException.class, () -> new Rule(Double.NaN, .9, 0, 0, 1, 1, 0));
        assertThrows(IllegalArgumentException.class, () -> new Rule(.1, 1, 0, 0, 1, 1, 0));
        assertThrows(IllegalArgumentException.class, () -> new Rule(.1, .9, 0, 1, 1, 1, 0));
        assertThrows(IllegalArgumentException.class, () -> new Rule(.1, .9, 0, 0, 1, 0, 0));
        LineSearch search = new LineSearch(Rule.forQuasiNewton());
        LineSearch.Slice slice = MoreThuenteSlices.slice(1);
        assertThrows(IllegalArgumentException.class, () -> search.search(slice, 0, 0, 1));
        assertThrows(IllegalArgumentException.class, () -> search.search(slice, Double.NaN, -1, 1));
        assertThrows(IllegalArgumentException.class, () -> search.search(slice, 0, -1, 0));
    }

    private static void assertAccepted(Rule rule, double from, double to) {
        double out = 1e-12;
        for (double a : new double[] {from + out, (from + to) / 2, to - out}) {
            assertTrue(rule.accepts(0, -1, a, parabola(a), a - 1), "refused " + a);
        }
        for (double a : new double[] {from - out, to + out}) {
            assertFalse(rule.accepts(0, -1, a, parabola(a), a - 1), "accepted " + a);
        }
    }

    private static double parabola(double a) {
        return (a - 1) * (a - 1) / 2 - .5;
    }

    /** Half a unit of the last digit printed in a decimal such as -9.1645e-3. */
    private static double halfOfLastDigit(String printed) {
        return .5001 * new BigDecimal(printed).ulp().doubleValue();
    }
}

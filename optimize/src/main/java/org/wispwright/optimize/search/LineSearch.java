package org.wispwright.optimize.search;

/**
 * Finds a step along a downhill direction at which the value has fallen enough and the slope is small enough: the strong
 * Wolfe conditions
 * <pre>
 *   phi(a) &lt;= phi(0) + mu a phi'(0)        |phi'(a)| &lt;= eta |phi'(0)|
 * </pre>
 * <p>Two stages. While no step is known with enough decrease and a slope that is not negative, and the best step so far
 * is better than the newest one only for want of decrease, the interval is updated for the auxiliary function
 * {@code psi(a) = phi(a) - phi(0) - mu a phi'(0)}, whose minimiser meets the first condition; after that for phi itself. Until
 * both ends of an interval are known the step grows by 1.1 to 4 times its last advance; then the interval must shrink to
 * 0.66 of its length in two steps, else it is halved. Cubic and quadratic trial steps: {@link Bracket}.
 * <p>Source: Moré and Thuente (1994), ACM TOMS 20(3), 286-307. Differences from it: (1) where a value or slope is NaN or
 * infinite the trial backs off to a tenth of the way from the best step, and no later step passes nine tenths of
 * that way; (2) a search that ends without the conditions gives the best step seen, without evaluating there again; the
 * caller checks whether it will do. Checked by {@code LineSearchTest} (outside checks O62, O63).
 */
public final class LineSearch {
    private static final double ADVANCE_LEAST = 1.1;
    private static final double ADVANCE_MOST = 4;
    private static final double SHRINK = 0.66;
    private static final double BACK_OFF = 0.1;
    private static final double WALL = 0.9;

    private final Rule rule;

    /** A function of the step alone. */
    public interface Slice {
        /** Value at a step; the slope there is then in {@link #slope()}. */
        double evaluate(double step);

        /** Derivative by the step, where {@link #evaluate} was last asked. */
        double slope();
    }

    /** Why a search ended. */
    public enum End {
        /** Both conditions hold at the step. */ WOLFE,
        /** The longest step allowed has enough decrease and the slope still falls steeply there. */ LONGEST,
        /** The shortest step allowed has not enough decrease, or its slope is too large. */ SHORTEST,
        /** The interval shrank to the stated share of its end, or to rounding, without the conditions. */ TOO_NARROW,
        /** All evaluations allowed are used up. */ TOO_MANY,
        /** Backing off from values that are NaN or infinite did not reach a finite one. */ NOT_FINITE
    }

    /**
     * What a search may do and when it is content.
     *
     * @param mu sufficient decrease, in (0, 1); below 1/2 or the minimiser of a parabola is refused
     * @param eta curvature, in (0, 1); mu &lt; eta for a step to exist for every smooth phi bounded below
     * @param narrowest relative length of the interval at which to give up, at least 0
     * @param shortest least step, at least 0
     * @param longest greatest step, finite, above shortest
     * @param mostEvaluations at least 1
     * @param mostBackOffs how often a value that is not finite is met with a shorter step before giving up, at least 0
     */
    public record Rule(double mu, double eta, double narrowest, double shortest, double longest, int mostEvaluations, int mostBackOffs) {
        /** Checks the numbers. @throws IllegalArgumentException naming the one that is off */
        public Rule {
            need(mu > 0 && mu < 1, "mu", mu, "above 0, below 1");
            need(eta > 0 && eta < 1, "eta", eta, "above 0, below 1");
            need(narrowest >= 0 && narrowest < 1, "narrowest", narrowest, "at least 0, below 1");
            need(shortest >= 0 && shortest < Double.POSITIVE_INFINITY, "shortest", shortest, "finite, at least 0");
            need(longest > shortest && longest < Double.POSITIVE_INFINITY, "longest", longest, "finite, above the shortest " + shortest);
            need(mostEvaluations >= 1, "mostEvaluations", mostEvaluations, "at least 1");
            need(mostBackOffs >= 0, "mostBackOffs", mostBackOffs, "at least 0");
        }

        /** For L-BFGS: mu 1e-4, eta 0.9 (Nocedal and Wright 2006, section 3.1), 20 evaluations, 8 back-offs. */
        public static Rule forQuasiNewton() {
            return new Rule(1e-4, 0.9, 1e-6, 0, 1e20, 20, 8);
        }

        /** The same with another limit: a search whose evaluations are dear, or noisy in the last digits, should give up sooner. */
        public Rule withMostEvaluations(int most) {
            return new Rule(mu, eta, narrowest, shortest, longest, most, mostBackOffs);
        }

        /** First condition (Armijo): {@code value <= value0 + mu step slope0}. */
        public boolean decreases(double value0, double slope0, double step, double value) {
            return value <= value0 + mu * step * slope0;
        }

        /** Both conditions; see {@link LineSearch}. */
        public boolean accepts(double value0, double slope0, double step, double value, double slope) {
            return decreases(value0, slope0, step, value) && Math.abs(slope) <= eta * -slope0;
        }

        private static void need(boolean holds, String name, double got, String needed) {
            if (!holds) {
                throw new IllegalArgumentException("line search: '" + name + "' is " + got + ", needs " + needed);
            }
        }
    }

    /**
     * What a search found.
     *
     * @param step        the step: accepted, or the best seen where the search gave up; 0 if nothing better than the start was met
     * @param value       phi there
     * @param slope       phi' there
     * @param lastStep    the step evaluated last; differs from step only where the search gave up
     * @param evaluations how often the slice was evaluated
     * @param end         why the search ended
     * @param badStep     last step whose value or slope was not finite; NaN if there was none
     * @param badValue    value at badStep (finite if only the slope was not); NaN also if there was none
     */
    public record Found(double step, double value, double slope, double lastStep, int evaluations, End end, double badStep,
                        double badValue) {
    }

    /** A search under the rule given. */
    public LineSearch(Rule rule) {
        this.rule = rule;
    }

    /** The rule. */
    public Rule rule() {
        return rule;
    }

    /**
     * Searches from step 0.
     *
     * @param slice  the function; evaluated at positive steps only
     * @param value0 phi(0), finite
     * @param slope0 phi'(0), below 0
     * @param first  first trial step, above 0; clipped to the rule's limits
     * @return the step and why it was taken
     * @throws IllegalArgumentException if value0 is not finite, slope0 is not below 0 or first is not above 0
     */
    public Found search(Slice slice, double value0, double slope0, double first) {
        if (!Double.isFinite(value0) || !(slope0 < 0) || Double.isInfinite(slope0) || !(first > 0)) {
            throw new IllegalArgumentException("line search: got value " + value0 + ", slope " + slope0 + ", first step " + first
                    + "; needs a finite value, a finite slope below 0 and a step above 0");
        }
        double longest = rule.longest();
        double step = Math.max(rule.shortest(), Math.min(longest, first));
        double enough = rule.mu() * slope0;                                    // slope of the line that psi is measured from
        Bracket bracket = new Bracket(value0, slope0);
        double width = longest - rule.shortest();
        double widthBefore = 2 * width;
        double least = 0;
        double most = step + ADVANCE_MOST * step;
        boolean auxiliary = true;
        double badStep = Double.NaN;
        double badValue = Double.NaN;
        int backOffs = 0;
        for (int n = 1; ; n++) {
            double value = slice.evaluate(step);
            double slope = slice.slope();
            if (!Double.isFinite(value) || !Double.isFinite(slope)) {
                badStep = step;
                badValue = value;
                if (++backOffs > rule.mostBackOffs() || n >= rule.mostEvaluations()) {
                    return best(bracket, step, n, End.NOT_FINITE, badStep, badValue);
                }
                double way = step - bracket.bestStep;
                if (way > 0) {
                    longest = Math.min(longest, bracket.bestStep + WALL * way);
                }
                step = bracket.bestStep + BACK_OFF * way;
                if (!bracket.closed) {
                    least = bracket.bestStep;
                    most = longest;
                }
                continue;
            }
            double line = value0 + step * enough;
            if (rule.accepts(value0, slope0, step, value, slope)) {
                return new Found(step, value, slope, step, n, End.WOLFE, badStep, badValue);
            }
            if (step == longest && value <= line && slope <= enough) {
                return new Found(step, value, slope, step, n, End.LONGEST, badStep, badValue);
            }
            if (step == rule.shortest() && (value > line || slope >= enough)) {
                return best(bracket, step, n, End.SHORTEST, badStep, badValue);
            }
            if (auxiliary && value <= line && slope >= 0) {
                auxiliary = false;
            }
            boolean forPsi = auxiliary && value <= bracket.bestValue && value > line;
            double last = step;
            step = bracket.next(step, value, slope, least, most, forPsi ? enough : 0);
            if (n >= rule.mostEvaluations()) {
                return best(bracket, last, n, End.TOO_MANY, badStep, badValue);
            }
            if (bracket.closed) {
                if (Double.isNaN(step) || bracket.width() >= SHRINK * widthBefore) {
                    step = bracket.middle();
                }
                widthBefore = width;
                width = bracket.width();
                least = Math.min(bracket.bestStep, bracket.otherStep);
                most = Math.max(bracket.bestStep, bracket.otherStep);
            } else {
                least = step + ADVANCE_LEAST * (step - bracket.bestStep);
                most = step + ADVANCE_MOST * (step - bracket.bestStep);
            }
            step = Math.max(rule.shortest(), Math.min(longest, step));
            if (bracket.closed && (step <= least || step >= most || most - least <= rule.narrowest() * most)) {
                return best(bracket, last, n, End.TOO_NARROW, badStep, badValue);
            }
        }
    }

    private static Found best(Bracket bracket, double lastStep, int evaluations, End end, double badStep, double badValue) {
        return new Found(bracket.bestStep, bracket.bestValue, bracket.bestSlope, lastStep, evaluations, end, badStep, badValue);
    }
}

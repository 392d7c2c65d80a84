package org.wispwright.optimize.search;

import java.util.Arrays;
import java.util.Locale;
import org.wispwright.optimize.search.LineSearch.End;
import org.wispwright.optimize.search.LineSearch.Found;

/**
 * Limited-memory BFGS, one iteration at a time, so that between two iterations the caller may look, stop, write a
 * record, or change what is made small.
 * <p>An iteration: direction by {@link CurvaturePairs}, step by {@link LineSearch} (first trial 1; without pairs the first
 * trial moves the unknowns by a stated length along the steepest descent), then the pair
 * {@code s = x' - x, y = g' - g} is kept if s.y is above 0. If the search finds no step, the pairs are dropped and steepest
 * descent is tried once; if that fails too the iteration says why. A search that gives up with enough decrease in hand counts
 * as a move.
 * <p>What is made small is {@code objective(x) + quadratic |x|^2 / 2}; the weight starts at 0 and is changed by
 * {@link #addQuadratic}. This class adds that term itself: the objective must not contain it.
 * <p>Source: Liu and Nocedal (1989), Mathematical Programming 45, 503-528. Differences from it: the line search is that of Moré and
 * Thuente in full; the restart; the quadratic term and the extension. One thread; all sums in float64 in a fixed order, so the same
 * objective gives the same bits. Memory: {@code (2 pairs + 6)} arrays of doubles. Checked by {@code LbfgsTest} (outside check O61).
 */
public final class Lbfgs {
    private Objective objective;
    private final Settings settings;
    private final LineSearch search;
    private final CurvaturePairs pairs;
    private double[] x;
    private double[] gradient;
    private double value;
    private double quadratic;
    private int iterations;
    private int evaluations;
    private double lastMoved;

    /**
     * How to search.
     *
     * @param pairs       how many pairs to keep, 0 (steepest descent) to 1000
     * @param search      the line search's rule
     * @param trialLength Euclidean length of the first move that is tried, in the unit of x; finite, above 0
     */
    public record Settings(int pairs, LineSearch.Rule search, double trialLength) {
        /** Checks the numbers. @throws IllegalArgumentException naming the one that is off */
        public Settings {
            if (pairs < 0 || pairs > 1000) {
                throw new IllegalArgumentException("L-BFGS: got " + pairs + " pairs, needs 0 to 1000");
            }
            if (!(trialLength > 0) || Double.isInfinite(trialLength)) {
                throw new IllegalArgumentException("L-BFGS: got a trial length of " + trialLength + ", needs a finite number above 0");
            }
        }

        /** 8 pairs, {@link LineSearch.Rule#forQuasiNewton()}, a first move of length 1. */
        public static Settings standard() {
            return new Settings(8, LineSearch.Rule.forQuasiNewton(), 1);
        }

        /** The same with another length of the first move. */
        public Settings withTrialLength(double length) {
            return new Settings(pairs, search, length);
        }
    }

    /** How an iteration ended. */
    public enum Outcome {
        /** The unknowns moved and the value fell. */ MOVED,
        /** The gradient is exactly zero; nothing moved. */ AT_REST,
        /** No step along the direction, nor along the steepest descent, makes the value fall enough; nothing moved. */ STUCK,
        /** As STUCK, and values on the way were NaN or infinite; nothing moved. */ NOT_FINITE
    }

    /**
     * One iteration.
     *
     * @param number       1 for the first; an iteration that did not move has the number it would have had
     * @param outcome      how it ended
     * @param value        value now, quadratic term included
     * @param gradientNorm Euclidean length of the gradient now
     * @param step         multiple of the direction taken; 0 if nothing moved
     * @param moved        Euclidean length of the move, in the unit of x
     * @param evaluations  of the objective, in this iteration
     * @param restarted    true if the pairs were dropped on the way
     * @param sentence     why it did not move, for a person; empty if it moved
     */
    public record Iteration(int number, Outcome outcome, double value, double gradientNorm, double step, double moved,
                            int evaluations, boolean restarted, String sentence) {
    }

    /**
     * All that a search needs to go on with the same bits, as plain numbers. Arrays are shared, not copied, to read: a search never changes
     * one that it has once filled, and they are as large as all else that it holds.
     *
     * @param x           unknowns
     * @param value       there, quadratic term included
     * @param gradient    there, quadratic term included
     * @param quadratic   weight of {@code |x|^2 / 2}
     * @param s           moves, oldest first
     * @param y           changes of the gradient over them
     * @param iterations  done so far
     * @param evaluations done so far
     * @param lastMoved   length of the last move, 0 if none
     */
    public record State(double[] x, double value, double[] gradient, double quadratic, double[][] s, double[][] y,
                        int iterations, int evaluations, double lastMoved) {
        /** Checks shapes and numbers. @throws IllegalArgumentException naming what is off */
        public State {
            s = s.clone();
            y = y.clone();
            requireFinite("x", x);
            requireFinite("gradient", gradient);
            requireFinite("value, quadratic, lastMoved", new double[] {value, quadratic, lastMoved});
            if (gradient.length != x.length || s.length != y.length || iterations < 0 || evaluations < 0 || lastMoved < 0) {
                throw new IllegalArgumentException("L-BFGS state: got " + x.length + " unknowns, " + gradient.length + " of gradient, "
                        + s.length + " moves, " + y.length + " changes, " + iterations + " iterations, " + evaluations
                        + " evaluations, last move " + lastMoved + "; needs equal lengths and counts of at least 0");
            }
            for (int n = 0; n < s.length; n++) {
                if (s[n].length != x.length || y[n].length != x.length) {
                    throw new IllegalArgumentException("L-BFGS state: pair " + n + " has " + s[n].length + " and " + y[n].length
                            + " numbers, needs " + x.length);
                }
                requireFinite("s[" + n + "]", s[n]);
                requireFinite("y[" + n + "]", y[n]);
            }
        }

    }

    /**
     * Starts at a point and evaluates there.
     *
     * @param objective what is made small
     * @param start     copied; at least one number, all finite
     * @param settings  how to search
     * @throws IllegalArgumentException if start, or value or gradient there, is not finite
     */
    public Lbfgs(Objective objective, double[] start, Settings settings) {
        this(objective, settings);
        if (start.length == 0) {
            throw new IllegalArgumentException("L-BFGS: got no unknowns, needs at least one");
        }
        requireFinite("start", start);
        x = start.clone();
        gradient = new double[x.length];
        value = firstValue(objective, x, gradient);
        evaluations = 1;
    }

    /**
     * Goes on from a state; the objective is not evaluated.
     *
     * @throws IllegalArgumentException if the state has more pairs than the settings allow, or a pair with s.y not above 0
     */
    public Lbfgs(Objective objective, State state, Settings settings) {
        this(objective, settings);
        if (state.s().length > settings.pairs()) {
            throw new IllegalArgumentException("L-BFGS state: got " + state.s().length + " pairs, needs at most " + settings.pairs()
                    + " as in the settings");
        }
        x = state.x();
        gradient = state.gradient();
        value = state.value();
        quadratic = state.quadratic();
        for (int n = 0; n < state.s().length; n++) {
            if (!pairs.add(state.s()[n], state.y()[n])) {
                throw new IllegalArgumentException("L-BFGS state: pair " + n + " has s.y not above 0; the record is damaged");
            }
        }
        iterations = state.iterations();
        evaluations = state.evaluations();
        lastMoved = state.lastMoved();
    }

    private Lbfgs(Objective objective, Settings settings) {
        this.objective = objective;
        this.settings = settings;
        search = new LineSearch(settings.search());
        pairs = new CurvaturePairs(settings.pairs());
    }

    /** The unknowns now: this object's own array, to read until the next call. */
    public double[] x() {
        return x;
    }

    /** Value now, quadratic term included. */
    public double value() {
        return value;
    }

    /** The quadratic term's part of the value. */
    public double quadraticValue() {
        return 0.5 * quadratic * CurvaturePairs.dot(x, x);
    }

    /** Weight of {@code |x|^2 / 2}. */
    public double quadratic() {
        return quadratic;
    }

    /** Gradient now, quadratic term included: this object's own array, to read until the next call. */
    public double[] gradient() {
        return gradient;
    }

    /** Iterations that moved. */
    public int iterations() {
        return iterations;
    }

    /** Evaluations of the objective so far. */
    public int evaluations() {
        return evaluations;
    }

    /** Pairs kept now. */
    public int pairs() {
        return pairs.count();
    }

    /** Everything, from which a new object goes on with the same bits; later calls do not change it. */
    public State state() {
        double[][] s = new double[pairs.count()][];
        double[][] y = new double[pairs.count()][];
        for (int n = 0; n < s.length; n++) {
            s[n] = pairs.s(n);
            y[n] = pairs.y(n);
        }
        return new State(x, value, gradient, quadratic, s, y, iterations, evaluations, lastMoved);
    }

    /**
     * One iteration. Should the objective throw, that comes out here and this object is as before the call.
     *
     * @return how it ended; anything but MOVED leaves x, value and gradient untouched
     */
    public Iteration step() {
        if (CurvaturePairs.dot(gradient, gradient) == 0) {
            return new Iteration(iterations + 1, Outcome.AT_REST, value, 0, 0, 0, 0, false,
                    "L-BFGS stopped at step " + (iterations + 1) + ": the gradient is zero");
        }
        Ray ray = new Ray((at, g) -> total(objective, at, g), x, value, gradient);
        boolean restarted = false;
        Found found = null;
        if (pairs.count() > 0) {
            pairs.direction(gradient, ray.direction);
            found = ray.isDownhill() ? ray.search(search, 1) : null;
            restarted = !ray.isMove(found, settings.search());
        }
        if (pairs.count() == 0 || restarted) {
            for (int i = 0; i < x.length; i++) {
                ray.direction[i] = -gradient[i];
            }
            double length = lastMoved > 0 ? lastMoved : settings.trialLength();
            found = ray.search(search, length / Math.sqrt(CurvaturePairs.dot(gradient, gradient)));
        }
        boolean moves = ray.isMove(found, settings.search());
        if (moves && found.lastStep() != found.step()) {
            ray.evaluate(found.step());                                        // the best step is not the one evaluated last
        }
        evaluations += ray.evaluations;
        if (restarted) {
            pairs.clear();
        }
        if (!moves) {
            return stopped(found, ray, restarted);
        }
        double[] s = new double[x.length];
        double[] y = new double[x.length];
        for (int i = 0; i < x.length; i++) {
            s[i] = ray.at[i] - x[i];
            y[i] = ray.gradientAt[i] - gradient[i];
        }
        x = ray.at;
        gradient = ray.gradientAt;
        value = ray.valueAt;
        iterations++;
        lastMoved = Math.sqrt(CurvaturePairs.dot(s, s));
        pairs.add(s, y);
        return new Iteration(iterations, Outcome.MOVED, value, Math.sqrt(CurvaturePairs.dot(gradient, gradient)), found.step(),
                lastMoved, ray.evaluations, restarted, "");
    }

    /**
     * Adds {@code change |x|^2 / 2} to what is made small. Value and gradient shift by exactly that term and every pair
     * becomes what it would have been with it ({@code y += change s}); nothing is evaluated.
     *
     * @param change finite; may be negative (pairs whose s.y is then not above 0 are dropped)
     * @throws IllegalArgumentException if change is not finite
     */
    public void addQuadratic(double change) {
        if (!Double.isFinite(change)) {
            throw new IllegalArgumentException("L-BFGS: got a quadratic weight of " + change + ", needs a finite number");
        }
        value += 0.5 * change * CurvaturePairs.dot(x, x);
        gradient = gradient.clone();
        CurvaturePairs.addScaled(gradient, change, x);
        quadratic += change;
        pairs.addQuadratic(change);
    }

    /**
     * Lengthens the unknowns by zeros at the end and goes on with an objective of that many. The pairs are padded with zeros
     * and kept: see {@link CurvaturePairs#extend} for why. One evaluation, since the new unknowns' gradient is not known.
     *
     * @param newLength at least the present length
     * @param wider     at unknowns (x, 0) it should have the value the old one had at x, or the pairs mislead the search
     * @throws IllegalArgumentException if newLength is too small, or value or gradient there is not finite; then nothing changed
     */
    public void extend(int newLength, Objective wider) {
        if (newLength < x.length) {
            throw new IllegalArgumentException("L-BFGS: got a new length of " + newLength + ", needs at least the present " + x.length);
        }
        take(wider, Arrays.copyOf(x, newLength));
        pairs.extend(newLength);
    }

    /**
     * Goes on with another objective of as many unknowns: one evaluation, pairs kept. Meant for one whose curvature is much the
     * same (moved targets); call {@link #forget} too where it is not.
     *
     * @throws IllegalArgumentException if value or gradient is not finite there; then nothing changed
     */
    public void replace(Objective other) {
        take(other, x);
    }

    /** Drops the pairs and the length of the last move: the next iteration goes along the steepest descent by the trial length. */
    public void forget() {
        pairs.clear();
        lastMoved = 0;
    }

    private void take(Objective other, double[] at) {
        double[] g = new double[at.length];
        double v = firstValue(other, at, g);
        objective = other;
        x = at;
        gradient = g;
        value = v;
        evaluations++;
    }

    private double firstValue(Objective of, double[] at, double[] g) {
        double v = total(of, at, g);
        if (!Double.isFinite(v) || !Double.isFinite(CurvaturePairs.dot(g, g))) {
            throw new IllegalArgumentException("L-BFGS cannot start at step " + iterations + ": loss is " + v
                    + ", squared length of the gradient " + CurvaturePairs.dot(g, g) + "; needs a start where both are finite");
        }
        return v;
    }

    private double total(Objective of, double[] at, double[] g) {
        double v = of.evaluate(at, g);
        if (quadratic != 0) {
            v += 0.5 * quadratic * CurvaturePairs.dot(at, at);
            CurvaturePairs.addScaled(g, quadratic, at);
        }
        return v;
    }

    private Iteration stopped(Found found, Ray ray, boolean restarted) {
        boolean notFinite = found.end() == End.NOT_FINITE;
        double bad = found.badValue();
        String why = notFinite
                ? (Double.isFinite(bad) ? "the gradient is not finite" : "loss is " + bad)
                : "no step along the steepest descent makes the loss fall enough (" + found.end() + " after " + found.evaluations()
                        + " evaluations)";
        double length = notFinite ? found.badStep() : found.lastStep();
        String sentence = "L-BFGS stopped at step " + (iterations + 1) + ": " + why + String.format(Locale.ROOT,
                " (last finite %.3g, step length %.3g)", value, length);
        return new Iteration(iterations + 1, notFinite ? Outcome.NOT_FINITE : Outcome.STUCK, value,
                Math.sqrt(CurvaturePairs.dot(gradient, gradient)), 0, 0, ray.evaluations, restarted, sentence);
    }

    private static void requireFinite(String name, double[] a) {
        for (int i = 0; i < a.length; i++) {
            if (!Double.isFinite(a[i])) {
                throw new IllegalArgumentException("L-BFGS: '" + name + "' has " + a[i] + " at index " + i + ", needs finite numbers");
            }
        }
    }
}

package org.wispwright.optimize.force;

import java.util.Arrays;
import java.util.List;

/**
 * The strengths of sources over time as unknowns, and gradients back to them. A strength multiplies a source's rates: 1 is the source as
 * it was set up, 0 is one that is shut.
 *
 * <p>Forward, for a source that feeds the steps of one span: {@code strength[t] = sum_k B_k(t) g(y_k)}, {@code y_k = x_k sqrt(K) / unit},
 * B the K cubic B-splines with about a knot every {@value #KNOT_STEPS} steps of its span (de Boor 1978, ch. 9; clamped, so they are 0 or
 * more and add up to 1) and {@code g(y) = ln(1 + (e - 1) exp(y))}. Since g is above 0 and g(0) = 1, a strength is never negative, and all
 * are 1 at x = 0; for large y it grows by 1 for 1, so that no step of a search makes smoke without measure, as an exponential would. Steps
 * outside the span have strength 1: there is nothing to multiply.
 * <p>Pullback: {@code xBar_k += sqrt(K) / unit g'(y_k) sum_t B_k(t) strengthBar[t]}, {@code g'(y) = 1 - exp(-g(y))}.
 * <p>Scale: a steady y of 1 (strength 1.74) of one source has the norm {@code |x| = unit}, so the unit says which force weighs as much.
 * <p>g is the softplus of Dugas and others (2001), NIPS 13, 472-478, moved so that it passes through (0, 1); the rest is ours. One thread;
 * sums in double in a fixed order.
 */
public final class SourceCurves {
    /** Steps from knot to knot, about. */
    public static final int KNOT_STEPS = 8;
    private static final int DEGREE = 3;
    private static final double STEEP = Math.E - 1;

    private final int steps;
    private final double unit;
    private final List<Span> spans;
    private final double[][][] splines;
    private final int[] firstUnknown;

    /**
     * Steps that a source feeds.
     *
     * @param from first step
     * @param to   one past the last; from or less if it feeds none
     */
    public record Span(int from, int to) {
        int count() {
            return Math.max(0, to - from);
        }
    }

    /**
     * Prepares the curves.
     *
     * @param steps of the frame range, at least 1
     * @param spans of each source, inside 0..steps
     * @param unit  norm of the unknowns that a steady y of 1 of one source has, m/s2 as the force's; finite, above 0
     * @throws IllegalArgumentException if a number is out of range
     */
    public SourceCurves(int steps, List<Span> spans, double unit) {
        if (steps < 1 || !(unit > 0) || Double.isInfinite(unit)) {
            throw new IllegalArgumentException("source curves: got " + steps + " steps and a unit of " + unit
                    + ", needs at least 1 and a finite number above 0");
        }
        this.steps = steps;
        this.unit = unit;
        this.spans = List.copyOf(spans);
        splines = new double[spans.size()][][];
        firstUnknown = new int[spans.size() + 1];
        for (int s = 0; s < splines.length; s++) {
            Span span = this.spans.get(s);
            if (span.count() > 0 && (span.from() < 0 || span.to() > steps)) {
                throw new IllegalArgumentException("source curves: got steps " + span.from() + " to " + span.to() + ", needs 0 to " + steps);
            }
            int count = Math.min(span.count(), DEGREE + Math.max(1, (int) Math.round((double) span.count() / KNOT_STEPS)));
            splines[s] = count == 0 ? new double[0][] : TimeSplines.values(span.count(), count);
            firstUnknown[s + 1] = firstUnknown[s] + count;
        }
    }

    /** Number of unknowns: a few for each source that feeds any step. */
    public int unknowns() {
        return firstUnknown[splines.length];
    }

    /** Number of sources. */
    public int sources() {
        return splines.length;
    }

    /**
     * The strengths.
     *
     * @param x read: its first {@link #unknowns()} numbers
     * @return a new array, [step][source]
     */
    public double[][] strengths(double[] x) {
        double[][] out = new double[steps][splines.length];
        for (double[] row : out) {
            Arrays.fill(row, 1);
        }
        for (int s = 0; s < splines.length; s++) {
            int at = firstUnknown[s];
            for (int t = 0; t < splines[s].length; t++) {
                double sum = 0;
                for (int k = 0; k < splines[s][t].length; k++) {
                    sum += splines[s][t][k] * positive(scaled(s, x[at + k]));
                }
                out[spans.get(s).from() + t][s] = sum;
            }
        }
        return out;
    }

    /**
     * Adds to xBar what a derivative by the strengths asks of the unknowns.
     *
     * @param x           read: as in {@link #strengths}
     * @param strengthBar read: [step][source]
     * @param xBar        added to at its first {@link #unknowns()} numbers
     */
    public void pullback(double[] x, double[][] strengthBar, double[] xBar) {
        for (int s = 0; s < splines.length; s++) {
            int count = firstUnknown[s + 1] - firstUnknown[s];
            for (int k = 0; k < count; k++) {
                double sum = 0;
                for (int t = 0; t < splines[s].length; t++) {
                    sum += splines[s][t][k] * strengthBar[spans.get(s).from() + t][s];
                }
                int at = firstUnknown[s] + k;
                double slope = 1 - Math.exp(-positive(scaled(s, x[at])));
                xBar[at] += Math.sqrt(count) / unit * slope * sum;
            }
        }
    }

    private double scaled(int source, double x) {
        return x * Math.sqrt(firstUnknown[source + 1] - firstUnknown[source]) / unit;
    }

    /** g: for large y in the form that does not overflow. */
    private static double positive(double y) {
        return y > 0 ? y + Math.log(STEEP + Math.exp(-y)) : Math.log1p(STEEP * Math.exp(y));
    }
}

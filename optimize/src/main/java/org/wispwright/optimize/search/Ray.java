package org.wispwright.optimize.search;

import org.wispwright.optimize.search.LineSearch.Found;

/**
 * The points {@code x + step direction} with value and gradient there, as a slice for the line search. Owns its arrays, so
 * a search that fails, or an objective that throws, leaves x and its gradient alone.
 */
final class Ray implements LineSearch.Slice {
    final double[] direction;
    double[] at;
    double[] gradientAt;
    double valueAt;
    int evaluations;
    private final Objective total;
    private final double[] x;
    private final double value;
    private final double[] gradient;

    /** From x, where value and gradient are known; the direction is to be filled in. */
    Ray(Objective total, double[] x, double value, double[] gradient) {
        this.total = total;
        this.x = x;
        this.value = value;
        this.gradient = gradient;
        direction = new double[x.length];
        at = new double[x.length];
        gradientAt = new double[x.length];
    }

    double slope0() {
        return CurvaturePairs.dot(gradient, direction);
    }

    /** True if the direction goes downhill by a finite slope. */
    boolean isDownhill() {
        double slope = slope0();
        return slope < 0 && slope > Double.NEGATIVE_INFINITY;
    }

    Found search(LineSearch search, double first) {
        return search.search(this, value, slope0(), first);
    }

    /** True if the step found is one to take: enough decrease, and not lost in the rounding of x. */
    boolean isMove(Found found, LineSearch.Rule rule) {
        return found != null && found.step() > 0 && rule.decreases(value, slope0(), found.step(), found.value())
                && changesX(found.step());
    }

    @Override
    public double evaluate(double step) {
        for (int i = 0; i < at.length; i++) {
            at[i] = x[i] + step * direction[i];
        }
        evaluations++;
        valueAt = total.evaluate(at, gradientAt);
        return valueAt;
    }

    /** NaN also where the gradient's square overflows, since nothing could start from there. */
    @Override
    public double slope() {
        return Double.isFinite(CurvaturePairs.dot(gradientAt, gradientAt)) ? CurvaturePairs.dot(gradientAt, direction) : Double.NaN;
    }

    private boolean changesX(double step) {
        for (int i = 0; i < x.length; i++) {
            if (x[i] + step * direction[i] != x[i]) {
                return true;
            }
        }
        return false;
    }
}

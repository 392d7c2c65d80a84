package org.wispwright.optimize.search;

/**
 * A smooth function of many numbers, with its gradient.
 * <p>The same x must give the same bits each time, or a resumed search departs from one that was never stopped. A point
 * where there is no answer is reported by a value, or a gradient, that is NaN or infinite: the search then backs off. A
 * throw (a cancel, say) passes through the search and leaves it as it was before the iteration.
 */
@FunctionalInterface
public interface Objective {

    /**
     * Value and gradient at one point.
     *
     * @param x        read only
     * @param gradient overwritten: derivative of the value by each number of x; same length as x
     * @return the value
     */
    double evaluate(double[] x, double[] gradient);
}

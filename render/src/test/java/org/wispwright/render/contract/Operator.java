package org.wispwright.render.contract;

/**
 * A differentiable operator as the contract test sees it: one array of doubles in, one out. An operator with several
 * inputs joins by laying them end to end; one that works in float narrows on the way in and widens on the way out.
 *
 * @param name      for messages
 * @param inputs    count of input numbers
 * @param outputs   count of output numbers
 * @param linear    true if the forward is linear (then the Taylor remainder must vanish, not only fall fourfold)
 * @param point     where to differentiate, kept off kinks (cell borders, clamps); for linear operators any point
 * @param forward   overwrites its second argument with the output for the first
 * @param pullback  given (point, outBar, inBar) adds the transpose of the derivative at point times outBar into inBar
 * @param direction a direction to try, scaled so that {@code point + direction} is still on the same side of every kink
 */
public record Operator(String name, int inputs, int outputs, boolean linear, double[] point, double[] direction,
                       Forward forward, Pullback pullback) {

    /** The forward run. */
    @FunctionalInterface
    public interface Forward {
        /** Overwrites {@code out} with the operator's value at {@code in}. */
        void run(double[] in, double[] out);
    }

    /** The pullback. */
    @FunctionalInterface
    public interface Pullback {
        /** Adds into {@code inBar} the transpose of the derivative at {@code in} times {@code outBar}. */
        void run(double[] in, double[] outBar, double[] inBar);
    }
}

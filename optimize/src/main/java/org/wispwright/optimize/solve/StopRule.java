package org.wispwright.optimize.solve;

/**
 * When a solve ends before its own rule ends it. A number that is not wanted is infinite or, for the loss, 0.
 *
 * @param loss       stop once the loss on the last rung is at most this share of the original's, 0..1
 * @param seconds    stop after the iteration in which so many seconds have passed
 * @param iterations stop after so many iterations in all
 */
public record StopRule(double loss, double seconds, int iterations) {
    /** The program's own rule alone. */
    public static final StopRule OWN = new StopRule(0, Double.POSITIVE_INFINITY, Integer.MAX_VALUE);

    /** Checks the numbers. @throws IllegalArgumentException saying what is off */
    public StopRule {
        if (!(loss >= 0 && loss < 1)) {
            throw new IllegalArgumentException("until: got a loss of " + loss + ", needs 0 to below 1 (the original has 1)");
        }
        if (!(seconds > 0)) {
            throw new IllegalArgumentException("until: got " + seconds + " seconds, needs a number above 0");
        }
        if (iterations < 1) {
            throw new IllegalArgumentException("until: got " + iterations + " iterations, needs at least 1");
        }
    }
}

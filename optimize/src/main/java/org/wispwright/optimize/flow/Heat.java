package org.wispwright.optimize.flow;

/**
 * How warm smoke rises. Temperature is told as the difference to the air around, in kelvin, so air itself is 0 and what flows in is what is
 * there already. It is a field of its own, carried like density, only when it lifts.
 *
 * @param lift    upward acceleration of air one kelvin warmer, m/s2, finite; 0 for no temperature at all
 * @param cooling its rate of decay, 1/s, 0 or more (Newton's law of cooling)
 */
public record Heat(double lift, double cooling) {
    /** No temperature. */
    public static final Heat NONE = new Heat(0, 0);

    /** Checks the numbers. @throws IllegalArgumentException saying what is off */
    public Heat {
        if (!Double.isFinite(lift)) {
            throw new IllegalArgumentException("flow: got a lift of " + lift + " m/s2 a kelvin, needs a finite number");
        }
        if (!(cooling >= 0) || Double.isInfinite(cooling)) {
            throw new IllegalArgumentException("flow: got a cooling of " + cooling + " 1/s, needs a finite number from 0");
        }
    }

    /** True if there is a temperature to carry. */
    public boolean isCarried() {
        return lift != 0;
    }
}

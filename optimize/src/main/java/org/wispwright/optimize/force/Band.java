package org.wispwright.optimize.force;

/**
 * Spatial frequencies {@code [low, high)} in cycles per metre, and how finely the force of these may change in time.
 *
 * @param low     lowest frequency, included, from 0
 * @param high    first frequency that is too high, above low
 * @param splines cubic B-splines over the frame range, at least 1
 */
public record Band(double low, double high, int splines) {
    /** Checks the numbers. @throws IllegalArgumentException saying what is off */
    public Band {
        if (!(0 <= low && low < high)) {
            throw new IllegalArgumentException("band: got [" + low + ", " + high + ") 1/m, needs 0 <= low < high");
        }
        if (splines < 1) {
            throw new IllegalArgumentException("band: got " + splines + " splines, needs at least 1");
        }
    }

    /** True if the frequency belongs here. */
    public boolean holds(double cyclesPerMetre) {
        return cyclesPerMetre >= low && cyclesPerMetre < high;
    }
}

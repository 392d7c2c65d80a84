package org.wispwright.optimize.flow;

/**
 * One solver step: the {@code number}-th, from 0, of the {@code count} equal ones that lead to a frame.
 *
 * @param frame  the frame that they lead to
 * @param number below count
 * @param count  1 or more
 */
public record Substep(int frame, int number, int count) {
    /** Checks the numbers. @throws IllegalArgumentException if the number is not below the count */
    public Substep {
        if (number < 0 || number >= count) {
            throw new IllegalArgumentException("substep: got number " + number + " of " + count + ", needs 0 to one below the count");
        }
    }

    /** The frame, in parts, at which it starts. */
    public double from() {
        return frame - 1 + (double) number / count;
    }

    /** The frame, in parts, at which it ends. */
    public double to() {
        return number == count - 1 ? frame : frame - 1 + (number + 1.0) / count;
    }
}

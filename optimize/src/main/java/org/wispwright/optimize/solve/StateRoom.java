package org.wispwright.optimize.solve;

import java.nio.file.Path;

/**
 * Where a sweep may keep its states. The gradient has the same bits wherever they are.
 *
 * @param memoryBytes of memory
 * @param diskBytes   of disk beside it, for the states that memory does not hold; 0 for none
 * @param file        that takes them; made when first needed and gone when the solve ends; null without a disk
 */
public record StateRoom(long memoryBytes, long diskBytes, Path file) {
    /** Checks the place. @throws IllegalArgumentException if there is disk and no file, or less than nothing of it */
    public StateRoom {
        if (diskBytes < 0 || diskBytes > 0 && file == null) {
            throw new IllegalArgumentException("solve: got " + diskBytes + " bytes of disk for states and "
                    + (file == null ? "no file" : "a file") + "; needs 0 or more, and a file if there are any");
        }
    }

    /** Memory alone. */
    public static StateRoom inMemory(long bytes) {
        return new StateRoom(bytes, 0, null);
    }
}

package org.wispwright.optimize.checkpoint;

/**
 * Memory for snapshots.
 *
 * @param bytes         that all snapshots together may take
 * @param bytesPerState that one takes, 1 or more
 */
public record Budget(long bytes, long bytesPerState) {

    /** Checks that one state fits. @throws IllegalArgumentException saying how much is needed */
    public Budget {
        if (bytesPerState < 1) {
            throw new IllegalArgumentException("checkpoints: got a state of " + bytesPerState + " bytes, needs at least 1");
        }
        if (bytes < bytesPerState) {
            throw new IllegalArgumentException("checkpoints: got " + Math.max(0, bytes) + " bytes for snapshots, needs at least "
                    + bytesPerState + " (one state, the start's); give more memory or a coarser grid");
        }
    }

    /** Snapshots that fit and are of use for a chain of so many steps: 1 to max(1, steps - 1). */
    public int snapshots(int steps) {
        if (steps < 1) {
            throw new IllegalArgumentException("checkpoints: got " + steps + " steps, needs at least 1");
        }
        return (int) Math.min(Math.max(1, steps - 1), bytes / bytesPerState);
    }
}

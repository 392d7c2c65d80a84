package org.wispwright.optimize.checkpoint;

/**
 * Room for snapshots: memory, and then disk.
 *
 * @param bytes         of memory that snapshots may take
 * @param diskBytes     of disk that further ones may take; 0 for none
 * @param bytesPerState that one takes, 1 or more
 */
public record Budget(long bytes, long diskBytes, long bytesPerState) {

    /** Checks that one state fits into memory. @throws IllegalArgumentException saying how much is needed */
    public Budget {
        if (bytesPerState < 1) {
            throw new IllegalArgumentException("checkpoints: got a state of " + bytesPerState + " bytes, needs at least 1");
        }
        if (bytes < bytesPerState) {
            throw new IllegalArgumentException("checkpoints: got " + Math.max(0, bytes) + " bytes for snapshots, needs at least "
                    + bytesPerState + " (one state, the start's); give more memory or a coarser grid");
        }
        if (diskBytes < 0) {
            throw new IllegalArgumentException("checkpoints: got " + diskBytes + " bytes of disk, needs at least 0");
        }
    }

    /** Memory alone. */
    public Budget(long bytes, long bytesPerState) {
        this(bytes, 0, bytesPerState);
    }

    /** Snapshots that fit, memory and disk together, and are of use for a chain of so many steps: 1 to max(1, steps - 1). */
    public int snapshots(int steps) {
        return (int) Math.min(ofUse(steps), bytes / bytesPerState + diskBytes / bytesPerState);
    }

    /** Those of {@link #snapshots} that memory does not hold. */
    public int onDisk(int steps) {
        return (int) Math.max(0, snapshots(steps) - bytes / bytesPerState);
    }

    private static long ofUse(int steps) {
        if (steps < 1) {
            throw new IllegalArgumentException("checkpoints: got " + steps + " steps, needs at least 1");
        }
        return Math.max(1, steps - 1);
    }
}

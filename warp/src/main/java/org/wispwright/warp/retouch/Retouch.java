package org.wispwright.warp.retouch;

import java.util.List;
import org.wispwright.warp.matte.Needs;

/**
 * The ordered, non-destructive list of operations of a note. Order matters: each operation works on what the one before it left.
 * It holds positions as fractions of the height, so it applies at any raster.
 *
 * @param operations 0 to {@value #MOST_OPERATIONS}; none leaves the picture as it is
 */
public record Retouch(List<Operation> operations) {
    /** The most operations one retouch may have. */
    public static final int MOST_OPERATIONS = 1_000;

    /**
     * Checks and copies.
     *
     * @throws IllegalArgumentException if the list or one of its entries is missing, or it is too long
     */
    public Retouch {
        Needs.present("retouch", "operations", operations);
        if (operations.size() > MOST_OPERATIONS) {
            throw new IllegalArgumentException("retouch: got " + operations.size() + " operations, needs at most " + MOST_OPERATIONS);
        }
        for (int n = 0; n < operations.size(); n++) {
            Needs.present("retouch", "operation " + n, operations.get(n));
        }
        operations = List.copyOf(operations);
    }

    /** True if no operation changes anything; the wanted picture then has the original's bits. */
    public boolean changesNothing() {
        return operations.stream().allMatch(Operation::changesNothing);
    }
}

package org.wispwright.warp.retouch;

import java.util.ArrayList;
import java.util.List;
import java.util.function.UnaryOperator;
import org.wispwright.warp.matte.Needs;
import org.wispwright.warp.matte.Point;

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

    /**
     * The retouch with all its positions taken to other places, see {@link Operation#moved}.
     *
     * @throws IllegalArgumentException if an operation does not stand it, with its number
     */
    public Retouch moved(UnaryOperator<Point> map) {
        List<Operation> moved = new ArrayList<>();
        for (int n = 0; n < operations.size(); n++) {
            try {
                moved.add(operations.get(n).moved(map));
            } catch (IllegalArgumentException refused) {
                throw new IllegalArgumentException("operation " + (n + 1) + " of the retouch, moved: " + refused.getMessage(), refused);
            }
        }
        return new Retouch(moved);
    }
}

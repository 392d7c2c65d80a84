package org.wispwright.optimize.flow;

import java.util.Collections;
import java.util.List;

/**
 * How many solver steps lead from one frame to the next: the same number everywhere, or one for each frame after the first.
 *
 * @param every  1 to {@value #MOST}; of all frames if there are no counts
 * @param counts one for each frame after the first, or none
 */
public record Substeps(int every, List<Integer> counts) {
    /** The most steps from one frame to the next. */
    public static final int MOST = 64;

    /** Checks the numbers. @throws IllegalArgumentException saying what is off */
    public Substeps {
        counts = List.copyOf(counts);
        require(every);
        counts.forEach(Substeps::require);
    }

    private static void require(int count) {
        if (count < 1 || count > MOST) {
            throw new IllegalArgumentException("flow: got " + count + " substeps a frame, needs 1 to " + MOST);
        }
    }

    /** The same number everywhere. */
    public static Substeps each(int count) {
        return new Substeps(count, List.of());
    }

    /** Steps that lead to the frame so many after the first, from the one before it. */
    public int to(int framesAfterFirst) {
        return counts.isEmpty() ? every : counts.get(framesAfterFirst - 1);
    }

    /** Steps from the first frame to the one so many after it. */
    public int upTo(int framesAfterFirst) {
        return counts.isEmpty() ? every * framesAfterFirst : counts.subList(0, framesAfterFirst).stream().mapToInt(n -> n).sum();
    }

    /** Step n of a run, from 0, of a shot with that first frame. */
    public Substep at(int n, int firstFrame) {
        if (counts.isEmpty()) {
            return new Substep(firstFrame + 1 + n / every, n % every, every);
        }
        int left = n;
        int frame = 0;
        while (left >= counts.get(frame)) {
            left -= counts.get(frame++);
        }
        return new Substep(firstFrame + 1 + frame, left, counts.get(frame));
    }

    /** The largest number of steps to any frame. */
    public int most() {
        return counts.isEmpty() ? every : Collections.max(counts);
    }
}

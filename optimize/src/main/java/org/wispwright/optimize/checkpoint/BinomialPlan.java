package org.wispwright.optimize.checkpoint;

/**
 * How many steps can be reversed with how few snapshots, and at what price.
 * <p>Let a chain of l steps be reversed with s snapshots, the start state being one of them, and let the step that is taped just
 * before its own reversal not be counted. With C(n, k) the binomial coefficient:
 * <pre>
 *   longest(s, r)    = C(s + r, s)                     the most steps if none is run more than r times plainly
 *   leastSteps(l, s) = r l - C(s + r, s + 1)           r = repeats(l, s), the least r with C(s + r, s) &gt;= l
 *                    = min over m of  m + leastSteps(l - m, s - 1) + leastSteps(m, s)
 * </pre>
 * The m are those with {@code longest(s, r-2) <= m <= longest(s, r-1)} and {@code longest(s-1, r-1) <= l - m <= longest(s-1, r)}.
 * <p>Sources: Griewank (1992), Optimization Methods and Software 1, 35-54; Griewank and Walther (2000), ACM TOMS 26(1), 19-45
 * (Algorithm 799). Differences from them: of the equally good m the largest is taken, so that snapshots are written least often.
 * Checked by {@code BinomialPlanTest} (outside checks O58 to O60).
 */
public final class BinomialPlan {

    private BinomialPlan() {
    }

    /**
     * The longest chain that s snapshots reverse with no step run plainly more than r times: C(s + r, s), or
     * {@link Long#MAX_VALUE} where that does not fit.
     *
     * @param s snapshots, 1 or more
     * @param r repeats, 0 or more
     */
    public static long longest(int s, int r) {
        requireSlots(s);
        if (r < 0) {
            throw new IllegalArgumentException("checkpoints: got " + r + " repeats, needs at least 0");
        }
        return choose(s + (long) r, Math.min(s, r));
    }

    /**
     * The least r with {@code longest(s, r) >= l}.
     *
     * @param l steps, 1 or more
     * @param s snapshots, 1 or more
     */
    public static int repeats(int l, int s) {
        requireSteps(l);
        requireSlots(s);
        int r = 0;
        while (longest(s, r) < l) {
            r++;
        }
        return r;
    }

    /**
     * The least number of plain steps that reverse l steps with s snapshots.
     *
     * @param l steps, 1 or more
     * @param s snapshots, the start state among them, 1 or more
     */
    public static long leastSteps(int l, int s) {
        int r = repeats(l, s);
        return r == 0 ? 0 : (long) r * l - choose(s + (long) r, r - 1);
    }

    /**
     * Where the next snapshot goes: the largest m for which {@code m + leastSteps(l - m, s - 1) + leastSteps(m, s)} is least.
     *
     * @param l steps, 2 or more
     * @param s snapshots, the start state among them, 2 or more
     * @return steps from the start, 1 to l - 1
     */
    public static int split(int l, int s) {
        if (l < 2 || s < 2) {
            throw new IllegalArgumentException("checkpoints: got " + l + " steps and " + s + " snapshots to split, needs at least 2"
                    + " of each");
        }
        int r = repeats(l, s);
        long most = Math.min(longest(s, r - 1), l - longest(s - 1, r - 1));
        return (int) Math.max(1, Math.min(l - 1L, most));
    }

    /**
     * Forward runs' worth of steps that one gradient takes, taped steps included: {@code (leastSteps(l, s) + l) / l}; 2 - 1/l
     * with everything kept. With w the price of a pullback in forward steps, a gradient costs this plus w.
     */
    public static double forwardRuns(int l, int s) {
        return (leastSteps(l, s) + (double) l) / l;
    }

    private static long choose(long n, long k) {
        long c = 1;
        for (long i = 1; i <= k; i++) {
            long factor = n - k + i;
            if (c > Long.MAX_VALUE / factor) {
                return Long.MAX_VALUE;
            }
            c = c * factor / i;
        }
        return c;
    }

    private static void requireSteps(int l) {
        if (l < 1) {
            throw new IllegalArgumentException("checkpoints: got " + l + " steps, needs at least 1");
        }
    }

    private static void requireSlots(int s) {
        if (s < 1) {
            throw new IllegalArgumentException("checkpoints: got " + s + " snapshots, needs at least 1: the start state is one of them");
        }
    }
}

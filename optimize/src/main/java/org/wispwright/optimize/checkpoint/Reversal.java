package org.wispwright.optimize.checkpoint;

import java.util.function.IntConsumer;

/**
 * The sweep over a chain and back, with snapshots where {@link BinomialPlan} wants them.
 * <p>{@link #forward} goes through every state once, in order, so the loss is known and the caller may stop there;
 * {@link #reverse} then pulls the steps back, last to first. The forward sweep tapes its last step (that is a forward step as any
 * other), so the reversal starts with no recomputation. Counted over both, the chain gets exactly
 * {@link BinomialPlan#leastSteps} plain steps and one taped step for each step, and no more than the given number of snapshots are held
 * at once. A part of one step is taped at once, so its start is never saved: with {@code snapshots >= steps - 1} every state but
 * the last two is kept.
 * <p>The gradient has the same bits for any number of snapshots, because pulls come in the same order from tapes with the same bits.
 * <p>How: the steps not yet pulled form parts, each starting at a kept state and having a number of snapshots of its own (its start
 * among them). The last part is swept: while it has more than one step and more than one snapshot, its first
 * m = {@code split} steps are run plainly, and the rest becomes a part with one snapshot fewer; then the last step is taped.
 * After its pull the last part is one step shorter.
 * <p>Source: Griewank and Walther (2000), ACM TOMS 26(1), 19-45. Differences from it: recursion unrolled into a stack of
 * parts. Checked by {@code ReversalTest}. One thread calls; the chain may use many.
 */
public final class Reversal {
    private final ReversibleChain chain;
    private final int steps;
    private final int snapshots;
    private final int[] start;                                                 // part p: first step,
    private final int[] length;                                                // steps not yet pulled,
    private final int[] own;                                                   // snapshots, its start (slot p) among them
    private int parts;
    private boolean swept;
    private long plainSteps;
    private long saves;
    private int mostHeld;

    /**
     * Plans a reversal; nothing runs yet. May be used any number of times.
     *
     * @param chain     driven by this object
     * @param steps     1 or more
     * @param snapshots slots that the chain has, 1 or more; more than steps are not used
     * @throws IllegalArgumentException if a count is below 1
     */
    public Reversal(ReversibleChain chain, int steps, int snapshots) {
        BinomialPlan.leastSteps(steps, snapshots);                             // checks both counts
        this.chain = chain;
        this.steps = steps;
        this.snapshots = Math.min(steps, snapshots);
        start = new int[this.snapshots];
        length = new int[this.snapshots];
        own = new int[this.snapshots];
    }

    /** Forward and reverse at once. @return plain steps: {@code leastSteps(steps, snapshots)} */
    public static long run(ReversibleChain chain, int steps, int snapshots) {
        Reversal reversal = new Reversal(chain, steps, snapshots);
        reversal.forward(state -> { });
        reversal.reverse();
        return reversal.plainSteps();
    }

    /**
     * From state 0, which must be current, to state {@code steps}. Forgets an earlier sweep that was not reversed.
     *
     * @param reached told 0, 1, ... steps as each state becomes current, before it is saved; it may read the state. A throw ends the
     *                sweep and comes out here; the next forward starts afresh
     */
    public void forward(IntConsumer reached) {
        swept = false;
        plainSteps = 0;
        saves = 0;
        mostHeld = 0;
        parts = 0;
        reached.accept(0);
        push(0, steps, snapshots);
        sweep(reached);
        reached.accept(steps);
        swept = true;
    }

    /**
     * Pulls all steps back, last to first. Once for each forward sweep.
     *
     * @throws IllegalStateException if no forward sweep has come to its end since the last reversal
     */
    public void reverse() {
        if (!swept) {
            throw new IllegalStateException("checkpoints: reverse called with no finished forward sweep to reverse; call forward first");
        }
        swept = false;
        for (int step = steps - 1; ; step--) {
            chain.pull(step);
            if (--length[parts - 1] == 0) {
                parts--;
            }
            if (parts == 0) {
                return;
            }
            chain.restore(parts - 1);
            sweep(state -> { });
        }
    }

    /** Plain steps since the last forward began. */
    public long plainSteps() {
        return plainSteps;
    }

    /** Snapshots written since the last forward began. */
    public long saves() {
        return saves;
    }

    /** Most snapshots held at once since the last forward began. */
    public int mostHeld() {
        return mostHeld;
    }

    /** From the last part's start, which is current, to its end, opening parts on the way; the last step is taped. */
    private void sweep(IntConsumer reached) {
        int top = parts - 1;
        while (length[top] > 1 && own[top] > 1) {
            int m = BinomialPlan.split(length[top], own[top]);
            int rest = length[top] - m;
            if (rest == 1) {
                break;                                                         // taped at once: its start need not be kept
            }
            advance(start[top], m, reached);
            length[top] = m;
            push(start[top] + m, rest, own[top] - 1);
            top++;
        }
        int last = length[top] - 1;
        advance(start[top], last, reached);
        chain.tape(start[top] + last);
    }

    private void advance(int from, int count, IntConsumer reached) {
        for (int step = from; step < from + count; step++) {
            chain.advance(step);
            plainSteps++;
            reached.accept(step + 1);
        }
    }

    private void push(int from, int count, int snapshotsOwned) {
        chain.save(parts);
        saves++;
        start[parts] = from;
        length[parts] = count;
        own[parts] = snapshotsOwned;
        parts++;
        mostHeld = Math.max(mostHeld, parts);
    }
}

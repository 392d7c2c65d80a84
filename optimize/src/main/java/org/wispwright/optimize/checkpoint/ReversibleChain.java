package org.wispwright.optimize.checkpoint;

/**
 * A chain of steps with one current state, which {@link Reversal} drives forwards and backwards.
 * <p>The chain owns the current state, the snapshots, one tape (what one step's pullback needs, the state after the step
 * included) and the adjoint of a state. All of a step's input but the state (forces, sources) must be the same each time it is
 * run: then a state met again has the same bits, and so has the gradient, wherever the snapshots are.
 * <p>Order of calls: {@code save(0)} with state 0 current; {@code advance} and {@code save} in state order; {@code tape} of the last
 * step; then {@code pull} of the last step and, for each step before it, {@code restore}, {@code advance}s, {@code tape},
 * {@code pull}. A {@code pull} always directly follows the {@code tape} of the same step, with nothing of the chain
 * called in between.
 */
public interface ReversibleChain {

    /** Copies the current state into a slot, over what was there. Slots are numbered 0 to snapshots - 1. */
    void save(int slot);

    /** Makes the state in a slot the current one; the slot keeps it. Must not touch the adjoint. */
    void restore(int slot);

    /** Plain step: the current state is {@code step}'s and becomes that of {@code step + 1}. */
    void advance(int step);

    /** As {@link #advance}, with the same bits, keeping on the tape what {@link #pull} needs. */
    void tape(int step);

    /**
     * Uses the tape of {@code step}: takes the adjoint of state {@code step + 1} (for the last step that starts at zero), adds
     * what the loss owes to that state itself, and pulls it back to the adjoint of state {@code step}, adding to the gradient
     * on the way. The current state is still that of {@code step + 1}, as the tape left it.
     */
    void pull(int step);
}

/**
 * Room: running a chain of steps backwards with room for only a few of its states.
 * <p>Doors: {@link org.wispwright.optimize.checkpoint.Reversal} (the sweep there and back),
 * {@link org.wispwright.optimize.checkpoint.ReversibleChain} (what a chain must be able to do),
 * {@link org.wispwright.optimize.checkpoint.BinomialPlan} (what it costs),
 * {@link org.wispwright.optimize.checkpoint.Budget} (bytes to snapshots).
 * <p>Words: step n leads from <i>state</i> n to state n + 1; <i>snapshot</i> = a kept copy of a state, in a numbered <i>slot</i>;
 * <i>plain step</i> = forward only, nothing kept; <i>taped step</i> = forward, keeping what its pullback needs.
 * <p>May use: nothing. Held by {@code WallsTest}.
 */
package org.wispwright.optimize.checkpoint;

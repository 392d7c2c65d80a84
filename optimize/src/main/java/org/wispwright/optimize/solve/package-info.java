/**
 * Room: the search for the force with which the smoke itself arrives at the retouched frames.
 * <p>Doors: {@link org.wispwright.optimize.solve.SolveProblem} (what is wished), {@link org.wispwright.optimize.solve.Solve} (the
 * search), {@link org.wispwright.optimize.solve.Simulation} (a plain run, with or without a force).
 * <p>Inside: {@link org.wispwright.optimize.solve.SmokeChain} (steps forwards and back under a budget of memory),
 * {@link org.wispwright.optimize.solve.FrameTerms} (what the pictures of the frames owe to the loss),
 * {@link org.wispwright.optimize.solve.SolveLoss} (both together: unknowns to loss and gradient).
 * <p>Words: <i>term</i> = one picture compared with one wanted picture; <i>met</i> = 1 - (note's pyramid
 * loss now / for the original), whatever it is solved with.
 * <p>May use: render, warp.loss, optimize.flow, force, search, checkpoint. Held by {@code WallsTest}.
 */
package org.wispwright.optimize.solve;

/**
 * Room: figures of whole gradients and of whole searches that need the solve's own, closed classes.
 * <p>Doors: {@link org.wispwright.optimize.solve.SolidGradientFigures}, {@link org.wispwright.optimize.solve.SolveRace} (the solve beside
 * what else a practitioner would try, on the same loss and simulator), {@link org.wispwright.optimize.solve.RacePlot} (its curves).
 * <p>Words: <i>runner</i> = a way to come down; <i>curve</i> = its least loss so far against time and work.
 * <p>May use: all of optimize, render, warp.loss, Hipparchus.
 */
package org.wispwright.optimize.solve;

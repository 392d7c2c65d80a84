/**
 * Room: the search for the unknowns that make a smooth function of many numbers small.
 * <p>Doors: {@link org.wispwright.optimize.search.Lbfgs} (one iteration at a time),
 * {@link org.wispwright.optimize.search.LineSearch} (how far along one direction),
 * {@link org.wispwright.optimize.search.Objective} (what is made small).
 * <p>Words: <i>step</i> = multiple of the direction; <i>slope</i> = derivative by the step;
 * <i>pair</i> = a move s of the unknowns and the change y of the gradient over it.
 * <p>May use: nothing. Held by {@code WallsTest}.
 */
package org.wispwright.optimize.search;

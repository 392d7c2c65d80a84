/**
 * Room: the benchmark whose plain side needs the force room's own {@code Mode} and {@code TimeSplines}, which are not public, and other
 * force models to race against. How to run it: {@link org.wispwright.bench}.
 * <p>Doors: {@link org.wispwright.optimize.force.ForceBench}; {@link org.wispwright.optimize.force.FreeForce},
 * {@link org.wispwright.optimize.force.PotentialForce}, {@link org.wispwright.optimize.force.HandleForce} for
 * {@code org.wispwright.optimize.solve.SolveRace}.
 * <p>Words: <i>plain</i> = every mode written out at every face; <i>handle</i> = a ball with a soft edge in which a force of one kind acts.
 * <p>May use: optimize.force, render.volume, render.view, render.lanes.
 */
package org.wispwright.optimize.force;

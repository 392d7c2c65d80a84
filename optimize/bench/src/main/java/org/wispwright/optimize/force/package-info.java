/**
 * Room: the benchmark whose plain side needs the force room's own {@code Mode} and {@code TimeSplines}, which are not public. How to
 * run it: {@link org.wispwright.bench}.
 * <p>Doors: {@link org.wispwright.optimize.force.ForceBench}.
 * <p>Words: <i>plain</i> = every mode written out at every face.
 * <p>May use: optimize.force, render.volume, render.lanes.
 */
package org.wispwright.optimize.force;

/**
 * Room: the extra force as a short list of numbers: solenoidal modes of the box, opened band by band.
 * <p>Doors: {@link org.wispwright.optimize.force.BandPlan} (which frequencies, in what order),
 * {@link org.wispwright.optimize.force.ForceBasis} (numbers to force field and gradients back), a
 * {@link org.wispwright.optimize.force.ForceModel} as any force is that the smoke's chain takes,
 * {@link org.wispwright.optimize.force.SourceCurves} (numbers to strengths of sources and gradients back).
 * <p>Words: <i>mode</i> = one solenoidal standing wave of the box; <i>band</i> = modes and time splines opened together;
 * <i>strength</i> = what a source's rates are multiplied by at a time;
 * <i>unknowns</i> = the numbers, of which the Euclidean norm is the force's root mean square in m/s2.
 * <p>May use: render.volume, render.lanes, optimize.product. Held by {@code WallsTest}.
 */
package org.wispwright.optimize.force;

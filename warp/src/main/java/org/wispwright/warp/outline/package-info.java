/**
 * Room: the outline of smoke as closed loops of points.
 * <p>Doors: {@link org.wispwright.warp.outline.OutlineTracer} (loops at a level of a plane),
 * {@link org.wispwright.warp.outline.Loop} (one closed line, and the same with fewer points),
 * {@link org.wispwright.warp.outline.Outlines} (a picture's outlines as points to take hold of).
 * <p>Words: <i>level</i> = the value on the outline; <i>inside</i> = where the plane reaches the level; <i>loop</i> = a closed line,
 * its last point joined to its first; <i>tolerance</i> = how far a simpler line may stray.
 * <p>May use: warp's measure (planes). Must not use: optimize, ui, java.awt. Held by {@code WallsTest}.
 */
package org.wispwright.warp.outline;

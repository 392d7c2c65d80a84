/**
 * Room: solid things in the box, still or moving, and the cells that they fill.
 * <p>Doors: {@link org.wispwright.optimize.solid.Obstacle} (a thing), {@link org.wispwright.optimize.solid.Solid} (its form),
 * {@link org.wispwright.optimize.solid.SolidCells} (all things on a grid at one moment).
 * <p>Words: <i>solid cell</i> = one that a thing fills, all others are <i>fluid</i>; <i>clearance</i> = cells to the nearest solid cell.
 * <p>May use: render.volume, render.view, render.lanes, optimize.motion.
 */
package org.wispwright.optimize.solid;

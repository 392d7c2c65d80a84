/**
 * Room: smoke in a box, one step at a time, and gradients back through each step.
 * <p>Doors: {@link org.wispwright.optimize.flow.FlowSetup} (what is simulated),
 * {@link org.wispwright.optimize.flow.SmokeSolver} (one substep and its pullback).
 * <p>Operators, each with its pullback beside it: {@link org.wispwright.optimize.flow.Trace},
 * {@link org.wispwright.optimize.flow.Carry}, {@link org.wispwright.optimize.flow.Buoyancy},
 * {@link org.wispwright.optimize.flow.Projection}; with solids {@link org.wispwright.optimize.flow.CarryAround},
 * {@link org.wispwright.optimize.flow.SolidProjection}.
 * <p>Words: <i>substep</i> = one solver step, a frame has one or more; <i>departure</i> = where the fluid of a cell came
 * from; xBar = derivative of the loss by x.
 * <p>May use: render.volume, render.lanes, optimize.product, optimize.solid, optimize.motion. Held by {@code WallsTest}.
 */
package org.wispwright.optimize.flow;

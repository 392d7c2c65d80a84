/**
 * Room: how things move that the person drives: values over frames, and rigid poses.
 * <p>Doors: {@link org.wispwright.optimize.motion.Curve} (numbers over frames),
 * {@link org.wispwright.optimize.motion.Pose} (where a rigid thing is and how it moves).
 * <p>Words: <i>key</i> = a frame with its values; <i>rotation vector</i> = the axis of a turn, as long as its angle in radians.
 * <p>May use: render.view.
 */
package org.wispwright.optimize.motion;

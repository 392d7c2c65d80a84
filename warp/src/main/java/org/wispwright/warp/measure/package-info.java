/**
 * Room: figures that say how alike two pictures, shapes or sequences are, for review and reports. Nothing here has a pullback.
 * <p>Doors: {@link org.wispwright.warp.measure.Plane} (one number a pixel, from a picture's alpha or luminance),
 * {@link org.wispwright.warp.measure.PlaneDifference} and {@link org.wispwright.warp.measure.StructuralSimilarity} (values),
 * {@link org.wispwright.warp.measure.Silhouette} with {@link org.wispwright.warp.measure.SilhouetteDistance} and
 * {@link org.wispwright.warp.measure.PointSets} (shapes), {@link org.wispwright.warp.measure.EarthMover} (distributions on a line),
 * {@link org.wispwright.warp.measure.Likeness} (all of them for one frame),
 * {@link org.wispwright.warp.measure.ContinuityMeter} (how steady a sequence is).
 * <p>Words: <i>plane</i> = one number a pixel; <i>silhouette</i> = the pixels where a plane reaches a level; <i>range</i> = largest
 * value minus smallest that the data can take; <i>chamfer</i> = mean distance to the nearest pixel of the other silhouette.
 * <p>May use: render's picture; warp's loss. Must not use: optimize, ui, java.awt. Held by {@code WallsTest}.
 */
package org.wispwright.warp.measure;

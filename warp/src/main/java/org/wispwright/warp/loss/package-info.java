/**
 * Room: how far a picture is from the wanted one, as one number with its pullback.
 * <p>Doors: {@link org.wispwright.warp.loss.PictureLoss} (what a solve lowers) and its kinds:
 * {@link org.wispwright.warp.loss.PyramidLoss} (colour and opacity at all scales; {@link org.wispwright.warp.loss.Pyramid} has the
 * levels), {@link org.wispwright.warp.loss.SlicedWassersteinLoss} (where the smoke is, however far it has to go),
 * {@link org.wispwright.warp.loss.SilhouetteLoss} (its outline), {@link org.wispwright.warp.loss.EdgeLoss} (steps from pixel to pixel);
 * {@link org.wispwright.warp.loss.LossChoice} (which {@link org.wispwright.warp.loss.LossKind}s a note is solved with, and why);
 * {@link org.wispwright.warp.loss.PictureMeasure} (plain figures for
 * reports).
 * <p>Words: <i>level</i> = the picture halved so many times, level 0 as it is; <i>weights</i> = M, one number 0 or more a pixel;
 * <i>finest</i> = level 0.
 * <p>May use: render's picture. Must not use: optimize, ui, java.awt. Held by {@code WallsTest}.
 */
package org.wispwright.warp.loss;

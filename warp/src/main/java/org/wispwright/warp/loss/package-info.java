/**
 * Room: how far a picture is from the wanted one, as one number with its pullback.
 * <p>Doors: {@link org.wispwright.warp.loss.PyramidLoss} (what a solve lowers), {@link org.wispwright.warp.loss.Pyramid} (the levels it
 * looks at), {@link org.wispwright.warp.loss.PictureMeasure} (plain figures for reports).
 * <p>Words: <i>level</i> = the picture halved so many times, level 0 as it is; <i>weights</i> = M, one number 0 or more a pixel;
 * <i>finest</i> = level 0.
 * <p>May use: render's picture. Must not use: optimize, ui, java.awt. Held by {@code WallsTest}.
 */
package org.wispwright.warp.loss;

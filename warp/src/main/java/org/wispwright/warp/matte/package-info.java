/**
 * Room: which part of a picture is meant, as values.
 * <p>Doors: {@link org.wispwright.warp.matte.Matte} (0 to 1 a pixel) and its kinds:
 * {@link org.wispwright.warp.matte.Region}, {@link org.wispwright.warp.matte.DensityRange},
 * {@link org.wispwright.warp.matte.BrushedMatte}, {@link org.wispwright.warp.matte.ImageMatte},
 * {@link org.wispwright.warp.matte.CombinedMatte};
 * {@link org.wispwright.warp.matte.Sweep} (a brush drawn along a line, and what it covers),
 * {@link org.wispwright.warp.matte.Cover} (the same while the line grows), {@link org.wispwright.warp.matte.Trail} (a pointer's raw points
 * made a line), {@link org.wispwright.warp.matte.Point}.
 * <p>Words: <i>position</i> = fraction of the raster's height from its top left corner, see {@link org.wispwright.warp.matte.Point};
 * <i>coverage</i> = how much of a brush a pixel gets, 0 to 1; <i>feather</i> = width of a soft edge, fraction of the height;
 * <i>window</i> = a rectangle of pixels.
 * <p>May use: render's picture; warp's measure. Must not use: optimize, ui, javax.swing. Held by {@code WallsTest}.
 */
package org.wispwright.warp.matte;

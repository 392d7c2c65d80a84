/**
 * Room: the value of a picture between its pixels.
 * <p>Doors: {@link org.wispwright.warp.resample.Kernel} (weights of four neighbours, by formula),
 * {@link org.wispwright.warp.resample.Resampling} (a picture read at many positions, and the transpose of that),
 * {@link org.wispwright.warp.resample.Rewarp} (rows of a picture read anew where each pixel comes from, in float).
 * <p>Words: <i>sample position</i> = where to read, in pixels, (0,0) at the centre of the first pixel; <i>clear</i> = all zero, what
 * lies outside the frame.
 * <p>May use: render's picture. Must not use: optimize, ui, java.awt. Held by {@code WallsTest}.
 */
package org.wispwright.warp.resample;

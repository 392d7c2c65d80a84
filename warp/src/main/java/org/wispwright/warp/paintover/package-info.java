/**
 * Room: what a person painted over a rendered frame in another program, understood as a retouch of our own picture.
 * <p>Door: {@link org.wispwright.warp.paintover.PaintOver} (frame before, frame after, our original: a
 * {@link org.wispwright.warp.paintover.Painted}).
 * <p>Words: <i>frame</i> = a picture of the production renderer, another look than ours; <i>before</i>, <i>after</i> = that frame as it was
 * and painted over; <i>mask</i> = which pixels a person changed; <i>moved</i> = explained by displacing smoke.
 * <p>May use: render's picture; warp's resample, retouch and matte. Must not use: optimize, ui, java.awt. Held by {@code WallsTest}.
 */
package org.wispwright.warp.paintover;

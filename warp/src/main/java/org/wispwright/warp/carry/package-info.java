/**
 * Room: a retouch taken from one frame to others.
 * <p>Doors: {@link org.wispwright.warp.carry.Between} (a retouch part of the way from one noted frame to another),
 * {@link org.wispwright.warp.carry.PictureFlow} (where a position of a picture goes with the smoke).
 * <p>Words: <i>position</i> = fraction of the raster's height from its top left corner; <i>share</i> = part of the way from the first
 * frame to the second, 0 to 1; <i>arc</i> = length along a line from its start, as a share of the whole.
 * <p>May use: warp's retouch and matte. Must not use: optimize, ui, java.awt, javax.swing. Held by {@code WallsTest}.
 */
package org.wispwright.warp.carry;

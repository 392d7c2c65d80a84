/**
 * Room: cameras, from a pixel to a ray and from a point to a pixel.
 * <p>Doors: {@link org.wispwright.render.view.View}, {@link org.wispwright.render.view.Ray}.
 * <p>Words: <i>gate</i> = the film's opening, in mm; <i>raster</i> = pixels of a frame; <i>axis</i> = from position to aim.
 * <p>May use: volume, picture. Held by {@code WallsTest}.
 */
package org.wispwright.render.view;

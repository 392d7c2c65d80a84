/**
 * Room: pictures as numbers, their colour, and the files they come from and go to.
 * <p>Doors: {@link org.wispwright.render.picture.Picture}.
 * <p>Words: <i>premultiplied</i> = colour already scaled by alpha; <i>coded</i> = through the sRGB curve, as in PNG files.
 * <p>May use: nothing of ours; java.awt.image at the file doors only. Held by {@code WallsTest}.
 */
package org.wispwright.render.picture;

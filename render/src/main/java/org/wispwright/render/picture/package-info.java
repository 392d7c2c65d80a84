/**
 * Room: pictures as numbers, their colour, and the files they come from and go to.
 * <p>Doors: {@link org.wispwright.render.picture.Picture}, {@link org.wispwright.render.picture.Rgb};
 * {@link org.wispwright.render.picture.PngFile}, {@link org.wispwright.render.picture.ExrFile},
 * {@link org.wispwright.render.picture.ExrWriting} (files); {@link org.wispwright.render.picture.Srgb},
 * {@link org.wispwright.render.picture.Luminance}, {@link org.wispwright.render.picture.Exposure} (colour);
 * {@link org.wispwright.render.picture.Compositing} (one picture on another).
 * <p>Words: <i>premultiplied</i> = colour already scaled by alpha; <i>coded</i> = through the sRGB curve, as in PNG files.
 * <p>May use: files; java.awt and javax.imageio in PngFile only; org.lwjgl in ExrFile only. Held by {@code WallsTest}.
 */
package org.wispwright.render.picture;

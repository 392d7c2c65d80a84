package org.wispwright.ui.desk;

import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.ui.report.ShownPicture;

/**
 * A small picture as a display shows it: over the shot's background, coded by sRGB. Nobody changes the array.
 *
 * @param width  pixels
 * @param height pixels
 * @param rgb    rows from the top, each pixel {@code 0xRRGGBB}
 */
public record Thumbnail(int width, int height, int[] rgb) {
    /** Checks the size. @throws IllegalArgumentException if the array has another */
    public Thumbnail {
        if (rgb.length != width * height) {
            throw new IllegalArgumentException("thumbnail: got " + rgb.length + " pixels for " + width + " x " + height);
        }
    }

    /** A linear premultiplied picture over a background. */
    static Thumbnail of(Picture picture, Rgb background) {
        return new Thumbnail(picture.width(), picture.height(), ShownPicture.codes(picture, background));
    }
}

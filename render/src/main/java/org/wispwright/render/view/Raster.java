package org.wispwright.render.view;

import org.wispwright.render.picture.Picture;

/**
 * Pixels of a frame.
 *
 * @param width pixels along a row, 1 to {@value Picture#LONGEST_SIDE}
 * @param height rows, 1 to {@value Picture#LONGEST_SIDE}
 */
public record Raster(int width, int height) {

    /** Checks the sides. @throws IllegalArgumentException if one is out of range */
    public Raster {
        if (width < 1 || height < 1 || width > Picture.LONGEST_SIDE || height > Picture.LONGEST_SIDE) {
            throw new IllegalArgumentException("raster: got " + width + "x" + height + " pixels, needs sides of 1 to " + Picture.LONGEST_SIDE);
        }
    }

    /** A clear picture of this size. */
    public Picture picture() {
        return new Picture(width, height);
    }

    /** "1920x1280 pixels", for messages. */
    public String inWords() {
        return width + "x" + height + " pixels";
    }
}

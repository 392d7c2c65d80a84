package org.wispwright.warp.matte;

import java.util.function.UnaryOperator;
import org.wispwright.render.picture.Picture;

/**
 * Which part of a picture is meant, and how much: 0 to 1 a pixel, at any raster. A retouch acts within it, a hold keeps it, a note
 * weighs by it.
 */
public sealed interface Matte permits Region, DensityRange, BrushedMatte, CombinedMatte, ImageMatte {
    /**
     * The matte's values in a window. They do not depend on which window a pixel is in.
     *
     * @param original read: the picture before any retouch; gives the raster, and the smoke for mattes that depend on it
     * @return a new array: 0 to 1, one a pixel of the window
     */
    float[] values(Picture original, Window window);

    /**
     * Where the matte reaches: 1 wherever its value is above 1/512 (half a code of 8 bits), falling to 0 over a feather beyond. Found
     * from the values, its border taken half a pixel beyond the outermost such pixel.
     *
     * @param feather fraction of the height, 0 or more; a pixel is the least
     * @return a new array: 0 to 1, one a pixel of the window
     */
    default float[] reach(Picture original, Window window, double feather) {
        return Reach.around(this, original, window, feather);
    }

    /**
     * The matte with every position of its own taken to another place; widths of edges stay.
     *
     * @throws IllegalArgumentException if what comes out is no such matte, as where all positions fall together
     */
    Matte moved(UnaryOperator<Point> map);

    /** The matte's values at every pixel of the picture. */
    default float[] values(Picture original) {
        return values(original, Window.all(original.width(), original.height()));
    }
}

package org.wispwright.warp.measure;

import org.wispwright.render.picture.Luminance;
import org.wispwright.render.picture.Picture;

/**
 * One number a pixel, any unit; row 0 at the top, x fastest: pixel (x,y) is {@code values[x + width * y]}. 8 bytes a pixel.
 *
 * @param width  pixels along a row, 1 to {@value Picture#LONGEST_SIDE}
 * @param height rows, 1 to {@value Picture#LONGEST_SIDE}
 * @param values kept, not copied: width x height finite numbers
 */
public record Plane(int width, int height, double[] values) {
    /**
     * Checks the shape and every number.
     *
     * @throws IllegalArgumentException if a side is out of range, the count differs, or a number is not finite
     */
    public Plane {
        if (width < 1 || height < 1 || width > Picture.LONGEST_SIDE || height > Picture.LONGEST_SIDE) {
            throw new IllegalArgumentException("plane: got " + width + "x" + height + " pixels, needs sides of 1 to "
                    + Picture.LONGEST_SIDE);
        }
        if (values.length != Math.multiplyExact(width, height)) {
            throw new IllegalArgumentException("plane: got " + values.length + " values, " + width + "x" + height + " pixels need "
                    + width * height);
        }
        for (int p = 0; p < values.length; p++) {
            if (!Double.isFinite(values[p])) {
                throw new IllegalArgumentException("plane: pixel (" + p % width + ", " + p / width + ") is " + values[p]
                        + ", needs a finite number");
            }
        }
    }

    /** A copy of floats as a plane; errors as in the constructor. */
    public static Plane of(int width, int height, float[] values) {
        double[] wide = new double[values.length];
        for (int p = 0; p < wide.length; p++) {
            wide[p] = values[p];
        }
        return new Plane(width, height, wide);
    }

    /** The opacity of a picture, 0 to 1 if the picture is sound. */
    public static Plane alpha(Picture picture) {
        double[] values = new double[picture.width() * picture.height()];
        for (int p = 0; p < values.length; p++) {
            values[p] = picture.rgba()[4 * p + 3];
        }
        return new Plane(picture.width(), picture.height(), values);
    }

    /** The luminance of a picture's premultiplied colour, linear: what it adds over black. */
    public static Plane luminance(Picture picture) {
        float[] rgba = picture.rgba();
        double[] values = new double[picture.width() * picture.height()];
        for (int p = 0; p < values.length; p++) {
            values[p] = Luminance.of(rgba[4 * p], rgba[4 * p + 1], rgba[4 * p + 2]);
        }
        return new Plane(picture.width(), picture.height(), values);
    }

    /** The value of pixel (x,y). */
    public double at(int x, int y) {
        return values[x + width * y];
    }

    /** Throws, naming {@code measure}, unless both planes have one raster. */
    static void requireSame(String measure, Plane a, Plane b) {
        if (a.width != b.width || a.height != b.height) {
            throw new IllegalArgumentException(measure + ": got planes of " + a.width + "x" + a.height + " and " + b.width + "x"
                    + b.height + " pixels, needs one raster; resample one of them");
        }
    }

    /** Throws, naming {@code measure}, unless there is one finite weight of 0 or more for each pixel. */
    static void requireWeights(String measure, Plane a, float[] weights) {
        if (weights.length != a.values.length) {
            throw new IllegalArgumentException(measure + ": got " + weights.length + " weights, " + a.width + "x" + a.height
                    + " pixels need " + a.values.length);
        }
        for (int p = 0; p < weights.length; p++) {
            if (!(weights[p] >= 0 && weights[p] < Float.POSITIVE_INFINITY)) {
                throw new IllegalArgumentException(measure + ": weight of pixel (" + p % a.width + ", " + p / a.width + ") is "
                        + weights[p] + ", needs a finite number, 0 or more");
            }
        }
    }
}

package org.wispwright.render.picture;

/**
 * A picture in linear light, Rec.709 primaries, premultiplied RGBA, float; row 0 at the top, x fastest:
 * channel c of pixel (x,y) is {@code rgba[4 * (x + width * y) + c]}. 16 bytes a pixel.
 * <p>The centre of pixel (x,y) lies at {@code ((x + 0.5) / height, (y + 0.5) / height)} in fractions of the height.
 */
public final class Picture {
    /** The longest side a picture may have. */
    public static final int LONGEST_SIDE = 16_384;

    private final int width;
    private final int height;
    private final float[] rgba;

    /** A clear (all zero) picture. */
    public Picture(int width, int height) {
        this(width, height, new float[4 * checkedPixels(width, height)]);
    }

    /**
     * Wraps values without copying them.
     *
     * @throws IllegalArgumentException if the count is not 4 width height, or a side is out of 1..{@value #LONGEST_SIDE}
     */
    public Picture(int width, int height, float[] rgba) {
        if (rgba.length != 4 * checkedPixels(width, height)) {
            throw new IllegalArgumentException("picture: got " + rgba.length + " values, " + width + "x" + height + " pixels need " + 4L * width * height);
        }
        this.width = width;
        this.height = height;
        this.rgba = rgba;
    }

    /** Pixels along a row. */
    public int width() {
        return width;
    }

    /** Rows. */
    public int height() {
        return height;
    }

    /** The values themselves, not a copy. */
    public float[] rgba() {
        return rgba;
    }

    /** Channel c (0 red, 1 green, 2 blue, 3 alpha) of pixel (x,y). */
    public float at(int x, int y, int c) {
        return rgba[4 * (x + width * y) + c];
    }

    /** A new picture with the same values. */
    public Picture copy() {
        return new Picture(width, height, rgba.clone());
    }

    private static int checkedPixels(int width, int height) {
        if (width < 1 || height < 1 || width > LONGEST_SIDE || height > LONGEST_SIDE) {
            throw new IllegalArgumentException("picture: got " + width + "x" + height + " pixels, needs sides of 1 to " + LONGEST_SIDE);
        }
        return Math.multiplyExact(width, height);
    }
}

package org.wispwright.warp.matte;

/**
 * A position on a picture, in fractions of the raster's height from its top left corner: inside the frame y runs 0 to 1
 * downwards and x runs 0 to width/height, so the same point means the same place at every raster. Points outside the frame
 * are allowed. The centre of pixel (i,j) lies at {@code ((i + 0.5) / height, (j + 0.5) / height)}.
 *
 * @param x from the left edge, in heights
 * @param y from the top edge, in heights
 */
public record Point(double x, double y) {
    /** Farthest a point may lie from the corner along either axis, in heights; pictures are at most this wide. */
    public static final double FARTHEST = 20_000;

    /**
     * Checks the numbers.
     *
     * @throws IllegalArgumentException if a number is not finite or beyond {@value #FARTHEST} heights
     */
    public Point {
        if (!(Math.abs(x) <= FARTHEST && Math.abs(y) <= FARTHEST)) {
            throw new IllegalArgumentException("point: got (" + x + ", " + y + "), needs finite fractions of the picture's height within "
                    + FARTHEST + " (inside the frame: y 0 to 1, x 0 to width/height)");
        }
    }

    /** Distance to another point, in heights. */
    public double distanceTo(Point other) {
        return Math.hypot(x - other.x, y - other.y);
    }
}

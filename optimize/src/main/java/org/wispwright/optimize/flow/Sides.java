package org.wispwright.optimize.flow;

/**
 * The six sides of the box: left and right along x, floor and top along y, back and front along z (front is larger z).
 *
 * @param left  side at the lowest x
 * @param right side at the highest x
 * @param floor side at the lowest y
 * @param top   side at the highest y
 * @param back  side at the lowest z
 * @param front side at the highest z
 */
public record Sides(Side left, Side right, Side floor, Side top, Side back, Side front) {
    /** A closed box. */
    public static final Sides CLOSED = new Sides(Side.WALL, Side.WALL, Side.WALL, Side.WALL, Side.WALL, Side.WALL);

    /** Checks that all six are given. @throws IllegalArgumentException if one is missing */
    public Sides {
        if (left == null || right == null || floor == null || top == null || back == null || front == null) {
            throw new IllegalArgumentException("sides: needs all of left, right, floor, top, back and front to be wall or open");
        }
    }
}

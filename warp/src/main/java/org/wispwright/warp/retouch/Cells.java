package org.wispwright.warp.retouch;

/**
 * Cells of an as-rigid-as-possible mesh, over the box of the warp's region, or over the whole frame where it has none.
 *
 * @param columns 3 to {@value #MOST}
 * @param rows    3 to {@value #MOST}
 */
public record Cells(int columns, int rows) {
    /** The most cells along a side. */
    public static final int MOST = 64;
    /** What a warp has if it does not say otherwise. */
    public static final Cells USUAL = new Cells(20, 20);

    /**
     * Checks the counts.
     *
     * @throws IllegalArgumentException if one is out of range
     */
    public Cells {
        if (columns < 3 || rows < 3 || columns > MOST || rows > MOST) {
            throw new IllegalArgumentException("mesh: got " + columns + "x" + rows + " cells, needs 3 to " + MOST + " a side");
        }
    }
}

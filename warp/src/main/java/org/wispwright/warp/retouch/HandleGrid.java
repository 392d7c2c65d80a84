package org.wispwright.warp.retouch;

import java.util.ArrayList;
import java.util.List;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Needs;
import org.wispwright.warp.matte.Point;

/**
 * Handles at the corners of a grid: those named are moved, all others are pins.
 *
 * @param columns cells along a row, 1 or more
 * @param rows    rows of cells, 1 or more; at most {@value MeshWarp#MOST_HANDLES} corners in all
 * @param left    x of the left side
 * @param top     y of the top
 * @param right   x of the right side, more than left
 * @param bottom  y of the bottom, more than top
 * @param moved   corners that are not where they were, none twice
 */
public record HandleGrid(int columns, int rows, double left, double top, double right, double bottom, List<Moved> moved) {
    /**
     * A corner that is moved.
     *
     * @param column 0 for the left side, to columns
     * @param row    0 for the top, to rows
     * @param to     where it is moved to
     */
    public record Moved(int column, int row, Point to) {
        /**
         * Checks that the place is there.
         *
         * @throws IllegalArgumentException if not
         */
        public Moved {
            Needs.present("grid corner", "to", to);
        }
    }

    /**
     * Checks the counts, the sides and every corner.
     *
     * @throws IllegalArgumentException if a count is out of range, a side is out of order, or a corner does not exist or comes twice
     */
    public HandleGrid {
        Needs.present("grid", "moved", moved);
        moved = List.copyOf(moved);
        if (columns < 1 || rows < 1 || (long) (columns + 1) * (rows + 1) > MeshWarp.MOST_HANDLES) {
            throw new IllegalArgumentException("grid: got " + columns + "x" + rows + " cells, needs 1 or more a side and at most "
                    + MeshWarp.MOST_HANDLES + " corners");
        }
        if (!(left < right && top < bottom)) {
            throw new IllegalArgumentException("grid: got left " + left + ", top " + top + ", right " + right + ", bottom " + bottom
                    + ", needs left < right and top < bottom");
        }
        boolean[] seen = new boolean[(columns + 1) * (rows + 1)];
        for (Moved corner : moved) {
            if (corner.column() < 0 || corner.row() < 0 || corner.column() > columns || corner.row() > rows) {
                throw new IllegalArgumentException("grid: there is no corner (" + corner.column() + ", " + corner.row() + "); corners are "
                        + "(0, 0) to (" + columns + ", " + rows + ")");
            }
            int n = corner.column() + (columns + 1) * corner.row();
            if (seen[n]) {
                throw new IllegalArgumentException("grid: corner (" + corner.column() + ", " + corner.row()
                        + ") is moved twice; remove one of them");
            }
            seen[n] = true;
        }
    }

    /**
     * A grid over the box that a matte can reach, feather included.
     *
     * @throws IllegalArgumentException as above, or if the matte has no box
     */
    public static HandleGrid over(Matte within, int columns, int rows, List<Moved> moved) {
        Box box = Box.of(within).orElseThrow(() -> new IllegalArgumentException(
                "grid: this kind of matte has no box of its own; say where the grid lies with 'box'"));
        return new HandleGrid(columns, rows, box.left(), box.top(), box.right(), box.bottom(), moved);
    }

    /** One handle a corner, row by row. */
    public List<Handle> handles() {
        List<Handle> handles = new ArrayList<>();
        for (int row = 0; row <= rows; row++) {
            for (int column = 0; column <= columns; column++) {
                // In this form the outermost corners are the box's own numbers.
                handles.add(Handle.pin(new Point((left * (columns - column) + right * column) / columns,
                        (top * (rows - row) + bottom * row) / rows)));
            }
        }
        for (Moved corner : moved) {
            int n = corner.column() + (columns + 1) * corner.row();
            handles.set(n, new Handle(handles.get(n).from(), corner.to()));
        }
        return handles;
    }
}

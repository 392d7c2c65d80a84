package org.wispwright.warp.mesh;

import java.util.ArrayList;
import java.util.List;

/**
 * A grid of four-cornered cells, any unit. Corner (i,j) is entry {@code i + (cellsX + 1) * j}; cell (i,j) lies between corners
 * (i,j) and (i+1,j+1).
 *
 * @param cellsX cells along a row, 1 to {@value #MOST_CELLS}
 * @param cellsY rows of cells, 1 to {@value #MOST_CELLS}
 * @param x      kept, not copied: one a corner, finite
 * @param y      kept, not copied: as many
 */
public record QuadGrid(int cellsX, int cellsY, double[] x, double[] y) {
    /** The most cells along one side. */
    public static final int MOST_CELLS = 256;
    /** A relative Jacobian from minus this to this counts as 0. */
    public static final double TOUCHING = 1e-12;

    /** What became of a cell. */
    public enum State {
        /** Everywhere the right way round. */
        CLEAR,
        /** Squeezed to nothing at a corner, but not turned over. */
        TOUCHING,
        /** Turned over at a corner at least. */
        FOLDED
    }

    /**
     * A cell that is not {@link State#CLEAR}.
     *
     * @param i             column
     * @param j             row
     * @param worstJacobian the least of its corner Jacobians, relative to rest: 1 = as at rest
     * @param state         TOUCHING or FOLDED
     */
    public record Fold(int i, int j, double worstJacobian, State state) { }

    /**
     * Checks the counts and numbers.
     *
     * @throws IllegalArgumentException if a count is out of range or a number is not finite
     */
    public QuadGrid {
        requireCells(cellsX, cellsY);
        int corners = (cellsX + 1) * (cellsY + 1);
        if (x.length != corners || y.length != corners) {
            throw new IllegalArgumentException("grid: got " + x.length + " x and " + y.length + " y, " + cellsX + "x" + cellsY
                    + " cells have " + corners + " corners");
        }
        for (int n = 0; n < corners; n++) {
            if (!Double.isFinite(x[n]) || !Double.isFinite(y[n])) {
                throw new IllegalArgumentException("grid: corner (" + n % (cellsX + 1) + ", " + n / (cellsX + 1) + ") is at (" + x[n]
                        + ", " + y[n] + "), needs finite numbers");
            }
        }
    }

    /**
     * Equal upright cells over a rectangle.
     *
     * @throws IllegalArgumentException if a count is out of range, or the rectangle has no area
     */
    public static QuadGrid over(double left, double top, double right, double bottom, int cellsX, int cellsY) {
        if (!(left < right && top < bottom)) {
            throw new IllegalArgumentException("grid: got a rectangle from (" + left + ", " + top + ") to (" + right + ", " + bottom
                    + "), needs left < right and top < bottom");
        }
        requireCells(cellsX, cellsY);
        int columns = cellsX + 1;
        double[] x = new double[columns * (cellsY + 1)];
        double[] y = new double[x.length];
        for (int n = 0; n < x.length; n++) {
            x[n] = left + (right - left) * (n % columns) / cellsX;
            y[n] = top + (bottom - top) * (n / columns) / cellsY;
        }
        return new QuadGrid(cellsX, cellsY, x, y);
    }

    /** The same cells with corners elsewhere; the arrays are kept. */
    public QuadGrid at(double[] x, double[] y) {
        return new QuadGrid(cellsX, cellsY, x, y);
    }

    /** Two triangles a cell, cut along (i,j) to (i+1,j+1), with copies of the corners. */
    public TriangleMesh triangles() {
        int[] triangles = new int[6 * cellsX * cellsY];
        int t = 0;
        for (int j = 0; j < cellsY; j++) {
            for (int i = 0; i < cellsX; i++) {
                int a = i + (cellsX + 1) * j;
                int b = a + 1;
                int c = a + cellsX + 1;
                for (int corner : new int[] {a, b, c + 1, a, c + 1, c}) {
                    triangles[t++] = corner;
                }
            }
        }
        return new TriangleMesh(x.clone(), y.clone(), triangles);
    }

    /**
     * Jacobians of the bilinear map onto cell (i,j) at its corners (i,j), (i+1,j), (i,j+1), (i+1,j+1): the cross product of the two
     * edges there. The Jacobian of a bilinear cell is linear along both axes, so its least value is one of these.
     *
     * @param out overwritten: 4 numbers
     */
    public void cornerJacobians(int i, int j, double[] out) {
        int a = i + (cellsX + 1) * j;
        int b = a + 1;
        int c = a + cellsX + 1;
        int d = c + 1;
        out[0] = cross(a, b, a, c);
        out[1] = cross(a, b, b, d);
        out[2] = cross(c, d, a, c);
        out[3] = cross(c, d, b, d);
    }

    /**
     * The cells of this grid that are not clear, row by row; none if the map from rest is one to one in every cell.
     *
     * @param rest the grid before it was bent: as many cells, none of them folded itself
     * @throws IllegalArgumentException if the counts differ, or a cell of rest has no area at a corner
     */
    public List<Fold> folds(QuadGrid rest) {
        if (rest.cellsX != cellsX || rest.cellsY != cellsY) {
            throw new IllegalArgumentException("grid: got " + cellsX + "x" + cellsY + " cells and " + rest.cellsX + "x" + rest.cellsY
                    + " at rest, needs the same");
        }
        List<Fold> folds = new ArrayList<>();
        double[] now = new double[4];
        double[] before = new double[4];
        for (int j = 0; j < cellsY; j++) {
            for (int i = 0; i < cellsX; i++) {
                cornerJacobians(i, j, now);
                rest.cornerJacobians(i, j, before);
                double worst = Double.POSITIVE_INFINITY;
                for (int k = 0; k < 4; k++) {
                    if (before[k] == 0) {
                        throw new IllegalArgumentException("grid: cell (" + i + ", " + j + ") has no area at a corner at rest");
                    }
                    worst = Math.min(worst, now[k] / before[k]);
                }
                if (worst <= TOUCHING) {
                    folds.add(new Fold(i, j, worst, worst < -TOUCHING ? State.FOLDED : State.TOUCHING));
                }
            }
        }
        return folds;
    }

    private static void requireCells(int cellsX, int cellsY) {
        if (cellsX < 1 || cellsY < 1 || cellsX > MOST_CELLS || cellsY > MOST_CELLS) {
            throw new IllegalArgumentException("grid: got " + cellsX + "x" + cellsY + " cells, needs 1 to " + MOST_CELLS + " a side");
        }
    }

    private double cross(int a, int b, int c, int d) {
        return (x[b] - x[a]) * (y[d] - y[c]) - (y[b] - y[a]) * (x[d] - x[c]);
    }
}

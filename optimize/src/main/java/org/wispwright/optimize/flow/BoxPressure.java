package org.wispwright.optimize.flow;

import java.util.function.IntConsumer;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;

/**
 * Solves {@code D G p = d} in a box without solids, directly: {@link AxisTransform} along x and z, then for each pair of modes the
 * tridiagonal system {@code p[j-1] - (2 + lambda) p[j] + p[j+1] = d[j]} along y by the Thomas algorithm, with any mix of wall and open at
 * floor and top. In a closed box the constant mode has no solution unless the right side sums to 0; its pressure is fixed by
 * {@code p[top] = 0}. Source: Swarztrauber (1977), SIAM Review 19(3), 490-501.
 */
final class BoxPressure {
    /** Columns of a plane that one piece of the z transforms takes. */
    private static final int COLUMNS = 512;

    private final GridShape shape;
    private final Sides sides;
    private final Lanes lanes;
    private final AxisTransform alongX;
    private final AxisTransform alongZ;
    /** Inverse pivots of the Thomas algorithm, at the index of mode (l, j, n). */
    private final float[] inversePivots;
    private final float[] scratch;

    /** Prepares the solve for one box: 8 bytes a cell are kept. */
    BoxPressure(GridShape shape, Sides sides, Lanes lanes) {
        this.shape = shape;
        this.sides = sides;
        this.lanes = lanes;
        alongX = new AxisTransform(shape.nx(), sides.left(), sides.right());
        alongZ = shape.isPlane() ? new AxisTransform(1, Side.WALL, Side.WALL) : new AxisTransform(shape.nz(), sides.back(), sides.front());
        inversePivots = new float[shape.cells()];
        scratch = new float[shape.cells()];
        lanes.forEach(shape.nz(), this::preparePivots);
    }

    private void preparePivots(int n) {
        for (int l = 0; l < shape.nx(); l++) {
            double lambda = alongX.eigenvalue(l) + alongZ.eigenvalue(n);
            double previous = 0;
            for (int j = 0; j < shape.ny(); j++) {
                double pivot = diagonal(j, lambda) - previous;
                // The constant mode of a closed box is singular in its last row: that pivot is 0 and its pressure is set to 0.
                boolean singular = j == shape.ny() - 1 && lambda < 1e-12 && sides.floor() == Side.WALL && sides.top() == Side.WALL;
                previous = singular ? 0 : 1 / pivot;
                inversePivots[shape.cell(l, j, n)] = (float) previous;
            }
        }
    }

    private double diagonal(int j, double lambda) {
        int neighbours = 2;
        if (j == 0 && sides.floor() == Side.WALL) {
            neighbours--;
        }
        if (j == shape.ny() - 1 && sides.top() == Side.WALL) {
            neighbours--;
        }
        return -(neighbours + lambda);
    }

    /**
     * Overwrites the right side with the pressure.
     *
     * @param a         in cells
     * @param fillSlab  run for every slab before it is read, on the slab's own lane
     * @param eachSlab  run for every slab when all pressures are there
     */
    void solve(float[] a, IntConsumer fillSlab, IntConsumer eachSlab) {
        int plane = shape.nx() * shape.ny();
        int nz = shape.nz();
        int pieces = (plane + COLUMNS - 1) / COLUMNS;
        lanes.forEach(nz, k -> {
            fillSlab.accept(k);
            alongX.rowsToModes(a, scratch, k * plane, shape.ny());
        });
        lanes.forEach(pieces, c -> alongZ.columnsToModes(a, scratch, plane, c * COLUMNS, Math.min(COLUMNS, plane - c * COLUMNS)));
        lanes.forEach(nz, n -> solveAlongY(a, n));
        lanes.forEach(pieces, c -> alongZ.columnsToCells(a, scratch, plane, c * COLUMNS, Math.min(COLUMNS, plane - c * COLUMNS)));
        lanes.forEach(nz, k -> alongX.rowsToCells(a, scratch, k * plane, shape.ny()));
        lanes.forEach(nz, eachSlab);
    }

    private void solveAlongY(float[] a, int n) {
        int nx = shape.nx();
        int ny = shape.ny();
        int first = shape.cell(0, 0, n);
        for (int l = 0; l < nx; l++) {
            a[first + l] *= inversePivots[first + l];
        }
        for (int j = 1; j < ny; j++) {
            int row = first + j * nx;
            for (int l = 0; l < nx; l++) {
                a[row + l] = (a[row + l] - a[row - nx + l]) * inversePivots[row + l];
            }
        }
        for (int j = ny - 2; j >= 0; j--) {
            int row = first + j * nx;
            for (int l = 0; l < nx; l++) {
                a[row + l] -= inversePivots[row + l] * a[row + nx + l];
            }
        }
    }
}

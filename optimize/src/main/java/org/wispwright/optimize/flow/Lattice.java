package org.wispwright.optimize.flow;

import org.wispwright.render.volume.GridShape;

/**
 * Where the values of one component live: cell centres, or the faces square to one axis. Tells, for a row of values along
 * x, which cells' displacements carry it: a face takes the mean of the two cells beside it, an outermost face its one cell.
 *
 * @param shape the box
 * @param axis  which faces, or the centres
 * @param mx    values along x
 * @param my    values along y
 * @param mz    values along z
 */
record Lattice(GridShape shape, Axis axis, int mx, int my, int mz) {
    /** Kind of lattice. */
    enum Axis { CENTRES, X_FACES, Y_FACES, Z_FACES }

    static Lattice of(GridShape shape, Axis axis) {
        return new Lattice(shape, axis, shape.nx() + (axis == Axis.X_FACES ? 1 : 0), shape.ny() + (axis == Axis.Y_FACES ? 1 : 0),
                shape.nz() + (axis == Axis.Z_FACES ? 1 : 0));
    }

    /** Number of values. */
    int count() {
        return mx * my * mz;
    }

    /** Work on {@code count} neighbouring values along x that share one rule. */
    @FunctionalInterface
    interface Segment {
        /**
         * @param first      index of the first value
         * @param count      how many
         * @param i          x index of the first
         * @param j          y index
         * @param k          z index
         * @param cell       cell whose displacement carries the first value
         * @param cellBefore the other cell, or the same
         */
        void run(int first, int count, int i, int j, int k, int cell, int cellBefore);
    }

    /** Runs every row of slab k; faces on a side for which {@code outermost} is false are left out. */
    void forSlab(int k, boolean lowest, boolean highest, Segment work) {
        int nx = shape.nx();
        if (axis == Axis.Z_FACES && (k == 0 && !lowest || k == mz - 1 && !highest)) {
            return;
        }
        int cellK = Math.min(k, shape.nz() - 1);
        int beforeK = axis == Axis.Z_FACES ? Math.max(k - 1, 0) : cellK;
        for (int j = 0; j < my; j++) {
            if (axis == Axis.Y_FACES && (j == 0 && !lowest || j == my - 1 && !highest)) {
                continue;
            }
            int cell = shape.cell(0, Math.min(j, shape.ny() - 1), cellK);
            int before = shape.cell(0, axis == Axis.Y_FACES ? Math.max(j - 1, 0) : Math.min(j, shape.ny() - 1), beforeK);
            int row = mx * (j + my * k);
            if (axis != Axis.X_FACES) {
                work.run(row, nx, 0, j, k, cell, before);
                continue;
            }
            if (lowest) {
                work.run(row, 1, 0, j, k, cell, cell);
            }
            work.run(row + 1, nx - 1, 1, j, k, cell + 1, cell);
            if (highest) {
                work.run(row + nx, 1, nx, j, k, cell + nx - 1, cell + nx - 1);
            }
        }
    }
}

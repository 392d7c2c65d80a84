package org.wispwright.optimize.flow;

import org.wispwright.optimize.solid.SolidCells;
import org.wispwright.render.volume.GridShape;

/**
 * Where one value comes from when solids are near: the straight path back, cut at the first solid face, and the fluid values around its
 * end.
 *
 * <p>The path from p to t = p - D (clamped to the box) goes through cells that share faces (Amanatides and Woo 1987, Eurographics 87,
 * 3-10). Before a solid cell it ends at the face between: {@code e = p + s (t - p)}, {@code s = (face - p_a) / (t_a - p_a)}, a the face's
 * axis. The value there is linear between those of the 8 around e that are fluid and joined by faces, inside the 8, to the cell that the
 * path ends in, with weights that sum to 1: {@code Q = sum w q / sum w}. So a value has its sources on its own side of every closed wall.
 * Ours; cutting follows common practice.
 *
 * <p>One object serves one value after another on one thread.
 */
final class Departure {
    private final GridShape shape;
    private final Lattice lattice;
    private final SolidCells solids;
    /** Half a cell from a value's index to the lower side of its cell, along the axes it is centred on; 0 along its own. */
    private final double[] half = new double[3];
    private final int[] most;
    private final int[] mostCell;
    private final double[] start = new double[3];
    private final double[] target = new double[3];
    private final double[] end = new double[3];
    private final boolean[] clamped = new boolean[3];
    private final int[] cell = new int[3];
    private final double[] share = new double[3];
    private final double[] byEnd = new double[3];
    /** Indices of the 8 values around the end. */
    private final int[] around = new int[8];
    private final double[] weights = new double[8];
    private int counted;
    private double weight;
    /** Axis of the face that cut the path, -1 for none. */
    private int cut;
    private double part;

    Departure(Lattice lattice, SolidCells solids) {
        this.lattice = lattice;
        this.solids = solids;
        shape = lattice.shape();
        half[0] = lattice.axis() == Lattice.Axis.X_FACES ? 0 : 0.5;
        half[1] = lattice.axis() == Lattice.Axis.Y_FACES ? 0 : 0.5;
        half[2] = lattice.axis() == Lattice.Axis.Z_FACES ? 0 : 0.5;
        most = new int[] {lattice.mx() - 1, lattice.my() - 1, lattice.mz() - 1};
        mostCell = new int[] {shape.nx() - 1, shape.ny() - 1, shape.nz() - 1};
    }

    /**
     * Follows the path of the value at (i, j, k), whose cells are fluid.
     *
     * @param dx    displacement there, cells
     * @param clear so far from solids the plain interpolation sees none of them
     * @return false if the path is whole and ends so clear that the plain interpolation is right
     */
    boolean follow(int i, int j, int k, float dx, float dy, float dz, int clear) {
        aim(0, i, dx);
        aim(1, j, dy);
        aim(2, k, dz);
        walk();
        if (cut < 0 && solids.clearance(shape.cell(cell[0], cell[1], cell[2])) > clear) {
            return false;
        }
        for (int axis = 0; axis < 3; axis++) {
            end[axis] = start[axis] + part * (target[axis] - start[axis]);
        }
        gather();
        return true;
    }

    private void aim(int axis, int at, float back) {
        float to = at - back;
        clamped[axis] = to < 0 || to > most[axis];
        to = to < 0 ? 0 : to > most[axis] ? most[axis] : to;
        start[axis] = at;
        target[axis] = to;
        // On a face of its own axis a path begins in the cell that it goes to.
        double from = at + half[axis];
        int first = (int) Math.floor(from);
        if (half[axis] == 0 && to < at) {
            first--;
        }
        cell[axis] = Math.max(0, Math.min(mostCell[axis], first));
    }

    private void walk() {
        cut = -1;
        part = 1;
        while (true) {
            int next = -1;
            double least = 1;
            for (int axis = 0; axis < 3; axis++) {
                double way = target[axis] - start[axis];
                if (way == 0) {
                    continue;
                }
                double border = cell[axis] + (way > 0 ? 1 : 0) - half[axis];
                double at = (border - start[axis]) / way;
                if (at < least) {
                    least = at;
                    next = axis;
                }
            }
            if (next < 0) {
                return;
            }
            int step = target[next] > start[next] ? 1 : -1;
            int to = cell[next] + step;
            if (to < 0 || to > mostCell[next]) {
                return;
            }
            cell[next] = to;
            if (solids.isSolid(shape.cell(cell[0], cell[1], cell[2]))) {
                cell[next] = to - step;
                cut = next;
                part = Math.max(0, least);
                return;
            }
        }
    }

    private void gather() {
        int home = 0;
        int[] low = new int[3];
        int[] high = new int[3];
        for (int axis = 0; axis < 3; axis++) {
            low[axis] = Math.min((int) end[axis], most[axis]);
            high[axis] = Math.min(low[axis] + 1, most[axis]);
            share[axis] = end[axis] - low[axis];
            boolean upper = half[axis] == 0 ? share[axis] >= 0.5 : cell[axis] > low[axis];
            home |= upper && high[axis] > low[axis] ? 1 << axis : 0;
        }
        int fluid = 0;
        for (int corner = 0; corner < 8; corner++) {
            int i = (corner & 1) == 0 ? low[0] : high[0];
            int j = (corner & 2) == 0 ? low[1] : high[1];
            int k = (corner & 4) == 0 ? low[2] : high[2];
            around[corner] = i + lattice.mx() * (j + lattice.my() * k);
            weights[corner] = side(0, corner & 1) * side(1, corner >> 1 & 1) * side(2, corner >> 2);
            fluid |= isFluid(i, j, k) ? 1 << corner : 0;
        }
        counted = 1 << home;
        for (int before = 0; before != counted;) {
            before = counted;
            int along = (counted & 0x55) << 1 | (counted & 0xAA) >> 1;
            int up = (counted & 0x33) << 2 | (counted & 0xCC) >> 2;
            int deep = (counted & 0x0F) << 4 | (counted & 0xF0) >> 4;
            counted |= (along | up | deep) & fluid;
        }
        weight = 0;
        for (int corner = 0; corner < 8; corner++) {
            weight += (counted >> corner & 1) * weights[corner];
        }
    }

    private double side(int axis, int upper) {
        return upper == 0 ? 1 - share[axis] : share[axis];
    }

    /** True if the value at this index belongs to the fluid: its cell, or one of the two cells beside its face, is fluid. */
    private boolean isFluid(int i, int j, int k) {
        switch (lattice.axis()) {
            case X_FACES:
                return fluidCell(i, j, k) || fluidCell(i - 1, j, k);
            case Y_FACES:
                return fluidCell(i, j, k) || fluidCell(i, j - 1, k);
            case Z_FACES:
                return fluidCell(i, j, k) || fluidCell(i, j, k - 1);
            default:
                return fluidCell(i, j, k);
        }
    }

    private boolean fluidCell(int i, int j, int k) {
        return i >= 0 && j >= 0 && k >= 0 && i <= mostCell[0] && j <= mostCell[1] && k <= mostCell[2]
                && !solids.isSolid(shape.cell(i, j, k));
    }

    /** The value at the end of the path. */
    float value(float[] q) {
        return (float) mean(q);
    }

    private double mean(float[] q) {
        double sum = 0;
        for (int corner = 0; corner < 8; corner++) {
            if ((counted >> corner & 1) != 0) {
                sum += weights[corner] * q[around[corner]];
            }
        }
        return sum / weight;
    }

    /**
     * The pullback of {@link #value}: {@code qBar += w outBar / sum w}, and along each axis
     * {@code eBar = outBar sum w' (q - Q) / sum w}; then {@code tBar = s eBar}, of which the axis of the cut gets
     * {@code -s sum over the others of eBar (t - p) / (t_a - p_a)}; {@code DBar = -tBar}, 0 where t was clamped.
     *
     * @param back overwritten: the derivative by the displacement along x, y, z
     */
    void pullback(float[] q, float outBar, float[] qBar, double[] back) {
        double mean = mean(q);
        java.util.Arrays.fill(byEnd, 0);
        for (int corner = 0; corner < 8; corner++) {
            if ((counted >> corner & 1) == 0) {
                continue;
            }
            qBar[around[corner]] += (float) (outBar * weights[corner] / weight);
            double more = outBar * (q[around[corner]] - mean) / weight;
            for (int axis = 0; axis < 3; axis++) {
                double slope = (corner >> axis & 1) == 0 ? -1 : 1;
                for (int other = 0; other < 3; other++) {
                    slope *= other == axis ? 1 : side(other, corner >> other & 1);
                }
                byEnd[axis] += slope * more;
            }
        }
        double atCut = 0;
        for (int axis = 0; axis < 3; axis++) {
            back[axis] = clamped[axis] || axis == cut ? 0 : -part * byEnd[axis];
            if (cut >= 0 && axis != cut) {
                atCut += part * byEnd[axis] * (target[axis] - start[axis]) / (target[cut] - start[cut]);
            }
        }
        if (cut >= 0) {
            back[cut] = clamped[cut] ? 0 : atCut;
        }
    }
}

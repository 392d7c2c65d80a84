package org.wispwright.optimize.flow;

import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;

/**
 * Carries a component along a displacement (semi-Lagrangian): each value becomes what lay at its departure point.
 *
 * <p>Forward: {@code out(p) = Q(p - D(p))}, D the displacement at p (of the cell at a centre, the mean of the two cells at a
 * face), Q the interpolation of q, positions clamped to the outermost values. Faces on a wall become 0.
 * Sources: Staniforth and Cote (1991), Monthly Weather Review 119(9), 2206-2223 (linear); Keys (1981), IEEE ASSP 29(6),
 * 1153-1160, a = -1/2 (cubic), clamped to the 8 nearest values.
 *
 * <p>Pullback: {@code qBar(around) += weight outBar(p)}, {@code DBar(p) -= gradient of Q at the departure outBar(p)}, halved to
 * each cell for a face, 0 along an axis where the position was clamped. Where the cubic was clamped to a cell's value, that
 * cell alone gets outBar. It is the exact derivative of the branch that the forward took.
 */
public final class Carry {
    private final Lattice lattice;
    private final Interpolation interpolation;
    private final boolean lowest;
    private final boolean highest;
    private final Lanes lanes;

    private Carry(Lattice lattice, Interpolation interpolation, boolean lowest, boolean highest, Lanes lanes) {
        this.lattice = lattice;
        this.interpolation = interpolation;
        this.lowest = lowest;
        this.highest = highest;
        this.lanes = lanes;
    }

    /** For values at cell centres. */
    static Carry ofCells(GridShape shape, Interpolation interpolation, Lanes lanes) {
        return new Carry(Lattice.of(shape, Lattice.Axis.CENTRES), interpolation, true, true, lanes);
    }

    /** For the component on faces square to an axis; {@code lowest}, {@code highest}: the side it meets there. */
    static Carry ofFaces(GridShape shape, Lattice.Axis axis, Interpolation interpolation, Side lowest, Side highest, Lanes lanes) {
        boolean plane = axis == Lattice.Axis.Z_FACES && shape.isPlane();
        return new Carry(Lattice.of(shape, axis), interpolation, lowest == Side.OPEN && !plane, highest == Side.OPEN && !plane, lanes);
    }

    /**
     * Overwrites out.
     *
     * @param q   read: one value each of the lattice, any unit
     * @param d   read: in cells
     * @param out overwritten; must not be q
     */
    void forward(float[] q, Displacement d, float[] out) {
        lanes.forEach(lattice.mz(), k -> {
            clearWalls(out, k);
            if (interpolation == Interpolation.LINEAR) {
                lattice.forSlab(k, lowest, highest, (first, count, i, j, kk, cell, before) ->
                        LinearKernel.forward(lattice, q, d, out, first, count, i, j, kk, cell, before));
            } else {
                lattice.forSlab(k, lowest, highest, (first, count, i, j, kk, cell, before) ->
                        CubicKernel.forward(lattice, q, d, out, first, count, i, j, kk, cell, before));
            }
        });
    }

    /**
     * Adds to qBar and dBar.
     *
     * @param q      read: as in the forward run
     * @param d      read: as in the forward run
     * @param reach  cells in z that d reaches, see {@link Displacement#reachInZ}
     * @param outBar read
     * @param qBar   added to
     * @param dBar   added to
     */
    void pullback(float[] q, Displacement d, int reach, float[] outBar, float[] qBar, Displacement dBar) {
        boolean linear = interpolation == Interpolation.LINEAR;
        // A departure lies at most the reach away; beyond it the interpolation's far corner and, for the cubic, its outer ring.
        new Slabs(lattice.mz(), reach + (linear ? 1 : 2)).forEach(lanes, k -> {
            if (linear) {
                lattice.forSlab(k, lowest, highest, (first, count, i, j, kk, cell, before) ->
                        LinearKernel.pullback(lattice, q, d, outBar, qBar, dBar, first, count, i, j, kk, cell, before));
            } else {
                lattice.forSlab(k, lowest, highest, (first, count, i, j, kk, cell, before) ->
                        CubicKernel.pullback(lattice, q, d, outBar, qBar, dBar, first, count, i, j, kk, cell, before));
            }
        });
    }

    private void clearWalls(float[] out, int k) {
        int mx = lattice.mx();
        int my = lattice.my();
        int slab = mx * my;
        switch (lattice.axis()) {
            case X_FACES -> {
                for (int row = slab * k; row < slab * (k + 1); row += mx) {
                    out[row] = 0;
                    out[row + mx - 1] = 0;
                }
            }
            case Y_FACES -> {
                java.util.Arrays.fill(out, slab * k, slab * k + mx, 0f);
                java.util.Arrays.fill(out, slab * (k + 1) - mx, slab * (k + 1), 0f);
            }
            case Z_FACES -> {
                if (k == 0 || k == lattice.mz() - 1) {
                    java.util.Arrays.fill(out, slab * k, slab * (k + 1), 0f);
                }
            }
            case CENTRES -> { }
        }
    }
}

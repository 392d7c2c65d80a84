package org.wispwright.optimize.flow;

import org.wispwright.optimize.solid.SolidCells;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;

/**
 * {@link Carry} with solids in the box: values whose plain departure a solid spoils are carried along their {@link Departure} instead,
 * linearly. Values of solid cells, and of faces that a solid cell touches, become 0; their derivative goes nowhere. Everything else is
 * the plain carry, to the bit.
 */
final class CarryAround {
    private final Carry plain;
    private final Lattice lattice;
    private final boolean lowest;
    private final boolean highest;
    private final int clear;
    private final Lanes lanes;

    /** What is done with a value that the plain carry does not serve. */
    private interface Mend {
        /** The value's index; its departure, null for a value that is solid's; the two cells that carry it. */
        void at(int value, Departure departure, int cell, int before);
    }

    private CarryAround(Carry plain, Lattice lattice, Interpolation interpolation, boolean lowest, boolean highest, Lanes lanes) {
        this.plain = plain;
        this.lattice = lattice;
        this.lowest = lowest;
        this.highest = highest;
        this.lanes = lanes;
        clear = interpolation == Interpolation.LINEAR ? 1 : 2;                 // cells that an interpolation reads beyond the nearest
    }

    /** For values at cell centres. */
    static CarryAround ofCells(GridShape shape, Interpolation interpolation, Lanes lanes) {
        return new CarryAround(Carry.ofCells(shape, interpolation, lanes), Lattice.of(shape, Lattice.Axis.CENTRES), interpolation, true,
                true, lanes);
    }

    /** For the component on faces square to an axis; {@code lowest}, {@code highest}: the side it meets there. */
    static CarryAround ofFaces(GridShape shape, Lattice.Axis axis, Interpolation interpolation, Side lowest, Side highest, Lanes lanes) {
        boolean plane = axis == Lattice.Axis.Z_FACES && shape.isPlane();
        return new CarryAround(Carry.ofFaces(shape, axis, interpolation, lowest, highest, lanes), Lattice.of(shape, axis), interpolation,
                lowest == Side.OPEN && !plane, highest == Side.OPEN && !plane, lanes);
    }

    /** Overwrites out; arguments as {@link Carry#forward}. */
    void forward(float[] q, Displacement d, SolidCells solids, float[] out) {
        plain.forward(q, d, out);
        lanes.forEach(lattice.mz(), k -> forSlab(d, solids, k, (value, departure, cell, before) ->
                out[value] = departure == null ? 0 : departure.value(q)));
    }

    /**
     * Adds to qBar and dBar; arguments as {@link Carry#pullback}.
     *
     * @param outBar overwritten with 0 where a solid is near
     */
    void pullback(float[] q, Displacement d, int reach, SolidCells solids, float[] outBar, float[] qBar, Displacement dBar) {
        // One piece writes around its departures, which lie at most the reach and a corner away.
        new Slabs(lattice.mz(), reach + 1).forEach(lanes, k -> {
            double[] back = new double[3];
            forSlab(d, solids, k, (value, departure, cell, before) -> {
                if (departure != null && outBar[value] != 0) {
                    departure.pullback(q, outBar[value], qBar, back);
                    addHalves(dBar.x, cell, before, back[0]);
                    addHalves(dBar.y, cell, before, back[1]);
                    addHalves(dBar.z, cell, before, back[2]);
                }
                outBar[value] = 0;
            });
        });
        plain.pullback(q, d, reach, outBar, qBar, dBar);
    }

    private static void addHalves(float[] bar, int cell, int before, double value) {
        bar[cell] += (float) (0.5 * value);
        bar[before] += (float) (0.5 * value);
    }

    private void forSlab(Displacement d, SolidCells solids, int k, Mend mend) {
        Departure departure = new Departure(lattice, solids);
        lattice.forSlab(k, lowest, highest, (first, count, i, j, kk, cell, before) -> {
            for (int n = 0; n < count; n++) {
                int c = cell + n;
                int b = before + n;
                int near = Math.min(solids.clearance(c), solids.clearance(b));
                if (near == 0) {
                    mend.at(first + n, null, c, b);
                    continue;
                }
                float x = 0.5f * (d.x[c] + d.x[b]);
                float y = 0.5f * (d.y[c] + d.y[b]);
                float z = 0.5f * (d.z[c] + d.z[b]);
                float far = Math.max(Math.abs(x), Math.max(Math.abs(y), Math.abs(z)));
                // One cell more, for a value on a face begins half a cell from its cells' centres.
                if (near < SolidCells.FAR && near <= far + clear + 1 || far + clear + 1 >= SolidCells.FAR) {
                    if (departure.follow(i + n, j, kk, x, y, z, clear)) {
                        mend.at(first + n, departure, c, b);
                    }
                }
            }
        });
    }
}

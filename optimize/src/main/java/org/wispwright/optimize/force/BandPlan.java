package org.wispwright.optimize.force;

import java.util.ArrayList;
import java.util.List;
import org.wispwright.render.volume.GridShape;

/**
 * The order in which frequencies open: each cut-off is 2^(3/2) times the one before, which halves the energy still missing
 * under Kolmogorov's (1941) k^(-5/3) law ({@code share above k = (k/k0)^(-2/3)}), and since the turn-over time goes as
 * k^(-2/3), each band has twice the time splines of the one before.
 */
public final class BandPlan {
    /** Factor from one cut-off to the next: it halves k^(-2/3). */
    public static final double GROWTH = Math.pow(2, 1.5);
    /** Lowest cut-off, in half-cycles across the box's smallest side: the first band can bend, lean and stretch the whole. */
    static final double FIRST_HALF_CYCLES = 3;
    /** The last cut-off as cells a cycle: shorter waves are not resolved well enough to be worth unknowns. */
    static final double LEAST_CELLS_A_CYCLE = 8;
    /** Splines of the first band over the whole range. */
    static final int FIRST_SPLINES = 5;

    private BandPlan() { }

    /** Cut-offs from {@code first}, times {@link #GROWTH}, as long as they stay below {@code last}; then last itself. */
    public static List<Double> cutoffs(double first, double last) {
        List<Double> cuts = new ArrayList<>();
        for (double cut = first; cut < last * (1 - 1e-9); cut *= GROWTH) {
            cuts.add(cut);
        }
        cuts.add(last);
        return cuts;
    }

    /** Kolmogorov's law with no upper end: the share of the energy above {@code ratio} times the lowest frequency. */
    public static double energyAbove(double ratio) {
        return Math.pow(ratio, -2.0 / 3.0);
    }

    /** The bands for a box and a number of force steps (frames - 1, at least 1). */
    public static List<Band> of(GridShape shape, int steps) {
        double side = shape.cellMetres() * Math.min(shape.nx(), shape.isPlane() ? shape.ny() : Math.min(shape.ny(), shape.nz()));
        double last = 1 / (LEAST_CELLS_A_CYCLE * shape.cellMetres());
        // A box of a few cells still gets one band that holds its lowest modes.
        double first = Math.min(FIRST_HALF_CYCLES / (2 * side), Math.max(last, 1 / side));
        List<Band> bands = new ArrayList<>();
        double low = 0;
        int splines = FIRST_SPLINES;
        for (double cut : cutoffs(first, Math.max(first, last))) {
            bands.add(new Band(low, cut, Math.min(splines, steps)));
            low = cut;
            splines *= 2;
        }
        return bands;
    }
}

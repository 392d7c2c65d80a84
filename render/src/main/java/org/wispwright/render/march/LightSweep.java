package org.wispwright.render.march;

import java.util.Arrays;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.ScalarGrid;

/**
 * How much of a directional light reaches each cell's centre, by one sweep of the box along the axis that the light's
 * direction follows most, and the pullback by density. Cost: one pass over the cells and one exponential a cell.
 * <p>Forward. Slices are taken from the light's side on. d = density, {@code q = extinction h / (2 |w_a|)} the depth of half
 * the path from slice to slice through density 1, w the unit direction to the light, a the sweep's axis, S the bilinear
 * shift by {@code (w_b, w_c)/|w_a|} cells within a slice, in which there is no smoke outside the box:
 * <pre>
 *   tau_0 = q d_0       tau_s = S(tau_(s-1) + q d_(s-1)) + q d_s       lit = exp(-tau)
 * </pre>
 * This is the trapezoid rule along the light's path, so it is exact for a density that is even along the sweep, and of
 * second order otherwise. It interpolates depths, not transmittances: depths are linear in density and smoother.
 * <p>Pullback, slices from the far side on: {@code g_s = -lit_s litBar_s + e_s}, {@code e_s = S' g_(s+1)} (0 for the last),
 * {@code dBar_s += q (g_s + e_s)}. S' is the shift by the opposite offset, because the offset is the same everywhere.
 * <p>Source of the model: Max (1995), IEEE TVCG 1(2), 99-108, light attenuated on its way in; the recurrence is ours.
 * <p>Not for two threads at once: the slices' buffers are reused.
 */
public final class LightSweep {
    /** Cells around a slice: a shift by up to one cell each way, and its right neighbour, read zeros outside. */
    private static final int RIM = 2;

    private final GridShape shape;
    private final double sharePerExtinction;
    private final int slices;
    private final int strideA;
    private final int countB;
    private final int strideB;
    private final int countC;
    private final int strideC;
    private final double shiftB;
    private final double shiftC;
    private final boolean lightAtHighEnd;
    private final double[] rimmed;
    private final double[] slice;

    /**
     * @param shape the box
     * @param towards direction to the light, any length above 0
     */
    public LightSweep(GridShape shape, Vec3 towards) {
        this.shape = shape;
        Vec3 unit = towards.unit();
        double[] w = {unit.x(), unit.y(), unit.z()};
        int[] counts = {shape.nx(), shape.ny(), shape.nz()};
        int[] strides = {1, shape.nx(), shape.nx() * shape.ny()};
        int a = 0;
        for (int axis = 1; axis < 3; axis++) {
            if (Math.abs(w[axis]) > Math.abs(w[a])) {
                a = axis;
            }
        }
        int b = a == 0 ? 1 : 0;
        int c = a == 2 ? 1 : 2;
        slices = counts[a];
        strideA = strides[a];
        countB = counts[b];
        strideB = strides[b];
        countC = counts[c];
        strideC = strides[c];
        shiftB = w[b] / Math.abs(w[a]);
        shiftC = w[c] / Math.abs(w[a]);
        lightAtHighEnd = w[a] > 0;
        sharePerExtinction = 0.5 * shape.cellMetres() / Math.abs(w[a]);
        rimmed = new double[Math.multiplyExact(countB + 2 * RIM, countC + 2 * RIM)];
        slice = new double[countB * countC];
    }

    /**
     * Transmittance from each cell's centre to the light.
     *
     * @param density read: this box's cells
     * @param extinction 1/m for density 1
     * @param lit overwritten: 1 where nothing is in the way; must not be density
     * @throws IllegalArgumentException if a grid is not of this box
     */
    public void transmittance(ScalarGrid density, double extinction, ScalarGrid lit, Lanes lanes) {
        requireShape("density", density);
        requireShape("lit", lit);
        float[] d = density.values();
        float[] depth = lit.values();
        double q = extinction * sharePerExtinction;
        for (int s = 0; s < slices; s++) {
            if (s == 0) {
                Arrays.fill(slice, 0);
            } else {
                shift(shiftB, shiftC);
            }
            int at = offset(s);
            for (int c = 0; c < countC; c++) {
                for (int b = 0; b < countB; b++) {
                    int cell = at + b * strideB + c * strideC;
                    double half = q * d[cell];
                    double tau = slice[b + countB * c] + half;
                    depth[cell] = (float) tau;
                    rimmed[b + RIM + (countB + 2 * RIM) * (c + RIM)] = tau + half;
                }
            }
        }
        int layer = shape.nx() * shape.ny();
        lanes.forEach(shape.nz(), k -> exponentials(depth, k * layer, (k + 1) * layer));
    }

    /**
     * Adds the derivative by density.
     *
     * @param extinction as in the forward run
     * @param lit read: what {@link #transmittance} wrote
     * @param litBar read: derivative of the loss by lit
     * @param densityBar added to
     * @throws IllegalArgumentException if a grid is not of this box
     */
    public void pullback(double extinction, ScalarGrid lit, ScalarGrid litBar, ScalarGrid densityBar) {
        requireShape("lit", lit);
        requireShape("litBar", litBar);
        requireShape("densityBar", densityBar);
        float[] l = lit.values();
        float[] lBar = litBar.values();
        float[] dBar = densityBar.values();
        double q = extinction * sharePerExtinction;
        for (int s = slices - 1; s >= 0; s--) {
            if (s == slices - 1) {
                Arrays.fill(slice, 0);
            } else {
                shift(-shiftB, -shiftC);
            }
            int at = offset(s);
            for (int c = 0; c < countC; c++) {
                for (int b = 0; b < countB; b++) {
                    int cell = at + b * strideB + c * strideC;
                    double e = slice[b + countB * c];
                    double g = e - (double) l[cell] * lBar[cell];
                    dBar[cell] += (float) (q * (g + e));
                    rimmed[b + RIM + (countB + 2 * RIM) * (c + RIM)] = g;
                }
            }
        }
    }

    private int offset(int s) {
        return strideA * (lightAtHighEnd ? slices - 1 - s : s);
    }

    /** Overwrites slice(b,c) with the rimmed buffer at (b + byB, c + byC), bilinear; both shifts in -1..1. */
    private void shift(double byB, double byC) {
        int wholeB = (int) Math.floor(byB);
        int wholeC = (int) Math.floor(byC);
        double fb = byB - wholeB;
        double fc = byC - wholeC;
        double w00 = (1 - fb) * (1 - fc);
        double w10 = fb * (1 - fc);
        double w01 = (1 - fb) * fc;
        double w11 = fb * fc;
        int row = countB + 2 * RIM;
        for (int c = 0; c < countC; c++) {
            int from = RIM + wholeB + row * (c + RIM + wholeC);
            int to = countB * c;
            for (int b = 0; b < countB; b++) {
                int n = from + b;
                slice[to + b] = w00 * rimmed[n] + w10 * rimmed[n + 1] + w01 * rimmed[n + row] + w11 * rimmed[n + row + 1];
            }
        }
    }

    private static void exponentials(float[] depth, int from, int to) {
        for (int n = from; n < to; n++) {
            depth[n] = (float) (1 + FastExp.minusOpacity(depth[n]));
        }
    }

    private void requireShape(String what, ScalarGrid grid) {
        if (!grid.shape().equals(shape)) {
            throw new IllegalArgumentException("light sweep: '" + what + "' is " + grid.shape().inWords() + ", the sweep is for "
                    + shape.inWords() + " of the same size and place");
        }
    }
}

package org.wispwright.render.march;

import java.util.Arrays;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.ScalarGrid;

/**
 * How much of a directional light reaches each cell's centre, by one sweep of the box along the axis that the light's
 * direction follows most, and the pullback by density. Cost: two passes over the cells and one exponential a cell.
 * <p>Forward. Slices s = 0, 1, ... are taken from the light's side on. d = density, w = the unit direction to the light, a the
 * sweep's axis, {@code q = extinction h / (2 |w_a|)} the depth of half the path between slices through density 1. The line to the
 * light that passes cell x of slice s is called by the place {@code u = x + s o}, {@code o = (w_b, w_c) / |w_a|} cells, at which
 * it would pass slice 0; E(u) is the depth gathered along it so far, at whole u. There is no smoke outside the box:
 * <pre>
 *   tau_s(x) = E(x + s o) + q d_s(x)          (E between whole places bilinear)
 *   E(u) += 2 q d_s(u - s o)                  (d between cells bilinear)
 *   lit = exp(-tau)
 * </pre>
 * This is the trapezoid rule along the light's path, first half step included: exact for a density that is even along the
 * sweep, of second order otherwise. Two interpolations in all, and not one a slice, keep shadows as sharp far away as near by.
 * <p>Pullback, slices from the far side on, with {@code g_s = -lit_s litBar_s}: the same two steps, transposed, in the other order:
 * <pre>
 *   dBar_s(x) += 2 q EBar(x + s o) + q g_s(x)          EBar(u) += g_s(u - s o)
 * </pre>
 * Both interpolations have the same weights in every cell of a slice, and each is the other's transpose.
 * <p>Source of the model: Max (1995), IEEE TVCG 1(2), 99-108, light attenuated on its way in; the slanted sweep is ours.
 * <p>Not for two threads at once: the buffers are reused.
 */
public final class LightSweep {
    private final GridShape shape;
    private final double halfPath;
    private final int slices;
    private final int strideA;
    private final int countB;
    private final int strideB;
    private final int countC;
    private final int strideC;
    private final double slantB;
    private final double slantC;
    private final boolean lightAtHighEnd;
    /** Place of u = 0 in a row of {@link #lines}, and of row 0. */
    private final int zeroB;
    private final int zeroC;
    private final int lineRow;
    /** E or EBar at whole u. */
    private final double[] lines;
    /** One slice of values with a rim of one zero. */
    private final double[] rimmed;

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
        slantB = w[b] / Math.abs(w[a]);
        slantC = w[c] / Math.abs(w[a]);
        lightAtHighEnd = w[a] > 0;
        halfPath = 0.5 * shape.cellMetres() / Math.abs(w[a]);
        double last = slices - 1;
        zeroB = (int) Math.max(0, -Math.floor(last * slantB));
        zeroC = (int) Math.max(0, -Math.floor(last * slantC));
        lineRow = countB + 2 + (int) Math.ceil(last * Math.abs(slantB));
        lines = new double[Math.multiplyExact(lineRow, countC + 2 + (int) Math.ceil(last * Math.abs(slantC)))];
        rimmed = new double[Math.multiplyExact(countB + 2, countC + 2)];
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
        double q = extinction * halfPath;
        Arrays.fill(lines, 0);
        Arrays.fill(depth, 0);
        for (int s = 0; s < slices; s++) {
            int at = offset(s);
            for (int c = 0; c < countC; c++) {
                int row = (countB + 2) * (c + 1) + 1;
                for (int b = 0; b < countB; b++) {
                    rimmed[row + b] = q * d[at + b * strideB + c * strideC];
                }
            }
            readLines(s, 1, 1, depth, at);
            addToLines(s, 2);
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
        double q = extinction * halfPath;
        Arrays.fill(lines, 0);
        for (int s = slices - 1; s >= 0; s--) {
            int at = offset(s);
            for (int c = 0; c < countC; c++) {
                int row = (countB + 2) * (c + 1) + 1;
                for (int b = 0; b < countB; b++) {
                    int cell = at + b * strideB + c * strideC;
                    rimmed[row + b] = -(double) l[cell] * lBar[cell];
                }
            }
            readLines(s, 2 * q, q, densityBar.values(), at);
            addToLines(s, 1);
        }
    }

    private int offset(int s) {
        return strideA * (lightAtHighEnd ? slices - 1 - s : s);
    }

    /** {@code to(x) += share lines(x + s o) + own rimmed(x)} for one slice. */
    private void readLines(int s, double share, double own, float[] to, int at) {
        int wholeB = (int) Math.floor(s * slantB);
        int wholeC = (int) Math.floor(s * slantC);
        double fb = s * slantB - wholeB;
        double fc = s * slantC - wholeC;
        double w00 = share * (1 - fb) * (1 - fc);
        double w10 = share * fb * (1 - fc);
        double w01 = share * (1 - fb) * fc;
        double w11 = share * fb * fc;
        for (int c = 0; c < countC; c++) {
            int line = wholeB + zeroB + lineRow * (c + wholeC + zeroC);
            int row = (countB + 2) * (c + 1) + 1;
            int cell = at + c * strideC;
            for (int b = 0; b < countB; b++) {
                double sum = w00 * lines[line + b] + w10 * lines[line + b + 1] + w01 * lines[line + b + lineRow]
                        + w11 * lines[line + b + lineRow + 1];
                to[cell + b * strideB] += (float) (sum + own * rimmed[row + b]);
            }
        }
    }

    /** {@code lines(u) += share rimmed(u - s o)} at the whole places that the slice reaches: the transpose of reading. */
    private void addToLines(int s, double share) {
        int wholeB = (int) Math.floor(s * slantB);
        int wholeC = (int) Math.floor(s * slantC);
        double fb = s * slantB - wholeB;
        double fc = s * slantC - wholeC;
        double w00 = share * (1 - fb) * (1 - fc);
        double w10 = share * fb * (1 - fc);
        double w01 = share * (1 - fb) * fc;
        double w11 = share * fb * fc;
        int rimRow = countB + 2;
        for (int c = 0; c <= countC; c++) {
            int line = wholeB + zeroB + lineRow * (c + wholeC + zeroC);
            int row = rimRow * (c + 1) + 1;
            for (int b = 0; b <= countB; b++) {
                int n = row + b;
                lines[line + b] += w00 * rimmed[n] + w10 * rimmed[n - 1] + w01 * rimmed[n - rimRow] + w11 * rimmed[n - rimRow - 1];
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

package org.wispwright.optimize.force;

import java.util.Arrays;
import org.wispwright.optimize.product.RowProduct;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * Sums of standing waves over a box, and the transpose, axis by axis with small matrix products: about {@code 3 N} products a cell
 * for N waves along z, plus little for the other two axes. Linear; {@link #project} is the exact transpose of {@link #sum}.
 *
 * <p>Forward, for each component: {@code out[k][j][i] = sum_n Z[k][n] sum_m Y[j][m] sum_l X[l][i] a[n][m][l]}, X, Y, Z sines on
 * the component's own axis (at faces) and cosines on the others (at centres). Pullback: the same sums over i, j, k.
 */
final class WaveSum {
    private static final int COLUMNS = 512;

    private final GridShape shape;
    private final int waves;
    private final int mostM;
    private final int mostN;
    private final Lanes lanes;
    private final Component[] components;

    WaveSum(GridShape shape, int mostL, int mostM, int mostN, Lanes lanes) {
        this.shape = shape;
        this.waves = mostL;
        this.mostM = mostM;
        this.mostN = mostN;
        this.lanes = lanes;
        components = new Component[] {new Component(0), new Component(1), new Component(2)};
    }

    /** One component's tables and workspace. */
    private final class Component {
        final int mx;
        final int my;
        final int mz;
        /** Wave l at place i: {@code l * mx + i}, and the transpose; y and z alike. */
        final float[] waveByX;
        final float[] xByWave;
        final float[] yByWave;
        final float[] waveByY;
        final float[] zByWave;
        final float[] waveByZ;
        /** Amplitude of (l, m, n) at {@code l + waves * (m + mostM * n)}. */
        final float[] amplitudes;
        final float[] rows;
        final float[] planes;

        Component(int axis) {
            mx = shape.nx() + (axis == 0 ? 1 : 0);
            my = shape.ny() + (axis == 1 ? 1 : 0);
            mz = shape.nz() + (axis == 2 ? 1 : 0);
            waveByX = table(waves, mx, shape.nx(), axis == 0);
            xByWave = transpose(waveByX, waves, mx);
            waveByY = table(mostM, my, shape.ny(), axis == 1);
            yByWave = transpose(waveByY, mostM, my);
            waveByZ = table(mostN, mz, shape.nz(), axis == 2);
            zByWave = transpose(waveByZ, mostN, mz);
            amplitudes = new float[waves * mostM * mostN];
            rows = new float[mx * mostM * mostN];
            planes = new float[mx * my * mostN];
        }
    }

    private static float[] table(int waves, int places, int cells, boolean sine) {
        float[] values = new float[waves * places];
        for (int w = 0; w < waves; w++) {
            for (int i = 0; i < places; i++) {
                // At the two walls the sine is 0 exactly, which sin(pi w) in floating point is not.
                boolean wall = sine && (i == 0 || i == places - 1);
                double angle = Math.PI * w / cells;
                values[w * places + i] = wall ? 0 : (float) (sine ? Math.sin(angle * i) : Math.cos(angle * (i + 0.5)));
            }
        }
        return values;
    }

    private static float[] transpose(float[] table, int rows, int columns) {
        float[] out = new float[table.length];
        for (int r = 0; r < rows; r++) {
            for (int c = 0; c < columns; c++) {
                out[c * rows + r] = table[r * columns + c];
            }
        }
        return out;
    }

    void clear() {
        for (Component c : components) {
            Arrays.fill(c.amplitudes, 0f);
        }
    }

    private int place(Mode mode) {
        return mode.l() + waves * (mode.m() + mostM * mode.n());
    }

    /** Adds a mode with an amplitude to what {@link #sum} will sum. */
    void add(Mode mode, double amplitude) {
        int at = place(mode);
        components[0].amplitudes[at] += (float) (mode.ax() * amplitude);
        components[1].amplitudes[at] += (float) (mode.ay() * amplitude);
        components[2].amplitudes[at] += (float) (mode.az() * amplitude);
    }

    /** A mode's product with the field of the last {@link #project}. */
    double along(Mode mode) {
        int at = place(mode);
        return mode.ax() * components[0].amplitudes[at] + mode.ay() * components[1].amplitudes[at]
                + mode.az() * components[2].amplitudes[at];
    }

    /** Overwrites out with the sum of the modes added since {@link #clear}. */
    void sum(MacVelocity out) {
        float[][] values = {out.x(), out.y(), out.z()};
        lanes.forEach(3 * mostN, piece -> {
            Component c = components[piece / mostN];
            int n = piece % mostN;
            RowProduct.multiply(c.amplitudes, n * mostM * waves, waves, mostM, waves, c.waveByX, 0, c.mx, c.rows, n * mostM * c.mx, c.mx, c.mx);
            RowProduct.multiply(c.yByWave, 0, mostM, c.my, mostM, c.rows, n * mostM * c.mx, c.mx, c.planes, n * c.my * c.mx, c.mx, c.mx);
        });
        for (int axis = 0; axis < 3; axis++) {
            Component c = components[axis];
            float[] to = values[axis];
            int plane = c.mx * c.my;
            lanes.forEach((plane + COLUMNS - 1) / COLUMNS, piece -> {
                int start = piece * COLUMNS;
                RowProduct.multiply(c.zByWave, 0, mostN, c.mz, mostN, c.planes, start, plane, to, start, plane, Math.min(COLUMNS, plane - start));
            });
        }
    }

    /** The transpose of {@link #sum}: leaves each wave's product with the field, for {@link #along}. */
    void project(MacVelocity field) {
        float[][] values = {field.x(), field.y(), field.z()};
        for (int axis = 0; axis < 3; axis++) {
            Component c = components[axis];
            float[] from = values[axis];
            int plane = c.mx * c.my;
            lanes.forEach((plane + COLUMNS - 1) / COLUMNS, piece -> {
                int start = piece * COLUMNS;
                RowProduct.multiply(c.waveByZ, 0, c.mz, mostN, c.mz, from, start, plane, c.planes, start, plane, Math.min(COLUMNS, plane - start));
            });
        }
        lanes.forEach(3 * mostN, piece -> {
            Component c = components[piece / mostN];
            int n = piece % mostN;
            RowProduct.multiply(c.waveByY, 0, c.my, mostM, c.my, c.planes, n * c.my * c.mx, c.mx, c.rows, n * mostM * c.mx, c.mx, c.mx);
            RowProduct.multiply(c.rows, n * mostM * c.mx, c.mx, mostM, c.mx, c.xByWave, 0, waves, c.amplitudes, n * mostM * waves, waves, waves);
        });
    }
}

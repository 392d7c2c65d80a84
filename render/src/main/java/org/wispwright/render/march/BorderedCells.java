package org.wispwright.render.march;

import java.util.Arrays;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.ScalarGrid;

/**
 * Cell values with one more cell around them that repeats the nearest: between the outermost centres and the box's walls a
 * value is then the outermost cell's, with no clamp in any loop. Cell (i,j,k) of the grid is at
 * {@code (i+1) + nx' ((j+1) + ny' (k+1))}, nx' = nx + 2 and so on; lattice coordinate of a point = {@code (x - origin)/h + 1/2}.
 */
final class BorderedCells {
    private final GridShape shape;
    private final int acrossX;
    private final int acrossY;
    private final int acrossZ;
    private final float[] values;

    BorderedCells(GridShape shape) {
        this.shape = shape;
        acrossX = shape.nx() + 2;
        acrossY = shape.ny() + 2;
        acrossZ = shape.nz() + 2;
        long cells = (long) acrossX * acrossY * acrossZ;
        if (cells > Integer.MAX_VALUE - 16) {
            throw new IllegalArgumentException("ray march: " + shape.inWords() + " with a border are " + cells + " cells, needs fewer than 2^31");
        }
        values = new float[(int) cells];
    }

    float[] values() {
        return values;
    }

    int acrossX() {
        return acrossX;
    }

    int acrossY() {
        return acrossY;
    }

    int acrossZ() {
        return acrossZ;
    }

    /** Cells from one row to the next. */
    int strideY() {
        return acrossX;
    }

    /** Cells from one layer to the next. */
    int strideZ() {
        return acrossX * acrossY;
    }

    /** Overwrites all values from a grid, the border by the nearest cell. */
    void fill(ScalarGrid grid, Lanes lanes) {
        lanes.forEach(acrossZ, k -> fillLayer(grid.values(), k));
    }

    void clear() {
        Arrays.fill(values, 0);
    }

    /** The transpose of {@link #fill}: adds every value, border too, to the cell it came from. */
    void addTo(ScalarGrid grid, Lanes lanes) {
        lanes.forEach(shape.nz(), k -> foldLayer(grid.values(), k));
    }

    private void fillLayer(float[] from, int k) {
        int nx = shape.nx();
        int kk = Math.min(Math.max(k - 1, 0), shape.nz() - 1);
        for (int j = 0; j < acrossY; j++) {
            int jj = Math.min(Math.max(j - 1, 0), shape.ny() - 1);
            int source = shape.cell(0, jj, kk);
            int row = acrossX * (j + acrossY * k);
            values[row] = from[source];
            System.arraycopy(from, source, values, row + 1, nx);
            values[row + nx + 1] = from[source + nx - 1];
        }
    }

    private void foldLayer(float[] into, int k) {
        int firstZ = k == 0 ? 0 : k + 1;
        int lastZ = k == shape.nz() - 1 ? k + 2 : k + 1;
        for (int kk = firstZ; kk <= lastZ; kk++) {
            for (int j = 0; j < acrossY; j++) {
                int jj = Math.min(Math.max(j - 1, 0), shape.ny() - 1);
                int target = shape.cell(0, jj, k);
                int row = acrossX * (j + acrossY * kk);
                into[target] += values[row];
                for (int i = 0; i < shape.nx(); i++) {
                    into[target + i] += values[row + 1 + i];
                }
                into[target + shape.nx() - 1] += values[row + shape.nx() + 1];
            }
        }
    }
}

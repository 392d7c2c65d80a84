package org.wispwright.optimize.flow;

import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;

/**
 * How far the fluid at each cell's centre moved during a span, in cells: it came from {@code (i - x, j - y, k - z)} in
 * index coordinates of centres. 12 bytes a cell; index as {@link GridShape#cell}. Also holds derivatives by it.
 */
final class Displacement {
    final GridShape shape;
    final float[] x;
    final float[] y;
    final float[] z;

    Displacement(GridShape shape) {
        this.shape = shape;
        x = new float[shape.cells()];
        y = new float[shape.cells()];
        z = new float[shape.cells()];
    }

    /** Overwrites slab k with 0. */
    void clearSlab(int k) {
        int plane = shape.nx() * shape.ny();
        java.util.Arrays.fill(x, k * plane, (k + 1) * plane, 0f);
        java.util.Arrays.fill(y, k * plane, (k + 1) * plane, 0f);
        java.util.Arrays.fill(z, k * plane, (k + 1) * plane, 0f);
    }

    /** Cells in z, rounded up, that the farthest departure lies away. */
    int reachInZ(Lanes lanes, float[] mostPerSlab) {
        int plane = shape.nx() * shape.ny();
        lanes.forEach(shape.nz(), k -> {
            float most = 0;
            for (int c = k * plane; c < (k + 1) * plane; c++) {
                float size = z[c] < 0 ? -z[c] : z[c];
                if (size > most) {
                    most = size;
                }
            }
            mostPerSlab[k] = most;
        });
        float most = 0;
        for (int k = 0; k < shape.nz(); k++) {
            most = Math.max(most, mostPerSlab[k]);
        }
        // No departure lies outside the box, so the box's depth is reach enough, also when a velocity has gone wild.
        return (int) Math.min(Math.ceil(most), shape.nz());
    }
}

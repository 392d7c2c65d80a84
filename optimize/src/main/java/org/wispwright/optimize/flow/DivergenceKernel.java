package org.wispwright.optimize.flow;

import java.util.function.IntConsumer;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * Divergence of a face velocity in cells: {@code d = u[i+1] - u[i] + v[j+1] - v[j] + w[k+1] - w[k]}, the cell's side as the
 * unit of length. Harlow and Welch (1965), Physics of Fluids 8(12), 2182-2189.
 */
final class DivergenceKernel {
    private DivergenceKernel() { }

    /** Overwrites slab k of d. In the plane case the z faces do not count. */
    static void slab(GridShape shape, float[] u, float[] v, float[] w, float[] d, int k) {
        int nx = shape.nx();
        int ny = shape.ny();
        int plane = nx * ny;
        for (int j = 0; j < ny; j++) {
            int c = shape.cell(0, j, k);
            int f = shape.xFace(0, j, k);
            int g = shape.yFace(0, j, k);
            for (int i = 0; i < nx; i++) {
                d[c + i] = (u[f + i + 1] - u[f + i]) + (v[g + i + nx] - v[g + i]);
            }
            if (!shape.isPlane()) {
                for (int i = 0; i < nx; i++) {
                    d[c + i] += w[c + i + plane] - w[c + i];
                }
            }
        }
    }

    /**
     * Largest |div u| h / largest |u component|; 0 for still air.
     *
     * @param scratch   overwritten with the divergence
     * @param clearSlab overwrites with 0 what does not count of a slab of scratch
     */
    static double relativeMax(MacVelocity u, float[] scratch, IntConsumer clearSlab, Lanes lanes) {
        GridShape shape = u.shape();
        lanes.forEach(shape.nz(), k -> {
            slab(shape, u.x(), u.y(), u.z(), scratch, k);
            clearSlab.accept(k);
        });
        float most = 0;
        for (float v : scratch) {
            most = Math.max(most, Math.abs(v));
        }
        float fastest = u.largest();
        return fastest == 0 ? 0 : most / (double) fastest;
    }
}

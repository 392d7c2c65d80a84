package org.wispwright.optimize.flow;

import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;

/**
 * Smoke pushes itself up: an acceleration on y faces in proportion to the density around them. Linear.
 *
 * <p>Forward, s = seconds times buoyancy: {@code v[j] += s (q[j-1] + q[j]) / 2}; on an open floor or top the one cell beside
 * the face counts whole; wall faces get nothing. Pullback, the transpose: {@code qBar[j] += s (vBar[j] + vBar[j+1]) / 2}, with
 * whole weight on open outermost faces. Source: Boussinesq approximation, e.g. Batchelor (1967), ch. 4; checked by O21-O23.
 */
final class Buoyancy {
    private final GridShape shape;
    private final float floorShare;
    private final float topShare;
    private final Lanes lanes;

    Buoyancy(GridShape shape, Sides sides, Lanes lanes) {
        this.shape = shape;
        this.lanes = lanes;
        floorShare = sides.floor() == Side.OPEN ? 1 : 0;
        topShare = sides.top() == Side.OPEN ? 1 : 0;
    }

    /** Adds to v (y faces, m/s); q is the density in cells; push = seconds times buoyancy, m/s per unit density. */
    void forward(float[] q, double push, float[] v) {
        int nx = shape.nx();
        int ny = shape.ny();
        float half = (float) (0.5 * push);
        lanes.forEach(shape.nz(), k -> {
            for (int j = 0; j <= ny; j++) {
                int f = shape.yFace(0, j, k);
                int above = shape.cell(0, Math.min(j, ny - 1), k);
                int below = shape.cell(0, Math.max(j - 1, 0), k);
                float s = half * share(j);
                for (int i = 0; i < nx; i++) {
                    v[f + i] += s * (q[below + i] + q[above + i]);
                }
            }
        });
    }

    /** Adds to qBar. */
    void pullback(float[] vBar, double push, float[] qBar) {
        int nx = shape.nx();
        int ny = shape.ny();
        float half = (float) (0.5 * push);
        lanes.forEach(shape.nz(), k -> {
            for (int j = 0; j < ny; j++) {
                int c = shape.cell(0, j, k);
                int f = shape.yFace(0, j, k);
                // At an open end one cell stands for both sides of the face.
                float low = half * share(j) * (j == 0 ? 2 : 1);
                float high = half * share(j + 1) * (j == ny - 1 ? 2 : 1);
                for (int i = 0; i < nx; i++) {
                    qBar[c + i] += low * vBar[f + i] + high * vBar[f + nx + i];
                }
            }
        });
    }

    private float share(int j) {
        return j == 0 ? floorShare : j == shape.ny() ? topShare : 1;
    }
}

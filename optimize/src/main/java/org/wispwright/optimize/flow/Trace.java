package org.wispwright.optimize.flow;

import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * Where the fluid of each cell came from: one backward step of order 2 (midpoint rule).
 *
 * <p>Forward: {@code c = (mean of opposite faces) seconds / h}, cells a span, at centres; then for the cell at index p
 * {@code displacement(p) = C(p - c(p) / 2)}, C the trilinear interpolation of c with positions clamped to the outermost
 * centres. Source: Staniforth and Cote (1991), Monthly Weather Review 119(9), 2206-2223.
 * Difference from the usual face-wise path: one path a cell, at its centre; a face takes the mean of its two cells
 * ({@link Carry}). That smooths the carrying velocity by O(h^2), the scheme's own order in space, and costs a third.
 *
 * <p>Pullback, with m = p - c(p)/2 and J the gradient of C at m (0 along an axis where m was clamped):
 * {@code cBar(cells around m) += weight dBar(p)}, {@code cBar(p) -= J' dBar(p) / 2}, then
 * {@code uBar(both faces) += cBar seconds / (2 h)}.
 */
public final class Trace {
    private final GridShape shape;
    private final Lanes lanes;
    private final Displacement c;
    private final Displacement cBar;
    private final float[] mostPerSlab;

    /** Takes 24 bytes a cell of workspace. */
    public Trace(GridShape shape, Lanes lanes) {
        this.shape = shape;
        this.lanes = lanes;
        c = new Displacement(shape);
        cBar = new Displacement(shape);
        mostPerSlab = new float[shape.nz()];
    }

    /**
     * Overwrites the displacement.
     *
     * @param u       read: m/s
     * @param seconds the span
     */
    void forward(MacVelocity u, double seconds, Displacement out) {
        float scale = (float) (0.5 * seconds / shape.cellMetres());
        lanes.forEach(shape.nz(), k -> centreSlab(u, scale, k));
        lanes.forEach(shape.nz(), k -> forwardSlab(out.x, out.y, out.z, k));
    }

    /**
     * Adds to uBar what a derivative by the displacement asks of the velocity.
     *
     * @param u               read: the velocity of the forward run
     * @param displacementBar read: derivative by the displacement, in cells
     * @param uBar            added to
     */
    void pullback(MacVelocity u, double seconds, Displacement displacementBar, MacVelocity uBar) {
        float scale = (float) (0.5 * seconds / shape.cellMetres());
        lanes.forEach(shape.nz(), k -> {
            centreSlab(u, scale, k);
            cBar.clearSlab(k);
        });
        // Half a displacement to the midpoint, one cell more for the interpolation's far corner.
        int reach = c.reachInZ(lanes, mostPerSlab) / 2 + 2;
        new Slabs(shape.nz(), reach).forEach(lanes, k -> pullbackSlab(displacementBar.x, displacementBar.y, displacementBar.z, k));
        lanes.forEach(shape.nz(), k -> facesOfSlab(uBar, scale, k));
    }

    private void centreSlab(MacVelocity u, float scale, int k) {
        float[] cx = c.x;
        float[] cy = c.y;
        float[] cz = c.z;
        int nx = shape.nx();
        int plane = nx * shape.ny();
        float[] ux = u.x();
        float[] uy = u.y();
        float[] uz = u.z();
        for (int j = 0; j < shape.ny(); j++) {
            int n = shape.cell(0, j, k);
            int f = shape.xFace(0, j, k);
            int g = shape.yFace(0, j, k);
            for (int i = 0; i < nx; i++) {
                cx[n + i] = scale * (ux[f + i] + ux[f + i + 1]);
            }
            for (int i = 0; i < nx; i++) {
                cy[n + i] = scale * (uy[g + i] + uy[g + i + nx]);
            }
            for (int i = 0; i < nx; i++) {
                cz[n + i] = scale * (uz[n + i] + uz[n + i + plane]);
            }
        }
    }

    private void forwardSlab(float[] outX, float[] outY, float[] outZ, int k) {
        float[] cx = c.x;
        float[] cy = c.y;
        float[] cz = c.z;
        int nx = shape.nx();
        int ny = shape.ny();
        int plane = nx * ny;
        float endX = nx - 1;
        float endY = ny - 1;
        float endZ = shape.nz() - 1;
        for (int j = 0; j < ny; j++) {
            int row = shape.cell(0, j, k);
            for (int i = 0; i < nx; i++) {
                int n = row + i;
                float px = i - 0.5f * cx[n];
                float py = j - 0.5f * cy[n];
                float pz = k - 0.5f * cz[n];
                px = px < 0 ? 0 : px > endX ? endX : px;
                py = py < 0 ? 0 : py > endY ? endY : py;
                pz = pz < 0 ? 0 : pz > endZ ? endZ : pz;
                int bi = (int) px;
                int bj = (int) py;
                int bk = (int) pz;
                float fx = px - bi;
                float fy = py - bj;
                float fz = pz - bk;
                int b00 = bi + nx * bj + plane * bk;
                int sx = bi < endX ? 1 : 0;
                int sy = bj < endY ? nx : 0;
                int b01 = b00 + (bk < endZ ? plane : 0);
                int b10 = b00 + sy;
                int b11 = b01 + sy;
                float w11 = fy * fz;
                float w10 = fy - w11;
                float w01 = fz - w11;
                float w00 = 1 - fy - w01;
                outX[n] = mix(cx, b00, b10, b01, b11, sx, fx, w00, w10, w01, w11);
                outY[n] = mix(cy, b00, b10, b01, b11, sx, fx, w00, w10, w01, w11);
                outZ[n] = mix(cz, b00, b10, b01, b11, sx, fx, w00, w10, w01, w11);
            }
        }
    }

    private static float mix(float[] q, int b00, int b10, int b01, int b11, int sx, float fx, float w00, float w10, float w01, float w11) {
        float low = w00 * q[b00] + w10 * q[b10] + w01 * q[b01] + w11 * q[b11];
        float high = w00 * q[b00 + sx] + w10 * q[b10 + sx] + w01 * q[b01 + sx] + w11 * q[b11 + sx];
        return low + fx * (high - low);
    }

    private void pullbackSlab(float[] barX, float[] barY, float[] barZ, int k) {
        float[] cx = c.x;
        float[] cy = c.y;
        float[] cz = c.z;
        int nx = shape.nx();
        int ny = shape.ny();
        int plane = nx * ny;
        float endX = nx - 1;
        float endY = ny - 1;
        float endZ = shape.nz() - 1;
        float[] toX = cBar.x;
        float[] toY = cBar.y;
        float[] toZ = cBar.z;
        for (int j = 0; j < ny; j++) {
            int row = shape.cell(0, j, k);
            for (int i = 0; i < nx; i++) {
                int n = row + i;
                float px = i - 0.5f * cx[n];
                float py = j - 0.5f * cy[n];
                float pz = k - 0.5f * cz[n];
                float freeX = px < 0 || px > endX ? 0 : -0.5f;
                float freeY = py < 0 || py > endY ? 0 : -0.5f;
                float freeZ = pz < 0 || pz > endZ ? 0 : -0.5f;
                px = px < 0 ? 0 : px > endX ? endX : px;
                py = py < 0 ? 0 : py > endY ? endY : py;
                pz = pz < 0 ? 0 : pz > endZ ? endZ : pz;
                int bi = (int) px;
                int bj = (int) py;
                int bk = (int) pz;
                float fx = px - bi;
                float fy = py - bj;
                float fz = pz - bk;
                int b000 = bi + nx * bj + plane * bk;
                int sx = bi < endX ? 1 : 0;
                int sy = bj < endY ? nx : 0;
                int sz = bk < endZ ? plane : 0;
                int b100 = b000 + sx;
                int b010 = b000 + sy;
                int b110 = b010 + sx;
                int b001 = b000 + sz;
                int b101 = b001 + sx;
                int b011 = b001 + sy;
                int b111 = b011 + sx;
                float gx = barX[n];
                float gy = barY[n];
                float gz = barZ[n];
                float ex = 1 - fx;
                float ey = 1 - fy;
                float ez = 1 - fz;
                // q = the eight corners of (gx cx + gy cy + gz cz): its gradient is J' dBar.
                float q000 = gx * cx[b000] + gy * cy[b000] + gz * cz[b000];
                float q100 = gx * cx[b100] + gy * cy[b100] + gz * cz[b100];
                float q010 = gx * cx[b010] + gy * cy[b010] + gz * cz[b010];
                float q110 = gx * cx[b110] + gy * cy[b110] + gz * cz[b110];
                float q001 = gx * cx[b001] + gy * cy[b001] + gz * cz[b001];
                float q101 = gx * cx[b101] + gy * cy[b101] + gz * cz[b101];
                float q011 = gx * cx[b011] + gy * cy[b011] + gz * cz[b011];
                float q111 = gx * cx[b111] + gy * cy[b111] + gz * cz[b111];
                float d00 = q100 - q000;
                float d10 = q110 - q010;
                float d01 = q101 - q001;
                float d11 = q111 - q011;
                float byX = ez * (ey * d00 + fy * d10) + fz * (ey * d01 + fy * d11);
                float m00 = q000 + fx * d00;
                float m10 = q010 + fx * d10;
                float m01 = q001 + fx * d01;
                float m11 = q011 + fx * d11;
                float byY = ez * (m10 - m00) + fz * (m11 - m01);
                float byZ = ey * (m01 - m00) + fy * (m11 - m10);
                toX[n] += freeX * byX;
                toY[n] += freeY * byY;
                toZ[n] += freeZ * byZ;
                spread(toX, gx, b000, b100, b010, b110, b001, b101, b011, b111, ex, fx, ey, fy, ez, fz);
                spread(toY, gy, b000, b100, b010, b110, b001, b101, b011, b111, ex, fx, ey, fy, ez, fz);
                spread(toZ, gz, b000, b100, b010, b110, b001, b101, b011, b111, ex, fx, ey, fy, ez, fz);
            }
        }
    }

    private static void spread(float[] to, float g, int b000, int b100, int b010, int b110, int b001, int b101, int b011, int b111,
                               float ex, float fx, float ey, float fy, float ez, float fz) {
        float g0 = g * ez;
        float g1 = g * fz;
        float g00 = g0 * ey;
        float g10 = g0 * fy;
        float g01 = g1 * ey;
        float g11 = g1 * fy;
        to[b000] += g00 * ex;
        to[b100] += g00 * fx;
        to[b010] += g10 * ex;
        to[b110] += g10 * fx;
        to[b001] += g01 * ex;
        to[b101] += g01 * fx;
        to[b011] += g11 * ex;
        to[b111] += g11 * fx;
    }

    /** Gathers, so that slab k writes only its own faces (and the last slab the front ones). */
    private void facesOfSlab(MacVelocity uBar, float scale, int k) {
        int nx = shape.nx();
        int ny = shape.ny();
        int plane = nx * ny;
        float[] toX = uBar.x();
        float[] toY = uBar.y();
        float[] toZ = uBar.z();
        for (int j = 0; j < ny; j++) {
            int n = shape.cell(0, j, k);
            int f = shape.xFace(0, j, k);
            int g = shape.yFace(0, j, k);
            for (int i = 0; i < nx; i++) {
                toX[f + i] += scale * cBar.x[n + i];
            }
            for (int i = 0; i < nx; i++) {
                toX[f + i + 1] += scale * cBar.x[n + i];
            }
            for (int i = 0; i < nx; i++) {
                toY[g + i] += scale * cBar.y[n + i];
            }
            for (int i = 0; i < nx; i++) {
                toY[g + i + nx] += scale * cBar.y[n + i];
            }
        }
        int n = k * plane;
        for (int i = 0; i < plane; i++) {
            toZ[n + i] += scale * cBar.z[n + i];
        }
        if (k > 0) {
            for (int i = 0; i < plane; i++) {
                toZ[n + i] += scale * cBar.z[n + i - plane];
            }
        }
        if (k == shape.nz() - 1) {
            for (int i = 0; i < plane; i++) {
                toZ[n + plane + i] += scale * cBar.z[n + i];
            }
        }
    }
}

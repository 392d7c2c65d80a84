package org.wispwright.optimize.flow;

/** Loops of {@link Carry} with trilinear interpolation: forward and pullback, one row segment at a time. */
final class LinearKernel {
    private LinearKernel() { }

    static void forward(Lattice lattice, float[] q, Displacement d, float[] out, int first, int count, int i0, int j, int k, int cell, int before) {
        float[] dx = d.x;
        float[] dy = d.y;
        float[] dz = d.z;
        int mx = lattice.mx();
        int slab = mx * lattice.my();
        int lastX = mx - 1;
        int lastY = lattice.my() - 1;
        int lastZ = lattice.mz() - 1;
        for (int n = 0; n < count; n++) {
            int c = cell + n;
            int b = before + n;
            float px = i0 + n - 0.5f * (dx[c] + dx[b]);
            float py = j - 0.5f * (dy[c] + dy[b]);
            float pz = k - 0.5f * (dz[c] + dz[b]);
            px = px < 0 ? 0 : px > lastX ? lastX : px;
            py = py < 0 ? 0 : py > lastY ? lastY : py;
            pz = pz < 0 ? 0 : pz > lastZ ? lastZ : pz;
            int bi = (int) px;
            int bj = (int) py;
            int bk = (int) pz;
            float fx = px - bi;
            float fy = py - bj;
            float fz = pz - bk;
            int sx = bi < lastX ? 1 : 0;
            int sy = bj < lastY ? mx : 0;
            int b00 = bi + mx * bj + slab * bk;
            int b10 = b00 + sy;
            int b01 = b00 + (bk < lastZ ? slab : 0);
            int b11 = b01 + sy;
            float q00 = q[b00] + fx * (q[b00 + sx] - q[b00]);
            float q10 = q[b10] + fx * (q[b10 + sx] - q[b10]);
            float q01 = q[b01] + fx * (q[b01 + sx] - q[b01]);
            float q11 = q[b11] + fx * (q[b11 + sx] - q[b11]);
            float q0 = q00 + fy * (q10 - q00);
            float q1 = q01 + fy * (q11 - q01);
            out[first + n] = q0 + fz * (q1 - q0);
        }
    }

    static void pullback(Lattice lattice, float[] q, Displacement d, float[] outBar, float[] qBar, Displacement dBar,
                         int first, int count, int i0, int j, int k, int cell, int before) {
        float[] dx = d.x;
        float[] dy = d.y;
        float[] dz = d.z;
        float[] dxBar = dBar.x;
        float[] dyBar = dBar.y;
        float[] dzBar = dBar.z;
        int mx = lattice.mx();
        int slab = mx * lattice.my();
        int lastX = mx - 1;
        int lastY = lattice.my() - 1;
        int lastZ = lattice.mz() - 1;
        for (int n = 0; n < count; n++) {
            int c = cell + n;
            int b = before + n;
            float g = outBar[first + n];
            float px = i0 + n - 0.5f * (dx[c] + dx[b]);
            float py = j - 0.5f * (dy[c] + dy[b]);
            float pz = k - 0.5f * (dz[c] + dz[b]);
            float halfX = px < 0 || px > lastX ? 0 : -0.5f * g;
            float halfY = py < 0 || py > lastY ? 0 : -0.5f * g;
            float halfZ = pz < 0 || pz > lastZ ? 0 : -0.5f * g;
            px = px < 0 ? 0 : px > lastX ? lastX : px;
            py = py < 0 ? 0 : py > lastY ? lastY : py;
            pz = pz < 0 ? 0 : pz > lastZ ? lastZ : pz;
            int bi = (int) px;
            int bj = (int) py;
            int bk = (int) pz;
            float fx = px - bi;
            float fy = py - bj;
            float fz = pz - bk;
            float ex = 1 - fx;
            int sx = bi < lastX ? 1 : 0;
            int sy = bj < lastY ? mx : 0;
            int b00 = bi + mx * bj + slab * bk;
            int b10 = b00 + sy;
            int b01 = b00 + (bk < lastZ ? slab : 0);
            int b11 = b01 + sy;
            float d00 = q[b00 + sx] - q[b00];
            float d10 = q[b10 + sx] - q[b10];
            float d01 = q[b01 + sx] - q[b01];
            float d11 = q[b11 + sx] - q[b11];
            float q00 = q[b00] + fx * d00;
            float q10 = q[b10] + fx * d10;
            float q01 = q[b01] + fx * d01;
            float q11 = q[b11] + fx * d11;
            float dy0 = q10 - q00;
            float dy1 = q11 - q01;
            float dx0 = d00 + fy * (d10 - d00);
            float dx1 = d01 + fy * (d11 - d01);
            float xBar = halfX * (dx0 + fz * (dx1 - dx0));
            float yBar = halfY * (dy0 + fz * (dy1 - dy0));
            float zBar = halfZ * (q01 + fy * dy1 - q00 - fy * dy0);
            dxBar[c] += xBar;
            dxBar[b] += xBar;
            dyBar[c] += yBar;
            dyBar[b] += yBar;
            dzBar[c] += zBar;
            dzBar[b] += zBar;
            float g1 = g * fz;
            float g0 = g - g1;
            float g10 = g0 * fy;
            float g00 = g0 - g10;
            float g11 = g1 * fy;
            float g01 = g1 - g11;
            qBar[b00] += g00 * ex;
            qBar[b00 + sx] += g00 * fx;
            qBar[b10] += g10 * ex;
            qBar[b10 + sx] += g10 * fx;
            qBar[b01] += g01 * ex;
            qBar[b01 + sx] += g01 * fx;
            qBar[b11] += g11 * ex;
            qBar[b11 + sx] += g11 * fx;
        }
    }
}

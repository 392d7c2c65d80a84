package org.wispwright.optimize.flow;

/**
 * Loops of {@link Carry} with Keys's cubic (a = -1/2) over 4 x 4 x 4 values, indices clamped to the lattice, the result clamped
 * to the 8 nearest values: forward and pullback, one row segment at a time.
 * <p>Weights of the values at -1, 0, 1, 2 for a share t: {@code (-t + 2t^2 - t^3)/2, (2 - 5t^2 + 3t^3)/2,
 * (t + 4t^2 - 3t^3)/2, (-t^2 + t^3)/2}; along an axis of one value the weights fall on that value and sum to 1.
 */
final class CubicKernel {
    private CubicKernel() { }

    static void forward(Lattice lattice, float[] q, Displacement d, float[] out, int first, int count, int i0, int j, int k, int cell, int before) {
        float[] dx = d.x;
        float[] dy = d.y;
        float[] dz = d.z;
        int mx = lattice.mx();
        int slab = mx * lattice.my();
        int lastX = mx - 1;
        int lastY = lattice.my() - 1;
        int lastZ = lattice.mz() - 1;
        int lowZ = lastZ == 0 ? 0 : -1;                                        // a plane: weight 1 on the one value there is
        int highZ = lastZ == 0 ? 0 : 2;
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
            int xm = bi > 0 ? bi - 1 : 0;
            int xp = bi < lastX ? bi + 1 : lastX;
            int xq = xp < lastX ? xp + 1 : lastX;
            float wm = (-fx + 2 * fx * fx - fx * fx * fx) * 0.5f;
            float w0 = (2 - 5 * fx * fx + 3 * fx * fx * fx) * 0.5f;
            float w1 = (fx + 4 * fx * fx - 3 * fx * fx * fx) * 0.5f;
            float w2 = (-fx * fx + fx * fx * fx) * 0.5f;
            float sum = 0;
            float low = Float.POSITIVE_INFINITY;
            float high = Float.NEGATIVE_INFINITY;
            for (int c3 = lowZ; c3 <= highZ; c3++) {
                int kk = bk + c3;
                int plane = slab * (kk < 0 ? 0 : kk > lastZ ? lastZ : kk);
                float wz = weight(c3, fz);
                for (int c2 = -1; c2 <= 2; c2++) {
                    int jj = bj + c2;
                    int row = plane + mx * (jj < 0 ? 0 : jj > lastY ? lastY : jj);
                    float near0 = q[row + bi];
                    float near1 = q[row + xp];
                    sum += wz * weight(c2, fy) * (wm * q[row + xm] + w0 * near0 + w1 * near1 + w2 * q[row + xq]);
                    if ((c2 | c3) >= 0 && c2 < 2 && c3 < 2) {
                        low = near0 < low ? near0 : low;
                        low = near1 < low ? near1 : low;
                        high = near0 > high ? near0 : high;
                        high = near1 > high ? near1 : high;
                    }
                }
            }
            out[first + n] = sum < low ? low : sum > high ? high : sum;
        }
    }

    static void pullback(Lattice lattice, float[] q, Displacement d, float[] outBar, float[] qBar, Displacement dBar,
                         int first, int count, int i0, int j, int k, int cell, int before) {
        int mx = lattice.mx();
        int slab = mx * lattice.my();
        int lastX = mx - 1;
        int lastY = lattice.my() - 1;
        int lastZ = lattice.mz() - 1;
        int lowZ = lastZ == 0 ? 0 : -1;                                        // a plane: weight 1 on the one value there is
        int highZ = lastZ == 0 ? 0 : 2;
        for (int n = 0; n < count; n++) {
            int c = cell + n;
            int b = before + n;
            float g = outBar[first + n];
            if (g == 0) {
                continue;
            }
            float px = i0 + n - 0.5f * (d.x[c] + d.x[b]);
            float py = j - 0.5f * (d.y[c] + d.y[b]);
            float pz = k - 0.5f * (d.z[c] + d.z[b]);
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
            float sum = 0;
            float byX = 0;
            float byY = 0;
            float byZ = 0;
            int lowAt = -1;
            int highAt = -1;
            for (int c3 = lowZ; c3 <= highZ; c3++) {
                int kk = bk + c3;
                int plane = slab * (kk < 0 ? 0 : kk > lastZ ? lastZ : kk);
                float wz = weight(c3, fz);
                float sz = slope(c3, fz);
                for (int c2 = -1; c2 <= 2; c2++) {
                    int jj = bj + c2;
                    int row = plane + mx * (jj < 0 ? 0 : jj > lastY ? lastY : jj);
                    float wy = weight(c2, fy);
                    float sy = slope(c2, fy);
                    for (int c1 = -1; c1 <= 2; c1++) {
                        int ii = bi + c1;
                        int at = row + (ii < 0 ? 0 : ii > lastX ? lastX : ii);
                        float value = q[at];
                        float wx = weight(c1, fx);
                        sum += wz * wy * wx * value;
                        byX += wz * wy * slope(c1, fx) * value;
                        byY += wz * sy * wx * value;
                        byZ += sz * wy * wx * value;
                        if ((c1 | c2 | c3) >= 0 && c1 < 2 && c2 < 2 && c3 < 2) {
                            lowAt = lowAt < 0 || value < q[lowAt] ? at : lowAt;
                            highAt = highAt < 0 || value > q[highAt] ? at : highAt;
                        }
                    }
                }
            }
            if (sum < q[lowAt]) {
                qBar[lowAt] += g;
                continue;
            }
            if (sum > q[highAt]) {
                qBar[highAt] += g;
                continue;
            }
            d(dBar.x, c, b, halfX * byX);
            d(dBar.y, c, b, halfY * byY);
            d(dBar.z, c, b, halfZ * byZ);
            for (int c3 = lowZ; c3 <= highZ; c3++) {
                int kk = bk + c3;
                int plane = slab * (kk < 0 ? 0 : kk > lastZ ? lastZ : kk);
                float gz = g * weight(c3, fz);
                for (int c2 = -1; c2 <= 2; c2++) {
                    int jj = bj + c2;
                    int row = plane + mx * (jj < 0 ? 0 : jj > lastY ? lastY : jj);
                    float gy = gz * weight(c2, fy);
                    for (int c1 = -1; c1 <= 2; c1++) {
                        int ii = bi + c1;
                        qBar[row + (ii < 0 ? 0 : ii > lastX ? lastX : ii)] += gy * weight(c1, fx);
                    }
                }
            }
        }
    }

    private static void d(float[] to, int c, int b, float value) {
        to[c] += value;
        to[b] += value;
    }

    private static float weight(int offset, float t) {
        return switch (offset) {
            case -1 -> (-t + 2 * t * t - t * t * t) * 0.5f;
            case 0 -> (2 - 5 * t * t + 3 * t * t * t) * 0.5f;
            case 1 -> (t + 4 * t * t - 3 * t * t * t) * 0.5f;
            default -> (-t * t + t * t * t) * 0.5f;
        };
    }

    private static float slope(int offset, float t) {
        return switch (offset) {
            case -1 -> (-1 + 4 * t - 3 * t * t) * 0.5f;
            case 0 -> (-10 * t + 9 * t * t) * 0.5f;
            case 1 -> (1 + 8 * t - 9 * t * t) * 0.5f;
            default -> (-2 * t + 3 * t * t) * 0.5f;
        };
    }
}

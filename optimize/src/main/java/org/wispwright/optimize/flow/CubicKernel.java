package org.wispwright.optimize.flow;

/**
 * Loops of {@link Carry} with Keys's cubic (a = -1/2) over 4 x 4 x 4 values, indices clamped to the lattice, the result clamped
 * to the 8 nearest values: forward and pullback, one row segment at a time.
 * <p>Weights of the values at -1, 0, 1, 2 for a share t: {@code (-t + 2t^2 - t^3)/2, (2 - 5t^2 + 3t^3)/2,
 * (t + 4t^2 - 3t^3)/2, (-t^2 + t^3)/2}. A plane (one value along z) has weight 1 on that value.
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
            int x0 = bi > 0 ? bi - 1 : 0;
            int x2 = bi < lastX ? bi + 1 : lastX;
            int x3 = x2 < lastX ? x2 + 1 : lastX;
            int y0 = mx * (bj > 0 ? bj - 1 : 0);
            int y1 = mx * bj;
            int y2 = bj < lastY ? y1 + mx : y1;
            int y3 = bj + 1 < lastY ? y2 + mx : y2;
            float wx0 = outer(fx);
            float wx1 = inner(fx);
            float wx2 = inner(1 - fx);
            float wx3 = outer(1 - fx);
            float wy0 = outer(fy);
            float wy1 = inner(fy);
            float wy2 = inner(1 - fy);
            float wy3 = outer(1 - fy);
            int z1 = slab * bk;
            float sum;
            int z2 = z1;
            if (lastZ == 0) {
                sum = plane(q, z1 + bi, z1 + x0, z1 + x2, z1 + x3, y0, y1, y2, y3, wx0, wx1, wx2, wx3, wy0, wy1, wy2, wy3);
            } else {
                int z0 = bk > 0 ? z1 - slab : z1;
                z2 = bk < lastZ ? z1 + slab : z1;
                int z3 = bk + 1 < lastZ ? z2 + slab : z2;
                sum = outer(fz) * plane(q, z0 + bi, z0 + x0, z0 + x2, z0 + x3, y0, y1, y2, y3, wx0, wx1, wx2, wx3, wy0, wy1, wy2, wy3)
                        + inner(fz) * plane(q, z1 + bi, z1 + x0, z1 + x2, z1 + x3, y0, y1, y2, y3, wx0, wx1, wx2, wx3, wy0, wy1, wy2, wy3)
                        + inner(1 - fz) * plane(q, z2 + bi, z2 + x0, z2 + x2, z2 + x3, y0, y1, y2, y3, wx0, wx1, wx2, wx3, wy0, wy1, wy2, wy3)
                        + outer(1 - fz) * plane(q, z3 + bi, z3 + x0, z3 + x2, z3 + x3, y0, y1, y2, y3, wx0, wx1, wx2, wx3, wy0, wy1, wy2, wy3);
            }
            float low = Float.POSITIVE_INFINITY;
            float high = Float.NEGATIVE_INFINITY;
            for (int corner = 0; corner < 8; corner++) {
                float near = q[((corner & 4) == 0 ? z1 : z2) + ((corner & 2) == 0 ? y1 : y2) + ((corner & 1) == 0 ? bi : x2)];
                low = near < low ? near : low;
                high = near > high ? near : high;
            }
            out[first + n] = sum < low ? low : sum > high ? high : sum;
        }
    }

    /** Weight of the value next to the position, at a distance t from it, 0..1. */
    private static float inner(float t) {
        return 1 + t * t * (1.5f * t - 2.5f);
    }

    /** Weight of the value beyond it: at a distance 1 + t. */
    private static float outer(float t) {
        return t * (t * (1 - 0.5f * t) - 0.5f);
    }

    /** Slope of {@link #inner}. */
    private static float innerSlope(float t) {
        return t * (4.5f * t - 5);
    }

    /** Slope of {@link #outer}. */
    private static float outerSlope(float t) {
        return t * (2 - 1.5f * t) - 0.5f;
    }

    private static float plane(float[] q, int x1, int x0, int x2, int x3, int y0, int y1, int y2, int y3, float wx0, float wx1, float wx2,
                               float wx3, float wy0, float wy1, float wy2, float wy3) {
        return wy0 * (wx0 * q[y0 + x0] + wx1 * q[y0 + x1] + wx2 * q[y0 + x2] + wx3 * q[y0 + x3])
                + wy1 * (wx0 * q[y1 + x0] + wx1 * q[y1 + x1] + wx2 * q[y1 + x2] + wx3 * q[y1 + x3])
                + wy2 * (wx0 * q[y2 + x0] + wx1 * q[y2 + x1] + wx2 * q[y2 + x2] + wx3 * q[y2 + x3])
                + wy3 * (wx0 * q[y3 + x0] + wx1 * q[y3 + x1] + wx2 * q[y3 + x2] + wx3 * q[y3 + x3]);
    }

    static void pullback(Lattice lattice, float[] q, Displacement d, float[] outBar, float[] qBar, Displacement dBar,
                         int first, int count, int i0, int j, int k, int cell, int before) {
        int mx = lattice.mx();
        int slab = mx * lattice.my();
        int lastX = mx - 1;
        int lastY = lattice.my() - 1;
        int lastZ = lattice.mz() - 1;
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
            int x0 = bi > 0 ? bi - 1 : 0;
            int x2 = bi < lastX ? bi + 1 : lastX;
            int x3 = x2 < lastX ? x2 + 1 : lastX;
            int y0 = mx * (bj > 0 ? bj - 1 : 0);
            int y1 = mx * bj;
            int y2 = bj < lastY ? y1 + mx : y1;
            int y3 = bj + 1 < lastY ? y2 + mx : y2;
            int z1 = slab * bk;
            int z0 = bk > 0 ? z1 - slab : z1;
            int z2 = bk < lastZ ? z1 + slab : z1;
            int z3 = bk + 1 < lastZ ? z2 + slab : z2;
            float wx0 = outer(fx);
            float wx1 = inner(fx);
            float wx2 = inner(1 - fx);
            float wx3 = outer(1 - fx);
            float sx0 = outerSlope(fx);
            float sx1 = innerSlope(fx);
            float sx2 = -innerSlope(1 - fx);
            float sx3 = -outerSlope(1 - fx);
            float wy0 = outer(fy);
            float wy1 = inner(fy);
            float wy2 = inner(1 - fy);
            float wy3 = outer(1 - fy);
            float sy0 = outerSlope(fy);
            float sy1 = innerSlope(fy);
            float sy2 = -innerSlope(1 - fy);
            float sy3 = -outerSlope(1 - fy);
            float sum = 0;
            float byX = 0;
            float byY = 0;
            float byZ = 0;
            int from = lastZ == 0 ? 1 : 0;                                     // a plane: only the value there is
            int to = lastZ == 0 ? 2 : 4;
            for (int c3 = from; c3 < to; c3++) {
                int z = c3 == 0 ? z0 : c3 == 1 ? z1 : c3 == 2 ? z2 : z3;
                float wz = weight(c3, fz);
                float value = plane(q, z + bi, z + x0, z + x2, z + x3, y0, y1, y2, y3, wx0, wx1, wx2, wx3, wy0, wy1, wy2, wy3);
                sum += wz * value;
                byX += wz * plane(q, z + bi, z + x0, z + x2, z + x3, y0, y1, y2, y3, sx0, sx1, sx2, sx3, wy0, wy1, wy2, wy3);
                byY += wz * plane(q, z + bi, z + x0, z + x2, z + x3, y0, y1, y2, y3, wx0, wx1, wx2, wx3, sy0, sy1, sy2, sy3);
                byZ += slope(c3, fz) * value;
            }
            int lowAt = z1 + y1 + bi;
            int highAt = lowAt;
            for (int corner = 1; corner < 8; corner++) {
                int at = ((corner & 4) == 0 ? z1 : z2) + ((corner & 2) == 0 ? y1 : y2) + ((corner & 1) == 0 ? bi : x2);
                lowAt = q[at] < q[lowAt] ? at : lowAt;
                highAt = q[at] > q[highAt] ? at : highAt;
            }
            if (sum < q[lowAt]) {
                qBar[lowAt] += g;
                continue;
            }
            if (sum > q[highAt]) {
                qBar[highAt] += g;
                continue;
            }
            addBoth(dBar.x, c, b, halfX * byX);
            addBoth(dBar.y, c, b, halfY * byY);
            addBoth(dBar.z, c, b, halfZ * byZ);
            for (int c3 = from; c3 < to; c3++) {
                int z = c3 == 0 ? z0 : c3 == 1 ? z1 : c3 == 2 ? z2 : z3;
                float gz = g * weight(c3, fz);
                spread(qBar, gz * wy0, z + y0, x0, bi, x2, x3, wx0, wx1, wx2, wx3);
                spread(qBar, gz * wy1, z + y1, x0, bi, x2, x3, wx0, wx1, wx2, wx3);
                spread(qBar, gz * wy2, z + y2, x0, bi, x2, x3, wx0, wx1, wx2, wx3);
                spread(qBar, gz * wy3, z + y3, x0, bi, x2, x3, wx0, wx1, wx2, wx3);
            }
        }
    }

    private static void spread(float[] qBar, float g, int row, int x0, int x1, int x2, int x3, float wx0, float wx1, float wx2, float wx3) {
        qBar[row + x0] += g * wx0;
        qBar[row + x1] += g * wx1;
        qBar[row + x2] += g * wx2;
        qBar[row + x3] += g * wx3;
    }

    private static void addBoth(float[] to, int c, int b, float value) {
        to[c] += value;
        to[b] += value;
    }

    private static float weight(int place, float t) {
        return place == 0 ? outer(t) : place == 1 ? inner(t) : place == 2 ? inner(1 - t) : outer(1 - t);
    }

    private static float slope(int place, float t) {
        return place == 0 ? outerSlope(t) : place == 1 ? innerSlope(t) : place == 2 ? -innerSlope(1 - t) : -outerSlope(1 - t);
    }
}

package org.wispwright.render.march;

/**
 * Trilinear samples along one ray, and the transpose. Coordinates are {@link RayTable}'s; values {@link BorderedCells}'.
 * <p>Forward: {@code value = sum over 8 corners of weight * corner}. Pullback: {@code cornerBar += weight * valueBar}.
 * <p>{@link #gatherFilled} leaves out what {@link EmptySpace} knows to be exactly zero; the pullback leaves out nothing,
 * because an empty cell has a derivative too.
 */
final class SampleKernel {
    private SampleKernel() {
    }

    /**
     * Takes the samples of ray p that are not in empty blocks.
     *
     * @param scale what a density of 1 becomes in tau
     * @param lit null if there is no light
     * @param tau overwritten from place 0 on
     * @param litAt overwritten alike, unless lit is null
     * @return how many were taken
     */
    static int gatherFilled(RayTable rays, int p, BorderedCells density, BorderedCells lit, EmptySpace empty, double scale,
                            double[] tau, double[] litAt) {
        int count = rays.count[p];
        double ax = rays.start[3 * p];
        double ay = rays.start[3 * p + 1];
        double az = rays.start[3 * p + 2];
        double dx = rays.advance[3 * p];
        double dy = rays.advance[3 * p + 1];
        double dz = rays.advance[3 * p + 2];
        double perX = 1 / dx;
        double perY = 1 / dy;
        double perZ = 1 / dz;
        int strideY = density.strideY();
        int strideZ = density.strideZ();
        float[] v = density.values();
        float[] l = lit == null ? null : lit.values();
        boolean[] filled = empty.filled();
        int blocksX = empty.blocksX();
        int blocksXY = blocksX * empty.blocksY();
        int taken = 0;
        int n = 0;
        while (n < count) {
            double x = ax + (n + 0.5) * dx;
            double y = ay + (n + 0.5) * dy;
            double z = az + (n + 0.5) * dz;
            int i = (int) x;
            int j = (int) y;
            int k = (int) z;
            int bx = i >> EmptySpace.SHIFT;
            int by = j >> EmptySpace.SHIFT;
            int bz = k >> EmptySpace.SHIFT;
            if (!filled[bx + blocksX * by + blocksXY * bz]) {
                double leave = exit(bx, ax, dx, perX);
                leave = Math.min(leave, exit(by, ay, dy, perY));
                leave = Math.min(leave, exit(bz, az, dz, perZ));
                // Samples before the leaving point lie in this block; 1e-6 of a sample guards against rounding.
                n = Math.max(n + 1, (int) (leave + 0.999999));
                continue;
            }
            float fx = (float) (x - i);
            float fy = (float) (y - j);
            float fz = (float) (z - k);
            int at = i + strideY * j + strideZ * k;
            float value = blend(v, at, strideY, strideZ, fx, fy, fz);
            if (value != 0) {
                tau[taken] = scale * value;
                if (l != null) {
                    litAt[taken] = blend(l, at, strideY, strideZ, fx, fy, fz);
                }
                taken++;
            }
            n++;
        }
        return taken;
    }

    /** Takes every sample of ray p. Overwrites the first count places of tau and, unless lit is null, of litAt. */
    static void gatherAll(RayTable rays, int p, BorderedCells density, BorderedCells lit, double scale, double[] tau, double[] litAt) {
        int count = rays.count[p];
        double ax = rays.start[3 * p];
        double ay = rays.start[3 * p + 1];
        double az = rays.start[3 * p + 2];
        double dx = rays.advance[3 * p];
        double dy = rays.advance[3 * p + 1];
        double dz = rays.advance[3 * p + 2];
        int strideY = density.strideY();
        int strideZ = density.strideZ();
        float[] v = density.values();
        float[] l = lit == null ? null : lit.values();
        for (int n = 0; n < count; n++) {
            double x = ax + (n + 0.5) * dx;
            double y = ay + (n + 0.5) * dy;
            double z = az + (n + 0.5) * dz;
            int i = (int) x;
            int j = (int) y;
            int k = (int) z;
            float fx = (float) (x - i);
            float fy = (float) (y - j);
            float fz = (float) (z - k);
            int at = i + strideY * j + strideZ * k;
            tau[n] = scale * blend(v, at, strideY, strideZ, fx, fy, fz);
            if (l != null) {
                litAt[n] = blend(l, at, strideY, strideZ, fx, fy, fz);
            }
        }
    }

    /**
     * Adds weight times valueBar to the corners of samples from..to-1 of ray p; and the same for lit unless litBar is null.
     *
     * @param valueBar read from place {@code first + n} for sample n
     */
    static void scatter(RayTable rays, int p, int from, int to, float[] valueBar, float[] litBar, int first,
                        BorderedCells densityInto, BorderedCells litInto) {
        double ax = rays.start[3 * p];
        double ay = rays.start[3 * p + 1];
        double az = rays.start[3 * p + 2];
        double dx = rays.advance[3 * p];
        double dy = rays.advance[3 * p + 1];
        double dz = rays.advance[3 * p + 2];
        int strideY = densityInto.strideY();
        int strideZ = densityInto.strideZ();
        float[] v = densityInto.values();
        float[] l = litBar == null ? null : litInto.values();
        for (int n = from; n < to; n++) {
            double x = ax + (n + 0.5) * dx;
            double y = ay + (n + 0.5) * dy;
            double z = az + (n + 0.5) * dz;
            int i = (int) x;
            int j = (int) y;
            int k = (int) z;
            float fx = (float) (x - i);
            float fy = (float) (y - j);
            float fz = (float) (z - k);
            int at = i + strideY * j + strideZ * k;
            spread(v, at, strideY, strideZ, fx, fy, fz, valueBar[first + n]);
            if (l != null) {
                spread(l, at, strideY, strideZ, fx, fy, fz, litBar[first + n]);
            }
        }
    }

    /** In samples, minus a half: the first n + 1/2 past the block along one axis. NaN (on the border, no advance) never counts. */
    private static double exit(int block, double start, double advance, double perAdvance) {
        int border = advance >= 0 ? (block + 1) << EmptySpace.SHIFT : block << EmptySpace.SHIFT;
        double leave = (border - start) * perAdvance - 0.5;
        return leave == leave ? leave : Double.POSITIVE_INFINITY;
    }

    private static float blend(float[] v, int at, int strideY, int strideZ, float fx, float fy, float fz) {
        int up = at + strideY;
        int far = at + strideZ;
        int farUp = up + strideZ;
        float a = v[at] + fx * (v[at + 1] - v[at]);
        float b = v[up] + fx * (v[up + 1] - v[up]);
        float c = v[far] + fx * (v[far + 1] - v[far]);
        float d = v[farUp] + fx * (v[farUp + 1] - v[farUp]);
        float ab = a + fy * (b - a);
        float cd = c + fy * (d - c);
        return ab + fz * (cd - ab);
    }

    private static void spread(float[] v, int at, int strideY, int strideZ, float fx, float fy, float fz, float bar) {
        int up = at + strideY;
        int far = at + strideZ;
        int farUp = up + strideZ;
        float farBar = bar * fz;
        float nearBar = bar - farBar;
        float nearUp = nearBar * fy;
        float nearLow = nearBar - nearUp;
        float farHigh = farBar * fy;
        float farLow = farBar - farHigh;
        float right = nearLow * fx;
        v[at] += nearLow - right;
        v[at + 1] += right;
        right = nearUp * fx;
        v[up] += nearUp - right;
        v[up + 1] += right;
        right = farLow * fx;
        v[far] += farLow - right;
        v[far + 1] += right;
        right = farHigh * fx;
        v[farUp] += farHigh - right;
        v[farUp + 1] += right;
    }
}

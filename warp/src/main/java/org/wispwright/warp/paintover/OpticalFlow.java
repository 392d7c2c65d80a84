package org.wispwright.warp.paintover;

import org.wispwright.warp.resample.Resized;

/**
 * Where the numbers of a picture came from: u with {@code after(p) = before(p + u(p))} as far as a piecewise smooth u can say so.
 * Minimises {@code sum |grad u_x| + |grad u_y| + lambda |before(p + u) - after(p)|} (TV-L1), coarse to fine: on every level the data term
 * is made linear around the last u {@value #WARPS} times, and each time the two halves are minimised in turn, a step along the
 * gradient of {@code before} that is cut off at lambda theta, and a dual step for the total variation.
 * <p>Source: Zach, Pock and Bischof (2007), DAGM 2007, LNCS 4713, 214-223; step sizes and stopping by a fixed count as in Sanchez,
 * Meinhardt-Llopis and Facciolo (2013), IPOL 3, 137-150. Differences from them: levels are means of 2 x 2 pixels; border values stand
 * beyond the border.
 */
final class OpticalFlow {
    private static final double TAU = 0.25;
    private static final double LAMBDA = 0.15;
    private static final double THETA = 0.3;
    /** What a difference of 1 counts as: the weights are for codes of 0 to 255. */
    private static final float CODES = 255;
    private static final int WARPS = 5;
    private static final int ITERATIONS = 30;
    /** The coarsest level has at least so many pixels along its shorter side. */
    private static final int COARSEST = 8;
    private static final double FLAT = 1e-9;

    private final int width;
    private final int height;
    private final float[] before;
    private final float[] after;
    private final float[] gradientX;
    private final float[] gradientY;
    private final float[] dual;
    private final float[] warped;

    private OpticalFlow(float[] before, float[] after, int width, int height) {
        this.width = width;
        this.height = height;
        this.before = before;
        this.after = after;
        gradientX = new float[before.length];
        gradientY = new float[before.length];
        warped = new float[before.length];
        dual = new float[4 * before.length];
    }

    /**
     * The displacement, in pixels: {@code u[2 p]} along x, {@code u[2 p + 1]} along y, y downwards; a new array.
     *
     * @param before read: one number a pixel, about 0 to 1
     * @param after  read: likewise
     */
    static float[] between(float[] before, float[] after, int width, int height) {
        float[] u;
        if (Math.min(width, height) >= 2 * COARSEST) {
            int halfWidth = (width + 1) / 2;
            int halfHeight = (height + 1) / 2;
            float[] coarse = between(Resized.values(before, 1, width, height, halfWidth, halfHeight),
                    Resized.values(after, 1, width, height, halfWidth, halfHeight), halfWidth, halfHeight);
            u = Resized.values(coarse, 2, halfWidth, halfHeight, width, height);
            for (int n = 0; n < u.length; n++) {
                u[n] *= (n & 1) == 0 ? (float) width / halfWidth : (float) height / halfHeight;
            }
        } else {
            u = new float[2 * before.length];
        }
        OpticalFlow level = new OpticalFlow(before, after, width, height);
        for (int warp = 0; warp < WARPS; warp++) {
            level.refine(u);
        }
        return u;
    }

    private void refine(float[] u) {
        float[] around = u.clone();
        for (int p = 0; p < before.length; p++) {
            float x = p % width + around[2 * p];
            float y = p / width + around[2 * p + 1];
            warped[p] = CODES * at(x, y);
            gradientX[p] = CODES * (at(x + 1, y) - at(x - 1, y)) / 2;
            gradientY[p] = CODES * (at(x, y + 1) - at(x, y - 1)) / 2;
        }
        for (int n = 0; n < ITERATIONS; n++) {
            step(u, around);
            dualStep(u);
        }
    }

    /** {@code v = u + cut-off step to rho(v) = 0; u = v + theta div dual}. */
    private void step(float[] u, float[] around) {
        for (int p = 0; p < before.length; p++) {
            double gx = gradientX[p];
            double gy = gradientY[p];
            double square = gx * gx + gy * gy;
            double rho = warped[p] + gx * (u[2 * p] - around[2 * p]) + gy * (u[2 * p + 1] - around[2 * p + 1]) - CODES * after[p];
            double factor = square < FLAT ? 0 : Math.min(LAMBDA * THETA, Math.max(-LAMBDA * THETA, -rho / square));
            for (int c = 0; c < 2; c++) {
                u[2 * p + c] += (float) (factor * (c == 0 ? gx : gy) + THETA * divergence(p, c));
            }
        }
    }

    private double divergence(int p, int c) {
        int x = p % width;
        int y = p / width;
        double along = (x < width - 1 ? dual[4 * p + 2 * c] : 0) - (x > 0 ? dual[4 * (p - 1) + 2 * c] : 0);
        double down = (y < height - 1 ? dual[4 * p + 2 * c + 1] : 0) - (y > 0 ? dual[4 * (p - width) + 2 * c + 1] : 0);
        return along + down;
    }

    /** {@code dual = (dual + tau / theta grad u) / (1 + tau / theta |grad u|)}. */
    private void dualStep(float[] u) {
        double ratio = TAU / THETA;
        for (int p = 0; p < before.length; p++) {
            boolean right = p % width < width - 1;
            boolean below = p / width < height - 1;
            for (int c = 0; c < 2; c++) {
                double ux = right ? u[2 * (p + 1) + c] - u[2 * p + c] : 0;
                double uy = below ? u[2 * (p + width) + c] - u[2 * p + c] : 0;
                double by = 1 + ratio * Math.sqrt(ux * ux + uy * uy);
                dual[4 * p + 2 * c] = (float) ((dual[4 * p + 2 * c] + ratio * ux) / by);
                dual[4 * p + 2 * c + 1] = (float) ((dual[4 * p + 2 * c + 1] + ratio * uy) / by);
            }
        }
    }

    /** {@code before} between its pixels, linearly. */
    private float at(float px, float py) {
        float x = Math.min(width - 1, Math.max(0, px));
        float y = Math.min(height - 1, Math.max(0, py));
        int x0 = (int) x;
        int y0 = (int) y;
        int right = x0 < width - 1 ? 1 : 0;
        int down = y0 < height - 1 ? width : 0;
        int p = x0 + width * y0;
        float top = before[p] + (x - x0) * (before[p + right] - before[p]);
        float bottom = before[p + down] + (x - x0) * (before[p + down + right] - before[p + down]);
        return top + (y - y0) * (bottom - top);
    }
}

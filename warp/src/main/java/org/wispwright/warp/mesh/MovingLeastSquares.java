package org.wispwright.warp.mesh;

/**
 * A map of the plane that carries controls p_i to targets q_i and is, at each place v, the best map of its {@link Kind} for weights
 * {@code w_i = 1 / |p_i - v|^2}. With {@code p* = sum w p / sum w}, {@code P = p - p*}, q alike:
 * {@code f(v) = q* + A (v - p*)}, where A minimises {@code sum w |A P_i - Q_i|^2} over the kind's matrices. At a control the value is
 * its target.
 * <p>In complex numbers, {@code s = sum w conj(P) Q}: similarity {@code A = s / sum w |P|^2}, rigid {@code A = s / |s|}; affine
 * {@code A = (sum w Q P') (sum w P P')^-1}. Where s is 0 nothing turns.
 * <p>Source: Schaefer, McPhail and Warren (2006), ACM TOG 25(3), 533-540, alpha = 1. Differences from it: weights are scaled by the
 * smallest squared distance, which cancels and cannot overflow.
 */
public final class MovingLeastSquares {
    /** Which matrices the map may use at each place. */
    public enum Kind {
        /** Any matrix: may shear and stretch. */
        AFFINE,
        /** A turn and one scale. */
        SIMILARITY,
        /** A turn alone: keeps sizes. */
        RIGID
    }

    /** Affine maps need controls whose spread across their best line is above this share of their spread along it. */
    public static final double THINNEST = 1e-6;

    private final Kind kind;
    private final double[][] controls;
    private final double[][] targets;

    /**
     * Prepares a map.
     *
     * @param kind     which matrices
     * @param controls read and copied: {@code [n][2]}, finite, one or more (three or more, not on one line, for affine), no two alike
     * @param targets  read and copied: {@code [n][2]}, finite
     * @throws IllegalArgumentException if the counts differ, a number is not finite, or controls coincide or lie on one line
     */
    public MovingLeastSquares(Kind kind, double[][] controls, double[][] targets) {
        int fewest = kind == Kind.AFFINE ? 3 : 1;
        if (controls.length < fewest || targets.length != controls.length) {
            throw new IllegalArgumentException("moving least squares: got " + controls.length + " controls and " + targets.length
                    + " targets, needs " + fewest + " or more and as many targets");
        }
        this.kind = kind;
        this.controls = copied("control", controls);
        this.targets = copied("target", targets);
        for (int n = 0; n < controls.length; n++) {
            for (int m = 0; m < n; m++) {
                if (controls[m][0] == controls[n][0] && controls[m][1] == controls[n][1]) {
                    throw new IllegalArgumentException("moving least squares: controls " + m + " and " + n + " are both at ("
                            + controls[n][0] + ", " + controls[n][1] + "); remove one or move it");
                }
            }
        }
        if (kind == Kind.AFFINE) {
            requireSpread();
        }
    }

    /** Overwrites {@code out[0..1]} with the image of (x,y). */
    public void evaluate(double x, double y, double[] out) {
        double nearest = Double.POSITIVE_INFINITY;
        for (int n = 0; n < controls.length; n++) {
            double squared = squaredDistance(n, x, y);
            if (squared == 0) {
                out[0] = targets[n][0];
                out[1] = targets[n][1];
                return;
            }
            nearest = Math.min(nearest, squared);
        }
        double sum = 0;
        double px = 0;
        double py = 0;
        double qx = 0;
        double qy = 0;
        for (int n = 0; n < controls.length; n++) {
            double w = nearest / squaredDistance(n, x, y);
            sum += w;
            px += w * controls[n][0];
            py += w * controls[n][1];
            qx += w * targets[n][0];
            qy += w * targets[n][1];
        }
        px /= sum;
        py /= sum;
        qx /= sum;
        qy /= sum;
        double xx = 0;
        double xy = 0;
        double yy = 0;
        double ux = 0;
        double uy = 0;
        double vx = 0;
        double vy = 0;
        for (int n = 0; n < controls.length; n++) {
            double w = nearest / squaredDistance(n, x, y);
            double ax = controls[n][0] - px;
            double ay = controls[n][1] - py;
            double bx = w * (targets[n][0] - qx);
            double by = w * (targets[n][1] - qy);
            xx += w * ax * ax;
            xy += w * ax * ay;
            yy += w * ay * ay;
            ux += bx * ax;
            uy += bx * ay;
            vx += by * ax;
            vy += by * ay;
        }
        double dx = x - px;
        double dy = y - py;
        if (kind == Kind.AFFINE) {
            double det = xx * yy - xy * xy;
            double sx = (yy * dx - xy * dy) / det;
            double sy = (xx * dy - xy * dx) / det;
            out[0] = qx + ux * sx + uy * sy;
            out[1] = qy + vx * sx + vy * sy;
            return;
        }
        double real = ux + vy;
        double imaginary = vx - uy;
        double length = kind == Kind.RIGID ? Math.hypot(real, imaginary) : xx + yy;
        double cos = length > 0 ? real / length : 1;
        double sin = length > 0 ? imaginary / length : 0;
        out[0] = qx + cos * dx - sin * dy;
        out[1] = qy + sin * dx + cos * dy;
    }

    private double squaredDistance(int n, double x, double y) {
        double dx = controls[n][0] - x;
        double dy = controls[n][1] - y;
        return dx * dx + dy * dy;
    }

    private void requireSpread() {
        double meanX = 0;
        double meanY = 0;
        for (double[] p : controls) {
            meanX += p[0] / controls.length;
            meanY += p[1] / controls.length;
        }
        double xx = 0;
        double xy = 0;
        double yy = 0;
        for (double[] p : controls) {
            xx += (p[0] - meanX) * (p[0] - meanX);
            xy += (p[0] - meanX) * (p[1] - meanY);
            yy += (p[1] - meanY) * (p[1] - meanY);
        }
        double along = (xx + yy) / 2 + Math.hypot((xx - yy) / 2, xy);
        double across = (xx * yy - xy * xy) / along;
        if (!(across > THINNEST * THINNEST * along)) {
            throw new IllegalArgumentException("moving least squares: all " + controls.length
                    + " controls lie on one line, which leaves an affine map open; add one beside it or use similarity or rigid");
        }
    }

    private static double[][] copied(String name, double[][] points) {
        double[][] copy = new double[points.length][];
        for (int n = 0; n < points.length; n++) {
            if (points[n].length != 2 || !Double.isFinite(points[n][0]) || !Double.isFinite(points[n][1])) {
                throw new IllegalArgumentException("moving least squares: " + name + " " + n + " is not two finite numbers");
            }
            copy[n] = points[n].clone();
        }
        return copy;
    }
}

package org.wispwright.warp.spline;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;
import org.ejml.interfaces.linsol.LinearSolverDense;

/**
 * The thin-plate spline that carries n landmarks p_i exactly to their targets v_i:
 * {@code f(p) = a0 + ax x + ay y + sum_i w_i U(|p - p_i|)}, one such f for x and one for y, with {@code U(r) = r^2 ln r^2}, U(0) = 0.
 * <p>The coefficients solve {@code [K P; P' 0] [w; a] = [v; 0]}, K_ij = U(|p_i - p_j|), row i of P = (1, x_i, y_i); so
 * {@code sum w = sum w x = sum w y = 0}. Bending energy: {@code v' L v} with L the top left n x n block of that matrix's inverse,
 * which equals {@code w' v}. Other texts scale it otherwise.
 * <p>Source: Bookstein (1989), IEEE PAMI 11(6), 567-585. Differences from it: landmarks are moved to their mean and scaled to unit
 * mean distance while solving (the map does not depend on it, the accuracy does), then the coefficients are carried back.
 */
public final class ThinPlateSpline {
    private final double[] landmarkX;
    private final double[] landmarkY;
    private final double[][] weights;
    private final double[] lengths;
    private final double[][] affine;
    private final double[] energy;
    private final DMatrixRMaj energyMatrix;

    private ThinPlateSpline(double[] landmarkX, double[] landmarkY, double[][] weights, double[][] affine, double[] energy,
                            DMatrixRMaj energyMatrix) {
        this.landmarkX = landmarkX;
        this.landmarkY = landmarkY;
        this.weights = weights;
        lengths = new double[landmarkX.length];
        for (int i = 0; i < lengths.length; i++) {
            lengths[i] = Math.hypot(weights[0][i], weights[1][i]);
        }
        this.affine = affine;
        this.energy = energy;
        this.energyMatrix = energyMatrix;
    }

    /**
     * Fits the spline.
     *
     * @param landmarks read: {@code [n][2]}, any unit, n 3 or more, not on one line, no two alike
     * @param targets   read: {@code [n][2]}
     * @throws IllegalArgumentException if the counts differ, a number is not finite, or the landmarks coincide or lie on one line
     */
    public static ThinPlateSpline fit(double[][] landmarks, double[][] targets) {
        int n = landmarks.length;
        if (n < 3 || targets.length != n) {
            throw new IllegalArgumentException("thin-plate spline: got " + n + " landmarks and " + targets.length
                    + " targets, needs 3 or more and as many targets");
        }
        double[] x = column("landmark", landmarks, 0);
        double[] y = column("landmark", landmarks, 1);
        double[][] v = {column("target", targets, 0), column("target", targets, 1)};
        double meanX = mean(x);
        double meanY = mean(y);
        double scale = 0;
        for (int i = 0; i < n; i++) {
            scale += Math.hypot(x[i] - meanX, y[i] - meanY) / n;
        }
        requireSpread(x, y, meanX, meanY, scale);
        double perScale = 1 / scale;
        DMatrixRMaj system = new DMatrixRMaj(n + 3, n + 3);
        for (int i = 0; i < n; i++) {
            double px = (x[i] - meanX) * perScale;
            double py = (y[i] - meanY) * perScale;
            for (int j = 0; j < i; j++) {
                double dx = (x[i] - x[j]) * perScale;
                double dy = (y[i] - y[j]) * perScale;
                double u = kernel(dx * dx + dy * dy);
                system.set(i, j, u);
                system.set(j, i, u);
            }
            double[] row = {1, px, py};
            for (int c = 0; c < 3; c++) {
                system.set(i, n + c, row[c]);
                system.set(n + c, i, row[c]);
            }
        }
        LinearSolverDense<DMatrixRMaj> solver = LinearSolverFactory_DDRM.lu(n + 3);
        if (!solver.setA(system.copy())) {
            throw new IllegalArgumentException("thin-plate spline: the system of the " + n
                    + " landmarks has no single solution; move them apart");
        }
        double[][] weights = new double[2][n];
        double[][] affine = new double[2][3];
        double[] energy = new double[2];
        for (int axis = 0; axis < 2; axis++) {
            double[] solution = solveRefined(solver, system, v[axis], n);
            carryBack(solution, x, y, meanX, meanY, perScale, weights[axis], affine[axis]);
            for (int i = 0; i < n; i++) {
                energy[axis] += weights[axis][i] * v[axis][i];
            }
        }
        DMatrixRMaj inverse = new DMatrixRMaj(n + 3, n + 3);
        solver.invert(inverse);
        DMatrixRMaj block = CommonOps_DDRM.extract(inverse, 0, n, 0, n);
        CommonOps_DDRM.scale(perScale * perScale, block);
        return new ThinPlateSpline(x, y, weights, affine, energy, block);
    }

    /** {@code U = r^2 ln r^2} of a squared distance; 0 at 0. */
    static double kernel(double squaredDistance) {
        return squaredDistance == 0 ? 0 : squaredDistance * Math.log(squaredDistance);
    }

    /** The map's x at (px,py). */
    public double x(double px, double py) {
        return value(0, px, py);
    }

    /** The map's y at (px,py). */
    public double y(double px, double py) {
        return value(1, px, py);
    }

    /** Writes the map's x and y at (px,py) into {@code out[0]} and {@code out[1]}: one kernel a landmark for both. */
    public void evaluate(double px, double py, double[] out) {
        double[] wx = weights[0];
        double[] wy = weights[1];
        double sumX = affine[0][0] + affine[0][1] * px + affine[0][2] * py;
        double sumY = affine[1][0] + affine[1][1] * px + affine[1][2] * py;
        for (int i = 0; i < wx.length; i++) {
            double dx = px - landmarkX[i];
            double dy = py - landmarkY[i];
            double u = kernel(dx * dx + dy * dy);
            sumX += wx[i] * u;
            sumY += wy[i] * u;
        }
        out[0] = sumX;
        out[1] = sumY;
    }

    /**
     * Writes value, slope along x, slope along y and mixed slope of the map's x into {@code out[0..3]}, of its y into
     * {@code out[4..7]}: {@code U_x = 2 dx (ln r^2 + 1)}, {@code U_xy = 4 dx dy / r^2}, both 0 at a landmark.
     */
    void jet(double px, double py, double[] out) {
        for (int axis = 0; axis < 2; axis++) {
            double[] a = affine[axis];
            out[4 * axis] = a[0] + a[1] * px + a[2] * py;
            out[4 * axis + 1] = a[1];
            out[4 * axis + 2] = a[2];
            out[4 * axis + 3] = 0;
        }
        for (int i = 0; i < landmarkX.length; i++) {
            double dx = px - landmarkX[i];
            double dy = py - landmarkY[i];
            double squared = dx * dx + dy * dy;
            if (squared == 0) {
                continue;
            }
            double log = Math.log(squared);
            double u = squared * log;
            double slope = 2 * (log + 1);
            double mixed = 4 * dx * dy / squared;
            for (int axis = 0; axis < 2; axis++) {
                double w = weights[axis][i];
                out[4 * axis] += w * u;
                out[4 * axis + 1] += w * slope * dx;
                out[4 * axis + 2] += w * slope * dy;
                out[4 * axis + 3] += w * mixed;
            }
        }
    }

    /**
     * An upper bound of the distance between the map and its bicubic Hermite interpolant over a square: with r_i the distance of
     * landmark i from the square, {@code side^4 / 384 sum_i |w_i| (24 + 6 side / r_i) / r_i^2}; infinite with a landmark in it.
     * <p>Cubic Hermite H along one axis errs by at most {@code side^4 / 384} times the largest fourth derivative (Davis 1975,
     * Interpolation and Approximation, 3.5). Along both, {@code f - HxHy f = (f - Hx f) + Hx (f - Hy f)}, and
     * {@code |Hx g| <= max |g| + side / 4 max |g_x|}. For U: {@code |U_xxxx| <= 12 / r^2}, y alike, {@code |U_xyyyy| <= 24 / r^3}.
     * The sum of it is ours.
     *
     * @param left x of the square's left side
     * @param top  y of its top
     * @param side its side, above 0
     */
    double hermiteError(double left, double top, double side) {
        double sum = 0;
        for (int i = 0; i < landmarkX.length; i++) {
            double dx = Math.max(0, Math.max(left - landmarkX[i], landmarkX[i] - left - side));
            double dy = Math.max(0, Math.max(top - landmarkY[i], landmarkY[i] - top - side));
            double squared = dx * dx + dy * dy;
            sum += lengths[i] * (24 + 6 * side / Math.sqrt(squared)) / squared;
        }
        return Double.isNaN(sum) ? Double.POSITIVE_INFINITY : side * side * side * side / 384 * sum;
    }

    /** A copy of the n kernel weights of an axis, 0 = x, 1 = y. */
    public double[] weights(int axis) {
        return weights[axis].clone();
    }

    /** A copy of (a0, ax, ay) of an axis, 0 = x, 1 = y. */
    public double[] affine(int axis) {
        return affine[axis].clone();
    }

    /** Bending energy {@code w' v} of an axis, 0 = x, 1 = y; 0 for an affine map. */
    public double bendingEnergy(int axis) {
        return energy[axis];
    }

    /** A copy of the n x n matrix L whose quadratic form is the bending energy; depends on the landmarks only, rank n - 3. */
    public DMatrixRMaj bendingMatrix() {
        return energyMatrix.copy();
    }

    private double value(int axis, double px, double py) {
        double[] w = weights[axis];
        double sum = affine[axis][0] + affine[axis][1] * px + affine[axis][2] * py;
        for (int i = 0; i < w.length; i++) {
            double dx = px - landmarkX[i];
            double dy = py - landmarkY[i];
            sum += w[i] * kernel(dx * dx + dy * dy);
        }
        return sum;
    }

    /** Solves, then solves once more for what is left over (iterative refinement). */
    private static double[] solveRefined(LinearSolverDense<DMatrixRMaj> solver, DMatrixRMaj system, double[] v, int n) {
        DMatrixRMaj right = new DMatrixRMaj(n + 3, 1);
        System.arraycopy(v, 0, right.data, 0, n);
        DMatrixRMaj solution = new DMatrixRMaj(n + 3, 1);
        solver.solve(right.copy(), solution);
        DMatrixRMaj left = right.copy();
        CommonOps_DDRM.multAdd(-1, system, solution, left);
        DMatrixRMaj correction = new DMatrixRMaj(n + 3, 1);
        solver.solve(left, correction);
        CommonOps_DDRM.addEquals(solution, correction);
        return solution.data;
    }

    /**
     * From q = s (p - m) back to p: {@code w U(s r) = w s^2 U(r) + w s^2 r^2 ln s^2}. The last term sums over the landmarks to
     * something affine, because sum w = sum w x = sum w y = 0: to the constant {@code s^2 ln s^2 sum w_i |p_i - m|^2}.
     */
    private static void carryBack(double[] solution, double[] x, double[] y, double meanX, double meanY, double s,
                                  double[] w, double[] a) {
        int n = w.length;
        double constant = 0;
        for (int i = 0; i < n; i++) {
            double dx = (x[i] - meanX) * s;
            double dy = (y[i] - meanY) * s;
            w[i] = solution[i] * s * s;
            constant += solution[i] * (dx * dx + dy * dy);
        }
        a[1] = solution[n + 1] * s;
        a[2] = solution[n + 2] * s;
        a[0] = solution[n] + constant * Math.log(s * s) - a[1] * meanX - a[2] * meanY;
    }

    /** Refuses landmarks that coincide or lie on one line, to 1e-9 of their spread: the system would have no single solution. */
    private static void requireSpread(double[] x, double[] y, double meanX, double meanY, double scale) {
        int farthest = 0;
        for (int i = 0; i < x.length; i++) {
            for (int j = 0; j < i; j++) {
                if (!(Math.hypot(x[i] - x[j], y[i] - y[j]) > 1e-9 * scale)) {
                    throw new IllegalArgumentException("thin-plate spline: landmarks " + j + " and " + i + " are the same point ("
                            + x[i] + ", " + y[i] + "); remove one of them");
                }
            }
            if (Math.hypot(x[i] - x[0], y[i] - y[0]) > Math.hypot(x[farthest] - x[0], y[farthest] - y[0])) {
                farthest = i;
            }
        }
        double ux = x[farthest] - x[0];
        double uy = y[farthest] - y[0];
        double across = 0;
        for (int i = 0; i < x.length; i++) {
            across = Math.max(across, Math.abs(ux * (y[i] - y[0]) - uy * (x[i] - x[0])) / Math.hypot(ux, uy));
        }
        if (!(across > 1e-9 * scale)) {
            throw new IllegalArgumentException("thin-plate spline: all " + x.length + " landmarks lie on one line through (" + meanX + ", "
                    + meanY + "); add one beside it");
        }
    }

    private static double[] column(String name, double[][] points, int axis) {
        double[] out = new double[points.length];
        for (int i = 0; i < out.length; i++) {
            out[i] = points[i][axis];
            if (!Double.isFinite(out[i])) {
                throw new IllegalArgumentException("thin-plate spline: " + name + " " + i + " is " + out[i] + ", needs finite numbers");
            }
        }
        return out;
    }

    private static double mean(double[] values) {
        double sum = 0;
        for (double value : values) {
            sum += value;
        }
        return sum / values.length;
    }
}

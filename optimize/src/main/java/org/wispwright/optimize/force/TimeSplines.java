package org.wispwright.optimize.force;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;

/**
 * Cubic B-splines over the steps of a frame range, made orthonormal: the columns satisfy
 * {@code sum over steps of q[t][s] q[t][r] = steps (s == r)}, so a column's mean square over time is 1.
 * <p>The splines (de Boor 1978, A Practical Guide to Splines, ch. 9; uniform clamped knots) are multiplied by the inverse root
 * of their Gram matrix (Löwdin 1950, J. Chem. Phys. 18, 365-375), which changes each as little as possible and keeps it local.
 */
final class TimeSplines {
    private static final int DEGREE = 3;

    private TimeSplines() { }

    /** The values at {@code [step][spline]}; splines is at most steps. */
    static double[][] orthonormal(int steps, int splines) {
        double[][] raw = values(steps, splines);
        DMatrixRMaj gram = new DMatrixRMaj(splines, splines);
        for (int s = 0; s < splines; s++) {
            for (int r = 0; r < splines; r++) {
                double sum = 0;
                for (double[] row : raw) {
                    sum += row[s] * row[r];
                }
                gram.set(s, r, sum / steps);
            }
        }
        EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(splines, true, true);
        if (!eigen.decompose(gram)) {
            throw new IllegalStateException("time splines: the Gram matrix of " + splines + " splines over " + steps + " steps has no eigenvalues");
        }
        double[][] out = new double[steps][splines];
        for (int e = 0; e < splines; e++) {
            double value = eigen.getEigenvalue(e).getReal();
            DMatrixRMaj vector = eigen.getEigenVector(e);
            double inverseRoot = 1 / Math.sqrt(value);
            for (int t = 0; t < steps; t++) {
                double along = 0;
                for (int s = 0; s < splines; s++) {
                    along += raw[t][s] * vector.get(s);
                }
                for (int s = 0; s < splines; s++) {
                    out[t][s] += inverseRoot * along * vector.get(s);
                }
            }
        }
        return out;
    }

    /** Plain B-splines at the middles of the steps; fewer than four splines use the degree that fits. */
    static double[][] values(int steps, int splines) {
        int degree = Math.min(DEGREE, splines - 1);
        int spans = splines - degree;
        double[][] out = new double[steps][splines];
        for (int t = 0; t < steps; t++) {
            double x = (t + 0.5) / steps * spans;
            for (int s = 0; s < splines; s++) {
                out[t][s] = bSpline(s, degree, x, spans, degree);
            }
        }
        return out;
    }

    /** Cox-de Boor recursion on clamped uniform knots 0,0,0,0,1,2,..,spans,spans,spans,spans. */
    private static double bSpline(int s, int degree, double x, int spans, int fullDegree) {
        if (degree == 0) {
            return x >= knot(s, spans, fullDegree) && x < knot(s + 1, spans, fullDegree) ? 1 : 0;
        }
        double left = knot(s, spans, fullDegree);
        double leftEnd = knot(s + degree, spans, fullDegree);
        double right = knot(s + 1, spans, fullDegree);
        double rightEnd = knot(s + degree + 1, spans, fullDegree);
        double rising = leftEnd > left ? (x - left) / (leftEnd - left) * bSpline(s, degree - 1, x, spans, fullDegree) : 0;
        double falling = rightEnd > right ? (rightEnd - x) / (rightEnd - right) * bSpline(s + 1, degree - 1, x, spans, fullDegree) : 0;
        return rising + falling;
    }

    private static double knot(int index, int spans, int degree) {
        return Math.max(0, Math.min(spans, index - degree));
    }
}

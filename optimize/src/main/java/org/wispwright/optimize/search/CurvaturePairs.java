package org.wispwright.optimize.search;

import java.util.Arrays;

/**
 * The last few moves s of the unknowns with the changes y of the gradient over them, and the direction they give: minus
 * H g, H the inverse Hessian that BFGS updates make of {@code gamma I}, {@code gamma = s.y / y.y} of the newest pair.
 * <p>Two-loop recursion, pairs numbered oldest first, rho = 1/(s.y):
 * <pre>
 *   q = g;  newest to oldest: alpha_n = rho_n s_n.q,  q -= alpha_n y_n
 *   q *= gamma;  oldest to newest: q += (alpha_n - rho_n y_n.q) s_n
 * </pre>
 * A pair is kept only if s.y is above rounding ({@code 2^-52 |s| |y|}): then H is positive definite and the direction goes
 * downhill. All sums in float64, first number to last.
 * <p>Sources: Nocedal (1980), Mathematics of Computation 35, 773-782; Liu and Nocedal (1989), Mathematical Programming 45,
 * 503-528. Differences from them: the first scale of new unknowns, see {@link #extend}. Checked by {@code CurvaturePairsTest} (outside
 * checks O64 to O68).
 */
final class CurvaturePairs {
    private static final double ROUNDING = 0x1p-52;

    private final int most;
    private double[][] s;
    private double[][] y;
    private final double[] rho;
    private int count;

    CurvaturePairs(int most) {
        this.most = most;
        s = new double[most][];
        y = new double[most][];
        rho = new double[most];
    }

    int count() {
        return count;
    }

    double[] s(int n) {
        return s[n];
    }

    double[] y(int n) {
        return y[n];
    }

    void clear() {
        for (int n = 0; n < count; n++) {
            s[n] = null;
            y[n] = null;
        }
        count = 0;
    }

    /** Takes the arrays over (no copy) as the newest pair, dropping the oldest if full; false if the pair was skipped. */
    boolean add(double[] move, double[] change) {
        double product = dot(move, change);
        if (most == 0 || !isUsable(product, move, change)) {
            return false;
        }
        if (count == most) {
            System.arraycopy(s, 1, s, 0, most - 1);
            System.arraycopy(y, 1, y, 0, most - 1);
            System.arraycopy(rho, 1, rho, 0, most - 1);
            count--;
        }
        s[count] = move;
        y[count] = change;
        rho[count] = 1 / product;
        count++;
        return true;
    }

    /** Overwrites {@code out} with minus H g; minus g if there are no pairs. */
    void direction(double[] g, double[] out) {
        int size = g.length;
        System.arraycopy(g, 0, out, 0, size);
        double[] alpha = new double[count];
        for (int n = count - 1; n >= 0; n--) {
            alpha[n] = rho[n] * dot(s[n], out);
            addScaled(out, -alpha[n], y[n]);
        }
        if (count > 0) {
            double gamma = scale(count - 1);
            int known = known();
            for (int i = 0; i < known; i++) {
                out[i] *= gamma;
            }
            double least = gamma;
            for (int n = 0; n < count && known < size; n++) {
                least = Math.min(least, scale(n));
            }
            for (int i = known; i < size; i++) {
                out[i] *= least;
            }
        }
        for (int n = 0; n < count; n++) {
            double beta = rho[n] * dot(y[n], out);
            addScaled(out, alpha[n] - beta, s[n]);
        }
        for (int i = 0; i < size; i++) {
            out[i] = -out[i];
        }
    }

    /** Of the inverse Hessian, as the pair has it. */
    private double scale(int n) {
        return 1 / (rho[n] * dot(y[n], y[n]));
    }

    /** Unknowns that the newest pair knows of: those after them were added since, and have zeros in it. */
    private int known() {
        int known = s[count - 1].length;
        while (known > 0 && s[count - 1][known - 1] == 0 && y[count - 1][known - 1] == 0) {
            known--;
        }
        return known;
    }

    /**
     * The objective gained {@code weight |x|^2 / 2}: its Hessian gained {@code weight I}, so every y gains {@code weight s},
     * exactly. Pairs that a negative weight makes unusable are dropped.
     */
    void addQuadratic(double weight) {
        int kept = 0;
        for (int n = 0; n < count; n++) {
            double[] change = y[n].clone();
            addScaled(change, weight, s[n]);
            double product = dot(s[n], change);
            if (isUsable(product, s[n], change)) {
                s[kept] = s[n];
                y[kept] = change;
                rho[kept] = 1 / product;
                kept++;
            }
        }
        for (int n = kept; n < count; n++) {
            s[n] = null;
            y[n] = null;
        }
        count = kept;
    }

    /**
     * Pads every pair with zeros. The s are then exact: the new unknowns were 0 all along. The y lack the change of the new
     * unknowns' gradient, which nobody measured; with zeros there, H is the old H for the old unknowns and a multiple of I for the new:
     * positive definite, keeps all that was learnt and claims nothing about the new ones but a first scale. Until a pair knows of
     * them that is the least scale of all pairs: the newest one's is that of a search which had all but ended, and the new unknowns then
     * overshoot and cut the whole first step short (ours).
     */
    void extend(int newLength) {
        for (int n = 0; n < count; n++) {
            s[n] = Arrays.copyOf(s[n], newLength);
            y[n] = Arrays.copyOf(y[n], newLength);
        }
    }

    static double dot(double[] a, double[] b) {
        double sum = 0;
        for (int i = 0; i < a.length; i++) {
            sum += a[i] * b[i];
        }
        return sum;
    }

    static void addScaled(double[] to, double by, double[] a) {
        for (int i = 0; i < to.length; i++) {
            to[i] += by * a[i];
        }
    }

    private static boolean isUsable(double product, double[] move, double[] change) {
        double limit = ROUNDING * Math.sqrt(dot(move, move)) * Math.sqrt(dot(change, change));
        return product > limit && product < Double.POSITIVE_INFINITY && 1 / product < Double.POSITIVE_INFINITY;
    }
}

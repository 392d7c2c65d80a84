package org.wispwright.optimize.flow;

/**
 * The eigenvectors of the 1-D pressure operator along one axis, as an orthonormal transform: cells to modes and back.
 *
 * <p>The operator is {@code (L p)[i] = p[i-1] - 2 p[i] + p[i+1]}; a wall copies the value across it
 * ({@code p[-1] = p[0]}), an open side has pressure 0 at the ghost cell's centre ({@code p[-1] = 0}). For mode m of n:
 * <pre>
 * wall, wall:  cos(theta (i + 1/2)),  theta = m pi / n,               m = 0..n-1   (DCT-II)
 * open, open:  sin(theta (i + 1)),    theta = (m + 1) pi / (n + 1),   m = 0..n-1   (DST-I)
 * wall, open:  cos(theta (i + 1/2)),  theta = (m + 1/2) pi / (n + 1/2)
 * open, wall:  the mirror image of wall, open
 * </pre>
 * each with eigenvalue {@code -4 sin^2(theta / 2)} and scaled to unit length, so the inverse is the transpose.
 * Sources: Strang (1999), SIAM Review 41(1), 135-147; LeVeque (2007), Finite Difference Methods, ch. 2.
 *
 * <p>Both directions are products with an n x n matrix, which for the sizes of a proxy box (up to about 64) is as quick
 * as a fast transform and takes any n and any pair of sides; {@code docs/benchmarks.md} has where the two cross.
 */
final class AxisTransform {
    /** Inputs that one pass over an output row takes at a time. */
    private static final int TOGETHER = 8;

    private final int n;
    private final double[] eigenvalues;
    /** Mode m, cell i at {@code m * n + i}. */
    private final float[] modesByCells;
    /** Cell i, mode m at {@code i * n + m}. */
    private final float[] cellsByModes;

    AxisTransform(int n, Side low, Side high) {
        this.n = n;
        eigenvalues = new double[n];
        modesByCells = new float[n * n];
        cellsByModes = new float[n * n];
        double[] mode = new double[n];
        for (int m = 0; m < n; m++) {
            double theta = angle(n, low, high, m);
            double half = Math.sin(theta / 2);
            eigenvalues[m] = 4 * half * half;
            double squares = 0;
            for (int i = 0; i < n; i++) {
                mode[i] = valueAt(n, low, high, theta, i);
                squares += mode[i] * mode[i];
            }
            for (int i = 0; i < n; i++) {
                float value = (float) (mode[i] / Math.sqrt(squares));
                modesByCells[m * n + i] = value;
                cellsByModes[i * n + m] = value;
            }
        }
    }

    private static double angle(int n, Side low, Side high, int m) {
        if (low == Side.WALL && high == Side.WALL) {
            return m * Math.PI / n;
        }
        if (low == Side.OPEN && high == Side.OPEN) {
            return (m + 1) * Math.PI / (n + 1);
        }
        return (m + 0.5) * Math.PI / (n + 0.5);
    }

    private static double valueAt(int n, Side low, Side high, double theta, int i) {
        if (low == Side.WALL) {
            return Math.cos(theta * (i + 0.5));
        }
        return high == Side.OPEN ? Math.sin(theta * (i + 1)) : Math.cos(theta * (n - 1 - i + 0.5));
    }

    /** Eigenvalue of minus the operator for mode m: {@code 4 sin^2(theta/2)}, cells as the unit of length. */
    double eigenvalue(int m) {
        return eigenvalues[m];
    }

    /** Transforms {@code rows} rows of n neighbouring values; {@code out} must not be {@code in}. */
    void alongRows(float[] in, float[] out, int start, int rows, boolean inverse) {
        float[] matrix = inverse ? modesByCells : cellsByModes;
        for (int r = 0; r < rows; r++) {
            int o = start + r * n;
            java.util.Arrays.fill(out, o, o + n, 0f);
            int i = 0;
            for (; i + TOGETHER <= n; i += TOGETHER) {
                addEight(out, o, n, matrix, i * n, n, in[o + i], in[o + i + 1], in[o + i + 2], in[o + i + 3],
                        in[o + i + 4], in[o + i + 5], in[o + i + 6], in[o + i + 7]);
            }
            for (; i < n; i++) {
                addOne(out, o, n, matrix, i * n, in[o + i]);
            }
        }
    }

    /**
     * Transforms along the slow axis: value i of column c lies at {@code i * stride + c}; columns
     * {@code start..start+count-1} are done. {@code out} must not be {@code in}.
     */
    void acrossRows(float[] in, float[] out, int stride, int start, int count, boolean inverse) {
        float[] matrix = inverse ? cellsByModes : modesByCells;
        for (int r = 0; r < n; r++) {
            int o = r * stride + start;
            java.util.Arrays.fill(out, o, o + count, 0f);
            int i = 0;
            for (; i + TOGETHER <= n; i += TOGETHER) {
                int w = r * n + i;
                addEight(out, o, count, in, i * stride + start, stride, matrix[w], matrix[w + 1], matrix[w + 2], matrix[w + 3],
                        matrix[w + 4], matrix[w + 5], matrix[w + 6], matrix[w + 7]);
            }
            for (; i < n; i++) {
                addOne(out, o, count, in, i * stride + start, matrix[r * n + i]);
            }
        }
    }

    private static void addEight(float[] out, int o, int count, float[] in, int p, int step, float a0, float a1, float a2, float a3,
                                 float a4, float a5, float a6, float a7) {
        int p1 = p + step;
        int p2 = p1 + step;
        int p3 = p2 + step;
        int p4 = p3 + step;
        int p5 = p4 + step;
        int p6 = p5 + step;
        int p7 = p6 + step;
        for (int l = 0; l < count; l++) {
            out[o + l] += ((a0 * in[p + l] + a1 * in[p1 + l]) + (a2 * in[p2 + l] + a3 * in[p3 + l]))
                    + ((a4 * in[p4 + l] + a5 * in[p5 + l]) + (a6 * in[p6 + l] + a7 * in[p7 + l]));
        }
    }

    private static void addOne(float[] out, int o, int count, float[] in, int p, float a) {
        for (int l = 0; l < count; l++) {
            out[o + l] += a * in[p + l];
        }
    }
}

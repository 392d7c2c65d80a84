package org.wispwright.optimize.product;

/**
 * {@code out = M in} for a small matrix M and long rows: row r of out is the sum over n of {@code M[r][n]} times row n of in.
 * Written for the compiler: eight rows at a time, so that a row of out is loaded and stored once for eight products.
 * The order of the sums is fixed by the sizes alone.
 */
public final class RowProduct {
    private static final int TOGETHER = 8;

    private RowProduct() { }

    /**
     * Overwrites {@code rows} rows of out.
     *
     * @param matrix      M, row r at {@code matrixStart + r * matrixStride}, {@code inner} values each
     * @param in          row n at {@code inStart + n * inStride}
     * @param out         row r at {@code outStart + r * outStride}; its rows must not overlap those of in
     * @param length      values a row
     */
    public static void multiply(float[] matrix, int matrixStart, int matrixStride, int rows, int inner,
                                float[] in, int inStart, int inStride, float[] out, int outStart, int outStride, int length) {
        for (int r = 0; r < rows; r++) {
            int o = outStart + r * outStride;
            int w = matrixStart + r * matrixStride;
            java.util.Arrays.fill(out, o, o + length, 0f);
            int n = 0;
            for (; n + TOGETHER <= inner; n += TOGETHER) {
                addEight(out, o, length, in, inStart + n * inStride, inStride, matrix[w + n], matrix[w + n + 1], matrix[w + n + 2],
                        matrix[w + n + 3], matrix[w + n + 4], matrix[w + n + 5], matrix[w + n + 6], matrix[w + n + 7]);
            }
            for (; n + 2 <= inner; n += 2) {
                addTwo(out, o, length, in, inStart + n * inStride, inStride, matrix[w + n], matrix[w + n + 1]);
            }
            if (n < inner) {
                addTwo(out, o, length, in, inStart + n * inStride, 0, matrix[w + n], 0f);
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

    private static void addTwo(float[] out, int o, int count, float[] in, int p, int step, float a0, float a1) {
        int p1 = p + step;
        for (int l = 0; l < count; l++) {
            out[o + l] += a0 * in[p + l] + a1 * in[p1 + l];
        }
    }
}

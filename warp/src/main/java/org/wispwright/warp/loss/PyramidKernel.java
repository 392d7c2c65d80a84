package org.wispwright.warp.loss;

/** The loops of {@link Pyramid}: entries of {@code run} neighbouring floats, {@code stride} apart, smoothed and halved along one axis. */
final class PyramidKernel {
    private static final float SIDE = 1f / 16;
    private static final float NEXT = 4f / 16;
    private static final float MIDDLE = 6f / 16;

    private PyramidKernel() {
    }

    /** n entries of in to m = (n + 1)/2 entries of out. */
    static void reduce(float[] in, int inAt, int inStride, int n, float[] out, int outAt, int outStride, int m, int run) {
        for (int i = 0; i < m; i++) {
            int a = inAt + mirror(2 * i - 2, n) * inStride;
            int b = inAt + mirror(2 * i - 1, n) * inStride;
            int c = inAt + 2 * i * inStride;
            int d = inAt + mirror(2 * i + 1, n) * inStride;
            int e = inAt + mirror(2 * i + 2, n) * inStride;
            int o = outAt + i * outStride;
            for (int r = 0; r < run; r++) {
                out[o + r] = SIDE * (in[a + r] + in[e + r]) + NEXT * (in[b + r] + in[d + r]) + MIDDLE * in[c + r];
            }
        }
    }

    /** The transpose of {@link #reduce}: m entries of outBar are added into n entries of inBar. */
    static void reducePullback(float[] outBar, int outAt, int outStride, int m, float[] inBar, int inAt, int inStride, int n, int run) {
        for (int i = 0; i < m; i++) {
            int a = inAt + mirror(2 * i - 2, n) * inStride;
            int b = inAt + mirror(2 * i - 1, n) * inStride;
            int c = inAt + 2 * i * inStride;
            int d = inAt + mirror(2 * i + 1, n) * inStride;
            int e = inAt + mirror(2 * i + 2, n) * inStride;
            int o = outAt + i * outStride;
            for (int r = 0; r < run; r++) {
                float bar = outBar[o + r];
                inBar[a + r] += SIDE * bar;
                inBar[b + r] += NEXT * bar;
                inBar[c + r] += MIDDLE * bar;
                inBar[d + r] += NEXT * bar;
                inBar[e + r] += SIDE * bar;
            }
        }
    }

    /** Where index i is read when the n entries are mirrored about the first and the last. */
    static int mirror(int i, int n) {
        if (n == 1) {
            return 0;
        }
        int folded = Math.abs(i) % (2 * n - 2);
        return folded < n ? folded : 2 * n - 2 - folded;
    }
}

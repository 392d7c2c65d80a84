package org.wispwright.optimize.flow;

/**
 * Values of one box on other cells. Along an axis of cells a new value is the mean over its cell, so sums times cell size stay; along the
 * axis that faces are square to it is the value at the face's place, linear between faces. So flux through a coarse face that lies on fine
 * ones is theirs, and a field free of divergence stays so when cells are joined. Equal sizes copy to the bit.
 */
final class Averages {
    private Averages() { }

    /** Overwrites out, of sizes {nx, ny, nz}; {@code faces}: the axis that the values' faces are square to, -1 for cells. */
    static void resample(float[] from, int[] fromSizes, float[] out, int[] outSizes, int faces) {
        double[] values = new double[from.length];
        for (int n = 0; n < from.length; n++) {
            values[n] = from[n];
        }
        int[] sizes = fromSizes.clone();
        for (int axis = 0; axis < 3; axis++) {
            if (sizes[axis] != outSizes[axis]) {
                values = along(values, sizes, axis, outSizes[axis], axis == faces);
                sizes[axis] = outSizes[axis];
            }
        }
        for (int n = 0; n < out.length; n++) {
            out[n] = (float) values[n];
        }
    }

    private static double[] along(double[] from, int[] sizes, int axis, int count, boolean faces) {
        int stride = axis == 0 ? 1 : axis == 1 ? sizes[0] : sizes[0] * sizes[1];
        int before = sizes[axis];
        int outer = from.length / (stride * before);
        double[] out = new double[outer * count * stride];
        for (int n = 0; n < count; n++) {
            // The span of old values, in their indices, that the new one stands for.
            double low = faces ? n * (before - 1.0) / (count - 1) : n * (double) before / count;
            double high = faces ? low : (n + 1) * (double) before / count;
            for (int i = (int) low; i < before && i <= high; i++) {
                double share = faces ? 1 - Math.min(1, Math.abs(low - i)) : (Math.min(high, i + 1) - Math.max(low, i)) / (high - low);
                add(from, out, stride, outer, i, before, n, count, share);
            }
            if (faces && low > (int) low) {
                add(from, out, stride, outer, (int) low + 1, before, n, count, low - (int) low);
            }
        }
        return out;
    }

    private static void add(double[] from, double[] out, int stride, int outer, int i, int before, int n, int count, double share) {
        for (int o = 0; share > 0 && o < outer; o++) {
            for (int s = 0; s < stride; s++) {
                out[(o * count + n) * stride + s] += share * from[(o * before + i) * stride + s];
            }
        }
    }
}

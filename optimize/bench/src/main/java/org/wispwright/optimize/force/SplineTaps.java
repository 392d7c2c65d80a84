package org.wispwright.optimize.force;

/**
 * Uniform cubic B-splines (de Boor 1978) along one axis: value at place m is the sum over four control values, first[m] to first[m] + 3,
 * times their weights. Forward and its transpose work on arrays of [outer][along][inner].
 */
final class SplineTaps {
    private final int controls;
    private final int[] first;
    private final float[][] weights;

    /**
     * @param spans  intervals between knots over the axis
     * @param cells  of the axis
     * @param nodes  true for places at the cells' ends (cells + 1 of them), false for their middles
     */
    SplineTaps(int spans, int cells, boolean nodes) {
        controls = spans + 3;
        first = new int[nodes ? cells + 1 : cells];
        weights = new float[first.length][];
        for (int m = 0; m < first.length; m++) {
            double t = (m + (nodes ? 0 : 0.5)) * spans / cells;
            first[m] = Math.min((int) t, spans - 1);
            double f = t - first[m];
            weights[m] = new float[] {(float) ((1 - f) * (1 - f) * (1 - f) / 6), (float) ((3 * f * f * f - 6 * f * f + 4) / 6),
                (float) ((-3 * f * f * f + 3 * f * f + 3 * f + 1) / 6), (float) (f * f * f / 6)};
        }
    }

    int controls() {
        return controls;
    }

    int places() {
        return first.length;
    }

    /** A new array of [outer][places][inner] from one of [outer][controls][inner]. */
    float[] forward(float[] in, int inner) {
        int outer = in.length / (controls * inner);
        float[] out = new float[outer * first.length * inner];
        for (int o = 0; o < outer; o++) {
            for (int m = 0; m < first.length; m++) {
                int to = (o * first.length + m) * inner;
                for (int tap = 0; tap < 4; tap++) {
                    addRow(in, (o * controls + first[m] + tap) * inner, weights[m][tap], out, to, inner);
                }
            }
        }
        return out;
    }

    /** The transpose: a new array of [outer][controls][inner] from one of [outer][places][inner]. */
    float[] pullback(float[] bar, int inner) {
        int outer = bar.length / (first.length * inner);
        float[] out = new float[outer * controls * inner];
        for (int o = 0; o < outer; o++) {
            for (int m = 0; m < first.length; m++) {
                int from = (o * first.length + m) * inner;
                for (int tap = 0; tap < 4; tap++) {
                    addRow(bar, from, weights[m][tap], out, (o * controls + first[m] + tap) * inner, inner);
                }
            }
        }
        return out;
    }

    private static void addRow(float[] from, int at, float weight, float[] to, int start, int length) {
        for (int n = 0; n < length; n++) {
            to[start + n] += weight * from[at + n];
        }
    }
}

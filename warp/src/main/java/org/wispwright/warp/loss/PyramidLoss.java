package org.wispwright.warp.loss;

import org.wispwright.render.picture.Picture;

/**
 * Distance of a picture from the wanted one at all scales, and its pullback:
 * {@code J = sum over levels l of (1 / pixels_l) sum over pixels p and RGBA of M_l[p] (got_l[p] - wanted_l[p])^2}.
 * <p>Levels are those of {@link Pyramid}, equally weighted; M_0 = weights, M_l = M_0 carried down by the same pyramid. The pyramid is
 * linear, so only the difference goes down it. Pullback: {@code diffBar_l = (2 / pixels_l) M_l diff_l + down'(diffBar_{l+1})},
 * gotBar += scale diffBar_0. Float storage, sums in double, row by row in a fixed order.
 * <p>Keeps its scratch space (about 6 floats a pixel and channel), so it allocates nothing when called; one caller at a time.
 */
public final class PyramidLoss implements PictureLoss {
    private final Pyramid pyramid;
    private final Picture wanted;
    private final float[][] weights;
    private final float[][] difference;
    private final float[][] bar;
    private final float[] scratch;
    private final double[] levelValues;

    /**
     * Prepares a loss.
     *
     * @param wanted  kept, not copied: do not change it afterwards
     * @param weights read: one number a pixel of wanted, finite, 0 or more
     * @throws IllegalArgumentException if the count differs, or a weight is negative or not finite
     */
    public PyramidLoss(Picture wanted, float[] weights) {
        this.wanted = wanted;
        pyramid = new Pyramid(wanted.width(), wanted.height());
        LossInputs.requireWeights(wanted, weights);
        int levels = pyramid.levels();
        scratch = new float[pyramid.scratchFloats(4)];
        this.weights = new float[levels][];
        difference = new float[levels][];
        bar = new float[levels][];
        levelValues = new double[levels];
        for (int l = 0; l < levels; l++) {
            this.weights[l] = l == 0 ? weights.clone() : new float[pyramid.pixels(l)];
            difference[l] = new float[4 * pyramid.pixels(l)];
            bar[l] = new float[4 * pyramid.pixels(l)];
            if (l > 0) {
                pyramid.down(l - 1, 1, this.weights[l - 1], this.weights[l], scratch);
            }
        }
    }

    @Override
    public Picture wanted() {
        return wanted;
    }

    @Override
    public double value(Picture got) {
        takeDifference(got);
        double sum = 0;
        for (int l = 0; l < difference.length; l++) {
            levelValues[l] = levelValue(l);
            sum += levelValues[l];
        }
        return sum;
    }

    @Override
    public double valueAndPullback(Picture got, float[] gotBar, double scale) {
        LossInputs.requireBar(wanted, gotBar);
        double value = value(got);
        for (int l = difference.length - 1; l >= 0; l--) {
            levelBar(l, 2 * scale / pyramid.pixels(l));
            if (l < difference.length - 1) {
                pyramid.downPullback(l, 4, bar[l + 1], bar[l], scratch);
            }
        }
        float[] finest = bar[0];
        for (int n = 0; n < gotBar.length; n++) {
            gotBar[n] += finest[n];
        }
        return value;
    }

    /** The share of level 0 alone in J. */
    public double finest(Picture got) {
        LossInputs.requireRaster(wanted, got);
        subtract(got);
        return levelValue(0);
    }

    /** J of the last call of {@link #value} or {@link #valueAndPullback}, level by level, finest first; a copy. */
    public double[] lastLevelValues() {
        return levelValues.clone();
    }

    private void takeDifference(Picture got) {
        LossInputs.requireRaster(wanted, got);
        subtract(got);
        for (int l = 0; l + 1 < difference.length; l++) {
            pyramid.down(l, 4, difference[l], difference[l + 1], scratch);
        }
    }

    private void subtract(Picture got) {
        float[] g = got.rgba();
        float[] w = wanted.rgba();
        float[] d = difference[0];
        for (int n = 0; n < d.length; n++) {
            d[n] = g[n] - w[n];
        }
    }

    private double levelValue(int level) {
        float[] d = difference[level];
        float[] m = weights[level];
        double sum = 0;
        for (int p = 0, n = 0; p < m.length; p++, n += 4) {
            sum += m[p] * ((double) d[n] * d[n] + (double) d[n + 1] * d[n + 1]
                    + (double) d[n + 2] * d[n + 2] + (double) d[n + 3] * d[n + 3]);
        }
        return sum / m.length;
    }

    private void levelBar(int level, double factor) {
        float[] d = difference[level];
        float[] m = weights[level];
        float[] b = bar[level];
        for (int p = 0, n = 0; p < m.length; p++, n += 4) {
            float f = (float) (factor * m[p]);
            b[n] = f * d[n];
            b[n + 1] = f * d[n + 1];
            b[n + 2] = f * d[n + 2];
            b[n + 3] = f * d[n + 3];
        }
    }
}

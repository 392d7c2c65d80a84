package org.wispwright.warp.loss;

import org.wispwright.render.picture.Picture;

/**
 * How little the silhouettes of two pictures overlap, softly, and its pullback. With alpha a, level L and softness t:
 * {@code s = 1 / (1 + exp(-(a - L) / t))}, the soft threshold, g = s of got, w = s of wanted, weights M:
 * {@code J = D / (U + e)}, {@code D = sum M (g - w)^2}, {@code U = sum M (g^2 + w^2 - g w)}, e = {@value #FLOOR}.
 * <p>This is 1 minus the intersection over union {@code sum M g w / U} in the form that holds for numbers in 0..1 as well as for
 * 0 and 1: it is 1 - 1 = 0 only for g = w. J is 0 for equal pictures, two empty ones among them, and close to 1 for silhouettes
 * that do not meet.
 * <p>Pullback: {@code gBar = scale M (2 (g - w) - J (2 g - w)) / (U + e)}, {@code aBar += gBar g (1 - g) / t}; colour has no part.
 * Far from the level on both sides the derivative dies away like {@code exp(-|a - L| / t)}: a loss for the rim of smoke that
 * overlaps already.
 * <p>Sources: Tanimoto's coefficient for numbers, Willett, Barnard and Downs (1998), J. Chem. Inf. Comput. Sci. 38(6), 983-996; as
 * a loss for outlines, Rahman and Wang (2016), ISVC 2016, LNCS 10072, 234-244. Difference from the latter: they have
 * {@code g + w - g w} below, for which soft equal silhouettes are not at the minimum.
 * <p>Sums in double, in pixel order. Allocates nothing when called; one caller at a time.
 */
public final class SilhouetteLoss implements PictureLoss {
    /** Added to the union, in pixels, so that nothing is divided by 0. */
    public static final double FLOOR = 1e-9;

    private final Picture wanted;
    private final float[] weights;
    private final double level;
    private final double softness;
    private final double[] wantedSoft;
    private final double[] gotSoft;
    private double union;

    /**
     * Prepares a loss.
     *
     * @param wanted   kept, not copied: do not change it afterwards
     * @param weights  read: one number a pixel of wanted, finite, 0 or more
     * @param level    alpha at the outline, above 0 and below 1
     * @param softness width t of the threshold, in alpha, above 0 and at most 1; 0.1 is a fair start
     * @throws IllegalArgumentException if a count or a number is out of range
     */
    public SilhouetteLoss(Picture wanted, float[] weights, double level, double softness) {
        LossInputs.requireWeights(wanted, weights);
        if (!(level > 0 && level < 1 && softness > 0 && softness <= 1)) {
            throw new IllegalArgumentException("silhouette loss: got level " + level + " and softness " + softness
                    + ", needs a level above 0 and below 1 and a softness above 0 and at most 1");
        }
        this.wanted = wanted;
        this.weights = weights.clone();
        this.level = level;
        this.softness = softness;
        wantedSoft = new double[weights.length];
        gotSoft = new double[weights.length];
        threshold(wanted, wantedSoft);
    }

    @Override
    public Picture wanted() {
        return wanted;
    }

    @Override
    public double value(Picture got) {
        LossInputs.requireRaster(wanted, got);
        threshold(got, gotSoft);
        double difference = 0;
        double sum = 0;
        for (int p = 0; p < weights.length; p++) {
            double g = gotSoft[p];
            double w = wantedSoft[p];
            difference += weights[p] * (g - w) * (g - w);
            sum += weights[p] * (g * g + w * w - g * w);
        }
        union = sum + FLOOR;
        return difference / union;
    }

    @Override
    public double valueAndPullback(Picture got, float[] gotBar, double scale) {
        LossInputs.requireBar(wanted, gotBar);
        double value = value(got);
        double factor = scale / (union * softness);
        for (int p = 0; p < weights.length; p++) {
            double g = gotSoft[p];
            double w = wantedSoft[p];
            gotBar[4 * p + 3] += (float) (factor * weights[p] * (2 * (g - w) - value * (2 * g - w)) * g * (1 - g));
        }
        return value;
    }

    private void threshold(Picture picture, double[] soft) {
        float[] rgba = picture.rgba();
        for (int p = 0; p < soft.length; p++) {
            soft[p] = 1 / (1 + Math.exp((level - rgba[4 * p + 3]) / softness));
        }
    }
}

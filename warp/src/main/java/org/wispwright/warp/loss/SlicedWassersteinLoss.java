package org.wispwright.warp.loss;

import java.util.Arrays;
import org.wispwright.render.picture.Picture;

/**
 * How far the smoke of one picture has to travel to become that of another, and its pullback. Both are taken as distributions of
 * opacity over the frame: pixel p at {@code (x, y)}, in heights, has mass {@code m_p = M_p (max(alpha_p, 0) + background)}, all
 * scaled to sum 1. {@code J = (1 / K) sum_k W2^2(along direction k)}, K = {@value #DIRECTIONS}, directions
 * {@code (cos, sin)((k + 1/2) pi / K)}, always the same. A shift by c heights costs about {@code |c|^2 / 2}, near or far, so the
 * gradient leads there even when nothing overlaps. J says nothing about how much smoke there is, nor about its colour: join it with
 * another loss for these.
 * <p>Along a direction ({@link TransportKernel}): each pixel's mass goes to the two nearest of bins one pixel wide (linear shares),
 * and is spread evenly in its bin. The cumulated mass F (got) and G (wanted) is then linear in each bin and
 * {@code W2^2 = integral over u of (F^-1(u) - G^-1(u))^2} an exact finite sum. Pullback: {@code binBar_i} = mean over bin i of phi,
 * {@code phi'(s) = 2 (s - G^-1(F(s)))} (Kantorovich's potential); through the scaling to sum 1,
 * {@code alphaBar_p += scale (M_p / sum m) (binBar at p - sum_i F_i binBar_i) / K} where alpha is above 0.
 * <p>The background, {@value #BACKGROUND} of the wanted picture's mean opacity, keeps every bin of the region filled, so that J is
 * smooth and defined for an empty picture.
 * <p>Sources: Bonneel, Rabin, Peyre and Pfister (2015), J. Math. Imaging Vis. 51, 22-45; potential, Santambrogio (2015), Optimal
 * Transport for Applied Mathematicians, 7.2. Differences from the former: fixed directions, masses rather than places are free,
 * bins, background. Allocates nothing when called; one caller at a time; sums in double in pixel order.
 */
public final class SlicedWassersteinLoss implements PictureLoss {
    /** How many directions are looked along. */
    public static final int DIRECTIONS = 16;
    /** Opacity added everywhere, as a share of the wanted picture's mean opacity in the region. */
    public static final double BACKGROUND = 1e-3;
    /** The least background, for a wanted picture with (almost) no smoke. */
    private static final double LEAST_BACKGROUND = 1e-6;

    private final Picture wanted;
    private final float[] weights;
    private final double background;
    private final Slice[] slices;
    private final double[] mass;
    private final double[] massBar;

    /**
     * Prepares a loss: the wanted picture is laid out along every direction.
     *
     * @param wanted  kept, not copied: do not change it afterwards
     * @param weights read: one number a pixel of wanted, finite, 0 or more; all 0 gives a loss that is always 0
     * @throws IllegalArgumentException if the count differs, or a weight is negative or not finite
     */
    public SlicedWassersteinLoss(Picture wanted, float[] weights) {
        LossInputs.requireWeights(wanted, weights);
        this.wanted = wanted;
        this.weights = weights.clone();
        mass = new double[weights.length];
        massBar = new double[weights.length];
        double sum = 0;
        double weight = 0;
        for (int p = 0; p < weights.length; p++) {
            sum += weights[p] * Math.max(0.0, wanted.rgba()[4 * p + 3]);
            weight += weights[p];
        }
        background = weight > 0 ? Math.max(LEAST_BACKGROUND, BACKGROUND * sum / weight) : 0;
        slices = new Slice[weight > 0 ? DIRECTIONS : 0];
        takeMass(wanted);
        for (int k = 0; k < slices.length; k++) {
            slices[k] = new Slice(wanted.width(), wanted.height(), (k + 0.5) * Math.PI / DIRECTIONS);
            slices[k].layOut(mass);
            System.arraycopy(slices[k].cumulated, 0, slices[k].wanted, 0, slices[k].wanted.length);
        }
    }

    @Override
    public Picture wanted() {
        return wanted;
    }

    @Override
    public double value(Picture got) {
        LossInputs.requireRaster(wanted, got);
        takeMass(got);
        double sum = 0;
        for (Slice slice : slices) {
            slice.layOut(mass);
            sum += slice.transport();
        }
        return sum / DIRECTIONS;
    }

    @Override
    public double valueAndPullback(Picture got, float[] gotBar, double scale) {
        LossInputs.requireRaster(wanted, got);
        LossInputs.requireBar(wanted, gotBar);
        double total = takeMass(got);
        Arrays.fill(massBar, 0);
        double sum = 0;
        for (Slice slice : slices) {
            slice.layOut(mass);
            sum += slice.transport();
            slice.addPotential(massBar);
        }
        float[] rgba = got.rgba();
        double factor = total > 0 ? scale / (total * DIRECTIONS) : 0;
        for (int p = 0; p < mass.length; p++) {
            if (rgba[4 * p + 3] > 0) {
                gotBar[4 * p + 3] += (float) (factor * weights[p] * massBar[p]);
            }
        }
        return sum / DIRECTIONS;
    }

    /** Fills {@code mass} and returns its sum. */
    private double takeMass(Picture picture) {
        float[] rgba = picture.rgba();
        double sum = 0;
        for (int p = 0; p < mass.length; p++) {
            mass[p] = weights[p] * (Math.max(0.0, rgba[4 * p + 3]) + background);
            sum += mass[p];
        }
        return sum;
    }

    /** One direction: where pixels fall on its bins, and both cumulated masses at the bins' edges. */
    private static final class Slice {
        private final int width;
        private final int height;
        private final double cos;
        private final double sin;
        private final double first;
        private final double pitch;
        private final double[] cumulated;
        private final double[] wanted;
        private final double[] potential;
        private double meanPotential;

        Slice(int width, int height, double angle) {
            this.width = width;
            this.height = height;
            cos = Math.cos(angle);
            sin = Math.sin(angle);
            pitch = 1.0 / height;
            // In bins, of the pixel (x,y): x cos + y sin - first, at least 1 so that both neighbours exist.
            first = Math.min(0, cos * (width - 1)) - 1;
            int bins = (int) Math.ceil(Math.max(0, cos * (width - 1)) + sin * (height - 1) - first) + 2;
            cumulated = new double[bins + 1];
            wanted = new double[bins + 1];
            potential = new double[bins];
        }

        void layOut(double[] mass) {
            Arrays.fill(cumulated, 0);
            for (int y = 0, p = 0; y < height; y++) {
                double row = y * sin - first;
                for (int x = 0; x < width; x++, p++) {
                    double place = row + x * cos;
                    int bin = (int) place;
                    double share = place - bin;
                    cumulated[bin + 1] += (1 - share) * mass[p];
                    cumulated[bin + 2] += share * mass[p];
                }
            }
            for (int i = 1; i < cumulated.length; i++) {
                cumulated[i] += cumulated[i - 1];
            }
            double total = cumulated[cumulated.length - 1];
            for (int i = 1; i < cumulated.length; i++) {
                cumulated[i] /= total;
            }
        }

        /** W2^2 in squared heights; leaves the potential of each bin, and its mean by mass, in squared bins. */
        double transport() {
            double squared = TransportKernel.squaredDistance(cumulated, wanted, potential);
            meanPotential = 0;
            for (int i = 0; i < potential.length; i++) {
                meanPotential += (cumulated[i + 1] - cumulated[i]) * potential[i];
            }
            return squared * pitch * pitch;
        }

        void addPotential(double[] massBar) {
            double unit = pitch * pitch;
            for (int y = 0, p = 0; y < height; y++) {
                double row = y * sin - first;
                for (int x = 0; x < width; x++, p++) {
                    double place = row + x * cos;
                    int bin = (int) place;
                    double share = place - bin;
                    massBar[p] += unit * ((1 - share) * potential[bin] + share * potential[bin + 1] - meanPotential);
                }
            }
        }
    }
}

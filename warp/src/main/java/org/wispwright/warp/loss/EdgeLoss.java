package org.wispwright.warp.loss;

import org.wispwright.render.picture.Picture;

/**
 * How far the edges of a picture are from the wanted ones, and its pullback. With {@code e = got - wanted}, the sum over links of a pixel
 * to its neighbour on the right and below (p to p'), and weights M:
 * {@code J = sum over links of m sum over RGBA (e[p'] - e[p])^2}, {@code m = (M_p q_p + M_p' q_p') / 2}.
 * <p>q says where the wanted picture has edges: {@code q = floor + (1 - floor) s^2 / (s^2 + K^2)}, s^2 the squared length of its
 * gradient over RGBA (one-sided differences), K^2 the mean of s^2 by weight, floor = {@value #FLOOR} so that an edge where the wanted
 * picture is smooth counts too. It depends on the wanted picture alone: J is quadratic in got.
 * <p>Pullback: {@code d = 2 scale m (e[p'] - e[p])}, {@code gotBar[p'] += d}, {@code gotBar[p] -= d}.
 * <p>Scale: with positions in heights J tends to {@code integral of M q |grad e|^2}, Dirichlet's energy of the difference; a difference
 * is a pixel's width times a slope and a pixel's area its square, so the two cancel and J of smooth pictures does not depend on the
 * raster. A constant difference costs nothing: join it with another loss.
 * <p>Sources: matching gradients, Perez, Gangnet and Blake (2003), ACM TOG 22(3), 313-318; the edge measure is one minus the second
 * conductance of Perona and Malik (1990), IEEE PAMI 12(7), 629-639. Differences: the weight is made of the wanted picture once, K from its
 * own mean, and the floor. Sums in double, row by row. Allocates nothing when called; one caller at a time.
 */
public final class EdgeLoss implements PictureLoss {
    /** What a place counts where the wanted picture is smooth. */
    public static final double FLOOR = 0.25;

    private final Picture wanted;
    private final float[] links;
    private final float[] difference;

    /**
     * Prepares a loss.
     *
     * @param wanted  kept, not copied: do not change it afterwards
     * @param weights read: one number a pixel of wanted, finite, 0 or more
     * @throws IllegalArgumentException if the count differs, or a weight is negative or not finite
     */
    public EdgeLoss(Picture wanted, float[] weights) {
        LossInputs.requireWeights(wanted, weights);
        this.wanted = wanted;
        links = new float[weights.length];
        difference = new float[wanted.rgba().length];
        double[] strength = new double[weights.length];
        double sum = 0;
        double weight = 0;
        for (int p = 0; p < strength.length; p++) {
            strength[p] = squaredSlope(p);
            sum += weights[p] * strength[p];
            weight += weights[p];
        }
        double mean = sum > 0 ? sum / weight : 1;
        for (int p = 0; p < strength.length; p++) {
            links[p] = (float) (weights[p] * (FLOOR + (1 - FLOOR) * strength[p] / (strength[p] + mean)));
        }
    }

    @Override
    public Picture wanted() {
        return wanted;
    }

    @Override
    public double value(Picture got) {
        subtract(got);
        int w = wanted.width();
        double sum = 0;
        for (int y = 0, p = 0; y < wanted.height(); y++) {
            for (int x = 0; x < w; x++, p++) {
                if (x + 1 < w) {
                    sum += link(p, p + 1);
                }
                if (y + 1 < wanted.height()) {
                    sum += link(p, p + w);
                }
            }
        }
        return sum;
    }

    @Override
    public double valueAndPullback(Picture got, float[] gotBar, double scale) {
        LossInputs.requireBar(wanted, gotBar);
        double value = value(got);
        int w = wanted.width();
        for (int y = 0, p = 0; y < wanted.height(); y++) {
            for (int x = 0; x < w; x++, p++) {
                if (x + 1 < w) {
                    linkBar(p, p + 1, scale, gotBar);
                }
                if (y + 1 < wanted.height()) {
                    linkBar(p, p + w, scale, gotBar);
                }
            }
        }
        return value;
    }

    private double link(int p, int next) {
        double sum = 0;
        for (int c = 0; c < 4; c++) {
            double slope = (double) difference[4 * next + c] - difference[4 * p + c];
            sum += slope * slope;
        }
        return 0.5 * ((double) links[p] + links[next]) * sum;
    }

    private void linkBar(int p, int next, double scale, float[] gotBar) {
        double factor = scale * ((double) links[p] + links[next]);
        for (int c = 0; c < 4; c++) {
            float d = (float) (factor * ((double) difference[4 * next + c] - difference[4 * p + c]));
            gotBar[4 * next + c] += d;
            gotBar[4 * p + c] -= d;
        }
    }

    private void subtract(Picture got) {
        LossInputs.requireRaster(wanted, got);
        float[] g = got.rgba();
        float[] w = wanted.rgba();
        for (int n = 0; n < difference.length; n++) {
            difference[n] = g[n] - w[n];
        }
    }

    /** Squared length of the wanted picture's gradient at a pixel, over RGBA, in squared numbers a pixel; 0 beyond the last row, column. */
    private double squaredSlope(int p) {
        int w = wanted.width();
        float[] rgba = wanted.rgba();
        int right = p % w + 1 < w ? p + 1 : p;
        int below = p + w < rgba.length / 4 ? p + w : p;
        double sum = 0;
        for (int c = 0; c < 4; c++) {
            double dx = (double) rgba[4 * right + c] - rgba[4 * p + c];
            double dy = (double) rgba[4 * below + c] - rgba[4 * p + c];
            sum += dx * dx + dy * dy;
        }
        return sum;
    }
}

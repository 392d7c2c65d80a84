package org.wispwright.warp.paintover;

import java.util.Arrays;
import org.wispwright.render.picture.Picture;

/**
 * From a frame's colour to our opacity, learnt from the frame before it was painted and our picture of the same smoke. The look that
 * made the frame is not known; what is assumed of it, C the frame's colour (red, green, blue, alpha; linear, premultiplied):
 * <pre>
 *   C(p) = B(p) + G(a(p)) V(p)
 * </pre>
 * a our opacity, B the background, V the way from background to smoke, which changes slowly over the frame (light and shade), G an
 * {@link OpacityCurve}, which is where another extinction shows.
 * <ol>
 * <li>B: the frame itself where a is at most {@value #CLEAR} (or among the clearest 1 % of all pixels); under smoke the
 *     {@link NearbyMean} of those.</li>
 * <li>V: least squares near each place, {@code V = mean(G (C - B)) / mean(G^2)}, the first time over the whole frame.</li>
 * <li>G: fitted to {@code t = (C - B).V / |V|^2} against a. Then V and G again, {@value #ROUNDS} rounds.</li>
 * <li>At last V of every pixel is drawn towards its own colour, {@code (r V + G (C - B)) / (r + G^2)}, r = {@value #OWN}: thick smoke
 *     knows its colour, and the unpainted frame then maps onto our own opacity.</li>
 * </ol>
 * Ours, from the emission-absorption model with a constant colour along the ray (Max 1995, IEEE TVCG 1(2), 99-108).
 */
final class LookMap {
    /** Up to this opacity a pixel shows background. */
    static final double CLEAR = 0.002;
    /** Reach squared at which half of a pixel's colour is its own. */
    static final double OWN = 0.003;
    private static final int ROUNDS = 4;
    private static final double CLEAREST = 0.01;
    /** Width of what counts as near, heights. */
    private static final double NEAR = 0.03;

    private final float[] background;
    private final float[] way;
    private final OpacityCurve curve;
    private final double agreement;

    private LookMap(float[] background, float[] way, OpacityCurve curve, double agreement) {
        this.background = background;
        this.way = way;
        this.curve = curve;
        this.agreement = agreement;
    }

    /**
     * Learns the look.
     *
     * @param before   read: the frame before it was painted
     * @param original read: our picture of the same frame and view, the same raster
     * @throws IllegalArgumentException if our picture has no smoke
     */
    static LookMap of(Picture before, Picture original) {
        int width = before.width();
        int height = before.height();
        float[] a = opacity(original);
        double clear = clearest(a);
        float[] background = background(before, a, clear);
        float[] away = before.rgba().clone();
        for (int n = 0; n < away.length; n++) {
            away[n] -= background[n];
        }
        OpacityCurve curve = OpacityCurve.straight();
        float[] way = null;
        for (int round = 0; round < ROUNDS; round++) {
            float[] weighted = new float[away.length];
            float[] weights = new float[a.length];
            for (int p = 0; p < a.length; p++) {
                double g = a[p] > clear ? curve.reach(a[p]) : 0;
                weights[p] = (float) (g * g);
                for (int c = 4 * p; c < 4 * p + 4; c++) {
                    weighted[c] = (float) (g * away[c]);
                }
            }
            // The first round knows one way for all: a wide kernel, so that G is not mistaken for light and shade.
            way = NearbyMean.of(weighted, weights, 4, width, height, round == 0 ? 10 : NEAR);
            curve = OpacityCurve.fit(a, along(away, way), clear);
        }
        double agreement = agreement(a, along(away, way), curve);
        for (int p = 0; p < a.length; p++) {
            double g = a[p] > clear ? curve.reach(a[p]) : 0;
            for (int c = 4 * p; c < 4 * p + 4; c++) {
                way[c] = (float) ((OWN * way[c] + g * away[c]) / (OWN + g * g));
            }
        }
        return new LookMap(background, way, curve, agreement);
    }

    /** Our opacity of every pixel of a frame that was made with the same look before the same background; a new array. */
    float[] opacityOf(Picture frame) {
        float[] away = frame.rgba().clone();
        for (int n = 0; n < away.length; n++) {
            away[n] -= background[n];
        }
        double[] seen = along(away, way);
        float[] out = new float[seen.length];
        for (int p = 0; p < out.length; p++) {
            out[p] = (float) curve.opacity(seen[p]);
        }
        return out;
    }

    /** What a frame of this look shows with these opacities: {@code B + G(a) V}, four numbers a pixel; a new array. */
    float[] colourOf(float[] opacity) {
        float[] out = background.clone();
        for (int p = 0; p < opacity.length; p++) {
            double g = curve.reach(Math.min(1, Math.max(0, opacity[p])));
            for (int c = 4 * p; c < 4 * p + 4; c++) {
                out[c] += g * way[c];
            }
        }
        return out;
    }

    /** The background that was found: four numbers a pixel, not a copy. */
    float[] background() {
        return background;
    }

    /** Share of our opacity's variance that the frame's colours explain before any pixel is given its own way: 1 is all, 0 none. */
    double agreement() {
        return agreement;
    }

    private static float[] opacity(Picture original) {
        float[] a = new float[original.width() * original.height()];
        boolean any = false;
        for (int p = 0; p < a.length; p++) {
            a[p] = Math.min(1f, Math.max(0f, original.rgba()[4 * p + 3]));
            any |= a[p] > CLEAR;
        }
        if (!any) {
            throw new IllegalArgumentException("paint-over: the original shows no smoke here, so that colours cannot be told from"
                    + " background; take another frame or view");
        }
        return a;
    }

    private static double clearest(float[] a) {
        float[] sorted = a.clone();
        Arrays.sort(sorted);
        return Math.max(CLEAR, sorted[(int) (CLEAREST * sorted.length)]);
    }

    private static float[] background(Picture before, float[] a, double clear) {
        float[] weights = new float[a.length];
        float[] weighted = new float[4 * a.length];
        for (int p = 0; p < a.length; p++) {
            if (a[p] <= clear) {
                weights[p] = 1;
                System.arraycopy(before.rgba(), 4 * p, weighted, 4 * p, 4);
            }
        }
        float[] background = NearbyMean.of(weighted, weights, 4, before.width(), before.height(), NEAR);
        for (int p = 0; p < a.length; p++) {
            if (a[p] <= clear) {
                System.arraycopy(before.rgba(), 4 * p, background, 4 * p, 4);
            }
        }
        return background;
    }

    private static double[] along(float[] away, float[] way) {
        double[] seen = new double[away.length / 4];
        for (int p = 0; p < seen.length; p++) {
            double top = 0;
            double bottom = 0;
            for (int c = 4 * p; c < 4 * p + 4; c++) {
                top += (double) away[c] * way[c];
                bottom += (double) way[c] * way[c];
            }
            seen[p] = bottom > 0 ? top / bottom : 0;
        }
        return seen;
    }

    private static double agreement(float[] a, double[] seen, OpacityCurve curve) {
        double mean = 0;
        for (float value : a) {
            mean += value / (double) a.length;
        }
        double left = 0;
        double all = 0;
        for (int p = 0; p < a.length; p++) {
            left += Math.pow(a[p] - curve.opacity(seen[p]), 2);
            all += Math.pow(a[p] - mean, 2);
        }
        return all > 0 ? Math.max(0, 1 - left / all) : 0;
    }
}

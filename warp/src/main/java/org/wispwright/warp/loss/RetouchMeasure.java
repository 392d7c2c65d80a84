package org.wispwright.warp.loss;

import java.util.Arrays;
import org.wispwright.render.picture.Picture;

/**
 * What a retouch does to the smoke, measured on its two pictures: original, opacity a, and wanted, opacity b.
 *
 * @param balance with {@code lost = max(a - b, 0)} and {@code gained = max(b - a, 0)}, the smaller of their sums as a share of the
 *                larger: 1 if smoke only moves, 0 if it only comes or goes
 * @param inside  share of {@code sum (a - b)^2} that lies inside both silhouettes, taken at half the larger of both pictures'
 *                {@link #opacity}: near 1 if only the inside changes, near 0 if outlines do
 * @param lead    the share of the pyramid loss that would fall if its first slope held along the whole way on which the transport
 *                loss carries the smoke: 2 for a quadratic bowl, 1 for an area of overlap that grows evenly, near or below 0 if the
 *                pyramid loss does not see where the smoke is wanted
 */
record RetouchMeasure(double balance, double inside, double lead) {
    /** Width of the soft edge around the {@link #span} of a change, in heights. */
    private static final double FEATHER = 0.1;
    /** A pixel counts as changed from this share of the largest change. */
    private static final double LEAST_CHANGE = 0.02;

    static RetouchMeasure of(Picture original, Picture wanted) {
        LossInputs.requireRaster(wanted, original);
        double level = Math.max(opacity(original), opacity(wanted)) / 2;
        double lost = 0;
        double gained = 0;
        double changed = 0;
        double inside = 0;
        for (int n = 3; n < original.rgba().length; n += 4) {
            double a = original.rgba()[n];
            double b = wanted.rgba()[n];
            lost += Math.max(a - b, 0);
            gained += Math.max(b - a, 0);
            changed += (a - b) * (a - b);
            inside += a > level && b > level ? (a - b) * (a - b) : 0;
        }
        double larger = Math.max(lost, gained);
        return new RetouchMeasure(larger > 0 ? Math.min(lost, gained) / larger : 0, changed > 0 ? inside / changed : 1,
                lead(original, wanted));
    }

    /** How opaque the smoke of a picture is where there is smoke: the mean of alpha by alpha, {@code sum a^2 / sum a}; 0 without smoke. */
    static double opacity(Picture picture) {
        double squares = 0;
        double sum = 0;
        for (int n = 3; n < picture.rgba().length; n += 4) {
            double a = Math.max(0, picture.rgba()[n]);
            squares += a * a;
            sum += a;
        }
        return sum > 0 ? squares / sum : 0;
    }

    /**
     * The part of the frame that a change spans: 1 in the upright box around all pixels whose opacity changes by at least
     * {@value #LEAST_CHANGE} of the largest change, falling to 0 over {@value #FEATHER} heights around it; 1 everywhere if none changes.
     */
    static float[] span(Picture original, Picture wanted) {
        int w = original.width();
        int h = original.height();
        double largest = 0;
        for (int n = 3; n < original.rgba().length; n += 4) {
            largest = Math.max(largest, Math.abs((double) original.rgba()[n] - wanted.rgba()[n]));
        }
        int left = w;
        int right = -1;
        int top = h;
        int bottom = -1;
        for (int p = 0; p < w * h; p++) {
            if (Math.abs((double) original.rgba()[4 * p + 3] - wanted.rgba()[4 * p + 3]) >= LEAST_CHANGE * largest) {
                left = Math.min(left, p % w);
                right = Math.max(right, p % w);
                top = Math.min(top, p / w);
                bottom = Math.max(bottom, p / w);
            }
        }
        float[] span = new float[w * h];
        for (int p = 0; p < span.length; p++) {
            int dx = Math.max(0, Math.max(left - p % w, p % w - right));
            int dy = Math.max(0, Math.max(top - p / w, p / w - bottom));
            span[p] = (float) (Math.max(0, 1 - dx / (FEATHER * h)) * Math.max(0, 1 - dy / (FEATHER * h)));
        }
        return span;
    }

    /**
     * The transport loss's potential phi leads the smoke by {@code -grad phi} heights to the wanted places, phi its derivative by the
     * distribution of mass. What flows over the border of two pixels at first is {@code (phi[p] - phi[p']) h^2} times the smoke there, and
     * the pyramid loss changes by that times {@code bar[p'] - bar[p]}.
     */
    private static double lead(Picture original, Picture wanted) {
        int w = original.width();
        int h = original.height();
        float[] span = span(original, wanted);
        float[] potential = new float[4 * w * h];
        double mass = 0;
        for (int p = 0; p < w * h; p++) {
            mass += span[p] * Math.max(0, original.rgba()[4 * p + 3]);
        }
        // The distribution counts a pixel's opacity by the span; its derivative by mass is that by opacity, over the span.
        new SlicedWassersteinLoss(wanted, span).valueAndPullback(original, potential, mass);
        float[] ones = new float[w * h];
        Arrays.fill(ones, 1f);
        float[] bar = new float[4 * w * h];
        double loss = new PyramidLoss(wanted, ones).valueAndPullback(original, bar, 1);
        double slope = 0;
        for (int y = 0, p = 0; y < h; y++) {
            for (int x = 0; x < w; x++, p++) {
                slope += x + 1 < w ? flow(original, span, potential, bar, p, p + 1) : 0;
                slope += y + 1 < h ? flow(original, span, potential, bar, p, p + w) : 0;
            }
        }
        return loss > 0 ? -slope * h * h / loss : 0;
    }

    private static double flow(Picture original, float[] span, float[] potential, float[] bar, int p, int next) {
        if (span[p] < 1 || span[next] < 1) {
            return 0;                                                          // in the soft edge nothing is wanted to move
        }
        double change = 0;
        for (int c = 0; c < 4; c++) {
            double smoke = 0.5 * ((double) original.rgba()[4 * p + c] + original.rgba()[4 * next + c]);
            change += smoke * ((double) bar[4 * next + c] - bar[4 * p + c]);
        }
        return change * ((double) potential[4 * p + 3] - potential[4 * next + 3]);
    }
}

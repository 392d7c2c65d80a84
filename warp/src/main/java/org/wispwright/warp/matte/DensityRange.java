package org.wispwright.warp.matte;

import java.util.function.UnaryOperator;
import org.wispwright.render.picture.Picture;

/**
 * Where the original picture's opacity a lies between two levels: {@code up(a) down(a)}, with
 * {@code up = smooth(1/2 + (a - from) / soft)}, {@code down = smooth(1/2 + (to - a) / soft)} and {@code smooth = s^2 (3 - 2 s)} of s
 * clamped to 0..1. A level of 0 or 1 is no limit on its side: {@code from = 0} means any clear part of the smoke too,
 * {@code to = 1} any dense one.
 *
 * @param from    opacity at which it begins: half of it there; 0 to 1
 * @param to      opacity at which it ends, more than from, at most 1
 * @param soft    width of each soft end, in opacity, {@value #LEAST_SOFT} to 1: a harder end would look different at every raster
 * @param feather width of the soft edge, laid on afterwards, fraction of the height, 0 or more
 */
public record DensityRange(double from, double to, double soft, double feather) implements Matte {
    /** The narrowest soft end, in opacity. */
    public static final double LEAST_SOFT = 0.01;

    /**
     * Checks the levels.
     *
     * @throws IllegalArgumentException if they are out of order or out of range
     */
    public DensityRange {
        Needs.share("density range", "from", from);
        Needs.share("density range", "to", to);
        Needs.feather("density range", feather);
        if (!(from < to)) {
            throw new IllegalArgumentException("density range: got from " + from + " to " + to + ", needs from below to");
        }
        if (!(soft >= LEAST_SOFT && soft <= 1)) {
            throw new IllegalArgumentException("density range: got soft " + soft + ", needs " + LEAST_SOFT + " to 1");
        }
    }

    @Override
    public float[] values(Picture original, Window window) {
        return Feather.applied(feather, original, window, w -> plain(original, w));
    }

    /** Has no position of its own: it goes where the smoke goes. */
    @Override
    public DensityRange moved(UnaryOperator<Point> map) {
        return this;
    }

    private float[] plain(Picture original, Window window) {
        float[] rgba = original.rgba();
        double slope = 1 / soft;
        float[] values = new float[window.pixels()];
        for (int y = 0, n = 0; y < window.height(); y++) {
            int at = 4 * (window.left() + original.width() * (window.top() + y)) + 3;
            for (int x = 0; x < window.width(); x++, n++, at += 4) {
                double up = from == 0 ? 1 : 0.5 + (rgba[at] - from) * slope;
                double down = to == 1 ? 1 : 0.5 + (to - rgba[at]) * slope;
                // Most pixels are air or well inside.
                if (up > 0 && down > 0) {
                    values[n] = up >= 1 && down >= 1 ? 1 : (float) (Sweep.smooth(up) * Sweep.smooth(down));
                }
            }
        }
        return values;
    }
}

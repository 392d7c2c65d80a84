package org.wispwright.warp.retouch;

import org.wispwright.warp.matte.Window;

/**
 * {@link Brush#EVEN} and {@link Brush#LIFT}: how far opacity departs from its mean nearby,
 * {@code a' = clamp(mean + gain (a - mean))}, mean the opacity blurred with a Gaussian of sigma = the stroke's radius.
 * <p>Colour follows: where opacity falls, {@code rgb' = rgb a' / a}; where it grows, {@code rgb' = rgb + (a' - a) c} with
 * {@code c = (rgb + k near) / (a + k)}, k = {@value #FAINT}: the pixel's own colour, and the colour of the smoke near where it has next
 * to none. Where the pixel's own colour is that of the smoke near, both are rgb scaled with alpha. Ours.
 */
final class LocalContrast {
    /** Opacity at which half of a pixel's colour is taken from the smoke near it. */
    static final double FAINT = 1e-3;
    /** Standard deviation of the mean's window as a share of the stroke's radius. */
    static final double MEAN_SIGMA = 1;

    private LocalContrast() {
    }

    /**
     * Changes the pixels of a part of a tile.
     *
     * @param coverage  one a pixel of the part
     * @param mean      opacity's, one a pixel of the tile
     * @param colour    of the smoke near, three a pixel of the tile
     * @param direction gain is {@code 1 + direction m}: -1 evens out, 1 lifts
     * @param out       RGBA of the part: changed
     */
    static void apply(Window part, float[] coverage, float[] mean, float[] colour, int direction, float[] out) {
        for (int j = 0, n = 0; j < part.height(); j++) {
            int at = Brushwork.inTile(part, j);
            for (int i = 0; i < part.width(); i++, n++, at++) {
                if (coverage[n] == 0) {
                    continue;
                }
                float was = out[4 * n + 3];
                float becomes = Math.min(1f, Math.max(0f, was + direction * coverage[n] * (was - mean[at])));
                if (becomes < was) {
                    double factor = (double) becomes / was;
                    out[4 * n] *= factor;
                    out[4 * n + 1] *= factor;
                    out[4 * n + 2] *= factor;
                } else if (becomes > was) {
                    double factor = ((double) becomes - was) / (was + FAINT);
                    for (int c = 0; c < 3; c++) {
                        out[4 * n + c] += factor * (out[4 * n + c] + FAINT * colour[3 * at + c]);
                    }
                }
                out[4 * n + 3] = becomes;
            }
        }
    }
}

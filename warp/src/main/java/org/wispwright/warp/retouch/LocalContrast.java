package org.wispwright.warp.retouch;

import org.wispwright.render.picture.Picture;
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
     * Changes the pixels with coverage m, all inside {@code window}.
     *
     * @param direction gain is {@code 1 + direction m}: -1 evens out, 1 lifts
     */
    static void apply(Picture picture, float[] coverage, Window window, double radius, int direction) {
        int width = picture.width();
        float[] rgba = picture.rgba();
        float[] opacity = new float[width * picture.height()];
        for (int p = 0; p < opacity.length; p++) {
            opacity[p] = rgba[4 * p + 3];
        }
        ColourNearby colour = new ColourNearby(picture, Brushwork.COLOUR_SIGMA * radius);
        float[] mean = Gaussian.blurred(opacity, 1, width, picture.height(), MEAN_SIGMA * radius * picture.height(), window);
        for (int n = 0; n < mean.length; n++) {
            int x = window.left() + n % window.width();
            int y = window.top() + n / window.width();
            int p = x + width * y;
            if (coverage[p] == 0) {
                continue;
            }
            double was = opacity[p];
            float becomes = (float) Math.min(1, Math.max(0, was + direction * coverage[p] * (was - mean[n])));
            if (becomes < was) {
                scale(rgba, 4 * p, becomes / was);
            } else if (becomes > was) {
                for (int c = 0; c < 3; c++) {
                    rgba[4 * p + c] += (becomes - was) * (rgba[4 * p + c] + FAINT * colour.at(x, y, c)) / (was + FAINT);
                }
            }
            rgba[4 * p + 3] = becomes;
        }
    }

    private static void scale(float[] rgba, int at, double factor) {
        for (int c = 0; c < 3; c++) {
            rgba[at + c] *= factor;
        }
    }
}

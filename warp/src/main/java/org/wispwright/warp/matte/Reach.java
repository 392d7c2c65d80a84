package org.wispwright.warp.matte;

import org.wispwright.render.picture.Picture;
import org.wispwright.warp.measure.DistanceTransform;
import org.wispwright.warp.measure.Silhouette;

/** Where a matte reaches, found from its values by the exact {@link DistanceTransform}. */
final class Reach {
    /** Half a code of 8 bits: a value up to this changes nothing that can be seen. */
    private static final float LEAST = 1 / 512f;

    private Reach() {
    }

    /**
     * {@code smooth(1 - (d - 1/2) / fade)}, d the distance in pixels to the nearest pixel whose value is above 1/512, fade the feather in
     * pixels, 1 or more; 1 at such a pixel itself.
     */
    static float[] around(Matte matte, Picture original, Window window, double feather) {
        double fade = Math.max(1, feather * original.height());
        Window grown = window.grown((int) Math.ceil(fade + 0.5), original.width(), original.height());
        float[] values = matte.values(original, grown);
        boolean[] inside = new boolean[values.length];
        for (int p = 0; p < inside.length; p++) {
            inside[p] = values[p] > LEAST;
        }
        double[] squared = DistanceTransform.squared(new Silhouette(grown.width(), grown.height(), inside));
        float[] reach = new float[window.pixels()];
        for (int y = 0, n = 0; y < window.height(); y++) {
            int p = window.left() - grown.left() + grown.width() * (window.top() - grown.top() + y);
            for (int x = 0; x < window.width(); x++, n++, p++) {
                reach[n] = squared[p] == 0 ? 1 : (float) Sweep.smooth(1 - (Math.sqrt(squared[p]) - 0.5) / fade);
            }
        }
        return reach;
    }
}

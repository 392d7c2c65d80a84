package org.wispwright.warp.paintover;

import org.wispwright.render.picture.Picture;
import org.wispwright.warp.loss.PictureMeasure;
import org.wispwright.warp.matte.Needs;
import org.wispwright.warp.retouch.Repaint;

/**
 * What was found in a painted frame.
 *
 * @param repaint    the same as an operation on our own picture; {@link Repaint#layers} has the opacity change, the displacement, the mask
 * @param way        how the change was explained
 * @param share      how much of the frame changed: the mask's mean, 0 to 1
 * @param massBefore mass of our original, in squared heights ({@link PictureMeasure#mass})
 * @param massAfter  the wanted picture's
 * @param confidence 0 to 1: the share of our opacity's variance that the unpainted frame's colours explain, times the share of the
 *                   squared difference between the frames that the model of the painted one accounts for. Near 1: the frame shows our
 *                   smoke, and what was painted looks like it. Low: another frame or view, or paint that is no smoke. 1 for a silhouette
 * @param noise      standard deviation of the difference that is not painted, in codes of 0 to 1
 */
public record Painted(Repaint repaint, Way way, double share, double massBefore, double massAfter, double confidence, double noise) {
    /** How a change was explained. */
    public enum Way {
        /** Nothing changed beyond noise. */ NOTHING,
        /** Smoke appeared or vanished. */ OPACITY,
        /** All of it by moving smoke, with a rest of opacity. */ MOVED,
        /** Some regions by moving, others by opacity. */ BOTH
    }

    /**
     * Checks the numbers.
     *
     * @throws IllegalArgumentException if a share or the confidence is out of 0..1, or a part is missing
     */
    public Painted {
        Needs.present("painted", "repaint", repaint);
        Needs.present("painted", "way", way);
        Needs.share("painted", "share", Math.min(1, share));
        Needs.share("painted", "confidence", confidence);
    }

    /** True if nothing changed beyond noise: there is nothing to make a note of. */
    public boolean isNothing() {
        return way == Way.NOTHING;
    }

    static Painted nothing(Picture original, double noise) {
        double mass = PictureMeasure.mass(original);
        Repaint none = new Repaint(original.width(), original.height(), new float[Repaint.LAYERS * original.width() * original.height()]);
        return new Painted(none, Way.NOTHING, 0, mass, mass, 0, noise);
    }
}

package org.wispwright.ui.job;

import org.wispwright.optimize.solve.SolveProblem;
import org.wispwright.optimize.solve.Wish;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.shot.Hold;
import org.wispwright.ui.shot.Note;
import org.wispwright.warp.retouch.Region;
import org.wispwright.warp.retouch.Retoucher;

/**
 * A note's retouch as a wish of the solve: applied anew at any raster. A pixel weighs 1 where the retouch acts and in the note's
 * holds on its frame, {@link SolveProblem#WEIGHT_ELSEWHERE} elsewhere, with a soft edge between.
 */
final class NoteWish implements Wish {
    /** Width of the soft edge around what is retouched, fraction of the height. */
    private static final double FEATHER = 0.04;

    private final Note note;

    NoteWish(Note note) {
        this.note = note;
    }

    @Override
    public Picture wanted(Picture original) {
        return Retoucher.wanted(note.retouch(), original);
    }

    @Override
    public float[] weights(int width, int height) {
        float[] weights = Retoucher.touched(note.retouch(), width, height, FEATHER);
        for (int n = 0; n < weights.length; n++) {
            weights[n] = SolveProblem.WEIGHT_ELSEWHERE + (1 - SolveProblem.WEIGHT_ELSEWHERE) * weights[n];
        }
        for (Hold hold : note.holds()) {
            if (hold.holds(note.frame())) {
                float[] held = mask(hold.region(), width, height);
                for (int n = 0; n < weights.length; n++) {
                    weights[n] = Math.max(weights[n], held[n]);
                }
            }
        }
        return weights;
    }

    /** The mask of a region at a raster, row 0 at the top: 1 inside, 0 outside. */
    static float[] mask(Region region, int width, int height) {
        float[] mask = new float[width * height];
        for (int y = 0; y < height; y++) {
            for (int x = 0; x < width; x++) {
                mask[x + width * y] = (float) region.mask((x + 0.5) / height, (y + 0.5) / height, 1.0 / height);
            }
        }
        return mask;
    }
}

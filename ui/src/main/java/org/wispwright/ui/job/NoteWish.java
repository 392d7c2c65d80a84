package org.wispwright.ui.job;

import org.wispwright.optimize.solve.SolveProblem;
import org.wispwright.optimize.solve.Wish;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.shot.Hold;
import org.wispwright.ui.shot.Note;
import org.wispwright.warp.loss.LossChoice;
import org.wispwright.warp.retouch.Retoucher;

/**
 * A note's retouch as a wish of the solve: applied anew at any raster, compared by the losses that the note names or
 * by the program's choice. A pixel weighs 1 where the retouch acts and in the note's holds on its frame,
 * {@link SolveProblem#WEIGHT_ELSEWHERE} elsewhere, with a soft edge between; all times the matte that the note weighs by, if it has one.
 */
final class NoteWish implements Wish {
    /** Width of the soft edge around what is retouched, fraction of the height. */
    static final double FEATHER = 0.04;

    private final Note note;

    NoteWish(Note note) {
        this.note = note;
    }

    @Override
    public Picture wanted(Picture original) {
        return Retoucher.wanted(note.retouch(), original);
    }

    @Override
    public LossChoice losses(Picture original, Picture wanted) {
        return note.loss().orElseGet(() -> LossChoice.of(original, wanted));
    }

    @Override
    public float[] weights(Picture original) {
        float[] weights = Retoucher.touched(note.retouch(), original, FEATHER);
        for (int n = 0; n < weights.length; n++) {
            weights[n] = SolveProblem.WEIGHT_ELSEWHERE + (1 - SolveProblem.WEIGHT_ELSEWHERE) * weights[n];
        }
        for (Hold hold : note.holds()) {
            if (hold.isIn(note.view(), note.frame())) {
                float[] held = hold.values(original);
                for (int n = 0; n < weights.length; n++) {
                    weights[n] = Math.max(weights[n], held[n]);
                }
            }
        }
        note.weighBy().ifPresent(matte -> {
            float[] share = matte.values(original);
            for (int n = 0; n < weights.length; n++) {
                weights[n] *= share[n];
            }
        });
        return weights;
    }
}

package org.wispwright.ui.work;

import org.wispwright.optimize.solve.SolveProblem;
import org.wispwright.optimize.solve.Wish;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.shot.Note;
import org.wispwright.warp.retouch.Region;
import org.wispwright.warp.retouch.Retoucher;

/** A note's retouch as a wish of the solve: applied anew at any raster. */
final class NoteWish implements Wish {
    private final Note note;

    NoteWish(Note note) {
        this.note = note;
    }

    @Override
    public Picture wanted(Picture original) {
        return Retoucher.apply(note.retouch(), original);
    }

    @Override
    public float[] weights(int width, int height) {
        return Retoucher.weights(note.retouch(), width, height, SolveProblem.WEIGHT_ELSEWHERE);
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

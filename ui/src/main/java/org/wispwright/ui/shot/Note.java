package org.wispwright.ui.shot;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.wispwright.warp.loss.LossChoice;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.retouch.Retouch;

/**
 * One wish on one frame in one view.
 *
 * @param id its file name without {@code .json}
 * @param words what the reviewer said
 * @param frame the frame it is about
 * @param view name of the view it was drawn in
 * @param weight share among the notes, above 0
 * @param weighBy how much each pixel counts, beside what the retouch and the holds say; empty for alike
 * @param retouch what makes the wanted picture of the original
 * @param holds what must stay
 * @param loss what it is solved with, if it says so; else the program chooses
 */
public record Note(String id, String words, int frame, String view, double weight, Optional<Matte> weighBy, Retouch retouch,
        List<Hold> holds, Optional<LossChoice> loss) {
    /** Checks the weight. @throws IllegalArgumentException if it is not a finite number above 0 */
    public Note {
        Objects.requireNonNull(weighBy, "note: weighBy");
        Objects.requireNonNull(retouch, "note: retouch");
        if (!(weight > 0) || Double.isInfinite(weight)) {
            throw new IllegalArgumentException("note '" + id + "': got a weight of " + weight + ", needs a finite number above 0");
        }
        holds = List.copyOf(holds);
    }
}

package org.wispwright.ui.job;

import java.util.List;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.shot.Note;

/**
 * Two takes side by side, note by note.
 *
 * @param before number of the take that is compared against; 0 is the original
 * @param after number of the take that is judged
 * @param notes one entry a note
 */
public record Comparison(int before, int after, List<OfNote> notes) {
    /** Keeps a copy. */
    public Comparison {
        notes = List.copyOf(notes);
    }

    /**
     * One note. All pictures have the raster of the note's view.
     *
     * @param note the note
     * @param original what take 0 shows
     * @param shown what the take before shows; the same picture as original if that is take 0
     * @param wanted what the retouch makes of original
     * @param got what the take after shows
     * @param met 1 - (loss of got / loss of original), the loss of the solve at this raster
     * @param finestErrorRatio weighted squared distance of got from wanted, as a share of the original's, at this raster alone
     * @param holdChange largest mean absolute change from the original of the note's holds on this frame, over RGBA; 0 without one
     */
    public record OfNote(Note note, Picture original, Picture shown, Picture wanted, Picture got, double met, double finestErrorRatio,
            double holdChange) {
    }
}

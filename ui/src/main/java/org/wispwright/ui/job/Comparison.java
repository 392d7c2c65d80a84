package org.wispwright.ui.job;

import java.util.List;
import java.util.Locale;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.shot.Note;
import org.wispwright.warp.loss.LossChoice;
import org.wispwright.warp.retouch.Folds;

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
     * @param met 1 - (loss of got / loss of original), by the pyramid loss at this raster, whatever the note is solved with
     * @param finestErrorRatio weighted squared distance of got from wanted, as a share of the original's, at this raster alone
     * @param holdChange largest mean absolute change from the original of the note's holds on this frame, over RGBA; 0 without one
     * @param mass of the smoke seen in original, wanted and got
     * @param folds where the retouch turns the original over
     * @param loss what the note is solved with, by its own words or by the program's choice for these pictures
     * @param lossFall 1 - (that loss of got / of original)
     */
    public record OfNote(Note note, Picture original, Picture shown, Picture wanted, Picture got, double met, double finestErrorRatio,
            double holdChange, Mass mass, Folds folds, LossChoice loss, double lossFall) {
        /** How far it is met, what the retouch did to the mass, and a fold if there is one: words for a line. */
        public String inWords() {
            return String.format(Locale.ROOT, "%s met %.1f %% (loss %s, mass %.4f, wanted %.4f, got %.4f%s)", note.id(), 100 * met,
                    loss.inWords(),
                    mass.before(), mass.wanted(), mass.got(), folds.cells() == 0 ? "" : "; " + inWords(folds));
        }

        /** What a person is told about folds. */
        public static String inWords(Folds folds) {
            return String.format(Locale.ROOT, "its warp folds the picture over in %d cell%s, worst at [%.3f, %.3f]", folds.cells(),
                    folds.cells() == 1 ? "" : "s", folds.worst().orElseThrow().x(), folds.worst().orElseThrow().y());
        }
    }

    /**
     * Opacity summed over pictures, in squared heights ({@code PictureMeasure.mass}): what a retouch makes or takes away.
     *
     * @param before of the original
     * @param wanted of what the retouch makes of it
     * @param got of the take after
     */
    public record Mass(double before, double wanted, double got) {
    }
}

package org.wispwright.ui.job;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.solve.Solve;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.View;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.TakeRecord;
import org.wispwright.ui.shot.Takes;
import org.wispwright.warp.loss.PictureMeasure;

/**
 * How much smoke a note wants beside what its original shows: a force only moves smoke, so a note that wants much more or less cannot be
 * met by a force alone. At the raster of a solve.
 *
 * @param note    the note
 * @param depth   smoke wanted as a share of the original's by optical depth, which is what density gives
 * @param opacity the same by opacity
 */
public record SmokeAsked(Note note, double depth, double opacity) {
    /** From this share on more or less is told in words. */
    static final double WORTH_TELLING = 0.05;

    /** Of one note; {@code takes} must have an original of this set-up. */
    static SmokeAsked of(Takes takes, Shot shot, Note note, Lanes lanes) {
        FlowSetup flow = shot.flow();
        View view = Solve.proxy(shot.view(note.view()).orElseThrow().view(), flow.grid().cellMetres());
        Picture original = PictureWork.picture(shot, takes.density(0, note.frame(), flow), view, lanes);
        Picture wanted = new NoteWish(note).wanted(original);
        return new SmokeAsked(note, share(PictureMeasure.depth(wanted), PictureMeasure.depth(original)),
                share(PictureMeasure.mass(wanted), PictureMeasure.mass(original)));
    }

    /** Of one note, as far as can be said without a simulation: empty if there is no sound take 0 of this set-up. */
    public static Optional<SmokeAsked> known(ShotFolder folder, Shot shot, Note note, Lanes lanes) {
        try {
            Takes takes = Takes.of(folder);
            takes.requireOf(0, shot.flow());
            return Optional.of(of(takes, shot, note, lanes));
        } catch (ShotException noTake) {
            return Optional.empty();                                           // who lists or checks notes did not ask about takes
        }
    }

    /** Of every note. */
    static List<SmokeAsked> ofAll(Takes takes, Shot shot, Lanes lanes) {
        return shot.notes().stream().map(note -> of(takes, shot, note, lanes)).toList();
    }

    private static double share(double wanted, double original) {
        return original > 0 ? wanted / original : wanted > 0 ? 100 : 1;
    }

    /** True if it is more or less by so much that a person should know. */
    public boolean isWorthTelling() {
        return Math.abs(depth - 1) >= WORTH_TELLING;
    }

    /** What the note wants, what a force can do, and the way out. */
    public String inWords(boolean sources) {
        boolean more = depth > 1;
        return String.format(Locale.ROOT, "note %s wants %.0f %% %s smoke than the original shows on frame %d (%.0f %% %s opacity); ",
                note.id(),
                100 * Math.abs(depth - 1), more ? "more" : "less", note.frame(), 100 * Math.abs(opacity - 1), opacity < 1 ? "less" : "more")
                + (sources ? "the sources' strengths may change for it"
                : more ? "a force moves smoke and cannot make it: ask for less, or let the sources' strengths change with solve --sources"
                : "a force moves smoke and cannot take it away, only carry it out of sight: ask for more, or let the sources' strengths change "
                + "with solve --sources");
    }

    /** For other programs: {@code smokeAsked} of a note. */
    public ObjectNode json() {
        return TakeRecord.object().put("id", note.id()).put("depth", depth).put("opacity", opacity);
    }
}

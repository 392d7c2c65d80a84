package org.wispwright.ui.job;

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
import org.wispwright.ui.shot.Takes;
import org.wispwright.warp.loss.LossChoice;

/** What notes would be solved with, as far as can be said without a simulation. */
public final class NoteLosses {
    private NoteLosses() {
    }

    /**
     * What a note names, or the program's choice for its frame of take 0 at the raster of a solve.
     *
     * @return empty if the note names nothing and there is no sound take 0 of this set-up
     */
    public static Optional<LossChoice> of(ShotFolder folder, Shot shot, Note note, Lanes lanes) {
        if (note.loss().isPresent()) {
            return note.loss();
        }
        FlowSetup flow = shot.flow();
        Takes takes = Takes.of(folder);
        try {
            takes.requireOf(0, flow);
            View view = Solve.proxy(shot.view(note.view()).orElseThrow().view(), flow.grid().cellMetres());
            Picture original = PictureWork.picture(shot, takes.density(0, note.frame(), flow), view, lanes);
            NoteWish wish = new NoteWish(note);
            return Optional.of(wish.losses(original, wish.wanted(original)));
        } catch (ShotException noTake) {
            return Optional.empty();                                           // a list of notes is no place to complain about takes
        }
    }
}

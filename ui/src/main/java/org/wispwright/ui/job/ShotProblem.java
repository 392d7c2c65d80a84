package org.wispwright.ui.job;

import java.util.ArrayList;
import java.util.List;
import org.wispwright.optimize.solve.SolveProblem;
import org.wispwright.render.view.View;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.Hold;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotException;

/** What a shot's notes and holds ask of the solve. */
public final class ShotProblem {
    private ShotProblem() {
    }

    /**
     * The problem of a checked shot.
     *
     * @throws ShotException if the shot has no note that is on
     */
    public static SolveProblem of(Shot shot) {
        if (shot.notes().isEmpty() && !shot.off().isEmpty()) {
            throw new ShotException(new Finding("notes", "",
                    "every note is off, so there is nothing to solve; turn one on with 'note on SHOT ID'."));
        }
        if (shot.notes().isEmpty()) {
            throw new ShotException(new Finding("notes", "",
                    "there is no note, so there is nothing to solve; add a file notes/ID.json (docs/shot-folder.md)."));
        }
        List<View> views = shot.views().stream().map(v -> v.view()).toList();
        List<SolveProblem.Note> notes = new ArrayList<>();
        List<SolveProblem.Hold> holds = new ArrayList<>();
        for (Note note : shot.notes()) {
            int view = index(views, note.view());
            notes.add(new SolveProblem.Note(note.id(), note.frame(), view, note.weight(), new NoteWish(note)));
            for (int n = 0; n < note.holds().size(); n++) {
                Hold hold = note.holds().get(n);
                holds.add(hold(note.id() + " hold " + (n + 1), hold, hold.view().map(name -> index(views, name)).orElse(view)));
            }
        }
        for (int n = 0; n < shot.holds().size(); n++) {
            Hold hold = shot.holds().get(n);
            holds.add(hold("hold " + (n + 1), hold, index(views, hold.view().orElseThrow())));
        }
        return new SolveProblem(shot.flow(), views, shot.look(), notes, holds);
    }

    private static SolveProblem.Hold hold(String id, Hold hold, int view) {
        return new SolveProblem.Hold(id, view, hold.spans(), hold.held(), hold.weight(), hold::values);
    }

    private static int index(List<View> views, String name) {
        for (int n = 0; n < views.size(); n++) {
            if (views.get(n).name().equals(name)) {
                return n;
            }
        }
        throw new IllegalArgumentException("no view '" + name + "'; check the shot first");
    }
}

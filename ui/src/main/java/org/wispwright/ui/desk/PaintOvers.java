package org.wispwright.ui.desk;

import java.nio.file.Path;
import java.util.Optional;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.View;
import org.wispwright.ui.job.PaintOverWork;
import org.wispwright.ui.shot.PaintedNotes;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.Takes;
import org.wispwright.warp.paintover.Painted;

/** Makes notes of what was painted over rendered frames. Reading runs beside the desk. Desk's thread. */
public final class PaintOvers {
    private final Desk desk;
    private final Replacing reading;

    /** For the notes of a desk. */
    public PaintOvers(Desk desk) {
        this.desk = desk;
        reading = new Replacing(desk.workers(), desk.workers().lane("paint-over"));
    }

    /**
     * Reads two pictures and makes a note of what differs, on the frame and view that are shown. What cannot be read is said.
     *
     * @param before the frame as it was rendered, PNG or EXR
     * @param after  the same painted over
     * @param words  of the note
     * @param nothing what to say if nothing changed beyond noise
     * @param made   on the desk's thread, once the note is there and open
     */
    public void read(Path before, Path after, String words, String nothing, Runnable made) {
        OpenShot now = desk.state().shot().orElseThrow();
        Showing showing = desk.state().showing().orElseThrow();
        reading.replace(cancel -> {
            Shot shot = now.setup();
            View view = shot.view(showing.view()).orElseThrow().view();
            try (Lanes lanes = new Lanes(1)) {
                return PaintOverWork.read(shot, Takes.of(now.folder()), showing.frame(), view, before, after, lanes);
            }
        }, painted -> make(now, showing, painted, words, nothing, made), thrown -> desk.say(Message.Kind.FAULT, Desk.words(thrown)));
    }

    private void make(OpenShot asked, Showing showing, Painted painted, String words, String nothing, Runnable made) {
        OpenShot now = desk.state().shot().orElseThrow();
        if (now.folder() != asked.folder()) {
            return;
        }
        if (painted.isNothing()) {
            desk.say(Message.Kind.NOTICE, nothing);
            return;
        }
        String id = NewNotes.freeId(now, "painted");
        desk.outside(folder -> PaintedNotes.make(folder, id, words, showing.frame(), showing.view(), painted.repaint(),
                "note paint-over --id " + id + " --frame " + showing.frame() + " --view " + showing.view()), () -> {
                    desk.look(s -> s.withNote(Optional.of(id)));
                    made.run();
                });
    }
}

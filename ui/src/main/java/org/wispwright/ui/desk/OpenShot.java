package org.wispwright.ui.desk;

import java.util.List;
import java.util.Optional;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotFolder;

/**
 * The shot on the desk.
 *
 * @param folder where it lies
 * @param setup  what shot.json and holds.json say; its own notes are those of the moment it was opened, so ask {@link #asItIs}
 * @param notes  all notes as they are now, on and off, in the order of their ids
 */
public record OpenShot(ShotFolder folder, Shot setup, List<Listed> notes) {
    /** Keeps a copy. */
    public OpenShot {
        notes = List.copyOf(notes);
    }

    /** The note of an id. */
    public Optional<Listed> note(String id) {
        return notes.stream().filter(listed -> listed.note().id().equals(id)).findFirst();
    }

    /** The same shot with other notes. */
    public OpenShot with(List<Listed> others) {
        return new OpenShot(folder, setup, others);
    }

    /** The whole shot with its notes as they are now. */
    public Shot asItIs() {
        List<Note> on = notes.stream().filter(Listed::on).map(Listed::note).toList();
        List<Note> off = notes.stream().filter(listed -> !listed.on()).map(Listed::note).toList();
        return new Shot(setup.name(), setup.flow(), setup.look(), setup.background(), setup.views(), on, off, setup.holds());
    }
}

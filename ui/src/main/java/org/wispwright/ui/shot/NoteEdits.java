package org.wispwright.ui.shot;

import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;

/**
 * What a person does to the notes of a shot without a screen.
 */
public final class NoteEdits {
    private final ShotFolder folder;

    private NoteEdits(ShotFolder folder) {
        this.folder = folder;
    }

    /** The notes of a shot folder. */
    public static NoteEdits of(ShotFolder folder) {
        return new NoteEdits(folder);
    }

    /**
     * A note and whether it takes part.
     *
     * @param note the note
     * @param on false if it is off
     */
    public record Listed(Note note, boolean on) {
    }

    /**
     * All notes in the order of their ids. Reads the set-up and the notes, no picture.
     *
     * @throws ShotException with the first thing that is wrong with them
     */
    public List<Listed> list() {
        Shot shot = ShotCheck.requireForNotes(folder);
        return Stream.concat(shot.notes().stream().map(n -> new Listed(n, true)), shot.off().stream().map(n -> new Listed(n, false)))
                .sorted(Comparator.comparing(listed -> listed.note().id())).toList();
    }
}

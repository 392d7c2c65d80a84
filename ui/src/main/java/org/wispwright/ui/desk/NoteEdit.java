package org.wispwright.ui.desk;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.function.UnaryOperator;
import org.wispwright.ui.shot.Hold;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.Retouch;

/**
 * A change of the notes, and what it is called in undo and redo.
 *
 * @param name   such as "Add stroke"
 * @param change from all notes before to all notes after; must not look at anything else
 * @param copied new id to the note that it was copied from, whose files it takes
 */
public record NoteEdit(String name, UnaryOperator<List<Listed>> change, Map<String, String> copied) {
    /** Keeps a copy. */
    public NoteEdit {
        copied = Map.copyOf(copied);
    }

    /** A change that copies no note. */
    public NoteEdit(String name, UnaryOperator<List<Listed>> change) {
        this(name, change, Map.of());
    }

    /** Another retouch for a note. */
    public static NoteEdit retouch(String name, String id, UnaryOperator<List<Operation>> change) {
        return note(name, id, note -> new Note(note.id(), note.words(), note.frame(), note.view(), note.weight(), note.weighBy(),
                new Retouch(change.apply(note.retouch().operations())), note.holds(), note.loss()));
    }

    /** One more operation behind the others. */
    public static NoteEdit append(String name, String id, Operation operation) {
        return retouch(name, id, operations -> {
            List<Operation> longer = new ArrayList<>(operations);
            longer.add(operation);
            return longer;
        });
    }

    /** Other holds for a note. */
    public static NoteEdit holds(String name, String id, UnaryOperator<List<Hold>> change) {
        return note(name, id, note -> new Note(note.id(), note.words(), note.frame(), note.view(), note.weight(), note.weighBy(),
                note.retouch(), change.apply(note.holds()), note.loss()));
    }

    /** Other words for a note. */
    public static NoteEdit words(String name, String id, String words) {
        return note(name, id, note -> new Note(note.id(), words, note.frame(), note.view(), note.weight(), note.weighBy(), note.retouch(),
                note.holds(), note.loss()));
    }

    /** Another weight for a note. */
    public static NoteEdit weight(String name, String id, double weight) {
        return note(name, id, note -> new Note(note.id(), note.words(), note.frame(), note.view(), weight, note.weighBy(), note.retouch(),
                note.holds(), note.loss()));
    }

    /** A note takes part, or is set aside. */
    public static NoteEdit on(String name, String id, boolean on) {
        return new NoteEdit(name, notes -> notes.stream().map(l -> l.note().id().equals(id) ? new Listed(l.note(), on) : l).toList());
    }

    /** More notes. @param copied as in the record */
    public static NoteEdit add(String name, List<Listed> more, Map<String, String> copied) {
        return new NoteEdit(name, notes -> {
            List<Listed> all = new ArrayList<>(notes);
            all.addAll(more);
            all.sort(Comparator.comparing(listed -> listed.note().id()));
            return all;
        }, copied);
    }

    /** A note less. */
    public static NoteEdit delete(String name, String id) {
        return new NoteEdit(name, notes -> notes.stream().filter(listed -> !listed.note().id().equals(id)).toList());
    }

    private static NoteEdit note(String name, String id, UnaryOperator<Note> change) {
        return new NoteEdit(name,
                notes -> notes.stream().map(l -> l.note().id().equals(id) ? new Listed(change.apply(l.note()), l.on()) : l).toList());
    }
}

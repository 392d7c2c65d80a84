package org.wispwright.ui.shot;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import com.fasterxml.jackson.databind.node.TextNode;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import org.wispwright.ui.shot.NoteJournal.FileChange;

/**
 * What a person does to the notes of a shot without a screen. Every change is in the journal before it is made, so that
 * {@link #undo} can take it back. One at a time: two edits of one shot must not run at once.
 */
public final class NoteEdits {
    /** The most notes that a shot may have. */
    public static final int MOST_NOTES = NoteReader.MOST_NOTES;

    private final ShotFolder folder;
    private final NoteFiles files;
    private final NoteChanges changes;

    private NoteEdits(ShotFolder folder) {
        this.folder = folder;
        this.files = new NoteFiles(folder);
        this.changes = new NoteChanges(folder);
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
     * A file after a change was taken back or made again.
     *
     * @param file such as {@code notes/lean.json}
     * @param there whether there is such a file now
     */
    public record FileNow(String file, boolean there) {
    }

    /**
     * What was taken back or made again.
     *
     * @param command the change, such as {@code note off lean}
     * @param files its files
     * @param changed false if all of them were so already, by hand or because the change was cut short
     */
    public record Moved(String command, List<FileNow> files, boolean changed) {
        /** Keeps a copy. */
        public Moved {
            files = List.copyOf(files);
        }
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

    /**
     * Lets a note take part or sets it aside. Of its file only the key {@code on} changes.
     *
     * @return false if it is so already; then nothing is written
     * @throws ShotException if there is no such note, it is not as it must be, or the disk refuses
     */
    public boolean setOn(String id, boolean on) {
        String file = NoteFiles.file(id);
        String before = files.need(id);
        JsonPlace top = parsed(file, before);
        NoteReader.note(top, id + ".json", folder);
        if (NoteReader.isOn(top) == on) {
            return false;
        }
        String after = NoteText.with(before, "on", String.valueOf(on));
        NoteReader.note(parsed(file, after), id + ".json", folder);
        changes.make("note " + (on ? "on " : "off ") + id,
                List.of(new FileChange(file, Optional.of(FileBytes.of(before)), Optional.of(FileBytes.of(after)))));
        return true;
    }

    /**
     * Makes a note with the same retouch, words and holds on another frame. Of the text only {@code frame} and {@code view} differ;
     * files beside the note are copied under the new id.
     *
     * @param view another view; empty for the same
     * @param newId its id; empty for the old one with {@code -frame} behind it
     * @return the new note
     * @throws ShotException if the shot or the new note is not as it must be, the name is taken, or the disk refuses
     */
    public Note copy(String id, int frame, Optional<String> view, Optional<String> newId) {
        String to = newId.orElse(id + "-" + frame);
        String file = NoteFiles.file(to);
        String text = files.need(id);
        Shot shot = ShotCheck.requireForNotes(folder);
        requireFree(file);
        requireRoom(1);
        String after = NoteText.with(text, "frame", String.valueOf(frame));
        if (view.isPresent()) {
            after = NoteText.with(after, "view", new TextNode(view.get()).toString());
        }
        Note note = fitting(file, after, to, shot);
        List<FileChange> all = new ArrayList<>();
        all.add(new FileChange(file, Optional.empty(), Optional.of(FileBytes.of(after))));
        all.addAll(copiesOfBeside(id, to));
        changes.make("note copy " + id + " --frame " + frame + view.map(v -> " --view " + v).orElse("")
                + newId.map(n -> " --id " + n).orElse(""), all);
        return note;
    }

    /**
     * Makes a note from values.
     *
     * @param values words, frame, view and retouch must be there
     * @return the new note
     * @throws ShotException if the shot or the new note is not as it must be, the name is taken, or the disk refuses
     */
    public Note add(String id, NoteValues values) {
        String file = NoteFiles.file(id);
        Shot shot = ShotCheck.requireForNotes(folder);
        requireFree(file);
        requireRoom(1);
        ObjectNode object = JsonNodeFactory.instance.objectNode().put("wispwright", SetupReader.FORMAT);
        object.setAll(values.values());
        String text = NoteText.of(object);
        Note note = fitting(file, text, id, shot);
        changes.make("note add --id " + id + values.inWords(), List.of(new FileChange(file, Optional.empty(),
                Optional.of(FileBytes.of(text)))));
        return note;
    }

    /**
     * Makes a note of a text, checked like any other and against the shot before its file appears.
     *
     * @param command what the person asked for, for the journal
     * @throws ShotException if the shot or the new note is not as it must be, the name is taken, or the disk refuses
     */
    Note make(String id, String text, String command) {
        requireNew(id);
        String file = NoteFiles.file(id);
        Note note = fitting(file, text, id, ShotCheck.requireForNotes(folder));
        changes.make(command, List.of(new FileChange(file, Optional.empty(), Optional.of(FileBytes.of(text)))));
        return note;
    }

    /** Refuses an id that is none, or is taken, or one note too many. */
    void requireNew(String id) {
        requireFree(NoteFiles.file(id));
        requireRoom(1);
    }

    /**
     * Gives a note other values; every other character of its file stays.
     *
     * @return false if the note has these values already, written alike; then nothing is written
     * @throws ShotException if there is no such note, the shot or the changed note is not as it must be, or the disk refuses
     */
    public boolean set(String id, NoteValues values) {
        String file = NoteFiles.file(id);
        String before = files.need(id);
        Shot shot = ShotCheck.requireForNotes(folder);
        String after = before;
        for (Map.Entry<String, JsonNode> value : values.values().entrySet()) {
            after = NoteText.with(after, value.getKey(), NoteText.value(value.getValue()));
        }
        fitting(file, after, id, shot);
        return changes.make("note set " + id + values.inWords(), List.of(new FileChange(file, Optional.of(FileBytes.of(before)),
                Optional.of(FileBytes.of(after)))));
    }

    /**
     * Makes several notes at once; one change, taken back as one. Each takes the files that lie beside the note it was made from.
     *
     * @param command what the person asked for
     * @param from the note they were made from
     * @param notes their ids differ
     * @param on whether they take part
     * @throws ShotException if the shot or a new note is not as it must be, a name is taken, or the disk refuses; then there is none
     */
    public void addAll(String command, String from, List<Note> notes, boolean on) {
        requireFit(notes);
        List<FileChange> all = new ArrayList<>();
        for (Note note : notes) {
            String file = NoteFiles.file(note.id());
            String text = NoteText.of(RetouchWriter.note(note, on));
            NoteReader.note(parsed(file, text), note.id() + ".json", folder);
            all.add(new FileChange(file, Optional.empty(), Optional.of(FileBytes.of(text))));
            all.addAll(copiesOfBeside(from, note.id()));
        }
        changes.make(command, all);
    }

    /**
     * Makes the notes that differ between two lists those of the second; one change, taken back as one. Of a note's file only the keys that
     * differ change, unless one of them goes.
     *
     * @param command what the person asked for
     * @param before the notes as the person had them
     * @param after the notes as they are wanted
     * @param copied id of a new note to the note that it is a copy of: it takes the files beside that one
     * @return false if nothing differs; then nothing is written
     * @throws ShotException if the shot or a note is not as it must be, a name is taken, or the disk refuses; then all is as before
     */
    public boolean change(String command, List<Listed> before, List<Listed> after, Map<String, String> copied) {
        Map<String, Listed> old = byId(before);
        Map<String, Listed> now = byId(after);
        Shot shot = ShotCheck.requireForNotes(folder);
        List<FileChange> all = new ArrayList<>();
        old.keySet().stream().filter(id -> !now.containsKey(id)).forEach(id -> all.addAll(removal(id)));
        for (Listed listed : after) {
            String id = listed.note().id();
            String file = NoteFiles.file(id);
            Listed was = old.get(id);
            if (listed.equals(was)) {
                continue;
            }
            Optional<FileBytes> there = Optional.empty();
            String text;
            if (was == null) {
                requireFree(file);
                requireRoom(1);
                text = NoteText.of(RetouchWriter.note(listed.note(), listed.on()));
                if (copied.containsKey(id)) {
                    all.addAll(copiesOfBeside(copied.get(id), id));
                }
            } else {
                String onDisk = files.need(id);
                there = Optional.of(FileBytes.of(onDisk));
                text = RetouchWriter.changed(onDisk, was, listed);
            }
            fitting(file, text, id, shot);
            all.add(new FileChange(file, there, Optional.of(FileBytes.of(text))));
        }
        return changes.make(command, all);
    }

    private static Map<String, Listed> byId(List<Listed> notes) {
        Map<String, Listed> byId = new LinkedHashMap<>();
        notes.forEach(listed -> byId.put(listed.note().id(), listed));
        return byId;
    }

    /** What {@link #undo} would take back. @throws ShotException if the journal is damaged */
    public Optional<String> undoName() {
        return changes.undoName();
    }

    /** What {@link #redo} would make again. @throws ShotException if the journal is damaged */
    public Optional<String> redoName() {
        return changes.redoName();
    }

    /** Refuses notes that could not be added: of frames or a view that the shot does not have, of names that are taken, or too many. */
    public void requireFit(List<Note> notes) {
        Shot shot = ShotCheck.requireForNotes(folder);
        for (Note note : notes) {
            requireFree(NoteFiles.file(note.id()));
            ShotCheck.requireFits(note, new MattePictures(folder, Long.MAX_VALUE), shot);
        }
        requireRoom(notes.size());
    }

    /** A note and whether it takes part. @throws ShotException if there is none of that id, or the notes are not in order */
    public Listed need(String id) {
        files.need(id);
        return list().stream().filter(listed -> listed.note().id().equals(id)).findFirst().orElseThrow();
    }

    /**
     * Removes a note's file and what lies beside it. It need not be in order, but must be UTF-8 text.
     *
     * @throws ShotException if there is no such note, or the disk refuses
     */
    public void delete(String id) {
        changes.make("note delete " + id, removal(id));
    }

    private List<FileChange> removal(String id) {
        List<FileChange> all = new ArrayList<>();
        all.add(new FileChange(NoteFiles.file(id), Optional.of(FileBytes.of(files.need(id))), Optional.empty()));
        for (String file : files.beside(id)) {
            all.add(new FileChange(file, files.bytes(file), Optional.empty()));
        }
        return all;
    }

    /**
     * Takes back the last change that was not taken back yet.
     *
     * @throws ShotException if there is none, a file has been changed by hand since, or the disk refuses
     */
    public Moved undo() {
        return changes.undo();
    }

    /**
     * Makes again the change that was taken back last, if no other was made since.
     *
     * @throws ShotException if there is none, a file has been changed by hand since, or the disk refuses
     */
    public Moved redo() {
        return changes.redo();
    }

    private List<FileChange> copiesOfBeside(String id, String to) {
        List<FileChange> copies = new ArrayList<>();
        for (String beside : files.beside(id)) {
            String copied = "notes/" + to + beside.substring(("notes/" + id).length());
            requireFree(copied);
            copies.add(new FileChange(copied, Optional.empty(), files.bytes(beside)));
        }
        return copies;
    }

    private void requireRoom(int more) {
        int there = files.ids().size();
        if (there + more > NoteReader.MOST_NOTES) {
            throw new ShotException(Finding.of("notes", "", there + " notes and " + more + " to come", "at most " + NoteReader.MOST_NOTES,
                    "make fewer, delete some, or split the shot"));
        }
    }

    private void requireFree(String file) {
        if (files.isTaken(file)) {
            throw new ShotException(Finding.of(file, "", (file.endsWith(".json") ? "a note" : "a file") + " of this name already",
                    "a name that is free", "give another with --id"));
        }
    }

    /** The note of a text, refused if it does not fit the shot. */
    private Note fitting(String file, String text, String id, Shot shot) {
        JsonPlace top = parsed(file, text);
        Note note = NoteReader.note(top, id + ".json", folder);
        ShotCheck.requireFits(note, top.pictures(), shot);
        return note;
    }

    private JsonPlace parsed(String file, String text) {
        return JsonDoor.parse(file, text.getBytes(StandardCharsets.UTF_8)).with(new MattePictures(folder, Long.MAX_VALUE));
    }
}

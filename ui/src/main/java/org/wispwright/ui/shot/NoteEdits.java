package org.wispwright.ui.shot;

import com.fasterxml.jackson.databind.node.TextNode;
import java.nio.charset.StandardCharsets;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * What a person does to the notes of a shot without a screen. Every change is in the journal before it is made, so that
 * {@link #undo} can take it back. One at a time: two edits of one shot must not run at once.
 */
public final class NoteEdits {
    private final ShotFolder folder;
    private final NoteFiles files;
    private final NoteJournal journal;

    private NoteEdits(ShotFolder folder) {
        this.folder = folder;
        this.files = new NoteFiles(folder);
        this.journal = new NoteJournal(folder);
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
     * What was taken back.
     *
     * @param command the change, such as {@code note off lean}
     * @param file the note's file
     * @param there whether there is such a file now
     * @param changed false if the file was back already, by hand or because the change was cut short
     */
    public record Undone(String command, String file, boolean there, boolean changed) {
    }

    /**
     * All notes in the order of their ids. Reads the set-up and the notes with their mattes, no rendered frame.
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
        change("note " + (on ? "on " : "off ") + id, file, Optional.of(before), Optional.of(after));
        return true;
    }

    /**
     * Makes a note with the same retouch, words and holds on another frame. Of the text only {@code frame} and {@code view} differ.
     *
     * @param view another view; empty for the same
     * @param newId its id; empty for the old one with {@code -frame} behind it
     * @return the new note
     * @throws ShotException if the shot or the new note is not as it must be, the name is taken, or the disk refuses
     */
    public Note copy(String id, int frame, Optional<String> view, Optional<String> newId) {
        String to = newId.orElse(id + "-" + frame);
        String text = files.need(id);
        String after = NoteText.with(text, "frame", String.valueOf(frame));
        if (view.isPresent()) {
            after = NoteText.with(after, "view", new TextNode(view.get()).toString());
        }
        return make(to, after, "note copy " + id + " --frame " + frame + view.map(v -> " --view " + v).orElse("")
                + newId.map(n -> " --id " + n).orElse(""));
    }

    /**
     * Makes a note of a text, checked like any other and against the shot before its file appears.
     *
     * @param command what the person asked for, for the journal
     * @throws ShotException if the shot or the new note is not as it must be, the name is taken, or the disk refuses
     */
    Note make(String id, String text, String command) {
        requireFree(id);
        String file = NoteFiles.file(id);
        Shot shot = ShotCheck.requireForNotes(folder);
        JsonPlace top = parsed(file, text);
        Note note = NoteReader.note(top, id + ".json", folder);
        ShotCheck.requireFits(note, top.pictures(), shot);
        change(command, file, Optional.empty(), Optional.of(text));
        return note;
    }

    /** Refuses an id that is none, or is taken, or one note too many. */
    void requireFree(String id) {
        String file = NoteFiles.file(id);
        if (files.isTaken(file)) {
            throw new ShotException(Finding.of(file, "", "a note of this name already", "a name that is free", "give another with --id"));
        }
        if (files.ids().size() >= NoteReader.MOST_NOTES) {
            throw new ShotException(Finding.of("notes", "", NoteReader.MOST_NOTES + " notes already", "room for one more",
                    "delete one, or split the shot"));
        }
    }

    /**
     * Removes a note's file. It need not be in order, but must be UTF-8 text so that it can be put back.
     *
     * @throws ShotException if there is no such note, or the disk refuses
     */
    public void delete(String id) {
        String file = NoteFiles.file(id);
        change("note delete " + id, file, Optional.of(files.need(id)), Optional.empty());
    }

    /**
     * Takes back the last change that was not taken back yet.
     *
     * @throws ShotException if there is none, the file has been changed by hand since, or the disk refuses
     */
    public Undone undo() {
        NoteJournal.Entry last = journal.last().orElseThrow(() -> new ShotException(Finding.of(NoteJournal.FILE, "", "no change",
                "a change made by 'note' to take back", "there is nothing to do")));
        Optional<String> now = files.text(last.file());
        boolean changed = now.equals(last.after());
        if (changed) {
            files.put(last.file(), last.before());
        } else if (!now.equals(last.before())) {
            throw new ShotException(Finding.of(last.file(), "", now.isEmpty() ? "no file" : "text that was changed by hand",
                    last.after().isEmpty() ? "no file there, as '" + last.command() + "' left it"
                            : "the text that '" + last.command() + "' left",
                    "put that back, or remove the last line of " + NoteJournal.FILE + " to keep what is there"));
        }
        journal.removeLast();
        return new Undone(last.command(), last.file(), last.before().isPresent(), changed);
    }

    private JsonPlace parsed(String file, String text) {
        return JsonDoor.parse(file, text.getBytes(StandardCharsets.UTF_8)).with(new MattePictures(folder, Long.MAX_VALUE));
    }

    private void change(String command, String file, Optional<String> before, Optional<String> after) {
        long bytes = after.map(text -> (long) text.getBytes(StandardCharsets.UTF_8).length).orElse(0L);
        if (bytes > NoteReader.MOST_BYTES) {
            throw new ShotException(Finding.of(file, "", bytes + " bytes with this change", "at most " + NoteReader.MOST_BYTES + " bytes",
                    "shorten the note"));
        }
        journal.add(new NoteJournal.Entry(command, file, before, after));
        try {
            files.put(file, after);
        } catch (ShotException refused) {
            journal.removeLast();
            throw refused;
        }
    }
}

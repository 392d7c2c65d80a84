package org.wispwright.ui.shot;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wispwright.ui.shot.NoteJournal.Entry;
import org.wispwright.ui.shot.NoteJournal.FileChange;

/**
 * Makes changes of note files, takes them back and makes them again. A change may have several files; it is in the journal before
 * the first of them is touched. One at a time: two changes of one shot must not run at once.
 */
final class NoteChanges {
    private final NoteFiles files;
    private final NoteJournal journal;

    NoteChanges(ShotFolder folder) {
        this.files = new NoteFiles(folder);
        this.journal = new NoteJournal(folder);
    }

    /**
     * Makes a change, all of it or nothing.
     *
     * @param command what the person asked for
     * @param changes their files differ; one that changes nothing is left out
     * @return false if none changes anything; then nothing is written
     * @throws ShotException if a file would get too large or the disk refuses; then all is as before
     */
    boolean make(String command, List<FileChange> changes) {
        List<FileChange> real = changes.stream().filter(change -> !change.before().equals(change.after())).toList();
        for (FileChange change : real) {
            long bytes = change.after().map(FileBytes::length).orElse(0);
            long most = NoteFiles.mostBytes(change.file());
            if (bytes > most) {
                throw new ShotException(Finding.of(change.file(), "", bytes + " bytes with this change", "at most " + most + " bytes",
                        "shorten the note"));
            }
        }
        if (real.isEmpty()) {
            return false;
        }
        journal.settle(this::isAfter);
        journal.add(new Entry(command, real));
        List<FileChange> done = new ArrayList<>();
        try {
            for (FileChange change : real) {
                files.put(change.file(), change.after());
                done.add(change);
            }
        } catch (ShotException refused) {
            done.forEach(change -> files.put(change.file(), change.before()));
            journal.removeLast();
            throw refused;
        }
        return true;
    }

    /**
     * Takes back the last change that was not taken back yet.
     *
     * @throws ShotException if there is none, a file has been changed by hand since, or the disk refuses
     */
    NoteEdits.Moved undo() {
        journal.settle(this::isAfter);
        Entry last = journal.last().orElseThrow(() -> new ShotException(Finding.of(NoteJournal.FILE, "", "no change",
                "a change made by 'note' to take back", "there is nothing to do")));
        boolean changed = false;
        for (FileChange change : last.files()) {
            changed |= differs(change, change.before(), change.after(), last.command(), NoteJournal.FILE);
        }
        last.files().forEach(change -> put(change.file(), change.before()));
        journal.movedBack(last);
        return new NoteEdits.Moved(last.command(), last.files().stream()
                .map(change -> new NoteEdits.FileNow(change.file(), change.before().isPresent())).toList(), changed);
    }

    /**
     * Makes again the change that was taken back last, if no other was made since.
     *
     * @throws ShotException if there is none, a file has been changed by hand since, or the disk refuses
     */
    NoteEdits.Moved redo() {
        journal.settle(this::isAfter);
        Entry next = journal.lastTakenBack().orElseThrow(() -> new ShotException(Finding.of(NoteJournal.TAKEN_BACK, "", "no change",
                "a change that 'note undo' took back, and no other change since", "there is nothing to do")));
        boolean changed = false;
        for (FileChange change : next.files()) {
            changed |= differs(change, change.after(), change.before(), "note undo", NoteJournal.TAKEN_BACK);
        }
        next.files().forEach(change -> put(change.file(), change.after()));
        journal.movedForth(next);
        return new NoteEdits.Moved(next.command(), next.files().stream()
                .map(change -> new NoteEdits.FileNow(change.file(), change.after().isPresent())).toList(), changed);
    }

    /** The command that {@link #undo} would take back. */
    Optional<String> undoName() {
        return journal.last().map(Entry::command);
    }

    /** The command that {@link #redo} would make again. */
    Optional<String> redoName() {
        return journal.lastTakenBack().map(Entry::command);
    }

    /** True if the file is still to be changed. @throws ShotException if it is neither as it should become nor as it was left */
    private boolean differs(FileChange change, Optional<FileBytes> wanted, Optional<FileBytes> left, String leftBy, String journalFile) {
        Optional<FileBytes> now = files.bytes(change.file());
        if (now.equals(wanted)) {
            return false;
        }
        if (!now.equals(left)) {
            throw new ShotException(Finding.of(change.file(), "", now.isEmpty() ? "no file" : "a file that was changed by hand",
                    left.isEmpty() ? "no file there, as '" + leftBy + "' left it" : "the file that '" + leftBy + "' left",
                    "put that back, or remove the last line of " + journalFile + " to keep what is there"));
        }
        return true;
    }

    private void put(String file, Optional<FileBytes> content) {
        if (!files.bytes(file).equals(content)) {
            files.put(file, content);
        }
    }

    private boolean isAfter(Entry entry) {
        return entry.files().stream().allMatch(change -> files.bytes(change.file()).equals(change.after()));
    }
}

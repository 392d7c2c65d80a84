package org.wispwright.ui.desk;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Stroke;

/** A session without a screen. Expectations: ours; what is on disk is asked of the folder, by its bytes and by {@link NoteEdits}. */
class DeskTest {
    @TempDir
    private Path folder;
    private final DeskThread thread = new DeskThread();
    private final List<Desk> all = new ArrayList<>();
    private Path shot;
    private Desk desk;

    @BeforeEach
    void open() {
        shot = SmallShot.in(folder.resolve("shot")).folder();
        desk = opened();
    }

    /** What they do beside the work must not go on in a folder that is being removed. */
    @AfterEach
    void close() {
        all.forEach(Desk::close);
    }

    private Desk opened() {
        Desk made = new Desk(thread.workers());
        all.add(made);
        made.open(shot);
        thread.until("the shot is open", () -> made.state().shot().isPresent());
        return made;
    }

    private static Stroke stroke(double x) {
        return new Stroke(Brush.ADD, 0.05, 0.5, 0.5, List.of(new Point(x, 0.4), new Point(x + 0.1, 0.5)), Optional.empty());
    }

    private void written() {
        thread.until("all is on disk", () -> desk.state().saving().isDone());
    }

    private List<Listed> onDisk() {
        return NoteEdits.of(ShotFolder.open(shot)).list();
    }

    private SortedMap<String, String> noteFiles() throws IOException {
        SortedMap<String, String> files = new TreeMap<>();
        try (Stream<Path> all = Files.list(shot.resolve("notes"))) {
            for (Path file : (Iterable<Path>) all.filter(p -> !p.getFileName().toString().startsWith("."))::iterator) {
                files.put(file.getFileName().toString(), Files.readString(file));
            }
        }
        return files;
    }

    @Test
    void theFirstNoteIsOpenAndItsFrameShown() {
        Note first = desk.state().openNote().orElseThrow().note();
        assertEquals(first.frame(), desk.state().showing().orElseThrow().frame());
        assertTrue(desk.state().isAtOpenNote());
    }

    @Test
    void undoBringsBackTheVeryNotesAndTheVeryBytes() throws IOException {
        SortedMap<String, String> bytes = noteFiles();
        List<Listed> before = desk.state().shot().orElseThrow().notes();
        String id = desk.state().note().orElseThrow();
        desk.edit(NoteEdit.append("Add stroke", id, stroke(0.3)));
        desk.edit(NoteEdit.on("Set aside", id, false));
        desk.edit(NoteEdit.words("Change words", id, "Other \"words\""));
        assertEquals(Optional.of("Change words"), desk.state().history().undoName());
        written();
        assertEquals(desk.state().shot().orElseThrow().notes(), onDisk());
        for (int n = 0; n < 3; n++) {
            desk.undo();
        }
        assertSame(before, desk.state().shot().orElseThrow().notes());
        written();
        assertEquals(bytes, noteFiles());
        assertEquals(Optional.of("Add stroke"), desk.state().history().redoName());
        desk.redo();
        desk.redo();
        desk.redo();
        written();
        assertEquals("Other \"words\"", onDisk().stream().filter(l -> l.note().id().equals(id)).findFirst().orElseThrow().note().words());
    }

    @Test
    void notesAreAddedCopiedAndDeletedWithTheirFiles() throws IOException {
        Note first = desk.state().openNote().orElseThrow().note();
        Files.writeString(shot.resolve("notes/" + first.id() + ".sky.txt"), "beside");
        SortedMap<String, String> bytes = noteFiles();
        Note copy = new Note("copy", "A copy", first.frame(), first.view(), 1, Optional.empty(), first.retouch(), List.of(), Optional.empty());
        Note bare = new Note("bare", "Just begun", first.frame(), first.view(), 1, Optional.empty(), new Retouch(List.of()), List.of(),
                Optional.empty());
        desk.edit(NoteEdit.add("Duplicate note", List.of(new Listed(copy, true)), Map.of("copy", first.id())));
        desk.edit(NoteEdit.add("New note", List.of(new Listed(bare, true)), Map.of()));
        desk.edit(NoteEdit.delete("Delete note", first.id()));
        written();
        assertEquals(desk.state().shot().orElseThrow().notes(), onDisk());
        assertEquals("beside", noteFiles().get("copy.sky.txt"));
        assertFalse(noteFiles().containsKey(first.id() + ".sky.txt"));
        assertTrue(desk.state().note().isEmpty(), "the open note is gone");
        for (int n = 0; n < 3; n++) {
            desk.undo();
        }
        written();
        assertEquals(bytes, noteFiles());
    }

    @Test
    void undoGoesOnIntoAnEarlierSession() throws IOException {
        SortedMap<String, String> bytes = noteFiles();
        String id = desk.state().note().orElseThrow();
        desk.edit(NoteEdit.append("Add stroke", id, stroke(0.3)));
        written();
        desk.close();
        desk = opened();
        thread.until("the journal is asked", () -> desk.state().history().undoName().isPresent());
        assertEquals("Add stroke", desk.state().history().undoName().orElseThrow());
        desk.undo();
        thread.until("it is taken back", () -> desk.state().history().redoName().isPresent());
        assertEquals(bytes, noteFiles());
        desk.redo();
        thread.until("it is made again", () -> desk.state().history().undoName().isPresent());
        assertEquals(desk.state().shot().orElseThrow().notes(), onDisk());
        assertFalse(bytes.equals(noteFiles()));
    }

    /** A folder in a file's place stands for a disk that refuses: no user of any rights can write through it. */
    @Test
    void whatTheDiskRefusesWaitsAndNothingIsLost() throws IOException {
        String id = desk.state().note().orElseThrow();
        Path journal = shot.resolve("notes/.journal.jsonl");
        Files.createDirectories(journal.resolve("in-the-way"));
        desk.edit(NoteEdit.append("Add stroke", id, stroke(0.3)));
        desk.edit(NoteEdit.append("Add stroke", id, stroke(0.5)));
        thread.until("it is refused", () -> desk.state().saving().refused().isPresent());
        assertEquals(2, desk.state().saving().waiting());
        desk.undo();
        assertEquals(1, desk.state().saving().waiting(), "what never got to the disk is not written to be taken back");
        desk.redo();
        thread.until("it is refused again", () -> desk.state().saving().refused().isPresent());
        Files.delete(journal.resolve("in-the-way"));
        Files.delete(journal);
        desk.saveAgain();
        written();
        assertEquals(desk.state().shot().orElseThrow().notes(), onDisk());
        desk.undo();
        desk.undo();
        written();
        assertEquals(desk.state().shot().orElseThrow().notes(), onDisk());
    }

    @Test
    void aDeskThatIsClosedWritesAllThatWaits() {
        String id = desk.state().note().orElseThrow();
        for (int n = 0; n < 4; n++) {
            desk.edit(NoteEdit.append("Add stroke", id, stroke(0.1 * n)));
        }
        List<Listed> notes = desk.state().shot().orElseThrow().notes();
        desk.close();                                                          // nothing has come back to this thread yet
        assertEquals(notes, onDisk());
    }

    @Test
    void aShotThatCannotBeOpenedIsSaidAndTheOneOnTheDeskStays() throws IOException {
        Path other = Files.createDirectories(folder.resolve("other"));
        Files.writeString(other.resolve("shot.json"), "{");
        OpenShot before = desk.state().shot().orElseThrow();
        desk.open(other);
        thread.until("a fault is said", () -> desk.state().message().isPresent());
        assertEquals(Message.Kind.FAULT, desk.state().message().orElseThrow().kind());
        assertSame(before, desk.state().shot().orElseThrow());
    }

    @Test
    void ofWorkThatIsReplacedOnlyTheNewestComesBack() {
        Workers workers = thread.workers();
        Replacing replacing = new Replacing(workers, workers.lane("test"));
        StringBuilder shown = new StringBuilder();
        for (int n = 0; n < 20; n++) {
            int number = n;
            replacing.replace(cancel -> number, value -> shown.append(value).append(' '), thrown -> { });
        }
        thread.until("the newest is there", () -> shown.length() > 0);
        assertEquals("19 ", shown.toString());
        workers.close();
    }
}

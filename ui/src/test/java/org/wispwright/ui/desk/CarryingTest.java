package org.wispwright.ui.desk;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.NoteEdits.Listed;
import org.wispwright.ui.shot.ShotFolder;

/** Notes taken to other frames, and changes from outside the session's own edits. Expectations: ours, by hand. */
class CarryingTest {
    @TempDir
    private Path folder;

    private static List<String> ids(WindowlessDesk d) {
        return d.shot().notes().stream().map(l -> l.note().id()).toList();
    }

    @Test
    void aNoteIsCarriedInOneEdit() throws IOException {
        Path shot = SmallShot.in(folder).folder();
        try (WindowlessDesk d = WindowlessDesk.with(shot)) {
            Carrying carrying = new Carrying(d.desk);
            carrying.carry("Carry note", "lean", List.of(1003, 1004, 1005), false, () -> { });
            assertEquals(List.of("lean", "lean-1003", "lean-1005", "open"), ids(d));
            carrying.carry("Carry note", "lean", List.of(1003), false, () -> { });
            assertTrue(ids(d).contains("lean-2-1003"), ids(d).toString());
            d.desk.undo();
            d.desk.undo();
            assertEquals(List.of("lean", "open"), ids(d));
            d.desk.redo();
            d.until("written", () -> d.desk.state().saving().isDone());
            assertTrue(Files.exists(shot.resolve("notes/lean-1005.json")) && !Files.exists(shot.resolve("notes/lean-2-1003.json")));
            carrying.carry("Carry note", "lean", List.of(1004), false, () -> { });
            assertTrue(d.desk.state().message().orElseThrow().words().contains("no frame but the note's own"));
        }
    }

    @Test
    void followingTheSmokeNeedsTheOriginalAndMovesTheRetouch() {
        try (WindowlessDesk d = WindowlessDesk.with(SolvedShot.simulated(folder))) {
            new Carrying(d.desk).carry("Carry note", "lean", List.of(1006), true, () -> { });
            assertEquals(List.of("lean", "open"), ids(d));
            d.until("carried", () -> ids(d).contains("lean-1006"));
            assertNotEquals(d.shot().note("lean").orElseThrow().note().retouch(),
                    d.shot().note("lean-1006").orElseThrow().note().retouch());
        }
        try (WindowlessDesk d = WindowlessDesk.with(SmallShot.in(folder.resolve("bare")).folder())) {
            new Carrying(d.desk).carry("Carry note", "lean", List.of(1006), true, () -> { });
            d.until("said", () -> d.desk.state().message().isPresent());
            assertTrue(d.desk.state().message().get().words().contains("no such take"), d.desk.state().message().get().words());
            assertEquals(List.of("lean", "open"), ids(d));
        }
    }

    @Test
    void betweenTwoNotesInEitherOrder() {
        try (WindowlessDesk d = WindowlessDesk.with(SmallShot.in(folder).folder())) {
            Carrying carrying = new Carrying(d.desk);
            carrying.carry("Carry note", "lean", List.of(1002), false, () -> { });
            carrying.between("Notes between", "lean", "lean-1002", 1, false, () -> { });
            assertTrue(ids(d).contains("lean-1002-1003"), ids(d).toString());
            carrying.between("Notes between", "lean", "lean-1002", 2, false, () -> { });
            assertTrue(d.desk.state().message().orElseThrow().words().contains("more than 2 frames"));
            carrying.between("Notes between", "lean", "open", 1, false, () -> { });
            assertTrue(d.desk.state().message().orElseThrow().words().contains("one view"));
        }
    }

    /** A change outside is read again, lies behind the edits before it in the journal, and undo goes on through both. */
    @Test
    void aChangeFromOutsideCanBeUndoneAndSoCanWhatWasBeforeIt() {
        try (WindowlessDesk d = WindowlessDesk.with(SmallShot.in(folder).folder())) {
            boolean[] told = new boolean[1];
            d.desk.edit(NoteEdit.words("Words", "lean", "Lean it."));
            d.desk.outside(f -> copy(f, "open", "made-outside"), () -> told[0] = true);
            d.desk.edit(NoteEdit.words("Words", "open", "Open it."));
            d.until("it is there", () -> told[0] && ids(d).contains("made-outside") && d.desk.state().saving().isDone());
            assertEquals("Open it.", d.shot().note("open").orElseThrow().note().words());
            d.until("its name is known", () -> d.desk.state().history().undoName().isPresent());
            d.desk.undo();
            d.until("words of open are back", () -> words(d, "open").equals("Open a gap."));
            d.until("its name is known", () -> d.desk.state().history().undoName().isPresent());
            d.desk.undo();
            d.until("it is gone", () -> !ids(d).contains("made-outside"));
            d.until("its name is known", () -> d.desk.state().history().undoName().isPresent());
            d.desk.undo();
            d.until("words of lean are back", () -> words(d, "lean").startsWith("Lean the head"));
        }
    }

    /** A fault outside is said, changes nothing and holds nothing up. */
    @Test
    void aFaultOutsideHoldsNothingUp() {
        try (WindowlessDesk d = WindowlessDesk.with(SmallShot.in(folder).folder())) {
            d.desk.outside(f -> copy(f, "open", "lean"), () -> { });
            d.desk.edit(NoteEdit.words("Words", "lean", "Lean it."));
            d.until("all is written", () -> d.desk.state().saving().isDone());
            assertTrue(d.desk.state().message().orElseThrow().words().contains("notes/lean.json"));
            assertEquals("Lean it.", words(d, "lean"));
        }
    }

    private static String words(WindowlessDesk d, String id) {
        return d.shot().note(id).map(Listed::note).map(Note::words).orElse("");
    }

    private static void copy(ShotFolder folder, String from, String to) {
        NoteEdits.of(folder).copy(from, 1005, Optional.empty(), Optional.of(to));
    }
}

package org.wispwright.ui.desk;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.ShotException;

/** Edits that make notes. Expectations: ours, by hand. */
class NewNotesTest {
    @TempDir
    private Path folder;

    @Test
    void aNewNoteHasAFreeIdAndNoRetouch() {
        try (WindowlessDesk d = WindowlessDesk.with(SmallShot.in(folder).folder())) {
            for (String id : List.of("note-1", "note-2")) {
                NewNotes.Made made = NewNotes.make("New note", d.shot(), "side", 1003, "New note");
                d.desk.edit(made.edit());
                assertEquals(List.of(id), made.ids());
                Note note = d.shot().note(id).orElseThrow().note();
                assertTrue(note.retouch().operations().isEmpty() && note.frame() == 1003 && note.view().equals("side"), note.toString());
            }
            ShotException first = assertThrows(ShotException.class, () -> NewNotes.make("New note", d.shot(), "side", 1001, "New note"));
            assertTrue(first.finding().inWords().contains("1001 is the first, which no force can change"), first.finding().inWords());
        }
    }

    @Test
    void aDuplicateTakesTheFilesAlongAndKeepsAllElse() {
        try (WindowlessDesk d = WindowlessDesk.with(SmallShot.in(folder).folder())) {
            NewNotes.Made made = NewNotes.duplicate("Duplicate note", d.shot(), "lean");
            assertEquals(List.of("lean-1"), made.ids());
            assertEquals(Map.of("lean-1", "lean"), made.edit().copied());
            d.desk.edit(made.edit());
            Note copy = d.shot().note("lean-1").orElseThrow().note();
            Note lean = d.shot().note("lean").orElseThrow().note();
            assertEquals(lean, new Note("lean", copy.words(), copy.frame(), copy.view(), copy.weight(), copy.weighBy(), copy.retouch(),
                    copy.holds(), copy.loss()));
        }
    }

    @Test
    void anIdNeverGetsTooLongAndNeverDiffersInCapitalsAlone() {
        try (WindowlessDesk d = WindowlessDesk.with(SmallShot.in(folder).folder())) {
            assertEquals("a".repeat(62) + "-1", NewNotes.freeId(d.shot(), "a".repeat(64)));
            assertEquals("lean", NewNotes.freePrefix(d.shot(), "lean", List.of(1002, 1003)));
            d.desk.edit(NewNotes.from("Carry", d.shot(), "lean", List.of(renamed(d, "LEAN-1003")), true).edit());
            assertEquals("lean-2", NewNotes.freePrefix(d.shot(), "lean", List.of(1002, 1003)));
        }
    }

    private static Note renamed(WindowlessDesk d, String id) {
        Note n = d.shot().note("lean").orElseThrow().note();
        return new Note(id, n.words(), n.frame(), n.view(), n.weight(), n.weighBy(), n.retouch(), n.holds(), n.loss());
    }
}

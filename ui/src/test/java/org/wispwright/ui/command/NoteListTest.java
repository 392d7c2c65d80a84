package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Path;
import java.util.SortedMap;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** {@code note list}, and what the key {@code on} of a note means to the other commands. */
class NoteListTest {
    @TempDir
    private Path place;
    private SmallShot shot;

    @BeforeEach
    void aGoodShot() {
        shot = SmallShot.in(place.resolve("yard"));
    }

    @Test
    void listsEveryNote() throws IOException {
        shot.swap("notes/lean.json", "\"wispwright\": 1,", "\"wispwright\": 1, \"on\": false,");
        shot.swap("notes/open.json", "\"wispwright\": 1,", "\"wispwright\": 1, \"loss\": [\"silhouette\", \"transport\"],");
        SortedMap<String, String> before = SmallShot.listing(place);
        Run run = Run.of("note", "list", shot.folder().toString());
        assertEquals(0, run.code(), run.err());
        assertEquals("lean  frame 1004  view front  weight 1  loss auto  off  Lean the head to the left.\n"
                + "open  frame 1006  view side  weight 1  loss silhouette+transport  on   Open a gap.\n", run.out().replace("\r\n", "\n"));
        JsonNode notes = new ObjectMapper().readTree(Run.of("note", "list", shot.folder().toString(), "--json").out()).get("notes");
        assertFalse(notes.get(0).get("on").booleanValue());
        assertTrue(notes.get(1).get("on").booleanValue());
        assertEquals("auto", notes.get(0).get("loss").textValue());
        assertEquals("silhouette+transport", notes.get(1).get("loss").textValue());
        assertEquals("side", notes.get(1).get("view").textValue());
        assertEquals(before, SmallShot.listing(place));
    }

    /** With take 0 there the program's choice is told; a small lean is within the pyramid's sight. A take of another set-up is none. */
    @Test
    void tellsTheProgramsChoiceOnceTakeZeroIsThere() throws IOException {
        assertEquals(0, Run.of("simulate", shot.folder().toString()).code());
        shot.swap("notes/open.json", "\"wispwright\": 1,", "\"wispwright\": 1, \"loss\": [\"edges\"],");
        String told = Run.of("note", "list", shot.folder().toString()).out();
        assertTrue(told.contains("loss auto (pyramid)  on ") && told.contains("loss edges  on "), told);
        JsonNode notes = new ObjectMapper().readTree(Run.of("note", "list", shot.folder().toString(), "--json").out()).get("notes");
        assertEquals("pyramid", notes.get(0).get("lossChosen").textValue());
        assertEquals("as the note says", notes.get(1).get("lossWhy").textValue());
        shot.swap("shot.json", "\"buoyancy\": 3.0", "\"buoyancy\": 2.5");
        assertTrue(Run.of("note", "list", shot.folder().toString()).out().contains("loss auto  on "));
    }

    @Test
    void aNoteThatIsOffIsCheckedAllTheSame() {
        shot.swap("notes/lean.json", "\"frame\": 1004", "\"frame\": 2004, \"on\": false");
        for (String[] args : new String[][] {{"check", shot.folder().toString()}, {"note", "list", shot.folder().toString()}}) {
            Run run = Run.of(args);
            assertEquals(3, run.code(), run.err());
            assertTrue(run.err().contains("notes/lean.json at /frame"), run.err());
        }
    }

    @Test
    void checkCountsThoseThatAreOff() {
        shot.swap("notes/lean.json", "\"wispwright\": 1,", "\"wispwright\": 1, \"on\": false,");
        assertTrue(Run.of("check", shot.folder().toString()).out().contains("notes 2 (1 off)"));
    }

    @Test
    void onIsTrueOrFalse() {
        shot.swap("notes/lean.json", "\"wispwright\": 1,", "\"wispwright\": 1, \"on\": \"no\",");
        Run run = Run.of("check", shot.folder().toString());
        assertEquals(3, run.code(), run.err());
        assertTrue(run.err().contains("notes/lean.json at /on") && run.err().contains("true or false"), run.err());
    }

    @Test
    void compareLeavesOutANoteThatIsOff() throws IOException {
        shot.swap("notes/lean.json", "\"wispwright\": 1,", "\"wispwright\": 1, \"on\": false,");
        assertEquals(0, Run.of("simulate", shot.folder().toString()).code());
        Run run = Run.of("compare", shot.folder().toString(), "--takes", "0,0", "--out", place.resolve("out").toString(), "--json");
        assertEquals(0, run.code(), run.err());
        JsonNode notes = new ObjectMapper().readTree(run.out()).get("notes");
        assertEquals(1, notes.size());
        assertTrue(notes.toString().contains("open"), notes.toString());
    }

    @Test
    void solveLeavesOutANoteThatIsOff() throws IOException {
        shot.swap("notes/lean.json", "\"wispwright\": 1,", "\"wispwright\": 1, \"on\": false,");
        Run run = Run.of("solve", shot.folder().toString(), "--until", "iterations=1");
        assertEquals(0, run.code(), run.err());
        JsonNode take = new ObjectMapper().readTree(shot.folder().resolve("takes/001/take.json").toFile());
        assertEquals("[\"open\"]", take.get("settings").get("notes").toString());
    }

    @Test
    void withEveryNoteOffThereIsNothingToSolveOrCompare() {
        for (String note : new String[] {"lean", "open"}) {
            shot.swap("notes/" + note + ".json", "\"wispwright\": 1,", "\"wispwright\": 1, \"on\": false,");
        }
        assertEquals(0, Run.of("simulate", shot.folder().toString()).code());
        for (Run run : new Run[] {Run.of("solve", shot.folder().toString()),
                Run.of("compare", shot.folder().toString(), "--takes", "0,0", "--out", place.resolve("out").toString())}) {
            assertEquals(3, run.code(), run.err());
            assertTrue(run.err().contains("every note is off"), run.err());
        }
    }
}

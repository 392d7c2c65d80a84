package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SortedMap;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** {@code note add}, {@code set}, {@code carry} and {@code between}: what they write, and what they refuse with nothing written. */
class NoteMakeTest {
    private static final String DENT = """
            {"wispwright": 1, "retouch": [
              {"stroke": {"brush": "remove", "radius": 0.1, "strength": 0.5, "line": [[0.3, 0.5], [0.4, 0.5]]}}
            ], "holds": [{"region": {"rectangle": {"left": 0.2, "top": 0.8, "right": 0.6, "bottom": 1}}}]}
            """;

    @TempDir
    private Path place;
    private SmallShot shot;

    @BeforeEach
    void aGoodShot() throws IOException {
        shot = SmallShot.in(place.resolve("yard"));
        Files.writeString(place.resolve("dent.json"), DENT);
    }

    @Test
    void addWritesTheNoteWithTheRetouchAsItIs() throws IOException {
        Run run = note("add", "--id", "dent", "--frame", "1005", "--view", "side", "--words", "Dent \"it\".", "--weight", "2", "--retouch",
                file("dent.json"));
        assertEquals(0, run.code(), run.err());
        assertEquals("""
                {
                  "wispwright": 1,
                  "words": "Dent \\"it\\".",
                  "frame": 1005,
                  "view": "side",
                  "weight": 2,
                  "retouch": [
                    {"stroke":{"brush":"remove","radius":0.1,"strength":0.5,"line":[[0.3,0.5],[0.4,0.5]]}}
                  ],
                  "holds": [
                    {"region":{"rectangle":{"left":0.2,"top":0.8,"right":0.6,"bottom":1}}}
                  ]
                }
                """, text("notes/dent.json"));
        assertEquals(0, Run.of("check", shot.folder().toString()).code());
        assertTrue(note("undo").out().contains("note add --id dent --words --frame 1005 --view side --weight 2.0 --retouch"));
        assertFalse(Files.exists(shot.folder().resolve("notes/dent.json")));
    }

    @Test
    void setChangesItsKeysAndNothingElse() throws IOException {
        assertEquals(0, note("set", "lean", "--words", "Lean right.", "--weight", "0.5").code());
        assertEquals(SmallShot.LEAN.replace("Lean the head to the left.", "Lean right.").replace("\"weight\": 1", "\"weight\": 0.5"),
                text("notes/lean.json"));
        assertTrue(note("set", "lean", "--weight", "0.5").out().contains("nothing was done"));
        note("undo");
        assertEquals(0, note("set", "lean", "--frame", "1003", "--view", "side", "--retouch", file("dent.json")).code());
        String now = text("notes/lean.json");
        assertTrue(now.contains("\"frame\": 1003, \"view\": \"side\", \"weight\": 1,") && now.contains("\"retouch\": [\n    {\"stroke\"")
                && !now.contains("meshWarp"), now);
        assertEquals(0, Run.of("check", shot.folder().toString()).code());
    }

    @Test
    void carryCopiesToEveryNthFrameAndUndoTakesAllBack() throws IOException {
        Run run = note("carry", "lean", "--frames", "1002-1006", "--every", "2", "--weight", "0.25");
        assertEquals(0, run.code(), run.err());
        assertEquals("2 notes made: lean-1002, lean-1006 of 'lean'.", run.out().strip());
        String made = text("notes/lean-1006.json");
        assertTrue(made.contains("\"frame\": 1006") && made.contains("\"weight\": 0.25") && made.contains("{\"pin\":[0.3,0.98]}"), made);
        assertTrue(made.contains("\"holds\""), "a hold of the note's frame alone goes along");
        assertEquals(0, Run.of("check", shot.folder().toString()).code());
        assertTrue(note("undo").out().contains("notes/lean-1002.json, notes/lean-1006.json are gone again"));
        assertEquals(0, note("carry", "open", "--frames", "1004", "--id", "early").code());
        assertFalse(text("notes/early-1004.json").contains("holds"), "a hold with frames of its own stays where it is");
    }

    /** By hand: a third and two thirds of the way from x 0.3, radius 0.1, weight 1 to x 0.6, radius 0.4, weight 4. */
    @Test
    void betweenGoesStraightOrEased() throws IOException {
        shot.write("notes/a.json", stroke("remove", 1003, 0.1, 0.3, 1));
        shot.write("notes/b.json", stroke("remove", 1006, 0.4, 0.6, 4));
        Run run = note("between", "a", "b");
        assertEquals(0, run.code(), run.err());
        assertTrue(run.out().contains("2 notes made: a-1004, a-1005 between 'a' and 'b'."), run.out());
        String third = text("notes/a-1004.json");
        assertTrue(third.contains("\"radius\":0.2,") && third.contains("\"weight\": 2.0"), third);
        assertEquals(0.4, new ObjectMapper().readTree(third).at("/retouch/0/stroke/line/1/0").doubleValue(), 1e-12);
        note("undo");
        assertEquals(0, note("between", "a", "b", "--every", "2", "--ease", "--id", "eased", "--weight", "1").code());
        String eased = text("notes/eased-1005.json");
        double share = 4 / 9.0 * (3 - 4 / 3.0);
        assertTrue(eased.contains("\"radius\":" + (0.1 + share * (0.4 - 0.1))), eased);
        assertTrue(eased.contains("\"weight\": 1.0"), eased);
    }

    @Test
    void aNoteThatIsOffIsCarriedOff() throws IOException {
        note("off", "lean");
        note("carry", "lean", "--frames", "1005");
        assertTrue(text("notes/lean-1005.json").contains("\"on\": false"));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "\"wispwright\": 1 | \"wispwright\": 9 | at /wispwright | newer", "\"retouch\" | \"retuoch\" | /retuoch | did you mean 'retouch'",
        "\"holds\" | \"words\" | /words | unknown key",
        "\"brush\": \"remove\" | \"brush\": \"smudge\" | /retouch/0/stroke/brush | \"smudge\"",
        "0.1, | NaN, | /retouch/0/stroke/radius | NaN", "]]}} | ] | brackets | cut short",
        "\"left\": 0.2 | \"left\": 0.7 | /holds/0/region | left < right"})
    void aRetouchFileThatIsNotInOrder(String old, String now, String one, String two) throws IOException {
        assertTrue(DENT.contains(old), old);
        Files.writeString(place.resolve("bad.json"), DENT.replace(old, now));
        refused("add --id new --frame 1005 --view side --words Dent. --retouch " + file("bad.json"), "bad.json", one, two);
        refused("set lean --retouch " + file("bad.json"), "bad.json", one, two);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "add --id new --frame 1005 --view side --words Dent. --retouch DIR/none.json | none.json: found no such file | correct the name",
        "add --id lean --frame 1005 --view side --words Dent. --retouch DIR/dent.json | notes/lean.json | already",
        "add --id ../x --frame 1005 --view side --words Dent. --retouch DIR/dent.json | the id '../x' | letters",
        "add --id new --frame 1001 --view side --words Dent. --retouch DIR/dent.json | notes/new.json at /frame | first frame",
        "add --id new --frame 2000 --view side --words Dent. --retouch DIR/dent.json | notes/new.json at /frame | frame 2000",
        "add --id new --frame 1005 --view sidee --words Dent. --retouch DIR/dent.json | at /view | did you mean 'side'",
        "add --id new --frame 1005 --view side --words '' --retouch DIR/dent.json | at /words | empty text",
        "add --id new --frame 1005 --view side --words Dent. --weight 0 --retouch DIR/dent.json | at /weight | above 0",
        "add --id new --frame 1005 --view side --words Dent. --weight NaN --retouch DIR/dent.json | at /weight | NaN",
        "set leann --weight 2 | notes/leann.json | did you mean 'lean'", "set lean --weight 2000 | notes/lean.json at /weight | 1000",
        "set lean --frame 1001 | at /frame | first frame", "set lean --view fornt | at /view | did you mean 'front'",
        "set lean --retouch DIR | no such file | retouch file", "carry leann --frames 1005 | notes/leann.json | did you mean 'lean'",
        "carry lean --frames 1002-1007 | at /frame | frame 1007", "carry lean --frames 1001-1003 | at /frame | first frame",
        "carry lean --frames 1005 --id open/x | the id 'open/x-1005' | letters",
        "carry lean --frames 1005 --follow 0 | takes/000 | run 'simulate' first",
        "between lean lean | notes/lean.json at /frame | earlier first", "between lean open | at /view | two notes of one view",
        "between lean none | notes/none.json | no such note"})
    void refusedInOneSentenceWithNothingWritten(String line, String one, String two) {
        refused(line.replace("DIR", place.toString()), one, two);
    }

    @Test
    void whatDoesNotMatchIsNamed() {
        shot.write("notes/a.json", stroke("remove", 1003, 0.1, 0.3, 1));
        shot.write("notes/b.json", stroke("add", 1006, 0.1, 0.3, 1));
        refused("between a b", "notes/b.json at /retouch", "operation 1 is a stroke of the brush 'remove'", "'add'");
        shot.swap("notes/lean.json", "\"frame\": 1004", "\"frame\": 1006");
        refused("between a lean", "at /holds", "0 holds", "1");
        refused("between a b --every 3", "at /frame", "none to make");
        shot.write("notes/a-1005.json", stroke("add", 1005, 0.1, 0.3, 1));
        shot.write("notes/b.json", stroke("remove", 1006, 0.1, 0.3, 1));
        refused("between a b", "notes/a-1005.json", "already");
        refused("carry a --frames 1004-1006", "notes/a-1005.json", "already");
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {"set lean | needs one of", "carry lean --frames x | 1030-1040",
        "carry lean --frames 1006-1002 | last frame",
        "carry lean --frames 1004 | note's own", "carry lean --frames 1005 --every 0 | --every 0",
        "between lean open --every -1 | --every -1",
        "carry lean --frames 1005 --weight NaN | --weight NaN", "between lean open --weight 0 | --weight 0", "add --id x | --frame",
        "carry lean --frames 1005 --follow x | --follow"})
    void wrongUsage(String line, String phrase) {
        SortedMap<String, String> before = SmallShot.listing(place);
        Run run = note(line.split(" "));
        assertEquals(2, run.code(), run.out() + run.err());
        assertTrue(run.err().contains(phrase), run.err());
        assertEquals(before, SmallShot.listing(place));
    }

    private static String stroke(String brush, int frame, double radius, double x, int weight) {
        return """
                {"wispwright": 1, "words": "As drawn.", "frame": %d, "view": "front", "weight": %d,
                 "retouch": [{"stroke": {"brush": "%s", "radius": %s, "line": [[%s, 0.5], [%s, 0.75]]}}]}
                """.formatted(frame, weight, brush, radius, x, x);
    }

    private void refused(String line, String... phrases) {
        SortedMap<String, String> before = SmallShot.listing(place);
        Run run = note(Arrays.stream(line.split(" ")).map(part -> part.equals("''") ? "" : part).toArray(String[]::new));
        assertEquals(3, run.code(), line + ": " + run.out() + run.err());
        String said = run.err().strip();
        assertTrue(said.lines().count() == 1 && said.startsWith("wispwright: ") && said.endsWith(".") && !said.contains("Exception"), said);
        for (String phrase : phrases) {
            assertTrue(said.contains(phrase), "'" + phrase + "' is not in: " + said);
        }
        assertEquals(before, SmallShot.listing(place), line);
    }

    private Run note(String... args) {
        List<String> all = new ArrayList<>(List.of("note", args[0], shot.folder().toString()));
        all.addAll(Arrays.asList(args).subList(1, args.length));
        return Run.of(all.toArray(new String[0]));
    }

    private String file(String name) {
        return place.resolve(name).toString();
    }

    private String text(String file) throws IOException {
        return Files.readString(shot.folder().resolve(file));
    }
}

package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.SortedMap;
import java.util.TreeMap;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** {@code note off}, {@code on}, {@code copy}, {@code delete} and {@code undo}: what they change on disk, and what they refuse. */
class NoteEditsTest {
    private static final String JOURNAL = "notes/.journal.jsonl";
    private static final String AGAIN = "notes/.taken-back.jsonl";

    @TempDir
    private Path place;
    private SmallShot shot;

    @BeforeEach
    void aGoodShot() {
        shot = SmallShot.in(place.resolve("yard"));
    }

    @Test
    void offAndOnChangeOneKeyAndNothingElse() throws IOException {
        assertEquals(0, note("off", "lean").code());
        assertEquals(SmallShot.LEAN.replace("{\n  \"wispwright\"", "{\n  \"on\": false,\n  \"wispwright\""), text("notes/lean.json"));
        assertEquals(SmallShot.OPEN, text("notes/open.json"));
        assertEquals(0, note("on", "lean").code());
        assertEquals(SmallShot.LEAN.replace("{\n  \"wispwright\"", "{\n  \"on\": true,\n  \"wispwright\""), text("notes/lean.json"));
        SortedMap<String, String> before = SmallShot.listing(place);
        Run again = note("on", "lean");
        assertEquals(0, again.code(), again.err());
        assertTrue(again.out().contains("nothing was done"), again.out());
        assertEquals(before, SmallShot.listing(place));
    }

    @Test
    void offIsOffForTheOtherCommands() {
        note("off", "lean");
        assertTrue(Run.of("check", shot.folder().toString()).out().contains("notes 2 (1 off)"));
        assertTrue(note("list").out().contains("weight 1  loss auto  off  Lean"));
    }

    @Test
    void copyDiffersInFrameAndViewAlone() throws IOException {
        Run run = note("copy", "lean", "--frame", "1005");
        assertEquals(0, run.code(), run.err());
        assertEquals(SmallShot.LEAN.replace("\"frame\": 1004", "\"frame\": 1005"), text("notes/lean-1005.json"));
        assertEquals(0, note("copy", "open", "--frame", "1003", "--view", "front", "--id", "gap").code());
        assertEquals(SmallShot.OPEN.replace("\"frame\": 1006", "\"frame\": 1003").replace("\"view\": \"side\"", "\"view\": \"front\""),
                text("notes/gap.json"));
        assertEquals(SmallShot.LEAN, text("notes/lean.json"));
        assertEquals(0, Run.of("check", shot.folder().toString()).code());
    }

    @Test
    void deleteRemovesEvenANoteThatIsNotInOrder() throws IOException {
        shot.swap("notes/lean.json", "\"weight\"", "\"wieght\"");
        String broken = text("notes/lean.json");
        assertEquals(0, note("delete", "lean").code());
        assertFalse(Files.exists(shot.folder().resolve("notes/lean.json")));
        assertEquals(0, note("undo").code());
        assertEquals(broken, text("notes/lean.json"));
    }

    @Test
    void undoSaysWhatItTookBack() throws IOException {
        note("copy", "lean", "--frame", "1005");
        note("off", "lean");
        assertTrue(note("undo").out().contains("'note off lean'"));
        assertEquals(SmallShot.LEAN, text("notes/lean.json"));
        assertTrue(note("undo", "--json").out().contains("\"command\" : \"note copy lean --frame 1005\""));
        assertFalse(Files.exists(shot.folder().resolve("notes/lean-1005.json")));
        note("copy", "lean", "--frame", "1005");
        assertTrue(note("undo").out().contains("notes/lean-1005.json is gone again"));
        refused(new String[] {"undo"}, "found no change");
    }

    @Test
    void undoRefusesWhatWasChangedByHand() {
        note("off", "lean");
        shot.swap("notes/lean.json", "to the left", "to the right");
        refused(new String[] {"undo"}, "notes/lean.json", "changed by hand", "note off lean");
        shot.swap("notes/lean.json", "to the right", "to the left");
        assertEquals(0, note("undo").code());
        note("delete", "open");
        shot.write("notes/open.json", SmallShot.LEAN);
        refused(new String[] {"undo"}, "notes/open.json", "changed by hand");
        note("copy", "lean", "--frame", "1005");
        shot.write("notes/lean-1005.json", SmallShot.OPEN);
        refused(new String[] {"undo"}, "notes/lean-1005.json", "changed by hand");
    }

    /**
     * A crash after the journal was written and before the note was, or in undo after the note was put back and before the journal
     * was: the note is as before, and undo says so.
     */
    @Test
    void aChangeThatWasCutShortIsTakenOffTheJournal() throws IOException {
        note("off", "open");
        note("off", "lean");
        shot.write("notes/lean.json", SmallShot.LEAN);
        Run first = note("undo");
        assertEquals(0, first.code(), first.err());
        assertTrue(first.out().contains("was so already"), first.out());
        assertTrue(note("undo").out().contains("note off open"));
        assertEquals(SmallShot.OPEN, text("notes/open.json"));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "off leann | notes/leann.json | did you mean 'lean'", "on ../shot | the id '../shot' | letters, digits",
        "delete nothing | notes/nothing.json | one of lean, open", "copy laen --frame 1005 | notes/laen.json | no such note",
        "copy lean --frame 1005 --id open | notes/open.json | already", "copy lean --frame 1005 --id ../../x | the id | correct the id",
        "copy lean --frame 2000 | notes/lean-2000.json at /frame | frame 2000",
        "copy lean --frame 1001 | notes/lean-1001.json at /frame | first frame",
        "copy lean --frame -4 | notes/lean--4.json at /frame | whole number",
        "copy lean --frame 1005 --view fornt | notes/lean-1005.json at /view | did you mean 'front'",
        "undo | notes/.journal.jsonl | found no change"})
    void refusedInOneSentenceWithNothingWritten(String line, String one, String two) {
        refused(line.split(" "), one, two);
    }

    @Test
    void aNoteOrAShotThatIsNotInOrderIsRefused() {
        shot.swap("shot.json", "\"buoyancy\": 3.0", "\"buoyancy\": NaN");
        refused(new String[] {"copy", "lean", "--frame", "1005"}, "shot.json at /flow/buoyancy");
        refused(new String[] {"list"}, "shot.json at /flow/buoyancy");
        shot.swap("notes/lean.json", "\"weight\"", "\"wieght\"");
        refused(new String[] {"off", "lean"}, "notes/lean.json at /wieght");
        shot.write("notes/open.json", new byte[] {'{', (byte) 0xE9, '}'});
        refused(new String[] {"off", "open"}, "notes/open.json", "UTF-8");
        refused(new String[] {"delete", "open"}, "notes/open.json", "UTF-8");
    }

    @Test
    void aDamagedJournalIsRefusedAndStopsEveryChange() throws IOException {
        note("off", "lean");
        String whole = text(JOURNAL);
        for (String bad : new String[] {whole.substring(0, whole.length() / 2) + "\n", "[]\n", "{}\n", "\n",
                whole.replace("\"wispwright\":1", "\"wispwright\":9"), whole.replace("notes/lean.json", "../shot.json"),
                whole.replace("\"before\"", "\"befour\""), whole.replaceAll("\"files\":.*", "\"files\":[]}")}) {
            shot.write(JOURNAL, bad);
            refused(new String[] {"undo"}, JOURNAL);
            refused(new String[] {"delete", "open"}, JOURNAL);
        }
    }

    /** A crash while a line was being written: no file had been touched yet, so the piece of a line means nothing. */
    @Test
    void aLineThatWasCutShortIsLeftOut() throws IOException {
        note("off", "lean");
        String one = text(JOURNAL);
        note("off", "open");
        String both = text(JOURNAL);
        for (int cut : new int[] {one.length() + 1, one.length() + 40, both.length() - 2}) {
            shot.write(JOURNAL, both.substring(0, cut));
            shot.write("notes/open.json", SmallShot.OPEN);
            assertEquals(0, note("delete", "open").code());
            assertTrue(text(JOURNAL).startsWith(one) && text(JOURNAL).lines().count() == 2, text(JOURNAL));
            assertEquals(0, note("undo").code());
            assertEquals(one, text(JOURNAL));
            assertEquals(SmallShot.OPEN, text("notes/open.json"));
        }
        shot.write(JOURNAL, one.stripTrailing());
        note("off", "open");
        assertEquals(both, text(JOURNAL));
    }

    /** What undo and redo do on disk, cut short between any two of their steps: the next one goes on from there. */
    @Test
    void aMoveThatWasCutShortIsEnded() throws IOException {
        note("off", "lean");
        String off = text("notes/lean.json");
        String line = text(JOURNAL);
        shot.write("notes/lean.json", SmallShot.LEAN);
        shot.write(AGAIN, line);
        assertTrue(note("undo").err().contains("found no change"));
        assertEquals("", text(JOURNAL));
        assertEquals(0, note("redo").code());
        assertEquals(off, text("notes/lean.json"));
        shot.write(AGAIN, line);
        assertEquals(0, note("undo").code());
        assertEquals(SmallShot.LEAN, text("notes/lean.json"));
        assertEquals(line, text(AGAIN));
        shot.write("notes/lean.json", off);
        assertTrue(note("redo").out().contains("was so already"));
        assertEquals(line, text(JOURNAL));
    }

    @Test
    void filesBesideANoteGoWhereItGoes() throws IOException {
        byte[] odd = {(byte) 0x89, 'P', 'N', 'G', 0, (byte) 0xFF, '\n'};
        shot.write("notes/lean.sky.png", odd);
        shot.write("notes/lean2.sky.png", new byte[] {1});
        assertEquals(0, note("copy", "lean", "--frame", "1005", "--id", "two").code());
        assertArrayEquals(odd, Files.readAllBytes(shot.folder().resolve("notes/two.sky.png")));
        SortedMap<String, String> whole = all();
        assertEquals(0, note("delete", "lean").code());
        assertFalse(Files.exists(shot.folder().resolve("notes/lean.sky.png")));
        SortedMap<String, String> less = all();
        assertTrue(note("undo").out().contains("notes/lean.json, notes/lean.sky.png are as before"));
        assertEquals(whole, all());
        assertEquals(0, note("redo").code());
        assertEquals(less, all());
        note("undo");
        shot.write("notes/lean.sky.png", new byte[] {2});
        refused(new String[] {"redo"}, "notes/lean.sky.png", "changed by hand");
        shot.write("notes/three.sky.png", odd);
        refused(new String[] {"copy", "lean", "--frame", "1005", "--id", "three"}, "notes/three.sky.png", "already");
        shot.write("notes/lean.a b.png", odd);
        refused(new String[] {"delete", "lean"}, "notes/lean.a b.png", "rename it");
    }

    @Test
    void redoIsGoneAfterAnotherChange() throws IOException {
        refused(new String[] {"redo"}, AGAIN, "found no change");
        note("off", "lean");
        note("undo");
        assertEquals(0, note("on", "open").code());
        assertEquals(0, note("redo").code(), "'on' changed nothing");
        note("undo");
        note("off", "open");
        refused(new String[] {"redo"}, "found no change");
    }

    @Test
    void linksAreRefused() throws IOException {
        Files.move(shot.folder().resolve("notes/lean.json"), shot.folder().resolve("lean.json"));
        Files.createSymbolicLink(shot.folder().resolve("notes/lean.json"), Path.of("..", "lean.json"));
        refused(new String[] {"off", "lean"}, "notes/lean.json", "found a link");
        Files.createSymbolicLink(shot.folder().resolve("notes/far.json"), place.resolve("nowhere"));
        refused(new String[] {"copy", "open", "--frame", "1005", "--id", "far"}, "notes/far.json");
    }

    /** 200 random changes, all taken back in turn, leave the exact bytes of every note file; odd texts are among them. */
    @ParameterizedTest
    @ValueSource(longs = 20261201)
    void allTakenBackLeavesTheVeryBytes(long seed) throws IOException {
        shot.write("notes/marked.json", ("\uFEFF" + SmallShot.OPEN.replace("Open", "\u00d6ffne \uD83D\uDCA8\u2028").replace("\n", "\r\n")));
        shot.write("notes/flat.json", SmallShot.LEAN.replaceAll("\\s*\\n\\s*", "").getBytes(StandardCharsets.UTF_8));
        SortedMap<String, String> before = notes();
        Random random = new Random(seed);
        List<Map<String, String>> states = new ArrayList<>();
        while (states.size() < 200) {
            List<String> ids = new ArrayList<>(notes().keySet());
            String id = ids.isEmpty() ? "" : ids.get(random.nextInt(ids.size()));
            SortedMap<String, String> was = notes();
            String[] args = switch (random.nextInt(ids.size() < 3 ? 6 : 8)) {
                case 0, 1 -> new String[] {"off", id};
                case 2, 3 -> new String[] {"on", id};
                case 4 -> new String[] {"copy", id, "--frame", String.valueOf(1002 + random.nextInt(5)), "--id", "c"
                    + random.nextInt(40)};
                case 5 -> new String[] {"copy", id, "--frame", "1005", "--view", random.nextBoolean() ? "side" : "front", "--id",
                    "c" + random.nextInt(40)};
                default -> new String[] {"delete", id};
            };
            Run run = note(args);
            boolean taken = run.code() == 3 && run.err().contains("already");
            assertTrue(run.code() == 0 || taken, () -> "seed " + seed + ", " + String.join(" ", args) + ": " + run.err());
            if (run.code() == 0 && !run.out().contains("nothing was done")) {
                states.add(was);
            } else {
                assertEquals(was, notes(), "seed " + seed);
            }
        }
        for (int n = states.size() - 1; n >= 0; n--) {
            Run run = note("undo");
            assertEquals(0, run.code(), run.err());
            assertEquals(states.get(n), notes(), "seed " + seed + ", change " + n);
        }
        assertEquals(before, notes());
        assertEquals("", text(JOURNAL));
    }

    private Run note(String... args) {
        List<String> all = new ArrayList<>(List.of("note", args[0], shot.folder().toString()));
        all.addAll(Arrays.asList(args).subList(1, args.length));
        return Run.of(all.toArray(new String[0]));
    }

    private void refused(String[] args, String... phrases) {
        SortedMap<String, String> before = SmallShot.listing(shot.folder().resolve("notes"));
        Run run = note(args);
        assertEquals(3, run.code(), String.join(" ", args) + ": " + run.out() + run.err());
        String line = run.err().strip();
        assertTrue(line.lines().count() == 1 && line.startsWith("wispwright: ") && line.endsWith("."), line);
        for (String phrase : phrases) {
            assertTrue(line.contains(phrase), "'" + phrase + "' is not in: " + line);
        }
        assertEquals(before, SmallShot.listing(shot.folder().resolve("notes")), String.join(" ", args));
    }

    private String text(String file) throws IOException {
        return Files.readString(shot.folder().resolve(file));
    }

    /** Every file in the notes folder but the journal, hidden ones too. */
    private SortedMap<String, String> all() {
        SortedMap<String, String> all = SmallShot.listing(shot.folder().resolve("notes"));
        all.keySet().removeIf(name -> name.endsWith(".jsonl"));
        return all;
    }

    /** Every note file by id, its bytes as Latin-1 so that none is lost. */
    private SortedMap<String, String> notes() throws IOException {
        SortedMap<String, String> all = new TreeMap<>();
        try (var files = Files.list(shot.folder().resolve("notes"))) {
            for (Path file : files.filter(f -> f.toString().endsWith(".json")).toList()) {
                String name = file.getFileName().toString();
                all.put(name.substring(0, name.length() - 5), Files.readString(file, StandardCharsets.ISO_8859_1));
            }
        }
        return all;
    }
}

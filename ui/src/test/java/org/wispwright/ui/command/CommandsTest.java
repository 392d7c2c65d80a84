package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.SortedMap;
import java.util.stream.Stream;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.ui.job.Cancel;

class CommandsTest {
    @TempDir
    private Path place;

    @Test
    void simulateMakesTakeZeroAndPictureDrawsIt() throws IOException {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        Run made = Run.of("simulate", shot.folder().toString());
        assertEquals(0, made.code(), made.err());
        assertTrue(Files.isRegularFile(shot.folder().resolve("takes/000/density.1006.npy")));
        assertTrue(Files.isRegularFile(shot.folder().resolve("takes/000/take.json")));
        Path file = place.resolve("front.png");
        Run drawn = Run.of("picture", shot.folder().toString(), "--take", "0", "--frame", "1006", "--view", "front", "--out",
                file.toString());
        assertEquals(0, drawn.code(), drawn.err());
        assertEquals(48, ImageIO.read(file.toFile()).getWidth());
        assertEquals(64, ImageIO.read(file.toFile()).getHeight());
    }

    @Test
    void simulateAgainDoesNothing() {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        assertEquals(0, Run.of("simulate", shot.folder().toString()).code());
        SortedMap<String, String> before = SmallShot.listing(place);
        Run again = Run.of("simulate", shot.folder().toString());
        assertEquals(0, again.code(), again.err());
        assertTrue(again.out().contains("nothing was done"), again.out());
        assertEquals(before, SmallShot.listing(place));
    }

    @Test
    void aTakeOfAnotherSetUpIsRefusedAndKept() {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        assertEquals(0, Run.of("simulate", shot.folder().toString()).code());
        shot.swap("shot.json", "\"buoyancy\": 3.0", "\"buoyancy\": 4.0");
        SortedMap<String, String> before = SmallShot.listing(place);
        for (Run run : new Run[] {Run.of("simulate", shot.folder().toString()),
                Run.of("picture", shot.folder().toString(), "--take", "0", "--frame", "1006",
                "--view", "front", "--out", place.resolve("front.png").toString())}) {
            assertEquals(3, run.code(), run.err());
            assertTrue(run.err().contains("another set-up"), run.err());
        }
        assertEquals(before, SmallShot.listing(place));
    }

    @Test
    void sameBitsFromOneAndTwoThreads() {
        SmallShot one = SmallShot.in(place.resolve("one"));
        SmallShot two = SmallShot.in(place.resolve("two"));
        assertEquals(0, Run.of("simulate", one.folder().toString(), "--threads", "1").code());
        assertEquals(0, Run.of("simulate", two.folder().toString(), "--threads", "2").code());
        assertEquals(SmallShot.listing(one.folder()), SmallShot.listing(two.folder()));
    }

    @Test
    void cancelledLeavesNoHalfTake() {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        SortedMap<String, String> before = SmallShot.listing(place);
        Cancel cancel = new Cancel();
        cancel.wish();
        Run run = Run.of(cancel, "simulate", shot.folder().toString());
        assertEquals(130, run.code(), run.err());
        assertEquals(before, SmallShot.listing(place));
    }

    @Test
    void jsonIsOneObjectOnStandardOutput() throws IOException {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        JsonNode result = new ObjectMapper().readTree(Run.of("check", shot.folder().toString(), "--json").out());
        assertTrue(result.get("ok").booleanValue());
        assertEquals(2, result.get("notes").intValue());
        shot.swap("shot.json", "[8, 16, 8]", "[8, -16, 8]");
        JsonNode refused = new ObjectMapper().readTree(Run.of("simulate", shot.folder().toString(), "--json").out());
        assertEquals(3, refused.get("exitCode").intValue());
        assertEquals("/grid/cells/1", refused.get("findings").get(0).get("pointer").textValue());
    }

    /** A handle pulled beyond two pins turns the picture over between them: said by check, with the place, and counted by compare. */
    @Test
    void aFoldIsSaidByCheckAndCompare() throws IOException {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        assertFalse(Run.of("check", shot.folder().toString()).out().contains("folds"));
        shot.swap("notes/lean.json", "\"to\": [0.31, 0.8]", "\"to\": [0.4, 0.995]");
        Run check = Run.of("check", shot.folder().toString());
        assertEquals(0, check.code(), check.err());
        assertTrue(check.out().contains("Note lean: its warp folds the picture over in "), check.out());
        JsonNode checked = new ObjectMapper().readTree(Run.of("check", shot.folder().toString(), "--json").out());
        assertEquals("lean", checked.get("foldingNotes").get(0).textValue());
        assertEquals(0, Run.of("simulate", shot.folder().toString()).code());
        Run compare = Run.of("compare", shot.folder().toString(), "--takes", "0,0", "--out", place.resolve("review").toString());
        assertEquals(0, compare.code(), compare.err());
        assertTrue(compare.out().contains("its warp folds the picture over in ") && compare.out().contains(", mass "), compare.out());
        JsonNode notes = new ObjectMapper().readTree(place.resolve("review/compare.json").toFile()).get("notes");
        assertTrue(notes.get(0).get("foldedCells").intValue() > 0 && notes.get(0).get("worstJacobian").doubleValue() < 0, notes.toString());
        assertEquals(2, notes.get(0).get("worstFold").size());
        assertEquals(0, notes.get(1).get("foldedCells").intValue());
        assertFalse(notes.get(1).has("worstFold"));
        // A take compared with itself has the original's mass; the note that adds and removes wants another.
        assertEquals(notes.get(1).get("massBefore").doubleValue(), notes.get(1).get("massGot").doubleValue());
        assertTrue(notes.get(1).get("massWanted").doubleValue() != notes.get(1).get("massBefore").doubleValue());
        assertTrue(notes.get(1).get("massBefore").doubleValue() > 0.01);
    }

    /** A take that is the original's copy has met nothing: 1 - 1 = 0, and all of the wish is still apart. */
    @Test
    void compareMeasuresEveryNoteAndDrawsTheSheet() throws IOException {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        assertEquals(0, Run.of("simulate", shot.folder().toString()).code());
        copy(shot.folder().resolve("takes/000"), shot.folder().resolve("takes/001"));
        Path out = place.resolve("review");
        Run run = Run.of("compare", shot.folder().toString(), "--takes", "0,1", "--out", out.toString(), "--json");
        assertEquals(0, run.code(), run.err());
        JsonNode notes = new ObjectMapper().readTree(run.out()).get("notes");
        assertEquals(2, notes.size());
        for (JsonNode note : notes) {
            assertEquals(0.0, note.get("met").doubleValue(), note.toString());
            assertEquals(1.0, note.get("finestErrorRatio").doubleValue(), note.toString());
            assertEquals(0.0, note.get("lossFall").doubleValue(), 1e-12, note.toString());
            assertEquals(0.0, note.get("holdChange").doubleValue(), note.toString());
        }
        assertEquals(48, ImageIO.read(out.resolve("lean.difference.png").toFile()).getWidth());
        assertTrue(ImageIO.read(out.resolve("sheet.png").toFile()).getWidth() > 1000);
        assertEquals(11, SmallShot.listing(out).size() - 1, SmallShot.listing(out).keySet().toString());
    }

    @Test
    void compareIntoAFileIsRefused() throws IOException {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        assertEquals(0, Run.of("simulate", shot.folder().toString()).code());
        Path out = Files.writeString(place.resolve("review"), "taken");
        Run run = Run.of("compare", shot.folder().toString(), "--takes", "0,0", "--out", out.toString());
        assertEquals(3, run.code(), run.err());
        assertEquals("taken", Files.readString(out));
    }

    @Test
    void measureTellsItsFigures() throws IOException {
        Run run = Run.of("measure", "--grid", "8", "--frames", "3", "--threads", "1", "--json");
        assertEquals(0, run.code(), run.err());
        JsonNode figures = new ObjectMapper().readTree(run.out());
        for (String key : new String[] {"stepNanosACell", "forwardSeconds", "gradientSeconds", "ratio", "peakMemoryBytes"}) {
            assertTrue(figures.get(key).doubleValue() > 0, key);
        }
        double sum = 0;
        for (JsonNode share : figures.get("gradientShare")) {
            sum += share.doubleValue();
        }
        assertEquals(1, sum, 1e-9);
        assertTrue(Run.of("measure", "--grid", "8", "--frames", "3").out().contains("projection back"));
    }

    @Test
    void measureBeyondTheMemoryIsRefused() {
        Run run = Run.of("measure", "--grid", "512", "--frames", "3", "--memory", "1M");
        assertEquals(3, run.code(), run.err());
        assertTrue(run.err().contains("512x512x512 cells"), run.err());
    }

    @Test
    void aTakeThatIsNotThereIsRefused() {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        Run run = Run.of("picture", shot.folder().toString(), "--take", "3", "--frame", "1006", "--view", "front", "--out",
                place.resolve("a.png").toString());
        assertEquals(3, run.code());
        assertTrue(run.err().contains("takes/003") && run.err().contains("simulate"), run.err());
    }

    @Test
    void aDamagedVolumeIsRefused() throws IOException {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        assertEquals(0, Run.of("simulate", shot.folder().toString()).code());
        Path volume = shot.folder().resolve("takes/000/density.1006.npy");
        byte[] whole = Files.readAllBytes(volume);
        Files.write(volume, Arrays.copyOf(whole, whole.length - 8));
        Run run = Run.of("picture", shot.folder().toString(), "--take", "0", "--frame", "1006", "--view", "front", "--out",
                place.resolve("a.png").toString());
        assertEquals(3, run.code(), run.err());
        assertTrue(run.err().contains("density.1006.npy"), run.err());
        assertFalse(Files.exists(place.resolve("a.png")));
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "paint", "check", "check a b", "check . --memory lots", "check . --memory -2G", "check . --memory 0",
            "check . --colour red",
        "simulate . --threads 0", "simulate . --threads many", "compare . --takes 0 --out x", "measure --grid 4", "measure --frames 1",
                "measure --grid big", "measure extra", "note", "note paint .", "note list",
                "note off .", "note copy . a", "note copy . a --frame x", "note undo", "solve . --until soon", "solve . --until loss=2",
                "solve . --until iterations=0.5",
                "solve . --until seconds=0", "compare . --takes a,b --out x", "picture . --take 0",
                "picture . --take x --frame 1 --view v --out a.png",
        "picture . --take 0 --frame 1 --view v --out a.gif", "picture . --take 0 --frame 1 --view v --out a.png --height 0"})
    void wrongUsageIsTwo(String line) {
        Run run = Run.of(line.isEmpty() ? new String[0] : line.split(" "));
        assertEquals(2, run.code(), line + ": " + run.err());
        assertEquals(1, run.err().strip().lines().count(), run.err());
        assertTrue(run.err().contains("--help"), run.err());
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "tour", "check", "simulate", "picture", "solve", "compare", "measure", "note", "note list",
        "note off", "note on", "note copy", "note delete", "note undo"})
    void helpShowsAnExample(String command) {
        Run run = command.isEmpty() ? Run.of("--help") : Run.of((command + " --help").split(" "));
        assertEquals(0, run.code());
        assertTrue(run.out().contains("java -jar wispwright.jar"), run.out());
    }

    private static void copy(Path from, Path to) throws IOException {
        Files.createDirectory(to);
        try (Stream<Path> files = Files.list(from)) {
            for (Path file : files.toList()) {
                Files.copy(file, to.resolve(file.getFileName()));
            }
        }
    }

    @Test
    void theVersionIsTheBuilds() {
        Run run = Run.of("--version");
        assertTrue(run.out().matches("wispwright [0-9]+\\.[0-9]+\\.[0-9]+\\S*\\s*"), run.out());
    }

    @ParameterizedTest
    @CsvSource({"2G, 2147483648", "512M, 536870912", "1.5g, 1610612736", "2048k, 2097152", "3GiB, 3221225472", "1048576, 1048576"})
    void sizes(String text, long bytes) {
        assertEquals(bytes, ByteSize.parse(text).bytes());
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "G", "2X", "-1G", "1e9", "NaN", "10K", "2 G G", "999999T"})
    void sizesThatAreNone(String text) {
        assertThrows(IllegalArgumentException.class, () -> ByteSize.parse(text));
    }
}

package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SortedMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.render.picture.ExrWriting;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.PngFile;
import org.wispwright.render.volume.NpyFile;

/** {@code note paint-over} and {@code note silhouette}: notes of painted frames, and what they refuse, leaving nothing behind. */
class NotePaintOverTest {
    private static final ObjectMapper JSON = new ObjectMapper();
    /** The layers of a 2 x 3 paint-over in which one pixel loses half its opacity. */
    private static final float[] LAYERS = new float[2 * 3 * 4];

    static {
        LAYERS[0] = -0.5f;
        LAYERS[3] = 1;
    }

    @TempDir
    private static Path made;
    @TempDir
    private Path place;
    private SmallShot shot;

    /** One shot with its original, a frame of it, and the frame painted over; every test works on a copy. */
    @BeforeAll
    static void aShotWithItsOriginal() throws IOException {
        SmallShot yard = SmallShot.in(made.resolve("yard"));
        assertEquals(0, Run.of("simulate", yard.folder().toString()).code());
        Run drawn = Run.of("picture", yard.folder().toString(), "--take", "0", "--frame", "1006", "--view", "front", "--out",
                made.resolve("before.png").toString());
        assertEquals(0, drawn.code(), drawn.err());
        Picture painted = PngFile.read(made.resolve("before.png"));
        paint(painted);
        PngFile.write(painted, made.resolve("after.png"), PngFile.Depth.EIGHT);
    }

    @BeforeEach
    void aCopyOfIt() throws IOException {
        try (Stream<Path> all = Files.walk(made)) {
            for (Path path : all.filter(Files::isRegularFile).toList()) {
                Path copy = place.resolve(made.relativize(path).toString());
                Files.createDirectories(copy.getParent());
                Files.copy(path, copy, StandardCopyOption.REPLACE_EXISTING);
            }
        }
        shot = SmallShot.in(place.resolve("yard"));
    }

    /** The left half of the picture painted with the shot's background: the smoke there is gone. */
    private static void paint(Picture frame) {
        for (int p = 0; p < frame.width() * frame.height(); p++) {
            if (p % frame.width() < frame.width() / 2) {
                System.arraycopy(new float[] {0.1f, 0.14f, 0.2f, 1}, 0, frame.rgba(), 4 * p, 4);
            }
        }
    }

    @Test
    void aPaintedFrameBecomesANote() throws IOException {
        Run run = paintOver("half", "before.png", "after.png");
        assertEquals(0, run.code(), run.err());
        assertTrue(run.out().contains("Note 'half' made: frame 1006, view front. Smoke was added or removed on"), run.out());
        JsonNode note = JSON.readTree(shot.folder().resolve("notes/half.json").toFile());
        String layers = note.at("/retouch/0/paintOver/layers").asText();
        assertTrue(layers.matches("notes/half\\.paint/[0-9a-f]{16}\\.npy"), layers);
        assertEquals(1, Files.readAllLines(shot.folder().resolve("notes/.journal.jsonl")).size());
        Run check = Run.of("check", shot.folder().toString());
        assertEquals(0, check.code(), check.err());
        assertTrue(check.out().contains("notes 3"), check.out());
        NpyFile.Contents contents = NpyFile.read(shot.folder().resolve(layers));
        assertArrayEquals(new int[] {64, 48, 4}, contents.shape());
        assertWantedIsHalf("half");
    }

    /** The smoke on the left is gone and that on the right is as it was, to 0.03 of opacity: what was painted, seen through 'compare'. */
    private void assertWantedIsHalf(String id) throws IOException {
        for (String other : new String[] {"lean", "open"}) {
            Run.of("note", "off", shot.folder().toString(), other);
        }
        Run compare = Run.of("compare", shot.folder().toString(), "--takes", "0,0", "--out", place.resolve("sheet").toString());
        assertEquals(0, compare.code(), compare.err());
        Picture wanted = PngFile.read(place.resolve("sheet/" + id + ".wanted.png"));
        Picture painted = PngFile.read(place.resolve("after.png"));
        double error = 0;
        for (int n = 0; n < wanted.rgba().length; n++) {
            error += Math.abs(wanted.rgba()[n] - painted.rgba()[n]) / wanted.rgba().length;
        }
        double change = 0;
        Picture before = PngFile.read(place.resolve("before.png"));
        for (int n = 0; n < wanted.rgba().length; n++) {
            change += Math.abs(before.rgba()[n] - painted.rgba()[n]) / wanted.rgba().length;
        }
        assertTrue(change > 0.003 && error < 0.1 * change, "error " + error + " of a change of " + change);
    }

    @Test
    void theAnswerForProgramsHasTheFigures() throws IOException {
        JsonNode said = JSON.readTree(paintOver("half", "before.png", "after.png", "--json").out());
        assertTrue(said.get("made").asBoolean());
        assertEquals("opacity", said.get("way").asText());
        assertTrue(said.get("massAfter").asDouble() < 0.7 * said.get("massBefore").asDouble(), said.toString());
        assertTrue(said.get("share").asDouble() > 0 && said.get("confidence").asDouble() > 0.9, said.toString());
    }

    @Test
    void undoTakesTheNoteBackAndItsLayersStayWhole() throws IOException {
        paintOver("half", "before.png", "after.png");
        String text = Files.readString(shot.folder().resolve("notes/half.json"));
        Run undo = Run.of("note", "undo", shot.folder().toString());
        assertEquals(0, undo.code(), undo.err());
        assertTrue(undo.out().contains("note paint-over --id half --frame 1006 --view front"), undo.out());
        assertFalse(Files.exists(shot.folder().resolve("notes/half.json")));
        assertEquals(1, files(shot.folder().resolve("notes/half.paint")).size());
        assertEquals(0, paintOver("half", "before.png", "after.png").code());
        assertEquals(text, Files.readString(shot.folder().resolve("notes/half.json")));
        assertEquals(1, files(shot.folder().resolve("notes/half.paint")).size());
    }

    @Test
    void aCopyNamesTheSameLayers() throws IOException {
        paintOver("half", "before.png", "after.png");
        assertEquals(0, Run.of("note", "copy", shot.folder().toString(), "half", "--frame", "1005").code());
        assertEquals(0, Run.of("check", shot.folder().toString()).code());
    }

    /** The same frame, and the same with every code off by at most one: no note, and the program says so. */
    @Test
    void noiseAloneMakesNoNote() throws IOException {
        Picture noisy = PngFile.read(place.resolve("before.png"));
        for (int n = 0; n < noisy.rgba().length; n++) {
            noisy.rgba()[n] = (n & 3) == 3 ? 1 : noisy.rgba()[n] * (n % 5 == 0 ? 1.008f : n % 3 == 0 ? 0.992f : 1);
        }
        PngFile.write(noisy, place.resolve("noisy.png"), PngFile.Depth.EIGHT);
        for (String after : new String[] {"before.png", "noisy.png"}) {
            SortedMap<String, String> before = SmallShot.listing(shot.folder());
            Run run = paintOver("none", "before.png", after);
            assertEquals(0, run.code(), run.err());
            assertTrue(run.out().startsWith("Nothing changed beyond noise"), run.out());
            assertFalse(JSON.readTree(paintOver("none", "before.png", after, "--json").out()).get("made").asBoolean());
            assertEquals(before, SmallShot.listing(shot.folder()));
        }
    }

    @Test
    void sixteenBitsAndExrOnAnotherRaster() throws IOException {
        Run.of("picture", shot.folder().toString(), "--take", "0", "--frame", "1006", "--view", "front", "--height", "160", "--out",
                place.resolve("large.png").toString());
        Picture frame = PngFile.read(place.resolve("large.png"));
        PngFile.write(frame, place.resolve("large-before.png"), PngFile.Depth.SIXTEEN);
        ExrWriting.write(frame, place.resolve("large-before.exr"), ExrWriting.Depth.HALF);
        paint(frame);
        PngFile.write(frame, place.resolve("large-after.png"), PngFile.Depth.SIXTEEN);
        ExrWriting.write(frame, place.resolve("large-after.exr"), ExrWriting.Depth.HALF);
        Run png = paintOver("png", "large-before.png", "large-after.png");
        assertEquals(0, png.code(), png.err());
        Run undo = Run.of("note", "undo", shot.folder().toString());
        assertEquals(0, undo.code(), undo.err());
        Run exr = paintOver("exr", "large-before.exr", "large-after.exr");
        assertEquals(0, exr.code(), exr.err());
        assertWantedIsHalf("exr");
    }

    @Test
    void aSilhouetteBecomesANote() throws IOException {
        Picture matte = new Picture(96, 128);
        for (int p = 0; p < 96 * 128; p++) {
            float white = p / 96 > 90 && p % 96 > 30 && p % 96 < 80 ? 1 : 0;
            Arrays.fill(matte.rgba(), 4 * p, 4 * p + 4, white);
            matte.rgba()[4 * p + 3] = 1;
        }
        PngFile.write(matte, place.resolve("matte.png"), PngFile.Depth.EIGHT);
        Run run = note("silhouette", "shape", "--matte", place.resolve("matte.png").toString());
        assertEquals(0, run.code(), run.err());
        assertTrue(run.out().contains("Note 'shape' made"), run.out());
        assertEquals(0, Run.of("check", shot.folder().toString()).code());
    }

    @Test
    void whatDoesNotFitIsRefusedAndNothingChanges() throws IOException {
        Picture narrow = new Picture(48, 60);
        PngFile.write(narrow, place.resolve("narrow.png"), PngFile.Depth.EIGHT);
        Files.writeString(place.resolve("words.png"), "no picture");
        byte[] whole = Files.readAllBytes(place.resolve("after.png"));
        Files.write(place.resolve("cut.png"), Arrays.copyOf(whole, whole.length / 2));
        ExrWriting.write(PngFile.read(place.resolve("after.png")), place.resolve("after.exr"), ExrWriting.Depth.FLOAT);
        whole = Files.readAllBytes(place.resolve("after.exr"));
        Files.write(place.resolve("cut.exr"), Arrays.copyOf(whole, whole.length / 2));
        refused(paintOver("x", "before.png", "narrow.png"), "narrow.png: before is 48x64 pixels, after is 48x60 pixels, needs one size");
        refused(paintOver("x", "narrow.png", "narrow.png"), "narrow.png: the frame is 48x60 pixels, needs the aspect of the view, 48x64");
        refused(paintOver("x", "before.png", "words.png"), "words.png: the picture is not a PNG file");
        refused(paintOver("x", "before.png", "cut.png"), "cut.png: the picture is cut short");
        refused(paintOver("x", "before.png", "cut.exr"), "cut.exr: the picture is cut short");
        refused(paintOver("x", "missing.png", "after.png"), "missing.png: the picture does not exist");
        refused(paintOver("lean", "before.png", "after.png"), "notes/lean.json: found a note of this name already");
        refused(paintOver("../x", "before.png", "after.png"), "notes: found the id '../x'");
        refused(note("silhouette", "x", "--matte", place.resolve("narrow.png").toString()), "narrow.png: the matte is 48x60 pixels");
        refused(run("paint-over", "x", "1001", "front", "words", "--before", file("before.png"), "--after", file("after.png")),
                "shows no smoke");
        refused(run("paint-over", "x", "1009", "front", "words", "--before", file("before.png"), "--after", file("after.png")),
                "there is no frame 1009");
        refused(run("paint-over", "x", "1006", "back", "words", "--before", file("before.png"), "--after", file("after.png")),
                "there is no view 'back'");
        refused(run("paint-over", "x", "1006", "front", " ", "--before", file("before.png"), "--after", file("after.png")),
                "notes/x.json at /words: found empty text");
    }

    @Test
    void withoutTheOriginalItSaysHowToGetIt() throws IOException {
        SmallShot other = SmallShot.in(place.resolve("other"));
        Run run = Run.of("note", "paint-over", other.folder().toString(), "--id", "x", "--frame", "1006", "--view", "front", "--words", "w",
                "--before", file("before.png"), "--after", file("after.png"));
        assertEquals(3, run.code());
        assertTrue(run.err().contains("run 'simulate' first"), run.err());
    }

    @Test
    void damagedLayersAreFound() throws IOException {
        SmallShot other = SmallShot.in(place.resolve("other"));
        Path file = other.folder().resolve("notes/hole.paint/layers.npy");
        Files.createDirectories(file.getParent());
        write(other, "notes/hole.paint/layers.npy");
        NpyFile.write(file, new int[] {3, 2, 4}, LAYERS);
        assertEquals(0, Run.of("check", other.folder().toString()).code());
        byte[] good = Files.readAllBytes(file);
        Files.write(file, Arrays.copyOf(good, good.length - 3));
        found(other, "notes/hole.json at /retouch/0/paintOver/layers", "is cut short");
        Files.write(file, "something else".getBytes());
        found(other, "is not an NPY file");
        NpyFile.write(file, new int[] {24}, LAYERS);
        found(other, "of shape [24], needs (rows, columns, 4)");
        NpyFile.write(file, new int[] {2, 4, 3}, LAYERS);
        found(other, "of shape [2, 4, 3]");
        NpyFile.write(file, new int[] {3, 2, 4}, changed(0, -1.5f));
        found(other, "change of pixel (0, 0) is -1.5, needs a number from -1 to 1");
        NpyFile.write(file, new int[] {3, 2, 4}, changed(7, 2));
        found(other, "mask of pixel (1, 0) is 2.0");
        NpyFile.write(file, new int[] {3, 2, 4}, changed(5, Float.NaN));
        found(other, "holds NaN as value 5");
        Files.delete(file);
        found(other, "notes/hole.json at /retouch/0/paintOver/layers", "no such file");
        write(other, "../layers.npy");
        found(other, "leaves the shot folder");
        other.write("notes/hole.json", HOLE.replace("\"layers\": \"FILE\"", "\"layer\": \"x\""));
        found(other, "unknown key 'layer'", "did you mean 'layers'");
    }

    private static final String HOLE = """
            {"wispwright": 1, "words": "A hole.", "frame": 1006, "view": "front", "retouch": [{"paintOver": {"layers": "FILE"}}]}
            """;

    private static void write(SmallShot shot, String file) {
        shot.write("notes/hole.json", HOLE.replace("FILE", file));
    }

    private static float[] changed(int at, float value) {
        float[] layers = LAYERS.clone();
        layers[at] = value;
        return layers;
    }

    private static void found(SmallShot shot, String... words) {
        Run run = Run.of("check", shot.folder().toString());
        assertEquals(3, run.code(), run.out());
        for (String word : words) {
            assertTrue((run.out() + run.err()).contains(word), run.out() + run.err());
        }
    }

    private void refused(Run run, String why) {
        assertEquals(3, run.code(), run.out() + run.err());
        assertTrue(run.err().contains(why), run.err());
        assertEquals(1, run.err().strip().lines().count(), run.err());
        assertFalse(Files.exists(shot.folder().resolve("notes/x.json")));
        assertFalse(Files.exists(shot.folder().resolve("notes/x.paint")));
        assertFalse(Files.exists(shot.folder().resolve("notes/.journal.jsonl")));
    }

    private Run paintOver(String id, String before, String after, String... more) {
        List<String> args = new ArrayList<>(List.of("--before", file(before), "--after", file(after)));
        args.addAll(List.of(more));
        return note("paint-over", id, args.toArray(String[]::new));
    }

    private Run note(String command, String id, String... more) {
        return run(command, id, "1006", "front", "Take the left half away.", more);
    }

    private Run run(String command, String id, String frame, String view, String words, String... more) {
        List<String> args = new ArrayList<>(List.of("note", command, shot.folder().toString(), "--id", id, "--frame", frame, "--view", view,
                "--words", words));
        args.addAll(List.of(more));
        return Run.of(args.toArray(String[]::new));
    }

    private String file(String name) {
        return place.resolve(name).toString();
    }

    private static List<Path> files(Path folder) throws IOException {
        try (Stream<Path> all = Files.list(folder)) {
            return all.toList();
        }
    }
}

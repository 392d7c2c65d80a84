package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.SortedMap;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.PngFile;

/** {@code retouch} on pictures whose answer can be worked out by hand, and on a take. */
class RetouchCommandTest {
    @TempDir
    private Path place;

    @BeforeEach
    void aPictureAndARetouch() throws IOException {
        Picture picture = new Picture(4, 2);
        for (int p = 0; p < 8; p++) {
            float alpha = p * 36 / 255f;
            for (int c = 0; c < 3; c++) {
                picture.rgba()[4 * p + c] = alpha * 0.25f * (c + 1);
            }
            picture.rgba()[4 * p + 3] = alpha;
        }
        PngFile.write(picture, place.resolve("in.png"), PngFile.Depth.EIGHT);
        write("half.json", 0.5);
        write("none.json", 0);
    }

    /** A removal of one half that covers the whole picture leaves half of every alpha: by hand 28 x 36 / 255 before. */
    @Test
    void halfOfTheSmokeIsLeft() throws IOException {
        Run run = Run.of("retouch", "--picture", at("in.png"), "--retouch", at("half.json"), "--out", at("out.png"), "--bits", "16",
                "--json");
        assertEquals(0, run.code(), run.err());
        JsonNode said = new ObjectMapper().readTree(run.out());
        assertEquals(28 * 36 / 255.0 / 4, said.get("massBefore").doubleValue(), 1e-6);
        assertEquals(14 * 36 / 255.0 / 4, said.get("massAfter").doubleValue(), 1e-6);
        Picture in = PngFile.read(place.resolve("in.png"));
        Picture out = PngFile.read(place.resolve("out.png"));
        for (int n = 0; n < 32; n++) {
            assertEquals(in.rgba()[n] / 2, out.rgba()[n], 3e-5, "value " + n + ": half, to 16 bits");
        }
        assertTrue(Run.of("retouch", "--picture", at("in.png"), "--retouch", at("half.json"), "--out", at("out.png")).out()
                .contains(" after (-50.0 %)"));
    }

    /** A retouch that does nothing gives the file's codes back. */
    @Test
    void nothingDoneIsNothingChanged() throws IOException {
        assertEquals(0, Run.of("retouch", "--picture", at("in.png"), "--retouch", at("none.json"), "--out", at("out.png")).code());
        assertArrayEquals(PngFile.read(place.resolve("in.png")).rgba(), PngFile.read(place.resolve("out.png")).rgba());
    }

    @Test
    void aFrameOfATakeWithANotesRetouchOrAFiles() throws IOException {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        assertEquals(0, Run.of("simulate", shot.folder().toString()).code());
        Run byNote = Run.of("retouch", "--shot", shot.folder().toString(), "--note", "open", "--clear", "--out", at("note.png"), "--json");
        assertEquals(0, byNote.code(), byNote.err());
        shot.write("open.json", "{\"wispwright\": 1, " + SmallShot.OPEN.substring(SmallShot.OPEN.indexOf("\"retouch\"")));
        Run byFile = Run.of("retouch", "--shot", shot.folder().toString(), "--retouch", shot.folder().resolve("open.json").toString(),
                "--frame", "1006", "--view", "side", "--clear", "--out", at("file.png"));
        assertEquals(0, byFile.code(), byFile.err());
        assertArrayEquals(Files.readAllBytes(place.resolve("note.png")), Files.readAllBytes(place.resolve("file.png")));
        Run.of("picture", shot.folder().toString(), "--take", "0", "--frame", "1006", "--view", "side", "--clear", "--out",
                at("plain.png"));
        Picture plain = PngFile.read(place.resolve("plain.png"));
        double sum = 0;
        for (int n = 3; n < plain.rgba().length; n += 4) {
            sum += plain.rgba()[n];
        }
        double before = new ObjectMapper().readTree(byNote.out()).get("massBefore").doubleValue();
        assertEquals(sum / (64 * 64), before, 48 * 0.5 / 255 / 64, "to the rounding of 8 bits");
        assertTrue(before > 0.001);
        refused("shot.json", "no view 'x'", "--shot", shot.folder().toString(), "--retouch", at("half.json"), "--frame", "1006",
                "--view", "x");
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {"--picture DIR/no.png --retouch DIR/half.json | no.png | does not exist",
        "--picture DIR/half.json --retouch DIR/half.json | half.json | PNG",
        "--picture DIR/in.png --retouch DIR/no.json | no.json | no such file",
        "--picture DIR/in.png --retouch DIR/in.png | in.png | UTF-8", "--shot DIR/nowhere --note x | nowhere | found nothing",
        "--shot DIR/yard --note leann | notes/leann.json | did you mean 'lean'",
        "--shot DIR/yard --note lean | takes/000 | run 'simulate' first",
        "--shot DIR/yard --note lean --take 7 | takes/007 | no such take",
        "--shot DIR/yard --note lean --view x | shot.json | no view 'x'",
        "--shot DIR/yard --note lean --frame 5 | shot.json | no frame 5"})
    void badInput(String line, String one, String two) {
        SmallShot.in(place.resolve("yard"));
        refused(one, two, line.replace("DIR", place.toString()).split(" "));
    }

    @Test
    void aPlaceThatCannotBeWrittenTo() {
        SortedMap<String, String> before = SmallShot.listing(place);
        Run run = Run.of("retouch", "--picture", at("in.png"), "--retouch", at("half.json"), "--out", at("no/such/out.png"));
        assertEquals(3, run.code(), run.err());
        assertTrue(run.err().contains("cannot be written"), run.err());
        assertEquals(before, SmallShot.listing(place));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {"--retouch a | --picture and --shot", "--picture a --shot b --retouch c | --picture and --shot",
        "--picture a | --retouch and --note", "--shot a --note b --retouch c | --retouch and --note",
        "--picture a --note b | --note needs --shot",
        "--picture a --retouch b --take 0 | need --shot", "--picture a --retouch b --clear | need --shot",
        "--shot a --retouch b --frame 3 | --frame and --view", "--picture a --retouch b --bits 12 | --bits 12"})
    void wrongUsage(String line, String phrase) {
        List<String> args = new ArrayList<>(List.of("retouch", "--out", at("out.png")));
        args.addAll(List.of(line.split(" ")));
        Run run = Run.of(args.toArray(new String[0]));
        assertEquals(2, run.code(), run.err());
        assertTrue(run.err().contains(phrase), run.err());
        assertEquals(2, Run.of("retouch", "--picture", "a", "--retouch", "b", "--out", "out.jpg").code());
    }

    private void refused(String one, String two, String... options) {
        SortedMap<String, String> before = SmallShot.listing(place);
        List<String> args = new ArrayList<>(List.of("retouch", "--out", at("out.png")));
        args.addAll(List.of(options));
        Run run = Run.of(args.toArray(new String[0]));
        assertEquals(3, run.code(), args + ": " + run.out() + run.err());
        String said = run.err().strip();
        assertTrue(said.lines().count() == 1 && said.startsWith("wispwright: ") && said.endsWith(".") && !said.contains("Exception"), said);
        assertTrue(said.contains(one) && said.contains(two), said);
        assertEquals(before, SmallShot.listing(place), args.toString());
    }

    private void write(String file, double strength) throws IOException {
        Files.writeString(place.resolve(file), """
                {"wispwright": 1, "retouch": [{"stroke": {"brush": "remove", "radius": 1, "strength": %s, "softEdge": 0,
                 "line": [[0, 0.5], [2, 0.5]]}}]}
                """.formatted(strength));
    }

    private String at(String name) {
        return place.resolve(name).toString();
    }
}

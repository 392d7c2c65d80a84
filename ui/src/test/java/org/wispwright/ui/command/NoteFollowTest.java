package org.wispwright.ui.command;

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
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.PngFile;

/** A puff that rises for a second: a retouch that follows it stays on it, one that is copied does not. */
class NoteFollowTest {
    @TempDir
    private Path place;

    /**
     * Hand-derived: thin smoke's opacity is its density summed along the ray, so once the source is shut the centroid of the picture moves
     * with the mean velocity of the smoke, weighted by opacity. Points spread over the puff, each weighing what the opacity there was,
     * keep their mean on that centroid if they follow; to a tenth of the way, for the points are few and the cells coarse.
     */
    @ParameterizedTest
    @CsvSource({"side, 1", "front, 1", "side, 3"})
    void aFollowedRetouchStaysOnItsPuff(String view, int substeps) throws IOException {
        SmallShot shot = risingPuff(substeps);
        Picture first = picture(shot, view, 1010);
        List<double[]> points = new ArrayList<>();
        for (int y = 1; y < first.height(); y += 2) {
            for (int x = 1; x < first.width(); x += 2) {
                if (first.at(x, y, 3) > 0) {
                    points.add(new double[] {(x + 0.5) / first.height(), (y + 0.5) / first.height(), first.at(x, y, 3)});
                }
            }
        }
        double[] end = centroid(picture(shot, view, 1022));
        shot.write("notes/dab.json", dabs(view, 1010, points));
        assertEquals(0, Run.of("note", "carry", shot.folder().toString(), "dab", "--frames", "1022", "--id", "still").code());
        Run run = Run.of("note", "carry", shot.folder().toString(), "dab", "--frames", "1012-1022", "--every", "5", "--follow", "0");
        assertEquals(0, run.code(), run.err());
        assertTrue(run.out().contains("dab-1012, dab-1017, dab-1022 of 'dab', following take 0"), run.out());
        List<double[]> carried = positions(shot, "dab-1022", points);
        double still = distance(mean(positions(shot, "still-1022", points)), end);
        double followed = distance(mean(carried), end);
        assertTrue(still > 0.08, "the puff goes " + still + " heights");
        assertTrue(followed < 0.1 * still, view + ": followed to " + followed + ", still " + still);
        // Back from the end every point arrives where it came from, to the error of the steps.
        shot.write("notes/back.json", dabs(view, 1022, carried));
        assertEquals(0, Run.of("note", "carry", shot.folder().toString(), "back", "--frames", "1010", "--follow", "0").code());
        List<double[]> back = positions(shot, "back-1010", points);
        for (int n = 0; n < points.size(); n++) {
            double off = distance(back.get(n), points.get(n));
            assertTrue(off < 0.02, "there and back, point " + n + " by " + off);
        }
    }

    @Test
    void badTakesAreRefusedWithNothingWritten() throws IOException {
        SmallShot shot = risingPuff(1);
        shot.write("notes/dab.json", dabs("side", 1010, List.of(new double[] {0.3, 0.8, 1})));
        refused(shot, "takes/003", "--follow", "3");
        shot.write("takes/000/velocity-y.1012.npy", "not numbers");
        refused(shot, "takes/000/velocity-y.1012.npy", "--follow", "0");
        shot.swap("shot.json", "\"buoyancy\": 12.0", "\"buoyancy\": 11.0");
        refused(shot, "another set-up", "--follow", "0");
    }

    private void refused(SmallShot shot, String phrase, String... options) {
        SortedMap<String, String> before = SmallShot.listing(place);
        Run run = Run.of("note", "carry", shot.folder().toString(), "dab", "--frames", "1008-1014", options[0], options[1]);
        assertEquals(3, run.code(), run.out());
        assertTrue(run.err().contains(phrase) && run.err().strip().lines().count() == 1, run.err());
        assertEquals(before, SmallShot.listing(place));
    }

    private SmallShot risingPuff(int substeps) {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        shot.swap("shot.json", "\"last\": 1006", "\"last\": 1022");
        shot.swap("shot.json", "\"frames\": [1001, 1006]", "\"frames\": [1001, 1004]");
        shot.swap("shot.json", "\"buoyancy\": 3.0", "\"buoyancy\": 12.0");
        shot.swap("shot.json", "\"extinctionPerMetre\": 6", "\"extinctionPerMetre\": 0.05");
        shot.swap("shot.json", "\"substeps\": 1", "\"substeps\": " + substeps);
        assertEquals(0, Run.of("simulate", shot.folder().toString()).code());
        return shot;
    }

    private static String dabs(String view, int frame, List<double[]> points) {
        String line = points.stream().map(p -> "[" + p[0] + ", " + p[1] + "]").collect(Collectors.joining(", "));
        return """
                {"wispwright": 1, "words": "Thin the puff.", "frame": %d, "view": "%s",
                 "retouch": [{"stroke": {"brush": "remove", "radius": 0.05, "line": [%s]}}]}
                """.formatted(frame, view, line);
    }

    private Picture picture(SmallShot shot, String view, int frame) throws IOException {
        Path file = place.resolve("smoke.png");
        Files.writeString(place.resolve("nothing.json"), """
                {"wispwright": 1, "retouch": [{"stroke": {"brush": "add", "radius": 1, "strength": 0, "line": [[0, 0]]}}]}
                """);
        assertEquals(0, Run.of("retouch", "--shot", shot.folder().toString(), "--frame", String.valueOf(frame), "--view", view, "--clear",
                "--bits", "16", "--retouch", place.resolve("nothing.json").toString(), "--out", file.toString()).code());
        return PngFile.read(file);
    }

    private static double[] centroid(Picture picture) {
        List<double[]> pixels = new ArrayList<>();
        for (int p = 0; p < picture.width() * picture.height(); p++) {
            pixels.add(new double[] {(p % picture.width() + 0.5) / picture.height(), (p / picture.width() + 0.5) / picture.height(),
                picture.rgba()[4 * p + 3]});
        }
        return mean(pixels);
    }

    /** Of x and y, by the weight that is the third number. */
    private static double[] mean(List<double[]> points) {
        double[] sums = new double[3];
        for (double[] p : points) {
            sums[0] += p[2] * p[0];
            sums[1] += p[2] * p[1];
            sums[2] += p[2];
        }
        return new double[] {sums[0] / sums[2], sums[1] / sums[2]};
    }

    /** The points of a note's stroke, with the weights of others. */
    private static List<double[]> positions(SmallShot shot, String id, List<double[]> weights) throws IOException {
        JsonNode line = new ObjectMapper().readTree(Files.readString(shot.folder().resolve("notes/" + id + ".json")))
                .at("/retouch/0/stroke/line");
        List<double[]> points = new ArrayList<>();
        for (int n = 0; n < weights.size(); n++) {
            points.add(new double[] {line.get(n).get(0).doubleValue(), line.get(n).get(1).doubleValue(), weights.get(n)[2]});
        }
        return points;
    }

    private static double distance(double[] a, double[] b) {
        return Math.hypot(a[0] - b[0], a[1] - b[1]);
    }
}

package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.render.volume.NpyFile;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.TakeRecord;

/**
 * Keys of shot.json that say what the air does beside plain smoke: read right, refused right, no part of a digest while they are not
 * there.
 */
class FlowKeysTest {
    /**
     * What the set-up of {@link SmallShot} had for a digest before any of these keys: its takes must stay its takes. By hand: sha256sum
     * of its five lines.
     */
    private static final String PLAIN = "f82a2c27d5489166661af0bb3ad4833916ce8ce455de6901add59e95b91dfcf6";

    @TempDir
    private Path place;
    private SmallShot shot;

    @BeforeEach
    void aGoodShot() {
        shot = SmallShot.in(place.resolve("yard"));
    }

    private FlowSetup flow() {
        return ShotCheck.require(shot.folder(), 1L << 30).flow();
    }

    private String digest() {
        return TakeRecord.digest(flow());
    }

    private void volume(String file, int[] shape, float value) throws IOException {
        float[] values = new float[Arrays.stream(shape).reduce(1, (a, b) -> a * b)];
        Arrays.fill(values, value);
        java.nio.file.Files.createDirectories(shot.folder().resolve(file).getParent());
        NpyFile.write(shot.folder().resolve(file), shape, values);
    }

    /** Adds a key beside the sources. */
    private void add(String json) {
        shot.swap("shot.json", "\"sources\":", json + ",\n  \"sources\":");
    }

    private void refused(String... phrases) {
        Refused.by(place, List.of("check", shot.folder().toString()), phrases);
        Refused.by(place, List.of("simulate", shot.folder().toString()), phrases);
    }

    @Test void withoutThemTheDigestIsTheOldOne() {
        assertEquals(PLAIN, digest());
    }

    @Test void everyFormOfObstacleCounts() throws IOException {
        volume("solids/rock.npy", new int[] {4, 5, 6}, -0.1f);
        add("""
            "obstacles": [
              {"name": "shelf", "box": {"sizeMetres": [1, 0.1, 1]}, "positionMetres": [1, 2, 1], "rotationRadians": [0, 0, 0.3]},
              {"name": "pipe", "cylinder": {"radiusMetres": 0.2, "lengthMetres": 2}, "positionMetres": [0.5, 1, 1]},
              {"name": "rock", "volume": {"file": "solids/rock.npy", "holds": "distance", "cellMetres": 0.1},
                "positionMetres": [1.5, 1, 1]},
              {"name": "drum", "ball": {"radiusMetres": 0.3}, "keys": [
                {"frame": 1001, "positionMetres": [0.5, 3, 1]}, {"frame": 1006, "positionMetres": [1.5, 3, 1],
                  "rotationRadians": [0, 1, 0]}]}
            ]""");
        FlowSetup flow = flow();
        assertEquals(4, flow.obstacles().size());
        assertEquals(1.0, flow.obstacles().get(3).position().at(1003.5).x(), 1e-12);
        String first = digest();
        assertNotEquals(PLAIN, first);
        shot.swap("shot.json", "\"name\": \"shelf\"", "\"name\": \"board\"");
        assertEquals(first, digest());
        shot.swap("shot.json", "[0, 1, 0]", "[0, 1.5, 0]");
        assertNotEquals(first, digest());
        shot.swap("shot.json", "[0, 1.5, 0]", "[0, 1, 0]");
        volume("solids/rock.npy", new int[] {4, 5, 6}, -0.2f);
        assertNotEquals(first, digest(), "the volume's values count");
        Run run = Run.of("simulate", shot.folder().toString());
        assertEquals(0, run.code(), run.err());
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '~', value = {
        "{'name': 'a', 'positionMetres': [1,1,1]}                                                     | /obstacles/0 | no form",
        "{'name': 'a', 'ball': {'radiusMetres': 1}, 'box': {'sizeMetres': [1,1,1]}, 'positionMetres': [1,1,1]} | /obstacles/0 | more "
                + "than one form",
        "{'name': 'a', 'ball': {'radiusMetres': -1}, 'positionMetres': [1,1,1]}                       | /obstacles/0/ball/radiusMetres "
                + "| above 0",
        "{'name': 'a', 'ball': {'radius': 1}, 'positionMetres': [1,1,1]}                              | /obstacles/0/ball/radius | "
                + "unknown key",
        "{'name': 'a', 'box': {'sizeMetres': [1,0,1]}, 'positionMetres': [1,1,1]}                     | /obstacles/0/box/sizeMetres/1 | "
                + "above 0",
        "{'name': 'a', 'ball': {'radiusMetres': 0.1}}                                                 | /obstacles/0 | neither",
        "{'name': 'a', 'ball': {'radiusMetres': 0.1}, 'positionMetres': [1,1,1], 'keys': []}          | /obstacles/0 | both",
        "{'name': 'a', 'ball': {'radiusMetres': 0.1}, 'keys': []}                                     | /obstacles/0/keys | a list of 0 "
                + "values",
        "{'name': 'a', 'ball': {'radiusMetres': 0.1}, 'keys': [{'frame': 1001}]}                      | /obstacles/0/keys/0 | no "
                + "'positionMetres'",
        "{'name': 'a', 'ball': {'radiusMetres': 0.1}, 'keys': [{'frame': 1002, 'positionMetres': [1,1,1]}, {'frame': 1002, "
                + "'positionMetres': [1,1,1]}]} | /obstacles/0/keys/1/frame | rise",
        "{'name': 'a', 'ball': {'radiusMetres': 0.1}, 'positionMetres': [90,1,1]}                     | /obstacles/0 | outside the box",
        "{'name': 'a', 'volume': {'file': 'none.npy', 'holds': 'mask', 'cellMetres': 1}, 'positionMetres': [1,1,1]} | "
                + "/obstacles/0/volume/file | missing",
        "{'name': 'a', 'volume': {'file': '../x.npy', 'holds': 'mask', 'cellMetres': 1}, 'positionMetres': [1,1,1]} | "
                + "/obstacles/0/volume/file | leaves the shot folder",
        "{'name': 'a', 'volume': {'file': 'solids/flat.npy', 'holds': 'mask', 'cellMetres': 1}, 'positionMetres': [1,1,1]} | "
                + "/obstacles/0/volume/file | three sizes",
        "{'name': 'a', 'volume': {'file': 'solids/loud.npy', 'holds': 'mask', 'cellMetres': 1}, 'positionMetres': [1,1,1]} | "
                + "/obstacles/0/volume/file | values from 0 to 1",
        "{'name': 'a', 'volume': {'file': 'solids/text.npy', 'holds': 'mask', 'cellMetres': 1}, 'positionMetres': [1,1,1]} | "
                + "/obstacles/0/volume/file | not an NPY file",
        "{'name': 'a', 'volume': {'file': 'solids/loud.npy', 'holds': 'smoke', 'cellMetres': 1}, 'positionMetres': [1,1,1]} | "
                + "/obstacles/0/volume/holds | distance"})
    void obstaclesThatAreRefused(String obstacle, String pointer, String phrase) throws IOException {
        volume("solids/flat.npy", new int[] {4, 5}, 0);
        volume("solids/loud.npy", new int[] {2, 2, 2}, 7);
        shot.write("solids/text.npy", "no volume");
        add("\"obstacles\": [" + obstacle.replace('\'', '"') + "]");
        refused("shot.json at " + pointer, phrase);
    }

    @Test void twoObstaclesOfOneName() {
        String ball = "{\"name\": \"a\", \"ball\": {\"radiusMetres\": 0.1}, \"positionMetres\": [1, 1, 1]}";
        add("\"obstacles\": [" + ball + ", " + ball + "]");
        refused("shot.json at /obstacles/1/name", "second time");
    }

    @Test void windSourcesAndStartCount() throws IOException {
        String first = digest();
        shot.swap("shot.json", "\"buoyancy\": 3.0,",
                "\"buoyancy\": 3.0, \"wind\": {\"dragPerSecond\": 2, \"metresPerSecond\": [1, 0, 0]},");
        String windy = digest();
        assertNotEquals(first, windy);
        assertEquals(1, flow().wind().velocity().at(1003).x());
        shot.swap("shot.json", "\"metresPerSecond\": [1, 0, 0]",
                "\"keys\": [{\"frame\": 1001, \"metresPerSecond\": [0, 0, 0]}, {\"frame\": 1005, \"metresPerSecond\": [2, 0, 0], "
                        + "\"metresPerSecond2\": [0, 1, 0]}]");
        assertEquals(0.5, flow().wind().acceleration().at(1003).y(), 1e-12);
        assertNotEquals(windy, digest());
        String before = digest();
        shot.swap("shot.json", "\"centreMetres\": [1, 0.6, 1], \"radiusMetres\": 0.5, \"edgeMetres\": 0.25",
                "\"keys\": [{\"frame\": 1001, \"centreMetres\": [0.5, 0.6, 1]}, {\"frame\": 1006, \"centreMetres\": [1.5, 0.6, 1]}], "
                        + "\"boxMetres\": [1, 0.5, 1]");
        assertEquals(1, flow().sources().get(0).centre().at(1003.5).x(), 1e-12);
        assertEquals(0.125, flow().sources().get(0).edgeMetres());
        assertNotEquals(before, digest());
        before = digest();
        volume("start/density.npy", new int[] {8, 16, 8}, 0.25f);
        volume("start/x.npy", new int[] {8, 16, 9}, 0.5f);
        volume("start/y.npy", new int[] {8, 17, 8}, 0);
        volume("start/z.npy", new int[] {9, 16, 8}, 0);
        add("\"start\": {\"density\": \"start/density.npy\", \"velocityX\": \"start/x.npy\", \"velocityY\": \"start/y.npy\", "
                + "\"velocityZ\": \"start/z.npy\"}");
        assertEquals(0.25f, flow().startState().density().at(3, 3, 3));
        assertNotEquals(before, digest());
        Run run = Run.of("simulate", shot.folder().toString());
        assertEquals(0, run.code(), run.err());
        assertEquals(0.25f, NpyFile.read(shot.folder().resolve("takes/000/density.1001.npy")).values()[0]);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '~', value = {
        "{'metresPerSecond': [1,0,0]}                                                | /flow/wind | without a drag",
        "{'metresPerSecond': [1,0], 'dragPerSecond': 1}                              | /flow/wind/metresPerSecond | exactly 3",
        "{'dragPerSecond': -1}                                                       | /flow/wind/dragPerSecond | found -1",
        "{'speed': 1}                                                                | /flow/wind/speed | unknown key",
        "{'dragPerSecond': 1, 'metresPerSecond': [1,0,0], 'keys': [{'frame': 1001}]} | /flow/wind/keys | keys beside",
        "{'dragPerSecond': 1, 'keys': [{'frame': 1001, 'speed': 1}]}                 | /flow/wind/keys/0/speed | unknown key"})
    void windsThatAreRefused(String wind, String pointer, String phrase) {
        shot.swap("shot.json", "\"buoyancy\": 3.0,", "\"buoyancy\": 3.0, \"wind\": " + wind.replace('\'', '"') + ",");
        refused("shot.json at " + pointer, phrase);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '~', value = {
        "{'density': 'start/none.npy'}                                       | /start/density | missing",
        "{'density': 'start/small.npy'}                                      | /start/density | (nz, ny, nx) = [8, 16, 8]",
        "{'density': 'start/below.npy'}                                      | /start/density | values from 0",
        "{'velocityX': 'start/small.npy'}                                    | /start | no 'velocityY'",
        "{'heat': 'start/small.npy'}                                         | /start/heat | unknown key",
        "{'temperature': 'start/below.npy'}                                  | /start | needs a lift"})
    void startsThatAreRefused(String start, String pointer, String phrase) throws IOException {
        volume("start/small.npy", new int[] {4, 8, 4}, 1);
        volume("start/below.npy", new int[] {8, 16, 8}, -1);
        add("\"start\": " + start.replace('\'', '"'));
        refused("shot.json at " + pointer, phrase);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '~', value = {
        "'boxMetres': [1,1,1], 'radiusMetres': 0.5, 'centreMetres': [1,1,1] | /sources/0 | both 'radiusMetres' and 'boxMetres'",
        "'boxMetres': [1,0,1], 'centreMetres': [1,1,1]                      | /sources/0/boxMetres/1 | above 0",
        "'boxMetres': [1,1,1], 'centreMetres': [1,1,1], 'keys': []          | /sources/0 | both 'centreMetres' and 'keys'",
        "'boxMetres': [1,1,1], 'centreMetres': [1,-9,1]                     | /sources/0 | outside the box",
        "'boxMetres': [1,1,1], 'keys': [{'frame': 1, 'at': [1,1,1]}]        | /sources/0/keys/0/at | unknown key"})
    void sourcesThatAreRefused(String what, String pointer, String phrase) {
        shot.swap("shot.json", "\"centreMetres\": [1, 0.6, 1], \"radiusMetres\": 0.5, \"edgeMetres\": 0.25", what.replace('\'', '"'));
        refused("shot.json at " + pointer, phrase);
    }

    @Test void warmthCounts() throws IOException {
        String first = digest();
        shot.swap("shot.json", "\"buoyancy\": 3.0,", "\"buoyancy\": 3.0, \"lift\": 0.03, \"cooling\": 0.5,");
        assertEquals(0.03, flow().heat().lift());
        assertNotEquals(first, digest());
        String lifted = digest();
        shot.swap("shot.json", "\"ratePerSecond\": 6", "\"ratePerSecond\": 6, \"kelvinPerSecond\": 200");
        assertEquals(200, flow().sources().get(0).kelvinPerSecond());
        assertNotEquals(lifted, digest());
        Run run = Run.of("simulate", shot.folder().toString());
        assertEquals(0, run.code(), run.err());
        assertEquals(3, NpyFile.read(shot.folder().resolve("takes/000/temperature.1006.npy")).shape().length);
    }

    /** By hand: a push of 60 m/s2 over 5 frames of 1/24 s gives 12.5 m/s, 2.08 cells of 0.25 m a frame: three substeps of at most a cell. */
    @Test void aLargestDisplacementFindsItsSubsteps() throws IOException {
        String stated = digest();
        shot.swap("shot.json", "\"substeps\": 1,", "\"largestDisplacementCells\": 1, \"wind\": {\"metresPerSecond2\": [60, 0, 0]},");
        shot.swap("shot.json", "\"buoyancy\": 3.0", "\"buoyancy\": 0");
        assertTrue(flow().pace().isOpen());
        String first = digest();
        assertNotEquals(stated, first);
        Run estimate = Run.of("estimate", shot.folder().toString(), "--quality", "preview");
        assertEquals(0, estimate.code(), estimate.err());
        Run run = Run.of("simulate", shot.folder().toString());
        assertEquals(0, run.code(), run.err());
        assertTrue(run.out().contains("6 frames of 3 substeps"), run.out());
        assertEquals(3, flow().substeps());
        assertEquals(first, digest(), "what was found is no part of what was asked");
        assertEquals(0, Run.of("simulate", shot.folder().toString()).code());
        String record = java.nio.file.Files.readString(shot.folder().resolve("takes/000/take.json"));
        assertTrue(record.contains("\"substeps\" : 3"), record);
        Run solve = Run.of("solve", shot.folder().toString(), "--until", "iterations=1");
        assertEquals(0, solve.code(), solve.err());
        shot.swap("takes/000/take.json", "\"substeps\" : 3", "\"substeps\" : 0");
        refused("takes/000/take.json at /figures/substeps", "simulate again");
        shot.swap("shot.json", "\"largestDisplacementCells\": 1", "\"largestDisplacementCells\": 0.5");
        assertNotEquals(first, digest());
        Refused.by(place, List.of("simulate", shot.folder().toString()), "another set-up");
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '~', value = {
        "'substeps': 2, 'largestDisplacementCells': 1 | /flow | both 'substeps' and 'largestDisplacementCells'",
        "'largestDisplacementCells': 0                | /flow/largestDisplacementCells | above 0",
        "'largestDisplacementCells': 1e9              | /flow/largestDisplacementCells | at most 1000",
        "'largestDisplacementCells': '2'              | /flow/largestDisplacementCells | number"})
    void pacesThatAreRefused(String keys, String pointer, String phrase) {
        shot.swap("shot.json", "\"substeps\": 1", keys.replace('\'', '"'));
        refused("shot.json at " + pointer, phrase);
    }

    @Test void airTooFastForAnyNumberOfSubsteps() {
        shot.swap("shot.json", "\"substeps\": 1", "\"largestDisplacementCells\": 0.0001");
        for (String command : List.of("simulate", "solve", "estimate")) {
            Refused.by(place, List.of(command, shot.folder().toString()), "shot.json at /flow/largestDisplacementCells", "at most 64 substeps");
        }
    }

    @Test void warmthWithoutALift() {
        shot.swap("shot.json", "\"ratePerSecond\": 6", "\"ratePerSecond\": 6, \"kelvinPerSecond\": 200");
        refused("shot.json at /flow", "needs a lift");
    }

    @Test void coolingBelowZero() {
        shot.swap("shot.json", "\"buoyancy\": 3.0,", "\"buoyancy\": 3.0, \"lift\": 0.03, \"cooling\": -0.5,");
        refused("shot.json at /flow/cooling", "found -0.5");
    }
}

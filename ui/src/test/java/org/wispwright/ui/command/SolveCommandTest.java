package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.SortedMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.optimize.solve.StopRule;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.Progress;
import org.wispwright.ui.job.SolveWork;

class SolveCommandTest {
    @TempDir
    private Path place;

    @Test
    void solveAddsATakeWithItsFigures() throws IOException {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        Path report = place.resolve("report.json");
        Run run = Run.of("solve", shot.folder().toString(), "--until", "iterations=4", "--report", report.toString());
        assertEquals(0, run.code(), run.err());
        JsonNode figures = new ObjectMapper().readTree(report.toFile());
        for (String key : List.of("divergenceMax", "massRatio", "forceRms", "gradients", "seconds", "peakMemoryBytes", "bands",
                "departure", "losses")) {
            assertTrue(figures.has(key), key);
        }
        assertEquals(List.of("lean", "open"), List.of(figures.get("notes").get(0).get("id").textValue(), figures.get("notes").get(1)
                .get("id").textValue()));
        assertTrue(figures.get("notes").get(0).has("met") && figures.get("notes").get(0).has("finestErrorRatio"));
        JsonNode take = new ObjectMapper().readTree(shot.folder().resolve("takes/001/take.json").toFile());
        assertEquals("solve", take.get("kind").textValue());
        JsonNode losses = take.get("losses");
        assertTrue(losses.get(losses.size() - 1).doubleValue() < losses.get(0).doubleValue(), losses.toString());
        assertTrue(Files.isRegularFile(shot.folder().resolve("takes/001/force.npy")));
        assertTrue(Files.isRegularFile(shot.folder().resolve("takes/001/velocity-z.1006.npy")));
    }

    /** What a note is solved with is told, kept with the take, and can be asked for; met stays the pyramid loss's. */
    @Test
    void tellsWhatNotesAreSolvedWith() throws IOException {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        shot.swap("notes/open.json", "\"wispwright\": 1,", "\"wispwright\": 1, \"loss\": [\"edges\", \"silhouette\"],");
        Run run = Run.of("solve", shot.folder().toString(), "--until", "iterations=3", "--json");
        assertEquals(0, run.code(), run.err());
        assertTrue(run.err().contains("note open: solved with loss edges+silhouette (as the note says)"), run.err());
        JsonNode figures = new ObjectMapper().readTree(run.out());
        assertEquals("edges+silhouette", figures.get("noteLosses").get(1).get("loss").textValue());
        assertEquals("pyramid", figures.get("notes").get(0).get("loss").textValue());
        JsonNode lean = figures.get("notes").get(0);
        assertEquals(lean.get("met").doubleValue(), lean.get("lossFall").doubleValue(), 1e-12);
        JsonNode take = new ObjectMapper().readTree(shot.folder().resolve("takes/001/take.json").toFile());
        assertEquals("edges+silhouette", take.get("settings").get("noteLosses").get("open").textValue());
        assertEquals(figures.get("noteLosses").get(1).get("fall").doubleValue(),
                take.get("figures").get("lossFall").get("open").doubleValue());
        String said = Run.of("compare", shot.folder().toString(), "--takes", "0,1", "--out", place.resolve("out").toString()).out();
        assertTrue(said.contains("(loss pyramid,") && said.contains("(loss edges+silhouette,"), said);
    }

    /** Every file of both takes, take.json and force.npy included. */
    @Test
    void sameBytesFromOneAndTwoThreadsAndFromTwoRuns() {
        SortedMap<String, String> first = null;
        for (String threads : new String[] {"1", "2", "2"}) {
            SmallShot shot = SmallShot.in(place.resolve("yard" + System.nanoTime()));
            assertEquals(0, Run.of("solve", shot.folder().toString(), "--until", "iterations=3", "--threads", threads).code());
            SortedMap<String, String> now = SmallShot.listing(shot.folder());
            first = first == null ? now : first;
            assertEquals(first, now);
        }
    }

    /** Cancelled at the first word from the search itself. */
    @Test
    void cancelledInTheSearchLeavesNoHalfTake() {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        assertEquals(0, Run.of("simulate", shot.folder().toString()).code());
        SortedMap<String, String> before = SmallShot.listing(place);
        Cancel cancel = new Cancel();
        Progress stopping = new Progress() {
            @Override
            public void now(String line) {
                milestone(line);
            }

            @Override
            public void milestone(String line) {
                if (line.startsWith("solve:")) {
                    cancel.wish();
                }
            }
        };
        try (Lanes lanes = new Lanes(2)) {
            SolveWork.Manner manner = new SolveWork.Manner(64L << 20, StopRule.OWN, true);
            assertThrows(Cancel.Cancelled.class, () -> SolveWork.run(ShotFolder.open(shot.folder()),
                    ShotCheck.require(shot.folder(), 1L << 30), manner, lanes, stopping, cancel));
        }
        SortedMap<String, String> after = SmallShot.listing(place);
        after.keySet().removeIf(name -> name.startsWith("yard/takes/.solving"));           // what it can be resumed from
        assertEquals(before, after);
    }

    @Test
    void aShotWithoutNotesIsRefused() {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        shot.delete("notes/lean.json");
        shot.delete("notes/open.json");
        Run run = Run.of("solve", shot.folder().toString());
        assertEquals(3, run.code(), run.err());
        assertTrue(run.err().contains("no note"), run.err());
    }

    @Test
    void aNoteThatChangesNothingIsRefused() {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        shot.swap("notes/open.json", "[[0.33, 0.82], [0.42, 0.82]]", "[[0.1, 0.1]]");
        shot.swap("notes/open.json", "\"line\": [[0.5, 0.6]]", "\"strength\": 0, \"line\": [[0.5, 0.6]]");
        Run run = Run.of("solve", shot.folder().toString());
        assertEquals(3, run.code(), run.err());
        assertTrue(run.err().contains("'open'") && run.err().contains("changes nothing"), run.err());
    }
}

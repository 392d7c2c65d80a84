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
import java.util.List;
import java.util.SortedMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
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

    /** A note that paints smoke where there is none wants more than a force can give: told before the search, in check and in the report. */
    @Test
    void tellsOfANoteThatWantsMoreSmokeThanThereIs() throws IOException {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        shot.delete("notes/lean.json");
        shot.swap("notes/open.json", "{\"stroke\": {\"brush\": \"remove\", \"radius\": 0.1, \"strength\": 0.9, \"softEdge\": 0.5, "
                + "\"line\": [[0.33, 0.82], [0.42, 0.82]]}},", "");
        assertFalse(Run.of("check", shot.folder().toString()).out().contains("more smoke"));
        Run run = Run.of("solve", shot.folder().toString(), "--until", "iterations=1", "--json");
        assertEquals(0, run.code(), run.err());
        Matcher said = Pattern.compile("note open wants ([0-9]+) % more smoke than the original shows on frame 1006 .*--sources").matcher(run.err());
        assertTrue(said.find(), run.err());
        JsonNode asked = new ObjectMapper().readTree(run.out()).get("smokeAsked").get(0);
        assertEquals("open", asked.get("id").textValue());
        assertEquals(Integer.parseInt(said.group(1)), Math.round(100 * (asked.get("depth").doubleValue() - 1)));
        JsonNode take = new ObjectMapper().readTree(shot.folder().resolve("takes/001/take.json").toFile());
        assertEquals(asked.get("depth"), take.get("figures").get("smokeAsked").get("open"));
        assertTrue(Run.of("check", shot.folder().toString()).out().contains("Note open wants " + said.group(1) + " % more smoke"));
        JsonNode listed = new ObjectMapper().readTree(Run.of("note", "list", shot.folder().toString(), "--json").out());
        assertEquals(asked, listed.get("notes").get(0).get("smokeAsked"));
    }

    /** Strengths are told, kept with the take and used by it: more smoke in the last frame than in the original. */
    @Test
    void sourcesChangeOnRequest() throws IOException {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        shot.delete("notes/lean.json");
        shot.swap("notes/open.json", "\"remove\"", "\"add\"");
        Run run = Run.of("solve", shot.folder().toString(), "--sources", "--until", "iterations=6", "--report", place.resolve("r.json").toString());
        assertEquals(0, run.code(), run.err());
        assertTrue(run.err().contains("the sources' strengths may change for it"), run.err());
        assertTrue(Pattern.compile("Source 'kiln mouth' gives [0-9.]+ times its rate").matcher(run.out()).find(), run.out());
        JsonNode file = new ObjectMapper().readTree(shot.folder().resolve("takes/001/sources.json").toFile()).get("sources").get(0);
        assertEquals("kiln mouth", file.get("name").textValue());
        assertEquals("[1002,1006]", file.get("frames").toString());
        double sum = 0;
        for (JsonNode strength : file.get("strength")) {
            sum += strength.doubleValue();
        }
        assertEquals(5, file.get("strength").size());
        JsonNode take = new ObjectMapper().readTree(shot.folder().resolve("takes/001/take.json").toFile());
        JsonNode figures = take.get("figures");
        assertEquals(sum / 5, figures.get("sources").get(0).get("mean").doubleValue(), 1e-12);
        assertTrue(sum / 5 > 1.02, () -> figures.toString());
        assertTrue(figures.get("massRatio").doubleValue() > 1.02, figures::toString);
        assertTrue(take.get("settings").get("sources").booleanValue());
        assertEquals(figures.get("sources"), new ObjectMapper().readTree(place.resolve("r.json").toFile()).get("sources"));
        Run again = Run.of("solve", shot.folder().toString(), "--sources", "--from", "1", "--until", "iterations=7");
        assertEquals(0, again.code(), again.err());
        Run other = Run.of("solve", shot.folder().toString(), "--from", "1", "--until", "iterations=7");
        assertEquals(3, other.code(), "a search with strengths is not gone on with without them");
    }

    @Test
    void sourcesOfAShotWithoutAnyAreRefused() {
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        shot.swap("shot.json", SmallShot.SETUP.substring(SmallShot.SETUP.indexOf("\"sources\""), SmallShot.SETUP.indexOf("\"look\"")),
                "\"sources\": [], ");
        Refused.by(place, List.of("solve", shot.folder().toString(), "--sources"), "shot.json at /sources", "no source");
    }
}

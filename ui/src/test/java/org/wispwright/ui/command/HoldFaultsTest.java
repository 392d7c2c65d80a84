package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.optimize.solve.SolveProblem;
import org.wispwright.ui.job.ShotProblem;
import org.wispwright.ui.shot.ShotCheck;

/** Holds of views and spans, in notes and in holds.json: what they come to, and one sentence for each fault. Ours. */
class HoldFaultsTest {
    private static final String WIDE = """
            {"wispwright": 1, "holds": [
              {"view": "side", "held": "silhouette", "frames": [[1001, 1002], [1004, 1005]], "weight": 2.5},
              {"view": "front", "region": {"image": {"file": "m.png"}}}
            ]}
            """;

    @TempDir
    private Path place;
    private SmallShot shot;

    @BeforeEach
    void aGoodShot() {
        shot = SmallShot.in(place.resolve("yard"));
        shot.writePng("m.png", 48, 64);
    }

    /** The shot's own holds come after the notes'; a hold without frames holds on all of the shot's, or on its note's. */
    @Test
    void holdsComeToTheSolve() {
        shot.write("holds.json", WIDE);
        shot.swap("notes/lean.json", "\"holds\": [", "\"holds\": [{\"view\": \"side\"}, ");
        List<SolveProblem.Hold> holds = ShotProblem.of(ShotCheck.require(shot.folder(), 1L << 30)).holds();
        assertEquals(List.of("lean hold 1", "lean hold 2", "open hold 1", "hold 1", "hold 2"),
                holds.stream().map(SolveProblem.Hold::id).toList());
        assertEquals(List.of(1, 0, 1, 1, 0), holds.stream().map(SolveProblem.Hold::view).toList());
        assertEquals(List.of(new SolveProblem.Span(1004, 1004)), holds.get(0).spans());
        assertEquals(SolveProblem.Held.PICTURE, holds.get(0).held());
        assertEquals(List.of(new SolveProblem.Span(1001, 1002), new SolveProblem.Span(1004, 1005)), holds.get(3).spans());
        assertEquals(SolveProblem.Held.SILHOUETTE, holds.get(3).held());
        assertEquals(2.5, holds.get(3).weight());
        assertEquals(List.of(new SolveProblem.Span(1001, 1006)), holds.get(4).spans());
        Run run = Run.of("check", shot.folder().toString());
        assertTrue(run.out().contains("holds 5"), run.out());
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "\"view\": \"side\", \"held\" | \"held\" | /holds/0 | no 'view'",
        "\"side\" | \"sid\" | /holds/0/view | did you mean 'side'",
        "\"silhouette\" | \"outline\" | /holds/0/held | \"picture\" or \"silhouette\"",
        "\"weight\": 2.5 | \"weight\": 0 | /holds/0/weight | above 0",
        "\"weight\": 2.5 | \"weigth\": 1 | /holds/0/weigth | did you mean 'weight'",
        "[1004, 1005] | [1004, 1060] | /holds/0/frames | 1004 to 1060",
        "[1004, 1005] | [1005, 1004] | /holds/0/frames/1/1 | found 1004",
        "[1004, 1005] | 1004 | /holds/0/frames/1 | list",
        "[[1001, 1002], [1004, 1005]] | [] | /holds/0/frames | a list of 0 values",
        "\"held\": \"silhouette\", \"frames\": [[1001, 1002], [1004, 1005]] | \"frames\": [1005, 1006] | /holds/0 | note 'open' wants changed",
        "m.png | n.png | /holds/1/region/image/file | n.png",
        "\"view\": \"front\" | \"view\": 3 | /holds/1/view | text",
        "\"wispwright\": 1 | \"wispwright\": 2 | /wispwright | newer",
        "\"holds\": [ | \"hold\": [ | /hold | did you mean 'holds'"})
    void inTheShotsOwn(String old, String now, String pointer, String words) {
        shot.write("holds.json", WIDE.replace(old, now));
        Refused.byAll(shot, place, List.of(), "holds.json at " + pointer, words);
    }

    @Test
    void cutShort() {
        shot.write("holds.json", WIDE.substring(0, WIDE.length() / 2));
        Refused.byAll(shot, place, List.of(), "holds.json at /holds/0", "cut short");
    }

    @Test
    void aMatteOfAnotherAspectThanItsView() {
        shot.write("holds.json", WIDE);
        shot.writePng("m.png", 64, 64);
        Refused.byAll(shot, place, List.of(), "holds.json at /holds/1/region/image/file", "m.png");
    }

    @Test
    void aNoteHeldWhole() {
        shot.swap("notes/lean.json", "\"holds\": [", "\"holds\": [{}, ");
        Refused.byAll(shot, place, List.of(), "notes/lean.json at /holds/0", "whole picture of view 'front' on frame 1004", "silhouette");
    }

    @Test
    void aNotesHoldOfAViewThatIsNotThere() {
        shot.swap("notes/lean.json", "\"holds\": [", "\"holds\": [{\"view\": \"top\"}, ");
        Refused.byAll(shot, place, List.of(), "notes/lean.json at /holds/0/view", "view 'top'");
    }
}

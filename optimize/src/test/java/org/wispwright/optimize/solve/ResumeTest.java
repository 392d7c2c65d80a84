package org.wispwright.optimize.solve;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.optimize.force.Band;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;

/** A solve that is cut off after any of its iterations and gone on with ends with the bits it would have had. Expected values: its own. */
class ResumeTest {
    private static final long MEMORY = 64L << 20;
    private static final StopRule SOME = new StopRule(0, Double.POSITIVE_INFINITY, 45);

    @TempDir
    Path folder;

    @Test
    void fromEveryRecordOnItEndsWithTheSameBits() throws IOException {
        SolveProblem problem = SolveScene.problem(24, 1006, 1, false);
        List<SolveState> states = new ArrayList<>();
        try (Lanes lanes = new Lanes(2)) {
            Solve solve = new Solve(problem, true, lanes, () -> false);
            SolveResult whole = solve.run(StateRoom.inMemory(MEMORY), SOME, p -> { }, "d", Optional.empty(), states::add);
            assertEquals(45, states.size());
            assertTrue(states.stream().anyMatch(s -> s.rung() == 2) && states.stream().anyMatch(s -> s.rung() == 1));
            for (int n = 0; n < states.size(); n += 8) {
                SolveRecords records = new SolveRecords(folder);
                records.write(states.get(n));
                List<SolveState> after = new ArrayList<>();
                SolveResult rest = solve.run(new StateRoom(1 << 20, 1 << 20, folder.resolve("states")), SOME, p -> { }, "d", records.latest().state(), after::add);
                assertArrayEquals(whole.unknowns(), rest.unknowns(), "from iteration " + states.get(n).search().iterations());
                assertEquals(whole.losses(), rest.losses());
                assertEquals(whole.met(), rest.met());
                assertEquals(whole.noteLosses(), rest.noteLosses());
                assertEquals(whole.gradients(), rest.gradients());
                assertEquals(whole.ended(), rest.ended());
                assertEquals(whole.energyWeight(), rest.energyWeight());
                assertEquals(whole.bands().stream().map(ResumeTest::count).toList(), rest.bands().stream().map(ResumeTest::count).toList());
                records.clear();
            }
        }
    }

    /** A first look on the lowest rung, gone on with to the last, is the solve that was never cut. */
    @Test
    void aLowerRungsEndGoesOnUpwards() {
        SolveProblem problem = SolveScene.problem(24, 1006, 1, false);
        List<SolveState> states = new ArrayList<>();
        List<GridShape> rungs = Solve.rungs(problem.flow().grid());
        try (Lanes lanes = new Lanes(2)) {
            SolveResult whole = new Solve(problem, true, lanes, () -> false).run(MEMORY, SOME, p -> { });
            Solve low = new Solve(problem, rungs.subList(0, 1), true, lanes, () -> false);
            SolveResult first = low.run(StateRoom.inMemory(MEMORY), SOME, p -> { }, "d", Optional.empty(), states::add);
            SolveState end = states.get(states.size() - 1);
            assertEquals(first.ended(), end.ended());
            Solve all = new Solve(problem, rungs, true, lanes, () -> false);
            assertArrayEquals(whole.unknowns(), all.run(StateRoom.inMemory(MEMORY), SOME, p -> { }, "d", Optional.of(end), Solve.Recorder.NONE).unknowns());
            assertThrows(IllegalArgumentException.class,
                    () -> all.run(StateRoom.inMemory(MEMORY), SOME, p -> { }, "another", Optional.of(end), Solve.Recorder.NONE));
            SolveState high = new SolveState("d", 2, 1, 0, 0, 0, 0, end.search(), end.losses(), end.met(), end.runs(), "");
            assertThrows(IllegalArgumentException.class,
                    () -> low.run(StateRoom.inMemory(MEMORY), SOME, p -> { }, "d", Optional.of(high), Solve.Recorder.NONE));
        }
    }

    /** Waves of 4 cells stay closed, of 5 and more are open: ours. */
    @Test
    void aRungOpensTheBandsItResolves() {
        GridShape grid = new GridShape(48, 64, 48, 0.1);
        List<Band> bands = List.of(new Band(0, 0.4, 5), new Band(0.4, 0.9, 10), new Band(0.9, 1.25, 20));
        assertEquals(3, Solve.open(bands, grid));
        assertEquals(2, Solve.open(bands, new GridShape(24, 32, 24, 0.2)));
        assertEquals(1, Solve.open(bands, new GridShape(12, 16, 12, 0.4)));
    }

    private static List<Number> count(SolveResult.BandRun run) {
        return List.of(run.unknowns(), run.iterations(), run.gradients(), run.loss());
    }
}

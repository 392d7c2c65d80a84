package org.wispwright.optimize.solve;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import org.junit.jupiter.api.Test;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.march.RayMarcher;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;

/** What a person can do to a running solve: watch its pictures, and find it enough. Expected values: those of a solve left alone. */
class EnoughTest {
    private static final long MEMORY = 64L << 20;

    /** Finds it enough after so many iterations, and keeps the pictures of the last. */
    private static final class Watching implements Progress.Listener {
        private final int most;
        private int seen;
        private List<Picture> got = List.of();

        Watching(int most) {
            this.most = most;
        }

        @Override
        public void iteration(Progress progress) {
            seen = progress.iteration();
        }

        @Override
        public void pictures(Supplier<List<Picture>> pictures) {
            got = pictures.get();
        }

        @Override
        public boolean enough() {
            return seen >= most;
        }
    }

    @Test
    void foundEnoughItEndsThereAndCanBeGoneOnWith() {
        SolveProblem problem = SolveScene.problem(24, 1006, 1, false);
        StopRule some = new StopRule(0, Double.POSITIVE_INFINITY, 40);
        for (int most : new int[] {3, 33}) {
            List<SolveState> states = new ArrayList<>();
            try (Lanes lanes = new Lanes(2)) {
                Solve solve = new Solve(problem, true, lanes, () -> false);
                SolveResult whole = solve.run(MEMORY, some, p -> { });
                SolveResult early = solve.run(StateRoom.inMemory(MEMORY), some, new Watching(most), "d", Optional.empty(), states::add);
                SolveState end = states.get(states.size() - 1);
                assertEquals(most, end.search().iterations());
                assertEquals(Climb.ENOUGH, end.ended());
                assertEquals(Climb.ENOUGH, early.ended());
                assertEquals(whole.losses().subList(0, early.losses().size()), early.losses());
                SolveResult rest = solve.run(StateRoom.inMemory(MEMORY), some, p -> { }, "d", Optional.of(end), Solve.Recorder.NONE);
                assertArrayEquals(whole.unknowns(), rest.unknowns(), "enough after " + most);
                assertEquals(whole.bands().size(), rest.bands().size());
                assertEquals(whole.ended(), rest.ended());
            }
        }
    }

    @Test
    void thePicturesGivenOutAreThoseOfTheForceThatWasAccepted() {
        SolveProblem problem = SolveScene.problem(24, 1006, 1, false);
        GridShape grid = Solve.rungs(problem.flow().grid()).get(0);
        Watching watching = new Watching(4);
        try (Lanes lanes = new Lanes(2)) {
            SolveResult result = new Solve(problem, List.of(grid), true, lanes, () -> false).run(MEMORY, StopRule.OWN, watching);
            SolveProblem here = problem.on(grid);
            SolveProblem.Note note = here.notes().get(0);
            View view = Solve.proxy(here.views().get(note.view()), grid.cellMetres());
            Picture drawn = view.raster().picture();
            ForceBasis basis = new ForceBasis(grid, here.flow().frames().count() - 1, Solve.bands(problem.flow()), lanes);
            Simulation.run(new SmokeSolver(here.flow(), lanes), here.flow().startState(), basis, result.unknowns(), note.frame(),
                    () -> false, (frame, state, force) -> {
                if (frame == note.frame()) {
                    new RayMarcher(grid, view, grid.cellMetres(), lanes).picture(state.density(), here.look(), drawn);
                }
            });
            assertEquals(here.notes().size(), watching.got.size());
            assertArrayEquals(drawn.rgba(), watching.got.get(0).rgba(), 1e-6f);
        }
    }
}

package org.wispwright.optimize.solve;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;

/** A note that wants more smoke than there is: a force cannot make it, sources that may change can. Bounds are ours. */
class SourcesTest {
    private static final long MEMORY = 256L << 20;

    @TempDir
    private Path folder;

    /** The smoke of the original so many times: optical depth {@code -ln(1 - a)} times that, colours along with the opacity. */
    private static SolveProblem thicker(int cells, int last, double times) {
        SolveProblem plain = SolveScene.problem(cells, last, 1, false);
        Wish wish = new Wish() {
            @Override public Picture wanted(Picture original) {
                Picture out = original.copy();
                for (int n = 0; n < out.rgba().length; n += 4) {
                    double a = out.rgba()[n + 3];
                    double more = a > 0 ? (1 - Math.pow(1 - a, times)) / a : 1;
                    for (int c = 0; c < 4; c++) {
                        out.rgba()[n + c] *= (float) more;
                    }
                }
                return out;
            }

            @Override public float[] weights(Picture original) {
                float[] ones = new float[original.width() * original.height()];
                Arrays.fill(ones, 1f);
                return ones;
            }
        };
        return new SolveProblem(plain.flow(), plain.views(), plain.look(), List.of(new SolveProblem.Note("thick", last - 2, 0, 1, wish)),
                List.of());
    }

    private static double norm(double[] x) {
        return Math.sqrt(Arrays.stream(x).map(v -> v * v).sum());
    }

    /** Twice the smoke, in as many iterations; what the force alone reaches it reaches by much more force. */
    @Test void sourcesMeetANoteThatWantsTwiceTheSmoke() {
        SolveProblem problem = thicker(16, 1013, 2);
        StopRule thirty = new StopRule(0, Double.POSITIVE_INFINITY, 30);
        try (Lanes lanes = new Lanes(2)) {
            SolveResult without = new Solve(problem, true, lanes, () -> false).run(MEMORY, thirty, p -> { });
            SolveResult with = new Solve(problem.withSources(true), true, lanes, () -> false).run(MEMORY, thirty, p -> { });
            assertTrue(without.strengths().isEmpty());
            assertTrue(without.met().get(0) < 0.8, () -> "without sources met " + without.met());
            assertTrue(with.met().get(0) > 0.93, () -> "with sources met " + with.met());
            assertTrue(norm(with.unknowns()) < norm(without.unknowns()),
                    () -> norm(with.unknowns()) + ", without " + norm(without.unknowns()));
            double[][] strengths = with.strengths().orElseThrow();
            double mean = Arrays.stream(strengths).mapToDouble(row -> row[0]).average().orElseThrow();
            assertEquals(12, strengths.length);
            assertTrue(mean > 1.4 && mean < 2.6, () -> "mean strength " + mean);
            assertEquals(with.met().get(0), metAgain(problem, with, lanes), 1e-12);
        }
    }

    /** Met by a plain run of what was found: what is told is what a take will show. */
    private static double metAgain(SolveProblem problem, SolveResult result, Lanes lanes) {
        SmokeSolver solver = new SmokeSolver(problem.flow(), lanes);
        double h = problem.flow().grid().cellMetres();
        FrameTerms terms = new FrameTerms(problem.flow().grid(), problem.views().stream().map(v -> Solve.proxy(v, h)).toList(),
                problem.look(), h,
                solver.clock(), lanes);
        TermPlan plan = new TermPlan(problem, solver, problem.flow().startState(), terms, false, () -> false);
        double[] losses = new double[terms.count()];
        Simulation.run(solver, problem.flow().startState(), Solve.basis(problem.flow(), lanes), result.unknowns(),
                result.strengths().orElseThrow(),
                problem.lastFrame(), () -> false, (frame, state, force) -> terms.forward(frame, state.density(), losses));
        return plan.met(losses).get(0);
    }

    /** The sources' unknowns come first, so bands that open append; records carry them; threads and memory change no bit. */
    @Test void sameBitsFromAnyThreadsAndAnyRecord() throws IOException {
        SolveProblem problem = thicker(24, 1006, 2).withSources(true);
        StopRule some = new StopRule(0, Double.POSITIVE_INFINITY, 60);
        List<SolveState> states = new ArrayList<>();
        SolveResult whole;
        try (Lanes lanes = new Lanes(2)) {
            whole = new Solve(problem, true, lanes, () -> false).run(StateRoom.inMemory(MEMORY), some, p -> { }, "d", Optional.empty(),
                    states::add);
        }
        assertTrue(states.stream().anyMatch(s -> s.rung() == 2), "the second rung is reached");
        for (int from : new int[] {2, 31, states.size() - 2}) {
            SolveRecords records = new SolveRecords(folder);
            records.write(states.get(from));
            try (Lanes lanes = new Lanes(1 + from % 3)) {
                SolveResult rest = new Solve(problem, true, lanes, () -> false).run(StateRoom.inMemory(1 << 20), some, p -> { }, "d",
                        records.latest().state(), s -> { });
                assertArrayEquals(whole.unknowns(), rest.unknowns());
                assertTrue(Arrays.deepEquals(whole.strengths().orElseThrow(), rest.strengths().orElseThrow()));
                assertEquals(whole.losses(), rest.losses());
            }
            records.clear();
        }
    }
}

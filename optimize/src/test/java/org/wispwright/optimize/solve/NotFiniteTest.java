package org.wispwright.optimize.solve;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.Interpolation;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.flow.Source;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.optimize.search.Lbfgs;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/** Runs and searches whose numbers go out of bounds say where that began, and keep what they had. Expected values by hand. */
class NotFiniteTest {
    /** A force that nothing in float survives: its faces overflow. */
    private static final double HUGE = 1e45;

    private static SolveLoss loss(SolveProblem problem, int snapshots) {
        return loss(problem, problem.flow().startState(), snapshots);
    }

    private static SolveLoss loss(SolveProblem problem, SmokeState start, int snapshots) {
        FlowSetup flow = problem.flow();
        Lanes lanes = new Lanes(1);
        SmokeSolver solver = new SmokeSolver(flow, lanes);
        FrameTerms terms = new FrameTerms(flow.grid(), problem.views(), problem.look(), flow.grid().cellMetres(), solver.clock(), lanes);
        new TermPlan(problem, solver, flow.startState(), terms, false, () -> false);
        return new SolveLoss(solver, Solve.basis(flow, lanes), terms, problem.lastFrame(),
                WholeChainTest.states(flow, start, problem.lastFrame(), snapshots), () -> false);
    }

    /** By hand, on faces and cells of a box of 3 x 4 x 5: value n of x faces lies at (n mod 4, n / 4 mod 4, n / 16). */
    @Test void namesTheFirstBadValue() {
        SmokeState state = new SmokeState(new GridShape(3, 4, 5, 1));
        assertEquals(Optional.empty(), NotFinite.in(state, "frame 7"));
        state.density().values()[2 + 3 * 1 + 12 * 4] = Float.POSITIVE_INFINITY;
        assertEquals(Optional.of("density at cell (2, 1, 4) of frame 7 is Infinity"), NotFinite.in(state, "frame 7"));
        state.velocity().z()[state.density().shape().zFace(2, 3, 5)] = Float.NaN;
        assertEquals(Optional.of("velocity along z at face (2, 3, 5) of frame 7 is NaN"), NotFinite.in(state, "frame 7"));
        state.velocity().y()[state.density().shape().yFace(1, 4, 2)] = Float.NEGATIVE_INFINITY;
        assertEquals(Optional.of("velocity along y at face (1, 4, 2) of frame 7 is -Infinity"), NotFinite.in(state, "frame 7"));
        state.velocity().x()[1 + 4 * 2 + 16 * 3] = Float.NaN;
        assertEquals(Optional.of("velocity along x at face (1, 2, 3) of frame 7 is NaN"), NotFinite.in(state, "frame 7"));
    }

    /** The place that is told is the first that a plain run of the same force meets; whatever is kept. */
    @Test void aForceThatBlowsUpIsTracedToItsFirstPlace() {
        SolveProblem problem = SolveScene.problem(12, 1009, 2, true);
        FlowSetup flow = problem.flow();
        Lanes lanes = new Lanes(1);
        ForceBasis basis = Solve.basis(flow, lanes);
        double[] x = new double[basis.unknowns(1)];
        x[4] = HUGE;
        double[] gradient = new double[x.length];
        SolveLoss loss = loss(problem, 3);
        assertEquals(Optional.empty(), loss.firstBad());
        assertTrue(Double.isFinite(loss.evaluate(new double[x.length], gradient)));
        assertEquals(Optional.empty(), loss.firstBad());
        assertTrue(Double.isNaN(loss.evaluate(x, gradient)));
        assertTrue(Arrays.stream(gradient).allMatch(Double::isNaN));
        String bad = loss.firstBad().orElseThrow();
        SmokeState next = SmokeState.of(flow);
        MacVelocity force = new MacVelocity(flow.grid());
        basis.force(x, 0, force);
        new SmokeSolver(flow, lanes).step(flow.startState(), force, flow.step(0), false, next);
        assertEquals(NotFinite.in(next, "frame 1002, substep 1 of 2,").orElseThrow(), bad);
        assertTrue(Double.isFinite(loss.evaluate(new double[x.length], gradient)), "and the next evaluation is as ever");
    }

    /** Air that stands, with one cell of NaN in a corner: the loss must not be taken for a number. */
    @Test void smokeThatIsNotFiniteIsNoLoss() {
        SolveProblem plain = SolveScene.problem(12, 1009, 1, false);
        FlowSetup f = plain.flow();
        FlowSetup still = new FlowSetup(f.grid(), f.frames(), 1, Interpolation.LINEAR, Interpolation.LINEAR, f.sides(), 0, 0, f.sources());
        SolveProblem problem = new SolveProblem(still, plain.views(), plain.look(), plain.notes(), List.of());
        SmokeState start = still.startState();
        start.density().values()[f.grid().cell(11, 14, 11)] = Float.NaN;
        SolveLoss loss = loss(problem, start, 100);
        double[] x = new double[Solve.basis(still, new Lanes(1)).unknowns(1)];
        assertTrue(Double.isNaN(loss.evaluate(x, new double[x.length])));
        assertEquals(Optional.of("density at cell (11, 14, 11) of frame 1001 is NaN"), loss.firstBad());
    }

    /** However short its steps, this search meets numbers out of bounds: it keeps where it stood and says where they began. */
    @Test void aSearchThatBlowsUpEndsWhereItStood() {
        SolveProblem problem = SolveScene.problem(12, 1009, 1, false);
        SolveLoss loss = loss(problem, 100);
        int count = Solve.basis(problem.flow(), new Lanes(1)).unknowns(1);
        Lbfgs lbfgs = new Lbfgs((x, gradient) -> loss.evaluate(Arrays.stream(x).map(v -> v * HUGE * 1e12).toArray(), gradient),
                new double[count],
                Lbfgs.Settings.standard());
        double value = lbfgs.value();
        Lbfgs.Iteration iteration = lbfgs.step();
        assertEquals(Lbfgs.Outcome.NOT_FINITE, iteration.outcome());
        String ended = Climb.endedBy(iteration, false, loss);
        assertTrue(ended.contains("loss is NaN (last finite") && ended.matches(".*; velocity along [xyz] at face \\([0-9, ]+\\) of frame 1002 is .*"),
                ended);
        assertArrayEquals(new double[count], lbfgs.x());
        assertEquals(value, lbfgs.value());
    }

    /** A search that only stalls ends its band, and the solve where nothing follows. */
    @Test void aStallEndsTheLastBandAlone() {
        Lbfgs lbfgs = new Lbfgs((x, gradient) -> {
            gradient[0] = 1;                                                   // a gradient that lies: the value never falls
            return 1;
        }, new double[1], Lbfgs.Settings.standard());
        Lbfgs.Iteration iteration = lbfgs.step();
        assertEquals(Lbfgs.Outcome.STUCK, iteration.outcome());
        SolveLoss loss = loss(SolveScene.problem(12, 1009, 1, false), 100);
        assertEquals("", Climb.endedBy(iteration, false, loss));
        assertTrue(Climb.endedBy(iteration, true, loss).contains("no step along the steepest descent"), iteration.sentence());
    }

    /** Enormous buoyancy: the original itself blows up, which is told as that and not as a note that changes nothing. */
    @Test void anOriginalThatBlowsUpIsRefused() {
        SolveProblem calm = SolveScene.problem(12, 1009, 1, false);
        FlowSetup f = calm.flow();
        FlowSetup wild = new FlowSetup(f.grid(), f.frames(), 1, Interpolation.LINEAR, Interpolation.LINEAR, f.sides(), 1e45, 0,
                f.sources());
        for (FlowSetup flow : List.of(wild, f.withSources(List.of(new Source("pot", 1, 0.35, 1, 0.4, 0.25, 1e45, 1001, 1009))))) {
            SolveProblem problem = new SolveProblem(flow, calm.views(), calm.look(), calm.notes(), List.of());
            try (Lanes lanes = new Lanes(1)) {
                IllegalArgumentException refused = assertThrows(IllegalArgumentException.class,
                        () -> new Solve(problem, true, lanes, () -> false).run(64L << 20, StopRule.OWN, p -> { }));
                assertTrue(refused.getMessage().matches("the original blows up on a grid of .* of frame 100[2-9] is (NaN|-?Infinity); .*"),
                        refused.getMessage());
            }
        }
    }
}

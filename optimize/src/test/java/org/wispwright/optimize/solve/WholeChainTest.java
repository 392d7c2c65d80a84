package org.wispwright.optimize.solve;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.optimize.checkpoint.BinomialPlan;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.Side;
import org.wispwright.optimize.flow.Sides;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.optimize.force.SourceCurves;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.optimize.solid.Obstacle;
import org.wispwright.optimize.solid.Solid;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.warp.loss.LossChoice;
import org.wispwright.warp.loss.LossKind;

/**
 * Outside checks O69, O70 for the whole chain unknowns -> force -> 8 steps -> pictures -> loss; and that its gradient has the same bits
 * for any memory and any number of threads (Griewank and Walther 2000: checkpoints do not change a gradient).
 */
class WholeChainTest {

    private static SolveLoss loss(SolveProblem problem, SmokeState start, int snapshots, Lanes lanes) {
        return loss(problem, states(problem.flow(), start, problem.lastFrame(), snapshots), lanes);
    }

    private static SolveLoss loss(SolveProblem problem, Snapshots states, Lanes lanes) {
        FlowSetup flow = problem.flow();
        SmokeSolver solver = new SmokeSolver(flow, lanes);
        ForceBasis basis = Solve.basis(flow, lanes);
        FrameTerms terms = new FrameTerms(flow.grid(), problem.views(), problem.look(), flow.grid().cellMetres(), solver.clock(), lanes);
        new TermPlan(problem, solver, states.start(), terms, true, () -> false);
        Optional<SourceCurves> curves = problem.sources() ? Optional.of(Solve.curves(flow)) : Optional.empty();
        return new SolveLoss(solver, basis, curves, terms, problem.lastFrame(), states, () -> false);
    }

    static Snapshots states(FlowSetup flow, SmokeState start, int lastFrame, int count) {
        return new Snapshots(flow, start, flow.stepsTo(lastFrame), StateRoom.inMemory(count * SmokeState.bytes(flow)));
    }

    private static SolveLoss loss(SolveProblem problem, int snapshots, Lanes lanes) {
        return loss(problem, new SmokeState(problem.flow().grid()), snapshots, lanes);
    }

    /** Off the kinks of linear carrying: open on all sides, with a wind by which every departure lies between two cell centres. */
    private static SolveProblem windy(boolean light, int substeps) {
        SolveProblem problem = SolveScene.problem(12, 1001 + 8 / substeps, substeps, light);
        FlowSetup flow = problem.flow();
        Sides open = new Sides(Side.OPEN, Side.OPEN, Side.OPEN, Side.OPEN, Side.OPEN, Side.OPEN);
        FlowSetup slow = new FlowSetup(flow.grid(), flow.frames(), substeps, flow.velocity(), flow.density(), open, 0.3, 0.1, flow.sources());
        return new SolveProblem(slow, problem.views(), problem.look(), problem.notes(), problem.holds());
    }

    private static SmokeState wind(FlowSetup flow) {
        GridShape shape = flow.grid();
        float cellAStep = (float) (shape.cellMetres() / flow.seconds(flow.step(0)));
        SmokeState state = new SmokeState(shape);
        for (int k = 0; k <= shape.nz(); k++) {
            for (int j = 0; j <= shape.ny(); j++) {
                for (int i = 0; i <= shape.nx(); i++) {
                    if (j < shape.ny() && k < shape.nz()) {
                        state.velocity().x()[shape.xFace(i, j, k)] = cellAStep * (0.45f + 0.1f * (float) Math.sin(0.4 * j + 0.3 * k));
                    }
                    if (i < shape.nx() && k < shape.nz()) {
                        state.velocity().y()[shape.yFace(i, j, k)] = cellAStep * (0.5f + 0.1f * (float) Math.cos(0.3 * i - 0.4 * k));
                    }
                    if (i < shape.nx() && j < shape.ny()) {
                        state.velocity().z()[shape.zFace(i, j, k)] = cellAStep * (0.45f + 0.1f * (float) Math.sin(0.5 * i + 0.2 * j));
                    }
                    if (i < shape.nx() && j < shape.ny() && k < shape.nz()) {
                        double r2 = Math.pow(i - 4, 2) + Math.pow(j - 4, 2) + Math.pow(k - 4, 2);
                        state.density().values()[shape.cell(i, j, k)] = (float) Math.exp(-r2 / 12);
                    }
                }
            }
        }
        return state;
    }

    private static double[] unknowns(FlowSetup flow, double size, long seed) {
        int count = Solve.basis(flow, new Lanes(1)).unknowns(1);
        Random random = new Random(seed);
        double[] x = new double[count];
        for (int n = 0; n < count; n++) {
            x[n] = size * random.nextGaussian() / Math.sqrt(count);
        }
        return x;
    }

    /** The sources' unknowns, if they may change, and the force's. */
    private static double[] unknowns(SolveProblem problem, double size, long seed) {
        double[] force = unknowns(problem.flow(), size, seed);
        int sources = problem.sources() ? Solve.curves(problem.flow()).unknowns() : 0;
        double[] x = new double[sources + force.length];
        Random random = new Random(seed + 10);
        for (int n = 0; n < sources; n++) {
            x[n] = size * random.nextGaussian();
        }
        System.arraycopy(force, 0, x, sources, force.length);
        return x;
    }

    /** 8 steps, one output: the loss. */
    private static Operator chain(boolean light, int substeps) {
        return chain(windy(light, substeps));
    }

    private static Operator chain(SolveProblem problem) {
        SolveLoss loss = loss(problem, wind(problem.flow()), 100, new Lanes(1));
        double[] point = unknowns(problem, 0.2, 1);
        return new Operator("whole chain", point.length, 1, false, point, unknowns(problem, 0.6, 2), (in, out) -> {
            out[0] = loss.evaluate(in, new double[in.length]);
        }, (in, outBar, inBar) -> {
            double[] gradient = new double[in.length];
            loss.evaluate(in, gradient);
            for (int n = 0; n < in.length; n++) {
                inBar[n] += outBar[0] * gradient[n];
            }
        });
    }

    /** Float fields through 8 steps and pictures: the loss carries about 1e-6 of rounding, so a central difference carries 1e-4. */
    abstract static class Chain extends PullbackContract {
        @Override protected double dotTolerance() {
            return 3e-4;
        }

        @Override protected double noise() {
            return 1e-6;
        }
    }

    @Nested class WithoutLight extends Chain {
        @Override protected Operator operator() {
            return chain(false, 1);
        }
    }

    @Nested class WithLight extends Chain {
        @Override protected Operator operator() {
            return chain(true, 1);
        }
    }

    @Nested class WithSources extends Chain {
        @Override protected Operator operator() {
            return chain(windy(true, 1).withSources(true));
        }
    }

    @Nested class WithSourcesInTwoSubsteps extends Chain {
        @Override protected Operator operator() {
            return chain(windy(false, 2).withSources(true));
        }
    }

    @Nested class TwoSubsteps extends Chain {
        @Override protected Operator operator() {
            return chain(false, 2);
        }
    }

    @Nested class WithEdges extends Chain {
        @Override protected Operator operator() {
            return chain(solvedWith(windy(false, 1), LossKind.EDGES));
        }
    }

    @Nested class WithTransport extends Chain {
        @Override protected Operator operator() {
            return chain(solvedWith(windy(false, 1), LossKind.TRANSPORT));
        }
    }

    @Nested class WithSilhouette extends Chain {
        @Override protected Operator operator() {
            return chain(solvedWith(windy(false, 1), LossKind.SILHOUETTE));
        }
    }

    @Nested class WithAllLosses extends Chain {
        @Override protected Operator operator() {
            return chain(solvedWith(windy(false, 1), LossKind.values()));
        }
    }

    private static SolveProblem solvedWith(SolveProblem problem, LossKind... kinds) {
        LossChoice choice = new LossChoice(List.of(kinds), "asked for");
        List<SolveProblem.Note> notes = problem.notes().stream().map(note -> new SolveProblem.Note(note.id(), note.frame(), note.view(),
                note.weight(), new Wish() {
                    @Override public Picture wanted(Picture original) {
                        return note.wish().wanted(original);
                    }

                    @Override public float[] weights(Picture original) {
                        return note.wish().weights(original);
                    }

                    @Override public LossChoice losses(Picture original, Picture wanted) {
                        return choice;
                    }
                })).toList();
        return new SolveProblem(problem.flow(), problem.views(), problem.look(), notes, problem.holds());
    }

    /** A thing beside the smoke that moves along: the pressure and what flows past it know it in every step. */
    @Nested class BesideAThing extends Chain {
        @Override protected Operator operator() {
            SolveProblem problem = windy(false, 1);
            return chain(new SolveProblem(problem.flow().withObstacles(List.of(thing())), problem.views(), problem.look(), problem.notes(),
                    problem.holds()));
        }
    }

    private static Obstacle thing() {
        Curve way = new Curve(List.of(1001.0, 1009.0), List.of(new Vec3(1.6, 0.4, 1), new Vec3(1.65, 0.45, 1)));
        return new Obstacle("stone", new Solid.Ball(0.2), way, Curve.still(new Vec3(0, 0, 0)));
    }

    /** Same bits from any number of kept states; O59, O60: never more steps than the plan. */
    @ParameterizedTest @ValueSource(ints = {1, 2, 3, 5, 7}) void anyMemoryGivesTheSameBits(int snapshots) {
        SolveProblem problem = SolveScene.problem(12, 1009, 1, true);
        double[] x = unknowns(problem.flow(), 1.5, 1);
        double[] all = new double[x.length];
        double[] few = new double[x.length];
        double a = loss(problem, 100, new Lanes(1)).evaluate(x, all);
        double b = loss(problem, snapshots, new Lanes(1)).evaluate(x, few);
        assertEquals(a, b);
        assertArrayEquals(all, few);
        assertTrue(BinomialPlan.leastSteps(8, snapshots) >= 7);
    }

    /** The same from states on disk, and the file is gone afterwards. */
    @ParameterizedTest @CsvSource({"1, 1", "1, 2", "1, 100", "2, 1", "3, 2"}) void diskGivesTheSameBits(int inMemory, int onDisk, @TempDir Path folder) {
        SolveProblem problem = SolveScene.problem(12, 1011, 1, true);
        FlowSetup flow = problem.flow();
        long state = SmokeState.bytes(flow);
        double[] x = unknowns(flow, 1.5, 1);
        double[] all = new double[x.length];
        double[] few = new double[x.length];
        Path file = folder.resolve("states");
        Snapshots states = new Snapshots(flow, new SmokeState(flow.grid()), flow.stepsTo(problem.lastFrame()),
                new StateRoom(inMemory * state, onDisk * state, file));
        double a = loss(problem, 100, new Lanes(1)).evaluate(x, all);
        SolveLoss loss = loss(problem, states, new Lanes(1));
        double b = loss.evaluate(x, few);
        assertEquals(Math.min(onDisk, flow.stepsTo(problem.lastFrame()) - 1 - inMemory), states.onDisk());
        assertEquals(a, b);
        assertArrayEquals(all, few);
        assertEquals(a, loss.evaluate(x, new double[x.length]));
        loss.release();
        assertFalse(Files.exists(file));
    }

    /** A disk that refuses ends the gradient with its own words. */
    @Test void aDiskThatRefusesIsNamed(@TempDir Path folder) {
        SolveProblem problem = SolveScene.problem(12, 1009, 1, false);
        long state = SmokeState.bytes(problem.flow());
        Snapshots states = new Snapshots(problem.flow(), new SmokeState(problem.flow().grid()), 8,
                new StateRoom(state, 3 * state, folder.resolve("none").resolve("states")));
        SolveLoss loss = loss(problem, states, new Lanes(1));
        double[] x = unknowns(problem.flow(), 1, 1);
        UncheckedIOException refused = assertThrows(UncheckedIOException.class, () -> loss.evaluate(x, new double[x.length]));
        assertTrue(refused.getMessage().contains("cannot make"), refused::getMessage);
    }

    /** Things that move stand where the step says, whichever way the sweep comes to it. */
    @Test void anyMemoryGivesTheSameBitsAmongMovingThings() {
        SolveProblem plain = SolveScene.problem(12, 1007, 2, false);
        Curve way = new Curve(List.of(1001.0, 1007.0), List.of(new Vec3(0.6, 0.9, 1), new Vec3(1.4, 0.9, 1)));
        Obstacle drum = new Obstacle("drum", new Solid.Cylinder(0.2, 0.4), way, Curve.still(new Vec3(0.3, 0, 0.2)));
        SolveProblem problem = new SolveProblem(plain.flow().withObstacles(List.of(drum)), plain.views(), plain.look(), plain.notes(),
                plain.holds());
        double[] x = unknowns(problem.flow(), 1.5, 1);
        double[] all = new double[x.length];
        double[] few = new double[x.length];
        assertEquals(loss(problem, 100, new Lanes(1)).evaluate(x, all), loss(problem, 2, new Lanes(1)).evaluate(x, few));
        assertArrayEquals(all, few);
    }

    @ParameterizedTest @ValueSource(ints = {2, 3, 5}) void anyThreadCountGivesTheSameBits(int threads) {
        SolveProblem problem = SolveScene.problem(16, 1009, 1, true);
        double[] x = unknowns(problem.flow(), 1.5, 1);
        double[] one = new double[x.length];
        double[] many = new double[x.length];
        double a = loss(problem, 100, new Lanes(1)).evaluate(x, one);
        try (Lanes lanes = new Lanes(threads)) {
            double b = loss(problem, 3, lanes).evaluate(x, many);
            assertEquals(a, b);
        }
        assertArrayEquals(one, many);
    }

    /** Descent for real: a few gradient steps on the true chain lower the loss by what the gradient foretells. */
    @Test void theGradientForetellsTheFall() {
        SolveProblem problem = SolveScene.problem(12, 1009, 1, false);
        SolveLoss loss = loss(problem, 100, new Lanes(1));
        double[] x = unknowns(problem.flow(), 0, 1);
        double[] gradient = new double[x.length];
        double start = loss.evaluate(x, gradient);
        double squares = 0;
        for (double g : gradient) {
            squares += g * g;
        }
        double step = 0.02 * start / squares;
        for (int n = 0; n < x.length; n++) {
            x[n] -= step * gradient[n];
        }
        double now = loss.evaluate(x, gradient);
        assertEquals(-0.02 * start, now - start, 0.004 * start);
    }
}

package org.wispwright.optimize.flow;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.optimize.solid.Obstacle;
import org.wispwright.optimize.solid.Solid;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;
import org.wispwright.render.volume.ScalarGrid;

/** Wind, sources that move, and what is in the box on the first frame. Expected values by hand. */
class AirTest {
    private static final GridShape BOX = new GridShape(10, 8, 6, 0.5);
    private static final Vec3 ZERO = new Vec3(0, 0, 0);
    private static final Wind BREEZE = new Wind(new Curve(List.of(1.0, 3.0), List.of(ZERO, new Vec3(0, -4, 1))), Curve.still(new Vec3(3,
            0, 0)), 0.7);

    private static FlowSetup flow(Sides sides, Source... sources) {
        return new FlowSetup(BOX, new FrameRange(1, 9, 2), 1, Interpolation.LINEAR, Interpolation.LINEAR, sides, 0, 0, List.of(sources));
    }

    private static SmokeState step(FlowSetup flow, SmokeState in, int n) {
        SmokeState out = new SmokeState(flow.grid());
        new SmokeSolver(flow, FlowOperators.ONE).step(in, null, flow.step(n), false, out);
        return out;
    }

    /** u' = -d (u - W), so still air has W (1 - exp(-d t)) after t; a push adds t a, that of the step's middle: a quarter of (0, -4, 1). */
    @Test void stillAirTakesOnTheWind() {
        SmokeState after = step(flow(FlowOperators.OPEN).withWind(BREEZE), new SmokeState(BOX), 0);
        for (float u : after.velocity().x()) {
            assertEquals(3 * (1 - Math.exp(-0.7 * 0.5)), u, 1e-6);
        }
        SmokeState moving = new SmokeState(BOX);
        java.util.Arrays.fill(moving.velocity().x(), 2f);
        assertEquals(3 - Math.exp(-0.7 * 0.5), step(flow(FlowOperators.OPEN).withWind(BREEZE), moving, 0).velocity().x()[50], 1e-6);
        for (float v : after.velocity().y()) {
            assertEquals(-4 * 0.25 * 0.5, v, 1e-6);
        }
        for (float w : after.velocity().z()) {
            assertEquals(0.25 * 0.5, w, 1e-6);
        }
    }

    /** In a closed box pressure takes back what is the same everywhere (hydrostatic balance, outside check O23). */
    @Test void inAClosedBoxNothingBlows() {
        SmokeState after = step(flow(Sides.CLOSED).withWind(BREEZE), new SmokeState(BOX), 1);
        for (float u : after.velocity().x()) {
            assertEquals(0, u, 2e-6);
        }
    }

    @Nested class StepInTheWind extends PullbackContract {
        @Override protected double largestStep() {
            return 2;                                                          // three halvings above the rounding of float
        }

        @Override protected Operator operator() {
            GridShape box = new GridShape(7, 6, 9, 0.5);
            Wind light = new Wind(Curve.still(new Vec3(0.02, 0.01, 0.03)), Curve.still(new Vec3(0.2, 0.2, 0.2)), 0.4);
            return FlowOperators.step(FlowOperators.setup(box, Interpolation.LINEAR, Interpolation.LINEAR, FlowOperators.OPEN,
                    1).withWind(light));
        }
    }

    /** A source that goes a cell a frame feeds the cell it stands over when the frame is there, and a ball's cell is the ball's alone. */
    @Test void aSourceThatMoves() {
        Curve way = new Curve(List.of(1.0, 5.0), List.of(new Vec3(1.25, 1.25, 1.25), new Vec3(3.25, 1.25, 1.25)));
        Source spark = new Source("spark", Source.Form.ball(0.2), way, 0, 3, 0, 1, 9);
        FlowSetup flow = flow(Sides.CLOSED, spark);
        SmokeSolver solver = new SmokeSolver(flow, FlowOperators.ONE);
        SmokeState state = new SmokeState(BOX);
        for (int n = 0; n < 3; n++) {
            SmokeState next = new SmokeState(BOX);
            solver.step(state, null, flow.step(n), false, next);
            state = next;
        }
        for (int i = 0; i < 10; i++) {
            assertEquals(i >= 3 && i <= 5 ? 3 * 0.5 : 0, state.density().at(i, 2, 2), 1e-6, "cell " + i);
        }
        assertEquals(3 * 3 * 0.5, state.density().sum(), 1e-5);
    }

    /** A box of 1.5 x 0.5 x 1 m fills 3 x 1 x 2 cells; in its rim of a quarter of a metre the share is s(t) = 3t^2 - 2t^3. */
    @Test void aBoxGivesOffSmoke() {
        Source hard = new Source("box", Source.Form.box(new Vec3(0.75, 0.25, 0.5)), Curve.still(new Vec3(2.25, 1.25, 1.5)), 0, 2, 0, 1, 9);
        assertEquals(3 * 1 * 2 * 2 * 0.5, step(flow(Sides.CLOSED, hard), new SmokeState(BOX), 0).density().sum(), 1e-5);
        Source soft = new Source("box", Source.Form.box(new Vec3(0.75, 0.25, 0.5)), Curve.still(ZERO), 0.25, 2, 0, 1, 9);
        assertEquals(1, soft.shareAt(0.5, 0, 0.25));
        assertEquals(0.5, soft.shareAt(0.625, 0, 0), 1e-15);
        assertEquals(3 / 16.0 - 2 / 64.0, soft.shareAt(0, 0.1875, 0), 1e-15);
        assertEquals(0, soft.shareAt(0, 0.25, 0));
        assertEquals(0.5, soft.shareAt(0, 0, 0.375), 1e-15);
        assertEquals(0, soft.shareAt(0, 0, 0.6));
    }

    /** Halving: means of eight cells; faces that coarse cells keep have the mean of their four; sums and a divergence of 0 stay (Gauss). */
    @Test void aStartOnHalfTheCells() {
        ScalarGrid density = new ScalarGrid(BOX, FlowOperators.noise(BOX.cells(), 1, 1, 1));
        MacVelocity u = new MacVelocity(BOX, FlowOperators.noise(BOX.xFaces(), 0, 1, 2), FlowOperators.noise(BOX.yFaces(), 0, 1, 3),
                FlowOperators.noise(BOX.zFaces(), 0, 1, 4));
        new Projection(BOX, Sides.CLOSED, FlowOperators.ONE).apply(u);
        FlowSetup flow = flow(Sides.CLOSED).withStart(new Start(Optional.of(density), Optional.empty(), Optional.of(u)));
        assertArrayEquals(density.values(), flow.startState().density().values());
        assertArrayEquals(u.y(), flow.startState().velocity().y());
        GridShape half = new GridShape(5, 4, 3, 1);
        SmokeState coarse = flow.on(half).startState();
        assertEquals(density.sum(), 8 * coarse.density().sum(), 1e-3);
        float mean = 0;
        for (int n = 0; n < 8; n++) {
            mean += density.at(4 + n % 2, 2 + n / 2 % 2, 4 + n / 4) / 8;
        }
        assertEquals(mean, coarse.density().at(2, 1, 2), 1e-6);
        float[] d = new float[half.cells()];
        assertTrue(DivergenceKernel.relativeMax(coarse.velocity(), d, k -> { }, FlowOperators.ONE) < 3e-6);
        float flux = 0;
        for (int n = 0; n < 4; n++) {
            flux += u.x()[BOX.xFace(4, 2 + n % 2, 4 + n / 2)] / 4;
        }
        assertEquals(flux, coarse.velocity().x()[half.xFace(2, 1, 2)], 1e-6);
    }

    /** Smoke that the volumes put where a thing stands is not there on the first frame. */
    @Test void aStartLeavesSolidsEmpty() {
        ScalarGrid full = new ScalarGrid(BOX);
        full.fill(1);
        Obstacle ball = new Obstacle("ball", new Solid.Ball(0.8), Curve.still(new Vec3(2.25, 2.25, 1.25)), Curve.still(ZERO));
        SmokeState start = flow(Sides.CLOSED).withStart(new Start(Optional.of(full), Optional.empty(),
                Optional.empty())).withObstacles(List.of(ball)).startState();
        assertEquals(0, start.density().at(4, 4, 2));
        assertEquals(1, start.density().at(0, 4, 2));
    }

    /** Thirds: the mean over a cell of one and a half cells counts the second by half. */
    @Test void aStartOnTwoThirdsOfTheCells() {
        float[] out = new float[2];
        Averages.resample(new float[] {1, 4, 10}, new int[] {3, 1, 1}, out, new int[] {2, 1, 1}, -1);
        assertArrayEquals(new float[] {(1 + 2) / 1.5f, (2 + 10) / 1.5f}, out, 1e-6f);
        float[] faces = new float[3];
        Averages.resample(new float[] {1, 4, 10, 2}, new int[] {4, 1, 1}, faces, new int[] {3, 1, 1}, 0);
        assertArrayEquals(new float[] {1, 7, 2}, faces, 1e-6f);
    }
}

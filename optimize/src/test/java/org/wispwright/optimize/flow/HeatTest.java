package org.wispwright.optimize.flow;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;
import org.wispwright.render.volume.ScalarGrid;

/** Smoke that rises because it is warm. */
class HeatTest {
    private static final GridShape BOX = new GridShape(9, 8, 7, 0.5);

    private static FlowSetup flow(double buoyancy, Heat heat, Source... sources) {
        return new FlowSetup(BOX, new FrameRange(1, 9, 4), 1, Interpolation.LINEAR, Interpolation.CUBIC, Sides.CLOSED, buoyancy, 0.3,
                List.of()).withHeat(heat).withSources(List.of(sources));
    }

    private static SmokeState step(FlowSetup flow, SmokeState in) {
        SmokeState out = SmokeState.of(flow);
        new SmokeSolver(flow, FlowOperators.ONE).step(in, null, flow.step(0), false, out);
        return out;
    }

    /** Boussinesq: what counts is the acceleration, so warmth of T moves air as smoke of T lift / buoyancy does (checked by O21, O22). */
    @Test void warmthLiftsAsSmokeDoes() {
        float[] blob = FlowOperators.noise(BOX.cells(), 1, 1, 3);
        FlowSetup smoky = flow(2, Heat.NONE);
        SmokeState smoke = new SmokeState(BOX);
        System.arraycopy(blob, 0, smoke.density().values(), 0, blob.length);
        FlowSetup warm = flow(0, new Heat(0.5, 0));
        SmokeState warmth = SmokeState.of(warm);
        for (int c = 0; c < blob.length; c++) {
            warmth.temperature().values()[c] = 4 * blob[c];
        }
        assertArrayEquals(step(smoky, smoke).velocity().y(), step(warm, warmth).velocity().y(), 1e-6f);
    }

    /** Newton's law of cooling: T exp(-k t) in still air (uniform, so nothing moves), beside a density with a decay of its own. */
    @Test void coolingIsExact() {
        FlowSetup flow = flow(0, new Heat(0.5, 1.7));
        SmokeState state = SmokeState.of(flow);
        state.temperature().fill(80);
        state.density().fill(1);
        SmokeState after = step(flow, state);
        assertEquals(80 * Math.exp(-1.7 * 0.25), after.temperature().at(4, 4, 4), 1e-4);
        assertEquals(Math.exp(-0.3 * 0.25), after.density().at(4, 4, 4), 1e-6);
    }

    /** A source warms by its rate times the time, and where a thing stands nothing is warm. */
    @Test void sourcesWarm() {
        Source stove = new Source("stove", Source.Form.box(new Vec3(9, 9, 9)), Curve.still(new Vec3(2, 2, 2)), 0, 0, 40, 1, 9);
        assertEquals(40 * 0.25, step(flow(0, new Heat(0.01, 0), stove), SmokeState.of(flow(0, new Heat(0.01, 0)))).temperature().at(1, 1, 1), 1e-5);
        FlowSetup blocked = flow(0, new Heat(0.01, 0), stove).withObstacles(FlowOperators.things(BOX));
        SmokeState after = step(blocked, SmokeState.of(blocked));
        int cold = 0;
        for (float t : after.temperature().values()) {
            cold += t == 0 ? 1 : 0;
        }
        assertTrue(cold > 10, "cold cells: " + cold);
    }

    @Test void warmthNeedsALift() {
        Source stove = new Source("stove", Source.Form.ball(1), Curve.still(new Vec3(2, 2, 2)), 0, 0, 40, 1, 9);
        assertThrows(IllegalArgumentException.class, () -> flow(1, Heat.NONE, stove));
        assertThrows(IllegalArgumentException.class, () -> new Heat(Double.NaN, 0));
        assertThrows(IllegalArgumentException.class, () -> new Heat(1, -1));
        Start warm = new Start(Optional.empty(), Optional.of(new ScalarGrid(BOX)), Optional.empty());
        assertThrows(IllegalArgumentException.class, () -> flow(1, Heat.NONE).withStart(warm));
        assertEquals(0, flow(1, new Heat(1, 0)).withStart(warm).startState().temperature().at(0, 0, 0));
    }

    @Nested class StepWithWarmth extends PullbackContract {
        @Override protected double largestStep() {
            return 2;
        }

        @Override protected Operator operator() {
            return warmStep(new GridShape(7, 6, 9, 0.5));
        }
    }

    /** Inputs: density, temperature, velocity. Outputs the same. */
    private static Operator warmStep(GridShape shape) {
        FlowSetup setup = FlowOperators.setup(shape, Interpolation.LINEAR, Interpolation.LINEAR, FlowOperators.OPEN, 1).withHeat(new Heat(0.3, 0.2));
        SmokeSolver solver = new SmokeSolver(setup, FlowOperators.ONE);
        int cells = shape.cells();
        int count = 2 * cells + shape.xFaces() + shape.yFaces() + shape.zFaces();
        float[] q = new float[cells];
        for (int n = 0; n < cells; n++) {
            q[n] = (float) (0.02 * (n % shape.nx()) + 0.03 * (n / shape.nx() % shape.ny()) + 0.01 * (n / (shape.nx() * shape.ny())));
        }
        MacVelocity u = FlowOperators.shear(shape, 0.33f, 0.8f);
        MacVelocity way = FlowOperators.shear(shape, 0.04f, -0.1f);
        double[] point = FlowOperators.pack(q, q, u.x(), u.y(), u.z());
        double[] direction = FlowOperators.pack(FlowOperators.noise(cells, 0.1, 0.002, 4), FlowOperators.noise(cells, 0.1, 0.002, 5), way.x(), way.y(),
                way.z());
        return new Operator("step with warmth", count, count, false, point, direction, (in, out) -> {
            SmokeState next = SmokeState.of(setup);
            solver.step(read(setup, in), null, setup.step(0), false, next);
            FlowOperators.write(out, parts(next));
        }, (in, outBar, inBar) -> {
            SmokeState state = read(setup, in);
            SmokeState next = SmokeState.of(setup);
            solver.step(state, null, setup.step(0), false, next);
            SmokeState bar = read(setup, outBar);
            solver.pullback(state, next.velocity(), setup.step(0), false, bar, null);
            FlowOperators.add(inBar, parts(bar));
        });
    }

    private static SmokeState read(FlowSetup setup, double[] packed) {
        SmokeState state = SmokeState.of(setup);
        FlowOperators.unpack(packed, parts(state));
        return state;
    }

    private static float[][] parts(SmokeState state) {
        return new float[][] {state.density().values(), state.temperature().values(), state.velocity().x(), state.velocity().y(),
            state.velocity().z()};
    }
}

package org.wispwright.optimize.flow;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/** Outside checks O69, O70 for a step by the strengths of its sources. Claerbout (1992), Earth Soundings Analysis. */
class StrengthPullbackTest {
    private static final GridShape BOX = new GridShape(9, 7, 8, 0.5);
    private static final Substep AT = new Substep(2, 0, 1);

    /** A still ball, a box that moves, and one that does not feed this frame. */
    private static FlowSetup setup() {
        Curve way = new Curve(List.of(1.0, 5.0), List.of(new Vec3(1, 1, 1.4), new Vec3(3, 2, 2.6)));
        return FlowOperators.setup(BOX, Interpolation.LINEAR, Interpolation.CUBIC, FlowOperators.OPEN, 1).withHeat(new Heat(0.4, 0.2))
                .withSources(List.of(new Source("ball", Source.Form.ball(1.2), Curve.still(new Vec3(2, 1.5, 2)), 0.5, 1.5, 20, 1, 9),
                        new Source("box", Source.Form.box(new Vec3(0.8, 0.6, 0.9)), way, 0.3, 2, -5, 1, 9),
                        new Source("later", Source.Form.ball(1), Curve.still(new Vec3(2, 2, 2)), 0.5, 1, 0, 5, 9)));
    }

    /** Inputs: strengths. Outputs: density, temperature. */
    private static Operator operator(FlowSetup setup) {
        SmokeSolver solver = new SmokeSolver(setup, new Lanes(1));
        SmokeState in = SmokeState.of(setup);
        int cells = BOX.cells();
        return new Operator("strengths", 3, 2 * cells, true, new double[] {1.5, 0.25, 1}, new double[] {0.5, -0.2, 1}, (x, out) -> {
            SmokeState next = SmokeState.of(setup);
            solver.step(in, null, x, AT, false, next);
            for (int n = 0; n < cells; n++) {
                out[n] = next.density().values()[n];
                out[cells + n] = next.temperature().values()[n];
            }
        }, (x, outBar, xBar) -> {
            SmokeState next = SmokeState.of(setup);
            solver.step(in, null, x, AT, false, next);
            SmokeState bar = SmokeState.of(setup);
            for (int n = 0; n < cells; n++) {
                bar.density().values()[n] = (float) outBar[n];
                bar.temperature().values()[n] = (float) outBar[cells + n];
            }
            solver.pullback(in, next.velocity(), AT, false, bar, new MacVelocity(BOX), xBar);
        });
    }

    @Nested class InAnEmptyBox extends PullbackContract {
        @Override protected Operator operator() {
            return StrengthPullbackTest.operator(setup());
        }
    }

    /** The ball reaches into a thing: what it gives there is taken away. */
    @Nested class IntoAThing extends PullbackContract {
        @Override protected Operator operator() {
            return StrengthPullbackTest.operator(setup().withObstacles(FlowOperators.things(BOX)));
        }
    }

    /** By hand: from nothing, a step of 1 s leaves rate times strength in the core of a source, and nothing of one that is shut. */
    @Test void multipliesTheRates() {
        FlowSetup setup = setup();
        SmokeState out = SmokeState.of(setup);
        new SmokeSolver(setup, new Lanes(1)).step(SmokeState.of(setup), null, new double[] {0.5, 0, 7}, AT, false, out);
        int core = BOX.cell(3, 2, 3);                                          // its centre lies 0.43 m from the ball's
        assertEquals(0.5 * 1.5, out.density().values()[core], 1e-6);
        assertEquals(0.5 * 20, out.temperature().values()[core], 1e-5);
        double sum = out.density().sum();
        SmokeState both = SmokeState.of(setup);
        new SmokeSolver(setup, new Lanes(1)).step(SmokeState.of(setup), null, new double[] {0.5, 1, 7}, AT, false, both);
        assertEquals(true, both.density().sum() > sum + 0.1);
    }
}

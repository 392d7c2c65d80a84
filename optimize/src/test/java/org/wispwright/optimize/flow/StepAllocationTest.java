package org.wispwright.optimize.flow;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.lang.management.ManagementFactory;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/** A warm step and its pullback make no field: counted by the JVM on the calling thread, with one lane. Limit: ours, far below a field. */
class StepAllocationTest {
    /** A field of 24^3 cells is 55296 bytes, one of its slabs 2304. */
    private static final int N = 24;

    @ParameterizedTest
    @EnumSource(Interpolation.class)
    void aWarmStepReusesItsWorkspace(Interpolation interpolation) {
        GridShape box = new GridShape(N, N, N, 0.1);
        Sides open = new Sides(Side.OPEN, Side.OPEN, Side.WALL, Side.OPEN, Side.OPEN, Side.OPEN);
        FlowSetup flow = new FlowSetup(box, new FrameRange(1, 9, 24), 1, interpolation, interpolation, open, 8, 0.1,
                List.of(new Source("pot", 1.2, 0.5, 1.2, 0.3, 0.2, 6, 1, 9)));
        try (Lanes lanes = new Lanes(1)) {
            SmokeSolver solver = new SmokeSolver(flow, lanes);
            SmokeState in = SmokeState.of(flow);
            SmokeState out = SmokeState.of(flow);
            SmokeState bar = SmokeState.of(flow);
            MacVelocity force = new MacVelocity(box);
            Runnable both = () -> {
                solver.step(in, force, flow.step(0), false, out);
                solver.pullback(in, out.velocity(), flow.step(0), true, bar, force);
            };
            both.run();
            both.run();
            com.sun.management.ThreadMXBean threads = (com.sun.management.ThreadMXBean) ManagementFactory.getThreadMXBean();
            long before = threads.getCurrentThreadAllocatedBytes();
            both.run();
            long bytes = threads.getCurrentThreadAllocatedBytes() - before;
            assertTrue(bytes < 4 * N * N * N, () -> "a step and its pullback allocated " + bytes + " bytes; one field is " + 4 * N * N * N);
        }
    }
}

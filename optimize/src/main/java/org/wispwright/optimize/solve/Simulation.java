package org.wispwright.optimize.solve;

import java.util.function.BooleanSupplier;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.flow.Substep;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.render.volume.MacVelocity;

/** A plain run of a shot from its first frame to its last, with or without a force. */
public final class Simulation {
    private Simulation() { }

    /** Told of each frame. */
    @FunctionalInterface
    public interface EachFrame {
        /**
         * One frame is done.
         *
         * @param frame frame number
         * @param state to read; it changes when this returns
         * @param force the force of the step that led here, m/s2; null for the first frame and without a force
         */
        void frame(int frame, SmokeState state, MacVelocity force);

        /** The start, and each substep's end before its frame is told of: the state is to read, and changes when this returns. */
        default void substep(SmokeState state) { }
    }

    /** Runs all frames with the sources as they were set up: see the other. */
    public static void run(SmokeSolver solver, SmokeState start, ForceBasis basis, double[] x, int lastFrame,
                           BooleanSupplier cancelled, EachFrame each) {
        run(solver, start, basis, x, null, lastFrame, cancelled, each);
    }

    /**
     * Runs all frames.
     *
     * @param solver    the shot's solver
     * @param start     read: the state of the first frame
     * @param basis     of the force; not used if x is null
     * @param x         unknowns; null for no force
     * @param strengths of the sources, [step][source]; null for 1
     * @param lastFrame where to stop, inside the shot's frames
     * @param cancelled asked before each step
     * @throws SolveCancelled if cancelled
     */
    public static void run(SmokeSolver solver, SmokeState start, ForceBasis basis, double[] x, double[][] strengths, int lastFrame,
                           BooleanSupplier cancelled, EachFrame each) {
        int first = solver.setup().frames().first();
        int substeps = solver.setup().substeps();
        SmokeState now = start.copy();
        SmokeState next = SmokeState.of(solver.setup());
        MacVelocity force = x == null ? null : new MacVelocity(solver.setup().grid());
        boolean follows = false;
        each.substep(now);
        each.frame(first, now, null);
        for (int frame = first + 1; frame <= lastFrame; frame++) {
            if (force != null) {
                basis.force(x, frame - first - 1, force);
            }
            for (int n = 0; n < substeps; n++) {
                if (cancelled.getAsBoolean()) {
                    throw new SolveCancelled();
                }
                solver.step(now, force, strengths == null ? null : strengths[frame - first - 1], new Substep(frame, n, substeps), follows,
                        next);
                follows = true;
                SmokeState swap = now;
                now = next;
                next = swap;
                each.substep(now);
            }
            each.frame(frame, now, force);
        }
    }
}

package org.wispwright.ui.work;

import java.util.function.ObjIntConsumer;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.TakeDraft;
import org.wispwright.ui.shot.TakeRecord;
import org.wispwright.ui.shot.Takes;

/** Simulates a shot without extra force, as take 0. Same bits for any number of lanes. */
public final class SimulateWork {
    private SimulateWork() {
    }

    /**
     * What came out.
     *
     * @param made false if take 0 was there already and belongs to the set-up, so nothing was done
     * @param frames frames in the take
     * @param seconds that the run took
     * @param lastMass sum of density times cell volume in the last frame, m3
     * @param divergenceMax largest |div u| h / |u| of any frame; 0 if nothing was done
     */
    public record Result(boolean made, int frames, double seconds, double lastMass, double divergenceMax) {
    }

    /**
     * Runs the simulation and adds take 0, if it is not there yet.
     *
     * @throws org.wispwright.ui.shot.ShotException if a take 0 of another set-up is there, or the disk refuses
     * @throws Cancel.Cancelled if cancelled; no take is left
     */
    public static Result run(ShotFolder folder, Shot shot, Lanes lanes, Progress progress, Cancel cancel) {
        long start = System.nanoTime();
        FlowSetup flow = shot.flow();
        Takes takes = Takes.of(folder);
        if (takes.has(0)) {
            takes.requireOf(0, flow);
            double mass = mass(takes.state(0, flow.frames().last(), flow));
            return new Result(false, flow.frames().count(), seconds(start), mass, 0);
        }
        double[] figures = new double[2];
        try (TakeDraft draft = takes.draft()) {
            SmokeSolver measure = new SmokeSolver(flow, lanes);
            frames(flow, lanes, progress, cancel, (state, frame) -> {
                draft.write(frame, state);
                figures[0] = mass(state);
                figures[1] = Math.max(figures[1], frame == flow.frames().first() ? 0 : measure.relativeDivergence(state.velocity()));
            });
            cancel.stopIfWished();
            TakeRecord record = TakeRecord.original(Build.version(), flow);
            draft.finishAsOriginal(record);
        }
        return new Result(true, flow.frames().count(), seconds(start), figures[0], figures[1]);
    }

    /**
     * Runs the simulation and hands every frame's state to {@code each}, the first frame's still air included. The state is
     * overwritten afterwards: copy what is to stay.
     *
     * @throws Cancel.Cancelled if cancelled
     */
    static void frames(FlowSetup flow, Lanes lanes, Progress progress, Cancel cancel, ObjIntConsumer<SmokeState> each) {
        SmokeSolver solver = new SmokeSolver(flow, lanes);
        SmokeState now = new SmokeState(flow.grid());
        SmokeState next = new SmokeState(flow.grid());
        FrameRange frames = flow.frames();
        long start = System.nanoTime();
        each.accept(now, frames.first());
        for (int frame = frames.first() + 1; frame <= frames.last(); frame++) {
            for (int substep = 0; substep < flow.substeps(); substep++) {
                cancel.stopIfWished();
                solver.step(now, null, frame, next);
                SmokeState swap = now;
                now = next;
                next = swap;
            }
            each.accept(now, frame);
            double done = (double) (frame - frames.first()) / (frames.count() - 1);
            progress.now("simulate: frame " + frame + " of " + frames.last() + ", about " + Math.round(seconds(start) * (1 / done - 1)) + " s left");
        }
    }

    private static double mass(SmokeState state) {
        double h = state.density().shape().cellMetres();
        return state.density().sum() * h * h * h;
    }

    private static double seconds(long start) {
        return (System.nanoTime() - start) / 1e9;
    }
}

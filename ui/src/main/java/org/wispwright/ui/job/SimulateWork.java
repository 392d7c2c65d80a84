package org.wispwright.ui.job;

import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.solve.Simulation;
import org.wispwright.optimize.solve.SolveCancelled;
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
            double mass = FrameWriting.mass(takes.density(0, flow.frames().last(), flow));
            return new Result(false, flow.frames().count(), seconds(start), mass, 0);
        }
        try (TakeDraft draft = takes.draft()) {
            FrameWriting writing = new FrameWriting(flow, draft, "simulate", progress);
            SmokeSolver solver = new SmokeSolver(flow, lanes);
            Simulation.run(solver, flow.startState(), null, null, flow.frames().last(), cancel::wished,
                    (frame, state, force) -> writing.frame(frame, state, solver));
            cancel.stopIfWished();
            if (takes.has(0)) {
                // Another run was quicker; its original has the same bits, if it is of this set-up.
                takes.requireOf(0, flow);
                return new Result(false, flow.frames().count(), seconds(start), writing.lastMass(), writing.divergenceMax());
            }
            draft.finishAsOriginal(TakeRecord.original(Build.version(), flow));
            return new Result(true, flow.frames().count(), seconds(start), writing.lastMass(), writing.divergenceMax());
        } catch (SolveCancelled asked) {
            throw new Cancel.Cancelled();
        }
    }

    private static double seconds(long start) {
        return (System.nanoTime() - start) / 1e9;
    }
}

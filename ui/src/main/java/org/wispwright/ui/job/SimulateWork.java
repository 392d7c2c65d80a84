package org.wispwright.ui.job;

import java.util.Locale;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.solve.Pacing;
import org.wispwright.optimize.solve.Simulation;
import org.wispwright.optimize.solve.SolveCancelled;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotException;
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
     * @param flow what was simulated, its number of substeps found
     */
    public record Result(boolean made, int frames, double seconds, double lastMass, double divergenceMax, FlowSetup flow) {
    }

    /**
     * Runs the simulation and adds take 0, if it is not there yet. Where the shot states a largest displacement it runs again with more
     * substeps until the air keeps to it.
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
            flow = takes.paced(flow);                                          // it may have come since the shot was read
            double mass = FrameWriting.mass(takes.density(0, flow.frames().last(), flow));
            return new Result(false, flow.frames().count(), seconds(start), mass, 0, flow);
        }
        try (TakeDraft draft = takes.draft()) {
            FrameWriting writing = run(flow, draft, lanes, progress, cancel);
            while (!writing.pacing().holds()) {
                flow = next(writing.pacing());
                progress.milestone(String.format(Locale.ROOT, "simulate: air moves %.2f cells in a substep; again with %d substeps a frame",
                        writing.pacing().cells(), flow.substeps()));
                writing = run(flow, draft, lanes, progress, cancel);
            }
            flow = writing.pacing().found();
            boolean made = !takes.has(0);
            if (made) {
                draft.finishAsOriginal(TakeRecord.original(Build.version(), flow, writing.pacing().cells()));
            } else {
                // Another run was quicker; its original has the same bits, if it is of this set-up.
                takes.requireOf(0, flow);
            }
            return new Result(made, flow.frames().count(), seconds(start), writing.lastMass(), writing.divergenceMax(), flow);
        } catch (SolveCancelled asked) {
            throw new Cancel.Cancelled();
        }
    }

    private static FrameWriting run(FlowSetup flow, TakeDraft draft, Lanes lanes, Progress progress, Cancel cancel) {
        SmokeSolver solver = new SmokeSolver(flow, lanes);
        FrameWriting writing = new FrameWriting(flow, solver, draft, "simulate", progress);
        Simulation.run(solver, flow.startState(), null, null, flow.frames().last(), cancel::wished, writing);
        cancel.stopIfWished();
        return writing;
    }

    private static FlowSetup next(Pacing pacing) {
        try {
            return pacing.next();
        } catch (IllegalArgumentException tooFast) {
            throw new ShotException(new Finding("shot.json", "/flow/largestDisplacementCells", tooFast.getMessage() + "."), tooFast);
        }
    }

    private static double seconds(long start) {
        return (System.nanoTime() - start) / 1e9;
    }
}

package org.wispwright.ui.job;

import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.solve.NotFinite;
import org.wispwright.optimize.solve.Pacing;
import org.wispwright.optimize.solve.Simulation;
import org.wispwright.render.volume.MacVelocity;
import org.wispwright.render.volume.ScalarGrid;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.TakeDraft;

/** Writes each frame of a run into a draft and measures it on the way. One thread. */
final class FrameWriting implements Simulation.EachFrame {
    private final FlowSetup flow;
    private final SmokeSolver solver;
    private final Pacing pacing;
    private final TakeDraft draft;
    private final String what;
    private final Progress progress;
    private final long start = System.nanoTime();
    private double lastMass;
    private double divergenceMax;

    FrameWriting(FlowSetup flow, SmokeSolver solver, TakeDraft draft, String what, Progress progress) {
        this.flow = flow;
        this.solver = solver;
        pacing = new Pacing(flow);
        this.draft = draft;
        this.what = what;
        this.progress = progress;
    }

    /** @throws ShotException if a value of the frame is not finite: the run has blown up, and there is no take of it */
    @Override
    public void frame(int frame, SmokeState state, MacVelocity force) {
        NotFinite.in(state, "frame " + frame).ifPresent(bad -> {
            throw new ShotException(new Finding("shot.json", "/flow", what + ": the simulation blows up: " + bad
                    + "; make sources, buoyancy, lift or wind weaker, or give more substeps."));
        });
        draft.write(frame, state);
        lastMass = mass(state.density());
        progress.frame(frame, flow.frames().last());
        int done = frame - flow.frames().first();
        if (done > 0) {
            divergenceMax = Math.max(divergenceMax, solver.relativeDivergence(state.velocity()));
            double seconds = (System.nanoTime() - start) / 1e9;
            progress.now(what + ": frame " + frame + " of " + flow.frames().last() + ", about "
                    + Math.round(seconds * (flow.frames().count() - 1 - done) / done) + " s left");
        }
    }

    @Override
    public void substep(SmokeState state) {
        pacing.add(state);
    }

    /** How far air moved in a substep of the run so far. */
    Pacing pacing() {
        return pacing;
    }

    /** Sum of density times cell volume in the frame written last, m3. */
    double lastMass() {
        return lastMass;
    }

    /** Largest |div u| h / |u| of any frame after the first. */
    double divergenceMax() {
        return divergenceMax;
    }

    static double mass(ScalarGrid density) {
        double h = density.shape().cellMetres();
        return density.sum() * h * h * h;
    }
}

package org.wispwright.optimize.solve;

import java.util.Locale;
import java.util.function.BooleanSupplier;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.Pace;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.MacVelocity;

/**
 * How far air moves in a substep of a run, and with how many substeps a frame it would move no farther than the shot's {@link Pace} says.
 * <p>A run of n substeps a frame of which the fastest face moves {@code d = speed dt / h} cells in one holds if {@code d <= most};
 * otherwise the next run takes {@code ceil(n d / most)}, which is more than n, and so on until one holds. Ours. The speeds of two runs
 * differ little, so it is one or two runs, all from the original: a force that is found later may move air faster.
 */
public final class Pacing {
    private final FlowSetup flow;
    private double cells;

    /** For one run of this set-up. */
    public Pacing(FlowSetup flow) {
        this.flow = flow;
    }

    /** Takes note of the run's start, or of where a substep ended. */
    public void add(SmokeState state) {
        double moved = state.velocity().largest() * flow.frames().secondsPerFrame() / flow.substeps() / flow.grid().cellMetres();
        cells = Math.max(cells, moved);
    }

    /** The farthest that air moved in a substep so far, in cells along an axis. */
    public double cells() {
        return cells;
    }

    /** True if the run's number of substeps is the shot's: it was stated, or air moved no farther than stated. */
    public boolean holds() {
        return flow.pace().mostCells() == 0 || cells <= flow.pace().mostCells();
    }

    /** The set-up that ran, with its number of substeps found. */
    public FlowSetup found() {
        return flow.withPace(flow.pace().found(flow.substeps()));
    }

    /**
     * What to run next.
     *
     * @throws IllegalArgumentException if that takes more than {@link Pace#MOST_SUBSTEPS} substeps, or a speed is not finite
     */
    public FlowSetup next() {
        double most = flow.pace().mostCells();
        double needed = Math.ceil(flow.substeps() * cells / most);
        if (!(needed <= Pace.MOST_SUBSTEPS)) {
            throw new IllegalArgumentException(String.format(Locale.ROOT, "got air that moves %.4g cells a frame, which takes %.4g "
                    + "substeps of at most %.4g cells, needs at most %d substeps; allow a larger displacement, or state substeps",
                    flow.substeps() * cells, needed, most, Pace.MOST_SUBSTEPS));
        }
        return flow.withPace(flow.pace().found(Math.max(flow.substeps() + 1, (int) needed)));
    }

    /**
     * Runs the original until its number of substeps is found.
     *
     * @param flow on any grid of the shot's box: a coarser one gives a first guess at a fraction of the cost, if {@code mostCells} was
     *             made smaller by as much as the cells are larger
     * @return the same with as many substeps as hold; at once if they are known
     * @throws SolveCancelled           if cancelled
     * @throws IllegalArgumentException as {@link #next}
     */
    public static FlowSetup run(FlowSetup flow, Lanes lanes, BooleanSupplier cancelled) {
        if (!flow.pace().isOpen()) {
            return flow;
        }
        Pacing pacing = pacing(flow, lanes, cancelled);
        while (!pacing.holds()) {
            pacing = pacing(pacing.next(), lanes, cancelled);
        }
        return pacing.found();
    }

    private static Pacing pacing(FlowSetup flow, Lanes lanes, BooleanSupplier cancelled) {
        Pacing pacing = new Pacing(flow);
        Simulation.run(new SmokeSolver(flow, lanes), flow.startState(), null, null, flow.frames().last(), cancelled, pacing.watch());
        return pacing;
    }

    private Simulation.EachFrame watch() {
        return new Simulation.EachFrame() {
            @Override
            public void frame(int frame, SmokeState state, MacVelocity force) { }

            @Override
            public void substep(SmokeState state) {
                add(state);
            }
        };
    }
}

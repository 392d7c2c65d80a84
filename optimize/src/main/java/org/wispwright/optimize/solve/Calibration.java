package org.wispwright.optimize.solve;

import java.util.function.BooleanSupplier;
import org.wispwright.optimize.checkpoint.BinomialPlan;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;

/**
 * What a problem's gradient costs on this machine, measured on one of its rungs, and what that says of the others.
 * <p>On a grid of {@code n} cells with {@code s} states kept, for {@code l} steps (ours; a step's cost is in proportion to its cells):
 * <pre>
 *   seconds = n / n0 (gradientSeconds + stepSeconds (leastSteps(l, s) - leastSteps(l, l)))
 * </pre>
 *
 * @param cells           n0, of the grid it was measured on
 * @param steps           l, from the first frame to the last that something is wished of
 * @param gradientSeconds of one gradient there with all states kept, the least of two
 * @param stepSeconds     of one plain step there: a forward sweep's share
 */
public record Calibration(long cells, int steps, double gradientSeconds, double stepSeconds) {
    /** Gradients that a solve usually takes on its lowest rung: 19 to 66 were counted. See docs/benchmarks.md. */
    public static final int GRADIENTS_LOWEST = 28;
    /** The same on each rung above: 38 to 77. */
    public static final int GRADIENTS_ABOVE = 60;
    private static final int TRIES = 2;

    /**
     * Measures: a forward sweep and a gradient, each a few times.
     *
     * @param grid a rung of the problem
     * @throws IllegalArgumentException if a note wants nothing
     * @throws SolveCancelled           if cancelled
     */
    public static Calibration of(SolveProblem problem, GridShape grid, Lanes lanes, BooleanSupplier cancelled) {
        Rung ready = Rung.of(problem, grid, true, lanes, cancelled);
        FlowSetup flow = ready.problem().flow();
        int lastFrame = ready.problem().lastFrame();
        int steps = flow.stepsTo(lastFrame);
        ForceBasis basis = new ForceBasis(grid, flow.frames().count() - 1, Solve.bands(problem.flow()), lanes);
        SolveLoss loss = new SolveLoss(ready.solver(), basis, ready.terms(), lastFrame,
                new Snapshots(flow, ready.start(), steps, StateRoom.inMemory(Long.MAX_VALUE)), cancelled);
        double[] x = new double[basis.unknowns(Solve.open(Solve.bands(problem.flow()), grid))];
        double forward = Double.POSITIVE_INFINITY;
        double whole = Double.POSITIVE_INFINITY;
        for (int n = 0; n <= TRIES; n++) {                                     // the first warms up
            long since = System.nanoTime();
            loss.forward(x, new double[x.length]);
            double ahead = (System.nanoTime() - since) / 1e9;
            since = System.nanoTime();
            loss.evaluate(x, new double[x.length]);
            double all = (System.nanoTime() - since) / 1e9;
            forward = n == 0 ? forward : Math.min(forward, ahead);
            whole = n == 0 ? whole : Math.min(whole, all);
        }
        loss.release();
        return new Calibration(grid.cells(), steps, whole, forward / steps);
    }

    /** Seconds of one gradient on a grid of so many cells with so many states kept. */
    public double gradientSeconds(long gridCells, int snapshots) {
        long again = BinomialPlan.leastSteps(steps, snapshots) - BinomialPlan.leastSteps(steps, steps);
        return (double) gridCells / cells * (gradientSeconds + stepSeconds * again);
    }

    /** Seconds of one plain run of so many frames' steps on a grid of so many cells. */
    public double runSeconds(long gridCells, int runSteps) {
        return (double) gridCells / cells * stepSeconds * runSteps;
    }
}

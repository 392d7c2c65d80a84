package org.wispwright.optimize.solve;

import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import org.wispwright.optimize.checkpoint.BinomialPlan;
import org.wispwright.optimize.flow.Clock;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.flow.Interpolation;
import org.wispwright.optimize.flow.Side;
import org.wispwright.optimize.flow.Sides;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.flow.Source;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.march.Look;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.view.Orthographic;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.warp.loss.PyramidLoss;

/**
 * What this machine can do: seconds of a forward run and of a gradient on a plume of a given size, and where they go.
 *
 * @param grid           cells each way
 * @param frames         frames
 * @param threads        lanes used
 * @param stepNanosACell one substep without a force on a grown plume, nanoseconds a cell, the least of five
 * @param forwardSeconds one forward run: force, steps, the last frame's picture and loss; the least of three
 * @param gradientSeconds the forward run and the way back, the least of three
 * @param snapshots      states that were kept
 * @param onDisk        of them on disk
 * @param plainSteps     steps that a gradient ran again or for the first time, without the taped ones
 * @param forwardShare   of the forward run, by part
 * @param gradientShare  of the gradient, by part
 */
public record Measurement(GridShape grid, int frames, int threads, double stepNanosACell, double forwardSeconds, double gradientSeconds,
                          int snapshots, int onDisk, long plainSteps, Map<Clock.Part, Double> forwardShare, Map<Clock.Part, Double> gradientShare) {
    private static final int TRIES = 3;

    /** Gradient seconds a forward second. */
    public double ratio() {
        return gradientSeconds / forwardSeconds;
    }

    /**
     * Runs the measurement.
     *
     * @param cells       cells each way, 8 to 512
     * @param frames      2 or more
     * @param room        for the states kept in a sweep
     * @throws IllegalArgumentException if a number is out of range or not one state fits
     */
    public static Measurement of(int cells, int frames, StateRoom room, Lanes lanes) {
        if (cells < 8 || cells > 512 || frames < 2) {
            throw new IllegalArgumentException("measure: got a grid of " + cells + " and " + frames + " frames, needs 8 to 512 and at least 2");
        }
        FlowSetup flow = plume(cells, frames);
        GridShape grid = flow.grid();
        SmokeSolver solver = new SmokeSolver(flow, lanes);
        ForceBasis basis = Solve.basis(flow, lanes);
        View view = new View("front", new Orthographic(4, 4), new Vec3(2, 2, 10), new Vec3(2, 2, 2), new Vec3(0, 1, 0), new Raster(cells, cells));
        Look look = new Look(4, new Rgb(.9, .9, .9), new Rgb(.7, .7, .7), Optional.empty());
        FrameTerms terms = new FrameTerms(grid, List.of(view), look, grid.cellMetres(), solver.clock(), lanes);
        float[] weights = new float[cells * cells];
        Arrays.fill(weights, 1f);
        terms.add(flow.frames().last(), 0, new PyramidLoss(new Picture(cells, cells), weights), 1);
        int steps = frames - 1;
        Snapshots states = new Snapshots(flow, new SmokeState(grid), steps, room);
        SolveLoss loss = new SolveLoss(solver, basis, terms, flow.frames().last(), states, () -> false);
        double[] x = new double[basis.unknowns(1)];
        Random random = new Random(1);
        for (int n = 0; n < x.length; n++) {
            x[n] = 0.5 * random.nextGaussian() / Math.sqrt(x.length);
        }
        double[] gradient = new double[x.length];
        loss.evaluate(x, gradient);                                            // warms up
        double forward = Double.POSITIVE_INFINITY;
        double whole = Double.POSITIVE_INFINITY;
        Map<Clock.Part, Double> forwardParts = Map.of();
        Map<Clock.Part, Double> wholeParts = Map.of();
        for (int n = 0; n < TRIES; n++) {
            solver.clock().reset();
            long since = System.nanoTime();
            loss.forward(x, gradient);
            double seconds = (System.nanoTime() - since) / 1e9;
            if (seconds < forward) {
                forward = seconds;
                forwardParts = solver.clock().seconds();
            }
            solver.clock().reset();
            since = System.nanoTime();
            loss.evaluate(x, gradient);
            seconds = (System.nanoTime() - since) / 1e9;
            if (seconds < whole) {
                whole = seconds;
                wholeParts = solver.clock().seconds();
            }
        }
        loss.release();
        return new Measurement(grid, frames, lanes.count(), stepNanos(solver), forward, whole, states.count(), states.onDisk(),
                BinomialPlan.leastSteps(steps, states.count()), forwardParts, wholeParts);
    }

    /** A plume in a box of 4 m: open sides, walled floor, one source. */
    private static FlowSetup plume(int cells, int frames) {
        Sides sides = new Sides(Side.OPEN, Side.OPEN, Side.WALL, Side.OPEN, Side.OPEN, Side.OPEN);
        FrameRange range = new FrameRange(1001, 1000 + frames, 24);
        return new FlowSetup(new GridShape(cells, cells, cells, 4.0 / cells), range, 1, Interpolation.LINEAR, Interpolation.LINEAR, sides, 8, 0.1,
                List.of(new Source("pot", 2, 0.5, 2, 0.5, 0.3, 6, range.first(), range.last())));
    }

    private static double stepNanos(SmokeSolver solver) {
        SmokeState now = new SmokeState(solver.setup().grid());
        SmokeState next = new SmokeState(solver.setup().grid());
        double least = Double.POSITIVE_INFINITY;
        int grow = 12;
        for (int n = 0; n < grow + 5; n++) {
            long since = System.nanoTime();
            solver.step(now, null, solver.setup().step(0), n > 0, next);
            double nanos = (double) (System.nanoTime() - since) / solver.setup().grid().cells();
            SmokeState swap = now;
            now = next;
            next = swap;
            least = n >= grow ? Math.min(least, nanos) : least;
        }
        return least;
    }
}

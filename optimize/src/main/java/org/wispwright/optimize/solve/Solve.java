package org.wispwright.optimize.solve;

import java.util.ArrayList;
import java.util.List;
import java.util.function.BooleanSupplier;
import org.wispwright.optimize.checkpoint.Budget;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.force.Band;
import org.wispwright.optimize.force.BandPlan;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.optimize.search.Lbfgs;
import org.wispwright.optimize.search.LineSearch;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Pinhole;
import org.wispwright.render.view.Orthographic;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;

/**
 * The search for the smallest smooth extra force with which the smoke arrives at the wanted pictures.
 *
 * <p>L-BFGS on notes + holds + stay term + {@code energyWeight |x|^2 / 2}. Bands open from low to high; one ends when the loss fell
 * by less than 5 % over 5 iterations (the very last: over 8), the next starts from the same force. The energy weight is the program's: it
 * is 0 in the first band and then set every few iterations so that the energy is 2 % of the starting loss, with the stored pairs and the
 * gradient moved along exactly; a force that moves still smoke by less than a cell counts as one that moves it by a cell. At the
 * solution that is a stationary point of {@code loss + 0.02 start ln |x|^2}: doubling the force has one price, whatever its size.
 *
 * <p>The pictures of a solve are small: a pixel covers about a cell, a sample a cell. Same bits for any number of lanes and any budget of
 * memory. One solve at a time for one set of lanes.
 */
public final class Solve {
    /** A band ends when the loss fell by less than this share ... */
    static final double LEAST_FALL = 0.05;
    /** ... over so many iterations. */
    static final int OVER_ITERATIONS = 5;
    /** The same for the last band of the last rung, after which nothing follows: a search often rests for a few iterations and goes on. */
    static final int OVER_LAST_ITERATIONS = 8;
    /** The force energy's part of the objective, as a share of the starting loss. */
    static final double ENERGY_SHARE = 0.02;
    /** Iterations between two settings of the energy weight. */
    static final int ENERGY_EVERY = 5;
    /** Pairs that L-BFGS keeps. They cost nothing beside a gradient; 20 save a tenth of the iterations against 8. */
    static final int PAIRS = 20;
    /** A line search that needs more gradients than this is lost in rounding. */
    static final int MOST_EVALUATIONS = 8;
    /** The coarsest rung has at least so many cells each way. */
    static final int LEAST_RUNG = 12;
    /** Iterations that a band usually takes; only for the estimate of the time left. */
    static final int USUAL_ITERATIONS = 14;

    private final SolveProblem problem;
    private final List<GridShape> climb;
    private final boolean stay;
    private final Lanes lanes;
    private final BooleanSupplier cancelled;

    /**
     * @param stay      true for the stay term; false only to measure what it does
     * @param lanes     used by the whole solve; stays the caller's
     * @param cancelled asked at every substep
     */
    public Solve(SolveProblem problem, boolean stay, Lanes lanes, BooleanSupplier cancelled) {
        this(problem, rungs(problem.flow().grid()), stay, lanes, cancelled);
    }

    /** A solve that climbs other rungs of the same box; the last must be the problem's own grid. */
    public Solve(SolveProblem problem, List<GridShape> climb, boolean stay, Lanes lanes, BooleanSupplier cancelled) {
        if (climb.isEmpty() || !climb.get(climb.size() - 1).equals(problem.flow().grid())) {
            throw new IllegalArgumentException("solve: the last rung must be the shot's own grid, " + problem.flow().grid().inWords());
        }
        this.problem = problem;
        this.climb = List.copyOf(climb);
        this.stay = stay;
        this.lanes = lanes;
        this.cancelled = cancelled;
    }

    /** The bands of a shot, the same for all its rungs. */
    public static List<Band> bands(FlowSetup flow) {
        return BandPlan.of(flow.grid(), flow.frames().count() - 1);
    }

    /** The force basis of a shot on its own grid: what the unknowns of a take mean. */
    public static ForceBasis basis(FlowSetup flow, Lanes lanes) {
        return new ForceBasis(flow.grid(), flow.frames().count() - 1, bands(flow), lanes);
    }

    /** The grids that a solve climbs: half the cells each way if that leaves whole cells enough, then the shot's own. */
    public static List<GridShape> rungs(GridShape grid) {
        boolean even = grid.nx() % 2 == 0 && grid.ny() % 2 == 0 && grid.nz() % 2 == 0;
        boolean enough = Math.min(grid.nx(), Math.min(grid.ny(), grid.nz())) >= 2 * LEAST_RUNG;
        if (!even || !enough) {
            return List.of(grid);
        }
        return List.of(new GridShape(grid.nx() / 2, grid.ny() / 2, grid.nz() / 2, 2 * grid.cellMetres(),
                grid.originX(), grid.originY(), grid.originZ()), grid);
    }

    /** The view as a solve draws it: a pixel at the aim covers about a cell, never more rows than the view's own. */
    public static View proxy(View view, double cellMetres) {
        double distance = view.position().minus(view.aim()).length();
        double heightMetres = view.lens() instanceof Pinhole pinhole ? distance * pinhole.gateHeightMm() / pinhole.focalMm()
                : ((Orthographic) view.lens()).heightMetres();
        int rows = (int) Math.max(8, Math.min(view.raster().height(), Math.round(heightMetres / cellMetres)));
        return rows >= view.raster().height() ? view : view.withRasterHeight(rows);
    }

    /**
     * Runs to its end.
     *
     * @param memoryBytes for the states kept in a sweep
     * @param until       ends it early
     * @throws SolveCancelled           if cancelled
     * @throws IllegalArgumentException if a note wants nothing, or not one state fits in the memory
     */
    public SolveResult run(long memoryBytes, StopRule until, Progress.Listener listener) {
        Search search = new Search(until, listener, climb.size());
        for (GridShape grid : climb) {
            if (search.ended.isEmpty()) {
                search.climb(grid, memoryBytes);
            }
        }
        return search.result();
    }

    /** What a running solve carries from iteration to iteration. */
    private final class Search {
        private final long began = System.nanoTime();
        private final StopRule until;
        private final Progress.Listener listener;
        private final int rungs;
        private final List<Double> losses = new ArrayList<>();
        private final List<SolveResult.BandRun> runs = new ArrayList<>();
        private List<Double> met = List.of();
        private Lbfgs lbfgs;
        private TermPlan plan;
        private SolveLoss loss;
        private String ended = "";
        private int rung;
        private int snapshots;

        Search(StopRule until, Progress.Listener listener, int rungs) {
            this.until = until;
            this.listener = listener;
            this.rungs = rungs;
        }

        /**
         * One rung: from the force of the rung below, or from none, until its last band ends. The last band's waves are resolved by the
         * last rung alone, so the rungs below leave it closed. A finer rung's loss bends much as the coarser one's did: the pairs go on.
         */
        void climb(GridShape grid, long memoryBytes) {
            rung++;
            if (loss != null) {
                loss.release();                                                // the search still holds the lower rung's loss for a moment
            }
            SolveProblem here = problem.on(grid);
            FlowSetup flow = here.flow();
            SmokeSolver solver = new SmokeSolver(flow, lanes);
            List<View> views = here.views().stream().map(view -> proxy(view, grid.cellMetres())).toList();
            FrameTerms terms = new FrameTerms(grid, views, here.look(), grid.cellMetres(), solver.clock(), lanes);
            SmokeState start = new SmokeState(grid);
            plan = new TermPlan(here, solver, start, terms, stay, cancelled);
            int lastFrame = here.lastFrame();
            int steps = (lastFrame - flow.frames().first()) * flow.substeps();
            snapshots = new Budget(memoryBytes, SmokeState.bytes(grid)).snapshots(steps);
            List<Band> bands = bands(problem.flow());
            ForceBasis basis = new ForceBasis(grid, flow.frames().count() - 1, bands, lanes);
            loss = new SolveLoss(solver, basis, terms, start, lastFrame, snapshots, cancelled);
            int last = rung < rungs ? Math.max(1, bands.size() - 1) : bands.size();
            int open = lbfgs == null ? 1 : bands.size();
            if (lbfgs == null) {
                lbfgs = new Lbfgs(loss, new double[basis.unknowns(1)], settings());
            } else {
                lengthen(basis.unknowns(open));
            }
            losses.add(share());
            for (; open <= last && ended.isEmpty(); open++) {
                if (lbfgs.x().length < basis.unknowns(open)) {
                    lengthen(basis.unknowns(open));
                }
                runBand(grid, bands, open);
            }
        }

        /** Goes on with this rung's loss and so many unknowns, the new ones 0. */
        private void lengthen(int unknowns) {
            lbfgs.extend(unknowns, loss);
            weighEnergy(lbfgs, plan.startLoss());
        }

        private void runBand(GridShape grid, List<Band> bands, int open) {
            int iterationsBefore = lbfgs.iterations();
            int gradientsBefore = lbfgs.evaluations();
            double secondsBefore = seconds();
            boolean more = true;
            while (more && ended.isEmpty()) {
                Lbfgs.Iteration iteration = lbfgs.step();
                if (iteration.outcome() != Lbfgs.Outcome.MOVED) {
                    ended = rung == rungs && open == bands.size() ? iteration.sentence() : "";
                    break;
                }
                losses.add(share());
                met = plan.met(loss.losses());
                int done = lbfgs.iterations() - iterationsBefore;
                tell(bands.size(), open, done, seconds() - secondsBefore);
                ended = endedBy(until, rung == rungs, losses, lbfgs.iterations(), seconds());
                more = !hasEnded(losses, done, rung == rungs && open == bands.size() ? OVER_LAST_ITERATIONS : OVER_ITERATIONS);
                if ((open > 1 || rung > 1) && done % ENERGY_EVERY == 0) {
                    weighEnergy(lbfgs, plan.startLoss());
                }
            }
            runs.add(new SolveResult.BandRun(grid, bands.get(open - 1), lbfgs.x().length, lbfgs.iterations() - iterationsBefore,
                    lbfgs.evaluations() - gradientsBefore, last(losses), seconds() - secondsBefore));
        }

        private void tell(int bands, int open, int done, double bandSeconds) {
            double perIteration = bandSeconds / done;
            double left = perIteration * (Math.max(1, USUAL_ITERATIONS - done) + USUAL_ITERATIONS * (bands - open));
            // A finer rung has eight times the cells.
            for (int finer = rung + 1, times = 8; finer <= rungs; finer++, times *= 8) {
                left += perIteration * times * USUAL_ITERATIONS;
            }
            listener.iteration(new Progress(rung, rungs, open, bands, lbfgs.iterations(), lbfgs.evaluations(),
                    last(losses), met, seconds(), left));
        }

        private Lbfgs.Settings settings() {
            // To move still smoke by four cells over the range is a fair first guess of what a note asks.
            return new Lbfgs.Settings(PAIRS, LineSearch.Rule.forQuasiNewton().withMostEvaluations(MOST_EVALUATIONS), forceOfCells(4));
        }

        private double share() {
            return (lbfgs.value() - lbfgs.quadraticValue()) / plan.startLoss();
        }

        private double seconds() {
            return (System.nanoTime() - began) / 1e9;
        }

        SolveResult result() {
            return new SolveResult(lbfgs.x().clone(), List.copyOf(runs), List.copyOf(losses), met, lbfgs.evaluations(), seconds(), lbfgs.quadratic(),
                    lbfgs.quadraticValue() / plan.startLoss(), snapshots, ended.isEmpty() ? "the last band's loss has stopped falling" : ended);
        }
    }

    /**
     * Sets the energy's weight for the force there is, but for no less than one that moves still smoke by a cell: a weight that grew
     * without end as the force shrinks would keep a hard note's search at nothing for ever.
     */
    private void weighEnergy(Lbfgs search, double start) {
        double squares = 0;
        for (double v : search.x()) {
            squares += v * v;
        }
        double least = forceOfCells(1);
        search.addQuadratic(2 * ENERGY_SHARE * start / Math.max(squares, least * least) - search.quadratic());
    }

    /** Norm of a steady force, m/s2, that moves still smoke by so many cells over the range. */
    private double forceOfCells(double cells) {
        FlowSetup flow = problem.flow();
        double range = (flow.frames().count() - 1) * flow.frames().secondsPerFrame();
        return 2 * cells * flow.grid().cellMetres() / (range * range);
    }

    private static boolean hasEnded(List<Double> losses, int iterationsOfBand, int over) {
        if (iterationsOfBand < over) {
            return false;
        }
        double before = losses.get(losses.size() - 1 - over);
        return !(last(losses) < before * (1 - LEAST_FALL));
    }

    private static String endedBy(StopRule until, boolean lastRung, List<Double> losses, int iterations, double seconds) {
        if (lastRung && last(losses) <= until.loss()) {
            return "the loss reached " + until.loss() + ", as asked";
        }
        if (iterations >= until.iterations()) {
            return until.iterations() + " iterations were done, as asked";
        }
        return seconds >= until.seconds() ? "the " + until.seconds() + " seconds asked for had passed" : "";
    }

    private static double last(List<Double> values) {
        return values.get(values.size() - 1);
    }
}

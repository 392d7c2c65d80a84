package org.wispwright.optimize.solve;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.BooleanSupplier;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.force.Band;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.optimize.force.SourceCurves;
import org.wispwright.optimize.search.Lbfgs;
import org.wispwright.optimize.search.LineSearch;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;

/**
 * One run of a {@link Solve}: rungs, in each its bands, in each its iterations. Whether a band or the solve ends is asked of the numbers
 * that a {@link SolveState} holds and of nothing else, so a run that goes on from one decides as the first did.
 */
final class Climb {
    /** Why a solve ended that a person had end with what it had; one that goes on from there does go on. */
    static final String ENOUGH = "a person found it enough";

    private final SolveProblem problem;
    private final List<GridShape> grids;
    private final boolean stay;
    private final Lanes lanes;
    private final BooleanSupplier cancelled;
    private final StateRoom room;
    private final StopRule until;
    private final Progress.Listener listener;
    private final String digest;
    private final Solve.Recorder recorder;
    private final List<Band> bands;
    private final Optional<SourceCurves> curves;
    private long began = System.nanoTime();
    private final List<Double> losses = new ArrayList<>();
    private final List<SolveResult.BandRun> runs = new ArrayList<>();
    private List<Double> met = List.of();
    private List<SolveResult.NoteLoss> noteLosses = List.of();
    private Lbfgs lbfgs;
    private TermPlan plan;
    private SolveLoss loss;
    private String ended = "";
    private double secondsBefore;
    private int snapshots;
    private int rung;
    private int open;
    private int done;
    private int bandGradients;
    private double bandSeconds;

    Climb(SolveProblem problem, List<GridShape> grids, boolean stay, Lanes lanes, BooleanSupplier cancelled, StateRoom room, StopRule until,
          Progress.Listener listener, String digest, Solve.Recorder recorder) {
        this.problem = problem;
        this.grids = grids;
        this.stay = stay;
        this.lanes = lanes;
        this.cancelled = cancelled;
        this.room = room;
        this.until = until;
        this.listener = listener;
        this.digest = digest;
        this.recorder = recorder;
        bands = Solve.bands(problem.flow());
        curves = problem.sources() ? Optional.of(Solve.curves(problem.flow())) : Optional.empty();
    }

    SolveResult run(Optional<SolveState> from) {
        try {
            return climb(from);
        } finally {
            if (loss != null) {
                loss.release();
            }
        }
    }

    private SolveResult climb(Optional<SolveState> from) {
        from.ifPresent(this::take);
        for (int next = Math.max(1, rung); next <= grids.size(); next++) {
            climb(next, from.filter(state -> lbfgs == null));
            if (!ended.isEmpty()) {
                break;
            }
        }
        if (ended.isEmpty()) {
            ended = "the last band's loss has stopped falling";
        }
        record();
        if (noteLosses.isEmpty()) {                                            // ended before it moved, from a record perhaps
            loss.forward(lbfgs.x(), new double[lbfgs.x().length]);
            noteLosses = plan.noteLosses(loss.losses());
            met = plan.met(loss.losses());
        }
        return new SolveResult(curves.map(c -> SolveLoss.forceOf(c, lbfgs.x())).orElse(lbfgs.x().clone()),
                curves.map(c -> c.strengths(lbfgs.x())), List.copyOf(runs), List.copyOf(losses), met, noteLosses, lbfgs.evaluations(),
                seconds(), lbfgs.quadratic(), lbfgs.quadraticValue() / plan.startLoss(), snapshots, ended);
    }

    private void take(SolveState state) {
        rung = state.rung();
        open = state.band();
        done = state.bandIterations();
        bandGradients = state.bandGradients();
        bandSeconds = state.bandSeconds();
        secondsBefore = state.seconds();
        losses.addAll(state.losses());
        met = state.met();
        runs.addAll(state.runs());
        ended = state.ended();
        if (!ended.isEmpty() && (rung < grids.size() || ended.equals(ENOUGH))) {
            ended = "";
            runs.remove(runs.size() - 1);                                      // its band is open again, and ends at once or goes on
        }
    }

    /**
     * One rung: from the force of the rung below, or from none, until its last band ends. A rung leaves the bands closed whose waves it
     * does not resolve. A finer rung's loss bends much as the coarser one's did: the pairs go on.
     *
     * @param state if given, this rung is gone on with from there, instead of begun
     */
    private void climb(int number, Optional<SolveState> state) {
        rung = number;
        noteLosses = List.of();
        GridShape grid = grids.get(rung - 1);
        if (loss != null) {
            loss.release();                                                    // the search still holds the lower rung's loss for a moment
            plan = null;
        }
        Rung ready = Rung.of(problem, grid, stay, lanes, cancelled);
        FlowSetup flow = ready.problem().flow();
        plan = ready.plan();
        int lastFrame = ready.problem().lastFrame();
        Snapshots states = new Snapshots(flow, ready.start(), flow.stepsTo(lastFrame), room);
        snapshots = states.count();
        ForceBasis basis = new ForceBasis(grid, flow.frames().count() - 1, bands, lanes);
        loss = new SolveLoss(ready.solver(), basis, curves, ready.terms(), lastFrame, states, cancelled);
        if (state.isPresent()) {
            lbfgs = new Lbfgs(loss, state.get().search(), settings());
            ended = ended.isEmpty() ? endedByRule() : ended;
        } else {
            int highest = Solve.open(bands, grid);
            open = rung == 1 ? 1 : Math.max(open, highest);
            begin(basis.unknowns(open));
            losses.add(share());
        }
        int last = Math.max(open, Solve.open(bands, grid));
        while (ended.isEmpty()) {
            runBand(grid, last);
            if (open == last || !ended.isEmpty()) {
                break;
            }
            open++;
            begin(basis.unknowns(open));
        }
    }

    /** Opens a rung or a band: this rung's loss and so many unknowns, the new ones 0. */
    private void begin(int forceUnknowns) {
        int unknowns = curves.map(SourceCurves::unknowns).orElse(0) + forceUnknowns;
        int gradients = lbfgs == null ? 0 : lbfgs.evaluations();
        if (lbfgs == null) {
            lbfgs = new Lbfgs(loss, new double[unknowns], settings());
        } else {
            try {
                lbfgs.extend(unknowns, loss);
            } catch (IllegalArgumentException blown) {
                throw new IllegalArgumentException(blown.getMessage() + loss.firstBad().map(bad -> "; " + bad).orElse("")
                        + "; end the solve on the rung below to keep what it found", blown);
            }
            weighEnergy();
        }
        done = 0;
        bandGradients = lbfgs.evaluations() - gradients;
        bandSeconds = 0;
    }

    private void runBand(GridShape grid, int lastBand) {
        boolean last = rung == grids.size() && open == lastBand;
        // A first look on a lower rung ends its bands as the whole climb would, so that it can be gone on with.
        boolean shotsOwn = last && grid.equals(problem.flow().grid());
        while (ended.isEmpty() && !hasEnded(shotsOwn ? Solve.OVER_LAST_ITERATIONS : Solve.OVER_ITERATIONS)) {
            double since = seconds();
            int gradients = lbfgs.evaluations();
            Lbfgs.Iteration iteration = lbfgs.step();
            bandGradients += lbfgs.evaluations() - gradients;
            bandSeconds += seconds() - since;
            if (iteration.outcome() != Lbfgs.Outcome.MOVED) {
                ended = endedBy(iteration, last, loss);
                break;
            }
            done++;
            losses.add(share());
            met = plan.met(loss.losses());
            noteLosses = plan.noteLosses(loss.losses());
            if ((open > 1 || rung > 1) && done % Solve.ENERGY_EVERY == 0) {
                weighEnergy();
            }
            tell(lastBand);
            ended = endedByRule();
            if (ended.isEmpty()) {
                record();
                ended = enough() ? ENOUGH : "";
            }
        }
        runs.add(new SolveResult.BandRun(grid, bands.get(open - 1), lbfgs.x().length, done, bandGradients, last(losses), bandSeconds));
    }

    /**
     * Why a search that did not move ends the solve; empty if it only ends the band. What it had found stays as it was. Where numbers
     * are not finite however short the step, more unknowns would not help: that ends the solve on any rung.
     */
    static String endedBy(Lbfgs.Iteration iteration, boolean last, SolveLoss loss) {
        if (iteration.outcome() == Lbfgs.Outcome.NOT_FINITE) {
            return iteration.sentence() + loss.firstBad().map(bad -> "; " + bad).orElse("");
        }
        return last ? iteration.sentence() : "";
    }

    private void record() {
        recorder.record(new SolveState(digest, rung, open, done, bandGradients, bandSeconds, seconds(), lbfgs.state(), losses, met, runs,
                ended));
    }

    private boolean enough() {
        long asked = System.nanoTime();
        boolean enough = listener.enough();
        began += System.nanoTime() - asked;
        return enough;
    }

    private void tell(int lastBand) {
        double perIteration = bandSeconds / done;
        double left = perIteration * (Math.max(1, Solve.USUAL_ITERATIONS - done) + Solve.USUAL_ITERATIONS * (lastBand - open));
        // A finer rung has eight times the cells.
        for (int finer = rung + 1, times = 8; finer <= grids.size(); finer++, times *= 8) {
            left += perIteration * times * Solve.USUAL_ITERATIONS;
        }
        long told = System.nanoTime();
        listener.iteration(new Progress(rung, grids.size(), open, bands.size(), lbfgs.iterations(), lbfgs.evaluations(),
                last(losses), met, seconds(), left));
        listener.pictures(plan::got);
        began += System.nanoTime() - told;
    }

    private Lbfgs.Settings settings() {
        // To move still smoke by four cells over the range is a fair first guess of what a note asks.
        return new Lbfgs.Settings(Solve.PAIRS, LineSearch.Rule.forQuasiNewton().withMostEvaluations(Solve.MOST_EVALUATIONS),
                Solve.forceOfCells(problem.flow(), 4));
    }

    /**
     * Sets the energy's weight for the force there is, but for no less than one that moves still smoke by a cell: a weight that grew
     * without end as the force shrinks would keep a hard note's search at nothing for ever.
     */
    private void weighEnergy() {
        double squares = 0;
        for (double v : lbfgs.x()) {
            squares += v * v;
        }
        double least = Solve.forceOfCells(problem.flow(), 1);
        lbfgs.addQuadratic(2 * Solve.ENERGY_SHARE * plan.startLoss() / Math.max(squares, least * least) - lbfgs.quadratic());
    }

    private boolean hasEnded(int over) {
        return done >= over && !(last(losses) < losses.get(losses.size() - 1 - over) * (1 - Solve.LEAST_FALL));
    }

    private String endedByRule() {
        if (rung == grids.size() && last(losses) <= until.loss()) {
            return "the loss reached " + until.loss() + ", as asked";
        }
        if (lbfgs.iterations() >= until.iterations()) {
            return until.iterations() + " iterations were done, as asked";
        }
        return seconds() >= until.seconds() ? "the " + until.seconds() + " seconds asked for had passed" : "";
    }

    private double share() {
        return (lbfgs.value() - lbfgs.quadraticValue()) / plan.startLoss();
    }

    private double seconds() {
        return secondsBefore + (System.nanoTime() - began) / 1e9;
    }

    private static double last(List<Double> values) {
        return values.get(values.size() - 1);
    }
}

package org.wispwright.optimize.solve;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.BooleanSupplier;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.force.Band;
import org.wispwright.optimize.force.BandPlan;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.optimize.force.SourceCurves;
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
    /** A source of steady strength 1.74 weighs as much as a steady force that moves still smoke by so many cells over the range. */
    static final double SOURCE_CELLS = 2;
    /** Cells of the shot along one cell of the coarsest rung. */
    static final int MOST_COARSENING = 4;
    /** The coarsest rung has at least so many cells each way. */
    static final int LEAST_RUNG = 12;
    /** A rung opens a band if its shortest waves have at least so many cells there. */
    static final double LEAST_CELLS = 5;
    /** Iterations that a band usually takes; only for the estimate of the time left. */
    static final int USUAL_ITERATIONS = 14;

    private final SolveProblem problem;
    private final List<GridShape> climb;
    private final boolean stay;
    private final Lanes lanes;
    private final BooleanSupplier cancelled;

    /** Told where the solve stands after each accepted iteration, so that it can be gone on with from there. */
    @FunctionalInterface
    public interface Recorder {
        /** Keeps nothing. */
        Recorder NONE = state -> { };

        /** Keeps a state, on the thread that solves. */
        void record(SolveState state);
    }

    /**
     * @param stay      true for the stay term; false only to measure what it does
     * @param lanes     used by the whole solve; stays the caller's
     * @param cancelled asked at every substep
     */
    public Solve(SolveProblem problem, boolean stay, Lanes lanes, BooleanSupplier cancelled) {
        this(problem, rungs(problem.flow().grid()), stay, lanes, cancelled);
    }

    /** A solve that climbs other rungs of the same box, coarse to fine: the lower ones of {@link #rungs}, for a first look. */
    public Solve(SolveProblem problem, List<GridShape> climb, boolean stay, Lanes lanes, BooleanSupplier cancelled) {
        if (climb.isEmpty()) {
            throw new IllegalArgumentException("solve: got no rung, needs at least one");
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

    /** Numbers that a search of all bands of a shot has to find, sources left out. */
    public static int unknowns(FlowSetup flow) {
        return basis(flow, new Lanes(1)).unknowns(bands(flow).size());
    }

    /** The same for a search that climbs no higher than a grid. */
    public static int unknowns(FlowSetup flow, GridShape top) {
        return basis(flow, new Lanes(1)).unknowns(open(bands(flow), top));
    }

    /** Bytes that the search itself takes for so many unknowns: its pairs, and the seven arrays of a line search beside them. */
    public static long searchBytes(long unknowns) {
        return unknowns * Double.BYTES * (2 * PAIRS + 7);
    }

    /** The curves of a shot's sources: what the first unknowns mean where strengths may change. */
    static SourceCurves curves(FlowSetup flow) {
        int first = flow.frames().first() + 1;
        int steps = flow.frames().count() - 1;
        List<SourceCurves.Span> spans = flow.sources().stream()
                .map(source -> new SourceCurves.Span(Math.max(0, source.firstFrame() - first), Math.min(steps, source.lastFrame() + 1 - first)))
                .toList();
        return new SourceCurves(steps, spans, forceOfCells(flow, SOURCE_CELLS));
    }

    /** Norm of a steady force, m/s2, that moves still smoke by so many cells over the range. */
    static double forceOfCells(FlowSetup flow, double cells) {
        double range = (flow.frames().count() - 1) * flow.frames().secondsPerFrame();
        return 2 * cells * flow.grid().cellMetres() / (range * range);
    }

    /**
     * The grids that a solve climbs: a quarter of the cells each way, half of them, then the shot's own; without those that do not come
     * out whole or have fewer than {@value #LEAST_RUNG} cells along a side.
     */
    public static List<GridShape> rungs(GridShape grid) {
        List<GridShape> rungs = new ArrayList<>();
        for (int part = MOST_COARSENING; part > 1; part /= 2) {
            boolean whole = grid.nx() % part == 0 && grid.ny() % part == 0 && grid.nz() % part == 0;
            if (whole && Math.min(grid.nx(), Math.min(grid.ny(), grid.nz())) >= part * LEAST_RUNG) {
                rungs.add(new GridShape(grid.nx() / part, grid.ny() / part, grid.nz() / part, part * grid.cellMetres(),
                        grid.originX(), grid.originY(), grid.originZ()));
            }
        }
        rungs.add(grid);
        return rungs;
    }

    /** How many of a shot's bands a rung opens: those whose waves have at least {@value #LEAST_CELLS} cells there, one at the least. */
    static int open(List<Band> bands, GridShape rung) {
        int open = 1;
        while (open < bands.size() && bands.get(open).high() * rung.cellMetres() * LEAST_CELLS <= 1 + 1e-9) {
            open++;
        }
        return open;
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
        return run(StateRoom.inMemory(memoryBytes), until, listener, "", Optional.empty(), Recorder.NONE);
    }

    /**
     * Runs to its end from where an earlier run of the same problem stood, with the bits that run would have had. A state that had ended on a
     * lower rung than this solve's last goes on with the next rung.
     *
     * @param room     for the states kept in a sweep
     * @param digest   of the problem, for the records
     * @param from     where to begin; empty begins at the beginning
     * @param recorder told of each accepted iteration
     * @throws SolveCancelled           if cancelled
     * @throws IllegalArgumentException as above, or if the state is of another problem or a higher rung
     * @throws java.io.UncheckedIOException if the disk for states refuses; what was recorded can be gone on with
     */
    public SolveResult run(StateRoom room, StopRule until, Progress.Listener listener, String digest, Optional<SolveState> from,
                           Recorder recorder) {
        from.ifPresent(state -> {
            if (!state.problem().equals(digest) || state.rung() > climb.size()) {
                throw new IllegalArgumentException("solve: the record is of another problem or of rung " + state.rung() + ", this solve has "
                        + climb.size() + " rungs; begin anew");
            }
        });
        return new Climb(problem, climb, stay, lanes, cancelled, room, until, listener, digest, recorder).run(from);
    }
}

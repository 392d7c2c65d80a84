package org.wispwright.ui.job;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.wispwright.optimize.checkpoint.Budget;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.Pace;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.solve.Calibration;
import org.wispwright.optimize.solve.Pacing;
import org.wispwright.optimize.solve.SolveCancelled;
import org.wispwright.optimize.solve.SolveProblem;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.MemoryNeed;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.TakeRecord;

/**
 * What a solve of one quality takes, said before it runs.
 *
 * @param quality     how far it climbs
 * @param top         the finest grid that is searched on
 * @param memoryBytes that the work itself holds at once, with as many states as the memory given allows
 * @param states      kept in a sweep on that grid
 * @param onDisk      of them on disk
 * @param diskBytes   that those take while it runs
 * @param takeBytes   that the new take takes, and take 0 if it is not there
 * @param seconds     of the whole solve, by the usual number of gradients
 * @param gradients   that number, all rungs together
 */
public record Estimate(Quality quality, GridShape top, long memoryBytes, int states, int onDisk, long diskBytes, long takeBytes,
                       double seconds, int gradients) {
    private static final int CALIBRATED_CELLS = 40_000;

    /**
     * Measures a low rung for some seconds and says it for each quality.
     *
     * @param memoryBytes that a solve may take
     * @param diskBytes   likewise, of disk for states
     * @throws ShotException    if the shot has no note, or a note wants nothing
     * @throws Cancel.Cancelled if cancelled
     */
    public static List<Estimate> all(Shot shot, long memoryBytes, long diskBytes, Lanes lanes, Cancel cancel) {
        Shot paced = shot.withFlow(paced(shot.flow(), lanes, cancel));
        Calibration measured = measured(paced, lanes, cancel);
        List<Estimate> all = new ArrayList<>();
        for (Quality quality : Quality.values()) {
            all.add(of(quality, paced.flow(), memoryBytes, diskBytes, measured));
        }
        return all;
    }

    /** The same for one quality. */
    static Estimate of(Quality quality, Shot shot, long memoryBytes, long diskBytes, Lanes lanes, Cancel cancel) {
        return of(quality, shot.flow(), memoryBytes, diskBytes, measured(shot, lanes, cancel));
    }

    /** Before there is an original: with as many substeps as its run on the lowest rung needs. */
    private static FlowSetup paced(FlowSetup flow, Lanes lanes, Cancel cancel) {
        if (!flow.pace().isOpen()) {
            return flow;
        }
        GridShape low = Quality.PREVIEW.rungs(flow.grid()).get(0);
        double cells = flow.pace().mostCells() * flow.grid().cellMetres() / low.cellMetres();
        try {
            return flow.withPace(flow.pace().found(Pacing.run(flow.on(low).withPace(Pace.within(cells)), lanes, cancel::wished).substeps()));
        } catch (SolveCancelled asked) {
            throw new Cancel.Cancelled();
        } catch (IllegalArgumentException tooFast) {
            throw new ShotException(new Finding("shot.json", "/flow/largestDisplacementCells", tooFast.getMessage() + "."), tooFast);
        }
    }

    /** The finest rung that still takes a second or two: on one of a few thousand cells the program is not warm when it is over. */
    private static GridShape calibrated(GridShape grid) {
        List<GridShape> rungs = Quality.FINAL.rungs(grid);
        GridShape chosen = rungs.get(0);
        for (GridShape rung : rungs) {
            chosen = rung.cells() <= CALIBRATED_CELLS ? rung : chosen;
        }
        return chosen;
    }

    private static Calibration measured(Shot shot, Lanes lanes, Cancel cancel) {
        SolveProblem problem = ShotProblem.of(shot);
        try {
            return Calibration.of(problem, calibrated(shot.flow().grid()), lanes, cancel::wished);
        } catch (SolveCancelled asked) {
            throw new Cancel.Cancelled();
        } catch (IllegalArgumentException refused) {
            throw new ShotException(new Finding("shot.json", "", refused.getMessage() + "."), refused);
        }
    }

    private static Estimate of(Quality quality, FlowSetup flow, long memoryBytes, long diskBytes, Calibration measured) {
        List<GridShape> rungs = quality.rungs(flow.grid());
        GridShape top = rungs.get(rungs.size() - 1);
        long forStates = MemoryNeed.forStates(flow, memoryBytes, MemoryNeed.region());
        int gradients = 0;
        double seconds = 0;
        for (int rung = 0; rung < rungs.size(); rung++) {
            int usual = rung == 0 ? Calibration.GRADIENTS_LOWEST : Calibration.GRADIENTS_ABOVE;
            GridShape grid = rungs.get(rung);
            int states = new Budget(forStates, diskBytes, SmokeState.bytes(flow.on(grid))).snapshots(measured.steps());
            seconds += usual * measured.gradientSeconds(grid.cells(), states);
            gradients += usual;
        }
        // The original and the take are run once each on the shot's own grid.
        int frames = flow.frames().count();
        seconds += 2 * measured.runSeconds(flow.grid().cells(), frames * flow.substeps());
        Budget budget = new Budget(forStates, diskBytes, SmokeState.bytes(flow.on(top)));
        int states = budget.snapshots(measured.steps());
        int onDisk = budget.onDisk(measured.steps());
        long state = SmokeState.bytes(flow.on(top));
        return new Estimate(quality, top, MemoryNeed.ofSolve(flow, top, states - onDisk), states, onDisk, onDisk * state,
                2L * frames * Float.BYTES * flow.grid().cells(), seconds, gradients);
    }

    /** One line for people. */
    public String inWords() {
        String disk = onDisk > 0 ? ", " + MemoryNeed.inWords(diskBytes) + " of disk while it runs" : "";
        return String.format(Locale.ROOT, "%-8s %s, about %s, memory %s (%d states kept)%s, takes on disk %s",
                quality.name().toLowerCase(Locale.ROOT), top.inWords(), duration(seconds), MemoryNeed.inWords(memoryBytes), states, disk,
                MemoryNeed.inWords(takeBytes));
    }

    /** For programs. */
    public ObjectNode json() {
        return TakeRecord.object().put("quality", quality.name().toLowerCase(Locale.ROOT)).put("cells", top.inWords())
                .put("seconds", seconds).put("gradients", gradients).put("memoryBytes", memoryBytes).put("states", states)
                .put("statesOnDisk", onDisk).put("diskBytes", diskBytes).put("takeBytes", takeBytes);
    }

    private static String duration(double seconds) {
        return seconds < 100 ? String.format(Locale.ROOT, "%.0f s", seconds) : String.format(Locale.ROOT, "%.0f min", seconds / 60);
    }
}

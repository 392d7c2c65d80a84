package org.wispwright.optimize.solve;

import java.util.List;
import org.wispwright.optimize.search.Lbfgs;

/**
 * Where a solve stands after an accepted iteration: all that it needs to go on with the same bits. Everything else (originals, wanted
 * pictures, snapshots) follows from the problem.
 *
 * @param problem          digest of what is solved and how; a state of another problem must not be gone on with
 * @param rung             1 for the coarsest
 * @param band             1 for the first; the highest that is open
 * @param bandIterations   done since that band opened on this rung
 * @param bandGradients    likewise, of gradients
 * @param bandSeconds      likewise, of wall time, for reports
 * @param seconds          wall time since the solve began, pauses left out, for reports
 * @param search           the search itself
 * @param losses           as {@link SolveResult#losses}, so far
 * @param met              of each note, now
 * @param runs             bands that have ended
 * @param ended            why the solve ended; empty while it has not
 */
public record SolveState(String problem, int rung, int band, int bandIterations, int bandGradients, double bandSeconds, double seconds,
                         Lbfgs.State search, List<Double> losses, List<Double> met, List<SolveResult.BandRun> runs, String ended) {
    /** Copies the lists and checks the counts. @throws IllegalArgumentException naming what is off */
    public SolveState {
        losses = List.copyOf(losses);
        met = List.copyOf(met);
        runs = List.copyOf(runs);
        if (rung < 1 || band < 1 || bandIterations < 0 || bandGradients < 0 || !(bandSeconds >= 0) || !(seconds >= 0)) {
            throw new IllegalArgumentException("solve state: got rung " + rung + ", band " + band + ", " + bandIterations + " iterations and "
                    + bandGradients + " gradients of it, " + bandSeconds + " and " + seconds + " s; needs counts of at least 1, 1, 0 and 0");
        }
    }

    /** The same with all wall times 0, so that the same search gives the same bytes. */
    public SolveState withoutTimes() {
        List<SolveResult.BandRun> timeless = runs.stream().map(r -> new SolveResult.BandRun(r.grid(), r.band(), r.unknowns(), r.iterations(),
                r.gradients(), r.loss(), 0)).toList();
        return new SolveState(problem, rung, band, bandIterations, bandGradients, 0, 0, search, losses, met, timeless, ended);
    }
}

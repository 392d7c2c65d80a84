package org.wispwright.optimize.solve;

import java.util.List;
import java.util.Optional;
import org.wispwright.optimize.force.Band;
import org.wispwright.render.volume.GridShape;
import org.wispwright.warp.loss.LossChoice;

/**
 * What a solve found.
 *
 * @param unknowns     the force: the numbers for {@code ForceBasis} with these bands
 * @param strengths    of the sources, [force step][source]; empty if they were not to change
 * @param bands        each rung's and band's part of the search
 * @param losses       total loss after each iteration, as a share of the original's on that rung; each rung adds its own start first
 * @param met          of each note at the solve's raster by the pyramid loss, in the problem's order
 * @param noteLosses   what each note was solved with on the last rung, in the problem's order
 * @param gradients    gradients computed
 * @param seconds      wall time
 * @param energyWeight weight of the energy, that of the strengths included, at the end, {@code weight |x|^2 / 2} beside notes that weigh 1
 * @param energyShare  the energy's part of the objective at the end, as a share of the starting loss
 * @param snapshots    states that were kept in a sweep of the last rung
 * @param ended        why it ended, for a person
 */
public record SolveResult(double[] unknowns, Optional<double[][]> strengths, List<BandRun> bands, List<Double> losses, List<Double> met,
                          List<NoteLoss> noteLosses, int gradients, double seconds,
                          double energyWeight, double energyShare, int snapshots, String ended) {

    /**
     * What a note was solved with.
     *
     * @param choice the losses and why
     * @param fall   1 - (their joint value now / for the original), at the solve's raster
     */
    public record NoteLoss(LossChoice choice, double fall) { }

    /**
     * One band's part of the search on one rung. On the first rung bands open one by one; later rungs begin with all open.
     *
     * @param grid       the rung
     * @param band       its frequencies and splines
     * @param unknowns   numbers open while it ran, lower bands included
     * @param iterations while it was the last open one
     * @param gradients  likewise
     * @param loss       at its end, as a share of the original's
     * @param seconds    that it took
     */
    public record BandRun(GridShape grid, Band band, int unknowns, int iterations, int gradients, double loss, double seconds) { }
}

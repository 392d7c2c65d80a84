package org.wispwright.optimize.force;

import java.util.List;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * The force as unknowns, and gradients back to them. Linear.
 *
 * <p>Forward, for the step s of the frame range (0 for the step that leads to the second frame): the amplitude of a mode is
 * {@code c = sum over splines of q[s][r] x[mode, r]}, the force the sum of the modes ({@link Mode}) times their amplitudes, on
 * faces, m/s2. Pullback, the transpose: {@code xBar[mode, r] += q[s][r] (mode . forceBar)}.
 *
 * <p>Modes and splines are orthonormal in the mean over box and range, so the mean square of the force over both is the
 * squared Euclidean norm of x: the force energy. The same x gives the same physical field on any grid of the same box.
 *
 * <p>Layout of x: bands in order; in a band modes in order, each with its splines side by side. Opening a band appends.
 */
public final class ForceBasis implements ForceModel {
    private final GridShape shape;
    private final int steps;
    private final List<Band> bands;
    private final List<List<Mode>> modes;
    private final List<double[][]> splines;
    private final int[] firstUnknown;
    private final Lanes lanes;
    /** Workspace for the first b + 1 bands: low bands have few waves, and their sums are the cheaper for it. */
    private final WaveSum[] waves;

    /**
     * Prepares the basis.
     *
     * @param steps number of force steps, frames - 1, at least 1
     */
    public ForceBasis(GridShape shape, int steps, List<Band> bands, Lanes lanes) {
        if (steps < 1) {
            throw new IllegalArgumentException("force: got " + steps + " steps, needs at least 1; a shot of one frame has nothing to push");
        }
        this.shape = shape;
        this.steps = steps;
        this.lanes = lanes;
        this.bands = List.copyOf(bands);
        modes = this.bands.stream().map(band -> Mode.in(shape, band)).toList();
        splines = this.bands.stream().map(band -> TimeSplines.orthonormal(steps, Math.min(band.splines(), steps))).toList();
        firstUnknown = new int[bands.size() + 1];
        for (int b = 0; b < bands.size(); b++) {
            firstUnknown[b + 1] = firstUnknown[b] + modes.get(b).size() * splines.get(b)[0].length;
        }
        waves = new WaveSum[bands.size()];
    }

    private WaveSum wavesOf(int openBands) {
        if (waves[openBands - 1] == null) {
            int l = 0;
            int m = 0;
            int n = 0;
            for (Mode mode : modes.subList(0, openBands).stream().flatMap(List::stream).toList()) {
                l = Math.max(l, mode.l());
                m = Math.max(m, mode.m());
                n = Math.max(n, mode.n());
            }
            waves[openBands - 1] = new WaveSum(shape, l + 1, m + 1, n + 1, lanes);
        }
        return waves[openBands - 1];
    }

    private int openBands(double[] x) {
        for (int b = 1; b < firstUnknown.length; b++) {
            if (x.length == firstUnknown[b]) {
                return b;
            }
        }
        throw new IllegalArgumentException("force: got " + x.length + " unknowns, needs one of "
                + java.util.Arrays.toString(java.util.Arrays.copyOfRange(firstUnknown, 1, firstUnknown.length)));
    }

    /** The box. */
    public GridShape shape() {
        return shape;
    }

    /** Number of force steps. */
    public int steps() {
        return steps;
    }

    /** The bands, low to high. */
    public List<Band> bands() {
        return bands;
    }

    @Override
    public int unknowns() {
        return firstUnknown[bands.size()];
    }

    /** Number of unknowns of the first {@code openBands} bands. */
    public int unknowns(int openBands) {
        return firstUnknown[openBands];
    }

    /** Number of modes of a band. */
    public int modes(int band) {
        return modes.get(band).size();
    }

    /** Takes as many unknowns as some number of open bands has. */
    @Override
    public void force(double[] x, int step, MacVelocity out) {
        int open = openBands(x);
        WaveSum sum = wavesOf(open);
        sum.clear();
        for (int b = 0; b < open; b++) {
            double[] q = splines.get(b)[step];
            int at = firstUnknown[b];
            for (Mode mode : modes.get(b)) {
                double amplitude = 0;
                for (double weight : q) {
                    amplitude += weight * x[at++];
                }
                sum.add(mode, amplitude);
            }
        }
        sum.sum(out);
    }

    @Override
    public void pullback(MacVelocity forceBar, int step, double[] xBar) {
        int open = openBands(xBar);
        WaveSum sum = wavesOf(open);
        sum.project(forceBar);
        for (int b = 0; b < open; b++) {
            double[] q = splines.get(b)[step];
            int at = firstUnknown[b];
            for (Mode mode : modes.get(b)) {
                double along = sum.along(mode);
                for (double weight : q) {
                    xBar[at++] += weight * along;
                }
            }
        }
    }
}

package org.wispwright.optimize.solve;

import java.util.Arrays;
import java.util.function.BooleanSupplier;
import org.wispwright.optimize.checkpoint.Reversal;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.optimize.search.Objective;

/**
 * Unknowns to loss and gradient: force, substeps, pictures, terms, and all of it back. The force energy is not in it; the
 * search adds that itself.
 */
final class SolveLoss implements Objective {
    private final FrameTerms terms;
    private final SmokeChain chain;
    private final Reversal reversal;
    private final int substeps;
    private final int firstFrame;
    private final double[] losses;

    /**
     * @param start     read: the state of the first frame
     * @param lastFrame the last frame that a term looks at, or later
     * @param snapshots states kept in the sweep
     */
    SolveLoss(SmokeSolver solver, ForceBasis basis, FrameTerms terms, SmokeState start, int lastFrame, int snapshots,
              BooleanSupplier cancelled) {
        this.terms = terms;
        substeps = solver.setup().substeps();
        firstFrame = solver.setup().frames().first();
        losses = new double[terms.count()];
        chain = new SmokeChain(solver, basis, start, cancelled, (n, density, densityBar) -> {
            if (n % substeps == 0) {
                terms.pullback(firstFrame + n / substeps, density, densityBar);
            }
        });
        reversal = new Reversal(chain, (lastFrame - firstFrame) * substeps, snapshots);
    }

    @Override
    public double evaluate(double[] x, double[] gradient) {
        Arrays.fill(gradient, 0);
        double value = forward(x, gradient);
        reversal.reverse();
        return value;
    }

    /** The value alone; the gradient is left for a reversal that may follow. */
    double forward(double[] x, double[] gradient) {
        double[] sum = new double[1];
        chain.begin(x, gradient);
        reversal.forward(n -> {
            if (n % substeps == 0) {
                sum[0] += terms.forward(firstFrame + n / substeps, chain.current().density(), losses);
            }
        });
        return sum[0];
    }

    /** Lets go of the kept states; an evaluation after this makes new ones. */
    void release() {
        chain.release();
    }

    /** Losses of the terms at the last evaluation, before their scales. */
    double[] losses() {
        return losses;
    }
}

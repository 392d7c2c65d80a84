package org.wispwright.optimize.solve;

import java.util.Arrays;
import java.util.Optional;
import java.util.function.BooleanSupplier;
import org.wispwright.optimize.checkpoint.Reversal;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.flow.Substep;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.optimize.force.SourceCurves;
import org.wispwright.optimize.search.Objective;

/**
 * Unknowns to loss and gradient: force and strengths of sources, substeps, pictures, terms, and all of it back. The force energy is not in it; the
 * search adds that itself.
 */
final class SolveLoss implements Objective {
    private final FrameTerms terms;
    private final SmokeChain chain;
    private final Reversal reversal;
    private final FlowSetup flow;
    private final double[] losses;
    private final SourceCurves curves;
    /** The force's part of the unknowns and of the gradient, and what the sources' part says; null where sources do not change. */
    private double[] forceBar;
    private double[][] strengthBar;

    /** With the sources as they were set up: see the other. */
    SolveLoss(SmokeSolver solver, ForceBasis basis, FrameTerms terms, SmokeState start, int lastFrame, int snapshots,
              BooleanSupplier cancelled) {
        this(solver, basis, Optional.empty(), terms, start, lastFrame, snapshots, cancelled);
    }

    /**
     * @param curves    of the sources' strengths, if they may change: their unknowns come first, the force's follow
     * @param start     read: the state of the first frame
     * @param lastFrame the last frame that a term looks at, or later
     * @param snapshots states kept in the sweep
     */
    SolveLoss(SmokeSolver solver, ForceBasis basis, Optional<SourceCurves> curves, FrameTerms terms, SmokeState start, int lastFrame,
              int snapshots, BooleanSupplier cancelled) {
        this.terms = terms;
        this.curves = curves.orElse(null);
        FlowSetup flow = solver.setup();
        losses = new double[terms.count()];
        chain = new SmokeChain(solver, basis, start, cancelled, (n, density, densityBar) -> {
            int frame = frameOf(flow, n);
            if (frame >= 0) {
                terms.pullback(frame, density, densityBar);
            }
        });
        reversal = new Reversal(chain, flow.stepsTo(lastFrame), snapshots);
        this.flow = flow;
    }

    @Override
    public double evaluate(double[] x, double[] gradient) {
        Arrays.fill(gradient, 0);
        double value = forward(x, gradient);
        reversal.reverse();
        if (curves != null) {
            System.arraycopy(forceBar, 0, gradient, curves.unknowns(), forceBar.length);
            curves.pullback(x, strengthBar, gradient);
        }
        return value;
    }

    /** The value alone; the gradient is left for a reversal that may follow. */
    double forward(double[] x, double[] gradient) {
        double[] sum = new double[1];
        if (curves == null) {
            chain.begin(x, gradient, null, null);
        } else {
            double[][] strengths = curves.strengths(x);
            strengthBar = new double[strengths.length][curves.sources()];
            forceBar = new double[x.length - curves.unknowns()];
            chain.begin(forceOf(curves, x), forceBar, strengths, strengthBar);
        }
        reversal.forward(n -> {
            int frame = frameOf(flow, n);
            if (frame >= 0) {
                sum[0] += terms.forward(frame, chain.current().density(), losses);
            }
        });
        return sum[0];
    }

    /** The force's part of all unknowns. */
    static double[] forceOf(SourceCurves curves, double[] x) {
        return Arrays.copyOfRange(x, curves.unknowns(), x.length);
    }

    /** The frame whose state is the one after n substeps; -1 if it lies between two. */
    private static int frameOf(FlowSetup flow, int n) {
        if (n == 0) {
            return flow.frames().first();
        }
        Substep last = flow.step(n - 1);
        return last.number() == last.count() - 1 ? last.frame() : -1;
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

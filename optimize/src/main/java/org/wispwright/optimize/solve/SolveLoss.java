package org.wispwright.optimize.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.BooleanSupplier;
import org.wispwright.optimize.checkpoint.Reversal;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.Substep;
import org.wispwright.optimize.force.ForceModel;
import org.wispwright.optimize.force.SourceCurves;
import org.wispwright.optimize.search.Objective;

/**
 * Unknowns to loss and gradient: force and strengths of sources, substeps, pictures, terms, and all of it back. The force energy is not in it; the
 * search adds that itself.
 */
final class SolveLoss implements Objective {
    private FrameTerms terms;
    private SmokeChain chain;
    private Reversal reversal;
    private final FlowSetup flow;
    private final double[] losses;
    private final SourceCurves curves;
    /** The force's part of the unknowns and of the gradient, and what the sources' part says; null where sources do not change. */
    private double[] forceBar;
    private double[][] strengthBar;
    /** Where the last value or gradient that was not finite was asked for; null while there was none. */
    private double[] badX;

    /** With the sources as they were set up: see the other. */
    SolveLoss(SmokeSolver solver, ForceModel model, FrameTerms terms, int lastFrame, Snapshots states, BooleanSupplier cancelled) {
        this(solver, model, Optional.empty(), terms, lastFrame, states, cancelled);
    }

    /**
     * @param curves    of the sources' strengths, if they may change: their unknowns come first, the force's follow
     * @param lastFrame the last frame that a term looks at, or later
     * @param states    kept in the sweep, and the first frame's
     */
    SolveLoss(SmokeSolver solver, ForceModel model, Optional<SourceCurves> curves, FrameTerms terms, int lastFrame, Snapshots states,
              BooleanSupplier cancelled) {
        this.terms = terms;
        this.curves = curves.orElse(null);
        FlowSetup flow = solver.setup();
        losses = new double[terms.count()];
        chain = new SmokeChain(solver, model, states, cancelled, (n, density, densityBar) -> {
            int frame = frameOf(flow, n);
            if (frame >= 0) {
                this.terms.pullback(frame, density, densityBar);
            }
        });
        reversal = new Reversal(chain, flow.stepsTo(lastFrame), states.count());
        this.flow = flow;
    }

    @Override
    public double evaluate(double[] x, double[] gradient) {
        Arrays.fill(gradient, 0);
        double value = forward(x, gradient);
        if (!Double.isFinite(value)) {
            badX = x.clone();
            Arrays.fill(gradient, Double.NaN);                                 // nothing can be pulled back from there
            return value;
        }
        reversal.reverse();
        if (curves != null) {
            System.arraycopy(forceBar, 0, gradient, curves.unknowns(), forceBar.length);
            curves.pullback(x, strengthBar, gradient);
        }
        if (!Arrays.stream(gradient).allMatch(Double::isFinite)) {
            badX = x.clone();
        }
        return value;
    }

    /** The value alone; the gradient is left for a reversal that may follow. */
    double forward(double[] x, double[] gradient) {
        double[] sum = new double[1];
        begin(x, gradient);
        reversal.forward(n -> {
            int frame = frameOf(flow, n);
            if (frame >= 0) {
                sum[0] += terms.forward(frame, chain.current().density(), losses);
            }
        });
        return sum[0];
    }

    /**
     * Runs once more where value or gradient was last not finite, to say where that began.
     *
     * @return such as "density at cell (31, 4, 17) of frame 1012 is NaN"; empty if there was no such place
     */
    Optional<String> firstBad() {
        if (badX == null) {
            return Optional.empty();
        }
        List<String> found = new ArrayList<>();
        begin(badX, new double[badX.length]);
        reversal.forward(n -> {
            if (found.isEmpty()) {
                NotFinite.in(chain.current(), moment(n)).ifPresent(found::add);
            }
            int frame = frameOf(flow, n);
            if (found.isEmpty() && frame >= 0 && !Double.isFinite(terms.forward(frame, chain.current().density(), losses))) {
                found.add("the smoke of frame " + frame + " is finite, but its pictures' loss is not");
            }
        });
        return Optional.of(found.isEmpty() ? "smoke and loss are finite everywhere, so only the gradient is not" : found.get(0));
    }

    private String moment(int n) {
        if (n == 0 || frameOf(flow, n) >= 0) {
            return "frame " + frameOf(flow, n);
        }
        Substep last = flow.step(n - 1);
        return "frame " + last.frame() + ", substep " + (last.number() + 1) + " of " + last.count() + ",";
    }

    private void begin(double[] x, double[] gradient) {
        if (curves == null) {
            chain.begin(x, gradient, null, null);
        } else {
            double[][] strengths = curves.strengths(x);
            strengthBar = new double[strengths.length][curves.sources()];
            forceBar = new double[x.length - curves.unknowns()];
            chain.begin(forceOf(curves, x), forceBar, strengths, strengthBar);
        }
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

    /** Lets go of all memory, and of the file that holds states; this loss is over. The losses of the last evaluation stay. */
    void release() {
        if (chain != null) {
            chain.release();
        }
        chain = null;
        reversal = null;
        terms = null;
    }

    /** Losses of the terms at the last evaluation, before their scales. */
    double[] losses() {
        return losses;
    }
}

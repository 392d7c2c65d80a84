package org.wispwright.optimize.solve;

import java.util.function.BooleanSupplier;
import org.wispwright.optimize.checkpoint.ReversibleChain;
import org.wispwright.optimize.flow.Clock;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.flow.Substep;
import org.wispwright.optimize.force.ForceModel;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;
import org.wispwright.render.volume.ScalarGrid;

/**
 * The smoke's substeps as a chain that can be reversed. State n is the smoke after n substeps; state 0 is the first frame's, given.
 *
 * <p>A substep's pullback needs the state before it and the velocity after it, and the latter is part of the state that the
 * pull before this one started from. So a tape costs nothing once the reversal is under way: only the last substep, and those
 * between snapshots, are ever run. Memory: three states, the adjoint, two forces, the start,
 * and a state for each slot used that is not on disk.
 */
final class SmokeChain implements ReversibleChain {
    private final SmokeSolver solver;
    private final ForceModel model;
    private final BooleanSupplier cancelled;
    private final Owed owed;
    private final FlowSetup flow;
    private final Snapshots states;
    private final SmokeState bar;
    private final MacVelocity force;
    private final MacVelocity forceBar;
    private SmokeState current;
    private SmokeState before;
    private SmokeState spare;
    /** Which state {@link #before} is once its step was pulled; -1 if none. */
    private int known = -1;
    /** True while the solver's last call left {@link #current}'s departures with it. */
    private boolean follows;
    /** True while nothing has been run since the last pull. */
    private boolean undisturbed;
    private int forceStep = -1;
    private int barStep = -1;
    private double[] x;
    private double[] xBar;
    private double[][] strengths;
    private double[][] strengthBar;

    /** What the loss owes to a state itself. */
    @FunctionalInterface
    interface Owed {
        /** Adds the derivative of the loss by the density of state n. */
        void addTo(int n, ScalarGrid density, ScalarGrid densityBar);
    }

    SmokeChain(SmokeSolver solver, ForceModel model, Snapshots states, BooleanSupplier cancelled, Owed owed) {
        this.solver = solver;
        this.model = model;
        this.cancelled = cancelled;
        this.owed = owed;
        this.states = states;
        flow = solver.setup();
        GridShape shape = flow.grid();
        bar = SmokeState.of(flow);
        force = new MacVelocity(shape);
        forceBar = new MacVelocity(shape);
        current = SmokeState.of(flow);
        before = SmokeState.of(flow);
        spare = SmokeState.of(flow);
    }

    /**
     * Readies a sweep: the force's unknowns to read, their gradient to add to, state 0 current, the adjoint 0.
     *
     * @param strengthsNow      of the sources, [step][source], to read; null for 1
     * @param strengthsGradient alike, to add to; null with the other
     */
    void begin(double[] unknowns, double[] gradient, double[][] strengthsNow, double[][] strengthsGradient) {
        x = unknowns;
        xBar = gradient;
        strengths = strengthsNow;
        strengthBar = strengthsGradient;
        known = -1;
        follows = false;
        forceStep = -1;
        barStep = -1;
        current.set(states.start());
        bar.clear();
    }

    /** Lets go of the snapshots; a sweep after this makes new ones. */
    void release() {
        states.release();
    }

    /** The current state, to read. */
    SmokeState current() {
        return current;
    }

    @Override
    public void save(int slot) {
        states.save(slot, current);
    }

    @Override
    public void restore(int slot) {
        states.restore(slot, current);
        follows = false;
    }

    @Override
    public void advance(int step) {
        run(step);
        SmokeState swap = current;
        current = spare;
        spare = swap;
    }

    @Override
    public void tape(int step) {
        boolean pulled = known == step + 1;
        if (pulled) {
            SmokeState after = before;
            before = current;
            current = after;
        } else {
            run(step);
            SmokeState free = before;
            before = current;
            current = spare;
            spare = free;
        }
        follows = !pulled || undisturbed;
        known = -1;
    }

    @Override
    public void pull(int step) {
        checkCancelled();
        owed.addTo(step + 1, current.density(), bar.density());
        Substep substep = flow.step(step);
        int at = frameStep(substep);
        if (at != barStep) {
            forceBar.fill(0);
            barStep = at;
        }
        solver.pullback(before, current.velocity(), substep, follows, bar, forceBar, strengthBar == null ? null : strengthBar[at]);
        follows = false;
        undisturbed = true;
        if (substep.number() == 0) {
            long since = System.nanoTime();
            model.pullback(forceBar, at, xBar);
            solver.clock().lap(Clock.Part.FORCE_BACK, since);
        }
        known = step;
    }

    private void run(int step) {
        checkCancelled();
        Substep substep = flow.step(step);
        int at = frameStep(substep);
        if (at != forceStep) {
            long since = System.nanoTime();
            model.force(x, at, force);
            forceStep = at;
            solver.clock().lap(Clock.Part.FORCE, since);
        }
        solver.step(current, force, strengths == null ? null : strengths[at], substep, follows, spare);
        follows = true;
        undisturbed = false;
    }

    /** Number of the force that a substep runs under, from 0. */
    private int frameStep(Substep substep) {
        return substep.frame() - flow.frames().first() - 1;
    }

    private void checkCancelled() {
        if (cancelled.getAsBoolean()) {
            throw new SolveCancelled();
        }
    }
}

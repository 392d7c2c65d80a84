package org.wispwright.optimize.solve;

import java.util.List;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.force.ForceModel;
import org.wispwright.optimize.search.Lbfgs;
import org.wispwright.optimize.search.LineSearch;
import org.wispwright.render.lanes.Lanes;

/** One problem on its own grid under one force model, with the terms that a solve would have: what all runners but the solve run on. */
final class RaceTrack {
    /** For kept states: all of 30 at 64x96x64 fit. */
    static final long MEMORY = 1L << 30;
    private static final double LEAST_FALL = 0.05;
    private static final int OVER = 5;

    private final SolveProblem problem;
    private final TermPlan plan;
    private final SolveLoss loss;
    private final RaceCurve curve;
    private int forwardRuns;

    RaceTrack(SolveProblem problem, ForceModel model, RaceCurve curve, Lanes lanes) {
        this.problem = problem;
        this.curve = curve;
        FlowSetup flow = problem.flow();
        SmokeSolver solver = new SmokeSolver(flow, lanes);
        SmokeState start = flow.startState();
        FrameTerms terms = new FrameTerms(flow.grid(), problem.views(), problem.look(), flow.grid().cellMetres(), solver.clock(), lanes);
        plan = new TermPlan(problem, solver, start, terms, true, () -> false);
        int steps = flow.stepsTo(problem.lastFrame());
        loss = new SolveLoss(solver, model, terms, problem.lastFrame(), new Snapshots(flow, start, steps, StateRoom.inMemory(MEMORY)),
                curve::isOver);
    }

    /** Loss and gradient, as the runners see them. */
    SolveLoss loss() {
        return loss;
    }

    /** The loss of the original. */
    double startLoss() {
        return plan.startLoss();
    }

    /** Loss at x without a gradient, its point noted. */
    double forward(double[] x, double[] scratch) {
        double value = loss.forward(x, scratch);
        forwardRuns++;
        curve.point(0, 0, forwardRuns, plan.met(loss.losses()));
        return value;
    }

    /** Norm of a steady force, m/s2, that moves still smoke by so many cells over the range, as the solve counts it. */
    double forceOfCells(double cells) {
        FlowSetup flow = problem.flow();
        double range = (flow.frames().count() - 1) * flow.frames().secondsPerFrame();
        return 2 * cells * flow.grid().cellMetres() / (range * range);
    }

    /**
     * L-BFGS from no force, its settings the solve's, until the curve is over or no step helps.
     *
     * @param levels numbers of unknowns, opened one after the other when the loss fell by less than 5 % over 5 iterations
     * @param weight of {@code |x|^2 / 2}, fixed; below 0 for the solve's own rule, by which the energy is 2 % of the starting loss
     * @param pairs  that L-BFGS keeps
     */
    void descend(List<Integer> levels, double weight, int pairs) {
        try {
            Lbfgs search = new Lbfgs(loss, new double[levels.get(0)], new Lbfgs.Settings(pairs,
                    LineSearch.Rule.forQuasiNewton().withMostEvaluations(Solve.MOST_EVALUATIONS), forceOfCells(4)));
            if (weight > 0) {
                search.addQuadratic(weight);
            }
            note(search);
            for (int level = 0; level < levels.size(); level++) {
                if (level > 0) {
                    search.extend(levels.get(level), loss);
                }
                level(search, level == levels.size() - 1, weight < 0);
            }
        } catch (SolveCancelled over) {
            return;
        }
    }

    private void level(Lbfgs search, boolean last, boolean ownRule) {
        double[] before = new double[OVER];
        for (int n = 0; !curve.isOver(); n++) {
            double now = search.value() - search.quadraticValue();
            if (!last && n >= OVER && !(now < before[n % OVER] * (1 - LEAST_FALL))) {
                return;
            }
            before[n % OVER] = now;
            if (ownRule && n > 0 && n % Solve.ENERGY_EVERY == 0) {
                weighEnergy(search);
            }
            if (search.step().outcome() != Lbfgs.Outcome.MOVED) {
                return;
            }
            note(search);
        }
    }

    private void note(Lbfgs search) {
        curve.point(search.evaluations(), search.evaluations(), 0, plan.met(loss.losses()));
    }

    private void weighEnergy(Lbfgs search) {
        double squares = 0;
        for (double v : search.x()) {
            squares += v * v;
        }
        double least = forceOfCells(1);
        search.addQuadratic(2 * Solve.ENERGY_SHARE * plan.startLoss() / Math.max(squares, least * least) - search.quadratic());
    }
}

package org.wispwright.ui.job;

import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.optimize.solve.Simulation;
import org.wispwright.optimize.solve.Solve;
import org.wispwright.optimize.solve.SolveCancelled;
import org.wispwright.optimize.solve.SolveProblem;
import org.wispwright.optimize.solve.SolveResult;
import org.wispwright.optimize.solve.StopRule;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.ScalarGrid;
import org.wispwright.ui.shot.Shot;

/**
 * What the stay term buys and costs on a shot: two solves that differ in it alone, on the coarsest rung and of so many iterations each,
 * so that the question costs seconds. Nothing is written.
 *
 * @param grid    the rung
 * @param with    with the stay term, as every take has it
 * @param without without it
 */
public record StayTrade(GridShape grid, Side with, Side without) {
    static final int ITERATIONS = 30;

    /**
     * One of the two solves.
     *
     * @param departure of its other frames from the original
     * @param met       of each note, in the shot's order, at the solve's raster
     */
    public record Side(Departure departure, List<Double> met) { }

    /**
     * Runs both.
     *
     * @throws Cancel.Cancelled if cancelled
     */
    public static StayTrade of(Shot shot, Lanes lanes, Cancel cancel) {
        GridShape grid = Solve.rungs(shot.flow().grid()).get(0);
        SolveProblem problem = ShotProblem.of(shot).on(grid);
        try {
            Map<Integer, ScalarGrid> original = densities(shot, problem.flow(), null, lanes, cancel);
            return new StayTrade(grid, side(shot, problem, original, true, lanes, cancel),
                    side(shot, problem, original, false, lanes, cancel));
        } catch (SolveCancelled asked) {
            throw new Cancel.Cancelled();
        }
    }

    private static Side side(Shot shot, SolveProblem problem, Map<Integer, ScalarGrid> original, boolean stay, Lanes lanes, Cancel cancel) {
        // An eighth of the cells: every state of the rung together is less than what the take's own solve kept.
        long states = SmokeState.bytes(problem.flow()) * (1 + problem.flow().stepsTo(problem.flow().frames().last()));
        StopRule few = new StopRule(0, Double.POSITIVE_INFINITY, ITERATIONS);
        SolveResult solve = new Solve(problem, List.of(problem.flow().grid()), stay, lanes, cancel::wished).run(states, few, now -> { });
        Map<Integer, ScalarGrid> take = densities(shot, problem.flow(), solve.unknowns(), lanes, cancel);
        return new Side(Departure.of(shot, original::get, take::get, lanes, cancel), solve.met());
    }

    private static Map<Integer, ScalarGrid> densities(Shot shot, FlowSetup flow, double[] unknowns, Lanes lanes, Cancel cancel) {
        Map<Integer, ScalarGrid> kept = new HashMap<>();
        Set<Integer> wanted = Arrays.stream(Departure.frames(shot)).boxed().collect(Collectors.toSet());
        ForceBasis basis = unknowns == null ? null : Solve.basis(flow, lanes);
        Simulation.run(new SmokeSolver(flow, lanes), flow.startState(), basis, unknowns, flow.frames().last(), cancel::wished,
                (frame, state, force) -> {
            if (wanted.contains(frame)) {
                kept.put(frame, state.density().copy());
            }
        });
        return kept;
    }
}

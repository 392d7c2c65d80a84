package org.wispwright.optimize.solve;

import java.util.List;
import java.util.function.BooleanSupplier;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;

/**
 * A problem on one grid, made ready: what does not depend on how the search goes on it.
 *
 * @param problem on the rung's grid
 * @param solver  for it
 * @param terms   filled by the plan
 * @param start   the state of the first frame
 * @param plan    the problem as terms
 */
record Rung(SolveProblem problem, SmokeSolver solver, FrameTerms terms, SmokeState start, TermPlan plan) {
    /**
     * Runs the original on the grid and makes the terms, about a pixel and a sample a cell.
     *
     * @throws SolveCancelled           if cancelled
     * @throws IllegalArgumentException if a note wants nothing
     */
    static Rung of(SolveProblem problem, GridShape grid, boolean stay, Lanes lanes, BooleanSupplier cancelled) {
        SolveProblem here = problem.on(grid);
        SmokeSolver solver = new SmokeSolver(here.flow(), lanes);
        List<View> views = here.views().stream().map(view -> Solve.proxy(view, grid.cellMetres())).toList();
        FrameTerms terms = new FrameTerms(grid, views, here.look(), grid.cellMetres(), solver.clock(), lanes);
        SmokeState start = here.flow().startState();
        return new Rung(here, solver, terms, start, new TermPlan(here, solver, start, terms, stay, cancelled));
    }
}

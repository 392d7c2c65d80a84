package org.wispwright.optimize.solve;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.hipparchus.optim.InitialGuess;
import org.hipparchus.optim.MaxEval;
import org.hipparchus.optim.SimpleBounds;
import org.hipparchus.optim.nonlinear.scalar.GoalType;
import org.hipparchus.optim.nonlinear.scalar.ObjectiveFunction;
import org.hipparchus.optim.nonlinear.scalar.noderiv.CMAESOptimizer;
import org.hipparchus.random.MersenneTwister;
import org.wispwright.optimize.force.HandleForce.Handle;
import org.wispwright.optimize.force.HandleForce.Kind;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;

/**
 * What is done by hand, by a patient machine: a dozen handles, forward runs alone, the strengths chosen by CMA-ES (Hansen and Ostermeier
 * 2001, Evolutionary Computation 9(2), 159-195) as Hipparchus has it, with its usual population of {@code 4 + 3 ln(unknowns)}. The seed is
 * fixed.
 */
final class GuessLoop {
    /** First spread of a strength, m/s2: about what the buoyancy of the scenes is, or less. */
    private static final double SPREAD = 3;
    private static final Vec3 X = new Vec3(1, 0, 0);
    private static final Vec3 Y = new Vec3(0, 1, 0);
    private static final Vec3 Z = new Vec3(0, 0, 1);

    private GuessLoop() { }

    /** The handles, placed for a plume in the middle of the box: low and high on its way, across both views. */
    static List<Handle> handles(GridShape box) {
        double x = box.nx() * box.cellMetres() / 2;
        double z = box.nz() * box.cellMetres() / 2;
        List<Handle> handles = new ArrayList<>();
        for (double y : new double[] {1.2, 2.4}) {
            Vec3 at = new Vec3(x, y, z);
            handles.add(new Handle(Kind.WIND, at, X, 1));
            handles.add(new Handle(Kind.WIND, at, Z, 1));
            handles.add(new Handle(Kind.WIND, at, Y, 0.9));
            handles.add(new Handle(Kind.VORTEX, at, Z, 1.1));
            handles.add(new Handle(Kind.VORTEX, at, X, 1.1));
        }
        handles.add(new Handle(Kind.ATTRACT, new Vec3(x - 0.5, 2.3, z), Y, 1.2));
        handles.add(new Handle(Kind.ATTRACT, new Vec3(x + 0.5, 2.3, z), Y, 1.2));
        return handles;
    }

    /** Guesses until the track's curve is over. */
    static void run(RaceTrack track, int unknowns) {
        double[] scratch = new double[unknowns];
        double[] spread = new double[unknowns];
        Arrays.fill(spread, SPREAD);
        int population = 4 + (int) (3 * Math.log(unknowns));
        CMAESOptimizer search = new CMAESOptimizer(Integer.MAX_VALUE, 0, true, 0, 0, new MersenneTwister(1), false, null);
        try {
            search.optimize(new MaxEval(Integer.MAX_VALUE), new ObjectiveFunction(x -> track.forward(x, scratch)), GoalType.MINIMIZE,
                    SimpleBounds.unbounded(unknowns), new InitialGuess(new double[unknowns]), new CMAESOptimizer.Sigma(spread),
                    new CMAESOptimizer.PopulationSize(population));
        } catch (SolveCancelled over) {
            return;
        }
    }
}

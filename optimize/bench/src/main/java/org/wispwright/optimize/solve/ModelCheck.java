package org.wispwright.optimize.solve;

import java.util.Random;
import org.wispwright.optimize.force.ForceModel;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * Before a race: is a model's pullback the transpose of its force (dot-product test, Claerbout 1992), and is the gradient of the whole loss
 * its slope (central difference along the gradient, where the slope is the gradient's own length)?
 */
final class ModelCheck {
    private ModelCheck() { }

    /** Refuses a model. @throws IllegalStateException saying what differs */
    static void run(SolveProblem problem, ForceModel model, Lanes lanes) {
        dotProduct(problem.flow().grid(), model, problem.flow().frames().count() - 1);
        slope(problem, model, lanes);
    }

    private static void dotProduct(GridShape grid, ForceModel model, int steps) {
        Random random = new Random(7);
        double[] x = random.doubles(model.unknowns(), -1, 1).toArray();
        double[] xBar = new double[x.length];
        double forward = 0;
        for (int step = 0; step < steps; step++) {
            MacVelocity force = new MacVelocity(grid);
            force.fill(Float.NaN);
            MacVelocity bar = new MacVelocity(grid);
            model.force(x, step, force);
            float[][] forces = {force.x(), force.y(), force.z()};
            float[][] bars = {bar.x(), bar.y(), bar.z()};
            for (int c = 0; c < 3; c++) {
                for (int n = 0; n < bars[c].length; n++) {
                    bars[c][n] = random.nextFloat() - 0.5f;
                    forward += (double) forces[c][n] * bars[c][n];
                }
            }
            model.pullback(bar, step, xBar);
        }
        double back = 0;
        double size = 0;
        for (int n = 0; n < x.length; n++) {
            back += x[n] * xBar[n];
            size += Math.abs(x[n] * xBar[n]);
        }
        require("dot product", back, forward, 1e-5 * size);
    }

    private static void slope(SolveProblem problem, ForceModel model, Lanes lanes) {
        RaceTrack track = new RaceTrack(problem, model, new RaceCurve(Double.POSITIVE_INFINITY), lanes);
        double[] gradient = new double[model.unknowns()];
        track.loss().evaluate(new double[gradient.length], gradient);
        double length = Math.sqrt(java.util.Arrays.stream(gradient).map(g -> g * g).sum());
        // A hundredth of a cell: the kinks of linear carrying are left aside, rounding is far below.
        double by = track.forceOfCells(0.01);
        double[] ends = new double[2];
        for (int side = 0; side < 2; side++) {
            double[] x = gradient.clone();
            for (int n = 0; n < x.length; n++) {
                x[n] *= (side == 0 ? by : -by) / length;
            }
            ends[side] = track.loss().forward(x, new double[x.length]);
        }
        require("slope of the loss", length, (ends[0] - ends[1]) / (2 * by), 0.02 * length);
    }

    private static void require(String what, double got, double expected, double most) {
        System.out.printf("check: %s %.6g, expected %.6g%n", what, got, expected);
        if (!(Math.abs(got - expected) <= most)) {
            throw new IllegalStateException("race, " + what + ": got " + got + ", expected " + expected + " within " + most);
        }
    }
}

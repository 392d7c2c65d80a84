package org.wispwright.optimize.solve;

import java.util.Random;
import org.wispwright.optimize.force.ForceModel;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * Before a race: is a model's pullback the transpose of its force (dot-product test, Claerbout 1992), and is the gradient of the whole loss
 * its slope (central difference along the gradient, where the slope is the gradient's own length)? The slope is asked for where the air has
 * been set moving a little: still air traces back to cell centres, which are kinks of linear carrying.
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
        double[] rest = new double[model.unknowns()];
        double[] start = along(rest, track.forceOfCells(-0.5), gradient(track, rest));
        double[] gradient = gradient(track, start);
        double by = track.forceOfCells(0.01);                                  // rounding is far below, the next kinks mostly further
        double up = track.loss().forward(along(start, by, gradient), rest);
        double down = track.loss().forward(along(start, -by, gradient), rest);
        double length = length(gradient);
        // Kinks are left (air at rest far off, a plume's own symmetry), so 5 %; the dot product is the sharp test of a model, and the chain
        // under it has its own in WholeChainTest, off all kinks.
        require("slope of the loss", length, (up - down) / (2 * by), 0.05 * length);
    }

    private static double[] gradient(RaceTrack track, double[] x) {
        double[] gradient = new double[x.length];
        track.loss().evaluate(x, gradient);
        return gradient;
    }

    /** x and so much more along a direction of any length. */
    private static double[] along(double[] x, double by, double[] direction) {
        double[] out = x.clone();
        double length = length(direction);
        for (int n = 0; n < out.length; n++) {
            out[n] += by * direction[n] / length;
        }
        return out;
    }

    private static double length(double[] x) {
        return Math.sqrt(java.util.Arrays.stream(x).map(v -> v * v).sum());
    }

    private static void require(String what, double got, double expected, double most) {
        System.out.printf("check: %s %.6g, expected %.6g%n", what, got, expected);
        if (!(Math.abs(got - expected) <= most)) {
            throw new IllegalStateException("race, " + what + ": got " + got + ", expected " + expected + " within " + most);
        }
    }
}

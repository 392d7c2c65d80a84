package org.wispwright.optimize.solve;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SolidFigures;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.march.Look;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.view.Orthographic;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.warp.loss.PyramidLoss;

/**
 * How many forward runs does a gradient cost with solids in the box? The scenes of {@link SolidFigures}, a view on the last frame, all states
 * kept, two threads; wall time, median of three.
 * <p>Run: {@code java -cp optimize/bench/target/bench.jar org.wispwright.optimize.solve.SolidGradientFigures 64 12}
 */
public final class SolidGradientFigures {
    private SolidGradientFigures() { }

    /** Prints a row a scene. @param args cells each way, frames */
    public static void main(String[] args) {
        int n = Integer.parseInt(args[0]);
        int frames = Integer.parseInt(args[1]);
        GridShape box = new GridShape(n, n, n, 4.0 / n);
        try (Lanes lanes = new Lanes(2)) {
            System.out.println("scene | forward, s | gradient, s | gradient / forward");
            SolidFigures.scenes().forEach((name, things) -> row(name, SolidFigures.flow(box, things), 1000 + frames, lanes));
        }
    }

    private static void row(String name, FlowSetup flow, int lastFrame, Lanes lanes) {
        GridShape grid = flow.grid();
        SmokeSolver solver = new SmokeSolver(flow, lanes);
        ForceBasis basis = Solve.basis(flow, lanes);
        View view = new View("front", new Orthographic(4, 4), new Vec3(2, 2, 10), new Vec3(2, 2, 2), new Vec3(0, 1, 0),
                new Raster(grid.nx(), grid.nx()));
        Look look = new Look(4, Rgb.grey(0.9), Rgb.grey(0.7), Optional.empty());
        FrameTerms terms = new FrameTerms(grid, List.of(view), look, grid.cellMetres(), solver.clock(), lanes);
        float[] weights = new float[grid.nx() * grid.nx()];
        Arrays.fill(weights, 1f);
        terms.add(lastFrame, 0, new PyramidLoss(new Picture(grid.nx(), grid.nx()), weights), 1);
        SolveLoss loss = new SolveLoss(solver, basis, terms, lastFrame,
                new Snapshots(flow, flow.startState(), flow.stepsTo(lastFrame), StateRoom.inMemory(Long.MAX_VALUE)), () -> false);
        double[] x = new double[basis.unknowns(1)];
        Random random = new Random(1);
        for (int n = 0; n < x.length; n++) {
            x[n] = 0.5 * random.nextGaussian() / Math.sqrt(x.length);
        }
        double[] gradient = new double[x.length];
        loss.evaluate(x, gradient);                                            // warms up
        double[] forward = new double[3];
        double[] whole = new double[3];
        for (int n = 0; n < 3; n++) {
            long since = System.nanoTime();
            loss.forward(x, gradient);
            forward[n] = (System.nanoTime() - since) / 1e9;
            since = System.nanoTime();
            loss.evaluate(x, gradient);
            whole[n] = (System.nanoTime() - since) / 1e9;
        }
        Arrays.sort(forward);
        Arrays.sort(whole);
        System.out.printf("%s | %.2f (worst %.2f) | %.2f (worst %.2f) | %.2f%n", name, forward[1], forward[2], whole[1], whole[2],
                whole[1] / forward[1]);
    }
}

package org.wispwright.optimize.solve;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
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
 * What one gradient of a large shot holds in memory with so many states kept, and that its bits do not depend on them. A plume, all bands open,
 * a view on the last frame. Prints a digest of the gradient and, where the system tells it, the peak of resident memory.
 * <p>Run: {@code java -Xmx1200m -cp optimize/bench/target/bench.jar org.wispwright.optimize.solve.GradientMemory 128 30 6}: cells each way,
 * frames (at most 41), states in memory.
 */
public final class GradientMemory {
    private GradientMemory() { }

    /** Prints a row. @param args cells each way, frames, states */
    public static void main(String[] args) throws IOException, NoSuchAlgorithmException {
        int n = Integer.parseInt(args[0]);
        int frames = Integer.parseInt(args[1]);
        long states = Long.parseLong(args[2]);
        FlowSetup flow = SolidFigures.flow(new GridShape(n, n, n, 4.0 / n), List.of());
        int lastFrame = flow.frames().first() + frames - 1;
        try (Lanes lanes = new Lanes(2)) {
            SmokeSolver solver = new SmokeSolver(flow, lanes);
            ForceBasis basis = Solve.basis(flow, lanes);
            View view = new View("front", new Orthographic(4, 4), new Vec3(2, 2, 10), new Vec3(2, 2, 2), new Vec3(0, 1, 0), new Raster(n, n));
            Look look = new Look(4, Rgb.grey(0.9), Rgb.grey(0.7), Optional.empty());
            FrameTerms terms = new FrameTerms(flow.grid(), List.of(view), look, flow.grid().cellMetres(), solver.clock(), lanes);
            float[] weights = new float[n * n];
            Arrays.fill(weights, 1f);
            terms.add(lastFrame, 0, new PyramidLoss(new Picture(n, n), weights), 1);
            Snapshots kept = new Snapshots(flow, flow.startState(), flow.stepsTo(lastFrame), StateRoom.inMemory(states * SmokeState.bytes(flow)));
            SolveLoss loss = new SolveLoss(solver, basis, terms, lastFrame, kept, () -> false);
            double[] x = new double[basis.unknowns(basis.bands().size())];
            Random random = new Random(1);
            for (int i = 0; i < x.length; i++) {
                x[i] = 0.5 * random.nextGaussian() / Math.sqrt(x.length);
            }
            double[] gradient = new double[x.length];
            long since = System.nanoTime();
            double value = loss.evaluate(x, gradient);
            System.out.printf("%d^3, %d frames | %d states | %d unknowns | %.0f s | loss %.9g | gradient sha256 %s | peak %s%n", n, frames,
                    kept.count(), x.length, (System.nanoTime() - since) / 1e9, value, digest(gradient).substring(0, 16), peak());
        }
    }

    private static String digest(double[] values) throws NoSuchAlgorithmException {
        ByteBuffer bytes = ByteBuffer.allocate(Double.BYTES * values.length);
        bytes.asDoubleBuffer().put(values);
        return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes.array()));
    }

    /** Peak resident memory as Linux tells it, in words; "not told" elsewhere. */
    private static String peak() throws IOException {
        Path status = Path.of("/proc/self/status");
        if (!Files.isReadable(status)) {
            return "not told";
        }
        return Files.readAllLines(status).stream().filter(line -> line.startsWith("VmHWM:")).map(line -> line.substring(6).strip()).findFirst()
                .orElse("not told");
    }
}

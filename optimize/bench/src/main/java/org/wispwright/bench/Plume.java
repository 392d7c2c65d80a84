package org.wispwright.bench;

import java.util.List;
import java.util.Random;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.flow.Interpolation;
import org.wispwright.optimize.flow.Side;
import org.wispwright.optimize.flow.Sides;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.flow.Source;
import org.wispwright.optimize.flow.Substep;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/** What the benchmarks work on: a plume in a box of 4 m height with open sides, a walled floor and one source, and seeded noise. */
final class Plume {
    /** Height of the box, metres. */
    static final double HEIGHT = 4;
    /** Frames from still air to the plume that is measured: it has reached about the middle of the box. */
    static final int GROWN = 24;

    private Plume() {
    }

    /** A box of {@link #HEIGHT} metres with its lowest corner at the origin. */
    static GridShape box(int nx, int ny, int nz) {
        return new GridShape(nx, ny, nz, HEIGHT / ny);
    }

    /** The plume in a box, one substep a frame. */
    static FlowSetup in(GridShape box, Interpolation density) {
        Sides sides = new Sides(Side.OPEN, Side.OPEN, Side.WALL, Side.OPEN, Side.OPEN, Side.OPEN);
        FrameRange frames = new FrameRange(1001, 1100, 24);
        double x = box.nx() * box.cellMetres() / 2;
        double z = box.nz() * box.cellMetres() / 2;
        return new FlowSetup(box, frames, 1, Interpolation.LINEAR, density, sides, 8, 0.1,
                List.of(new Source("pot", x, 0.5, z, 0.5, 0.3, 6, frames.first(), frames.last())));
    }

    /** The state after {@link #GROWN} frames, without a force. */
    static SmokeState grown(FlowSetup flow, Lanes lanes) {
        SmokeSolver solver = new SmokeSolver(flow, lanes);
        SmokeState now = new SmokeState(flow.grid());
        SmokeState next = new SmokeState(flow.grid());
        for (int n = 1; n <= GROWN; n++) {
            solver.step(now, null, new Substep(flow.frames().first() + n, 0, 1), n > 1, next);
            SmokeState swap = now;
            now = next;
            next = swap;
        }
        return now;
    }

    /** Overwrites values with noise of mean 0. */
    static void noise(float[] values, double deviation, long seed) {
        Random random = new Random(seed);
        for (int n = 0; n < values.length; n++) {
            values[n] = (float) (deviation * random.nextGaussian());
        }
    }

    /** Overwrites a face field with noise of mean 0. */
    static void noise(MacVelocity values, double deviation, long seed) {
        noise(values.x(), deviation, seed);
        noise(values.y(), deviation, seed + 1);
        noise(values.z(), deviation, seed + 2);
    }
}

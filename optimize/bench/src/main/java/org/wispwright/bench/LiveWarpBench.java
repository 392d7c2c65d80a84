package org.wispwright.bench;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Level;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Window;
import org.wispwright.warp.retouch.Cells;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.LiveWarp;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Retoucher;
import org.wispwright.warp.retouch.WarpKind;

/**
 * Does a dragged mesh warp follow the hand at 1920x1080 on one core, and what does the picture of rest cost? Each call is one movement
 * of the hand: the median and the worst (p1.00) count. Mesh: 20 x 20 cells.
 * <p>Both sides: at rest the live picture must have the bits of {@link Retoucher#wanted}.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.SampleTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class LiveWarpBench {
    /** How the inside follows. */
    @Param({"AS_RIGID_AS_POSSIBLE", "SPLINE", "RIGID"})
    public WarpKind kind;
    /** REGION: an ellipse of 475 x 540 pixels and its feather; FRAME: everything moves. */
    @Param({"REGION", "FRAME"})
    public String where;

    private LiveWarp live;
    private int moves;

    /** Makes the warp; then both sides. */
    @Setup(Level.Trial)
    public void sameAnswerFirst() {
        Picture original = new Picture(1920, 1080);
        for (int p = 0; p < 1920 * 1080; p++) {
            double x = (p % 1920 + 0.5) / 1080 - 0.9;
            double y = (p / 1920 + 0.5) / 1080 - 0.5;
            Arrays.fill(original.rgba(), 4 * p, 4 * p + 4, (float) (0.9 * Math.exp(-(x * x + y * y) / 0.06)));
        }
        List<Handle> handles = List.of(Handle.pin(new Point(0.9, 0.5)), Handle.pin(new Point(0.8, 0.62)), Handle.pin(new Point(1, 0.62)));
        Optional<Matte> within = where.equals("REGION") ? Optional.of(new Region.Ellipse(new Point(0.9, 0.5), 0.22, 0.25, 0.1))
                : Optional.empty();
        live = new LiveWarp(new MeshWarp(kind, handles, Cells.USUAL, within), original, original);
        drag();
        live.rest();
        if (!Arrays.equals(live.shown().rgba(), Retoucher.wanted(new Retouch(List.of(live.warp())), original).rgba())) {
            throw new IllegalStateException("live warp bench: the picture of rest is not the wanted one");
        }
    }

    /** One movement of the hand: handles, mesh or fit, pixels as a draft. */
    @Benchmark
    public Optional<Window> drag() {
        moves++;
        return live.drag(0, new Point(0.9 + 0.05 * Math.sin(0.3 * moves), 0.45 + 0.05 * Math.cos(0.2 * moves)));
    }

    /** The picture of rest. */
    @Benchmark
    public Optional<Window> rest() {
        return live.rest();
    }
}

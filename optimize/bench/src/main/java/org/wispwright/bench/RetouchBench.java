package org.wispwright.bench;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
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
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Retoucher;
import org.wispwright.warp.retouch.Stroke;

/**
 * Which operation of a retouch, one stroke of a brush or one mesh warp, is too slow to follow the hand (about 50 ms) at which raster?
 * <p>Both sides: {@link Retoucher}, and at {@value #CHECKED} pixels chosen by chance the formula of the operation written out
 * ({@link PlainRetouch}). The smoke has one colour, so the colour of added smoke is known.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class RetouchBench {
    private static final int CHECKED = 400;
    /** Colour of the smoke, not premultiplied. */
    private static final double[] COLOUR = {0.8, 0.7, 0.6};

    /** A brush, or WARP. */
    @Param({"ADD", "REMOVE", "SOFTEN", "WARP"})
    public String operation;
    /** Pixels, width x height. */
    @Param({"480x360", "1920x1080"})
    public String raster;

    private Picture original;
    private Retouch retouch;

    /** Paints a puff of smoke; then both sides. */
    @Setup(Level.Trial)
    public void sameAnswerFirst() {
        String[] sides = raster.split("x");
        original = puff(Integer.parseInt(sides[0]), Integer.parseInt(sides[1]));
        double middle = 0.5 * original.width() / original.height();
        Operation one = operation.equals("WARP") ? warp(middle) : stroke(Brush.valueOf(operation), middle);
        retouch = new Retouch(List.of(one));
        Picture wanted = Retoucher.wanted(retouch, original);
        PlainRetouch plain = new PlainRetouch(original, COLOUR);
        Random random = new Random(9);
        double[] got = new double[4 * CHECKED];
        double[] expected = new double[4 * CHECKED];
        double changed = 0;
        for (int n = 0; n < CHECKED; n++) {
            // Around the middle, where the operations act.
            int x = (int) ((middle + 0.8 * (random.nextDouble() - 0.5)) * original.height());
            int y = (int) ((0.5 + 0.8 * (random.nextDouble() - 0.5)) * original.height());
            double[] pixel = one instanceof Stroke stroke ? plain.stroked(stroke, x, y) : plain.warped((MeshWarp) one, x, y);
            for (int c = 0; c < 4; c++) {
                got[4 * n + c] = wanted.at(x, y, c);
                expected[4 * n + c] = pixel[c];
                changed = Math.max(changed, Math.abs(wanted.at(x, y, c) - original.at(x, y, c)));
            }
        }
        Same.close("retouch " + operation + " at " + raster, got, expected, 1e-5);
        if (!(changed > 0.01)) {
            throw new IllegalStateException("retouch bench: " + operation + " changed the checked pixels by at most " + changed
                    + ", so the check shows nothing");
        }
    }

    static Picture puff(int width, int height) {
        Picture picture = new Picture(width, height);
        for (int y = 0; y < height; y++) {
            for (int x = 0; x < width; x++) {
                double dx = (x + 0.5 - 0.5 * width) / height;
                double dy = (y + 0.5) / height - 0.5;
                double ripple = 0.75 + 0.25 * Math.sin(60 * dx) * Math.cos(45 * dy);
                double alpha = 0.9 * ripple * Math.exp(-(dx * dx + dy * dy) / (2 * 0.18 * 0.18));
                int at = 4 * (x + width * y);
                for (int c = 0; c < 3; c++) {
                    picture.rgba()[at + c] = (float) (COLOUR[c] * alpha);
                }
                picture.rgba()[at + 3] = (float) alpha;
            }
        }
        return picture;
    }

    /** An arc of 40 points across the puff. */
    private static Stroke stroke(Brush brush, double middle) {
        List<Point> line = new ArrayList<>();
        for (int n = 0; n < 40; n++) {
            double angle = Math.PI * n / 39;
            line.add(new Point(middle + 0.25 * Math.cos(angle), 0.5 - 0.2 * Math.sin(angle)));
        }
        return new Stroke(brush, 0.08, 0.8, 0.5, line, Optional.empty());
    }

    /** Four pins around the puff and eight handles on it, turned by a few degrees. */
    private static MeshWarp warp(double middle) {
        List<Handle> handles = new ArrayList<>();
        for (int n = 0; n < 4; n++) {
            handles.add(Handle.pin(new Point(middle + (n % 2 == 0 ? -0.6 : 0.6), n < 2 ? 0.02 : 0.98)));
        }
        for (int n = 0; n < 8; n++) {
            double angle = Math.PI * n / 4;
            handles.add(new Handle(new Point(middle + 0.2 * Math.cos(angle), 0.5 + 0.2 * Math.sin(angle)),
                    new Point(middle + 0.23 * Math.cos(angle + 0.2), 0.5 + 0.21 * Math.sin(angle + 0.2))));
        }
        return new MeshWarp(handles, Optional.empty());
    }

    /** The wanted picture. */
    @Benchmark
    public Picture wanted() {
        return Retoucher.wanted(retouch, original);
    }
}

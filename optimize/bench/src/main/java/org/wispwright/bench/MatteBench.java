package org.wispwright.bench;

import java.util.ArrayList;
import java.util.List;
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
import org.wispwright.warp.matte.BrushedMatte;
import org.wispwright.warp.matte.CombinedMatte;
import org.wispwright.warp.matte.DensityRange;
import org.wispwright.warp.matte.ImageMatte;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.matte.Window;

/**
 * Which kind of matte takes more than a few milliseconds for a frame of 1920 x 1080?
 * <p>Both sides: the values of the whole frame, and at {@value #CHECKED} pixels chosen by chance those of a window of one pixel, which
 * must be the same bits.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.SampleTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class MatteBench {
    private static final int CHECKED = 200;
    private static final double MIDDLE = 960.0 / 1080;

    /** Which matte. */
    @Param({"RECTANGLE", "ELLIPSE", "POLYGON", "DENSITY", "DENSITY_FEATHERED", "BRUSHED", "IMAGE", "COMBINED"})
    public String kind;

    private Picture original;
    private Matte matte;

    /** Paints a puff of smoke; then both sides. */
    @Setup(Level.Trial)
    public void sameAnswerFirst() {
        original = RetouchBench.puff(1920, 1080);
        matte = matte(kind);
        float[] whole = matte.values(original);
        Random random = new Random(9);
        double[] got = new double[CHECKED];
        double[] expected = new double[CHECKED];
        for (int n = 0; n < CHECKED; n++) {
            int x = random.nextInt(1920);
            int y = random.nextInt(1080);
            got[n] = whole[x + 1920 * y];
            expected[n] = matte.values(original, new Window(x, y, 1, 1))[0];
        }
        Same.close("matte " + kind, got, expected, 0);
    }

    private static Matte matte(String kind) {
        List<Point> star = new ArrayList<>();
        for (int n = 0; n < 40; n++) {
            double radius = n % 2 == 0 ? 0.4 : 0.3;
            star.add(new Point(MIDDLE + radius * Math.cos(Math.PI * n / 20), 0.5 + radius * Math.sin(Math.PI * n / 20)));
        }
        Region rectangle = new Region.Rectangle(0.2, 0.1, 1.5, 0.9, 0.02);
        return switch (kind) {
            case "RECTANGLE" -> rectangle;
            case "ELLIPSE" -> new Region.Ellipse(new Point(MIDDLE, 0.5), 0.6, 0.4, 0.02);
            case "POLYGON" -> new Region.Polygon(star, 0.02);
            case "DENSITY" -> new DensityRange(0.2, 0.8, 0.1, 0);
            case "DENSITY_FEATHERED" -> new DensityRange(0.2, 0.8, 0.1, 0.05);
            case "BRUSHED" -> new BrushedMatte(List.of(new BrushedMatte.Dab(BrushedMatte.Way.ADD, new Sweep(0.05, 1, 0.5, star))));
            case "IMAGE" -> new ImageMatte(480, 270, ImageMatte.pixels(RetouchBench.puff(480, 270), ImageMatte.Channel.ALPHA), 0);
            default -> new CombinedMatte(CombinedMatte.Way.SUBTRACT, List.of(rectangle, matte("DENSITY")));
        };
    }

    /** The values of a whole frame. */
    @Benchmark
    public float[] values() {
        return matte.values(original);
    }
}

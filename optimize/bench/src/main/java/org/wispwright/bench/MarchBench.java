package org.wispwright.bench;

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
import org.openjdk.jmh.annotations.TearDown;
import org.openjdk.jmh.annotations.Warmup;
import org.wispwright.optimize.flow.Interpolation;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.march.Light;
import org.wispwright.render.march.Look;
import org.wispwright.render.march.RayMarcher;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.view.Orthographic;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.ScalarGrid;

/**
 * What does a light cost in a picture of 96x128 pixels and its pullback, of a plume of 48x64x48 cells, a sample a cell?
 * <p>Both sides: without a light, one exponential a ray; with one, a march with shadows. With a light of no radiance the second must
 * give the first's picture and derivative.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class MarchBench {
    private static final Vec3 TOWARDS_LIGHT = new Vec3(1, 2, 1.5);

    /** NONE or ONE. */
    @Param({"NONE", "ONE"})
    public String light;
    /** Lanes. */
    @Param({"1", "2"})
    public int lanes;

    private Lanes ours;
    private RayMarcher marcher;
    private ScalarGrid smoke;
    private ScalarGrid smokeBar;
    private Look look;
    private Picture got;
    private Picture out;
    private float[] pictureBar;

    /** Grows the plume; then both sides. */
    @Setup(Level.Trial)
    public void sameAnswerFirst() {
        ours = new Lanes(lanes);
        GridShape box = Plume.box(48, 64, 48);
        smoke = Plume.grown(Plume.in(box, Interpolation.LINEAR), ours).density();
        smokeBar = new ScalarGrid(box);
        View view = new View("front", new Orthographic(3, 4), new Vec3(1.5, 2, 10), new Vec3(1.5, 2, 1.5), new Vec3(0, 1, 0),
                new Raster(96, 128));
        marcher = new RayMarcher(box, view, box.cellMetres(), ours);
        got = view.raster().picture();
        out = view.raster().picture();
        pictureBar = new float[got.rgba().length];
        Plume.noise(pictureBar, 1, 4);
        Look unlit = look(Optional.empty());
        Look dark = look(Optional.of(new Light(TOWARDS_LIGHT, Rgb.BLACK)));
        marcher.picture(smoke, unlit, got);
        marcher.picture(smoke, dark, out);
        Same.close("picture with a dark light and without one", out.rgba(), got.rgba(), 2e-6);
        ScalarGrid plain = new ScalarGrid(box);
        marcher.pullback(smoke, unlit, got, pictureBar, plain);
        ScalarGrid marched = new ScalarGrid(box);
        marcher.pullback(smoke, dark, out, pictureBar, marched);
        Same.close("pullback with a dark light and without one", marched.values(), plain.values(), 1e-5);
        look = switch (light) {
            case "NONE" -> unlit;
            case "ONE" -> look(Optional.of(new Light(TOWARDS_LIGHT, Rgb.grey(1.5))));
            default -> throw new IllegalArgumentException("march bench: got light '" + light + "', needs NONE or ONE");
        };
        marcher.picture(smoke, look, got);
    }

    private static Look look(Optional<Light> light) {
        return new Look(4, Rgb.grey(.9), Rgb.grey(.7), light);
    }

    /** Ends the lanes. */
    @TearDown(Level.Trial)
    public void close() {
        ours.close();
    }

    /** One picture. */
    @Benchmark
    public Picture picture() {
        marcher.picture(smoke, look, out);
        return out;
    }

    /** One pullback; all pixels pull. */
    @Benchmark
    public ScalarGrid pullback() {
        smokeBar.fill(0);
        marcher.pullback(smoke, look, got, pictureBar, smokeBar);
        return smokeBar;
    }
}

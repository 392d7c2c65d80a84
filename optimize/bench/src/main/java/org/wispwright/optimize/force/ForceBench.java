package org.wispwright.optimize.force;

import java.util.List;
import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Level;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.TearDown;
import org.openjdk.jmh.annotations.Warmup;
import org.wispwright.bench.Same;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * What does the force of one step cost, and its pullback, as the bands of a box of 64^3 cells and 48 frames open one by one?
 * <p>Both sides: the separable products that are timed, and on a small box every mode written out at every face. One operation is one
 * of the 47 steps, taken in turn.
 */
@State(Scope.Benchmark)
@BenchmarkMode(org.openjdk.jmh.annotations.Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class ForceBench {
    private static final int STEPS = 47;
    private static final double HEIGHT = 4;

    /** Open bands; the box has three. */
    @Param({"1", "2", "3"})
    public int open;
    /** Lanes. */
    @Param({"1", "2"})
    public int lanes;

    private Lanes ours;
    private ForceBasis basis;
    private double[] x;
    private double[] xBar;
    private MacVelocity force;
    private MacVelocity forceBar;
    private int step;

    /** Both sides on a box of 12x10x9 cells, then the basis that is timed. */
    @Setup(Level.Trial)
    public void sameAnswerFirst() {
        ours = new Lanes(lanes);
        check(new GridShape(12, 10, 9, HEIGHT / 10), 11, 7);
        GridShape shape = new GridShape(64, 64, 64, HEIGHT / 64);
        basis = new ForceBasis(shape, STEPS, BandPlan.of(shape, STEPS), ours);
        if (open > basis.bands().size()) {
            throw new IllegalArgumentException("force bench: got " + open + " open bands, the box has " + basis.bands().size());
        }
        Random random = new Random(7);
        x = noise(basis.unknowns(open), random);
        xBar = new double[x.length];
        force = new MacVelocity(shape);
        forceBar = noise(shape, random);
        step = 0;
    }

    /** Ends the lanes. */
    @TearDown(Level.Trial)
    public void close() {
        ours.close();
    }

    private void check(GridShape shape, int steps, int at) {
        Random random = new Random(8);
        List<Band> bands = List.of(new Band(0, 0.3, 3), new Band(0.3, 0.6, 6));
        ForceBasis small = new ForceBasis(shape, steps, bands, ours);
        double[] unknowns = noise(small.unknowns(2), random);
        MacVelocity bar = noise(shape, random);
        MacVelocity sum = new MacVelocity(shape);
        double[] gradient = new double[unknowns.length];
        small.force(unknowns, at, sum);
        small.pullback(bar, at, gradient);
        MacVelocity plainSum = new MacVelocity(shape);
        double[] plainGradient = new double[unknowns.length];
        int n = 0;
        for (Band band : bands) {
            double[] weights = TimeSplines.orthonormal(steps, band.splines())[at];
            for (Mode mode : Mode.in(shape, band)) {
                MacVelocity wave = plain(shape, mode);
                double along = dot(wave.x(), bar.x()) + dot(wave.y(), bar.y()) + dot(wave.z(), bar.z());
                double amplitude = 0;
                for (double weight : weights) {
                    amplitude += weight * unknowns[n];
                    plainGradient[n++] = weight * along;
                }
                add(wave.x(), amplitude, plainSum.x());
                add(wave.y(), amplitude, plainSum.y());
                add(wave.z(), amplitude, plainSum.z());
            }
        }
        Same.close("force by products and mode by mode, x", sum.x(), plainSum.x(), 1e-5);
        Same.close("force by products and mode by mode, y", sum.y(), plainSum.y(), 1e-5);
        Same.close("force by products and mode by mode, z", sum.z(), plainSum.z(), 1e-5);
        Same.close("pullback by products and mode by mode", gradient, plainGradient, 1e-5);
    }

    /** The mode written out, sines on the component's own axis. */
    private static MacVelocity plain(GridShape shape, Mode mode) {
        MacVelocity wave = new MacVelocity(shape);
        double ax = Math.PI * mode.l() / shape.nx();
        double ay = Math.PI * mode.m() / shape.ny();
        double az = Math.PI * mode.n() / shape.nz();
        for (int k = 0; k <= shape.nz(); k++) {
            for (int j = 0; j <= shape.ny(); j++) {
                for (int i = 0; i <= shape.nx(); i++) {
                    double cx = Math.cos(ax * (i + 0.5));
                    double cy = Math.cos(ay * (j + 0.5));
                    double cz = Math.cos(az * (k + 0.5));
                    if (j < shape.ny() && k < shape.nz()) {
                        wave.x()[shape.xFace(i, j, k)] = (float) (mode.ax() * Math.sin(ax * i) * cy * cz);
                    }
                    if (i < shape.nx() && k < shape.nz()) {
                        wave.y()[shape.yFace(i, j, k)] = (float) (mode.ay() * cx * Math.sin(ay * j) * cz);
                    }
                    if (i < shape.nx() && j < shape.ny()) {
                        wave.z()[shape.zFace(i, j, k)] = (float) (mode.az() * cx * cy * Math.sin(az * k));
                    }
                }
            }
        }
        return wave;
    }

    private static double dot(float[] a, float[] b) {
        double sum = 0;
        for (int n = 0; n < a.length; n++) {
            sum += (double) a[n] * b[n];
        }
        return sum;
    }

    private static void add(float[] wave, double amplitude, float[] to) {
        for (int n = 0; n < to.length; n++) {
            to[n] += (float) (amplitude * wave[n]);
        }
    }

    private static double[] noise(int count, Random random) {
        return random.doubles(count, -1, 1).toArray();
    }

    private static MacVelocity noise(GridShape shape, Random random) {
        MacVelocity out = new MacVelocity(shape);
        for (float[] values : new float[][] {out.x(), out.y(), out.z()}) {
            for (int n = 0; n < values.length; n++) {
                values[n] = (float) random.nextGaussian();
            }
        }
        return out;
    }

    private int nextStep() {
        step = (step + 1) % STEPS;
        return step;
    }

    /** The force of the next step. */
    @Benchmark
    public MacVelocity force() {
        basis.force(x, nextStep(), force);
        return force;
    }

    /** The pullback of the next step; what is in xBar only grows, which costs nothing. */
    @Benchmark
    public double[] pullback() {
        basis.pullback(forceBar, nextStep(), xBar);
        return xBar;
    }
}

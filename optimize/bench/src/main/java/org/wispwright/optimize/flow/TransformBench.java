package org.wispwright.optimize.flow;

import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.jtransforms.dct.FloatDCT_1D;
import org.jtransforms.fft.FloatFFT_1D;
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
import org.wispwright.bench.Same;

/**
 * At which axis length does a fast cosine transform beat the folded matrix product of {@link AxisTransform}?
 * <p>One operation carries the n rows of one slab of an n^3 box, walls at both ends, to modes and back. Both sides copy the rows in
 * first, so that rounding does not pile up. Same answer: JTransforms' scaled cosine transform is the orthonormal DCT-II; AxisTransform
 * has the same numbers, even modes first, then odd.
 * <p>The cosine transform of JTransforms has tables for powers of 2 only. So a second fast side takes any n through a real Fourier
 * transform of the same length, with a table of its own: with {@code v = x[0], x[2], .. x[3], x[1]} and V its Fourier transform,
 * {@code y[m] = s_m Re(exp(-i pi m / 2n) V[m])}, and back {@code V[m] = exp(i pi m / 2n) (y[m] / s_m - i y[n-m] / s_(n-m))}; s as in
 * the orthonormal DCT. Makhoul (1980), IEEE Trans. ASSP 28(1), 27-34.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class TransformBench {
    /** Cells along the axis, and rows. */
    @Param({"32", "48", "64", "96", "128", "192", "256"})
    public int n;

    private float[] start;
    private float[] values;
    private float[] scratch;
    private AxisTransform product;
    private FloatDCT_1D fast;
    private FloatFFT_1D fourier;
    private float[] line;
    private float[] cosines;
    private float[] sines;

    /** Both sides, to modes and back. */
    @Setup(Level.Trial)
    public void sameAnswerFirst() {
        if (n < 2 || n % 2 != 0) {
            throw new IllegalArgumentException("transform bench: got n = " + n + ", needs an even number from 2");
        }
        Random random = new Random(6);
        start = new float[n * n];
        for (int p = 0; p < start.length; p++) {
            start[p] = (float) random.nextGaussian();
        }
        scratch = new float[n * n];
        product = new AxisTransform(n, Side.WALL, Side.WALL, Integer.MAX_VALUE);
        fast = new FloatDCT_1D(n);
        fourier = new FloatFFT_1D(n);
        line = new float[n];
        cosines = new float[n];
        sines = new float[n];
        for (int m = 0; m < n; m++) {
            cosines[m] = (float) Math.cos(Math.PI * m / (2 * n));
            sines[m] = (float) Math.sin(Math.PI * m / (2 * n));
        }
        float[] modes = start.clone();
        product.rowsToModes(modes, scratch, 0, n);
        float[] rising = new float[n * n];
        for (int r = 0; r < n; r++) {
            for (int m = 0; m < n; m++) {
                rising[r * n + m] = modes[r * n + (m % 2 == 0 ? m / 2 : (n + 1) / 2 + m / 2)];
            }
        }
        values = start.clone();
        for (int r = 0; r < n; r++) {
            fast.forward(values, r * n, true);
        }
        Same.close("modes by product and by fast transform", rising, values, 2e-6);
        float[] byFourier = start.clone();
        for (int r = 0; r < n; r++) {
            forwardByFourier(byFourier, r * n);
        }
        Same.close("modes by Fourier transform and by fast transform", byFourier, values, 2e-6);
        Same.close("there and back by Fourier transform", fourier().clone(), start, 2e-6);
        Same.close("there and back by product", product().clone(), start, 2e-6);
        Same.close("there and back by fast transform", fast().clone(), start, 2e-6);
    }

    /** There and back by the folded product. */
    @Benchmark
    public float[] product() {
        System.arraycopy(start, 0, values, 0, start.length);
        product.rowsToModes(values, scratch, 0, n);
        product.rowsToCells(values, scratch, 0, n);
        return values;
    }

    /** There and back by the fast transform. */
    @Benchmark
    public float[] fast() {
        System.arraycopy(start, 0, values, 0, start.length);
        for (int at = 0; at < values.length; at += n) {
            fast.forward(values, at, true);
        }
        for (int at = 0; at < values.length; at += n) {
            fast.inverse(values, at, true);
        }
        return values;
    }

    /** There and back by a real Fourier transform of the same length. */
    @Benchmark
    public float[] fourier() {
        System.arraycopy(start, 0, values, 0, start.length);
        for (int at = 0; at < values.length; at += n) {
            forwardByFourier(values, at);
        }
        for (int at = 0; at < values.length; at += n) {
            backByFourier(values, at);
        }
        return values;
    }

    /** n even. JTransforms packs V as Re V[0], Re V[n/2], Re V[1], Im V[1], .. */
    private void forwardByFourier(float[] row, int at) {
        int half = n / 2;
        for (int i = 0; i < half; i++) {
            line[i] = row[at + 2 * i];
            line[n - 1 - i] = row[at + 2 * i + 1];
        }
        fourier.realForward(line, 0);
        float scale = (float) Math.sqrt(2.0 / n);
        row[at] = (float) Math.sqrt(1.0 / n) * line[0];
        row[at + half] = scale * cosines[half] * line[1];
        for (int m = 1; m < half; m++) {
            float re = line[2 * m];
            float im = line[2 * m + 1];
            row[at + m] = scale * (cosines[m] * re + sines[m] * im);
            row[at + n - m] = scale * (sines[m] * re - cosines[m] * im);
        }
    }

    private void backByFourier(float[] row, int at) {
        int half = n / 2;
        float scale = (float) Math.sqrt(n / 2.0);
        line[0] = (float) Math.sqrt(n) * row[at];
        line[1] = 2 * scale * cosines[half] * row[at + half];
        for (int m = 1; m < half; m++) {
            float y = row[at + m];
            float mirror = row[at + n - m];
            line[2 * m] = scale * (cosines[m] * y + sines[m] * mirror);
            line[2 * m + 1] = scale * (sines[m] * y - cosines[m] * mirror);
        }
        fourier.realInverse(line, 0, true);
        for (int i = 0; i < half; i++) {
            row[at + 2 * i] = line[i];
            row[at + 2 * i + 1] = line[n - 1 - i];
        }
    }
}

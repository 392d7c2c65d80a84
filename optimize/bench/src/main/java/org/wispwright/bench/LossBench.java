package org.wispwright.bench;

import java.util.Random;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Level;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.loss.PyramidLoss;

/**
 * Is the pyramid loss with its pullback, at 96x128 pixels, small beside the picture that it judges ({@link MarchBench})?
 * <p>Both sides: the loss, and the same sum over levels written out in double pixel by pixel. The derivative is held against a central
 * difference, which for a square is exact up to rounding.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class LossBench {
    private static final int WIDTH = 96;
    private static final int HEIGHT = 128;
    private static final double[] BURT = {1 / 16.0, 4 / 16.0, 6 / 16.0, 4 / 16.0, 1 / 16.0};

    private Picture got;
    private float[] gotBar;
    private PyramidLoss loss;

    /** Random pictures and weights; then both sides. */
    @Setup(Level.Trial)
    public void sameAnswerFirst() {
        Random random = new Random(5);
        got = picture(random);
        Picture wanted = picture(random);
        float[] weights = new float[WIDTH * HEIGHT];
        for (int p = 0; p < weights.length; p++) {
            weights[p] = random.nextFloat();
        }
        loss = new PyramidLoss(wanted, weights);
        gotBar = new float[got.rgba().length];
        double value = loss.valueAndPullback(got, gotBar, 1);
        Same.close("pyramid loss", new double[] {value}, new double[] {plain(got, wanted, weights)}, 1e-6);
        Picture ahead = got.copy();
        Picture behind = got.copy();
        double along = 0;
        for (int n = 0; n < gotBar.length; n++) {
            // Steps of 1/8 add without rounding to values on a grid of 2^-20.
            float step = random.nextBoolean() ? 0.125f : -0.125f;
            ahead.rgba()[n] += step;
            behind.rgba()[n] -= step;
            along += (double) gotBar[n] * step;
        }
        double difference = (plain(ahead, wanted, weights) - plain(behind, wanted, weights)) / 2;
        Same.close("pullback of the pyramid loss", new double[] {along}, new double[] {difference}, 1e-5);
    }

    private static Picture picture(Random random) {
        Picture picture = new Picture(WIDTH, HEIGHT);
        for (int n = 0; n < picture.rgba().length; n++) {
            picture.rgba()[n] = random.nextInt(1 << 20) / (float) (1 << 20);
        }
        return picture;
    }

    private static double plain(Picture got, Picture wanted, float[] weights) {
        int width = WIDTH;
        int height = HEIGHT;
        double[][] difference = new double[4][width * height];
        double[] weight = new double[width * height];
        for (int p = 0; p < weight.length; p++) {
            weight[p] = weights[p];
            for (int c = 0; c < 4; c++) {
                difference[c][p] = (double) got.rgba()[4 * p + c] - wanted.rgba()[4 * p + c];
            }
        }
        double sum = 0;
        while (true) {
            double level = 0;
            for (int p = 0; p < weight.length; p++) {
                for (double[] channel : difference) {
                    level += weight[p] * channel[p] * channel[p];
                }
            }
            sum += level / weight.length;
            if ((Math.min(width, height) + 1) / 2 < 8) {
                return sum;
            }
            for (int c = 0; c < 4; c++) {
                difference[c] = down(difference[c], width, height);
            }
            weight = down(weight, width, height);
            width = (width + 1) / 2;
            height = (height + 1) / 2;
        }
    }

    private static double[] down(double[] in, int width, int height) {
        int halfWidth = (width + 1) / 2;
        double[] out = new double[halfWidth * ((height + 1) / 2)];
        for (int p = 0; p < out.length; p++) {
            for (int dy = -2; dy <= 2; dy++) {
                for (int dx = -2; dx <= 2; dx++) {
                    int x = mirrored(2 * (p % halfWidth) + dx, width);
                    int y = mirrored(2 * (p / halfWidth) + dy, height);
                    out[p] += BURT[dx + 2] * BURT[dy + 2] * in[x + width * y];
                }
            }
        }
        return out;
    }

    private static int mirrored(int i, int n) {
        return i < 0 ? -i : i >= n ? 2 * n - 2 - i : i;
    }

    /** The loss and its derivative; what is in gotBar only grows, which costs nothing. */
    @Benchmark
    public double valueAndPullback() {
        return loss.valueAndPullback(got, gotBar, 1);
    }
}

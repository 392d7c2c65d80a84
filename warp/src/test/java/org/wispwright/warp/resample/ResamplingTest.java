package org.wispwright.warp.resample;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;
import org.wispwright.render.picture.Picture;

/** Outside checks W30, W31; O69 for resampling at fixed positions. */
class ResamplingTest extends PullbackContract {
    private static final int WIDTH = 9;
    private static final int HEIGHT = 7;

    /** O69: bicubic reads of a 9x7 picture at 40 fixed positions, some of them across the border. */
    @Override
    protected Operator operator() {
        int reads = 40;
        double[] positions = random(2 * reads, 5);
        int inputs = 4 * WIDTH * HEIGHT;
        Resampling resampling = new Resampling(Kernel.KEYS);
        return new Operator("bicubic resampling", inputs, 4 * reads, true, random(inputs, 6), random(inputs, 7), (in, out) -> {
            Picture picture = new Picture(WIDTH, HEIGHT, narrow(in));
            float[] values = new float[4 * reads];
            for (int n = 0; n < reads; n++) {
                resampling.read(picture, 4 + 6 * positions[2 * n], 3 + 5 * positions[2 * n + 1], values, 4 * n);
            }
            widen(values, out);
        }, (in, outBar, inBar) -> {
            float[] bar = new float[inputs];
            for (int n = 0; n < reads; n++) {
                resampling.readPullback(WIDTH, HEIGHT, 4 + 6 * positions[2 * n], 3 + 5 * positions[2 * n + 1], narrow(outBar), 4 * n, bar);
            }
            for (int i = 0; i < inputs; i++) {
                inBar[i] += bar[i];
            }
        });
    }

    /** W30: bilinear at (.25, .75) between 10, 20, 30, 40, and its transpose. */
    @Test
    void w30_bilinearAndItsTranspose() {
        Picture corners = new Picture(2, 2);
        float[] values = {10, 20, 30, 40};
        for (int p = 0; p < 4; p++) {
            corners.rgba()[4 * p + 3] = values[p];
        }
        float[] out = new float[4];
        Resampling resampling = new Resampling(Kernel.LINEAR);
        resampling.read(corners, .25, .75, out, 0);
        assertEquals(27.5f, out[3]);
        float[] bar = new float[16];
        resampling.readPullback(2, 2, .25, .75, new float[] {0, 0, 0, 1}, 0, bar);
        assertArrayEquals(new float[] {.1875f, .0625f, .5625f, .1875f}, new float[] {bar[3], bar[7], bar[11], bar[15]});
    }

    /** W31: a shift by whole pixels and a turn by 90 degrees are exact copies; a shift by .5, bilinear, is the mean of two. */
    @Test
    void w31_shiftAndQuarterTurnAreExact() {
        Picture in = new Picture(WIDTH, HEIGHT);
        Random random = new Random(3);
        for (int n = 0; n < in.rgba().length; n++) {
            in.rgba()[n] = random.nextFloat();
        }
        float[] out = new float[4];
        for (Kernel kernel : new Kernel[] {Kernel.LINEAR, Kernel.KEYS, Kernel.KEYS_SHARP}) {
            Resampling resampling = new Resampling(kernel);
            for (int y = 0; y < HEIGHT; y++) {
                for (int x = 0; x < WIDTH; x++) {
                    resampling.read(in, x + 2, y - 1, out, 0);
                    for (int c = 0; c < 4; c++) {
                        assertEquals(x + 2 < WIDTH && y >= 1 ? in.at(x + 2, y - 1, c) : 0f, out[c]);
                    }
                }
            }
            for (int y = 0; y < WIDTH; y++) {
                for (int x = 0; x < HEIGHT; x++) {
                    resampling.read(in, y, HEIGHT - 1 - x, out, 0);
                    for (int c = 0; c < 4; c++) {
                        assertEquals(in.at(y, HEIGHT - 1 - x, c), out[c]);
                    }
                }
            }
        }
        Resampling linear = new Resampling(Kernel.LINEAR);
        for (int x = 0; x + 1 < WIDTH; x++) {
            linear.read(in, x + .5, 2, out, 0);
            assertEquals((float) (((double) in.at(x, 2, 1) + in.at(x + 1, 2, 1)) / 2), out[1]);
        }
    }

    @Test
    void clampTakesOvershootAway() {
        float[] rgba = {-0.1f, 0.5f, 0.2f, 1.25f, 0.3f, 0.3f, 0.3f, -0.01f};
        Resampling.clamp(rgba, 0);
        Resampling.clamp(rgba, 4);
        assertArrayEquals(new float[] {0, 0.4f, 0.16f, 1, 0, 0, 0, 0}, rgba, 1e-7f);
    }

    private static float[] narrow(double[] values) {
        float[] out = new float[values.length];
        for (int n = 0; n < out.length; n++) {
            out[n] = (float) values[n];
        }
        return out;
    }

    private static void widen(float[] values, double[] out) {
        for (int n = 0; n < out.length; n++) {
            out[n] = values[n];
        }
    }
}

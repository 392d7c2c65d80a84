package org.wispwright.warp.loss;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;

/** Burt and Adelson (1983), IEEE Trans. Communications 31(4), 532-540. */
class PyramidTest extends PullbackContract {
    /** One level down, 4 channels, odd sides. */
    @Override
    protected Operator operator() {
        Pyramid pyramid = new Pyramid(19, 23);
        int inputs = 4 * pyramid.pixels(0);
        int outputs = 4 * pyramid.pixels(1);
        float[] scratch = new float[pyramid.scratchFloats(4)];
        return new Operator("pyramid step", inputs, outputs, true, random(inputs, 1), random(inputs, 2), (in, out) -> {
            float[] values = narrow(out);
            pyramid.down(0, 4, narrow(in), values, scratch);
            widen(values, out);
        }, (in, outBar, inBar) -> {
            float[] bar = narrow(inBar);
            pyramid.downPullback(0, 4, narrow(outBar), bar, scratch);
            widen(bar, inBar);
        });
    }

    /** The equivalent weights of two steps, a = 3/8 (their figure 2): the 5-tap kernel widened by itself. */
    @Test
    void aSpikeShowsTheKernel() {
        Pyramid pyramid = new Pyramid(33, 33);
        float[] in = new float[33 * 33];
        in[16 + 33 * 16] = 256;
        float[] out = new float[17 * 17];
        pyramid.down(0, 1, in, out, new float[pyramid.scratchFloats(1)]);
        // Even positions of (1,4,6,4,1) about the spike: 1, 6, 1 along each axis.
        float[] row = {0, 1, 6, 1, 0};
        for (int y = 0; y < 5; y++) {
            for (int x = 0; x < 5; x++) {
                assertEquals(row[x] * row[y], out[6 + x + 17 * (6 + y)], 1e-5f);
            }
        }
    }

    @ParameterizedTest
    @CsvSource({"8,8", "16,16", "96,128", "17,31", "45,33", "9,200"})
    void aConstantStaysAConstantOnEveryLevel(int width, int height) {
        Pyramid pyramid = new Pyramid(width, height);
        float[] level = new float[pyramid.pixels(0)];
        Arrays.fill(level, 0.7f);
        float[] scratch = new float[pyramid.scratchFloats(1)];
        for (int l = 0; l + 1 < pyramid.levels(); l++) {
            float[] next = new float[pyramid.pixels(l + 1)];
            pyramid.down(l, 1, level, next, scratch);
            for (float value : next) {
                assertEquals(0.7f, value, 1e-6f);
            }
            level = next;
        }
    }

    /** Against the definition, entry by entry, at awkward sizes. */
    @ParameterizedTest
    @CsvSource({"16,16", "17,16", "15,31", "33,18", "40,15"})
    void downEqualsPlain(int width, int height) {
        Pyramid pyramid = new Pyramid(width, height);
        float[] in = narrow(random(3 * width * height, 9));
        float[] out = new float[3 * pyramid.pixels(1)];
        pyramid.down(0, 3, in, out, new float[pyramid.scratchFloats(3)]);
        double[] g = {1.0 / 16, 4.0 / 16, 6.0 / 16, 4.0 / 16, 1.0 / 16};
        for (int y = 0; y < pyramid.height(1); y++) {
            for (int x = 0; x < pyramid.width(1); x++) {
                for (int c = 0; c < 3; c++) {
                    double sum = 0;
                    for (int m = -2; m <= 2; m++) {
                        for (int n = -2; n <= 2; n++) {
                            int i = reflect(2 * x + n, width);
                            int j = reflect(2 * y + m, height);
                            sum += g[n + 2] * g[m + 2] * in[3 * (i + width * j) + c];
                        }
                    }
                    assertEquals(sum, out[3 * (x + pyramid.width(1) * y) + c], 1e-6, "(" + x + ", " + y + ") channel " + c);
                }
            }
        }
    }

    @Test
    void levelsEndAtAboutEightPixels() {
        Pyramid pyramid = new Pyramid(96, 128);
        assertEquals(4, pyramid.levels());
        assertArrayEquals(new int[] {12, 16}, new int[] {pyramid.width(3), pyramid.height(3)});
        assertEquals(5, new Pyramid(128, 128).levels());
        assertEquals(1, new Pyramid(5, 400).levels());
        assertEquals(2, new Pyramid(15, 20).levels());
    }

    private static int reflect(int i, int n) {
        return i < 0 ? -i : i >= n ? 2 * n - 2 - i : i;
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

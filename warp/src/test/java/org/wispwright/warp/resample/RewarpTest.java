package org.wispwright.warp.resample;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.picture.Picture;

/** Rows read anew against {@link Resampling}, pixel by pixel. */
class RewarpTest {
    @ParameterizedTest
    @CsvSource({"1,1", "2,3", "5,4", "17,13", "64,31"})
    void equalsPlain(int width, int height) {
        Random random = new Random(5);
        Picture in = new Picture(width, height);
        for (int n = 0; n < in.rgba().length; n++) {
            in.rgba()[n] = random.nextFloat();
        }
        double[] dx = new double[width + 2];
        double[] dy = new double[width + 2];
        float[] mask = new float[width * height];
        for (Kernel kernel : new Kernel[] {Kernel.KEYS, Kernel.LINEAR}) {
            Rewarp rewarp = new Rewarp(kernel);
            Resampling plain = new Resampling(kernel);
            Picture out = new Picture(width, height);
            float[] expected = new float[4];
            for (int row = 0; row < height; row++) {
                for (int i = 0; i < width; i++) {
                    dx[2 + i] = i % 5 == 0 ? 0 : i % 7 == 3 ? Double.NaN : 9 * (random.nextDouble() - 0.5);
                    dy[2 + i] = i % 5 == 0 ? 0 : 9 * (random.nextDouble() - 0.5);
                    mask[i + width * row] = i % 4 == 0 ? 0 : i % 4 == 1 ? 1 : random.nextFloat();
                }
                rewarp.row(in, 0, row, width, dx, dy, 2, mask, out);
                for (int i = 0; i < width; i++) {
                    float m = mask[i + width * row];
                    boolean still = m == 0 || dx[2 + i] == 0 && dy[2 + i] == 0;
                    if (!still && !Double.isNaN(dx[2 + i])) {
                        plain.read(in, i + m * dx[2 + i], row + m * dy[2 + i], expected, 0);
                        Resampling.clamp(expected, 0);
                    }
                    for (int c = 0; c < 4; c++) {
                        float was = in.at(i, row, c);
                        float want = still ? was : Double.isNaN(dx[2 + i]) ? (1 - m) * was : expected[c];
                        assertEquals(want, out.at(i, row, c), still ? 0 : 2e-6, kernel + " at " + i + ", " + row);
                    }
                }
            }
        }
    }

    @Test
    void refusesOtherKernels() {
        assertThrows(IllegalArgumentException.class, () -> new Rewarp(Kernel.CUBIC_B_SPLINE));
    }
}

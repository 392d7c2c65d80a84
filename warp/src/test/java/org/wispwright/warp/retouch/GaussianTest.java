package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Window;

/** The blur against the true Gaussian, summed pixel by pixel over the picture and its border pixels repeated without end. */
class GaussianTest {
    /** One channel blurred by the definition: weights exp(-d^2 / (2 sigma^2)) to 6 sigma, sum 1, in double. */
    static double[] plain(Picture in, int channel, double sigma) {
        int width = in.width();
        int height = in.height();
        double[] across = new double[width * height];
        double[] out = new double[width * height];
        int reach = (int) Math.ceil(6 * sigma);
        for (int p = 0; p < across.length; p++) {
            double weight = 0;
            for (int n = -reach; n <= reach; n++) {
                double w = n == 0 ? 1 : Math.exp(-0.5 * n * n / (sigma * sigma));
                across[p] += w * in.at(Math.min(width - 1, Math.max(0, p % width + n)), p / width, channel);
                weight += w;
            }
            across[p] /= weight;
        }
        for (int p = 0; p < across.length; p++) {
            double weight = 0;
            for (int n = -reach; n <= reach; n++) {
                double w = n == 0 ? 1 : Math.exp(-0.5 * n * n / (sigma * sigma));
                out[p] += w * across[p % width + width * Math.min(height - 1, Math.max(0, p / width + n))];
                weight += w;
            }
            out[p] /= weight;
        }
        return out;
    }

    /** Squares of 0 and 1 of three sizes: the sharpest there is. */
    private static Picture squares(int width, int height) {
        Picture picture = new Picture(width, height);
        for (int n = 0; n < picture.rgba().length; n++) {
            int side = new int[] {3, 11, 29, 5}[n % 4];
            picture.rgba()[n] = (n / 4 % width / side + n / 4 / width / side) % 2;
        }
        return picture;
    }

    /** At awkward sizes: wider than the picture, one row, one column; every level of blocks, and the width just before a level begins. */
    @ParameterizedTest
    @CsvSource({"5,7,0.8", "1,9,2", "9,1,1.3", "6,4,5", "3,3,0", "90,83,3.99", "90,83,4", "90,83,7.9", "90,83,8", "90,83,19",
            "90,83,32", "67,131,63", "131,67,64", "83,90,128", "67,45,300", "1,77,9", "77,1,17"})
    void blurEqualsPlain(int width, int height, double sigma) {
        Picture in = squares(width, height);
        float[] all = Gaussian.blurred(in, 4, sigma);
        float[] alpha = Gaussian.blurred(in, 1, sigma);
        for (int c = 0; c < 4; c += 3) {
            double[] expected = plain(in, c, sigma);
            for (int p = 0; p < width * height; p++) {
                String place = "(" + p % width + ", " + p / width + ") channel " + c;
                assertEquals(expected[p], all[4 * p + c], sigma < 4 ? 1e-4 : 5e-4, place);
                assertEquals(c == 3 ? all[4 * p + 3] : alpha[p], alpha[p], 1e-6, place);
            }
        }
    }

    /**
     * A step at every offset to the blocks: the normal distribution's integral (Abramowitz and Stegun 26.2), within what the class states.
     */
    @ParameterizedTest
    @ValueSource(doubles = {8, 9.1, 13.7, 16, 40})
    void aStepEqualsTheErrorIntegral(double sigma) {
        double worst = 0;
        for (int offset = 0; offset < 32; offset += 3) {
            Picture step = new Picture(640, 3);
            for (int p = 0; p < 640 * 3; p++) {
                step.rgba()[4 * p + 3] = p % 640 < 300 + offset ? 0 : 1;
            }
            float[] blurred = Gaussian.blurred(step, 1, sigma);
            for (int x = 40; x < 600; x++) {
                worst = Math.max(worst, Math.abs(normal((x + 0.5 - 300 - offset) / sigma) - blurred[640 + x]));
            }
        }
        double seen = worst;
        assertTrue(worst < 5e-4, () -> "off by " + seen);
    }

    /** Simpson's rule for the normal distribution. */
    private static double normal(double z) {
        double sum = 0;
        double to = Math.min(8, Math.max(-8, z));
        int n = 400;
        for (int k = 0; k <= n; k++) {
            double t = to * k / n;
            sum += (k == 0 || k == n ? 1 : k % 2 == 1 ? 4 : 2) * Math.exp(-t * t / 2);
        }
        return 0.5 + sum * to / n / 3 / Math.sqrt(2 * Math.PI);
    }

    /** Tiles in any order have the same bits; and so after the picture changed in a window and the blocks were told. */
    @Test
    void theBitsDoNotDependOnTheOrderOfTiles() {
        Picture picture = squares(260, 200);
        Blocks blocks = new Blocks(picture);
        List<Integer> order = new ArrayList<>();
        for (int n = 0; n < 5 * 4; n++) {
            order.add(n);
        }
        for (int round = 0; round < 2; round++) {
            Collections.shuffle(order, new Random(round));
            for (double sigma : new double[] {2, 9, 90}) {
                Gaussian gaussian = new Gaussian(blocks, picture.rgba(), 260, 200, 4, sigma);
                float[] whole = Gaussian.blurred(picture, 4, sigma);
                float[] tile = new float[4 * 64 * 64];
                for (int n : order) {
                    gaussian.tile(n % 5, n / 5, tile);
                    for (int y = n / 5 * 64; y < Math.min(200, n / 5 * 64 + 64); y++) {
                        for (int x = n % 5 * 64; x < Math.min(260, n % 5 * 64 + 64); x++) {
                            for (int c = 0; c < 4; c++) {
                                assertEquals(whole[4 * (x + 260 * y) + c], tile[4 * (x % 64 + 64 * (y % 64)) + c]);
                            }
                        }
                    }
                }
            }
            for (Window window : List.of(new Window(120, 60, 140, 10), new Window(1, 1, 1, 1), new Window(3, 199, 61, 1))) {
                for (int p = 0; p < window.pixels(); p++) {
                    int x = window.left() + p % window.width();
                    int y = window.top() + p / window.width();
                    picture.rgba()[4 * (x + 260 * y) + 3] = 0.5f + 0.25f * round;
                }
                blocks.changed(window);
            }
        }
    }
}

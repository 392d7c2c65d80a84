package org.wispwright.warp.matte;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.render.picture.Picture;

/** The softening of mattes by its variance, and pictures as mattes by hand. */
class FeatherAndImageTest {
    /**
     * A spike spreads to numbers whose sum is the spike's and whose variance along an axis is F^2 / 20 (the variance of the derivative
     * 6 s (1 - s) / F of a region's edge, by integration), at any width: narrower than a pixel, whole, odd.
     */
    @ParameterizedTest
    @ValueSource(doubles = {0.6, 2, 7.3, 20, 33.3})
    void aSpikeGetsTheVarianceOfARegionsEdge(double pixels) {
        int n = 101;
        float[] spike = new float[n * n];
        spike[50 + n * 50] = 1;
        float[] soft = new ImageMatte(n, n, spike, pixels / n).values(new Picture(n, n));
        double sum = 0;
        double across = 0;
        double down = 0;
        for (int p = 0; p < soft.length; p++) {
            sum += soft[p];
            across += soft[p] * Math.pow(p % n - 50, 2);
            down += soft[p] * Math.pow(p / n - 50, 2);
        }
        // Numbers of 2^-24 are rounded up and down; a wide kernel has thousands of small ones.
        assertEquals(1, sum, 2e-4);
        assertEquals(pixels * pixels / 20, across / sum, 2e-4 * pixels * pixels);
        assertEquals(pixels * pixels / 20, down / sum, 2e-4 * pixels * pixels);
    }

    /** A hard edge of a picture with feather F is at most 0.03 from the region's s^2 (3 - 2 s); both are 1/2 on the edge. */
    @Test
    void aHardEdgeGetsAboutARegionsEdge() {
        int n = 100;
        float[] half = new float[n * n];
        for (int p = 0; p < half.length; p++) {
            half[p] = p % n < 50 ? 1 : 0;
        }
        float[] soft = new ImageMatte(n, n, half, 0.4).values(new Picture(n, n), new Window(0, 40, n, 1));
        float[] region = new Region.Rectangle(-2, -2, 0.5, 2, 0.4).values(new Picture(n, n), new Window(0, 40, n, 1));
        assertArrayEquals(region, soft, 0.03f);
        assertEquals(1, soft[49] + soft[50], 1e-5);
    }

    /** Ours: what is 0 or 1 all around stays so exactly, also at the border, so nothing changes where a matte is 0. */
    @Test
    void zeroAndOneStayExact() {
        int n = 60;
        float[] half = new float[n * n];
        for (int p = 0; p < half.length; p++) {
            half[p] = p % n < 30 ? 1 : 0;
        }
        float[] soft = new ImageMatte(n, n, half, 0.25).values(new Picture(n, n));
        for (int y = 0; y < n; y++) {
            assertEquals(1f, soft[n * y]);
            assertEquals(1f, soft[n * y + 20]);
            assertEquals(0f, soft[n * y + 39]);
            assertEquals(0f, soft[n * y + n - 1]);
            assertTrue(soft[n * y + 29] > 0.5f && soft[n * y + 30] < 0.5f);
        }
    }

    /**
     * By hand. As many pixels: themselves. Two for three: (2 a + b) / 3, (b + 2 c) / 3. Four for two: a, (3 a + b) / 4, (a + 3 b) / 4, b.
     */
    @Test
    void resamplingByHand() {
        float[] noise = MatteScenes.noise(7 * 5, 3);
        assertArrayEquals(noise, new ImageMatte(7, 5, noise, 0).values(new Picture(7, 5)));
        assertArrayEquals(new float[] {0.5f, 1f / 3}, new ImageMatte(3, 1, new float[] {0.25f, 1, 0}, 0).values(new Picture(2, 1)), 1e-7f);
        assertArrayEquals(new float[] {0, 0.25f, 0.75f, 1}, new ImageMatte(2, 1, new float[] {0, 1}, 0).values(new Picture(4, 1)), 1e-7f);
        assertArrayEquals(new float[] {0.5f, 1f / 3}, new ImageMatte(1, 3, new float[] {0.25f, 1, 0}, 0).values(new Picture(1, 2)), 1e-7f);
        assertArrayEquals(new float[] {0, 0.25f, 0.75f, 1}, new ImageMatte(1, 2, new float[] {0, 1}, 0).values(new Picture(1, 4)), 1e-7f);
    }

    /** Area means keep the mean: at 3 x 5 pixels that of 30 x 35 is the mean of all, by linearity. */
    @Test
    void fewerPixelsKeepTheMean() {
        float[] noise = MatteScenes.noise(30 * 35, 4);
        float[] few = new ImageMatte(30, 35, noise, 0).values(new Picture(7, 9));
        double whole = 0;
        for (float v : noise) {
            whole += v / noise.length;
        }
        double mean = 0;
        for (float v : few) {
            mean += v / few.length;
        }
        assertEquals(whole, mean, 1e-6);
    }

    /**
     * IEC 61966-2-1 decodes code 128 to 0.2158605; as a matte it counts 128/255 again. Alpha is itself, and colour over black is
     * premultiplied.
     */
    @Test
    void channelsByHand() {
        float[] rgba = {0, 0, 0, 1, 1, 1, 1, 1, 0.2158605f, 0.2158605f, 0.2158605f, 1, 0, 0, 0, 0.25f, 0.2158605f, 0.2158605f, 0.2158605f,
                0.3f};
        Picture picture = new Picture(5, 1, rgba);
        assertArrayEquals(new float[] {0, 1, 128f / 255, 0, 128f / 255}, ImageMatte.pixels(picture, ImageMatte.Channel.GREY), 1e-6f);
        assertArrayEquals(new float[] {1, 1, 1, 0.25f, 0.3f}, ImageMatte.pixels(picture, ImageMatte.Channel.ALPHA));
        assertEquals(1f, ImageMatte.pixels(picture, ImageMatte.Channel.GREY)[1]);
    }
}

package org.wispwright.warp.paintover;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Srgb;

/** The parts that a paint-over is read with, each against a result by hand. */
class PaintOverPartsTest {
    /**
     * Pooling by hand: 3, 1 become 2, 2; then 2, 2, 1 with weights 1, 1, 2 become (2 + 2 + 2) / 4 = 1.5. Optimality by its definition
     * (Barlow et al. 1972): no other monotone sequence of a fine lattice is nearer.
     */
    @Test
    void isotonicPoolsAdjacentViolators() {
        assertArrayEquals(new double[] {1.5, 1.5, 1.5, 4, 5}, Isotonic.fit(new double[] {3, 1, 1, 4, 5}, new double[] {1, 1, 2, 1, 1}),
                1e-15);
        double[] values = {0.4, 0.1, 0.6, 0.3};
        double[] weights = {1, 2, 1, 3};
        double[] fitted = Isotonic.fit(values, weights);
        assertTrue(fitted[0] <= fitted[1] && fitted[1] <= fitted[2] && fitted[2] <= fitted[3], Arrays.toString(fitted));
        double best = distance(fitted, values, weights);
        for (int n = 0; n < 21 * 21 * 21 * 21; n++) {
            double[] other = {n % 21 / 20.0, n / 21 % 21 / 20.0, n / 441 % 21 / 20.0, n / 9261 / 20.0};
            if (other[0] <= other[1] && other[1] <= other[2] && other[2] <= other[3]) {
                assertTrue(distance(other, values, weights) >= best - 1e-12);
            }
        }
    }

    /** 1.6 times the extinction: G is {@code 1 - (1 - a)^1.6} up to scale (Beer-Lambert law), and the way back undoes it. */
    @Test
    void theCurveFindsAnotherExtinction() {
        Random random = new Random(3);
        float[] a = new float[5000];
        double[] seen = new double[a.length];
        for (int p = 0; p < a.length; p++) {
            a[p] = 0.9f * random.nextFloat();
            seen[p] = 0.3 * (1 - Math.pow(1 - a[p], 1.6)) + (p % 10 == 0 ? 0.2 * random.nextDouble() : 0);
        }
        OpacityCurve curve = OpacityCurve.fit(a, seen, 0.002);
        double scale = curve.reach(0.85) / (1 - Math.pow(0.15, 1.6));
        for (double at = 0.05; at < 0.9; at += 0.05) {
            assertEquals(scale * (1 - Math.pow(1 - at, 1.6)), curve.reach(at), 0.01);
            assertEquals(at, curve.opacity(curve.reach(at)), 1e-9);
        }
        assertEquals(0, curve.reach(0));
        assertEquals(1, curve.opacity(1e9));
    }

    /** A smooth picture shifted by (2.5, -1.25) pixels: the flow is that shift wherever there is something to see. */
    @Test
    void flowFindsAKnownShift() {
        int width = 60;
        int height = 48;
        float[] before = new float[width * height];
        float[] after = new float[before.length];
        for (int p = 0; p < before.length; p++) {
            before[p] = (float) bumps(p % width, p / width);
            after[p] = (float) bumps(p % width + 2.5, p / width - 1.25);
        }
        float[] u = OpticalFlow.between(before, after, width, height);
        double worst = 0;
        for (int y = 8; y < height - 8; y++) {
            for (int x = 8; x < width - 8; x++) {
                int p = 2 * (x + width * y);
                worst = Math.max(worst, Math.hypot(u[p] - 2.5, u[p + 1] + 1.25));
            }
        }
        assertTrue(worst < 0.35, "off by " + worst + " pixels");
        for (float none : OpticalFlow.between(before, before, width, height)) {
            assertEquals(0, none, 1e-6);
        }
    }

    /** Eight neighbours join, so a diagonal is one patch; numbers go by first pixel. Rosenfeld and Pfaltz 1966. */
    @Test
    void patchesJoinOverCorners() {
        boolean[] in = {true, false, false, true, false, true, false, false, false, false, false, true};
        Patches patches = Patches.of(in, 4, 3);
        assertEquals(3, patches.count());
        assertEquals(2, patches.at(11));
        assertEquals(patches.at(0), patches.at(5));
        assertEquals(1, patches.at(3));
        assertEquals(-1, patches.at(1));
        boolean[] corner = {true, false, false, true};
        assertEquals(1, Patches.of(corner, 2, 2).count());
    }

    /** Normal noise of 2 codes is measured to a tenth (Donoho and Johnstone 1994), although a third of the frame was painted. */
    @Test
    void noiseIsMeasuredBesideALargeChange() {
        Picture before = grey(128, 96, 0.4);
        Picture after = before.copy();
        Random random = new Random(5);
        for (int p = 0; p < 128 * 96; p++) {
            for (int c = 0; c < 3; c++) {
                double code = Srgb.encode(before.rgba()[4 * p + c]) + 2 * random.nextGaussian() / 255 + (p % 128 < 43 ? 0.2 : 0);
                after.rgba()[4 * p + c] = (float) Srgb.decode(code);
            }
        }
        ChangedPixels changed = ChangedPixels.between(before, after);
        assertEquals(2, changed.noise() * 255, 0.2);
        assertTrue(changed.any());
        int wrong = 0;
        for (int p = 0; p < 128 * 96; p++) {
            int x = p % 128;
            wrong += x < 41 && changed.mask()[p] < 1 || x > 47 && changed.mask()[p] > 0 ? 1 : 0;
        }
        assertEquals(0, wrong);
    }

    /** A patch of 31 pixels is a speck and one of 36 is not; a faint patch counts only with a strong pixel in it. Hand-derived. */
    @Test
    void specksAndFaintPatchesAreDropped() {
        Picture before = grey(64, 64, 0.4);
        assertFalse(ChangedPixels.between(before, dab(before, 1, 0.03)).any());
        assertTrue(ChangedPixels.between(before, dab(before, 6, 0.03)).any());
        assertFalse(ChangedPixels.between(before, dab(before, 20, 1.5 / 255)).any());
        assertTrue(ChangedPixels.between(before, dab(before, 20, 2.5 / 255)).any());
    }

    /** A constant stays what it is, and far from all numbers the mean takes over. Knutsson and Westin 1993. */
    @Test
    void nearbyMeanIsTheMeanOfWhatIsNear() {
        float[] weights = new float[40 * 40];
        float[] weighted = new float[weights.length];
        for (int p = 0; p < weights.length; p++) {
            weights[p] = p % 40 < 5 || p % 40 >= 35 ? 1 : 0;
            weighted[p] = weights[p] * (p % 40 < 5 ? 2 : 6);
        }
        float[] mean = NearbyMean.of(weighted, weights, 1, 40, 40, 0.05);
        assertEquals(2, mean[40 * 20 + 2], 0.01);
        assertEquals(6, mean[40 * 20 + 37], 0.01);
        assertEquals(4, (mean[40 * 20 + 19] + mean[40 * 20 + 20]) / 2, 0.01);
    }

    private static Picture dab(Picture before, int side, double codes) {
        Picture after = before.copy();
        for (int y = 30; y < 30 + side; y++) {
            for (int x = 20; x < 20 + side; x++) {
                for (int c = 0; c < 3; c++) {
                    int n = 4 * (x + 64 * y) + c;
                    after.rgba()[n] = (float) Srgb.decode(Srgb.encode(before.rgba()[n]) + codes);
                }
            }
        }
        return after;
    }

    private static Picture grey(int width, int height, double code) {
        Picture picture = new Picture(width, height);
        Arrays.fill(picture.rgba(), (float) Srgb.decode(code));
        for (int n = 3; n < picture.rgba().length; n += 4) {
            picture.rgba()[n] = 1;
        }
        return picture;
    }

    private static double bumps(double x, double y) {
        return 0.5 + 0.2 * Math.sin(0.35 * x) * Math.cos(0.3 * y) + 0.2 * Math.sin(0.21 * x + 0.37 * y);
    }

    private static double distance(double[] a, double[] b, double[] weights) {
        double sum = 0;
        for (int n = 0; n < a.length; n++) {
            sum += weights[n] * (a[n] - b[n]) * (a[n] - b[n]);
        }
        return sum;
    }
}

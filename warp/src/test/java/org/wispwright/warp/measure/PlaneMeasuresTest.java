package org.wispwright.warp.measure;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.wispwright.warp.measure.CheckPlanes.BLOB;
import static org.wispwright.warp.measure.CheckPlanes.BLOB3;
import static org.wispwright.warp.measure.CheckPlanes.CHECK;
import static org.wispwright.warp.measure.CheckPlanes.DISC;
import static org.wispwright.warp.measure.CheckPlanes.DISC3;
import static org.wispwright.warp.measure.CheckPlanes.HASH;
import static org.wispwright.warp.measure.CheckPlanes.RAMP;
import static org.wispwright.warp.measure.CheckPlanes.WAVE;
import static org.wispwright.warp.measure.CheckPlanes.constant;
import static org.wispwright.warp.measure.CheckPlanes.map;
import static org.wispwright.warp.measure.CheckPlanes.sum;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.loss.PictureMeasure;

/** Outside checks 4.2: SSIM, MSE and PSNR of given planes, to 1e-9 relative (D, agrees with a published library). */
class PlaneMeasuresTest {
    /** U20: two constants; SSIM = (2 * .3 + 1e-4) / (.61 + 1e-4). */
    @Test
    void u20_constants() {
        row(constant(.5), constant(.6), (2 * .3 + 1e-4) / (.61 + 1e-4), .01, 20);
        row(constant(.5), constant(.6), 0.983609244386, .01, 20);
    }

    /** U21: equal planes. */
    @Test
    void u21_equal() {
        row(RAMP, RAMP, 1, 0, Double.POSITIVE_INFINITY);
    }

    /** U22: a ramp and the same, brighter. */
    @Test
    void u22_brighter() {
        row(RAMP, map(RAMP, v -> v + .1), 0.960479259092, .01, 20);
    }

    /** U23: half the contrast. */
    @Test
    void u23_halfContrast() {
        row(RAMP, map(RAMP, v -> .5 * v), 0.729849990875, 0.0839947089947, 10.7574807021);
    }

    /** U24: reversed ramp, a negative SSIM. */
    @Test
    void u24_reversed() {
        row(RAMP, map(RAMP, v -> 1 - v), -0.074193982878, 0.343915343915, 4.6354844753);
    }

    /** U25: reversed check. */
    @Test
    void u25_reversedCheck() {
        row(CHECK, map(CHECK, v -> 1 - v), -0.579448234935, 1, 0);
    }

    /** U26: a check against its mean. */
    @Test
    void u26_checkAndItsMean() {
        row(CHECK, constant(.5), 0.005600310039, .25, 6.0205999133);
    }

    /** U27: a blob moved by 3 pixels. */
    @Test
    void u27_movedBlob() {
        row(BLOB, BLOB3, 0.891139383189, 0.00341220784818, 24.6696452247);
    }

    /** U28: a blob at 0.8 of its height. */
    @Test
    void u28_fainterBlob() {
        row(BLOB, map(BLOB, v -> .8 * v), 0.964479195456, 0.00306792525496, 25.1315522548);
    }

    /** U29: a wave on the blob; its PSNR is higher than U27's and its SSIM lower. */
    @Test
    void u29_waveOnABlob() {
        row(BLOB, sum(BLOB, WAVE, 1), 0.789035962099, 0.000625, 32.0411998266);
        assertTrue(StructuralSimilarity.of(BLOB, sum(BLOB, WAVE, 1), 1) < StructuralSimilarity.of(BLOB, BLOB3, 1));
        assertTrue(PlaneDifference.meanSquare(BLOB, sum(BLOB, WAVE, 1)) < PlaneDifference.meanSquare(BLOB, BLOB3));
    }

    /** U30: noise on the blob. */
    @Test
    void u30_noiseOnABlob() {
        row(BLOB, sum(BLOB, HASH, .1), 0.743398019041, 0.000877619319492, 30.5669382498);
    }

    /** U31: a disc moved by 3 pixels. */
    @Test
    void u31_movedDisc() {
        row(DISC, DISC3, 0.603919181121, 0.05859375, 12.3214870626);
    }

    /** U32: a blob against nothing. */
    @Test
    void u32_nothing() {
        row(BLOB, constant(0), 0.106828870057, 0.0766981313741, 11.1521521680);
    }

    /** U33: U27 as codes of 8 bits, range 255. */
    @Test
    void u33_codes() {
        Plane a = map(BLOB, v -> Math.rint(255 * v));
        Plane b = map(BLOB3, v -> Math.rint(255 * v));
        assertEquals(0.8895288785090588, StructuralSimilarity.of(a, b, 255), 1e-9);
        assertEquals(24.668630482119454, PlaneDifference.peakSignalToNoise(PlaneDifference.meanSquare(a, b), 255), 1e-9);
    }

    /** U34: a flat 7 x 7 window with sample covariance is a different measure: the plain twin gives its digits, ours does not. */
    @Test
    void u34_aDifferentWindowIsADifferentMeasure() {
        double[] flat = new double[4];
        Arrays.fill(flat, 1.0 / 7);
        assertEquals(0.8900097683969048, plain(BLOB, BLOB3, flat, 49.0 / 48), 1e-9);
        assertTrue(Math.abs(StructuralSimilarity.of(BLOB, BLOB3, 1) - 0.8900097683969048) > 1e-3);
    }

    /** U35: one code of 255 everywhere. */
    @Test
    void u35_oneCode() {
        double square = PlaneDifference.meanSquare(constant(17), constant(18));
        assertEquals(48.1308036086791, PlaneDifference.peakSignalToNoise(square, 255), 1e-9);
    }

    /** The 1-D weights stated with the outside checks (Wang et al. 2004: sigma 1.5, 11 taps, sum 1). */
    @Test
    void windowHasTheStatedWeights() {
        assertArrayEquals(new double[] {0.2660117248617944, 0.2130055377112537, 0.1093606895097, 0.03600077212843081,
            0.007598758135239186, 0.00102838008447911}, StructuralSimilarity.window(), 1e-13);
    }

    /** Separable and row by row against the definition, window by window, at awkward sizes; weights pick single windows. */
    @ParameterizedTest
    @CsvSource({"11,11", "11,17", "23,12"})
    void similarityEqualsPlain(int width, int height) {
        double[] a = new double[width * height];
        double[] b = new double[width * height];
        for (int p = 0; p < a.length; p++) {
            a[p] = Math.sin(1 + 7 * p);
            b[p] = a[p] + .3 * Math.cos(3 + 5 * p);
        }
        Plane planeA = new Plane(width, height, a);
        Plane planeB = new Plane(width, height, b);
        assertEquals(plain(planeA, planeB, StructuralSimilarity.window(), 1), StructuralSimilarity.of(planeA, planeB, 1), 1e-12);
        float[] none = new float[a.length];
        assertEquals(1, StructuralSimilarity.of(planeA, planeB, 1, none));
    }

    /** By hand: a region counts alone, whatever lies outside it. */
    @Test
    void regionsByHand() {
        Plane a = new Plane(3, 1, new double[] {0, 1, 5});
        Plane b = new Plane(3, 1, new double[] {.5, 1.25, 9});
        float[] weights = {1, 3, 0};
        assertEquals((.25 + 3 * .0625) / 4, PlaneDifference.meanSquare(a, b, weights), 1e-15);
        assertEquals((.5 + 3 * .25) / 4, PlaneDifference.meanAbsolute(a, b, weights), 1e-15);
        assertEquals((.5 + .25 + 4) / 3, PlaneDifference.meanAbsolute(a, b), 1e-15);
        assertEquals(0, PlaneDifference.meanSquare(a, b, new float[3]));
        Plane half = CheckPlanes.plane((x, y) -> x < 32 ? BLOB.at((int) x, (int) y) : 0);
        float[] left = new float[64 * 64];
        for (int p = 0; p < left.length; p++) {
            left[p] = p % 64 < 27 ? 1 : 0;
        }
        assertEquals(1, StructuralSimilarity.of(BLOB, half, 1, left), 1e-12);
    }

    /** Alpha and luminance of a picture; luminance by Rec. 709's weights. */
    @Test
    void planesOfAPicture() {
        Picture picture = new Picture(2, 1, new float[] {.5f, .25f, .125f, .75f, 1, 1, 1, 1});
        assertArrayEquals(new double[] {.75, 1}, Plane.alpha(picture).values());
        assertArrayEquals(new double[] {.2126 * .5 + .7152 * .25 + .0722 * .125, 1}, Plane.luminance(picture).values(), 1e-15);
        assertArrayEquals(new double[] {.5f, 2}, Plane.of(2, 1, new float[] {.5f, 2}).values());
    }

    /** All figures of one frame agree with the single measures, distances in heights. */
    @Test
    void likenessGathersTheMeasures() {
        Picture a = picture(DISC);
        Picture b = picture(DISC3);
        float[] ones = new float[64 * 64];
        Arrays.fill(ones, 1f);
        Likeness likeness = Likeness.of(a, b, ones, .5);
        assertEquals(0.603919181121, likeness.structure(), 1e-9);
        assertEquals(0.05859375, likeness.meanSquare(), 1e-12);
        assertEquals(12.3214870626, likeness.peakSignalToNoise(), 1e-9);
        assertEquals(PictureMeasure.meanAbsoluteDifference(a, b, ones), likeness.meanAbsolute());
        assertEquals(1144.0 / 1384, likeness.overlap(), 1e-15);
        assertEquals(3.0 / 64, likeness.farthest(), 1e-15);
        assertTrue(likeness.nearest() > 0 && likeness.nearest() < likeness.farthest());
        // U45: a shift by c moves everything by c.
        assertEquals(3.0 / 64, likeness.across(), 1e-12);
        assertEquals(0, likeness.down(), 1e-12);
        float[] middle = new float[64 * 64];
        Arrays.fill(middle, 32 * 64 + 20, 32 * 64 + 44, 1f);
        Likeness inside = Likeness.of(a, b, middle, .5);
        assertEquals(1, inside.overlap());
        assertEquals(0, inside.farthest());
        assertEquals(Double.POSITIVE_INFINITY, inside.peakSignalToNoise());
        assertThrows(IllegalArgumentException.class, () -> Likeness.of(a, b, ones, 0));
    }

    /**
     * Ours: nothing against nothing has nowhere to move, nothing against something no way; a picture too small for the window has no
     * structure.
     */
    @Test
    void likenessOfNothing() {
        Picture none = new Picture(10, 20);
        Picture one = new Picture(10, 20);
        one.rgba()[4 * 25 + 3] = 1;
        float[] ones = new float[200];
        Arrays.fill(ones, 1f);
        Likeness nothing = Likeness.of(none, none, ones, .5);
        assertEquals(0, nothing.across() + nothing.down());
        assertTrue(Double.isNaN(nothing.structure()));
        Likeness lost = Likeness.of(none, one, ones, .5);
        assertEquals(Double.POSITIVE_INFINITY, lost.across());
        assertEquals(Double.POSITIVE_INFINITY, lost.down());
        assertEquals(0, lost.overlap());
    }

    @Test
    void refusesWhatDoesNotFit() {
        Plane small = new Plane(10, 12, new double[120]);
        Plane other = new Plane(12, 10, new double[120]);
        assertThrows(IllegalArgumentException.class, () -> PlaneDifference.meanSquare(small, other));
        assertThrows(IllegalArgumentException.class, () -> StructuralSimilarity.of(small, small, 1));
        assertThrows(IllegalArgumentException.class, () -> StructuralSimilarity.of(BLOB, BLOB, Double.NaN));
        assertThrows(IllegalArgumentException.class, () -> PlaneDifference.peakSignalToNoise(Double.NaN, 1));
        assertThrows(IllegalArgumentException.class, () -> new Plane(10, 12, new double[119]));
        float[] weights = new float[120];
        weights[13] = -1;
        String message = assertThrows(IllegalArgumentException.class, () -> PlaneDifference.meanAbsolute(small, small, weights))
                .getMessage();
        assertTrue(message.contains("(3, 1)"), message);
        double[] bad = new double[120];
        bad[25] = Double.NaN;
        message = assertThrows(IllegalArgumentException.class, () -> new Plane(10, 12, bad)).getMessage();
        assertTrue(message.contains("(5, 2)"), message);
    }

    private static void row(Plane a, Plane b, double similarity, double square, double decibels) {
        assertEquals(similarity, StructuralSimilarity.of(a, b, 1), 1e-9);
        double got = PlaneDifference.meanSquare(a, b);
        assertEquals(square, got, 1e-9 * Math.max(square, 1e-3));
        assertEquals(decibels, PlaneDifference.peakSignalToNoise(got, 1), 1e-9);
    }

    private static Picture picture(Plane alpha) {
        Picture picture = new Picture(alpha.width(), alpha.height());
        for (int p = 0; p < alpha.values().length; p++) {
            picture.rgba()[4 * p + 3] = (float) alpha.values()[p];
        }
        return picture;
    }

    /** The definition: window weights from the middle outwards, covariance times a factor, range 1. */
    private static double plain(Plane a, Plane b, double[] window, double factor) {
        int reach = window.length - 1;
        double sum = 0;
        int count = 0;
        for (int y = reach; y < a.height() - reach; y++) {
            for (int x = reach; x < a.width() - reach; x++) {
                double[] m = new double[2];
                double[] v = new double[3];
                for (int pass = 0; pass < 2; pass++) {
                    for (int dy = -reach; dy <= reach; dy++) {
                        for (int dx = -reach; dx <= reach; dx++) {
                            double w = window[Math.abs(dx)] * window[Math.abs(dy)];
                            double va = a.at(x + dx, y + dy);
                            double vb = b.at(x + dx, y + dy);
                            if (pass == 0) {
                                m[0] += w * va;
                                m[1] += w * vb;
                            } else {
                                v[0] += w * factor * (va - m[0]) * (va - m[0]);
                                v[1] += w * factor * (vb - m[1]) * (vb - m[1]);
                                v[2] += w * factor * (va - m[0]) * (vb - m[1]);
                            }
                        }
                    }
                }
                sum += (2 * m[0] * m[1] + 1e-4) * (2 * v[2] + 9e-4)
                        / ((m[0] * m[0] + m[1] * m[1] + 1e-4) * (v[0] + v[1] + 9e-4));
                count++;
            }
        }
        return sum / count;
    }
}

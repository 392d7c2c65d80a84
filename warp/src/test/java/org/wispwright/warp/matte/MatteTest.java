package org.wispwright.warp.matte;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assertions.fail;

import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.BrushedMatte.Dab;

/** What every matte owes: the same values in any window and at any raster, and a reach that covers them; and the formulas by hand. */
class MatteTest {
    /** Whose reach is looked at too where rasters are compared: one of each way to find it. */
    private static final Set<String> REACHES = Set.of("polygon", "density, feathered", "brushed", "image, feathered", "subtract");

    /** Ours: a window is a window onto one matte, so its numbers are those of the whole, bit for bit. */
    @Test
    void aWindowShowsTheSameBits() {
        Picture smoke = MatteScenes.smoke(53);
        for (Map.Entry<String, Matte> entry : MatteScenes.all().entrySet()) {
            float[] whole = entry.getValue().values(smoke);
            float[] reach = entry.getValue().reach(smoke, Window.all(smoke.width(), smoke.height()), 0.1);
            for (Window window : MatteScenes.windows(smoke.width(), smoke.height())) {
                String where = entry.getKey() + " in " + window;
                assertArrayEquals(piece(whole, smoke.width(), window), entry.getValue().values(smoke, window), where);
                assertArrayEquals(piece(reach, smoke.width(), window), entry.getValue().reach(smoke, window, 0.1), "reach of " + where);
            }
        }
    }

    /**
     * Ours: mean absolute difference of the values at 256, 512 and 2048 rows, brought to 256 rows by means of 2 x 2, at most 0.003;
     * of the reach 0.005, because its border is known to half a pixel, here 0.002 heights.
     */
    @Test
    void rastersAgree() {
        Picture[] smoke = {MatteScenes.smoke(256), MatteScenes.smoke(512), MatteScenes.smoke(2048)};
        for (Map.Entry<String, Matte> entry : MatteScenes.all().entrySet()) {
            float[][] values = new float[3][];
            float[][] reach = new float[3][];
            for (int n = 0; n < 3; n++) {
                int height = smoke[n].height();
                values[n] = down(entry.getValue().values(smoke[n]), height);
                reach[n] = REACHES.contains(entry.getKey())
                        ? down(entry.getValue().reach(smoke[n], Window.all(smoke[n].width(), height), 0.05), height) : values[n];
            }
            double mean = meanAbsolute(values[0], new float[values[0].length]);
            assertTrue(mean > 0.02 && mean < 0.98, entry.getKey() + " is " + mean + " on average, so this test could not fail");
            for (int n = 0; n < 2; n++) {
                double apart = meanAbsolute(values[n], values[2]);
                double reachApart = meanAbsolute(reach[n], reach[2]);
                assertTrue(apart <= 0.003, entry.getKey() + " at " + smoke[n].height() + " rows is " + apart + " from that at 2048");
                assertTrue(reachApart <= 0.005, "reach of " + entry.getKey() + " at " + smoke[n].height() + " rows: " + reachApart);
            }
        }
    }

    /** The contract of {@link Matte#reach}: 1 where the value is above 1/512, in 0..1, less the farther away. */
    @Test
    void reachCoversTheValues() {
        Picture smoke = MatteScenes.smoke(61);
        for (Map.Entry<String, Matte> entry : MatteScenes.all().entrySet()) {
            float[] values = entry.getValue().values(smoke);
            float[] narrow = entry.getValue().reach(smoke, Window.all(smoke.width(), smoke.height()), 0);
            float[] wide = entry.getValue().reach(smoke, Window.all(smoke.width(), smoke.height()), 0.2);
            for (int p = 0; p < values.length; p++) {
                // A region's soft rim is drawn at least a pixel wide, which may lie half a pixel beyond its outline.
                float least = values[p] > (entry.getValue() instanceof Region ? 0.5f : 1f / 512) ? 1f : 0f;
                boolean inRange = values[p] >= 0 && values[p] <= 1 && narrow[p] >= 0 && wide[p] <= 1;
                if (!inRange || narrow[p] < least || wide[p] < narrow[p]) {
                    fail(entry.getKey() + " at pixel " + p + ": value " + values[p] + ", reach " + narrow[p] + ", " + wide[p]);
                }
            }
        }
    }

    /**
     * By hand: pixels 0..3 of a row of 10 x 10 are in, so the border lies at x = 4 pixels; a feather of 0.4 heights is 4 pixels. Pixel 4 is
     * 1/2 beyond: {@code s = 1 - 1/8}, {@code s^2 (3 - 2 s) = 0.95703125}; pixel 5: s = 5/8: 0.68359375; 7: s = 1/8; 8: 0.
     */
    @Test
    void reachByHand() {
        float[] pixels = new float[100];
        for (int p = 0; p < 100; p++) {
            pixels[p] = p % 10 < 4 ? 0.2f : 0;
        }
        float[] reach = new ImageMatte(10, 10, pixels, 0).reach(new Picture(10, 10), new Window(0, 6, 10, 1), 0.4);
        assertArrayEquals(new float[] {1, 1, 1, 1, 0.95703125f, 0.68359375f, 0.31640625f, 0.04296875f, 0, 0}, reach, 1e-7f);
    }

    /** By hand: with soft 0.2 the ramp about 0.2 runs from 0.1 to 0.3; 3/4 along it s^2 (3 - 2 s) = 27/32; both limits meet by product. */
    @Test
    void densityRangeByHand() {
        Picture row = MatteScenes.row(0, 0.1, 0.15, 0.2, 0.25, 0.3, 0.5, 0.8, 0.9, 1);
        assertArrayEquals(new float[] {0, 0, 0.15625f, 0.5f, 0.84375f, 1, 1, 0.5f, 0, 0},
                new DensityRange(0.2, 0.8, 0.2, 0).values(row), 1e-6f);
        assertArrayEquals(new float[] {1, 1, 1, 1, 1, 1, 1, 0.5f, 0, 0}, new DensityRange(0, 0.8, 0.2, 0).values(row), 1e-6f);
        assertArrayEquals(new float[] {0, 0, 0.15625f, 0.5f, 0.84375f, 1, 1, 1, 1, 1}, new DensityRange(0.2, 1, 0.2, 0).values(row), 1e-6f);
        assertArrayEquals(new float[] {0.84375f * 0.84375f}, new DensityRange(0.5, 0.6, 0.2, 0).values(MatteScenes.row(0.55)), 1e-6f);
    }

    /** By hand on one pixel under hard dabs: 0.5, then max(0.5, 0.8), then 0.8 (1 - 0.25), then max(0.6, 0.3). */
    @Test
    void brushedByHand() {
        List<Dab> dabs = List.of(dab(BrushedMatte.Way.ADD, 0.5), dab(BrushedMatte.Way.ADD, 0.8), dab(BrushedMatte.Way.TAKE, 0.25),
                dab(BrushedMatte.Way.ADD, 0.3));
        double[] expected = {0.5, 0.8, 0.6, 0.6};
        for (int n = 1; n <= dabs.size(); n++) {
            float[] values = new BrushedMatte(dabs.subList(0, n)).values(new Picture(20, 20));
            assertEquals(expected[n - 1], values[10 + 20 * 10], 1e-7, n + " dabs");
            assertEquals(0f, values[0]);
        }
    }

    private static Dab dab(BrushedMatte.Way way, double strength) {
        return new Dab(way, new Sweep(0.2, strength, 0, List.of(new Point(0.525, 0.525))));
    }

    /** The stated formulas on soft values: max, min, a (1 - b) (1 - c), 1 - a. */
    @Test
    void combinedByHand() {
        Matte a = flat(0.6f);
        Matte b = flat(0.25f);
        Matte c = flat(0.5f);
        assertEquals(0.6f, combined(CombinedMatte.Way.UNION, b, a, c));
        assertEquals(0.25f, combined(CombinedMatte.Way.INTERSECT, a, b, c));
        assertEquals(0.6f * 0.75f * 0.5f, combined(CombinedMatte.Way.SUBTRACT, a, b, c));
        assertEquals(0.75f, combined(CombinedMatte.Way.INVERSE, b));
        assertEquals(0.6f, combined(CombinedMatte.Way.UNION, a, a), "joined with itself");
    }

    private static Matte flat(float value) {
        return new ImageMatte(1, 1, new float[] {value}, 0);
    }

    private static float combined(CombinedMatte.Way way, Matte... parts) {
        return new CombinedMatte(way, List.of(parts)).values(new Picture(3, 2))[4];
    }

    @Test
    void combinedNestsToEightAndNoDeeper() {
        Matte matte = flat(0.25f);
        for (int n = 0; n < CombinedMatte.DEEPEST; n++) {
            matte = new CombinedMatte(CombinedMatte.Way.INVERSE, List.of(matte));
        }
        assertEquals(0.25f, matte.values(new Picture(1, 1))[0]);
        Matte deepest = matte;
        assertRefused("9 deep", () -> new CombinedMatte(CombinedMatte.Way.INVERSE, List.of(deepest)));
    }

    @Test
    void whatIsOutOfRangeIsRefused() {
        Matte any = flat(1);
        assertRefused("from below to", () -> new DensityRange(0.5, 0.5, 0.1, 0));
        assertRefused("from NaN", () -> new DensityRange(Double.NaN, 0.5, 0.1, 0));
        assertRefused("soft 0.0", () -> new DensityRange(0.1, 0.5, 0, 0));
        assertRefused("feather -1.0", () -> new DensityRange(0.1, 0.5, 0.1, -1));
        assertRefused("0 sweeps", () -> new BrushedMatte(List.of()));
        assertRefused("takes away", () -> new BrushedMatte(List.of(dab(BrushedMatte.Way.TAKE, 1))));
        assertRefused("1 mattes", () -> new CombinedMatte(CombinedMatte.Way.UNION, List.of(any)));
        assertRefused("2 mattes", () -> new CombinedMatte(CombinedMatte.Way.INVERSE, List.of(any, any)));
        assertRefused("101 mattes", () -> new CombinedMatte(CombinedMatte.Way.UNION, Collections.nCopies(101, any)));
        assertRefused("3 numbers", () -> new ImageMatte(2, 2, new float[3], 0));
        assertRefused("pixel (1, 0) is NaN", () -> new ImageMatte(2, 1, new float[] {0, Float.NaN}, 0));
        assertRefused("pixel (0, 0) is 1.5", () -> new ImageMatte(1, 1, new float[] {1.5f}, 0));
    }

    /** Slow twin: the outline row by row and near its edges alone, against every pixel's distance to every edge. */
    @ParameterizedTest
    @CsvSource({"1, 0", "7, 0.2", "31, 0", "53, 0.1", "64, 0.4"})
    void aPolygonIsWhatItsFormulaSays(int height, double feather) {
        Picture picture = new Picture(Math.max(1, height * 3 / 4), height);
        Region.Polygon star = new Region.Polygon(List.of(new Point(-0.2, 0.3), new Point(0.65, 0.35), new Point(0.2, 1.4),
                new Point(0.4, 0.1), new Point(0.5, 0.85), new Point(0.5, 0.85), new Point(0.25, 0.5)), feather);
        float[] values = star.values(picture);
        float[] reach = star.reach(picture, Window.all(picture.width(), height), 0.1);
        double fade = Math.max(0.1, 1.0 / height);
        for (int p = 0; p < values.length; p++) {
            double x = (p % picture.width() + 0.5) / height;
            double y = (p / picture.width() + 0.5) / height;
            assertEquals((float) star.mask(x, y, 1.0 / height), values[p], "pixel " + p);
            assertEquals(Sweep.smooth(1 + (feather / 2 - star.signedDistance(x, y)) / fade), reach[p], 1e-6, "reach of pixel " + p);
        }
    }

    /** Slow twin for the ellipse's short cuts, flat and round, with its soft edge wider than itself. */
    @ParameterizedTest
    @CsvSource({"1, 0.3, 0.2, 0", "37, 0.3, 0.1, 0.05", "64, 0.05, 0.4, 0.3", "53, 0.2, 0.2, 1"})
    void anEllipseIsWhatItsFormulaSays(int height, double across, double down, double feather) {
        Picture picture = new Picture(Math.max(1, height * 3 / 4), height);
        Region.Ellipse ellipse = new Region.Ellipse(new Point(0.4, 0.45), across, down, feather);
        float[] values = ellipse.values(picture);
        float[] reach = ellipse.reach(picture, Window.all(picture.width(), height), 0.1);
        double fade = Math.max(0.1, 1.0 / height);
        for (int p = 0; p < values.length; p++) {
            double x = (p % picture.width() + 0.5) / height;
            double y = (p / picture.width() + 0.5) / height;
            assertEquals((float) ellipse.mask(x, y, 1.0 / height), values[p], "pixel " + p);
            assertEquals(Sweep.smooth(1 + (feather / 2 - ellipse.signedDistance(x, y)) / fade), reach[p], 1e-6, "reach of pixel " + p);
        }
    }

    private static void assertRefused(String phrase, Runnable birth) {
        String message = assertThrows(IllegalArgumentException.class, birth::run).getMessage();
        assertTrue(message.contains(phrase), message);
    }

    private static float[] piece(float[] whole, int width, Window window) {
        float[] piece = new float[window.pixels()];
        for (int n = 0; n < piece.length; n++) {
            piece[n] = whole[window.left() + n % window.width() + width * (window.top() + n / window.width())];
        }
        return piece;
    }

    private static float[] down(float[] values, int height) {
        float[] now = values;
        for (int rows = height; rows > 256; rows /= 2) {
            int width = rows * 3 / 4;
            float[] half = new float[now.length / 4];
            for (int p = 0; p < half.length; p++) {
                int at = 2 * (p % (width / 2)) + 2 * width * (p / (width / 2));
                half[p] = (now[at] + now[at + 1] + now[at + width] + now[at + width + 1]) / 4;
            }
            now = half;
        }
        return now;
    }

    private static double meanAbsolute(float[] a, float[] b) {
        double sum = 0;
        for (int p = 0; p < a.length; p++) {
            sum += Math.abs(a[p] - b[p]);
        }
        return sum / a.length;
    }
}

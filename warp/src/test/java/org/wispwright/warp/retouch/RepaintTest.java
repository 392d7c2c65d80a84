package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.picture.Picture;

/** A paint-over as an operation: its formula by hand, what it keeps, what it refuses. */
class RepaintTest {
    private static final float FAINT = 1e-3f;

    /** A hole, a wisp beside the smoke, and the top pushed to the left, as soft shapes; three quarters as wide as high. */
    static Repaint painted(int rows) {
        int width = rows * 3 / 4;
        float[] layers = new float[4 * width * rows];
        for (int p = 0; p < width * rows; p++) {
            double x = (p % width + 0.5) / rows;
            double y = (p / width + 0.5) / rows;
            double hole = soft(Math.hypot(x - 0.36, y - 0.55), 0.06);
            double wisp = soft(Math.hypot(x - 0.6, y - 0.4), 0.05);
            double top = soft(Math.hypot(x - 0.36, y - 0.27), 0.16);
            layers[4 * p] = (float) (0.5 * wisp - 0.6 * hole);
            layers[4 * p + 1] = (float) (0.04 * top);
            layers[4 * p + 2] = (float) (-0.02 * top);
            layers[4 * p + 3] = (float) Math.min(1, hole + wisp + top);
        }
        return new Repaint(width, rows, layers);
    }

    private static double soft(double distance, double radius) {
        double s = Math.min(1, Math.max(0, (radius - distance) / (0.5 * radius)));
        return s * s * (3 - 2 * s);
    }

    private static Picture wanted(Repaint repaint, Picture picture) {
        return Retoucher.wanted(new Retouch(List.of(repaint)), picture);
    }

    /** Less opacity scales all four; more adds the pixel's own colour and, by k / (a + k), that of the smoke near. Hand-derived. */
    @Test
    void opacityChangesAndColourFollows() {
        Picture picture = new Picture(4, 1, new float[] {0.2f, 0.1f, 0.05f, 0.5f, 0.2f, 0.1f, 0.05f, 0.5f, 0.2f, 0.1f, 0.05f, 0.5f,
                0.2f, 0.1f, 0.05f, 0.5f});
        Picture got = wanted(new Repaint(4, 1, new float[] {-0.25f, 0, 0, 1, 0.25f, 0, 0, 1, 0, 0, 0, 0, -0.9f, 0, 0, 1}), picture);
        assertArrayEquals(new float[] {0.1f, 0.05f, 0.025f, 0.25f}, row(got, 0), 1e-6f);
        float near = 0.4f;
        assertEquals(0.2f + 0.25f * (0.2f + FAINT * near) / (0.5f + FAINT), got.rgba()[4], 1e-6f);
        assertEquals(0.75f, got.rgba()[7], 1e-6f);
        assertArrayEquals(row(picture, 2), row(got, 2));
        assertArrayEquals(new float[4], row(got, 3));
    }

    /** A displacement of whole pixels copies bits: pixel 1 shows what pixel 3 had. */
    @Test
    void smokeIsReadFromWhereItCame() {
        Picture picture = RetoucherTest.smoke(32);
        float[] layers = new float[4 * 24 * 32];
        int p = 12 + 24 * 10;
        layers[4 * p + 1] = 2f / 32;
        layers[4 * p + 2] = -1f / 32;
        Picture got = wanted(new Repaint(24, 32, layers), picture);
        assertArrayEquals(row(picture, 14 + 24 * 9), row(got, p), 1e-6f);
        assertArrayEquals(row(picture, p - 1), row(got, p - 1));
    }

    /** From the method's definition: a mean over pixels that are joined keeps the mean, so coarse and fine change the same mass. */
    @Test
    void aCoarserRasterTakesMeansAndNotSamples() {
        float[] layers = new float[4 * 64 * 64];
        for (int p = 0; p < 64 * 64; p++) {
            layers[4 * p] = (p % 2 == 0) == (p / 64 % 2 == 0) ? -0.4f : 0;
        }
        Picture picture = new Picture(32, 32);
        Arrays.fill(picture.rgba(), 0.8f);
        Picture got = wanted(new Repaint(64, 64, layers), picture);
        for (int p = 0; p < 32 * 32; p++) {
            assertEquals(0.6f, got.rgba()[4 * p + 3], 1e-6f);
        }
    }

    @Test
    void anEmptyOneKeepsTheBits() {
        Picture picture = RetoucherTest.smoke(64);
        Repaint nothing = new Repaint(3, 4, new float[4 * 12]);
        assertTrue(nothing.changesNothing() && !nothing.moves());
        assertArrayEquals(picture.rgba(), wanted(nothing, picture).rgba());
        Repaint painted = painted(48);
        assertFalse(painted.changesNothing());
        assertTrue(painted.moves());
    }

    /** Alpha stays in 0..1, colour at 0 or more, and what changes lies where it says it acts. */
    @Test
    void staysInRangeAndWhereItActs() {
        Picture picture = RetoucherTest.smoke(128);
        Repaint painted = painted(64);
        Picture got = wanted(painted, picture);
        float[] touched = Retoucher.touched(new Retouch(List.of(painted)), picture, 0.04);
        int changed = 0;
        for (int p = 0; p < touched.length; p++) {
            assertTrue(got.rgba()[4 * p + 3] >= 0 && got.rgba()[4 * p + 3] <= 1 && got.rgba()[4 * p] >= 0);
            if (Math.abs(got.rgba()[4 * p + 3] - picture.rgba()[4 * p + 3]) > 0.02) {
                changed++;
                assertTrue(touched[p] > 0.1, p % 96 + ", " + p / 96 + ": " + touched[p]);
            }
        }
        assertTrue(changed > 500);
        assertEquals(0, touched[96 * 120 + 5]);
    }

    @ParameterizedTest
    @CsvSource({"0, 1.01", "0, -1.01", "0, NaN", "1, 4.1", "2, -4.1", "2, Infinity", "3, -0.1", "3, 1.1"})
    void aNumberOutOfRangeIsRefused(int layer, float value) {
        float[] layers = new float[4 * 6];
        layers[4 * 4 + layer] = value;
        String said = assertThrows(IllegalArgumentException.class, () -> new Repaint(3, 2, layers)).getMessage();
        assertTrue(said.contains("of pixel (1, 1) is " + value), said);
    }

    @Test
    void aWrongCountOrSizeIsRefused() {
        assertTrue(assertThrows(IllegalArgumentException.class, () -> new Repaint(3, 2, new float[5])).getMessage().contains("need 24"));
        assertThrows(IllegalArgumentException.class, () -> new Repaint(0, 2, new float[0]));
        assertThrows(IllegalArgumentException.class, () -> new Repaint(1 << 16, 1 << 16, new float[0]));
    }

    private static float[] row(Picture picture, int p) {
        return Arrays.copyOfRange(picture.rgba(), 4 * p, 4 * p + 4);
    }
}

package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Segment;
import org.wispwright.warp.matte.Window;

/** Even out and lift: gain about the local mean by hand, colour that follows, range, and nothing beyond the reach. */
class LocalContrastTest {
    private static Picture wanted(Picture original, Brush brush, double radius, double strength, Point... line) {
        return Retoucher.wanted(new Retouch(List.of(new Stroke(brush, radius, strength, 0, List.of(line), Optional.empty()))), original);
    }

    /** Grating of opacity {@code middle + depth cos(2 pi x / period)} in one colour, 0.3, 0.6 and 0.9 un-premultiplied. */
    private static Picture grating(double middle, double depth, int period) {
        Picture picture = new Picture(200, 200);
        for (int p = 0; p < 200 * 200; p++) {
            double a = middle + depth * Math.cos(2 * Math.PI * (p % 200) / period);
            for (int c = 0; c < 4; c++) {
                picture.rgba()[4 * p + c] = (float) (c < 3 ? 0.3 * (c + 1) * a : a);
            }
        }
        return picture;
    }

    /**
     * By hand: a Gaussian of sigma takes a cosine of period L down by exp(-2 (pi sigma / L)^2) (its Fourier transform), so the mean of the
     * grating is its middle plus that share t of its depth, and its depth becomes {@code t + gain (1 - t)} of what it was, with gain
     * 1 - strength or 1 + strength. Sigma is 20 pixels, made on blocks of 8.
     */
    @ParameterizedTest
    @CsvSource({"EVEN,1,100", "EVEN,0.5,100", "EVEN,0.5,20", "LIFT,1,100", "LIFT,0.5,100", "LIFT,0.5,20", "LIFT,1,50"})
    void gainOnAGratingByHand(Brush brush, double strength, int period) {
        Picture original = grating(0.5, 0.2, period);
        Picture wanted = wanted(original, brush, 0.1, strength, new Point(0.5, 0.3), new Point(0.5, 0.7));
        double t = Math.exp(-2 * Math.pow(Math.PI * 20 / period, 2));
        double gain = brush == Brush.EVEN ? 1 - strength : 1 + strength;
        for (int x : new int[] {90, 95, 100, 107}) {
            double a = 0.5 + 0.2 * (t + gain * (1 - t)) * Math.cos(2 * Math.PI * x / period);
            assertEquals(a, wanted.at(x, 100, 3), 0.2 * 0.003 * 2);
            for (int c = 0; c < 3; c++) {
                assertEquals(0.3 * (c + 1) * wanted.at(x, 100, 3), wanted.at(x, 100, c), 1e-5, "colour follows");
            }
        }
    }

    /** EVEN against the whole picture blurred and mixed, pixel by pixel; LIFT is its mirror image about a. */
    @Test
    void evenAndLiftMirrorEachOther() {
        Picture original = RetoucherTest.smoke(64);
        Point[] line = {new Point(0.3, 0.3), new Point(0.4, 0.6)};
        Picture even = wanted(original, Brush.EVEN, 0.08, 0.4, line);
        Picture lift = wanted(original, Brush.LIFT, 0.08, 0.4, line);
        double[] mean = GaussianTest.plain(original, 3, 0.08 * 64);
        float[] coverage = new Stroke(Brush.EVEN, 0.08, 0.4, 0, List.of(line), Optional.empty()).sweep().coverage(Window.all(48, 64), 64);
        int changed = 0;
        for (int p = 0; p < 48 * 64; p++) {
            double a = original.rgba()[4 * p + 3];
            assertEquals(mean[p] + (1 - coverage[p]) * (a - mean[p]), even.rgba()[4 * p + 3], 0.4 * 0.0005);
            double mirrored = Math.min(1, Math.max(0, 2 * a - even.rgba()[4 * p + 3]));
            assertEquals(mirrored, lift.rgba()[4 * p + 3], 1e-6);
            changed += Math.abs(mirrored - a) > 0.01 ? 1 : 0;
        }
        assertTrue(changed > 50, "only " + changed + " pixels change");
    }

    /** Deep grating lifted: clamped at 0 and 1, and clear is clear in colour too. */
    @Test
    void liftIsClampedAndColourGoesWithIt() {
        Picture wanted = wanted(grating(0.5, 0.45, 40), Brush.LIFT, 0.2, 1, new Point(0.5, 0.5));
        for (int c = 0; c < 4; c++) {
            assertEquals(c < 3 ? 0.3 * (c + 1) : 1, wanted.at(80, 100, c), 1e-5);
            assertEquals(0f, wanted.at(100, 100, c));
        }
        assertEquals(1f, wanted.at(80, 100, 3));
    }

    /** A hole with no light at all is filled in the colour of the smoke around it; one with almost none is not set alight. */
    @Test
    void anEmptyHoleTakesTheColourNear() {
        Picture picture = grating(0.8, 0, 10);
        for (int y = 95; y < 105; y++) {
            for (int x = 95; x < 105; x++) {
                Arrays.fill(picture.rgba(), 4 * (x + 200 * y), 4 * (x + 200 * y) + 4, 0f);
            }
        }
        Arrays.fill(picture.rgba(), 4 * (101 + 200 * 101), 4 * (101 + 200 * 101) + 4, Float.MIN_VALUE);
        Picture wanted = wanted(picture, Brush.EVEN, 0.1, 1, new Point(0.5, 0.5));
        for (int at : new int[] {100, 101}) {
            assertTrue(wanted.at(at, at, 3) > 0.6, "filled to " + wanted.at(at, at, 3));
            for (int c = 0; c < 3; c++) {
                assertEquals(0.3 * (c + 1), wanted.at(at, at, c) / wanted.at(at, at, 3), 1e-3);
            }
        }
    }

    @ParameterizedTest
    @EnumSource(value = Brush.class, names = {"EVEN", "LIFT"})
    void beyondItsReachTheBitsStayAndEmptyStaysEmpty(Brush brush) {
        Picture original = grating(0.5, 0.3, 25);
        original.rgba()[4 * (81 + 200 * 61) + 3] = 1.25f;       // in a corner of the window, not under the stroke
        Picture wanted = wanted(original, brush, 0.1, 1, new Point(0.5, 0.5), new Point(0.8, 0.4));
        int changed = 0;
        for (int p = 0; p < 200 * 200; p++) {
            double d = Math.sqrt(Segment.squaredDistance((p % 200 + 0.5) / 200, (p / 200 + 0.5) / 200, 0.5, 0.5, 0.8, 0.4));
            for (int n = 4 * p; n < 4 * p + 4; n++) {
                if (d > 0.1 + 0.5 / 200) {
                    assertEquals(original.rgba()[n], wanted.rgba()[n]);
                }
                changed += original.rgba()[n] != wanted.rgba()[n] ? 1 : 0;
            }
        }
        assertTrue(changed > 10_000, "changes only " + changed + " values");
        for (float value : wanted(new Picture(60, 40), brush, 0.3, 1, new Point(0.5, 0.5)).rgba()) {
            assertEquals(0f, value);
        }
    }
}

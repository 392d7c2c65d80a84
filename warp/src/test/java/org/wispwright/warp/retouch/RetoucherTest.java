package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.loss.PictureMeasure;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Window;

/** The brushes' formulas by hand, what a retouch must keep, and the same retouch at three rasters. */
class RetoucherTest {
    private static final double ASPECT = 0.75;

    private static Stroke stroke(Brush brush, double radius, double strength, double softEdge, Point... line) {
        return new Stroke(brush, radius, strength, softEdge, List.of(line), Optional.empty());
    }

    private static Retouch retouch(Operation... operations) {
        return new Retouch(List.of(operations));
    }

    /** A column with a head, in the colours of warm grey smoke: alpha and colour are smooth functions of the place. */
    static Picture smoke(int height) {
        int width = (int) Math.round(ASPECT * height);
        Picture picture = new Picture(width, height);
        int fine = Math.max(1, Math.min(4, 1024 / height));
        for (int j = 0; j < height; j++) {
            for (int i = 0; i < width; i++) {
                int at = 4 * (i + width * j);
                for (int k = 0; k < fine * fine; k++) {
                    double x = (i + (k % fine + 0.5) / fine) / height;
                    double y = (j + (k / fine + 0.5) / fine) / height;
                    double head = Math.exp(-(Math.pow((x - 0.38) / 0.12, 2) + Math.pow((y - 0.3) / 0.14, 2)));
                    double column = Math.exp(-Math.pow((x - 0.37) / 0.06, 2)) / (1 + Math.exp(-(y - 0.45) / 0.03));
                    double alpha = 1 - Math.exp(-2 * (head + column));
                    picture.rgba()[at] += (float) (alpha * (0.5 + 0.3 * y) / (fine * fine));
                    picture.rgba()[at + 1] += (float) (alpha * 0.5 / (fine * fine));
                    picture.rgba()[at + 2] += (float) (alpha * (0.6 - 0.2 * y) / (fine * fine));
                    picture.rgba()[at + 3] += (float) (alpha / (fine * fine));
                }
            }
        }
        return picture;
    }

    private static MeshWarp lean(Optional<Matte> within) {
        List<Handle> handles = new ArrayList<>();
        handles.add(new Handle(new Point(0.38, 0.3), new Point(0.26, 0.32)));
        handles.add(new Handle(new Point(0.38, 0.15), new Point(0.24, 0.19)));
        for (double[] pin : new double[][] {{0.3, 0.7}, {0.45, 0.7}, {0.3, 0.95}, {0.45, 0.95}, {0, 0}, {0.75, 0}, {0, 1}, {0.75, 1}}) {
            handles.add(Handle.pin(new Point(pin[0], pin[1])));
        }
        return new MeshWarp(handles, within);
    }

    private static final Region UPPER = new Region.Ellipse(new Point(0.35, 0.3), 0.3, 0.28, 0.1);

    /** Every brush and a warp; the restore takes back a part of the removal and the warp. */
    static Retouch everything() {
        return retouch(stroke(Brush.REMOVE, 0.06, 0.9, 0.6, new Point(0.3, 0.28), new Point(0.45, 0.32)),
                stroke(Brush.ADD, 0.05, 0.7, 0.5, new Point(0.6, 0.2), new Point(0.65, 0.35), new Point(0.6, 0.5)),
                lean(Optional.of(UPPER)),
                stroke(Brush.SOFTEN, 0.08, 0.8, 0.7, new Point(0.35, 0.6), new Point(0.35, 0.8)),
                stroke(Brush.PUSH, 0.09, 0.9, 0.6, new Point(0.45, 0.66), new Point(0.3, 0.7), new Point(0.2, 0.62)),
                stroke(Brush.EVEN, 0.07, 0.8, 0.5, new Point(0.34, 0.85), new Point(0.42, 0.93)),
                stroke(Brush.LIFT, 0.06, 0.9, 0.5, new Point(0.2, 0.25), new Point(0.3, 0.18)),
                stroke(Brush.RESTORE, 0.05, 1, 0.6, new Point(0.44, 0.3), new Point(0.4, 0.42)),
                new Stroke(Brush.ADD, 0.1, 0.5, 0, List.of(new Point(0.1, 0.8)),
                        Optional.of(new Region.Rectangle(0.05, 0.7, 0.2, 0.9, 0))));
    }

    @Test
    void identityIsBitExactAndTheOriginalIsNeverChanged() {
        Picture original = smoke(64);
        Picture kept = original.copy();
        List<Handle> pins = List.of(Handle.pin(new Point(0, 0)), Handle.pin(new Point(0.7, 0.1)), Handle.pin(new Point(0.3, 0.9)));
        for (Retouch nothing : List.of(retouch(), retouch(stroke(Brush.ADD, 0.2, 0, 0.5, new Point(0.4, 0.4)),
                new MeshWarp(pins, Optional.empty())))) {
            assertTrue(nothing.changesNothing());
            Picture wanted = Retoucher.wanted(nothing, original);
            assertNotSame(original, wanted);
            assertArrayEquals(original.rgba(), wanted.rgba());
            for (float t : Retoucher.touched(nothing, original, 0.05)) {
                assertEquals(0f, t);
            }
        }
        Retoucher.wanted(everything(), original);
        assertArrayEquals(kept.rgba(), original.rgba());
    }

    /** By hand at the middle of a hard stroke with coverage m: REMOVE a(1-m); ADD a + m(1-a). */
    @Test
    void removeAndAddByHand() {
        Picture flat = new Picture(32, 32);
        for (int p = 0; p < 32 * 32; p++) {
            flat.rgba()[4 * p] = 0.1f;
            flat.rgba()[4 * p + 1] = 0.2f;
            flat.rgba()[4 * p + 2] = 0.3f;
            flat.rgba()[4 * p + 3] = 0.4f;
        }
        Point middle = new Point(0.5, 0.5);
        Picture less = Retoucher.wanted(retouch(stroke(Brush.REMOVE, 0.2, 0.75, 0, middle)), flat);
        assertPixel(less, 16, 16, 0.025, 0.05, 0.075, 0.1);
        assertPixel(less, 1, 1, 0.1f, 0.2f, 0.3f, 0.4f);
        // Colour near is (0.25, 0.5, 0.75) un-premultiplied; 0.5 * (1 - 0.4) = 0.3 more of it.
        Picture more = Retoucher.wanted(retouch(stroke(Brush.ADD, 0.2, 0.5, 0, middle)), flat);
        assertPixel(more, 16, 16, 0.1 + 0.3 * 0.25, 0.2 + 0.3 * 0.5, 0.3 + 0.3 * 0.75, 0.7);
        // Blurring something flat leaves it flat.
        Picture soft = Retoucher.wanted(retouch(stroke(Brush.SOFTEN, 0.2, 1, 0.5, middle)), flat);
        assertPixel(soft, 16, 16, 0.1, 0.2, 0.3, 0.4);
    }

    /** By hand: half the way into the soft edge, s = 1/2 and coverage is half the strength; beyond the radius it is 0. */
    @Test
    void softEdgeByHand() {
        Stroke stroke = stroke(Brush.ADD, 0.25, 0.8, 1, new Point(0.5 / 64, 0.5 / 64), new Point(0.5 / 64, 100.5 / 64));
        float[] coverage = stroke.sweep().coverage(Window.all(64, 64), 64);
        assertEquals(0.8, coverage[64 * 30], 1e-6);
        assertEquals(0.4, coverage[8 + 64 * 30], 1e-6);
        double s = 0.25;
        assertEquals(0.8 * s * s * (3 - 2 * s), coverage[12 + 64 * 30], 1e-6);
        assertEquals(0, coverage[16 + 64 * 30]);
        assertEquals(0, coverage[17 + 64 * 30]);
    }

    @Test
    void aLineThatCrossesItselfDoesNotActTwice() {
        Picture original = smoke(96);
        Point a = new Point(0.2, 0.3);
        Point b = new Point(0.5, 0.3);
        Retouch once = retouch(stroke(Brush.REMOVE, 0.07, 0.5, 0.5, a, b));
        Retouch thrice = retouch(stroke(Brush.REMOVE, 0.07, 0.5, 0.5, a, b, a, b));
        assertArrayEquals(Retoucher.wanted(once, original).rgba(), Retoucher.wanted(thrice, original).rgba(), 1e-6f);
    }

    @Test
    void removeOverEmptyStaysEmpty() {
        Picture clear = new Picture(48, 64);
        Retouch remove = retouch(stroke(Brush.REMOVE, 0.3, 1, 0.5, new Point(0.3, 0.5)),
                stroke(Brush.SOFTEN, 0.3, 1, 0.5, new Point(0.3, 0.5)));
        for (float value : Retoucher.wanted(remove, clear).rgba()) {
            assertEquals(0f, value);
        }
    }

    /** With no smoke to take the colour from, what is added is white. */
    @Test
    void addInAPictureWithNoSmokeIsWhite() {
        Picture wanted = Retoucher.wanted(retouch(stroke(Brush.ADD, 0.2, 0.6, 0.2, new Point(0.4, 0.5))), new Picture(48, 64));
        assertPixel(wanted, 25, 32, 0.6, 0.6, 0.6, 0.6);
        assertPixel(wanted, 1, 1, 0, 0, 0, 0);
    }

    /** One blot of smoke in a corner gives its colour to a stroke at the other end: always a value, and the right one. */
    @Test
    void addedSmokeTakesTheColourOfTheSmokeThereIs() {
        Picture picture = new Picture(200, 128);
        for (int j = 2; j < 6; j++) {
            for (int i = 2; i < 6; i++) {
                int at = 4 * (i + 200 * j);
                picture.rgba()[at] = 0.4f;
                picture.rgba()[at + 1] = 0.1f;
                picture.rgba()[at + 2] = 0.05f;
                picture.rgba()[at + 3] = 0.5f;
            }
        }
        Picture wanted = Retoucher.wanted(retouch(stroke(Brush.ADD, 0.05, 0.5, 0, new Point(1.4, 0.9))), picture);
        assertPixel(wanted, 179, 115, 0.4, 0.1, 0.05, 0.5);
        // Two blots: the near one decides.
        for (int j = 110; j < 120; j++) {
            int at = 4 * (170 + 200 * j);
            picture.rgba()[at] = 0.2f;
            picture.rgba()[at + 1] = 0.8f;
            picture.rgba()[at + 2] = 0.8f;
            picture.rgba()[at + 3] = 1f;
        }
        Picture both = Retoucher.wanted(retouch(stroke(Brush.ADD, 0.05, 0.5, 0, new Point(1.4, 0.9))), picture);
        assertEquals(0.2, both.at(179, 115, 0) / both.at(179, 115, 3), 0.02);
        assertEquals(0.8, both.at(179, 115, 1) / both.at(179, 115, 3), 0.02);
    }

    @ParameterizedTest
    @EnumSource(Brush.class)
    void resultsStayInRange(Brush brush) {
        Picture wanted = smoke(96);
        Operation before = stroke(Brush.REMOVE, 0.2, 0.7, 0.5, new Point(0.4, 0.4));
        Retouch again = retouch(before, stroke(brush, 0.15, 1, 0.3, new Point(0.2, 0.2), new Point(0.5, 0.7)),
                stroke(brush, 0.4, 0.9, 1, new Point(0.35, 0.5)));
        Picture once = Retoucher.wanted(again, wanted);
        assertFalse(Arrays.equals(Retoucher.wanted(retouch(before), wanted).rgba(), once.rgba()));
        assertInRange(once);
    }

    /** A sharp disc bent and moved: the bicubic kernel overshoots, the result does not. */
    @Test
    void warpsStayInRange() {
        Picture disc = new Picture(72, 96);
        for (int p = 0; p < 72 * 96; p++) {
            if (Math.hypot(p % 72 - 36, p / 72 - 30) < 12) {
                Arrays.fill(disc.rgba(), 4 * p, 4 * p + 4, 1f);
            }
        }
        Picture wanted = Retoucher.wanted(retouch(lean(Optional.empty())), disc);
        assertInRange(wanted);
        assertTrue(PictureMeasure.mass(wanted) > 0.5 * PictureMeasure.mass(disc));
    }

    /** A blot at a handle's start is found at its end: the warp pulls, it does not push the other way. */
    @Test
    void aHandleCarriesWhatIsThere() {
        Picture picture = new Picture(96, 128);
        for (int p = 0; p < 96 * 128; p++) {
            double r2 = Math.pow((p % 96 + 0.5) / 128 - 0.38, 2) + Math.pow((p / 96 + 0.5) / 128 - 0.3, 2);
            picture.rgba()[4 * p + 3] = (float) Math.exp(-r2 / (2 * 0.02 * 0.02));
        }
        Picture wanted = Retoucher.wanted(retouch(lean(Optional.empty())), picture);
        double sumX = 0;
        double sumY = 0;
        double sum = 0;
        for (int p = 0; p < 96 * 128; p++) {
            double alpha = wanted.rgba()[4 * p + 3];
            sum += alpha;
            sumX += alpha * (p % 96 + 0.5) / 128;
            sumY += alpha * (p / 96 + 0.5) / 128;
        }
        assertEquals(0.26, sumX / sum, 0.006);
        assertEquals(0.32, sumY / sum, 0.006);
        assertTrue(wanted.at(33, 41, 3) > 0.95, () -> "the blot's top is at (0.26, 0.32): " + wanted.at(33, 41, 3));
    }

    /** Whole pixels, affine handles: the warp is then an exact copy, shifted (W31 through the whole chain, to the spline's rounding). */
    @Test
    void aShiftByWholePixelsIsACopy() {
        Picture original = smoke(64);
        List<Handle> handles = new ArrayList<>();
        for (double[] p : new double[][] {{0.1, 0.1}, {0.6, 0.1}, {0.3, 0.9}, {0.5, 0.5}}) {
            handles.add(new Handle(new Point(p[0], p[1]), new Point(p[0] - 5.0 / 64, p[1] + 3.0 / 64)));
        }
        Picture wanted = Retoucher.wanted(retouch(new MeshWarp(handles, Optional.empty())), original);
        for (int y = 4; y < 60; y++) {
            for (int x = 4; x < 40; x++) {
                for (int c = 0; c < 4; c++) {
                    assertEquals(original.at(x + 5, y - 3, c), wanted.at(x, y, c), 1e-6);
                }
            }
        }
    }

    @Test
    void outsideItsRegionAnOperationKeepsTheBits() {
        Picture original = smoke(96);
        Picture wanted = Retoucher.wanted(retouch(lean(Optional.of(UPPER)),
                new Stroke(Brush.REMOVE, 0.5, 1, 0.5, List.of(new Point(0.4, 0.3)), Optional.of(UPPER))), original);
        int changed = 0;
        for (int p = 0; p < 72 * 96; p++) {
            boolean out = UPPER.signedDistance((p % 72 + 0.5) / 96, (p / 72 + 0.5) / 96) > 0.05;
            for (int n = 4 * p; n < 4 * p + 4; n++) {
                if (out) {
                    assertEquals(original.rgba()[n], wanted.rgba()[n]);
                } else if (original.rgba()[n] != wanted.rgba()[n]) {
                    changed++;
                }
            }
        }
        assertTrue(changed > 1000);
    }

    @Test
    void orderIsRespected() {
        Picture original = smoke(96);
        Stroke add = stroke(Brush.ADD, 0.1, 1, 0.2, new Point(0.4, 0.3));
        Stroke remove = stroke(Brush.REMOVE, 0.1, 1, 0.2, new Point(0.4, 0.3));
        int x = (int) (0.4 * 96);
        int y = (int) (0.3 * 96);
        assertEquals(0, Retoucher.wanted(retouch(add, remove), original).at(x, y, 3), 1e-6);
        assertEquals(1, Retoucher.wanted(retouch(remove, add), original).at(x, y, 3), 1e-6);
    }

    /** Design section 4: positions are fractions of the height, so rasters agree: at most 0.003 mean absolute difference at 128 rows. */
    @Test
    void theSameRetouchAtThreeRasters() {
        Picture at128 = Retoucher.wanted(everything(), smoke(128));
        Picture at256 = halved(Retoucher.wanted(everything(), smoke(256)));
        Picture at512 = halved(halved(Retoucher.wanted(everything(), smoke(512))));
        float[] ones = new float[96 * 128];
        Arrays.fill(ones, 1f);
        double changed = PictureMeasure.meanAbsoluteDifference(smoke(128), at128, ones);
        double first = PictureMeasure.meanAbsoluteDifference(at128, at512, ones);
        double second = PictureMeasure.meanAbsoluteDifference(at256, at512, ones);
        assertTrue(changed > 0.02, () -> "the retouch changes only " + changed + ", so this test could not fail");
        assertTrue(first <= 0.003, () -> "128 against 512 rows: " + first);
        assertTrue(second <= 0.003, () -> "256 against 512 rows: " + second);
    }

    /** Whatever a retouch changes noticeably lies inside what it says it touches. */
    @Test
    void touchedCoversEveryNoticeableChange() {
        assertTouchedCovers(retouch(), everything(), 0.1);
    }

    @ParameterizedTest
    @EnumSource(Brush.class)
    void touchedCoversWhatEachBrushChanges(Brush brush) {
        Retouch before = retouch(stroke(Brush.REMOVE, 0.2, 0.7, 0.5, new Point(0.4, 0.4)));
        Stroke last = stroke(brush, 0.12, 1, 0.3, new Point(0.3, 0.25), new Point(0.42, 0.4));
        assertTouchedCovers(before, retouch(before.operations().get(0), last), 0.6);
    }

    /** What the last of {@code all} change of the picture after {@code before} lies where they touch it; the far share is left out. */
    private static void assertTouchedCovers(Retouch before, Retouch all, double far) {
        Picture original = Retoucher.wanted(before, smoke(128));
        Picture wanted = Retoucher.wanted(all, smoke(128));
        float[] touched = Retoucher.touched(new Retouch(all.operations().subList(before.operations().size(), all.operations().size())),
                original,
                0.04);
        assertFalse(Arrays.equals(original.rgba(), wanted.rgba()));
        double untouched = 0;
        for (int p = 0; p < touched.length; p++) {
            assertTrue(touched[p] >= 0 && touched[p] <= 1);
            double change = 0;
            for (int c = 0; c < 4; c++) {
                change = Math.max(change, Math.abs(original.rgba()[4 * p + c] - wanted.rgba()[4 * p + c]));
            }
            if (change > 0.02) {
                int at = p;
                double seen = change;
                assertTrue(touched[p] > 0.5, () -> "(" + at % 96 + ", " + at / 96 + ") changes by " + seen + " at weight " + touched[at]);
            }
            untouched += touched[p] == 0 ? 1 : 0;
        }
        assertTrue(untouched > far * touched.length, "the far parts stay out: only " + untouched / touched.length);
    }

    /** A strong pull: both where the smoke was and where it goes are touched, and the pinned foot is not. */
    @Test
    void touchedShowsBothEndsOfAPull() {
        float[] touched = Retoucher.touched(retouch(lean(Optional.empty())), smoke(128), 0.02);
        assertEquals(1, touched[(int) (0.38 * 128) + 96 * (int) (0.3 * 128)], 1e-6);
        assertEquals(1, touched[(int) (0.26 * 128) + 96 * (int) (0.32 * 128)], 1e-6);
        assertTrue(touched[(int) (0.38 * 128) + 96 * (int) (0.95 * 128)] < 0.5);
        assertThrows(IllegalArgumentException.class, () -> Retoucher.touched(retouch(), smoke(16), Double.NaN));
    }

    @Test
    void softenLowersTheSteepestSlope() {
        Picture original = smoke(96);
        Picture wanted = Retoucher.wanted(retouch(stroke(Brush.SOFTEN, 0.15, 1, 0.5, new Point(0.37, 0.75))), original);
        int row = 72;
        double before = 0;
        double after = 0;
        for (int x = 1; x < 72; x++) {
            before = Math.max(before, Math.abs(original.at(x, row, 3) - original.at(x - 1, row, 3)));
            after = Math.max(after, Math.abs(wanted.at(x, row, 3) - wanted.at(x - 1, row, 3)));
        }
        assertTrue(after < 0.8 * before, "slope " + before + " to " + after);
    }

    private static void assertInRange(Picture picture) {
        float[] rgba = picture.rgba();
        for (int p = 0; p < rgba.length; p += 4) {
            int at = p / 4;
            assertTrue(rgba[p + 3] >= 0 && rgba[p + 3] <= 1, () -> "alpha of pixel " + at + ": " + rgba[4 * at + 3]);
            for (int c = 0; c < 3; c++) {
                float value = rgba[p + c];
                // The smoke here is no brighter than white.
                assertTrue(value >= 0 && value <= rgba[p + 3] + 1e-6f, () -> "pixel " + at + ": colour " + value + ", alpha "
                        + rgba[4 * at + 3]);
            }
        }
    }

    private static void assertPixel(Picture picture, int x, int y, double... rgba) {
        for (int c = 0; c < 4; c++) {
            assertEquals(rgba[c], picture.at(x, y, c), 1e-5, "(" + x + ", " + y + ") channel " + c);
        }
    }

    static Picture halved(Picture in) {
        Picture out = new Picture(in.width() / 2, in.height() / 2);
        for (int y = 0; y < out.height(); y++) {
            for (int x = 0; x < out.width(); x++) {
                for (int c = 0; c < 4; c++) {
                    out.rgba()[4 * (x + out.width() * y) + c] = (in.at(2 * x, 2 * y, c) + in.at(2 * x + 1, 2 * y, c)
                            + in.at(2 * x, 2 * y + 1, c) + in.at(2 * x + 1, 2 * y + 1, c)) / 4;
                }
            }
        }
        return out;
    }
}

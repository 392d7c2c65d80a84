package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Segment;

/** The push brush: how far by hand, the same however the line is sampled, no holes, no folds, nothing beyond its reach. */
class PushTest {
    private static final double R = 0.1;

    private static Stroke push(double radius, double strength, double softEdge, Point... line) {
        return new Stroke(Brush.PUSH, radius, strength, softEdge, List.of(line), Optional.empty());
    }

    private static Picture wanted(Picture original, Stroke... strokes) {
        return Retoucher.wanted(new Retouch(List.of(strokes)), original);
    }

    /** Opacity grows along x alone, 0.6 a height and 0.1 at the left edge: a push along x by D lowers it by 0.6 D (bicubic is exact). */
    private static Picture ramp(int width, int height) {
        Picture ramp = new Picture(width, height);
        for (int n = 0; n < ramp.rgba().length; n++) {
            ramp.rgba()[n] = (float) (0.1 + 0.6 * (n / 4 % width + 0.5) / height);
        }
        return ramp;
    }

    /**
     * By hand, hard edge, from x = 0.5 to 1: in the middle r (1 - d^2 / r^2)^(3/2), at the ends r/2, half a radius before the start
     * 3/4 r (1/2 - 7/24) = 5/32 r, all times the strength.
     */
    @ParameterizedTest
    @CsvSource({"0.75,0,1", "0.75,0.06,0.512", "0.75,0.08,0.216", "0.5,0,0.5", "1,0,0.5", "0.45,0,0.15625",
            "1.05,0,0.15625", "0.55,0,0.84375"})
    void howFarByHand(double x, double beside, double share) {
        int height = 400;
        Picture original = ramp(600, height);
        double half = 0.5 / height;
        Stroke stroke = push(R, 0.8, 0, new Point(0.5 + half, 0.5 + half), new Point(1 + half, 0.5 + half));
        Picture wanted = wanted(original, stroke);
        int i = (int) Math.round(x * height);
        int j = (int) Math.round((0.5 + beside) * height);
        assertEquals(0.8 * share * R, (original.at(i, j, 3) - wanted.at(i, j, 3)) / 0.6, 2e-6);
        assertEquals(0, original.at(i, j, 0) - wanted.at(i, j, 0) - (original.at(i, j, 3) - wanted.at(i, j, 3)), 1e-6);
    }

    /** A blot goes the way of the stroke, by a radius, and back when the stroke goes back. */
    @Test
    void carriesABlotAlong() {
        Picture original = new Picture(160, 128);
        for (int p = 0; p < 160 * 128; p++) {
            double r2 = Math.pow((p % 160 + 0.5) / 128 - 0.6, 2) + Math.pow((p / 160 + 0.5) / 128 - 0.5, 2);
            Arrays.fill(original.rgba(), 4 * p, 4 * p + 4, (float) Math.exp(-r2 / (2 * 0.02 * 0.02)));
        }
        Point left = new Point(0.2, 0.5);
        Point right = new Point(1, 0.5);
        Point up = new Point(0.6, 0.1);
        Point down = new Point(0.6, 0.9);
        assertMeanAt(wanted(original, push(0.2, 0.5, 0.4, left, right)), 0.7, 0.5);
        assertMeanAt(wanted(original, push(0.2, 0.5, 0.4, right, left)), 0.5, 0.5);
        assertMeanAt(wanted(original, push(0.2, 0.5, 0.4, up, down)), 0.6, 0.6);
        assertMeanAt(wanted(original, push(0.2, 0.5, 0.4, down, up)), 0.6, 0.4);
    }

    /** The exact integral against 20,000 short steps summed up, on a line with corners, at the pixels of a small window. */
    @Test
    void travelEqualsPlain() {
        Point[] line = {new Point(0.2, 0.3), new Point(0.45, 0.25), new Point(0.4, 0.6), new Point(0.35, 0.62)};
        Push push = new Push(push(0.15, 1, 1, line).sweep(), new Picture(28, 40), new Spare());
        for (int n = 1; n < line.length; n++) {
            push.extend(line[n - 1], 1, line[n], 1);
        }
        double[] travel = new double[2];
        double longest = 0;
        for (int p = 0; p < 23 * 31; p++) {
            double x = (5 + p % 23 + 0.5) / 40;
            double y = (3 + p / 23 + 0.5) / 40;
            double[] plain = new double[2];
            for (int n = 1; n < line.length; n++) {
                double dx = (line[n].x() - line[n - 1].x()) / 20_000;
                double dy = (line[n].y() - line[n - 1].y()) / 20_000;
                for (int k = 0; k < 20_000; k++) {
                    double ex = x - line[n - 1].x() - (k + 0.5) * dx;
                    double ey = y - line[n - 1].y() - (k + 0.5) * dy;
                    double w = Math.max(0, 0.75 * (1 - (ex * ex + ey * ey) / (0.15 * 0.15)));
                    plain[0] += w * dx;
                    plain[1] += w * dy;
                }
            }
            double shorter = 0.15 / Math.max(0.15, Math.hypot(plain[0], plain[1]));
            push.travel(5 + p % 23, 3 + p / 23, travel);
            assertEquals(shorter * plain[0], travel[0], 1e-8);
            assertEquals(shorter * plain[1], travel[1], 1e-8);
            longest = Math.max(longest, Math.hypot(plain[0], plain[1]));
        }
        assertTrue(longest > 0.12, "travels at most " + longest);
    }

    /** A line of 3 points and the same line of 601, 2,999 and 9,001: the same picture. */
    @ParameterizedTest
    @ValueSource(ints = {300, 1499, 4500})
    void howFinelyTheLineIsSampledDoesNotMatter(int pieces) {
        Point[] corners = {new Point(0.2, 0.3), new Point(0.5, 0.35), new Point(0.4, 0.7)};
        List<Point> fine = new ArrayList<>(List.of(corners[0]));
        for (int n = 1; n < corners.length; n++) {
            for (int k = 1; k <= pieces; k++) {
                double t = (double) k / pieces;
                fine.add(new Point((1 - t) * corners[n - 1].x() + t * corners[n].x(), (1 - t) * corners[n - 1].y() + t * corners[n].y()));
            }
        }
        Picture original = RetoucherTest.smoke(96);
        Picture coarse = wanted(original, push(0.12, 0.9, 0.6, corners));
        assertFalse(Arrays.equals(original.rgba(), coarse.rgba()));
        assertArrayEquals(coarse.rgba(), wanted(original, push(0.12, 0.9, 0.6, fine.toArray(Point[]::new))).rgba(), 2e-6f);
    }

    /** There and back is nothing, to the bit; there, back and there is there; a dab has no direction. */
    @Test
    void goingBackTakesThePushBack() {
        Picture original = RetoucherTest.smoke(96);
        Point a = new Point(0.2, 0.3);
        Point b = new Point(0.53, 0.41);
        assertArrayEquals(original.rgba(), wanted(original, push(R, 1, 0.5, a, b, a)).rgba());
        // Back in 4,999 steps, over hard squares: what rounding leaves of the travel must not smear clear pixels.
        List<Point> stops = new ArrayList<>(List.of(a, b));
        for (int k = 4998; k >= 0; k--) {
            stops.add(new Point(0.2 + k / 4999.0 * 0.33, 0.3 + k / 4999.0 * 0.11));
        }
        Picture squares = new Picture(72, 96);
        for (int n = 0; n < squares.rgba().length; n++) {
            squares.rgba()[n] = (n / 4 % 72 / 3 + n / 4 / 72 / 3) % 2;
        }
        assertArrayEquals(squares.rgba(), wanted(squares, push(R, 1, 0.5, stops.toArray(Point[]::new))).rgba());
        assertArrayEquals(wanted(original, push(R, 1, 0.5, a, b)).rgba(), wanted(original, push(R, 1, 0.5, a, b, a, b)).rgba(), 1e-5f);
        for (Stroke dab : List.of(push(R, 1, 0.5, b), push(R, 1, 0.5, b, b, b))) {
            assertTrue(dab.changesNothing());
            assertArrayEquals(original.rgba(), wanted(original, dab).rgba());
        }
        assertFalse(push(R, 1, 0.5, a, b).changesNothing());
    }

    @Test
    void beyondItsReachTheBitsStay() {
        Picture original = RetoucherTest.smoke(96);
        Picture wanted = wanted(original, push(0.15, 1, 0, new Point(0.3, 0.2), new Point(0.5, 0.5)));
        int changed = 0;
        for (int p = 0; p < 72 * 96; p++) {
            double d = Math.sqrt(Segment.squaredDistance((p % 72 + 0.5) / 96, (p / 72 + 0.5) / 96, 0.3, 0.2, 0.5, 0.5));
            for (int n = 4 * p; n < 4 * p + 4; n++) {
                if (d >= 0.15) {
                    assertEquals(original.rgba()[n], wanted.rgba()[n]);
                }
                changed += original.rgba()[n] != wanted.rgba()[n] ? 1 : 0;
            }
        }
        assertTrue(changed > 3000, "changes only " + changed + " values");
    }

    /** Something flat stays flat: inside, over the border, and pushed in from beyond it. */
    @Test
    void makesNoHoles() {
        Picture flat = new Picture(48, 64);
        Arrays.fill(flat.rgba(), 0.6f);
        Picture wanted = wanted(flat, push(0.2, 1, 0.5, new Point(-0.3, 0.5), new Point(0.6, 0.4), new Point(0.3, 1.4)),
                push(0.5, 1, 0, new Point(0.3, -0.4), new Point(0.4, 0.3)));
        for (float value : wanted.rgba()) {
            assertEquals(0.6f, value, 1e-6f);
        }
    }

    /** Along a straight stroke at full strength the order of things stays: what grew before grows still, for any soft edge. */
    @ParameterizedTest
    @ValueSource(doubles = {0, 0.1, 0.25, 0.5, 0.75, 0.9, 1})
    void aStraightStrokeDoesNotFold(double softEdge) {
        Picture wanted = wanted(ramp(360, 240), push(0.25, 1, softEdge, new Point(0.5, 0.5), new Point(1, 0.5)));
        for (int y = 0; y < 240; y++) {
            for (int x = 1; x < 360; x++) {
                float step = wanted.at(x, y, 3) - wanted.at(x - 1, y, 3);
                assertTrue(step > -1e-6f, "folds at (" + x + ", " + y + ") by " + step);
            }
        }
    }

    private static void assertMeanAt(Picture picture, double x, double y) {
        double sum = 0;
        double sumX = 0;
        double sumY = 0;
        for (int p = 0; p < picture.width() * picture.height(); p++) {
            double alpha = picture.rgba()[4 * p + 3];
            sum += alpha;
            sumX += alpha * (p % picture.width() + 0.5) / picture.height();
            sumY += alpha * (p / picture.width() + 0.5) / picture.height();
        }
        assertEquals(x, sumX / sum, 0.005);
        assertEquals(y, sumY / sum, 0.005);
    }
}

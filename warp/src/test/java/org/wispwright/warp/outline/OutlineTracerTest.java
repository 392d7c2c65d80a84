package org.wispwright.warp.outline;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import java.util.function.DoubleBinaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.warp.measure.Plane;

/** Marching squares: Lorensen and Cline (1987) in the plane. */
class OutlineTracerTest {
    /** By hand: one pixel of 1 at level 1/4 gives a diamond, 3/4 of a pixel from the centre, clockwise on the screen. */
    @Test
    void onePixelByHand() {
        List<Loop> loops = OutlineTracer.trace(new Plane(3, 2, new double[] {0, 0, 0, 0, 1, 0}), .25);
        assertEquals(1, loops.size());
        Loop loop = loops.get(0);
        assertEquals(4, loop.size());
        double cx = 1.5 / 2;
        double cy = 1.5 / 2;
        double r = .75 / 2;
        assertArrayEquals(new double[] {cx, cx + r, cx, cx - r}, loop.x(), 1e-15);
        assertArrayEquals(new double[] {cy - r, cy, cy + r, cy}, loop.y(), 1e-15);
        assertEquals(2 * r * r, loop.signedArea(), 1e-15);
        assertEquals(4 * Math.sqrt(2) * r, loop.length(), 1e-15);
    }

    /** By hand: two pixels that touch at a corner; the mean of the four, 1/2, joins them at level 0.4 and parts them at 0.6. */
    @Test
    void theMeanOfFourDecides() {
        for (double[] values : new double[][] {{1, 0, 0, 1}, {0, 1, 1, 0}}) {
            assertEquals(1, OutlineTracer.trace(new Plane(2, 2, values), .4).size());
            assertEquals(2, OutlineTracer.trace(new Plane(2, 2, values), .6).size());
        }
    }

    /** A Gaussian's level line is a circle: every point as near as linear interpolation allows, area as pi r^2; a ring has a hole. */
    @Test
    void circlesAndHoles() {
        double sigma = 9;
        Plane blob = plane(80, 60, (x, y) -> Math.exp(-((x - 38) * (x - 38) + (y - 31) * (y - 31)) / (2 * sigma * sigma)));
        double level = .3;
        double r = sigma * Math.sqrt(-2 * Math.log(level));
        List<Loop> loops = OutlineTracer.trace(blob, level);
        assertEquals(1, loops.size());
        Loop circle = loops.get(0);
        // Linear interpolation over one pixel errs by up to |f''| / (8 |f'|) = (r / sigma^2 - 1 / r) / 8, here 0.0126 pixels.
        double allowed = (r / (sigma * sigma) - 1 / r) / 8;
        for (int n = 0; n < circle.size(); n++) {
            assertEquals(r, 60 * Math.hypot(circle.x()[n] - 38.5 / 60, circle.y()[n] - 31.5 / 60), allowed);
        }
        assertEquals(Math.PI * r * r / 3600, circle.signedArea(), 3e-3 * Math.PI * r * r / 3600);
        Plane ring = plane(80, 60, (x, y) -> 1 - Math.abs(Math.hypot(x - 38, y - 31) - 15) / 10);
        loops = OutlineTracer.trace(ring, .5);
        assertEquals(2, loops.size());
        assertEquals(Math.PI * 400 / 3600, loops.get(0).signedArea(), 1e-3);
        assertEquals(-Math.PI * 100 / 3600, loops.get(1).signedArea(), 1e-3);
    }

    /** By hand: a full plane closes half way to the first centres outside; its four corners are cut by triangles of 1/8 pixel. */
    @Test
    void outlinesCloseAtTheBorder() {
        List<Loop> loops = OutlineTracer.trace(plane(5, 4, (x, y) -> 1), .5);
        assertEquals(1, loops.size());
        assertEquals((5 * 4 - 4 * .125) / 16, loops.get(0).signedArea(), 1e-15);
        assertEquals(1, OutlineTracer.trace(new Plane(1, 1, new double[] {1}), .5).size());
        assertEquals(List.of(), OutlineTracer.trace(plane(5, 4, (x, y) -> .4), .5));
    }

    /** Noise: the loops wind once around each pixel that reaches the level, and not around any other. */
    @ParameterizedTest
    @CsvSource({"1,9,1", "9,1,2", "7,5,3", "23,31,4", "40,17,5"})
    void loopsWindAroundTheInside(int width, int height, long seed) {
        Random random = new Random(seed);
        Plane noise = plane(width, height, (x, y) -> random.nextDouble());
        List<Loop> loops = OutlineTracer.trace(noise, .5);
        for (int p = 0; p < width * height; p++) {
            double px = (p % width + .5) / height;
            double py = (p / width + .5) / height;
            double turns = 0;
            for (Loop loop : loops) {
                for (int n = 0, m = loop.size() - 1; n < loop.size(); m = n++) {
                    double ax = loop.x()[m] - px;
                    double ay = loop.y()[m] - py;
                    double bx = loop.x()[n] - px;
                    double by = loop.y()[n] - py;
                    turns += Math.atan2(ax * by - ay * bx, ax * bx + ay * by) / (2 * Math.PI);
                }
            }
            assertEquals(noise.values()[p] >= .5 ? 1 : 0, turns, 1e-9, "pixel " + p + ", seed " + seed);
        }
    }

    /** Values that are the level itself: no doubled points, no loop of fewer than 3, the same areas as just below. */
    @Test
    void valuesAtTheLevel() {
        Plane steps = plane(12, 9, (x, y) -> Math.floorMod((int) (3 * x + 5 * y), 4) / 2.0);
        double area = 0;
        for (Loop loop : OutlineTracer.trace(steps, .5)) {
            for (int n = 0, m = loop.size() - 1; n < loop.size(); m = n++) {
                assertTrue(loop.x()[n] != loop.x()[m] || loop.y()[n] != loop.y()[m]);
            }
            area += loop.signedArea();
        }
        double below = OutlineTracer.trace(steps, .5 - 1e-9).stream().mapToDouble(Loop::signedArea).sum();
        assertEquals(below, area, 1e-6);
        assertTrue(area > .1);
    }

    /** Every point left out lies within the tolerance of the simpler line, which has fewer points, and some are left out. */
    @ParameterizedTest
    @CsvSource({"0", "1e-4", "0.003", "0.02", "10"})
    void simplifiedStaysWithinTheTolerance(double tolerance) {
        Plane blob = plane(90, 70, (x, y) -> Math.exp(-(x - 40) * (x - 40) / 300 - (y - 33) * (y - 33) / 150)
                * (1 + .3 * Math.sin(x / 2)));
        Loop loop = OutlineTracer.trace(blob, .4).get(0);
        Loop simple = loop.simplified(tolerance);
        assertTrue(simple.size() >= 3 && simple.size() <= loop.size());
        if (tolerance >= .003) {
            assertTrue(simple.size() < loop.size() / 3, simple.size() + " of " + loop.size());
        }
        if (tolerance == 10) {
            assertEquals(3, simple.size());
        }
        for (int n = 0; n < loop.size(); n++) {
            double nearest = Double.POSITIVE_INFINITY;
            for (int k = 0, m = simple.size() - 1; k < simple.size(); m = k++) {
                nearest = Math.min(nearest, distance(loop.x()[n], loop.y()[n], simple.x()[m], simple.y()[m], simple.x()[k], simple.y()[k]));
            }
            assertTrue(nearest <= tolerance + 1e-12, "point " + n + " is " + nearest + " away");
        }
    }

    /** By hand: points along the sides of a square fall away, its corners stay in their order. */
    @Test
    void aSquareKeepsItsCorners() {
        Loop square = new Loop(new double[] {1, 2, 3, 3, 3, 2, 1, 1}, new double[] {1, 1, 1, 2, 3, 3, 3, 2});
        Loop simple = square.simplified(1e-9);
        assertArrayEquals(new double[] {1, 3, 3, 1}, simple.x());
        assertArrayEquals(new double[] {1, 1, 3, 3}, simple.y());
        assertEquals(4, simple.signedArea());
        assertEquals(8, simple.length());
    }

    @Test
    void refusesWhatIsNoOutline() {
        Plane plane = plane(3, 3, (x, y) -> x);
        assertThrows(IllegalArgumentException.class, () -> OutlineTracer.trace(plane, 0));
        assertThrows(IllegalArgumentException.class, () -> OutlineTracer.trace(plane, Double.NaN));
        assertThrows(IllegalArgumentException.class, () -> new Loop(new double[2], new double[2]));
        assertThrows(IllegalArgumentException.class, () -> new Loop(new double[3], new double[] {0, 0, Double.NaN}));
        Loop point = new Loop(new double[3], new double[3]);
        assertEquals(3, point.simplified(1).size());
        assertThrows(IllegalArgumentException.class, () -> point.simplified(-1));
    }

    private static double distance(double x, double y, double ax, double ay, double bx, double by) {
        double l = (bx - ax) * (bx - ax) + (by - ay) * (by - ay);
        double t = l == 0 ? 0 : Math.min(1, Math.max(0, ((x - ax) * (bx - ax) + (y - ay) * (by - ay)) / l));
        return Math.hypot(x - ax - t * (bx - ax), y - ay - t * (by - ay));
    }

    private static Plane plane(int width, int height, DoubleBinaryOperator f) {
        double[] values = new double[width * height];
        for (int p = 0; p < values.length; p++) {
            values[p] = f.applyAsDouble(p % width, p / width);
        }
        return new Plane(width, height, values);
    }
}

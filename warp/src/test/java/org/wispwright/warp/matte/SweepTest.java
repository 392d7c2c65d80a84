package org.wispwright.warp.matte;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/** Coverage against its definition, the maximum over the points of the line; the slow twin tries thousands of points one by one. */
class SweepTest {
    private static final int WIDTH = 51;
    private static final int HEIGHT = 37;
    private static final Window ALL = Window.all(WIDTH, HEIGHT);

    /** The definition in the record's comment at one pixel: 400 points a piece, then 100 around the best; or the dabs alone. */
    private static double plain(Sweep sweep, double px, double py, int height) {
        double best = touched(sweep, touch(sweep, 0, 0), px, py, height);
        double way = 0;
        double next = sweep.spacing() * sweep.radius();
        for (int n = 1; n < sweep.line().size(); n++) {
            double length = sweep.line().get(n - 1).distanceTo(sweep.line().get(n));
            double at = 0;
            double most = 0;
            for (int k = 0; sweep.spacing() == 0 && k <= 400; k++) {
                double here = touched(sweep, touch(sweep, n, k / 400.0), px, py, height);
                at = here > most ? k / 400.0 : at;
                most = Math.max(most, here);
            }
            for (int k = -50; sweep.spacing() == 0 && k <= 50; k++) {
                most = Math.max(most, touched(sweep, touch(sweep, n, Math.min(1, Math.max(0, at + k / 20_000.0))), px, py, height));
            }
            for (; sweep.spacing() > 0 && next <= way + length; next += sweep.spacing() * sweep.radius()) {
                most = Math.max(most, touched(sweep, touch(sweep, n, (next - way) / length), px, py, height));
            }
            way += length;
            best = Math.max(best, most);
        }
        return best;
    }

    private static double touched(Sweep sweep, double[] touch, double px, double py, int height) {
        Pressure.On on = sweep.pressure().on();
        double r = sweep.radius() * (on == Pressure.On.STRENGTH ? 1 : touch[2]);
        double most = sweep.strength() * (on == Pressure.On.RADIUS ? 1 : touch[2]) * (on == Pressure.On.STRENGTH ? 1
                : Math.min(1, 2 * r * height));
        double d = Math.sqrt((px - touch[0]) * (px - touch[0]) + (py - touch[1]) * (py - touch[1]));
        double s = 0.5 + (r - sweep.softEdge() * r / 2 - d) / Math.max(sweep.softEdge() * r, 1.0 / height);
        s = Math.min(1, Math.max(0, s));
        return most * s * s * (3 - 2 * s);
    }

    private static double[] touch(Sweep sweep, int n, double t) {
        int m = Math.max(0, n - 1);
        Point a = sweep.line().get(m);
        Point b = sweep.line().get(n);
        return new double[] {a.x() + t * (b.x() - a.x()), a.y() + t * (b.y() - a.y()),
            sweep.pressure().at(m) + t * (sweep.pressure().at(n) - sweep.pressure().at(m))};
    }

    private static Sweep random(long seed, int points, Pressure.On on, boolean even, double soft, double spacing) {
        Random random = new Random(seed);
        List<Point> line = new ArrayList<>();
        List<Double> pressure = new ArrayList<>();
        for (int n = 0; n < points; n++) {
            line.add(new Point(1.7 * random.nextDouble() - 0.2, 1.3 * random.nextDouble() - 0.15));
            pressure.add(Math.min(1, Math.max(0, 1.4 * random.nextDouble() - 0.2)));
        }
        if (points > 3) {
            line.set(2, line.get(1));
        }
        return new Sweep(0.11, 0.8, soft, line, new Pressure(on, even ? List.of() : pressure), spacing);
    }

    /** Lines at random, with a dwelling point, that cross themselves and leave the frame; a dab; hard and soft. Seeds 1 to 4. */
    @ParameterizedTest
    @CsvSource({"STRENGTH,true,0.5,0", "STRENGTH,true,0,0", "STRENGTH,true,1,0", "STRENGTH,false,0.5,0", "STRENGTH,false,0,0",
            "RADIUS,false,0.5,0", "RADIUS,false,1,0", "RADIUS,false,0,0", "BOTH,false,0.6,0", "BOTH,false,0,0", "STRENGTH,true,0.3,1.7",
            "BOTH,false,0.3,0.4"})
    void coverageEqualsPlain(Pressure.On on, boolean even, double soft, double spacing) {
        double seen = 0;
        for (int seed = 1; seed <= 4; seed++) {
            Sweep sweep = random(seed, new int[] {1, 2, 5, 9}[seed - 1], on, even, soft, spacing);
            float[] got = sweep.coverage(ALL, HEIGHT);
            for (int n = 0; n < got.length; n++) {
                String place = "seed " + seed + " pixel (" + n % WIDTH + ", " + n / WIDTH + ")";
                // 0.002: the search of the peak; 0.0005: a step of the twin.
                assertEquals(plain(sweep, (n % WIDTH + 0.5) / HEIGHT, (n / WIDTH + 0.5) / HEIGHT, HEIGHT), got[n],
                        even || spacing > 0 ? 0.0005 : 0.0025, place);
                seen = Math.max(seen, got[n]);
            }
        }
        assertTrue(seen > 0.6, "covers at most " + seen);
    }

    /** A window has the bits of the whole. */
    @ParameterizedTest
    @EnumSource(Pressure.On.class)
    void aWindowHasTheBitsOfTheWhole(Pressure.On on) {
        for (Sweep sweep : List.of(random(11, 9, on, false, 0.5, 0), random(12, 9, on, true, 0.5, 0), random(13, 9, on, false, 0.5, 0.3))) {
            float[] whole = sweep.coverage(ALL, HEIGHT);
            for (Window window : List.of(new Window(0, 0, 1, 1), new Window(13, 7, 29, 21), new Window(50, 36, 1, 1),
                    new Window(5, 30, 40, 3))) {
                float[] part = sweep.coverage(window, HEIGHT);
                for (int n = 0; n < part.length; n++) {
                    assertEquals(whole[window.left() + n % window.width() + WIDTH * (window.top() + n / window.width())], part[n]);
                }
            }
        }
    }

    /** Pieces cut into 7: the same coverage, pressure and all; and drawn there and back, once is enough. */
    @ParameterizedTest
    @EnumSource(Pressure.On.class)
    void howFinelyALineIsSampledDoesNotMatter(Pressure.On on) {
        Sweep coarse = random(21, 6, on, false, 0.6, 0);
        List<Point> line = new ArrayList<>(List.of(coarse.line().get(0)));
        List<Double> pressure = new ArrayList<>(List.of(coarse.pressure().at(0)));
        for (int n = 1; n < coarse.line().size(); n++) {
            for (int k = 1; k <= 7; k++) {
                double[] touch = touch(coarse, n, k / 7.0);
                line.add(new Point(touch[0], touch[1]));
                pressure.add(touch[2]);
            }
        }
        float[] once = coarse.coverage(ALL, HEIGHT);
        assertArrayEquals(once, new Sweep(0.11, 0.8, 0.6, line, new Pressure(on, pressure), 0).coverage(ALL, HEIGHT), 0.002f);
        for (int n = coarse.line().size() - 1; n >= 0; n--) {
            line.add(coarse.line().get(n));
            pressure.add(coarse.pressure().at(n));
        }
        assertArrayEquals(once, new Sweep(0.11, 0.8, 0.6, line, new Pressure(on, pressure), 0).coverage(ALL, HEIGHT), 0.002f);
    }

    /** By hand, hard edge, pressure 0 to 1 over ten radii: a place sees the hardest touch that reaches it, half a chord ahead. */
    @Test
    void theHardestTouchThatReachesAPlaceCounts() {
        Sweep sweep = new Sweep(0.05, 1, 0, List.of(new Point(0.2, 0.5), new Point(0.7, 0.5)),
                new Pressure(Pressure.On.STRENGTH, List.of(0.0, 1.0)), 0);
        Window spot = new Window(449, 499, 1, 1);
        // Half a pixel before x = 0.45 on the line: 0.2495 + 0.05 along of 0.5, less half a pixel of edge that is not yet 1.
        assertEquals((0.2495 + 0.05 - 0.0005) / 0.5, sweep.coverage(spot, 1000)[0], 0.001);
    }

    /** By hand: pressed harder while dwelling, the most counts; released to nothing, nothing. */
    @Test
    void dwellingTakesTheHardest() {
        Point middle = new Point(0.5, 0.5);
        for (Pressure.On on : Pressure.On.values()) {
            Sweep dwell = new Sweep(0.2, 0.5, 0.5, List.of(middle, middle, middle), new Pressure(on, List.of(0.2, 1.0, 0.0)), 0);
            assertArrayEquals(new Sweep(0.2, 0.5, 0.5, List.of(middle)).coverage(ALL, HEIGHT), dwell.coverage(ALL, HEIGHT));
            Sweep none = new Sweep(0.2, 0.5, 0.5, List.of(middle), new Pressure(on, List.of(0.0)), 0);
            assertArrayEquals(new float[ALL.pixels()], none.coverage(ALL, HEIGHT));
        }
    }

    /** Wherever there is coverage the reach is 1, and it ends a feather beyond the radius. */
    @ParameterizedTest
    @EnumSource(Pressure.On.class)
    void reachHoldsCoverage(Pressure.On on) {
        for (double spacing : new double[] {0, 0.9}) {
            Sweep sweep = random(31, 6, on, false, 0.4, spacing);
            float[] coverage = sweep.coverage(ALL, HEIGHT);
            float[] reach = sweep.reach(ALL, HEIGHT, 0.05);
            int outside = 0;
            for (int n = 0; n < reach.length; n++) {
                // At the very rim the twin peaks of coverage and reach are found to a share of a pixel.
                assertTrue(coverage[n] < 0.01 || reach[n] > 0.99, "pixel " + n + " covered " + coverage[n] + ", reach " + reach[n]);
                outside += reach[n] == 0 ? 1 : 0;
            }
            assertTrue(outside > 100, "only " + outside + " outside");
        }
    }

    /** Thousands of raw points, a trembling hand: few are kept, no piece longer than asked, coverage within the bound stated. */
    @ParameterizedTest
    @CsvSource({"STRENGTH,0.25", "RADIUS,0.25", "BOTH,1", "STRENGTH,0.05"})
    void thinningKeepsCoverage(Pressure.On on, double spacing) {
        Random random = new Random(5);
        List<Point> line = new ArrayList<>();
        List<Double> pressure = new ArrayList<>();
        for (int n = 0; n < 4000; n++) {
            double t = n / 4000.0;
            line.add(new Point(0.2 + 0.9 * t + 5e-5 * random.nextGaussian(), 0.5 + 0.3 * Math.sin(9 * t) + 5e-5 * random.nextGaussian()));
            pressure.add(0.6 + 0.4 * Math.sin(17 * t));
        }
        Trail trail = new Trail(line, pressure).thinned(0.12, spacing);
        assertTrue(trail.line().size() < 400, trail.line().size() + " points kept");
        assertEquals(line.get(3999), trail.line().get(trail.line().size() - 1));
        for (int n = 1; n < trail.line().size(); n++) {
            assertTrue(trail.line().get(n - 1).distanceTo(trail.line().get(n)) <= spacing * 0.12 + 1e-12);
        }
        float[] raw = new Sweep(0.12, 1, 0.5, line, new Pressure(on, pressure), 0).coverage(ALL, HEIGHT);
        assertArrayEquals(raw, new Sweep(0.12, 1, 0.5, trail.line(), new Pressure(on, trail.pressure()), 0).coverage(ALL, HEIGHT), 0.02f);
        float[] even = new Sweep(0.12, 1, 0.5, line).coverage(ALL, HEIGHT);
        assertArrayEquals(even, new Sweep(0.12, 1, 0.5, trail.line()).coverage(ALL, HEIGHT), 0.012f);
    }

    /** Going back and pressing harder on the spot are kept. */
    @Test
    void thinningKeepsTurnsAndPresses() {
        List<Point> line = List.of(new Point(0.1, 0.5), new Point(0.11, 0.5), new Point(0.12, 0.5), new Point(0.11, 0.5), new Point(0.1,
                0.5),
                new Point(0.1, 0.5), new Point(0.1, 0.5));
        Trail trail = new Trail(line, List.of(1.0, 1.0, 1.0, 1.0, 1.0, 0.2, 0.9)).thinned(0.2, 1);
        assertEquals(List.of(line.get(0), line.get(2), line.get(4), line.get(5), line.get(6)), trail.line());
        assertEquals(List.of(1.0, 1.0, 1.0, 0.2, 0.9), trail.pressure());
    }

    @Test
    void refusesWhatMakesNoSense() {
        List<Point> line = List.of(new Point(0, 0), new Point(0.5, 0.5));
        assertRefused("1 numbers", () -> new Sweep(0.1, 1, 1, line, new Pressure(Pressure.On.BOTH, List.of(1.0)), 0));
        assertRefused("pressure 1 1.5", () -> new Pressure(Pressure.On.BOTH, List.of(1.0, 1.5)));
        assertRefused("pressure 0 NaN", () -> new Pressure(Pressure.On.BOTH, List.of(Double.NaN)));
        assertRefused("spacing 0.01", () -> new Sweep(0.1, 1, 1, line, Pressure.FULL, 0.01));
        assertRefused("spacing NaN", () -> new Sweep(0.1, 1, 1, line, Pressure.FULL, Double.NaN));
        assertRefused("more than 20000 dabs", () -> new Sweep(1e-5, 1, 1, line, Pressure.FULL, 0.1));
        assertRefused("radius 0.0", () -> new Trail(line, List.of(1.0, 1.0)).thinned(0, 1));
        assertRefused("2 points and 1", () -> new Trail(line, List.of(1.0)));
    }

    private static void assertRefused(String says, Runnable making) {
        String message = assertThrows(IllegalArgumentException.class, making::run).getMessage();
        assertTrue(message.contains(says), message);
    }
}

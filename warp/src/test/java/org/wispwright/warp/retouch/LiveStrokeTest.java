package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Pressure;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.matte.Window;

/** A stroke drawn point by point: at any time the bits of the same stroke laid at once, and no pixel touched that was not told. */
class LiveStrokeTest {
    private static final int WIDTH = 171;
    private static final int HEIGHT = 139;

    /** Noise, premultiplied: alpha 0 to 1 with plenty of both ends, colour at most alpha. */
    private static Picture noise(long seed) {
        Random random = new Random(seed);
        Picture picture = new Picture(WIDTH, HEIGHT);
        for (int p = 0; p < WIDTH * HEIGHT; p++) {
            float alpha = (float) Math.min(1, Math.max(0, 1.6 * random.nextDouble() - 0.3));
            for (int c = 0; c < 4; c++) {
                picture.rgba()[4 * p + c] = c == 3 ? alpha : alpha * random.nextFloat();
            }
        }
        return picture;
    }

    private static Stroke stroke(Random random, Brush brush, Pressure.On on, int points) {
        List<Point> line = new ArrayList<>();
        List<Double> pressure = new ArrayList<>();
        double x = 1.23 * random.nextDouble();
        double y = random.nextDouble();
        for (int n = 0; n < points; n++) {
            line.add(new Point(x, y));
            pressure.add(random.nextInt(3) == 0 && n > 0 ? pressure.get(n - 1) : (Double) random.nextDouble());
            x += random.nextInt(4) == 0 ? 0 : 0.2 * random.nextGaussian();
            y += random.nextInt(4) == 0 ? 0 : 0.2 * random.nextGaussian();
        }
        double spacing = random.nextInt(3) == 0 ? 0.2 + random.nextDouble() : 0;
        List<Double> told = random.nextInt(3) == 0 ? List.of() : pressure;
        Optional<Matte> within = random.nextBoolean() ? Optional.empty()
                : Optional.of(new Region.Ellipse(new Point(0.6, 0.5), 0.5, 0.4, 0.2));
        return new Stroke(brush, new Sweep(0.02 + 0.2 * random.nextDouble(), random.nextDouble(), random.nextDouble(), line,
                new Pressure(on, told), spacing), within);
    }

    private static Stroke first(Stroke stroke, int points) {
        Pressure pressure = stroke.sweep().pressure();
        Sweep sweep = stroke.sweep();
        return new Stroke(stroke.brush(), new Sweep(sweep.radius(), sweep.strength(), sweep.softEdge(), stroke.line().subList(0, points),
                new Pressure(pressure.on(), pressure.values().isEmpty() ? List.of() : pressure.values().subList(0, points)),
                sweep.spacing()), stroke.within());
    }

    /** Twelve strokes one after the other, drawn a few points at a time; seeds by brush. */
    @ParameterizedTest
    @EnumSource(Brush.class)
    void drawnIsLaid(Brush brush) {
        Random random = new Random(brush.ordinal());
        Picture original = noise(99);
        Canvas canvas = new Canvas(original);
        List<Operation> before = new ArrayList<>();
        for (int n = 0; n < 12; n++) {
            Stroke whole = stroke(random, n % 2 == 0 ? brush : Brush.values()[random.nextInt(7)], Pressure.On.values()[n % 3],
                    1 + random.nextInt(9));
            int drawn = 1 + random.nextInt(Math.min(2, whole.line().size()));
            LiveStroke live = canvas.begin(first(whole, drawn));
            assertSameAs(before, first(whole, drawn), original, canvas);
            while (drawn < whole.line().size()) {
                int more = Math.min(whole.line().size() - drawn, 1 + random.nextInt(3));
                float[] was = canvas.picture().rgba().clone();
                List<Double> pressures = new ArrayList<>();
                for (int k = drawn; k < drawn + more; k++) {
                    pressures.add(whole.sweep().pressure().at(k));
                }
                Optional<Window> dirty = live.extend(whole.line().subList(drawn, drawn + more), pressures);
                assertOnlyChangedIn(dirty, was, canvas.picture());
                drawn += more;
                assertSameAs(before, first(whole, drawn), original, canvas);
            }
            if (n % 4 == 3) {
                float[] was = canvas.picture().rgba().clone();
                assertOnlyChangedIn(live.cancel(), was, canvas.picture());
            } else {
                assertEquals(whole, live.end());
                before.add(whole);
            }
            if (n == 5) {
                Stroke laid = stroke(random, brush, Pressure.On.BOTH, 4);
                canvas.apply(laid);
                before.add(laid);
            }
        }
        assertArrayEquals(Retoucher.wanted(new Retouch(before), original).rgba(), canvas.picture().rgba());
        assertFalse(Arrays.equals(original.rgba(), canvas.picture().rgba()));
    }

    private static void assertSameAs(List<Operation> before, Stroke last, Picture original, Canvas canvas) {
        List<Operation> all = new ArrayList<>(before);
        all.add(last);
        float[] expected = Retoucher.wanted(new Retouch(all), original).rgba();
        float[] got = canvas.picture().rgba();
        for (int n = 0; n < got.length; n++) {
            if (Float.floatToIntBits(expected[n]) != Float.floatToIntBits(got[n])) {
                assertEquals(expected[n], got[n], "(" + n / 4 % WIDTH + ", " + n / 4 / WIDTH + ") channel " + n % 4 + " after " + last);
            }
        }
    }

    private static void assertOnlyChangedIn(Optional<Window> dirty, float[] was, Picture picture) {
        for (int n = 0; n < was.length; n++) {
            if (was[n] != picture.rgba()[n]) {
                int x = n / 4 % WIDTH;
                int y = n / 4 / WIDTH;
                assertTrue(dirty.isPresent() && x >= dirty.get().left() && x < dirty.get().left() + dirty.get().width()
                        && y >= dirty.get().top() && y < dirty.get().top() + dirty.get().height(), "(" + x + ", " + y + ") was not told");
            }
        }
    }

    /** Whatever the strokes, alpha and colour stay in 0 to 1; strength 0 and pressure 0 keep the bits. Seeds 0 to 14. */
    @ParameterizedTest
    @EnumSource(Brush.class)
    void resultsStayInRange(Brush brush) {
        for (int seed = 0; seed < 15; seed++) {
            Random random = new Random(seed);
            Picture original = noise(seed);
            List<Operation> operations = new ArrayList<>();
            for (int n = 0; n < 3; n++) {
                operations.add(stroke(random, n == 1 ? Brush.values()[seed % 7] : brush, Pressure.On.values()[random.nextInt(3)],
                        1 + random.nextInt(5)));
            }
            for (float value : Retoucher.wanted(new Retouch(operations), original).rgba()) {
                assertTrue(value >= 0 && value <= 1.000001f, "seed " + seed + ": " + value);
            }
            List<Point> line = List.of(new Point(0.3, 0.3), new Point(0.6, 0.6));
            for (Sweep nothing : List.of(new Sweep(0.2, 0, 0.5, line), new Sweep(0.2, 1, 0.5, line,
                    new Pressure(Pressure.On.values()[seed % 3], List.of(0.0, 0.0)), 0))) {
                Stroke stroke = new Stroke(brush, nothing, Optional.empty());
                assertTrue(stroke.changesNothing());
                Canvas canvas = new Canvas(original);
                canvas.begin(stroke).end();
                assertArrayEquals(original.rgba(), canvas.picture().rgba());
            }
        }
    }

    @Test
    void oneStrokeAtATimeAndNothingAfterItsEnd() {
        Canvas canvas = new Canvas(noise(1));
        Stroke start = new Stroke(Brush.ADD, 0.1, 1, 0.5, List.of(new Point(0.5, 0.5)), Optional.empty());
        LiveStroke live = canvas.begin(start);
        assertThrows(IllegalStateException.class, () -> canvas.begin(start));
        assertThrows(IllegalStateException.class, () -> canvas.apply(start));
        float[] was = canvas.picture().rgba().clone();
        assertThrows(IllegalArgumentException.class, () -> live.extend(List.of(new Point(0, 0)), List.of()));
        assertThrows(IllegalArgumentException.class, () -> live.extend(List.of(new Point(0, 0)), List.of(1.5)));
        assertArrayEquals(was, canvas.picture().rgba());
        assertEquals(Optional.empty(), live.extend(List.of(), List.of()));
        live.end();
        assertThrows(IllegalStateException.class, live::end);
        assertThrows(IllegalStateException.class, live::cancel);
        assertThrows(IllegalStateException.class, () -> live.extend(List.of(new Point(0, 0)), List.of(1.0)));
    }
}

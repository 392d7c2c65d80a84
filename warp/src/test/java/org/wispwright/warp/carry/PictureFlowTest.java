package org.wispwright.warp.carry;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.function.DoubleBinaryOperator;
import org.junit.jupiter.api.Test;
import org.wispwright.warp.matte.Point;

/** Positions carried by fields whose paths are known. */
class PictureFlowTest {

    /** Hand-derived: a weighted mean of equal numbers is that number, wherever it is taken and however little smoke there is. */
    @Test
    void oneVelocityIsThatVelocityEverywhere() {
        for (double weight : new double[] {1, 0.004}) {
            PictureFlow flow = field(37, 53, (x, y) -> Math.hypot(x - 0.4, y - 0.6) < 0.1 ? weight : 0, (x, y) -> 0.25, (x, y) -> -0.5);
            for (Point p : new Point[] {new Point(0.4, 0.6), new Point(0.05, 0.03), new Point(-2, 0.5), new Point(0.69, 9)}) {
                assertArrayEquals(new double[] {0.25, -0.5}, flow.velocity(p), 1e-6, p.toString());
            }
        }
    }

    /** Hand-derived: the picture without smoke has no velocity at all. */
    @Test
    void withoutSmokePositionsStay() {
        PictureFlow flow = field(5, 3, (x, y) -> 0, (x, y) -> 1, (x, y) -> 1);
        assertEquals(new Point(0.3, 0.2), flow.carried(new Point(0.3, 0.2), 10));
    }

    /** Two puffs, one going left and one right: beside each, its own velocity wins; on it, it is alone. */
    @Test
    void besideSmokeTheNearestLeads() {
        PictureFlow flow = field(128, 64, (x, y) -> Math.hypot(x - 0.4, y - 0.5) < 0.15 || Math.hypot(x - 1.6, y - 0.5) < 0.15 ? 0.8 : 0,
                (x, y) -> x < 1 ? -1 : 1, (x, y) -> 0);
        assertEquals(-1, flow.velocity(new Point(0.4, 0.5))[0], 1e-6);
        assertEquals(1, flow.velocity(new Point(1.65, 0.45))[0], 1e-6);
        assertTrue(flow.velocity(new Point(0.62, 0.5))[0] < -0.95);
        assertTrue(flow.velocity(new Point(1.4, 0.4))[0] > 0.95);
    }

    /**
     * A solid turn by 1 rad/s about (0.5, 0.5): positions go on a circle. The midpoint rule's error is of third order in a step
     * (Hairer, Norsett and Wanner 1993, Solving ODEs I, II.1), so half the step leaves a quarter of it over the whole way.
     */
    @Test
    void theMidpointRuleIsOfSecondOrder() {
        PictureFlow flow = field(101, 101, (x, y) -> 1, (x, y) -> 0.5 - y, (x, y) -> x - 0.5);
        double coarse = errorAfterOneSecond(flow, 8);
        double fine = errorAfterOneSecond(flow, 16);
        assertEquals(4, coarse / fine, 0.3, coarse + ", " + fine);
        assertTrue(fine < 5e-4, "error " + fine);
    }

    private static double errorAfterOneSecond(PictureFlow flow, int steps) {
        Point p = new Point(0.8, 0.5);
        for (int n = 0; n < steps; n++) {
            p = flow.carried(p, 1.0 / steps);
        }
        return p.distanceTo(new Point(0.5 + 0.3 * Math.cos(1), 0.5 + 0.3 * Math.sin(1)));
    }

    @Test
    void oddNumbersAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> new PictureFlow(2, 2, new float[11]));
        for (int c = 0; c < 3; c++) {
            float[] motion = new float[12];
            motion[6 + c] = Float.NaN;
            assertTrue(assertThrows(IllegalArgumentException.class, () -> new PictureFlow(2, 2, motion)).getMessage().contains("pixel 2"));
        }
        assertThrows(IllegalArgumentException.class, () -> new PictureFlow(1, 1, new float[] {0, 0, -1}));
    }

    private static PictureFlow field(int width, int height, DoubleBinaryOperator weight, DoubleBinaryOperator u, DoubleBinaryOperator v) {
        float[] motion = new float[3 * width * height];
        for (int p = 0; p < width * height; p++) {
            double x = (p % width + 0.5) / height;
            double y = (p / width + 0.5) / height;
            motion[3 * p] = (float) u.applyAsDouble(x, y);
            motion[3 * p + 1] = (float) v.applyAsDouble(x, y);
            motion[3 * p + 2] = (float) weight.applyAsDouble(x, y);
        }
        return new PictureFlow(width, height, motion);
    }
}

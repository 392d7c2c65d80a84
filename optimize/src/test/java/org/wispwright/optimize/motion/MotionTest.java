package org.wispwright.optimize.motion;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.wispwright.render.view.Vec3;

/** Values over frames, and rigid motion. */
class MotionTest {
    private static final Vec3 ZERO = new Vec3(0, 0, 0);

    private static Curve curve(double[] frames, double[] xs) {
        return new Curve(java.util.Arrays.stream(frames).boxed().toList(), java.util.Arrays.stream(xs).mapToObj(x -> new Vec3(x, -x,
                0)).toList());
    }

    @Test void twoKeysAreAStraightLine() {
        Curve line = curve(new double[] {10, 20}, new double[] {1, 6});
        assertEquals(3.5, line.at(15).x(), 1e-15);
        assertEquals(-2.25, line.at(12.5).y(), 1e-15);
        assertEquals(0.5, line.slope(17).x(), 1e-15);
        assertEquals(1, line.at(3).x());
        assertEquals(6, line.at(30).x());
        assertEquals(0, line.slope(30).x());
    }

    /**
     * Fritsch and Butland (1984), by hand: keys 0, 1, 3 at frames 0, 1, 2: d1 = 1, d2 = 2, w = 1/2, slope 2 / 1.5 = 4/3 at frame 1; halfway
     * of the second span 1/2 (1 + 3) + (4/3 - 2)/8 = 2 - 1/12.
     */
    @Test void threeKeysByHand() {
        Curve bend = curve(new double[] {0, 1, 2}, new double[] {0, 1, 3});
        assertEquals(4 / 3.0, bend.slope(1).x(), 1e-14);
        assertEquals(2 - 1 / 12.0, bend.at(1.5).x(), 1e-14);
        // Spans of 1 and 2 frames, slopes 1 and 2: w = 5/9, 2 / (10/9 + 4/9) = 9/7.
        assertEquals(9 / 7.0, curve(new double[] {0, 1, 3}, new double[] {0, 1, 5}).slope(1).x(), 1e-14);
    }

    /**
     * Fritsch and Carlson (1980), SIAM J. Numer. Anal. 17, 238-246, table of RPN 14: monotone data, so a monotone curve; and rest between
     * equal keys.
     */
    @Test void nothingSwingsPastAKey() {
        double[] xs = {7.99, 8.09, 8.19, 8.7, 9.2, 10, 12, 15, 20};
        double[] ys = {0, 2.76429e-5, 4.37498e-2, 0.169183, 0.469428, 0.943740, 0.998636, 0.999919, 0.999994};
        Curve rise = curve(xs, ys);
        double before = 0;
        for (double t = 7.99; t <= 20; t += 0.005) {
            assertTrue(rise.at(t).x() >= before - 1e-15, "at " + t);
            assertTrue(rise.slope(t).x() >= -1e-12, "at " + t);
            before = rise.at(t).x();
        }
        Curve rests = curve(new double[] {0, 4, 8, 12}, new double[] {0, 1, 1, 0});
        assertEquals(1, rests.at(6.3).x(), 1e-15);
        assertEquals(0, rests.slope(5).x(), 1e-15);
    }

    /** The slope is the derivative: central differences. */
    @Test void slopeIsTheDerivative() {
        Curve bend = curve(new double[] {0, 1, 3, 7, 8}, new double[] {0, 1, 4, 2, 2});
        for (double t : new double[] {0.3, 1.7, 2.9, 5, 7.5}) {
            assertEquals((bend.at(t + 1e-5).x() - bend.at(t - 1e-5).x()) / 2e-5, bend.slope(t).x(), 1e-9, "at " + t);
        }
    }

    /** Rodrigues: a quarter turn about y takes z to x; a whole turn about any axis nothing anywhere. */
    @Test void turns() {
        Pose quarter = Pose.of(Curve.still(new Vec3(1, 2, 3)), Curve.still(new Vec3(0, Math.PI / 2, 0)), 0, 1, 24);
        Vec3 turned = quarter.turn(new Vec3(0, 0, 1));
        assertEquals(1, turned.x(), 1e-15);
        assertEquals(0, turned.z(), 1e-15);
        Vec3 back = quarter.toLocal(new Vec3(2, 2, 3));
        assertEquals(1, back.z(), 1e-15);
        Pose whole = Pose.of(Curve.still(ZERO), Curve.still(new Vec3(1, 2, -2).times(2 * Math.PI / 3)), 0, 1, 24);
        assertEquals(0.3, whole.turn(new Vec3(0.3, 1, 2)).x(), 1e-14);
    }

    /** Bullo and Murray (1995): the spin of a rotation vector that changes on a bent way; against differences of where a point goes. */
    @Test void velocityIsTheDerivativeOfThePlace() {
        Curve position = new Curve(List.of(0.0, 5.0, 9.0), List.of(ZERO, new Vec3(1, 2, 0), new Vec3(3, 3, 3)));
        Curve rotation = new Curve(List.of(0.0, 5.0, 9.0), List.of(new Vec3(0.1, 0, 0), new Vec3(0.8, 1.9, -0.4), new Vec3(2, 2.1, 1)));
        double t = 6.3;
        Pose mid = Pose.of(position, rotation, t, t, 24);
        Vec3 local = new Vec3(0.3, -0.7, 1.1);
        Vec3 world = mid.turn(local).plus(mid.position());
        Vec3 later = place(position, rotation, t + 1e-5, local);
        Vec3 earlier = place(position, rotation, t - 1e-5, local);
        Vec3 expected = later.minus(earlier).times(24 / 2e-5);
        assertEquals(0, mid.velocityAt(world).minus(expected).length(), 1e-7);
        // The series for small angles joins the closed form.
        Curve small = new Curve(List.of(0.0, 1.0), List.of(new Vec3(0.00097, 0, 0), new Vec3(0.001, 0.00003, 0)));
        assertEquals(Pose.of(position, small, 0.5, 0.5, 1).spin().y(), 0.00003, 1e-10);
    }

    private static Vec3 place(Curve position, Curve rotation, double t, Vec3 local) {
        Pose pose = Pose.of(position, rotation, t, t, 24);
        return pose.turn(local).plus(pose.position());
    }

    @Test void keysThatAreNone() {
        assertThrows(IllegalArgumentException.class, () -> new Curve(List.of(), List.of()));
        assertThrows(IllegalArgumentException.class, () -> new Curve(List.of(1.0, 1.0), List.of(ZERO, ZERO)));
        assertThrows(IllegalArgumentException.class, () -> new Curve(List.of(1.0, Double.NaN), List.of(ZERO, ZERO)));
        assertThrows(IllegalArgumentException.class, () -> new Curve(List.of(1.0), List.of(ZERO, ZERO)));
    }
}

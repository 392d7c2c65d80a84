package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;

/** The values of a retouch refuse what makes no sense, each with a sentence that names it. */
class RetouchValuesTest {
    private static final List<Point> LINE = List.of(new Point(0.1, 0.1), new Point(0.2, 0.4));

    @Test
    void pointsAreFinite() {
        assertRefused("(NaN, 0.0)", () -> new Point(Double.NaN, 0));
        assertRefused("Infinity", () -> new Point(0, Double.POSITIVE_INFINITY));
        assertEquals(5, new Point(-3, 0).distanceTo(new Point(0, 4)));
    }

    @Test
    void strokesAreInRange() {
        assertRefused("radius 0.0", () -> new Stroke(Brush.ADD, 0, 1, 1, LINE, Optional.empty()));
        assertRefused("radius 1.5", () -> new Stroke(Brush.ADD, 1.5, 1, 1, LINE, Optional.empty()));
        assertRefused("radius NaN", () -> new Stroke(Brush.ADD, Double.NaN, 1, 1, LINE, Optional.empty()));
        assertRefused("strength -0.1", () -> new Stroke(Brush.ADD, 0.1, -0.1, 1, LINE, Optional.empty()));
        assertRefused("softEdge NaN", () -> new Stroke(Brush.ADD, 0.1, 1, Double.NaN, LINE, Optional.empty()));
        assertRefused("'line' has 0", () -> new Stroke(Brush.ADD, 0.1, 1, 1, List.of(), Optional.empty()));
        assertRefused("'line point 1' is missing", () -> new Stroke(Brush.ADD, 0.1, 1, 1, Arrays.asList(LINE.get(0), null),
                Optional.empty()));
        assertRefused("'brush'", () -> new Stroke(null, 0.1, 1, 1, LINE, Optional.empty()));
        assertRefused("'within'", () -> new Stroke(Brush.ADD, 0.1, 1, 1, LINE, null));
    }

    @Test
    void handlesSpreadOverThePlane() {
        assertRefused("2 handles", () -> warp(0, 0, 1, 1));
        assertRefused("'from' points of all 3", () -> warp(0, 0, 0.5, 0.5, 1, 1));
        assertRefused("handles 1 and 2 have the same 'from'", () -> warp(0, 0, 0.5, 0.5, 0.5, 0.5));
        List<Handle> folded = List.of(Handle.pin(new Point(0, 0)), Handle.pin(new Point(1, 0)),
                new Handle(new Point(0, 1), new Point(0.5, 0)));
        assertRefused("'to' points", () -> new MeshWarp(folded, Optional.empty()));
        assertEquals(3, warp(0, 0, 1, 0, 0, 1).handles().size());
    }

    @Test
    void regionsHaveAnInside() {
        assertRefused("left 0.5", () -> new Region.Rectangle(0.5, 0, 0.5, 1, 0));
        assertRefused("feather -0.1", () -> new Region.Rectangle(0, 0, 1, 1, -0.1));
        assertRefused("radii 0.0", () -> new Region.Ellipse(new Point(0, 0), 0, 1, 0));
        assertRefused("2 points", () -> new Region.Polygon(LINE, 0));
    }

    @Test
    void retouchesCopyTheirList() {
        assertRefused("'operation 0' is missing", () -> new Retouch(Arrays.asList((Operation) null)));
        assertThrows(UnsupportedOperationException.class, () -> new Retouch(List.of()).operations().add(null));
    }

    /** By hand: distances from a unit square and from a circle; a 3-4-5 corner. */
    @Test
    void signedDistancesByHand() {
        Region square = new Region.Rectangle(0, 0, 1, 1, 0.2);
        assertEquals(-0.25, square.signedDistance(0.5, 0.25), 1e-12);
        assertEquals(0.5, square.signedDistance(1.3, 1.4), 1e-12);
        assertEquals(0.3, square.signedDistance(1.3, 0.5), 1e-12);
        Region circle = new Region.Ellipse(new Point(0.5, 0.5), 0.25, 0.25, 0);
        assertEquals(0.25, circle.signedDistance(0.5, 1), 1e-12);
        assertEquals(-0.25, circle.signedDistance(0.5, 0.5), 1e-12);
        Region polygon = new Region.Polygon(List.of(new Point(0, 0), new Point(1, 0), new Point(1, 1), new Point(0, 1)), 0.2);
        for (double[] p : new double[][] {{0.5, 0.25}, {1.3, 1.4}, {1.3, 0.5}, {-2, 0.1}, {0.9, 0.95}}) {
            assertEquals(square.signedDistance(p[0], p[1]), polygon.signedDistance(p[0], p[1]), 1e-12);
        }
        // Five-pointed star drawn in one line: its middle is outside by the even-odd rule.
        Point[] star = new Point[5];
        for (int n = 0; n < 5; n++) {
            star[n] = new Point(Math.sin(0.8 * Math.PI * n), -Math.cos(0.8 * Math.PI * n));
        }
        assertTrue(new Region.Polygon(List.of(star), 0).signedDistance(0, 0) > 0);
        assertTrue(new Region.Polygon(List.of(star), 0).signedDistance(0, -0.7) < 0);
    }

    /** By hand: 1/2 on the outline, 1 half a feather inside, 0 half a feather outside, 27/32 a quarter inside. */
    @Test
    void masksByHand() {
        Region square = new Region.Rectangle(0, 0, 1, 1, 0.2);
        assertEquals(0.5, square.mask(0, 0.5, 0.01), 1e-12);
        assertEquals(1, square.mask(0.1, 0.5, 0.01), 1e-12);
        assertEquals(0, square.mask(-0.1, 0.5, 0.01), 1e-12);
        assertEquals(27.0 / 32, square.mask(0.05, 0.5, 0.01), 1e-12);
        assertEquals(1, new Region.Rectangle(0, 0, 1, 1, 0).mask(0.02, 0.5, 0.01));
    }

    private static MeshWarp warp(double... xy) {
        Handle[] handles = new Handle[xy.length / 2];
        for (int n = 0; n < handles.length; n++) {
            handles[n] = Handle.pin(new Point(xy[2 * n], xy[2 * n + 1]));
        }
        return new MeshWarp(List.of(handles), Optional.empty());
    }

    private static void assertRefused(String says, Runnable making) {
        String message = assertThrows(IllegalArgumentException.class, making::run).getMessage();
        assertTrue(message.contains(says), message);
    }
}

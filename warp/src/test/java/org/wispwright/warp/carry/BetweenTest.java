package org.wispwright.warp.carry;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Stroke;

/** Retouches between two, worked out by hand: every number lies on the straight line between its two ends. */
class BetweenTest {

    @Test
    void numbersOfAStrokeGoStraight() {
        Stroke a = stroke(Brush.ADD, 0.1, 1, 0.2, Optional.of(rectangle(0, 0.1)), new Point(0, 0), new Point(1, 0));
        Stroke b = stroke(Brush.ADD, 0.3, 0.5, 0.6, Optional.of(rectangle(2, 0.5)), new Point(0, 1), new Point(3, 1));
        Stroke quarter = stroke(Brush.ADD, 0.15, 0.875, 0.3, Optional.of(rectangle(0.5, 0.2)), new Point(0, 0.25), new Point(1.5, 0.25));
        assertClose(quarter, (Stroke) one(a, b, 0.25));
        assertClose(a, (Stroke) one(a, b, 0));
        assertClose(b, (Stroke) one(a, b, 1));
    }

    /**
     * A line of two pieces of length 1 and 3 against one with corners at a quarter and a half: all three arcs appear, no corner is lost.
     */
    @Test
    void linesMatchByArcLengthAndKeepEveryCorner() {
        Stroke a = stroke(Brush.REMOVE, 0.1, 1, 0, Optional.empty(), new Point(0, 0), new Point(1, 0), new Point(1, 3));
        Stroke b = stroke(Brush.REMOVE, 0.1, 1, 0, Optional.empty(), new Point(0, 0), new Point(0, 2), new Point(2, 2));
        assertEquals(List.of(new Point(0, 0), new Point(0.5, 0.5), new Point(0.5, 1.5), new Point(1.5, 2.5)), ((Stroke) one(a, b,
                0.5)).line());
        assertEquals(List.of(new Point(0, 0), new Point(1, 0), new Point(1, 1), new Point(1, 3)), ((Stroke) one(a, b, 0)).line());
    }

    @Test
    void aDabGrowsIntoALine() {
        Stroke dab = stroke(Brush.SOFTEN, 0.1, 1, 0, Optional.empty(), new Point(1, 1));
        Stroke line = stroke(Brush.SOFTEN, 0.1, 1, 0, Optional.empty(), new Point(0, 1), new Point(2, 1), new Point(2, 3));
        assertEquals(List.of(new Point(0.5, 1), new Point(1.5, 1), new Point(1.5, 2)), ((Stroke) one(dab, line, 0.5)).line());
        assertEquals(List.of(new Point(1, 1)), ((Stroke) one(dab, dab, 0.3)).line());
    }

    @Test
    void linesOfManyPointsStayWithinWhatALineMayHave() {
        Point[] many = new Point[10_000];
        Point[] other = new Point[9_999];
        for (int n = 0; n < many.length; n++) {
            many[n] = new Point(n / 9999.0, 0);
        }
        for (int n = 0; n < other.length; n++) {
            other[n] = new Point(n / 9998.0, 1);
        }
        Stroke half = (Stroke) one(stroke(Brush.ADD, 0.1, 1, 0, Optional.empty(), many), stroke(Brush.ADD, 0.1, 1, 0, Optional.empty(),
                other), 0.5);
        assertEquals(10_000, half.line().size());
        assertEquals(0.5, half.line().get(0).y());
        assertEquals(1, half.line().get(9_999).x(), 1e-12);
    }

    @Test
    void handlesMatchByOrder() {
        MeshWarp a = new MeshWarp(List.of(new Handle(new Point(0, 0), new Point(0, 1)), Handle.pin(new Point(1, 0)),
                Handle.pin(new Point(0, 2))),
                Optional.empty());
        MeshWarp b = new MeshWarp(List.of(new Handle(new Point(2, 0), new Point(0, 3)), Handle.pin(new Point(1, 4)),
                Handle.pin(new Point(4, 3))),
                Optional.empty());
        assertEquals(new MeshWarp(List.of(new Handle(new Point(1, 0), new Point(0, 2)), Handle.pin(new Point(1, 2)),
                Handle.pin(new Point(2, 2.5))), Optional.empty()), one(a, b, 0.5));
    }

    /** A triangle and a square with the same first corner and the same turn: arcs 0, 1/4, 1/3.. by hand for a square of side 1. */
    @Test
    void outlinesMatchByArcLengthAroundTheLoop() {
        Matte square = new Region.Polygon(List.of(new Point(0, 0), new Point(1, 0), new Point(1, 1), new Point(0, 1)), 0);
        Matte larger = new Region.Polygon(List.of(new Point(0, 0), new Point(2, 0), new Point(4, 0), new Point(4, 4), new Point(0, 4)),
                0.4);
        Region.Polygon half = (Region.Polygon) Between.matte("it", square, larger, 0.5);
        assertEquals(List.of(new Point(0, 0), new Point(1.25, 0), new Point(2.5, 0), new Point(2.5, 2.5), new Point(0, 2.5)),
                half.outline());
        assertEquals(0.2, half.feather(), 1e-15);
        Region.Ellipse ellipse = (Region.Ellipse) Between.matte("it", new Region.Ellipse(new Point(0, 0), 1, 2, 0),
                new Region.Ellipse(new Point(4, 2), 3, 4, 1), 0.25);
        assertEquals(new Region.Ellipse(new Point(1, 0.5), 1.5, 2.5, 0.25), ellipse);
    }

    @Test
    void whatDoesNotMatchIsNamed() {
        Stroke add = stroke(Brush.ADD, 0.1, 1, 0, Optional.empty(), new Point(0, 0));
        Stroke remove = stroke(Brush.REMOVE, 0.1, 1, 0, Optional.empty(), new Point(0, 0));
        Stroke bounded = stroke(Brush.ADD, 0.1, 1, 0, Optional.of(rectangle(0, 0)), new Point(0, 0));
        Stroke round = stroke(Brush.ADD, 0.1, 1, 0, Optional.of(new Region.Ellipse(new Point(0, 0), 1, 1, 0)), new Point(0, 0));
        MeshWarp three = new MeshWarp(List.of(Handle.pin(new Point(0, 0)), Handle.pin(new Point(1, 0)), Handle.pin(new Point(0, 1))),
                Optional.empty());
        MeshWarp four = new MeshWarp(List.of(Handle.pin(new Point(0, 0)), Handle.pin(new Point(1, 0)), Handle.pin(new Point(0, 1)),
                Handle.pin(new Point(1, 1))), Optional.empty());
        assertRefused(List.of(add), List.of(add, add), "1 operations and the second 2");
        assertRefused(List.of(add, add), List.of(add, remove), "operation 2", "'add'", "'remove'");
        assertRefused(List.of(add), List.of(three), "operation 1", "'add'", "mesh warp");
        assertRefused(List.of(three), List.of(four), "3 handles", "4");
        assertRefused(List.of(add), List.of(bounded), "not bounded", "'within'");
        assertRefused(List.of(bounded), List.of(round), "'within' of operation 1", "rectangle", "ellipse");
        assertThrows(IllegalArgumentException.class, () -> Between.retouch(new Retouch(List.of()), new Retouch(List.of()), Double.NaN));
        MeshWarp turned = new MeshWarp(List.of(Handle.pin(new Point(1, 1)), Handle.pin(new Point(0, 1)), Handle.pin(new Point(1, 0))),
                Optional.empty());
        assertRefused(List.of(add, three), List.of(add, turned), "operation 2, part of the way", "same 'from'");
    }

    private static void assertRefused(List<Operation> a, List<Operation> b, String... phrases) {
        String words = assertThrows(IllegalArgumentException.class, () -> Between.retouch(new Retouch(a), new Retouch(b),
                0.5)).getMessage();
        for (String phrase : phrases) {
            assertTrue(words.contains(phrase), words);
        }
    }

    private static Operation one(Operation a, Operation b, double share) {
        return Between.retouch(new Retouch(List.of(a)), new Retouch(List.of(b)), share).operations().get(0);
    }

    private static void assertClose(Stroke wanted, Stroke got) {
        assertEquals(wanted.brush(), got.brush());
        assertEquals(wanted.radius(), got.radius(), 1e-15);
        assertEquals(wanted.sweep().strength(), got.sweep().strength(), 1e-15);
        assertEquals(wanted.sweep().softEdge(), got.sweep().softEdge(), 1e-15);
        assertEquals(wanted.line().size(), got.line().size());
        for (int n = 0; n < wanted.line().size(); n++) {
            assertEquals(0, wanted.line().get(n).distanceTo(got.line().get(n)), 1e-15);
        }
        Region.Rectangle a = (Region.Rectangle) wanted.within().orElseThrow();
        Region.Rectangle b = (Region.Rectangle) got.within().orElseThrow();
        assertEquals(a.left(), b.left(), 1e-15);
        assertEquals(a.right(), b.right(), 1e-15);
        assertEquals(a.feather(), b.feather(), 1e-15);
    }

    private static Stroke stroke(Brush brush, double radius, double strength, double softEdge, Optional<Matte> within, Point... line) {
        return new Stroke(brush, radius, strength, softEdge, List.of(line), within);
    }

    private static Matte rectangle(double left, double feather) {
        return new Region.Rectangle(left, -1, left + 1, 1, feather);
    }
}

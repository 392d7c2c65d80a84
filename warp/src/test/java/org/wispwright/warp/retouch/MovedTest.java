package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.lang.reflect.RecordComponent;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;
import org.wispwright.warp.matte.BrushedMatte;
import org.wispwright.warp.matte.CombinedMatte;
import org.wispwright.warp.matte.DensityRange;
import org.wispwright.warp.matte.ImageMatte;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Sweep;

/** Every position of every kind of operation and matte goes where the map takes it, and nothing else changes. */
class MovedTest {
    private static final UnaryOperator<Point> SHIFT = p -> new Point(p.x() + 0.25, p.y() - 0.5);
    private static final List<Matte> MATTES = List.of(new Region.Rectangle(0.25, 0.5, 0.5, 0.75, 0.125),
            new Region.Ellipse(new Point(0.5, 0.25), 0.25, 0.125, 0.25),
            new Region.Polygon(List.of(new Point(0, 0), new Point(0.5, 0), new Point(0, 0.5)), 0.125),
            new BrushedMatte(List.of(new BrushedMatte.Dab(BrushedMatte.Way.ADD, new Sweep(0.25, 1, 0.5, List.of(new Point(0, 0.25)))))),
            new CombinedMatte(CombinedMatte.Way.UNION, List.of(new Region.Ellipse(new Point(0.5, 0.25), 0.25, 0.125, 0.25),
                    new DensityRange(0.25, 0.5, 0.125, 0))),
            new DensityRange(0.25, 0.5, 0.125, 0));
    private static final List<Operation> OPERATIONS = List.of(
            new Stroke(Brush.PUSH, 0.25, 0.5, 0.125, List.of(new Point(0, 0.25), new Point(1, 0.5)), Optional.of(MATTES.get(1))),
            new MeshWarp(List.of(new Handle(new Point(0, 0), new Point(0.5, 0.25)), Handle.pin(new Point(1, 0)), Handle.pin(new Point(0,
                    1))),
                    Optional.of(MATTES.get(2))),
            new OutlineWarp(0.25, List.of(new Handle(new Point(0, 0), new Point(0.5, 0.25))), 0.125, WarpKind.RIGID,
            Optional.of(MATTES.get(4))));

    /** The lists above are whole: a kind that joins must join them. */
    @Test
    void everyPermittedKindIsHere() {
        Set<Class<?>> here = new HashSet<>();
        MATTES.forEach(matte -> here.add(matte.getClass()));
        OPERATIONS.forEach(operation -> here.add(operation.getClass()));
        Set<Class<?>> permitted = new HashSet<>(kinds(Operation.class));
        permitted.addAll(kinds(Matte.class));
        // Pixels have no positions: below.
        here.add(Repaint.class);
        here.add(ImageMatte.class);
        assertEquals(permitted, here);
    }

    /** Positions are found by looking into every record component, so one that a kind forgets to move is seen. */
    @Test
    void everyPositionMovesAndNothingElse() throws ReflectiveOperationException {
        for (Operation operation : OPERATIONS) {
            assertMoved(operation, operation.moved(SHIFT));
            assertEquals(operation, operation.moved(SHIFT).moved(p -> new Point(p.x() - 0.25, p.y() + 0.5)), "there and back");
        }
        for (Matte matte : MATTES) {
            assertEquals(matte, matte.moved(UnaryOperator.identity()));
            assertEquals(matte.getClass(), matte.moved(SHIFT).getClass());
        }
        Retouch all = new Retouch(OPERATIONS);
        assertEquals(OPERATIONS.get(1).moved(SHIFT), all.moved(SHIFT).operations().get(1));
    }

    /** Hand-derived: a shift carries the outline along, so the distance from it at the shifted place is the old one. */
    @Test
    void shiftedRegionsAreShifted() {
        for (Matte matte : MATTES.subList(0, 3)) {
            Region before = (Region) matte;
            Region after = (Region) matte.moved(SHIFT);
            for (double[] p : new double[][] {{0.3, 0.6}, {0.5, 0.25}, {-1, 2}, {0.1, 0.1}}) {
                assertEquals(before.signedDistance(p[0], p[1]), after.signedDistance(p[0] + 0.25, p[1] - 0.5), 1e-12, matte.toString());
            }
            assertEquals(before.feather(), after.feather());
        }
    }

    /** Turned by a right angle, x becomes the old -y and y the old x. */
    @Test
    void turnedAndStretchedRegions() {
        UnaryOperator<Point> turn = p -> new Point(-p.y(), p.x());
        Region.Rectangle upright = new Region.Rectangle(1, 2, 4, 3, 0);
        Region turned = upright.moved(turn);
        assertTrue(turned instanceof Region.Polygon);
        for (double[] p : new double[][] {{2, 2.5}, {0, 0}, {5, 2.2}, {1.5, 4}}) {
            assertEquals(upright.signedDistance(p[0], p[1]), turned.signedDistance(-p[1], p[0]), 1e-12);
        }
        assertEquals(new Region.Ellipse(new Point(-2, 3), 3, 10, 0.5),
                new Region.Ellipse(new Point(1, 3), 1, 5, 0.5).moved(p -> new Point(3 * p.x() - 5, 2 * p.y() - 3)));
    }

    @Test
    void pixelsAreNotCarried() {
        assertThrows(IllegalArgumentException.class, () -> new ImageMatte(1, 1, new float[1], 0).moved(SHIFT));
        assertThrows(IllegalArgumentException.class, () -> new Repaint(1, 1, new float[Repaint.LAYERS]).moved(SHIFT));
    }

    @Test
    void whatFallsTogetherIsRefusedWithItsNumber() {
        String words = assertThrows(IllegalArgumentException.class, () -> new Retouch(OPERATIONS).moved(p -> new Point(0, 0))).getMessage();
        assertTrue(words.startsWith("operation 1 of the retouch, moved: ellipse"), words);
    }

    private static void assertMoved(Record before, Record after) throws ReflectiveOperationException {
        List<Object> was = new ArrayList<>();
        List<Object> is = new ArrayList<>();
        gather(before, was);
        gather(after, is);
        assertTrue(was.stream().anyMatch(Point.class::isInstance));
        assertEquals(was.stream().map(part -> part instanceof Point p ? SHIFT.apply(p) : part).toList(), is);
    }

    private static void assertMoved(Operation before, Operation after) throws ReflectiveOperationException {
        assertMoved((Record) before, (Record) after);
    }

    /** All that a value is made of, in order, points whole. */
    private static void gather(Object value, List<Object> into) throws ReflectiveOperationException {
        if (value instanceof List<?> list) {
            for (Object item : list) {
                gather(item, into);
            }
        } else if (value instanceof Optional<?> optional) {
            gather(optional.stream().toList(), into);
        } else if (value instanceof Record && !(value instanceof Point)) {
            for (RecordComponent part : value.getClass().getRecordComponents()) {
                gather(part.getAccessor().invoke(value), into);
            }
        } else {
            into.add(value);
        }
    }

    private static Set<Class<?>> kinds(Class<?> sealed) {
        Set<Class<?>> kinds = new HashSet<>();
        for (Class<?> kind : sealed.getPermittedSubclasses()) {
            if (kind.isSealed()) {
                kinds.addAll(kinds(kind));
            } else {
                kinds.add(kind);
            }
        }
        return kinds;
    }
}

package org.wispwright.ui.window.easel;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.ui.desk.Hand;
import org.wispwright.ui.shot.Hold;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.outline.Loop;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.OutlineWarp;
import org.wispwright.warp.retouch.Stroke;
import org.wispwright.warp.retouch.WarpKind;

/** What each hand makes of the pointer. Expectations: ours, by the tools' own words; places worked out by hand. */
class ToolsTest {
    @TempDir
    private static Path folder;
    private ToolBench bench;

    @BeforeAll
    static void shot() {
        ToolBench.shotIn(folder);
    }

    @BeforeEach
    void open() {
        bench = new ToolBench(folder);
    }

    @AfterEach
    void close() {
        bench.close();
    }

    private List<Operation> operations() {
        return bench.retouching.operations();
    }

    private MeshWarp warp(int at) {
        return (MeshWarp) operations().get(at);
    }

    private Optional<String> undoName() {
        return bench.desk.state().history().undoName();
    }

    @Test
    void aBrushDrawsWhereItIsDragged() {
        bench.takeUp(new Hand.Brushing(Brush.REMOVE, 0.1, 0.7, 0.5, true));
        assertSame(bench.retouching.live().orElseThrow(), bench.live);
        bench.drag("", 0.3, 0.7, 0.35, 0.72, 0.4, 0.7);
        Stroke stroke = (Stroke) operations().get(1);
        assertEquals(Brush.REMOVE, stroke.brush());
        assertEquals(0.1, stroke.radius());
        assertEquals(0.7, stroke.sweep().strength());
        assertEquals(0.5, stroke.sweep().softEdge());
        assertEquals(new Point(0.3, 0.7), stroke.line().get(0));
        assertEquals(new Point(0.4, 0.7), stroke.line().get(stroke.line().size() - 1));
        assertTrue(bench.windows.size() >= 2, "what is under the hand is drawn as it goes");
        assertEquals(Optional.of("Add stroke"), undoName());
    }

    /** Points that wait together in the queue make one segment. */
    @Test
    void pointsThatWaitTogetherAreDrawnTogether() {
        bench.takeUp(new Hand.Brushing(Brush.REMOVE, 0.1, 0.7, 0.5, true));
        ToolBench.onSwing(() -> {
            bench.tool.pressed(ToolBench.at(0.2, 0.6));
            bench.windows.clear();
            for (int n = 1; n <= 20; n++) {
                bench.tool.dragged(ToolBench.at(0.2 + 0.01 * n, 0.6 + 0.001 * n * n));
            }
        });
        ToolBench.onSwing(() -> assertEquals(1, bench.windows.size()));
        ToolBench.onSwing(() -> bench.tool.released(ToolBench.at(0.4, 1)));
        assertTrue(((Stroke) operations().get(1)).line().size() > 4);
    }

    @Test
    void shiftAndADragChangeTheRadiusAndDrawNothing() {
        bench.takeUp(Hand.Brushing.usual(Brush.ADD));
        bench.drag("shift", 0.3, 0.5, 0.35, 0.5, 0.4, 0.6);
        assertEquals(0.16, ((Hand.Brushing) bench.desk.state().hand()).radius(), 1e-9);
        assertEquals(1, operations().size());
    }

    /** The circles: 0.1 heights of 500 pixels are 50, and half of that is soft. */
    @Test
    void theCursorIsAsLargeAndAsSoftAsTheBrush() {
        bench.takeUp(new Hand.Brushing(Brush.ADD, 0.1, 0.7, 0.5, true));
        ToolBench.onSwing(() -> bench.tool.moved(ToolBench.at(0.3, 0.5)));
        assertTrue(bench.paintedNear(0.4, 0.5, 1) > 0);
        assertTrue(bench.paintedNear(0.3, 0.45, 4) > 0);
        assertEquals(0, bench.paintedNear(0.3, 0.5, 10));
        assertEquals(0, bench.paintedNear(0.3 + 0.075, 0.5, 8));
        ToolBench.onSwing(() -> bench.tool.exited());
        assertEquals(0, bench.paintedNear(0.4, 0.5, 3));
    }

    @Test
    void escapeDropsAStroke() {
        bench.takeUp(Hand.Brushing.usual(Brush.REMOVE));
        ToolBench.onSwing(() -> {
            bench.tool.pressed(ToolBench.at(0.3, 0.7));
            bench.tool.dragged(ToolBench.at(0.4, 0.7));
            bench.tool.cancel();
            bench.tool.dragged(ToolBench.at(0.5, 0.7));
            bench.tool.released(ToolBench.at(0.5, 0.7));
        });
        assertEquals(1, operations().size());
        assertTrue(bench.retouching.isAtRest());
    }

    @Test
    void aHandPutDownLeavesTheEaselAsItWas() {
        bench.takeUp(Hand.Brushing.usual(Brush.ADD));
        ToolBench.onSwing(() -> bench.tool.leave());
        assertNull(bench.live);
        bench.tool = null;
    }

    @Test
    void aHandleIsPulledSetAndTakenOff() {
        bench.takeUp(new Hand.Pulling(WarpKind.SPLINE));
        assertEquals(new Point(0.31, 0.8), warp(0).handles().get(0).to());
        bench.drag("", 0.311, 0.801, 0.35, 0.75, 0.4, 0.7);
        bench.await("pulled", () -> warp(0).handles().get(0).to().equals(new Point(0.4, 0.7)));
        assertEquals(Optional.of("Pull handle"), undoName());
        bench.rest();
        bench.click("", 0.2, 0.3);
        bench.await("set", () -> warp(0).handles().size() == 4);
        assertEquals(Optional.of("Set handle"), undoName());
        bench.rest();
        bench.click("ctrl", 0.2, 0.3);
        assertEquals(3, warp(0).handles().size());
        assertEquals(Optional.of("Remove handle"), undoName());
        bench.rest();
        bench.click("alt", 0.4, 0.7);
        assertEquals(3, warp(0).handles().size(), "a spline needs three");
        assertTrue(bench.desk.state().message().orElseThrow().words().contains("3"));
    }

    @Test
    void aNewHandleCanBePulledAtOnce() {
        bench.takeUp(new Hand.Pulling(WarpKind.SPLINE));
        bench.drag("", 0.2, 0.3, 0.22, 0.3, 0.25, 0.32);
        bench.await("set", () -> warp(0).handles().size() == 4);
        assertEquals(new Point(0.25, 0.32), warp(0).handles().get(3).to());
        assertEquals(Optional.of("Pull handle"), undoName());
    }

    @Test
    void behindAStrokeANewMeshBeginsWithAsManyHandlesAsItsKindNeeds() {
        bench.takeUp(Hand.Brushing.usual(Brush.REMOVE));
        bench.drag("", 0.3, 0.7, 0.35, 0.72);
        bench.takeUp(new Hand.Pulling(WarpKind.AFFINE));
        bench.click("", 0.2, 0.3);
        bench.click("", 0.2, 0.5);
        assertEquals(2, operations().size());
        assertTrue(bench.paintedNear(0.2, 0.5, 6) > 0, "a handle that waits is drawn");
        bench.click("", 0.4, 0.4);
        bench.await("there", () -> operations().size() == 3);
        assertEquals(WarpKind.AFFINE, warp(2).kind());
        assertTrue(warp(2).handles().stream().allMatch(h -> h.from().equals(h.to())));
        bench.rest();
        bench.takeUp(Hand.Brushing.usual(Brush.REMOVE));
        bench.drag("", 0.3, 0.6, 0.35, 0.62);
        bench.takeUp(new Hand.Pulling(WarpKind.AS_RIGID_AS_POSSIBLE));
        bench.drag("", 0.5, 0.6, 0.5, 0.5, 0.45, 0.5);
        bench.await("there", () -> operations().size() == 5);
        assertEquals(List.of(new Handle(new Point(0.5, 0.6), new Point(0.45, 0.5))), warp(4).handles());
    }

    /** A mesh takes a while to set up; a quick hand is not made to wait, and loses nothing. */
    @Test
    void handlesSetQuicklyAndAStrokeDrawnAtOnceAreAllThere() {
        bench.takeUp(new Hand.Pulling(WarpKind.SPLINE));
        ToolBench.onSwing(() -> {
            for (double y = 0.2; y < 0.65; y += 0.1) {
                bench.tool.pressed(ToolBench.at(0.2, y));
                bench.tool.released(ToolBench.at(0.2, y));
            }
        });
        bench.await("all are set", () -> warp(0).handles().size() == 8);
        bench.rest();
        ToolBench.onSwing(() -> {
            bench.tool.pressed(ToolBench.at(0.45, 0.5));
            bench.tool.released(ToolBench.at(0.45, 0.5));
            bench.tool.leave();
            bench.desk.look(s -> s.withHand(Hand.Brushing.usual(Brush.REMOVE)));
            bench.tool = Tools.of(bench.desk.state().hand(), bench.desk, bench.retouching, bench);
            bench.tool.pressed(ToolBench.at(0.3, 0.7));
            bench.tool.dragged(ToolBench.at(0.35, 0.7));
        });
        bench.await("the handle is set", () -> warp(0).handles().size() == 9);
        ToolBench.onSwing(() -> {
            bench.tool.dragged(ToolBench.at(0.4, 0.7));
            bench.tool.released(ToolBench.at(0.4, 0.7));
        });
        assertEquals(2, operations().size());
        assertEquals(new Point(0.4, 0.7), ((Stroke) operations().get(1)).line().get(((Stroke) operations().get(1)).line().size() - 1));
        bench.rest();
    }

    @Test
    void handlesAreDrawnAndTheOneUnderThePointerHasARing() {
        bench.takeUp(new Hand.Pulling(WarpKind.SPLINE));
        assertTrue(bench.paintedNear(0.3, 0.98, 4) > 20, "a pin is a dot");
        int before = bench.paintedNear(0.31, 0.8, 12);
        assertTrue(before > 20, "an arrow");
        ToolBench.onSwing(() -> bench.tool.moved(ToolBench.at(0.31, 0.8)));
        assertTrue(bench.paintedNear(0.31, 0.8, 12) > before + 40);
    }

    @Test
    void foldsAreShown() {
        bench.takeUp(new Hand.Pulling(WarpKind.SPLINE));
        bench.drag("", 0.31, 0.8, 0.3, 0.97, 0.38, 1.15);
        bench.await("pulled", () -> warp(0).handles().get(0).to().y() > 1.1);
        bench.await("folds", () -> bench.retouching.folds().cells() > 0);
    }

    @Test
    void theOutlineIsDraggedFromAnyPlaceOfItsLine() {
        bench.takeUp(new Hand.Outlining(0.3, 0.15));
        bench.await("traced", () -> bench.retouching.outlines().isPresent());
        Loop loop = bench.retouching.outlines().orElseThrow().loops().get(0);
        Point on = new Point((loop.x()[0] + loop.x()[1]) / 2, (loop.y()[0] + loop.y()[1]) / 2);
        assertTrue(bench.paintedNear(on.x(), on.y(), 3) > 0);
        bench.drag("", on.x() + 0.004, on.y(), on.x() + 0.02, on.y() - 0.02, on.x() + 0.02, on.y() - 0.06);
        bench.await("dragged", () -> operations().size() == 2);
        OutlineWarp warp = (OutlineWarp) operations().get(1);
        assertEquals(0.3, warp.level());
        assertEquals(0.15, warp.reach());
        assertEquals(0, warp.drags().get(0).from().distanceTo(on), 0.008);
        assertEquals(new Point(on.x() + 0.02, on.y() - 0.06), warp.drags().get(0).to());
        assertEquals(Optional.of("Drag outline"), undoName());
        bench.rest();
        bench.drag("", on.x() + 0.02, on.y() - 0.06, on.x(), on.y() - 0.05);
        assertEquals(new Point(on.x(), on.y() - 0.05), ((OutlineWarp) operations().get(1)).drags().get(0).to());
        bench.rest();
        bench.click("ctrl", on.x(), on.y() - 0.05);
        assertEquals(1, operations().size());
        bench.rest();
        bench.click("", on.x(), on.y());
        assertEquals(1, operations().size(), "a click on the line changes nothing");
    }

    private List<Hold> holds() {
        return bench.retouching.note().orElseThrow().holds();
    }

    @Test
    void regionsThatMustStayAreDrawnChosenAndRemoved() {
        bench.takeUp(new Hand.Holding(Hand.Form.RECTANGLE, 0.04));
        assertEquals(1, holds().size());
        bench.drag("", 0.5, 0.5, 0.4, 0.3, 0.3, 0.2);
        assertEquals(Optional.of(new Region.Rectangle(0.3, 0.2, 0.5, 0.5, 0.04)), holds().get(1).region().map(m -> (Region) m));
        assertTrue(holds().get(1).isOf(1004));
        assertEquals(OptionalInt.of(1), bench.retouching.chosenHold());
        assertEquals(Optional.of("Add hold"), undoName());
        ToolBench.onSwing(() -> bench.desk.look(s -> s.withHand(new Hand.Holding(Hand.Form.ELLIPSE, 0))));
        bench.drag("", 0.35, 0.25, 0.4, 0.3, 0.45, 0.35);
        Region.Ellipse ellipse = (Region.Ellipse) holds().get(2).region().orElseThrow();
        assertEquals(0, ellipse.centre().distanceTo(new Point(0.4, 0.3)), 1e-12);
        assertEquals(0.05, ellipse.radiusX(), 1e-12);
        ToolBench.onSwing(() -> bench.desk.look(s -> s.withHand(new Hand.Holding(Hand.Form.FREEHAND, 0))));
        bench.drag("", 0.1, 0.1, 0.2, 0.1, 0.2, 0.2, 0.1, 0.15);
        assertEquals(List.of(new Point(0.1, 0.1), new Point(0.2, 0.1), new Point(0.2, 0.2), new Point(0.1, 0.15)),
                ((Region.Polygon) holds().get(3).region().orElseThrow()).outline());
        bench.click("", 0.4, 0.3);
        assertEquals(OptionalInt.of(2), bench.retouching.chosenHold(), "of two that lie there, the smaller");
        bench.click("", 0.6, 0.05);
        assertEquals(OptionalInt.empty(), bench.retouching.chosenHold());
        assertEquals(4, holds().size());
        assertTrue(bench.paintedNear(0.5, 0.35, 4) > 0);
        assertFalse(bench.paintedNear(0.6, 0.05, 4) > 0);
    }

    @Test
    void awayFromTheNoteHandsDoNothing() {
        bench.takeUp(Hand.Brushing.usual(Brush.REMOVE));
        ToolBench.onSwing(() -> bench.desk.show(s -> s.withFrame(1005)));
        for (Hand hand : List.of(Hand.Brushing.usual(Brush.ADD), new Hand.Pulling(WarpKind.SPLINE), new Hand.Outlining(0.3, 0.2),
                new Hand.Holding(Hand.Form.RECTANGLE, 0), Hand.LOOK)) {
            ToolBench.onSwing(() -> {
                bench.tool.leave();
                bench.desk.look(s -> s.withHand(hand));
                bench.tool = Tools.of(hand, bench.desk, bench.retouching, bench);
            });
            ToolBench.onSwing(() -> bench.tool.moved(ToolBench.at(0.31, 0.8)));
            bench.drag("", 0.31, 0.8, 0.4, 0.7, 0.5, 0.6);
            bench.click("ctrl", 0.31, 0.8);
            bench.painted();
        }
        assertTrue(bench.desk.state().history().made().isEmpty());
    }
}

package org.wispwright.ui.desk;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotSame;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.desk.Pictures.Ask;
import org.wispwright.ui.desk.Retouching.Edit;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.Progress;
import org.wispwright.ui.job.SimulateWork;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Window;
import org.wispwright.warp.outline.Loop;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.OutlineWarp;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Retoucher;
import org.wispwright.warp.retouch.Stroke;
import org.wispwright.warp.retouch.WarpKind;

/**
 * A retouch under a hand, without a window. Expectations: the live picture at rest is {@link Retoucher#wanted} of the note's operations, to
 * the bit, by that method's own words; the rest ours, by the session's words.
 */
class RetouchingTest {
    @TempDir
    private static Path once;
    private final DeskThread thread = new DeskThread();
    private Desk desk;
    private Retouching retouching;
    private final Followed followed = new Followed();

    private static final class Followed implements Retouching.Follower {
        private final List<Optional<Picture>> pictures = new ArrayList<>();
        private final List<Window> windows = new ArrayList<>();
        private int rests;

        @Override
        public void live(Optional<Picture> picture) {
            pictures.add(picture);
        }

        @Override
        public void changed(Window pixels) {
            windows.add(pixels);
        }

        @Override
        public void rested() {
            rests++;
        }
    }

    @BeforeAll
    static void shot() {
        ShotFolder shot = ShotFolder.open(SmallShot.in(once).folder());
        try (Lanes lanes = new Lanes(1)) {
            SimulateWork.run(shot, ShotCheck.requireForNotes(shot), lanes, Progress.SILENT, new Cancel());
        }
    }

    @BeforeEach
    void opened() {
        desk = new Desk(thread.workers());
        desk.open(once);
        thread.until("the shot is open", () -> desk.state().shot().isPresent());
        retouching = new Retouching(desk, kind -> "name of " + kind);
        retouching.listen(followed);
    }

    @AfterEach
    void putBack() {
        retouching.cancel();
        while (!desk.state().history().made().isEmpty()) {
            desk.undo();
        }
        thread.until("all is written", () -> desk.state().saving().isDone());
        desk.close();
    }

    private void takeUp(Hand hand) {
        desk.look(s -> s.withHand(hand));
        thread.until("the live picture is there", retouching::isAtRest);
    }

    private Picture wanted() {
        Picture original = desk.pictures().draw(desk.state().shot().orElseThrow(), new Ask(Source.ORIGINAL, "front", 1004, 0),
                new Cancel());
        return Retoucher.wanted(new Retouch(retouching.operations()), original);
    }

    private void assertWanted() {
        thread.until("at rest", retouching::isAtRest);
        assertArrayEquals(wanted().rgba(), retouching.live().orElseThrow().rgba());
    }

    private static Stroke dab(Brush brush, double x, double y) {
        return new Stroke(brush, 0.1, 0.8, 0.7, List.of(new Point(x, y)), Optional.empty());
    }

    @Test
    void nothingIsMadeReadyForAHandThatLooks() {
        assertTrue(retouching.live().isEmpty());
        assertTrue(retouching.draw(dab(Brush.ADD, 0.4, 0.6)).isEmpty());
        takeUp(Hand.Brushing.usual(Brush.ADD));
        assertWanted();
    }

    @Test
    void aStrokeIsShownAsItIsDrawnAndTheNoteHasItUnderItsName() {
        takeUp(Hand.Brushing.usual(Brush.REMOVE));
        Picture live = retouching.live().orElseThrow();
        Drawing drawing = retouching.draw(dab(Brush.REMOVE, 0.3, 0.7)).orElseThrow();
        assertEquals(1, followed.windows.size());
        drawing.extend(List.of(new Point(0.35, 0.72), new Point(0.4, 0.7)), List.of(1.0, 0.5));
        assertEquals(2, followed.windows.size());
        assertFalse(java.util.Arrays.equals(wanted().rgba(), live.rgba()));
        drawing.end();
        assertEquals(2, retouching.operations().size());
        assertEquals(Optional.of("name of ADD_STROKE"), desk.state().history().undoName());
        assertTrue(retouching.isAtRest(), "a stroke just drawn needs no drawing anew");
        assertSame(live, retouching.live().orElseThrow());
        assertWanted();
    }

    @Test
    void undoAndRedoAreFollowed() {
        takeUp(Hand.Brushing.usual(Brush.REMOVE));
        float[] before = wanted().rgba();
        retouching.draw(dab(Brush.REMOVE, 0.35, 0.7)).orElseThrow().end();
        float[] after = retouching.live().orElseThrow().rgba().clone();
        assertFalse(java.util.Arrays.equals(before, after));
        desk.undo();
        assertFalse(retouching.isAtRest());
        thread.until("drawn anew", retouching::isAtRest);
        assertArrayEquals(before, retouching.live().orElseThrow().rgba());
        desk.redo();
        thread.until("drawn anew", retouching::isAtRest);
        assertArrayEquals(after, retouching.live().orElseThrow().rgba());
    }

    @Test
    void aStrokeCancelledLeavesNothing() {
        takeUp(Hand.Brushing.usual(Brush.REMOVE));
        Drawing drawing = retouching.draw(dab(Brush.REMOVE, 0.35, 0.7)).orElseThrow();
        drawing.extend(List.of(new Point(0.4, 0.6)), List.of(1.0));
        retouching.cancel();
        drawing.extend(List.of(new Point(0.5, 0.6)), List.of(1.0));
        drawing.end();
        assertTrue(desk.state().history().made().isEmpty());
        assertWanted();
    }

    @Test
    void whatIsDrawnBeforeThePictureIsThereIsNotLost() {
        takeUp(Hand.Brushing.usual(Brush.REMOVE));
        retouching.draw(dab(Brush.REMOVE, 0.35, 0.7)).orElseThrow().end();
        desk.undo();
        Drawing waits = retouching.draw(dab(Brush.REMOVE, 0.3, 0.6)).orElseThrow();
        waits.extend(List.of(new Point(0.4, 0.6)), List.of(1.0));
        thread.until("drawn anew", retouching::isLaid);
        assertFalse(java.util.Arrays.equals(wanted().rgba(), retouching.live().orElseThrow().rgba()));
        waits.end();
        assertEquals(2, retouching.operations().size());
        assertWanted();
        desk.undo();
        retouching.draw(dab(Brush.REMOVE, 0.3, 0.65)).orElseThrow().end();
        assertEquals(2, retouching.operations().size());
        assertWanted();
    }

    @Test
    void undoDropsAStrokeThatIsBeingDrawn() {
        takeUp(Hand.Brushing.usual(Brush.REMOVE));
        retouching.draw(dab(Brush.REMOVE, 0.35, 0.7)).orElseThrow().end();
        Drawing drawing = retouching.draw(dab(Brush.REMOVE, 0.3, 0.6)).orElseThrow();
        desk.undo();
        drawing.end();
        assertEquals(1, retouching.operations().size());
        assertWanted();
    }

    @Test
    void whatChangesNothingIsNoEdit() {
        takeUp(Hand.Brushing.usual(Brush.PUSH));
        retouching.draw(dab(Brush.PUSH, 0.35, 0.7)).orElseThrow().end();
        retouching.draw(dab(Brush.ADD, 3, 3)).orElseThrow().end();
        retouching.pull(0, warp(), 1).orElseThrow().end();
        thread.until("at rest", retouching::isAtRest);
        assertTrue(desk.state().history().made().isEmpty());
    }

    private MeshWarp warp() {
        return (MeshWarp) retouching.operations().get(0);
    }

    @Test
    void aHandleIsPulledWithThePictureBehindItAndRestIsTheWish() {
        takeUp(new Hand.Pulling(WarpKind.SPLINE));
        Picture rest = retouching.live().orElseThrow();
        Pulling pulling = retouching.pull(0, warp(), 0).orElseThrow();
        thread.until("the warp is ready", () -> retouching.live().orElseThrow() != rest);
        float[] before = retouching.live().orElseThrow().rgba().clone();
        pulling.to(new Point(0.45, 0.75));
        assertFalse(java.util.Arrays.equals(before, retouching.live().orElseThrow().rgba()));
        pulling.to(warp().handles().get(1).to());
        assertEquals(new Point(0.45, 0.75), pulling.warp().handles().get(0).to(), "a handle cannot lie upon another");
        pulling.end();
        assertEquals(new Point(0.45, 0.75), warp().handles().get(0).to());
        assertEquals(1, retouching.operations().size());
        assertEquals(Optional.of("name of PULL_HANDLE"), desk.state().history().undoName());
        assertWanted();
        assertNotSame(rest, retouching.live().orElseThrow());
    }

    @Test
    void aWarpDeeperInTheListIsPulledAndWhatComesAfterIsThereAtRest() {
        takeUp(new Hand.Pulling(WarpKind.SPLINE));
        retouching.draw(dab(Brush.REMOVE, 0.35, 0.7)).orElseThrow().end();
        Pulling pulling = retouching.pull(0, warp(), 0).orElseThrow();
        pulling.to(new Point(0.42, 0.75));
        pulling.end();
        thread.until("the note has it", () -> warp().handles().get(0).to().equals(new Point(0.42, 0.75)));
        assertTrue(retouching.operations().get(1) instanceof Stroke);
        assertWanted();
    }

    @Test
    void aNewHandleLeavesThePictureNearlyAsItIs() {
        takeUp(new Hand.Pulling(WarpKind.SPLINE));
        Picture before = wanted();
        retouching.pullNew(0, warp(), new Point(0.34, 0.84)).orElseThrow().end();
        thread.until("the note has it", () -> warp().handles().size() == 4);
        assertEquals(Optional.of("name of SET_HANDLE"), desk.state().history().undoName());
        assertWanted();
        // The spline through three points is affine, and the fourth lies on it but for half a pixel's reading of the lattice.
        assertEquals(0, apart(before, wanted()), 2e-3);
        Handle set = warp().handles().get(3);
        assertEquals(new Point(0.34, 0.84), set.to());
        assertTrue(set.from().distanceTo(set.to()) > 0.02, "the place came from elsewhere");
    }

    @Test
    void aPullCancelledLeavesNothing() {
        takeUp(new Hand.Pulling(WarpKind.SPLINE));
        Pulling pulling = retouching.pull(0, warp(), 0).orElseThrow();
        Picture rest = retouching.live().orElseThrow();
        thread.until("the warp is ready", () -> retouching.live().orElseThrow() != rest);
        pulling.to(new Point(0.45, 0.75));
        retouching.cancel();
        assertSame(rest, retouching.live().orElseThrow());
        assertTrue(desk.state().history().made().isEmpty());
        assertWanted();
    }

    @Test
    void theOutlineIsTracedAndDragged() {
        takeUp(new Hand.Outlining(0.3, 0.2));
        retouching.trace(0.3);
        thread.until("outlines are there", () -> retouching.outlines().isPresent());
        Loop loop = retouching.outlines().orElseThrow().loops().get(0);
        Point from = new Point(loop.x()[0], loop.y()[0]);
        Picture rest = retouching.live().orElseThrow();
        OutlineWarp start = new OutlineWarp(0.3, List.of(Handle.pin(from)), 0.2, WarpKind.SPLINE, Optional.empty());
        OutlineDrag drag = retouching.drag(1, start, 0).orElseThrow();
        drag.to(new Point(from.x(), from.y() - 0.05));
        thread.until("it follows", () -> retouching.live().orElseThrow() != rest);
        drag.end();
        assertEquals(2, retouching.operations().size());
        assertEquals(Optional.of("name of DRAG_OUTLINE"), desk.state().history().undoName());
        assertWanted();
    }

    @Test
    void foldsOfAWarpThatTurnsThePictureOverAreFound() {
        takeUp(new Hand.Pulling(WarpKind.SPLINE));
        retouching.fold(Optional.of(warp()));
        thread.until("asked", () -> followed.rests > 1);
        assertEquals(0, retouching.folds().cells());
        Operation over = new MeshWarp(List.of(new Handle(new Point(0.3, 0.5), new Point(0.5, 0.5)), new Handle(new Point(0.4, 0.5),
                new Point(0.2, 0.5)), Handle.pin(new Point(0.1, 0.1)), Handle.pin(new Point(0.6, 0.9))), Optional.empty());
        retouching.fold(Optional.of(over));
        thread.until("folds are found", () -> retouching.folds().cells() > 0);
    }

    @Test
    void leavingTheNoteLeavesThePicture() {
        takeUp(Hand.Brushing.usual(Brush.ADD));
        desk.show(s -> s.withFrame(1005));
        assertTrue(retouching.live().isEmpty());
        assertEquals(Optional.empty(), followed.pictures.get(followed.pictures.size() - 1));
        assertTrue(retouching.draw(dab(Brush.ADD, 0.4, 0.6)).isEmpty());
        desk.show(s -> s.withFrame(1004));
        assertWanted();
    }

    @Test
    void aPlainEditHasItsNameAndARefusedOneIsSaid() {
        takeUp(Hand.Brushing.usual(Brush.ADD));
        retouching.edit(Edit.REMOVE_STEP, operations -> List.of());
        assertEquals(Optional.of("name of REMOVE_STEP"), desk.state().history().undoName());
        assertWanted();
        List<Operation> tooMany = java.util.Collections.nCopies(Retouch.MOST_OPERATIONS + 1, dab(Brush.ADD, 0.1, 0.1));
        retouching.edit(Edit.MOVE_STEP, operations -> tooMany);
        assertTrue(desk.state().message().filter(m -> m.kind() == Message.Kind.FAULT).isPresent());
        assertTrue(retouching.operations().isEmpty());
    }

    private static double apart(Picture a, Picture b) {
        double worst = 0;
        for (int n = 0; n < a.rgba().length; n++) {
            worst = Math.max(worst, Math.abs(a.rgba()[n] - b.rgba()[n]));
        }
        return worst;
    }
}

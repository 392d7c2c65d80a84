package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.outline.Outlines;

/** Outlines dragged, on a disc whose outline at every level is a circle known by its formula. */
class OutlineWarpTest {
    private static final double LEVEL = 0.3;

    /** Opacity {@code exp(-(r / 0.22)^4)} about (0.4, 0.5): the outline at level L is the circle of radius 0.22 (-ln L)^(1/4). */
    private static Picture disc(int rows) {
        Picture picture = new Picture(rows * 4 / 5, rows);
        for (int p = 0; p < picture.width() * rows; p++) {
            double r = Math.hypot((p % picture.width() + 0.5) / rows - 0.4, (p / picture.width() + 0.5) / rows - 0.5);
            Arrays.fill(picture.rgba(), 4 * p, 4 * p + 4, (float) Math.exp(-Math.pow(r / 0.22, 4)));
        }
        return picture;
    }

    private static double radius(double level) {
        return 0.22 * Math.pow(-Math.log(level), 0.25);
    }

    private static OutlineWarp pull(WarpKind inside, double offOutline) {
        Point top = new Point(0.4, 0.5 - radius(LEVEL) - offOutline);
        return new OutlineWarp(LEVEL, List.of(new Handle(top, new Point(top.x() + 0.02, top.y() - 0.06))), 0.1, inside, Optional.empty());
    }

    private static Picture wanted(OutlineWarp warp, Picture picture) {
        return Retoucher.wanted(new Retouch(List.of(warp)), picture);
    }

    /** By the formula: one loop, its points on the circle, its area nearly the circle's; few points. */
    @Test
    void outlinesOfADisc() {
        Outlines outlines = Outlines.of(disc(256), LEVEL);
        assertEquals(1, outlines.loops().size());
        var loop = outlines.loops().get(0);
        assertTrue(loop.size() >= 12 && loop.size() < 100, "points: " + loop.size());
        for (int n = 0; n < loop.size(); n++) {
            assertEquals(radius(LEVEL), Math.hypot(loop.x()[n] - 0.4, loop.y()[n] - 0.5), 5e-4);
        }
        assertEquals(Math.PI * radius(LEVEL) * radius(LEVEL), loop.signedArea(), 0.01 * loop.signedArea());
        assertTrue(outlines.nearest(0.4, 0.5, 0.1).isEmpty());
        assertEquals(0.5 - radius(LEVEL), outlines.nearest(0.4, 0.2, 0.3).orElseThrow().y(), 1.5e-3);
        assertTrue(Outlines.of(new Picture(20, 20), LEVEL).loops().isEmpty());
    }

    /** The outline passes through the drag's end, its other side stays to the bit, and the mass grows: it was pulled outwards. */
    @ParameterizedTest
    @EnumSource(WarpKind.class)
    void theOutlineComesWithTheDragAndTheRestStays(WarpKind inside) {
        Picture original = disc(256);
        OutlineWarp warp = pull(inside, 0);
        Picture wanted = wanted(warp, original);
        Point to = warp.drags().get(0).to();
        var there = Outlines.of(wanted, LEVEL).nearest(to.x(), to.y(), 0.1).orElseThrow();
        assertEquals(0, Math.hypot(there.x() - to.x(), there.y() - to.y()), 1.5 / 256, inside + " ends at " + there);
        int moved = 0;
        for (int p = 0; p < original.width() * 256; p++) {
            double distance = warp.distance((p % original.width() + 0.5) / 256, (p / original.width() + 0.5) / 256);
            for (int n = 4 * p; n < 4 * p + 4; n++) {
                float now = wanted.rgba()[n];
                assertTrue(now >= 0 && now <= 1);
                if (distance > 0.21) {
                    assertEquals(original.rgba()[n], now, "a place beyond two reaches moved");
                }
                moved += now != original.rgba()[n] ? 1 : 0;
            }
        }
        assertTrue(moved > 1000);
        // Outline more than a reach away is pinned: the circle's sides at the height of its middle.
        var side = Outlines.of(wanted, LEVEL).nearest(0.4 + radius(LEVEL), 0.5, 0.1).orElseThrow();
        assertEquals(0.4 + radius(LEVEL), side.x(), 2e-3);
        // A mesh is pinched at single corners by a drag of two of its cells; the smooth kinds are not.
        assertTrue(Folds.of(warp, original).cells() <= (inside == WarpKind.AS_RIGID_AS_POSSIBLE ? 4 : 0), inside + " folds");
    }

    /** A drag drawn beside the outline, as on a picture of another take, takes hold of the nearest point of the outline there is. */
    @Test
    void aDragBesideTheOutlineTakesHoldOfIt() {
        Picture original = disc(256);
        Picture on = wanted(pull(WarpKind.SPLINE, 0), original);
        Picture beside = wanted(pull(WarpKind.SPLINE, 0.02), original);
        Point to = new Point(0.42, 0.5 - radius(LEVEL) - 0.06);
        for (Picture picture : List.of(on, beside)) {
            var there = Outlines.of(picture, LEVEL).nearest(to.x(), to.y(), 0.1).orElseThrow();
            assertEquals(0, Math.hypot(there.x() - to.x(), there.y() - to.y()), 1.5 / 256);
        }
    }

    @Test
    void nothingDraggedOrNothingThereIsNothingChanged() {
        Picture original = disc(64);
        Point top = new Point(0.4, 0.25);
        OutlineWarp still = new OutlineWarp(LEVEL, List.of(Handle.pin(top)), 0.1, WarpKind.SPLINE, Optional.empty());
        assertTrue(still.changesNothing());
        assertArrayEquals(original.rgba(), wanted(still, original).rgba());
        assertArrayEquals(new float[4 * 51 * 64], wanted(pull(WarpKind.SPLINE, 0), new Picture(51, 64)).rgba());
    }

    /** Where it changes the picture noticeably, it says that it touches it; far away it does not. */
    @Test
    void touchedCoversTheChange() {
        Picture original = disc(128);
        Retouch retouch = new Retouch(List.of(pull(WarpKind.RIGID, 0)));
        Picture wanted = Retoucher.wanted(retouch, original);
        float[] touched = Retoucher.touched(retouch, original, 0.04);
        for (int p = 0; p < touched.length; p++) {
            if (Math.abs(original.rgba()[4 * p] - wanted.rgba()[4 * p]) > 0.02) {
                assertTrue(touched[p] > 0.5, "(" + p % 102 + ", " + p / 102 + ") at weight " + touched[p]);
            }
        }
        assertEquals(0f, touched[51 + 102 * 110]);
    }

    @Test
    void refusals() {
        Handle drag = new Handle(new Point(0.4, 0.2), new Point(0.4, 0.1));
        assertRefused("level", () -> new OutlineWarp(1, List.of(drag), 0.1, WarpKind.SPLINE, Optional.empty()));
        assertRefused("level", () -> new OutlineWarp(Double.NaN, List.of(drag), 0.1, WarpKind.SPLINE, Optional.empty()));
        assertRefused("reach", () -> new OutlineWarp(0.5, List.of(drag), 0, WarpKind.SPLINE, Optional.empty()));
        assertRefused("drags", () -> new OutlineWarp(0.5, List.of(), 0.1, WarpKind.SPLINE, Optional.empty()));
        assertRefused("same 'from'", () -> new OutlineWarp(0.5, List.of(drag, drag), 0.1, WarpKind.SPLINE, Optional.empty()));
        assertRefused("cells", () -> new Cells(2, 20));
        assertRefused("no corner", () -> new HandleGrid(2, 2, 0, 0, 1, 1, List.of(new HandleGrid.Moved(3, 0, drag.to()))));
        assertRefused("twice", () -> new HandleGrid(2, 2, 0, 0, 1, 1,
                List.of(new HandleGrid.Moved(1, 0, drag.to()), new HandleGrid.Moved(1, 0, drag.from()))));
        assertRefused("at most 500 corners", () -> new HandleGrid(30, 30, 0, 0, 1, 1, List.of()));
        assertRefused("left < right", () -> new HandleGrid(2, 2, 1, 0, 1, 1, List.of()));
        assertRefused("needs 3 to", () -> new MeshWarp(WarpKind.AFFINE, List.of(drag), Cells.USUAL, Optional.empty()));
        assertEquals(1, new MeshWarp(WarpKind.RIGID, List.of(drag), Cells.USUAL, Optional.empty()).handles().size());
    }

    private static void assertRefused(String says, Runnable making) {
        String message = assertThrows(IllegalArgumentException.class, making::run).getMessage();
        assertTrue(message.contains(says), message);
    }
}

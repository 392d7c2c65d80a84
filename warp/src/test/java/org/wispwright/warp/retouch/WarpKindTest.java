package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;

/** What every kind of mesh warp owes, and folds by hand. */
class WarpKindTest {
    private static final int ROWS = 128;
    private static final Region MIDDLE = new Region.Rectangle(0.15, 0.2, 0.6, 0.8, 0.1);

    /** The centre of a pixel at {@value #ROWS} rows. */
    private static Point centre(int x, int y) {
        return new Point((x + 0.5) / ROWS, (y + 0.5) / ROWS);
    }

    private static List<Handle> pulled() {
        List<Handle> handles = new ArrayList<>();
        handles.add(new Handle(centre(40, 50), centre(52, 45)));
        handles.add(new Handle(centre(55, 70), centre(60, 72)));
        for (int[] pin : new int[][] {{30, 90}, {70, 100}, {2, 2}, {93, 2}, {2, 125}, {93, 125}}) {
            handles.add(Handle.pin(centre(pin[0], pin[1])));
        }
        return handles;
    }

    private static MeshWarp warp(WarpKind kind, List<Handle> handles, Optional<Matte> within) {
        return new MeshWarp(kind, handles, Cells.USUAL, within);
    }

    private static Picture flat(float value) {
        Picture picture = new Picture(96, ROWS);
        Arrays.fill(picture.rgba(), value);
        return picture;
    }

    private static Picture wanted(Operation operation, Picture picture) {
        return Retoucher.wanted(new Retouch(List.of(operation)), picture);
    }

    /** Every kind interpolates its handles (the three papers): the source of a handle's end is its start, of a pin the pin. */
    @ParameterizedTest
    @EnumSource(WarpKind.class)
    void aHandleLandsExactlyAndAPinStays(WarpKind kind) {
        Bend bend = Bend.of(warp(kind, pulled(), Optional.empty()), flat(0.5f));
        double[] dx = new double[96];
        double[] dy = new double[96];
        for (Handle handle : pulled()) {
            int x = (int) (handle.to().x() * ROWS);
            int y = (int) (handle.to().y() * ROWS);
            bend.displacements(y, dx, dy);
            assertEquals((handle.from().x() - handle.to().x()) * ROWS, dx[x], 1e-4, kind + " " + handle);
            assertEquals((handle.from().y() - handle.to().y()) * ROWS, dy[x], 1e-4, kind + " " + handle);
        }
    }

    /** Each pixel has a source and the kernel's weights sum to 1 (W29), so something flat stays flat: no holes, no doubling. */
    @ParameterizedTest
    @EnumSource(WarpKind.class)
    void aFlatPictureStaysFlat(WarpKind kind) {
        Picture free = wanted(warp(kind, pulled(), Optional.empty()), flat(0.5f));
        for (int p = 0; p < 96 * ROWS; p++) {
            if (p % 96 > 14 && p % 96 < 82 && p / 96 > 14 && p / 96 < ROWS - 14) {
                assertEquals(0.5, free.rgba()[4 * p + 3], 1e-6, kind + " at " + p % 96 + ", " + p / 96);
            }
        }
        Picture held = wanted(warp(kind, pulled(), Optional.of(MIDDLE)), flat(0.5f));
        for (int p = 0; p < 96 * ROWS; p++) {
            if (p % 96 > 14 && p % 96 < 82 && p / 96 > 14 && p / 96 < ROWS - 14 || kind == WarpKind.AS_RIGID_AS_POSSIBLE) {
                assertEquals(0.5, held.rgba()[4 * p], 1e-6, kind + " within, at " + p % 96 + ", " + p / 96);
            }
        }
    }

    /** Handles that all move alike: every kind reproduces a shift, and by whole pixels that is a copy (W31). */
    @ParameterizedTest
    @EnumSource(WarpKind.class)
    void aShiftByWholePixelsIsACopy(WarpKind kind) {
        Picture original = RetoucherTest.smoke(ROWS);
        List<Handle> handles = new ArrayList<>();
        for (int[] p : new int[][] {{20, 20}, {70, 20}, {40, 110}, {50, 60}}) {
            handles.add(new Handle(centre(p[0], p[1]), centre(p[0] - 5, p[1] + 3)));
        }
        Picture wanted = wanted(warp(kind, handles, Optional.empty()), original);
        for (int y = 6; y < 120; y++) {
            for (int x = 6; x < 80; x++) {
                for (int c = 0; c < 4; c++) {
                    assertEquals(original.at(x + 5, y - 3, c), wanted.at(x, y, c), 2e-5, kind + " at " + x + ", " + y);
                }
            }
        }
        // What the mesh leaves of the frame is clear: nothing comes from beyond, as for the other kinds.
        assertEquals(0, wanted(warp(kind, handles, Optional.empty()), flat(1f)).at(94, 60, 3), 1e-5);
    }

    /** The kinds are not each other: on one pull no two agree. */
    @Test
    void noTwoKindsAgree() {
        Picture original = RetoucherTest.smoke(ROWS);
        List<Picture> all = new ArrayList<>();
        for (WarpKind kind : WarpKind.values()) {
            Picture one = wanted(warp(kind, pulled(), Optional.empty()), original);
            for (Picture other : all) {
                double most = 0;
                for (int n = 0; n < one.rgba().length; n++) {
                    most = Math.max(most, Math.abs(one.rgba()[n] - other.rgba()[n]));
                }
                assertTrue(most > 0.01, kind + " differs by " + most);
            }
            all.add(one);
        }
    }

    /** Pulled across two pins, every kind folds, and still: finite, 0 to 1, a flat picture no higher than the kernel's own overshoot at
     * the frame's border: with one lobe cut off the weights sum to at most 1 + 2/27 along an axis (t = 1/3), so 0.5 (29/27)^2. */
    @ParameterizedTest
    @EnumSource(WarpKind.class)
    void whereItFoldsThePictureStaysSound(WarpKind kind) {
        List<Handle> handles = pulled();
        handles.set(0, new Handle(centre(40, 50), centre(80, 115)));
        handles.set(1, new Handle(centre(55, 70), centre(15, 100)));
        MeshWarp warp = warp(kind, handles, Optional.empty());
        Folds folds = Folds.of(warp, flat(0.5f));
        assertTrue(folds.cells() > 0 && folds.worstJacobian() < 0 && folds.worst().isPresent(), kind + " " + folds);
        assertFalse(folds.places().isEmpty());
        for (float value : wanted(warp, flat(0.5f)).rgba()) {
            assertTrue(value >= 0 && value <= 0.5769, kind + ": " + value);
        }
        for (float value : wanted(warp, RetoucherTest.smoke(ROWS)).rgba()) {
            assertTrue(value >= 0 && value <= 1, kind + ": " + value);
        }
    }

    @ParameterizedTest
    @EnumSource(WarpKind.class)
    void aGentlePullDoesNotFold(WarpKind kind) {
        List<Handle> handles = pulled();
        handles.set(0, new Handle(centre(40, 50), centre(44, 49)));
        handles.set(1, new Handle(centre(55, 70), centre(57, 71)));
        Folds folds = Folds.of(warp(kind, handles, Optional.empty()), flat(0.5f));
        assertEquals(0, folds.cells(), kind + " " + folds);
        assertTrue(folds.worstJacobian() > 0 && folds.worstJacobian() < 1, kind + " " + folds);
        assertTrue(folds.worst().isEmpty());
    }

    /** By hand: mirrored at x = 0.4 the Jacobian is -1 in each of 95 x 127 cells; twice as large, that of the way back is 1/4. */
    @Test
    void jacobiansByHand() {
        Point[] from = {new Point(0.2, 0.2), new Point(0.6, 0.2), new Point(0.4, 0.8)};
        List<Handle> mirrored = new ArrayList<>();
        List<Handle> doubled = new ArrayList<>();
        for (Point p : from) {
            mirrored.add(new Handle(p, new Point(0.8 - p.x() + 0.01 * p.y(), p.y())));
            doubled.add(new Handle(p, new Point(2 * p.x() - 0.4, 2 * p.y() - 0.4)));
        }
        Folds all = Folds.of(warp(WarpKind.AFFINE, mirrored, Optional.empty()), flat(0.5f));
        assertEquals(95 * 127, all.cells());
        assertEquals(-1, all.worstJacobian(), 1e-9);
        assertEquals(Folds.MOST_PLACES, all.places().size());
        Folds none = Folds.of(warp(WarpKind.AFFINE, doubled, Optional.empty()), flat(0.5f));
        assertEquals(0, none.cells());
        assertEquals(0.25, none.worstJacobian(), 1e-9);
        Retouch both = new Retouch(List.of(warp(WarpKind.AFFINE, doubled, Optional.empty()),
                warp(WarpKind.AFFINE, mirrored, Optional.empty())));
        assertEquals(95 * 127, Folds.of(both, flat(0.5f)).cells());
        assertEquals(-1, Folds.of(both, flat(0.5f)).worstJacobian(), 1e-9);
    }

    /** By hand: 2 x 1 cells have 3 x 2 corners; the one moved is entry 1 + 3 * 1, the others are pins. */
    @Test
    void aGridIsHandlesByHand() {
        List<Handle> handles = new HandleGrid(2, 1, 0.1, 0.2, 0.5, 0.6, List.of(new HandleGrid.Moved(1, 1, new Point(0.35, 0.5))))
                .handles();
        assertEquals(6, handles.size());
        assertEquals(0, handles.get(4).from().distanceTo(new Point(0.3, 0.6)), 1e-12);
        assertEquals(new Point(0.35, 0.5), handles.get(4).to());
        assertEquals(Handle.pin(new Point(0.5, 0.2)), handles.get(2));
        // A region's box with half its feather around: 0.15 - 0.05, 0.2 - 0.05.
        HandleGrid over = HandleGrid.over(MIDDLE, 2, 1, List.of(new HandleGrid.Moved(0, 0, new Point(0.2, 0.2))));
        assertEquals(0.1, over.left(), 1e-12);
        assertEquals(0.15, over.top(), 1e-12);
        assertEquals(0.65, over.right(), 1e-12);
        assertEquals(0.85, over.bottom(), 1e-12);
    }

    /** Every kind carries each handle's start exactly to its end, by {@link WarpKind}'s words, so that is where what lies there came from. */
    @ParameterizedTest
    @EnumSource(WarpKind.class)
    void whatLiesAtAHandlesEndCameFromItsStart(WarpKind kind) {
        LiveWarp live = new LiveWarp(warp(kind, pulled(), Optional.empty()), RetoucherTest.smoke(ROWS), RetoucherTest.smoke(ROWS));
        for (Handle handle : live.warp().handles()) {
            Point from = live.cameFrom(handle.to()).orElseThrow();
            assertEquals(0, from.distanceTo(handle.from()), 0.1 / ROWS, kind + " " + handle);
        }
        live.drag(0, centre(48, 47));
        assertEquals(0, live.cameFrom(centre(48, 47)).orElseThrow().distanceTo(live.warp().handles().get(0).from()), 0.1 / ROWS);
    }

    /** A live warp draws, at rest, the bits of the wanted picture; while dragged, nothing outside the window it names changes. */
    @ParameterizedTest
    @EnumSource(WarpKind.class)
    void aLiveWarpAtRestIsTheWantedPicture(WarpKind kind) {
        Picture original = RetoucherTest.smoke(ROWS);
        for (Optional<Matte> within : List.<Optional<Matte>>of(Optional.empty(), Optional.of(MIDDLE))) {
            LiveWarp live = new LiveWarp(warp(kind, pulled(), within), original, original);
            assertArrayEquals(wanted(live.warp(), original).rgba(), live.shown().rgba());
            for (Point to : List.of(new Point(0.5, 0.5), new Point(0.3, 0.3), new Point(0.37, 0.41))) {
                Picture before = live.shown().copy();
                var dirty = live.drag(0, to).orElseThrow();
                int changed = 0;
                for (int p = 0; p < 96 * ROWS; p++) {
                    boolean inside = p % 96 >= dirty.left() && p % 96 < dirty.left() + dirty.width() && p / 96 >= dirty.top()
                            && p / 96 < dirty.top() + dirty.height();
                    boolean same = before.rgba()[4 * p + 3] == live.shown().rgba()[4 * p + 3];
                    assertTrue(inside || same, kind + " changed outside " + dirty);
                    changed += same ? 0 : 1;
                }
                assertTrue(changed > 100, kind + " changed " + changed);
            }
            Picture draft = live.shown().copy();
            live.rest();
            double most = 0;
            double mean = 0;
            for (int n = 0; n < draft.rgba().length; n++) {
                double off = Math.abs(draft.rgba()[n] - live.shown().rgba()[n]);
                most = Math.max(most, off);
                mean += off / draft.rgba().length;
            }
            assertTrue(most > 0 && most < 0.1 && mean < 0.003, kind + ": the draft is off by " + mean + ", at most by " + most);
            assertEquals(new Point(0.37, 0.41), live.warp().handles().get(0).to());
            assertArrayEquals(wanted(live.warp(), original).rgba(), live.shown().rgba());
            MeshWarp kept = live.warp();
            try {
                live.drag(0, live.warp().handles().get(1).to());
                assertFalse(true, "two handles at one place");
            } catch (IllegalArgumentException refused) {
                assertTrue(refused.getMessage().contains("same 'to'"), refused.getMessage());
            }
            assertEquals(kept, live.warp());
            live.drag(0, pulled().get(0).from());
            live.drag(1, pulled().get(1).from());
            live.rest();
            assertArrayEquals(original.rgba(), live.shown().rgba(), "back where it was");
        }
    }
}

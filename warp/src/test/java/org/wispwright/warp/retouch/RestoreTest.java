package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Segment;

/** The restore brush: the original's bits in the core, a mix in the soft edge, nothing beyond, whatever came before. */
class RestoreTest {
    private static final Point MIDDLE = new Point(0.38, 0.4);
    private static final Stroke AWAY = new Stroke(Brush.REMOVE, 0.3, 0.9, 0.5, List.of(MIDDLE), Optional.empty());
    private static final Stroke MORE = new Stroke(Brush.ADD, 0.2, 0.6, 0.5, List.of(new Point(0.5, 0.5)), Optional.empty());

    private static Stroke restore(double strength) {
        return new Stroke(Brush.RESTORE, 0.2, strength, 0.5, List.of(MIDDLE, new Point(0.4, 0.5)), Optional.empty());
    }

    private static MeshWarp aside() {
        return new MeshWarp(List.of(new Handle(MIDDLE, new Point(0.3, 0.4)), Handle.pin(new Point(0, 0)), Handle.pin(new Point(0.7, 0)),
                Handle.pin(new Point(0, 1)), Handle.pin(new Point(0.7, 1))), Optional.empty());
    }

    @Test
    void theCoreHasTheOriginalsBitsAndBeyondTheReachNothingChanges() {
        Picture original = RetoucherTest.smoke(96);
        Picture before = Retoucher.wanted(new Retouch(List.of(AWAY, aside(), MORE)), original);
        Picture after = Retoucher.wanted(new Retouch(List.of(AWAY, aside(), MORE, restore(1))), original);
        int core = 0;
        for (int p = 0; p < 72 * 96; p++) {
            double d = Math.sqrt(Segment.squaredDistance((p % 72 + 0.5) / 96, (p / 72 + 0.5) / 96, 0.38, 0.4, 0.4, 0.5));
            for (int n = 4 * p; n < 4 * p + 4; n++) {
                if (d <= 0.1) {
                    assertEquals(original.rgba()[n], after.rgba()[n]);
                    core += original.rgba()[n] != before.rgba()[n] ? 1 : 0;
                } else if (d > 0.2) {
                    assertEquals(before.rgba()[n], after.rgba()[n]);
                }
            }
        }
        assertTrue(core > 1000, "only " + core + " values had to be brought back");
    }

    /** By hand: 0.4 thinned by 0.75 is 0.1; a quarter of the way back is 0.175; rgb in proportion. */
    @Test
    void strengthMixesByHand() {
        Picture flat = new Picture(32, 32);
        for (int n = 0; n < flat.rgba().length; n++) {
            flat.rgba()[n] = 0.1f * (n % 4 + 1);
        }
        Stroke thin = new Stroke(Brush.REMOVE, 0.3, 0.75, 0, List.of(new Point(0.5, 0.5)), Optional.empty());
        Stroke back = new Stroke(Brush.RESTORE, 0.2, 0.25, 0, List.of(new Point(0.5, 0.5)), Optional.empty());
        Picture wanted = Retoucher.wanted(new Retouch(List.of(thin, back)), flat);
        for (int c = 0; c < 4; c++) {
            assertEquals(0.4375 * 0.1 * (c + 1), wanted.at(16, 16, c), 1e-6);
        }
    }

    /** A retouch of its own kind alone, or before anything changed, is the identity to the bit. */
    @Test
    void withNothingToBringBackTheBitsStay() {
        Picture original = RetoucherTest.smoke(64);
        assertArrayEquals(original.rgba(), Retoucher.wanted(new Retouch(List.of(restore(0.37))), original).rgba());
        assertArrayEquals(Retoucher.wanted(new Retouch(List.of(AWAY)), original).rgba(),
                Retoucher.wanted(new Retouch(List.of(restore(0.8), AWAY)), original).rgba());
    }

    /** Within a region, only there. */
    @Test
    void keepsToItsRegion() {
        Picture original = RetoucherTest.smoke(96);
        Region left = new Region.Rectangle(0, 0, 0.38, 1, 0);
        Stroke back = new Stroke(Brush.RESTORE, 0.2, 1, 0, List.of(MIDDLE), Optional.of(left));
        Picture before = Retoucher.wanted(new Retouch(List.of(AWAY)), original);
        Picture after = Retoucher.wanted(new Retouch(List.of(AWAY, back)), original);
        assertEquals(original.at(30, 38, 3), after.at(30, 38, 3));
        assertTrue(before.at(30, 38, 3) < 0.5 * original.at(30, 38, 3));
        assertEquals(before.at(40, 38, 3), after.at(40, 38, 3));
    }
}

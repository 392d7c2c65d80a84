package org.wispwright.ui.job;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.shot.Hold;
import org.wispwright.ui.shot.Note;
import org.wispwright.warp.matte.ImageMatte;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Stroke;

class NoteWishTest {
    private static final Picture ORIGINAL = new Picture(20, 20);

    private static float[] weights(Optional<Matte> weighBy) {
        Retouch retouch = new Retouch(List.of(new Stroke(Brush.ADD, 0.1, 1, 0, List.of(new Point(0.5, 0.5)), Optional.empty())));
        Hold hold = new Hold(new Region.Rectangle(0, 0.8, 1, 1, 0), 3, 3);
        return new NoteWish(new Note("a", "words", 3, "front", 1, weighBy, retouch, List.of(hold), Optional.empty())).weights(ORIGINAL);
    }

    /** By hand: 1 where retouched and held, 1/2 elsewhere; a matte of 1/4 on the left and 1 on the right makes a quarter of the left. */
    @Test
    void weighByMultipliesEveryWeight() {
        float[] plain = weights(Optional.empty());
        assertEquals(1f, plain[10 + 20 * 10]);
        assertEquals(1f, plain[2 + 20 * 18]);
        assertEquals(0.5f, plain[2 + 20 * 2]);
        float[] matte = new float[400];
        float[] expected = new float[400];
        for (int p = 0; p < 400; p++) {
            matte[p] = p % 20 < 10 ? 0.25f : 1;
            expected[p] = plain[p] * matte[p];
        }
        assertArrayEquals(expected, weights(Optional.of(new ImageMatte(20, 20, matte, 0))));
    }
}

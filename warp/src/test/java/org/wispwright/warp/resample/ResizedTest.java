package org.wispwright.warp.resample;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.wispwright.render.picture.Picture;

/** A picture on another raster: means where it shrinks, Keys's cubic where it grows; edges stay edges. */
class ResizedTest {
    /** By hand: 3 pixels to 2, each covers one and a half. */
    @Test
    void shrinkingTakesTheMeanOverWhatAPixelCovers() {
        assertArrayEquals(new float[] {(1 + 0.5f * 4) / 1.5f, (0.5f * 4 + 7) / 1.5f}, Resized.values(new float[] {1, 4, 7}, 1, 3, 1, 2,
                1), 1e-6f);
        assertArrayEquals(new float[] {2.5f, 25}, Resized.values(new float[] {1, 10, 2, 20, 3, 30, 4, 40}, 2, 2, 2, 1, 1), 1e-6f);
    }

    /** Keys (1981): a = -1/2 reproduces quadratic functions; new pixel i lies at (i + 1/2) n / m - 1/2 of the old. */
    @Test
    void growingReproducesAQuadratic() {
        float[] in = new float[12];
        for (int i = 0; i < 12; i++) {
            in[i] = 0.1f * i * i - i;
        }
        float[] out = Resized.values(in, 1, 1, 12, 1, 30);
        for (int i = 5; i < 25; i++) {
            double at = (i + 0.5) * 12 / 30 - 0.5;
            assertEquals(0.1 * at * at - at, out[i], 1e-5);
        }
    }

    @Test
    void theSameRasterGivesTheSameBits() {
        float[] in = {0.1f, 0.7f, 0.3f, 0.9f, 0.2f, 0.5f};
        float[] out = Resized.values(in, 1, 3, 2, 3, 2);
        assertArrayEquals(in, out);
        out[0] = 9;
        assertEquals(0.1f, in[0]);
    }

    /** Keys's cubic overshoots a step; a picture's alpha does not. */
    @Test
    void aPictureStaysInRange() {
        Picture step = new Picture(8, 1);
        for (int n = 16; n < 32; n++) {
            step.rgba()[n] = 1;
        }
        Picture grown = Resized.picture(step, 40, 5);
        for (float value : grown.rgba()) {
            assertTrue(value >= 0 && value <= 1, "got " + value);
        }
    }

    @Test
    void whatDoesNotFitIsRefused() {
        assertThrows(IllegalArgumentException.class, () -> Resized.values(new float[5], 1, 3, 2, 3, 2));
        assertThrows(IllegalArgumentException.class, () -> Resized.values(new float[6], 1, 3, 2, 0, 2));
    }
}

package org.wispwright.render.march;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.sun.management.ThreadMXBean;
import java.lang.management.ManagementFactory;
import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.ScalarGrid;

/** The march against its slow twin, the same bits everywhere, and what it refuses. */
class RayMarcherTest {

    @ParameterizedTest
    @CsvSource({"1,1,1", "2,3,5", "7,8,9", "9,5,1", "1,6,4", "13,4,2"})
    void marchEqualsPlain(int nx, int ny, int nz) {
        GridShape box = new GridShape(nx, ny, nz, 0.3, 0.5, -0.2, 0.1);
        ScalarGrid smoke = MarchScenes.smoke(box, true, 42);
        for (View view : new View[] {MarchScenes.pinhole(box, 19, 14), MarchScenes.orthographic(box, 9, 17)}) {
            for (Look look : new Look[] {MarchScenes.PLAIN, MarchScenes.lit(0.3, 1, 0.8)}) {
                try (Lanes lanes = new Lanes(2)) {
                    Picture got = view.raster().picture();
                    new RayMarcher(box, view, 0.17, lanes).picture(smoke, look, got);
                    double[] plain = new MarchPlain(box, MarchScenes.widen(smoke.values()), look).picture(view, 0.17);
                    int worst = 0;
                    for (int n = 0; n < plain.length; n++) {
                        if (Math.abs(plain[n] - got.rgba()[n]) > Math.abs(plain[worst] - got.rgba()[worst])) {
                            worst = n;
                        }
                    }
                    assertEquals(plain[worst], got.rgba()[worst], 2e-6, view.name() + ", " + box.inWords() + ", worst value " + worst);
                }
            }
        }
    }

    /** Enough rays for several batches of the pullback, and an odd number of everything. */
    @Test
    void sameBitsForOneTwoAndThreeThreads() {
        GridShape box = new GridShape(37, 23, 29, 0.1);
        ScalarGrid smoke = MarchScenes.smoke(box, true, 3);
        View view = MarchScenes.pinhole(box, 151, 113);
        for (Look look : new Look[] {MarchScenes.PLAIN, MarchScenes.lit(0.3, 1, 0.8)}) {
            float[] firstPicture = null;
            float[] firstBar = null;
            for (int threads = 1; threads <= 3; threads++) {
                try (Lanes lanes = new Lanes(threads)) {
                    RayMarcher marcher = new RayMarcher(box, view, 0.04, lanes);
                    Picture picture = view.raster().picture();
                    marcher.picture(smoke, look, picture);
                    ScalarGrid bar = new ScalarGrid(box);
                    marcher.pullback(smoke, look, picture, wave(picture.rgba().length), bar);
                    if (threads == 1) {
                        firstPicture = picture.rgba();
                        firstBar = bar.values();
                    } else {
                        assertArrayEquals(firstPicture, picture.rgba(), threads + " threads, picture");
                        assertArrayEquals(firstBar, bar.values(), threads + " threads, pullback");
                    }
                }
            }
        }
    }

    @Test
    void passingOverEmptySpaceChangesNoBit() {
        GridShape box = new GridShape(31, 40, 27, 0.1);
        ScalarGrid smoke = MarchScenes.smoke(box, true, 8);
        smoke.values()[box.cell(1, 1, 1)] = 0.7f;
        smoke.values()[box.cell(30, 39, 26)] = -0.2f;
        try (Lanes lanes = new Lanes(2)) {
            for (View view : new View[] {MarchScenes.pinhole(box, 80, 60), MarchScenes.orthographic(box, 50, 71)}) {
                for (Look look : new Look[] {MarchScenes.PLAIN, MarchScenes.lit(-0.3, -1, 0.8)}) {
                    RayMarcher marcher = new RayMarcher(box, view, 0.06, lanes);
                    Picture skipped = view.raster().picture();
                    Picture all = view.raster().picture();
                    marcher.picture(smoke, look, skipped);
                    marcher.pictureWithoutSkipping(smoke, look, all);
                    assertArrayEquals(all.rgba(), skipped.rgba(), view.name());
                }
            }
        }
    }

    /** An empty box still has a derivative: that is how smoke gets painted where there is none. */
    @Test
    void emptyCellsHaveADerivative() {
        GridShape box = new GridShape(5, 6, 4, 0.2);
        View view = MarchScenes.pinhole(box, 24, 18);
        try (Lanes lanes = new Lanes(1)) {
            RayMarcher marcher = new RayMarcher(box, view, 0.1, lanes);
            Picture picture = view.raster().picture();
            ScalarGrid smoke = new ScalarGrid(box);
            marcher.picture(smoke, MarchScenes.PLAIN, picture);
            float[] bar = new float[picture.rgba().length];
            Arrays.fill(bar, 1);
            ScalarGrid smokeBar = new ScalarGrid(box);
            marcher.pullback(smoke, MarchScenes.PLAIN, picture, bar, smokeBar);
            for (float value : smokeBar.values()) {
                assertTrue(value > 0);
            }
        }
    }

    @Test
    void aRayThatMissesGivesAClearPixel() {
        GridShape box = new GridShape(4, 4, 4, 0.2);
        View view = MarchScenes.orthographic(box, 40, 40);
        ScalarGrid smoke = new ScalarGrid(box);
        smoke.fill(1);
        try (Lanes lanes = new Lanes(1)) {
            Picture picture = view.raster().picture();
            Arrays.fill(picture.rgba(), 9);
            new RayMarcher(box, view, 0.1, lanes).picture(smoke, MarchScenes.PLAIN, picture);
            assertEquals(0, picture.at(0, 0, 3));
            assertEquals(0, picture.at(0, 0, 0));
            assertTrue(picture.at(20, 20, 3) > 0.3);
        }
    }

    @Test
    void shapesThatDoNotMatchAreRefusedByName() {
        GridShape box = new GridShape(4, 4, 4, 0.2);
        View view = MarchScenes.orthographic(box, 8, 8);
        try (Lanes lanes = new Lanes(1)) {
            assertThrows(IllegalArgumentException.class, () -> new RayMarcher(box, view, 0, lanes));
            assertThrows(IllegalArgumentException.class, () -> new RayMarcher(box, view, 1e-9, lanes));
            RayMarcher marcher = new RayMarcher(box, view, 0.1, lanes);
            ScalarGrid other = new ScalarGrid(new GridShape(4, 4, 5, 0.2));
            String message = assertThrows(IllegalArgumentException.class,
                    () -> marcher.picture(other, MarchScenes.PLAIN, view.raster().picture())).getMessage();
            assertTrue(message.contains("'density' is 4x4x5"), message);
            message = assertThrows(IllegalArgumentException.class,
                    () -> marcher.picture(new ScalarGrid(box), MarchScenes.PLAIN, new Picture(8, 9))).getMessage();
            assertTrue(message.contains("'out' is 8x9"), message);
            assertThrows(IllegalArgumentException.class, () -> marcher.pullback(new ScalarGrid(box), MarchScenes.PLAIN, new Picture(8, 8),
                    new float[3], new ScalarGrid(box)));
        }
    }

    /** Once warm, a picture and a pullback on one lane make no arrays: one grid of this box would be 250 kB. */
    @Test
    void aWarmCallReusesItsBuffers() {
        GridShape box = new GridShape(40, 40, 40, 0.1);
        View view = MarchScenes.pinhole(box, 40, 30);
        ScalarGrid smoke = MarchScenes.smoke(box, true, 1);
        Look look = MarchScenes.lit(1, 2, 3);
        ThreadMXBean threads = (ThreadMXBean) ManagementFactory.getThreadMXBean();
        try (Lanes lanes = new Lanes(1)) {
            RayMarcher marcher = new RayMarcher(box, view, 0.1, lanes);
            Picture picture = view.raster().picture();
            float[] bar = wave(picture.rgba().length);
            ScalarGrid smokeBar = new ScalarGrid(box);
            long bytes = 0;
            for (int n = 0; n < 3; n++) {
                long before = threads.getCurrentThreadAllocatedBytes();
                marcher.picture(smoke, look, picture);
                marcher.pullback(smoke, look, picture, bar, smokeBar);
                bytes = threads.getCurrentThreadAllocatedBytes() - before;
            }
            assertTrue(bytes < 64_000, "a warm call allocated " + bytes + " bytes");
        }
    }

    private static float[] wave(int count) {
        float[] values = new float[count];
        for (int n = 0; n < count; n++) {
            values[n] = (float) Math.sin(0.37 * n);
        }
        return values;
    }
}

package org.wispwright.warp.paintover;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.PngFile;
import org.wispwright.render.picture.Srgb;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Retoucher;

/**
 * Painted frames whose change in our opacity is known ({@link PaintScene}), through files, under another look than ours: mean absolute
 * error of the recovered change at most 0.03 over the frame and over the changed part. The bound is ours.
 */
class PaintOverTest {
    private static final int ROWS = 160;
    private static final double MOST = 0.03;
    private static final PaintScene SCENE = PaintScene.plume();
    private static final Picture ORIGINAL = SCENE.original(ROWS);

    @TempDir
    private Path place;

    /** What a painter did to the layer of smoke. */
    enum Case {
        MOVED_BLOB(Painted.Way.MOVED) {
            @Override
            Picture painted(Picture layer) {
                return PaintScene.moved(layer, 0.604, 0.667, 0.1, -0.045, -0.05);
            }
        },
        REMOVED_HOLE(Painted.Way.OPACITY) {
            @Override
            Picture painted(Picture layer) {
                return PaintScene.removed(layer, (x, y) -> 0.9 * PaintScene.disc(x - 0.3, y - 0.33, 0.09));
            }
        },
        ADDED_WISP(Painted.Way.OPACITY) {
            @Override
            Picture painted(Picture layer) {
                return PaintScene.added(layer, PaintScene::wisp);
            }
        },
        HOLE_AND_WISP(Painted.Way.OPACITY) {
            @Override
            Picture painted(Picture layer) {
                return ADDED_WISP.painted(REMOVED_HOLE.painted(layer));
            }
        },
        ALL(Painted.Way.BOTH) {
            @Override
            Picture painted(Picture layer) {
                return MOVED_BLOB.painted(HOLE_AND_WISP.painted(layer));
            }
        };

        private final Painted.Way way;

        Case(Painted.Way way) {
            this.way = way;
        }

        abstract Picture painted(Picture layer);
    }

    @ParameterizedTest
    @EnumSource(Case.class)
    void throughEightBits(Case one) {
        Picture layer = SCENE.layer(ROWS);
        Painted found = PaintOver.read(png(PaintScene.frame(layer), PngFile.Depth.EIGHT), png(PaintScene.frame(one.painted(layer)),
                PngFile.Depth.EIGHT), ORIGINAL);
        assertRecovered(one, found, layer);
    }

    @ParameterizedTest
    @EnumSource(Case.class)
    void throughSixteenBitsOnAFinerRaster(Case one) {
        Picture fine = SCENE.layer(400);
        Painted found = PaintOver.read(png(PaintScene.frame(fine), PngFile.Depth.SIXTEEN), png(PaintScene.frame(one.painted(fine)),
                PngFile.Depth.SIXTEEN), ORIGINAL);
        assertEquals(ROWS, found.repaint().height());
        assertRecovered(one, found, SCENE.layer(ROWS));
    }

    @ParameterizedTest
    @EnumSource(Case.class)
    void onACoarserRaster(Case one) {
        Picture coarse = SCENE.layer(120);
        Painted found = PaintOver.read(png(PaintScene.frame(coarse), PngFile.Depth.EIGHT), png(PaintScene.frame(one.painted(coarse)),
                PngFile.Depth.EIGHT), ORIGINAL);
        assertRecovered(one, found, SCENE.layer(ROWS));
    }

    /** Smoke alone, premultiplied, nothing behind it, as floats: opacity is in the frame itself. */
    @ParameterizedTest
    @EnumSource(Case.class)
    void withoutABackground(Case one) {
        Picture layer = SCENE.layer(ROWS);
        assertRecovered(one, PaintOver.read(layer, one.painted(layer), ORIGINAL), layer);
    }

    /** The blob was laid down (-0.045, -0.05) from where it was, so what is seen there came from (0.045, 0.05) away. */
    @Test
    void aMovedBlobIsMovedByAsMuch() {
        Picture layer = SCENE.layer(ROWS);
        Painted found = PaintOver.read(PaintScene.frame(layer), PaintScene.frame(Case.MOVED_BLOB.painted(layer)), ORIGINAL);
        int p = (int) ((0.604 - 0.045) * ROWS) + layer.width() * (int) ((0.667 - 0.05) * ROWS);
        float[] layers = found.repaint().layers();
        assertEquals(0.045, layers[4 * p + 1], 0.006);
        assertEquals(0.05, layers[4 * p + 2], 0.006);
    }

    /** Codes that differ by at most one, as after saving twice; and normal noise of 1.5 codes with a few specks. */
    @ParameterizedTest
    @ValueSource(doubles = {0, 1.5})
    void noiseAloneIsNoNote(double deviation) {
        Picture before = png(PaintScene.frame(SCENE.layer(ROWS)), PngFile.Depth.EIGHT);
        Picture after = before.copy();
        Random random = new Random(7);
        for (int n = 0; n < after.rgba().length; n++) {
            double off = deviation == 0 ? random.nextInt(3) - 1 : deviation * random.nextGaussian();
            after.rgba()[n] = (n & 3) == 3 ? 1 : (float) Srgb.decode(Math.max(0, Srgb.encode(before.rgba()[n]) + off / 255));
        }
        for (int speck : new int[] {4 * 5000, 4 * 9000, 4 * 15_000}) {
            after.rgba()[speck] += deviation > 0 ? 0.1f : 0;
        }
        Painted found = PaintOver.read(before, after, ORIGINAL);
        assertTrue(found.isNothing() && found.repaint().changesNothing(), "share " + found.share());
        assertEquals(found.massBefore(), found.massAfter());
        assertTrue(deviation == 0 || Math.abs(found.noise() * 255 - deviation) < 0.3, "noise of " + found.noise() * 255 + " codes");
    }

    @Test
    void theSameFrameIsNoNote() {
        Picture before = PaintScene.frame(SCENE.layer(ROWS));
        assertTrue(PaintOver.read(before, before, ORIGINAL).isNothing());
    }

    /** The changes are still found under the noise, with the same bound. */
    @ParameterizedTest
    @EnumSource(Case.class)
    void underNoise(Case one) {
        Picture layer = SCENE.layer(ROWS);
        Picture after = png(PaintScene.frame(one.painted(layer)), PngFile.Depth.EIGHT);
        Random random = new Random(11);
        for (int n = 0; n < after.rgba().length; n++) {
            double code = Math.max(0, Srgb.encode(after.rgba()[n]) + random.nextGaussian() / 255);
            after.rgba()[n] = (n & 3) == 3 ? 1 : (float) Srgb.decode(code);
        }
        assertRecovered(one, PaintOver.read(png(PaintScene.frame(layer), PngFile.Depth.EIGHT), after, ORIGINAL), layer);
    }

    /** Another frame's smoke, and paint that is no smoke, are not believed. */
    @Test
    void whatIsNotOurSmokeHasLittleConfidence() {
        Picture layer = SCENE.layer(ROWS);
        Picture frame = PaintScene.frame(layer);
        Picture painted = PaintScene.frame(Case.REMOVED_HOLE.painted(layer));
        assertTrue(PaintOver.read(frame, painted, ORIGINAL).confidence() > 0.95);
        Picture mirrored = ORIGINAL.copy();
        for (int p = 0; p < 120 * ROWS; p++) {
            int q = 119 - p % 120 + p / 120 * 120;
            System.arraycopy(ORIGINAL.rgba(), 4 * q, mirrored.rgba(), 4 * p, 4);
        }
        assertTrue(PaintOver.read(frame, painted, mirrored).confidence() < 0.7);
        Picture green = frame.copy();
        for (int p = 0; p < 120 * ROWS; p++) {
            if (Math.hypot(p % 120 - 20, p / 120 - 120) < 12) {
                green.rgba()[4 * p + 1] = 0.9f;
                green.rgba()[4 * p] = 0;
            }
        }
        assertTrue(PaintOver.read(frame, green, ORIGINAL).confidence() < 0.4);
    }

    /** Outside nothing, inside at least the level nearby, and what is denser stays; a half-covered pixel has half. Hand-derived. */
    @Test
    void aSilhouetteIsFilledToTheLevelNearby() {
        Picture matte = new Picture(120, ROWS);
        for (int p = 0; p < 120 * ROWS; p++) {
            int x = p % 120;
            boolean in = x >= 30 && x < 70 && p / 120 >= 30 && p / 120 < 90;
            Arrays.fill(matte.rgba(), 4 * p, 4 * p + 3, x == 70 && p / 120 >= 30 && p / 120 < 90 ? (float) Srgb.decode(0.5) : in ? 1 : 0);
            matte.rgba()[4 * p + 3] = 1;
        }
        Painted found = PaintOver.silhouette(matte, ORIGINAL);
        Picture wanted = Retoucher.wanted(new Retouch(List.of(found.repaint())), ORIGINAL);
        for (int p = 0; p < 120 * ROWS; p++) {
            int x = p % 120;
            boolean row = p / 120 >= 30 && p / 120 < 90;
            float a = wanted.rgba()[4 * p + 3];
            if (row && x >= 30 && x < 70) {
                assertTrue(a > 0.15 && a >= ORIGINAL.rgba()[4 * p + 3] - 0.005, x + ", " + p / 120 + ": " + a);
            } else if (row && x == 70) {
                assertEquals(wanted.rgba()[4 * p - 1] / 2, a, 0.02);
            } else {
                assertTrue(a < 0.005, x + ", " + p / 120 + ": " + a);
            }
        }
    }

    @Test
    void whatDoesNotFitIsRefused() {
        Picture frame = PaintScene.frame(SCENE.layer(ROWS));
        assertRefused("needs one size", () -> PaintOver.read(frame, new Picture(119, ROWS), ORIGINAL));
        assertRefused("needs the aspect of the view", () -> PaintOver.read(new Picture(160, ROWS), new Picture(160, ROWS), ORIGINAL));
        assertRefused("needs the aspect of the view", () -> PaintOver.silhouette(new Picture(100, ROWS), ORIGINAL));
        Picture broken = frame.copy();
        broken.rgba()[4 * 7 + 1] = Float.NaN;
        assertRefused("pixel (7, 0) of 'after' is NaN", () -> PaintOver.read(frame, broken, ORIGINAL));
        assertRefused("pixel (7, 0) of 'matte' is NaN", () -> PaintOver.silhouette(broken, ORIGINAL));
        Picture none = new Picture(120, ROWS);
        Picture painted = PaintScene.frame(Case.REMOVED_HOLE.painted(SCENE.layer(ROWS)));
        assertRefused("shows no smoke", () -> PaintOver.read(frame, painted, none));
        assertRefused("shows no smoke", () -> PaintOver.silhouette(frame, none));
    }

    private static void assertRefused(String why, Executable call) {
        String message = assertThrows(IllegalArgumentException.class, call).getMessage();
        assertTrue(message.contains(why), message);
    }

    private static void assertRecovered(Case one, Painted found, Picture layer) {
        float[] before = PaintScene.ours(layer);
        float[] after = PaintScene.ours(one.painted(layer));
        Picture wanted = Retoucher.wanted(new Retouch(List.of(found.repaint())), ORIGINAL);
        double frame = 0;
        double changed = 0;
        double size = 0;
        int count = 0;
        for (int p = 0; p < before.length; p++) {
            double truth = after[p] - before[p];
            double error = Math.abs(wanted.rgba()[4 * p + 3] - ORIGINAL.rgba()[4 * p + 3] - truth);
            frame += error / before.length;
            if (Math.abs(truth) > 0.01) {
                changed += error;
                size += Math.abs(truth);
                count++;
            }
        }
        String seen = one + ": " + found.way() + ", error " + frame + " over the frame, " + changed / count + " over " + count
                + " changed pixels, whose change is " + size / count + ", confidence " + found.confidence() + ", share " + found.share()
                + ", mass " + found.massBefore() + " to " + found.massAfter();
        assertTrue(size / count > 2 * MOST, seen + ": too little for this test to fail");
        assertTrue(frame <= MOST && changed / count <= MOST, seen);
        assertEquals(one.way, found.way(), seen);
    }

    private Picture png(Picture picture, PngFile.Depth depth) {
        try {
            PngFile.write(picture, place.resolve("frame.png"), depth);
            return PngFile.read(place.resolve("frame.png"));
        } catch (IOException broken) {
            throw new UncheckedIOException(broken);
        }
    }
}

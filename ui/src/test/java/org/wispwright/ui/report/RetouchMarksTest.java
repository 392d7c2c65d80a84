package org.wispwright.ui.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Graphics2D;
import java.awt.image.BufferedImage;
import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.matte.ImageMatte;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.retouch.Folds;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.OutlineWarp;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Stroke;
import org.wispwright.warp.retouch.WarpKind;

class RetouchMarksTest {
    /** Every brush has its own word, its own colour and its own sign: no two look alike on a sheet, in grey neither. */
    @Test
    void noTwoBrushesLookAlike() {
        Set<String> words = new HashSet<>();
        Set<Integer> colours = new HashSet<>();
        Set<String> signs = new HashSet<>();
        for (Brush brush : Brush.values()) {
            Retouch retouch = new Retouch(List.of(new Stroke(brush, 0.2, 1, 0.5,
                    List.of(new Point(0.3, 0.7), new Point(0.5, 0.5), new Point(0.7, 0.5)), Optional.empty())));
            Set<RetouchMarks.Meaning> meanings = RetouchMarks.meanings(retouch, List.of(), Optional.empty(), Folds.NONE);
            assertEquals(1, meanings.size());
            RetouchMarks.Meaning meaning = meanings.iterator().next();
            words.add(meaning.words());
            colours.add(meaning.colour().getRGB());
            signs.add(sign(retouch, meaning.colour().getRGB()));
        }
        assertEquals(Brush.values().length, words.size());
        assertEquals(Brush.values().length, colours.size());
        assertEquals(Brush.values().length, signs.size());
    }

    /** By hand: a square over each folded place and a cross at the worst, in a colour that nothing else has; without a fold, none. */
    @Test
    void foldsAreMarkedWhereTheyAre() {
        Retouch retouch = new Retouch(List.of(new OutlineWarp(0.3, List.of(new Handle(new Point(0.2, 0.5), new Point(0.3, 0.5))), 0.1,
                WarpKind.SPLINE, Optional.empty())));
        Folds folds = new Folds(2, -0.5, Optional.of(new Point(0.7, 0.3)), List.of(new Point(0.7, 0.3), new Point(0.8, 0.7)));
        assertTrue(RetouchMarks.meanings(retouch, List.of(), Optional.empty(), folds).contains(RetouchMarks.Meaning.FOLD));
        assertEquals(Set.of(RetouchMarks.Meaning.PULL), RetouchMarks.meanings(retouch, List.of(), Optional.empty(), Folds.NONE));
        for (Folds drawn : List.of(Folds.NONE, folds)) {
            BufferedImage image = new BufferedImage(200, 200, BufferedImage.TYPE_INT_ARGB);
            Graphics2D g = image.createGraphics();
            new RetouchMarks(g, 200, new Picture(1, 1)).draw(retouch, List.of(), Optional.empty(), drawn);
            g.dispose();
            int fold = RetouchMarks.Meaning.FOLD.colour().getRGB();
            assertEquals(drawn == folds, image.getRGB(160, 140) == fold);
            assertEquals(drawn == folds, image.getRGB(140, 60) == fold);
            assertEquals(drawn == folds, image.getRGB(145, 65) == fold);
            assertEquals(RetouchMarks.Meaning.PULL.colour().getRGB(), image.getRGB(50, 100), "the arrow of the drag");
        }
    }

    /** Where the pen's very colour stands, as a string of bits. */
    private static String sign(Retouch retouch, int rgb) {
        BufferedImage image = new BufferedImage(200, 200, BufferedImage.TYPE_INT_ARGB);
        Graphics2D g = image.createGraphics();
        new RetouchMarks(g, 200, new Picture(1, 1)).draw(retouch, List.of(), Optional.empty(), Folds.NONE);
        g.dispose();
        int[] pixels = image.getRGB(0, 0, 200, 200, null, 0, 200);
        boolean[] set = new boolean[pixels.length];
        int count = 0;
        for (int p = 0; p < pixels.length; p++) {
            set[p] = pixels[p] == rgb;
            count += set[p] ? 1 : 0;
        }
        assertTrue(count > 100, "only " + count + " pixels are drawn");
        return Arrays.toString(set);
    }

    /**
     * A matte without an outline of its own is drawn where its value is 1/2: left half in, so a line at the middle and nothing far from it.
     */
    @Test
    void aMatteOfPixelsIsDrawnWhereItIsHalf() {
        float[] pixels = new float[100];
        for (int p = 0; p < 100; p++) {
            pixels[p] = p % 10 < 5 ? 1 : 0;
        }
        BufferedImage image = new BufferedImage(200, 200, BufferedImage.TYPE_INT_ARGB);
        Graphics2D g = image.createGraphics();
        Matte half = new ImageMatte(10, 10, pixels, 0);
        assertEquals(Set.of(RetouchMarks.Meaning.WEIGHS), RetouchMarks.meanings(new Retouch(List.of()), List.of(), Optional.of(half),
                Folds.NONE));
        new RetouchMarks(g, 200, new Picture(100, 100)).draw(new Retouch(List.of()), List.of(), Optional.of(half), Folds.NONE);
        g.dispose();
        int atMiddle = 0;
        for (int y = 20; y < 180; y++) {
            atMiddle += image.getRGB(100, y) >>> 24 > 0 || image.getRGB(99, y) >>> 24 > 0 ? 1 : 0;
            for (int x = 0; x < 200; x++) {
                assertTrue(image.getRGB(x, y) >>> 24 == 0 || Math.abs(x - 100) <= 4 || x <= 4, "something is drawn at " + x + ", " + y);
            }
        }
        assertTrue(atMiddle > 60 && atMiddle < 160, "dashes, found " + atMiddle);
    }
}

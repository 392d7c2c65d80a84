package org.wispwright.ui.report;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.image.BufferedImage;
import java.io.File;
import java.io.IOException;
import java.util.List;
import java.util.Optional;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Test;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Folds;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Stroke;

class SheetTest {
    private static final Rgb SKY = new Rgb(0.10, 0.14, 0.20);
    private static final Retouch LEAN = new Retouch(List.of(new MeshWarp(List.of(
            new Handle(new Point(0.38, 0.22), new Point(0.24, 0.25)), new Handle(new Point(0.40, 0.40), new Point(0.31, 0.41)),
            Handle.pin(new Point(0.375, 0.75)), Handle.pin(new Point(0.33, 0.95)), Handle.pin(new Point(0.42, 0.95))), Optional.empty())));
    private static final Retouch GAP = new Retouch(List.of(
            new Stroke(Brush.REMOVE, 0.06, 0.9, 0.5, List.of(new Point(0.34, 0.40), new Point(0.39, 0.41), new Point(0.43, 0.39)),
                    Optional.empty()),
            new Stroke(Brush.ADD, 0.045, 0.7, 0.5, List.of(new Point(0.56, 0.30), new Point(0.60, 0.24)), Optional.empty())));
    private static final Region BASE = new Region.Rectangle(0.28, 0.68, 0.48, 0.97, 0.04);

    static Sheet sheet(int width, int height, boolean foreign) {
        Picture original = PaintedSmoke.column(width, height, 0.02, 0, 0.8);
        Picture leaning = PaintedSmoke.column(width, height, -0.12, 0, 0.8);
        Picture holed = PaintedSmoke.column(width, height, 0.02, 0.95, 0.8);
        Optional<Picture> rendered = foreign ? Optional.of(PaintedSmoke.column(2 * width, 2 * height, 0.02, 0, 1.3)) : Optional.empty();
        return new Sheet("Kiln yard", "take 001 against the original, frames 1001 to 1048", "original", SKY, List.of(
                new SheetRow("lean-head", "Lean the head to frame left by a good part of its width, keep the base as it is.",
                        "frame 1036, view front",
                        rendered, LEAN, List.of(BASE), Optional.empty(), original, leaning,
                        PaintedSmoke.column(width, height, -0.105, 0, 0.8), Folds.NONE, 0.9742),
                new SheetRow("open-gap", "Open a gap here and let a wisp come out on the other side.", "frame 1044, view front",
                        rendered, GAP, List.of(), Optional.empty(), original, holed, PaintedSmoke.column(width, height, 0.02, 0.7, 0.8),
                        Folds.NONE, 0.93)));
    }

    /** By hand: 5 columns of 300, 4 gaps of 20, 2 margins of 48; head 104, 2 rows of 70 + 400 + 34 + 40, margin 48 less a gap of 40. */
    @Test
    void theSheetIsAsLargeAsItsPartsAddUpTo() throws IOException {
        BufferedImage image = sheet(360, 480, true).paint();
        assertEquals(5 * 300 + 4 * 20 + 2 * 48, image.getWidth());
        assertEquals(104 + 2 * (70 + 400 + 34 + 40) + 48 - 40, image.getHeight());
        keep(image, "sheet-portrait");
    }

    @Test
    void withoutARenderedFrameTheColumnIsLeftOut() throws IOException {
        BufferedImage image = sheet(480, 270, false).paint();
        assertEquals(4 * 420 + 3 * 20 + 2 * 48, image.getWidth());
        keep(image, "sheet-wide");
    }

    /** The pixel in the middle of the original's top edge is pure background: 0.10, 0.14, 0.20 through IEC 61966-2-1 is 89, 105, 124. */
    @Test
    void picturesLieOnTheShotsBackground() {
        BufferedImage image = sheet(360, 480, true).paint();
        int rgb = image.getRGB(48 + 300 + 20 + 3, 104 + 70 + 3);
        assertEquals(89, rgb >> 16 & 255, 1);
        assertEquals(105, rgb >> 8 & 255, 1);
        assertEquals(124, rgb & 255, 1);
    }

    @Test
    void whereGotIsWantedTheDifferenceIsBlack() {
        Picture column = PaintedSmoke.column(36, 48, 0, 0, 1);
        SheetRow met = new SheetRow("a", "words", "frame 1", Optional.empty(), LEAN, List.of(), Optional.empty(),
                PaintedSmoke.column(36, 48, 0.1, 0, 1), column, column, Folds.NONE, 1);
        BufferedImage image = new Sheet("t", "s", "original", SKY, List.of(met)).paint();
        assertEquals(0xFF000000, image.getRGB(48 + 3 * 320 + 150, 104 + 70 + 200));
    }

    /** The wish of largest size decides: 0.2 of light allows x4 (0.8) and not x8 (1.6). */
    @Test
    void theGainIsTheLargestPowerOfTwoThatDoesNotClipTheWish() {
        Picture dark = new Picture(4, 4);
        Picture lit = new Picture(4, 4);
        lit.rgba()[0] = 0.2f;
        SheetRow row = new SheetRow("a", "words", "frame 1", Optional.empty(), new Retouch(List.of()), List.of(), Optional.empty(), dark,
                lit, dark,
                Folds.NONE, 0);
        assertEquals(4, new Sheet("t", "s", "original", Rgb.BLACK, List.of(row)).gain());
    }

    @Test
    void metIsRoundedDownSoThatOnlyAllOfItIsHundred() {
        assertEquals("met 99 %", Sheet.metInWords(0.9999));
        assertEquals("met 100 %", Sheet.metInWords(1));
        assertEquals("met \u22125 %", Sheet.metInWords(-0.05));
    }

    @Test
    void theSamePicturesGiveTheSameSheet() {
        BufferedImage a = sheet(120, 160, true).paint();
        BufferedImage b = sheet(120, 160, true).paint();
        int[] first = a.getRGB(0, 0, a.getWidth(), a.getHeight(), null, 0, a.getWidth());
        int[] second = b.getRGB(0, 0, b.getWidth(), b.getHeight(), null, 0, b.getWidth());
        assertArrayEquals(first, second);
    }

    @Test
    void refusesPicturesOfDifferentRasters() {
        IllegalArgumentException refused = assertThrows(IllegalArgumentException.class, () -> new SheetRow("n", "w", "p", Optional.empty(),
                new Retouch(List.of()), List.of(), Optional.empty(), new Picture(4, 4), new Picture(4, 4), new Picture(5, 4), Folds.NONE,
                0));
        assertTrue(refused.getMessage().contains("4x4") && refused.getMessage().contains("5x4"), refused.getMessage());
    }

    private static void keep(BufferedImage image, String name) throws IOException {
        File folder = new File("target/golden");
        assertTrue(folder.isDirectory() || folder.mkdirs());
        ImageIO.write(image, "png", new File(folder, name + ".png"));
    }
}

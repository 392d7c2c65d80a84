package org.wispwright.ui.window.easel;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.image.BufferedImage;
import java.awt.geom.AffineTransform;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.picture.Srgb;
import org.wispwright.warp.matte.Window;

/** From linear pixels to the screen. Expectations: IEC 61966-2-1 by {@link Srgb}; means and lines worked out by hand; the whole for the part. */
class PlatesTest {
    private static final Rgb BEHIND = new Rgb(0.05, 0.1, 0.2);

    private static Picture smoke(int width, int height, long seed) {
        Picture picture = new Picture(width, height);
        Random random = new Random(seed);
        for (int n = 0; n < picture.rgba().length; n += 4) {
            float alpha = random.nextFloat();
            for (int c = 0; c < 3; c++) {
                picture.rgba()[n + c] = alpha * random.nextFloat();
            }
            picture.rgba()[n + 3] = alpha;
        }
        return picture;
    }

    @Test
    void theToneIsSrgbOverTheBackgroundWithinOneCode() {
        Picture picture = smoke(40, 30, 1);
        int[] codes = new Plate(picture, new Tone(BEHIND, 0, 1)).codes();
        double[] behind = {BEHIND.r(), BEHIND.g(), BEHIND.b()};
        for (int n = 0; n < codes.length; n++) {
            for (int c = 0; c < 3; c++) {
                int got = codes[n] >> 8 * (2 - c) & 255;
                double light = picture.rgba()[4 * n + c] + (1.0 - picture.rgba()[4 * n + 3]) * behind[c];
                assertEquals(Srgb.encodeTo(255, light), got, 1, "pixel " + n + " channel " + c);
            }
        }
    }

    /** A stop is a factor of two in light: common practice, no source. Gamma 2 takes the root. */
    @Test
    void exposureDoublesLightAndGammaTakesItsRoot() {
        Picture grey = new Picture(2, 2, new float[] {0.2f, 0.2f, 0.2f, 1, 0.2f, 0.2f, 0.2f, 1, 0.2f, 0.2f, 0.2f, 1, 0.2f, 0.2f, 0.2f, 1});
        assertEquals(Srgb.encodeTo(255, 0.4), new Plate(grey, new Tone(BEHIND, 1, 1)).codes()[0] & 255, 1);
        assertEquals(Srgb.encodeTo(255, Math.sqrt(0.2)), new Plate(grey, new Tone(BEHIND, 0, 2)).codes()[0] & 255, 1);
    }

    @Test
    void aPlateThatFollowsWindowByWindowIsTheWholePlate() {
        Picture picture = smoke(301, 277, 2);
        Plate plate = new Plate(picture, new Tone(BEHIND, 0, 1));
        plate.fitting(40);
        Picture other = smoke(301, 277, 3);
        Window[] windows = {new Window(3, 5, 41, 17), new Window(200, 100, 101, 177), new Window(0, 270, 300, 7)};
        for (Window w : windows) {
            for (int y = w.top(); y < w.top() + w.height(); y++) {
                System.arraycopy(other.rgba(), 4 * (w.left() + 301 * y), picture.rgba(), 4 * (w.left() + 301 * y), 4 * w.width());
            }
            plate.refresh(w);
        }
        Plate whole = new Plate(picture, new Tone(BEHIND, 0, 1));
        assertArrayEquals(whole.codes(), plate.codes());
        assertArrayEquals(whole.fitting(130).codes(), plate.fitting(130).codes());
        assertArrayEquals(whole.fitting(65).codes(), plate.fitting(65).codes());
        assertEquals(277 / 2, plate.fitting(130).height());
    }

    @Test
    void atItsOwnSizeThePlateIsCopied() {
        Picture picture = smoke(50, 40, 4);
        Plate plate = new Plate(picture, new Tone(BEHIND, 0, 1));
        int[] screen = new int[70 * 60];
        ScaleKernel.draw(plate.codes(), 50, 40, 10, 10, 1, screen, 70, 0, 0, 70, 60, 0x123456);
        assertEquals(0x123456, screen[9 + 70 * 30]);
        for (int y = 0; y < 40; y++) {
            for (int x = 0; x < 50; x++) {
                assertEquals(plate.codes()[x + 50 * y], screen[10 + x + 70 * (10 + y)], "pixel " + x + ", " + y);
            }
        }
    }

    /** Bilinear interpolation keeps a line: worked out by hand. */
    @Test
    void enlargedARampStaysARamp() {
        int[] ramp = new int[64 * 8];
        for (int n = 0; n < ramp.length; n++) {
            ramp[n] = 0x010101 * (4 * (n % 64));
        }
        int[] screen = new int[160 * 20];
        ScaleKernel.draw(ramp, 64, 8, 0, 0, 2.5, screen, 160, 0, 0, 160, 20, 0);
        for (int x = 5; x < 155; x++) {
            double expected = 4 * ((x + 0.5) / 2.5 - 0.5);
            assertEquals(expected, screen[x + 160 * 10] & 255, 1.01, "column " + x);
        }
    }

    @Test
    void aPartOfThePaneIsThatPartOfTheWhole() {
        Picture picture = smoke(400, 300, 5);
        Tone tone = new Tone(BEHIND, 0, 1);
        Plate plate = new Plate(picture, tone);
        for (double scale : new double[] {110, 250, 300, 470, 2000}) {
            Placement lies = new Placement(-20.3, 7.7, scale);
            Pane pane = new Pane();
            pane.show(plate, lies, 500, 350, 0x808080);
            Window window = new Window(120, 90, 33, 41);
            Picture other = smoke(400, 300, 6);
            for (int y = 90; y < 131; y++) {
                System.arraycopy(other.rgba(), 4 * (120 + 400 * y), picture.rgba(), 4 * (120 + 400 * y), 4 * 33);
            }
            plate.refresh(window);
            assertTrue(!pane.changed(window).isEmpty() || scale == 2000);
            Pane fresh = new Pane();
            fresh.show(new Plate(picture, tone), lies, 500, 350, 0x808080);
            assertArrayEquals(pixels(fresh), pixels(pane), "scale " + scale);
        }
    }

    private static int[] pixels(Pane pane) {
        BufferedImage image = new BufferedImage(500, 350, BufferedImage.TYPE_INT_RGB);
        pane.paint(image.createGraphics(), new AffineTransform());
        return image.getRGB(0, 0, 500, 350, null, 0, 500);
    }

    @Test
    void aFadeIsAMixOfLightAndADifferenceOfTheSameIsBlack() {
        Picture a = smoke(9, 7, 7);
        Picture b = smoke(9, 7, 8);
        Picture half = Mixing.fade(a, b, 0.25);
        for (int n = 0; n < a.rgba().length; n++) {
            assertEquals(0.75 * a.rgba()[n] + 0.25 * b.rgba()[n], half.rgba()[n], 1e-6);
        }
        Picture same = Mixing.difference(a, a.copy(), BEHIND, 8);
        Picture other = Mixing.difference(a, b, BEHIND, 2);
        for (int n = 0; n < a.rgba().length; n += 4) {
            assertEquals(0, same.rgba()[n], 0);
            double overA = a.rgba()[n] + (1 - a.rgba()[n + 3]) * BEHIND.r();
            double overB = b.rgba()[n] + (1 - b.rgba()[n + 3]) * BEHIND.r();
            assertEquals(2 * Math.abs(overA - overB), other.rgba()[n], 1e-6);
            assertEquals(1, other.rgba()[n + 3], 0);
        }
    }
}

package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.lang.management.ManagementFactory;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Window;

/** A soft stroke blurs its own window only; the whole picture blurred is the slow twin. */
class SoftenTest {
    /** A window has the bits of the whole: inside, at each border, one pixel, and wider than its surroundings. */
    @ParameterizedTest
    @CsvSource({"4,3,5,6,1.1", "0,0,3,2,0.7", "15,11,2,2,2.3", "7,0,1,1,9", "0,5,17,1,0.4", "0,0,17,13,3", "3,3,4,4,0"})
    void aWindowHasTheBitsOfTheWhole(int left, int top, int wide, int high, double sigma) {
        int width = 17;
        int height = 13;
        for (int channels = 1; channels <= 4; channels += 3) {
            float[] in = new float[channels * width * height];
            for (int n = 0; n < in.length; n++) {
                in[n] = (float) Math.sin(1 + 7 * n);
            }
            float[] whole = Gaussian.blurred(in, channels, width, height, sigma);
            float[] part = Gaussian.blurred(in, channels, width, height, sigma, new Window(left, top, wide, high));
            assertEquals(channels * wide * high, part.length);
            for (int n = 0; n < part.length; n++) {
                int x = left + n / channels % wide;
                int y = top + n / channels / wide;
                assertEquals(whole[channels * (x + width * y) + n % channels], part[n], "(" + x + ", " + y + ")");
            }
        }
    }

    /** The same stroke by blurring everything: in the middle, over a corner, over the whole frame, a dab, beside the frame. */
    @ParameterizedTest
    @CsvSource({"0.4,0.5,0.6,0.3,0.08", "-0.05,-0.02,0.1,0.1,0.1", "0.1,0.1,1.2,0.9,0.7", "0.6,0.4,0.6,0.4,0.03", "3,3,4,4,0.2"})
    void aStrokeEqualsPlain(double ax, double ay, double bx, double by, double radius) {
        Picture original = picture(75, 57);
        Stroke stroke = new Stroke(Brush.SOFTEN, radius, .9, .6, List.of(new Point(ax, ay), new Point(bx, by)), Optional.empty());
        Picture wanted = Retoucher.wanted(new Retouch(List.of(stroke)), original);
        float[] coverage = stroke.coverage(new Picture(75, 57));
        float[] blurred = Gaussian.blurred(original.rgba(), 4, 75, 57, Brushwork.SOFTEN_SIGMA * radius * 57);
        float[] plain = original.rgba().clone();
        int covered = 0;
        for (int n = 0; n < plain.length; n++) {
            if (coverage[n / 4] > 0) {
                plain[n] += coverage[n / 4] * (blurred[n] - plain[n]);
                plain[n] = n % 4 == 3 ? Math.min(1f, plain[n]) : plain[n];
                covered++;
            }
        }
        assertEquals(ax > 2 ? 0 : 1, covered > 0 ? 1 : 0);
        assertArrayEquals(plain, wanted.rgba(), 1e-6f);
    }

    /** Far less memory is touched: a small dab on a large picture takes a small part of what blurring all would. */
    @Test
    void aSmallDabTakesLittle() {
        Picture original = picture(1200, 900);
        Stroke dab = new Stroke(Brush.SOFTEN, .02, 1, .5, List.of(new Point(.5, .5)), Optional.empty());
        float[] coverage = dab.coverage(new Picture(1200, 900));
        int count = 0;
        for (float c : coverage) {
            count += c > 0 ? 1 : 0;
        }
        assertTrue(count > 500 && count < 1300, "the dab covers " + count + " pixels");
        com.sun.management.ThreadMXBean threads =
                (com.sun.management.ThreadMXBean) ManagementFactory.getThreadMXBean();
        long before = threads.getCurrentThreadAllocatedBytes();
        Brushwork.apply(dab, original, original);
        long bytes = threads.getCurrentThreadAllocatedBytes() - before;
        // Coverage and its distances take 12 bytes a pixel, a whole blur 32 more.
        assertTrue(bytes < 14L * 1200 * 900, "took " + bytes + " bytes");
    }

    private static Picture picture(int width, int height) {
        Picture picture = new Picture(width, height);
        for (int n = 0; n < picture.rgba().length; n++) {
            picture.rgba()[n] = (float) (.5 + .5 * Math.sin(1 + .37 * n));
        }
        return picture;
    }
}

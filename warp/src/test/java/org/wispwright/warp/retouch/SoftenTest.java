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
    /** The same stroke by blurring everything: in the middle, over a corner, over the whole frame, a dab, beside the frame. */
    @ParameterizedTest
    @CsvSource({"0.4,0.5,0.6,0.3,0.08", "-0.05,-0.02,0.1,0.1,0.1", "0.1,0.1,1.2,0.9,0.7", "0.6,0.4,0.6,0.4,0.03", "3,3,4,4,0.2"})
    void aStrokeEqualsPlain(double ax, double ay, double bx, double by, double radius) {
        Picture original = picture(75, 57);
        Stroke stroke = new Stroke(Brush.SOFTEN, radius, .9, .6, List.of(new Point(ax, ay), new Point(bx, by)), Optional.empty());
        Picture wanted = Retoucher.wanted(new Retouch(List.of(stroke)), original);
        float[] coverage = stroke.sweep().coverage(Window.all(75, 57), 57);
        double[][] blurred = new double[4][];
        for (int c = 0; c < 4; c++) {
            blurred[c] = GaussianTest.plain(original, c, Brushwork.SOFTEN_SIGMA * radius * 57);
        }
        float[] plain = original.rgba().clone();
        int covered = 0;
        for (int n = 0; n < plain.length; n++) {
            if (coverage[n / 4] > 0) {
                plain[n] += coverage[n / 4] * (blurred[n % 4][n / 4] - plain[n]);
                plain[n] = n % 4 == 3 ? Math.min(1f, plain[n]) : plain[n];
                covered++;
            }
        }
        assertEquals(ax > 2 ? 0 : 1, covered > 0 ? 1 : 0);
        assertArrayEquals(plain, wanted.rgba(), 5e-4f);
    }

    /** Far less memory is touched: a small dab on a large picture takes a small part of what blurring all would. */
    @Test
    void aSmallDabTakesLittle() {
        Picture original = picture(1200, 900);
        Stroke dab = new Stroke(Brush.SOFTEN, .02, 1, .5, List.of(new Point(.5, .5)), Optional.empty());
        Canvas canvas = new Canvas(original);
        canvas.apply(dab);
        com.sun.management.ThreadMXBean threads =
                (com.sun.management.ThreadMXBean) ManagementFactory.getThreadMXBean();
        long before = threads.getCurrentThreadAllocatedBytes();
        canvas.apply(dab);
        long bytes = threads.getCurrentThreadAllocatedBytes() - before;
        // The blocks are there from the first dab; a copy of the picture would be 17 million.
        assertTrue(bytes < 1200 * 900, "took " + bytes + " bytes");
    }

    private static Picture picture(int width, int height) {
        Picture picture = new Picture(width, height);
        for (int n = 0; n < picture.rgba().length; n++) {
            picture.rgba()[n] = (float) (.5 + .5 * Math.sin(1 + .37 * n));
        }
        return picture;
    }
}

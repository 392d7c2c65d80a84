package org.wispwright.render.picture;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Outside checks R21 to R28: Porter and Duff (1984), "Compositing digital images", SIGGRAPH 84, 253-259. */
class CompositingTest {
    private static final double[] A = {.25, .10, .05, .5};
    private static final double[] B = {.20, .40, .60, .80};
    private static final double[] C = {.30, .30, 0, .30};

    /** R21: A over B. */
    @Test
    void r21_over() {
        check(Compositing.OVER, A, B, .35, .30, .35, .90);
    }

    /** R22: B over A. */
    @Test
    void r22_overTheOtherWay() {
        check(Compositing.OVER, B, A, .25, .42, .61, .90);
    }

    /** R23: A in B, B in A. */
    @Test
    void r23_in() {
        check(Compositing.IN, A, B, .20, .08, .04, .40);
        check(Compositing.IN, B, A, .10, .20, .30, .40);
    }

    /** R24: A out B, B out A. */
    @Test
    void r24_out() {
        check(Compositing.OUT, A, B, .05, .02, .01, .10);
        check(Compositing.OUT, B, A, .10, .20, .30, .40);
    }

    /** R25: A atop B, B atop A. */
    @Test
    void r25_atop() {
        check(Compositing.ATOP, A, B, .30, .28, .34, .80);
        check(Compositing.ATOP, B, A, .15, .22, .31, .50);
    }

    /** R26: A xor B, A plus B. */
    @Test
    void r26_xorAndPlus() {
        check(Compositing.XOR, A, B, .15, .22, .31, .50);
        check(Compositing.PLUS, A, B, .45, .50, .65, 1.30);
    }

    /** R27: over is associative. */
    @Test
    void r27_associative() {
        double[] expected = {.38, .33, .35, .93};
        assertArrayEquals(expected, Compositing.OVER.mix(Compositing.OVER.mix(A, B), C), 1e-15);
        assertArrayEquals(expected, Compositing.OVER.mix(A, Compositing.OVER.mix(B, C)), 1e-15);
        Random random = new Random(42);
        for (int n = 0; n < 100; n++) {
            double[] a = pixel(random);
            double[] b = pixel(random);
            double[] c = pixel(random);
            assertArrayEquals(Compositing.OVER.mix(Compositing.OVER.mix(a, b), c), Compositing.OVER.mix(a, Compositing.OVER.mix(b, c)), 1e-14);
        }
    }

    /** R28: over does not commute, a clear layer changes nothing, an opaque one hides. */
    @Test
    void r28_clearAndOpaque() {
        assertFalse(Arrays.equals(Compositing.OVER.mix(A, B), Compositing.OVER.mix(B, A)));
        double[] clear = {0, 0, 0, 0};
        assertArrayEquals(A, Compositing.OVER.mix(clear, A));
        assertArrayEquals(A, Compositing.OVER.mix(A, clear));
        double[] opaque = {.3, .2, .1, 1};
        assertArrayEquals(opaque, Compositing.OVER.mix(opaque, A));
    }

    @Test
    void anEvenBackgroundIsAnOpaqueLayerBehind() {
        Picture front = new Picture(1, 1, new float[] {.25f, .10f, .05f, .5f});
        Picture got = new Picture(1, 1);
        Compositing.overEven(front, new Rgb(.2, .4, .6), got);
        double[] expected = Compositing.OVER.mix(A, new double[] {.2, .4, .6, 1});
        for (int c = 0; c < 4; c++) {
            assertEquals(expected[c], got.at(0, 0, c), 1e-7);
        }
    }

    @Test
    void picturesOfAnotherRasterAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> Compositing.OVER.mix(new Picture(2, 1), new Picture(1, 2), new Picture(2, 1)));
    }

    /** Numbers and whole pictures give the same. */
    private static void check(Compositing operator, double[] a, double[] b, double... expected) {
        assertArrayEquals(expected, operator.mix(a, b), 1e-15);
        Picture got = new Picture(2, 1);
        operator.mix(twice(a), twice(b), got);
        for (int c = 0; c < 4; c++) {
            assertEquals(expected[c], got.at(1, 0, c), 2e-7);
        }
    }

    private static Picture twice(double[] pixel) {
        Picture picture = new Picture(2, 1);
        for (int n = 0; n < 8; n++) {
            picture.rgba()[n] = (float) pixel[n % 4];
        }
        return picture;
    }

    private static double[] pixel(Random random) {
        double alpha = random.nextDouble();
        return new double[] {alpha * random.nextDouble(), alpha * random.nextDouble(), alpha * random.nextDouble(), alpha};
    }
}

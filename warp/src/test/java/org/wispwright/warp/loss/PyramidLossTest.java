package org.wispwright.warp.loss;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.lang.management.ManagementFactory;
import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;
import org.wispwright.render.picture.Picture;

class PyramidLossTest extends PullbackContract {
    private static final int WIDTH = 21;
    private static final int HEIGHT = 34;

    /** J of a 21x34 picture (3 levels) with weights from 0 to 1, and its pullback. */
    @Override
    protected Operator operator() {
        int inputs = 4 * WIDTH * HEIGHT;
        PyramidLoss loss = new PyramidLoss(picture(WIDTH, HEIGHT, 11), weights(WIDTH, HEIGHT, 12));
        return new Operator("pyramid loss", inputs, 1, false, random(inputs, 13), random(inputs, 14),
                (in, out) -> out[0] = loss.value(new Picture(WIDTH, HEIGHT, narrow(in))), (in, outBar, inBar) -> {
                    float[] bar = narrow(inBar);
                    loss.valueAndPullback(new Picture(WIDTH, HEIGHT, narrow(in)), bar, outBar[0]);
                    for (int n = 0; n < inputs; n++) {
                        inBar[n] = bar[n];
                    }
                });
    }

    /** By hand: 8x8 is one level, so a difference of d in one channel everywhere gives d^2. */
    @Test
    void oneLevelByHand() {
        float[] ones = new float[64];
        Arrays.fill(ones, 1f);
        PyramidLoss loss = new PyramidLoss(new Picture(8, 8), ones);
        Picture got = new Picture(8, 8);
        for (int p = 0; p < 64; p++) {
            got.rgba()[4 * p + 3] = 0.5f;
        }
        assertEquals(0.25, loss.value(got), 1e-12);
        float[] bar = new float[256];
        assertEquals(0.25, loss.valueAndPullback(got, bar, 3), 1e-12);
        assertEquals(3 * 2 * 0.5 / 64, bar[3], 1e-8);
        assertEquals(0, bar[0]);
    }

    /** By hand: a constant difference stays so on every level, so J = levels * d^2, and level 0 alone is d^2. */
    @Test
    void constantDifferenceCountsOncePerLevel() {
        float[] ones = new float[96 * 128];
        Arrays.fill(ones, 1f);
        PyramidLoss loss = new PyramidLoss(new Picture(96, 128), ones);
        Picture got = new Picture(96, 128);
        Arrays.fill(got.rgba(), 0.5f);
        assertEquals(4 * 4 * 0.25, loss.value(got), 1e-6);
        assertEquals(4 * 0.25, loss.finest(got), 1e-12);
        assertEquals(1.0, loss.lastLevelValues()[3], 1e-6);
    }

    @Test
    void zeroAtTheWantedPictureAndWhereWeightsAreZero() {
        Picture wanted = picture(WIDTH, HEIGHT, 1);
        assertEquals(0, new PyramidLoss(wanted, weights(WIDTH, HEIGHT, 2)).value(wanted.copy()));
        assertEquals(0, new PyramidLoss(wanted, new float[WIDTH * HEIGHT]).value(picture(WIDTH, HEIGHT, 3)));
    }

    /** Why there is a pyramid: of two spots that miss the wanted one, the nearer costs less, though the finest level cannot tell. */
    @Test
    void coarseLevelsSeeATargetThatDoesNotOverlap() {
        float[] ones = new float[64 * 64];
        Arrays.fill(ones, 1f);
        PyramidLoss loss = new PyramidLoss(spot(10), ones);
        assertEquals(loss.finest(spot(24)), loss.finest(spot(40)), 1e-9);
        double near = loss.value(spot(24));
        double nearCoarsest = loss.lastLevelValues()[3];
        double far = loss.value(spot(40));
        double farCoarsest = loss.lastLevelValues()[3];
        assertTrue(near < 0.97 * far, () -> "near " + near + ", far " + far);
        assertTrue(nearCoarsest < 0.8 * farCoarsest, () -> "coarsest level: near " + nearCoarsest + ", far " + farCoarsest);
    }

    @Test
    void pullbackAddsItsScaledShare() {
        PyramidLoss loss = new PyramidLoss(picture(WIDTH, HEIGHT, 1), weights(WIDTH, HEIGHT, 2));
        Picture got = picture(WIDTH, HEIGHT, 3);
        float[] once = new float[got.rgba().length];
        loss.valueAndPullback(got, once, 1);
        float[] more = new float[once.length];
        Arrays.fill(more, 1f);
        loss.valueAndPullback(got, more, 2);
        for (int n = 0; n < once.length; n++) {
            assertEquals(1 + 2 * once[n], more[n], 1e-6);
        }
    }

    @Test
    void aWarmCallAllocatesNothing() {
        PyramidLoss loss = new PyramidLoss(picture(96, 128, 1), weights(96, 128, 2));
        Picture got = picture(96, 128, 3);
        float[] bar = new float[got.rgba().length];
        for (int n = 0; n < 20; n++) {
            loss.valueAndPullback(got, bar, 1);
        }
        com.sun.management.ThreadMXBean threads = (com.sun.management.ThreadMXBean) ManagementFactory.getThreadMXBean();
        long before = threads.getCurrentThreadAllocatedBytes();
        for (int n = 0; n < 10; n++) {
            loss.valueAndPullback(got, bar, 1);
        }
        long bytes = threads.getCurrentThreadAllocatedBytes() - before;
        assertTrue(bytes < 4096, () -> "10 calls allocated " + bytes + " bytes; one 96x128 picture is 196608");
    }

    @Test
    void refusesOtherRastersAndBadWeights() {
        PyramidLoss loss = new PyramidLoss(new Picture(10, 12), new float[120]);
        assertThrows(IllegalArgumentException.class, () -> loss.value(new Picture(12, 10)));
        assertThrows(IllegalArgumentException.class, () -> new PyramidLoss(new Picture(10, 12), new float[119]));
        float[] bad = new float[120];
        bad[13] = Float.NaN;
        String message = assertThrows(IllegalArgumentException.class, () -> new PyramidLoss(new Picture(10, 12), bad)).getMessage();
        assertTrue(message.contains("(3, 1)"), message);
    }

    /** By hand: pixels differ by .1 in all four channels and by .2 in one, with weights 1 and 3. */
    @Test
    void meanAbsoluteDifferenceByHand() {
        Picture a = new Picture(2, 1);
        Picture b = new Picture(2, 1, new float[] {.1f, -.1f, .1f, .1f, 0, 0, .2f, 0});
        assertEquals((1 * .4 + 3 * .2) / 16, PictureMeasure.meanAbsoluteDifference(a, b, new float[] {1, 3}), 1e-7);
        assertEquals(0, PictureMeasure.meanAbsoluteDifference(a, b, new float[2]));
        assertEquals(.1, PictureMeasure.mass(b), 1e-7);
        assertArrayEquals(new float[8], a.rgba());
    }

    private static Picture spot(int at) {
        Picture picture = new Picture(64, 64);
        for (int y = 26; y < 38; y++) {
            for (int x = at; x < at + 12; x++) {
                picture.rgba()[4 * (x + 64 * y) + 3] = 1;
            }
        }
        return picture;
    }

    private static Picture picture(int width, int height, long seed) {
        return new Picture(width, height, narrow(random(4 * width * height, seed)));
    }

    private static float[] weights(int width, int height, long seed) {
        float[] out = narrow(random(width * height, seed));
        for (int n = 0; n < out.length; n++) {
            out[n] = Math.max(0, out[n]);
        }
        return out;
    }

    private static float[] narrow(double[] values) {
        float[] out = new float[values.length];
        for (int n = 0; n < out.length; n++) {
            out[n] = (float) values[n];
        }
        return out;
    }
}

package org.wispwright.warp.loss;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.wispwright.warp.loss.LossPictures.blob;
import static org.wispwright.warp.loss.LossPictures.narrow;
import static org.wispwright.warp.loss.LossPictures.ones;
import static org.wispwright.warp.loss.LossPictures.waves;
import static org.wispwright.warp.loss.LossPictures.widen;

import org.junit.jupiter.api.Test;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.measure.Plane;
import org.wispwright.warp.measure.Silhouette;

class SilhouetteLossTest extends PullbackContract {
    private static final int WIDTH = 19;
    private static final int HEIGHT = 22;

    /** J of 19x22 pictures with weights from 0 to 2; smooth everywhere. */
    @Override
    protected Operator operator() {
        int inputs = 4 * WIDTH * HEIGHT;
        float[] weights = new float[WIDTH * HEIGHT];
        for (int p = 0; p < weights.length; p++) {
            weights[p] = p % 5 * .5f;
        }
        SilhouetteLoss loss = new SilhouetteLoss(blob(WIDTH, HEIGHT, 11, 8, 4, 1), weights, .4, .15);
        double[] direction = random(inputs, 4);
        for (int n = 0; n < inputs; n++) {
            direction[n] *= .1;
        }
        return new Operator("silhouette loss", inputs, 1, false, widen(waves(WIDTH, HEIGHT, 1).rgba()), direction,
                (in, out) -> out[0] = loss.value(new Picture(WIDTH, HEIGHT, narrow(in))), (in, outBar, inBar) -> {
                    float[] bar = narrow(inBar);
                    loss.valueAndPullback(new Picture(WIDTH, HEIGHT, narrow(in)), bar, outBar[0]);
                    for (int n = 0; n < inputs; n++) {
                        inBar[n] = bar[n];
                    }
                });
    }

    /** U38: with a sharp threshold 1 - J is the intersection over union of pixels, 1224/1304 for the disc moved by 1. */
    @Test
    void u38_sharpItIsTheIntersectionOverUnion() {
        int[][] rows = {{1, 1224, 1304}, {3, 1144, 1384}, {5, 1064, 1464}, {10, 868, 1660}};
        for (int[] row : rows) {
            SilhouetteLoss loss = new SilhouetteLoss(disc(31.5), ones(64, 64), .5, .01);
            assertEquals((double) row[1] / row[2], 1 - loss.value(disc(31.5 + row[0])), 1e-9, "shift by " + row[0]);
        }
        Silhouette a = Silhouette.of(Plane.alpha(blob(50, 40, 20, 20, 7, 1)), .5);
        Silhouette b = Silhouette.of(Plane.alpha(blob(50, 40, 24, 22, 8, 1)), .5);
        SilhouetteLoss loss = new SilhouetteLoss(blob(50, 40, 20, 20, 7, 1), ones(50, 40), .5, 1e-5);
        assertEquals(a.intersectionOverUnion(b), 1 - loss.value(blob(50, 40, 24, 22, 8, 1)), 1e-3);
    }

    /** U39's conventions: equal or both empty, 0; one empty, 1. */
    @Test
    void u39_emptySilhouettes() {
        Picture empty = new Picture(64, 64);
        assertEquals(0, new SilhouetteLoss(empty, ones(64, 64), .5, .05).value(new Picture(64, 64)), 1e-15);
        assertEquals(1, new SilhouetteLoss(empty, ones(64, 64), .5, .02).value(disc(31.5)), 1e-6);
        assertEquals(1, new SilhouetteLoss(disc(31.5), ones(64, 64), .5, .02).value(empty), 1e-6);
        assertEquals(0, new SilhouetteLoss(disc(31.5), new float[64 * 64], .5, .02).value(empty));
    }

    /** Soft equal silhouettes are at the minimum: the derivative there is 0. */
    @Test
    void equalPicturesAreAtTheMinimum() {
        Picture wanted = waves(32, 24, 1);
        SilhouetteLoss loss = new SilhouetteLoss(wanted, ones(32, 24), .5, .1);
        float[] bar = new float[wanted.rgba().length];
        assertEquals(0, loss.valueAndPullback(wanted.copy(), bar, 1));
        for (float b : bar) {
            assertEquals(0, b);
        }
    }

    /** By hand: one pixel at g = 3/4 where w = 1/4: J = (1/4) / (9/16 + 1/16 - 3/16) = 4/7; dJ/dg = (2/2 - 4/7 * 5/4) / (7/16). */
    @Test
    void onePixelByHand() {
        double t = .1;
        float high = (float) (.5 + t * Math.log(3));
        float low = (float) (.5 - t * Math.log(3));
        SilhouetteLoss loss = new SilhouetteLoss(new Picture(1, 1, new float[] {0, 0, 0, low}), new float[] {2}, .5, t);
        float[] bar = {1, 1, 1, 1};
        assertEquals(4.0 / 7, loss.valueAndPullback(new Picture(1, 1, new float[] {.3f, .3f, .3f, high}), bar, 5), 1e-6);
        double slope = (1 - 4.0 / 7 * 5 / 4) / (7.0 / 16) * (3.0 / 16) / t;
        assertEquals(1 + 5 * slope, bar[3], 1e-5);
        assertEquals(1, bar[0]);
    }

    @Test
    void aWarmCallAllocatesNothing() {
        SilhouetteLoss loss = new SilhouetteLoss(blob(96, 128, 30, 40, 9, 1), ones(96, 128), .5, .1);
        long bytes = LossPictures.bytesOfTenCalls(loss, waves(96, 128, 3));
        assertTrue(bytes < 4096, () -> "10 calls allocated " + bytes + " bytes; one 96x128 plane of doubles is 98304");
    }

    @Test
    void refusesWhatDoesNotFit() {
        Picture wanted = new Picture(10, 12);
        assertThrows(IllegalArgumentException.class, () -> new SilhouetteLoss(wanted, new float[119], .5, .1));
        assertThrows(IllegalArgumentException.class, () -> new SilhouetteLoss(wanted, new float[120], 0, .1));
        assertThrows(IllegalArgumentException.class, () -> new SilhouetteLoss(wanted, new float[120], .5, Double.NaN));
        SilhouetteLoss loss = new SilhouetteLoss(wanted, new float[120], .5, .1);
        assertThrows(IllegalArgumentException.class, () -> loss.value(new Picture(12, 10)));
        assertThrows(IllegalArgumentException.class, () -> loss.valueAndPullback(wanted, new float[3], 1));
    }

    private static Picture disc(double cx) {
        Picture picture = new Picture(64, 64);
        for (int p = 0; p < 64 * 64; p++) {
            double dx = p % 64 - cx;
            double dy = p / 64 - 31.5;
            picture.rgba()[4 * p + 3] = dx * dx + dy * dy <= 400 ? 1 : 0;
        }
        return picture;
    }
}

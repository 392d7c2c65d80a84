package org.wispwright.warp.loss;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.wispwright.warp.loss.LossPictures.blob;
import static org.wispwright.warp.loss.LossPictures.narrow;
import static org.wispwright.warp.loss.LossPictures.ones;
import static org.wispwright.warp.loss.LossPictures.waves;
import static org.wispwright.warp.loss.LossPictures.widen;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;
import org.wispwright.render.picture.Picture;

class EdgeLossTest extends PullbackContract {
    private static final int WIDTH = 19;
    private static final int HEIGHT = 22;

    /** J of 19x22 pictures with weights from 0 to 2; quadratic. */
    @Override
    protected Operator operator() {
        int inputs = 4 * WIDTH * HEIGHT;
        float[] weights = new float[WIDTH * HEIGHT];
        for (int p = 0; p < weights.length; p++) {
            weights[p] = p % 5 * .5f;
        }
        EdgeLoss loss = new EdgeLoss(blob(WIDTH, HEIGHT, 11, 8, 4, 1), weights);
        return new Operator("edge loss", inputs, 1, false, widen(waves(WIDTH, HEIGHT, 1).rgba()), random(inputs, 4),
                (in, out) -> out[0] = loss.value(new Picture(WIDTH, HEIGHT, narrow(in))), (in, outBar, inBar) -> {
                    float[] bar = narrow(inBar);
                    loss.valueAndPullback(new Picture(WIDTH, HEIGHT, narrow(in)), bar, outBar[0]);
                    for (int n = 0; n < inputs; n++) {
                        inBar[n] = bar[n];
                    }
                });
    }

    /**
     * By hand, 3x1, alpha wanted (0, 1, 1): s^2 = (1, 0, 0), its mean 1/3, q = (1/4 + 3/4 * 3/4, 1/4, 1/4) = (13/16, 1/4, 1/4). Got
     * (0, 0, 0) differs by e = (0, -1, -1): only the first link has a slope, J = (13/16 + 1/4) / 2 = 17/32, and J' is -17/16 at the second
     * pixel, +17/16 at the first.
     */
    @Test
    void oneEdgeByHand() {
        EdgeLoss loss = new EdgeLoss(alpha(3, 1, 0, 1, 1), ones(3, 1));
        float[] bar = new float[12];
        bar[3] = 1;
        assertEquals(17.0 / 32, loss.valueAndPullback(new Picture(3, 1), bar, 2), 1e-7);
        assertEquals(1 + 2 * 17.0 / 16, bar[3], 1e-6);
        assertEquals(-2 * 17.0 / 16, bar[7], 1e-6);
        assertEquals(0, bar[11]);
        assertEquals(17.0 / 32, new EdgeLoss(alpha(1, 3, 0, 1, 1), ones(1, 3)).value(new Picture(1, 3)), 1e-7);
    }

    /** By hand: a false edge where the wanted picture is flat counts a quarter: 4 links of (1/4) 1^2 around one pixel, colour alike. */
    @Test
    void aFalseEdgeCountsAQuarter() {
        Picture got = new Picture(5, 5);
        got.rgba()[4 * 12 + 1] = 1;
        assertEquals(1, new EdgeLoss(new Picture(5, 5), ones(5, 5)).value(got), 1e-7);
    }

    /** A constant difference has no slope. */
    @Test
    void aConstantDifferenceCostsNothing() {
        Picture wanted = waves(32, 24, 1);
        Picture got = wanted.copy();
        for (int n = 0; n < got.rgba().length; n++) {
            got.rgba()[n] += .125f;
        }
        assertEquals(0, new EdgeLoss(wanted, ones(32, 24)).value(got), 1e-10);
    }

    /**
     * Dirichlet's energy does not depend on the raster. Weights of the difference alone: wanted is flat, so q = 1/4, and for
     * {@code got = exp(-r^2 / (2 s^2))} the integral of the squared gradient over the plane is pi, for any s.
     */
    @Test
    void smoothPicturesCostTheSameAtAnyRaster() {
        for (int height : new int[] {40, 80, 160, 320}) {
            EdgeLoss loss = new EdgeLoss(new Picture(height, height), ones(height, height));
            Picture bump = blob(height, height, .5 * height, .5 * height, .1 * height, 1);
            assertEquals(Math.PI / 4, loss.value(bump), .01 * Math.PI, "rows " + height);
        }
        double coarse = new EdgeLoss(blob(80, 80, 40, 40, 8, 1), ones(80, 80)).value(blob(80, 80, 44, 40, 8, 1));
        double fine = new EdgeLoss(blob(320, 320, 160, 160, 32, 1), ones(320, 320)).value(blob(320, 320, 176, 160, 32, 1));
        assertEquals(fine, coarse, .05 * fine);
    }

    /** An edge that is wanted weighs more than the same edge where none is: q above the floor there. */
    @Test
    void aLostEdgeCostsMoreThanAFalseOne() {
        Picture edge = blob(64, 64, 32, 32, 3, 1);
        Picture none = new Picture(64, 64);
        double lost = new EdgeLoss(edge, ones(64, 64)).value(none);
        double added = new EdgeLoss(none, ones(64, 64)).value(edge);
        assertTrue(lost > 2.5 * added && lost < 4 * added, lost + " and " + added);
    }

    @Test
    void aWarmCallAllocatesNothing() {
        EdgeLoss loss = new EdgeLoss(blob(96, 128, 30, 40, 9, 1), ones(96, 128));
        long bytes = LossPictures.bytesOfTenCalls(loss, waves(96, 128, 3));
        assertTrue(bytes < 4096, () -> "10 calls allocated " + bytes + " bytes; one 96x128 plane of floats is 49152");
    }

    @Test
    void refusesWhatDoesNotFit() {
        Picture wanted = new Picture(10, 12);
        assertThrows(IllegalArgumentException.class, () -> new EdgeLoss(wanted, new float[119]));
        EdgeLoss loss = new EdgeLoss(wanted, new float[120]);
        assertEquals(0, loss.value(wanted));
        assertThrows(IllegalArgumentException.class, () -> loss.value(new Picture(12, 10)));
        assertThrows(IllegalArgumentException.class, () -> loss.valueAndPullback(wanted, new float[3], 1));
        float[] bad = new float[120];
        Arrays.fill(bad, Float.NaN);
        assertThrows(IllegalArgumentException.class, () -> new EdgeLoss(wanted, bad));
    }

    private static Picture alpha(int width, int height, double... values) {
        Picture picture = new Picture(width, height);
        for (int p = 0; p < values.length; p++) {
            picture.rgba()[4 * p + 3] = (float) values[p];
        }
        return picture;
    }
}

package org.wispwright.warp.loss;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.wispwright.warp.loss.LossPictures.blob;
import static org.wispwright.warp.loss.LossPictures.narrow;
import static org.wispwright.warp.loss.LossPictures.ones;
import static org.wispwright.warp.loss.LossPictures.waves;
import static org.wispwright.warp.loss.LossPictures.widen;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;
import org.wispwright.render.picture.Picture;

class SlicedWassersteinLossTest extends PullbackContract {
    private static final int WIDTH = 23;
    private static final int HEIGHT = 31;

    /** J of filled pictures, so no place is at the kink alpha = 0; the direction is a broad bump, as noise averages out along lines. */
    @Override
    protected Operator operator() {
        int inputs = 4 * WIDTH * HEIGHT;
        float[] weights = new float[WIDTH * HEIGHT];
        for (int p = 0; p < weights.length; p++) {
            weights[p] = .5f + .5f * (p % 3);
        }
        SlicedWassersteinLoss loss = new SlicedWassersteinLoss(waves(WIDTH, HEIGHT, 1), weights);
        double[] direction = widen(blob(WIDTH, HEIGHT, 6, 20, 5, .1).rgba());
        return new Operator("sliced Wasserstein loss", inputs, 1, false, widen(waves(WIDTH, HEIGHT, 0).rgba()), direction,
                (in, out) -> out[0] = loss.value(new Picture(WIDTH, HEIGHT, narrow(in))), (in, outBar, inBar) -> {
                    float[] bar = narrow(inBar);
                    loss.valueAndPullback(new Picture(WIDTH, HEIGHT, narrow(in)), bar, outBar[0]);
                    for (int n = 0; n < inputs; n++) {
                        inBar[n] = bar[n];
                    }
                });
    }

    /** Bonneel et al. (2015): a shift by c costs |c|^2 times the mean of cos^2 over directions, 1/2, whatever the direction. */
    @ParameterizedTest
    @CsvSource({"12,0", "0,-20", "9,15", "30,-24", "1,0"})
    void aShiftCostsHalfItsSquare(double dx, double dy) {
        Picture wanted = blob(128, 96, 60, 48, 4, 1);
        SlicedWassersteinLoss loss = new SlicedWassersteinLoss(wanted, ones(128, 96));
        double squared = (dx * dx + dy * dy) / (96.0 * 96.0);
        // The background of 1e-3 takes some of the mass another way: within 5 % here.
        assertEquals(squared / 2, loss.value(blob(128, 96, 60 + dx, 48 + dy, 4, 1)), .05 * squared / 2 + 1e-6);
    }

    /** The same place and shape but thinner: as distributions they are equal (up to the background). */
    @Test
    void theAmountDoesNotCount() {
        SlicedWassersteinLoss loss = new SlicedWassersteinLoss(blob(64, 64, 30, 34, 5, 1), ones(64, 64));
        double thinner = loss.value(blob(64, 64, 30, 34, 5, .5));
        double moved = loss.value(blob(64, 64, 36, 34, 5, 1));
        assertTrue(thinner < .02 * moved, () -> "thinner " + thinner + ", moved by 6 pixels " + moved);
    }

    @Test
    void zeroAtTheWantedPictureAndWhereWeightsAreZero() {
        Picture wanted = blob(40, 30, 20, 10, 4, 1);
        SlicedWassersteinLoss loss = new SlicedWassersteinLoss(wanted, ones(40, 30));
        float[] bar = new float[wanted.rgba().length];
        assertEquals(0, loss.valueAndPullback(wanted.copy(), bar, 1), 1e-25);
        for (float b : bar) {
            assertEquals(0, b, 1e-12);
        }
        SlicedWassersteinLoss none = new SlicedWassersteinLoss(wanted, new float[1200]);
        assertEquals(0, none.valueAndPullback(blob(40, 30, 5, 5, 4, 1), bar, 1));
        for (float b : bar) {
            assertEquals(0, b, 1e-12);
        }
    }

    /**
     * Why it exists: a blob displaced by three times its width. Along the movement of the got blob (alpha' = -d alpha/dx) plain
     * squared error has no slope, below 1e-3 of its own scale (value per blob's width); here the slope is that of |c|^2 / 2.
     */
    @Test
    void theGradientLeadsThereWithoutOverlap() {
        int width = 128;
        int height = 64;
        double sigma = 3;
        double shift = 3 * 4 * sigma;
        Picture wanted = blob(width, height, 40 + shift, 32, sigma, 1);
        Picture got = blob(width, height, 40, 32, sigma, 1);
        float[] bar = new float[got.rgba().length];
        double value = new SlicedWassersteinLoss(wanted, ones(width, height)).valueAndPullback(got, bar, 1);
        double slope = 0;
        double plain = 0;
        double plainValue = 0;
        for (int p = 0; p < width * height; p++) {
            double a = got.rgba()[4 * p + 3];
            double perPixel = (p % width - 40) / (sigma * sigma) * a;
            slope += bar[4 * p + 3] * perPixel;
            double d = a - wanted.rgba()[4 * p + 3];
            plain += 2 * d * perPixel;
            plainValue += d * d;
            assertEquals(0, bar[4 * p], "colour has no part");
        }
        double c = shift / height;
        assertEquals(c * c / 2, value, .05 * c * c / 2);
        assertEquals(-c / height, slope, .05 * c / height);
        double width4 = 4 * sigma;
        double seen = Math.abs(plain) * width4 / plainValue;
        assertTrue(seen < 1e-3, () -> "squared error's slope is " + seen + " of its scale");
        assertTrue(-slope * width4 / value > .5, "and here it is of the order of the value");
    }

    /** Led by its gradient alone, by steps of the curvature of |c|^2 / 2, a blob three widths away arrives within a tenth of a pixel. */
    @Test
    void aBlobLedByTheGradientArrives() {
        int width = 128;
        int height = 96;
        double sigma = 4;
        SlicedWassersteinLoss loss = new SlicedWassersteinLoss(blob(width, height, 90, 40, sigma, 1), ones(width, height));
        double x = 90 - 3 * 4 * sigma;
        double y = 55;
        for (int step = 0; step < 20; step++) {
            Picture got = blob(width, height, x, y, sigma, 1);
            float[] bar = new float[got.rgba().length];
            loss.valueAndPullback(got, bar, 1);
            double slopeX = 0;
            double slopeY = 0;
            for (int p = 0; p < width * height; p++) {
                double a = got.rgba()[4 * p + 3] / (sigma * sigma);
                slopeX += bar[4 * p + 3] * a * (p % width - x);
                slopeY += bar[4 * p + 3] * a * (p / width - y);
            }
            x -= height * height * slopeX;
            y -= height * height * slopeY;
        }
        assertEquals(90, x, .1);
        assertEquals(40, y, .1);
    }

    /** An empty picture has a value and a gradient. */
    @Test
    void anEmptyPictureHasAValue() {
        SlicedWassersteinLoss loss = new SlicedWassersteinLoss(blob(48, 40, 12, 20, 4, 1), ones(48, 40));
        float[] bar = new float[4 * 48 * 40];
        assertTrue(loss.valueAndPullback(new Picture(48, 40), bar, 1) > .01);
        for (float b : bar) {
            assertTrue(Float.isFinite(b));
        }
        SlicedWassersteinLoss toNothing = new SlicedWassersteinLoss(new Picture(48, 40), ones(48, 40));
        assertEquals(0, toNothing.value(new Picture(48, 40)), 1e-25);
        assertTrue(toNothing.value(blob(48, 40, 12, 20, 4, 1)) > .01);
    }

    /** The same at two rasters, as all is in heights. */
    @Test
    void theRasterDoesNotCount() {
        double coarse = new SlicedWassersteinLoss(blob(64, 48, 20, 20, 4, 1), ones(64, 48)).value(blob(64, 48, 40, 30, 4, .8));
        double fine = new SlicedWassersteinLoss(blob(128, 96, 40.5, 40.5, 8, 1), ones(128, 96)).value(blob(128, 96, 80.5, 60.5, 8, .8));
        assertEquals(fine, coarse, .005 * fine);
    }

    @Test
    void sameBitsEveryTimeAndNothingAllocated() {
        SlicedWassersteinLoss loss = new SlicedWassersteinLoss(blob(96, 128, 30, 40, 9, 1), ones(96, 128));
        Picture got = waves(96, 128, 3);
        float[] first = new float[got.rgba().length];
        double value = loss.valueAndPullback(got, first, 1);
        loss.value(blob(96, 128, 1, 2, 3, 1));
        float[] second = new float[first.length];
        assertEquals(value, loss.valueAndPullback(got, second, 1));
        assertArrayEquals(first, second);
        assertEquals(value, loss.value(got));
        long bytes = LossPictures.bytesOfTenCalls(loss, got);
        assertTrue(bytes < 4096, () -> "10 calls allocated " + bytes + " bytes; one 96x128 plane of doubles is 98304");
    }

    /** Single rows, columns and pixels. */
    @ParameterizedTest
    @CsvSource({"1,1", "1,9", "9,1", "2,2"})
    void smallestRasters(int width, int height) {
        SlicedWassersteinLoss loss = new SlicedWassersteinLoss(waves(width, height, 0), ones(width, height));
        float[] bar = new float[4 * width * height];
        double value = loss.valueAndPullback(waves(width, height, 2), bar, 1);
        assertTrue(value >= 0 && value < 1);
        assertEquals(width * height == 1 ? 0 : 1, value > 1e-12 ? 1 : 0);
    }

    @Test
    void refusesOtherRastersAndBadWeights() {
        SlicedWassersteinLoss loss = new SlicedWassersteinLoss(new Picture(10, 12), new float[120]);
        assertEquals(12, loss.wanted().height());
        assertThrows(IllegalArgumentException.class, () -> loss.value(new Picture(12, 10)));
        assertThrows(IllegalArgumentException.class, () -> loss.valueAndPullback(new Picture(10, 12), new float[10], 1));
        assertThrows(IllegalArgumentException.class, () -> new SlicedWassersteinLoss(new Picture(10, 12), new float[119]));
        float[] bad = new float[120];
        bad[7] = -1;
        assertThrows(IllegalArgumentException.class, () -> new SlicedWassersteinLoss(new Picture(10, 12), bad));
    }
}

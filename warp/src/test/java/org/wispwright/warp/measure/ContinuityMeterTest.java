package org.wispwright.warp.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.wispwright.render.picture.Picture;

class ContinuityMeterTest {
    /** By hand: before rises by 1/4 a frame; after the same, but jumps by 3/4 once and then stands still. */
    @Test
    void stepsByHand() {
        ContinuityMeter meter = new ContinuityMeter(new float[] {1, 1});
        double[] before = {0, .25, .5, .75};
        double[] after = {.5, .75, 1.5, 1.5};
        for (int t = 0; t < 4; t++) {
            meter.add(flat(2, 1, before[t]), flat(2, 1, after[t]));
        }
        List<ContinuityMeter.Step> steps = meter.steps();
        assertEquals(List.of(new ContinuityMeter.Step(0, .25, .25, 0), new ContinuityMeter.Step(1, .25, .75, .5),
                new ContinuityMeter.Step(2, .25, 0, .25)), steps);
        assertEquals(1, steps.get(0).ratio());
        assertEquals(3, steps.get(1).ratio());
        assertEquals(0, steps.get(2).ratio());
    }

    /** Only the region counts; where nothing moves the ratio is 1, where only the work moves it is infinite. */
    @Test
    void onlyTheRegionCounts() {
        ContinuityMeter meter = new ContinuityMeter(new float[] {0, 3});
        Picture still = flat(2, 1, .5);
        Picture elsewhere = flat(2, 1, .5);
        Arrays.fill(elsewhere.rgba(), 0, 4, 1f);
        meter.add(still, still);
        meter.add(still, elsewhere);
        meter.add(still, flat(2, 1, 1));
        assertEquals(new ContinuityMeter.Step(0, 0, 0, 0), meter.steps().get(0));
        assertEquals(1, meter.steps().get(0).ratio());
        assertEquals(Double.POSITIVE_INFINITY, meter.steps().get(1).ratio());
        assertEquals(.5, meter.steps().get(1).added());
    }

    /** The meter keeps copies: a frame changed afterwards does not count. */
    @Test
    void framesAreCopied() {
        ContinuityMeter meter = new ContinuityMeter(new float[] {1});
        Picture frame = flat(1, 1, .25);
        meter.add(frame, frame);
        Arrays.fill(frame.rgba(), 9f);
        meter.add(flat(1, 1, .5), flat(1, 1, .5));
        assertEquals(.25, meter.steps().get(0).after());
    }

    @Test
    void refusesFramesThatDoNotFit() {
        ContinuityMeter meter = new ContinuityMeter(new float[6]);
        meter.add(new Picture(3, 2), new Picture(3, 2));
        assertThrows(IllegalArgumentException.class, () -> meter.add(new Picture(2, 3), new Picture(2, 3)));
        assertThrows(IllegalArgumentException.class, () -> meter.add(new Picture(3, 2), new Picture(2, 3)));
        assertEquals(0, meter.steps().size());
        assertThrows(IllegalArgumentException.class, () -> new ContinuityMeter(new float[5]).add(new Picture(3, 2), new Picture(3, 2)));
        assertThrows(IllegalArgumentException.class, () -> new ContinuityMeter(new float[] {Float.NaN}));
    }

    private static Picture flat(int width, int height, double value) {
        Picture picture = new Picture(width, height);
        Arrays.fill(picture.rgba(), (float) value);
        return picture;
    }
}

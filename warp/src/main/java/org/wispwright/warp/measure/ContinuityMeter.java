package org.wispwright.warp.measure;

import java.util.ArrayList;
import java.util.List;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.loss.PictureMeasure;

/**
 * How much a sequence changes from each frame to the next, before and after it was worked on. Frames come one pair at a time, so
 * only two of each sequence are kept, whatever its length. One caller at a time.
 */
public final class ContinuityMeter {
    /**
     * From one frame to the next. All means are {@code sum M sum_RGBA |d| / (4 sum M)}.
     *
     * @param from   index of the earlier frame, 0 = the first that was given
     * @param before mean absolute change of the sequence before
     * @param after  mean absolute change of the sequence after
     * @param added  mean absolute difference between both changes: what flickers though it did not before; 0 where after moves as
     *               before does
     */
    public record Step(int from, double before, double after, double added) {
        /** {@code after / before}; 1 where neither moves, infinite where only after does. */
        public double ratio() {
            return before == after ? 1 : after / before;
        }
    }

    private final float[] weights;
    private final List<Step> steps = new ArrayList<>();
    private Picture lastBefore;
    private Picture lastAfter;
    private int frames;

    /**
     * Starts with no frames.
     *
     * @param weights read: one a pixel of the frames to come, finite, 0 or more
     * @throws IllegalArgumentException if a weight is out of range
     */
    public ContinuityMeter(float[] weights) {
        for (int p = 0; p < weights.length; p++) {
            if (!(weights[p] >= 0 && weights[p] < Float.POSITIVE_INFINITY)) {
                throw new IllegalArgumentException("continuity: weight of pixel " + p + " is " + weights[p]
                        + ", needs a finite number, 0 or more");
            }
        }
        this.weights = weights.clone();
    }

    /**
     * Takes the next frame of both sequences.
     *
     * @param before copied
     * @param after  copied
     * @throws IllegalArgumentException if a raster does not fit the weights or the frames so far; the frame then does not count
     */
    public void add(Picture before, Picture after) {
        requireFits(before, after);
        if (frames > 0) {
            Picture turned = change(lastAfter, after);
            Picture turnedBefore = change(lastBefore, before);
            steps.add(new Step(frames - 1, PictureMeasure.meanAbsoluteDifference(lastBefore, before, weights),
                    PictureMeasure.meanAbsoluteDifference(lastAfter, after, weights),
                    PictureMeasure.meanAbsoluteDifference(turned, turnedBefore, weights)));
        }
        lastBefore = before.copy();
        lastAfter = after.copy();
        frames++;
    }

    /** The steps so far, one fewer than frames; a copy. */
    public List<Step> steps() {
        return List.copyOf(steps);
    }

    private void requireFits(Picture before, Picture after) {
        Picture like = frames > 0 ? lastBefore : before;
        for (Picture picture : new Picture[] {before, after}) {
            if (picture.width() != like.width() || picture.height() != like.height()
                    || picture.width() * picture.height() != weights.length) {
                throw new IllegalArgumentException("continuity: frame " + frames + " is " + picture.width() + "x" + picture.height()
                        + " pixels, needs " + like.width() + "x" + like.height() + " with " + weights.length + " weights");
            }
        }
    }

    private static Picture change(Picture from, Picture to) {
        float[] difference = new float[from.rgba().length];
        for (int n = 0; n < difference.length; n++) {
            difference[n] = to.rgba()[n] - from.rgba()[n];
        }
        return new Picture(from.width(), from.height(), difference);
    }
}

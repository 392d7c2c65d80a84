package org.wispwright.ui.desk;

import org.wispwright.optimize.flow.FrameRange;

/**
 * Frames along a line: each has a stretch of the same width, the first begins at the left end.
 *
 * @param range the frames
 * @param width of the line, pixels, above 0
 */
public record RangeScale(FrameRange range, double width) {
    /** Checks. @throws IllegalArgumentException if the width is not above 0 */
    public RangeScale {
        if (!(width > 0)) {
            throw new IllegalArgumentException("range scale: got a width of " + width + ", needs a number above 0");
        }
    }

    /** Width of one frame's stretch. */
    public double step() {
        return width / range.count();
    }

    /** The frame at a place; the nearest one outside. */
    public int frameAt(double x) {
        double n = Math.floor(x / step());
        return range.first() + (int) Math.max(0, Math.min(range.count() - 1, n));
    }

    /** Left end of a frame's stretch; of the frame behind the last, the right end of the line. */
    public double left(int frame) {
        return (frame - range.first()) * step();
    }

    /** Middle of a frame's stretch. */
    public double middle(int frame) {
        return left(frame) + step() / 2;
    }
}

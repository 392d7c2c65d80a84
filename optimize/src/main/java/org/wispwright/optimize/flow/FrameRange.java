package org.wispwright.optimize.flow;

/**
 * Whole frame numbers {@code first..last}, both included; time in seconds is {@code (frame - first) / perSecond}.
 *
 * @param first     first frame, usually 1001
 * @param last      last frame, not before first
 * @param perSecond frames a second, above 0
 */
public record FrameRange(int first, int last, double perSecond) {

    /** The longest range that a shot may have. */
    public static final int MOST_FRAMES = 10_000;

    /** Checks the range. @throws IllegalArgumentException saying what is off */
    public FrameRange {
        if (first < 0 || last < first || last - first >= MOST_FRAMES) {
            throw new IllegalArgumentException("frames: got " + first + " to " + last + ", needs 0 <= first <= last and at most "
                    + MOST_FRAMES + " frames");
        }
        if (!(perSecond > 0) || !(perSecond <= 1000)) {
            throw new IllegalArgumentException("frames: got " + perSecond + " frames a second, needs a number above 0, at most 1000");
        }
    }

    /** Number of frames. */
    public int count() {
        return last - first + 1;
    }

    /** True if the frame is in the range. */
    public boolean contains(int frame) {
        return frame >= first && frame <= last;
    }

    /** Seconds between two frames. */
    public double secondsPerFrame() {
        return 1 / perSecond;
    }
}

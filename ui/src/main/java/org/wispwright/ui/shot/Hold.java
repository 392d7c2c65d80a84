package org.wispwright.ui.shot;

import java.util.Objects;
import org.wispwright.warp.matte.Matte;

/**
 * A part of the picture that must stay as in the original, in its note's view.
 *
 * @param matte where
 * @param firstFrame first frame that it holds
 * @param lastFrame last frame that it holds, not before firstFrame
 */
public record Hold(Matte matte, int firstFrame, int lastFrame) {
    /** Checks the span. @throws IllegalArgumentException if the last frame comes before the first */
    public Hold {
        Objects.requireNonNull(matte, "hold: matte");
        if (lastFrame < firstFrame) {
            throw new IllegalArgumentException("hold: got frames " + firstFrame + " to " + lastFrame
                    + ", needs the last not before the first");
        }
    }

    /** True if the frame is held. */
    public boolean holds(int frame) {
        return frame >= firstFrame && frame <= lastFrame;
    }
}

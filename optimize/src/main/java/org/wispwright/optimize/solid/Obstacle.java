package org.wispwright.optimize.solid;

import org.wispwright.optimize.motion.Curve;
import org.wispwright.optimize.motion.Pose;

/**
 * A solid thing in the box: smoke flows round it. In the plane case (nz = 1) it is cut through its middle.
 *
 * @param name     for messages
 * @param solid    its form
 * @param position of its middle over the frames, metres
 * @param rotation of it over the frames, rotation vectors in radians
 */
public record Obstacle(String name, Solid solid, Curve position, Curve rotation) {
    /** The most that a box may hold: cells name theirs by a byte. */
    public static final int MOST = 127;

    /** Checks the name. @throws IllegalArgumentException if there is none */
    public Obstacle {
        if (name == null || name.isBlank()) {
            throw new IllegalArgumentException("obstacle: needs a name");
        }
    }

    /** True if it never moves. */
    public boolean isStill() {
        return position.isStill() && rotation.isStill();
    }

    /** Where it is at the end of a span of frames, see {@link Pose#of}. */
    public Pose pose(double fromFrame, double toFrame, double framesPerSecond) {
        return Pose.of(position, rotation, fromFrame, toFrame, framesPerSecond);
    }
}

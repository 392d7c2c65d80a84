package org.wispwright.warp.outline;

import java.util.List;
import java.util.Optional;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.measure.Plane;

/**
 * The outlines of a picture's smoke that a hand can take hold of: the loops of its opacity at a level, each through as few points as
 * keep it within {@value #TOLERANCE} heights, without specks.
 *
 * @param level opacity on the outline
 * @param loops in the tracer's order; their points are what is dragged
 */
public record Outlines(double level, List<Loop> loops) {
    /** Farthest a simpler loop strays, in heights: half a pixel at 500 rows. */
    public static final double TOLERANCE = 0.001;
    /** Loops of less area, in squared heights, are left out. */
    public static final double SPECK = 1e-4;

    /** Copies the list. */
    public Outlines {
        loops = List.copyOf(loops);
    }

    /**
     * Traces a picture.
     *
     * @param picture read
     * @param level   above 0, finite
     * @return no loop if no pixel reaches the level
     * @throws IllegalArgumentException if the level is out of range
     */
    public static Outlines of(Picture picture, double level) {
        return new Outlines(level, OutlineTracer.trace(Plane.alpha(picture), level).stream()
                .filter(loop -> Math.abs(loop.signedArea()) >= SPECK).map(loop -> loop.simplified(TOLERANCE)).toList());
    }

    /** The outlines' place nearest to (px,py); empty if none is within {@code farthest} heights. */
    public Optional<Loop.Place> nearest(double px, double py, double farthest) {
        Loop.Place best = null;
        double least = farthest;
        for (Loop loop : loops) {
            Loop.Place place = loop.nearest(px, py);
            double distance = Math.hypot(place.x() - px, place.y() - py);
            if (distance < least || best == null && distance == least) {
                best = place;
                least = distance;
            }
        }
        return Optional.ofNullable(best);
    }
}

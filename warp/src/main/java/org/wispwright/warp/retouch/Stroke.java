package org.wispwright.warp.retouch;

import java.util.List;
import java.util.Optional;

/**
 * A brush drawn along a polyline. Coverage of a pixel follows from its distance to the whole line, so a line that crosses itself
 * or dwells at a place does not act there twice.
 *
 * @param brush    what it does
 * @param radius   distance from the line at which the brush ends, fraction of the height, in (0, 1]
 * @param strength coverage on the line, 0 to 1; 0 changes nothing
 * @param softEdge share of the radius over which coverage fades to nothing, 0 to 1
 * @param line     1 to {@value #MOST_POINTS} points; one point is a dab
 * @param within   region outside which nothing changes; empty means anywhere
 */
public record Stroke(Brush brush, double radius, double strength, double softEdge, List<Point> line, Optional<Region> within)
        implements Operation {
    /** The most points a line may have. */
    public static final int MOST_POINTS = 10_000;

    /**
     * Checks and copies.
     *
     * @throws IllegalArgumentException if a number or the count of points is out of its range
     */
    public Stroke {
        Needs.present("stroke", "brush", brush);
        Needs.present("stroke", "line", line);
        Needs.present("stroke", "within", within);
        if (!(radius > 0 && radius <= 1)) {
            throw new IllegalArgumentException("stroke: got radius " + radius
                    + ", needs a fraction of the picture's height above 0 and at most 1");
        }
        Needs.share("stroke", "strength", strength);
        Needs.share("stroke", "softEdge", softEdge);
        line = Needs.points("stroke", "line", line, 1, MOST_POINTS);
    }

    @Override
    public boolean changesNothing() {
        return strength == 0 || brush == Brush.PUSH && line.stream().allMatch(line.get(0)::equals);
    }
}

package org.wispwright.warp.matte;

import java.util.List;
import java.util.function.UnaryOperator;

/**
 * A brush drawn along a polyline, and how much of it each pixel gets. With d the distance of the pixel's centre to the whole line, r
 * the radius, e the soft edge, all in heights: {@code s = clamp(1/2 + (r - e r / 2 - d) / max(e r, pixel))},
 * {@code coverage = strength s^2 (3 - 2 s)}. Distance to the whole line means that a line that crosses itself or dwells at a place
 * does not act there twice.
 *
 * @param radius   distance from the line at which the brush ends, fraction of the height, in (0, 1]
 * @param strength coverage on the line, 0 to 1; 0 covers nothing
 * @param softEdge share of the radius over which coverage fades to nothing, 0 to 1
 * @param line     1 to {@value #MOST_POINTS} points; one point is a dab
 */
public record Sweep(double radius, double strength, double softEdge, List<Point> line) {
    /** The most points a line may have. */
    public static final int MOST_POINTS = 10_000;

    /**
     * Checks and copies.
     *
     * @throws IllegalArgumentException if a number or the count of points is out of its range
     */
    public Sweep {
        Needs.present("stroke", "line", line);
        if (!(radius > 0 && radius <= 1)) {
            throw new IllegalArgumentException("stroke: got radius " + radius
                    + ", needs a fraction of the picture's height above 0 and at most 1");
        }
        Needs.share("stroke", "strength", strength);
        Needs.share("stroke", "softEdge", softEdge);
        line = Needs.points("stroke", "line", line, 1, MOST_POINTS);
    }

    /** The same brush along a line whose points are taken to other places. */
    public Sweep moved(UnaryOperator<Point> map) {
        return new Sweep(radius, strength, softEdge, line.stream().map(map).toList());
    }

    /**
     * Coverage of the pixels of a window.
     *
     * @param height rows of the whole raster
     * @return a new array: 0 to strength, one a pixel of the window
     */
    public float[] coverage(Window window, int height) {
        double soft = softEdge * radius;
        double fade = Math.max(soft, 1.0 / height);
        double middle = radius - soft / 2;
        float[] coverage = new float[window.pixels()];
        double[] squared = Segment.squaredDistances(line, window, height, middle + fade / 2);
        for (int p = 0; p < coverage.length; p++) {
            if (squared[p] < Double.POSITIVE_INFINITY) {
                coverage[p] = (float) (strength * smooth(0.5 + (middle - Math.sqrt(squared[p])) / fade));
            }
        }
        return coverage;
    }

    /**
     * Where the brush reaches, whatever its strength: 1 wherever it has any coverage, falling to 0 over a feather beyond.
     *
     * @param height  rows of the whole raster
     * @param feather fraction of the height; a pixel is the least
     * @return a new array: 0 to 1, one a pixel of the window
     */
    public float[] reach(Window window, int height, double feather) {
        double fade = Math.max(feather, 1.0 / height);
        float[] reach = new float[window.pixels()];
        double[] squared = Segment.squaredDistances(line, window, height, radius + fade);
        for (int p = 0; p < reach.length; p++) {
            if (squared[p] < Double.POSITIVE_INFINITY) {
                reach[p] = (float) smooth(1 + (radius - Math.sqrt(squared[p])) / fade);
            }
        }
        return reach;
    }

    /** {@code s^2 (3 - 2 s)} of s clamped to 0..1. */
    public static double smooth(double s) {
        double c = Math.min(1, Math.max(0, s));
        return c * c * (3 - 2 * c);
    }
}

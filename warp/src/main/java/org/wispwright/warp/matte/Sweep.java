package org.wispwright.warp.matte;

import java.util.List;
import java.util.function.UnaryOperator;

/**
 * A brush drawn along a polyline, and how much of it each pixel gets: the maximum of {@code c(d, p)} over all points of the line, d the
 * distance of the pixel's centre to the point and p the pressure there. With r the radius, e the soft edge, all in heights, at full
 * pressure: {@code s = clamp(1/2 + (r - e r / 2 - d) / max(e r, pixel))}, {@code c = strength s^2 (3 - 2 s)}; pressure scales the
 * strength, the radius, or both ({@link Pressure.On}). The maximum means that a line that crosses itself or dwells at a place does not
 * act there twice, and that pressing harder there goes on from what it had. Where pressure is even it lies at the nearest point.
 *
 * @param radius   distance from the line at which the brush ends, fraction of the height, in (0, 1]
 * @param strength coverage on the line, 0 to 1; 0 covers nothing
 * @param softEdge share of the radius over which coverage fades to nothing, 0 to 1
 * @param line     1 to {@value #MOST_POINTS} points; one point is a dab
 * @param pressure how hard, at each point of the line
 * @param spacing  0: the line is drawn through. Otherwise dabs are set along it, this share of the radius apart, from
 *                 {@value #LEAST_SPACING} to {@value #MOST_SPACING}, the first at the first point; at most {@value #MOST_DABS} in all
 */
public record Sweep(double radius, double strength, double softEdge, List<Point> line, Pressure pressure, double spacing) {
    /** The most points a line may have. */
    public static final int MOST_POINTS = 10_000;
    /** Dabs closer than this share of the radius look like a line drawn through. */
    public static final double LEAST_SPACING = 0.05;
    /** The widest spacing, as a share of the radius. */
    public static final double MOST_SPACING = 20;
    /** The most dabs of a line with a spacing. */
    public static final int MOST_DABS = 20_000;

    /**
     * Checks and copies.
     *
     * @throws IllegalArgumentException if a number or the count of points, pressures or dabs is out of its range
     */
    public Sweep {
        Needs.present("stroke", "line", line);
        Needs.present("stroke", "pressure", pressure);
        if (!(radius > 0 && radius <= 1)) {
            throw new IllegalArgumentException("stroke: got radius " + radius
                    + ", needs a fraction of the picture's height above 0 and at most 1");
        }
        Needs.share("stroke", "strength", strength);
        Needs.share("stroke", "softEdge", softEdge);
        line = Needs.points("stroke", "line", line, 1, MOST_POINTS);
        if (!pressure.values().isEmpty() && pressure.values().size() != line.size()) {
            throw new IllegalArgumentException("stroke: 'pressure' has " + pressure.values().size() + " numbers, needs one for each of the "
                    + line.size() + " points of 'line'");
        }
        if (!(spacing == 0 || spacing >= LEAST_SPACING && spacing <= MOST_SPACING)) {
            throw new IllegalArgumentException("stroke: got spacing " + spacing + ", needs 0 (a line drawn through) or a share of the "
                    + "radius, "
                    + LEAST_SPACING + " to " + MOST_SPACING);
        }
        if (spacing > 0 && !(length(line) / (spacing * radius) < MOST_DABS)) {
            throw new IllegalArgumentException("stroke: spacing " + spacing + " sets more than " + MOST_DABS
                    + " dabs along the line; set them wider apart or cut the line into strokes");
        }
    }

    /** At full pressure and drawn through. @throws IllegalArgumentException as for all its parts */
    public Sweep(double radius, double strength, double softEdge, List<Point> line) {
        this(radius, strength, softEdge, line, Pressure.FULL, 0);
    }

    /** The same brush along a line whose points are taken to other places. */
    public Sweep moved(UnaryOperator<Point> map) {
        return new Sweep(radius, strength, softEdge, line.stream().map(map).toList(), pressure, spacing);
    }

    /**
     * Coverage of the pixels of a window.
     *
     * @param height rows of the whole raster
     * @return a new array: 0 to strength, one a pixel of the window; the bits do not depend on the window
     */
    public float[] coverage(Window window, int height) {
        float[] values = new float[window.pixels()];
        return drawn(new Cover(this, height, window, values), window);
    }

    /**
     * Where the brush reaches, whatever its strength: 1 wherever it has any coverage, falling to 0 over a feather beyond. Pressure counts
     * where it acts on the radius.
     *
     * @param height  rows of the whole raster
     * @param feather fraction of the height; a pixel is the least
     * @return a new array: 0 to 1, one a pixel of the window
     */
    public float[] reach(Window window, int height, double feather) {
        Tip tip = Tip.reaching(radius, feather, pressure.on(), height);
        return drawn(new Cover(tip, spacing * radius, height, window, new float[window.pixels()]), window);
    }

    /** {@code s^2 (3 - 2 s)} of s clamped to 0..1. */
    public static double smooth(double s) {
        double c = Math.min(1, Math.max(0, s));
        return c * c * (3 - 2 * c);
    }

    private float[] drawn(Cover cover, Window window) {
        for (int n = 0; n < line.size(); n++) {
            cover.extend(line.get(n), pressure.at(n));
        }
        float[] out = new float[window.pixels()];
        cover.read(window, out);
        return out;
    }

    private static double length(List<Point> line) {
        double length = 0;
        for (int n = 1; n < line.size(); n++) {
            length += line.get(n - 1).distanceTo(line.get(n));
        }
        return length;
    }
}

package org.wispwright.warp.matte;

import java.util.ArrayList;
import java.util.List;

/**
 * A pointer's raw points made a line: thousands become few, and coverage stays. Of the raw points are kept the first, the last, and
 * greedily from each kept one the farthest such that the way there is no longer than {@code spacing} radii and every point left out lies
 * within {@value #OFF} of the radius of the straight piece, in order along it, its pressure within {@value #PRESSURE_OFF} of the piece's.
 * <p>So the line left out and the line kept lie within {@value #OFF} r of each other: by the slope of the edge coverage changes by at most
 * {@code 1.5 OFF / e + PRESSURE_OFF (1 + 1.5 / e)}, e the soft edge: at most 0.02 for e = 1/2, and 0.012 for even
 * pressure. Ours; the greedy walk is that of Reumann and Witkam (1974), Proc. International Computing Symposium, 467-472, with both bounds.
 *
 * @param line     the points kept
 * @param pressure their pressures, one a point
 */
public record Trail(List<Point> line, List<Double> pressure) {
    /** How far a point left out may lie beside the line, as a share of the radius. */
    public static final double OFF = 0.004;
    /** How far its pressure may be off. */
    public static final double PRESSURE_OFF = 0.002;
    /** A spacing that loses no more than {@link #OFF} and leaves few points. */
    public static final double USUAL_SPACING = 0.25;
    private static final int FARTHEST_LOOK = 500;

    /**
     * Checks and copies.
     *
     * @throws IllegalArgumentException if the lists differ in length or are empty
     */
    public Trail {
        Needs.present("trail", "line", line);
        Needs.present("trail", "pressure", pressure);
        if (line.isEmpty() || line.size() != pressure.size()) {
            throw new IllegalArgumentException("trail: got " + line.size() + " points and " + pressure.size()
                    + " pressures, needs as many of each and at least one");
        }
        line = List.copyOf(line);
        pressure = List.copyOf(pressure);
    }

    /**
     * Fewer points for the same line.
     *
     * @param radius  the brush's, fraction of the height, above 0
     * @param spacing the longest piece that may stand for several, as a share of the radius, above 0; pieces between raw points that are
     *                longer stay as they are
     * @throws IllegalArgumentException if a number is not above 0
     */
    public Trail thinned(double radius, double spacing) {
        if (!(radius > 0 && spacing > 0)) {
            throw new IllegalArgumentException("trail: got radius " + radius + " and spacing " + spacing + ", needs both above 0");
        }
        List<Point> points = new ArrayList<>();
        List<Double> pressures = new ArrayList<>();
        for (int from = 0; from < line.size(); from = next(from, radius, spacing)) {
            points.add(line.get(from));
            pressures.add(pressure.get(from));
        }
        return new Trail(points, pressures);
    }

    /** The next point to keep; beyond the end after the last. */
    private int next(int from, double radius, double spacing) {
        int best = from + 1;
        double way = 0;
        for (int to = from + 1; to < line.size() && to - from <= FARTHEST_LOOK; to++) {
            way += line.get(to - 1).distanceTo(line.get(to));
            if (way > spacing * radius || !stands(from, to, OFF * radius)) {
                break;
            }
            best = to;
        }
        return best;
    }

    /** Whether the straight piece between two raw points stands for those between. */
    private boolean stands(int from, int to, double off) {
        Point a = line.get(from);
        Point b = line.get(to);
        double length = a.distanceTo(b);
        double before = 0;
        for (int n = from + 1; n < to; n++) {
            Point p = line.get(n);
            double along = length == 0 ? 0 : ((p.x() - a.x()) * (b.x() - a.x()) + (p.y() - a.y()) * (b.y() - a.y())) / length;
            double t = length == 0 ? 0 : along / length;
            double even = pressure.get(from) + t * (pressure.get(to) - pressure.get(from));
            if (Segment.squaredDistance(p.x(), p.y(), a.x(), a.y(), b.x(), b.y()) > off * off || along < before - off
                    || !(Math.abs(pressure.get(n) - even) <= PRESSURE_OFF)) {
                return false;
            }
            before = Math.max(before, along);
        }
        return true;
    }
}

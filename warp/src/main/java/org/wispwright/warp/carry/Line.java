package org.wispwright.warp.carry;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.wispwright.warp.matte.Point;

/**
 * Two polylines made comparable: both are given points at the same arcs, by straight interpolation along each. The arcs are those of
 * the corners of either line, so neither loses a corner; where that would be more points than a line may have, as many even arcs.
 * A line without length, such as a dab, is its one place at every arc. Matching by arc length: common practice.
 */
final class Line {
    /** Two arcs closer than this are one. */
    private static final double SAME = 1e-9;

    private Line() {
    }

    /**
     * The line part of the way from a to b: corresponding points go straight, linearly.
     *
     * @param closed the last point joins the first
     * @param most as many points as it may have
     */
    static List<Point> between(List<Point> a, List<Point> b, double share, boolean closed, int most) {
        double[] arcs = arcs(a, b, closed, most);
        List<Point> from = at(a, arcs, closed);
        List<Point> to = at(b, arcs, closed);
        List<Point> line = new ArrayList<>(arcs.length);
        for (int n = 0; n < arcs.length; n++) {
            line.add(between(from.get(n), to.get(n), share));
        }
        return line;
    }

    /** The point part of the way. */
    static Point between(Point a, Point b, double share) {
        return new Point(a.x() + share * (b.x() - a.x()), a.y() + share * (b.y() - a.y()));
    }

    /** Arcs of the corners of both, rising. */
    private static double[] arcs(List<Point> a, List<Point> b, boolean closed, int most) {
        double[] ofA = corners(a, closed);
        double[] ofB = corners(b, closed);
        double[] all = new double[ofA.length + ofB.length];
        int count = 0;
        int i = 0;
        int j = 0;
        while (i < ofA.length || j < ofB.length) {
            double next = j == ofB.length || i < ofA.length && ofA[i] <= ofB[j] ? ofA[i++] : ofB[j++];
            if (count == 0 || next - all[count - 1] > SAME) {
                all[count++] = next;
            }
        }
        if (count > most) {
            double[] even = new double[most];
            for (int n = 0; n < most; n++) {
                even[n] = (double) n / (closed ? most : most - 1);
            }
            return even;
        }
        return Arrays.copyOf(all, count);
    }

    /** The arc of every corner, 0 for all if the line has no length; of a closed line without the end, where it is at its start again. */
    private static double[] corners(List<Point> line, boolean closed) {
        double[] lengths = lengths(line, closed);
        double whole = lengths[lengths.length - 1];
        double[] arcs = new double[line.size()];
        for (int n = 0; n < arcs.length && whole > 0; n++) {
            arcs[n] = lengths[n] / whole;
        }
        return arcs;
    }

    /** Length up to every corner; of a closed line also up to its start again. */
    private static double[] lengths(List<Point> line, boolean closed) {
        double[] lengths = new double[line.size() + (closed ? 1 : 0)];
        for (int n = 1; n < lengths.length; n++) {
            lengths[n] = lengths[n - 1] + line.get(n - 1).distanceTo(line.get(n % line.size()));
        }
        return lengths;
    }

    private static List<Point> at(List<Point> line, double[] arcs, boolean closed) {
        double[] lengths = lengths(line, closed);
        double whole = lengths[lengths.length - 1];
        List<Point> points = new ArrayList<>(arcs.length);
        int piece = 1;
        for (double arc : arcs) {
            double length = arc * whole;
            while (piece < lengths.length - 1 && lengths[piece] < length) {
                piece++;
            }
            if (whole == 0 || lengths.length == 1) {
                points.add(line.get(0));
                continue;
            }
            double span = lengths[piece] - lengths[piece - 1];
            double t = span > 0 ? Math.min(1, Math.max(0, (length - lengths[piece - 1]) / span)) : 0;
            points.add(between(line.get(piece - 1), line.get(piece % line.size()), t));
        }
        return points;
    }
}

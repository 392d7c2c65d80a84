package org.wispwright.warp.retouch;

import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Needs;
import org.wispwright.warp.matte.Point;

/**
 * A smooth bend of the picture that carries every handle's {@code from} to its {@code to}: a thin-plate spline between the handles
 * (Bookstein 1989). Without pins or a region it also moves what lies far from the handles.
 *
 * @param handles 3 to {@value #MOST_HANDLES}; neither the starts nor the ends may lie on one line or coincide
 * @param within  matte outside which nothing moves: the displacement is scaled by its mask; empty means anywhere
 */
public record MeshWarp(List<Handle> handles, Optional<Matte> within) implements Operation {
    /** The most handles a warp may have; its cost per pixel grows with their number. */
    public static final int MOST_HANDLES = 500;
    /** Two handles closer than this, in heights, count as the same place. */
    public static final double CLOSEST = 1e-5;
    /** Handles whose spread across their best line is under this share of their spread along it count as being on one line. */
    public static final double THINNEST = 1e-4;

    /**
     * Checks and copies.
     *
     * @throws IllegalArgumentException if there are too few or too many handles, or they coincide or lie on one line
     */
    public MeshWarp {
        Needs.present("mesh warp", "handles", handles);
        Needs.present("mesh warp", "within", within);
        if (handles.size() < 3 || handles.size() > MOST_HANDLES) {
            throw new IllegalArgumentException("mesh warp: got " + handles.size() + " handles, needs 3 to " + MOST_HANDLES);
        }
        for (int n = 0; n < handles.size(); n++) {
            Needs.present("mesh warp", "handle " + n, handles.get(n));
        }
        handles = List.copyOf(handles);
        requireSpread(handles, Handle::from, "from");
        requireSpread(handles, Handle::to, "to");
    }

    @Override
    public boolean changesNothing() {
        return handles.stream().allMatch(handle -> handle.from().equals(handle.to()));
    }

    private static void requireSpread(List<Handle> handles, Function<Handle, Point> end, String name) {
        double meanX = 0;
        double meanY = 0;
        for (int n = 0; n < handles.size(); n++) {
            Point p = end.apply(handles.get(n));
            meanX += p.x() / handles.size();
            meanY += p.y() / handles.size();
            for (int m = 0; m < n; m++) {
                if (p.distanceTo(end.apply(handles.get(m))) < CLOSEST) {
                    throw new IllegalArgumentException("mesh warp: handles " + m + " and " + n + " have the same '" + name + "' point ("
                            + p.x() + ", " + p.y() + "); remove one of them or move it by at least " + CLOSEST);
                }
            }
        }
        double xx = 0;
        double xy = 0;
        double yy = 0;
        for (Handle handle : handles) {
            double x = end.apply(handle).x() - meanX;
            double y = end.apply(handle).y() - meanY;
            xx += x * x;
            xy += x * y;
            yy += y * y;
        }
        double half = Math.hypot((xx - yy) / 2, xy);
        double along = (xx + yy) / 2 + half;
        double across = (xx * yy - xy * xy) / along;
        if (!(across > THINNEST * THINNEST * along)) {
            throw new IllegalArgumentException("mesh warp: the '" + name + "' points of all " + handles.size()
                    + " handles lie on one line; add a handle beside the line (a pin will do)");
        }
    }
}

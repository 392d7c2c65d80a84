package org.wispwright.warp.retouch;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import java.util.function.UnaryOperator;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Needs;
import org.wispwright.warp.matte.Point;

/**
 * A bend of the picture that carries every handle's {@code from} to its {@code to}. Without pins or a region it also moves what lies
 * far from the handles.
 *
 * @param kind    how the places between the handles follow
 * @param handles as many as the kind needs, to {@value #MOST_HANDLES}; no two starts and no two ends alike; for kinds that need 3,
 *                neither may lie on one line
 * @param cells   of the mesh; only {@link WarpKind#AS_RIGID_AS_POSSIBLE} has one
 * @param within  matte outside which nothing moves: the displacement is scaled by its mask; empty means anywhere. An
 *                as-rigid-as-possible mesh then covers the region's box alone, and its rim stays
 */
public record MeshWarp(WarpKind kind, List<Handle> handles, Cells cells, Optional<Matte> within) implements Operation {
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
        Needs.present("mesh warp", "kind", kind);
        Needs.present("mesh warp", "handles", handles);
        Needs.present("mesh warp", "cells", cells);
        Needs.present("mesh warp", "within", within);
        if (handles.size() < kind.fewestHandles() || handles.size() > MOST_HANDLES) {
            throw new IllegalArgumentException("mesh warp: got " + handles.size() + " handles, needs " + kind.fewestHandles() + " to "
                    + MOST_HANDLES);
        }
        requireApart("mesh warp", "handle", handles, Handle::from, "from");
        requireApart("mesh warp", "handle", handles, Handle::to, "to");
        handles = List.copyOf(handles);
        if (kind.fewestHandles() >= 3) {
            requireSpread(handles, Handle::from, "from");
            requireSpread(handles, Handle::to, "to");
        }
    }

    /** A thin-plate spline. @throws IllegalArgumentException as above */
    public MeshWarp(List<Handle> handles, Optional<Matte> within) {
        this(WarpKind.SPLINE, handles, Cells.USUAL, within);
    }

    /**
     * The same warp with one handle pulled to another place.
     *
     * @throws IllegalArgumentException if there is no such handle, or two ends then coincide or all lie on one line
     */
    public MeshWarp with(int handle, Point to) {
        if (handle < 0 || handle >= handles.size()) {
            throw new IllegalArgumentException("mesh warp: there is no handle " + handle + ", needs 0 to " + (handles.size() - 1));
        }
        List<Handle> moved = new ArrayList<>(handles);
        moved.set(handle, new Handle(handles.get(handle).from(), to));
        return new MeshWarp(kind, moved, cells, within);
    }

    @Override
    public boolean changesNothing() {
        return handles.stream().allMatch(handle -> handle.from().equals(handle.to()));
    }

    /** Throws if a handle is missing or two have one end at the same place. */
    static void requireApart(String owner, String name, List<Handle> handles, Function<Handle, Point> end, String endName) {
        for (int n = 0; n < handles.size(); n++) {
            Needs.present(owner, name + " " + n, handles.get(n));
            Point p = end.apply(handles.get(n));
            for (int m = 0; m < n; m++) {
                if (p.distanceTo(end.apply(handles.get(m))) < CLOSEST) {
                    throw new IllegalArgumentException(owner + ": " + name + "s " + m + " and " + n + " have the same '" + endName
                            + "' point (" + p.x() + ", " + p.y() + "); remove one of them or move it by at least " + CLOSEST);
                }
            }
        }
    }

    @Override
    public MeshWarp moved(UnaryOperator<Point> map) {
        return new MeshWarp(kind, handles.stream().map(handle -> new Handle(map.apply(handle.from()), map.apply(handle.to()))).toList(),
                cells, within.map(matte -> matte.moved(map)));
    }

    private static void requireSpread(List<Handle> handles, Function<Handle, Point> end, String name) {
        double meanX = 0;
        double meanY = 0;
        for (Handle handle : handles) {
            meanX += end.apply(handle).x() / handles.size();
            meanY += end.apply(handle).y() / handles.size();
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

package org.wispwright.warp.retouch;

import org.wispwright.warp.matte.Needs;
import org.wispwright.warp.matte.Point;

/**
 * One control point of a {@link MeshWarp}. A handle with from = to pins the picture there.
 *
 * @param from a place on the picture before the warp
 * @param to   where that place is pulled to
 */
public record Handle(Point from, Point to) {
    /**
     * Checks that both ends are there.
     *
     * @throws IllegalArgumentException if one is missing
     */
    public Handle {
        Needs.present("handle", "from", from);
        Needs.present("handle", "to", to);
    }

    /** A handle that holds a place where it is. */
    public static Handle pin(Point place) {
        return new Handle(place, place);
    }
}

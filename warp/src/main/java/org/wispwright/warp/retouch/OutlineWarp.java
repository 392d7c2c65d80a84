package org.wispwright.warp.retouch;

import java.util.List;
import java.util.Optional;
import java.util.function.UnaryOperator;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Needs;
import org.wispwright.warp.matte.Point;

/**
 * Points of the smoke's outline dragged, the inside following. The outline is that of the original's opacity at a level, found anew in
 * every picture the operation is applied to: each drag takes hold of the outline's point nearest to its {@code from} and moves it by
 * {@code to - from}. Outline farther than a reach from every drag stays; beyond two reaches nothing moves at all.
 * <p>A drag with no outline within a reach of it takes hold of {@code from} itself.
 *
 * @param level  opacity on the outline, above 0 and below 1
 * @param drags  1 to {@value #MOST_DRAGS}; no two starts and no two ends alike
 * @param reach  how far a drag bends the outline, heights, above 0 and at most {@value #LONGEST_REACH}
 * @param inside how what lies between the outline's points follows
 * @param within matte that scales the displacement; empty means anywhere
 */
public record OutlineWarp(double level, List<Handle> drags, double reach, WarpKind inside, Optional<Matte> within)
        implements Operation {
    /** The most drags. */
    public static final int MOST_DRAGS = 100;
    /** The longest reach, in heights. */
    public static final double LONGEST_REACH = 2;

    /**
     * Checks and copies.
     *
     * @throws IllegalArgumentException if a number is out of range, there are too few or too many drags, or two coincide
     */
    public OutlineWarp {
        Needs.present("outline", "drags", drags);
        Needs.present("outline", "inside", inside);
        Needs.present("outline", "within", within);
        if (!(level > 0 && level < 1)) {
            throw new IllegalArgumentException("outline: got level " + level + ", needs an opacity above 0 and below 1");
        }
        if (!(reach > 0 && reach <= LONGEST_REACH)) {
            throw new IllegalArgumentException("outline: got reach " + reach + ", needs heights above 0, at most " + LONGEST_REACH);
        }
        if (drags.isEmpty() || drags.size() > MOST_DRAGS) {
            throw new IllegalArgumentException("outline: got " + drags.size() + " drags, needs 1 to " + MOST_DRAGS);
        }
        MeshWarp.requireApart("outline", "drag", drags, Handle::from, "from");
        MeshWarp.requireApart("outline", "drag", drags, Handle::to, "to");
        drags = List.copyOf(drags);
    }

    @Override
    public boolean changesNothing() {
        return drags.stream().allMatch(drag -> drag.from().equals(drag.to()));
    }

    @Override
    public OutlineWarp moved(UnaryOperator<Point> map) {
        return new OutlineWarp(level, drags.stream().map(drag -> new Handle(map.apply(drag.from()), map.apply(drag.to()))).toList(), reach,
                inside, within.map(matte -> matte.moved(map)));
    }

    /** The least distance of a place from what the drags sweep, in heights. */
    double distance(double x, double y) {
        double nearest = Double.POSITIVE_INFINITY;
        for (Handle drag : drags) {
            Point a = drag.from();
            double abx = drag.to().x() - a.x();
            double aby = drag.to().y() - a.y();
            double squared = abx * abx + aby * aby;
            double t = squared == 0 ? 0 : ((x - a.x()) * abx + (y - a.y()) * aby) / squared;
            t = Math.min(1, Math.max(0, t));
            nearest = Math.min(nearest, Math.hypot(x - a.x() - t * abx, y - a.y() - t * aby));
        }
        return nearest;
    }
}

package org.wispwright.warp.carry;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.wispwright.warp.matte.CombinedMatte;
import org.wispwright.warp.matte.DensityRange;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Pressure;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.OutlineWarp;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Stroke;

/**
 * A retouch part of the way between two, for frames between two noted ones. Operations match by order and must be of one kind (strokes:
 * of one brush); then every number x of one is {@code x_a + share (x_b - x_a)}: radii, strengths, edges, sides, and positions, where
 * handles match by order and the points of lines and outlines by arc length, see {@link Line}. At share 0 and 1 it draws what the
 * first and the second draw.
 */
public final class Between {
    private Between() {
    }

    /**
     * The retouch at a share of the way.
     *
     * @param share 0 to 1
     * @throws IllegalArgumentException in one sentence, if an operation does not match its counterpart, which says where and how, or
     *     what lies between two is no such operation, or the share is out of range
     */
    public static Retouch retouch(Retouch first, Retouch second, double share) {
        if (!(share >= 0 && share <= 1)) {
            throw new IllegalArgumentException("between: got a share of " + share + ", needs 0 to 1");
        }
        List<Operation> a = first.operations();
        List<Operation> b = second.operations();
        if (a.size() != b.size()) {
            throw new IllegalArgumentException("the first retouch has " + a.size() + " operations and the second " + b.size()
                    + ", but both need the same list of kinds to have something between them");
        }
        List<Operation> between = new ArrayList<>();
        for (int n = 0; n < a.size(); n++) {
            String where = "operation " + (n + 1);
            try {
                between.add(operation(where, a.get(n), b.get(n), share));
            } catch (Unlike unlike) {
                throw unlike;
            } catch (IllegalArgumentException refused) {
                throw new IllegalArgumentException(where + ", part of the way: " + refused.getMessage(), refused);
            }
        }
        return new Retouch(between);
    }

    /**
     * The matte at a share of the way.
     *
     * @param where what it is, for the message
     * @throws IllegalArgumentException in one sentence, if they are not of one kind
     */
    public static Matte matte(String where, Matte a, Matte b, double share) {
        if (a.equals(b)) {
            return a;
        }
        if (a instanceof Region.Rectangle p && b instanceof Region.Rectangle q) {
            return new Region.Rectangle(number(p.left(), q.left(), share), number(p.top(), q.top(), share),
                    number(p.right(), q.right(), share), number(p.bottom(), q.bottom(), share), number(p.feather(), q.feather(), share));
        }
        if (a instanceof Region.Ellipse p && b instanceof Region.Ellipse q) {
            return new Region.Ellipse(Line.between(p.centre(), q.centre(), share), number(p.radiusX(), q.radiusX(), share),
                    number(p.radiusY(), q.radiusY(), share), number(p.feather(), q.feather(), share));
        }
        if (a instanceof Region.Polygon p && b instanceof Region.Polygon q) {
            return new Region.Polygon(Line.between(p.outline(), q.outline(), share, true, Region.Polygon.MOST_POINTS),
                    number(p.feather(), q.feather(), share));
        }
        if (a instanceof DensityRange p && b instanceof DensityRange q) {
            return new DensityRange(number(p.from(), q.from(), share), number(p.to(), q.to(), share), number(p.soft(), q.soft(), share),
                    number(p.feather(), q.feather(), share));
        }
        if (a instanceof CombinedMatte p && b instanceof CombinedMatte q && p.way() == q.way() && p.parts().size() == q.parts().size()) {
            List<Matte> parts = new ArrayList<>();
            for (int n = 0; n < p.parts().size(); n++) {
                parts.add(matte("part " + (n + 1) + " of " + where, p.parts().get(n), q.parts().get(n), share));
            }
            return new CombinedMatte(p.way(), parts);
        }
        throw new Unlike(where, named(a), named(b), "the same kind of matte");
    }

    private static Operation operation(String where, Operation a, Operation b, double share) {
        if (a instanceof Stroke p && b instanceof Stroke q && p.brush() == q.brush()) {
            return new Stroke(p.brush(), sweep(where, p.sweep(), q.sweep(), share), within(where, p, q, share));
        }
        if (a instanceof MeshWarp p && b instanceof MeshWarp q) {
            if (p.handles().size() != q.handles().size()) {
                throw new Unlike(where, "a mesh warp with " + p.handles().size() + " handles", "one with " + q.handles().size(),
                        "the same number of handles");
            }
            List<Handle> handles = new ArrayList<>();
            for (int n = 0; n < p.handles().size(); n++) {
                handles.add(new Handle(Line.between(p.handles().get(n).from(), q.handles().get(n).from(), share),
                        Line.between(p.handles().get(n).to(), q.handles().get(n).to(), share)));
            }
            if (p.kind() != q.kind()) {
                throw new Unlike(where, "a mesh warp of kind '" + p.kind().name().toLowerCase(Locale.ROOT) + "'", "one of kind '"
                        + q.kind().name().toLowerCase(Locale.ROOT) + "'", "the same kind");
            }
            return new MeshWarp(p.kind(), handles, p.cells(), within(where, p, q, share));
        }
        if (a instanceof OutlineWarp p && b instanceof OutlineWarp q && p.inside() == q.inside() && p.drags().size() == q.drags().size()) {
            List<Handle> drags = new ArrayList<>();
            for (int n = 0; n < p.drags().size(); n++) {
                drags.add(new Handle(Line.between(p.drags().get(n).from(), q.drags().get(n).from(), share),
                        Line.between(p.drags().get(n).to(), q.drags().get(n).to(), share)));
            }
            return new OutlineWarp(number(p.level(), q.level(), share), drags, number(p.reach(), q.reach(), share), p.inside(),
                    within(where, p, q, share));
        }
        throw new Unlike(where, named(a), named(b), "the same kind of operation, with lines or handles that can go from one to the other");
    }

    private static Sweep sweep(String where, Sweep a, Sweep b, double share) {
        boolean pressed = !a.pressure().values().isEmpty() || !b.pressure().values().isEmpty();
        if (pressed || a.spacing() > 0 != b.spacing() > 0) {
            throw new Unlike(where, "drawn with " + drawn(a), "with " + drawn(b), "even pressure, and a spacing in both or in neither,");
        }
        return new Sweep(number(a.radius(), b.radius(), share), number(a.strength(), b.strength(), share),
                number(a.softEdge(), b.softEdge(), share), Line.between(a.line(), b.line(), share, false, Sweep.MOST_POINTS),
                Pressure.FULL, number(a.spacing(), b.spacing(), share));
    }

    private static String drawn(Sweep sweep) {
        return (sweep.pressure().values().isEmpty() ? "even pressure" : "changing pressure") + (sweep.spacing() > 0 ? " and a spacing"
                : "");
    }

    private static Optional<Matte> within(String where, Operation a, Operation b, double share) {
        if (a.within().isPresent() != b.within().isPresent()) {
            throw new Unlike(where, a.within().isPresent() ? "bounded" : "not bounded", b.within().isPresent() ? "bounded" : "not bounded",
                    "'within' in both or in neither");
        }
        return a.within().map(matte -> matte("'within' of " + where, matte, b.within().orElseThrow(), share));
    }

    /** Clamped, so that rounding leaves no range. */
    private static double number(double a, double b, double share) {
        return Math.min(Math.max(a, b), Math.max(Math.min(a, b), a + share * (b - a)));
    }

    private static String named(Operation operation) {
        if (operation instanceof Stroke stroke) {
            return "a stroke of the brush '" + stroke.brush().name().toLowerCase(Locale.ROOT) + "'";
        }
        return operation instanceof MeshWarp ? "a mesh warp" : "a " + operation.getClass().getSimpleName();
    }

    private static String named(Matte matte) {
        return "a " + matte.getClass().getSimpleName().toLowerCase(Locale.ROOT);
    }

    /** Two that have nothing between them. */
    private static final class Unlike extends IllegalArgumentException {
        private static final long serialVersionUID = 1;

        private Unlike(String where, String first, String second, String needed) {
            super(where + " is " + first + " in the first retouch and " + second + " in the second, but needs " + needed + " in both");
        }
    }
}

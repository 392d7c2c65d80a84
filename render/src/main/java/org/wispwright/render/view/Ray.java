package org.wispwright.render.view;

import java.util.Optional;
import org.wispwright.render.volume.GridShape;

/**
 * A half line in the world.
 *
 * @param origin where it starts, metres
 * @param direction where it goes, length 1
 */
public record Ray(Vec3 origin, Vec3 direction) {

    /**
     * The part of a ray inside a box, as distances from the ray's origin.
     *
     * @param entry metres, at least 0 (0 where the origin is inside)
     * @param exit metres, above entry
     */
    public record Span(double entry, double exit) {
        /** Metres inside. */
        public double length() {
            return exit - entry;
        }
    }

    /** The point this many metres along the ray. */
    public Vec3 at(double metres) {
        return origin.plus(direction.times(metres));
    }

    /**
     * Where this ray is inside the box, by the three pairs of planes: Kay and Kajiya (1986), SIGGRAPH 86, 269-278. A ray that
     * only touches an edge, or runs along a face, is outside.
     */
    public Optional<Span> inside(GridShape box) {
        double h = box.cellMetres();
        double[] start = {origin.x() - box.originX(), origin.y() - box.originY(), origin.z() - box.originZ()};
        double[] step = {direction.x(), direction.y(), direction.z()};
        double[] size = {box.nx() * h, box.ny() * h, box.nz() * h};
        double entry = 0;
        double exit = Double.POSITIVE_INFINITY;
        for (int axis = 0; axis < 3; axis++) {
            if (step[axis] == 0) {
                if (!(start[axis] > 0 && start[axis] < size[axis])) {
                    return Optional.empty();
                }
                continue;
            }
            double low = -start[axis] / step[axis];
            double high = (size[axis] - start[axis]) / step[axis];
            entry = Math.max(entry, Math.min(low, high));
            exit = Math.min(exit, Math.max(low, high));
        }
        return exit > entry ? Optional.of(new Span(entry, exit)) : Optional.empty();
    }
}

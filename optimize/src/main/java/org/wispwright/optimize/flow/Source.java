package org.wispwright.optimize.flow;

import org.wispwright.optimize.motion.Curve;
import org.wispwright.render.view.Vec3;

/**
 * A ball or a box that gives off smoke. In its core it adds {@code ratePerSecond} of density a second; over the rim the rate falls smoothly
 * ({@code 3t^2 - 2t^3}) to 0 at its surface. One that moves stands, in every substep, where it is at the substep's end.
 *
 * @param name          for messages
 * @param form          its shape and size
 * @param centre        of it over the frames, metres; in the plane case only x and y count
 * @param edgeMetres    width of the soft rim, 0 to the form's least half width
 * @param ratePerSecond density added a second at the core, 0 or more
 * @param kelvinPerSecond temperature added a second at the core, finite
 * @param firstFrame    first frame whose state it has already fed
 * @param lastFrame     last frame that it feeds, not before firstFrame
 */
public record Source(String name, Form form, Curve centre, double edgeMetres, double ratePerSecond, double kelvinPerSecond, int firstFrame,
                     int lastFrame) {

    /**
     * Half its widths along x, y and z, metres, each above 0.
     *
     * @param half  of a ball its radius, thrice
     * @param round true for a ball
     */
    public record Form(Vec3 half, boolean round) {
        /** Checks the widths. @throws IllegalArgumentException if one is not above 0 */
        public Form {
            if (!(Math.min(half.x(), Math.min(half.y(), half.z())) > 0)) {
                throw new IllegalArgumentException("source: got half widths of " + half.inWords() + " m, needs numbers above 0");
            }
        }

        /** A ball. @param radius metres, above 0 */
        public static Form ball(double radius) {
            if (!(radius > 0) || Double.isInfinite(radius)) {
                throw new IllegalArgumentException("source: got a radius of " + radius + " m, needs a finite number above 0");
            }
            return new Form(new Vec3(radius, radius, radius), true);
        }

        /** A box. @param half half its sides, metres, each above 0 */
        public static Form box(Vec3 half) {
            return new Form(half, false);
        }

        /** How deep inside a point lies, metres; below 0 outside. */
        double depth(double x, double y, double z) {
            if (round) {
                return half.x() - Math.sqrt(x * x + y * y + z * z);
            }
            return Math.min(half.x() - Math.abs(x), Math.min(half.y() - Math.abs(y), half.z() - Math.abs(z)));
        }
    }

    /** Checks the numbers. @throws IllegalArgumentException saying what is off */
    public Source {
        if (name == null || name.isBlank()) {
            throw new IllegalArgumentException("source: needs a name");
        }
        double least = Math.min(form.half().x(), Math.min(form.half().y(), form.half().z()));
        if (!(edgeMetres >= 0 && edgeMetres <= least)) {
            throw new IllegalArgumentException("source '" + name + "': got an edge of " + edgeMetres
                    + " m, needs 0 to its least half width, "
                    + least + " m");
        }
        if (!(ratePerSecond >= 0) || Double.isInfinite(ratePerSecond)) {
            throw new IllegalArgumentException("source '" + name + "': got a rate of " + ratePerSecond + " a second, needs a finite number from 0");
        }
        if (!Double.isFinite(kelvinPerSecond)) {
            throw new IllegalArgumentException("source '" + name + "': got " + kelvinPerSecond + " kelvin a second, needs a finite number");
        }
        if (lastFrame < firstFrame) {
            throw new IllegalArgumentException("source '" + name + "': got frames " + firstFrame + " to " + lastFrame
                    + ", needs the last not before the first");
        }
    }

    /** A ball that stays and gives no warmth. */
    public Source(String name, double x, double y, double z, double radiusMetres, double edgeMetres, double ratePerSecond, int firstFrame,
                  int lastFrame) {
        this(name, Form.ball(radiusMetres), Curve.still(new Vec3(x, y, z)), edgeMetres, ratePerSecond, 0, firstFrame,
                lastFrame);
    }

    /** The rate's share at a place, metres from the centre: 1 in the core, 0 outside. */
    public double shareAt(double x, double y, double z) {
        double depth = form.depth(x, y, z);
        if (depth <= 0) {
            return 0;
        }
        if (depth >= edgeMetres) {
            return 1;
        }
        double t = depth / edgeMetres;
        return t * t * (3 - 2 * t);
    }

    /** True if the source feeds the step that ends at this frame. */
    public boolean feeds(int frame) {
        return frame >= firstFrame && frame <= lastFrame;
    }
}

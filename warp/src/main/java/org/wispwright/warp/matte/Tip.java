package org.wispwright.warp.matte;

import org.wispwright.render.picture.Picture;

/**
 * What one touch of a brush gives at a distance, on a raster; lengths in pixels. With q = p where pressure acts on the radius, else 1,
 * and v = p where it acts on the strength, else 1:
 * {@code s = centre + (middle q - d) / max(fade q, finest)}, {@code coverage = strength v s^2 (3 - 2 s)}, s clamped to 0..1. A touch
 * whose pressed diameter is under a pixel gives that share of it, so that no pressure gives nothing.
 *
 * @param radius the brush's, which tells when it is under a pixel
 * @param finest narrowest edge: one pixel, or a feather
 * @param on     what pressure scales; null for nothing
 */
record Tip(double radius, double centre, double middle, double fade, double finest, double strength, Pressure.On on) {
    /** The tip of a sweep on a raster of {@code height} rows. */
    static Tip of(double radius, double strength, double softEdge, Pressure.On on, int height) {
        double r = radius * height;
        return new Tip(r, 0.5, r - softEdge * r / 2, softEdge * r, 1, strength, on);
    }

    /**
     * 1 to half a pixel beyond the radius (a hard edge ends there), then falling to 0 over a feather; pressure acts on the radius alone.
     */
    static Tip reaching(double radius, double feather, Pressure.On on, int height) {
        double finest = Math.max(feather * height, 1);
        return new Tip(Picture.LONGEST_SIDE, 1 + 0.5 / finest, radius * height, 0, finest, 1, on == Pressure.On.STRENGTH ? null
                : Pressure.On.RADIUS);
    }

    /** Distance from which on a touch with pressure p gives nothing. */
    double end(double p) {
        double q = onRadius() ? p : 1;
        return middle * q + centre * Math.max(fade * q, finest);
    }

    /** Distance up to which a touch with pressure p gives all. */
    double core(double p) {
        double q = onRadius() ? p : 1;
        return middle * q - (1 - centre) * Math.max(fade * q, finest);
    }

    /** The most that a touch with pressure p gives. */
    double most(double p) {
        double v = onStrength() ? p : 1;
        return strength * v * (onRadius() ? Math.min(1, 2 * radius * p) : 1);
    }

    /** A touch with pressure p. */
    Touch touch(double p) {
        double q = onRadius() ? p : 1;
        double perWide = 1 / Math.max(fade * q, finest);
        return new Touch(end(p), Math.max(0, core(p)), centre + middle * q * perWide, perWide, most(p));
    }

    /**
     * A touch whose pressure is known: {@code s = edge - d perWide}, {@code coverage = most s^2 (3 - 2 s)}, s clamped to 0..1.
     *
     * @param end  distance from which on it gives nothing
     * @param core distance up to which it gives all
     */
    record Touch(double end, double core, double edge, double perWide, double most) {
        float at(double distance) {
            double s = Math.min(1, Math.max(0, edge - distance * perWide));
            return (float) (most * s * s * (3 - 2 * s));
        }
    }

    /** Whether pressure scales the radius. */
    boolean onRadius() {
        return on == Pressure.On.RADIUS || on == Pressure.On.BOTH;
    }

    /** Whether pressure scales the strength. */
    boolean onStrength() {
        return on == Pressure.On.STRENGTH || on == Pressure.On.BOTH;
    }
}

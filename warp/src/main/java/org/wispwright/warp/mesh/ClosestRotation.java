package org.wispwright.warp.mesh;

/**
 * The rotation nearest to a matrix {@code [a b; c d]} in the sum of squared entries: {@code angle = atan2(c - b, a + d)}, since
 * {@code |A - R|^2 = |A|^2 + 2 - 2 ((a + d) cos + (c - b) sin)}. Positive angles turn x towards y.
 * <p>Source: Schoenemann (1966), Psychometrika 31(1), 1-10, in the plane.
 *
 * @param cos             cosine of its angle
 * @param sin             sine of its angle
 * @param squaredDistance {@code |A - R|^2}
 */
public record ClosestRotation(double cos, double sin, double squaredDistance) {
    /** The nearest rotation; no turn where all turns are as near ({@code a + d = c - b = 0}). */
    public static ClosestRotation to(double a, double b, double c, double d) {
        double along = a + d;
        double across = c - b;
        double length = Math.hypot(along, across);
        double cos = length > 0 ? along / length : 1;
        double sin = length > 0 ? across / length : 0;
        double squared = (a - cos) * (a - cos) + (b + sin) * (b + sin) + (c - sin) * (c - sin) + (d - cos) * (d - cos);
        return new ClosestRotation(cos, sin, squared);
    }

    /** The angle in radians, -pi to pi. */
    public double angle() {
        return Math.atan2(sin, cos);
    }
}

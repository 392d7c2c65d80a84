package org.wispwright.render.view;

/**
 * A point (metres) or a direction in the world: right-handed, y up.
 *
 * @param x along x, finite
 * @param y along y, finite
 * @param z along z, finite
 */
public record Vec3(double x, double y, double z) {
    /** Checks the three numbers. @throws IllegalArgumentException if one is NaN or infinite */
    public Vec3 {
        if (!Double.isFinite(x) || !Double.isFinite(y) || !Double.isFinite(z)) {
            throw new IllegalArgumentException("vector: got (" + x + ", " + y + ", " + z + "), needs finite numbers");
        }
    }

    /** This and another added. */
    public Vec3 plus(Vec3 other) {
        return new Vec3(x + other.x, y + other.y, z + other.z);
    }

    /** From the other to this. */
    public Vec3 minus(Vec3 other) {
        return new Vec3(x - other.x, y - other.y, z - other.z);
    }

    /** This stretched. */
    public Vec3 times(double by) {
        return new Vec3(x * by, y * by, z * by);
    }

    /** Scalar product. */
    public double dot(Vec3 other) {
        return x * other.x + y * other.y + z * other.z;
    }

    /** Vector product, right-handed. */
    public Vec3 cross(Vec3 other) {
        return new Vec3(y * other.z - z * other.y, z * other.x - x * other.z, x * other.y - y * other.x);
    }

    /** Euclidean length. */
    public double length() {
        return Math.sqrt(dot(this));
    }

    /** The same direction with length 1. @throws IllegalArgumentException if the length is 0 */
    public Vec3 unit() {
        double length = length();
        if (!(length > 0)) {
            throw new IllegalArgumentException("vector: " + inWords() + " has no direction; give one that is longer than 0");
        }
        return times(1 / length);
    }

    /** "(1.0, 2.0, 3.0)", for messages. */
    public String inWords() {
        return "(" + x + ", " + y + ", " + z + ")";
    }
}

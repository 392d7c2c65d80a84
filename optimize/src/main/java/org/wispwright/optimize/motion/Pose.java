package org.wispwright.optimize.motion;

import org.wispwright.render.view.Vec3;

/**
 * Where a rigid thing is at one moment, and how it moves: world = position + R local. R turns by the angle |r| about the rotation
 * vector r: {@code R x = x + sin(a)/a r x + (1 - cos a)/a^2 r (r x)} with cross products (Rodrigues 1840). Its points move with
 * {@code v + w x (point - position)}; for a rotation vector that changes by r' a second
 * {@code w = r' + (1 - cos a)/a^2 (r x r') + (a - sin a)/a^3 (r x (r x r'))} (Bullo and Murray 1995, Proportional Derivative Control on the
 * Euclidean Group, App. A).
 *
 * @param position metres
 * @param rotation rotation vector, radians
 * @param velocity of the position, m/s
 * @param spin     the w above, radians a second
 */
public record Pose(Vec3 position, Vec3 rotation, Vec3 velocity, Vec3 spin) {

    /**
     * The pose at the end of a span of frames, moving as in the span's middle: what lies between keys then moves by the right amount, and
     * the first and last span of a motion have the speed of their own.
     */
    public static Pose of(Curve position, Curve rotation, double fromFrame, double toFrame, double framesPerSecond) {
        double middle = (fromFrame + toFrame) / 2;
        return new Pose(position.at(toFrame), rotation.at(toFrame), position.slope(middle).times(framesPerSecond),
                spin(rotation.at(middle), rotation.slope(middle).times(framesPerSecond)));
    }

    private static Vec3 spin(Vec3 r, Vec3 change) {
        double a = r.length();
        // The series where the quotients lose their digits: next terms are a^4 / 720 and a^4 / 5040.
        double first = a < 1e-3 ? 0.5 - a * a / 24 : (1 - Math.cos(a)) / (a * a);
        double second = a < 1e-3 ? 1.0 / 6 - a * a / 120 : (a - Math.sin(a)) / (a * a * a);
        Vec3 across = r.cross(change);
        return change.plus(across.times(first)).plus(r.cross(across).times(second));
    }

    /** A local point, or direction, turned into the world's axes. */
    public Vec3 turn(Vec3 local) {
        return turned(local, 1);
    }

    /** A world point in the thing's own axes, from its position. */
    public Vec3 toLocal(Vec3 world) {
        return turned(world.minus(position), -1);
    }

    /** Velocity of the thing's point that is at a world position, m/s. */
    public Vec3 velocityAt(Vec3 world) {
        return velocity.plus(spin.cross(world.minus(position)));
    }

    /** True if it does not move at this moment. */
    public boolean isStill() {
        return velocity.length() == 0 && spin.length() == 0;
    }

    private Vec3 turned(Vec3 v, double way) {
        double a = rotation.length();
        if (a == 0) {
            return v;
        }
        Vec3 axis = rotation.times(way / a);
        Vec3 across = axis.cross(v);
        return v.plus(across.times(Math.sin(a))).plus(axis.cross(across).times(1 - Math.cos(a)));
    }
}

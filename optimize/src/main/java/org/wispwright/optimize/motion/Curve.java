package org.wispwright.optimize.motion;

import java.util.Arrays;
import java.util.List;
import org.wispwright.render.view.Vec3;

/**
 * Three numbers over frames, smooth between keys: a monotone cubic a component. Before the first key and after the last they stand still.
 *
 * <p>Between keys a and b, t = the share of the way: Hermite's cubic of the values and slopes. The slope at an inner key is 0 where the
 * component turns round or rests, else Fritsch and Butland's (1984), SIAM J. Sci. Stat. Comput. 5(2), 300-304,
 * {@code d1 d2 / (w d2 + (1 - w) d1)}, {@code w = (1 + h2 / (h1 + h2)) / 3}, d and h the slopes and lengths of the two spans beside it; at
 * an end it is the span's own. So nothing swings past a key, two keys give a straight line, and equal keys give rest.
 *
 * @param frames of the keys, rising, at least one
 * @param values one for each frame
 */
public record Curve(List<Double> frames, List<Vec3> values) {
    /** The most keys that one curve may have. */
    public static final int MOST_KEYS = 10_000;

    /** Copies the lists. @throws IllegalArgumentException if there is no key, counts differ or frames do not rise */
    public Curve {
        frames = List.copyOf(frames);
        values = List.copyOf(values);
        if (frames.isEmpty() || frames.size() != values.size() || frames.size() > MOST_KEYS) {
            throw new IllegalArgumentException("keys: got " + frames.size() + " frames and " + values.size() + " values, needs 1 to "
                    + MOST_KEYS + " of both");
        }
        for (int n = 0; n < frames.size(); n++) {
            if (!Double.isFinite(frames.get(n)) || n > 0 && !(frames.get(n) > frames.get(n - 1))) {
                throw new IllegalArgumentException("keys: got frame " + frames.get(n) + " as number " + (n + 1)
                        + ", needs frames that rise from key to key; sort them");
            }
        }
    }

    /** The same at every frame. */
    public static Curve still(Vec3 value) {
        return new Curve(List.of(0.0), List.of(value));
    }

    /** True if it never changes. */
    public boolean isStill() {
        return values.stream().allMatch(values.get(0)::equals);
    }

    /** The values at a frame, whole or between two. */
    public Vec3 at(double frame) {
        return new Vec3(component(frame, 0, false), component(frame, 1, false), component(frame, 2, false));
    }

    /** Change a frame, at a frame; 0 outside the keys. */
    public Vec3 slope(double frame) {
        return new Vec3(component(frame, 0, true), component(frame, 1, true), component(frame, 2, true));
    }

    private double component(double frame, int axis, boolean slope) {
        int last = frames.size() - 1;
        if (frame <= frames.get(0) || frame >= frames.get(last)) {
            return slope ? 0 : value(frame <= frames.get(0) ? 0 : last, axis);
        }
        int n = Arrays.binarySearch(frames.toArray(), frame);
        n = n >= 0 ? n : -n - 2;
        double h = frames.get(n + 1) - frames.get(n);
        double t = (frame - frames.get(n)) / h;
        double a = value(n, axis);
        double b = value(n + 1, axis);
        double ma = keySlope(n, axis) * h;
        double mb = keySlope(n + 1, axis) * h;
        if (slope) {
            return (6 * t * (1 - t) * (b - a) + (1 - t) * (1 - 3 * t) * ma + t * (3 * t - 2) * mb) / h;
        }
        double u = 1 - t;
        return u * u * (1 + 2 * t) * a + t * t * (3 - 2 * t) * b + t * u * (u * ma - t * mb);
    }

    private double keySlope(int n, int axis) {
        int last = frames.size() - 1;
        if (n == 0 || n == last) {
            return span(n == 0 ? 0 : last - 1, axis);
        }
        double d1 = span(n - 1, axis);
        double d2 = span(n, axis);
        if (!(d1 * d2 > 0)) {
            return 0;
        }
        double h1 = frames.get(n) - frames.get(n - 1);
        double h2 = frames.get(n + 1) - frames.get(n);
        double w = (1 + h2 / (h1 + h2)) / 3;
        return d1 * d2 / (w * d2 + (1 - w) * d1);
    }

    private double span(int n, int axis) {
        return (value(n + 1, axis) - value(n, axis)) / (frames.get(n + 1) - frames.get(n));
    }

    private double value(int n, int axis) {
        Vec3 v = values.get(n);
        return axis == 0 ? v.x() : axis == 1 ? v.y() : v.z();
    }
}

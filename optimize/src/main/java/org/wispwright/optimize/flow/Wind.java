package org.wispwright.optimize.flow;

import org.wispwright.optimize.motion.Curve;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.MacVelocity;

/**
 * Air that is pushed everywhere alike: by an acceleration, and by a drag towards a wind. Both may change over the frames.
 *
 * <p>Forward, in every face, k = exp(-drag dt): {@code u := k u + (1 - k) W + dt a}; exact for drag alone. Affine in u. Pullback:
 * {@code uBar := k uBar}. In a closed box pressure takes back what is the same everywhere; through open sides it blows. Ours.
 *
 * @param acceleration    over the frames, m/s2
 * @param velocity        the wind W over the frames, m/s
 * @param dragPerSecond   rate at which air takes on the wind's velocity, 1/s, 0 or more
 */
public record Wind(Curve acceleration, Curve velocity, double dragPerSecond) {
    /** No push at all. */
    public static final Wind NONE = new Wind(Curve.still(new Vec3(0, 0, 0)), Curve.still(new Vec3(0, 0, 0)), 0);

    /** Checks the drag. @throws IllegalArgumentException if it is below 0 */
    public Wind {
        if (!(dragPerSecond >= 0) || Double.isInfinite(dragPerSecond)) {
            throw new IllegalArgumentException("wind: got a drag of " + dragPerSecond + " 1/s, needs a finite number from 0");
        }
    }

    /** True if it never pushes. */
    public boolean isNone() {
        Vec3 zero = new Vec3(0, 0, 0);
        return dragPerSecond == 0 && acceleration.values().stream().allMatch(zero::equals);
    }

    /** Blows on u, in place, as in the middle of the substep. */
    void forward(MacVelocity u, Substep at, double seconds, Lanes lanes) {
        if (isNone()) {
            return;
        }
        double middle = (at.from() + at.to()) / 2;
        double keep = Math.exp(-dragPerSecond * seconds);
        Vec3 add = velocity.at(middle).times(1 - keep).plus(acceleration.at(middle).times(seconds));
        blow(u, (float) keep, add, lanes);
    }

    /** Pulls a derivative back, in place. */
    void pullback(MacVelocity uBar, double seconds, Lanes lanes) {
        if (dragPerSecond > 0) {
            blow(uBar, (float) Math.exp(-dragPerSecond * seconds), new Vec3(0, 0, 0), lanes);
        }
    }

    private static void blow(MacVelocity u, float keep, Vec3 add, Lanes lanes) {
        float[][] parts = {u.x(), u.y(), u.z()};
        float[] adds = {(float) add.x(), (float) add.y(), (float) add.z()};
        lanes.forEach(3, part -> {
            float[] values = parts[part];
            for (int n = 0; n < values.length; n++) {
                values[n] = keep * values[n] + adds[part];
            }
        });
    }
}

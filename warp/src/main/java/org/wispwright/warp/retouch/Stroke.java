package org.wispwright.warp.retouch;

import java.util.List;
import java.util.Optional;
import java.util.function.UnaryOperator;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Needs;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.matte.Window;

/**
 * A brush drawn along a polyline.
 *
 * @param brush  what it does
 * @param sweep  the line, its width, strength and edge
 * @param within outside it nothing changes; empty means anywhere
 */
public record Stroke(Brush brush, Sweep sweep, Optional<Matte> within) implements Operation {
    /**
     * Checks that all is there.
     *
     * @throws IllegalArgumentException if a part is missing
     */
    public Stroke {
        Needs.present("stroke", "brush", brush);
        Needs.present("stroke", "sweep", sweep);
        Needs.present("stroke", "within", within);
    }

    /**
     * A stroke of a new {@link Sweep}.
     *
     * @throws IllegalArgumentException as there
     */
    public Stroke(Brush brush, double radius, double strength, double softEdge, List<Point> line, Optional<? extends Matte> within) {
        this(brush, new Sweep(radius, strength, softEdge, line), within == null ? null : within.map(m -> m));
    }

    /** Distance from the line at which the brush ends, fraction of the height. */
    public double radius() {
        return sweep.radius();
    }

    /** The line's points. */
    public List<Point> line() {
        return sweep.line();
    }

    @Override
    public boolean changesNothing() {
        return sweep.strength() == 0 || !sweep.pressure().values().isEmpty() && sweep.pressure().values().stream().allMatch(p -> p == 0)
                || brush == Brush.PUSH && line().stream().allMatch(line().get(0)::equals);
    }

    @Override
    public Stroke moved(UnaryOperator<Point> map) {
        return new Stroke(brush, sweep.moved(map), within.map(matte -> matte.moved(map)));
    }

    /** Where the stroke reaches, the matte taken in. */
    float[] reach(Picture original, double feather) {
        Window all = Window.all(original.width(), original.height());
        float[] reach = sweep.reach(all, original.height(), feather);
        within.ifPresent(matte -> times(reach, matte.reach(original, all, feather)));
        return reach;
    }

    private static void times(float[] a, float[] b) {
        for (int n = 0; n < a.length; n++) {
            a[n] *= b[n];
        }
    }
}

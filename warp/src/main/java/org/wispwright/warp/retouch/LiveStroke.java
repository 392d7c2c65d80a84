package org.wispwright.warp.retouch;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Pressure;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.matte.Window;

/**
 * A stroke while it is drawn on a {@link Canvas}: every few points that the pointer gives refresh the pixels near them and no others. At
 * any time the canvas shows what {@link Retoucher#wanted} makes of the operations before and {@link #stroke} as it is by then, to the bit.
 * <p>It ends once, by {@link #end} or {@link #cancel}.
 */
public final class LiveStroke {
    private final Canvas canvas;
    private final Stroke start;
    private final Brushwork work;
    private final List<Point> line = new ArrayList<>();
    private final List<Double> pressure = new ArrayList<>();
    private Window reached;
    private boolean over;

    LiveStroke(Canvas canvas, Stroke start, Brushwork work) {
        this.canvas = canvas;
        this.start = start;
        this.work = work;
        List<Double> pressures = new ArrayList<>();
        for (int n = 0; n < start.line().size(); n++) {
            pressures.add(start.sweep().pressure().at(n));
        }
        extend(start.line(), pressures);
    }

    /**
     * The line goes on by some points, and the canvas's picture follows.
     *
     * @param points    in order
     * @param pressures 0 to 1, one a point
     * @return the pixels that may have changed; empty if no pixel of the picture can have
     * @throws IllegalArgumentException if the numbers of both differ, a pressure is out of range, or the line gets longer than a
     *                                  {@link Sweep} may be; nothing is drawn then
     * @throws IllegalStateException    if the stroke is over
     */
    public Optional<Window> extend(List<Point> points, List<Double> pressures) {
        requireNotOver();
        if (points.size() != pressures.size()) {
            throw new IllegalArgumentException("stroke: got " + points.size() + " points and " + pressures.size()
                    + " pressures, needs as many of each");
        }
        List<Point> longer = new ArrayList<>(line);
        longer.addAll(points);
        List<Double> harder = new ArrayList<>(pressure);
        harder.addAll(pressures);
        stroke(longer, harder);
        List<Point> fresh = longer.subList(Math.max(0, line.size() - 1), longer.size());
        for (int n = 0; n < points.size(); n++) {
            work.extend(points.get(n), pressures.get(n));
        }
        line.addAll(points);
        pressure.addAll(pressures);
        Picture picture = canvas.picture();
        Window dirty = points.isEmpty() ? null : Brushwork.reached(fresh, start.radius(), picture.width(), picture.height());
        if (dirty != null) {
            work.refresh(dirty, picture);
            reached = reached == null ? dirty : reached.around(dirty);
        }
        return Optional.ofNullable(dirty);
    }

    /** The stroke as it is by now. */
    public Stroke stroke() {
        return stroke(line, pressure);
    }

    /** Keeps the stroke on the canvas. @throws IllegalStateException if it is over already */
    public Stroke end() {
        requireNotOver();
        over = true;
        canvas.over(true);
        return stroke();
    }

    /**
     * Takes the stroke off the canvas again.
     *
     * @return the pixels that may have changed; empty for none
     * @throws IllegalStateException if it is over already
     */
    public Optional<Window> cancel() {
        requireNotOver();
        over = true;
        canvas.over(false);
        return Optional.ofNullable(reached);
    }

    private Stroke stroke(List<Point> points, List<Double> pressures) {
        Sweep sweep = start.sweep();
        List<Double> told = pressures.stream().allMatch(p -> p != null && p == 1) ? List.of() : pressures;
        return new Stroke(start.brush(), new Sweep(sweep.radius(), sweep.strength(), sweep.softEdge(), points,
                new Pressure(sweep.pressure().on(), told), sweep.spacing()), start.within());
    }

    private void requireNotOver() {
        if (over) {
            throw new IllegalStateException("stroke: it was ended or cancelled; begin another");
        }
    }
}

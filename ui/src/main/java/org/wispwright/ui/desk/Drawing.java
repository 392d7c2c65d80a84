package org.wispwright.ui.desk;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Pressure;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.matte.Trail;
import org.wispwright.warp.matte.Window;
import org.wispwright.warp.retouch.LiveStroke;
import org.wispwright.warp.retouch.Stroke;

/**
 * A stroke under the hand. The live picture follows it point by point; when it ends, the open note has it. Points that come before the
 * picture is there are drawn when it is. A line as long as a stroke may be takes no more points.
 */
public final class Drawing extends Gesture {
    private final Retouching session;
    private final Stroke start;
    private final List<Point> line = new ArrayList<>();
    private final List<Double> pressures = new ArrayList<>();
    private LiveStroke live;
    private boolean over;

    Drawing(Retouching session, Stroke start) {
        this.session = session;
        this.start = start;
        line.addAll(start.line());
        for (int n = 0; n < start.line().size(); n++) {
            pressures.add(start.sweep().pressure().at(n));
        }
    }

    @Override
    void ready() {
        live = session.canvas().begin(stroke());
        around(line).ifPresent(session::changed);
    }

    /**
     * The line goes on. Points that a straight piece stands for are left out ({@link Trail}).
     *
     * @param points those that came since the last call, in order
     * @param harder their pressures, 0 to 1, one a point
     */
    public void extend(List<Point> points, List<Double> harder) {
        if (over || points.isEmpty()) {
            return;
        }
        List<Point> all = new ArrayList<>(line.subList(line.size() - 1, line.size()));
        all.addAll(points);
        List<Double> pressed = new ArrayList<>(pressures.subList(line.size() - 1, line.size()));
        pressed.addAll(harder);
        Trail trail = new Trail(all, pressed).thinned(start.radius(), Trail.USUAL_SPACING);
        int more = Math.min(trail.line().size() - 1, Sweep.MOST_POINTS - line.size());
        List<Point> fresh = trail.line().subList(1, 1 + more);
        List<Double> pressure = trail.pressure().subList(1, 1 + more);
        line.addAll(fresh);
        pressures.addAll(pressure);
        if (live != null) {
            live.extend(fresh, pressure).ifPresent(session::changed);
        }
    }

    /** Ends the stroke: the note has it, unless it changes nothing. */
    public void end() {
        if (over) {
            return;
        }
        Stroke stroke = stroke();
        if (stroke.changesNothing() || live != null && around(line).isEmpty()) {
            session.cancel();
            return;
        }
        over = true;
        boolean shown = live != null && session.isLaid();
        if (shown) {
            live.end();
        }
        session.ended(this, Retouching.Edit.ADD_STROKE, session.operations().size(), stroke, shown);
    }

    @Override
    void dropped() {
        if (!over) {
            over = true;
            if (live != null && session.isLaid()) {
                live.cancel().ifPresent(session::changed);
            }
        }
    }

    /** The stroke as it is by now. */
    public Stroke stroke() {
        List<Double> told = pressures.stream().allMatch(p -> p == 1) ? List.of() : pressures;
        Sweep sweep = start.sweep();
        return new Stroke(start.brush(), new Sweep(sweep.radius(), sweep.strength(), sweep.softEdge(), line,
                new Pressure(sweep.pressure().on(), told), sweep.spacing()), start.within());
    }

    /** The pixels that the brush may reach along some points; empty if none is on the picture. */
    private Optional<Window> around(List<Point> points) {
        Picture picture = session.canvas().picture();
        int height = picture.height();
        double radius = start.radius();
        double left = points.stream().mapToDouble(Point::x).min().orElseThrow() - radius;
        double right = points.stream().mapToDouble(Point::x).max().orElseThrow() + radius;
        double top = points.stream().mapToDouble(Point::y).min().orElseThrow() - radius;
        double bottom = points.stream().mapToDouble(Point::y).max().orElseThrow() + radius;
        int x0 = (int) Math.max(0, Math.floor(left * height) - 1);
        int y0 = (int) Math.max(0, Math.floor(top * height) - 1);
        int x1 = (int) Math.min(picture.width() - 1, Math.ceil(right * height) + 1);
        int y1 = (int) Math.min(height - 1, Math.ceil(bottom * height) + 1);
        return x0 > x1 || y0 > y1 ? Optional.empty() : Optional.of(new Window(x0, y0, x1 - x0 + 1, y1 - y0 + 1));
    }
}

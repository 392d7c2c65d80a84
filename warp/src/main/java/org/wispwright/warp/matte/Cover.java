package org.wispwright.warp.matte;

/**
 * Coverage of a line that grows: at each pixel the maximum, over all points of the line, of what a touch there gives ({@link Tip}). So a
 * line that crosses itself or dwells acts once, and how finely it is sampled makes no difference.
 * <p>Where the pressure is the same, the maximum lies at the nearest point, so a piece is looked at only beside itself, and a joint only
 * on the outer side of its bend; the far side of the last point is added when coverage is read. Where pressure changes along a piece, the
 * coverage along it has one peak, found by golden section to within {@value #SEARCH_SHARE} of the edge's width (coverage then falls short
 * by at most 0.002). With a spacing there is one touch at every spacing of arc length and nothing between.
 * <p>The bits of a pixel depend on the line alone, neither on the window nor on how the line was handed over.
 */
public final class Cover {
    private static final double GOLDEN = (Math.sqrt(5) - 1) / 2;
    private static final double SEARCH_SHARE = 0.02;

    private final Tip tip;
    private final double spacing;
    private final int height;
    private final Window window;
    private final float[] values;
    private final Rows rows;
    private boolean begun;
    /** Whether the last piece had even pressure. */
    private boolean level;
    /** Whether what a touch at the last point gives is still to be taken in. */
    private boolean open;
    private double x;
    private double y;
    private double pressure;
    private double ux;
    private double uy;
    private double sinceTouch;

    /**
     * An empty line's.
     *
     * @param sweep  gives the brush: radius, strength, soft edge, spacing and what pressure acts on; its line is not read
     * @param height rows of the whole raster
     * @param values one a pixel of the window, all 0; {@link #extend} changes them and {@link #read} reads them
     */
    public Cover(Sweep sweep, int height, Window window, float[] values) {
        this(Tip.of(sweep.radius(), sweep.strength(), sweep.softEdge(), sweep.pressure().on(), height), sweep.spacing() * sweep.radius(),
                height, window, values);
    }

    Cover(Tip tip, double spacing, int height, Window window, float[] values) {
        this.tip = tip;
        this.spacing = spacing * height;
        this.height = height;
        this.window = window;
        this.values = values;
        rows = new Rows(window);
    }

    /** The line goes on to a point; the first begins it. Writes what is sure by now; {@link #read} adds the end. */
    public void extend(Point point, double p) {
        double bx = point.x() * height - 0.5;
        double by = point.y() * height - 0.5;
        if (!begun) {
            touch(bx, by, p);
        } else if (spacing > 0) {
            touches(bx, by, p);
        } else {
            piece(bx, by, p);
        }
        begun = true;
        x = bx;
        y = by;
        pressure = p;
    }

    /**
     * Coverage of a part, the line's end taken in.
     *
     * @param part inside this cover's window
     * @param out  overwritten: one a pixel of the part
     */
    public void read(Window part, float[] out) {
        for (int j = 0; j < part.height(); j++) {
            System.arraycopy(values, part.left() - window.left() + window.width() * (part.top() - window.top() + j), out,
                    part.width() * j, part.width());
        }
        if (begun && spacing == 0) {
            new Cover(tip, 0, height, part, out).touch(x, y, pressure);
        }
    }

    private void touches(double bx, double by, double p) {
        double length = Math.hypot(bx - x, by - y);
        double at = spacing - sinceTouch;
        for (; at <= length; at += spacing) {
            double t = at / length;
            touch(x + t * (bx - x), y + t * (by - y), pressure + t * (p - pressure));
        }
        sinceTouch = length - (at - spacing);
    }

    private void piece(double bx, double by, double p) {
        double length = Math.hypot(bx - x, by - y);
        boolean same = p == pressure || tip.on() == null;
        if (length == 0) {
            if (!same) {
                touch(bx, by, Math.max(p, pressure));
                level = false;
                open = false;
            }
            return;
        }
        double nextX = (bx - x) / length;
        double nextY = (by - y) / length;
        if (same) {
            if (level) {
                joint(nextX, nextY);
            } else if (open) {
                touch(x, y, pressure);
            }
            strip(nextX, nextY, length);
        } else {
            cone(nextX, nextY, length, p);
        }
        level = same;
        open = !same;
        ux = nextX;
        uy = nextY;
    }

    private void touch(double cx, double cy, double p) {
        double end = tip.end(p);
        rows.between(cy - end, cy + end);
        for (int j = rows.from; j <= rows.to; j++) {
            double dy = j - cy;
            double half = Math.sqrt(Math.max(0, end * end - dy * dy));
            rows.all();
            rows.keep(1, cx - half, cx + half);
            spread(j, cx, cy, p);
        }
    }

    /** The outer side of the bend at the last point: neither beside the piece before nor beside the next. */
    private void joint(double nextX, double nextY) {
        double end = tip.end(pressure);
        if (ux * nextX + uy * nextY > 1 - 1e-12) {
            return;
        }
        rows.between(y - end, y + end);
        for (int j = rows.from; j <= rows.to; j++) {
            rows.all();
            rows.keep(1, x - end, x + end);
            rows.keep(ux, ux * x - uy * (j - y), Double.POSITIVE_INFINITY);
            rows.keep(nextX, Double.NEGATIVE_INFINITY, nextX * x - nextY * (j - y));
            spread(j, x, y, pressure);
        }
    }

    /** A row's columns take what a touch gives. */
    private void spread(int j, double cx, double cy, double p) {
        double end = tip.end(p);
        double core = Math.max(0, tip.core(p));
        float most = (float) tip.most(p);
        int at = window.width() * (j - window.top()) - window.left();
        double dy = (j - cy) * (j - cy);
        for (int i = rows.left; i <= rows.right; i++) {
            double squared = (i - cx) * (i - cx) + dy;
            if (squared < end * end) {
                values[at + i] = Math.max(values[at + i], squared <= core * core ? most : (float) tip.value(squared, p));
            }
        }
    }

    /** What lies beside a piece of even pressure. */
    private void strip(double vx, double vy, double length) {
        double end = tip.end(pressure);
        double core = Math.max(0, tip.core(pressure));
        float most = (float) tip.most(pressure);
        double farY = y + length * vy;
        double farX = x + length * vx;
        rows.between(Math.min(y, farY) - end, Math.max(y, farY) + end);
        for (int j = rows.from; j <= rows.to; j++) {
            double dy = j - y;
            rows.all();
            rows.keep(1, Math.min(x, farX) - end, Math.max(x, farX) + end);
            rows.keep(vx, vx * x - vy * dy, vx * x - vy * dy + length);
            rows.keep(vy, vy * x + vx * dy - end, vy * x + vx * dy + end);
            int at = window.width() * (j - window.top()) - window.left();
            for (int i = rows.left; i <= rows.right; i++) {
                double along = (i - x) * vx + dy * vy;
                double beside = (i - x) * vy - dy * vx;
                double past = Math.max(0, Math.max(-along, along - length));
                double squared = beside * beside + past * past;
                if (squared < end * end) {
                    values[at + i] = Math.max(values[at + i], squared <= core * core ? most : (float) tip.value(squared, pressure));
                }
            }
        }
    }

    /**
     * A piece whose pressure goes from that of the last point to p, its start taken in. Where coverage is the most at its end, that is left
     * to what follows: the next piece, or the touch that ends the line.
     */
    private void cone(double vx, double vy, double length, double p) {
        double end = tip.end(Math.max(p, pressure));
        double slope = (p - pressure) / length;
        double harder = Math.max(p, pressure);
        double core = Math.max(0, tip.core(harder));
        float most = (float) tip.most(harder);
        double farY = y + length * vy;
        double farX = x + length * vx;
        rows.between(Math.min(y, farY) - end, Math.max(y, farY) + end);
        for (int j = rows.from; j <= rows.to; j++) {
            double dy = j - y;
            rows.all();
            rows.keep(1, Math.min(x, farX) - end, Math.max(x, farX) + end);
            rows.keep(vy, vy * x + vx * dy - end, vy * x + vx * dy + end);
            if (slope > 0) {
                // Ahead of the end coverage rises all along the piece.
                rows.keep(vx, Double.NEGATIVE_INFINITY, vx * x - vy * dy + length);
            }
            int at = window.width() * (j - window.top()) - window.left();
            for (int i = rows.left; i <= rows.right; i++) {
                double along = (i - x) * vx + dy * vy;
                double beside = (i - x) * vy - dy * vx;
                double past = Math.max(0, Math.max(-along, along - length));
                double squared = beside * beside + past * past;
                if (squared >= end * end || values[at + i] >= most) {
                    continue;
                }
                double fromHarder = slope > 0 ? along - length : along;
                if (beside * beside + fromHarder * fromHarder <= core * core) {
                    values[at + i] = most;
                    continue;
                }
                // No point of the piece gives more than the nearest would, pressed as hard as the harder end.
                double distance = Math.sqrt(squared);
                if (tip.at(distance, harder) > values[at + i]) {
                    values[at + i] = Math.max(values[at + i], (float) peak(along, beside * beside, distance, length, slope));
                }
            }
        }
    }

    /** The most along a piece, between the nearest point, which is at {@code distance}, and the end that was pressed harder. */
    private double peak(double along, double beside2, double distance, double length, double slope) {
        double near = Math.min(length, Math.max(0, along));
        double far = slope > 0 ? length : 0;
        double atNear = tip.at(distance, pressure + slope * near);
        if (near == far) {
            return atNear;
        }
        double narrow = SEARCH_SHARE * Math.max(tip.fade(), tip.finest());
        // One peak: if coverage falls away from an end there, that end has it.
        double step = Math.min(narrow, Math.abs(far - near)) / 8 * Math.signum(far - near);
        double within = near + step;
        if (tip.value(beside2 + (along - within) * (along - within), pressure + slope * within) < atNear) {
            return atNear;
        }
        double atFar = tip.value(beside2 + (along - far) * (along - far), pressure + slope * far);
        within = far - step;
        if (tip.value(beside2 + (along - within) * (along - within), pressure + slope * within) < atFar) {
            return atFar;
        }
        double best = Math.max(atNear, atFar);
        double a = near;
        double b = far;
        double c = b - GOLDEN * (b - a);
        double d = a + GOLDEN * (b - a);
        double atC = tip.value(beside2 + (along - c) * (along - c), pressure + slope * c);
        double atD = tip.value(beside2 + (along - d) * (along - d), pressure + slope * d);
        while (Math.abs(b - a) > narrow) {
            if (atC >= atD) {
                b = d;
                d = c;
                atD = atC;
                c = b - GOLDEN * (b - a);
                atC = tip.value(beside2 + (along - c) * (along - c), pressure + slope * c);
            } else {
                a = c;
                c = d;
                atC = atD;
                d = a + GOLDEN * (b - a);
                atD = tip.value(beside2 + (along - d) * (along - d), pressure + slope * d);
            }
        }
        return Math.max(best, Math.max(atC, atD));
    }
}

package org.wispwright.warp.matte;

/**
 * Coverage of a line that grows: at each pixel the maximum, over all points of the line, of what a touch there gives ({@link Tip}). So a
 * line that crosses itself or dwells acts once, and how finely it is sampled makes no difference.
 * <p>Where the pressure is the same, the maximum lies at the nearest point, so a piece is looked at only beside itself, and a joint only
 * on the outer side of its bend; the far side of the last point is added when coverage is read. Where pressure changes along a piece, the
 * coverage along it has one peak ({@link PressedPiece}), found to within 0.002. With a spacing there is one touch at every spacing of arc
 * length and nothing between.
 * <p>The bits of a pixel depend on the line alone, neither on the window nor on how the line was handed over.
 */
public final class Cover {
    private final Tip tip;
    private final double spacing;
    private final int height;
    private final Window window;
    private final float[] values;
    private final Rows rows;
    private final EvenRow even;
    private PressedRow pixels;
    private PressedRow searched;
    private int[] columns;
    private boolean begun;
    /** Whether the last piece had even pressure. */
    private boolean level;
    /** Whether what a touch at the last point gives is still to be taken in. */
    private boolean open;
    /** Whether all that a touch at the last point gives is taken in. */
    private boolean whole;
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
        even = new EvenRow(window.width());
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
        whole = !begun || whole && bx == x && by == y;
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
        double toPartX = Math.max(part.left() - x, x - (part.left() + part.width() - 1));
        double toPartY = Math.max(part.top() - y, y - (part.top() + part.height() - 1));
        if (begun && spacing == 0 && !whole && Math.max(toPartX, toPartY) < tip.end(pressure)) {
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
        Tip.Touch touch = tip.touch(p);
        rows.between(cy - touch.end(), cy + touch.end());
        for (int j = rows.from; j <= rows.to; j++) {
            rows.all();
            spread(j, cx, cy, touch);
        }
    }

    /** The outer side of the bend at the last point: neither beside the piece before nor beside the next. */
    private void joint(double nextX, double nextY) {
        if (ux * nextX + uy * nextY > 1 - 1e-12) {
            return;
        }
        Tip.Touch touch = tip.touch(pressure);
        rows.between(y - touch.end(), y + touch.end());
        for (int j = rows.from; j <= rows.to; j++) {
            rows.all();
            rows.keep(ux, ux * x - uy * (j - y), Double.POSITIVE_INFINITY);
            rows.keep(nextX, Double.NEGATIVE_INFINITY, nextX * x - nextY * (j - y));
            spread(j, x, y, touch);
        }
    }

    /** A row's columns take what a touch gives: all in the core, a share in the edge left and right of it. */
    private void spread(int j, double cx, double cy, Tip.Touch touch) {
        double dy2 = (j - cy) * (j - cy);
        double half2 = touch.end() * touch.end() - dy2;
        if (half2 <= 0) {
            return;
        }
        double half = Math.sqrt(half2);
        int left = (int) Math.max(rows.left, Math.ceil(cx - half));
        int right = (int) Math.min(rows.right, Math.floor(cx + half));
        double inner2 = touch.core() * touch.core() - dy2;
        double inner = inner2 > 0 ? Math.sqrt(inner2) : 0;
        int coreLeft = Math.max(left, inner2 > 0 ? (int) Math.ceil(cx - inner) : right + 1);
        int coreRight = Math.min(right, inner2 > 0 ? (int) Math.floor(cx + inner) : right);
        int at = window.width() * (j - window.top()) - window.left();
        edge(touch, cx, j - cy, left, Math.min(right, coreLeft - 1), at);
        core((float) touch.most(), at + coreLeft, at + coreRight);
        edge(touch, cx, j - cy, Math.max(left, coreRight + 1), right, at);
    }

    private void edge(Tip.Touch touch, double cx, double dy, int left, int right, int at) {
        if (left <= right) {
            even.take(touch, left, right - left + 1, cx, dy, 1, 0, 0, values, at + left);
        }
    }

    private void core(float most, int from, int to) {
        for (int n = from; n <= to; n++) {
            values[n] = Math.max(values[n], most);
        }
    }

    /** What lies beside a piece of even pressure. */
    private void strip(double vx, double vy, double length) {
        Tip.Touch touch = tip.touch(pressure);
        double end = touch.end();
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
            if (rows.left <= rows.right) {
                even.take(touch, rows.left, rows.right - rows.left + 1, x, dy, vx, vy, length, values, at + rows.left);
            }
        }
    }

    /**
     * A piece whose pressure goes from that of the last point to p, its start taken in. Where coverage is the most at its end, that is left
     * to what follows: the next piece, or the touch that ends the line.
     */
    private void cone(double vx, double vy, double length, double p) {
        if (pixels == null) {
            pixels = new PressedRow(window.width());
            searched = new PressedRow(window.width());
            columns = new int[window.width()];
        }
        PressedPiece pressed = new PressedPiece(tip, x, y, vx, vy, length, pressure, p, pixels, searched,
                columns);
        boolean rises = p > pressure;
        double end = pressed.hardest().end();
        double farY = y + length * vy;
        double farX = x + length * vx;
        rows.between(Math.min(y, farY) - end, Math.max(y, farY) + end);
        for (int j = rows.from; j <= rows.to; j++) {
            double dy = j - y;
            double off = Math.max(0, Math.max(Math.min(y, farY) - j, j - Math.max(y, farY)));
            double half = Math.sqrt(Math.max(0, end * end - off * off));
            rows.all();
            rows.keep(1, Math.min(x, farX) - half, Math.max(x, farX) + half);
            rows.keep(vy, vy * x + vx * dy - end, vy * x + vx * dy + end);
            if (rises) {
                // Ahead of the end coverage rises all along the piece.
                rows.keep(vx, Double.NEGATIVE_INFINITY, vx * x - vy * dy + length);
            }
            if (rows.left <= rows.right) {
                pressed.row(j, rows.left, rows.right, values, window.width() * (j - window.top()) - window.left());
            }
        }
    }
}

package org.wispwright.warp.retouch;

import java.util.List;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Pressure;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.matte.Window;
import org.wispwright.warp.resample.Resampling;

/**
 * {@link Brush#PUSH}: the smoke under a stroke moved the way the stroke went.
 * <p>Backward map: pixel p shows what was at {@code q = p - m(p) T(p)}, m the coverage, so every pixel has one source and no holes appear.
 * T is the stroke's travel near p: with gamma the polyline by arc length, gamma' its direction, r the radius, all in heights,
 * {@code T(p) = integral of w(|p - gamma(s)|) gamma'(s) ds}, {@code w(d) = 3/4 (1 - d^2 / r^2)} within r, 0 beyond; where |T| is more than
 * r it is shortened to r. On a long straight line T is r, a distance d beside it {@code r (1 - d^2 / r^2)^(3/2)}, r/2 at its ends.
 * <p>Pressure on the radius narrows r of w along the line with it, in steps of at most 1/16; |T| stays at most the full radius. Pressure on
 * the strength is in m alone, and so is a spacing.
 * <p>The integral is exact a piece, so it does not matter how finely a line is sampled; going back along the line takes the travel back.
 * Along a straight stroke q grows with p for any strength and soft edge: nothing is mirrored or shown twice. Ours.
 */
final class Push {
    /** Displacements up to this, in heights, leave a pixel's bits: what is left of a line that went there and back. */
    static final double STILL = 1e-9;

    private static final int TILE = Gaussian.TILE;
    /** Largest change of pressure along a piece that is taken for one radius. */
    private static final double EVEN_ENOUGH = 1 / 16.0;

    private final Sweep sweep;
    private final Picture before;
    private final int tilesAcross;
    private final Spare spare;
    /** Travel so far, not yet shortened, in heights: of a tile's pixels first x, then y; null where there is none. */
    private final double[][] travels;
    /** Where the columns' centres are, in heights. */
    private final double[] centres;
    /** The travel of a row of a tile's pixels, and where these are. */
    private final double[] rowX = new double[TILE];
    private final double[] rowY = new double[TILE];
    private final double[] places = new double[TILE];
    private final float[] wx = new float[4];
    private final float[] wy = new float[4];

    /** A line without a piece yet; {@code before} is the picture before the stroke, read only. */
    Push(Sweep sweep, Picture before, Spare spare) {
        this.spare = spare;
        this.sweep = sweep;
        this.before = before;
        tilesAcross = (before.width() + TILE - 1) / TILE;
        travels = new double[tilesAcross * ((before.height() + TILE - 1) / TILE)][];
        centres = new double[before.width()];
        for (int i = 0; i < centres.length; i++) {
            centres[i] = (i + 0.5) / before.height();
        }
    }

    /** The travel's arrays go back. */
    void over() {
        for (int tile = 0; tile < travels.length; tile++) {
            spare.back(travels[tile]);
            travels[tile] = null;
        }
    }

    /** The line goes on by a piece. */
    void extend(Point a, double pressureA, Point b, double pressureB) {
        boolean narrows = sweep.pressure().on() != Pressure.On.STRENGTH;
        int parts = narrows ? Math.max(1, (int) Math.ceil(Math.abs(pressureB - pressureA) / EVEN_ENOUGH)) : 1;
        for (int n = 0; n < parts; n++) {
            double from = (double) n / parts;
            double to = (n + 1.0) / parts;
            double middle = pressureA + (from + to) / 2 * (pressureB - pressureA);
            piece(a.x() + from * (b.x() - a.x()), a.y() + from * (b.y() - a.y()), a.x() + to * (b.x() - a.x()),
                    a.y() + to * (b.y() - a.y()), narrows ? middle * sweep.radius() : sweep.radius());
        }
    }

    private void piece(double ax, double ay, double bx, double by, double r) {
        double length = Math.hypot(bx - ax, by - ay);
        int height = before.height();
        Window window = Brushwork.reached(List.of(new Point(ax, ay), new Point(bx, by)), r, before.width(), height);
        if (length == 0 || r == 0 || window == null) {
            return;
        }
        double ux = (bx - ax) / length;
        double uy = (by - ay) / length;
        for (int j = window.top(); j < window.top() + window.height(); j++) {
            double y = (j + 0.5) / height;
            double off = Math.max(0, Math.max(Math.min(ay, by) - y, y - Math.max(ay, by)));
            if (off >= r) {
                continue;
            }
            // Only columns less than r from the piece and less than r beside its line, and a pixel more.
            double half = Math.sqrt(r * r - off * off);
            double middle = Math.abs(uy) < 1e-9 ? 0 : ax + (y - ay) * ux / uy;
            double reach = Math.abs(uy) < 1e-9 ? Double.POSITIVE_INFINITY : r / Math.abs(uy);
            int left = column(Math.max(Math.min(ax, bx) - half, middle - reach), -1, window);
            int right = column(Math.min(Math.max(ax, bx) + half, middle + reach), 1, window);
            // Columns that all of the piece is less than r from, and a pixel less.
            double halfA = Math.sqrt(Math.max(0, r * r - (y - ay) * (y - ay)));
            double halfB = Math.sqrt(Math.max(0, r * r - (y - by) * (y - by)));
            int within = column(Math.max(ax - halfA, bx - halfB), 2, window);
            int beyond = column(Math.min(ax + halfA, bx + halfB), -1, window);
            for (int i = left; i <= right; i = i / TILE * TILE + TILE) {
                int tile = i / TILE + tilesAcross * (j / TILE);
                if (travels[tile] == null) {
                    travels[tile] = spare.zeros();
                }
                int end = Math.min(right + 1, i / TILE * TILE + TILE);
                int from = Math.min(end, Math.max(i, within));
                int to = Math.max(from, Math.min(end, beyond));
                int at = i % TILE + TILE * (j % TILE);
                System.arraycopy(centres, i, places, 0, end - i);
                System.arraycopy(travels[tile], at, rowX, 0, end - i);
                System.arraycopy(travels[tile], at + TILE * TILE, rowY, 0, end - i);
                partly(0, from - i, ax, y - ay, ux, uy, length, r);
                wholly(from - i, to - i, (ax + bx) / 2, y - (ay + by) / 2, ux, uy, length, r);
                partly(to - i, end - i, ax, y - ay, ux, uy, length, r);
                System.arraycopy(rowX, 0, travels[tile], at, end - i);
                System.arraycopy(rowY, 0, travels[tile], at + TILE * TILE, end - i);
            }
        }
    }

    /** The column at a place and some more, cut to a window. */
    private int column(double x, int more, Window window) {
        double column = Math.floor(x * before.height() - 0.5) + more;
        return (int) Math.max(window.left(), Math.min(window.left() + window.width() - 1, column));
    }

    /**
     * The integral of w over a straight piece all of which is less than r from each place: of w at its middle (mx, 0) a share
     * {@code length^2 / 12 / r^2} is lost at its ends. The loops have one index for all arrays, which makes them quick.
     */
    private void wholly(int from, int to, double mx, double py, double ux, double uy, double length, double r) {
        double perR2 = 0.75 * length / (r * r);
        double most = 0.75 * length - perR2 * (py * py + length * length / 12);
        for (int n = from; n < to; n++) {
            double t = most - perR2 * (places[n] - mx) * (places[n] - mx);
            rowX[n] += t * ux;
            rowY[n] += t * uy;
        }
    }

    /** The integral of w over a straight piece from its start (ax, 0), for places of a row that is {@code py} below it. */
    private void partly(int from, int to, double ax, double py, double ux, double uy, double length, double r) {
        double perR2 = 1 / (r * r);
        for (int n = from; n < to; n++) {
            double px = places[n] - ax;
            double along = px * ux + py * uy;
            double beside = px * uy - py * ux;
            double near = Math.max(0, 1 - beside * beside * perR2);
            double half = r * Math.sqrt(near);
            double a = Math.max(-half, -along);
            double b = Math.min(half, length - along);
            double t = 0.75 * Math.max(0, b - a) * (near - (b * b + b * a + a * a) * perR2 / 3);
            rowX[n] += t * ux;
            rowY[n] += t * uy;
        }
    }

    /** Sets x and y of out to T at a pixel, in heights. */
    void travel(int x, int y, double[] out) {
        double[] travel = travels[x / TILE + tilesAcross * (y / TILE)];
        int at = x % TILE + TILE * (y % TILE);
        out[0] = travel == null ? 0 : travel[at];
        out[1] = travel == null ? 0 : travel[at + TILE * TILE];
        double squared = out[0] * out[0] + out[1] * out[1];
        if (squared > sweep.radius() * sweep.radius()) {
            double shorter = sweep.radius() / Math.sqrt(squared);
            out[0] *= shorter;
            out[1] *= shorter;
        }
    }

    /** Overwrites the pixels of a part of a tile that move; {@code out} holds those of the picture before. */
    void move(Window part, float[] coverage, float[] out) {
        int height = before.height();
        double[] travel = new double[2];
        for (int n = 0; n < part.pixels(); n++) {
            if (coverage[n] > 0) {
                int x = part.left() + n % part.width();
                int y = part.top() + n / part.width();
                travel(x, y, travel);
                double dx = coverage[n] * travel[0];
                double dy = coverage[n] * travel[1];
                if (dx * dx + dy * dy > STILL * STILL) {
                    read(x - dx * height, y - dy * height, out, 4 * n);
                    Resampling.clamp(out, 4 * n);
                }
            }
        }
    }

    /**
     * Bicubic (Keys, a = -1/2) at the sample position, the border pixel standing beyond the border. Where no pixel it reads is brighter
     * than white, the overshoot is not either.
     */
    private void read(double px, double py, float[] out, int at) {
        int width = before.width();
        int height = before.height();
        double x = Math.min(width - 1, Math.max(0, px));
        double y = Math.min(height - 1, Math.max(0, py));
        int x0 = (int) x;
        int y0 = (int) y;
        keys((float) (x - x0), wx);
        keys((float) (y - y0), wy);
        int a = 4 * Math.max(0, x0 - 1);
        int b = 4 * x0;
        int c = 4 * Math.min(width - 1, x0 + 1);
        int d = 4 * Math.min(width - 1, x0 + 2);
        float wa = wx[0];
        float wb = wx[1];
        float wc = wx[2];
        float wd = wx[3];
        float red = 0;
        float green = 0;
        float blue = 0;
        float alpha = 0;
        float[] in = before.rgba();
        for (int n = 0; n < 4; n++) {
            int row = 4 * width * Math.min(height - 1, Math.max(0, y0 - 1 + n));
            float w = wy[n];
            red += w * (wa * in[row + a] + wb * in[row + b] + (wc * in[row + c] + wd * in[row + d]));
            green += w * (wa * in[row + a + 1] + wb * in[row + b + 1] + (wc * in[row + c + 1] + wd * in[row + d + 1]));
            blue += w * (wa * in[row + a + 2] + wb * in[row + b + 2] + (wc * in[row + c + 2] + wd * in[row + d + 2]));
            alpha += w * (wa * in[row + a + 3] + wb * in[row + b + 3] + (wc * in[row + c + 3] + wd * in[row + d + 3]));
        }
        boolean bright = red > alpha || green > alpha || blue > alpha;
        float most = bright && !glows(x0, y0) ? alpha : Float.POSITIVE_INFINITY;
        out[at] = Math.min(most, red);
        out[at + 1] = Math.min(most, green);
        out[at + 2] = Math.min(most, blue);
        out[at + 3] = alpha;
    }

    /** Whether one of the 4 x 4 pixels around is brighter than white smoke of its opacity. */
    private boolean glows(int x0, int y0) {
        float[] in = before.rgba();
        for (int y = Math.max(0, y0 - 1); y <= Math.min(before.height() - 1, y0 + 2); y++) {
            for (int x = Math.max(0, x0 - 1); x <= Math.min(before.width() - 1, x0 + 2); x++) {
                int from = 4 * (x + before.width() * y);
                if (in[from] > in[from + 3] || in[from + 1] > in[from + 3] || in[from + 2] > in[from + 3]) {
                    return true;
                }
            }
        }
        return false;
    }

    /** {@link org.wispwright.warp.resample.Kernel#KEYS} in float. */
    private static void keys(float t, float[] out) {
        out[0] = ((1 - 0.5f * t) * t - 0.5f) * t;
        out[1] = (1.5f * t - 2.5f) * t * t + 1;
        out[2] = ((2 - 1.5f * t) * t + 0.5f) * t;
        out[3] = (0.5f * t - 0.5f) * t * t;
    }
}

package org.wispwright.warp.retouch;

import java.util.List;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Pressure;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.matte.Window;
import org.wispwright.warp.resample.Kernel;
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
    /** Travel so far, not yet shortened: x and y in heights, two numbers a pixel of a tile; null where there is none. */
    private final double[][] travels;
    private final double[] wx = new double[4];
    private final double[] wy = new double[4];

    /** A line without a piece yet; {@code before} is the picture before the stroke, read only. */
    Push(Sweep sweep, Picture before) {
        this.sweep = sweep;
        this.before = before;
        tilesAcross = (before.width() + TILE - 1) / TILE;
        travels = new double[tilesAcross * ((before.height() + TILE - 1) / TILE)][];
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
        int right = window.left() + window.width() - 1;
        for (int j = window.top(); j < window.top() + window.height(); j++) {
            double py = (j + 0.5) / height - ay;
            for (int i = window.left(); i <= right;) {
                int tile = i / TILE + tilesAcross * (j / TILE);
                int end = Math.min(right, i / TILE * TILE + TILE - 1);
                for (int at = 2 * (i % TILE + TILE * (j % TILE)); i <= end; i++, at += 2) {
                    double px = (i + 0.5) / height - ax;
                    double beside = px * uy - py * ux;
                    if (beside * beside < r * r) {
                        double t = travel(px * ux + py * uy, beside, length, r);
                        if (t != 0) {
                            if (travels[tile] == null) {
                                travels[tile] = new double[2 * TILE * TILE];
                            }
                            travels[tile][at] += t * ux;
                            travels[tile][at + 1] += t * uy;
                        }
                    }
                }
            }
        }
    }

    /** Sets x and y of out to T at a pixel, in heights. */
    void travel(int x, int y, double[] out) {
        double[] travel = travels[x / TILE + tilesAcross * (y / TILE)];
        int at = 2 * (x % TILE + TILE * (y % TILE));
        out[0] = travel == null ? 0 : travel[at];
        out[1] = travel == null ? 0 : travel[at + 1];
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
        for (int n = 0; n < coverage.length; n++) {
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

    /** The integral of w over a straight piece, for a place {@code along} it from its start and {@code beside} it. */
    private static double travel(double along, double beside, double length, double r) {
        double near = 1 - beside * beside / (r * r);
        if (near <= 0) {
            return 0;
        }
        double half = r * Math.sqrt(near);
        double from = Math.max(-half, -along);
        double to = Math.min(half, length - along);
        return from < to ? 0.75 * (to - from) * (near - (to * to + to * from + from * from) / (3 * r * r)) : 0;
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
        Kernel.KEYS.weights(x - x0, wx);
        Kernel.KEYS.weights(y - y0, wy);
        double red = 0;
        double green = 0;
        double blue = 0;
        double alpha = 0;
        boolean glows = false;
        float[] in = before.rgba();
        for (int n = 0; n < 4; n++) {
            int row = width * Math.min(height - 1, Math.max(0, y0 - 1 + n));
            for (int m = 0; m < 4; m++) {
                int from = 4 * (row + Math.min(width - 1, Math.max(0, x0 - 1 + m)));
                double w = wy[n] * wx[m];
                red += w * in[from];
                green += w * in[from + 1];
                blue += w * in[from + 2];
                alpha += w * in[from + 3];
                glows |= in[from] > in[from + 3] || in[from + 1] > in[from + 3] || in[from + 2] > in[from + 3];
            }
        }
        double most = glows ? Double.POSITIVE_INFINITY : alpha;
        out[at] = (float) Math.min(most, red);
        out[at + 1] = (float) Math.min(most, green);
        out[at + 2] = (float) Math.min(most, blue);
        out[at + 3] = (float) alpha;
    }
}

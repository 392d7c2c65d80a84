package org.wispwright.warp.retouch;

import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Window;
import org.wispwright.warp.resample.Kernel;
import org.wispwright.warp.resample.Resampling;

/**
 * {@link Brush#PUSH}: the smoke under a stroke moved the way the stroke went.
 * <p>Backward map: pixel p shows what was at {@code q = p - m(p) T(p)}, m the coverage, so every pixel has one source and no holes appear.
 * T is the stroke's travel near p: with gamma the polyline by arc length, gamma' its direction, r the radius, all in heights,
 * {@code T(p) = integral of w(|p - gamma(s)|) gamma'(s) ds}, {@code w(d) = 3/4 (1 - d^2 / r^2)} within r, 0 beyond; where |T| is more than
 * r it is shortened to r. On a long straight line T is r, a distance d beside it {@code r (1 - d^2 / r^2)^(3/2)}, r/2 at its ends.
 * <p>The integral is exact a piece, so it does not matter how finely a line is sampled; going back along the line takes the travel back.
 * Along a straight stroke q grows with p for any strength and soft edge: nothing is mirrored or shown twice. Ours.
 */
final class Push {
    /** Displacements up to this, in heights, leave a pixel's bits: what is left of a line that went there and back. */
    static final double STILL = 1e-9;

    private final Stroke stroke;
    private final Picture picture;
    private final double[] wx = new double[4];
    private final double[] wy = new double[4];

    private Push(Stroke stroke, Picture picture) {
        this.stroke = stroke;
        this.picture = picture;
    }

    /** Changes the picture inside {@code window}, which holds all pixels with coverage. */
    static void apply(Stroke stroke, Picture picture, float[] coverage, Window window) {
        float[] moved = new Push(stroke, picture).moved(coverage, window);
        int row = 4 * window.width();
        for (int y = 0; y < window.height(); y++) {
            System.arraycopy(moved, y * row, picture.rgba(), 4 * (window.left() + picture.width() * (window.top() + y)), row);
        }
    }

    private float[] moved(float[] coverage, Window window) {
        int height = picture.height();
        double[] travel = travel(stroke, height, window);
        float[] out = new float[4 * window.width() * window.height()];
        for (int n = 0; n < window.width() * window.height(); n++) {
            int x = window.left() + n % window.width();
            int y = window.top() + n / window.width();
            int p = x + picture.width() * y;
            double dx = coverage[p] * travel[2 * n];
            double dy = coverage[p] * travel[2 * n + 1];
            if (Math.hypot(dx, dy) > STILL) {
                read(x - dx * height, y - dy * height, out, 4 * n);
                Resampling.clamp(out, 4 * n);
            } else {
                System.arraycopy(picture.rgba(), 4 * p, out, 4 * n, 4);
            }
        }
        return out;
    }

    /** T at the pixels of a window: x and y in heights, two numbers a pixel, row 0 = the window's top. */
    static double[] travel(Stroke stroke, int height, Window window) {
        double r = stroke.radius();
        double[] travel = new double[2 * window.width() * window.height()];
        for (int n = 1; n < stroke.line().size(); n++) {
            Point a = stroke.line().get(n - 1);
            Point b = stroke.line().get(n);
            double length = a.distanceTo(b);
            if (length > 0) {
                int left = within(Math.min(a.x(), b.x()) - r, height, window.left(), window.width());
                int right = within(Math.max(a.x(), b.x()) + r, height, window.left(), window.width());
                int top = within(Math.min(a.y(), b.y()) - r, height, window.top(), window.height());
                int bottom = within(Math.max(a.y(), b.y()) + r, height, window.top(), window.height());
                double ux = (b.x() - a.x()) / length;
                double uy = (b.y() - a.y()) / length;
                for (int j = top; j <= bottom; j++) {
                    for (int i = left; i <= right; i++) {
                        double px = (window.left() + i + 0.5) / height - a.x();
                        double py = (window.top() + j + 0.5) / height - a.y();
                        double t = travel(px * ux + py * uy, px * uy - py * ux, length, r);
                        travel[2 * (i + window.width() * j)] += t * ux;
                        travel[2 * (i + window.width() * j) + 1] += t * uy;
                    }
                }
            }
        }
        for (int n = 0; n < travel.length; n += 2) {
            double shorter = Math.min(1, r / Math.max(r, Math.hypot(travel[n], travel[n + 1])));
            travel[n] *= shorter;
            travel[n + 1] *= shorter;
        }
        return travel;
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

    /** Bicubic (Keys, a = -1/2) at the sample position, the border pixel standing beyond the border. */
    private void read(double px, double py, float[] out, int at) {
        int width = picture.width();
        int height = picture.height();
        double x = Math.min(width - 1, Math.max(0, px));
        double y = Math.min(height - 1, Math.max(0, py));
        int x0 = (int) x;
        int y0 = (int) y;
        Kernel.KEYS.weights(x - x0, wx);
        Kernel.KEYS.weights(y - y0, wy);
        for (int c = 0; c < 4; c++) {
            double sum = 0;
            for (int n = 0; n < 4; n++) {
                int row = width * Math.min(height - 1, Math.max(0, y0 - 1 + n));
                for (int m = 0; m < 4; m++) {
                    sum += wy[n] * wx[m] * picture.rgba()[4 * (row + Math.min(width - 1, Math.max(0, x0 - 1 + m))) + c];
                }
            }
            out[at + c] = (float) sum;
        }
    }

    private static int within(double position, int height, int first, int count) {
        return (int) Math.min(count - 1, Math.max(0, Math.floor(position * height) - first));
    }
}

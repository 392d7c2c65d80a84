package org.wispwright.warp.outline;

import java.util.ArrayDeque;
import java.util.Arrays;
import java.util.Deque;

/**
 * A closed line in the plane, its last point joined to its first; on pictures in heights from the top left corner, y downwards.
 *
 * @param x kept, not copied: 3 or more, finite
 * @param y kept, not copied: as many
 */
public record Loop(double[] x, double[] y) {
    /**
     * Checks the numbers.
     *
     * @throws IllegalArgumentException if there are fewer than 3 points, the counts differ, or a number is not finite
     */
    public Loop {
        if (x.length < 3 || y.length != x.length) {
            throw new IllegalArgumentException("loop: got " + x.length + " x and " + y.length + " y, needs 3 or more and as many");
        }
        for (int n = 0; n < x.length; n++) {
            if (!Double.isFinite(x[n]) || !Double.isFinite(y[n])) {
                throw new IllegalArgumentException("loop: point " + n + " is at (" + x[n] + ", " + y[n] + "), needs finite numbers");
            }
        }
    }

    /** How many points. */
    public int size() {
        return x.length;
    }

    /**
     * {@code sum (x_n y_(n+1) - x_(n+1) y_n) / 2}: on pictures, where y runs downwards, positive for a loop that runs clockwise as
     * seen on the screen.
     */
    public double signedArea() {
        double sum = 0;
        for (int n = 0, m = x.length - 1; n < x.length; m = n++) {
            // About the first point, which keeps digits for a small loop far from the corner.
            sum += (x[m] - x[0]) * (y[n] - y[0]) - (x[n] - x[0]) * (y[m] - y[0]);
        }
        return sum / 2;
    }

    /** The length of the line, the closing piece included. */
    public double length() {
        double sum = 0;
        for (int n = 0, m = x.length - 1; n < x.length; m = n++) {
            sum += Math.hypot(x[n] - x[m], y[n] - y[m]);
        }
        return sum;
    }

    /**
     * A place on the loop.
     *
     * @param piece  number of the point before it
     * @param share  how far along the piece to the next point, 0 to 1
     * @param x      where that is
     * @param y      where that is
     */
    public record Place(int piece, double share, double x, double y) { }

    /** The place of the loop nearest to (px,py); the first of those as near. */
    public Place nearest(double px, double py) {
        Place best = null;
        double least = Double.POSITIVE_INFINITY;
        for (int a = 0; a < x.length; a++) {
            int b = (a + 1) % x.length;
            double abx = x[b] - x[a];
            double aby = y[b] - y[a];
            double squared = abx * abx + aby * aby;
            double t = squared == 0 ? 0 : Math.min(1, Math.max(0, ((px - x[a]) * abx + (py - y[a]) * aby) / squared));
            double dx = px - x[a] - t * abx;
            double dy = py - y[a] - t * aby;
            if (dx * dx + dy * dy < least) {
                least = dx * dx + dy * dy;
                best = new Place(a, t, x[a] + t * abx, y[a] + t * aby);
            }
        }
        return best;
    }

    /**
     * Overwrites {@code out[0..1]} with the place some way along the loop from another.
     *
     * @param distance 0 or more; longer than the loop goes round again
     */
    public void along(Place from, double distance, double[] out) {
        double left = distance % length();
        int piece = from.piece();
        double startX = from.x();
        double startY = from.y();
        for (int n = 0; n <= x.length; n++) {
            int b = (piece + 1) % x.length;
            double piecewise = Math.hypot(x[b] - startX, y[b] - startY);
            if (left <= piecewise && piecewise > 0) {
                out[0] = startX + left / piecewise * (x[b] - startX);
                out[1] = startY + left / piecewise * (y[b] - startY);
                return;
            }
            left -= piecewise;
            piece = b;
            startX = x[b];
            startY = y[b];
        }
        out[0] = startX;
        out[1] = startY;
    }

    /**
     * The same loop through fewer of its points: every point left out lies within the tolerance of the piece that stands for it. A
     * line is cut at its farthest point from the chord as long as that is farther than the tolerance. The first cuts are at the
     * point farthest from the middle, at the point farthest from that one, and at the point farthest from the chord between these;
     * they stay, so at least 3 points do.
     * <p>Source: Douglas and Peucker (1973), Cartographica 10(2), 112-122. Difference from it: distance is to the chord as a piece
     * of line, not to its endless extension, so the tolerance holds for lines that turn back; closed lines as above.
     *
     * @param tolerance in the unit of the points, 0 or more, finite
     * @throws IllegalArgumentException if the tolerance is out of range
     */
    public Loop simplified(double tolerance) {
        if (!(tolerance >= 0 && tolerance < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("loop: got tolerance " + tolerance + ", needs a finite number, 0 or more");
        }
        int n = x.length;
        double middleX = 0;
        double middleY = 0;
        for (int k = 0; k < n; k++) {
            middleX += x[k] / n;
            middleY += y[k] / n;
        }
        int first = farthestFrom(middleX, middleY);
        int second = farthestFrom(x[first], y[first]);
        if (second == first) {
            return this;
        }
        boolean[] keep = new boolean[n];
        keep[first] = true;
        keep[second] = true;
        int third = thirdCorner(first, second);
        keep[third] = true;
        Deque<int[]> open = new ArrayDeque<>();
        int[] corners = {first, second, third};
        Arrays.sort(corners);
        open.push(new int[] {corners[0], corners[1]});
        open.push(new int[] {corners[1], corners[2]});
        open.push(new int[] {corners[2], corners[0] + n});
        while (!open.isEmpty()) {
            int[] piece = open.pop();
            int worst = farthestFromChord(piece[0], piece[1]);
            if (worst >= 0 && squaredDistance(worst % n, piece[0] % n, piece[1] % n) > tolerance * tolerance) {
                keep[worst % n] = true;
                open.push(new int[] {piece[0], worst});
                open.push(new int[] {worst, piece[1]});
            }
        }
        return kept(keep);
    }

    private Loop kept(boolean[] keep) {
        int count = 0;
        for (boolean k : keep) {
            count += k ? 1 : 0;
        }
        double[] keptX = new double[count];
        double[] keptY = new double[count];
        int at = 0;
        for (int k = 0; k < keep.length; k++) {
            if (keep[k]) {
                keptX[at] = x[k];
                keptY[at++] = y[k];
            }
        }
        return new Loop(keptX, keptY);
    }

    private int farthestFrom(double px, double py) {
        int farthest = 0;
        double most = -1;
        for (int k = 0; k < x.length; k++) {
            double squared = (x[k] - px) * (x[k] - px) + (y[k] - py) * (y[k] - py);
            if (squared > most) {
                most = squared;
                farthest = k;
            }
        }
        return farthest;
    }

    private int thirdCorner(int first, int second) {
        int farthest = -1;
        double most = -1;
        for (int k = 0; k < x.length; k++) {
            if (k != first && k != second) {
                double squared = squaredDistance(k, first, second);
                if (squared > most) {
                    most = squared;
                    farthest = k;
                }
            }
        }
        return farthest;
    }

    /** Between two points, numbered on beyond the end where the line closes; -1 if there is none between. */
    private int farthestFromChord(int from, int to) {
        int farthest = -1;
        double most = -1;
        for (int k = from + 1; k < to; k++) {
            double squared = squaredDistance(k % x.length, from % x.length, to % x.length);
            if (squared > most) {
                most = squared;
                farthest = k;
            }
        }
        return farthest;
    }

    private double squaredDistance(int p, int a, int b) {
        double abx = x[b] - x[a];
        double aby = y[b] - y[a];
        double squared = abx * abx + aby * aby;
        double t = squared == 0 ? 0 : ((x[p] - x[a]) * abx + (y[p] - y[a]) * aby) / squared;
        t = Math.min(1, Math.max(0, t));
        double dx = x[p] - x[a] - t * abx;
        double dy = y[p] - y[a] - t * aby;
        return dx * dx + dy * dy;
    }
}

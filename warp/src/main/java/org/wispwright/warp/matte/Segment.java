package org.wispwright.warp.matte;

import java.util.Arrays;
import java.util.List;

/** Distances to straight pieces of line, and to lines made of them. */
public final class Segment {
    private Segment() {
    }

    /** Squared distance from (x,y) to the piece from (ax,ay) to (bx,by), which may be a single point. */
    public static double squaredDistance(double x, double y, double ax, double ay, double bx, double by) {
        double abx = bx - ax;
        double aby = by - ay;
        double length = abx * abx + aby * aby;
        double t = length == 0 ? 0 : ((x - ax) * abx + (y - ay) * aby) / length;
        t = Math.min(1, Math.max(0, t));
        double dx = x - (ax + t * abx);
        double dy = y - (ay + t * aby);
        return dx * dx + dy * dy;
    }

    /** Squared distance of pixel centres to a polyline of one or more points, in squared heights; infinite where it is surely beyond reach. */
    static double[] squaredDistances(List<Point> line, Window window, int height, double reach) {
        double[] squared = new double[window.pixels()];
        Arrays.fill(squared, Double.POSITIVE_INFINITY);
        Point a = line.get(0);
        for (int n = line.size() == 1 ? 0 : 1; n < line.size(); n++) {
            Point b = line.get(n);
            int left = pixel(Math.min(a.x(), b.x()) - reach, height, window.left(), window.width());
            int right = pixel(Math.max(a.x(), b.x()) + reach, height, window.left(), window.width());
            int top = pixel(Math.min(a.y(), b.y()) - reach, height, window.top(), window.height());
            int bottom = pixel(Math.max(a.y(), b.y()) + reach, height, window.top(), window.height());
            for (int j = top; j <= bottom; j++) {
                for (int i = left; i <= right; i++) {
                    double d = squaredDistance((window.left() + i + 0.5) / height, (window.top() + j + 0.5) / height, a.x(), a.y(),
                            b.x(), b.y());
                    squared[i + window.width() * j] = Math.min(squared[i + window.width() * j], d);
                }
            }
            a = b;
        }
        return squared;
    }

    /** The pixel of a window nearest to a position along one axis, counted from the window's first. */
    static int pixel(double position, int height, int first, int count) {
        return (int) Math.min(count - 1, Math.max(0, Math.floor(position * height) - first));
    }
}

package org.wispwright.warp.matte;

/** Distances to straight pieces of line, and pixels of a window. */
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

    /** The pixel of a window nearest to a position along one axis, counted from the window's first. */
    static int pixel(double position, int height, int first, int count) {
        return (int) Math.min(count - 1, Math.max(0, Math.floor(position * height) - first));
    }
}

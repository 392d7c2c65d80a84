package org.wispwright.warp.matte;

/** Distances to a straight piece of line. */
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
}

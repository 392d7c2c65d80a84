package org.wispwright.warp.measure;

/** Distances of sets of points in the plane, in the unit of the points. */
public final class PointSets {
    private PointSets() {
    }

    /**
     * {@code max over p in from of min over q in to of |p - q|}; time grows with the product of both counts.
     *
     * @param from read: {@code [n][2]}, finite, one point or more
     * @param to   read: {@code [m][2]}, finite, one point or more
     * @throws IllegalArgumentException if a set is empty or a point is not two finite numbers
     */
    public static double directedHausdorff(double[][] from, double[][] to) {
        require("from", from);
        require("to", to);
        double farthest = 0;
        for (double[] p : from) {
            double nearest = Double.POSITIVE_INFINITY;
            for (double[] q : to) {
                double dx = p[0] - q[0];
                double dy = p[1] - q[1];
                nearest = Math.min(nearest, dx * dx + dy * dy);
            }
            farthest = Math.max(farthest, nearest);
        }
        return Math.sqrt(farthest);
    }

    /** The larger of both directed distances; errors as there. */
    public static double hausdorff(double[][] a, double[][] b) {
        return Math.max(directedHausdorff(a, b), directedHausdorff(b, a));
    }

    private static void require(String name, double[][] points) {
        if (points.length == 0) {
            throw new IllegalArgumentException("Hausdorff distance: '" + name + "' has no points, needs one or more");
        }
        for (int n = 0; n < points.length; n++) {
            if (points[n].length != 2 || !Double.isFinite(points[n][0]) || !Double.isFinite(points[n][1])) {
                throw new IllegalArgumentException("Hausdorff distance: point " + n + " of '" + name + "' is not two finite numbers");
            }
        }
    }
}

package org.wispwright.warp.mesh;

import java.util.Arrays;
import java.util.Comparator;

/**
 * Where the place under each pixel was before a mesh was bent: the bent triangles are painted over the pixels, and inside one the
 * displacement (rest less now) runs linearly between its corners. Every pixel that a triangle covers has exactly one source.
 * <p>Where triangles overlap: one that is the right way round hides one that is turned over; among those alike one with a handle at a
 * corner hides one without, so that handles and pins are seen to hold; then the one moved farther (its corners' mean, at rest to now)
 * hides the other, so the dragged part lies on top; then the later one. Ours.
 * <p>A side belongs to both its triangles, so no pixel between two falls through. Displacements are only ever mixed from those of a
 * triangle's own corners with shares of 0 to 1: however thin or folded a triangle, a source lies among its corners.
 */
public final class MeshPainting {
    private static final double SLACK = 1e-7;

    private final TriangleMesh rest;
    private final double[] x;
    private final double[] y;
    private final int[] order;
    /** By triangle: left, right, top and bottom of its corners now. */
    private final double[] bounds;
    private double leftDx;
    private double leftDy;
    private double rightDx;
    private double rightDy;
    private double low;
    private double high;

    /**
     * A bent mesh ready to paint.
     *
     * @param rest    kept, not copied
     * @param handles read: corners that are handles; may be none
     * @param x       kept, not copied: where its corners are now, finite
     * @param y       kept, not copied
     * @throws IllegalArgumentException if the counts differ
     */
    public MeshPainting(TriangleMesh rest, int[] handles, double[] x, double[] y) {
        if (x.length != rest.corners() || y.length != rest.corners()) {
            throw new IllegalArgumentException("mesh painting: got " + x.length + " x and " + y.length + " y, the mesh has "
                    + rest.corners() + " corners");
        }
        this.rest = rest;
        this.x = x;
        this.y = y;
        int[] corners = rest.triangles();
        int count = corners.length / 3;
        boolean[] turned = new boolean[count];
        boolean[] handled = new boolean[count];
        boolean[] handle = new boolean[rest.corners()];
        for (int h : handles) {
            handle[h] = true;
        }
        double[] far = new double[count];
        bounds = new double[4 * count];
        Integer[] sorted = new Integer[count];
        for (int t = 0; t < count; t++) {
            double mx = 0;
            double my = 0;
            for (int k = 3 * t; k < 3 * t + 3; k++) {
                handled[t] |= handle[corners[k]];
                mx += x[corners[k]] - rest.x()[corners[k]];
                my += y[corners[k]] - rest.y()[corners[k]];
            }
            far[t] = mx * mx + my * my;
            bound(t);
            turned[t] = !(relativeArea(t) > 0);
            sorted[t] = t;
        }
        Arrays.sort(sorted, Comparator.comparing((Integer t) -> !turned[t]).thenComparing(t -> handled[t]).thenComparingDouble(t -> far[t])
                .thenComparingInt(t -> t));
        order = Arrays.stream(sorted).mapToInt(Integer::intValue).toArray();
    }

    private void bound(int t) {
        int a = rest.triangles()[3 * t];
        int b = rest.triangles()[3 * t + 1];
        int c = rest.triangles()[3 * t + 2];
        bounds[4 * t] = Math.min(x[a], Math.min(x[b], x[c]));
        bounds[4 * t + 1] = Math.max(x[a], Math.max(x[b], x[c]));
        bounds[4 * t + 2] = Math.min(y[a], Math.min(y[b], y[c]));
        bounds[4 * t + 3] = Math.max(y[a], Math.max(y[b], y[c]));
    }

    /** Area of a triangle now as a share of its area at rest; 0 or less where it is turned over. */
    public double relativeArea(int triangle) {
        int[] corners = rest.triangles();
        return TriangleMesh.twiceArea(x, y, corners, 3 * triangle) / TriangleMesh.twiceArea(rest.x(), rest.y(), corners, 3 * triangle);
    }

    /**
     * Writes, in pixels, where each pixel of a window comes from less where it is; NaN where no triangle covers it. Pixel (i,j) lies at
     * {@code ((i + 0.5) / height, (j + 0.5) / height)} in the mesh's unit. A pixel has the same bits in every window.
     *
     * @param left   first column
     * @param top    first row
     * @param width  columns
     * @param rows   rows
     * @param height rows of the whole picture
     * @param dx     overwritten from 0: row by row
     * @param dy     overwritten from 0
     */
    public void displacements(int left, int top, int width, int rows, int height, double[] dx, double[] dy) {
        Arrays.fill(dx, 0, width * rows, Double.NaN);
        Arrays.fill(dy, 0, width * rows, Double.NaN);
        for (int t : order) {
            double minX = bounds[4 * t] * height - 0.5;
            double maxX = bounds[4 * t + 1] * height - 0.5;
            double minY = bounds[4 * t + 2] * height - 0.5;
            double maxY = bounds[4 * t + 3] * height - 0.5;
            if (maxY < top - 1 || minY > top + rows || maxX < left - 1 || minX > left + width) {
                continue;
            }
            int first = Math.max(top, (int) Math.ceil(minY - SLACK));
            int last = Math.min(top + rows - 1, (int) Math.floor(maxY + SLACK));
            for (int j = first; j <= last; j++) {
                span(3 * t, j, height);
                paint(left, width, (j - top) * width, dx, dy);
            }
        }
    }

    /** Where row j meets the triangle: its ends and the displacements there, mixed along the sides they lie on. */
    private void span(int t, int j, int height) {
        int[] corners = rest.triangles();
        low = Double.POSITIVE_INFINITY;
        high = Double.NEGATIVE_INFINITY;
        for (int k = 0; k < 3; k++) {
            int a = corners[t + k];
            int b = corners[t + (k + 1) % 3];
            if (y[a] > y[b] || y[a] == y[b] && a > b) {
                int swap = a;
                a = b;
                b = swap;
            }
            double ay = y[a] * height - 0.5;
            double by = y[b] * height - 0.5;
            if (j < ay - SLACK || j > by + SLACK) {
                continue;
            }
            double length = by - ay;
            if (length < SLACK) {
                end(a, b, 0, height);
                end(a, b, 1, height);
            } else {
                end(a, b, Math.min(1, Math.max(0, (j - ay) / length)), height);
            }
        }
    }

    private void end(int a, int b, double share, int height) {
        double px = (x[a] + share * (x[b] - x[a])) * height - 0.5;
        double ax = rest.x()[a] - x[a];
        double ay = rest.y()[a] - y[a];
        double px0 = (ax + share * (rest.x()[b] - x[b] - ax)) * height;
        double py0 = (ay + share * (rest.y()[b] - y[b] - ay)) * height;
        if (px < low) {
            low = px;
            leftDx = px0;
            leftDy = py0;
        }
        if (px > high) {
            high = px;
            rightDx = px0;
            rightDy = py0;
        }
    }

    private void paint(int left, int width, int row, double[] dx, double[] dy) {
        int first = Math.max(left, (int) Math.ceil(low - SLACK));
        int last = Math.min(left + width - 1, (int) Math.floor(high + SLACK));
        double length = high - low;
        double perPixel = length > SLACK ? 1 / length : 0;
        for (int i = first; i <= last; i++) {
            double share = Math.min(1, Math.max(0, (i - low) * perPixel));
            dx[row + i - left] = leftDx + share * (rightDx - leftDx);
            dy[row + i - left] = leftDy + share * (rightDy - leftDy);
        }
    }
}

package org.wispwright.warp.mesh;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Triangles of a grid with a corner at every handle, wherever that lies: handles then hold exactly. The nearest corner that is not on
 * the rim moves to the handle if the handle is within {@value #NEAR} of a cell of it along both axes; else the handle splits the
 * triangle it lies in into three, or, close to a side, that side and both its triangles into two. The corners of the grid keep their
 * numbers, new ones follow. No triangle is turned over by this. Ours.
 *
 * @param mesh    at rest; corner (i,j) of the grid is entry {@code i + (cellsX + 1) * j}
 * @param handles the corner of each handle, in the order given
 */
public record HandledMesh(TriangleMesh mesh, int[] handles) {
    /** How near a corner takes a handle, as a share of a cell's side. */
    public static final double NEAR = 0.25;
    /** Closer to a side than this share of the height above it, a handle splits the side. */
    private static final double SLIVER = 0.08;

    /**
     * Makes the mesh.
     *
     * @param rest equal upright cells ({@link QuadGrid#over})
     * @param x    read: one a handle, inside the grid or on its rim
     * @param y    read: as many
     * @throws IllegalArgumentException if a handle lies outside, or two are at one place
     */
    public static HandledMesh of(QuadGrid rest, double[] x, double[] y) {
        return new Making(rest).with(x, y);
    }

    /** The work of {@link #of}. */
    private static final class Making {
        private final QuadGrid rest;
        private final double cellX;
        private final double cellY;
        private final List<int[]> triangles = new ArrayList<>();
        private double[] cornerX;
        private double[] cornerY;
        private boolean[] taken;
        private int corners;

        Making(QuadGrid rest) {
            this.rest = rest;
            cellX = rest.x()[1] - rest.x()[0];
            cellY = rest.y()[rest.cellsX() + 1] - rest.y()[0];
            int[] all = rest.triangles().triangles();
            for (int t = 0; t < all.length; t += 3) {
                triangles.add(Arrays.copyOfRange(all, t, t + 3));
            }
            corners = rest.x().length;
        }

        HandledMesh with(double[] x, double[] y) {
            cornerX = Arrays.copyOf(rest.x(), corners + x.length);
            cornerY = Arrays.copyOf(rest.y(), corners + x.length);
            taken = new boolean[cornerX.length];
            int[] handles = new int[x.length];
            for (int h = 0; h < x.length; h++) {
                handles[h] = cornerAt(x[h], y[h]);
                taken[handles[h]] = true;
            }
            int[] flat = triangles.stream().flatMapToInt(Arrays::stream).toArray();
            return new HandledMesh(new TriangleMesh(Arrays.copyOf(cornerX, corners), Arrays.copyOf(cornerY, corners), flat), handles);
        }

        private int cornerAt(double px, double py) {
            int nearest = 0;
            for (int c = 1; c < corners; c++) {
                if (Math.hypot(px - cornerX[c], py - cornerY[c]) < Math.hypot(px - cornerX[nearest], py - cornerY[nearest])) {
                    nearest = c;
                }
            }
            if (Math.hypot(px - cornerX[nearest], py - cornerY[nearest]) < 1e-9 * Math.min(cellX, cellY)) {
                if (taken[nearest]) {
                    throw new IllegalArgumentException("mesh: two handles are at (" + px + ", " + py + "); remove one of them");
                }
                return nearest;
            }
            if (!taken[nearest] && inner(nearest) && Math.abs(px - cornerX[nearest]) < NEAR * cellX
                    && Math.abs(py - cornerY[nearest]) < NEAR * cellY && moved(nearest, px, py)) {
                return nearest;
            }
            return split(px, py);
        }

        private boolean inner(int corner) {
            int i = corner % (rest.cellsX() + 1);
            int j = corner / (rest.cellsX() + 1);
            return corner < rest.x().length && i > 0 && j > 0 && i < rest.cellsX() && j < rest.cellsY();
        }

        /** Moves a corner unless that would all but flatten a triangle. */
        private boolean moved(int corner, double px, double py) {
            double wasX = cornerX[corner];
            double wasY = cornerY[corner];
            cornerX[corner] = px;
            cornerY[corner] = py;
            for (int[] t : triangles) {
                if ((t[0] == corner || t[1] == corner || t[2] == corner) && !(area(t[0], t[1], t[2]) > 0.1 * cellX * cellY)) {
                    cornerX[corner] = wasX;
                    cornerY[corner] = wasY;
                    return false;
                }
            }
            return true;
        }

        private int split(double px, double py) {
            int h = corners++;
            cornerX[h] = px;
            cornerY[h] = py;
            int[] holder = null;
            double best = Double.NEGATIVE_INFINITY;
            for (int[] t : triangles) {
                double inside = Math.min(area(t[0], t[1], h), Math.min(area(t[1], t[2], h), area(t[2], t[0], h))) / area(t[0], t[1], t[2]);
                if (inside > best) {
                    best = inside;
                    holder = t;
                }
            }
            if (best < -1e-9) {
                throw new IllegalArgumentException("mesh: the handle at (" + px + ", " + py + ") lies outside the grid");
            }
            triangles.remove(holder);
            for (int k = 0; k < 3; k++) {
                int a = holder[k];
                int b = holder[(k + 1) % 3];
                int c = holder[(k + 2) % 3];
                double share = area(a, b, h) / area(a, b, c);
                if (share < SLIVER && share == best) {
                    int[] other = withSide(b, a);
                    if (other != null && splitBoth(other, a, b, c, h) || other == null && share < 1e-9) {
                        triangles.add(new int[] {b, c, h});
                        triangles.add(new int[] {c, a, h});
                        return h;
                    }
                }
            }
            for (int k = 0; k < 3; k++) {
                triangles.add(new int[] {holder[k], holder[(k + 1) % 3], h});
            }
            return h;
        }

        /** Cuts the triangle beyond side ab in two at h, if both parts keep their way round. */
        private boolean splitBoth(int[] other, int a, int b, int c, int h) {
            int d = other[0] + other[1] + other[2] - a - b;
            if (!(area(a, d, h) > 0 && area(d, b, h) > 0 && area(b, c, h) > 0 && area(c, a, h) > 0)) {
                return false;
            }
            triangles.remove(other);
            triangles.add(new int[] {a, d, h});
            triangles.add(new int[] {d, b, h});
            return true;
        }

        private int[] withSide(int a, int b) {
            for (int[] t : triangles) {
                for (int k = 0; k < 3; k++) {
                    if (t[k] == a && t[(k + 1) % 3] == b) {
                        return t;
                    }
                }
            }
            return null;
        }

        private double area(int a, int b, int c) {
            return (cornerX[b] - cornerX[a]) * (cornerY[c] - cornerY[a]) - (cornerX[c] - cornerX[a]) * (cornerY[b] - cornerY[a]);
        }
    }
}

package org.wispwright.warp.mesh;

/**
 * Corners in the plane and triangles between them, any unit. Triangle t joins corners {@code triangles[3 t .. 3 t + 2]}.
 *
 * @param x         kept, not copied: one a corner, finite
 * @param y         kept, not copied: as many
 * @param triangles kept, not copied: three corners each, none flat
 */
public record TriangleMesh(double[] x, double[] y, int[] triangles) {
    /**
     * Checks the numbers and every triangle.
     *
     * @throws IllegalArgumentException if counts do not fit, a number is not finite, a corner does not exist, or a triangle is flat
     */
    public TriangleMesh {
        if (x.length != y.length || triangles.length == 0 || triangles.length % 3 != 0) {
            throw new IllegalArgumentException("triangle mesh: got " + x.length + " x, " + y.length + " y and " + triangles.length
                    + " corners of triangles, needs as many x as y and three a triangle");
        }
        for (int n = 0; n < x.length; n++) {
            if (!Double.isFinite(x[n]) || !Double.isFinite(y[n])) {
                throw new IllegalArgumentException("triangle mesh: corner " + n + " is at (" + x[n] + ", " + y[n]
                        + "), needs finite numbers");
            }
        }
        for (int t = 0; t < triangles.length; t += 3) {
            for (int k = 0; k < 3; k++) {
                if (triangles[t + k] < 0 || triangles[t + k] >= x.length) {
                    throw new IllegalArgumentException("triangle mesh: triangle " + t / 3 + " names corner " + triangles[t + k]
                            + ", there are " + x.length);
                }
            }
            if (twiceArea(x, y, triangles, t) == 0) {
                throw new IllegalArgumentException("triangle mesh: triangle " + t / 3 + " is flat; leave it out");
            }
        }
    }

    /** How many corners there are. */
    public int corners() {
        return x.length;
    }

    /** Signed area of triangle {@code t / 3} twice over. */
    static double twiceArea(double[] x, double[] y, int[] triangles, int t) {
        int a = triangles[t];
        int b = triangles[t + 1];
        int c = triangles[t + 2];
        return (x[b] - x[a]) * (y[c] - y[a]) - (x[c] - x[a]) * (y[b] - y[a]);
    }
}

package org.wispwright.optimize.flow;

import org.wispwright.optimize.solid.SolidCells;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * {@link Projection} with solids in the box: no fluid passes a face of a solid cell but with the solid's own velocity.
 *
 * <p>Forward: {@code u' = M (u - G p) + (I - M) s}, M = 1 on the faces between two fluid cells and on open sides of fluid cells, else 0;
 * s the solids' velocity, 0 on walls; p lives in fluid cells and {@code D M G p = D (M u + (I - M) s)} there. With G = -D' the matrix
 * D M G is symmetric, and the part that acts on u, {@code P = M - M G (D M G)^-1 D M}, is an orthogonal projection.
 *
 * <p>Pullback: {@code uBar := P uBar}, the same solve with s = 0; solids are given, so nothing flows to their velocity.
 *
 * <p>Conjugate gradients (Hestenes and Stiefel 1952), preconditioned by the direct solve of the box without solids: residuals are 0 in
 * solids on the way in, pressures there are dropped on the way out. The eigenvalues are at most 1, and the least is how much more it costs
 * to go on smoothly into the solids: a number of their form, not of the cells (Proskurowski and Widlund 1976, Math. Comp. 30, 433-468).
 * They end when the divergence is {@value #TOLERANCE} of the start's in the mean square, or at the rounding of u. In a pocket what its
 * solids squeeze out cannot go anywhere: the mean of its divergence is taken off and stays (the pocket is compressed).
 */
final class SolidProjection {
    /** Root mean square divergence that is left, as a share of the start's. */
    static final double TOLERANCE = 5e-7;
    /** A divergence of this share of the velocity (both root sums of squares) is rounding. */
    private static final double ROUNDING = 6e-8;
    /** Most iterations of one run; thin shells take the most. */
    static final int MOST_ITERATIONS = 200;
    /** Runs of the search, each from the divergence that is really left. */
    private static final int RUNS = 4;

    private final GridShape shape;
    private final Sides sides;
    private final Lanes lanes;
    private final BoxPressure box;
    private final float[] residual;
    private final float[] way;
    private final float[] pressure;
    private final float[] smooth;
    private final float[] image;
    private final double[] partial;
    private int iterations;

    /** Takes 28 bytes a cell. */
    SolidProjection(GridShape shape, Sides sides, Lanes lanes) {
        this.shape = shape;
        this.sides = sides;
        this.lanes = lanes;
        box = new BoxPressure(shape, sides, lanes);
        residual = new float[shape.cells()];
        way = new float[shape.cells()];
        pressure = new float[shape.cells()];
        smooth = new float[shape.cells()];
        image = new float[shape.cells()];
        partial = new double[shape.nz()];
    }

    /** Projects in place, with the solids' own velocity on their faces. */
    void forward(MacVelocity u, SolidCells solids, PressureLinks links) {
        apply(u, solids, links, true);
    }

    /** Pulls a derivative back, in place. */
    void pullback(MacVelocity uBar, SolidCells solids, PressureLinks links) {
        apply(uBar, solids, links, false);
    }

    /** Iterations of the last call. */
    int lastIterations() {
        return iterations;
    }

    private void apply(MacVelocity u, SolidCells solids, PressureLinks links, boolean moving) {
        lanes.forEach(shape.nz(), k -> {
            solids.writeFaces(u, moving, k);
            Projection.closeWalls(shape, sides, u, k);
        });
        iterations = 0;
        double enough = 0;
        for (int run = 0; run < RUNS; run++) {
            lanes.forEach(shape.nz(), k -> {
                DivergenceKernel.slab(shape, u.x(), u.y(), u.z(), residual, k);
                solids.clear(residual, k);
            });
            links.removeMeans(residual, lanes);
            double left = Math.sqrt(dot(residual, residual));
            if (run == 0) {
                enough = Math.max(TOLERANCE * left, ROUNDING * norm(u));
            }
            if (!(left > enough)) {
                return;
            }
            search(links, enough / 2);
            lanes.forEach(shape.nz(), k -> subtractGradient(u, links, k));
        }
    }

    /** Overwrites the pressure with one whose divergence is the residual's; works until what is left of it has that norm. */
    private void search(PressureLinks links, double enough) {
        int plane = shape.nx() * shape.ny();
        java.util.Arrays.fill(pressure, 0f);
        double before = 0;
        for (int n = 0; n < MOST_ITERATIONS; n++) {
            smoothen(links);
            double product = dot(residual, smooth);
            float share = n == 0 ? 0 : (float) (product / before);
            before = product;
            lanes.forEach(shape.nz(), k -> {
                for (int c = k * plane; c < (k + 1) * plane; c++) {
                    way[c] = smooth[c] + share * way[c];
                }
            });
            lanes.forEach(shape.nz(), k -> partial[k] = image(links, k));
            double bend = sum();
            if (bend == 0) {
                return;
            }
            float step = (float) (product / bend);
            lanes.forEach(shape.nz(), k -> {
                double squares = 0;
                for (int c = k * plane; c < (k + 1) * plane; c++) {
                    pressure[c] += step * way[c];
                    float r = residual[c] - step * image[c];
                    residual[c] = r;
                    squares += (double) r * r;
                }
                partial[k] = squares;
            });
            iterations++;
            if (!(Math.sqrt(sum()) > enough)) {
                return;
            }
        }
    }

    /** Overwrites smooth with the box's answer to the residual. Its values in solids have no links, so nothing reads them. */
    private void smoothen(PressureLinks links) {
        int plane = shape.nx() * shape.ny();
        box.solve(smooth, k -> System.arraycopy(residual, k * plane, smooth, k * plane, plane), k -> { });
        links.removeMeans(smooth, lanes);
    }

    /** Overwrites slab k of the image with D M G of the way. @return their product over the slab */
    private double image(PressureLinks links, int k) {
        int nx = shape.nx();
        int plane = nx * shape.ny();
        float[] p = way;
        double product = 0;
        for (int c = k * plane; c < (k + 1) * plane; c++) {
            int bits = links.links[c];
            float around;
            if (bits == PressureLinks.ALL) {
                around = p[c - 1] + p[c + 1] + p[c - nx] + p[c + nx] + p[c - plane] + p[c + plane];
            } else {
                around = 0;
                around += (bits & 1) != 0 ? p[c - 1] : 0;
                around += (bits & 2) != 0 ? p[c + 1] : 0;
                around += (bits & 4) != 0 ? p[c - nx] : 0;
                around += (bits & 8) != 0 ? p[c + nx] : 0;
                around += (bits & 16) != 0 ? p[c - plane] : 0;
                around += (bits & 32) != 0 ? p[c + plane] : 0;
            }
            float d = around - links.faces[c] * p[c];
            image[c] = d;
            product += (double) d * p[c];
        }
        return product;
    }

    private void subtractGradient(MacVelocity u, PressureLinks links, int k) {
        int nx = shape.nx();
        int ny = shape.ny();
        int plane = nx * ny;
        boolean flat = shape.isPlane();
        float[] p = pressure;
        for (int j = 0; j < ny; j++) {
            for (int i = 0; i < nx; i++) {
                int c = shape.cell(i, j, k);
                if (links.faces[c] == 0) {
                    continue;
                }
                int bits = links.links[c];
                if ((bits & 1) != 0) {
                    u.x()[shape.xFace(i, j, k)] -= p[c] - p[c - 1];
                } else if (i == 0 && sides.left() == Side.OPEN) {
                    u.x()[shape.xFace(0, j, k)] -= p[c];
                }
                if ((bits & 4) != 0) {
                    u.y()[shape.yFace(i, j, k)] -= p[c] - p[c - nx];
                } else if (j == 0 && sides.floor() == Side.OPEN) {
                    u.y()[shape.yFace(i, 0, k)] -= p[c];
                }
                if ((bits & 16) != 0) {
                    u.z()[c] -= p[c] - p[c - plane];
                } else if (k == 0 && sides.back() == Side.OPEN && !flat) {
                    u.z()[c] -= p[c];
                }
                if (i == nx - 1 && sides.right() == Side.OPEN) {
                    u.x()[shape.xFace(nx, j, k)] += p[c];
                }
                if (j == ny - 1 && sides.top() == Side.OPEN) {
                    u.y()[shape.yFace(i, ny, k)] += p[c];
                }
                if (k == shape.nz() - 1 && sides.front() == Side.OPEN && !flat) {
                    u.z()[c + plane] += p[c];
                }
            }
        }
    }

    private double dot(float[] a, float[] b) {
        int plane = shape.nx() * shape.ny();
        lanes.forEach(shape.nz(), k -> {
            double sum = 0;
            for (int c = k * plane; c < (k + 1) * plane; c++) {
                sum += (double) a[c] * b[c];
            }
            partial[k] = sum;
        });
        return sum();
    }

    private double sum() {
        double sum = 0;
        for (double part : partial) {
            sum += part;
        }
        return sum;
    }

    private static double norm(MacVelocity u) {
        double sum = 0;
        for (float[] part : new float[][] {u.x(), u.y(), u.z()}) {
            for (float v : part) {
                sum += (double) v * v;
            }
        }
        return Math.sqrt(sum);
    }
}

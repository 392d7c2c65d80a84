package org.wispwright.optimize.flow;

import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * Makes a face velocity free of divergence (Chorin 1968): {@code u' = u - G p} with {@code D G p = D u}. Linear.
 *
 * <p>Forward, cells as the unit of length (h cancels): {@code d = D u}, the sum of differences of opposite faces;
 * {@code (G p)} on a face is the pressure beyond minus the pressure before it, 0 on a wall, with p = 0 at the centre of
 * the ghost cell of an open side. Then G is exactly minus the transpose of D, so {@code P = I - G (D G)^-1 D} is an orthogonal
 * projection, for walls and open sides alike.
 *
 * <p>Pullback: P is symmetric, so {@code uBar := P uBar}. The same method serves both; {@code FlowPullbackTest} proves it.
 *
 * <p>{@link BoxPressure} solves for p. In a closed box that asks for a divergence that sums to 0, which walls see to.
 *
 * <p>Wall faces are set to 0 on the way in. With solids in the box: {@link SolidProjection}.
 */
public final class Projection {
    private final GridShape shape;
    private final Sides sides;
    private final BoxPressure box;
    private final float[] a;

    /** Prepares the solve for one box: 12 bytes a cell are kept. */
    public Projection(GridShape shape, Sides sides, Lanes lanes) {
        this.shape = shape;
        this.sides = sides;
        box = new BoxPressure(shape, sides, lanes);
        a = new float[shape.cells()];
    }

    /**
     * Projects in place; also the pullback.
     *
     * @param u overwritten: face velocity of the same box, any unit
     * @throws IllegalArgumentException if u is of another box
     */
    public void apply(MacVelocity u) {
        if (!u.shape().equals(shape)) {
            throw new IllegalArgumentException("projection: the velocity is " + u.shape().inWords() + ", the solver " + shape.inWords());
        }
        box.solve(a, k -> {
            closeWalls(shape, sides, u, k);
            DivergenceKernel.slab(shape, u.x(), u.y(), u.z(), a, k);
        }, k -> subtractGradient(u, k));
    }

    /** Sets wall faces of slab k to 0. The faces between slabs k-1 and k belong to slab k; the last front face to the last slab. */
    static void closeWalls(GridShape shape, Sides sides, MacVelocity u, int k) {
        int nx = shape.nx();
        int ny = shape.ny();
        for (int j = 0; j < ny; j++) {
            if (sides.left() == Side.WALL) {
                u.x()[shape.xFace(0, j, k)] = 0;
            }
            if (sides.right() == Side.WALL) {
                u.x()[shape.xFace(nx, j, k)] = 0;
            }
        }
        if (sides.floor() == Side.WALL) {
            int start = shape.yFace(0, 0, k);
            java.util.Arrays.fill(u.y(), start, start + nx, 0f);
        }
        if (sides.top() == Side.WALL) {
            int start = shape.yFace(0, ny, k);
            java.util.Arrays.fill(u.y(), start, start + nx, 0f);
        }
        if (k == 0 && (sides.back() == Side.WALL || shape.isPlane())) {
            java.util.Arrays.fill(u.z(), 0, nx * ny, 0f);
        }
        if (k == shape.nz() - 1 && (sides.front() == Side.WALL || shape.isPlane())) {
            int start = shape.zFace(0, 0, shape.nz());
            java.util.Arrays.fill(u.z(), start, start + nx * ny, 0f);
        }
    }

    private void subtractGradient(MacVelocity u, int k) {
        int nx = shape.nx();
        int ny = shape.ny();
        int nz = shape.nz();
        float[] ux = u.x();
        float[] uy = u.y();
        float[] uz = u.z();
        for (int j = 0; j < ny; j++) {
            int c = shape.cell(0, j, k);
            int f = shape.xFace(0, j, k);
            for (int i = 1; i < nx; i++) {
                ux[f + i] -= a[c + i] - a[c + i - 1];
            }
            if (sides.left() == Side.OPEN) {
                ux[f] -= a[c];
            }
            if (sides.right() == Side.OPEN) {
                ux[f + nx] += a[c + nx - 1];
            }
            int g = shape.yFace(0, j, k);
            if (j > 0) {
                for (int i = 0; i < nx; i++) {
                    uy[g + i] -= a[c + i] - a[c + i - nx];
                }
            } else if (sides.floor() == Side.OPEN) {
                for (int i = 0; i < nx; i++) {
                    uy[g + i] -= a[c + i];
                }
            }
            if (j == ny - 1 && sides.top() == Side.OPEN) {
                for (int i = 0; i < nx; i++) {
                    uy[g + nx + i] += a[c + i];
                }
            }
        }
        if (shape.isPlane()) {
            return;
        }
        int plane = nx * ny;
        int c = shape.cell(0, 0, k);
        if (k > 0) {
            for (int i = 0; i < plane; i++) {
                uz[c + i] -= a[c + i] - a[c + i - plane];
            }
        } else if (sides.back() == Side.OPEN) {
            for (int i = 0; i < plane; i++) {
                uz[c + i] -= a[c + i];
            }
        }
        if (k == nz - 1 && sides.front() == Side.OPEN) {
            for (int i = 0; i < plane; i++) {
                uz[c + plane + i] += a[c + i];
            }
        }
    }

    /** An array of the box's cells that nobody needs between two calls of {@link #apply}; writing to it spoils {@link #lastPressure}. */
    float[] workspace() {
        return a;
    }

    /** The pressure of the last {@link #apply}, in the velocity's unit times cells, index as cells; for measures and tests. */
    float[] lastPressure() {
        return a;
    }
}

package org.wispwright.warp.mesh;

import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.data.DMatrixSparseCSC;
import org.ejml.data.DMatrixSparseTriplet;
import org.ejml.interfaces.linsol.LinearSolverSparse;
import org.ejml.ops.DConvertMatrixStruct;
import org.ejml.sparse.FillReducing;
import org.ejml.sparse.csc.factory.LinearSolverFactory_DSCC;

/**
 * A mesh that follows dragged handles while each corner's ring turns as a whole and hardly stretches. It lowers
 * {@code E = sum_i sum_{j in ring(i)} |(p'_i - p'_j) - R_i (p_i - p_j)|^2}, p at rest, p' now, R_i a rotation, by turns:
 * <ul>
 * <li>the R_i for given p', each the {@link ClosestRotation} to {@code sum_j (p'_i - p'_j)(p_i - p_j)'};</li>
 * <li>the free p' for given R_i: {@code sum_{j in ring(i)} (p'_i - p'_j) = sum_j (R_i + R_j)(p_i - p_j) / 2}, with handles in place.</li>
 * </ul>
 * Neither can raise E. The matrix of the second depends on the mesh and on which corners are handles, not on where these are, so it
 * is factorised once (sparse Cholesky) and a drag costs two back-substitutions an iteration.
 * <p>Source: Sorkine and Alexa (2007), Symposium on Geometry Processing, 109-116, in the plane. Differences from it: all weights 1
 * (they use cotangents, which for a regular grid differ little and may be negative for a thin triangle).
 * <p>Keeps its scratch space; one caller at a time. After {@link #begin} the result depends on the handles alone, not on how they
 * got there; after {@link #drag} it starts from where the mesh is.
 */
public final class AsRigidAsPossible {
    private final TriangleMesh mesh;
    private final int[] handles;
    private final int[][] rings;
    private final int[] unknownOf;
    private final int[] free;
    private final LinearSolverSparse<DMatrixSparseCSC, DMatrixRMaj> solver;
    private final DMatrixRMaj right;
    private final DMatrixRMaj solution;
    private final double[] x;
    private final double[] y;
    private final double[] cos;
    private final double[] sin;

    /**
     * Factorises the system of a mesh and its handles.
     *
     * @param mesh    at rest; kept, not copied: do not change it afterwards
     * @param handles read: corners that will be told where to be; no corner twice, at least one in each connected part
     * @throws IllegalArgumentException if a handle does not exist or comes twice, or a part of the mesh has none
     */
    public AsRigidAsPossible(TriangleMesh mesh, int[] handles) {
        this.mesh = mesh;
        this.handles = handles.clone();
        rings = Rings.of(mesh);
        unknownOf = new int[mesh.corners()];
        for (int handle : handles) {
            if (handle < 0 || handle >= mesh.corners() || unknownOf[handle] == -1) {
                throw new IllegalArgumentException("as rigid as possible: handle at corner " + handle
                        + " does not exist or comes twice; the mesh has corners 0 to " + (mesh.corners() - 1));
            }
            unknownOf[handle] = -1;
        }
        Rings.requireReached(rings, handles);
        free = new int[mesh.corners() - handles.length];
        int count = 0;
        for (int i = 0; i < unknownOf.length; i++) {
            if (unknownOf[i] == 0) {
                unknownOf[i] = count;
                free[count++] = i;
            }
        }
        right = new DMatrixRMaj(Math.max(1, count), 2);
        solution = new DMatrixRMaj(Math.max(1, count), 2);
        solver = count == 0 ? null : factorised();
        x = mesh.x().clone();
        y = mesh.y().clone();
        cos = new double[x.length];
        sin = new double[x.length];
        fitRotations();
    }

    /**
     * Puts the handles in place and everything else where the best turn and shift of the handles takes it.
     *
     * @param toX read: one a handle, in the order given to the constructor, finite
     * @param toY read: as many
     * @throws IllegalArgumentException if a count differs or a number is not finite
     */
    public void begin(double[] toX, double[] toY) {
        requireTargets(toX, toY);
        double px = 0;
        double py = 0;
        double qx = 0;
        double qy = 0;
        int n = handles.length;
        for (int h = 0; h < n; h++) {
            px += mesh.x()[handles[h]] / n;
            py += mesh.y()[handles[h]] / n;
            qx += toX[h] / n;
            qy += toY[h] / n;
        }
        double a = 0;
        double b = 0;
        double c = 0;
        double d = 0;
        for (int h = 0; h < n; h++) {
            double ax = mesh.x()[handles[h]] - px;
            double ay = mesh.y()[handles[h]] - py;
            a += (toX[h] - qx) * ax;
            b += (toX[h] - qx) * ay;
            c += (toY[h] - qy) * ax;
            d += (toY[h] - qy) * ay;
        }
        ClosestRotation turn = ClosestRotation.to(a, b, c, d);
        for (int i = 0; i < x.length; i++) {
            double ax = mesh.x()[i] - px;
            double ay = mesh.y()[i] - py;
            x[i] = qx + turn.cos() * ax - turn.sin() * ay;
            y[i] = qy + turn.sin() * ax + turn.cos() * ay;
        }
        place(toX, toY);
        fitRotations();
    }

    /**
     * Moves the handles, the rest following from where it is, and runs some iterations.
     *
     * @param toX        read: as for {@link #begin}
     * @param toY        read: as many
     * @param iterations 0 or more; a handful is enough between two movements of the hand
     * @throws IllegalArgumentException if a count differs, a number is not finite, or iterations is negative
     */
    public void drag(double[] toX, double[] toY, int iterations) {
        requireTargets(toX, toY);
        if (iterations < 0) {
            throw new IllegalArgumentException("as rigid as possible: got " + iterations + " iterations, needs 0 or more");
        }
        place(toX, toY);
        fitRotations();
        for (int n = 0; n < iterations; n++) {
            step();
        }
    }

    /** One iteration: the free corners for the rotations there are, then the rotations for these; E never grows. */
    public void step() {
        if (free.length == 0) {
            return;
        }
        for (int u = 0; u < free.length; u++) {
            int i = free[u];
            double bx = 0;
            double by = 0;
            for (int j : rings[i]) {
                double ex = mesh.x()[i] - mesh.x()[j];
                double ey = mesh.y()[i] - mesh.y()[j];
                double c = 0.5 * (cos[i] + cos[j]);
                double s = 0.5 * (sin[i] + sin[j]);
                bx += c * ex - s * ey;
                by += s * ex + c * ey;
                if (unknownOf[j] < 0) {
                    bx += x[j];
                    by += y[j];
                }
            }
            right.data[2 * u] = bx;
            right.data[2 * u + 1] = by;
        }
        solver.solve(right, solution);
        for (int u = 0; u < free.length; u++) {
            x[free[u]] = solution.data[2 * u];
            y[free[u]] = solution.data[2 * u + 1];
        }
        fitRotations();
    }

    /** E now, in the mesh's unit squared. */
    public double energy() {
        return energy(mesh, rings, x, y);
    }

    /** Where the corners are along x; a copy. */
    public double[] x() {
        return x.clone();
    }

    /** Where the corners are along y; a copy. */
    public double[] y() {
        return y.clone();
    }

    /**
     * E of a mesh with its corners at (x,y), each R_i the best one.
     *
     * @throws IllegalArgumentException if a count is not that of the mesh's corners
     */
    public static double energy(TriangleMesh rest, double[] x, double[] y) {
        if (x.length != rest.corners() || y.length != rest.corners()) {
            throw new IllegalArgumentException("as rigid as possible: got " + x.length + " x and " + y.length + " y, the mesh has "
                    + rest.corners() + " corners");
        }
        return energy(rest, Rings.of(rest), x, y);
    }

    private static double energy(TriangleMesh rest, int[][] rings, double[] x, double[] y) {
        double sum = 0;
        double[] turn = new double[2];
        for (int i = 0; i < x.length; i++) {
            fitRotation(rest, rings[i], i, x, y, turn);
            for (int j : rings[i]) {
                double ex = rest.x()[i] - rest.x()[j];
                double ey = rest.y()[i] - rest.y()[j];
                double dx = x[i] - x[j] - (turn[0] * ex - turn[1] * ey);
                double dy = y[i] - y[j] - (turn[1] * ex + turn[0] * ey);
                sum += dx * dx + dy * dy;
            }
        }
        return sum;
    }

    private void fitRotations() {
        double[] turn = new double[2];
        for (int i = 0; i < x.length; i++) {
            fitRotation(mesh, rings[i], i, x, y, turn);
            cos[i] = turn[0];
            sin[i] = turn[1];
        }
    }

    private static void fitRotation(TriangleMesh rest, int[] ring, int i, double[] x, double[] y, double[] turn) {
        double along = 0;
        double across = 0;
        for (int j : ring) {
            double ex = rest.x()[i] - rest.x()[j];
            double ey = rest.y()[i] - rest.y()[j];
            double dx = x[i] - x[j];
            double dy = y[i] - y[j];
            along += dx * ex + dy * ey;
            across += dy * ex - dx * ey;
        }
        double length = Math.hypot(along, across);
        turn[0] = length > 0 ? along / length : 1;
        turn[1] = length > 0 ? across / length : 0;
    }

    private LinearSolverSparse<DMatrixSparseCSC, DMatrixRMaj> factorised() {
        DMatrixSparseTriplet entries = new DMatrixSparseTriplet(free.length, free.length, 8 * free.length);
        for (int u = 0; u < free.length; u++) {
            entries.addItem(u, u, rings[free[u]].length);
            for (int j : rings[free[u]]) {
                if (unknownOf[j] >= 0) {
                    entries.addItem(u, unknownOf[j], -1);
                }
            }
        }
        DMatrixSparseCSC matrix = DConvertMatrixStruct.convert(entries, (DMatrixSparseCSC) null);
        LinearSolverSparse<DMatrixSparseCSC, DMatrixRMaj> cholesky = LinearSolverFactory_DSCC.cholesky(FillReducing.NONE);
        if (!cholesky.setA(matrix)) {
            throw new IllegalArgumentException("as rigid as possible: the system of " + free.length
                    + " free corners has no single solution; add handles");
        }
        return cholesky;
    }

    private void place(double[] toX, double[] toY) {
        for (int h = 0; h < handles.length; h++) {
            x[handles[h]] = toX[h];
            y[handles[h]] = toY[h];
        }
    }

    private void requireTargets(double[] toX, double[] toY) {
        if (toX.length != handles.length || toY.length != handles.length) {
            throw new IllegalArgumentException("as rigid as possible: got " + toX.length + " x and " + toY.length + " y for "
                    + handles.length + " handles " + Arrays.toString(handles));
        }
        for (int h = 0; h < handles.length; h++) {
            if (!Double.isFinite(toX[h]) || !Double.isFinite(toY[h])) {
                throw new IllegalArgumentException("as rigid as possible: handle " + h + " is told to be at (" + toX[h] + ", " + toY[h]
                        + "), needs finite numbers");
            }
        }
    }
}

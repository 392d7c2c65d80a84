package org.wispwright.warp.mesh;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Outside checks 2.3: Sorkine and Alexa (2007) with unit weights, digits derived; 3 x 3 corners, 8 triangles, sum |e|^2 = 40. */
class AsRigidAsPossibleTest {
    private static final TriangleMesh MESH = QuadGrid.over(0, 0, 2, 2, 2, 2).triangles();
    private static final double C = Math.sqrt(3) / 2;

    /** The mesh of the rows: 12 unit edges and 4 diagonals, both ways. */
    @Test
    void theMeshOfTheRows() {
        double sum = 0;
        int edges = 0;
        int[][] rings = Rings.of(MESH);
        for (int i = 0; i < 9; i++) {
            for (int j : rings[i]) {
                sum += Math.pow(MESH.x()[i] - MESH.x()[j], 2) + Math.pow(MESH.y()[i] - MESH.y()[j], 2);
                edges++;
            }
        }
        assertEquals(32, edges);
        assertEquals(40, sum);
        assertTrue(Arrays.stream(rings[0]).anyMatch(j -> j == 4), "the diagonal goes from (i,j) to (i+1,j+1)");
    }

    /** W16: a turn by 30 degrees and a shift cost nothing. */
    @Test
    void w16_rigidMotion() {
        assertEquals(0, energy(C, -.5, .5, C), 1e-26);
    }

    /** W17: uniform scale s costs (s - 1)^2 * 40. */
    @Test
    void w17_scale() {
        assertEquals(.4, energy(1.1, 0, 0, 1.1), 1e-12);
    }

    /** W18: stretch x by 1.2. */
    @Test
    void w18_stretch() {
        assertEquals(0.7345642275625016, energy(1.2, 0, 0, 1), 1e-12);
    }

    /** W19: shear x += .25 y. */
    @Test
    void w19_shear() {
        assertEquals(0.6450301691286583, energy(1, .25, 0, 1), 1e-12);
    }

    /** W20: the rotation closest to [1 .25; 0 1]. */
    @Test
    void w20_closestRotation() {
        ClosestRotation closest = ClosestRotation.to(1, .25, 0, 1);
        assertEquals(-7.125016348901798, Math.toDegrees(closest.angle()), 1e-12);
        assertEquals(0.03137112585072518, closest.squaredDistance(), 1e-14);
        assertEquals(2, ClosestRotation.to(0, 0, 0, 0).squaredDistance());
    }

    /** W21: border fixed at a turned position, inside started elsewhere: it lands on the turned position, E falls every time. */
    @Test
    void w21_insideFollowsTheBorder() {
        for (int cells : new int[] {2, 6}) {
            TriangleMesh mesh = QuadGrid.over(0, 0, 2, 2, cells, cells).triangles();
            int side = cells + 1;
            int[] border = IntStream.range(0, side * side)
                    .filter(n -> n % side == 0 || n % side == cells || n / side == 0 || n / side == cells).toArray();
            AsRigidAsPossible solver = new AsRigidAsPossible(mesh, border);
            double[][] to = targets(mesh, border);
            solver.drag(to[0], to[1], 0);
            double before = solver.energy();
            assertTrue(before > .1, "starts far from the answer");
            for (int n = 0; n < 400; n++) {
                solver.step();
                double now = solver.energy();
                assertTrue(now < before || now < 1e-20, "iteration " + n + ": energy from " + before + " to " + now);
                before = now;
            }
            for (int n = 0; n < mesh.corners(); n++) {
                assertEquals(C * mesh.x()[n] - .5 * mesh.y()[n] + .3, solver.x()[n], 1e-10);
                assertEquals(.5 * mesh.x()[n] + C * mesh.y()[n] - .2, solver.y()[n], 1e-10);
            }
            // Begun from the best rigid motion of the handles it is there at once.
            solver.begin(to[0], to[1]);
            assertEquals(0, solver.energy(), 1e-26);
        }
    }

    /** Energy falls every time on a hard pull of a larger mesh, handles stay where they are told, and the result is a low point of E. */
    @Test
    void aHardPullEndsAtALowPoint() {
        TriangleMesh mesh = QuadGrid.over(0, 0, 1, 1, 8, 8).triangles();
        int[] handles = {0, 8, 40, 72, 80};
        AsRigidAsPossible solver = new AsRigidAsPossible(mesh, handles);
        double[] toX = {0, 1, .8, 0, 1};
        double[] toY = {0, 0, .3, 1, 1};
        solver.begin(toX, toY);
        double before = solver.energy();
        for (int n = 0; n < 3000; n++) {
            solver.step();
            double now = solver.energy();
            assertTrue(now <= before * (1 + 1e-12), "iteration " + n + ": energy from " + before + " to " + now);
            before = now;
        }
        for (int h = 0; h < handles.length; h++) {
            assertEquals(toX[h], solver.x()[handles[h]]);
            assertEquals(toY[h], solver.y()[handles[h]]);
        }
        Random random = new Random(42);
        for (int trial = 0; trial < 20; trial++) {
            double[] x = solver.x();
            double[] y = solver.y();
            for (int i = 0; i < x.length; i++) {
                int corner = i;
                if (Arrays.stream(handles).noneMatch(h -> h == corner)) {
                    x[i] += 1e-3 * random.nextGaussian();
                    y[i] += 1e-3 * random.nextGaussian();
                }
            }
            assertTrue(AsRigidAsPossible.energy(mesh, x, y) > before, "trial " + trial + ", seed 42");
        }
    }

    /** The factorised step against a dense elimination of the same equations, at awkward meshes. */
    @ParameterizedTest
    @CsvSource({"1,1", "1,7", "5,2", "9,4"})
    void oneStepEqualsPlain(int cellsX, int cellsY) {
        TriangleMesh mesh = QuadGrid.over(0, 0, 1, 2, cellsX, cellsY).triangles();
        int[] handles = {mesh.corners() - 1, 0};
        AsRigidAsPossible solver = new AsRigidAsPossible(mesh, handles);
        double[] toX = {1.3, -.2};
        double[] toY = {1.7, .1};
        solver.drag(toX, toY, 0);
        double[][] plain = plainStep(mesh, handles, solver.x(), solver.y());
        solver.step();
        assertArrayEquals(plain[0], solver.x(), 1e-12);
        assertArrayEquals(plain[1], solver.y(), 1e-12);
    }

    /** A result that comes from a file must not depend on how the hand got there. */
    @Test
    void begunAfreshTheWayThereDoesNotCount() {
        TriangleMesh mesh = QuadGrid.over(0, 0, 1, 1, 5, 5).triangles();
        int[] handles = {0, 5, 20, 35};
        double[] toX = {0, 1, .7, 1.1};
        double[] toY = {0, 0, .4, 1};
        AsRigidAsPossible once = new AsRigidAsPossible(mesh, handles);
        once.begin(toX, toY);
        once.drag(toX, toY, 12);
        AsRigidAsPossible wandering = new AsRigidAsPossible(mesh, handles);
        wandering.drag(new double[] {.5, 2, -1, 1}, new double[] {.5, 0, .4, -1}, 7);
        wandering.begin(toX, toY);
        for (int n = 0; n < 12; n++) {
            wandering.step();
        }
        assertArrayEquals(once.x(), wandering.x());
        assertArrayEquals(once.y(), wandering.y());
    }

    @Test
    void everyCornerAHandleIsTakenAsTold() {
        TriangleMesh one = new TriangleMesh(new double[] {0, 1, 0}, new double[] {0, 0, 1}, new int[] {0, 1, 2});
        AsRigidAsPossible solver = new AsRigidAsPossible(one, new int[] {0, 1, 2});
        solver.drag(new double[] {3, 4, 3}, new double[] {1, 1, 2}, 3);
        assertArrayEquals(new double[] {3, 4, 3}, solver.x());
        assertEquals(0, solver.energy(), 1e-28);
    }

    @Test
    void refusesWhatCannotBeSolved() {
        assertThrows(IllegalArgumentException.class, () -> new AsRigidAsPossible(MESH, new int[0]));
        assertThrows(IllegalArgumentException.class, () -> new AsRigidAsPossible(MESH, new int[] {9}));
        assertThrows(IllegalArgumentException.class, () -> new AsRigidAsPossible(MESH, new int[] {3, 3}));
        TriangleMesh two = new TriangleMesh(new double[] {0, 1, 0, 5, 6, 5}, new double[] {0, 0, 1, 0, 0, 1}, new int[] {0, 1, 2, 3, 4, 5});
        String message = assertThrows(IllegalArgumentException.class, () -> new AsRigidAsPossible(two, new int[] {1})).getMessage();
        assertTrue(message.contains("corner 3"), message);
        AsRigidAsPossible solver = new AsRigidAsPossible(MESH, new int[] {0});
        assertThrows(IllegalArgumentException.class, () -> solver.begin(new double[2], new double[1]));
        assertThrows(IllegalArgumentException.class, () -> solver.drag(new double[] {Double.NaN}, new double[1], 1));
        assertThrows(IllegalArgumentException.class, () -> solver.drag(new double[1], new double[1], -1));
        assertThrows(IllegalArgumentException.class, () -> AsRigidAsPossible.energy(MESH, new double[8], new double[9]));
        assertThrows(IllegalArgumentException.class,
                () -> new TriangleMesh(new double[] {0, 1, 2}, new double[] {0, 1, 2}, new int[] {0, 1, 2}));
        assertThrows(IllegalArgumentException.class, () -> new TriangleMesh(new double[3], new double[3], new int[] {0, 1, 3}));
    }

    private static double energy(double a, double b, double c, double d) {
        double[] x = new double[9];
        double[] y = new double[9];
        for (int n = 0; n < 9; n++) {
            x[n] = a * MESH.x()[n] + b * MESH.y()[n] + .7;
            y[n] = c * MESH.x()[n] + d * MESH.y()[n] - .4;
        }
        return AsRigidAsPossible.energy(MESH, x, y);
    }

    private static double[][] targets(TriangleMesh mesh, int[] handles) {
        double[][] to = new double[2][handles.length];
        for (int h = 0; h < handles.length; h++) {
            double px = mesh.x()[handles[h]];
            double py = mesh.y()[handles[h]];
            to[0][h] = C * px - .5 * py + .3;
            to[1][h] = .5 * px + C * py - .2;
        }
        return to;
    }

    /** Rotations by {@link ClosestRotation}, then all corners by Gaussian elimination with the handles as equations of their own. */
    private static double[][] plainStep(TriangleMesh mesh, int[] handles, double[] x, double[] y) {
        int n = mesh.corners();
        int[][] rings = Rings.of(mesh);
        ClosestRotation[] turns = new ClosestRotation[n];
        for (int i = 0; i < n; i++) {
            double[] m = new double[4];
            for (int j : rings[i]) {
                double ex = mesh.x()[i] - mesh.x()[j];
                double ey = mesh.y()[i] - mesh.y()[j];
                m[0] += (x[i] - x[j]) * ex;
                m[1] += (x[i] - x[j]) * ey;
                m[2] += (y[i] - y[j]) * ex;
                m[3] += (y[i] - y[j]) * ey;
            }
            turns[i] = ClosestRotation.to(m[0], m[1], m[2], m[3]);
        }
        double[][] a = new double[n][n + 2];
        for (int i = 0; i < n; i++) {
            int corner = i;
            if (Arrays.stream(handles).anyMatch(h -> h == corner)) {
                a[i][i] = 1;
                a[i][n] = x[i];
                a[i][n + 1] = y[i];
                continue;
            }
            for (int j : rings[i]) {
                a[i][i] += 1;
                a[i][j] -= 1;
                double ex = mesh.x()[i] - mesh.x()[j];
                double ey = mesh.y()[i] - mesh.y()[j];
                double cos = (turns[i].cos() + turns[j].cos()) / 2;
                double sin = (turns[i].sin() + turns[j].sin()) / 2;
                a[i][n] += cos * ex - sin * ey;
                a[i][n + 1] += sin * ex + cos * ey;
            }
        }
        for (int i = 0; i < n; i++) {
            for (int k = 0; k < n; k++) {
                if (k != i) {
                    double f = a[k][i] / a[i][i];
                    for (int j = i; j < n + 2; j++) {
                        a[k][j] -= f * a[i][j];
                    }
                }
            }
        }
        double[][] out = new double[2][n];
        for (int i = 0; i < n; i++) {
            out[0][i] = a[i][n] / a[i][i];
            out[1][i] = a[i][n + 1] / a[i][i];
        }
        return out;
    }
}

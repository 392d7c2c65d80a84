package org.wispwright.warp.mesh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Painted triangles against a plain search of the triangle over each pixel, and meshes with corners anywhere. */
class MeshPaintingTest {
    private static final int[] HANDLES = {8, 16};

    /** Slow twin: over each pixel all triangles are asked, with barycentric coordinates; the rule of the class says which one counts. */
    @ParameterizedTest
    @CsvSource({"1,1,0.3", "7,5,0.05", "31,17,0.02", "13,29,0.2"})
    void equalsPlain(int width, int height, double shake) {
        QuadGrid rest = QuadGrid.over(0, 0, (double) width / height, 1, 5, 4);
        Random random = new Random(11);
        double[] x = rest.x().clone();
        double[] y = rest.y().clone();
        for (int c = 0; c < x.length; c++) {
            x[c] += shake * (random.nextDouble() - 0.4);
            y[c] += shake * (random.nextDouble() - 0.6);
        }
        TriangleMesh mesh = rest.triangles();
        MeshPainting painting = new MeshPainting(mesh, HANDLES, x, y);
        double[] dx = new double[width * height];
        double[] dy = new double[width * height];
        painting.displacements(0, 0, width, height, height, dx, dy);
        int covered = 0;
        for (int p = 0; p < width * height; p++) {
            double[] plain = plain(mesh, painting, x, y, (p % width + 0.5) / height, (p / width + 0.5) / height);
            assertEquals(Double.isNaN(plain[0]), Double.isNaN(dx[p]), "pixel " + p);
            if (!Double.isNaN(plain[0])) {
                covered++;
                assertEquals(plain[0] * height, dx[p], 1e-5, "pixel " + p);
                assertEquals(plain[1] * height, dy[p], 1e-5, "pixel " + p);
            }
        }
        assertTrue(covered > 0.6 * width * height);
        // Any window has the same bits.
        double[] partX = new double[width * height];
        double[] partY = new double[width * height];
        int w = Math.max(1, width - 3);
        int h = Math.max(1, height - 2);
        painting.displacements(width - w, height - h, w, h, height, partX, partY);
        for (int n = 0; n < w * h; n++) {
            int p = width - w + n % w + width * (height - h + n / w);
            assertEquals(dx[p], partX[n]);
            assertEquals(dy[p], partY[n]);
        }
    }

    private static double[] plain(TriangleMesh mesh, MeshPainting painting, double[] x, double[] y, double px, double py) {
        double[] best = {Double.NaN, Double.NaN};
        boolean bestUpright = false;
        boolean bestHandled = false;
        double bestFar = -1;
        int[] t = mesh.triangles();
        for (int n = 0; n < t.length; n += 3) {
            double area = cross(x, y, t[n], t[n + 1], x[t[n + 2]], y[t[n + 2]]);
            double a = cross(x, y, t[n + 1], t[n + 2], px, py) / area;
            double b = cross(x, y, t[n + 2], t[n], px, py) / area;
            double c = 1 - a - b;
            boolean upright = painting.relativeArea(n / 3) > 0;
            boolean handled = false;
            double far = 0;
            double farY = 0;
            for (int k = n; k < n + 3; k++) {
                handled |= t[k] == HANDLES[0] || t[k] == HANDLES[1];
                far += x[t[k]] - mesh.x()[t[k]];
                farY += y[t[k]] - mesh.y()[t[k]];
            }
            far = far * far + farY * farY;
            if (Math.min(a, Math.min(b, c)) >= -1e-12 && (upright && !bestUpright || upright == bestUpright
                    && (handled && !bestHandled || handled == bestHandled && far >= bestFar))) {
                best[0] = a * (mesh.x()[t[n]] - x[t[n]]) + b * (mesh.x()[t[n + 1]] - x[t[n + 1]]) + c * (mesh.x()[t[n + 2]] - x[t[n + 2]]);
                best[1] = a * (mesh.y()[t[n]] - y[t[n]]) + b * (mesh.y()[t[n + 1]] - y[t[n + 1]]) + c * (mesh.y()[t[n + 2]] - y[t[n + 2]]);
                bestUpright = upright;
                bestHandled = handled;
                bestFar = far;
            }
        }
        return best;
    }

    private static double cross(double[] x, double[] y, int a, int b, double px, double py) {
        return (x[b] - x[a]) * (py - y[a]) - (y[b] - y[a]) * (px - x[a]);
    }

    /** Handles on corners, near them, near sides, on the rim, in crowds: every one is a corner, no triangle turns over, none is lost. */
    @Test
    void aHandledMeshHasACornerAtEachHandle() {
        QuadGrid grid = QuadGrid.over(0, 0, 2, 1, 8, 4);
        Random random = new Random(3);
        for (int round = 0; round < 40; round++) {
            int count = 1 + 5 * round;
            double[] x = new double[count];
            double[] y = new double[count];
            for (int h = 0; h < count; h++) {
                x[h] = round % 2 == 0 ? 2 * random.nextDouble() : Math.rint(100 * random.nextDouble()) / 50;
                y[h] = round % 3 == 0 ? random.nextDouble() : Math.rint(100 * random.nextDouble()) / 100;
                for (int m = 0; m < h; m++) {
                    if (Math.hypot(x[h] - x[m], y[h] - y[m]) < 1e-5) {
                        x[h] = 2 * random.nextDouble();
                        m = -1;
                    }
                }
            }
            HandledMesh handled = HandledMesh.of(grid, x, y);
            TriangleMesh mesh = handled.mesh();
            for (int h = 0; h < count; h++) {
                assertEquals(x[h], mesh.x()[handled.handles()[h]], 1e-9);
                assertEquals(y[h], mesh.y()[handled.handles()[h]], 1e-9);
            }
            assertEquals(count, Arrays.stream(handled.handles()).distinct().count());
            double sum = 0;
            for (int t = 0; t < mesh.triangles().length; t += 3) {
                double twice = TriangleMesh.twiceArea(mesh.x(), mesh.y(), mesh.triangles(), t);
                assertTrue(twice > 0, "triangle " + t / 3 + " of round " + round + ": " + twice);
                sum += twice / 2;
            }
            assertEquals(2, sum, 1e-9, "the grid's area in round " + round);
        }
        String said = assertThrows(IllegalArgumentException.class, () -> HandledMesh.of(grid, new double[] {2.5}, new double[] {0.5}))
                .getMessage();
        assertTrue(said.contains("outside"), said);
    }
}

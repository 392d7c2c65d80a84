package org.wispwright.optimize.flow;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * Outside checks O1-O5: calculus on faces. Layout: Harlow and Welch (1965), Physics of Fluids 8(12), 2182-2189. The rows' bounds are
 * for double; our fields are float, so where a row says eps the tests use that of float (2^-24).
 */
class GridCalculusTest {
    private static final double FLOAT_EPS = Math.pow(2, -24);

    /** O1: whole-number stream function (3i^2 - 2ij + 5j^3) mod 17: the divergence is 0 exactly; printed first row and column. */
    @Test void o1_planeStreamFunctionHasNoDivergence() {
        GridShape shape = new GridShape(5, 5, 1, 1);
        int[][] psi = new int[6][6];
        for (int i = 0; i < 6; i++) {
            for (int j = 0; j < 6; j++) {
                psi[i][j] = Math.floorMod(3 * i * i - 2 * i * j + 5 * j * j * j, 17);
            }
        }
        MacVelocity u = new MacVelocity(shape);
        for (int j = 0; j < 5; j++) {
            for (int i = 0; i <= 5; i++) {
                u.x()[shape.xFace(i, j, 0)] = psi[i][j + 1] - psi[i][j];
            }
        }
        for (int j = 0; j <= 5; j++) {
            for (int i = 0; i < 5; i++) {
                u.y()[shape.yFace(i, j, 0)] = -(psi[i + 1][j] - psi[i][j]);
            }
        }
        assertArrayEquals(new float[] {5, 3, 1, -1, -3, -5}, java.util.Arrays.copyOfRange(u.x(), 0, 6));
        float[] leftColumn = new float[6];
        for (int j = 0; j <= 5; j++) {
            leftColumn[j] = u.y()[shape.yFace(0, j, 0)];
        }
        assertArrayEquals(new float[] {-3, -1, 1, 3, 5, 7}, leftColumn);
        assertEquals(0, DivergenceKernel.relativeMax(u, new float[shape.cells()], k -> { }, FlowOperators.ONE));
    }

    /** O2: faces as the curl of an edge potential; |div| stays under 12 eps max|A| / h^2. */
    @ParameterizedTest @ValueSource(ints = {8, 32}) void o2_curlOfEdgePotentialHasNoDivergence(int n) {
        GridShape shape = new GridShape(n, n, n, 1.0 / n);
        double h = shape.cellMetres();
        MacVelocity u = new MacVelocity(shape);
        for (int k = 0; k <= n; k++) {
            for (int j = 0; j <= n; j++) {
                for (int i = 0; i <= n; i++) {
                    if (j < n && k < n) {
                        u.x()[shape.xFace(i, j, k)] = (float) ((az(i * h, (j + 1) * h, (k + .5) * h) - az(i * h, j * h, (k + .5) * h)
                                - ay(i * h, (j + .5) * h, (k + 1) * h) + ay(i * h, (j + .5) * h, k * h)) / h);
                    }
                    if (i < n && k < n) {
                        u.y()[shape.yFace(i, j, k)] = (float) ((ax((i + .5) * h, j * h, (k + 1) * h) - ax((i + .5) * h, j * h, k * h)
                                - az((i + 1) * h, j * h, (k + .5) * h) + az(i * h, j * h, (k + .5) * h)) / h);
                    }
                    if (i < n && j < n) {
                        u.z()[shape.zFace(i, j, k)] = (float) ((ay((i + 1) * h, (j + .5) * h, k * h) - ay(i * h, (j + .5) * h, k * h)
                                - ax((i + .5) * h, (j + 1) * h, k * h) + ax((i + .5) * h, j * h, k * h)) / h);
                    }
                }
            }
        }
        float[] div = new float[shape.cells()];
        double relative = DivergenceKernel.relativeMax(u, div, k -> { }, FlowOperators.ONE);
        double most = 0;
        for (float d : div) {
            most = Math.max(most, Math.abs(d) / h);
        }
        double bound = 12 * FLOAT_EPS * 1.5 / (h * h);
        double seen = most;
        assertTrue(most <= bound, () -> "|div| " + seen + " 1/s, bound " + bound);
        assertTrue(relative < 8 * FLOAT_EPS, () -> "relative " + relative);
        assertTrue(relative > 0 || n == 8, "the field is not trivial");
    }

    private static double ax(double x, double y, double z) {
        return Math.sin(2 * y + z) * Math.cos(x);
    }

    private static double ay(double x, double y, double z) {
        return Math.cos(3 * z - x) + 0.3 * y;
    }

    private static double az(double x, double y, double z) {
        return Math.sin(x * y + 2 * z);
    }

    /** O3: n = 8: U (9,8,8), V (8,9,8), W (8,8,9). We store no edge values, so the row's edge shapes have nothing to check. */
    @Test void o3_faceCounts() {
        MacVelocity u = new MacVelocity(new GridShape(8, 8, 8, 1));
        assertEquals(9 * 8 * 8, u.x().length);
        assertEquals(8 * 9 * 8, u.y().length);
        assertEquals(8 * 8 * 9, u.z().length);
        assertEquals(9 * 8 * 8 - 1, u.shape().xFace(8, 7, 7));
        assertEquals(8 * 9 * 8 - 1, u.shape().yFace(7, 8, 7));
        assertEquals(8 * 8 * 9 - 1, u.shape().zFace(7, 7, 8));
    }

    /** O4: {@code <grad p, u> = -<p, div u>} with u = 0 on walls. The curl of a gradient has no counterpart in the tool. */
    @Test void o4_gradientIsMinusTheTransposeOfDivergence() {
        GridShape shape = new GridShape(7, 6, 5, 0.3);
        MacVelocity u = FlowOperators.wind(shape, 0, 1, 3);
        closeWalls(shape, u);
        float[] p = FlowOperators.noise(shape.cells(), 0, 1, 4);
        float[] div = new float[shape.cells()];
        for (int k = 0; k < shape.nz(); k++) {
            DivergenceKernel.slab(shape, u.x(), u.y(), u.z(), div, k);
        }
        MacVelocity grad = gradient(shape, p);
        double left = dot(grad.x(), u.x()) + dot(grad.y(), u.y()) + dot(grad.z(), u.z());
        double right = -dot(p, div);
        assertEquals(left, right, 1e-5 * Math.sqrt(dot(p, p) * dot(div, div)));
        assertTrue(Math.abs(left) > 1e-3, "not trivially 0");
    }

    /** A gradient is exactly what the projection takes away. */
    @Test void o4_projectionRemovesGradients() {
        GridShape shape = new GridShape(7, 6, 5, 0.3);
        MacVelocity grad = gradient(shape, FlowOperators.noise(shape.cells(), 0, 1, 4));
        new Projection(shape, Sides.CLOSED, FlowOperators.ONE).apply(grad);
        for (float v : FlowOperators.all(grad)) {
            assertEquals(0, v, 3e-6);
        }
    }

    /**
     * O5: P(Pu) = Pu; {@code <Pu,v> = <u,Pv>}; |u|^2 = |Pu|^2 + |u-Pu|^2. Chorin (1968); Helmholtz-Hodge decomposition. Float storage: 1e-6
     * for the row's 1e-10.
     */
    @ParameterizedTest @CsvSource({"7,6,5,CLOSED", "8,9,16,OPEN", "33,5,12,MIXED", "9,7,1,MIXED"})
    void o5_projectionIsOrthogonal(int nx, int ny, int nz, String which) {
        GridShape shape = new GridShape(nx, ny, nz, 0.3);
        Sides sides = switch (which) {
            case "CLOSED" -> Sides.CLOSED;
            case "OPEN" -> FlowOperators.OPEN;
            default -> new Sides(Side.WALL, Side.OPEN, Side.WALL, Side.OPEN, Side.OPEN, Side.OPEN);
        };
        Projection projection = new Projection(shape, sides, FlowOperators.ONE);
        MacVelocity u = FlowOperators.wind(shape, 0, 1, 3);
        MacVelocity v = FlowOperators.wind(shape, 0, 1, 7);
        if (which.equals("CLOSED")) {
            closeWalls(shape, u);                                              // else u - Pu holds the walls' part as well
            closeWalls(shape, v);
        }
        MacVelocity pu = u.copy();
        projection.apply(pu);
        MacVelocity ppu = pu.copy();
        projection.apply(ppu);
        MacVelocity pv = v.copy();
        projection.apply(pv);
        float[] a = FlowOperators.all(u);
        float[] pa = FlowOperators.all(pu);
        float[] ppa = FlowOperators.all(ppu);
        float[] b = FlowOperators.all(v);
        float[] pb = FlowOperators.all(pv);
        for (int n = 0; n < pa.length; n++) {
            assertEquals(pa[n], ppa[n], 3e-6 * 0.3, "P(Pu) = Pu, value " + n);
        }
        double scale = Math.sqrt(dot(a, a) * dot(b, b));
        assertEquals(dot(pa, b), dot(a, pb), 1e-6 * scale);
        float[] rest = new float[a.length];
        for (int n = 0; n < a.length; n++) {
            rest[n] = a[n] - pa[n];
        }
        assertEquals(dot(a, a), dot(pa, pa) + dot(rest, rest), 1e-6 * dot(a, a));
        assertTrue(projection.lastPressure().length == shape.cells());
        assertTrue(DivergenceKernel.relativeMax(pu, new float[shape.cells()], k -> { }, FlowOperators.ONE) < 2e-6);
    }

    static void closeWalls(GridShape shape, MacVelocity u) {
        for (int k = 0; k < shape.nz(); k++) {
            for (int j = 0; j < shape.ny(); j++) {
                u.x()[shape.xFace(0, j, k)] = 0;
                u.x()[shape.xFace(shape.nx(), j, k)] = 0;
            }
            for (int i = 0; i < shape.nx(); i++) {
                u.y()[shape.yFace(i, 0, k)] = 0;
                u.y()[shape.yFace(i, shape.ny(), k)] = 0;
            }
        }
        for (int n = 0; n < shape.nx() * shape.ny(); n++) {
            u.z()[n] = 0;
            u.z()[u.z().length - 1 - n] = 0;
        }
    }

    private static MacVelocity gradient(GridShape shape, float[] p) {
        MacVelocity grad = new MacVelocity(shape);
        for (int k = 0; k < shape.nz(); k++) {
            for (int j = 0; j < shape.ny(); j++) {
                for (int i = 0; i < shape.nx(); i++) {
                    float here = p[shape.cell(i, j, k)];
                    if (i > 0) {
                        grad.x()[shape.xFace(i, j, k)] = here - p[shape.cell(i - 1, j, k)];
                    }
                    if (j > 0) {
                        grad.y()[shape.yFace(i, j, k)] = here - p[shape.cell(i, j - 1, k)];
                    }
                    if (k > 0) {
                        grad.z()[shape.zFace(i, j, k)] = here - p[shape.cell(i, j, k - 1)];
                    }
                }
            }
        }
        return grad;
    }

    private static double dot(float[] a, float[] b) {
        double sum = 0;
        for (int n = 0; n < a.length; n++) {
            sum += (double) a[n] * b[n];
        }
        return sum;
    }
}

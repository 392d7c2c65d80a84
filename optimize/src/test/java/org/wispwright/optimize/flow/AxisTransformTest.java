package org.wispwright.optimize.flow;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/** Outside checks O6-O15: eigenvalues, eigenvectors and the solve that they make direct. Textbook: LeVeque (2007), ch. 2. */
class AxisTransformTest {

    /**
     * O6-O8: Neumann k = 0,1,2 (walls) and Dirichlet at nodes k = 1,2,3 (open sides: pressure 0 at the ghost cell's centre, so
     * N inner points and h = 1/(N+1)). The rows' other two kinds do not occur: no side of ours has its pressure fixed on the face, none is periodic.
     */
    @ParameterizedTest @CsvSource({
        "8,  9.743419838555, 37.490332008122, 9.769795432683, 37.900800214726, 81",
        "16, 9.837936433546, 38.973679354221, 9.841548382705, 39.031051404282, 86.574495548283",
        "32, 9.861679775341, 39.351745734184, 9.862152635822, 39.359297361825, 88.224303467625"})
    void o6_o7_o8_eigenvalues(int n, double wall1, double wall2, double open1, double open2, double open3) {
        double[] walls = sorted(n, Side.WALL, (double) n * n);
        assertEquals(0, walls[0], 1e-12);
        assertEquals(wall1, walls[1], 1e-11);
        assertEquals(wall2, walls[2], 1e-11);
        double[] open = sorted(n, Side.OPEN, (n + 1.0) * (n + 1.0));
        assertEquals(open1, open[0], 1e-11);
        assertEquals(open2, open[1], 1e-11);
        assertEquals(open3, open[2], 1e-11);
    }

    /** O9: first Neumann eigenvalue. */
    @ParameterizedTest @CsvSource({"4,9.37258300203048", "8,9.74341983855529", "16,9.83793643354601", "32,9.86167977534078", "64,9.86762276722776"})
    void o9_firstNeumannEigenvalue(int n, double expected) {
        assertEquals(expected, sorted(n, Side.WALL, (double) n * n)[1], 1e-12 * expected);
    }

    /**
     * O10: right side -pi^2 d cos(pi x)cos(pi y).. at cell centres, walls: the discrete answer is the exact one times pi^2/lambda_1, in
     * one, two and three dimensions. Solved by the projection: the velocity is made to have that divergence. Float: 2e-6.
     */
    @ParameterizedTest @CsvSource({"4,1.05302928754551", "8,1.01295074672188", "16,1.00321896444008", "32,1.00080357767937", "64,1.0002008218097"})
    void o10_manufacturedPoisson(int n, double factor) {
        checkPoisson(new GridShape(n, 1, 1, 1.0 / n), 1, factor);
        checkPoisson(new GridShape(n, n, 1, 1.0 / n), 2, factor);
        checkPoisson(new GridShape(n, n, n, 1.0 / n), 3, factor);
    }

    private static void checkPoisson(GridShape shape, int dimensions, double factor) {
        double h = shape.cellMetres();
        MacVelocity u = new MacVelocity(shape);
        double[] exact = new double[shape.cells()];
        for (int k = 0; k < shape.nz(); k++) {
            for (int j = 0; j < shape.ny(); j++) {
                double flux = 0;
                for (int i = 0; i < shape.nx(); i++) {
                    double value = Math.cos(Math.PI * (i + .5) * h) * (dimensions > 1 ? Math.cos(Math.PI * (j + .5) * h) : 1)
                            * (dimensions > 2 ? Math.cos(Math.PI * (k + .5) * h) : 1);
                    exact[shape.cell(i, j, k)] = value;
                    flux += -Math.PI * Math.PI * dimensions * value * h * h;
                    u.x()[shape.xFace(i + 1, j, k)] = i + 1 < shape.nx() ? (float) flux : 0;
                }
            }
        }
        Projection projection = new Projection(shape, Sides.CLOSED, FlowOperators.ONE);
        projection.apply(u);
        float[] p = projection.lastPressure();
        double mean = 0;
        for (float v : p) {
            mean += v / (double) p.length;
        }
        for (int n = 0; n < p.length; n++) {
            int at = n;
            assertEquals(factor * exact[n], p[n] - mean, 2e-5, () -> shape.inWords() + " cell " + at);
        }
        // The largest value fixes the factor itself to the digits of float.
        int top = 0;
        for (int n = 1; n < p.length; n++) {
            top = Math.abs(exact[n]) > Math.abs(exact[top]) ? n : top;
        }
        assertEquals(factor, (p[top] - mean) / exact[top], 2e-5);
    }

    /** O11: condition numbers: cot^2(pi/2N) with walls and without the constant mode; the row's Dirichlet-face kind does not occur. */
    @ParameterizedTest @CsvSource({"8,26.2741423691", "16,104.08686892", "32,415.345062232", "64,1660.37964629"})
    void o11_conditionNumber(int n, double dirichletFace) {
        double[] walls = sorted(n, Side.WALL, 1);
        assertEquals(dirichletFace - 1, walls[n - 1] / walls[1], 1e-8 * dirichletFace);
    }

    /**
     * O12 speaks of conjugate gradients, of which a box without solids needs none. What makes it true holds here too: a right side of one
     * eigenvector (O10's) is solved by one division: only that mode is not 0.
     */
    @Test void o12_oneModeStaysOneMode() {
        int n = 16;
        float[] values = new float[n];
        for (int i = 0; i < n; i++) {
            values[i] = (float) Math.cos(3 * Math.PI * (i + .5) / n);
        }
        float[] modes = transformed(values, Side.WALL);
        assertEquals(Math.sqrt(n / 2.0), modes[3], 1e-5);
        for (int m = 0; m < n; m++) {
            if (m != 3) {
                assertEquals(0, modes[m], 1e-6);
            }
        }
    }

    /** O13, O14: Parseval, sums of squares 30 and 56, for the transforms that we have (orthonormal: no factor). */
    @Test void o13_o14_parseval() {
        for (Side side : Side.values()) {
            assertEquals(30, squares(transformed(new float[] {1, 2, 3, 4}, side)), 30e-6);
            assertEquals(56, squares(transformed(new float[] {1, 0, -2, 3, 5, -1, 0, 4}, side)), 56e-6);
        }
    }

    /** O15: orthonormal DCT-II of 1,2,3,4. The row's DST-II belongs to a pressure fixed on the face; our open sides are of the node kind (DST-I). */
    @Test void o15_dctOfOneTwoThreeFour() {
        float[] modes = transformed(new float[] {1, 2, 3, 4}, Side.WALL);
        double[] expected = {5, -2.230442497388, 0, -0.158512667781};
        for (int m = 0; m < 4; m++) {
            assertEquals(expected[m], modes[m], 2e-6);
        }
    }

    /** Both directions, along rows and along columns, against sums written out in double, for even, odd and mixed sizes. */
    @ParameterizedTest @CsvSource({"1,WALL,WALL", "1,OPEN,OPEN", "2,WALL,WALL", "5,OPEN,OPEN", "8,WALL,OPEN", "9,OPEN,WALL", "33,WALL,WALL", "48,OPEN,OPEN", "64,WALL,WALL", "64,OPEN,OPEN", "128,WALL,WALL"})
    void blockedEqualsPlain(int n, Side low, Side high) {
        AxisTransform transform = new AxisTransform(n, low, high);
        int rows = 3;
        float[] start = FlowOperators.noise(n * rows, 0, 1, n);
        float[] byRows = start.clone();
        float[] scratch = new float[n * rows];
        transform.rowsToModes(byRows, scratch, 0, rows);
        float[] columns = new float[n * rows];
        for (int r = 0; r < rows; r++) {
            for (int i = 0; i < n; i++) {
                columns[i * rows + r] = start[r * n + i];
            }
        }
        transform.columnsToModes(columns, scratch, rows, 0, rows);
        for (int r = 0; r < rows; r++) {
            for (int m = 0; m < n; m++) {
                assertEquals(byRows[r * n + m], columns[m * rows + r], 1e-5, "row " + r + " mode " + m);
            }
            double energy = 0;
            for (int m = 0; m < n; m++) {
                energy += transform.eigenvalue(m) * byRows[r * n + m] * byRows[r * n + m];
            }
            assertEquals(minusLaplacianForm(start, r * n, n, low, high), energy, 1e-4 * (1 + energy));
        }
        transform.rowsToCells(byRows, scratch, 0, rows);
        transform.columnsToCells(columns, scratch, rows, 0, rows);
        for (int r = 0; r < rows; r++) {
            for (int i = 0; i < n; i++) {
                assertEquals(start[r * n + i], byRows[r * n + i], 1e-5);
                assertEquals(start[r * n + i], columns[i * rows + r], 1e-5);
            }
        }
    }

    /** The fast transform is shared by all lanes: the same bits for any number of them, and the box is as free of divergence as by products. */
    @Test void fastTransformOnManyLanes() {
        GridShape shape = new GridShape(64, 5, 64, 0.1);
        MacVelocity one = FlowOperators.wind(shape, 0, 1, 3);
        MacVelocity many = one.copy();
        new Projection(shape, Sides.CLOSED, FlowOperators.ONE).apply(one);
        try (Lanes lanes = new Lanes(4)) {
            Projection projection = new Projection(shape, Sides.CLOSED, lanes);
            projection.apply(many);
            assertTrue(DivergenceKernel.relativeMax(many, new float[shape.cells()], k -> { }, lanes) < 3e-6);
        }
        assertArrayEquals(FlowOperators.all(one), FlowOperators.all(many));
    }

    /** {@code -x' L x} from the definition: squared differences across inner faces, plus x^2 at each open end. */
    private static double minusLaplacianForm(float[] x, int at, int n, Side low, Side high) {
        double sum = low == Side.OPEN ? (double) x[at] * x[at] : 0;
        sum += high == Side.OPEN ? (double) x[at + n - 1] * x[at + n - 1] : 0;
        for (int i = 1; i < n; i++) {
            double d = x[at + i] - (double) x[at + i - 1];
            sum += d * d;
        }
        return sum;
    }

    private static double[] sorted(int n, Side side, double scale) {
        AxisTransform transform = new AxisTransform(n, side, side);
        double[] values = new double[n];
        for (int m = 0; m < n; m++) {
            values[m] = scale * transform.eigenvalue(m);
        }
        Arrays.sort(values);
        return values;
    }

    /** Modes in rising order of frequency; inside, evens come before odds. The sign is the transform's, a convention. */
    private static float[] transformed(float[] values, Side side) {
        int n = values.length;
        float[] out = values.clone();
        new AxisTransform(n, side, side).rowsToModes(out, new float[n], 0, 1);
        float[] ordered = new float[n];
        for (int m = 0; m < n; m++) {
            ordered[m] = out[m % 2 == 0 ? m / 2 : (n + 1) / 2 + m / 2];
        }
        return ordered;
    }

    private static double squares(float[] values) {
        double sum = 0;
        for (float v : values) {
            sum += (double) v * v;
        }
        assertTrue(sum > 0);
        return sum;
    }
}

package org.wispwright.warp.spline;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.junit.jupiter.api.Test;

/** Bookstein (1989), IEEE PAMI 11(6), 567-585, outside checks W1-W9. */
class ThinPlateSplineTest {
    private static final double[][] FOUR = {{0, 1}, {-1, 0}, {0, -1}, {1, 0}};
    private static final double[][] FOUR_TO = {{0, .75}, {-1, .25}, {0, -1.25}, {1, .25}};
    private static final double[][] FIVE = {{3.6929, 10.3819}, {6.5827, 8.8386}, {6.7756, 12.0866}, {4.8189, 11.2047}, {5.6969, 10.0748}};
    private static final double[][] FIVE_TO = {{3.9724, 6.5354}, {6.6969, 4.1181}, {6.5394, 7.2362}, {5.4016, 6.4528}, {5.7756, 5.1142}};

    /** W1: Bookstein's four-point example; the paper prints 0.0902. */
    @Test
    void w1_fourPointExample() {
        ThinPlateSpline spline = ThinPlateSpline.fit(FOUR, FOUR_TO);
        assertArrayEquals(new double[] {0, 1, 0}, spline.affine(0), 1e-13);
        assertArrayEquals(new double[] {0, 0, 1}, spline.affine(1), 1e-13);
        assertArrayEquals(new double[4], spline.weights(0), 1e-13);
        double w = 0.09016844005556021;
        assertEquals(1 / (16 * Math.log(2)), w, 1e-16);
        assertArrayEquals(new double[] {-w, w, -w, w}, spline.weights(1), 1e-13);
    }

    /** W2: its bending energy and the only eigenvalue of the bending matrix that is not zero. */
    @Test
    void w2_fourPointEnergyAndEigenvalue() {
        ThinPlateSpline spline = ThinPlateSpline.fit(FOUR, FOUR_TO);
        assertEquals(0.0901684400556, spline.bendingEnergy(1), 1e-12);
        assertEquals(0, spline.bendingEnergy(0), 1e-12);
        assertEquals(quadraticForm(spline.bendingMatrix(), FOUR_TO, 1), spline.bendingEnergy(1), 1e-12);
        double[] eigenvalues = eigenvalues(spline.bendingMatrix());
        assertArrayEquals(new double[] {0, 0, 0, 0.3606737602222}, eigenvalues, 1e-12);
        assertEquals(1 / (4 * Math.log(2)), eigenvalues[3], 1e-12);
    }

    /** W3: its values. */
    @Test
    void w3_fourPointValues() {
        ThinPlateSpline spline = ThinPlateSpline.fit(FOUR, FOUR_TO);
        assertMaps(spline, 0, 0, 0, 0, 1e-11);
        assertMaps(spline, .5, .5, .5, .5, 1e-11);
        assertMaps(spline, .5, 0, .5, 0.082969438502, 1e-11);
        assertMaps(spline, 0, .5, 0, 0.417030561498, 1e-11);
        assertMaps(spline, 2, 0, 2, 0.331877754007, 1e-11);
    }

    /** W4: Bookstein's five-point example; the paper's four-digit values beside the full ones. */
    @Test
    void w4_fivePointExample() {
        ThinPlateSpline spline = ThinPlateSpline.fit(FIVE, FIVE_TO);
        assertArrayEquals(new double[] {1.354995817737, 0.874725874867, -0.02886041335}, spline.affine(0), 1e-9);
        assertArrayEquals(new double[] {-0.038030135354, 0.023187750609, -0.024755055674, 0.079782257612, -0.040184817192},
                spline.weights(0), 1e-9);
        assertArrayEquals(new double[] {-2.945963080998, -0.295560562638, 0.921632592118}, spline.affine(1), 1e-9);
        assertArrayEquals(new double[] {0.042446928059, 0.01591661177, 0.028813480594, -0.045425521194, -0.04175149923},
                spline.weights(1), 1e-9);
        assertArrayEquals(new double[] {1.355, .8747, -.0289}, spline.affine(0), 2e-3);
        assertArrayEquals(new double[] {-2.946, -.2956, .9216}, spline.affine(1), 2e-3);
    }

    /** W5: its energies and eigenvalues. */
    @Test
    void w5_fivePointEnergies() {
        ThinPlateSpline spline = ThinPlateSpline.fit(FIVE, FIVE_TO);
        assertEquals(0.041192338836, spline.bendingEnergy(0), 1e-10);
        assertEquals(0.044806640325, spline.bendingEnergy(1), 1e-10);
        assertEquals(0.0859989791612, spline.bendingEnergy(0) + spline.bendingEnergy(1), 1e-10);
        assertEquals(quadraticForm(spline.bendingMatrix(), FIVE_TO, 0), spline.bendingEnergy(0), 1e-10);
        assertArrayEquals(new double[] {0, 0, 0, 0.148013264933, 0.283750490453}, eigenvalues(spline.bendingMatrix()), 1e-10);
    }

    /** W6: its values. */
    @Test
    void w6_fivePointValues() {
        ThinPlateSpline spline = ThinPlateSpline.fit(FIVE, FIVE_TO);
        assertMaps(spline, 5, 10, 5.20321325645, 5.347881027332, 1e-10);
        assertMaps(spline, 6, 11, 6.113478930227, 5.976970500893, 1e-10);
        assertMaps(spline, 4, 9, 4.150809042892, 5.176904276003, 1e-10);
    }

    /** W7: side conditions on the weights, and the landmarks are hit. */
    @Test
    void w7_sideConditions() {
        double[][] many = randomPoints(40, 7);
        double[][] manyTo = randomPoints(40, 8);
        assertSideConditions(FIVE, FIVE_TO, 1e-12);
        assertSideConditions(FOUR, FOUR_TO, 1e-12);
        // 40 random landmarks, some close together: weights reach some hundreds, so the bound is relative to their size.
        ThinPlateSpline spline = ThinPlateSpline.fit(many, manyTo);
        double size = Arrays.stream(spline.weights(0)).map(Math::abs).max().orElseThrow();
        assertSideConditions(many, manyTo, 1e-12 * Math.max(1, size));
    }

    /** W8: an affine map of the landmarks is reproduced with no bending. */
    @Test
    void w8_affineReproduction() {
        double[][] to = new double[5][];
        for (int i = 0; i < 5; i++) {
            to[i] = new double[] {1.2 * FIVE[i][0] - .3 * FIVE[i][1] + 2, .4 * FIVE[i][0] + .9 * FIVE[i][1] - 1};
        }
        ThinPlateSpline spline = ThinPlateSpline.fit(FIVE, to);
        assertArrayEquals(new double[5], spline.weights(0), 1e-12);
        assertArrayEquals(new double[5], spline.weights(1), 1e-12);
        assertEquals(0, spline.bendingEnergy(0), 1e-12);
        assertEquals(0, spline.bendingEnergy(1), 1e-12);
        assertMaps(spline, 5, 10, 5, 10, 1e-12);
    }

    /**
     * W9: energy is unchanged by rotating and translating the targets and goes as the square of their scale. The kernel's log base:
     * with log2 in place of ln the kernel is 1/ln 2 as large and the weights ln 2 times, so the map is the same.
     */
    @Test
    void w9_energyInvariances() {
        double energy = total(ThinPlateSpline.fit(FIVE, FIVE_TO));
        double[][] moved = new double[5][];
        for (int i = 0; i < 5; i++) {
            double c = Math.cos(0.7);
            double s = Math.sin(0.7);
            moved[i] = new double[] {c * FIVE_TO[i][0] - s * FIVE_TO[i][1] + 3, s * FIVE_TO[i][0] + c * FIVE_TO[i][1] - 5};
        }
        assertEquals(energy, total(ThinPlateSpline.fit(FIVE, moved)), 1e-12);
        assertEquals(6.25 * energy, total(ThinPlateSpline.fit(FIVE, scaled(FIVE_TO, 2.5))), 1e-12);
        // Kernel with another base, fitted here from the definition: weights differ by ln 2, values do not.
        ThinPlateSpline spline = ThinPlateSpline.fit(FIVE, FIVE_TO);
        double[] base2 = plainFit(FIVE, FIVE_TO, 0, 1 / Math.log(2));
        double value = base2[5] + base2[6] * 5 + base2[7] * 10;
        for (int i = 0; i < 5; i++) {
            assertEquals(spline.weights(0)[i] * Math.log(2), base2[i], 1e-12);
            double r2 = Math.pow(5 - FIVE[i][0], 2) + Math.pow(10 - FIVE[i][1], 2);
            value += base2[i] * r2 * Math.log(r2) / Math.log(2);
        }
        assertEquals(spline.x(5, 10), value, 1e-12);
    }

    /** The centred and scaled fit against the plain system of the paper, far from the origin and at another unit. */
    @Test
    void theScaledFitEqualsThePlainOne() {
        double[] plain = plainFit(FIVE, FIVE_TO, 1, 1);
        ThinPlateSpline spline = ThinPlateSpline.fit(FIVE, FIVE_TO);
        assertArrayEquals(Arrays.copyOfRange(plain, 0, 5), spline.weights(1), 1e-11);
        assertArrayEquals(Arrays.copyOfRange(plain, 5, 8), spline.affine(1), 1e-10);
    }

    @Test
    void manyHandlesStayExact() {
        double[][] from = randomPoints(300, 1);
        double[][] to = randomPoints(300, 2);
        ThinPlateSpline spline = ThinPlateSpline.fit(from, to);
        for (int i = 0; i < 300; i++) {
            assertMaps(spline, from[i][0], from[i][1], to[i][0], to[i][1], 1e-9);
        }
    }

    @Test
    void refusesWhatHasNoSingleSolution() {
        double[][] line = {{0, 0}, {1, 1}, {2, 2}, {3, 3}};
        assertThrows(IllegalArgumentException.class, () -> ThinPlateSpline.fit(line, FOUR_TO));
        double[][] same = {{0, 0}, {1, 0}, {0, 1}, {0, 1}};
        String message = assertThrows(IllegalArgumentException.class, () -> ThinPlateSpline.fit(same, FOUR_TO)).getMessage();
        assertTrue(message.contains("2 and 3"), message);
        double[][] nan = {{0, 0}, {1, 0}, {0, Double.NaN}, {0, 1}};
        assertThrows(IllegalArgumentException.class, () -> ThinPlateSpline.fit(nan, FOUR_TO));
        assertThrows(IllegalArgumentException.class, () -> ThinPlateSpline.fit(FIVE, FOUR_TO));
    }

    private static void assertSideConditions(double[][] from, double[][] to, double tolerance) {
        ThinPlateSpline spline = ThinPlateSpline.fit(from, to);
        for (int axis = 0; axis < 2; axis++) {
            double[] w = spline.weights(axis);
            double sum = 0;
            double sumX = 0;
            double sumY = 0;
            for (int i = 0; i < w.length; i++) {
                sum += w[i];
                sumX += w[i] * from[i][0];
                sumY += w[i] * from[i][1];
            }
            assertEquals(0, sum, tolerance);
            assertEquals(0, sumX, tolerance);
            assertEquals(0, sumY, tolerance);
        }
        for (int i = 0; i < from.length; i++) {
            assertMaps(spline, from[i][0], from[i][1], to[i][0], to[i][1], tolerance);
        }
    }

    /** Weights and affine part by the plain system of the paper with the kernel times {@code factor}, by Gaussian elimination. */
    private static double[] plainFit(double[][] p, double[][] v, int axis, double factor) {
        int n = p.length;
        DMatrixRMaj a = new DMatrixRMaj(n + 3, n + 3);
        DMatrixRMaj b = new DMatrixRMaj(n + 3, 1);
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < n; j++) {
                double r2 = Math.pow(p[i][0] - p[j][0], 2) + Math.pow(p[i][1] - p[j][1], 2);
                a.set(i, j, i == j ? 0 : factor * r2 * Math.log(r2));
            }
            a.set(i, n, 1);
            a.set(n, i, 1);
            a.set(i, n + 1, p[i][0]);
            a.set(n + 1, i, p[i][0]);
            a.set(i, n + 2, p[i][1]);
            a.set(n + 2, i, p[i][1]);
            b.set(i, 0, v[i][axis]);
        }
        DMatrixRMaj x = new DMatrixRMaj(n + 3, 1);
        assertTrue(CommonOps_DDRM.solve(a, b, x));
        return x.data;
    }

    private static double quadraticForm(DMatrixRMaj l, double[][] v, int axis) {
        double sum = 0;
        for (int i = 0; i < v.length; i++) {
            for (int j = 0; j < v.length; j++) {
                sum += v[i][axis] * l.get(i, j) * v[j][axis];
            }
        }
        return sum;
    }

    private static double[] eigenvalues(DMatrixRMaj symmetric) {
        EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(symmetric.numRows, false, true);
        DMatrixRMaj half = symmetric.copy();
        for (int i = 0; i < half.numRows; i++) {
            for (int j = 0; j < half.numCols; j++) {
                half.set(i, j, (symmetric.get(i, j) + symmetric.get(j, i)) / 2);
            }
        }
        assertTrue(eigen.decompose(half));
        double[] out = new double[half.numRows];
        for (int i = 0; i < out.length; i++) {
            out[i] = eigen.getEigenvalue(i).real;
        }
        Arrays.sort(out);
        return out;
    }

    private static double total(ThinPlateSpline spline) {
        return spline.bendingEnergy(0) + spline.bendingEnergy(1);
    }

    private static double[][] scaled(double[][] points, double by) {
        return Arrays.stream(points).map(p -> new double[] {by * p[0], by * p[1]}).toArray(double[][]::new);
    }

    private static double[][] randomPoints(int count, long seed) {
        Random random = new Random(seed);
        double[][] out = new double[count][];
        for (int i = 0; i < count; i++) {
            out[i] = new double[] {random.nextDouble(), random.nextDouble()};
        }
        return out;
    }

    private static void assertMaps(ThinPlateSpline spline, double x, double y, double toX, double toY, double tolerance) {
        assertEquals(toX, spline.x(x, y), tolerance);
        assertEquals(toY, spline.y(x, y), tolerance);
        double[] both = new double[2];
        spline.evaluate(x, y, both);
        assertArrayEquals(new double[] {toX, toY}, both, tolerance);
    }
}

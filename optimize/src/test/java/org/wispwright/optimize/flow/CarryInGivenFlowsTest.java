package org.wispwright.optimize.flow;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.volume.GridShape;

/**
 * Outside checks O33, O37, O38, O41, O42, O46, O47: carrying in given flows, for the schemes that exist here: A (linear) and C' (cubic,
 * clamped). Rows O34-O36, O39, O40, O43-O45 are MacCormack and unclamped schemes, which the tool does not have. Paths by formula as the
 * rows state; the interpolation is the tool's own kernel. Tolerance of the rows: 2e-3 absolute.
 * Zalesak (1979), J. Comput. Phys. 31, 335-362; LeVeque (1996), SIAM J. Numer. Anal. 33, 627-665.
 */
class CarryInGivenFlowsTest {
    private static final double ROW = 2e-3;

    private interface Flow {
        /** Velocity at (x, y) in 0..1 at a time. */
        double[] at(double x, double y, double t);
    }

    private record Outcome(double l1, double l2, double min, double max, double sum, double area) { }

    private static Outcome carried(int n, int steps, double span, Interpolation scheme, Flow flow, float[] start) {
        GridShape shape = new GridShape(n, n, 1, 1.0 / n);
        Carry carry = Carry.ofCells(shape, scheme, FlowOperators.ONE);
        Displacement d = new Displacement(shape);
        double dt = span / steps;
        float[] q = start.clone();
        float[] next = new float[q.length];
        boolean steady = flow.at(.3, .6, 0)[0] == flow.at(.3, .6, span / 3)[0];
        for (int s = 0; s < steps; s++) {
            if (s == 0 || !steady) {
                for (int j = 0; j < n; j++) {
                    for (int i = 0; i < n; i++) {
                        double x = (i + .5) / n;
                        double y = (j + .5) / n;
                        double[] u1 = flow.at(x, y, (s + 1) * dt);
                        double[] u = flow.at(x - dt / 2 * u1[0], y - dt / 2 * u1[1], (s + .5) * dt);
                        d.x[shape.cell(i, j, 0)] = (float) (dt * u[0] * n);
                        d.y[shape.cell(i, j, 0)] = (float) (dt * u[1] * n);
                    }
                }
            }
            carry.forward(q, d, next);
            float[] swap = q;
            q = next;
            next = swap;
        }
        double sum0 = 0;
        double sum = 0;
        double l1 = 0;
        double squares0 = 0;
        double squares = 0;
        double min = 1;
        double max = 0;
        int inside0 = 0;
        int inside = 0;
        for (int c = 0; c < q.length; c++) {
            sum0 += start[c];
            sum += q[c];
            l1 += Math.abs(q[c] - start[c]);
            squares += (q[c] - start[c]) * (double) (q[c] - start[c]);
            squares0 += start[c] * (double) start[c];
            min = Math.min(min, q[c]);
            max = Math.max(max, q[c]);
            inside0 += start[c] > .5 ? 1 : 0;
            inside += q[c] > .5 ? 1 : 0;
        }
        return new Outcome(l1 / sum0, Math.sqrt(squares / squares0), min, max, sum / sum0, inside / (double) inside0);
    }

    private static double[] turning(double x, double y) {
        return new double[] {2 * Math.PI * (.5 - y), 2 * Math.PI * (x - .5)};
    }

    /** O33, O37, O38, O41: the slotted disc after one turn. */
    @ParameterizedTest @CsvSource({
        "O33,LINEAR,100,628,616,1.109118,0.660825,0,0.623601,1.008519,0.4188",
        "O37,CUBIC,100,628,616,0.525605,0.468772,0,0.995714,1.022480,1.0552",
        "O38,LINEAR,200,1256,2328,0.960311,0.618956,0,0.677190,1.000335,0.7388",
        "O41,CUBIC,200,1256,2328,0.350149,0.369449,0,1,1.009053,0.9970"})
    void o33_o37_o38_o41_slottedDisc(String row, Interpolation scheme, int n, int steps, int inside, double l1, double l2, double min, double max,
                                     double sum, double area) {
        float[] start = new float[n * n];
        int count = 0;
        for (int j = 0; j < n; j++) {
            for (int i = 0; i < n; i++) {
                double x = (i + .5) / n;
                double y = (j + .5) / n;
                boolean disc = (x - .5) * (x - .5) + (y - .75) * (y - .75) <= .15 * .15 && !(Math.abs(x - .5) < .025 && y < .85);
                start[i + n * j] = disc ? 1 : 0;
                count += disc ? 1 : 0;
            }
        }
        assertEquals(inside, count, row);
        Outcome seen = carried(n, steps, 1, scheme, (x, y, t) -> turning(x, y), start);
        assertEquals(l1, seen.l1, ROW, row);
        assertEquals(l2, seen.l2, ROW, row);
        assertEquals(max, seen.max, ROW, row);
        assertEquals(sum, seen.sum, ROW, row);
        assertEquals(area, seen.area, 2 * ROW, row);
        assertTrue(seen.min >= min && seen.max <= 1, "no new extremes, exactly");
    }

    /** O42: smooth blob, same turn, steps = 4N, scheme A. */
    @ParameterizedTest @CsvSource({"32,1.261325,.148187", "64,0.941513,.256452", "128,0.645293,.406316"})
    void o42_smoothBlob(int n, double l1, double peak) {
        float[] start = new float[n * n];
        for (int j = 0; j < n; j++) {
            for (int i = 0; i < n; i++) {
                double x = (i + .5) / n - .5;
                double y = (j + .5) / n - .75;
                start[i + n * j] = (float) Math.exp(-(x * x + y * y) / (2 * .06 * .06));
            }
        }
        Outcome seen = carried(n, 4 * n, 1, Interpolation.LINEAR, (x, y, t) -> turning(x, y), start);
        assertEquals(l1, seen.l1, ROW);
        assertEquals(peak, seen.max, ROW);
    }

    /** O46, O47: swirl that turns back, T = 2. */
    @ParameterizedTest @CsvSource({
        "O46,LINEAR,64,284,0.986902,.9113,.4190",
        "O46,CUBIC,64,284,0.372087,1.0024,.9613",
        "O47,LINEAR,128,1160,0.751529,.9542,.7767",
        "O47,CUBIC,128,1160,0.230965,.9960,.9845"})
    void o46_o47_swirlThatTurnsBack(String row, Interpolation scheme, int n, int inside, double l1, double sum, double area) {
        float[] start = new float[n * n];
        int count = 0;
        for (int j = 0; j < n; j++) {
            for (int i = 0; i < n; i++) {
                double x = (i + .5) / n - .5;
                double y = (j + .5) / n - .75;
                boolean disc = x * x + y * y <= .15 * .15;
                start[i + n * j] = disc ? 1 : 0;
                count += disc ? 1 : 0;
            }
        }
        assertEquals(inside, count, row);
        Outcome seen = carried(n, 4 * n, 2, scheme, (x, y, t) -> {
            double turn = Math.cos(Math.PI * t / 2);
            return new double[] {Math.pow(Math.sin(Math.PI * x), 2) * Math.sin(2 * Math.PI * y) * turn,
                -Math.pow(Math.sin(Math.PI * y), 2) * Math.sin(2 * Math.PI * x) * turn};
        }, start);
        assertEquals(l1, seen.l1, ROW, row);
        assertEquals(sum, seen.sum, ROW, row);
        assertEquals(area, seen.area, 2 * ROW, row);
    }
}

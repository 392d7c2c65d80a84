package org.wispwright.optimize.flow;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/** Outside checks O21-O23: what buoyancy does in the first step from rest. */
class FirstStepTest {

    private static SmokeSolver solver(GridShape shape, double buoyancy, double perSecond) {
        return new SmokeSolver(new FlowSetup(shape, new FrameRange(1, 2, perSecond), 1, Interpolation.LINEAR, Interpolation.LINEAR, Sides.CLOSED,
                buoyancy, 0, List.of()), FlowOperators.ONE);
    }

    /** O21: Batchelor (1967), 6.8: a disc of acceleration b moves off at b/2, a ball at 2b/3 (added mass 1 and 1/2); walls 8 radii away, 3 %. */
    @ParameterizedTest @CsvSource({"1,0.5", "64,0.6666667"})
    void o21_blobMovesOffWithItsAddedMass(int nz, double expected) {
        int n = nz == 1 ? 160 : 96;
        double radius = n / 16.0;
        GridShape shape = new GridShape(n, n, nz == 1 ? 1 : n, 1);
        SmokeState rest = new SmokeState(shape);
        double middle = n / 2.0;
        for (int k = 0; k < shape.nz(); k++) {
            for (int j = 0; j < n; j++) {
                for (int i = 0; i < n; i++) {
                    rest.density().values()[shape.cell(i, j, k)] = (float) shareInside(i, j, k, middle, radius, shape.isPlane());
                }
            }
        }
        SmokeState next = new SmokeState(shape);
        solver(shape, 0.8, 1).step(rest, null, new Substep(2, 0, 1), false, next);
        float[] v = next.velocity().y();
        int c = n / 2;
        int k = shape.isPlane() ? 0 : c;
        double seen = (v[shape.yFace(c, c, k)] + v[shape.yFace(c - 1, c, k)]) / 2 / 0.8;
        assertEquals(expected, seen, 0.03 * expected);
    }

    /** Share of a cell inside the disc or ball, by 4 samples each way: a staircase alone is off by percents at this radius. */
    private static double shareInside(int i, int j, int k, double middle, double radius, boolean plane) {
        int inside = 0;
        int samples = 0;
        for (int c = 0; c < (plane ? 1 : 4); c++) {
            for (int b = 0; b < 4; b++) {
                for (int a = 0; a < 4; a++) {
                    double x = i + (a + .5) / 4 - middle;
                    double y = j + (b + .5) / 4 - middle;
                    double z = plane ? 0 : k + (c + .5) / 4 - middle;
                    samples++;
                    inside += x * x + y * y + z * z <= radius * radius ? 1 : 0;
                }
            }
        }
        return inside / (double) samples;
    }

    /**
     * O22 is exact in a periodic box: (1-1/d)(b_centre - mean b) + mean b. None of our sides is periodic, so its digits cannot be reached to
     * rounding. What can: a closed box is one cell of a periodic pattern of mirror images, so with no mean flow possible the same
     * symmetric blob starts with (1-1/d) b_centre up to what the images add, which falls with the blob's share of the box.
     */
    @ParameterizedTest @CsvSource({"2,32,0.1", "2,64,0.05", "3,24,0.1", "3,32,0.06"})
    void o22_symmetricBlobInAClosedBox(int d, int n, double s) {
        GridShape shape = new GridShape(n - 1, n, d == 2 ? 1 : n - 1, 1.0 / n);
        MacVelocity push = new MacVelocity(shape);
        double mean = 0;
        for (int k = 0; k < shape.nz(); k++) {
            for (int j = 1; j < n; j++) {
                for (int i = 0; i < n - 1; i++) {
                    double x = (i + 1 - n / 2) / (double) n;
                    double y = (j - n / 2) / (double) n;
                    double z = d == 2 ? 0 : (k + 1 - n / 2) / (double) n;
                    double b = Math.exp(-(x * x + y * y + z * z) / (2 * s * s));
                    push.y()[shape.yFace(i, j, k)] = (float) b;
                    mean += b / shape.cells();
                }
            }
        }
        new Projection(shape, Sides.CLOSED, FlowOperators.ONE).apply(push);
        double seen = push.y()[shape.yFace(n / 2 - 1, n / 2, d == 2 ? 0 : n / 2 - 1)];
        assertEquals(1 - 1.0 / d, seen, 1.2 * mean + 1e-4);
        assertTrue(Math.abs(1 - seen) > 0.2, "without the pressure it would be 1");
    }

    /** O23: hydrostatic balance: uniform and layered density in a closed box stay at rest; rho 1, g 9.81, H 1, 8 cells: pressure steps 1.22625, 8.58375 in all. */
    @ParameterizedTest @ValueSource(doubles = {0.01, 1, 5})
    void o23_layersStayAtRest(double seconds) {
        GridShape shape = new GridShape(4, 8, 4, 1.0 / 8);
        SmokeState layered = new SmokeState(shape);
        for (int n = 0; n < shape.cells(); n++) {
            layered.density().values()[n] = 1 + 0.3f * (float) Math.sin(n / 4 % 8);
        }
        SmokeState next = new SmokeState(shape);
        solver(shape, 9.81, 1 / seconds).step(layered, null, new Substep(2, 0, 1), false, next);
        double push = seconds * 9.81;
        for (float v : FlowOperators.all(next.velocity())) {
            assertEquals(0, v, 1e-6 * push, "a velocity of float rounding at the most");
        }
    }

    /** O23's pressures, from the projection itself; textbook hydrostatics. */
    @Test void o23_pressureRisesByRhoGH() {
        GridShape shape = new GridShape(4, 8, 4, 1.0 / 8);
        MacVelocity push = new MacVelocity(shape);
        java.util.Arrays.fill(push.y(), 9.81f);
        Projection projection = new Projection(shape, Sides.CLOSED, FlowOperators.ONE);
        projection.apply(push);
        float[] p = projection.lastPressure();
        for (int j = 1; j < 8; j++) {
            double step = (p[shape.cell(1, j, 2)] - p[shape.cell(1, j - 1, 2)]) * shape.cellMetres();
            assertEquals(1.22625, step, 2e-6);
        }
        assertEquals(8.58375, (p[shape.cell(1, 7, 2)] - p[shape.cell(1, 0, 2)]) * shape.cellMetres(), 1e-5);
    }
}

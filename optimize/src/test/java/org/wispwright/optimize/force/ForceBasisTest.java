package org.wispwright.optimize.force;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/** The force basis: its contract, that it is solenoidal and orthonormal, and that it means the same on every grid. */
class ForceBasisTest {
    private static final Lanes ONE = new Lanes(1);
    private static final int STEPS = 9;
    private static final List<Band> BANDS = List.of(new Band(0, 0.9, 4), new Band(0.9, 2, 6));

    private static ForceBasis basis(GridShape shape) {
        return new ForceBasis(shape, STEPS, BANDS, ONE);
    }

    private static double[] unknowns(int count, long seed) {
        java.util.Random random = new java.util.Random(seed);
        double[] x = new double[count];
        for (int n = 0; n < count; n++) {
            x[n] = random.nextGaussian();
        }
        return x;
    }

    /** Outside checks O69, O70; Claerbout (1992), Earth Soundings Analysis. */
    @Nested class InABox extends PullbackContract {
        @Override protected Operator operator() {
            return operatorOf(new GridShape(9, 11, 8, 0.11));
        }
    }

    @Nested class InAPlane extends PullbackContract {
        @Override protected Operator operator() {
            return operatorOf(new GridShape(12, 10, 1, 0.1));
        }
    }

    private static Operator operatorOf(GridShape shape) {
        ForceBasis basis = basis(shape);
        int count = basis.unknowns(2);
        int faces = shape.xFaces() + shape.yFaces() + shape.zFaces();
        return new Operator("force " + shape.inWords(), count, faces, true, unknowns(count, 1), unknowns(count, 2), (in, out) -> {
            MacVelocity f = new MacVelocity(shape);
            f.fill(7);
            basis.force(in, 3, f);
            int at = 0;
            for (float[] part : new float[][] {f.x(), f.y(), f.z()}) {
                for (float v : part) {
                    out[at++] = v;
                }
            }
        }, (in, outBar, inBar) -> {
            MacVelocity f = new MacVelocity(shape);
            int at = 0;
            for (float[] part : new float[][] {f.x(), f.y(), f.z()}) {
                for (int n = 0; n < part.length; n++) {
                    part[n] = (float) outBar[at++];
                }
            }
            basis.pullback(f, 3, inBar);
        });
    }

    /** Every mode alone: largest |div| h / |f| at rounding, and nothing pushes through a wall. Curl of a potential: O2's kin. */
    @ParameterizedTest @CsvSource({"9,11,8", "16,16,16", "12,10,1"}) void modesHaveNoDivergence(int nx, int ny, int nz) {
        GridShape shape = new GridShape(nx, ny, nz, 0.1);
        ForceBasis basis = basis(shape);
        int count = basis.unknowns(2);
        assertTrue(count > 20);
        MacVelocity f = new MacVelocity(shape);
        for (int n = 0; n < count; n += 7) {
            double[] x = new double[count];
            x[n] = 1;
            basis.force(x, 4, f);
            assertTrue(relativeDivergence(f) < 2e-6, "unknown " + n + ": " + relativeDivergence(f));
            for (int k = 0; k < nz; k++) {
                for (int j = 0; j < ny; j++) {
                    assertEquals(0, f.x()[shape.xFace(0, j, k)]);
                    assertEquals(0, f.x()[shape.xFace(nx, j, k)]);
                }
            }
        }
    }

    /** O56 (Parseval): the norm of the unknowns is the root mean square force over box and range; bands add up; projecting twice changes nothing. */
    @ParameterizedTest @CsvSource({"9,11,8", "16,16,16", "12,10,1"}) void o56_unknownsAreAnOrthonormalProjection(int nx, int ny, int nz) {
        GridShape shape = new GridShape(nx, ny, nz, 0.1);
        ForceBasis basis = basis(shape);
        int count = basis.unknowns(2);
        double[] x = unknowns(count, 3);
        double[] back = new double[count];
        double squares = 0;
        double bandSquares = 0;
        MacVelocity f = new MacVelocity(shape);
        MacVelocity low = new MacVelocity(shape);
        MacVelocity high = new MacVelocity(shape);
        double[] lowX = java.util.Arrays.copyOf(x, basis.unknowns(1));
        double[] highX = x.clone();
        java.util.Arrays.fill(highX, 0, basis.unknowns(1), 0);
        for (int step = 0; step < STEPS; step++) {
            basis.force(x, step, f);
            basis.pullback(f, step, back);
            squares += squares(f);
            basis.force(lowX, step, low);
            basis.force(highX, step, high);
            bandSquares += squares(low) + squares(high);
            for (int n = 0; n < f.x().length; n += 13) {
                assertEquals(f.x()[n], low.x()[n] + high.x()[n], 2e-4, "bands add up to the whole");
            }
        }
        double norm = 0;
        for (double v : x) {
            norm += v * v;
        }
        double samples = (double) shape.cells() * STEPS;
        assertEquals(norm, squares / samples, 1e-5 * norm, "mean square force");
        assertEquals(squares, bandSquares, 1e-5 * squares, "energies add");
        for (int n = 0; n < count; n++) {
            assertEquals(x[n], back[n] / samples, 2e-5, "unknown " + n + " comes back");
        }
    }

    /** The same unknowns are the same physical field on a grid twice as fine: the difference falls with the square of the cell. */
    @Test void sameFieldOnAFinerGrid() {
        double coarse = gap(10, 20);
        double fine = gap(20, 40);
        assertTrue(fine < coarse / 3, () -> "gaps " + coarse + " then " + fine + ": order 2 makes it a quarter");
    }

    private static double gap(int n, int finer) {
        List<Band> bands = List.of(new Band(0, 2.2, 4));
        GridShape a = new GridShape(n, n, n, 1.0 / n);
        GridShape b = new GridShape(finer, finer, finer, 1.0 / finer);
        ForceBasis onA = new ForceBasis(a, STEPS, bands, ONE);
        ForceBasis onB = new ForceBasis(b, STEPS, bands, ONE);
        assertEquals(onA.unknowns(1), onB.unknowns(1));
        double[] x = unknowns(onA.unknowns(1), 5);
        MacVelocity fa = new MacVelocity(a);
        MacVelocity fb = new MacVelocity(b);
        onA.force(x, 2, fa);
        onB.force(x, 2, fb);
        double squares = 0;
        double whole = 0;
        for (int k = 0; k < n; k++) {
            for (int j = 0; j < n; j++) {
                for (int i = 0; i <= n; i++) {
                    double mean = 0;
                    for (int s = 0; s < 4; s++) {
                        mean += fb.x()[b.xFace(2 * i, 2 * j + s / 2, 2 * k + s % 2)] / 4;
                    }
                    double here = fa.x()[a.xFace(i, j, k)];
                    squares += (here - mean) * (here - mean);
                    whole += here * here;
                }
            }
        }
        return Math.sqrt(squares / whole);
    }

    private static double squares(MacVelocity f) {
        double sum = 0;
        for (float[] part : new float[][] {f.x(), f.y(), f.z()}) {
            for (float v : part) {
                sum += (double) v * v;
            }
        }
        return sum;
    }

    private static double relativeDivergence(MacVelocity f) {
        GridShape s = f.shape();
        double most = 0;
        double largest = 0;
        for (int k = 0; k < s.nz(); k++) {
            for (int j = 0; j < s.ny(); j++) {
                for (int i = 0; i < s.nx(); i++) {
                    double d = f.x()[s.xFace(i + 1, j, k)] - f.x()[s.xFace(i, j, k)] + f.y()[s.yFace(i, j + 1, k)] - f.y()[s.yFace(i, j, k)]
                            + f.z()[s.zFace(i, j, k + 1)] - f.z()[s.zFace(i, j, k)];
                    most = Math.max(most, Math.abs(d));
                    largest = Math.max(largest, Math.max(Math.abs(f.x()[s.xFace(i, j, k)]), Math.max(Math.abs(f.y()[s.yFace(i, j, k)]),
                            Math.abs(f.z()[s.zFace(i, j, k)]))));
                }
            }
        }
        return most / largest;
    }
}

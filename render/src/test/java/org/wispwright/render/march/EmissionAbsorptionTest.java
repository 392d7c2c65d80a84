package org.wispwright.render.march;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.view.Orthographic;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.ScalarGrid;

/**
 * Outside checks R1 to R20 through the march's own {@link RayKernel} in double, with samples at midpoints; R1, R2 and R12
 * through whole pictures too. Model: Max (1995), "Optical models for direct volume rendering", IEEE TVCG 1(2), 99-108.
 */
class EmissionAbsorptionTest {

    /** R1: the Bouguer-Beer-Lambert law, T = exp(-sigma L), in any number of steps. */
    @ParameterizedTest
    @CsvSource({"0.5, 2, 0.36787944117144232", "1.2, 0.75, 0.40656965974059911", "2, 1.5, 0.049787068367863943",
        "3, 0.2, 0.54881163609402643"})
    void r1_lawOfAbsorption(double sigma, double length, double expected) {
        for (int steps : new int[] {1, 7, 64}) {
            double[] tau = midpoints(steps, length, s -> sigma);
            assertEquals(expected, RayKernel.through(tau, steps), 1e-14);
            assertEquals(expected, march(tau, new double[steps])[RayKernel.THROUGH], 1e-14);
            assertEquals(expected, 1 - RayKernel.opacity(tau, steps), 1e-14);
        }
        assertEquals(1 - expected, slabPixel(sigma, length, Rgb.grey(1)).at(0, 0, 3), 1e-6);
    }

    /** R2, R3: Max (1995), a slab of one colour before a background, I = C (1-T) + I0 T, for any number of steps. */
    @ParameterizedTest
    @CsvSource({"0.5, 2, 0.8, 0.1, 0.54248439117999037", "1.2, 0.75, 0.25, 1, 0.55492724480544933"})
    void r2_r3_slabBeforeABackground(double sigma, double length, double colour, double behind, double expected) {
        for (int steps : new int[] {1, 7, 64}) {
            assertEquals(expected, seen(midpoints(steps, length, s -> sigma), filled(steps, colour), behind), 1e-14);
        }
        Picture pixel = slabPixel(sigma, length, Rgb.grey(colour));
        assertEquals(expected, pixel.at(0, 0, 0) + (1 - pixel.at(0, 0, 3)) * behind, 1e-6);
    }

    /** R4: calculus on Max (1995): dI/dsigma = (C-I0) L T, dI/dC = 1-T, dI/dI0 = T. */
    @ParameterizedTest
    @ValueSource(ints = {1, 7, 64})
    void r4_slabDerivatives(int steps) {
        double[] tau = midpoints(steps, 2, s -> 0.5);
        double[] colour = filled(steps, 0.8);
        double[] litBar = new double[steps];
        assertEquals(0.51503121764001925, sigmaBar(tau, colour, 0.1, 2.0 / steps, litBar), 1e-13);
        assertEquals(0.63212055882855768, Arrays.stream(litBar).sum(), 1e-13);
        assertEquals(0.36787944117144232, march(tau, colour)[RayKernel.THROUGH], 1e-13);
    }

    /** R5: as R4, for the slab of R3. */
    @ParameterizedTest
    @ValueSource(ints = {1, 7, 64})
    void r5_slabDerivativesAgain(int steps) {
        double[] tau = midpoints(steps, 0.75, s -> 1.2);
        assertEquals(-0.22869543360408700, sigmaBar(tau, filled(steps, 0.25), 1, 0.75 / steps, new double[steps]), 1e-13);
    }

    /** R6: Max (1995), emission q that does not depend on sigma, I = q (1-T)/sigma, with no noise at tiny sigma. */
    @ParameterizedTest
    @CsvSource({"0.3, 0.5, 2, 0.37927233529713461", "0.3, 1e-9, 2, 0.5999999994000000", "1.5, 3, 0.4, 0.34940289404389895"})
    void r6_emissionOfItsOwn(double q, double sigma, double length, double expected) {
        for (int steps : new int[] {1, 7, 64}) {
            assertEquals(expected, seen(midpoints(steps, length, s -> sigma), filled(steps, q / sigma), 0), 1e-13);
        }
    }

    /** R7: a linear ramp, T = exp(-a L^2 / 2); the midpoint rule is exact here. */
    @ParameterizedTest
    @CsvSource({"1, 1, 0.60653065971263342", "2, 1.5, 0.10539922456186434", "0.5, 3, 0.10539922456186434"})
    void r7_rampTransmittance(double a, double length, double expected) {
        for (int steps : new int[] {1, 7, 64}) {
            double[] tau = midpoints(steps, length, s -> a * s);
            assertEquals(expected, RayKernel.through(tau, steps), 1e-13);
            assertEquals(expected, march(tau, new double[steps])[RayKernel.THROUGH], 1e-13);
        }
    }

    /** R8: ramp with unit emission seen from its thin end, sqrt(pi/2a) erf(L sqrt(a/2)); order 2. */
    @ParameterizedTest
    @CsvSource({"1, 1, 0.85562439189214880", "2, 1.5, 0.85618839362490106", "0.5, 3, 1.7123767872498021"})
    void r8_rampFromTheThinEnd(double a, double length, double expected) {
        assertSecondOrder(expected, steps -> seen(midpoints(steps, length, s -> a * s), midpointColours(steps, length, s -> 1 / (a * s)), 0));
    }

    /** R9: the same from its thick end, sqrt(2/a) Dawson(L sqrt(a/2)) (Dawson: Abramowitz and Stegun 7.1); order 2. */
    @ParameterizedTest
    @CsvSource({"1, 1, 0.72477845900707633", "2, 1.5, 0.42824907108539863", "0.5, 3, 0.85649814217080"})
    void r9_rampFromTheThickEnd(double a, double length, double expected) {
        assertSecondOrder(expected, steps -> seen(midpoints(steps, length, s -> a * (length - s)),
                midpointColours(steps, length, s -> 1 / (a * (length - s))), 0));
    }

    /** R10: Gaussian blob at distance b, tau = A s sqrt(2 pi) exp(-b^2 / 2 s^2), over +-8 s. */
    @ParameterizedTest
    @CsvSource({"1, 1, 0, 2.5066282746310005, 0.081542715894749629", "1, 1, 1, 1.5203469010662808, 0.21863602872383364",
        "2, .25, 0, 1.2533141373155003, 0.28555685229871412", "2, .25, .25, 0.7601734505331404, 0.46758531705329846",
        "2, .25, .5, 0.16961762375804412, 0.84398747566307351", "5, .1, .1, 0.7601734505331404, 0.46758531705329846"})
    void r10_gaussianBlob(double amount, double s, double b, double depth, double expected) {
        int steps = 200;
        double[] tau = midpoints(steps, 16 * s, t -> amount * Math.exp(-((t - 8 * s) * (t - 8 * s) + b * b) / (2 * s * s)));
        assertEquals(depth, -Math.log(RayKernel.through(tau, steps)), 1e-10);
        assertEquals(expected, march(tau, new double[steps])[RayKernel.THROUGH], 1e-10);
    }

    /** R11: the Gaussian cut to [-1, 1], tau erf(1/(s sqrt 2)). */
    @Test
    void r11_gaussianSegment() {
        int steps = 40_000;
        double[] tau = midpoints(steps, 2, t -> 2 * Math.exp(-(t - 1) * (t - 1) / (2 * 0.25 * 0.25)));
        assertEquals(1.2532347492852287, -Math.log(RayKernel.through(tau, steps)), 1e-10);
    }

    /** R12: geometry of a unit sphere, sigma 2, ray at distance b: by its chord, and as voxels in a real picture. */
    @ParameterizedTest
    @CsvSource({"0, 2, 0.018315638888734180", "0.5, 1.7320508075688773, 0.031301113244932889", "0.8, 1.2, 0.090717953289412503",
        "0.9, 0.87177978870813471, 0.17489673281829166"})
    void r12_unitSphere(double b, double chord, double expected) {
        assertEquals(chord, 2 * Math.sqrt(1 - b * b), 1e-15);
        for (int steps : new int[] {1, 40}) {
            double[] tau = midpoints(steps, chord, s -> 2);
            assertEquals(expected, march(tau, new double[steps])[RayKernel.THROUGH], 1e-12);
        }
        int n = 64;
        double h = 2.4 / n;
        GridShape box = new GridShape(n, n, n, h, -1.2, -1.2, -1.2);
        ScalarGrid ball = new ScalarGrid(box);
        for (int c = 0; c < box.cells(); c++) {
            double x = -1.2 + h * (c % n + 0.5);
            double y = -1.2 + h * (c / n % n + 0.5);
            double z = -1.2 + h * (c / n / n + 0.5);
            ball.values()[c] = x * x + y * y + z * z < 1 ? 1 : 0;
        }
        Look look = new Look(2, Rgb.grey(1), Rgb.grey(1), Optional.empty());
        View view = new View("side", new Orthographic(0.01, 0.01), new Vec3(b, 0, 5), new Vec3(b, 0, 0), new Vec3(0, 1, 0), new Raster(1, 1));
        float alpha = pixel(ball, view, look, h / 2).at(0, 0, 3);
        double gotChord = -Math.log(1 - alpha) / 2;
        assertEquals(chord, gotChord, 2 * h, "two voxels of chord");
    }

    /** R13: two slabs front to back before 0.5; Porter and Duff's over is the order along the ray. */
    @Test
    void r13_twoSlabsInOrder() {
        assertEquals(0.66275411969744604, seen(new double[] {0.7, 0.3}, new double[] {0.9, 0.2}, 0.5), 1e-14);
        assertEquals(0.57142097800862558, seen(new double[] {0.3, 0.7}, new double[] {0.2, 0.9}, 0.5), 1e-14);
    }

    /** R14: exact adjoint of three samples, dI/dsigma_i = h T_i exp(-sigma_i h) (C_i - what lies behind i). */
    @Test
    void r14_pullbackOfThreeSamples() {
        double h = 0.5;
        double[] tau = {1 * h, 2 * h, 0.5 * h};
        double[] colour = {1, 0.5, 0.25};
        assertEquals(0.6322634329340536, seen(tau, colour, 0.2), 1e-14);
        double[] tauBar = new double[3];
        double[] litBar = new double[3];
        // The background enters as bg (1 - alpha): alphaBar is -bg.
        RayKernel.pullback(tau, colour, 3, -0.2, 1, new double[3], new double[3], tauBar, litBar);
        double[] sigmaBar = Arrays.stream(tauBar).map(t -> h * t).toArray();
        assertArrayEquals(new double[] {0.1838682835329732, 0.03223561860481486, 0.004344348586261128}, sigmaBar, 1e-14);
        assertArrayEquals(new double[] {0.3934693402873666, 0.3834004995642036, 0.0493562166979847}, litBar, 1e-14);
        assertEquals(0.1737739434504451, march(tau, colour)[RayKernel.THROUGH], 1e-14);
    }

    /** R15: depth of sigma = exp(s) on [0,1] by samples at the left ends: order 1. This is what midpoints are not. */
    @Test
    void r15_leftSumIsOfOrderOne() {
        double[] expected = {-1.0515585057e-1, -5.3137007018e-2, -2.6708321712e-2, -1.3389118394e-2, -6.7032987680e-3};
        double[] ratios = {1.979, 1.990, 1.995, 1.997};
        assertErrors(expected, 8, 1e-9, steps -> depth(weighted(steps, n -> 1, n -> n)));
        assertRatios(expected, ratios, 8, steps -> depth(weighted(steps, n -> 1, n -> n)));
    }

    /** R16: the same at midpoints, where the march takes its samples: order 2. */
    @Test
    void r16_midpointsAreOfOrderTwo() {
        double[] expected = {-1.1181634634e-3, -2.7963640638e-4, -6.9915075186e-5, -1.7479142182e-5, -4.3698088825e-6};
        assertErrors(expected, 8, 1e-9, steps -> depth(midpoints(steps, 1, Math::exp)));
        assertRatios(expected, new double[] {3.9986, 3.9996, 3.9999, 3.99998}, 8, steps -> depth(midpoints(steps, 1, Math::exp)));
    }

    /** R17: the trapezoid rule: order 2 and the opposite sign to midpoints. */
    @Test
    void r17_trapezoid() {
        double[] expected = {2.2367637053e-3, 5.5930012095e-4, 1.3983185728e-4, 3.4958391048e-5, 8.7396244333e-6};
        assertErrors(expected, 8, 1e-9, steps -> depth(trapezoid(steps)));
        double ratio = (depth(trapezoid(8)) - EXACT_DEPTH) / (depth(trapezoid(16)) - EXACT_DEPTH);
        assertEquals(3.9992, ratio, 5e-5);
        assertTrue((depth(trapezoid(8)) - EXACT_DEPTH) * (depth(midpoints(8, 1, Math::exp)) - EXACT_DEPTH) < 0);
    }

    /** R18: Simpson's rule: order 4. */
    @Test
    void r18_simpson() {
        double[] expected = {2.3262408519e-6, 1.4559284667e-7, 9.1027267946e-9, 5.6896998e-10};
        assertErrors(expected, 8, 1e-6, steps -> depth(simpson(steps)));
        assertRatios(expected, new double[] {15.98, 15.99, 16.00}, 8, steps -> depth(simpson(steps)));
    }

    /** R19: sigma = exp(s), colour s, eye at 0, exact 0.36605315194589109: with opacity 1 - exp(-sigma h) the order is 2. */
    @Test
    void r19_stepOpacityGivesOrderTwo() {
        double[] expected = {1.61375386e-4, 4.03534445e-5, 1.00889610e-5, 2.52227773e-6, 6.30571776e-7};
        int steps = 16;
        double previous = 0;
        for (double error : expected) {
            double got = seen(midpoints(steps, 1, Math::exp), midpointColours(steps, 1, s -> s), 0) - FULL_INTEGRAL;
            assertEquals(error, Math.abs(got), 1e-6 * error, steps + " steps");
            if (previous != 0) {
                assertEquals(3.999, previous / got, 2e-3);
            }
            previous = got;
            steps *= 2;
        }
    }

    /** R20: the same with the first-order shortcut sigma h as opacity, given to the kernel as tau = -ln(1 - sigma h): order 1. */
    @Test
    void r20_theShortcutWouldGiveOrderOne() {
        double[] expected = {5.87061339e-3, 2.86574744e-3, 1.41624330e-3, 7.04053243e-4, 3.51020340e-4};
        int steps = 16;
        double previous = 0;
        for (double error : expected) {
            double[] tau = Arrays.stream(midpoints(steps, 1, Math::exp)).map(t -> -Math.log1p(-t)).toArray();
            double got = seen(tau, midpointColours(steps, 1, s -> s), 0) - FULL_INTEGRAL;
            assertEquals(error, Math.abs(got), 1e-6 * error, steps + " steps");
            if (previous != 0) {
                assertTrue(previous / got > 2.0 && previous / got < 2.06, "ratio " + previous / got);
            }
            previous = got;
            steps *= 2;
        }
    }

    private static final double EXACT_DEPTH = 1.718281828459045;
    private static final double FULL_INTEGRAL = 0.36605315194589109;

    /** A number that depends on how many steps were taken. */
    private interface BySteps {
        double at(int steps);
    }

    private static void assertErrors(double[] expected, int steps, double relative, BySteps value) {
        for (double error : expected) {
            assertEquals(error, value.at(steps) - EXACT_DEPTH, relative * Math.abs(error), steps + " steps");
            steps *= 2;
        }
    }

    private static void assertRatios(double[] expected, double[] ratios, int steps, BySteps value) {
        for (int n = 0; n + 1 < expected.length; n++) {
            double ratio = (value.at(steps) - EXACT_DEPTH) / (value.at(2 * steps) - EXACT_DEPTH);
            assertEquals(ratios[n], ratio, 6e-4 * ratios[n], steps + " to " + 2 * steps);
            steps *= 2;
        }
    }

    private static void assertSecondOrder(double expected, BySteps value) {
        double coarse = Math.abs(value.at(64) - expected);
        double fine = Math.abs(value.at(256) - expected);
        double order = Math.log(coarse / fine) / Math.log(4);
        assertTrue(order > 1.9 && order < 2.1, "order " + order + ", errors " + coarse + ", " + fine);
        assertEquals(expected, value.at(4096), 1e-6);
    }

    private static double[] march(double[] tau, double[] colour) {
        double[] sums = new double[3];
        RayKernel.march(tau, colour, tau.length, sums);
        return sums;
    }

    private static double seen(double[] tau, double[] colour, double behind) {
        double[] sums = march(tau, colour);
        return sums[RayKernel.SHINE] + behind * sums[RayKernel.THROUGH];
    }

    private static double depth(double[] tau) {
        return -Math.log(RayKernel.through(tau, tau.length));
    }

    /** Derivative by a sigma that all samples share. */
    private static double sigmaBar(double[] tau, double[] colour, double behind, double h, double[] litBar) {
        int n = tau.length;
        double[] tauBar = new double[n];
        RayKernel.pullback(tau, colour, n, -behind, 1, new double[n], new double[n], tauBar, litBar);
        return h * Arrays.stream(tauBar).sum();
    }

    private static double[] midpoints(int steps, double length, DoubleUnaryOperator sigma) {
        double h = length / steps;
        double[] tau = new double[steps];
        for (int n = 0; n < steps; n++) {
            tau[n] = h * sigma.applyAsDouble((n + 0.5) * h);
        }
        return tau;
    }

    private static double[] midpointColours(int steps, double length, DoubleUnaryOperator colour) {
        return Arrays.stream(midpoints(steps, length, colour)).map(v -> v * steps / length).toArray();
    }

    private static double[] weighted(int count, DoubleUnaryOperator weight, DoubleUnaryOperator place) {
        return weighted(count, count, weight, place);
    }

    private static double[] weighted(int steps, int count, DoubleUnaryOperator weight, DoubleUnaryOperator place) {
        double[] tau = new double[count];
        for (int n = 0; n < count; n++) {
            tau[n] = weight.applyAsDouble(n) / steps * Math.exp(place.applyAsDouble(n) / steps);
        }
        return tau;
    }

    private static double[] trapezoid(int steps) {
        return weighted(steps, steps + 1, n -> n == 0 || n == steps ? 0.5 : 1, n -> n);
    }

    private static double[] simpson(int steps) {
        return weighted(steps, steps + 1, n -> n == 0 || n == steps ? 1 / 3.0 : n % 2 == 1 ? 4 / 3.0 : 2 / 3.0, n -> n);
    }

    private static double[] filled(int count, double value) {
        double[] values = new double[count];
        Arrays.fill(values, value);
        return values;
    }

    /** One pixel of an even slab seen square on: the whole door, in float. */
    private static Picture slabPixel(double sigma, double length, Rgb colour) {
        GridShape box = new GridShape(3, 3, 5, length / 5);
        ScalarGrid smoke = new ScalarGrid(box);
        smoke.fill(1);
        Vec3 middle = MarchScenes.middle(box);
        View view = new View("square on", new Orthographic(0.01, 0.01), middle.plus(new Vec3(0, 0, 9)), middle, new Vec3(0, 1, 0), new Raster(1, 1));
        return pixel(smoke, view, new Look(sigma, Rgb.grey(1), colour, Optional.empty()), length / 7);
    }

    private static Picture pixel(ScalarGrid smoke, View view, Look look, double step) {
        Picture out = view.raster().picture();
        try (Lanes lanes = new Lanes(1)) {
            new RayMarcher(smoke.shape(), view, step, lanes).picture(smoke, look, out);
        }
        return out;
    }
}

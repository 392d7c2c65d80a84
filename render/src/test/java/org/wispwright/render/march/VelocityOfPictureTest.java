package org.wispwright.render.march;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.Orthographic;
import org.wispwright.render.view.Pinhole;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;
import org.wispwright.render.volume.ScalarGrid;

/** Motion across the picture where it can be worked out by hand, and against what two renders show. */
class VelocityOfPictureTest {
    private static final GridShape BOX = new GridShape(24, 20, 16, 0.25, -3, -2.5, -2);
    private static final View PLAN = new View("plan", new Orthographic(8, 6), new Vec3(0, 0, 10), new Vec3(0, 0, 0), new Vec3(0, 1, 0),
            new Raster(48, 36));
    private static final View EYE = new View("eye", new Pinhole(40, 32, 24), new Vec3(0, 0, 10), new Vec3(0, 0, 0), new Vec3(0, 1, 0),
            new Raster(48, 36));

    /** By hand: 2 m/s to the right in a field 6 m high is 1/3 height a second; 3 m/s upwards -1/2; along the axis nothing is seen. */
    @Test
    void uniformVelocityOrthographic() {
        float[] motion = motion(PLAN, MarchScenes.smoke(BOX, true, 5), uniform(2, 3, -7));
        int smoky = 0;
        for (int p = 0; p < motion.length; p += 3) {
            assertEquals(motion[p + 2] > 0 ? 1 / 3.0 : 0, motion[p], 1e-6);
            assertEquals(motion[p + 2] > 0 ? -0.5 : 0, motion[p + 1], 1e-6);
            smoky += motion[p + 2] > 0 ? 1 : 0;
        }
        assertTrue(smoky > 100);
    }

    /** Turned by a right angle about the axis, with up along x: right becomes -y and above x. */
    @Test
    void theViewsOwnAxesCount() {
        View turned = new View("turned", new Orthographic(8, 6), new Vec3(0, 0, 10), new Vec3(0, 0, 0), new Vec3(1, 0, 0), new Raster(48,
                36));
        float[] motion = motion(turned, MarchScenes.smoke(BOX, true, 5), uniform(2, 3, 0));
        int middle = 3 * (24 + 48 * 18);
        assertEquals(-0.5, motion[middle], 1e-6);
        assertEquals(-1 / 3.0, motion[middle + 1], 1e-6);
    }

    /** The weight is the pixel's alpha, the marcher's own. */
    @Test
    void theWeightIsAlpha() {
        ScalarGrid smoke = MarchScenes.smoke(BOX, true, 8);
        for (View view : new View[] {PLAN, EYE}) {
            float[] motion = motion(view, smoke, uniform(1, 1, 1));
            try (Lanes lanes = new Lanes(1)) {
                Picture picture = view.raster().picture();
                new RayMarcher(BOX, view, 0.1, lanes).picture(smoke, MarchScenes.PLAIN, picture);
                for (int p = 0; p < motion.length / 3; p++) {
                    assertEquals(picture.rgba()[4 * p + 3], motion[3 * p + 2], 1e-6);
                }
            }
        }
    }

    /**
     * A sheet one cell thick, far thinner than its distance, in the plane z = z0: its points are at one depth, so the motion is the
     * derivative of {@link View#project} there; taken by central differences (Dennis and Schnabel 1983, 5.6).
     */
    @Test
    void aThinSheetMovesAsItsProjectionDoes() {
        for (int k : new int[] {0, 7, 15}) {
            ScalarGrid smoke = new ScalarGrid(BOX);
            for (int n = 0; n < BOX.nx() * BOX.ny(); n++) {
                smoke.values()[n + BOX.nx() * BOX.ny() * k] = 0.2f;
            }
            Vec3 u = new Vec3(0.7, -1.1, 2.3);
            float[] motion = motion(EYE, smoke, uniform(u.x(), u.y(), u.z()));
            double z0 = -2 + (k + 0.5) * 0.25;
            for (int[] pixel : new int[][] {{24, 18}, {12, 9}, {35, 20}}) {
                double depth = 10 - z0;
                Vec3 point = new Vec3(depth * ((pixel[0] + 0.5) / 48 - 0.5) * 32 / 40, depth * (0.5 - (pixel[1] + 0.5) / 36) * 24 / 40, z0);
                View.ImagePoint back = EYE.project(point.plus(u.times(-1e-4))).orElseThrow();
                View.ImagePoint forth = EYE.project(point.plus(u.times(1e-4))).orElseThrow();
                int p = 3 * (pixel[0] + 48 * pixel[1]);
                assertEquals((forth.x() - back.x()) / 36 / 2e-4, motion[p], 2e-3, "x at depth " + depth);
                assertEquals((forth.y() - back.y()) / 36 / 2e-4, motion[p + 1], 2e-3, "y at depth " + depth);
            }
        }
    }

    /** Two layers with opposite velocities: by hand, the near one of opacity a hides that much of the far one. */
    @Test
    void theNearerLayerHidesTheFarther() {
        ScalarGrid smoke = new ScalarGrid(BOX);
        MacVelocity velocity = new MacVelocity(BOX);
        int layer = BOX.nx() * BOX.ny();
        for (int n = 0; n < layer; n++) {
            smoke.values()[n + layer * 12] = 1.5f;
            smoke.values()[n + layer * 3] = 1.5f;
        }
        for (int k = 8; k < 16; k++) {
            for (int n = 0; n < (BOX.nx() + 1) * BOX.ny(); n++) {
                velocity.x()[n + (BOX.nx() + 1) * BOX.ny() * k] = 6;
            }
        }
        float[] motion = motion(PLAN, smoke, velocity);
        double alpha = 1 - Math.exp(-1.3 * 1.5 * 0.25);
        // The far layer adds alpha (1 - alpha) and does not move; 6 m/s are one height a second.
        assertEquals(alpha / (alpha + alpha * (1 - alpha)), motion[3 * (24 + 48 * 18)], 2e-4);
    }

    /**
     * A soft ball that moves without changing: the weighted mean of the motion over the picture, times the time, is how far the centroid
     * of its image goes. For thin smoke, whose opacity is the integral of density, to the size of that opacity; orthographic.
     */
    @Test
    void aMovingBallsImageGoesWhereItIsSaidTo() {
        for (View view : new View[] {PLAN, EYE}) {
            double[] u = {0.8, -0.6, 1.5};
            double dt = 0.25;
            float[] motion = motion(view, ball(-0.3 + u[0] * dt / 2, 0.2 + u[1] * dt / 2, u[2] * dt / 2), uniform(u[0], u[1], u[2]));
            double[] before = centroid(view, ball(-0.3, 0.2, 0));
            double[] after = centroid(view, ball(-0.3 + u[0] * dt, 0.2 + u[1] * dt, u[2] * dt));
            double x = 0;
            double y = 0;
            double all = 0;
            for (int p = 0; p < motion.length; p += 3) {
                x += motion[p] * motion[p + 2];
                y += motion[p + 1] * motion[p + 2];
                all += motion[p + 2];
            }
            double went = Math.hypot(after[0] - before[0], after[1] - before[1]);
            assertTrue(went > 0.03, "it moves by " + went + " heights");
            assertEquals(after[0] - before[0], dt * x / all, 0.02 * went, view.name());
            assertEquals(after[1] - before[1], dt * y / all, 0.02 * went, view.name());
        }
    }

    @Test
    void sameBitsForOneTwoAndThreeThreads() {
        ScalarGrid smoke = MarchScenes.smoke(BOX, true, 9);
        MacVelocity velocity = uniform(1, 2, 3);
        View view = MarchScenes.pinhole(BOX, 71, 43);
        float[] first = null;
        for (int threads = 1; threads <= 3; threads++) {
            try (Lanes lanes = new Lanes(threads)) {
                float[] motion = new float[3 * 71 * 43];
                new VelocityOfPicture(BOX, view, 0.1, lanes).motion(smoke, velocity, 1.3, motion);
                first = first == null ? motion : first;
                assertArrayEquals(first, motion);
            }
        }
    }

    @Test
    void whatDoesNotFitIsRefused() {
        try (Lanes lanes = new Lanes(1)) {
            VelocityOfPicture motion = new VelocityOfPicture(BOX, PLAN, 0.1, lanes);
            ScalarGrid other = new ScalarGrid(new GridShape(2, 2, 2, 1));
            float[] out = new float[3 * 48 * 36];
            assertThrows(IllegalArgumentException.class, () -> motion.motion(other, uniform(0, 0, 0), 1, out));
            assertThrows(IllegalArgumentException.class, () -> motion.motion(new ScalarGrid(BOX), uniform(0, 0, 0), Double.NaN, out));
            assertThrows(IllegalArgumentException.class, () -> motion.motion(new ScalarGrid(BOX), uniform(0, 0, 0), 1, new float[3]));
            assertThrows(IllegalArgumentException.class, () -> new VelocityOfPicture(BOX, PLAN, Double.NaN, lanes));
        }
    }

    private static float[] motion(View view, ScalarGrid smoke, MacVelocity velocity) {
        try (Lanes lanes = new Lanes(2)) {
            float[] motion = new float[3 * view.raster().width() * view.raster().height()];
            new VelocityOfPicture(BOX, view, 0.1, lanes).motion(smoke, velocity, MarchScenes.PLAIN.extinction(), motion);
            return motion;
        }
    }

    private static MacVelocity uniform(double x, double y, double z) {
        MacVelocity velocity = new MacVelocity(BOX);
        Arrays.fill(velocity.x(), (float) x);
        Arrays.fill(velocity.y(), (float) y);
        Arrays.fill(velocity.z(), (float) z);
        return velocity;
    }

    /** Thin smoke, a Gaussian of 0.5 m around a place. */
    private static ScalarGrid ball(double x, double y, double z) {
        ScalarGrid smoke = new ScalarGrid(BOX);
        for (int k = 0; k < BOX.nz(); k++) {
            for (int j = 0; j < BOX.ny(); j++) {
                for (int i = 0; i < BOX.nx(); i++) {
                    double dx = -3 + (i + 0.5) * 0.25 - x;
                    double dy = -2.5 + (j + 0.5) * 0.25 - y;
                    double dz = -2 + (k + 0.5) * 0.25 - z;
                    smoke.values()[BOX.cell(i, j, k)] = (float) (0.01 * Math.exp(-(dx * dx + dy * dy + dz * dz) / 0.5));
                }
            }
        }
        return smoke;
    }

    private static double[] centroid(View view, ScalarGrid smoke) {
        try (Lanes lanes = new Lanes(1)) {
            Picture picture = view.raster().picture();
            new RayMarcher(BOX, view, 0.1, lanes).picture(smoke, MarchScenes.PLAIN, picture);
            double[] sums = new double[3];
            for (int p = 0; p < picture.width() * picture.height(); p++) {
                double alpha = picture.rgba()[4 * p + 3];
                sums[0] += alpha * (p % picture.width() + 0.5) / picture.height();
                sums[1] += alpha * (p / picture.width() + 0.5) / picture.height();
                sums[2] += alpha;
            }
            return new double[] {sums[0] / sums[2], sums[1] / sums[2]};
        }
    }
}

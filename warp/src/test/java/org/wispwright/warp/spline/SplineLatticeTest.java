package org.wispwright.warp.spline;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.api.Test;

/** The lattice against the spline at every pixel (the slow twin), and the jet against differences. */
class SplineLatticeTest {
    private static final double[][] ENDS = {{0.3, 0.3}, {0.8, 0.35}, {0.5, 0.8}, {0.55, 0.45}, {1.2, 0.6}, {0.1, 0.9}};
    private static final double[][] STARTS = {{0.38, 0.33}, {0.7, 0.3}, {0.5, 0.8}, {0.5, 0.55}, {1.2, 0.6}, {0.15, 0.85}};

    @ParameterizedTest
    @CsvSource({"1,1", "37,23", "480,360", "1013,701"})
    void withinItsTolerance(int width, int height) {
        ThinPlateSpline spline = ThinPlateSpline.fit(ENDS, STARTS);
        double[] dx = new double[width * height];
        double[] dy = new double[width * height];
        SplineLattice lattice = new SplineLattice(spline, height);
        lattice.displacements(0, 0, width, height, dx, dy);
        double worst = 0;
        for (int p = 0; p < width * height; p++) {
            double px = (p % width + 0.5) / height;
            double py = (p / width + 0.5) / height;
            worst = Math.max(worst, Math.hypot(dx[p] - (spline.x(px, py) - px) * height, dy[p] - (spline.y(px, py) - py) * height));
        }
        assertTrue(worst <= SplineLattice.TOLERANCE + 1e-9, "worst " + worst + " of a pixel");
        if (height > 300) {
            assertTrue(worst > 1e-7, "no square was interpolated, so this proves nothing: " + worst);
        }
        // A window has the bits of the whole, in any order.
        int w = Math.max(1, width - 21);
        int h = Math.max(1, height - 18);
        double[] partX = new double[w * h];
        double[] partY = new double[w * h];
        lattice.displacements(width - w, height - h, w, h, partX, partY);
        for (int n = 0; n < w * h; n++) {
            assertEquals(dx[width - w + n % w + width * (height - h + n / w)], partX[n]);
        }
    }

    /** Central differences of step 1e-4, error about 1e-8 times the third derivative. */
    @Test
    void slopesEqualDifferences() {
        ThinPlateSpline spline = ThinPlateSpline.fit(ENDS, STARTS);
        double[] jet = new double[8];
        spline.jet(0.62, 0.51, jet);
        double e = 1e-4;
        assertEquals(spline.x(0.62, 0.51), jet[0], 1e-14);
        assertEquals((spline.x(0.62 + e, 0.51) - spline.x(0.62 - e, 0.51)) / (2 * e), jet[1], 1e-6);
        assertEquals((spline.y(0.62, 0.51 + e) - spline.y(0.62, 0.51 - e)) / (2 * e), jet[6], 1e-6);
        assertEquals((spline.x(0.62 + e, 0.51 + e) - spline.x(0.62 + e, 0.51 - e) - spline.x(0.62 - e, 0.51 + e)
                + spline.x(0.62 - e, 0.51 - e)) / (4 * e * e), jet[3], 1e-4);
    }
}

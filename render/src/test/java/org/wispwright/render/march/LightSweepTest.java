package org.wispwright.render.march;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.ScalarGrid;

/** The light's way through the smoke: contract, closed forms, slow twin. */
class LightSweepTest extends PullbackContract {
    @Override
    protected Operator operator() {
        GridShape box = new GridShape(6, 5, 7, 0.3);
        LightSweep sweep = new LightSweep(box, new Vec3(-0.7, 0.4, 1));
        double extinction = 0.9;
        double[] point = MarchScenes.widen(MarchScenes.smoke(box, false, 11).values());
        double[] direction = random(point.length, 12);
        for (int n = 0; n < direction.length; n++) {
            direction[n] *= 0.5;
        }
        return new Operator("light sweep", point.length, point.length, false, point, direction, (in, to) -> {
            ScalarGrid lit = lit(sweep, box, in, extinction);
            System.arraycopy(MarchScenes.widen(lit.values()), 0, to, 0, to.length);
        }, (in, outBar, inBar) -> {
            ScalarGrid lit = lit(sweep, box, in, extinction);
            ScalarGrid bar = new ScalarGrid(box, MarchScenes.narrow(inBar));
            sweep.pullback(extinction, lit, new ScalarGrid(box, MarchScenes.narrow(outBar)), bar);
            System.arraycopy(MarchScenes.widen(bar.values()), 0, inBar, 0, inBar.length);
        });
    }

    /** Bouguer-Beer-Lambert law: through even smoke, light along an axis arrives as exp(-sigma depth) at any depth. */
    @ParameterizedTest
    @CsvSource({"1,0,0", "-2,0,0", "0,3,0", "0,-1,0", "0,0,1", "0,0,-0.5"})
    void evenSmokeFollowsTheLaw(double x, double y, double z) {
        GridShape box = new GridShape(4, 5, 6, 0.25);
        double[] density = new double[box.cells()];
        java.util.Arrays.fill(density, 0.8);
        ScalarGrid lit = lit(new LightSweep(box, new Vec3(x, y, z)), box, density, 1.5);
        int[] size = {4, 5, 6};
        double[] w = {x, y, z};
        for (int n = 0; n < box.cells(); n++) {
            int[] cell = {n % 4, n / 4 % 5, n / 20};
            for (int a = 0; a < 3; a++) {
                if (w[a] != 0) {
                    double depth = 0.25 * ((w[a] > 0 ? size[a] - cell[a] : cell[a] + 1) - 0.5);
                    assertEquals(Math.exp(-1.5 * 0.8 * depth), lit.values()[n], 1e-6);
                }
            }
        }
    }

    /** As outside check R10 (51 and 111 cells: the line then cuts the last slice at the same fraction of a cell): a Gaussian blob's depth along any line to infinity from its middle is half of A s sqrt(2 pi). */
    @Test
    void obliqueLightThroughABlobConvergesWithOrderTwo() {
        double exact = 0.5 * 1.2 * 0.4 * Math.sqrt(2 * Math.PI);
        double coarse = blobDepthError(51, exact);
        double fine = blobDepthError(111, exact);
        double order = Math.log(coarse / fine) / Math.log(111.0 / 51);
        assertTrue(order > 1.8 && order < 2.2, "order " + order + ", errors " + coarse + ", " + fine);
    }

    /** Against the same sum in double, cell by cell, with no buffers. */
    @ParameterizedTest
    @CsvSource({"1,1,1, 1,2,3", "2,3,5, -1,0.5,0.2", "5,2,3, 0.9,-1,0.9", "4,4,1, 1,1,0", "3,4,4, -0.3,0.2,-1", "4,3,2, 1,-1,1"})
    void sweepEqualsPlain(int nx, int ny, int nz, double x, double y, double z) {
        GridShape box = new GridShape(nx, ny, nz, 0.4);
        double[] density = MarchScenes.widen(MarchScenes.smoke(box, false, 42).values());
        Look look = new Look(1.1, Rgb.grey(1), Rgb.BLACK, Optional.of(new Light(new Vec3(x, y, z), Rgb.grey(1))));
        double[] plain = new MarchPlain(box, density, look).lit();
        ScalarGrid lit = lit(new LightSweep(box, new Vec3(x, y, z)), box, density, 1.1);
        for (int n = 0; n < plain.length; n++) {
            assertEquals(plain[n], lit.values()[n], 1e-6, "cell " + n + " of " + box.inWords());
        }
    }

    private static double blobDepthError(int cells, double exact) {
        double h = 4.0 / cells;
        GridShape box = new GridShape(cells, cells, cells, h, -2, -2, -2);
        double[] density = new double[box.cells()];
        for (int n = 0; n < density.length; n++) {
            double x = -2 + h * (n % cells + 0.5);
            double y = -2 + h * (n / cells % cells + 0.5);
            double z = -2 + h * (n / cells / cells + 0.5);
            density[n] = 1.2 * Math.exp(-(x * x + y * y + z * z) / (2 * 0.4 * 0.4));
        }
        ScalarGrid lit = lit(new LightSweep(box, new Vec3(0.5, 1, -0.3)), box, density, 1);
        return Math.abs(-Math.log(lit.at(cells / 2, cells / 2, cells / 2)) - exact);
    }

    private static ScalarGrid lit(LightSweep sweep, GridShape box, double[] density, double extinction) {
        ScalarGrid lit = new ScalarGrid(box);
        try (Lanes lanes = new Lanes(1)) {
            sweep.transmittance(new ScalarGrid(box, MarchScenes.narrow(density)), extinction, lit, lanes);
        }
        return lit;
    }
}

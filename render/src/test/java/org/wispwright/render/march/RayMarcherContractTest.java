package org.wispwright.render.march;

import java.util.Random;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Nested;
import org.wispwright.render.contract.Operator;
import org.wispwright.render.contract.PullbackContract;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.ScalarGrid;

/** The march owes what every operator owes, for both lenses, with and without a light. */
class RayMarcherContractTest {
    private static final GridShape BOX = new GridShape(7, 9, 6, 0.2, -0.4, 0.1, 0.3);
    private static Lanes lanes;

    @BeforeAll
    static void start() {
        lanes = new Lanes(2);
    }

    @AfterAll
    static void stop() {
        lanes.close();
    }

    /** Rounding of single pixels is a few 1e-8 of each and has no common sign, so over a whole picture it is well below the usual 2e-7. */
    abstract static class MarchContract extends PullbackContract {
        @Override
        protected double noise() {
            return 1e-7;
        }
    }

    @Nested
    class PinholeUnlit extends MarchContract {
        @Override
        protected Operator operator() {
            return march("pinhole, no light", BOX, MarchScenes.pinhole(BOX, 16, 12), MarchScenes.PLAIN);
        }
    }

    @Nested
    class PinholeLit extends MarchContract {
        @Override
        protected Operator operator() {
            return march("pinhole, light", BOX, MarchScenes.pinhole(BOX, 16, 12), MarchScenes.lit(0.4, 1, -0.7));
        }
    }

    @Nested
    class OrthographicUnlit extends MarchContract {
        @Override
        protected Operator operator() {
            return march("orthographic, no light", BOX, MarchScenes.orthographic(BOX, 11, 13), MarchScenes.PLAIN);
        }
    }

    @Nested
    class OrthographicLit extends MarchContract {
        @Override
        protected Operator operator() {
            return march("orthographic, light", BOX, MarchScenes.orthographic(BOX, 11, 13), MarchScenes.lit(-1, 0.3, 0.2));
        }
    }

    @Nested
    class PlaneLit extends MarchContract {
        @Override
        protected Operator operator() {
            GridShape plane = new GridShape(9, 8, 1, 0.2);
            return march("plane, light", plane, MarchScenes.pinhole(plane, 15, 12), MarchScenes.lit(0.6, 1, 0));
        }
    }

    /** Rays so deep that alpha is near 1 everywhere: the branch that sums a ray again. */
    @Nested
    class DenseUnlit extends MarchContract {
        @Override
        protected Operator operator() {
            Look dense = new Look(6, MarchScenes.PLAIN.albedo(), MarchScenes.PLAIN.ambient(), MarchScenes.PLAIN.light());
            return march("dense, no light", BOX, MarchScenes.pinhole(BOX, 16, 12), dense);
        }
    }

    private static Operator march(String name, GridShape box, View view, Look look) {
        RayMarcher marcher = new RayMarcher(box, view, 0.13, lanes);
        double[] point = MarchScenes.widen(MarchScenes.smoke(box, false, 5).values());
        for (int n = 0; n < point.length; n++) {
            point[n] += 0.3;
        }
        double[] direction = new double[point.length];
        Random random = new Random(6);
        for (int n = 0; n < direction.length; n++) {
            direction[n] = 0.3 * (random.nextDouble() - 0.2);
        }
        Picture out = view.raster().picture();
        return new Operator(name, point.length, out.rgba().length, false, point, direction, (in, to) -> {
            marcher.picture(new ScalarGrid(box, MarchScenes.narrow(in)), look, out);
            System.arraycopy(MarchScenes.widen(out.rgba()), 0, to, 0, to.length);
        }, (in, outBar, inBar) -> {
            ScalarGrid density = new ScalarGrid(box, MarchScenes.narrow(in));
            ScalarGrid bar = new ScalarGrid(box, MarchScenes.narrow(inBar));
            marcher.picture(density, look, out);
            marcher.pullback(density, look, out, MarchScenes.narrow(outBar), bar);
            System.arraycopy(MarchScenes.widen(bar.values()), 0, inBar, 0, inBar.length);
        });
    }
}

package org.wispwright.optimize.solve;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.wispwright.optimize.flow.Clock;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.optimize.flow.Interpolation;
import org.wispwright.optimize.flow.Side;
import org.wispwright.optimize.flow.Sides;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.flow.Source;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.march.Look;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.view.Orthographic;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.warp.loss.LossChoice;
import org.wispwright.warp.loss.LossKind;
import org.wispwright.warp.loss.PictureLoss;

/**
 * A puff of smoke is wanted three times its own width aside, in the plane, 64 x 32 cells: given off in the first three frames, wanted on
 * the last but one of 24. The scene and its bounds are ours; that squared error has no slope there is by hand (two bumps that do not meet:
 * to move one changes no product of the two), that transport has one is Bonneel et al. (2015).
 */
class CarriedPuffTest {
    private static final long MEMORY = 64L << 20;
    private static final int NOTED = 1023;
    private static final GridShape BOX = new GridShape(64, 32, 1, 2.0 / 32);
    private static final View FRONT = new View("front", new Orthographic(4, 2), new Vec3(2, 1, 6), new Vec3(2, 1, 0), new Vec3(0, 1, 0),
            new Raster(64, 32));
    private static final Look LOOK = new Look(32, new Rgb(.9, .85, .8), new Rgb(.5, .5, .6), Optional.empty());
    private static final FlowSetup FLOW = new FlowSetup(BOX, new FrameRange(1001, 1024, 12), 1, Interpolation.LINEAR, Interpolation.CUBIC,
            new Sides(Side.OPEN, Side.OPEN, Side.WALL, Side.OPEN, Side.WALL, Side.WALL), 0.3, 0,
            List.of(new Source("puff", 0.7, 0.7, 0.03, 0.2, 0.14, 6, 1002, 1004)));

    /** What the frame shows, moved to the right by whole pixels, solved with the kinds given or with the program's choice. */
    private record Aside(int pixels, Optional<LossChoice> choice) implements Wish {
        @Override
        public Picture wanted(Picture original) {
            return moved(original, pixels);
        }

        @Override
        public float[] weights(Picture original) {
            float[] weights = new float[original.width() * original.height()];
            Arrays.fill(weights, 1f);
            return weights;
        }

        @Override
        public LossChoice losses(Picture original, Picture wanted) {
            return choice.orElseGet(() -> LossChoice.of(original, wanted));
        }
    }

    @Test
    void transportCarriesItThreeWidthsWhereThePyramidIsBlind() {
        try (Lanes lanes = new Lanes(2)) {
            Picture original = original(lanes);
            int far = (int) Math.ceil(3 * width(original));
            assertTrue(far >= 18, () -> "moved by " + far + " pixels");
            SolveResult chosen = solve(far, Optional.empty(), StopRule.OWN, lanes);
            assertEquals(List.of(LossKind.PYRAMID, LossKind.TRANSPORT), chosen.noteLosses().get(0).choice().kinds());
            assertTrue(chosen.met().get(0) > 0.9, () -> "met " + chosen.met());
            assertTrue(chosen.noteLosses().get(0).fall() > 0.9, () -> "fall " + chosen.noteLosses());
            SolveResult pyramid = solve(far, only(LossKind.PYRAMID), StopRule.OWN, lanes);
            assertTrue(pyramid.met().get(0) < 0.3, () -> "met " + pyramid.met());
            assertEquals(pyramid.met().get(0), pyramid.noteLosses().get(0).fall(), 1e-12);

            // The slope of plain squared error as the puff sets out on its way, times the way's length, as a share of it.
            PictureLoss plain = plain(moved(original, far));
            double slope = (plain.value(moved(original, 1)) - plain.value(moved(original, -1))) / 2;
            assertEquals(0, far * slope / plain.value(original), 1e-3);
            // Through the whole chain to the force that was found; what is left to plain squared error is to smear the puff where it is.
            double[] way = chosen.unknowns();
            double blind = lead(plain, original, way, lanes);
            double transport = lead(LossKind.TRANSPORT.of(original, moved(original, far), null), original, way, lanes);
            assertTrue(blind < 0.15 && transport > 1, () -> "leads: plain " + blind + ", transport " + transport);
        }
    }

    /** A note on smoke that moves by a pixel is within sight, so the pyramid loss alone is chosen. Ours. */
    @Test
    void aSmallMoveIsLeftToThePyramid() {
        try (Lanes lanes = new Lanes(1)) {
            SolveResult few = solve(1, Optional.empty(), new StopRule(0, 1e9, 2), lanes);
            assertEquals(List.of(LossKind.PYRAMID), few.noteLosses().get(0).choice().kinds());
        }
    }

    /** Ours: met is by the pyramid loss even where the note is solved without it; on the way it lags far behind the loss that leads. */
    @Test
    void metIsThePyramidsWhateverTheLoss() {
        try (Lanes lanes = new Lanes(1)) {
            SolveResult few = new Solve(problem(new Aside(30, only(LossKind.TRANSPORT))), false, lanes, () -> false)
                    .run(MEMORY, new StopRule(0, 1e9, 3), p -> { });
            assertTrue(few.noteLosses().get(0).fall() > 0.2, () -> "fall " + few.noteLosses());
            assertTrue(few.met().get(0) < 0.1, () -> "met " + few.met());
            assertEquals(1 - few.noteLosses().get(0).fall(), last(few.losses()), 1e-9);
        }
    }

    @Test
    void anyThreadCountGivesTheSameBits() {
        StopRule few = new StopRule(0, Double.POSITIVE_INFINITY, 8);
        Optional<LossChoice> all = Optional.of(new LossChoice(List.of(LossKind.values()), "all"));
        try (Lanes one = new Lanes(1); Lanes three = new Lanes(3)) {
            assertArrayEquals(solve(20, all, few, one).unknowns(), solve(20, all, few, three).unknowns());
        }
    }

    /** By hand: another colour moves no outline, so the silhouette loss has no scale to be measured by. */
    @Test
    void aLossThatSeesNothingIsRefused() {
        Wish redder = new Wish() {
            @Override
            public Picture wanted(Picture original) {
                Picture out = original.copy();
                for (int n = 0; n < out.rgba().length; n += 4) {
                    out.rgba()[n] *= 0.5f;
                }
                return out;
            }

            @Override
            public float[] weights(Picture original) {
                return new Aside(1, Optional.empty()).weights(original);
            }

            @Override
            public LossChoice losses(Picture original, Picture wanted) {
                return only(LossKind.SILHOUETTE).orElseThrow();
            }
        };
        try (Lanes lanes = new Lanes(1)) {
            Solve solve = new Solve(problem(redder), true, lanes, () -> false);
            IllegalArgumentException refused = assertThrows(IllegalArgumentException.class,
                    () -> solve.run(MEMORY, StopRule.OWN, p -> { }));
            assertTrue(refused.getMessage().contains("'aside'") && refused.getMessage().contains("'silhouette'"), refused.getMessage());
        }
    }

    private static Optional<LossChoice> only(LossKind kind) {
        return Optional.of(new LossChoice(List.of(kind), "asked for"));
    }

    private static SolveProblem problem(Wish wish) {
        return new SolveProblem(FLOW, List.of(FRONT), LOOK, List.of(new SolveProblem.Note("aside", NOTED, 0, 1, wish)), List.of());
    }

    private static SolveResult solve(int pixels, Optional<LossChoice> choice, StopRule until, Lanes lanes) {
        return new Solve(problem(new Aside(pixels, choice)), true, lanes, () -> false).run(MEMORY, until, p -> { });
    }

    private static Picture original(Lanes lanes) {
        Picture[] out = new Picture[1];
        FrameTerms pictures = new FrameTerms(BOX, List.of(FRONT), LOOK, BOX.cellMetres(), new Clock(), lanes);
        Simulation.run(new SmokeSolver(FLOW, lanes), new SmokeState(BOX), null, null, NOTED, () -> false, (frame, state, force) -> {
            if (frame == NOTED) {
                out[0] = pictures.picture(state.density(), 0);
            }
        });
        return out[0];
    }

    /** {@code -g . way / J} at no force, for the one term with this loss. */
    private static double lead(PictureLoss loss, Picture original, double[] way, Lanes lanes) {
        SmokeSolver solver = new SmokeSolver(FLOW, lanes);
        ForceBasis basis = Solve.basis(FLOW, lanes);
        FrameTerms terms = new FrameTerms(BOX, List.of(FRONT), LOOK, BOX.cellMetres(), solver.clock(), lanes);
        terms.add(NOTED, 0, loss, 1);
        double[] gradient = new double[way.length];
        SolveLoss chain = new SolveLoss(solver, basis, terms, NOTED, WholeChainTest.states(FLOW, new SmokeState(BOX), NOTED, 100), () -> false);
        double value = chain.evaluate(new double[way.length], gradient);
        double slope = 0;
        for (int n = 0; n < way.length; n++) {
            slope += gradient[n] * way[n];
        }
        return -slope / value;
    }

    /** Plain squared error over all pixels and channels. */
    private static PictureLoss plain(Picture wanted) {
        return new PictureLoss() {
            @Override
            public Picture wanted() {
                return wanted;
            }

            @Override
            public double value(Picture got) {
                return valueAndPullback(got, new float[got.rgba().length], 0);
            }

            @Override
            public double valueAndPullback(Picture got, float[] gotBar, double scale) {
                double sum = 0;
                for (int n = 0; n < gotBar.length; n++) {
                    double difference = (double) got.rgba()[n] - wanted.rgba()[n];
                    sum += difference * difference;
                    gotBar[n] += (float) (2 * scale * difference);
                }
                return sum;
            }
        };
    }

    private static Picture moved(Picture original, int pixels) {
        Picture out = new Picture(original.width(), original.height());
        for (int p = 0; p < out.width() * out.height(); p++) {
            int from = p % out.width() - pixels;
            if (from >= 0 && from < out.width()) {
                System.arraycopy(original.rgba(), 4 * (p - pixels), out.rgba(), 4 * p, 4);
            }
        }
        return out;
    }

    /** Four standard deviations of the opacity along x, in pixels: what an eye calls the width of a bump. */
    private static double width(Picture picture) {
        double sum = 0;
        double first = 0;
        double second = 0;
        for (int p = 0; p < picture.width() * picture.height(); p++) {
            double a = picture.rgba()[4 * p + 3];
            int x = p % picture.width();
            sum += a;
            first += a * x;
            second += a * x * x;
        }
        return 4 * Math.sqrt(second / sum - first * first / (sum * sum));
    }

    private static double last(List<Double> values) {
        return values.get(values.size() - 1);
    }
}

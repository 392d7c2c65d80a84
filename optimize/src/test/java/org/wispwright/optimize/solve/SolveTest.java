package org.wispwright.optimize.solve;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.Test;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.volume.GridShape;

/** The search as a whole, on a small plume. */
class SolveTest {
    private static final long MEMORY = 256L << 20;

    @Test void aLeaningPlumeIsReachedAndToldOf() {
        SolveProblem problem = SolveScene.problem(16, 1013, 1, true);
        List<Progress> told = new ArrayList<>();
        try (Lanes lanes = new Lanes(2)) {
            SolveResult result = new Solve(problem, true, lanes, () -> false).run(MEMORY, StopRule.OWN, told::add);
            assertTrue(result.met().get(0) > 0.9, () -> "met " + result.met());
            assertEquals(result.losses().size() - Solve.rungs(problem.flow().grid()).size(), told.size());
            assertEquals(result.gradients(), told.get(told.size() - 1).gradients());
            assertTrue(result.energyShare() > 0.005 && result.energyShare() < 0.03, () -> "energy share " + result.energyShare());
            assertTrue(told.stream().allMatch(p -> p.secondsLeft() >= 0 && p.met().size() == 1));
            assertEquals(Solve.basis(problem.flow(), lanes).unknowns(Solve.bands(problem.flow()).size()), result.unknowns().length);
        }
    }

    @Test void twoRunsAndAnyThreadCountGiveTheSameBits() {
        SolveProblem problem = SolveScene.problem(12, 1009, 1, true);
        StopRule few = new StopRule(0, Double.POSITIVE_INFINITY, 6);
        double[] one;
        try (Lanes lanes = new Lanes(1)) {
            one = new Solve(problem, true, lanes, () -> false).run(MEMORY, few, p -> { }).unknowns();
            assertArrayEquals(one, new Solve(problem, true, lanes, () -> false).run(MEMORY, few, p -> { }).unknowns());
        }
        try (Lanes lanes = new Lanes(3)) {
            assertArrayEquals(one, new Solve(problem, true, lanes, () -> false).run(MEMORY, few, p -> { }).unknowns());
        }
    }

    @Test void stopsWhereAsked() {
        SolveProblem problem = SolveScene.problem(12, 1009, 1, false);
        try (Lanes lanes = new Lanes(1)) {
            SolveResult byCount = new Solve(problem, true, lanes, () -> false).run(MEMORY, new StopRule(0, 1e9, 3), p -> { });
            assertEquals(4, byCount.losses().size());
            SolveResult byLoss = new Solve(problem, true, lanes, () -> false).run(MEMORY, new StopRule(0.8, 1e9, 100), p -> { });
            assertTrue(byLoss.losses().get(byLoss.losses().size() - 1) <= 0.8);
            assertTrue(byLoss.losses().size() == 2 || byLoss.losses().get(byLoss.losses().size() - 2) > 0.8);
        }
    }

    @Test void cancelEndsItAtOnce() {
        SolveProblem problem = SolveScene.problem(12, 1009, 1, false);
        AtomicInteger asked = new AtomicInteger();
        try (Lanes lanes = new Lanes(1)) {
            Solve solve = new Solve(problem, true, lanes, () -> asked.incrementAndGet() > 20);
            assertThrows(SolveCancelled.class, () -> solve.run(MEMORY, StopRule.OWN, p -> { }));
        }
        assertEquals(21, asked.get());
    }

    @Test void aNoteThatWantsNothingIsRefused() {
        SolveProblem leaning = SolveScene.problem(12, 1009, 1, false);
        SolveProblem.Note none = new SolveProblem.Note("none", 1007, 0, 1, new Wish() {
            @Override public Picture wanted(Picture original) {
                return original;
            }

            @Override public float[] weights(Picture original) {
                return new float[original.width() * original.height()];
            }
        });
        SolveProblem problem = new SolveProblem(leaning.flow(), leaning.views(), leaning.look(), List.of(none), List.of());
        try (Lanes lanes = new Lanes(1)) {
            IllegalArgumentException refused = assertThrows(IllegalArgumentException.class,
                    () -> new Solve(problem, true, lanes, () -> false).run(MEMORY, StopRule.OWN, p -> { }));
            assertTrue(refused.getMessage().contains("'none'") && refused.getMessage().contains("1007"), refused.getMessage());
        }
        assertThrows(IllegalArgumentException.class, () -> new SolveProblem(leaning.flow(), leaning.views(), leaning.look(), List.of(), List.of()));
    }

    @Test void tooLittleMemorySaysWhatIsNeeded() {
        SolveProblem problem = SolveScene.problem(12, 1009, 1, false);
        try (Lanes lanes = new Lanes(1)) {
            IllegalArgumentException refused = assertThrows(IllegalArgumentException.class,
                    () -> new Solve(problem, true, lanes, () -> false).run(1000, StopRule.OWN, p -> { }));
            assertTrue(refused.getMessage().contains("bytes"), refused.getMessage());
        }
    }

    @Test void proxiesHaveAboutAPixelACell() {
        assertEquals(40, Solve.proxy(SolveScene.SIDE, 2.5 / 40).raster().height());
        assertEquals(80, Solve.proxy(SolveScene.SIDE, 0.001).raster().height());
        assertEquals(3, Solve.rungs(new GridShape(48, 64, 48, 0.1)).size());
        assertEquals(2, Solve.rungs(new GridShape(48, 66, 48, 0.1)).size());
        assertEquals(1, Solve.rungs(new GridShape(48, 63, 48, 0.1)).size());
        assertEquals(1, Solve.rungs(new GridShape(16, 20, 16, 0.1)).size());
    }
}

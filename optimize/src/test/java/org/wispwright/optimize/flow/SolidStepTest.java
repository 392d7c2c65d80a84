package org.wispwright.optimize.flow;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.optimize.solid.Obstacle;
import org.wispwright.optimize.solid.Solid;
import org.wispwright.optimize.solid.SolidCells;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/** Smoke among solids, over several steps. Expectations are ours unless they say otherwise: nothing passes a closed wall. */
class SolidStepTest {
    private static final GridShape BOX = new GridShape(20, 14, 12, 0.1);

    private static FlowSetup flow(GridShape box, Interpolation interpolation, Source source, Obstacle... things) {
        return new FlowSetup(box, new FrameRange(1, 40, 10), 1, interpolation, interpolation, Sides.CLOSED, 3, 0, List.of(source))
                .withObstacles(List.of(things));
    }

    private static Source pot(double x) {
        return new Source("pot", x, 0.3, 0.6, 0.25, 0.1, 5, 1, 40);
    }

    /** A force that blows along x by gusts of some cells a step, and stirs. */
    private static MacVelocity storm(GridShape box, double strength) {
        MacVelocity f = new MacVelocity(box);
        for (int n = 0; n < f.x().length; n++) {
            f.x()[n] = (float) (strength * (1 + Math.sin(n * 0.7)));
        }
        for (int n = 0; n < f.y().length; n++) {
            f.y()[n] = (float) (strength * Math.sin(n * 0.3));
        }
        for (int n = 0; n < f.z().length; n++) {
            f.z()[n] = (float) (strength * Math.cos(n * 0.5));
        }
        return f;
    }

    private static SmokeState run(FlowSetup setup, double strength, int steps, Lanes lanes) {
        SmokeSolver solver = new SmokeSolver(setup, lanes);
        SmokeState now = new SmokeState(setup.grid());
        SmokeState next = new SmokeState(setup.grid());
        MacVelocity f = storm(setup.grid(), strength);
        for (int n = 0; n < steps; n++) {
            solver.step(now, f, setup.step(n), n > 0, next);
            SmokeState swap = now;
            now = next;
            next = swap;
        }
        return now;
    }

    private static double most(SmokeState state, java.util.function.DoublePredicate atX) {
        GridShape s = state.density().shape();
        double most = 0;
        for (int c = 0; c < s.cells(); c++) {
            if (atX.test((c % s.nx() + 0.5) * s.cellMetres())) {
                most = Math.max(most, Math.abs(state.density().values()[c]));
            }
        }
        return most;
    }

    /**
     * A plate of a hundredth of a cell across the box, straight or tilted about y or z or both, between the smoke and the other half; the
     * storm drives displacements of several cells a step. Not one bit of smoke gets through.
     */
    @ParameterizedTest
    @CsvSource({"LINEAR,0,0", "CUBIC,0,0", "LINEAR,0.5,0", "CUBIC,0,0.4", "CUBIC,0.35,0.3"})
    void nothingPassesAThinWall(Interpolation interpolation, double aboutY, double aboutZ) {
        Obstacle wall = new Obstacle("wall", new Solid.Box(new Vec3(0.0005, 9, 9)), Curve.still(new Vec3(1, 0.7, 0.6)),
                Curve.still(new Vec3(0, aboutY, aboutZ)));
        FlowSetup setup = flow(BOX, interpolation, pot(0.4), wall);
        SmokeState end = run(setup, 8, 25, FlowOperators.ONE);
        SolidCells solids = new SolidCells(BOX, List.of(wall), 1, 2, 10, FlowOperators.ONE);
        double near = 0;
        double beyond = 0;
        for (int c = 0; c < BOX.cells(); c++) {
            Vec3 at = new Vec3((c % 20 + 0.5) * 0.1 - 1, (c / 20 % 14 + 0.5) * 0.1 - 0.7, (c / 280 + 0.5) * 0.1 - 0.6);
            double x = wall.pose(1, 2, 10).toLocal(at.plus(new Vec3(1, 0.7, 0.6))).x();
            double q = end.density().values()[c];
            if (solids.isSolid(c)) {
                assertEquals(0, q, "in the wall, cell " + c);
            } else if (x < 0) {
                near = Math.max(near, q);
            } else {
                beyond = Math.max(beyond, Math.abs(q));
            }
        }
        assertTrue(near > 0.1, "there is smoke on the near side: " + near);
        assertEquals(0, beyond, "and none beyond");
        double fastest = 0;
        for (float v : end.velocity().x()) {
            fastest = Math.max(fastest, Math.abs(v));
        }
        assertTrue(fastest * 0.1 / 0.1 > 2, "steps of more than two cells are tried: " + fastest);
    }

    /** A closed plate that sweeps through the box pushes the smoke before it and lets none through to its wake, where there is none. */
    @Test void nothingPassesAMovingWall() {
        Curve way = new Curve(List.of(1.0, 30.0), List.of(new Vec3(0.25, 0.7, 0.6), new Vec3(1.3, 0.7, 0.6)));
        Obstacle wall = new Obstacle("wall", new Solid.Box(new Vec3(0.06, 9, 9)), way, Curve.still(new Vec3(0, 0, 0)));
        Sides open = new Sides(Side.OPEN, Side.OPEN, Side.WALL, Side.WALL, Side.WALL, Side.WALL);
        FlowSetup closed = flow(BOX, Interpolation.LINEAR, new Source("pot", 1.5, 0.5, 0.6, 0.3, 0.1, 5, 1, 40), wall);
        FlowSetup setup = new FlowSetup(BOX, closed.frames(), 1, closed.velocity(), closed.density(), open, 0, 0, closed.sources())
                .withObstacles(closed.obstacles());
        SmokeState end = run(setup, 0, 29, FlowOperators.ONE);
        assertEquals(0, most(end, x -> x < 1.2));
        assertTrue(most(end, x -> x > 1.4) > 0.3);
        // It has come to 1.3 m, into the source: no smoke in it.
        assertEquals(0, end.density().at(12, 4, 6));
        assertEquals(0, end.density().at(13, 4, 6));
        assertTrue(end.density().at(15, 4, 6) > 0.3);
    }

    /** The carry itself leaves 0 in solids and takes no derivative from there, whatever flows. */
    @Test void nothingIsCarriedIntoSolids() {
        SolidCells solids = FlowOperators.solids(BOX);
        CarryAround carry = CarryAround.ofCells(BOX, Interpolation.CUBIC, FlowOperators.ONE);
        Displacement d = new Displacement(BOX);
        java.util.Arrays.fill(d.x, 1.3f);
        float[] out = FlowOperators.noise(BOX.cells(), 1, 0.5, 2);
        carry.forward(FlowOperators.noise(BOX.cells(), 1, 0.5, 1), d, solids, out);
        float[] bar = FlowOperators.noise(BOX.cells(), 1, 0.5, 3);
        carry.pullback(out, d, 0, solids, bar, new float[BOX.cells()], new Displacement(BOX));
        int inside = 0;
        for (int c = 0; c < BOX.cells(); c++) {
            if (solids.isSolid(c)) {
                inside++;
                assertEquals(0, out[c]);
                assertEquals(0, bar[c]);
            }
        }
        assertTrue(inside > 20);
    }

    /** A source in a solid is shut; smoke that a solid runs over is gone. */
    @Test void noSmokeInsideSolids() {
        Obstacle lid = new Obstacle("lid", new Solid.Ball(0.4), Curve.still(new Vec3(0.5, 0.3, 0.6)), Curve.still(new Vec3(0, 0, 0)));
        assertEquals(0, most(run(flow(BOX, Interpolation.CUBIC, pot(0.5), lid), 0, 5, FlowOperators.ONE), x -> true));
    }

    /**
     * A ball far from all smoke and wind changes nothing but the rounding of the pressure: the plain path serves where no solid is near.
     */
    @Test void farFromSolidsTheSameSmoke() {
        GridShape box = new GridShape(40, 14, 12, 0.1);
        Obstacle pebble = new Obstacle("pebble", new Solid.Ball(0.06), Curve.still(new Vec3(3.55, 0.75, 0.65)), Curve.still(new Vec3(0, 0,
                0)));
        float[] with = run(flow(box, Interpolation.CUBIC, pot(0.5), pebble), 0, 8, FlowOperators.ONE).density().values();
        float[] without = run(flow(box, Interpolation.CUBIC, pot(0.5)), 0, 8, FlowOperators.ONE).density().values();
        assertArrayEquals(without, with, 2e-3f);
    }

    @ParameterizedTest @ValueSource(ints = {2, 3, 5}) void anyThreadCountGivesTheSameBits(int threads) {
        FlowSetup setup = flow(BOX, Interpolation.CUBIC, pot(0.5), FlowOperators.things(BOX).toArray(new Obstacle[0]));
        SmokeState one = run(setup, 2, 6, FlowOperators.ONE);
        try (Lanes lanes = new Lanes(threads)) {
            SmokeState many = run(setup, 2, 6, lanes);
            assertArrayEquals(one.density().values(), many.density().values());
            assertArrayEquals(one.velocity().y(), many.velocity().y());
            SmokeState barOne = bar(setup, one, FlowOperators.ONE);
            SmokeState barMany = bar(setup, one, lanes);
            assertArrayEquals(barOne.density().values(), barMany.density().values());
            assertArrayEquals(barOne.velocity().x(), barMany.velocity().x());
        }
    }

    private static SmokeState bar(FlowSetup setup, SmokeState state, Lanes lanes) {
        SmokeSolver solver = new SmokeSolver(setup, lanes);
        SmokeState next = new SmokeState(setup.grid());
        solver.step(state, null, setup.step(6), false, next);
        SmokeState bar = next.copy();
        solver.pullback(state, next.velocity(), setup.step(6), true, bar, new MacVelocity(setup.grid()));
        return bar;
    }

    /** Flow through the gap of a half-closed wall stays free of divergence to rounding, and goes faster there (continuity). */
    @Test void throughAGapItGoesFaster() {
        Obstacle wall = new Obstacle("wall", new Solid.Box(new Vec3(0.05, 0.5, 9)), Curve.still(new Vec3(1, 0.2, 0.6)),
                Curve.still(new Vec3(0, 0, 0)));
        Sides tunnel = new Sides(Side.OPEN, Side.OPEN, Side.WALL, Side.WALL, Side.WALL, Side.WALL);
        FlowSetup closed = flow(BOX, Interpolation.LINEAR, pot(0.4), wall);
        FlowSetup setup = new FlowSetup(BOX, closed.frames(), 1, closed.velocity(), closed.density(), tunnel, 0, 0, List.of())
                .withObstacles(closed.obstacles());
        SmokeSolver solver = new SmokeSolver(setup, FlowOperators.ONE);
        SmokeState start = new SmokeState(BOX);
        java.util.Arrays.fill(start.velocity().x(), 0.5f);
        SmokeState next = new SmokeState(BOX);
        solver.step(start, null, setup.step(0), false, next);
        assertTrue(solver.relativeDivergence(next.velocity()) < 2e-6, "left " + solver.relativeDivergence(next.velocity()));
        double before = 0;
        double inGap = 0;
        int open = 0;
        for (int k = 0; k < 12; k++) {
            for (int j = 0; j < 14; j++) {
                before += next.velocity().x()[BOX.xFace(3, j, k)];
                float through = next.velocity().x()[BOX.xFace(10, j, k)];
                inGap += through;
                open += through != 0 ? 1 : 0;
            }
        }
        assertEquals(before, inGap, 1e-4 * before);
        assertEquals(7 * 12, open);
    }
}

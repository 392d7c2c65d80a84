package org.wispwright.optimize.flow;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.optimize.solid.Obstacle;
import org.wispwright.optimize.solid.Solid;
import org.wispwright.optimize.solid.SolidCells;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/** The pressure around solids: what it must leave behind, how soon, and against plain elimination. */
class SolidProjectionTest {
    private static final Lanes ONE = FlowOperators.ONE;

    private static SolidCells still(GridShape shape, Solid solid, Vec3 at, Vec3 rotation) {
        return new SolidCells(shape, List.of(new Obstacle("thing", solid, Curve.still(at), Curve.still(rotation))), 1, 2, 24, ONE);
    }

    private static SolidCells moving(GridShape shape, Solid solid, Vec3 from, Vec3 to) {
        Curve way = new Curve(List.of(0.0, 10.0), List.of(from, to));
        return new SolidCells(shape, List.of(new Obstacle("thing", solid, way, Curve.still(new Vec3(0, 0, 0)))), 4, 5, 1, ONE);
    }

    private static MacVelocity noise(GridShape shape) {
        Random random = new Random(3);
        MacVelocity u = new MacVelocity(shape);
        for (float[] part : new float[][] {u.x(), u.y(), u.z()}) {
            for (int n = 0; n < part.length; n++) {
                part[n] = (float) random.nextGaussian();
            }
        }
        return u;
    }

    /** Divergence of a cell, cells as unit of length: Harlow and Welch (1965). */
    private static double divergence(MacVelocity u, int i, int j, int k) {
        GridShape s = u.shape();
        double d = (double) u.x()[s.xFace(i + 1, j, k)] - u.x()[s.xFace(i, j, k)] + u.y()[s.yFace(i, j + 1, k)] - u.y()[s.yFace(i, j, k)];
        return s.isPlane() ? d : d + u.z()[s.zFace(i, j, k + 1)] - u.z()[s.zFace(i, j, k)];
    }

    private static double rms(MacVelocity u, SolidCells solids) {
        GridShape s = u.shape();
        double sum = 0;
        for (int k = 0; k < s.nz(); k++) {
            for (int j = 0; j < s.ny(); j++) {
                for (int i = 0; i < s.nx(); i++) {
                    double d = solids.isSolid(s.cell(i, j, k)) ? 0 : divergence(u, i, j, k);
                    sum += d * d;
                }
            }
        }
        return Math.sqrt(sum);
    }

    /** The figure to reach (design): a ball of a fifth of the box at 64^3, at most 25 iterations, 1e-6 of the start's divergence. */
    @ParameterizedTest @EnumSource(Side.class) void aBallAt64TakesFewIterations(Side side) {
        GridShape shape = new GridShape(64, 64, 64, 1.0 / 64);
        SolidCells solids = still(shape, new Solid.Ball(0.1), new Vec3(0.45, 0.4, 0.5), new Vec3(0, 0, 0));
        Sides sides = new Sides(side, side, Side.WALL, side, side, side);
        try (Lanes lanes = new Lanes(2)) {
            SolidProjection projection = new SolidProjection(shape, sides, lanes);
            PressureLinks links = new PressureLinks(shape, sides, solids, lanes);
            MacVelocity u = noise(shape);
            MacVelocity start = u.copy();
            for (int k = 0; k < shape.nz(); k++) {
                solids.writeFaces(start, false, k);
                Projection.closeWalls(shape, sides, start, k);
            }
            projection.forward(u, solids, links);
            assertTrue(projection.lastIterations() <= 25, "iterations: " + projection.lastIterations());
            assertTrue(rms(u, solids) <= 1e-6 * rms(start, solids), rms(u, solids) + " of " + rms(start, solids));
        }
    }

    /**
     * The slow twin: {@code D M G p = D u} by elimination in double over fluid cells, one cell of each pocket held at 0, p = 0 at the ghost
     * centre of an open side. Boxes with odd and prime sides, a wall, a ball and a sealed pocket in them.
     */
    @ParameterizedTest @ValueSource(ints = {0, 1, 2, 3}) void theSameAsElimination(int scene) {
        GridShape shape = scene == 3 ? new GridShape(9, 7, 1, 0.5) : new GridShape(7, 6, 5, 0.5);
        Sides sides = scene % 2 == 0 ? Sides.CLOSED : new Sides(Side.WALL, Side.OPEN, Side.WALL, Side.OPEN, Side.OPEN, Side.WALL);
        Vec3 middle = new Vec3(1.75, 1.5, 1.25);
        SolidCells solids = scene == 2 ? still(shape, new Solid.Box(new Vec3(0.1, 9, 9)), middle, new Vec3(0, 0, 0.5))
                : moving(shape, new Solid.Ball(0.9), middle.minus(new Vec3(1, 0, 0)), middle.plus(new Vec3(1, 0.5, 0)));
        SolidProjection projection = new SolidProjection(shape, sides, ONE);
        PressureLinks links = new PressureLinks(shape, sides, solids, ONE);
        MacVelocity u = noise(shape);
        MacVelocity twin = u.copy();
        projection.forward(u, solids, links);
        PlainPressure.project(twin, sides, solids);
        for (float[][] pair : new float[][][] {{u.x(), twin.x()}, {u.y(), twin.y()}, {u.z(), twin.z()}}) {
            assertArrayEquals(pair[1], pair[0], 4e-6f);
        }
    }

    /** P P = P (outside check O5, Chorin 1968), with solids: what is free of divergence stays, to rounding. */
    @Test void twiceIsOnce() {
        GridShape shape = new GridShape(20, 16, 12, 0.1);
        SolidCells solids = moving(shape, new Solid.Cylinder(0.3, 0.4), new Vec3(0.9, 0.7, 0.6), new Vec3(1.2, 0.9, 0.6));
        PressureLinks links = new PressureLinks(shape, Sides.CLOSED, solids, ONE);
        SolidProjection projection = new SolidProjection(shape, Sides.CLOSED, ONE);
        MacVelocity u = noise(shape);
        projection.forward(u, solids, links);
        MacVelocity once = u.copy();
        projection.forward(u, solids, links);
        assertArrayEquals(once.x(), u.x(), 2e-6f);
        assertArrayEquals(once.y(), u.y(), 2e-6f);
        assertArrayEquals(once.z(), u.z(), 2e-6f);
    }

    /**
     * A ball that sets off with U in still, endless fluid: potential flow, u = U (a/r)^3 on its axis (Batchelor 1967, 2.9). The
     * surface of cells lies up to half a cell outside the ball's: 20 % for a of 8 cells; how it falls, 6 %.
     */
    @Test void aBallThatSetsOffMakesItsDipole() {
        GridShape shape = new GridShape(48, 48, 48, 1);
        SolidCells solids = moving(shape, new Solid.Ball(8), new Vec3(24 - 4.5 * 0.1, 24, 24), new Vec3(24 + 5.5 * 0.1, 24, 24));
        MacVelocity u = new MacVelocity(shape);
        try (Lanes lanes = new Lanes(2)) {
            new SolidProjection(shape, FlowOperators.OPEN, lanes)
                    .forward(u, solids, new PressureLinks(shape, FlowOperators.OPEN, solids, lanes));
        }
        double near = u.x()[shape.xFace(24 + 11, 23, 24)];
        for (int r = 11; r <= 14; r++) {
            double ahead = u.x()[shape.xFace(24 + r, 23, 24)];
            double from = r - 0.05;                                            // the ball has come to 24.05
            assertEquals(0.1 * Math.pow(8 / from, 3), ahead, 0.2 * 0.1 * Math.pow(8 / from, 3), "at " + r);
            assertEquals(Math.pow(10.95 / from, 3), ahead / near, 0.06, "at " + r);
        }
    }

    /** A face takes the speed of the thing's point there: v + w x r, by hand for a turn about y of w radians a frame. */
    @Test void facesHaveTheSpeedOfTheThing() {
        GridShape shape = new GridShape(8, 8, 8, 1);
        double w = 0.1;
        Curve turn = new Curve(List.of(0.0, 10.0), List.of(new Vec3(0, 0, 0), new Vec3(0, 10 * w, 0)));
        SolidCells solids = new SolidCells(shape, List.of(new Obstacle("fan", new Solid.Box(new Vec3(2.2, 1.2, 2.2)),
                Curve.still(new Vec3(4, 4, 4)),
                turn)), 4, 5, 24, ONE);
        MacVelocity u = noise(shape);
        for (int k = 0; k < 8; k++) {
            solids.writeFaces(u, true, k);
        }
        // w x r with w along y: (w z, 0, -w x), 24 frames a second.
        assertEquals(24 * w * (4.5 - 4), u.x()[shape.xFace(4, 4, 4)], 1e-6);
        assertEquals(-24 * w * (4.5 - 4), u.z()[shape.zFace(4, 4, 4)], 1e-6);
        assertEquals(24 * w * (2.5 - 4), u.x()[shape.xFace(4, 4, 2)], 1e-6);
        assertEquals(0, u.y()[shape.yFace(4, 4, 4)], 1e-6);
        assertTrue(Math.abs(u.x()[shape.xFace(0, 0, 0)]) > 0.01, "faces of fluid stay");
    }

    /**
     * A piston in a sealed chamber: what it squeezes out has nowhere to go. Its divergence is spread evenly, and the rest is free of any.
     */
    @Test void aSqueezedPocketIsCompressedEvenly() {
        GridShape shape = new GridShape(10, 6, 5, 1);
        Curve way = new Curve(List.of(0.0, 10.0), List.of(new Vec3(4.5, 3, 2.5), new Vec3(5.5, 3, 2.5)));
        SolidCells solids = new SolidCells(shape, List.of(new Obstacle("piston", new Solid.Box(new Vec3(0.5, 9, 9)), way,
                Curve.still(new Vec3(0, 0, 0)))),
                0, 1, 1, ONE);
        Sides sides = new Sides(Side.OPEN, Side.WALL, Side.WALL, Side.WALL, Side.WALL, Side.WALL);
        PressureLinks links = new PressureLinks(shape, sides, solids, ONE);
        assertEquals(1, links.pockets());
        MacVelocity u = noise(shape);
        new SolidProjection(shape, sides, ONE).forward(u, solids, links);
        int first = 0;
        while (!solids.isSolid(shape.cell(first, 0, 0))) {
            first++;
        }
        int last = first;
        while (solids.isSolid(shape.cell(last, 0, 0))) {
            last++;
        }
        assertEquals(0.1, u.x()[shape.xFace(last, 2, 2)], 1e-6);
        for (int i = 0; i < 10; i++) {
            // By hand: 0.1 m/s times the piston's 30 faces over the chamber's 30 (10 - last) cells.
            double expected = i < first ? 0 : -0.1 / (10 - last);
            if (!solids.isSolid(shape.cell(i, 3, 2))) {
                assertEquals(expected, divergence(u, i, 3, 2), 3e-6, "column " + i);
            }
        }
    }

    @Test void aSolidAloneLeavesAPocketOfOneCell() {
        GridShape shape = new GridShape(7, 7, 7, 1);
        float[] shell = new float[27];
        java.util.Arrays.fill(shell, 1f);
        shell[13] = 0;
        SolidCells solids = still(shape, new Solid.Volume(new GridShape(3, 3, 3, 1), shell, Solid.Volume.Kind.MASK), new Vec3(3.5, 3.5,
                3.5),
                new Vec3(0, 0, 0));
        assertTrue(!solids.isSolid(shape.cell(3, 3, 3)) && solids.isSolid(shape.cell(2, 3, 3)));
        PressureLinks links = new PressureLinks(shape, FlowOperators.OPEN, solids, ONE);
        assertEquals(1, links.pockets());
        MacVelocity u = noise(shape);
        new SolidProjection(shape, FlowOperators.OPEN, ONE).forward(u, solids, links);
        assertEquals(0, u.x()[shape.xFace(3, 3, 3)]);
        assertTrue(Float.isFinite(u.x()[shape.xFace(1, 3, 3)]));
    }
}

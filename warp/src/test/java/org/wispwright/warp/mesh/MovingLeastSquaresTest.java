package org.wispwright.warp.mesh;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.wispwright.warp.mesh.MovingLeastSquares.Kind;

/** Outside checks 2.2: Schaefer, McPhail and Warren (2006), digits derived; four controls of a unit square. */
class MovingLeastSquaresTest {
    private static final double[][] SQUARE = {{0, 0}, {1, 0}, {1, 1}, {0, 1}};
    private static final double[][] PULLED = {{0, 0}, {1, 0}, {1.5, 1.25}, {0, 1}};
    private static final double C = Math.sqrt(3) / 2;

    /** W10: the middle, where all three agree. */
    @Test
    void w10_middle() {
        row(.5, .5, .625, .5625, .625, .5625, .625, .5625);
    }

    /** W11. */
    @Test
    void w11_lowerLeft() {
        row(.25, .75, .325, .7875, 0.325892857143, 0.776785714286, 0.317596721050, 0.784555753943);
    }

    /** W12. */
    @Test
    void w12_nearThePulledCorner() {
        row(.9, .8, 1.28, .99, 1.304821428571, 0.980892857143, 1.315876989919, 1.016493872380);
    }

    /** W13: outside the square. */
    @Test
    void w13_outside() {
        row(2, 2, 3.1, 2.55, 2.714285714286, 2.357142857143, 2.333171124582, 2.026174923979);
    }

    /** W14: controls turned by 30 degrees and moved: every kind gives the rigid image. */
    @ParameterizedTest
    @EnumSource(Kind.class)
    void w14_rigidMotion(Kind kind) {
        assertArrayEquals(new double[] {0.159807621135, 0.569615242271}, at(kind, turned(1, .2, -.1), .3, .6), 1e-12);
    }

    /** W15: scaled by 2 and turned by 30 degrees: affine and similarity follow, rigid must not. */
    @Test
    void w15_scaledAndTurned() {
        double[] exact = {-0.080384757729, 1.339230484541};
        assertArrayEquals(exact, at(Kind.AFFINE, turned(2, 0, 0), .3, .6), 1e-11);
        assertArrayEquals(exact, at(Kind.SIMILARITY, turned(2, 0, 0), .3, .6), 1e-11);
        assertArrayEquals(new double[] {-0.086966839911, 1.358191741376}, at(Kind.RIGID, turned(2, 0, 0), .3, .6), 1e-11);
    }

    /** The paper's property 1: interpolation; at a control without 1/0, and just beside it close by. */
    @ParameterizedTest
    @EnumSource(Kind.class)
    void controlsLandOnTheirTargets(Kind kind) {
        for (int n = 0; n < 4; n++) {
            assertArrayEquals(PULLED[n], at(kind, PULLED, SQUARE[n][0], SQUARE[n][1]));
            assertArrayEquals(PULLED[n], at(kind, PULLED, SQUARE[n][0] + 1e-9, SQUARE[n][1] - 1e-9), 1e-7);
        }
    }

    /** The paper's property 2: identity. */
    @ParameterizedTest
    @EnumSource(Kind.class)
    void nothingMovesIfNoControlDoes(Kind kind) {
        assertArrayEquals(new double[] {.37, -1.2}, at(kind, SQUARE, .37, -1.2), 1e-13);
    }

    /** By hand: one control can only shift; where both controls meet in one target, similarity shrinks to it and rigid does not turn. */
    @Test
    void fewControlsByHand() {
        double[] out = new double[2];
        for (Kind kind : new Kind[] {Kind.SIMILARITY, Kind.RIGID}) {
            new MovingLeastSquares(kind, new double[][] {{1, 2}}, new double[][] {{4, 1}}).evaluate(5, 5, out);
            assertArrayEquals(new double[] {8, 4}, out);
            new MovingLeastSquares(kind, new double[][] {{0, 0}, {2, 0}}, new double[][] {{1, 0}, {1, 0}}).evaluate(1, 1, out);
            assertArrayEquals(new double[] {1, kind == Kind.RIGID ? 1 : 0}, out);
        }
    }

    @Test
    void refusesWhatHasNoSingleMap() {
        double[][] line = {{0, 0}, {1, 1}, {2, 2}};
        assertThrows(IllegalArgumentException.class, () -> new MovingLeastSquares(Kind.AFFINE, line, line));
        assertThrows(IllegalArgumentException.class, () -> new MovingLeastSquares(Kind.AFFINE, new double[][] {{0, 0}, {1, 0}},
                new double[2][2]));
        assertThrows(IllegalArgumentException.class, () -> new MovingLeastSquares(Kind.RIGID, new double[0][], new double[0][]));
        assertThrows(IllegalArgumentException.class, () -> new MovingLeastSquares(Kind.RIGID, SQUARE, line));
        assertThrows(IllegalArgumentException.class, () -> new MovingLeastSquares(Kind.RIGID, new double[][] {{1, 1}, {1, 1}},
                new double[2][2]));
        assertThrows(IllegalArgumentException.class, () -> new MovingLeastSquares(Kind.RIGID, new double[][] {{1, Double.NaN}},
                new double[1][2]));
        new MovingLeastSquares(Kind.RIGID, line, line);
        assertEquals(3, Kind.values().length);
    }

    private static void row(double x, double y, double... expected) {
        for (Kind kind : Kind.values()) {
            int at = 2 * kind.ordinal();
            assertArrayEquals(new double[] {expected[at], expected[at + 1]}, at(kind, PULLED, x, y), 1e-11, kind.name());
        }
    }

    private static double[] at(Kind kind, double[][] targets, double x, double y) {
        double[] out = new double[2];
        new MovingLeastSquares(kind, SQUARE, targets).evaluate(x, y, out);
        return out;
    }

    private static double[][] turned(double scale, double dx, double dy) {
        double[][] out = new double[4][];
        for (int n = 0; n < 4; n++) {
            out[n] = new double[] {scale * (C * SQUARE[n][0] - .5 * SQUARE[n][1]) + dx,
                scale * (.5 * SQUARE[n][0] + C * SQUARE[n][1]) + dy};
        }
        return out;
    }
}

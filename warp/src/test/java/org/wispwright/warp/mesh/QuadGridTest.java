package org.wispwright.warp.mesh;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.List;
import org.junit.jupiter.api.Test;

/** Outside check W32 (derived) and the list of folded cells. */
class QuadGridTest {
    /** W32: the quad (0,0) (1,0) (u,u) (0,1) has corner Jacobians 1, u, u, 2u - 1: u .6 no fold, .5 touching, .4 a fold. */
    @Test
    void w32_foldOfAQuad() {
        QuadGrid rest = QuadGrid.over(0, 0, 1, 1, 1, 1);
        double[] jacobians = new double[4];
        quad(.6).cornerJacobians(0, 0, jacobians);
        assertArrayEquals(new double[] {1, .6, .6, .2}, jacobians, 1e-15);
        assertEquals(List.of(), quad(.6).folds(rest));
        quad(.5).cornerJacobians(0, 0, jacobians);
        assertArrayEquals(new double[] {1, .5, .5, 0}, jacobians);
        assertEquals(List.of(new QuadGrid.Fold(0, 0, 0, QuadGrid.State.TOUCHING)), quad(.5).folds(rest));
        quad(.4).cornerJacobians(0, 0, jacobians);
        assertEquals(-.2, jacobians[3], 1e-15);
        assertEquals(1, quad(.4).folds(rest).size());
        assertEquals(QuadGrid.State.FOLDED, quad(.4).folds(rest).get(0).state());
        assertEquals(-.2, quad(.4).folds(rest).get(0).worstJacobian(), 1e-15);
    }

    /** By hand: one corner of a grid dragged beyond its right neighbour turns over the cells to its right, and those alone. */
    @Test
    void theListNamesTheFoldedCells() {
        QuadGrid rest = QuadGrid.over(-1, 2, 3, 5, 8, 6);
        QuadGrid same = rest.at(rest.x().clone(), rest.y().clone());
        assertEquals(List.of(), same.folds(rest));
        double[] x = rest.x().clone();
        int corner = 3 + 9 * 2;
        x[corner] += 1.2 * .5;
        List<QuadGrid.Fold> folds = rest.at(x, rest.y().clone()).folds(rest);
        assertEquals(2, folds.size());
        assertEquals(3, folds.get(0).i());
        assertEquals(1, folds.get(0).j());
        assertEquals(3, folds.get(1).i());
        assertEquals(2, folds.get(1).j());
        assertEquals(-.2, folds.get(0).worstJacobian(), 1e-12);
    }

    /** Jacobians are relative to rest, so neither the size nor the direction of y matters; a mirrored grid is folded everywhere. */
    @Test
    void aMirroredGridIsFoldedEverywhere() {
        QuadGrid rest = QuadGrid.over(0, 0, .3, 7, 4, 3);
        double[] mirrored = rest.x().clone();
        for (int n = 0; n < mirrored.length; n++) {
            mirrored[n] = -mirrored[n];
        }
        List<QuadGrid.Fold> folds = rest.at(mirrored, rest.y()).folds(rest);
        assertEquals(12, folds.size());
        assertEquals(-1, folds.get(7).worstJacobian(), 1e-12);
        assertEquals(3, folds.get(7).i());
        assertEquals(1, folds.get(7).j());
    }

    @Test
    void refusesWhatIsNoGrid() {
        assertThrows(IllegalArgumentException.class, () -> QuadGrid.over(0, 0, 1, 1, 0, 3));
        assertThrows(IllegalArgumentException.class, () -> QuadGrid.over(0, 0, 1, 1, 3, 257));
        assertThrows(IllegalArgumentException.class, () -> QuadGrid.over(0, 0, 0, 1, 3, 3));
        assertThrows(IllegalArgumentException.class, () -> new QuadGrid(1, 1, new double[4], new double[3]));
        assertThrows(IllegalArgumentException.class, () -> new QuadGrid(1, 1, new double[4], new double[] {0, 0, Double.NaN, 0}));
        QuadGrid rest = QuadGrid.over(0, 0, 1, 1, 1, 1);
        assertThrows(IllegalArgumentException.class, () -> rest.folds(QuadGrid.over(0, 0, 1, 1, 2, 1)));
        assertThrows(IllegalArgumentException.class, () -> rest.folds(rest.at(new double[4], new double[4])));
    }

    private static QuadGrid quad(double u) {
        return new QuadGrid(1, 1, new double[] {0, 1, 0, u}, new double[] {0, 0, 1, u});
    }
}

package org.wispwright.warp.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Outside checks 4.2: overlap and distance of shapes. */
class ShapeMeasuresTest {
    /** U36: rectangles 20 x 10, one shifted by 5 along the long side: 150/250. */
    @Test
    void u36_rectangles() {
        Silhouette a = rectangle(40, 20, 5, 5, 20, 10);
        Silhouette b = rectangle(40, 20, 10, 5, 20, 10);
        assertEquals(150, a.common(b));
        assertEquals(.6, a.intersectionOverUnion(b), 1e-15);
        assertEquals(.75, a.dice(b), 1e-15);
    }

    /** U37: lens formula for discs of radius 20; pixels a twelfth wide come within 1e-3 of it. */
    @ParameterizedTest
    @CsvSource({"1,0.938308162447", "3,0.825811443501", "5,0.726013482416", "10,0.520956085590", "20,0.243009793775"})
    void u37_discsByTheLensFormula(double d, double expected) {
        double lens = 2 * 400 * Math.acos(d / 40) - d / 2 * Math.sqrt(1600 - d * d);
        assertEquals(expected, lens / (2 * Math.PI * 400 - lens), 1e-12);
        int fine = 12;
        assertEquals(expected, fineDisc(30, fine).intersectionOverUnion(fineDisc(30 + d, fine)), 1e-3);
    }

    /** U38: the same as whole pixels of a 64 x 64 plane. */
    @ParameterizedTest
    @CsvSource({"1,1224,1304,0.938650306748", "3,1144,1384,0.826589595376", "5,1064,1464,0.726775956284", "10,868,1660,0.522891566265"})
    void u38_discsAsPixels(int d, int common, int union, double expected) {
        Silhouette a = Silhouette.of(CheckPlanes.disc(31.5, 20), .5);
        Silhouette b = Silhouette.of(CheckPlanes.disc(31.5 + d, 20), .5);
        assertEquals(1264, a.count());
        assertEquals(1264, b.count());
        assertEquals(common, a.common(b));
        assertEquals(union, a.count() + b.count() - a.common(b));
        assertEquals((double) common / union, a.intersectionOverUnion(b));
        assertEquals(expected, a.intersectionOverUnion(b), 1e-12);
    }

    /** U39: both empty, 1; one empty, 0. Distances follow suit: 0, and infinite where there is something to carry. */
    @Test
    void u39_emptySilhouettes() {
        Silhouette empty = new Silhouette(7, 5, new boolean[35]);
        Silhouette one = rectangle(7, 5, 1, 1, 2, 2);
        assertEquals(1, empty.intersectionOverUnion(empty));
        assertEquals(1, empty.dice(empty));
        assertEquals(0, empty.intersectionOverUnion(one));
        assertEquals(0, one.intersectionOverUnion(empty));
        assertEquals(0, one.dice(empty));
        assertEquals(0, SilhouetteDistance.hausdorff(empty, empty));
        assertEquals(Double.POSITIVE_INFINITY, SilhouetteDistance.hausdorff(one, empty));
        assertEquals(0, SilhouetteDistance.directedHausdorff(empty, one));
        assertEquals(0, SilhouetteDistance.chamfer(empty, one));
        assertEquals(Double.POSITIVE_INFINITY, SilhouetteDistance.chamfer(one, empty));
    }

    /** U40: a convex set and its copy shifted by (3,4). */
    @Test
    void u40_shiftedSquares() {
        assertEquals(5, SilhouetteDistance.hausdorff(SQUARE, SHIFTED));
        assertEquals(5, SilhouetteDistance.directedHausdorff(SQUARE, SHIFTED));
        assertEquals(5, SilhouetteDistance.directedHausdorff(SHIFTED, SQUARE));
    }

    /** U41: pixel discs of radius 10 and 14 about one centre. */
    @Test
    void u41_discsInDiscs() {
        assertEquals(4.123105625617661, SilhouetteDistance.hausdorff(disc(10), disc(14)), 1e-15);
        assertEquals(Math.sqrt(17), SilhouetteDistance.directedHausdorff(disc(14), disc(10)));
        assertEquals(0, SilhouetteDistance.directedHausdorff(disc(10), disc(14)));
    }

    /** U42: mean nearest distance of both. */
    @Test
    void u42_chamfer() {
        assertEquals(0.7652207919528002, SilhouetteDistance.chamfer(SQUARE, SHIFTED), 1e-12);
        assertEquals(0.7652207919528002, SilhouetteDistance.chamfer(SHIFTED, SQUARE), 1e-12);
        assertEquals(1.2146719390141454, SilhouetteDistance.chamfer(disc(14), disc(10)), 1e-12);
        assertEquals(0, SilhouetteDistance.chamfer(disc(10), disc(14)));
    }

    /** U43: a published manual's example. */
    @Test
    void u43_pointSets() {
        double[][] u = {{1, 0}, {0, 1}, {-1, 0}, {0, -1}};
        double[][] v = {{2, 0}, {0, 2}, {-2, 0}, {0, -4}};
        assertEquals(2.23606797749979, PointSets.directedHausdorff(u, v), 1e-15);
        assertEquals(3, PointSets.directedHausdorff(v, u));
        assertEquals(3, PointSets.hausdorff(u, v));
        assertThrows(IllegalArgumentException.class, () -> PointSets.hausdorff(u, new double[0][]));
        assertThrows(IllegalArgumentException.class, () -> PointSets.hausdorff(u, new double[][] {{Double.NaN, 0}}));
    }

    /** The envelope of parabolas against trying every pixel; whole numbers, so equal to the bit. */
    @ParameterizedTest
    @CsvSource({"1,1,1", "1,9,2", "9,1,1", "7,5,3", "16,13,1", "31,40,12", "40,31,300"})
    void distancesEqualPlain(int width, int height, int count) {
        Random random = new Random(42);
        boolean[] inside = new boolean[width * height];
        for (int n = 0; n < count; n++) {
            inside[random.nextInt(inside.length)] = true;
        }
        double[] squared = DistanceTransform.squared(new Silhouette(width, height, inside));
        for (int p = 0; p < inside.length; p++) {
            double nearest = Double.POSITIVE_INFINITY;
            for (int q = 0; q < inside.length; q++) {
                if (inside[q]) {
                    double dx = p % width - q % width;
                    double dy = p / width - q / width;
                    nearest = Math.min(nearest, dx * dx + dy * dy);
                }
            }
            assertEquals(nearest, squared[p], "pixel (" + p % width + ", " + p / width + "), seed 42");
        }
    }

    @Test
    void refusesOtherRasters() {
        Silhouette a = new Silhouette(4, 3, new boolean[12]);
        Silhouette b = new Silhouette(3, 4, new boolean[12]);
        assertThrows(IllegalArgumentException.class, () -> a.intersectionOverUnion(b));
        assertThrows(IllegalArgumentException.class, () -> a.dice(b));
        assertThrows(IllegalArgumentException.class, () -> SilhouetteDistance.hausdorff(a, b));
        assertThrows(IllegalArgumentException.class, () -> SilhouetteDistance.chamfer(a, b));
        assertThrows(IllegalArgumentException.class, () -> new Silhouette(4, 3, new boolean[11]));
        assertThrows(IllegalArgumentException.class, () -> Silhouette.of(CheckPlanes.RAMP, Double.NaN));
        assertTrue(Silhouette.of(CheckPlanes.RAMP, 2).count() == 0);
    }

    private static final Silhouette SQUARE = rectangle(40, 40, 5, 5, 20, 20);
    private static final Silhouette SHIFTED = rectangle(40, 40, 8, 9, 20, 20);

    private static Silhouette rectangle(int width, int height, int left, int top, int wide, int high) {
        boolean[] inside = new boolean[width * height];
        for (int p = 0; p < inside.length; p++) {
            int x = p % width - left;
            int y = p / width - top;
            inside[p] = x >= 0 && x < wide && y >= 0 && y < high;
        }
        return new Silhouette(width, height, inside);
    }

    private static Silhouette disc(double radius) {
        return Silhouette.of(CheckPlanes.disc(31.5, radius), .5);
    }

    /** A disc of radius 20 about (cx, 22) in a field of 72 x 44, {@code fine} pixels a unit. */
    private static Silhouette fineDisc(double cx, int fine) {
        boolean[] inside = new boolean[72 * fine * 44 * fine];
        for (int p = 0; p < inside.length; p++) {
            double x = (p % (72 * fine) + .5) / fine - cx;
            double y = (p / (72 * fine) + .5) / fine - 22;
            inside[p] = x * x + y * y <= 400;
        }
        return new Silhouette(72 * fine, 44 * fine, inside);
    }
}

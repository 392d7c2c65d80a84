package org.wispwright.optimize.solid;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayDeque;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;

/** Which cells a thing fills. */
class SolidCellsTest {
    private static final GridShape BOX = new GridShape(24, 20, 22, 0.1, -1, 0, 3);
    private static final Vec3 MIDDLE = new Vec3(0.2, 1, 4.1);

    private static SolidCells cells(GridShape box, Solid solid, Vec3 at, Vec3 rotation) {
        return new SolidCells(box, List.of(new Obstacle("thing", solid, Curve.still(at), Curve.still(rotation))), 1, 2, 24, new Lanes(1));
    }

    private static int count(SolidCells cells) {
        int sum = 0;
        for (int c = 0; c < cells.shape().cells(); c++) {
            sum += cells.isSolid(c) ? 1 : 0;
        }
        return sum;
    }

    /**
     * Volumes: ball 4/3 pi r^3, cylinder 2 pi r^2 l, box 8 abc (textbook), however turned; counting centres errs by the surface's share.
     */
    @Test void volumes() {
        assertEquals(4 / 3.0 * Math.PI * Math.pow(0.72, 3), 1e-3 * count(cells(BOX, new Solid.Ball(0.72), MIDDLE, new Vec3(0, 0, 0))),
                0.02);
        Vec3 turned = new Vec3(0.3, -0.4, 0.5);
        assertEquals(2 * Math.PI * 0.5 * 0.5 * 0.6, 1e-3 * count(cells(BOX, new Solid.Cylinder(0.5, 0.6), MIDDLE, turned)), 0.02);
        assertEquals(8 * 0.4 * 0.5 * 0.6, 1e-3 * count(cells(BOX, new Solid.Box(new Vec3(0.4, 0.5, 0.6)), MIDDLE, turned)), 0.02);
    }

    /** A quarter turn about z lays a cylinder along x. */
    @Test void aTurnedCylinderLies() {
        SolidCells lying = cells(BOX, new Solid.Cylinder(0.25, 0.8), MIDDLE, new Vec3(0, 0, Math.PI / 2));
        assertTrue(lying.isSolid(BOX.cell(12 + 6, 10, 11)));
        assertFalse(lying.isSolid(BOX.cell(12, 10 + 4, 11)));
    }

    /**
     * Cohen-Or and Kaufman (1995): a plate of half a cell to each side parts the cells. Thin plates, any way round: no way through by
     * faces.
     */
    @ParameterizedTest
    @CsvSource({"0,0,0,0.05", "0,0,0,0.0", "0.3,0.2,0.1,0.013", "0.615,0,0,0.03", "0,0.785398,0,0.02", "0.6,0.5,-0.4,0.07", "0,0.78,0.6,0.04"})
    void aThinPlateParts(double rx, double ry, double rz, double shift) {
        Vec3 at = MIDDLE.plus(new Vec3(shift, shift / 2, 0));
        SolidCells cells = cells(BOX, new Solid.Box(new Vec3(1e-4, 9, 9)), at, new Vec3(rx, ry, rz));
        Obstacle plate = new Obstacle("plate", new Solid.Ball(1), Curve.still(at), Curve.still(new Vec3(rx, ry, rz)));
        boolean[] seen = new boolean[BOX.cells()];
        ArrayDeque<Integer> queue = new ArrayDeque<>();
        int before = 0;
        for (int c = 0; c < seen.length; c++) {
            if (!cells.isSolid(c) && side(plate, c) < 0) {
                seen[c] = true;
                queue.add(c);
                before++;
            }
        }
        assertTrue(before > 1000);
        while (!queue.isEmpty()) {
            int c = queue.remove();
            assertTrue(side(plate, c) < 0, "a way through at cell " + c);
            int[] at3 = {c % 24, c / 24 % 20, c / 480};
            for (int face = 0; face < 6; face++) {
                int[] to = at3.clone();
                to[face / 2] += face % 2 == 0 ? -1 : 1;
                if (to[0] >= 0 && to[1] >= 0 && to[2] >= 0 && to[0] < 24 && to[1] < 20 && to[2] < 22) {
                    int other = BOX.cell(to[0], to[1], to[2]);
                    if (!seen[other] && !cells.isSolid(other)) {
                        seen[other] = true;
                        queue.add(other);
                    }
                }
            }
        }
    }

    private static double side(Obstacle plate, int c) {
        return plate.pose(1, 2, 24).toLocal(new Vec3(-1 + (c % 24 + 0.5) * 0.1, (c / 24 % 20 + 0.5) * 0.1, 3 + (c / 480 + 0.5) * 0.1)).x();
    }

    /**
     * A ball from a volume of distances, sampled twice and half as finely as the cells, and from a mask: the ball's own cells, but for
     * its skin.
     */
    @ParameterizedTest @ValueSource(doubles = {0.05, 0.2}) void aBallFromAVolume(double h) {
        int n = (int) Math.round(2 / h);
        GridShape fine = new GridShape(n, n, n, h);
        float[] distance = new float[fine.cells()];
        float[] mask = new float[fine.cells()];
        for (int c = 0; c < distance.length; c++) {
            double x = (c % n + 0.5) * h - 1;
            double y = (c / n % n + 0.5) * h - 1;
            double z = (c / n / n + 0.5) * h - 1;
            distance[c] = (float) (Math.sqrt(x * x + y * y + z * z) - 0.7);
            mask[c] = distance[c] < 0 ? 1 : 0;
        }
        int ball = count(cells(BOX, new Solid.Ball(0.7), MIDDLE, new Vec3(0, 0, 0)));
        Vec3 turned = new Vec3(0.4, 0.3, 0.2);
        assertEquals(ball, count(cells(BOX, new Solid.Volume(fine, distance, Solid.Volume.Kind.DISTANCE), MIDDLE, turned)), 0.08 * ball);
        assertEquals(ball, count(cells(BOX, new Solid.Volume(fine, mask, Solid.Volume.Kind.MASK), MIDDLE, turned)),
                (h < 0.1 ? 0.08 : 0.2) * ball);
    }

    /** Clearance by its definition: the largest index difference to the nearest solid cell. */
    @Test void clearanceByDefinition() {
        GridShape box = new GridShape(13, 11, 7, 1);
        SolidCells cells = cells(box, new Solid.Ball(1.6), new Vec3(3.2, 5.1, 2.9), new Vec3(0, 0, 0));
        for (int c = 0; c < box.cells(); c++) {
            int least = SolidCells.FAR;
            for (int s = 0; s < box.cells(); s++) {
                if (cells.isSolid(s)) {
                    int away = Math.max(Math.abs(c % 13 - s % 13), Math.max(Math.abs(c / 13 % 11 - s / 13 % 11),
                            Math.abs(c / 143 - s / 143)));
                    least = Math.min(least, away);
                }
            }
            assertEquals(least, cells.clearance(c), "cell " + c);
        }
    }

    /** Half the cells each way: the same volume, within the coarser surface's share. Geometry is in metres. */
    @Test void coarserGridsHoldTheSameThing() {
        GridShape half = new GridShape(12, 10, 11, 0.2, -1, 0, 3);
        assertEquals(count(cells(BOX, new Solid.Ball(0.7), MIDDLE, new Vec3(0, 0, 0))),
                8 * count(cells(half, new Solid.Ball(0.7), MIDDLE, new Vec3(0, 0, 0))), 0.1 * 1437);
    }

    @Test void formsThatAreNone() {
        assertThrows(IllegalArgumentException.class, () -> new Solid.Ball(Double.NaN));
        assertThrows(IllegalArgumentException.class, () -> new Solid.Box(new Vec3(1, 0, 1)));
        assertThrows(IllegalArgumentException.class, () -> new Solid.Cylinder(1, -1));
        assertThrows(IllegalArgumentException.class, () -> new Solid.Volume(BOX, new float[3], Solid.Volume.Kind.MASK));
        assertThrows(IllegalArgumentException.class, () -> new Obstacle(" ", new Solid.Ball(1), Curve.still(MIDDLE), Curve.still(MIDDLE)));
    }
}

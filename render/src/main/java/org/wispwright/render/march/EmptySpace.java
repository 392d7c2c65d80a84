package org.wispwright.render.march;

import java.util.Arrays;
import org.wispwright.render.lanes.Lanes;

/**
 * Which blocks of {@value #SIDE}^3 lattice cells hold nothing, so that a forward march can pass over them. A block counts as
 * empty when every value that interpolation inside it can read is exactly 0, whatever the sign of the others: what is left
 * out would have added exactly nothing.
 */
final class EmptySpace {
    static final int SHIFT = 2;
    static final int SIDE = 1 << SHIFT;

    private final int blocksX;
    private final int blocksY;
    private final int blocksZ;
    private final boolean[] filled;

    EmptySpace(BorderedCells cells) {
        blocksX = (cells.acrossX() + SIDE - 1) >> SHIFT;
        blocksY = (cells.acrossY() + SIDE - 1) >> SHIFT;
        blocksZ = (cells.acrossZ() + SIDE - 1) >> SHIFT;
        filled = new boolean[blocksX * blocksY * blocksZ];
    }

    int blocksX() {
        return blocksX;
    }

    int blocksY() {
        return blocksY;
    }

    boolean[] filled() {
        return filled;
    }

    /** Looks at every value once more; overwrites what was known. */
    void update(BorderedCells cells, Lanes lanes) {
        lanes.forEach(blocksZ, bz -> updateLayer(cells, bz));
    }

    /** Treats every block as filled, so that nothing is passed over. */
    void fillAll() {
        Arrays.fill(filled, true);
    }

    private void updateLayer(BorderedCells cells, int bz) {
        for (int by = 0; by < blocksY; by++) {
            for (int bx = 0; bx < blocksX; bx++) {
                filled[bx + blocksX * (by + blocksY * bz)] = anyIn(cells, bx, by, bz);
            }
        }
    }

    private static boolean anyIn(BorderedCells cells, int bx, int by, int bz) {
        float[] v = cells.values();
        int endX = Math.min((bx + 1) * SIDE, cells.acrossX() - 1);
        int endY = Math.min((by + 1) * SIDE, cells.acrossY() - 1);
        int endZ = Math.min((bz + 1) * SIDE, cells.acrossZ() - 1);
        for (int k = bz * SIDE; k <= endZ; k++) {
            for (int j = by * SIDE; j <= endY; j++) {
                int row = cells.strideY() * j + cells.strideZ() * k;
                for (int i = bx * SIDE; i <= endX; i++) {
                    if (v[row + i] != 0) {
                        return true;
                    }
                }
            }
        }
        return false;
    }
}

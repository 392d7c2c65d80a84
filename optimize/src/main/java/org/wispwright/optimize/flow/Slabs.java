package org.wispwright.optimize.flow;

import java.util.function.IntConsumer;
import org.wispwright.render.lanes.Lanes;

/**
 * Slabs of z for a scatter: pieces that write beyond their own cells, yet need no atomics and leave the same bits always.
 * <p>A piece at z may write to {@code z - reach .. z + reach}. Slabs are at least twice the reach thick; all even slabs
 * run first, side by side, then all odd ones. The division depends on the box and the reach, never on the thread count.
 */
final class Slabs {
    private static final int MOST = 16;

    private final int nz;
    private final int count;

    /** @param reach how far in z a piece may write, in cells, 0 or more */
    Slabs(int nz, int reach) {
        this.nz = nz;
        int slabs = Math.max(1, Math.min(MOST, nz / Math.max(1, 2 * reach)));
        // Three or an even number: with five, one of the even slabs would run alone.
        slabs = slabs > 3 ? slabs / 2 * 2 : slabs;
        count = slabs;
    }

    /** Runs the body for every z: even slabs, then odd; within a slab z rises. */
    void forEach(Lanes lanes, IntConsumer bodyAtZ) {
        lanes.forEach((count + 1) / 2, s -> run(2 * s, bodyAtZ));
        lanes.forEach(count / 2, s -> run(2 * s + 1, bodyAtZ));
    }

    private void run(int slab, IntConsumer bodyAtZ) {
        int end = (int) ((long) nz * (slab + 1) / count);
        for (int k = (int) ((long) nz * slab / count); k < end; k++) {
            bodyAtZ.accept(k);
        }
    }
}

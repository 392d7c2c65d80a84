package org.wispwright.ui.shot;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Optional;
import org.junit.jupiter.api.Test;

class MemoryNeedTest {
    /** By hand: 1024 cells, 32 steps: 16 bytes at log2(32) + 1 = 6 moments, 212 and 160 once are 468 a cell; plus 96 MiB. */
    @Test
    void bytesByHand() {
        assertEquals((96L << 20) + 1024 * 468, MemoryNeed.bytes(1024, 32));
    }

    /** By hand: a cube of 64 has arrays of 1 MiB, which with their heads take two regions of 1 MiB; one of 128 nine for eight. */
    @Test
    void largeArraysTakeWholeRegions() {
        long mib = 1L << 20;
        assertEquals(2, MemoryNeed.waste(mib, mib));
        assertEquals(9 / 8.0, MemoryNeed.waste(8 * mib, mib));
        assertEquals(1, MemoryNeed.waste(mib, 4 * mib));
        assertEquals(1, MemoryNeed.waste(mib, 0));
    }

    /** What is said to fit fits, and a tenth more along each axis does not. */
    @Test
    void whatFitsFitsAndNotMuchMoreDoes() {
        int[] fit = MemoryNeed.fitting(new int[] {512, 1024, 512}, 48, 1L << 30).orElseThrow();
        assertTrue(MemoryNeed.bytes((long) fit[0] * fit[1] * fit[2], 48) <= 1L << 30);
        assertTrue(MemoryNeed.bytes((long) (1.331 * fit[0] * fit[1] * fit[2]), 48) > 1L << 30);
        assertEquals(2.0, (double) fit[1] / fit[0], 0.02);
    }

    @Test
    void thePlaneCaseStaysPlane() {
        assertEquals(1, MemoryNeed.fitting(new int[] {8000, 8000, 1}, 48, 1L << 30).orElseThrow()[2]);
    }

    @Test
    void nothingFitsBelowTheBase() {
        assertEquals(Optional.empty(), MemoryNeed.fitting(new int[] {64, 64, 64}, 48, 16L << 20).map(f -> 1));
    }

    @Test
    void sizesForPeople() {
        assertArrayEquals(new String[] {"1.5 KiB", "2.0 MiB", "1.5 GiB"},
                new String[] {MemoryNeed.inWords(1536), MemoryNeed.inWords(2 << 20), MemoryNeed.inWords(3L << 29)});
    }
}

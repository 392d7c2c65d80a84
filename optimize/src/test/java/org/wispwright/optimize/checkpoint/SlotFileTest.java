package org.wispwright.optimize.checkpoint;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Expected values are ours: the bits that went in. */
class SlotFileTest {
    @TempDir
    Path folder;

    /** Sizes around the buffer's, so that a chunk lost or doubled shows. */
    @Test
    void slotsComeBackToTheBitInAnyOrder() {
        int[] sizes = {1, (1 << 18) - 1, 1 << 18, (1 << 18) + 3};
        long floats = Arrays.stream(sizes).sum();
        Path file = folder.resolve("slots");
        try (SlotFile slots = new SlotFile(file, floats)) {
            for (int slot : new int[] {2, 0, 1, 2}) {
                slots.save(slot, arrays(sizes, slot));
            }
            for (int slot : new int[] {1, 2, 0}) {
                List<float[]> back = arrays(sizes, 99);
                slots.restore(slot, back);
                List<float[]> wanted = arrays(sizes, slot);
                for (int n = 0; n < sizes.length; n++) {
                    assertEquals(-1, Arrays.mismatch(wanted.get(n), back.get(n)), "slot " + slot + " array " + n);
                }
            }
        }
        assertFalse(Files.exists(file));
    }

    @Test
    void whatCannotBeIsSaid() {
        assertThrows(IllegalArgumentException.class, () -> new SlotFile(folder.resolve("a"), 0));
        assertThrows(UncheckedIOException.class, () -> new SlotFile(folder.resolve("none").resolve("a"), 4));
        try (SlotFile slots = new SlotFile(folder.resolve("b"), 4)) {
            assertThrows(IllegalArgumentException.class, () -> slots.save(0, List.of(new float[3])));
            assertThrows(UncheckedIOException.class, () -> slots.restore(5, List.of(new float[4])));
        }
    }

    private static List<float[]> arrays(int[] sizes, int seed) {
        Random random = new Random(seed);
        return Arrays.stream(sizes).mapToObj(size -> {
            float[] a = new float[size];
            for (int n = 0; n < size; n++) {
                a[n] = n == 0 ? Float.NaN : random.nextFloat();
            }
            return a;
        }).toList();
    }
}

package org.wispwright.render.lanes;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.concurrent.atomic.AtomicInteger;
import java.util.concurrent.atomic.AtomicIntegerArray;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Every piece exactly once, for any number of lanes, call after call; a failing piece fails the caller. */
class LanesTest {

    @ParameterizedTest @ValueSource(ints = {1, 2, 3, 8}) void everyPieceOnce(int threads) {
        try (Lanes lanes = new Lanes(threads)) {
            assertEquals(threads, lanes.count());
            for (int round = 0; round < 2_000; round++) {
                int pieces = round % 37;
                AtomicIntegerArray seen = new AtomicIntegerArray(pieces + 1);
                lanes.forEach(pieces, seen::incrementAndGet);
                for (int n = 0; n < pieces; n++) {
                    assertEquals(1, seen.get(n), "round " + round + " piece " + n);
                }
                assertEquals(0, seen.get(pieces));
            }
        }
    }

    @ParameterizedTest @ValueSource(ints = {1, 2, 8}) void aFailingPieceFailsTheCallerAndTheLanesGoOn(int threads) {
        try (Lanes lanes = new Lanes(threads)) {
            AtomicInteger after = new AtomicInteger();
            IllegalStateException thrown = assertThrows(IllegalStateException.class, () -> lanes.forEach(1_000, n -> {
                if (n == 5) {
                    throw new IllegalStateException("piece 5");
                }
                after.incrementAndGet();
            }));
            assertEquals("piece 5", thrown.getMessage());
            assertTrue(after.get() < 1_000);
            AtomicInteger next = new AtomicInteger();
            lanes.forEach(64, n -> next.incrementAndGet());
            assertEquals(64, next.get());
        }
    }

    @Test void refusesWhatItCannotBe() {
        assertThrows(IllegalArgumentException.class, () -> new Lanes(0));
        assertThrows(IllegalArgumentException.class, () -> new Lanes(2_000));
        Lanes closed = new Lanes(2);
        closed.close();
        assertThrows(IllegalStateException.class, () -> closed.forEach(3, n -> { }));
    }
}

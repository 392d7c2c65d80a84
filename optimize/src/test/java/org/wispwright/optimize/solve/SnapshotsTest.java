package org.wispwright.optimize.solve;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import org.junit.jupiter.api.Test;

/** Which states lie where. By hand from the schedule of Griewank and Walther (2000), ACM TOMS 26(1), 19-45. */
class SnapshotsTest {

    /**
     * With a slot for every state but the last two each is written once and read once, by the step that starts at it. Of 7 steps
     * with 5 slots one state has none, number 1 (the split is the latest): the step from there costs the start a second reading.
     */
    @Test
    void usesAreWrittenAndRead() {
        assertArrayEquals(new int[] {2, 2, 2, 2, 2}, Snapshots.uses(6, 5));
        assertArrayEquals(new int[] {3, 2, 2, 2, 2}, Snapshots.uses(7, 5));
    }

    @Test
    void theLeastUsedGoToDisk() {
        assertArrayEquals(new int[] {-1, 0, 1, 2, -1, -1}, Snapshots.placesOnDisk(Snapshots.uses(29, 6), 3));
        assertArrayEquals(new int[] {-1, 1, -1, 0}, Snapshots.placesOnDisk(new int[] {1, 5, 6, 2}, 2));
        assertArrayEquals(new int[] {-1, 0, 1}, Snapshots.placesOnDisk(new int[] {1, 5, 6}, 7), "the start never does");
    }

    @Test
    void aDiskNeedsAFile() {
        assertThrows(IllegalArgumentException.class, () -> new StateRoom(1, 1, null));
        assertThrows(IllegalArgumentException.class, () -> new StateRoom(1, -1, null));
        assertEquals(0, StateRoom.inMemory(7).diskBytes());
    }
}

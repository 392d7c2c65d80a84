package org.wispwright.warp.retouch;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotSame;
import static org.junit.jupiter.api.Assertions.assertSame;

import java.util.Arrays;
import org.junit.jupiter.api.Test;

/** Expected values are ours: an array that was used before comes back as a new one would. */
class SpareTest {
    @Test
    void whatMustBeZeroIsZeroAgain() {
        Spare spare = new Spare();
        double[] first = spare.zeros();
        Arrays.fill(first, 3);
        spare.back(first);
        assertSame(first, spare.zeros());
        assertArrayEquals(new double[first.length], first);
        float[] window = spare.window(10);
        Arrays.fill(window, 2f);
        assertArrayEquals(new float[7], Arrays.copyOf(spare.window(7), 7));
        assertArrayEquals(new float[20], Arrays.copyOf(spare.window(20), 20));
    }

    @Test
    void arraysGoBackToTheirOwnSize() {
        Spare spare = new Spare();
        float[] one = spare.floats(1);
        float[] four = spare.floats(4);
        assertEquals(4 * one.length, four.length);
        spare.back(one);
        spare.back(four);
        assertSame(four, spare.floats(4));
        assertSame(one, spare.floats(1));
        assertNotSame(one, spare.floats(1));
        spare.back((float[]) null);
    }
}

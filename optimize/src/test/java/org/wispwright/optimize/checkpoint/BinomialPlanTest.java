package org.wispwright.optimize.checkpoint;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class BinomialPlanTest {
    private static final int MOST_STEPS = 240;
    private static final int MOST_SNAPSHOTS = 12;

    /** O58: forward solves' worth of a gradient's steps, (t(l,s) + l)/l with t from O60; Griewank and Walther (2000). */
    @ParameterizedTest(name = "O58 l {0}, s {1}")
    @CsvSource({"10, 3, 15", "20, 5, 33", "30, 10, 48", "48, 8, 89", "60, 1, 1770", "240, 10, 642"})
    void o58_forwardRunsOfAGradient(int l, int s, int t) {
        assertEquals((t + l) / (double) l, BinomialPlan.forwardRuns(l, s), 1e-15);
        CheckedChain chain = new CheckedChain(l, s);
        Reversal.run(chain, l, s);
        assertEquals(t + l, chain.advances + chain.tapes, "all forward steps, plain and taped");
    }

    /** O59: the longest chain, C(s+r, s); Griewank (1992), Griewank and Walther (2000), ACM TOMS 26, 19-45. Columns r = 0 to 10. */
    @ParameterizedTest(name = "O59 s {0}")
    @CsvSource({"1, '1 2 3 4 5 6 7 8 9 10 11'", "2, '1 3 6 10 15 21 28 36 45 55 66'", "3, '1 4 10 20 35 56 84 120 165 220 286'",
        "4, '1 5 15 35 70 126 210 330 495 715 1001'", "5, '1 6 21 56 126 252 462 792 1287 2002 3003'",
        "8, '1 9 45 165 495 1287 3003 6435 12870 24310 43758'", "10, '1 11 66 286 1001 3003 8008 19448 43758 92378 184756'"})
    void o59_longestChain(int s, String row) {
        String[] longest = row.split(" ");
        for (int r = 0; r < longest.length; r++) {
            int l = Integer.parseInt(longest[r]);
            assertEquals(l, BinomialPlan.longest(s, r), "r " + r);
            assertEquals(r, BinomialPlan.repeats(l, s), "least r for " + l);
            assertEquals(r + 1, BinomialPlan.repeats(l + 1, s), "least r for one step more");
        }
        assertEquals(Long.MAX_VALUE, BinomialPlan.longest(200, 200), "what does not fit is as good as endless");
    }

    /** O60: the closed form, all entries {@code t (r)} for s = 1, 2, 3, 4, 5, 8, 10. */
    @ParameterizedTest(name = "O60 l {0}")
    @CsvSource({"5, '10 4 6 2 5 2 4 1 4 1 4 1 4 1'", "10, '45 9 20 3 15 2 14 2 13 2 10 2 9 1'",
        "15, '105 14 40 4 30 3 24 2 23 2 20 2 18 2'", "20, '190 19 65 5 45 3 39 3 33 2 30 2 28 2'",
        "24, '276 23 88 6 61 4 51 3 44 3 38 2 36 2'", "30, '435 29 126 7 85 4 69 3 62 3 50 2 48 2'",
        "48, '1128 47 267 9 170 5 136 4 116 3 89 3 84 2'", "60, '1770 59 380 10 234 6 184 4 156 4 125 3 108 2'",
        "100, '4950 99 845 13 490 7 374 5 316 4 245 3 222 3'", "120, '7140 119 1120 14 630 7 474 5 396 4 305 3 282 3'",
        "240, '28680 239 3269 21 1685 10 1218 7 990 5 740 4 642 3'"})
    void o60_leastSteps(int l, String row) {
        int[] snapshots = {1, 2, 3, 4, 5, 8, 10};
        String[] entries = row.split(" ");
        for (int n = 0; n < snapshots.length; n++) {
            assertEquals(Long.parseLong(entries[2 * n]), BinomialPlan.leastSteps(l, snapshots[n]), "t, s " + snapshots[n]);
            assertEquals(Integer.parseInt(entries[2 * n + 1]), BinomialPlan.repeats(l, snapshots[n]), "r, s " + snapshots[n]);
        }
    }

    /** O60, "extra" steps beyond one forward sweep, t - (l - 1), for s = 2, 3, 4, 5, 8, 10. */
    @ParameterizedTest(name = "O60 extra, l {0}")
    @CsvSource({"10, '11 6 5 4 1 0'", "20, '46 26 20 14 11 9'", "30, '97 56 40 33 21 19'", "60, '321 175 125 97 66 49'",
        "120, '1001 511 355 277 186 163'", "240, '3030 1446 979 751 501 403'"})
    void o60_extraSteps(int l, String row) {
        int[] snapshots = {2, 3, 4, 5, 8, 10};
        String[] extra = row.split(" ");
        for (int n = 0; n < snapshots.length; n++) {
            assertEquals(Long.parseLong(extra[n]), BinomialPlan.leastSteps(l, snapshots[n]) - (l - 1), "s " + snapshots[n]);
        }
    }

    /** O60: closed form and split against the dynamic programme t(l,s) = min_m [m + t(l-m, s-1) + t(m, s)], its slow twin. */
    @Test
    void o60_theClosedFormIsTheDynamicProgramme() {
        long[][] t = new long[MOST_SNAPSHOTS + 1][MOST_STEPS + 1];
        for (int s = 1; s <= MOST_SNAPSHOTS; s++) {
            for (int l = 1; l <= MOST_STEPS; l++) {
                t[s][l] = s == 1 ? l * (l - 1L) / 2 : l == 1 ? 0 : Long.MAX_VALUE;
                int largest = 0;
                for (int m = 1; s > 1 && m < l; m++) {
                    long price = m + t[s - 1][l - m] + t[s][m];
                    if (price <= t[s][l]) {
                        t[s][l] = price;
                        largest = m;
                    }
                }
                assertEquals(t[s][l], BinomialPlan.leastSteps(l, s), "l " + l + ", s " + s);
                if (largest > 0) {
                    assertEquals(largest, BinomialPlan.split(l, s), "the largest best m, l " + l + ", s " + s);
                }
            }
        }
    }

    @Test
    void countsThatCannotWorkAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> BinomialPlan.leastSteps(0, 1));
        assertThrows(IllegalArgumentException.class, () -> BinomialPlan.leastSteps(1, 0));
        assertThrows(IllegalArgumentException.class, () -> BinomialPlan.longest(1, -1));
        assertThrows(IllegalArgumentException.class, () -> BinomialPlan.split(1, 2));
        assertThrows(IllegalArgumentException.class, () -> BinomialPlan.split(2, 1));
    }

    /** Bytes to snapshots, by hand. */
    @Test
    void aBudgetIsWholeStates() {
        assertEquals(3, new Budget(3_999, 1_000).snapshots(100));
        assertEquals(4, new Budget(4_000, 1_000).snapshots(100));
        assertEquals(9, new Budget(Long.MAX_VALUE, 1_000).snapshots(10), "more than steps - 1 are of no use");
        assertEquals(1, new Budget(4_000, 1_000).snapshots(1));
        String message = assertThrows(IllegalArgumentException.class, () -> new Budget(999, 1_000)).getMessage();
        assertTrue(message.contains("got 999 bytes") && message.contains("at least 1000"), message);
        assertEquals(3 + 5, new Budget(3_999, 5_999, 1_000).snapshots(100));
        assertEquals(5, new Budget(3_999, 5_999, 1_000).onDisk(100));
        assertEquals(9 - 3, new Budget(3_999, Long.MAX_VALUE, 1_000).onDisk(10), "more than steps - 1 are of no use");
        assertEquals(0, new Budget(9_000, 5_000, 1_000).onDisk(10), "memory first");
        assertThrows(IllegalArgumentException.class, () -> new Budget(1_000, -1, 1_000));
        assertThrows(IllegalArgumentException.class, () -> new Budget(1, 0));
        assertThrows(IllegalArgumentException.class, () -> new Budget(10, 1).snapshots(0));
    }
}

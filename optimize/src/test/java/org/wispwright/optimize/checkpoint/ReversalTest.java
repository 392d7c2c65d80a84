package org.wispwright.optimize.checkpoint;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ReversalTest {

    /**
     * O60: Griewank and Walther (2000), ACM TOMS 26, 19-45. A counting chain gets exactly t(l,s) plain steps, one tape and one pull a
     * step, never holds more than s snapshots, and the gradient has the bits of the twin that keeps everything.
     */
    @ParameterizedTest(name = "O60 run, l {0}")
    @ValueSource(ints = {1, 2, 3, 4, 5, 7, 10, 15, 20, 24, 30, 48, 60, 100, 120, 240})
    void o60_countsSnapshotsAndBits(int l) {
        double[] wanted = CheckedChain.gradientPlainly(l);
        for (int s : new int[] {1, 2, 3, 4, 5, 8, 10, l - 1, l, l + 1}) {
            if (s < 1) {
                continue;
            }
            CheckedChain chain = new CheckedChain(l, s);
            Reversal reversal = new Reversal(chain, l, s);
            reversal.forward(state -> { });
            reversal.reverse();
            String where = "l " + l + ", s " + s;
            assertEquals(BinomialPlan.leastSteps(l, s), chain.advances, where);
            assertEquals(chain.advances, reversal.plainSteps(), where);
            assertEquals(l, chain.tapes, where);
            assertEquals(l, chain.pulls, where);
            assertTrue(reversal.mostHeld() <= s, () -> where + ": held " + reversal.mostHeld());
            assertEquals(chain.saves, reversal.saves(), where);
            assertArrayEquals(wanted, chain.uBar, where);
        }
    }

    /** With a snapshot for every step nothing is run twice: l - 1 plain steps and l taped ones (O60, r = 1). */
    @Test
    void withEverythingKeptNothingIsRunTwice() {
        CheckedChain chain = new CheckedChain(30, 30);
        assertEquals(29, Reversal.run(chain, 30, 30));
        assertEquals(29, chain.saves, "states 0 to 28; the last step is taped at once");
        assertEquals(29, chain.restores);
    }

    /** The forward sweep shows every state once, in order, and can be the end of it; another may follow, and be reversed. */
    @Test
    void theForwardSweepShowsEveryStateOnce() {
        CheckedChain chain = new CheckedChain(20, 3);
        Reversal reversal = new Reversal(chain, 20, 3);
        assertThrows(IllegalStateException.class, reversal::reverse, "nothing to reverse yet");
        for (int run = 0; run < 2; run++) {
            chain.rewind();
            List<Integer> seen = new ArrayList<>();
            double[] loss = {0};
            reversal.forward(state -> {
                assertEquals(chain.current(), state);
                seen.add(state);
                loss[0] += state == 0 ? 0 : CheckedChain.weight(state) * chain.p() * chain.p() / 2;
            });
            assertEquals(21, seen.size());
            for (int n = 0; n <= 20; n++) {
                assertEquals(n, seen.get(n));
            }
            assertEquals(19, chain.advances, "one sweep: the last step is the taped one");
            assertEquals(1, chain.tapes);
            assertEquals(0, chain.pulls);
            if (run == 1) {
                reversal.reverse();
                assertEquals(45, chain.advances);
                assertEquals(loss[0], chain.loss, 1e-13);
                assertArrayEquals(CheckedChain.gradientPlainly(20), chain.uBar);
                assertThrows(IllegalStateException.class, reversal::reverse, "once a sweep");
            }
        }
    }

    /** A throw on the way (a cancel) comes out; what was half done cannot be reversed, and the next sweep is whole. */
    @Test
    void aThrowOnTheWayLeavesNothingHalfDone() {
        CheckedChain chain = new CheckedChain(24, 4);
        Reversal reversal = new Reversal(chain, 24, 4);
        assertThrows(IllegalStateException.class, () -> reversal.forward(state -> {
            if (state == 11) {
                throw new IllegalStateException("cancelled");
            }
        }));
        assertThrows(IllegalStateException.class, reversal::reverse);
        chain.rewind();
        reversal.forward(state -> { });
        reversal.reverse();
        assertEquals(51, chain.advances);
        assertArrayEquals(CheckedChain.gradientPlainly(24), chain.uBar);
    }

    /** The twin's gradient itself, against central differences of the loss: else equal bits would prove little. */
    @Test
    void theTwinIsRight() {
        double[] gradient = CheckedChain.gradientPlainly(12);
        for (int n = 0; n < 12; n++) {
            double h = 1e-6;
            double slope = (lossPlainly(12, n, h) - lossPlainly(12, n, -h)) / (2 * h);
            assertEquals(slope, gradient[n], 1e-7 * Math.max(1, Math.abs(slope)), "control " + n);
            assertNotEquals(0, gradient[n]);
        }
    }

    private static double lossPlainly(int steps, int changed, double by) {
        double[] u = CheckedChain.controls(steps);
        u[changed] += by;
        double p = .3;
        double q = -.7;
        double loss = 0;
        for (int n = 0; n < steps; n++) {
            double next = Math.cos(p) + q + u[n];
            q = p * q / (1 + q * q);
            p = next;
            loss += CheckedChain.weight(n + 1) * p * p / 2;
        }
        return loss;
    }
}

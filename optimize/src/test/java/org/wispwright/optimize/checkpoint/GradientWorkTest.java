package org.wispwright.optimize.checkpoint;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * What a gradient costs, counted and not timed: the seconds of O57 are left to the benchmarks, where the machine is quiet and said.
 */
class GradientWorkTest {

    /**
     * O57: Baur and Strassen (1983), Theoretical Computer Science 22, 317-330: value and gradient together take at most 5 times the
     * operations of the value, however many unknowns. Counted on the product of n numbers (their own kind of example) and on a sum
     * of squares of differences.
     */
    @ParameterizedTest(name = "O57 operations, n = {0}")
    @ValueSource(ints = {2, 10, 10_000})
    void o57_operationsOfAGradient(int n) {
        CountingTape product = new CountingTape(n);
        int value = 0;
        for (int i = 1; i < n; i++) {
            value = product.times(value, i);
        }
        assertCheap(product, value, n);
        CountingTape squares = new CountingTape(n);
        int sum = squares.square(0);
        for (int i = 1; i < n; i++) {
            sum = squares.plus(sum, squares.square(squares.minus(i, i - 1)));
        }
        assertCheap(squares, sum, n);
        double[] x = CountingTape.point(n);
        double[] g = squares.gradient(sum);
        double[] byHand = new double[n];
        byHand[0] = 2 * x[0];
        for (int i = 1; i < n; i++) {
            byHand[i] += 2 * (x[i] - x[i - 1]);
            byHand[i - 1] -= 2 * (x[i] - x[i - 1]);
        }
        assertArrayEquals(byHand, g, 1e-15);
    }

    /** O57, everything stored: a gradient is l forward steps (l - 1 plain, 1 taped), l - 1 taped again, l pulls; no control is in it. */
    @Test
    void o57_stepsOfAGradientDoNotDependOnTheControls() {
        int[][] counts = new int[2][];
        for (int n = 0; n < 2; n++) {
            ManyControls chain = new ManyControls(n == 0 ? 10 : 10_000);
            long plain = Reversal.run(chain, 30, 30);
            assertEquals(29, plain);
            counts[n] = new int[] {chain.forwards, chain.pulls};
        }
        assertArrayEquals(new int[] {59, 30}, counts[0]);
        assertArrayEquals(counts[0], counts[1]);
    }

    private static void assertCheap(CountingTape tape, int value, int n) {
        long forward = tape.operations;
        tape.gradient(value);
        long all = tape.operations;
        assertTrue(all <= 5 * forward, () -> "n " + n + ": value " + forward + " operations, with its gradient " + all);
        assertTrue(all > forward);
    }

    /** Reverse mode over +, -, *, square on a list of results, counting one for each addition and multiplication. */
    private static final class CountingTape {
        long operations;
        private final int unknowns;
        private double[] values;
        private int[] left;
        private int[] right;
        private char[] kind;
        private int count;

        CountingTape(int unknowns) {
            this.unknowns = unknowns;
            values = point(unknowns);
            count = unknowns;
            values = Arrays.copyOf(values, 4 * unknowns);
            left = new int[4 * unknowns];
            right = new int[4 * unknowns];
            kind = new char[4 * unknowns];
        }

        static double[] point(int n) {
            double[] x = new double[n];
            for (int i = 0; i < n; i++) {
                x[i] = 1 + .5 * Math.sin(i);
            }
            return x;
        }

        int plus(int a, int b) {
            return push('+', a, b, values[a] + values[b]);
        }

        int minus(int a, int b) {
            return push('-', a, b, values[a] - values[b]);
        }

        int times(int a, int b) {
            return push('*', a, b, values[a] * values[b]);
        }

        int square(int a) {
            return push('s', a, a, values[a] * values[a]);
        }

        double[] gradient(int of) {
            double[] bar = new double[count];
            bar[of] = 1;
            for (int n = count - 1; n >= unknowns; n--) {
                switch (kind[n]) {
                    case '+' -> add(bar, left[n], bar[n], right[n], bar[n], 2);
                    case '-' -> add(bar, left[n], bar[n], right[n], -bar[n], 2);
                    case '*' -> add(bar, left[n], values[right[n]] * bar[n], right[n], values[left[n]] * bar[n], 4);
                    default -> add(bar, left[n], 2 * values[left[n]] * bar[n], left[n], 0, 3);
                }
            }
            return Arrays.copyOf(bar, unknowns);
        }

        private void add(double[] bar, int a, double toA, int b, double toB, int work) {
            bar[a] += toA;
            bar[b] += toB;
            operations += work;
        }

        private int push(char what, int a, int b, double value) {
            kind[count] = what;
            left[count] = a;
            right[count] = b;
            values[count] = value;
            operations++;
            return count++;
        }
    }

    /** A chain that feels the sum of its controls in every step. */
    private static final class ManyControls implements ReversibleChain {
        int forwards;
        int pulls;
        private final double[] kept = new double[30];
        private final double push;
        private double state = 1;

        ManyControls(int controls) {
            double sum = 0;
            for (int n = 0; n < controls; n++) {
                sum += 1. / controls;
            }
            push = sum;
        }

        @Override
        public void save(int slot) {
            kept[slot] = state;
        }

        @Override
        public void restore(int slot) {
            state = kept[slot];
        }

        @Override
        public void advance(int step) {
            forwards++;
            state = Math.cos(state) + push;
        }

        @Override
        public void tape(int step) {
            advance(step);
        }

        @Override
        public void pull(int step) {
            pulls++;
        }
    }
}

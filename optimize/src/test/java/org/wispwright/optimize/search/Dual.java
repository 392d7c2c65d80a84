package org.wispwright.optimize.search;

/**
 * A number with its derivatives by n unknowns, carried forward through every operation: gradients of test functions
 * without a line of hand-made derivative. Griewank and Walther (2008), Evaluating Derivatives, chapter 3.
 */
final class Dual {
    final double value;
    final double[] by;

    private Dual(double value, double[] by) {
        this.value = value;
        this.by = by;
    }

    static Dual[] unknowns(double[] x) {
        Dual[] out = new Dual[x.length];
        for (int i = 0; i < x.length; i++) {
            out[i] = new Dual(x[i], new double[x.length]);
            out[i].by[i] = 1;
        }
        return out;
    }

    Dual plus(Dual b) {
        return combine(value + b.value, 1, b, 1);
    }

    Dual minus(Dual b) {
        return combine(value - b.value, 1, b, -1);
    }

    Dual times(Dual b) {
        return combine(value * b.value, b.value, b, value);
    }

    Dual over(Dual b) {
        return combine(value / b.value, 1 / b.value, b, -value / (b.value * b.value));
    }

    Dual plus(double c) {
        return chain(value + c, 1);
    }

    Dual minus(double c) {
        return chain(value - c, 1);
    }

    Dual times(double c) {
        return chain(value * c, c);
    }

    Dual square() {
        return chain(value * value, 2 * value);
    }

    Dual power(int n) {
        return chain(Math.pow(value, n), n == 0 ? 0 : n * Math.pow(value, n - 1));
    }

    Dual exp() {
        return chain(Math.exp(value), Math.exp(value));
    }

    Dual sin() {
        return chain(Math.sin(value), Math.cos(value));
    }

    Dual cos() {
        return chain(Math.cos(value), -Math.sin(value));
    }

    Dual sqrt() {
        return chain(Math.sqrt(value), .5 / Math.sqrt(value));
    }

    Dual atan() {
        return chain(Math.atan(value), 1 / (1 + value * value));
    }

    private Dual chain(double result, double slope) {
        double[] out = new double[by.length];
        for (int i = 0; i < out.length; i++) {
            out[i] = slope * by[i];
        }
        return new Dual(result, out);
    }

    private Dual combine(double result, double slope, Dual b, double slopeB) {
        double[] out = new double[by.length];
        for (int i = 0; i < out.length; i++) {
            out[i] = slope * by[i] + slopeB * b.by[i];
        }
        return new Dual(result, out);
    }
}

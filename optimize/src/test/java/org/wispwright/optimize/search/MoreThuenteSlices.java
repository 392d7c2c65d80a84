package org.wispwright.optimize.search;

import java.util.function.DoubleUnaryOperator;

/** The six functions of one step of Moré and Thuente (1994), ACM TOMS 20(3), section 5; outside check O62. */
final class MoreThuenteSlices {

    private MoreThuenteSlices() {
    }

    /** Function number 1 to 6. */
    static LineSearch.Slice slice(int number) {
        return switch (number) {
            case 1 -> new Counted(a -> -a / (a * a + 2), a -> (a * a - 2) / ((a * a + 2) * (a * a + 2)));
            case 2 -> new Counted(a -> Math.pow(a + .004, 5) - 2 * Math.pow(a + .004, 4),
                    a -> 5 * Math.pow(a + .004, 4) - 8 * Math.pow(a + .004, 3));
            case 3 -> {
                double b = .01;
                yield new Counted(a -> kink(a, b) + 2 * (1 - b) / (39 * Math.PI) * Math.sin(39 * Math.PI * a / 2),
                        a -> kinkSlope(a, b) + (1 - b) * Math.cos(39 * Math.PI * a / 2));
            }
            case 4 -> valley(.001, .001);
            case 5 -> valley(.01, .001);
            case 6 -> valley(.001, .01);
            default -> throw new IllegalArgumentException("no function " + number);
        };
    }

    private static double kink(double a, double b) {
        return a <= 1 - b ? 1 - a : a >= 1 + b ? a - 1 : (a - 1) * (a - 1) / (2 * b) + b / 2;
    }

    private static double kinkSlope(double a, double b) {
        return a <= 1 - b ? -1 : a >= 1 + b ? 1 : (a - 1) / b;
    }

    private static Counted valley(double b1, double b2) {
        double g1 = Math.sqrt(1 + b1 * b1) - b1;
        double g2 = Math.sqrt(1 + b2 * b2) - b2;
        return new Counted(a -> g1 * Math.sqrt((1 - a) * (1 - a) + b2 * b2) + g2 * Math.sqrt(a * a + b1 * b1),
                a -> g1 * (a - 1) / Math.sqrt((1 - a) * (1 - a) + b2 * b2) + g2 * a / Math.sqrt(a * a + b1 * b1));
    }

    /** A function with its derivative, counting evaluations. */
    static final class Counted implements LineSearch.Slice {
        int evaluations;
        private final DoubleUnaryOperator value;
        private final DoubleUnaryOperator derivative;
        private double at;

        Counted(DoubleUnaryOperator value, DoubleUnaryOperator derivative) {
            this.value = value;
            this.derivative = derivative;
        }

        @Override
        public double evaluate(double step) {
            evaluations++;
            at = step;
            return value.applyAsDouble(step);
        }

        @Override
        public double slope() {
            return derivative.applyAsDouble(at);
        }
    }
}

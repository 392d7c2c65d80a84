package org.wispwright.optimize.search;

/**
 * The interval of a line search: the best step so far, the other end, and the next trial step.
 * <p>With a the best step, b the newest, f and g value and slope there, the trial steps are the minimiser of the cubic
 * through (f_a, g_a, f_b, g_b), that of the parabola through (f_a, f_b, g_a), and the zero of the line through the slopes
 * (g_a, g_b):
 * <pre>
 *   theta = 3 (f_a - f_b)/(b - a) + g_a + g_b,  gamma = sign sqrt(theta^2 - g_a g_b)
 *   cubic  = a + (b - a) (gamma - g_a + theta) / (2 gamma - g_a + g_b)
 *   parabola = a + (b - a) g_a / (2 ((f_a - f_b)/(b - a) + g_a))
 *   line   = b + (a - b) g_b / (g_b - g_a)
 * </pre>
 * Case 1, f_b above f_a: the cubic if nearer to a than the parabola, else half way between the two. Case 2, slopes of opposite sign: the
 * one of cubic and line further from b. Case 3, same sign and flatter: the nearer to b of the two (kept within 0.66 of the way
 * to the other end) if the interval is closed, else the further. Case 4, same sign and not flatter: the cubic with the other
 * end if closed, else the limit.
 * <p>Source: Moré and Thuente (1994), ACM TOMS 20(3), section 4. Differences from it: none.
 */
final class Bracket {
    private static final double TOWARDS_OTHER = 0.66;

    double bestStep;
    double bestValue;
    double bestSlope;
    double otherStep;
    double otherValue;
    double otherSlope;
    /** True once a minimiser is known to lie between the two ends. */
    boolean closed;

    Bracket(double value0, double slope0) {
        bestValue = value0;
        bestSlope = slope0;
        otherValue = value0;
        otherSlope = slope0;
    }

    double width() {
        return Math.abs(otherStep - bestStep);
    }

    double middle() {
        return bestStep + 0.5 * (otherStep - bestStep);
    }

    /**
     * Takes in the newest evaluation and gives the next trial step.
     *
     * @param least limit of the trial step while the interval is open
     * @param most  the other limit
     * @param tilt  slope of the line to subtract from all values: mu phi'(0) for the auxiliary function, 0 for phi itself
     */
    double next(double step, double value, double slope, double least, double most, double tilt) {
        double fa = bestValue - bestStep * tilt;
        double ga = bestSlope - tilt;
        double fb = value - step * tilt;
        double gb = slope - tilt;
        double fo = otherValue - otherStep * tilt;
        double go = otherSlope - tilt;
        boolean opposite = gb * (ga / Math.abs(ga)) < 0;
        double trial;
        if (fb > fa) {
            trial = higher(step, fa, ga, fb, gb);
        } else if (opposite) {
            trial = turned(step, fa, ga, fb, gb);
        } else if (Math.abs(gb) < Math.abs(ga)) {
            trial = flatter(step, fa, ga, fb, gb, least, most);
        } else {
            trial = steeper(step, fb, gb, fo, go, least, most);
        }
        if (fb > fa) {
            otherStep = step;
            otherValue = value;
            otherSlope = slope;
            closed = true;
        } else {
            if (opposite) {
                otherStep = bestStep;
                otherValue = bestValue;
                otherSlope = bestSlope;
                closed = true;
            }
            bestStep = step;
            bestValue = value;
            bestSlope = slope;
        }
        return trial;
    }

    private double higher(double step, double fa, double ga, double fb, double gb) {
        double theta = 3 * (fa - fb) / (step - bestStep) + ga + gb;
        double gamma = root(theta, ga, gb);
        if (step < bestStep) {
            gamma = -gamma;
        }
        double share = ((gamma - ga) + theta) / (((gamma - ga) + gamma) + gb);
        double cubic = bestStep + share * (step - bestStep);
        double parabola = bestStep + ((ga / ((fa - fb) / (step - bestStep) + ga)) / 2) * (step - bestStep);
        return Math.abs(cubic - bestStep) < Math.abs(parabola - bestStep) ? cubic : cubic + (parabola - cubic) / 2;
    }

    private double turned(double step, double fa, double ga, double fb, double gb) {
        double theta = 3 * (fa - fb) / (step - bestStep) + ga + gb;
        double gamma = root(theta, ga, gb);
        if (step > bestStep) {
            gamma = -gamma;
        }
        double share = ((gamma - gb) + theta) / (((gamma - gb) + gamma) + ga);
        double cubic = step + share * (bestStep - step);
        double line = step + (gb / (gb - ga)) * (bestStep - step);
        return Math.abs(cubic - step) > Math.abs(line - step) ? cubic : line;
    }

    private double flatter(double step, double fa, double ga, double fb, double gb, double least, double most) {
        double theta = 3 * (fa - fb) / (step - bestStep) + ga + gb;
        double gamma = root(theta, ga, gb);                                    // 0 where the cubic has no minimiser
        if (step > bestStep) {
            gamma = -gamma;
        }
        double share = ((gamma - gb) + theta) / ((gamma + (ga - gb)) + gamma);
        double cubic;
        if (share < 0 && gamma != 0) {
            cubic = step + share * (bestStep - step);
        } else {
            cubic = step > bestStep ? most : least;
        }
        double line = step + (gb / (gb - ga)) * (bestStep - step);
        boolean cubicNearer = Math.abs(cubic - step) < Math.abs(line - step);
        if (closed) {
            double trial = cubicNearer ? cubic : line;
            double limit = step + TOWARDS_OTHER * (otherStep - step);
            return step > bestStep ? Math.min(limit, trial) : Math.max(limit, trial);
        }
        boolean cubicFurther = Math.abs(cubic - step) > Math.abs(line - step);
        return Math.max(least, Math.min(most, cubicFurther ? cubic : line));
    }

    private double steeper(double step, double fb, double gb, double fo, double go, double least, double most) {
        if (!closed) {
            return step > bestStep ? most : least;
        }
        double theta = 3 * (fb - fo) / (otherStep - step) + go + gb;
        double gamma = root(theta, go, gb);
        if (step > otherStep) {
            gamma = -gamma;
        }
        double share = ((gamma - gb) + theta) / (((gamma - gb) + gamma) + go);
        return step + share * (otherStep - step);
    }

    /** {@code sqrt(max(0, theta^2 - g h))}, scaled so that no square overflows. */
    private static double root(double theta, double g, double h) {
        double s = Math.max(Math.abs(theta), Math.max(Math.abs(g), Math.abs(h)));
        return s == 0 ? 0 : s * Math.sqrt(Math.max(0, (theta / s) * (theta / s) - (g / s) * (h / s)));
    }
}

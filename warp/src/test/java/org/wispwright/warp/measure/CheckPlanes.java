package org.wispwright.warp.measure;

import java.util.function.DoubleBinaryOperator;
import java.util.function.DoubleUnaryOperator;

/** The 64 x 64 planes of the outside checks for image comparison, x = column, y = row. */
final class CheckPlanes {
    static final Plane RAMP = plane((x, y) -> x / 63);
    static final Plane BLOB = blob(31.5);
    static final Plane BLOB3 = blob(34.5);
    static final Plane DISC = disc(31.5, 20);
    static final Plane DISC3 = disc(34.5, 20);
    static final Plane CHECK = plane((x, y) -> (Math.floor(x / 8) + Math.floor(y / 8)) % 2);
    static final Plane WAVE = plane((x, y) -> .05 * Math.sin(2 * Math.PI * x / 8) * Math.sin(2 * Math.PI * y / 8));
    static final Plane HASH = plane((x, y) -> ((73 * x + 151 * y + 7 * x * y) % 97) / 96 - .5);

    private CheckPlanes() {
    }

    static Plane plane(DoubleBinaryOperator f) {
        double[] values = new double[64 * 64];
        for (int p = 0; p < values.length; p++) {
            values[p] = f.applyAsDouble(p % 64, p / 64);
        }
        return new Plane(64, 64, values);
    }

    static Plane map(Plane a, DoubleUnaryOperator f) {
        return plane((x, y) -> f.applyAsDouble(a.at((int) x, (int) y)));
    }

    static Plane sum(Plane a, Plane b, double times) {
        return plane((x, y) -> a.at((int) x, (int) y) + times * b.at((int) x, (int) y));
    }

    static Plane constant(double value) {
        return plane((x, y) -> value);
    }

    static Plane disc(double cx, double radius) {
        return plane((x, y) -> (x - cx) * (x - cx) + (y - 31.5) * (y - 31.5) <= radius * radius ? 1 : 0);
    }

    private static Plane blob(double cx) {
        return plane((x, y) -> Math.exp(-((x - cx) * (x - cx) + (y - 31.5) * (y - 31.5)) / 200));
    }
}

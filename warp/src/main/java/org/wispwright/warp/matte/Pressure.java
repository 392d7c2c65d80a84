package org.wispwright.warp.matte;

import java.util.List;

/**
 * How hard a line was drawn: one number a point, linear along the line between them, and what it scales.
 * <p>{@link On#STRENGTH} is what a shot gets if it says nothing: the line then stays as wide as it was drawn, and presses more or less.
 *
 * @param on     what pressure scales
 * @param values 0 to 1, one a point of the line; empty means 1 everywhere
 */
public record Pressure(On on, List<Double> values) {
    /** What pressure scales. */
    public enum On {
        /** Coverage is {@code p} times what it is at full pressure. */
        STRENGTH,
        /** The radius, and the soft edge with it, is {@code p} times what it is at full pressure. */
        RADIUS,
        /** Both. */
        BOTH
    }

    /** Full pressure everywhere. */
    public static final Pressure FULL = new Pressure(On.STRENGTH, List.of());

    /**
     * Checks and copies.
     *
     * @throws IllegalArgumentException if a part is missing or a value is not 0 to 1
     */
    public Pressure {
        Needs.present("stroke", "pressureOn", on);
        Needs.present("stroke", "pressure", values);
        for (int n = 0; n < values.size(); n++) {
            Needs.present("stroke", "pressure " + n, values.get(n));
            Needs.share("stroke", "pressure " + n, values.get(n));
        }
        values = List.copyOf(values);
    }

    /** Pressure at point n of the line. */
    public double at(int n) {
        return values.isEmpty() ? 1 : values.get(n);
    }
}

package org.wispwright.optimize.flow;

import java.util.EnumMap;
import java.util.Map;

/** Adds up where the time of a solve goes. One thread; a few nanoseconds a lap. */
public final class Clock {
    private final long[] nanos = new long[Part.values().length];

    /** What time is spent on; a pullback has its own line. */
    public enum Part {
        /** Laying out solids. */ SOLIDS,
        /** Departure points. */ TRACE,
        /** Carrying the velocity. */ CARRY_VELOCITY,
        /** Carrying the density, with decay and sources. */ CARRY_DENSITY,
        /** Adding force and buoyancy. */ PUSH,
        /** Pressure. */ PROJECTION,
        /** Unknowns to force. */ FORCE,
        /** Drawing pictures. */ PICTURE,
        /** Comparing pictures, with the gradient. */ LOSS,
        /** Pullback of TRACE. */ TRACE_BACK,
        /** Pullback of CARRY_VELOCITY. */ CARRY_VELOCITY_BACK,
        /** Pullback of CARRY_DENSITY. */ CARRY_DENSITY_BACK,
        /** Pullback of PUSH. */ PUSH_BACK,
        /** Pullback of PROJECTION. */ PROJECTION_BACK,
        /** Pullback of FORCE. */ FORCE_BACK,
        /** Pullback of PICTURE. */ PICTURE_BACK
    }

    /** Counts the time since {@code since} for a part. @return now, for the next lap */
    public long lap(Part part, long since) {
        long now = System.nanoTime();
        nanos[part.ordinal()] += now - since;
        return now;
    }

    /** Back to zero. */
    public void reset() {
        java.util.Arrays.fill(nanos, 0);
    }

    /** Seconds of each part that took any, in the enum's order. */
    public Map<Part, Double> seconds() {
        Map<Part, Double> out = new EnumMap<>(Part.class);
        for (Part part : Part.values()) {
            if (nanos[part.ordinal()] > 0) {
                out.put(part, nanos[part.ordinal()] / 1e9);
            }
        }
        return out;
    }
}

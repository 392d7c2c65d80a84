package org.wispwright.render.picture;

/** 16-bit floating point numbers, IEEE 754-2008 binary16: 1 sign, 5 exponent and 10 fraction bits; largest 65504, smallest 2^-24. */
final class HalfFloat {
    private static final int INFINITY = 0x7C00;

    private HalfFloat() {
    }

    /** The bits of the nearest half, ties to even; what rounds to 65520 or more is infinite, NaN stays NaN. */
    static short bits(float value) {
        int word = Float.floatToRawIntBits(value);
        int sign = word >>> 16 & 0x8000;
        if (Float.isNaN(value)) {
            return (short) (sign | INFINITY | 0x200);
        }
        int exponent = Math.getExponent(value);
        if (exponent > 15) {
            return (short) (sign | INFINITY);
        }
        // A normal half keeps 10 fraction bits; below 2^-14 the last kept place stays at 2^-24, which Math.rint rounds to even.
        int lastPlace = Math.max(-24, exponent - 10);
        int places = (int) Math.rint(Math.scalb(Math.abs((double) value), -lastPlace));
        int magnitude = exponent < -14 ? places : (exponent + 14 << 10) + places;
        return (short) (sign | Math.min(INFINITY, magnitude));
    }
}

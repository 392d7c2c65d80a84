package org.wispwright.render.picture;

/**
 * The sRGB transfer curve, IEC 61966-2-1:1999: light in 0..1 to code in 0..1 and back. Its two pieces nearly meet: they are
 * 2.9e-8 apart at the joint.
 * <pre>
 *   decode: c / 12.92 up to 0.04045, else ((c + 0.055) / 1.055)^2.4
 *   encode: 12.92 l up to 0.0031308, else 1.055 l^(1/2.4) - 0.055
 * </pre>
 */
public final class Srgb {
    private static final double LAST_LINEAR_CODE = 0.04045;
    private static final double LAST_LINEAR_LIGHT = 0.0031308;
    private static final float[] LIGHT_OF_BYTE = new float[256];

    static {
        for (int code = 0; code < 256; code++) {
            LIGHT_OF_BYTE[code] = (float) decode(code / 255.0);
        }
    }

    private Srgb() {
    }

    /** Light of a code; below 0 the straight piece goes on, above 1 the power. */
    public static double decode(double code) {
        return code <= LAST_LINEAR_CODE ? code / 12.92 : Math.pow((code + 0.055) / 1.055, 2.4);
    }

    /** Code of a light; below 0 the straight piece goes on, above 1 the power. */
    public static double encode(double light) {
        return light <= LAST_LINEAR_LIGHT ? 12.92 * light : 1.055 * Math.pow(light, 1 / 2.4) - 0.055;
    }

    /** Light of an 8-bit code, 0..255. */
    public static float decodeByte(int code) {
        return LIGHT_OF_BYTE[code];
    }

    /** The nearest whole code of 0..largest (255 or 65535), light outside 0..1 clipped; NaN gives 0. */
    public static int encodeTo(int largest, double light) {
        double clipped = light > 0 ? Math.min(light, 1) : 0;
        return (int) (encode(clipped) * largest + 0.5);
    }
}

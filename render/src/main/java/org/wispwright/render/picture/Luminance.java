package org.wispwright.render.picture;

/**
 * One number for how bright a colour is. Weights: Rec. ITU-R BT.709, item 3; lightness: CIE 15, Colorimetry.
 */
public final class Luminance {
    /** Share of red in luminance. */
    public static final double RED = 0.2126;
    /** Share of green in luminance. */
    public static final double GREEN = 0.7152;
    /** Share of blue in luminance. */
    public static final double BLUE = 0.0722;
    private static final double CIE_EPSILON = 216.0 / 24389;
    private static final double CIE_KAPPA = 24389.0 / 27;

    private Luminance() {
    }

    /** {@code 0.2126 r + 0.7152 g + 0.0722 b}: luminance of linear values. Of coded values the same sum is luma, another number. */
    public static double of(double r, double g, double b) {
        return RED * r + GREEN * g + BLUE * b;
    }

    /** CIE L*, 0..100, of a luminance relative to white: {@code 116 Y^(1/3) - 16}, below 216/24389 the straight piece {@code Y 24389/27}. */
    public static double lightness(double luminance) {
        return luminance > CIE_EPSILON ? 116 * Math.cbrt(luminance) - 16 : CIE_KAPPA * luminance;
    }
}

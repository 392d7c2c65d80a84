package org.wispwright.render.picture;

/**
 * Three numbers in linear light, Rec.709 primaries: a radiance, or a share such as an albedo.
 *
 * @param r red, finite, at least 0
 * @param g green, as red
 * @param b blue, as red
 */
public record Rgb(double r, double g, double b) {
    /** No light. */
    public static final Rgb BLACK = new Rgb(0, 0, 0);

    /** Checks the three numbers. @throws IllegalArgumentException if one is negative, NaN or infinite */
    public Rgb {
        if (!(r >= 0 && g >= 0 && b >= 0 && r < Double.POSITIVE_INFINITY && g < Double.POSITIVE_INFINITY && b < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("colour: got (" + r + ", " + g + ", " + b + "), needs three finite numbers of at least 0");
        }
    }

    /** The same number three times. */
    public static Rgb grey(double value) {
        return new Rgb(value, value, value);
    }

    /** Product, channel by channel. */
    public Rgb times(Rgb other) {
        return new Rgb(r * other.r, g * other.g, b * other.b);
    }
}

package org.wispwright.ui.desk;

import java.util.Optional;

/**
 * What the easel shows. Zoom and pan are not in it: they stay when anything here changes.
 *
 * @param view     name of the view
 * @param frame    frame number
 * @param near     what is shown
 * @param far      what it is set against
 * @param against  how
 * @param divider  where the dividing line crosses the picture, shares of width and height, and its angle
 * @param fade     share of {@code far} in a fade, 0 to 1
 * @param gain     of a difference, above 0
 * @param exposure stops, for looking only
 * @param gamma    for looking only, above 0; 1 leaves the picture as it is
 * @param outline  whether the wanted outline lies over the picture
 */
public record Showing(String view, int frame, Source near, Source far, Against against, Divider divider, double fade, double gain,
                      double exposure, double gamma, boolean outline) {
    /** The strongest exposure to look with, stops either way. */
    public static final double MOST_STOPS = 8;

    /**
     * A line across the picture.
     *
     * @param x       share of the picture's width, 0 to 1
     * @param y       share of the picture's height, 0 to 1
     * @param radians of the line's normal, from near to far; 0 points right: near lies on the left
     */
    public record Divider(double x, double y, double radians) {
        /** Upright, in the middle. */
        public static final Divider MIDDLE = new Divider(0.5, 0.5, 0);

        /** Keeps the place within the picture. */
        public Divider {
            x = Math.max(0, Math.min(1, x));
            y = Math.max(0, Math.min(1, y));
            if (!Double.isFinite(radians)) {
                throw new IllegalArgumentException("divider: got an angle of " + radians + ", needs a finite number");
            }
        }
    }

    /** Checks. @throws IllegalArgumentException if a number is out of its range */
    public Showing {
        if (!(fade >= 0 && fade <= 1) || !(gain > 0) || !(Math.abs(exposure) <= MOST_STOPS) || !(gamma > 0.1 && gamma < 10)) {
            throw new IllegalArgumentException("showing: got fade " + fade + ", gain " + gain + ", exposure " + exposure + ", gamma " + gamma
                    + "; needs fade in 0..1, gain above 0, exposure within " + MOST_STOPS + " stops, gamma between 0.1 and 10");
        }
    }

    /** The original on a frame of a view, as it is. */
    public static Showing of(String view, int frame) {
        return new Showing(view, frame, Source.ORIGINAL, Source.ORIGINAL, Against.ALONE, Divider.MIDDLE, 0.5, 4, 0, 1, true);
    }

    /** Another frame. */
    public Showing withFrame(int other) {
        return new Showing(view, other, near, far, against, divider, fade, gain, exposure, gamma, outline);
    }

    /** Another view. */
    public Showing withView(String other) {
        return new Showing(other, frame, near, far, against, divider, fade, gain, exposure, gamma, outline);
    }

    /** Something else shown. */
    public Showing withNear(Source other) {
        return new Showing(view, frame, other, far, against, divider, fade, gain, exposure, gamma, outline);
    }

    /** Something else to set it against. */
    public Showing withFar(Source other) {
        return new Showing(view, frame, near, other, against, divider, fade, gain, exposure, gamma, outline);
    }

    /** Another way to set them against each other. */
    public Showing withAgainst(Against other) {
        return new Showing(view, frame, near, far, other, divider, fade, gain, exposure, gamma, outline);
    }

    /** Another dividing line. */
    public Showing withDivider(Divider other) {
        return new Showing(view, frame, near, far, against, other, fade, gain, exposure, gamma, outline);
    }

    /** Another share in a fade. */
    public Showing withFade(double other) {
        return new Showing(view, frame, near, far, against, divider, other, gain, exposure, gamma, outline);
    }

    /** Another gain of the difference. */
    public Showing withGain(double other) {
        return new Showing(view, frame, near, far, against, divider, fade, other, exposure, gamma, outline);
    }

    /** Another exposure and gamma to look with. */
    public Showing withTone(double stops, double otherGamma) {
        return new Showing(view, frame, near, far, against, divider, fade, gain, stops, otherGamma, outline);
    }

    /** With the wanted outline or without. */
    public Showing withOutline(boolean shown) {
        return new Showing(view, frame, near, far, against, divider, fade, gain, exposure, gamma, shown);
    }

    /** What it is set against, if it is set against anything. */
    public Optional<Source> other() {
        return against == Against.ALONE ? Optional.empty() : Optional.of(far);
    }
}

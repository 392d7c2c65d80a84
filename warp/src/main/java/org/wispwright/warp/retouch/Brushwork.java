package org.wispwright.warp.retouch;

import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Window;

/** Lays strokes on a picture; the formulas are those of {@link Brush}. Changes the picture it is given. */
final class Brushwork {
    /** Width of the blur of {@link Brush#SOFTEN}: standard deviation as a share of the stroke's radius. */
    static final double SOFTEN_SIGMA = 0.5;
    /** Narrowest kernel for the colour of added smoke, as a share of the stroke's radius. */
    static final double COLOUR_SIGMA = 0.5;

    private Brushwork() {
    }

    /** Changes {@code picture}; {@code original} is the picture before the retouch's first operation, read only. */
    static void apply(Stroke stroke, Picture picture, Picture original) {
        float[] coverage = stroke.coverage(original);
        switch (stroke.brush()) {
            case ADD -> add(picture, coverage, new ColourNearby(picture, COLOUR_SIGMA * stroke.radius()));
            case REMOVE -> remove(picture.rgba(), coverage);
            case SOFTEN -> soften(picture, coverage, SOFTEN_SIGMA * stroke.radius() * picture.height());
            case RESTORE -> restore(picture.rgba(), coverage, original.rgba());
            case PUSH -> push(stroke, picture, coverage);
            case EVEN -> contrast(picture, coverage, stroke.radius(), -1);
            case LIFT -> contrast(picture, coverage, stroke.radius(), 1);
        }
    }

    private static void add(Picture picture, float[] coverage, ColourNearby colour) {
        float[] rgba = picture.rgba();
        for (int p = 0; p < coverage.length; p++) {
            float more = coverage[p] * (1 - rgba[4 * p + 3]);
            if (more > 0) {
                for (int c = 0; c < 3; c++) {
                    rgba[4 * p + c] += more * colour.at(p % picture.width(), p / picture.width(), c);
                }
                rgba[4 * p + 3] = Math.min(1f, rgba[4 * p + 3] + more);
            }
        }
    }

    private static void remove(float[] rgba, float[] coverage) {
        for (int p = 0; p < coverage.length; p++) {
            if (coverage[p] > 0) {
                for (int c = 0; c < 4; c++) {
                    rgba[4 * p + c] *= 1 - coverage[p];
                }
            }
        }
    }

    private static void restore(float[] rgba, float[] coverage, float[] original) {
        for (int p = 0; p < coverage.length; p++) {
            for (int n = 4 * p; coverage[p] > 0 && n < 4 * p + 4; n++) {
                rgba[n] = coverage[p] < 1 ? rgba[n] + coverage[p] * (original[n] - rgba[n]) : original[n];
            }
        }
    }

    private static void push(Stroke stroke, Picture picture, float[] coverage) {
        Window window = covered(coverage, picture.width());
        if (window != null) {
            Push.apply(stroke, picture, coverage, window);
        }
    }

    private static void contrast(Picture picture, float[] coverage, double radius, int direction) {
        Window window = covered(coverage, picture.width());
        if (window != null) {
            LocalContrast.apply(picture, coverage, window, radius, direction);
        }
    }

    /** Blurs only the window that the stroke covers; the pixels have the bits they would have if all were blurred. */
    private static void soften(Picture picture, float[] coverage, double sigma) {
        Window window = covered(coverage, picture.width());
        if (window == null) {
            return;
        }
        float[] rgba = picture.rgba();
        float[] blurred = Gaussian.blurred(rgba, 4, picture.width(), picture.height(), sigma, window);
        for (int y = 0, n = 0; y < window.height(); y++) {
            int p = window.left() + picture.width() * (window.top() + y);
            for (int x = 0; x < window.width(); x++, p++, n += 4) {
                if (coverage[p] > 0) {
                    for (int c = 0; c < 4; c++) {
                        rgba[4 * p + c] += coverage[p] * (blurred[n + c] - rgba[4 * p + c]);
                    }
                    rgba[4 * p + 3] = Math.min(1f, rgba[4 * p + 3]);
                }
            }
        }
    }

    /** The smallest window around all pixels with coverage; null if there are none. */
    private static Window covered(float[] coverage, int width) {
        int left = width;
        int right = -1;
        int top = -1;
        int bottom = -1;
        for (int p = 0; p < coverage.length; p++) {
            if (coverage[p] > 0) {
                left = Math.min(left, p % width);
                right = Math.max(right, p % width);
                top = top < 0 ? p / width : top;
                bottom = p / width;
            }
        }
        return right < 0 ? null : new Window(left, top, right - left + 1, bottom - top + 1);
    }
}

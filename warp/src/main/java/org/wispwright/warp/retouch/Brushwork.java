package org.wispwright.warp.retouch;

import org.wispwright.render.picture.Picture;

/** Lays strokes on a picture; the formulas are those of {@link Brush}. Changes the picture it is given. */
final class Brushwork {
    /** Width of the blur of {@link Brush#SOFTEN}: standard deviation as a share of the stroke's radius. */
    static final double SOFTEN_SIGMA = 0.5;
    /** Narrowest kernel for the colour of added smoke, as a share of the stroke's radius. */
    static final double COLOUR_SIGMA = 0.5;

    private Brushwork() {
    }

    static void apply(Stroke stroke, Picture picture) {
        float[] coverage = StrokeCoverage.of(stroke, picture.width(), picture.height());
        switch (stroke.brush()) {
            case ADD -> add(picture, coverage, new ColourNearby(picture, COLOUR_SIGMA * stroke.radius()));
            case REMOVE -> remove(picture.rgba(), coverage);
            case SOFTEN -> mix(picture.rgba(), coverage, Gaussian.blurred(picture.rgba(), 4, picture.width(), picture.height(),
                    SOFTEN_SIGMA * stroke.radius() * picture.height()));
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

    private static void mix(float[] rgba, float[] coverage, float[] blurred) {
        for (int p = 0; p < coverage.length; p++) {
            if (coverage[p] > 0) {
                for (int n = 4 * p; n < 4 * p + 4; n++) {
                    rgba[n] += coverage[p] * (blurred[n] - rgba[n]);
                }
                rgba[4 * p + 3] = Math.min(1f, rgba[4 * p + 3]);
            }
        }
    }
}

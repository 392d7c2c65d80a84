package org.wispwright.ui.window.easel;

import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;

/** Two pictures made one, for looking: a fade or a difference. Pictures of other rasters are read at the nearest pixel. */
final class Mixing {
    private Mixing() {
    }

    /** {@code (1 - share) a + share b}, linear and premultiplied. @return a new picture of a's raster */
    static Picture fade(Picture a, Picture b, double share) {
        Picture out = new Picture(a.width(), a.height());
        float keep = (float) (1 - share);
        float other = (float) share;
        for (int y = 0; y < a.height(); y++) {
            for (int x = 0; x < a.width(); x++) {
                int p = 4 * (x + a.width() * y);
                int q = nearest(a, b, x, y);
                for (int c = 0; c < 4; c++) {
                    out.rgba()[p + c] = keep * a.rgba()[p + c] + other * b.rgba()[q + c];
                }
            }
        }
        return out;
    }

    /** {@code gain |a - b|} over the background, channel by channel in linear light, opaque: black where they agree. */
    static Picture difference(Picture a, Picture b, Rgb background, double gain) {
        Picture out = new Picture(a.width(), a.height());
        float[] behind = {(float) background.r(), (float) background.g(), (float) background.b()};
        float g = (float) gain;
        for (int y = 0; y < a.height(); y++) {
            for (int x = 0; x < a.width(); x++) {
                int p = 4 * (x + a.width() * y);
                int q = nearest(a, b, x, y);
                float alphas = b.rgba()[q + 3] - a.rgba()[p + 3];
                for (int c = 0; c < 3; c++) {
                    out.rgba()[p + c] = g * Math.abs(a.rgba()[p + c] - b.rgba()[q + c] + alphas * behind[c]);
                }
                out.rgba()[p + 3] = 1;
            }
        }
        return out;
    }

    private static int nearest(Picture a, Picture b, int x, int y) {
        if (a.width() == b.width() && a.height() == b.height()) {
            return 4 * (x + a.width() * y);
        }
        int bx = Math.min(b.width() - 1, (int) ((x + 0.5) * b.height() / a.height()));
        int by = Math.min(b.height() - 1, (int) ((y + 0.5) * b.height() / a.height()));
        return 4 * (bx + b.width() * by);
    }
}

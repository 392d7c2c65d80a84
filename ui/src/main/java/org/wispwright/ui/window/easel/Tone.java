package org.wispwright.ui.window.easel;

import org.wispwright.render.picture.Exposure;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.picture.Srgb;
import org.wispwright.warp.matte.Window;

/**
 * From linear, premultiplied pixels to the screen's codes: over the background, times the exposure, to the power of 1/gamma, sRGB coded, in 8
 * bits. By a table of {@value #STEPS} steps; at gamma 1 it differs from {@link Srgb#encodeTo} by at most one code.
 */
final class Tone {
    private static final int STEPS = 1 << 16;

    private final byte[] codes = new byte[STEPS + 1];
    private final float scale;
    private final float[] behind;

    /**
     * A tone.
     *
     * @param background linear light
     * @param stops      exposure
     * @param gamma      above 0
     */
    Tone(Rgb background, double stops, double gamma) {
        for (int n = 0; n <= STEPS; n++) {
            codes[n] = (byte) Srgb.encodeTo(255, Math.pow((double) n / STEPS, 1 / gamma));
        }
        scale = (float) (STEPS * Exposure.factor(stops));
        behind = new float[] {(float) background.r(), (float) background.g(), (float) background.b()};
    }

    /** Writes a window of a picture as 0xRRGGBB. @param out one value a pixel of the whole picture */
    void code(Picture picture, Window window, int[] out) {
        float[] rgba = picture.rgba();
        for (int y = window.top(); y < window.top() + window.height(); y++) {
            int at = window.left() + picture.width() * y;
            for (int n = at; n < at + window.width(); n++) {
                int p = 4 * n;
                float through = 1 - rgba[p + 3];
                out[n] = code(rgba[p] + through * behind[0]) << 16 | code(rgba[p + 1] + through * behind[1]) << 8
                        | code(rgba[p + 2] + through * behind[2]);
            }
        }
    }

    private int code(float light) {
        int step = (int) (light * scale + 0.5f);
        return codes[step < 0 ? 0 : Math.min(step, STEPS)] & 0xff;
    }
}

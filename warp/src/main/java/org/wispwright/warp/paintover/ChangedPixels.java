package org.wispwright.warp.paintover;

import java.util.Arrays;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Srgb;
import org.wispwright.warp.resample.Blur;

/**
 * Which pixels a person changed between two frames, and which merely differ because a file was saved again.
 * <p>The difference d is taken in sRGB codes (alpha: as it is), where rounding is even. Its noise is measured channel by channel on the
 * diagonal detail {@code h = (d00 - d01 - d10 + d11) / 2} of neighbouring pixels, which smooth changes leave out:
 * {@code s = median |h| / 0.6745} (Donoho and Johnstone 1994, Biometrika 81(3), 425-455). Blurred with a Gaussian of one pixel noise
 * shrinks to {@code s / (2 sqrt(pi))}; a pixel has changed where the blurred |d| passes {@code T = max(1 / 255, 5 s / (2 sqrt(pi)))} in a
 * channel, 1/255 being the most by which rounding twice to 8 bits can shift a mean; a patch of such pixels counts if one of them passes 2 T
 * (hysteresis, Canny 1986, IEEE PAMI 8(6), 679-698) and it has at least {@value #SPECKLE} pixels (area opening, Vincent 1993).
 */
final class ChangedPixels {
    /** Smaller patches are specks. */
    static final int SPECKLE = 32;
    static final double QUANTUM = 1.0 / 255;
    private static final double NORMAL_MEDIAN = 0.6744897501960817;
    private static final double DEVIATIONS = 5;
    private static final double BLUR = 1;
    /** Width of the mask's soft edge, standard deviation in heights. */
    private static final double EDGE = 0.004;

    private final float[] mask;
    private final boolean any;
    private final double noise;

    private ChangedPixels(float[] mask, boolean any, double noise) {
        this.mask = mask;
        this.any = any;
        this.noise = noise;
    }

    /** Compares two frames of one raster. */
    static ChangedPixels between(Picture before, Picture after) {
        int width = before.width();
        int height = before.height();
        float[] d = new float[before.rgba().length];
        for (int n = 0; n < d.length; n++) {
            float b = before.rgba()[n];
            float a = after.rgba()[n];
            d[n] = a == b ? 0 : (n & 3) == 3 ? a - b : (float) (Srgb.encode(a) - Srgb.encode(b));
        }
        double[] threshold = new double[4];
        double noise = 0;
        for (int c = 0; c < 4; c++) {
            double s = noise(d, c, width, height);
            noise = Math.max(noise, s);
            threshold[c] = Math.max(QUANTUM, DEVIATIONS * s * 0.5 / Math.sqrt(Math.PI) / BLUR);
        }
        float[] blurred = Blur.gaussian(d, 4, width, height, BLUR);
        double[] passes = new double[width * height];
        boolean[] weak = new boolean[passes.length];
        for (int p = 0; p < passes.length; p++) {
            for (int c = 0; c < 4; c++) {
                passes[p] = Math.max(passes[p], Math.abs(blurred[4 * p + c]) / threshold[c]);
            }
            weak[p] = passes[p] > 1;
        }
        Patches patches = Patches.of(weak, width, height);
        int[] size = new int[patches.count()];
        boolean[] strong = new boolean[patches.count()];
        for (int p = 0; p < passes.length; p++) {
            if (weak[p]) {
                size[patches.at(p)]++;
                strong[patches.at(p)] |= passes[p] > 2;
            }
        }
        float[] mask = new float[passes.length];
        boolean any = false;
        for (int p = 0; p < passes.length; p++) {
            boolean in = weak[p] && strong[patches.at(p)] && size[patches.at(p)] >= SPECKLE;
            mask[p] = in ? 1 : 0;
            any |= in;
        }
        return new ChangedPixels(any ? softened(mask, width, height) : mask, any, noise);
    }

    /** 1 on changed pixels, falling to 0 around them; one number a pixel, not a copy. */
    float[] mask() {
        return mask;
    }

    /** True if something changed beyond noise. */
    boolean any() {
        return any;
    }

    /** Standard deviation of the noisiest channel's difference, in codes of 0 to 1. */
    double noise() {
        return noise;
    }

    private static double noise(float[] d, int c, int width, int height) {
        int n = 0;
        float[] detail = new float[Math.max(0, (width - 1) * (height - 1))];
        for (int y = 1; y < height; y++) {
            for (int x = 1; x < width; x++) {
                int p = 4 * (x + width * y) + c;
                detail[n++] = Math.abs(d[p] - d[p - 4] - d[p - 4 * width] + d[p - 4 * width - 4]) / 2;
            }
        }
        Arrays.sort(detail);
        return n == 0 ? 0 : detail[n / 2] / NORMAL_MEDIAN;
    }

    private static float[] softened(float[] mask, int width, int height) {
        float[] wide = Blur.gaussian(mask, 1, width, height, Math.max(0.75, EDGE * height));
        for (int p = 0; p < mask.length; p++) {
            wide[p] = Math.max(mask[p], Math.min(1f, 2 * wide[p]));
        }
        return wide;
    }
}

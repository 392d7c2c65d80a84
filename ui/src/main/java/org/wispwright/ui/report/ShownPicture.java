package org.wispwright.ui.report;

import java.awt.image.BufferedImage;
import org.imgscalr.Scalr;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.picture.Srgb;

/** A linear picture as a display image: over a background, through the sRGB curve, scaled. */
public final class ShownPicture {
    private ShownPicture() {
    }

    /** The picture over a background, at its own size. */
    public static BufferedImage over(Picture picture, Rgb background) {
        BufferedImage image = new BufferedImage(picture.width(), picture.height(), BufferedImage.TYPE_INT_RGB);
        image.setRGB(0, 0, picture.width(), picture.height(), codes(picture, background), 0, picture.width());
        return image;
    }

    /** The same as 0xRRGGBB, index {@code x + width * y}. */
    public static int[] codes(Picture picture, Rgb background) {
        float[] rgba = picture.rgba();
        int[] rgb = new int[picture.width() * picture.height()];
        for (int n = 0; n < rgb.length; n++) {
            double through = 1 - rgba[4 * n + 3];
            rgb[n] = coded(rgba[4 * n] + through * background.r()) << 16 | coded(rgba[4 * n + 1] + through * background.g()) << 8
                    | coded(rgba[4 * n + 2] + through * background.b());
        }
        return rgb;
    }

    /** {@code gain * |a - b|} over the background, channel by channel in linear light: black where the two agree. */
    static BufferedImage difference(Picture a, Picture b, Rgb background, double gain) {
        BufferedImage image = new BufferedImage(a.width(), a.height(), BufferedImage.TYPE_INT_RGB);
        double[] behind = {background.r(), background.g(), background.b()};
        float[] p = a.rgba();
        float[] q = b.rgba();
        for (int n = 0; n < a.width() * a.height(); n++) {
            int rgb = 0;
            double alphas = (double) q[4 * n + 3] - p[4 * n + 3];
            for (int c = 0; c < 3; c++) {
                rgb = rgb << 8 | coded(gain * Math.abs((double) p[4 * n + c] - q[4 * n + c] + alphas * behind[c]));
            }
            image.setRGB(n % a.width(), n / a.width(), rgb);
        }
        return image;
    }

    /** The largest difference over the background, any channel, linear. */
    static double largestDifference(Picture a, Picture b, Rgb background) {
        double[] behind = {background.r(), background.g(), background.b()};
        float[] p = a.rgba();
        float[] q = b.rgba();
        double largest = 0;
        for (int n = 0; n < a.width() * a.height(); n++) {
            double alphas = (double) q[4 * n + 3] - p[4 * n + 3];
            for (int c = 0; c < 3; c++) {
                largest = Math.max(largest, Math.abs((double) p[4 * n + c] - q[4 * n + c] + alphas * behind[c]));
            }
        }
        return largest;
    }

    /** Scaled to exactly this size. */
    static BufferedImage scaled(BufferedImage image, int width, int height) {
        if (image.getWidth() == width && image.getHeight() == height) {
            return image;
        }
        return Scalr.resize(image, Scalr.Method.ULTRA_QUALITY, Scalr.Mode.FIT_EXACT, width, height);
    }

    private static int coded(double linear) {
        return Srgb.encodeTo(255, linear);
    }
}

package org.wispwright.warp.matte;

import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.BrushedMatte.Dab;
import org.wispwright.warp.matte.BrushedMatte.Way;

/** Pictures and mattes for the tests of this room. */
final class MatteScenes {
    private MatteScenes() {
    }

    /**
     * White smoke whose opacity is a smooth function of the place, the mean over each pixel as a renderer would give it; width 3/4 of the
     * height.
     */
    static Picture smoke(int height) {
        int width = Math.max(1, Math.round(0.75f * height));
        Picture picture = new Picture(width, height);
        int fine = Math.max(1, Math.min(4, 1024 / height));
        for (int p = 0; p < width * height; p++) {
            double sum = 0;
            for (int k = 0; k < fine * fine; k++) {
                double x = (p % width + (k % fine + 0.5) / fine) / height;
                double y = (p / width + (k / fine + 0.5) / fine) / height;
                double head = Math.exp(-(Math.pow((x - 0.38) / 0.12, 2) + Math.pow((y - 0.3) / 0.14, 2)));
                double column = Math.exp(-Math.pow((x - 0.37) / 0.06, 2)) / (1 + Math.exp(-(y - 0.45) / 0.03));
                sum += 1 - Math.exp(-2 * (head + column));
            }
            for (int c = 0; c < 4; c++) {
                picture.rgba()[4 * p + c] = (float) (sum / (fine * fine));
            }
        }
        return picture;
    }

    /** A picture of one row with these opacities. */
    static Picture row(double... alphas) {
        Picture picture = new Picture(alphas.length, 1);
        for (int x = 0; x < alphas.length; x++) {
            picture.rgba()[4 * x + 3] = (float) alphas[x];
        }
        return picture;
    }

    /** One matte of every kind, with and without a feather where it has one; hard and soft, convex and not. */
    static Map<String, Matte> all() {
        Map<String, Matte> all = new TreeMap<>();
        Region ellipse = new Region.Ellipse(new Point(0.36, 0.4), 0.2, 0.3, 0.05);
        Region rectangle = new Region.Rectangle(0.1, 0.2, 0.45, 0.93, 0);
        Region star = new Region.Polygon(List.of(new Point(0.1, 0.3), new Point(0.65, 0.35), new Point(0.2, 0.8), new Point(0.4, 0.1),
                new Point(0.5, 0.85)), 0.03);
        BrushedMatte brushed = new BrushedMatte(List.of(
                new Dab(Way.ADD, new Sweep(0.12, 1, 0.4, List.of(new Point(0.2, 0.3), new Point(0.5, 0.45), new Point(0.3, 0.8)))),
                new Dab(Way.TAKE, new Sweep(0.06, 0.8, 0.5, List.of(new Point(0.2, 0.5), new Point(0.6, 0.4)))),
                new Dab(Way.ADD, new Sweep(0.03, 0.5, 0.5, List.of(new Point(0.6, 0.1), new Point(0.65, 0.9))))));
        all.put("rectangle", rectangle);
        all.put("ellipse", ellipse);
        all.put("polygon", star);
        all.put("hard polygon", new Region.Polygon(star instanceof Region.Polygon p ? p.outline() : List.of(), 0));
        all.put("density", new DensityRange(0.2, 0.75, 0.15, 0));
        all.put("density, feathered", new DensityRange(0.3, 1, 0.05, 0.06));
        all.put("brushed", brushed);
        all.put("image", image(111, 148, 0));
        all.put("image, feathered", image(301, 401, 0.05));
        all.put("union", new CombinedMatte(CombinedMatte.Way.UNION, List.of(ellipse, star, brushed)));
        all.put("intersect", new CombinedMatte(CombinedMatte.Way.INTERSECT, List.of(new DensityRange(0.2, 1, 0.2, 0), ellipse)));
        all.put("subtract", new CombinedMatte(CombinedMatte.Way.SUBTRACT, List.of(ellipse, brushed, rectangle)));
        all.put("inverse", new CombinedMatte(CombinedMatte.Way.INVERSE, List.of(star)));
        return all;
    }

    /** A ring with soft edges, and nothing else. */
    private static ImageMatte image(int width, int height, double feather) {
        float[] pixels = new float[width * height];
        for (int p = 0; p < pixels.length; p++) {
            double d = Math.hypot((p % width + 0.5) / height - 0.36, (p / width + 0.5) / height - 0.5);
            pixels[p] = (float) Sweep.smooth(2 - Math.abs(d - 0.2) / 0.05);
        }
        return new ImageMatte(width, height, pixels, feather);
    }

    /** Windows of a raster: all, one pixel, a row, odd pieces at borders. */
    static List<Window> windows(int width, int height) {
        return List.of(Window.all(width, height), new Window(0, 0, 1, 1), new Window(width - 1, height - 1, 1, 1),
                new Window(0, height / 2, width, 1), new Window(width / 3, height / 4, width / 3, height / 2),
                new Window(width - 7, 3, 7, 13));
    }

    /** Numbers of 0 to 1, many of them exactly 0 or 1. */
    static float[] noise(int count, long seed) {
        Random random = new Random(seed);
        float[] values = new float[count];
        for (int n = 0; n < count; n++) {
            values[n] = (float) Math.min(1, Math.max(0, 2 * random.nextDouble() - 0.5));
        }
        return values;
    }
}

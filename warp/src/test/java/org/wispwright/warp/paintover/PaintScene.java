package org.wispwright.warp.paintover;

import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import java.util.function.BiFunction;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.march.Light;
import org.wispwright.render.march.Look;
import org.wispwright.render.march.RayMarcher;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.view.Orthographic;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.ScalarGrid;
import org.wispwright.warp.resample.Kernel;
import org.wispwright.warp.resample.Resampling;

/**
 * A plume under two looks. Ours is dim and grey; the production's has 1.6 times the extinction, another albedo, light from the other
 * side, and a background that is not even. A painter works on the production's layer of smoke; what that means in our opacity is known:
 * both looks have straight rays and one density, so {@code 1 - A = (1 - a)^1.6} in every pixel (Beer-Lambert law).
 */
final class PaintScene {
    static final double RATIO = 1.6;
    private static final Look OURS = new Look(0.9, new Rgb(0.85, 0.84, 0.82), new Rgb(0.35, 0.38, 0.42),
            Optional.of(new Light(new Vec3(1, 2, 1.5), new Rgb(1.1, 1.05, 0.95))));
    private static final Look PRODUCTION = new Look(0.9 * RATIO, new Rgb(0.95, 0.9, 0.82), new Rgb(0.5, 0.45, 0.4),
            Optional.of(new Light(new Vec3(-1, 1, 1), new Rgb(0.7, 0.75, 0.8))));

    private final ScalarGrid density;
    private final Map<Integer, Picture> layers = new HashMap<>();

    private PaintScene(ScalarGrid density) {
        this.density = density;
    }

    /** A stem, a lumpy head, and a puff of its own to the right. */
    static PaintScene plume() {
        GridShape box = new GridShape(36, 48, 24, 0.1, 0, 0, 0);
        ScalarGrid density = new ScalarGrid(box);
        for (int n = 0; n < box.cells(); n++) {
            double x = (n % 36 + 0.5) * 0.1;
            double y = (n / 36 % 48 + 0.5) * 0.1;
            double z = (n / 36 / 48 + 0.5) * 0.1;
            double lumps = 1 + 0.35 * Math.sin(7 * x + 2) * Math.sin(6 * y) * Math.cos(5 * z);
            double stem = y < 3.2 ? ball(x, 0, z, 1.3 + 0.1 * Math.sin(2 * y), 0, 1.2, 0.35) : 0;
            double head = ball(x, y, z, 1.5, 3.1, 1.2, 0.75) + 0.8 * ball(x, y, z, 1.1, 3.7, 1.3, 0.45);
            double puff = 0.9 * ball(x, y, z, 2.9, 1.6, 1.2, 0.3);
            density.values()[n] = (float) (1.1 * lumps * (0.8 * stem + head + puff));
        }
        return new PaintScene(density);
    }

    private static double ball(double x, double y, double z, double cx, double cy, double cz, double r) {
        double s = ((x - cx) * (x - cx) + (y - cy) * (y - cy) + (z - cz) * (z - cz)) / (r * r);
        return s < 4 ? Math.exp(-1.5 * s) * (1 - s / 4) : 0;
    }

    /** Our picture. */
    Picture original(int rows) {
        return drawn(OURS, rows);
    }

    /** The production's smoke, nothing behind it; not to be changed. */
    Picture layer(int rows) {
        return layers.computeIfAbsent(rows, r -> drawn(PRODUCTION, r));
    }

    /** A layer of the production before its background: a soft slope from dark blue to a warm grey. */
    static Picture frame(Picture layer) {
        Picture out = layer.copy();
        for (int p = 0; p < layer.width() * layer.height(); p++) {
            double x = (p % layer.width() + 0.5) / layer.height();
            double y = (p / layer.width() + 0.5) / layer.height();
            double through = 1 - layer.rgba()[4 * p + 3];
            out.rgba()[4 * p] += (float) (through * (0.05 + 0.08 * y));
            out.rgba()[4 * p + 1] += (float) (through * (0.08 + 0.05 * y + 0.02 * x));
            out.rgba()[4 * p + 2] += (float) (through * (0.16 - 0.03 * y));
            out.rgba()[4 * p + 3] = 1;
        }
        return out;
    }

    /** The opacity that a layer of the production has under our look, one number a pixel. */
    static float[] ours(Picture layer) {
        float[] out = new float[layer.width() * layer.height()];
        for (int p = 0; p < out.length; p++) {
            out[p] = (float) (1 - Math.pow(1 - Math.min(1, layer.rgba()[4 * p + 3]), 1 / RATIO));
        }
        return out;
    }

    /** A copy with every pixel scaled by {@code 1 - m(x, y)}, positions in heights: smoke taken away. */
    static Picture removed(Picture layer, BiFunction<Double, Double, Double> m) {
        Picture out = layer.copy();
        for (int p = 0; p < layer.width() * layer.height(); p++) {
            double by = 1 - m.apply((p % layer.width() + 0.5) / layer.height(), (p / layer.width() + 0.5) / layer.height());
            for (int c = 4 * p; c < 4 * p + 4; c++) {
                out.rgba()[c] *= (float) by;
            }
        }
        return out;
    }

    /** A copy with smoke laid behind what is there, of the colour that a painter picks up from the thick smoke at (0.42, 0.27). */
    static Picture added(Picture layer, BiFunction<Double, Double, Double> m) {
        Picture out = layer.copy();
        int picked = (int) (0.42 * layer.height()) + layer.width() * (int) (0.27 * layer.height());
        float[] colour = new float[4];
        for (int c = 0; c < 4; c++) {
            colour[c] = layer.at(picked % layer.width(), picked / layer.width(), c) / layer.rgba()[4 * picked + 3];
        }
        for (int p = 0; p < layer.width() * layer.height(); p++) {
            double more = m.apply((p % layer.width() + 0.5) / layer.height(), (p / layer.width() + 0.5) / layer.height())
                    * (1 - layer.rgba()[4 * p + 3]);
            for (int c = 0; c < 4; c++) {
                out.rgba()[4 * p + c] += (float) (more * colour[c]);
            }
        }
        return out;
    }

    /** A copy in which what is inside a soft disc around (x,y) has been cut out and laid down again (dx,dy) further; heights. */
    static Picture moved(Picture layer, double x, double y, double radius, double dx, double dy) {
        Picture lifted = removed(layer, (px, py) -> 1 - disc(px - x, py - y, radius));
        Picture out = removed(layer, (px, py) -> disc(px - x, py - y, radius));
        Resampling resampling = new Resampling(Kernel.KEYS);
        float[] read = new float[4];
        for (int p = 0; p < layer.width() * layer.height(); p++) {
            resampling.read(lifted, p % layer.width() - dx * layer.height(), p / layer.width() - dy * layer.height(), read, 0);
            Resampling.clamp(read, 0);
            for (int c = 0; c < 4; c++) {
                out.rgba()[4 * p + c] = read[c] + (1 - read[3]) * out.rgba()[4 * p + c];
            }
        }
        return out;
    }

    /** 1 inside a disc, falling to 0 over its outer quarter. */
    static double disc(double x, double y, double radius) {
        double s = Math.min(1, Math.max(0, (radius - Math.hypot(x, y)) / (0.25 * radius)));
        return s * s * (3 - 2 * s);
    }

    /** A soft bow of smoke. */
    static double wisp(double x, double y) {
        double off = Math.abs(Math.hypot(x - 0.6, y - 0.22) - 0.13) / 0.035;
        return x > 0.58 ? 0 : 0.55 * Math.exp(-off * off) * Math.min(1, (0.58 - x) / 0.04);
    }

    private Picture drawn(Look look, int rows) {
        Vec3 middle = new Vec3(1.8, 2.4, 1.2);
        View view = new View("front", new Orthographic(3.6, 4.8), new Vec3(1.8, 2.4, 9), middle, new Vec3(0, 1, 0),
                new Raster(rows * 3 / 4, rows));
        Picture out = view.raster().picture();
        try (Lanes lanes = new Lanes(1)) {
            new RayMarcher(density.shape(), view, 0.05, lanes).picture(density, look, out);
        }
        return out;
    }
}

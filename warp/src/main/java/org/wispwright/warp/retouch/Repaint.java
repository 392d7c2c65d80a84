package org.wispwright.warp.retouch;

import java.util.Optional;
import java.util.function.UnaryOperator;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.resample.Kernel;
import org.wispwright.warp.resample.Resampling;
import org.wispwright.warp.resample.Resized;

/**
 * What a person painted over a frame in another program, as an operation of its own: smoke moved, then opacity changed. It holds
 * its numbers on its own raster and brings them to whatever raster it is applied at ({@link Resized}); the painted files are no
 * longer needed.
 * <p>{@code q(p) = rgba(p + u(p))}, read bicubically; then {@code a' = clamp(a + change)}. Colour follows: where opacity falls,
 * {@code rgb' = rgb a' / a}; where it grows, {@code rgb' = rgb + (a' - a) c}, {@code c = (rgb + k near) / (a + k)}, the pixel's own
 * colour or, where it has next to none, that of the smoke near it ({@link ColourNearby}); k as in {@link LocalContrast}. Composition as in
 * Porter and Duff (1984), SIGGRAPH 84, 253-259.
 */
public final class Repaint implements Operation {
    /** Numbers a pixel: change of opacity -1..1, displacement u along x and y in heights, mask 0..1. */
    public static final int LAYERS = 4;
    /** The most pixels its raster may have. */
    public static final int MOST_PIXELS = 1 << 22;
    /** The farthest that smoke may be moved, heights along an axis. */
    public static final double FARTHEST = 4;
    /** Width of the kernel for the colour of new smoke, heights. */
    private static final double COLOUR_SIGMA = 0.02;
    private static final String[] NAMES = {"change", "move along x", "move along y", "mask"};
    private static final double[] LEAST = {-1, -FARTHEST, -FARTHEST, 0};
    private static final double[] MOST = {1, FARTHEST, FARTHEST, 1};

    private final int width;
    private final int height;
    private final float[] layers;
    private final boolean moves;
    private final boolean changes;
    private final Optional<String> file;

    /** Layers that are from no file. @throws IllegalArgumentException as below */
    public Repaint(int width, int height, float[] layers) {
        this(width, height, layers, Optional.empty());
    }

    /**
     * Checks and copies.
     *
     * @param width  pixels along a row
     * @param height rows
     * @param layers read: {@value #LAYERS} numbers a pixel, index {@code 4 (x + width y) + layer}; order and ranges: {@link #LAYERS}
     * @param file   path inside the shot folder that the layers are from, if any
     * @throws IllegalArgumentException if the raster is too large, the count differs, or a number is out of its range or not finite
     */
    public Repaint(int width, int height, float[] layers, Optional<String> file) {
        if (width < 1 || height < 1 || (long) width * height > MOST_PIXELS) {
            throw new IllegalArgumentException("paint-over: got " + width + "x" + height + " pixels, needs sides of at least 1 and at most "
                    + MOST_PIXELS + " pixels");
        }
        if (layers.length != LAYERS * width * height) {
            throw new IllegalArgumentException("paint-over: got " + layers.length + " numbers, " + width + "x" + height + " pixels need "
                    + LAYERS * width * height);
        }
        boolean anyMove = false;
        boolean anyChange = false;
        for (int n = 0; n < layers.length; n++) {
            int layer = n % LAYERS;
            if (!(layers[n] >= LEAST[layer] && layers[n] <= MOST[layer])) {
                int p = n / LAYERS;
                throw new IllegalArgumentException("paint-over: " + NAMES[layer] + " of pixel (" + p % width + ", " + p / width + ") is "
                        + layers[n] + ", needs a number from " + (int) LEAST[layer] + " to " + (int) MOST[layer]);
            }
            anyChange |= layer == 0 && layers[n] != 0;
            anyMove |= (layer == 1 || layer == 2) && layers[n] != 0;
        }
        this.width = width;
        this.height = height;
        this.layers = layers.clone();
        this.moves = anyMove;
        this.changes = anyChange;
        this.file = file;
    }

    /** Pixels along a row of its own raster. */
    public int width() {
        return width;
    }

    /** Rows of its own raster. */
    public int height() {
        return height;
    }

    /** A copy of the numbers, laid out as in the constructor. */
    public float[] layers() {
        return layers.clone();
    }

    /** Path inside the shot folder that the layers are from, if any. */
    public Optional<String> file() {
        return file;
    }

    /** Painted pixels have no position that could be taken along. @throws IllegalArgumentException always */
    @Override
    public Repaint moved(UnaryOperator<Point> map) {
        throw new IllegalArgumentException("paint-over: painted pixels cannot be carried along; paint the other frame too, or use brushes");
    }

    /** True if it moves smoke somewhere. */
    public boolean moves() {
        return moves;
    }

    @Override
    public Optional<Matte> within() {
        return Optional.empty();
    }

    @Override
    public boolean changesNothing() {
        return !moves && !changes;
    }

    /** A new picture; pixels that are neither moved nor changed keep their bits. */
    Picture applied(Picture picture) {
        float[] own = on(picture);
        Picture out = moves ? moved(picture, own) : picture.copy();
        if (changes) {
            change(out, own);
        }
        return out;
    }

    /** Where it acts: its mask, widened by about a feather, {@code max(m, min(1, 2 G(feather / 2) * m))}. */
    float[] touched(Picture original, double feather) {
        float[] own = on(original);
        float[] mask = new float[original.width() * original.height()];
        for (int p = 0; p < mask.length; p++) {
            mask[p] = Math.min(1f, Math.max(0f, own[LAYERS * p + 3]));
        }
        if (feather > 0) {
            float[] wide = Gaussian.blurred(mask, original.width(), original.height(), Math.max(0.5, feather * original.height() / 2));
            for (int p = 0; p < mask.length; p++) {
                mask[p] = Math.max(mask[p], Math.min(1f, 2 * wide[p]));
            }
        }
        return mask;
    }

    private float[] on(Picture picture) {
        return Resized.values(layers, LAYERS, width, height, picture.width(), picture.height());
    }

    private static Picture moved(Picture picture, float[] own) {
        Picture out = picture.copy();
        Resampling resampling = new Resampling(Kernel.KEYS);
        int rows = picture.height();
        for (int p = 0; p < picture.width() * rows; p++) {
            float ux = own[LAYERS * p + 1];
            float uy = own[LAYERS * p + 2];
            if (ux != 0 || uy != 0) {
                double x = p % picture.width() + (double) ux * rows;
                double y = p / picture.width() + (double) uy * rows;
                resampling.read(picture, x, y, out.rgba(), 4 * p);
                Resampling.clamp(out.rgba(), 4 * p);
            }
        }
        return out;
    }

    private static void change(Picture picture, float[] own) {
        float[] near = new ColourNearby(new Blocks(picture), picture, COLOUR_SIGMA * picture.height()).all();
        float[] rgba = picture.rgba();
        for (int p = 0; p < picture.width() * picture.height(); p++) {
            double was = rgba[4 * p + 3];
            float becomes = (float) Math.min(1, Math.max(0, was + own[LAYERS * p]));
            if (becomes < was) {
                for (int c = 0; c < 3; c++) {
                    rgba[4 * p + c] *= becomes / was;
                }
            } else if (becomes > was) {
                for (int c = 0; c < 3; c++) {
                    rgba[4 * p + c] += (becomes - was) * (rgba[4 * p + c] + LocalContrast.FAINT * near[3 * p + c])
                            / (was + LocalContrast.FAINT);
                }
            }
            rgba[4 * p + 3] = becomes;
        }
    }
}

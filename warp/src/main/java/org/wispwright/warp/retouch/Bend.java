package org.wispwright.warp.retouch;

import java.util.List;
import java.util.Optional;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.matte.Window;
import org.wispwright.warp.resample.Kernel;
import org.wispwright.warp.resample.Rewarp;

/**
 * A {@link MeshWarp} or an {@link OutlineWarp} made ready for pictures of one raster: where the smoke at each place comes from.
 * <p>With B the backward map of the warp's kind, the pixel at p shows what was at {@code q = p + mask(p) (B(p) - p)}. Every pixel has
 * one source, so no holes appear; where a mesh leaves a part of the frame, nothing comes and the frame is clear there. Where the
 * mask is 1 the handles land exactly; in its feather they fall short by design.
 */
final class Bend {
    /** Displacements from 0 to this many heights count as ever more noticeable; from here on, fully. */
    static final double NOTICEABLE = 0.01;
    private static final int BAND = 16;

    private final BackwardMap map;
    private final float[] mask;
    private final int width;
    private final int height;
    private final Optional<Window> reach;

    private Bend(BackwardMap map, float[] mask, Picture original) {
        this(map, mask, original.width(), original.height(), reach(mask, original.width(), original.height()));
    }

    private Bend(BackwardMap map, float[] mask, int width, int height, Optional<Window> reach) {
        this.map = map;
        this.mask = mask;
        this.width = width;
        this.height = height;
        this.reach = reach;
    }

    /** A mesh warp over pictures of the original's raster. */
    static Bend of(MeshWarp warp, Picture original) {
        return new Bend(map(warp.kind(), warp.handles(), warp.cells(), MeshMap.box(warp.within()), original),
                mask(warp.within(), original), original);
    }

    /** An outline warp: its outline is that of the original. */
    static Bend of(OutlineWarp warp, Picture original) {
        OutlinePull pull = OutlinePull.of(warp, original);
        float[] mask = pull.mask();
        float[] within = mask(warp.within(), original);
        for (int p = 0; within != null && p < mask.length; p++) {
            mask[p] *= within[p];
        }
        return new Bend(map(warp.inside(), pull.handles(), Cells.USUAL, Optional.of(pull.box()), original), mask, original);
    }

    /** The same mask with another map. */
    Bend with(BackwardMap other) {
        return new Bend(other, mask, width, height, reach);
    }

    static BackwardMap map(WarpKind kind, List<Handle> handles, Cells cells, Optional<Box> box, Picture original) {
        return kind == WarpKind.AS_RIGID_AS_POSSIBLE ? new MeshMap(handles, cells, box, original) : BackwardMap.fitted(kind, handles);
    }

    private static float[] mask(Optional<Matte> within, Picture original) {
        return within.map(matte -> matte.values(original)).orElse(null);
    }

    BackwardMap map() {
        return map;
    }

    /** A new picture: bicubic (Keys, a = -1/2), clear outside the frame, overshoot taken away; bits kept where nothing moves. */
    Picture applied(Picture picture) {
        Picture out = picture.copy();
        reach.ifPresent(window -> paint(picture, window, Kernel.KEYS, out));
        return out;
    }

    /** Overwrites a window of {@code out}; a pixel has the same bits whichever window it is in. */
    void paint(Picture picture, Window window, Kernel kernel, Picture out) {
        Rewarp rewarp = new Rewarp(kernel);
        double[] dx = new double[window.width() * BAND];
        double[] dy = new double[window.width() * BAND];
        for (int top = window.top(); top < window.top() + window.height();) {
            // Bands end where the lattice's squares do.
            int rows = Math.min(BAND - top % BAND, window.top() + window.height() - top);
            map.displacements(window.left(), top, window.width(), rows, height, dx, dy);
            for (int j = 0; j < rows; j++) {
                rewarp.row(picture, window.left(), top + j, window.width(), dx, dy, j * window.width(), mask, out);
            }
            top += rows;
        }
    }

    /** The smallest window outside which the mask is 0; the whole raster without a mask; empty if the mask is 0 everywhere. */
    Optional<Window> reach() {
        return reach;
    }

    private static Optional<Window> reach(float[] mask, int width, int height) {
        if (mask == null) {
            return Optional.of(Window.all(width, height));
        }
        int x0 = width;
        int y0 = height;
        int x1 = -1;
        int y1 = -1;
        for (int p = 0; p < mask.length; p++) {
            if (mask[p] > 0) {
                x0 = Math.min(x0, p % width);
                x1 = Math.max(x1, p % width);
                y0 = Math.min(y0, p / width);
                y1 = p / width;
            }
        }
        return x1 < 0 ? Optional.empty() : Optional.of(new Window(x0, y0, x1 - x0 + 1, y1 - y0 + 1));
    }

    /** Masked displacements of part of a row, in pixels; NaN where nothing comes. */
    void displacements(int row, double[] dx, double[] dy) {
        map.displacements(0, row, width, 1, height, dx, dy);
        for (int i = 0; mask != null && i < width; i++) {
            double m = mask[i + width * row];
            dx[i] = m == 0 ? 0 : m * dx[i];
            dy[i] = m == 0 ? 0 : m * dy[i];
        }
    }

    /**
     * Where the bend shows: both where smoke arrives (p) and where it came from (q), each as far as the displacement is noticeable,
     * then widened by about a feather: {@code max(t, min(1, 2 G(feather / 2) * t))}. Where nothing comes, t is 1.
     */
    float[] touched(double feather) {
        float[] touched = new float[width * height];
        double[] dx = new double[width];
        double[] dy = new double[width];
        for (int j = 0; j < height; j++) {
            displacements(j, dx, dy);
            for (int i = 0; i < width; i++) {
                if (Double.isNaN(dx[i]) || Double.isNaN(dy[i])) {
                    touched[i + width * j] = 1;
                    continue;
                }
                float t = (float) Sweep.smooth(Math.hypot(dx[i], dy[i]) / height / NOTICEABLE);
                touched[i + width * j] = Math.max(touched[i + width * j], t);
                double qi = Math.floor(i + 0.5 + dx[i]);
                double qj = Math.floor(j + 0.5 + dy[i]);
                if (qi >= 0 && qi < width && qj >= 0 && qj < height) {
                    int q = (int) qi + width * (int) qj;
                    touched[q] = Math.max(touched[q], t);
                }
            }
        }
        float[] wide = Gaussian.blurred(touched, width, height, Math.max(0.5, feather * height / 2));
        for (int p = 0; p < touched.length; p++) {
            touched[p] = Math.max(touched[p], Math.min(1f, 2 * wide[p]));
        }
        return touched;
    }
}

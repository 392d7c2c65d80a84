package org.wispwright.warp.retouch;

import java.util.List;
import java.util.function.Function;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.resample.Kernel;
import org.wispwright.warp.resample.Resampling;
import org.wispwright.warp.spline.ThinPlateSpline;

/**
 * A {@link MeshWarp} made ready: where the smoke at each place comes from.
 * <p>Backward map: with B the spline fitted from the handles' {@code to} to their {@code from}, the pixel at p shows what was at
 * {@code q = p + mask(p) (B(p) - p)}. Every pixel has one source, so no holes appear. Where the region's mask is 1 the handles land
 * exactly; in its feather they fall short by design.
 */
final class Bend {
    /** Displacements from 0 to this many heights count as ever more noticeable; from here on, fully. */
    static final double NOTICEABLE = 0.01;

    private final MeshWarp warp;
    private final ThinPlateSpline backward;
    private final double[] source = new double[2];

    Bend(MeshWarp warp) {
        this.warp = warp;
        backward = ThinPlateSpline.fit(positions(warp.handles(), Handle::to), positions(warp.handles(), Handle::from));
    }

    /** A new picture: bicubic (Keys, a = -1/2), clear outside the frame, overshoot taken away; bits kept where nothing moves. */
    Picture applied(Picture picture, Picture original) {
        int width = picture.width();
        int height = picture.height();
        Picture out = picture.copy();
        Resampling resampling = new Resampling(Kernel.KEYS);
        float[] mask = mask(original);
        for (int j = 0; j < height; j++) {
            for (int i = 0; i < width; i++) {
                if (sourceOf((i + 0.5) / height, (j + 0.5) / height, mask == null ? 1 : mask[i + width * j])) {
                    int at = 4 * (i + width * j);
                    resampling.read(picture, source[0] * height - 0.5, source[1] * height - 0.5, out.rgba(), at);
                    Resampling.clamp(out.rgba(), at);
                }
            }
        }
        return out;
    }

    /**
     * Where the bend shows: both where smoke arrives (p) and where it came from (q), each as far as the displacement is noticeable,
     * then widened by about a feather: {@code max(t, min(1, 2 G(feather / 2) * t))}.
     */
    float[] touched(Picture original, double feather) {
        int width = original.width();
        int height = original.height();
        float[] mask = mask(original);
        float[] touched = new float[width * height];
        for (int j = 0; j < height; j++) {
            for (int i = 0; i < width; i++) {
                double x = (i + 0.5) / height;
                double y = (j + 0.5) / height;
                if (sourceOf(x, y, mask == null ? 1 : mask[i + width * j])) {
                    float t = (float) Sweep.smooth(Math.hypot(source[0] - x, source[1] - y) / NOTICEABLE);
                    touched[i + width * j] = Math.max(touched[i + width * j], t);
                    double qi = Math.floor(source[0] * height);
                    double qj = Math.floor(source[1] * height);
                    if (qi >= 0 && qi < width && qj >= 0 && qj < height) {
                        int q = (int) qi + width * (int) qj;
                        touched[q] = Math.max(touched[q], t);
                    }
                }
            }
        }
        float[] wide = Gaussian.blurred(touched, 1, width, height, Math.max(0.5, feather * height / 2));
        for (int p = 0; p < touched.length; p++) {
            touched[p] = Math.max(touched[p], Math.min(1f, 2 * wide[p]));
        }
        return touched;
    }

    private float[] mask(Picture original) {
        return warp.within().map(matte -> matte.values(original)).orElse(null);
    }

    /** Sets {@code source} to q for p = (x,y); false if the matte keeps the place where it is. */
    private boolean sourceOf(double x, double y, double mask) {
        if (mask == 0) {
            return false;
        }
        backward.evaluate(x, y, source);
        source[0] = x + mask * (source[0] - x);
        source[1] = y + mask * (source[1] - y);
        return true;
    }

    private static double[][] positions(List<Handle> handles, Function<Handle, Point> end) {
        double[][] out = new double[handles.size()][];
        for (int n = 0; n < out.length; n++) {
            Point p = end.apply(handles.get(n));
            out[n] = new double[] {p.x(), p.y()};
        }
        return out;
    }
}

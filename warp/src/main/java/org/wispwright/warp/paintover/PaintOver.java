package org.wispwright.warp.paintover;

import java.util.List;
import org.wispwright.render.picture.Luminance;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Srgb;
import org.wispwright.warp.loss.PictureMeasure;
import org.wispwright.warp.resample.Resized;
import org.wispwright.warp.retouch.Repaint;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Retoucher;

/**
 * Reads what a person painted over a rendered frame in any paint program, as a {@link Repaint} of our own picture.
 * <p>Frames and original are brought to the original's raster (halved while it has more pixels than a {@link Repaint} may have): finer
 * than that no solve looks. {@link ChangedPixels} says where something changed, {@link LookMap} what the frames' colours mean in our
 * opacity, {@link Moved} where smoke was moved. The change of opacity is {@code mask (map(after) - map(before))}; where smoke moved it is
 * what the moved original then still lacks. So the original, repainted, has the opacity {@code clamp(a + mask (map(after) - map(before)))}
 * either way, and the decision is about colour and about what other rasters make of it.
 */
public final class PaintOver {
    /** A change of opacity smaller than this is left out. */
    private static final float LEAST = 1e-4f;
    /** Width of what counts as near for the level of a silhouette, heights. */
    private static final double NEAR = 0.08;

    private PaintOver() {
    }

    /**
     * What changed from one frame to the other.
     *
     * @param before   read: the frame as the production renderer made it, linear, any look and background
     * @param after    read: the same, painted over; the same raster
     * @param original read: our picture of that frame and view: the same aspect to about a pixel, any raster
     * @throws IllegalArgumentException if the rasters do not fit each other, a number is not finite, or the original shows no smoke
     */
    public static Painted read(Picture before, Picture after, Picture original) {
        if (before.width() != after.width() || before.height() != after.height()) {
            throw new IllegalArgumentException("paint-over: before is " + size(before) + ", after is " + size(after)
                    + ", needs one size; save the painted frame at the size it was loaded with");
        }
        requireAspect("frame", before, original);
        requireFinite("before", before);
        requireFinite("after", after);
        Picture own = workable(original);
        Picture first = Resized.picture(before, own.width(), own.height());
        Picture second = Resized.picture(after, own.width(), own.height());
        ChangedPixels changed = ChangedPixels.between(first, second);
        if (!changed.any()) {
            return Painted.nothing(own, changed.noise());
        }
        LookMap look = LookMap.of(first, own);
        float[] mask = changed.mask();
        float[] a0 = look.opacityOf(first);
        float[] a1 = look.opacityOf(second);
        float[] wanted = new float[mask.length];
        for (int p = 0; p < mask.length; p++) {
            a1[p] = a0[p] + mask[p] * (a1[p] - a0[p]);
            wanted[p] = Math.min(1f, Math.max(0f, own.rgba()[4 * p + 3] + a1[p] - a0[p]));
        }
        Moved moved = Moved.between(first, second, look.background(), a0, a1);
        double confidence = look.agreement() * explained(first, second, look.colourOf(a1), mask);
        return painted(own, wanted, mask, moved, confidence, changed.noise());
    }

    /**
     * A silhouette as the wish: a picture that is white where smoke is wanted and black where none is.
     * <p>With m the matte's luminance in sRGB codes, the scale that paint programs blend edges on, and L the level nearby, the mean of the
     * original's opacity weighted with itself, {@code mean(a^2) / mean(a)} ({@link NearbyMean}): {@code a' = m max(a, L)}. So smoke that
     * is there stays, what lacks is filled to the level of the smoke next to it, and outside there is none. The rule is ours.
     *
     * @param matte    read: the same aspect as the original, any raster
     * @param original read: our picture
     * @throws IllegalArgumentException if the aspects differ, a number is not finite, or the original shows no smoke
     */
    public static Painted silhouette(Picture matte, Picture original) {
        requireAspect("matte", matte, original);
        requireFinite("matte", matte);
        Picture own = workable(original);
        Picture shape = Resized.picture(matte, own.width(), own.height());
        int pixels = own.width() * own.height();
        float[] a = new float[pixels];
        float[] squares = new float[pixels];
        boolean any = false;
        for (int p = 0; p < pixels; p++) {
            a[p] = Math.min(1f, Math.max(0f, own.rgba()[4 * p + 3]));
            squares[p] = a[p] * a[p];
            any |= a[p] > LookMap.CLEAR;
        }
        if (!any) {
            throw new IllegalArgumentException("silhouette: the original shows no smoke here, so that it has no level to fill with;"
                    + " take another frame or view");
        }
        float[] level = NearbyMean.of(squares, a, 1, own.width(), own.height(), NEAR);
        float[] wanted = new float[pixels];
        float[] mask = new float[pixels];
        for (int p = 0; p < pixels; p++) {
            double light = Luminance.of(shape.rgba()[4 * p], shape.rgba()[4 * p + 1], shape.rgba()[4 * p + 2]);
            double inside = Math.min(1, Math.max(0, Srgb.encode(light)));
            wanted[p] = (float) (inside * Math.min(1, Math.max(a[p], level[p])));
            mask[p] = Math.abs(wanted[p] - a[p]) > ChangedPixels.QUANTUM ? 1 : 0;
        }
        return painted(own, wanted, mask, null, 1, 0);
    }

    private static Painted painted(Picture own, float[] wanted, float[] mask, Moved moved, double confidence, double noise) {
        int pixels = mask.length;
        float[] layers = new float[Repaint.LAYERS * pixels];
        float[] from = new float[pixels];
        boolean anyMove = moved != null && moved.movedRegions() > 0;
        for (int p = 0; p < pixels; p++) {
            from[p] = own.rgba()[4 * p + 3];
            layers[Repaint.LAYERS * p + 3] = mask[p];
            if (anyMove) {
                float far = (float) Repaint.FARTHEST;
                layers[Repaint.LAYERS * p + 1] = Math.min(far, Math.max(-far, moved.displacement()[2 * p]));
                layers[Repaint.LAYERS * p + 2] = Math.min(far, Math.max(-far, moved.displacement()[2 * p + 1]));
                layers[Repaint.LAYERS * p + 3] = Math.max(mask[p], moved.region()[p]);
            }
        }
        if (anyMove) {
            Repaint alone = new Repaint(own.width(), own.height(), layers);
            Picture there = Retoucher.wanted(new Retouch(List.of(alone)), own);
            for (int p = 0; p < pixels; p++) {
                from[p] = there.rgba()[4 * p + 3];
            }
        }
        double after = 0;
        double share = 0;
        boolean changes = false;
        for (int p = 0; p < pixels; p++) {
            float change = layers[Repaint.LAYERS * p + 3] > 0 ? wanted[p] - from[p] : 0;
            layers[Repaint.LAYERS * p] = Math.abs(change) < LEAST ? 0 : Math.min(1f, Math.max(-1f, change));
            changes |= Math.abs(change) >= LEAST;
            after += (layers[Repaint.LAYERS * p + 3] > 0 ? wanted[p] : own.rgba()[4 * p + 3]) / ((double) own.height() * own.height());
            share += mask[p] / (double) pixels;
        }
        Painted.Way way = !anyMove && !changes ? Painted.Way.NOTHING : !anyMove ? Painted.Way.OPACITY
                : moved.movedRegions() == moved.regions() ? Painted.Way.MOVED : Painted.Way.BOTH;
        return new Painted(new Repaint(own.width(), own.height(), layers), way, share, PictureMeasure.mass(own), after,
                confidence, noise);
    }

    /** Share of the squared difference between the frames, where masked, that our model of the painted frame accounts for: 0 to 1. */
    private static double explained(Picture before, Picture after, float[] model, float[] mask) {
        double left = 0;
        double whole = 0;
        for (int n = 0; n < model.length; n++) {
            double m = mask[n / 4];
            left += m * Math.pow(after.rgba()[n] - model[n], 2);
            whole += m * Math.pow(after.rgba()[n] - before.rgba()[n], 2);
        }
        return whole > 0 ? Math.max(0, 1 - left / whole) : 0;
    }

    private static Picture workable(Picture original) {
        requireFinite("original", original);
        Picture own = original;
        while ((long) own.width() * own.height() > Repaint.MOST_PIXELS) {
            own = Resized.picture(own, (own.width() + 1) / 2, (own.height() + 1) / 2);
        }
        return own;
    }

    private static void requireAspect(String what, Picture frame, Picture original) {
        double across = (double) frame.height() * original.width() / original.height();
        double down = (double) frame.width() * original.height() / original.width();
        if (!(Math.abs(frame.width() - across) <= 1 || Math.abs(frame.height() - down) <= 1)) {
            throw new IllegalArgumentException("paint-over: the " + what + " is " + size(frame) + ", needs the aspect of the view, "
                    + size(original) + "; save it without cropping or borders");
        }
    }

    private static void requireFinite(String what, Picture picture) {
        for (int n = 0; n < picture.rgba().length; n++) {
            if (!Float.isFinite(picture.rgba()[n])) {
                int p = n / 4;
                throw new IllegalArgumentException("paint-over: pixel (" + p % picture.width() + ", " + p / picture.width() + ") of '"
                        + what
                        + "' is " + picture.rgba()[n] + ", needs finite numbers; save it again");
            }
        }
    }

    private static String size(Picture picture) {
        return picture.width() + "x" + picture.height() + " pixels";
    }
}

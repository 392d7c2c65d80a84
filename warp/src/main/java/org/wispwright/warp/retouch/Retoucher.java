package org.wispwright.warp.retouch;

import org.wispwright.render.picture.Picture;

/**
 * Applies a {@link Retouch} to a picture, and tells where it acts. Works at any raster; the same retouch at two rasters shows the
 * same picture up to resampling, because all positions and widths are fractions of the height.
 */
public final class Retoucher {
    /** The widest feather of {@link #touched}, in heights. */
    public static final double WIDEST_FEATHER = 1;

    private Retoucher() {
    }

    /**
     * The wanted picture: the operations in their order, each on what the one before it left.
     * <p>Alpha stays in 0..1 and colour at or above 0 if they were so in the original. An operation that changes nothing, and pixels
     * that no operation reaches, keep the original's bits.
     *
     * @param original read; never changed
     * @return a new picture of the same raster
     */
    public static Picture wanted(Retouch retouch, Picture original) {
        Canvas canvas = new Canvas(original);
        retouch.operations().forEach(canvas::apply);
        return canvas.picture();
    }

    /**
     * Where a retouch acts, from the geometry of its operations alone: 1 where a stroke has coverage or a warp moves things
     * noticeably (where smoke leaves as well as where it arrives), falling to 0 over about a feather. Operations join by the maximum.
     *
     * @param original read: gives the raster, and the smoke for mattes that depend on it
     * @param feather fraction of the height, 0 to {@value #WIDEST_FEATHER}
     * @return one weight a pixel, 0 to 1, index {@code x + width * y}
     * @throws IllegalArgumentException if the feather is out of range
     */
    public static float[] touched(Retouch retouch, Picture original, double feather) {
        if (!(feather >= 0 && feather <= WIDEST_FEATHER)) {
            throw new IllegalArgumentException("retouch: got feather " + feather + ", needs a fraction of the picture's height, 0 to "
                    + WIDEST_FEATHER);
        }
        float[] touched = new float[original.width() * original.height()];
        for (Operation operation : retouch.operations()) {
            if (operation.changesNothing()) {
                continue;
            }
            float[] one = operation instanceof MeshWarp warp ? Bend.of(warp, original).touched(feather)
                    : operation instanceof OutlineWarp outline ? Bend.of(outline, original).touched(feather)
                    : operation instanceof Repaint repaint ? repaint.touched(original, feather)
                    : ((Stroke) operation).reach(original, feather);
            for (int p = 0; p < touched.length; p++) {
                touched[p] = Math.max(touched[p], one[p]);
            }
        }
        return touched;
    }
}

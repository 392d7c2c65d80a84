package org.wispwright.ui.desk;

import org.wispwright.render.picture.Picture;
import org.wispwright.warp.resample.Resized;

/**
 * The picture that a retouch works on, at the rasters that a hand needs. A retouch may be applied at any of them.
 *
 * @param full   the view's own raster; nobody changes it
 * @param middle at most {@value #MIDDLE_PIXELS} pixels: small enough to move all of them in the time of one frame of the screen
 * @param small  at most {@value #SMALL_PIXELS} pixels, for what a worker draws while the hand moves
 */
record Originals(Picture full, Picture middle, Picture small) {
    static final int MIDDLE_PIXELS = 200_000;
    static final int SMALL_PIXELS = 150_000;

    /** Shrinks a picture by whole factors; one that is small enough stays the same object. */
    static Originals of(Picture full) {
        return new Originals(full, shrunk(full, MIDDLE_PIXELS), shrunk(full, SMALL_PIXELS));
    }

    private static Picture shrunk(Picture full, int most) {
        int factor = (int) Math.ceil(Math.sqrt((double) full.width() * full.height() / most));
        return factor <= 1 ? full : Resized.picture(full, Math.max(1, full.width() / factor), Math.max(1, full.height() / factor));
    }
}

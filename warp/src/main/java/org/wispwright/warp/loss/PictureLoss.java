package org.wispwright.warp.loss;

import org.wispwright.render.picture.Picture;

/**
 * How far a picture is from the wanted one: one number, 0 or more, 0 where got = wanted, with its pullback. Such a loss keeps
 * scratch space of its own: one caller at a time. Same bits for the same picture, always.
 */
public interface PictureLoss {
    /** The wanted picture itself. */
    Picture wanted();

    /**
     * J at a picture.
     *
     * @throws IllegalArgumentException if its raster is not that of the wanted picture
     */
    double value(Picture got);

    /**
     * J at a picture, and {@code scale * dJ/dgot} added into {@code gotBar}.
     *
     * @param got    read
     * @param gotBar added to: shape of got.rgba()
     * @param scale  factor on the derivative only; the returned value is J itself
     * @throws IllegalArgumentException if a raster is not that of the wanted picture
     */
    double valueAndPullback(Picture got, float[] gotBar, double scale);
}

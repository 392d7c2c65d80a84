package org.wispwright.render.view;

/**
 * How a point of the world gets to the film: by a {@link Pinhole} or an {@link Orthographic} projection. Only the ratio of
 * the film's sides meets the raster; {@link #aspect()} gives it.
 */
public sealed interface Lens permits Pinhole, Orthographic {

    /** Width by height of the film gate (pinhole) or of the field (orthographic). */
    double aspect();
}

package org.wispwright.optimize.solve;

import org.wispwright.render.picture.Picture;

/**
 * What a note wants of its frame, at any raster: the retouch is applied anew to each rung's own picture of the original.
 */
public interface Wish {
    /** The wanted picture for an original of any raster; the original is left as it is. */
    Picture wanted(Picture original);

    /** How much each pixel of an original counts, 0..1, row 0 at the top: 1 where retouched, a smaller number elsewhere. */
    float[] weights(Picture original);
}

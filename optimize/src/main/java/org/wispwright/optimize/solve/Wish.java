package org.wispwright.optimize.solve;

import org.wispwright.render.picture.Picture;
import org.wispwright.warp.loss.LossChoice;

/**
 * What a note wants of its frame, at any raster: the retouch is applied anew to each rung's own picture of the original.
 */
public interface Wish {
    /** The wanted picture for an original of any raster; the original is left as it is. */
    Picture wanted(Picture original);

    /** How much each pixel of an original counts, 0..1, row 0 at the top: 1 where retouched, a smaller number elsewhere. */
    float[] weights(Picture original);

    /** What the picture is compared with the wanted one by; the program's own rule unless a note says otherwise. */
    default LossChoice losses(Picture original, Picture wanted) {
        return LossChoice.of(original, wanted);
    }
}

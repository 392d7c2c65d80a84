package org.wispwright.warp.loss;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;
import org.wispwright.render.picture.Picture;

/** Plain figures of pictures, by hand. */
class PictureMeasureTest {
    /**
     * Beer and Lambert: an opacity of 1 - exp(-d) is a depth d, so depths of 1/2 and 2 in a picture of 2 x 2 pixels are 2.5 / 4 squared
     * heights; an opaque pixel counts -ln(0.002) = 6.2146, one below 0 nothing.
     */
    @Test void depthIsWhatDensityGives() {
        Picture picture = new Picture(2, 2);
        picture.rgba()[3] = (float) (1 - Math.exp(-0.5));
        picture.rgba()[7] = (float) (1 - Math.exp(-2));
        assertEquals(2.5 / 4, PictureMeasure.depth(picture), 1e-6);
        picture.rgba()[11] = 1;
        picture.rgba()[15] = -0.5f;
        assertEquals((2.5 + 6.2146) / 4, PictureMeasure.depth(picture), 1e-5);
    }

    /** By hand: alpha 0.5 and 0.25 of 8 pixels, 2 rows: 0.75 / 4. */
    @Test void massIsTheIntegralOfOpacity() {
        Picture picture = new Picture(4, 2);
        picture.rgba()[3] = 0.5f;
        picture.rgba()[31] = 0.25f;
        assertEquals(0.75 / 4, PictureMeasure.mass(picture), 1e-12);
    }
}

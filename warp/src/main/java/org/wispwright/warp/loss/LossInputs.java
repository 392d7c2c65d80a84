package org.wispwright.warp.loss;

import org.wispwright.render.picture.Picture;

/** The checks that all losses share. Each throws {@link IllegalArgumentException} with one sentence. */
final class LossInputs {
    private LossInputs() {
    }

    static void requireWeights(Picture wanted, float[] weights) {
        int pixels = wanted.width() * wanted.height();
        if (weights.length != pixels) {
            throw new IllegalArgumentException("picture loss: got " + weights.length + " weights, the wanted picture has "
                    + wanted.width() + "x" + wanted.height() + " = " + pixels + " pixels");
        }
        for (int p = 0; p < weights.length; p++) {
            if (!(weights[p] >= 0 && weights[p] < Float.POSITIVE_INFINITY)) {
                throw new IllegalArgumentException("picture loss: weight of pixel (" + p % wanted.width() + ", " + p / wanted.width()
                        + ") is " + weights[p] + ", needs a finite number, 0 or more");
            }
        }
    }

    static void requireRaster(Picture wanted, Picture got) {
        if (got.width() != wanted.width() || got.height() != wanted.height()) {
            throw new IllegalArgumentException("picture loss: got a picture of " + got.width() + "x" + got.height() + " pixels, wanted is "
                    + wanted.width() + "x" + wanted.height() + "; render the view at the wanted picture's raster");
        }
    }

    static void requireBar(Picture wanted, float[] gotBar) {
        if (gotBar.length != wanted.rgba().length) {
            throw new IllegalArgumentException("picture loss: 'gotBar' has " + gotBar.length + " numbers, needs "
                    + wanted.rgba().length);
        }
    }
}

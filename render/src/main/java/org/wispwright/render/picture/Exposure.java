package org.wispwright.render.picture;

/** Exposure in stops: one stop is a factor of 2 on linear light. Common practice of the trade, no source. */
public final class Exposure {
    private Exposure() {
    }

    /** {@code 2^stops}: what to multiply light by. */
    public static double factor(double stops) {
        return Math.pow(2, stops);
    }

    /** {@code log2(to / from)}: how many stops from one light to another, both above 0. */
    public static double stops(double from, double to) {
        return Math.log(to / from) / Math.log(2);
    }

    /**
     * Overwrites out with the picture exposed by so many stops more; alpha stays.
     *
     * @param out the same raster; may be the picture itself
     * @throws IllegalArgumentException if the rasters differ
     */
    public static void apply(Picture picture, double stops, Picture out) {
        Compositing.requireSame("exposure", picture, out);
        float[] from = picture.rgba();
        float[] to = out.rgba();
        float by = (float) factor(stops);
        for (int n = 0; n < from.length; n++) {
            to[n] = (n & 3) == 3 ? from[n] : from[n] * by;
        }
    }
}

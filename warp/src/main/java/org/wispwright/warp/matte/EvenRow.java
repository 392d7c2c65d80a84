package org.wispwright.warp.matte;

/**
 * Coverage of a row of pixels from a straight piece that is pressed alike all along, or from one touch, a piece of length 0: that of the
 * nearest place. The loops have one index for all their arrays, so that the compiler does several pixels at a time.
 */
final class EvenRow {
    /** 0, 1, 2, ... */
    private final double[] count;
    private final double[] squared;
    private final double[] value;

    /** Room for so many pixels. */
    EvenRow(int pixels) {
        count = new double[pixels];
        for (int n = 0; n < pixels; n++) {
            count[n] = n;
        }
        squared = new double[pixels];
        value = new double[pixels];
    }

    /**
     * The pixels take what the piece gives, if it is more than they have.
     *
     * @param left   column of the first
     * @param pixels how many
     * @param x      of the piece's start, in pixels
     * @param dy     from the piece's start down to the row
     * @param vx     direction of the piece
     * @param vy     direction of the piece
     * @param length of the piece
     * @param values changed from {@code at} on
     */
    void take(Tip.Touch touch, int left, int pixels, double x, double dy, double vx, double vy, double length, float[] values, int at) {
        squares(pixels, left, x, dy, vx, vy, length);
        values(pixels, touch.edge(), touch.perWide(), touch.most());
        for (int n = 0; n < pixels; n++) {
            float given = (float) value[n];
            if (given > values[at + n]) {
                values[at + n] = given;
            }
        }
    }

    private void squares(int pixels, double left, double x, double dy, double vx, double vy, double length) {
        for (int n = 0; n < pixels; n++) {
            double px = count[n] + left - x;
            double along = px * vx + dy * vy;
            double beside = px * vy - dy * vx;
            double past = Math.max(0, Math.max(-along, along - length));
            squared[n] = beside * beside + past * past;
        }
    }

    private void values(int pixels, double edge, double perWide, double most) {
        for (int n = 0; n < pixels; n++) {
            double s = Math.min(1, Math.max(0, edge - Math.sqrt(squared[n]) * perWide));
            value[n] = most * s * s * (3 - 2 * s);
        }
    }
}

package org.wispwright.warp.matte;

/**
 * Pixels of a raster: columns left to left + width - 1, rows top to top + height - 1. Numbers of a window are laid out row by row,
 * index {@code (x - left) + width * (y - top)}.
 *
 * @param left   first column
 * @param top    first row
 * @param width  columns, 1 or more
 * @param height rows, 1 or more
 */
public record Window(int left, int top, int width, int height) {
    /** All pixels of a raster. */
    public static Window all(int width, int height) {
        return new Window(0, 0, width, height);
    }

    /** This window and the pixels around it up to a distance, as far as they are on the raster. */
    Window grown(int pixels, int rasterWidth, int rasterHeight) {
        int x0 = Math.max(0, left - pixels);
        int y0 = Math.max(0, top - pixels);
        return new Window(x0, y0, Math.min(rasterWidth, left + width + pixels) - x0, Math.min(rasterHeight, top + height + pixels) - y0);
    }

    /** How many pixels. */
    public int pixels() {
        return width * height;
    }

    /** The smallest window around this one and another. */
    public Window around(Window other) {
        int l = Math.min(left, other.left);
        int t = Math.min(top, other.top);
        return new Window(l, t, Math.max(left + width, other.left + other.width) - l, Math.max(top + height, other.top + other.height) - t);
    }
}

package org.wispwright.ui.window.easel;

import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Window;

/**
 * A picture coded for the screen, with smaller copies for when it is shown small: each has half the rows and columns of the one before, a
 * pixel the mean of four codes. Follows the picture window by window.
 */
final class Plate {
    private static final int FEWEST_ROWS = 64;

    private final Picture picture;
    private final Tone tone;
    private final int[] codes;
    private Plate half;
    private final int width;
    private final int height;

    Plate(Picture picture, Tone tone) {
        this.picture = picture;
        this.tone = tone;
        width = picture.width();
        height = picture.height();
        codes = new int[width * height];
        refresh(Window.all(width, height));
    }

    private Plate(int width, int height) {
        picture = null;
        tone = null;
        this.width = width;
        this.height = height;
        codes = new int[width * height];
    }

    /** The picture it was made of. */
    Picture picture() {
        return picture;
    }

    int width() {
        return width;
    }

    int height() {
        return height;
    }

    /** 0xRRGGBB, index x + width * y. */
    int[] codes() {
        return codes;
    }

    /** Codes the pixels of a window again, in all sizes that there are. */
    void refresh(Window window) {
        tone.code(picture, window, codes);
        if (half != null) {
            half.from(this, window);
        }
    }

    /** The smallest copy that still has a pixel for each of the screen's. @param screenRows rows that the picture takes on the screen */
    Plate fitting(double screenRows) {
        if (screenRows > height / 2.0 || height / 2 < FEWEST_ROWS || width < 2) {
            return this;
        }
        if (half == null) {
            half = new Plate(width / 2, height / 2);
            half.from(this, Window.all(width, height));
        }
        return half.fitting(screenRows);
    }

    private void from(Plate large, Window changed) {
        int x0 = Math.min(width, changed.left() / 2);
        int x1 = Math.min(width, (changed.left() + changed.width() + 1) / 2);
        int y0 = Math.min(height, changed.top() / 2);
        int y1 = Math.min(height, (changed.top() + changed.height() + 1) / 2);
        if (x0 >= x1 || y0 >= y1) {
            return;
        }
        for (int y = y0; y < y1; y++) {
            for (int x = x0; x < x1; x++) {
                int at = 2 * x + large.width * 2 * y;
                codes[x + width * y] = mean(large.codes[at], large.codes[at + 1], large.codes[at + large.width],
                        large.codes[at + large.width + 1]);
            }
        }
        if (half != null) {
            half.from(this, new Window(x0, y0, x1 - x0, y1 - y0));
        }
    }

    private static int mean(int a, int b, int c, int d) {
        int redBlue = (a & 0xff00ff) + (b & 0xff00ff) + (c & 0xff00ff) + (d & 0xff00ff) + 0x20002;
        int green = (a & 0xff00) + (b & 0xff00) + (c & 0xff00) + (d & 0xff00) + 0x200;
        return redBlue >>> 2 & 0xff00ff | green >>> 2 & 0xff00;
    }
}

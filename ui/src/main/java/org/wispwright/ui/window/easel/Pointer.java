package org.wispwright.ui.window.easel;

import org.wispwright.warp.matte.Point;

/**
 * One event of the pointer over the easel.
 *
 * @param place    in fractions of the picture's height; may lie outside the picture
 * @param x        in the easel's pixels
 * @param y        in the easel's pixels
 * @param pressure 0 to 1; 1 where the device tells none
 * @param shift    whether Shift is down
 * @param ctrl     whether Ctrl, or the platform's menu key, is down
 * @param alt      whether Alt is down
 * @param heights  fraction of the picture's height that one pixel of the easel is
 */
record Pointer(Point place, double x, double y, double pressure, boolean shift, boolean ctrl, boolean alt, double heights) {
}

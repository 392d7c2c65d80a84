package org.wispwright.ui.window.easel;

import java.awt.geom.Point2D;
import org.wispwright.warp.matte.Point;

/**
 * Where the picture lies in the easel: screen = corner + scale * place, with places in fractions of the picture's height, as in a retouch.
 *
 * @param left  of the picture's left edge, in the component's pixels
 * @param top   of its top edge
 * @param scale the component's pixels in one height of the picture, above 0
 */
record Placement(double left, double top, double scale) {
    Placement {
        if (!(scale > 0)) {
            throw new IllegalArgumentException("placement: got scale " + scale + ", needs a number above 0");
        }
    }

    Point2D toScreen(Point place) {
        return new Point2D.Double(left + scale * place.x(), top + scale * place.y());
    }

    Point toPicture(double x, double y) {
        return new Point((x - left) / scale, (y - top) / scale);
    }

    /** Zoomed by a factor with one place of the screen kept. */
    Placement zoomed(double factor, double x, double y) {
        return new Placement(x + factor * (left - x), y + factor * (top - y), scale * factor);
    }

    /** Moved. */
    Placement moved(double dx, double dy) {
        return new Placement(left + dx, top + dy, scale);
    }
}

package org.wispwright.warp.retouch;

import java.util.List;
import java.util.Optional;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Region;
import org.wispwright.warp.matte.Window;

/** An upright box of the picture, in heights. */
record Box(double left, double top, double right, double bottom) {
    /** The frame of a picture. */
    static Box frame(Picture picture) {
        return new Box(0, 0, (double) picture.width() / picture.height(), 1);
    }

    /** What a matte can reach, feather included; empty if that does not follow from its geometry. */
    static Optional<Box> of(Matte matte) {
        if (matte instanceof Region.Rectangle r) {
            return Optional.of(new Box(r.left(), r.top(), r.right(), r.bottom()).grown(r.feather() / 2));
        }
        if (matte instanceof Region.Ellipse e) {
            return Optional.of(new Box(e.centre().x() - e.radiusX(), e.centre().y() - e.radiusY(), e.centre().x() + e.radiusX(),
                    e.centre().y() + e.radiusY()).grown(e.feather() / 2));
        }
        if (matte instanceof Region.Polygon p) {
            Box box = around(p.outline()).grown(p.feather() / 2);
            return box.left < box.right && box.top < box.bottom ? Optional.of(box) : Optional.empty();
        }
        return Optional.empty();
    }

    private static Box around(List<Point> points) {
        Point first = points.get(0);
        Box box = new Box(first.x(), first.y(), first.x(), first.y());
        for (Point p : points) {
            box = box.with(p);
        }
        return box;
    }

    Box with(Point p) {
        return new Box(Math.min(left, p.x()), Math.min(top, p.y()), Math.max(right, p.x()), Math.max(bottom, p.y()));
    }

    /** The pixels it touches, with one more on every side; empty if it lies beyond the raster. */
    Optional<Window> window(int width, int height) {
        int x0 = (int) Math.max(0, Math.floor(left * height) - 1);
        int y0 = (int) Math.max(0, Math.floor(top * height) - 1);
        int x1 = (int) Math.min(width, Math.ceil(right * height) + 1);
        int y1 = (int) Math.min(height, Math.ceil(bottom * height) + 1);
        return x0 < x1 && y0 < y1 ? Optional.of(new Window(x0, y0, x1 - x0, y1 - y0)) : Optional.empty();
    }

    Box grown(double by) {
        return new Box(left - by, top - by, right + by, bottom + by);
    }
}

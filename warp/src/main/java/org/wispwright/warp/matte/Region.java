package org.wispwright.warp.matte;

import java.util.List;
import org.wispwright.render.picture.Picture;

/**
 * A part of the picture with a soft edge. Its mask is 1/2 on the outline and goes from 1 to 0 over a width of {@code feather}
 * centred there, by {@code s^2 (3 - 2 s)}.
 */
public sealed interface Region extends Matte permits Region.Rectangle, Region.Ellipse, Region.Polygon {
    /** The widest feather, in heights. */
    double WIDEST_FEATHER = 4;

    /** Width of the soft edge, fraction of the height, 0 or more. */
    double feather();

    /**
     * Signed distance from the outline in heights, negative inside. Exact for rectangles and polygons; for an ellipse correct to first
     * order near its outline.
     */
    double signedDistance(double x, double y);

    /**
     * The mask at a place, 0 to 1.
     *
     * @param x      in heights
     * @param y      in heights
     * @param finest narrowest edge to draw, in heights, above 0: one pixel, so that a hard outline does not stair-step
     */
    default double mask(double x, double y, double finest) {
        double width = Math.max(feather(), finest);
        double s = Math.min(1, Math.max(0, 0.5 - signedDistance(x, y) / width));
        return s * s * (3 - 2 * s);
    }

    @Override
    default float[] values(Picture original, Window window) {
        int height = original.height();
        float[] values = new float[window.pixels()];
        for (int n = 0; n < values.length; n++) {
            values[n] = (float) mask((window.left() + n % window.width() + 0.5) / height, (window.top() + n / window.width() + 0.5) / height,
                    1.0 / height);
        }
        return values;
    }

    @Override
    default float[] reach(Picture original, Window window, double feather) {
        int height = original.height();
        double fade = Math.max(feather, 1.0 / height);
        float[] reach = new float[window.pixels()];
        for (int n = 0; n < reach.length; n++) {
            double d = signedDistance((window.left() + n % window.width() + 0.5) / height, (window.top() + n / window.width() + 0.5) / height);
            reach[n] = (float) Sweep.smooth(1 + (feather() / 2 - d) / fade);
        }
        return reach;
    }

    /**
     * An upright rectangle.
     *
     * @param left    x of its left side
     * @param top     y of its top
     * @param right   x of its right side, more than left
     * @param bottom  y of its bottom, more than top
     * @param feather width of the soft edge
     */
    record Rectangle(double left, double top, double right, double bottom, double feather) implements Region {
        /**
         * Checks the sides.
         *
         * @throws IllegalArgumentException if they are out of order, not finite, or the feather is out of range
         */
        public Rectangle {
            Needs.feather("rectangle", feather);
            if (!(left < right && top < bottom && Math.abs(left) <= Point.FARTHEST && Math.abs(right) <= Point.FARTHEST
                    && Math.abs(top) <= Point.FARTHEST && Math.abs(bottom) <= Point.FARTHEST)) {
                throw new IllegalArgumentException("rectangle: got left " + left + ", top " + top + ", right " + right + ", bottom "
                        + bottom
                        + ", needs left < right and top < bottom, in fractions of the picture's height from its top left corner");
            }
        }

        @Override
        public double signedDistance(double x, double y) {
            double dx = Math.max(left - x, x - right);
            double dy = Math.max(top - y, y - bottom);
            return dx > 0 && dy > 0 ? Math.hypot(dx, dy) : Math.max(dx, dy);
        }
    }

    /**
     * An upright ellipse.
     *
     * @param centre  its middle
     * @param radiusX half its width, in heights, above 0
     * @param radiusY half its height, in heights, above 0
     * @param feather width of the soft edge
     */
    record Ellipse(Point centre, double radiusX, double radiusY, double feather) implements Region {
        /**
         * Checks the radii.
         *
         * @throws IllegalArgumentException if a radius is not above 0, or the feather is out of range
         */
        public Ellipse {
            Needs.present("ellipse", "centre", centre);
            Needs.feather("ellipse", feather);
            if (!(radiusX > 0 && radiusY > 0 && radiusX <= Point.FARTHEST && radiusY <= Point.FARTHEST)) {
                throw new IllegalArgumentException("ellipse: got radii " + radiusX + " and " + radiusY
                        + ", needs fractions of the picture's height above 0");
            }
        }

        /** {@code f / |grad f|} with {@code f = |p / r| - 1}: Taubin (1991), IEEE PAMI 13(11), 1115-1138. */
        @Override
        public double signedDistance(double x, double y) {
            double px = (x - centre.x()) / radiusX;
            double py = (y - centre.y()) / radiusY;
            double k = Math.hypot(px, py);
            if (k < 1e-9) {
                return -Math.min(radiusX, radiusY);
            }
            return Math.max(k * (k - 1) / Math.hypot(px / radiusX, py / radiusY), -Math.min(radiusX, radiusY));
        }
    }

    /**
     * The inside of a closed outline, by the even-odd rule where it crosses itself.
     *
     * @param outline 3 to {@value #MOST_POINTS} corners; the last joins the first
     * @param feather width of the soft edge
     */
    record Polygon(List<Point> outline, double feather) implements Region {
        /** The most corners an outline may have. */
        public static final int MOST_POINTS = 10_000;

        /**
         * Checks and copies.
         *
         * @throws IllegalArgumentException if there are too few or too many corners, or the feather is out of range
         */
        public Polygon {
            Needs.feather("polygon", feather);
            Needs.present("polygon", "outline", outline);
            outline = Needs.points("polygon", "outline", outline, 3, MOST_POINTS);
        }

        @Override
        public double signedDistance(double x, double y) {
            double nearest = Double.POSITIVE_INFINITY;
            boolean inside = false;
            Point a = outline.get(outline.size() - 1);
            for (Point b : outline) {
                nearest = Math.min(nearest, Segment.squaredDistance(x, y, a.x(), a.y(), b.x(), b.y()));
                if (a.y() > y != b.y() > y && x < a.x() + (y - a.y()) / (b.y() - a.y()) * (b.x() - a.x())) {
                    inside = !inside;
                }
                a = b;
            }
            return inside ? -Math.sqrt(nearest) : Math.sqrt(nearest);
        }
    }
}

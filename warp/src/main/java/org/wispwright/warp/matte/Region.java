package org.wispwright.warp.matte;

import java.util.ArrayList;
import java.util.Arrays;
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

    /** The smallest upright rectangle around the outline: left, top, right, bottom, in heights. */
    double[] bounds();

    /**
     * Signed distances of pixel centres, as {@link #signedDistance}; where that is farther than {@code reach} from the outline, possibly
     * infinite with its sign.
     */
    default double[] signedDistances(Window window, int height, double reach) {
        double[] bounds = bounds();
        double[] distances = new double[window.pixels()];
        Arrays.fill(distances, Double.POSITIVE_INFINITY);
        int left = Segment.pixel(bounds[0] - reach, height, window.left(), window.width());
        int right = Segment.pixel(bounds[2] + reach, height, window.left(), window.width());
        int top = Segment.pixel(bounds[1] - reach, height, window.top(), window.height());
        int bottom = Segment.pixel(bounds[3] + reach, height, window.top(), window.height());
        for (int j = top; j <= bottom; j++) {
            for (int i = left; i <= right; i++) {
                distances[i + window.width() * j] = signedDistance((window.left() + i + 0.5) / height, (window.top() + j + 0.5) / height);
            }
        }
        return distances;
    }

    @Override
    default float[] values(Picture original, Window window) {
        double width = Math.max(feather(), 1.0 / original.height());
        double[] distances = signedDistances(window, original.height(), width / 2);
        float[] values = new float[distances.length];
        for (int n = 0; n < values.length; n++) {
            values[n] = (float) Sweep.smooth(0.5 - distances[n] / width);
        }
        return values;
    }

    @Override
    default float[] reach(Picture original, Window window, double feather) {
        double fade = Math.max(feather, 1.0 / original.height());
        double[] distances = signedDistances(window, original.height(), feather() / 2 + fade);
        float[] reach = new float[distances.length];
        for (int n = 0; n < reach.length; n++) {
            reach[n] = (float) Sweep.smooth(1 + (feather() / 2 - distances[n]) / fade);
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
        public double[] bounds() {
            return new double[] {left, top, right, bottom};
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

        @Override
        public double[] bounds() {
            return new double[] {centre.x() - radiusX, centre.y() - radiusY, centre.x() + radiusX, centre.y() + radiusY};
        }

        /** {@code f / |grad f|} with {@code f = |p / r| - 1}: Taubin (1991), IEEE PAMI 13(11), 1115-1138. */
        @Override
        public double signedDistance(double x, double y) {
            double px = (x - centre.x()) / radiusX;
            double py = (y - centre.y()) / radiusY;
            double k = Math.sqrt(px * px + py * py);
            if (k < 1e-9) {
                return -Math.min(radiusX, radiusY);
            }
            double gx = px / radiusX;
            double gy = py / radiusY;
            return Math.max(k * (k - 1) / Math.sqrt(gx * gx + gy * gy), -Math.min(radiusX, radiusY));
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

        @Override
        public double[] bounds() {
            double[] bounds = {Point.FARTHEST, Point.FARTHEST, -Point.FARTHEST, -Point.FARTHEST};
            for (Point p : outline) {
                bounds[0] = Math.min(bounds[0], p.x());
                bounds[1] = Math.min(bounds[1], p.y());
                bounds[2] = Math.max(bounds[2], p.x());
                bounds[3] = Math.max(bounds[3], p.y());
            }
            return bounds;
        }

        /** Distances along the outline alone, signs row by row: time grows with the outline's length, not with corners times pixels. */
        @Override
        public double[] signedDistances(Window window, int height, double reach) {
            List<Point> closed = new ArrayList<>(outline);
            closed.add(outline.get(0));
            double[] distances = Segment.squaredDistances(closed, window, height, reach);
            boolean[] turns = new boolean[window.width() + 1];
            for (int j = 0, n = 0; j < window.height(); j++) {
                Arrays.fill(turns, false);
                turnsOfRow((window.top() + j + 0.5) / height, window, height, turns);
                boolean inside = false;
                n += window.width();
                for (int i = window.width() - 1, p = n - 1; i >= 0; i--, p--) {
                    inside ^= turns[i + 1];
                    distances[p] = inside ? -Math.sqrt(distances[p]) : Math.sqrt(distances[p]);
                }
            }
            return distances;
        }

        /** Flips {@code turns[i + 1]} for each crossing of row y that pixels up to i of the window, and no others, lie left of. */
        private void turnsOfRow(double y, Window window, int height, boolean[] turns) {
            Point a = outline.get(outline.size() - 1);
            for (Point b : outline) {
                if (a.y() > y != b.y() > y) {
                    double x = a.x() + (y - a.y()) / (b.y() - a.y()) * (b.x() - a.x());
                    int i = Segment.pixel(x, height, window.left() - 1, window.width() + 1);
                    while (i > 0 && !((window.left() + i - 1 + 0.5) / height < x)) {
                        i--;
                    }
                    while (i < window.width() && (window.left() + i + 0.5) / height < x) {
                        i++;
                    }
                    turns[i] ^= true;
                }
                a = b;
            }
        }
    }
}

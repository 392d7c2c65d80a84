package org.wispwright.warp.matte;

import java.util.Arrays;
import java.util.List;
import java.util.function.UnaryOperator;
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
     * Signed distances of the pixel centres of a window's row, as {@link #signedDistance}; where that is {@code reach} or more from the
     * outline, any number at least as far out or in.
     *
     * @param y      of the row, in heights
     * @param x      of the pixel centres, in heights, one pixel apart
     * @param height rows of the raster
     * @param out    overwritten, as many as x
     */
    default void rowDistances(double y, double[] x, int height, double reach, double[] out) {
        for (int i = 0; i < x.length; i++) {
            out[i] = signedDistance(x[i], y);
        }
    }

    @Override
    default float[] values(Picture original, Window window) {
        return drawn(window, original.height(), 0, Math.max(feather(), 1.0 / original.height()));
    }

    @Override
    default float[] reach(Picture original, Window window, double feather) {
        double fade = Math.max(feather, 1.0 / original.height());
        return drawn(window, original.height(), (feather() + fade) / 2, fade);
    }

    /** {@code smooth(1/2 - (d - shift) / width)}; rows and columns that nothing reaches are passed over. */
    private float[] drawn(Window window, int height, double shift, double width) {
        double out = shift + width / 2;
        double in = shift - width / 2;
        double reach = Math.max(Math.abs(out), Math.abs(in));
        double[] bounds = bounds();
        int left = Segment.pixel(bounds[0] - reach, height, window.left(), window.width());
        int right = Segment.pixel(bounds[2] + reach, height, window.left(), window.width());
        int top = Segment.pixel(bounds[1] - reach, height, window.top(), window.height());
        int bottom = Segment.pixel(bounds[3] + reach, height, window.top(), window.height());
        double[] x = new double[right - left + 1];
        for (int i = 0; i < x.length; i++) {
            x[i] = (window.left() + left + i + 0.5) / height;
        }
        double[] distances = new double[x.length];
        float[] values = new float[window.pixels()];
        for (int j = top; j <= bottom; j++) {
            rowDistances((window.top() + j + 0.5) / height, x, height, reach, distances);
            for (int i = 0, n = left + window.width() * j; i < x.length; i++, n++) {
                double d = distances[i];
                if (d < out) {
                    values[n] = d <= in ? 1 : (float) Sweep.smooth(0.5 - (d - shift) / width);
                }
            }
        }
        return values;
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

        /** A rectangle if its corners still are those of an upright one, else the polygon of the four. */
        @Override
        public Region moved(UnaryOperator<Point> map) {
            Point a = map.apply(new Point(left, top));
            Point b = map.apply(new Point(right, top));
            Point c = map.apply(new Point(right, bottom));
            Point d = map.apply(new Point(left, bottom));
            boolean upright = a.y() == b.y() && c.y() == d.y() && a.x() == d.x() && b.x() == c.x() && a.x() < b.x() && a.y() < d.y();
            return upright ? new Rectangle(a.x(), a.y(), c.x(), c.y(), feather) : new Polygon(List.of(a, b, c, d), feather);
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

        /** Most pixels need no root: {@code |d| >= |k - 1| r}, k = |p / r|, r the smaller radius. */
        @Override
        public void rowDistances(double y, double[] x, int height, double reach, double[] out) {
            double least = Math.min(radiusX, radiusY);
            double outer = 1 + reach / least;
            double inner = Math.max(0, 1 - reach / least);
            double py = (y - centre.y()) / radiusY;
            for (int i = 0; i < out.length; i++) {
                double px = (x[i] - centre.x()) / radiusX;
                double kk = px * px + py * py;
                out[i] = kk >= outer * outer ? Double.POSITIVE_INFINITY : kk < inner * inner ? -least : signedDistance(x[i], y);
            }
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

        /** Stays upright: each radius becomes half the distance between the moved ends of its axis, so it is stretched but not turned. */
        @Override
        public Region moved(UnaryOperator<Point> map) {
            return new Ellipse(map.apply(centre), half(map, radiusX, 0), half(map, 0, radiusY), feather);
        }

        private double half(UnaryOperator<Point> map, double dx, double dy) {
            return map.apply(new Point(centre.x() - dx, centre.y() - dy)).distanceTo(map.apply(new Point(centre.x() + dx, centre.y()
                    + dy))) / 2;
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

        /**
         * Distances near the outline alone, signs by the crossings: time grows with the outline's length, not with corners times pixels.
         */
        @Override
        public void rowDistances(double y, double[] x, int height, double reach, double[] out) {
            Arrays.fill(out, Double.POSITIVE_INFINITY);
            boolean[] turns = new boolean[x.length + 1];
            Point a = outline.get(outline.size() - 1);
            for (Point b : outline) {
                if (Math.min(a.y(), b.y()) - reach <= y && Math.max(a.y(), b.y()) + reach >= y) {
                    squared(a, b, y, x, height, reach, out);
                }
                if (a.y() > y != b.y() > y) {
                    turns[leftOf(a.x() + (y - a.y()) / (b.y() - a.y()) * (b.x() - a.x()), x, height)] ^= true;
                }
                a = b;
            }
            boolean inside = false;
            for (int i = x.length - 1; i >= 0; i--) {
                inside ^= turns[i + 1];
                double d = out[i] == Double.POSITIVE_INFINITY ? out[i] : Math.sqrt(out[i]);
                out[i] = inside ? -d : d;
            }
        }

        /** Lowers {@code out} to the squared distance to the edge from a to b, where that may be within reach of the row. */
        private static void squared(Point a, Point b, double y, double[] x, int height, double reach, double[] out) {
            double t0 = 0;
            double t1 = 1;
            if (a.y() != b.y()) {
                // The part of the edge that is within reach of the row's height.
                double s = (y - reach - a.y()) / (b.y() - a.y());
                double t = (y + reach - a.y()) / (b.y() - a.y());
                t0 = Math.min(1, Math.max(0, Math.min(s, t)));
                t1 = Math.min(1, Math.max(0, Math.max(s, t)));
            }
            double x0 = a.x() + t0 * (b.x() - a.x());
            double x1 = a.x() + t1 * (b.x() - a.x());
            // A pixel more on either side, for what rounding does.
            int first = Math.max(0, leftOf(Math.min(x0, x1) - reach, x, height) - 1);
            int end = Math.min(x.length, leftOf(Math.max(x0, x1) + reach, x, height) + 1);
            for (int i = first; i < end; i++) {
                out[i] = Math.min(out[i], Segment.squaredDistance(x[i], y, a.x(), a.y(), b.x(), b.y()));
            }
        }

        /** How many of the pixel centres x lie left of a place. */
        private static int leftOf(double place, double[] x, int height) {
            int n = (int) Math.min(x.length, Math.max(0, Math.ceil((place - x[0]) * height)));
            while (n > 0 && !(x[n - 1] < place)) {
                n--;
            }
            while (n < x.length && x[n] < place) {
                n++;
            }
            return n;
        }

        @Override
        public Region moved(UnaryOperator<Point> map) {
            return new Polygon(outline.stream().map(map).toList(), feather);
        }
    }
}

package org.wispwright.warp.retouch;

import java.util.Arrays;

/**
 * How much of a stroke each pixel gets. With d the distance of the pixel's centre to the whole polyline, r the radius, e the soft
 * edge, all in heights: {@code s = clamp(1/2 + (r - e r / 2 - d) / max(e r, pixel))}, {@code m = strength s^2 (3 - 2 s) mask}.
 * Distance to the whole line means that nothing adds up where the line crosses itself.
 */
final class StrokeCoverage {
    private StrokeCoverage() {
    }

    /** Coverage m of each pixel, 0 to strength. */
    static float[] of(Stroke stroke, int width, int height) {
        double soft = stroke.softEdge() * stroke.radius();
        double fade = Math.max(soft, 1.0 / height);
        double middle = stroke.radius() - soft / 2;
        float[] coverage = new float[width * height];
        double[] squared = squaredDistances(stroke, width, height, middle + fade / 2);
        for (int p = 0; p < coverage.length; p++) {
            if (squared[p] < Double.POSITIVE_INFINITY) {
                double m = stroke.strength() * smooth(0.5 + (middle - Math.sqrt(squared[p])) / fade);
                if (m > 0 && stroke.within().isPresent()) {
                    m *= stroke.within().get().mask((p % width + 0.5) / height, (p / width + 0.5) / height, 1.0 / height);
                }
                coverage[p] = (float) m;
            }
        }
        return coverage;
    }

    /** 1 wherever the stroke has any coverage, falling to 0 over a feather beyond, whatever its strength. */
    static float[] touched(Stroke stroke, int width, int height, double feather) {
        double fade = Math.max(feather, 1.0 / height);
        float[] touched = new float[width * height];
        double[] squared = squaredDistances(stroke, width, height, stroke.radius() + fade);
        for (int p = 0; p < touched.length; p++) {
            if (squared[p] < Double.POSITIVE_INFINITY) {
                double t = smooth(1 + (stroke.radius() - Math.sqrt(squared[p])) / fade);
                if (t > 0 && stroke.within().isPresent()) {
                    Region region = stroke.within().get();
                    double d = region.signedDistance((p % width + 0.5) / height, (p / width + 0.5) / height);
                    t *= smooth(1 + (region.feather() / 2 - d) / fade);
                }
                touched[p] = (float) t;
            }
        }
        return touched;
    }

    /** {@code s^2 (3 - 2 s)} of s clamped to 0..1. */
    static double smooth(double s) {
        double c = Math.min(1, Math.max(0, s));
        return c * c * (3 - 2 * c);
    }

    /** Squared distance of pixel centres to the line, in squared heights; infinite where it is surely beyond reach. */
    private static double[] squaredDistances(Stroke stroke, int width, int height, double reach) {
        double[] squared = new double[width * height];
        Arrays.fill(squared, Double.POSITIVE_INFINITY);
        Point a = stroke.line().get(0);
        for (int n = stroke.line().size() == 1 ? 0 : 1; n < stroke.line().size(); n++) {
            Point b = stroke.line().get(n);
            int left = pixel(Math.min(a.x(), b.x()) - reach, width, height);
            int right = pixel(Math.max(a.x(), b.x()) + reach, width, height);
            int top = pixel(Math.min(a.y(), b.y()) - reach, height, height);
            int bottom = pixel(Math.max(a.y(), b.y()) + reach, height, height);
            for (int j = top; j <= bottom; j++) {
                for (int i = left; i <= right; i++) {
                    double d = Segment.squaredDistance((i + 0.5) / height, (j + 0.5) / height, a.x(), a.y(), b.x(), b.y());
                    squared[i + width * j] = Math.min(squared[i + width * j], d);
                }
            }
            a = b;
        }
        return squared;
    }

    private static int pixel(double position, int count, int height) {
        return (int) Math.min(count - 1, Math.max(0, Math.floor(position * height)));
    }
}

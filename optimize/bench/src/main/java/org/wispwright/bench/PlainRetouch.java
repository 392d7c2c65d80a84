package org.wispwright.bench;

import org.wispwright.render.picture.Picture;
import org.wispwright.warp.resample.Resampling;
import org.wispwright.warp.retouch.Handle;
import org.wispwright.warp.retouch.MeshWarp;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.retouch.Stroke;
import org.wispwright.warp.spline.ThinPlateSpline;

/**
 * The plain side of {@link RetouchBench}: one pixel of the wanted picture, by the formulas of {@code Brush} and {@code MeshWarp}, for an
 * operation that acts anywhere on smoke of one colour.
 */
final class PlainRetouch {
    private final Picture original;
    private final double[] colour;

    PlainRetouch(Picture original, double[] colour) {
        this.original = original;
        this.colour = colour.clone();
    }

    /** RGBA of pixel (x,y) after a stroke. */
    double[] stroked(Stroke stroke, int x, int y) {
        double m = coverage(stroke, x, y);
        double alpha = original.at(x, y, 3);
        double[] out = new double[4];
        double[] blurred = switch (stroke.brush()) {
            case SOFTEN -> m > 0 ? blurred(x, y, 0.5 * stroke.radius() * original.height()) : out.clone();
            default -> out;
        };
        for (int c = 0; c < 4; c++) {
            double was = original.at(x, y, c);
            out[c] = switch (stroke.brush()) {
                case ADD -> was + m * (1 - alpha) * (c < 3 ? colour[c] : 1);
                case REMOVE -> (1 - m) * was;
                case SOFTEN -> was + m * (blurred[c] - was);
                default -> throw new IllegalArgumentException("no plain side for brush " + stroke.brush());
            };
        }
        return out;
    }

    private double coverage(Stroke stroke, int x, int y) {
        double px = (x + 0.5) / original.height();
        double py = (y + 0.5) / original.height();
        double nearest = Double.POSITIVE_INFINITY;
        for (int n = 1; n < stroke.line().size(); n++) {
            Point a = stroke.line().get(n - 1);
            Point b = stroke.line().get(n);
            double length = a.distanceTo(b);
            double ux = (b.x() - a.x()) / length;
            double uy = (b.y() - a.y()) / length;
            double along = Math.min(length, Math.max(0, (px - a.x()) * ux + (py - a.y()) * uy));
            nearest = Math.min(nearest, Math.hypot(px - a.x() - along * ux, py - a.y() - along * uy));
        }
        double soft = stroke.sweep().softEdge() * stroke.radius();
        double s = 0.5 + (stroke.radius() - soft / 2 - nearest) / Math.max(soft, 1.0 / original.height());
        s = Math.min(1, Math.max(0, s));
        return stroke.sweep().strength() * s * s * (3 - 2 * s);
    }

    /** Both axes at once: a Gaussian of sigma pixels over a square of 3 sigma each way, border pixels repeated. */
    private double[] blurred(int x, int y, double sigma) {
        int reach = (int) Math.ceil(3 * sigma);
        double[] sums = new double[4];
        double weights = 0;
        for (int dy = -reach; dy <= reach; dy++) {
            int row = Math.min(original.height() - 1, Math.max(0, y + dy));
            for (int dx = -reach; dx <= reach; dx++) {
                int column = Math.min(original.width() - 1, Math.max(0, x + dx));
                double w = Math.exp(-0.5 * (dx * dx + dy * dy) / (sigma * sigma));
                weights += w;
                for (int c = 0; c < 4; c++) {
                    sums[c] += w * original.at(column, row, c);
                }
            }
        }
        for (int c = 0; c < 4; c++) {
            sums[c] /= weights;
        }
        return sums;
    }

    /** RGBA of pixel (x,y) after a warp: where the backward spline points to, by Keys' cubic with a = -1/2 over 4x4 pixels. */
    double[] warped(MeshWarp warp, int x, int y) {
        double h = original.height();
        double[][] from = warp.handles().stream().map(Handle::from).map(p -> new double[] {p.x(), p.y()}).toArray(double[][]::new);
        double[][] to = warp.handles().stream().map(Handle::to).map(p -> new double[] {p.x(), p.y()}).toArray(double[][]::new);
        ThinPlateSpline spline = ThinPlateSpline.fit(to, from);
        double sourceX = spline.x((x + 0.5) / h, (y + 0.5) / h) * h - 0.5;
        double sourceY = spline.y((x + 0.5) / h, (y + 0.5) / h) * h - 0.5;
        int left = (int) Math.floor(sourceX);
        int top = (int) Math.floor(sourceY);
        double[] sums = new double[4];
        for (int row = top - 1; row <= top + 2; row++) {
            for (int column = left - 1; column <= left + 2; column++) {
                if (row >= 0 && row < original.height() && column >= 0 && column < original.width()) {
                    double w = keys(Math.abs(sourceX - column)) * keys(Math.abs(sourceY - row));
                    for (int c = 0; c < 4; c++) {
                        sums[c] += w * original.at(column, row, c);
                    }
                }
            }
        }
        float[] pixel = {(float) sums[0], (float) sums[1], (float) sums[2], (float) sums[3]};
        Resampling.clamp(pixel, 0);
        return new double[] {pixel[0], pixel[1], pixel[2], pixel[3]};
    }

    /** Keys (1981), IEEE Trans. ASSP 29(6), 1153-1160. */
    private static double keys(double d) {
        return d < 1 ? (1.5 * d - 2.5) * d * d + 1 : d < 2 ? ((-0.5 * d + 2.5) * d - 4) * d + 2 : 0;
    }
}

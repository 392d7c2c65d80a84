package org.wispwright.render.march;

import org.wispwright.render.view.Ray;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;

/** The slow twin of {@link RayMarcher} and {@link LightSweep}: straight from the formulas, in double, with clamps at the walls. */
final class MarchPlain {
    private final GridShape shape;
    private final double[] density;
    private final Look look;
    private final double[] lit;

    MarchPlain(GridShape shape, double[] density, Look look) {
        this.shape = shape;
        this.density = density;
        this.look = look;
        lit = look.light().isPresent() ? light() : null;
    }

    /** The picture, in the order of a picture's values. */
    double[] picture(View view, double stepMetres) {
        int width = view.raster().width();
        int height = view.raster().height();
        double[] out = new double[4 * width * height];
        for (int y = 0; y < height; y++) {
            for (int x = 0; x < width; x++) {
                Ray ray = view.ray(x, y);
                int at = 4 * (x + width * y);
                ray.inside(shape).ifPresent(span -> march(ray, span, stepMetres, out, at));
            }
        }
        return out;
    }

    /** Light that arrives at each cell's centre. */
    double[] lit() {
        return lit.clone();
    }

    private void march(Ray ray, Ray.Span span, double stepMetres, double[] out, int at) {
        int count = (int) Math.max(1, Math.ceil(span.length() / stepMetres - 1e-9));
        double step = span.length() / count;
        double[] albedo = {look.albedo().r(), look.albedo().g(), look.albedo().b()};
        double[] ambient = {look.ambient().r(), look.ambient().g(), look.ambient().b()};
        double[] radiance = look.light().map(l -> new double[] {l.radiance().r(), l.radiance().g(), l.radiance().b()}).orElse(new double[3]);
        double through = 1;
        for (int n = 0; n < count; n++) {
            Vec3 point = ray.at(span.entry() + (n + 0.5) * step);
            double opacity = 1 - Math.exp(-look.extinction() * sample(density, point) * step);
            double shadow = lit == null ? 0 : sample(lit, point);
            for (int c = 0; c < 3; c++) {
                out[at + c] += through * opacity * albedo[c] * (ambient[c] + radiance[c] * shadow);
            }
            through *= 1 - opacity;
        }
        out[at + 3] = 1 - through;
    }

    private double sample(double[] values, Vec3 point) {
        double h = shape.cellMetres();
        double x = clamp((point.x() - shape.originX()) / h - 0.5, shape.nx());
        double y = clamp((point.y() - shape.originY()) / h - 0.5, shape.ny());
        double z = clamp((point.z() - shape.originZ()) / h - 0.5, shape.nz());
        double sum = 0;
        for (int corner = 0; corner < 8; corner++) {
            int i = (int) x + (corner & 1);
            int j = (int) y + (corner >> 1 & 1);
            int k = (int) z + (corner >> 2);
            double weight = (1 - Math.abs(x - i)) * (1 - Math.abs(y - j)) * (1 - Math.abs(z - k));
            if (weight > 0) {
                sum += weight * values[shape.cell(i, j, k)];
            }
        }
        return sum;
    }

    private static double clamp(double at, int cells) {
        return Math.max(0, Math.min(cells - 1, at));
    }

    /** LightSweep's sum for every cell by itself, with hat functions for both interpolations. */
    private double[] light() {
        Vec3 to = look.light().get().towards().unit();
        double[] w = {to.x(), to.y(), to.z()};
        int[] counts = {shape.nx(), shape.ny(), shape.nz()};
        int a = 0;
        for (int axis = 1; axis < 3; axis++) {
            a = Math.abs(w[axis]) > Math.abs(w[a]) ? axis : a;
        }
        int b = (a + 1) % 3;
        int c = (a + 2) % 3;
        double half = look.extinction() * shape.cellMetres() / Math.abs(w[a]) / 2;
        double slantB = w[b] / Math.abs(w[a]);
        double slantC = w[c] / Math.abs(w[a]);
        double[] out = new double[shape.cells()];
        for (int n = 0; n < out.length; n++) {
            int[] cell = cell(n);
            int slice = w[a] > 0 ? counts[a] - 1 - cell[a] : cell[a];
            double atB = cell[b] + slice * slantB;
            double atC = cell[c] + slice * slantC;
            double tau = half * density[n];
            for (int m = 0; m < out.length; m++) {
                int[] other = cell(m);
                int before = w[a] > 0 ? counts[a] - 1 - other[a] : other[a];
                if (before >= slice) {
                    continue;
                }
                for (int corner = 0; corner < 4; corner++) {
                    double u = Math.floor(atB) + (corner & 1);
                    double v = Math.floor(atC) + (corner >> 1);
                    double weight = hat(atB - u) * hat(atC - v) * hat(u - before * slantB - other[b]) * hat(v - before * slantC - other[c]);
                    tau += 2 * half * density[m] * weight;
                }
            }
            out[n] = Math.exp(-tau);
        }
        return out;
    }

    private int[] cell(int n) {
        return new int[] {n % shape.nx(), n / shape.nx() % shape.ny(), n / shape.nx() / shape.ny()};
    }

    private static double hat(double x) {
        return Math.max(0, 1 - Math.abs(x));
    }
}

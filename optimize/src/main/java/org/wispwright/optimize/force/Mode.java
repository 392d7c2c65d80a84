package org.wispwright.optimize.force;

import java.util.ArrayList;
import java.util.List;
import org.wispwright.render.volume.GridShape;

/**
 * One solenoidal standing wave of the box, of root mean square 1: on x faces
 * {@code a_x sin(pi l i/nx) cos(pi m (j+1/2)/ny) cos(pi n (k+1/2)/nz)}, y and z alike with the sine on their own axis.
 * <p>Its discrete divergence is 0 exactly when {@code a . kd = 0}, {@code kd = 2 sin(pi l/2nx)/h} and so on. The two unit
 * vectors square to kd are the toroidal {@code t = kd x e_y / |kd x e_y|} and the poloidal {@code kd x t / |kd|}: the
 * Craya-Herring frame (Sagaut and Cambon 2008, Homogeneous Turbulence Dynamics, ch. 2). With one index 0 the wave is plane
 * and one vector is left; with two there is none.
 *
 * @param l half-cycles along x
 * @param m half-cycles along y
 * @param n half-cycles along z
 * @param ax amplitude on x faces (0 if l is 0)
 * @param ay amplitude on y faces
 * @param az amplitude on z faces
 */
record Mode(int l, int m, int n, double ax, double ay, double az) {

    /** All modes whose frequency lies in the band, in the order n, m, l, toroidal before poloidal. */
    static List<Mode> in(GridShape shape, Band band) {
        double h = shape.cellMetres();
        List<Mode> modes = new ArrayList<>();
        int mostN = shape.isPlane() ? 0 : most(shape.nz(), h, band);
        for (int n = 0; n <= mostN; n++) {
            for (int m = 0; m <= most(shape.ny(), h, band); m++) {
                for (int l = 0; l <= most(shape.nx(), h, band); l++) {
                    double cycles = Math.sqrt(square(l / (2 * h * shape.nx())) + square(m / (2 * h * shape.ny()))
                            + square(shape.isPlane() ? 0 : n / (2 * h * shape.nz())));
                    if (band.holds(cycles)) {
                        addModes(shape, l, m, n, modes);
                    }
                }
            }
        }
        return modes;
    }

    private static int most(int cells, double h, Band band) {
        return (int) Math.min(cells - 1, Math.ceil(band.high() * 2 * h * cells));
    }

    private static double square(double x) {
        return x * x;
    }

    private static void addModes(GridShape shape, int l, int m, int n, List<Mode> modes) {
        int zeros = (l == 0 ? 1 : 0) + (m == 0 ? 1 : 0) + (n == 0 ? 1 : 0);
        if (zeros > 1) {
            return;
        }
        double kx = 2 * Math.sin(Math.PI * l / (2 * shape.nx()));
        double ky = 2 * Math.sin(Math.PI * m / (2 * shape.ny()));
        double kz = 2 * Math.sin(Math.PI * n / (2 * shape.nz()));
        // Mean square of sin cos cos over the box is 1/8 with three indices, 1/4 where one cosine is constant.
        double scale = Math.sqrt(zeros == 0 ? 8 : 4);
        double flat = Math.hypot(kx, kz);
        double whole = Math.sqrt(kx * kx + ky * ky + kz * kz);
        boolean toroidal = l > 0 && n > 0;
        boolean poloidal = m > 0;
        if (toroidal) {
            modes.add(new Mode(l, m, n, -scale * kz / flat, 0, scale * kx / flat));
        }
        if (poloidal) {
            modes.add(new Mode(l, m, n, -scale * kx * ky / (flat * whole), scale * flat / whole, -scale * kz * ky / (flat * whole)));
        }
    }
}

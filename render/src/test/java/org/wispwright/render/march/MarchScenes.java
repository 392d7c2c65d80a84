package org.wispwright.render.march;

import java.util.Optional;
import java.util.Random;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.view.Orthographic;
import org.wispwright.render.view.Pinhole;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.ScalarGrid;

/** Boxes, views and looks that several tests share. */
final class MarchScenes {
    static final Look PLAIN = new Look(1.3, new Rgb(0.8, 0.7, 0.6), new Rgb(1, 1.2, 0.9), Optional.empty());

    private MarchScenes() {
    }

    static Look lit(double x, double y, double z) {
        return new Look(1.3, new Rgb(0.8, 0.7, 0.6), new Rgb(0.2, 0.3, 0.4),
                Optional.of(new Light(new Vec3(x, y, z), new Rgb(2, 1.8, 1.5))));
    }

    /** Outside the box, looking at its middle from a corner's side. */
    static View pinhole(GridShape box, int width, int height) {
        Vec3 middle = middle(box);
        double size = box.cellMetres() * Math.max(box.nx(), Math.max(box.ny(), box.nz()));
        return new View("corner", new Pinhole(35, 24.0 * width / height, 24), middle.plus(new Vec3(1.1 * size, 0.4 * size, 1.6 * size)), middle,
                new Vec3(0.1, 1, 0), new Raster(width, height));
    }

    static View orthographic(GridShape box, int width, int height) {
        Vec3 middle = middle(box);
        double size = box.cellMetres() * Math.max(box.nx(), Math.max(box.ny(), box.nz()));
        return new View("plan", new Orthographic(1.3 * size * width / height, 1.3 * size), middle.plus(new Vec3(-2 * size, 0.3 * size, -size)), middle,
                new Vec3(0, 1, 0), new Raster(width, height));
    }

    static Vec3 middle(GridShape box) {
        double h = box.cellMetres();
        return new Vec3(box.originX() + h * box.nx() / 2, box.originY() + h * box.ny() / 2, box.originZ() + h * box.nz() / 2);
    }

    /** Random density in 0..1.5; cells outside a ball around the middle are empty if asked. */
    static ScalarGrid smoke(GridShape box, boolean ball, long seed) {
        Random random = new Random(seed);
        ScalarGrid grid = new ScalarGrid(box);
        for (int n = 0; n < box.cells(); n++) {
            double x = n % box.nx() + 0.5 - box.nx() / 2.0;
            double y = n / box.nx() % box.ny() + 0.5 - box.ny() / 2.0;
            double z = n / box.nx() / box.ny() + 0.5 - box.nz() / 2.0;
            float value = (float) (1.5 * random.nextDouble());
            boolean inside = x * x + y * y + z * z < Math.pow(Math.min(box.nx(), box.ny()) / 3.0, 2);
            grid.values()[n] = !ball || inside ? value : 0;
        }
        return grid;
    }

    static double[] widen(float[] values) {
        double[] out = new double[values.length];
        for (int n = 0; n < out.length; n++) {
            out[n] = values[n];
        }
        return out;
    }

    static float[] narrow(double[] values) {
        float[] out = new float[values.length];
        for (int n = 0; n < out.length; n++) {
            out[n] = (float) values[n];
        }
        return out;
    }
}

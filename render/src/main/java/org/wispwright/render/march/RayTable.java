package org.wispwright.render.march;

import java.util.Optional;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Ray;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;

/**
 * Where every pixel's ray takes its samples. A ray's chord through the box is cut into {@code ceil(chord / step)} equal
 * pieces, and each piece has its sample in the middle: the whole chord is covered. 60 bytes a pixel.
 * <p>Sample n of ray p is at lattice coordinate {@code start[3p + axis] + (n + 1/2) advance[3p + axis]}; see {@link BorderedCells}.
 */
final class RayTable {
    /** The most samples one ray may have. */
    static final int MOST_SAMPLES = 65_536;

    /** The most pixels whose rays are held: 2 GiB. */
    static final int MOST_RAYS = 1 << 25;

    final int rays;
    final double[] start;
    final double[] advance;
    /** Samples; 0 where the ray misses the box. */
    final int[] count;
    /** Metres from sample to sample. */
    final double[] spacing;
    private int longest;

    RayTable(GridShape box, View view, double stepMetres, Lanes lanes) {
        int width = view.raster().width();
        int height = view.raster().height();
        rays = width * height;
        if (rays > MOST_RAYS) {
            throw new IllegalArgumentException("ray march: view '" + view.name() + "' has " + view.raster().inWords() + ", needs at most "
                    + MOST_RAYS + " in all; take a smaller raster");
        }
        start = new double[3 * rays];
        advance = new double[3 * rays];
        count = new int[rays];
        spacing = new double[rays];
        lanes.forEach(height, y -> {
            for (int x = 0; x < width; x++) {
                place(x + width * y, view.ray(x, y), box, stepMetres);
            }
        });
        for (int c : count) {
            longest = Math.max(longest, c);
        }
    }

    /** Samples of the ray that has most. */
    int longest() {
        return longest;
    }

    private void place(int p, Ray ray, GridShape box, double stepMetres) {
        Optional<Ray.Span> inside = ray.inside(box);
        if (inside.isEmpty()) {
            return;
        }
        Ray.Span span = inside.get();
        double pieces = Math.max(1, Math.ceil(span.length() / stepMetres - 1e-9));
        if (pieces > MOST_SAMPLES) {
            throw new IllegalArgumentException("ray march: a step of " + stepMetres + " m gives a ray " + (long) pieces + " samples, needs at most "
                    + MOST_SAMPLES + "; take a longer step");
        }
        int n = (int) pieces;
        double step = span.length() / n;
        double h = box.cellMetres();
        count[p] = n;
        spacing[p] = step;
        start[3 * p] = (ray.origin().x() + span.entry() * ray.direction().x() - box.originX()) / h + 0.5;
        start[3 * p + 1] = (ray.origin().y() + span.entry() * ray.direction().y() - box.originY()) / h + 0.5;
        start[3 * p + 2] = (ray.origin().z() + span.entry() * ray.direction().z() - box.originZ()) / h + 0.5;
        advance[3 * p] = ray.direction().x() * step / h;
        advance[3 * p + 1] = ray.direction().y() * step / h;
        advance[3 * p + 2] = ray.direction().z() * step / h;
    }
}

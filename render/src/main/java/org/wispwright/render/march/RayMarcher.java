package org.wispwright.render.march;

import java.util.Arrays;
import java.util.function.BooleanSupplier;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.Rgb;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.ScalarGrid;

/**
 * Density to picture by emission and absorption along the ray through every pixel's centre, and the exact pullback. Model:
 * Max (1995), IEEE TVCG 1(2), 99-108; per ray {@link RayKernel}, light {@link LightSweep}, samples {@link SampleKernel}.
 * <p>A point glows with {@code albedo * (ambient + radiance * lit)}, so with alpha and shine of a ray its pixel is
 * {@code (albedo ambient alpha + albedo radiance shine, alpha)}: premultiplied foreground, no background behind it.
 * Without a light alpha alone matters, and that is {@code 1 - exp(-sum tau)}: one exponential a ray.
 * <p>Pullback: {@code alphaBar = aBar + sum_c albedo_c ambient_c cBar_c}, {@code shineBar = sum_c albedo_c radiance_c cBar_c},
 * then the kernels' transposes, and for the light's way through the smoke {@link LightSweep#pullback}. The error of the
 * picture falls with the square of the step.
 * <p>Same bits for any number of lanes. Keeps its buffers between calls: one call at a time. Memory: 64 bytes a pixel,
 * 8 bytes a cell (24 with a light), and 2 MiB for the batches.
 */
public final class RayMarcher {
    /** Pieces that the rays of a loop are dealt to; each has its own scratch. */
    private static final int PIECES = 32;
    /** Samples whose derivatives are held at once. Fixed, so that bits depend on nothing else. */
    private static final int BATCH_SAMPLES = 1 << 18;
    /** Up to this alpha, 1 - alpha in float still has a relative error below 5e-7; beyond it the ray is summed again. */
    private static final float ALPHA_TRUSTED = 0.875f;

    private final GridShape shape;
    private final View view;
    private final Lanes lanes;
    private final RayTable rays;
    private final BorderedCells density;
    private final BorderedCells densityBars;
    private final EmptySpace empty;
    private final SlabScatter slabs;
    private final Scratch[] scratch;
    private final int[] place;
    private final float[] valueBar;
    private Lit lit;

    /** One ray's samples and what is worked out from them. */
    private static final class Scratch {
        private final double[] tau;
        private final double[] lit;
        private final double[] weight;
        private final double[] after;
        private final double[] tauBar;
        private final double[] litBar;
        private final double[] sums = new double[3];

        private Scratch(int samples) {
            tau = new double[samples];
            lit = new double[samples];
            weight = new double[samples];
            after = new double[samples];
            tauBar = new double[samples];
            litBar = new double[samples];
        }
    }

    /** What a light needs: made when a look first has one. */
    private static final class Lit {
        private final BorderedCells bordered;
        private final BorderedCells bars;
        private final ScalarGrid cells;
        private final ScalarGrid cellBars;
        private final float[] litBar;
        private Light light;
        private LightSweep sweep;

        private Lit(GridShape shape, int samples) {
            bordered = new BorderedCells(shape);
            bars = new BorderedCells(shape);
            cells = new ScalarGrid(shape);
            cellBars = new ScalarGrid(shape);
            litBar = new float[samples];
        }

        private void aim(GridShape shape, Light at) {
            if (!at.equals(light)) {
                light = at;
                sweep = new LightSweep(shape, at.towards());
            }
        }
    }

    /**
     * @param shape the box
     * @param view the camera; a ray that misses the box gives a clear pixel
     * @param stepMetres the longest distance between two samples, finite and above 0; half a cell to one cell is usual
     * @param lanes used by every call
     * @throws IllegalArgumentException if the step is not such a length, or so short that a ray needs more than 65536 samples,
     *     or the view has more than 2^25 pixels
     */
    public RayMarcher(GridShape shape, View view, double stepMetres, Lanes lanes) {
        if (!(stepMetres > 0) || Double.isInfinite(stepMetres)) {
            throw new IllegalArgumentException("ray march: got a step of " + stepMetres + " m, needs a finite length above 0");
        }
        this.shape = shape;
        this.view = view;
        this.lanes = lanes;
        rays = new RayTable(shape, view, stepMetres, lanes);
        density = new BorderedCells(shape);
        densityBars = new BorderedCells(shape);
        empty = new EmptySpace(density);
        slabs = new SlabScatter(rays, view, density);
        scratch = new Scratch[PIECES];
        Arrays.setAll(scratch, piece -> new Scratch(rays.longest()));
        place = new int[rays.rays];
        valueBar = new float[Math.max(BATCH_SAMPLES, rays.longest())];
    }

    /** The box. */
    public GridShape shape() {
        return shape;
    }

    /** The camera. */
    public View view() {
        return view;
    }

    /**
     * Overwrites out with the smoke's picture, premultiplied, over nothing.
     *
     * @param smoke read: this box's cells, unitless
     * @param look how it shows
     * @param out overwritten: the view's raster
     * @throws IllegalArgumentException if a shape differs
     */
    public void picture(ScalarGrid smoke, Look look, Picture out) {
        picture(smoke, look, out, () -> false);
    }

    /**
     * As {@link #picture(ScalarGrid, Look, Picture)}, but given up where it is no longer wanted; out is then of no use.
     *
     * @param stop asked before every row, on any lane
     */
    public void picture(ScalarGrid smoke, Look look, Picture out, BooleanSupplier stop) {
        requireShape("density", smoke);
        requireRaster("out", out.width(), out.height());
        takeIn(smoke, look);
        empty.update(density, lanes);
        draw(look, out, stop);
    }

    /** As {@link #picture}, but samples empty space too: the slow twin that must give the same bits. */
    void pictureWithoutSkipping(ScalarGrid smoke, Look look, Picture out) {
        takeIn(smoke, look);
        empty.fillAll();
        draw(look, out, () -> false);
    }

    /**
     * Adds the derivative of the loss by density.
     *
     * @param smoke read: the density that was drawn
     * @param look the look it was drawn with
     * @param got read: exactly what {@link #picture} wrote for them (its alpha tells what gets through a ray)
     * @param pictureBar read: derivative of the loss by every value of that picture, in the picture's order
     * @param smokeBar added to: this box's cells
     * @throws IllegalArgumentException if a shape differs
     */
    public void pullback(ScalarGrid smoke, Look look, Picture got, float[] pictureBar, ScalarGrid smokeBar) {
        requireShape("density", smoke);
        requireShape("densityBar", smokeBar);
        requireRaster("got", got.width(), got.height());
        if (pictureBar.length != got.rgba().length) {
            throw new IllegalArgumentException("ray march: 'pictureBar' has " + pictureBar.length + " values, the picture "
                    + got.rgba().length + "; they must match");
        }
        takeIn(smoke, look);
        Lit light = look.light().isPresent() ? lit : null;
        densityBars.clear();
        if (light != null) {
            light.bars.clear();
        }
        int from = 0;
        while (from < rays.rays) {
            int to = placeBatch(from, pictureBar);
            pullBatch(from, to, look, got, pictureBar, light);
            slabs.add(from, to, place, valueBar, light == null ? null : light.litBar, densityBars, light == null ? null : light.bars, lanes);
            from = to;
        }
        densityBars.addTo(smokeBar, lanes);
        if (light != null) {
            light.cellBars.fill(0);
            light.bars.addTo(light.cellBars, lanes);
            light.sweep.pullback(look.extinction(), light.cells, light.cellBars, smokeBar);
        }
    }

    private void takeIn(ScalarGrid smoke, Look look) {
        density.fill(smoke, lanes);
        if (look.light().isPresent()) {
            if (lit == null) {
                lit = new Lit(shape, valueBar.length);
            }
            lit.aim(shape, look.light().get());
            lit.sweep.transmittance(smoke, look.extinction(), lit.cells, lanes);
            lit.bordered.fill(lit.cells, lanes);
        }
    }

    private void draw(Look look, Picture out, BooleanSupplier stop) {
        lanes.forEach(PIECES, piece -> {
            int height = out.height();
            for (int y = piece; y < height && !stop.getAsBoolean(); y += PIECES) {
                drawRow(y, look, scratch[piece], out);
            }
        });
    }

    private void drawRow(int y, Look look, Scratch work, Picture out) {
        boolean shone = look.light().isPresent();
        Rgb glow = look.albedo().times(look.ambient());
        Rgb shineColour = shone ? look.albedo().times(look.light().get().radiance()) : Rgb.BLACK;
        BorderedCells litCells = shone ? lit.bordered : null;
        float[] rgba = out.rgba();
        int width = out.width();
        for (int x = 0; x < width; x++) {
            int p = x + width * y;
            double alpha = 0;
            double shine = 0;
            if (rays.count[p] > 0) {
                double scale = look.extinction() * rays.spacing[p];
                int taken = SampleKernel.gatherFilled(rays, p, density, litCells, empty, scale, work.tau, work.lit);
                if (shone) {
                    RayKernel.march(work.tau, work.lit, taken, work.sums);
                    alpha = work.sums[RayKernel.ALPHA];
                    shine = work.sums[RayKernel.SHINE];
                } else {
                    alpha = RayKernel.opacity(work.tau, taken);
                }
            }
            rgba[4 * p] = (float) (glow.r() * alpha + shineColour.r() * shine);
            rgba[4 * p + 1] = (float) (glow.g() * alpha + shineColour.g() * shine);
            rgba[4 * p + 2] = (float) (glow.b() * alpha + shineColour.b() * shine);
            rgba[4 * p + 3] = (float) alpha;
        }
    }

    /** Gives the rays from here on their places in the batch; -1 for one with no samples or nothing to pull. Returns the batch's end. */
    private int placeBatch(int from, float[] pictureBar) {
        int used = 0;
        int p = from;
        while (p < rays.rays) {
            int count = rays.count[p];
            boolean pulls = pictureBar[4 * p] != 0 || pictureBar[4 * p + 1] != 0 || pictureBar[4 * p + 2] != 0 || pictureBar[4 * p + 3] != 0;
            if (count == 0 || !pulls) {
                place[p] = -1;
            } else if (used + count > valueBar.length) {
                break;
            } else {
                place[p] = used;
                used += count;
            }
            p++;
        }
        return p;
    }

    private void pullBatch(int from, int to, Look look, Picture got, float[] pictureBar, Lit light) {
        Rgb glow = look.albedo().times(look.ambient());
        Rgb shineColour = light == null ? Rgb.BLACK : look.albedo().times(look.light().get().radiance());
        int each = (to - from + PIECES - 1) / PIECES;
        lanes.forEach(PIECES, piece -> {
            int end = Math.min(to, from + (piece + 1) * each);
            for (int p = from + piece * each; p < end; p++) {
                if (place[p] >= 0) {
                    double scale = look.extinction() * rays.spacing[p];
                    double alphaBar = pictureBar[4 * p + 3] + along(glow, pictureBar, p);
                    if (light == null) {
                        pullUnlit(p, scale, alphaBar, got.rgba()[4 * p + 3], scratch[piece]);
                    } else {
                        pullLit(p, scale, alphaBar, along(shineColour, pictureBar, p), light, scratch[piece]);
                    }
                }
            }
        });
    }

    private static double along(Rgb colour, float[] bar, int p) {
        return colour.r() * bar[4 * p] + colour.g() * bar[4 * p + 1] + colour.b() * bar[4 * p + 2];
    }

    private void pullUnlit(int p, double scale, double alphaBar, float alpha, Scratch work) {
        double through = 1.0 - alpha;
        if (!(alpha <= ALPHA_TRUSTED)) {
            SampleKernel.gatherAll(rays, p, density, null, scale, work.tau, null);
            through = RayKernel.through(work.tau, rays.count[p]);
        }
        int first = place[p];
        Arrays.fill(valueBar, first, first + rays.count[p], (float) (alphaBar * through * scale));
    }

    private void pullLit(int p, double scale, double alphaBar, double shineBar, Lit light, Scratch work) {
        int count = rays.count[p];
        SampleKernel.gatherAll(rays, p, density, light.bordered, scale, work.tau, work.lit);
        RayKernel.pullback(work.tau, work.lit, count, alphaBar, shineBar, work.weight, work.after, work.tauBar, work.litBar);
        int first = place[p];
        for (int n = 0; n < count; n++) {
            valueBar[first + n] = (float) (work.tauBar[n] * scale);
            light.litBar[first + n] = (float) work.litBar[n];
        }
    }

    private void requireShape(String what, ScalarGrid grid) {
        if (!grid.shape().equals(shape)) {
            throw new IllegalArgumentException("ray march: '" + what + "' is " + grid.shape().inWords() + ", the marcher is for "
                    + shape.inWords() + " of the same size and place; make it with new ScalarGrid(marcher.shape())");
        }
    }

    private void requireRaster(String what, int width, int height) {
        if (width != view.raster().width() || height != view.raster().height()) {
            throw new IllegalArgumentException("ray march: '" + what + "' is " + width + "x" + height + " pixels, view '" + view.name()
                    + "' has " + view.raster().inWords() + "; make it with view.raster().picture()");
        }
    }
}

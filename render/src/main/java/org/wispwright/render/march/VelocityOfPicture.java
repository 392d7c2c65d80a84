package org.wispwright.render.march;

import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Orthographic;
import org.wispwright.render.view.Pinhole;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;
import org.wispwright.render.volume.ScalarGrid;

/**
 * How the smoke of a picture moves across it: for every pixel the mean over its ray of the velocity as the view sees it,
 * weighted by what each sample adds to the pixel's opacity. No pullback: nothing is solved for through it.
 * <p>With the weights {@code w_n} of {@link RayKernel} (Max 1995), u the velocity along right, above and axis of the {@link View} (R, A, Z),
 * and for a pinhole {@code a = X/Z, b = Y/Z} of the pixel, the same at every sample, and depth Z_n:
 * <pre>
 *   pinhole        v_n = ( f/gateWidth (R_n - a Z'_n) / Z_n  width/height,  -f/gateHeight (A_n - b Z'_n) / Z_n )
 *   orthographic   v_n = ( R_n / fieldWidth  width/height,  -A_n / fieldHeight )
 *   v = sum w_n v_n / sum w_n          weight = sum w_n = alpha          (Z'_n: velocity along the axis)
 * </pre>
 * v_n is the derivative of {@link View#project}. The mean is taken of what is seen, rather than seen of the mean at a mean depth: the
 * two agree to first order in the smoke's extent over its distance. In heights a second, y downwards.
 * <p>Velocities are taken to cell centres (mean of two faces) and read linearly from there: second order in the cell. Same bits for any
 * number of lanes. Keeps its buffers: one call at a time; 64 bytes a pixel and 16 bytes a cell.
 */
public final class VelocityOfPicture {
    private static final int PIECES = 32;

    private final GridShape shape;
    private final View view;
    private final Lanes lanes;
    private final RayTable rays;
    private final BorderedCells density;
    private final BorderedCells right;
    private final BorderedCells above;
    private final BorderedCells along;
    private final ScalarGrid cells;

    /**
     * @param shape the box
     * @param view the camera
     * @param stepMetres the longest distance between two samples, finite and above 0
     * @param lanes used by every call
     * @throws IllegalArgumentException if the step is not such a length, or a ray would need more than 65536 samples
     */
    public VelocityOfPicture(GridShape shape, View view, double stepMetres, Lanes lanes) {
        if (!(stepMetres > 0) || Double.isInfinite(stepMetres)) {
            throw new IllegalArgumentException("velocity of a picture: got a step of " + stepMetres + " m, needs a finite length above 0");
        }
        this.shape = shape;
        this.view = view;
        this.lanes = lanes;
        rays = new RayTable(shape, view, stepMetres, lanes);
        density = new BorderedCells(shape);
        right = new BorderedCells(shape);
        above = new BorderedCells(shape);
        along = new BorderedCells(shape);
        cells = new ScalarGrid(shape);
    }

    /**
     * Overwrites out with three numbers a pixel, pixels in rows from the top: velocity to the right and downwards, in heights a second,
     * and weight, the pixel's alpha. Where there is no smoke all three are 0.
     *
     * @param smoke read: this box's cells, unitless
     * @param velocity read: this box's faces, m/s
     * @param extinction 1/m for a density of 1, as in {@link Look}; finite and above 0
     * @param out overwritten: 3 width height numbers
     * @throws IllegalArgumentException if a shape differs or the extinction is none
     */
    public void motion(ScalarGrid smoke, MacVelocity velocity, double extinction, float[] out) {
        if (!smoke.shape().equals(shape) || !velocity.shape().equals(shape)) {
            throw new IllegalArgumentException("velocity of a picture: density and velocity are " + smoke.shape().inWords() + " and "
                    + velocity.shape().inWords() + ", needs " + shape.inWords() + " of the same size and place for both");
        }
        if (!(extinction > 0) || Double.isInfinite(extinction)) {
            throw new IllegalArgumentException("velocity of a picture: got an extinction of " + extinction
                    + " 1/m, needs a finite number above 0");
        }
        if (out.length != 3 * rays.rays) {
            throw new IllegalArgumentException("velocity of a picture: 'out' has " + out.length + " numbers, view '" + view.name()
                    + "' needs "
                    + 3 * rays.rays);
        }
        density.fill(smoke, lanes);
        towards(view.right(), velocity, right);
        towards(view.above(), velocity, above);
        towards(view.axis(), velocity, along);
        int width = view.raster().width();
        int height = view.raster().height();
        lanes.forEach(PIECES, piece -> {
            double[][] work = new double[4][rays.longest()];
            for (int y = piece; y < height; y += PIECES) {
                for (int x = 0; x < width; x++) {
                    pixel(x, y, extinction, work, out);
                }
            }
        });
    }

    /** The component of the velocity along a direction, in cells. */
    private void towards(Vec3 direction, MacVelocity velocity, BorderedCells into) {
        lanes.forEach(shape.nz(), k -> {
            for (int j = 0; j < shape.ny(); j++) {
                for (int i = 0; i < shape.nx(); i++) {
                    double x = 0.5 * (velocity.x()[shape.xFace(i, j, k)] + velocity.x()[shape.xFace(i + 1, j, k)]);
                    double y = 0.5 * (velocity.y()[shape.yFace(i, j, k)] + velocity.y()[shape.yFace(i, j + 1, k)]);
                    double z = 0.5 * (velocity.z()[shape.zFace(i, j, k)] + velocity.z()[shape.zFace(i, j, k + 1)]);
                    cells.values()[shape.cell(i, j, k)] = (float) (direction.x() * x + direction.y() * y + direction.z() * z);
                }
            }
        });
        into.fill(cells, lanes);
    }

    private void pixel(int x, int y, double extinction, double[][] work, float[] out) {
        int p = x + view.raster().width() * y;
        int count = rays.count[p];
        double[] sums = {0, 0, 0};
        if (count > 0) {
            double scale = extinction * rays.spacing[p];
            SampleKernel.gatherAll(rays, p, density, right, scale, work[0], work[1]);
            SampleKernel.gatherAll(rays, p, density, above, scale, work[0], work[2]);
            SampleKernel.gatherAll(rays, p, density, along, scale, work[0], work[3]);
            seen(x, y, count, work, sums);
        }
        out[3 * p] = sums[2] > 0 ? (float) (sums[0] / sums[2]) : 0;
        out[3 * p + 1] = sums[2] > 0 ? (float) (sums[1] / sums[2]) : 0;
        out[3 * p + 2] = (float) sums[2];
    }

    /** Sums weight times the seen velocity, and the weight. */
    private void seen(int x, int y, int count, double[][] work, double[] sums) {
        double aspect = (double) view.raster().width() / view.raster().height();
        double across = (x + 0.5) / view.raster().width() - 0.5;
        double upwards = 0.5 - (y + 0.5) / view.raster().height();
        double through = 1;
        if (view.lens() instanceof Orthographic field) {
            for (int n = 0; n < count; n++) {
                double m = FastExp.minusOpacity(work[0][n]);
                double w = -through * m;
                through += through * m;
                sums[0] += w * work[1][n] / field.widthMetres() * aspect;
                sums[1] -= w * work[2][n] / field.heightMetres();
                sums[2] += w;
            }
            return;
        }
        Pinhole lens = (Pinhole) view.lens();
        double a = across * lens.gateWidthMm() / lens.focalMm();
        double b = upwards * lens.gateHeightMm() / lens.focalMm();
        int p = x + view.raster().width() * y;
        double depth = depth(p);
        double deeper = rays.spacing[p] / Math.sqrt(1 + a * a + b * b);
        for (int n = 0; n < count; n++) {
            double m = FastExp.minusOpacity(work[0][n]);
            double w = -through * m;
            through += through * m;
            double per = w / (depth + (n + 0.5) * deeper);
            sums[0] += per * (work[1][n] - a * work[3][n]) * lens.focalMm() / lens.gateWidthMm() * aspect;
            sums[1] -= per * (work[2][n] - b * work[3][n]) * lens.focalMm() / lens.gateHeightMm();
            sums[2] += w;
        }
    }

    /** Metres along the axis from the eye to where ray p enters the box. */
    private double depth(int p) {
        double h = shape.cellMetres();
        Vec3 entry = new Vec3(shape.originX() + (rays.start[3 * p] - 0.5) * h, shape.originY() + (rays.start[3 * p + 1] - 0.5) * h,
                shape.originZ() + (rays.start[3 * p + 2] - 0.5) * h);
        return entry.minus(view.position()).dot(view.axis());
    }
}

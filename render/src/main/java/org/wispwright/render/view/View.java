package org.wispwright.render.view;

import java.util.Optional;
import org.wispwright.render.volume.GridShape;

/**
 * A camera: lens, place, direction and raster. Frame axes: right = axis x up, above = right x axis, all of length 1; pixel
 * (0,0) is at the top left and continuous pixel coordinates have (0,0) at its outer corner, so its centre is (0.5, 0.5).
 * The frame's edges are the gate's edges. Pinhole geometry: Hartley and Zisserman (2004), Multiple View Geometry, ch. 6.
 *
 * @param name what notes call it, not blank
 * @param lens see {@link Lens}
 * @param position the eye (pinhole) or the centre of the field (orthographic), metres; nothing behind it is seen
 * @param aim a point on the axis, metres, not the position
 * @param up any direction that is not along the axis
 * @param raster its aspect is the lens's to within half a pixel
 */
public record View(String name, Lens lens, Vec3 position, Vec3 aim, Vec3 up, Raster raster) {
    /** The smallest sine of the angle between axis and up; below it the frame would turn by chance. */
    private static final double LEAST_SINE = 1e-6;

    /** Where a world point falls in the frame: continuous pixel coordinates (may lie outside) and metres along the axis. */
    public record ImagePoint(double x, double y, double depthMetres) {
    }

    /** Checks the parts against each other. @throws IllegalArgumentException saying which part is off and what it needs */
    public View {
        if (name == null || name.isBlank()) {
            throw new IllegalArgumentException("view: has no name; give one that notes can call it by");
        }
        Vec3 sight = aim.minus(position);
        if (!(sight.length() > 0)) {
            throw new IllegalArgumentException("view '" + name + "': aim and position are both " + aim.inWords() + "; move one of them");
        }
        if (!(up.length() > 0) || !(sight.unit().cross(up.unit()).length() > LEAST_SINE)) {
            throw new IllegalArgumentException("view '" + name + "': up " + up.inWords() + " is zero or runs along the axis "
                    + sight.inWords() + "; give an up across the axis");
        }
        double across = raster.height() * lens.aspect();
        double down = raster.width() / lens.aspect();
        if (!(Math.abs(raster.width() - across) <= 0.5 || Math.abs(raster.height() - down) <= 0.5)) {
            throw new IllegalArgumentException("view '" + name + "': raster " + raster.inWords() + " does not have the lens's aspect "
                    + lens.aspect() + "; for " + raster.height() + " rows it needs " + Math.max(1, Math.round(across)) + " pixels a row");
        }
    }

    /** Direction of the axis, length 1. */
    public Vec3 axis() {
        return aim.minus(position).unit();
    }

    /** Direction to the right of the frame, length 1. */
    public Vec3 right() {
        return axis().cross(up).unit();
    }

    /** Direction to the top of the frame, length 1. */
    public Vec3 above() {
        return right().cross(axis());
    }

    /** The ray through the centre of pixel (x,y). */
    public Ray ray(int x, int y) {
        return rayThrough(x + 0.5, y + 0.5);
    }

    /** The ray through any point of the frame, continuous pixel coordinates. */
    public Ray rayThrough(double x, double y) {
        double across = x / raster.width() - 0.5;
        double upwards = 0.5 - y / raster.height();
        if (lens instanceof Pinhole pinhole) {
            Vec3 onFilm = right().times(across * pinhole.gateWidthMm()).plus(above().times(upwards * pinhole.gateHeightMm()));
            return new Ray(position, onFilm.plus(axis().times(pinhole.focalMm())).unit());
        }
        Orthographic field = (Orthographic) lens;
        Vec3 offset = right().times(across * field.widthMetres()).plus(above().times(upwards * field.heightMetres()));
        return new Ray(position.plus(offset), axis());
    }

    /** Where a world point falls in the frame; empty if it is not in front of the position. */
    public Optional<ImagePoint> project(Vec3 point) {
        Vec3 from = point.minus(position);
        double depth = from.dot(axis());
        if (!(depth > 0)) {
            return Optional.empty();
        }
        double across = from.dot(right());
        double upwards = from.dot(above());
        if (lens instanceof Pinhole pinhole) {
            across *= pinhole.focalMm() / (depth * pinhole.gateWidthMm());
            upwards *= pinhole.focalMm() / (depth * pinhole.gateHeightMm());
        } else {
            Orthographic field = (Orthographic) lens;
            across /= field.widthMetres();
            upwards /= field.heightMetres();
        }
        return Optional.of(new ImagePoint((0.5 + across) * raster.width(), (0.5 - upwards) * raster.height(), depth));
    }

    /**
     * The same view at about this many rows, for proxies. If a raster of exactly this raster's aspect has a height within a
     * quarter of the wanted one, the nearest such raster is taken; otherwise the wanted height with the nearest whole width.
     *
     * @param height wanted rows, 1 to {@value org.wispwright.render.picture.Picture#LONGEST_SIDE}
     * @throws IllegalArgumentException if the raster would have a side out of range
     */
    public View withRasterHeight(int height) {
        int common = gcd(raster.width(), raster.height());
        int unitHeight = raster.height() / common;
        int times = Math.max(1, (int) Math.round((double) height / unitHeight));
        int exact = times * unitHeight;
        double exactWidth = (double) times * (raster.width() / common);
        boolean near = 4.0 * Math.abs(exact - height) <= height;
        if (near && Math.abs(exactWidth - exact * lens.aspect()) <= 0.5) {
            return withRaster(new Raster((int) exactWidth, exact));
        }
        return withRaster(new Raster(Math.max(1, (int) Math.round(height * lens.aspect())), height));
    }

    /** The same view with another raster. */
    public View withRaster(Raster other) {
        return new View(name, lens, position, aim, up, other);
    }

    /** True if the ray through some pixel centre passes through the box. Stops at the first that does. */
    public boolean sees(GridShape box) {
        for (int y = 0; y < raster.height(); y++) {
            for (int x = 0; x < raster.width(); x++) {
                if (ray(x, y).inside(box).isPresent()) {
                    return true;
                }
            }
        }
        return false;
    }

    private static int gcd(int a, int b) {
        return b == 0 ? a : gcd(b, a % b);
    }
}

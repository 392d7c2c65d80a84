package org.wispwright.optimize.solid;

import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;

/**
 * The form of a solid thing about its own middle, in metres.
 *
 * <p>A form says whether a point is inside when it fills cells of a stated side: no half width of it counts as less than half a cell.
 * Then a plate, however thin and however it is turned, parts the cells: between two cells that share a face the distance to its middle
 * plane changes by a cell at the most, so nobody passes from more than half a cell on one side to more than half a cell on the other
 * (the tunnel-free thickness of Cohen-Or and Kaufman 1995, Graphical Models and Image Processing 57(6), 453-461).
 */
public sealed interface Solid {

    /**
     * True if a cell whose centre is here is solid.
     *
     * @param x          metres along the thing's own axes, from its middle
     * @param y          as x
     * @param z          as x
     * @param cellMetres side of the cells
     */
    boolean fills(double x, double y, double z, double cellMetres);

    /** No point farther from the middle than this is inside, for cells of that side; metres. */
    double reach(double cellMetres);

    /** Rounding must not open a face that lies exactly on centres: this share of a cell is let through. */
    double SLACK = 1e-6;

    private static double atLeastHalfACell(double half, double cellMetres) {
        return Math.max(half, cellMetres / 2) + SLACK * cellMetres;
    }

    private static void requireAbove0(String what, double value) {
        if (!(value > 0) || Double.isInfinite(value)) {
            throw new IllegalArgumentException(what + ": got " + value + " m, needs a finite number above 0");
        }
    }

    /** A box. @param half half its sides along its own axes, metres, each above 0 */
    record Box(Vec3 half) implements Solid {
        /** Checks the sides. @throws IllegalArgumentException if one is not above 0 */
        public Box {
            requireAbove0("box", Math.min(half.x(), Math.min(half.y(), half.z())));
        }

        @Override public boolean fills(double x, double y, double z, double h) {
            return Math.abs(x) <= atLeastHalfACell(half.x(), h) && Math.abs(y) <= atLeastHalfACell(half.y(), h)
                    && Math.abs(z) <= atLeastHalfACell(half.z(), h);
        }

        @Override public double reach(double h) {
            return half.length() + 2 * h;
        }
    }

    /** A ball. @param radius metres, above 0 */
    record Ball(double radius) implements Solid {
        /** Checks the radius. @throws IllegalArgumentException if it is not above 0 */
        public Ball {
            requireAbove0("ball", radius);
        }

        @Override public boolean fills(double x, double y, double z, double h) {
            double r = atLeastHalfACell(radius, h);
            return x * x + y * y + z * z <= r * r;
        }

        @Override public double reach(double h) {
            return radius + h;
        }
    }

    /** A cylinder about its own y axis. @param radius metres, above 0 @param halfLength metres, above 0 */
    record Cylinder(double radius, double halfLength) implements Solid {
        /** Checks both. @throws IllegalArgumentException if one is not above 0 */
        public Cylinder {
            requireAbove0("cylinder", Math.min(radius, halfLength));
        }

        @Override public boolean fills(double x, double y, double z, double h) {
            double r = atLeastHalfACell(radius, h);
            return Math.abs(y) <= atLeastHalfACell(halfLength, h) && x * x + z * z <= r * r;
        }

        @Override public double reach(double h) {
            return Math.hypot(radius, halfLength) + 2 * h;
        }
    }

    /**
     * Any form, from a volume. A cell is solid where the value at its centre says so; of a mask where its mean over the cell does. Walls
     * thinner than a cell of the grid may be lost.
     *
     * @param shape  sizes and cell side of the volume; its middle is the thing's, whatever its origin
     * @param values in the order of {@link GridShape#cell}; read, not copied
     * @param kind   what the values mean
     */
    record Volume(GridShape shape, float[] values, Kind kind) implements Solid {
        /** Most points along an axis that the mean of a mask takes. */
        private static final int MOST_POINTS = 8;

        /** What a volume's values mean. */
        public enum Kind {
            /** Metres to the surface, negative inside. */ DISTANCE,
            /** Share of solid, 0 to 1. */ MASK
        }

        /** Checks the count. @throws IllegalArgumentException if it is not the shape's */
        public Volume {
            if (values.length != shape.cells()) {
                throw new IllegalArgumentException("solid volume: got " + values.length + " values for " + shape.inWords());
            }
        }

        @Override public boolean fills(double x, double y, double z, double h) {
            if (kind == Kind.DISTANCE) {
                return inside(x, y, z) && at(x, y, z) <= 0;
            }
            int points = (int) Math.max(1, Math.min(MOST_POINTS, Math.ceil(h / shape.cellMetres() - SLACK)));
            double sum = 0;
            for (int n = 0; n < points * points * points; n++) {
                double px = x + h * ((n % points + 0.5) / points - 0.5);
                double py = y + h * ((n / points % points + 0.5) / points - 0.5);
                double pz = z + h * ((n / points / points + 0.5) / points - 0.5);
                sum += inside(px, py, pz) ? at(px, py, pz) : 0;
            }
            return sum >= 0.5 * points * points * points;
        }

        private boolean inside(double x, double y, double z) {
            double half = shape.cellMetres() / 2;
            return Math.abs(x) <= shape.nx() * half && Math.abs(y) <= shape.ny() * half && Math.abs(z) <= shape.nz() * half;
        }

        /** Trilinear between the volume's centres, the outermost value beyond them. */
        private double at(double x, double y, double z) {
            double h = shape.cellMetres();
            double px = clamp(x / h + 0.5 * (shape.nx() - 1), shape.nx() - 1);
            double py = clamp(y / h + 0.5 * (shape.ny() - 1), shape.ny() - 1);
            double pz = clamp(z / h + 0.5 * (shape.nz() - 1), shape.nz() - 1);
            int i = (int) px;
            int j = (int) py;
            int k = (int) pz;
            double sum = 0;
            for (int corner = 0; corner < 8; corner++) {
                double wx = (corner & 1) == 0 ? 1 - (px - i) : px - i;
                double wy = (corner & 2) == 0 ? 1 - (py - j) : py - j;
                double wz = (corner & 4) == 0 ? 1 - (pz - k) : pz - k;
                if (wx * wy * wz > 0) {
                    sum += wx * wy * wz * values[shape.cell(i + (corner & 1), j + (corner >> 1 & 1), k + (corner >> 2))];
                }
            }
            return sum;
        }

        private static double clamp(double at, int last) {
            return Math.max(0, Math.min(last, at));
        }

        @Override public double reach(double h) {
            double half = shape.cellMetres() / 2;
            return Math.sqrt(Math.pow(shape.nx() * half, 2) + Math.pow(shape.ny() * half, 2) + Math.pow(shape.nz() * half, 2)) + 2 * h;
        }
    }
}

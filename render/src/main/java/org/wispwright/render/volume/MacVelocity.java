package org.wispwright.render.volume;

import java.util.Arrays;

/**
 * Velocity (or any vector quantity, such as a force in m/s2) on the faces of a box's cells: each component lives on
 * the faces square to it. Layout: Harlow and Welch (1965), Physics of Fluids 8(12), 2182-2189. Indices:
 * {@link GridShape#xFace}, {@link GridShape#yFace}, {@link GridShape#zFace}. About 12 bytes a cell.
 */
public final class MacVelocity {
    private final GridShape shape;
    private final float[] x;
    private final float[] y;
    private final float[] z;

    /** All zeros. */
    public MacVelocity(GridShape shape) {
        this(shape, new float[shape.xFaces()], new float[shape.yFaces()], new float[shape.zFaces()]);
    }

    /**
     * Wraps three arrays without copying them.
     *
     * @throws IllegalArgumentException if a count is not the shape's
     */
    public MacVelocity(GridShape shape, float[] x, float[] y, float[] z) {
        if (x.length != shape.xFaces() || y.length != shape.yFaces() || z.length != shape.zFaces()) {
            throw new IllegalArgumentException("face velocity: got " + x.length + ", " + y.length + ", " + z.length + " values, "
                    + shape.inWords() + " need " + shape.xFaces() + ", " + shape.yFaces() + ", " + shape.zFaces());
        }
        this.shape = shape;
        this.x = x;
        this.y = y;
        this.z = z;
    }

    /** The box. */
    public GridShape shape() {
        return shape;
    }

    /** The x component on x faces, not a copy. */
    public float[] x() {
        return x;
    }

    /** The y component on y faces, not a copy. */
    public float[] y() {
        return y;
    }

    /** The z component on z faces, not a copy. */
    public float[] z() {
        return z;
    }

    /** The largest absolute value of any component on any face; NaN if one is NaN. */
    public float largest() {
        float most = 0;
        for (float[] component : new float[][] {x, y, z}) {
            for (float v : component) {
                most = Math.max(most, Math.abs(v));
            }
        }
        return most;
    }

    /** Overwrites this velocity with another of the same shape. */
    public void set(MacVelocity other) {
        System.arraycopy(other.x, 0, x, 0, x.length);
        System.arraycopy(other.y, 0, y, 0, y.length);
        System.arraycopy(other.z, 0, z, 0, z.length);
    }

    /** Overwrites every value. */
    public void fill(float value) {
        Arrays.fill(x, value);
        Arrays.fill(y, value);
        Arrays.fill(z, value);
    }

    /** A new velocity with the same values. */
    public MacVelocity copy() {
        return new MacVelocity(shape, x.clone(), y.clone(), z.clone());
    }
}

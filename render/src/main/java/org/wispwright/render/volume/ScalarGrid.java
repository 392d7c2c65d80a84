package org.wispwright.render.volume;

import java.util.Arrays;

/**
 * Values at the centres of a box's cells, in the order of {@link GridShape#cell}; 4 bytes a cell: 64^3 = 1 MiB.
 * The unit is the user's: density is unitless, extinction times density is 1/m.
 */
public final class ScalarGrid {
    private final GridShape shape;
    private final float[] values;

    /** A grid of zeros. */
    public ScalarGrid(GridShape shape) {
        this(shape, new float[shape.cells()]);
    }

    /**
     * Wraps values without copying them.
     *
     * @throws IllegalArgumentException if the count is not the shape's
     */
    public ScalarGrid(GridShape shape, float[] values) {
        if (values.length != shape.cells()) {
            throw new IllegalArgumentException("scalar grid: got " + values.length + " values, " + shape.inWords() + " need " + shape.cells());
        }
        this.shape = shape;
        this.values = values;
    }

    /** The box. */
    public GridShape shape() {
        return shape;
    }

    /** The values themselves, not a copy. */
    public float[] values() {
        return values;
    }

    /** The value of cell (i,j,k). */
    public float at(int i, int j, int k) {
        return values[shape.cell(i, j, k)];
    }

    /** Overwrites this grid with another of the same shape. */
    public void set(ScalarGrid other) {
        System.arraycopy(other.values, 0, values, 0, values.length);
    }

    /** Overwrites every value. */
    public void fill(float value) {
        Arrays.fill(values, value);
    }

    /** A new grid with the same values. */
    public ScalarGrid copy() {
        return new ScalarGrid(shape, values.clone());
    }

    /** Sum of all values, in double, in index order. */
    public double sum() {
        double sum = 0;
        for (float v : values) {
            sum += v;
        }
        return sum;
    }
}

package org.wispwright.optimize.flow;

import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;
import org.wispwright.render.volume.ScalarGrid;

/**
 * The state of the smoke between two steps, or the derivative of a loss by it. About 16 bytes a cell.
 *
 * @param density  unitless, in cells
 * @param velocity m/s, on faces
 */
public record SmokeState(ScalarGrid density, MacVelocity velocity) {

    /** Checks that both share a box. @throws IllegalArgumentException if not */
    public SmokeState {
        if (!density.shape().equals(velocity.shape())) {
            throw new IllegalArgumentException("smoke state: the density is " + density.shape().inWords() + ", the velocity "
                    + velocity.shape().inWords());
        }
    }

    /** Empty, still air. */
    public SmokeState(GridShape shape) {
        this(new ScalarGrid(shape), new MacVelocity(shape));
    }

    /** Overwrites this state with another of the same box. */
    public void set(SmokeState other) {
        density.set(other.density);
        velocity.set(other.velocity);
    }

    /** Overwrites everything with 0. */
    public void clear() {
        density.fill(0);
        velocity.fill(0);
    }

    /** A new state with the same values. */
    public SmokeState copy() {
        return new SmokeState(density.copy(), velocity.copy());
    }

    /** Bytes that one state of this box takes. */
    public static long bytes(GridShape shape) {
        return 4L * ((long) shape.cells() + shape.xFaces() + shape.yFaces() + shape.zFaces());
    }
}

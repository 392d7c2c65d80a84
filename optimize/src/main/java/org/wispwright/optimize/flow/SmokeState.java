package org.wispwright.optimize.flow;

import java.util.ArrayList;
import java.util.List;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;
import org.wispwright.render.volume.ScalarGrid;

/**
 * The state of the smoke between two steps, or the derivative of a loss by it. About 16 bytes a cell, 20 with
 * a temperature.
 *
 * @param density  unitless, in cells
 * @param velocity m/s, on faces
 * @param temperature above the air around, kelvin, in cells; null in a shot without {@link Heat}
 */
public record SmokeState(ScalarGrid density, MacVelocity velocity, ScalarGrid temperature) {

    /** Checks that both share a box. @throws IllegalArgumentException if not */
    public SmokeState {
        if (!density.shape().equals(velocity.shape()) || temperature != null && !density.shape().equals(temperature.shape())) {
            throw new IllegalArgumentException("smoke state: the density is " + density.shape().inWords() + ", the velocity "
                    + velocity.shape().inWords());
        }
    }

    /** Density and velocity alone. */
    public SmokeState(ScalarGrid density, MacVelocity velocity) {
        this(density, velocity, null);
    }

    /** Empty, still air, without a temperature. */
    public SmokeState(GridShape shape) {
        this(new ScalarGrid(shape), new MacVelocity(shape));
    }

    /** Empty, still air with what the shot carries. */
    public static SmokeState of(FlowSetup flow) {
        GridShape shape = flow.grid();
        return new SmokeState(new ScalarGrid(shape), new MacVelocity(shape), flow.heat().isCarried() ? new ScalarGrid(shape) : null);
    }

    /** Its arrays, in one order for all states of a shot. */
    public List<float[]> arrays() {
        List<float[]> arrays = new ArrayList<>(List.of(density.values(), velocity.x(), velocity.y(), velocity.z()));
        if (temperature != null) {
            arrays.add(temperature.values());
        }
        return arrays;
    }

    /** Overwrites this state with another of the same box. */
    public void set(SmokeState other) {
        density.set(other.density);
        velocity.set(other.velocity);
        if (temperature != null) {
            temperature.set(other.temperature);
        }
    }

    /** Overwrites everything with 0. */
    public void clear() {
        density.fill(0);
        velocity.fill(0);
        if (temperature != null) {
            temperature.fill(0);
        }
    }

    /** A new state with the same values. */
    public SmokeState copy() {
        return new SmokeState(density.copy(), velocity.copy(), temperature == null ? null : temperature.copy());
    }

    /** Bytes that one state without a temperature takes. */
    public static long bytes(GridShape shape) {
        return 4L * ((long) shape.cells() + shape.xFaces() + shape.yFaces() + shape.zFaces());
    }

    /** Bytes that one state of this shot takes. */
    public static long bytes(FlowSetup flow) {
        return bytes(flow.grid()) + (flow.heat().isCarried() ? 4L * flow.grid().cells() : 0);
    }
}

package org.wispwright.optimize.flow;

import java.util.Optional;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;
import org.wispwright.render.volume.ScalarGrid;

/**
 * What is in the box on the first frame. Velocity may hold divergence; the first step takes it away.
 *
 * @param density  unitless, if there is any; read, not copied
 * @param temperature above the air around, kelvin, if there is any; read, not copied
 * @param velocity m/s, if the air moves; read, not copied
 */
public record Start(Optional<ScalarGrid> density, Optional<ScalarGrid> temperature, Optional<MacVelocity> velocity) {
    /** Empty, still air. */
    public static final Start EMPTY = new Start(Optional.empty(), Optional.empty(), Optional.empty());

    /** A new state of a shot's grid, whatever its cells: see {@link Averages}. */
    SmokeState on(FlowSetup flow) {
        GridShape shape = flow.grid();
        SmokeState state = SmokeState.of(flow);
        density.ifPresent(given -> resample(given, state.density()));
        temperature.ifPresent(given -> resample(given, state.temperature()));
        velocity.ifPresent(given -> {
            GridShape from = given.shape();
            Averages.resample(given.x(), sizes(from, 1, 0, 0), state.velocity().x(), sizes(shape, 1, 0, 0), 0);
            Averages.resample(given.y(), sizes(from, 0, 1, 0), state.velocity().y(), sizes(shape, 0, 1, 0), 1);
            Averages.resample(given.z(), sizes(from, 0, 0, 1), state.velocity().z(), sizes(shape, 0, 0, 1), 2);
        });
        return state;
    }

    private static void resample(ScalarGrid from, ScalarGrid to) {
        Averages.resample(from.values(), sizes(from.shape(), 0, 0, 0), to.values(), sizes(to.shape(), 0, 0, 0), -1);
    }

    private static int[] sizes(GridShape s, int x, int y, int z) {
        return new int[] {s.nx() + x, s.ny() + y, s.nz() + z};
    }
}

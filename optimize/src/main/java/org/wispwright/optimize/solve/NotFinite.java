package org.wispwright.optimize.solve;

import java.util.Optional;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.render.volume.GridShape;

/** Finds the first value of a state that is NaN or infinite, so that a run that blows up can say where. */
public final class NotFinite {
    private NotFinite() {
    }

    /**
     * The first such value in words: velocity along x, y and z, which a step makes first, then density, then temperature; each in memory
     * order.
     *
     * @param when the moment, such as "frame 1012"
     * @return such as "density at cell (31, 4, 17) of frame 1012 is NaN"; empty if all values are finite
     */
    public static Optional<String> in(SmokeState state, String when) {
        GridShape g = state.density().shape();
        return in("velocity along x at face", state.velocity().x(), g.nx() + 1, g.ny(), when)
                .or(() -> in("velocity along y at face", state.velocity().y(), g.nx(), g.ny() + 1, when))
                .or(() -> in("velocity along z at face", state.velocity().z(), g.nx(), g.ny(), when))
                .or(() -> in("density at cell", state.density().values(), g.nx(), g.ny(), when))
                .or(() -> state.temperature() == null ? Optional.empty()
                        : in("temperature at cell", state.temperature().values(), g.nx(), g.ny(), when));
    }

    private static Optional<String> in(String what, float[] values, int nx, int ny, String when) {
        for (int n = 0; n < values.length; n++) {
            if (!Float.isFinite(values[n])) {
                return Optional.of(what + " (" + n % nx + ", " + n / nx % ny + ", " + n / (nx * ny) + ") of " + when + " is " + values[n]);
            }
        }
        return Optional.empty();
    }
}

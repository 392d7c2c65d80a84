package org.wispwright.optimize.flow;

import java.util.List;
import org.wispwright.render.volume.GridShape;

/**
 * Everything that the simulation of a shot depends on, apart from the extra force. The first frame's state is empty,
 * still air.
 *
 * @param grid        the box
 * @param frames      the frame range
 * @param substeps    solver steps from one frame to the next, 1 to 64
 * @param velocity    interpolation of the velocity that carries itself
 * @param density     interpolation of the density
 * @param sides       walls and open sides
 * @param buoyancy    upward acceleration of smoke of density 1, m/s2, finite
 * @param dissipation density's rate of decay, 1/s, 0 or more
 * @param sources     where smoke comes from
 */
public record FlowSetup(GridShape grid, FrameRange frames, int substeps, Interpolation velocity, Interpolation density, Sides sides,
                        double buoyancy, double dissipation, List<Source> sources) {

    /** Checks the numbers. @throws IllegalArgumentException saying what is off */
    public FlowSetup {
        if (substeps < 1 || substeps > 64) {
            throw new IllegalArgumentException("flow: got " + substeps + " substeps a frame, needs 1 to 64");
        }
        if (!Double.isFinite(buoyancy)) {
            throw new IllegalArgumentException("flow: got a buoyancy of " + buoyancy + " m/s2, needs a finite number");
        }
        if (!(dissipation >= 0) || Double.isInfinite(dissipation)) {
            throw new IllegalArgumentException("flow: got a dissipation of " + dissipation + " 1/s, needs a finite number from 0");
        }
        sources = List.copyOf(sources);
    }

    /** Seconds of one substep. */
    public double stepSeconds() {
        return frames.secondsPerFrame() / substeps;
    }

    /** The same shot on another grid. */
    public FlowSetup on(GridShape other) {
        return new FlowSetup(other, frames, substeps, velocity, density, sides, buoyancy, dissipation, sources);
    }
}

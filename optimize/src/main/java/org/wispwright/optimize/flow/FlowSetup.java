package org.wispwright.optimize.flow;

import java.util.List;
import org.wispwright.optimize.solid.Obstacle;
import org.wispwright.optimize.solid.SolidCells;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;

/**
 * Everything that the simulation of a shot depends on, apart from the extra force.
 *
 * @param grid        the box
 * @param frames      the frame range
 * @param pace        how a frame is cut into substeps
 * @param velocity    interpolation of the velocity that carries itself
 * @param density     interpolation of the density
 * @param sides       walls and open sides
 * @param buoyancy    upward acceleration of smoke of density 1, m/s2, finite
 * @param dissipation density's rate of decay, 1/s, 0 or more
 * @param sources     where smoke comes from
 * @param obstacles   solid things, at most {@link Obstacle#MOST}
 * @param heat        how warm smoke rises
 * @param wind        what pushes all air alike
 * @param start       what is in the box on the first frame
 */
public record FlowSetup(GridShape grid, FrameRange frames, Pace pace, Interpolation velocity, Interpolation density, Sides sides,
                        double buoyancy, double dissipation, List<Source> sources, List<Obstacle> obstacles, Heat heat,
                        Wind wind, Start start) {

    /** Checks the numbers. @throws IllegalArgumentException saying what is off */
    public FlowSetup {
        if (!Double.isFinite(buoyancy)) {
            throw new IllegalArgumentException("flow: got a buoyancy of " + buoyancy + " m/s2, needs a finite number");
        }
        if (!(dissipation >= 0) || Double.isInfinite(dissipation)) {
            throw new IllegalArgumentException("flow: got a dissipation of " + dissipation + " 1/s, needs a finite number from 0");
        }
        sources = List.copyOf(sources);
        obstacles = List.copyOf(obstacles);
        if (!heat.isCarried() && (sources.stream().anyMatch(s -> s.kelvinPerSecond() != 0) || start.temperature().isPresent())) {
            throw new IllegalArgumentException("flow: a source or the start gives a temperature, needs a lift other than 0 that it acts by");
        }
        if (obstacles.size() > Obstacle.MOST) {
            throw new IllegalArgumentException("flow: got " + obstacles.size() + " obstacles, needs at most " + Obstacle.MOST);
        }
    }

    /** Plain smoke: sources and buoyancy alone. */
    public FlowSetup(GridShape grid, FrameRange frames, int substeps, Interpolation velocity, Interpolation density, Sides sides,
                     double buoyancy, double dissipation, List<Source> sources) {
        this(grid, frames, Pace.of(substeps), velocity, density, sides, buoyancy, dissipation, sources, List.of(), Heat.NONE, Wind.NONE,
                Start.EMPTY);
    }

    /** Solver steps from one frame to the next; 1 while they are still to be found. */
    public int substeps() {
        return Math.max(1, pace.substeps());
    }

    /** The same shot with its frames cut otherwise. */
    public FlowSetup withPace(Pace other) {
        return new FlowSetup(grid, frames, other, velocity, density, sides, buoyancy, dissipation, sources, obstacles, heat, wind, start);
    }

    /** The same shot on another grid of its box. */
    public FlowSetup on(GridShape other) {
        return new FlowSetup(other, frames, pace, velocity, density, sides, buoyancy, dissipation, sources, obstacles, heat,
                wind, start);
    }

    /** The same shot with these things in its box. */
    public FlowSetup withObstacles(List<Obstacle> things) {
        return new FlowSetup(grid, frames, pace, velocity, density, sides, buoyancy, dissipation, sources, things, heat, wind, start);
    }

    /** The same shot with other sources. */
    public FlowSetup withSources(List<Source> other) {
        return new FlowSetup(grid, frames, pace, velocity, density, sides, buoyancy, dissipation, other, obstacles, heat, wind, start);
    }

    /** The same shot with a temperature. */
    public FlowSetup withHeat(Heat other) {
        return new FlowSetup(grid, frames, pace, velocity, density, sides, buoyancy, dissipation, sources, obstacles, other, wind,
                start);
    }

    /** The same shot in another wind. */
    public FlowSetup withWind(Wind other) {
        return new FlowSetup(grid, frames, pace, velocity, density, sides, buoyancy, dissipation, sources, obstacles, heat, other,
                start);
    }

    /** The same shot with something in its box on the first frame. */
    public FlowSetup withStart(Start other) {
        return new FlowSetup(grid, frames, pace, velocity, density, sides, buoyancy, dissipation, sources, obstacles, heat, wind,
                other);
    }

    /** A new state as on the first frame; solids hold no smoke. */
    public SmokeState startState() {
        SmokeState state = start.on(this);
        if (!obstacles.isEmpty()) {
            SolidCells solids = new SolidCells(grid, obstacles, frames.first(), frames.first(), frames.perSecond(), new Lanes(1));
            for (int k = 0; k < grid.nz(); k++) {
                solids.clear(state.density().values(), k);
                if (state.temperature() != null) {
                    solids.clear(state.temperature().values(), k);
                }
            }
        }
        return state;
    }

    /** Step n of a run, from 0. */
    public Substep step(int n) {
        return new Substep(frames.first() + 1 + n / substeps(), n % substeps(), substeps());
    }

    /** Steps of a run from the first frame to this one. */
    public int stepsTo(int frame) {
        return substeps() * (frame - frames.first());
    }

    /** Seconds of a substep. */
    public double seconds(Substep substep) {
        return frames.secondsPerFrame() / substep.count();
    }
}

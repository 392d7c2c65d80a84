package org.wispwright.optimize.flow;

import java.util.List;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;
import org.wispwright.render.volume.ScalarGrid;

/**
 * One substep of smoke in a box, and its pullback. Stable Fluids (Stam 1999, SIGGRAPH 99, 121-128) on a MAC grid:
 * <pre>
 * u1 = carry(u, trace(u))
 * u2 = wind(u1 + dt (f + buoyancy(density) + lift(temperature)))
 * u' = project(u2)
 * density' = exp(-dissipation dt) carry(density, trace(u')) + dt strength sources, 0 in solids; temperature' likewise
 * </pre>
 * Only carrying is not linear, and it needs u, density and u' alone; so the pullback needs the state before the step and the
 * velocity after it, and runs no step again. A solver owns about 100 bytes a cell of workspace, 40 more with solids; one caller at a time.
 */
public final class SmokeSolver {
    /** Pieces of a plain loop over one array. */
    private static final int CHUNKS = 8;

    private final FlowSetup setup;
    private final GridShape shape;
    private final Lanes lanes;
    private final Trace trace;
    private final Medium medium;
    private final Buoyancy buoyancy;
    private final List<SourceCells> sources;
    private final Displacement displacement;
    private final Clock clock = new Clock();
    private final float[] mostPerSlab;
    private Displacement displacementBar;
    private SmokeState inBar;

    /** Prepares a solver; lanes stay the caller's. */
    public SmokeSolver(FlowSetup setup, Lanes lanes) {
        this.setup = setup;
        this.lanes = lanes;
        shape = setup.grid();
        trace = new Trace(shape, lanes);
        medium = setup.obstacles().isEmpty() ? new EmptyBox(setup, lanes) : new BoxWithSolids(setup, lanes);
        buoyancy = new Buoyancy(shape, setup.sides(), lanes);
        sources = setup.sources().stream().map(source -> new SourceCells(source, shape)).toList();
        displacement = new Displacement(shape);
        mostPerSlab = new float[shape.nz()];
    }

    /** What is simulated. */
    public FlowSetup setup() {
        return setup;
    }

    /** One substep with the sources as they were set up: see the other. */
    public void step(SmokeState in, MacVelocity force, Substep at, boolean follows, SmokeState out) {
        step(in, force, null, at, follows, out);
    }

    /**
     * One substep.
     *
     * @param in    read
     * @param force read: acceleration on faces, m/s2; null for none
     * @param strengths read: what each source's rates are multiplied by; null for 1
     * @param at    the substep: says how long it is, which sources feed it and where the solids are
     * @param follows true if {@code in} is, unchanged, what the last call of this solver wrote to {@code out}: its departures are known
     * @param out   overwritten; must not be in
     */
    public void step(SmokeState in, MacVelocity force, double[] strengths, Substep at, boolean follows, SmokeState out) {
        MacVelocity u = in.velocity();
        MacVelocity next = out.velocity();
        double seconds = setup.seconds(at);
        long since = System.nanoTime();
        medium.ready(at);
        if (!setup.obstacles().isEmpty()) {
            since = clock.lap(Clock.Part.SOLIDS, since);
        }
        if (!follows) {
            trace.forward(u, seconds, displacement);
        }
        since = clock.lap(Clock.Part.TRACE, since);
        medium.carryFaces(u, displacement, next);
        since = clock.lap(Clock.Part.CARRY_VELOCITY, since);
        if (force != null) {
            addScaled(next, force, (float) seconds);
        }
        buoyancy.forward(in.density().values(), seconds * setup.buoyancy(), next.y());
        if (setup.heat().isCarried()) {
            buoyancy.forward(in.temperature().values(), seconds * setup.heat().lift(), next.y());
        }
        setup.wind().forward(next, at, seconds, lanes);
        since = clock.lap(Clock.Part.PUSH, since);
        medium.project(next);
        since = clock.lap(Clock.Part.PROJECTION, since);
        trace.forward(next, seconds, displacement);
        since = clock.lap(Clock.Part.TRACE, since);
        carryForward(in.density(), out.density(), setup.dissipation(), seconds);
        if (setup.heat().isCarried()) {
            carryForward(in.temperature(), out.temperature(), setup.heat().cooling(), seconds);
        }
        for (int n = 0; n < sources.size(); n++) {
            sources.get(n).feed(out, at, seconds, strengths == null ? 1 : strengths[n]);
        }
        medium.clearSolids(out.density().values());
        if (setup.heat().isCarried()) {
            medium.clearSolids(out.temperature().values());
        }
        clock.lap(Clock.Part.CARRY_DENSITY, since);
    }

    /** Pulls a derivative back through one substep with the sources as they were set up: see the other. */
    public void pullback(SmokeState in, MacVelocity outVelocity, Substep at, boolean follows, SmokeState bar, MacVelocity forceBar) {
        pullback(in, outVelocity, at, follows, bar, forceBar, null);
    }

    /**
     * Pulls a derivative back through one substep.
     *
     * @param in       read: the state before the substep
     * @param outVelocity read: the velocity after it
     * @param at          the substep
     * @param follows     true if outVelocity is, unchanged, what the last call of this solver traced last: the velocity of a step's
     *                    {@code out} or of a pullback's {@code in}
     * @param bar      on entry the derivative by the state after the substep, on exit by the state before it
     * @param forceBar added to: the derivative by the force; null if not wanted
     * @param strengthBar added to: the derivative by the sources' strengths; null if not wanted
     */
    public void pullback(SmokeState in, MacVelocity outVelocity, Substep at, boolean follows, SmokeState bar, MacVelocity forceBar,
                         double[] strengthBar) {
        if (inBar == null) {
            inBar = SmokeState.of(setup);
            displacementBar = new Displacement(shape);
        }
        double seconds = setup.seconds(at);
        clear(inBar);
        lanes.forEach(shape.nz(), displacementBar::clearSlab);
        long since = System.nanoTime();
        medium.ready(at);
        if (!setup.obstacles().isEmpty()) {
            since = clock.lap(Clock.Part.SOLIDS, since);
        }
        if (strengthBar != null) {
            strengthsBack(bar, at, seconds, strengthBar);
        }
        if (!follows) {
            trace.forward(outVelocity, seconds, displacement);
        }
        since = clock.lap(Clock.Part.TRACE, since);
        int reach = displacement.reachInZ(lanes, mostPerSlab);
        carryBack(in.density(), bar.density(), inBar.density(), setup.dissipation(), seconds, reach);
        if (setup.heat().isCarried()) {
            carryBack(in.temperature(), bar.temperature(), inBar.temperature(), setup.heat().cooling(), seconds, reach);
        }
        since = clock.lap(Clock.Part.CARRY_DENSITY_BACK, since);
        trace.pullback(outVelocity, seconds, displacementBar, bar.velocity());
        since = clock.lap(Clock.Part.TRACE_BACK, since);

        medium.projectBack(bar.velocity());
        since = clock.lap(Clock.Part.PROJECTION_BACK, since);
        setup.wind().pullback(bar.velocity(), seconds, lanes);
        if (forceBar != null) {
            addScaled(forceBar, bar.velocity(), (float) seconds);
        }
        buoyancy.pullback(bar.velocity().y(), seconds * setup.buoyancy(), inBar.density().values());
        if (setup.heat().isCarried()) {
            buoyancy.pullback(bar.velocity().y(), seconds * setup.heat().lift(), inBar.temperature().values());
        }
        since = clock.lap(Clock.Part.PUSH_BACK, since);

        MacVelocity u = in.velocity();
        MacVelocity uBar = inBar.velocity();
        lanes.forEach(shape.nz(), displacementBar::clearSlab);
        trace.forward(u, seconds, displacement);
        since = clock.lap(Clock.Part.TRACE, since);
        reach = displacement.reachInZ(lanes, mostPerSlab);
        medium.carryFacesBack(u, displacement, reach, bar.velocity(), uBar, displacementBar);
        since = clock.lap(Clock.Part.CARRY_VELOCITY_BACK, since);
        trace.pullback(u, seconds, displacementBar, uBar);
        bar.set(inBar);
        clock.lap(Clock.Part.TRACE_BACK, since);
    }

    /** What a source gives into a solid is taken away again, so nothing is owed for it. */
    private void strengthsBack(SmokeState bar, Substep at, double seconds, double[] strengthBar) {
        medium.clearSolids(bar.density().values());
        if (bar.temperature() != null) {
            medium.clearSolids(bar.temperature().values());
        }
        for (int n = 0; n < sources.size(); n++) {
            strengthBar[n] += sources.get(n).strengthBar(bar, at, seconds);
        }
    }

    /** A cell value's step when its departures are traced. */
    private void carryForward(ScalarGrid in, ScalarGrid out, double decay, double seconds) {
        medium.carryCells(in.values(), displacement, out.values());
        fade(out.values(), (float) Math.exp(-decay * seconds));
    }

    /** What solids hold is 0 whatever came before: the medium's pullback takes nothing from there. */
    private void carryBack(ScalarGrid in, ScalarGrid outBar, ScalarGrid valueBar, double decay, double seconds, int reach) {
        fade(outBar.values(), (float) Math.exp(-decay * seconds));
        medium.carryCellsBack(in.values(), displacement, reach, outBar.values(), valueBar.values(), displacementBar);
    }

    /** Where this solver's time went; whoever drives it may add parts of its own. */
    public Clock clock() {
        return clock;
    }

    /**
     * Largest |div u| h / |u| of a velocity: 0 for a field free of divergence, about 1 for one that is not. With solids: of the fluid
     * around them where the last step saw them.
     */
    public double relativeDivergence(MacVelocity u) {
        return medium.relativeDivergence(u);
    }

    private void addScaled(MacVelocity to, MacVelocity from, float by) {
        float[][] tos = {to.x(), to.y(), to.z()};
        float[][] froms = {from.x(), from.y(), from.z()};
        lanes.forEach(3 * CHUNKS, piece -> {
            float[] t = tos[piece / CHUNKS];
            float[] f = froms[piece / CHUNKS];
            int end = chunkStart(t.length, piece % CHUNKS + 1);
            for (int n = chunkStart(t.length, piece % CHUNKS); n < end; n++) {
                t[n] += by * f[n];
            }
        });
    }

    private void clear(SmokeState state) {
        MacVelocity u = state.velocity();
        float[] temperature = state.temperature() == null ? new float[0] : state.temperature().values();
        float[][] parts = {u.x(), u.y(), u.z(), state.density().values(), temperature};
        lanes.forEach(parts.length, part -> java.util.Arrays.fill(parts[part], 0f));
    }

    private void fade(float[] density, float by) {
        if (by == 1) {
            return;
        }
        lanes.forEach(CHUNKS, piece -> {
            int end = chunkStart(density.length, piece + 1);
            for (int n = chunkStart(density.length, piece); n < end; n++) {
                density[n] *= by;
            }
        });
    }

    private static int chunkStart(int length, int chunk) {
        return (int) ((long) length * chunk / CHUNKS);
    }
}

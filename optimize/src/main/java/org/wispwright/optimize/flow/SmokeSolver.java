package org.wispwright.optimize.flow;

import java.util.List;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * One substep of smoke in a box, and its pullback. Stable Fluids (Stam 1999, SIGGRAPH 99, 121-128) on a MAC grid:
 * <pre>
 * u1 = carry(u, trace(u))
 * u2 = u1 + dt (f + buoyancy(density))
 * u' = project(u2)
 * density' = exp(-dissipation dt) carry(density, trace(u')) + dt sources
 * </pre>
 * Only carrying is not linear, and it needs u, density and u' alone; so the pullback needs the state before the step and the
 * velocity after it, and runs no step again. A solver owns about 100 bytes a cell of workspace; one caller at a time.
 */
public final class SmokeSolver {
    /** Pieces of a plain loop over one array. */
    private static final int CHUNKS = 8;

    private final FlowSetup setup;
    private final GridShape shape;
    private final Lanes lanes;
    private final double seconds;
    private final float keep;
    private final Trace trace;
    private final Carry carryX;
    private final Carry carryY;
    private final Carry carryZ;
    private final Carry carryDensity;
    private final Buoyancy buoyancy;
    private final Projection projection;
    private final List<SourceCells> sources;
    private final Displacement displacement;
    private final Clock clock = new Clock();
    private final float[] mostPerSlab;
    private final float[] scratch;
    private Displacement displacementBar;
    private SmokeState inBar;

    /** The cells that one source feeds, and how much of its rate each gets. */
    private record SourceCells(Source source, int[] cells, float[] ratePerSecond) {
        static SourceCells of(Source source, GridShape shape) {
            double h = shape.cellMetres();
            int[] cells = new int[shape.cells()];
            float[] rates = new float[shape.cells()];
            int found = 0;
            for (int k = 0; k < shape.nz(); k++) {
                double z = shape.isPlane() ? source.centreZ() : shape.originZ() + (k + 0.5) * h;
                for (int j = 0; j < shape.ny(); j++) {
                    for (int i = 0; i < shape.nx(); i++) {
                        double share = source.shareAt(shape.originX() + (i + 0.5) * h, shape.originY() + (j + 0.5) * h, z);
                        if (share > 0) {
                            cells[found] = shape.cell(i, j, k);
                            rates[found++] = (float) (share * source.ratePerSecond());
                        }
                    }
                }
            }
            return new SourceCells(source, java.util.Arrays.copyOf(cells, found), java.util.Arrays.copyOf(rates, found));
        }
    }

    /** Prepares a solver; lanes stay the caller's. */
    public SmokeSolver(FlowSetup setup, Lanes lanes) {
        this.setup = setup;
        this.lanes = lanes;
        shape = setup.grid();
        seconds = setup.stepSeconds();
        keep = (float) Math.exp(-setup.dissipation() * seconds);
        Sides sides = setup.sides();
        trace = new Trace(shape, lanes);
        carryX = Carry.ofFaces(shape, Lattice.Axis.X_FACES, setup.velocity(), sides.left(), sides.right(), lanes);
        carryY = Carry.ofFaces(shape, Lattice.Axis.Y_FACES, setup.velocity(), sides.floor(), sides.top(), lanes);
        carryZ = Carry.ofFaces(shape, Lattice.Axis.Z_FACES, setup.velocity(), sides.back(), sides.front(), lanes);
        carryDensity = Carry.ofCells(shape, setup.density(), lanes);
        buoyancy = new Buoyancy(shape, sides, lanes);
        projection = new Projection(shape, sides, lanes);
        sources = setup.sources().stream().map(source -> SourceCells.of(source, shape)).toList();
        displacement = new Displacement(shape);
        mostPerSlab = new float[shape.nz()];
        scratch = new float[shape.cells()];
    }

    /** What is simulated. */
    public FlowSetup setup() {
        return setup;
    }

    /**
     * One substep.
     *
     * @param in    read
     * @param force read: acceleration on faces, m/s2; null for none
     * @param frame the frame that this substep leads to; says which sources feed it
     * @param follows true if {@code in} is, unchanged, what the last call of this solver wrote to {@code out}: its departures are known
     * @param out   overwritten; must not be in
     */
    public void step(SmokeState in, MacVelocity force, int frame, boolean follows, SmokeState out) {
        MacVelocity u = in.velocity();
        MacVelocity next = out.velocity();
        long since = System.nanoTime();
        if (!follows) {
            trace.forward(u, seconds, displacement);
        }
        since = clock.lap(Clock.Part.TRACE, since);
        carryX.forward(u.x(), displacement, next.x());
        carryY.forward(u.y(), displacement, next.y());
        carryZ.forward(u.z(), displacement, next.z());
        since = clock.lap(Clock.Part.CARRY_VELOCITY, since);
        if (force != null) {
            addScaled(next, force, (float) seconds);
        }
        buoyancy.forward(in.density().values(), seconds * setup.buoyancy(), next.y());
        since = clock.lap(Clock.Part.PUSH, since);
        projection.apply(next);
        since = clock.lap(Clock.Part.PROJECTION, since);
        trace.forward(next, seconds, displacement);
        since = clock.lap(Clock.Part.TRACE, since);
        carryDensity.forward(in.density().values(), displacement, out.density().values());
        fade(out.density().values(), keep);
        feed(out.density().values(), frame);
        clock.lap(Clock.Part.CARRY_DENSITY, since);
    }

    /**
     * Pulls a derivative back through one substep.
     *
     * @param in       read: the state before the substep
     * @param outVelocity read: the velocity after it
     * @param follows     true if outVelocity is, unchanged, what the last call of this solver traced last: the velocity of a step's
     *                    {@code out} or of a pullback's {@code in}
     * @param bar      on entry the derivative by the state after the substep, on exit by the state before it
     * @param forceBar added to: the derivative by the force; null if not wanted
     */
    public void pullback(SmokeState in, MacVelocity outVelocity, boolean follows, SmokeState bar, MacVelocity forceBar) {
        if (inBar == null) {
            inBar = new SmokeState(shape);
            displacementBar = new Displacement(shape);
        }
        clear(inBar);
        lanes.forEach(shape.nz(), displacementBar::clearSlab);
        float[] density = in.density().values();
        long since = System.nanoTime();
        fade(bar.density().values(), keep);
        if (!follows) {
            trace.forward(outVelocity, seconds, displacement);
        }
        since = clock.lap(Clock.Part.TRACE, since);
        int reach = displacement.reachInZ(lanes, mostPerSlab);
        carryDensity.pullback(density, displacement, reach, bar.density().values(), inBar.density().values(), displacementBar);
        since = clock.lap(Clock.Part.CARRY_DENSITY_BACK, since);
        trace.pullback(outVelocity, seconds, displacementBar, bar.velocity());
        since = clock.lap(Clock.Part.TRACE_BACK, since);

        projection.apply(bar.velocity());
        since = clock.lap(Clock.Part.PROJECTION_BACK, since);
        if (forceBar != null) {
            addScaled(forceBar, bar.velocity(), (float) seconds);
        }
        buoyancy.pullback(bar.velocity().y(), seconds * setup.buoyancy(), inBar.density().values());
        since = clock.lap(Clock.Part.PUSH_BACK, since);

        MacVelocity u = in.velocity();
        MacVelocity uBar = inBar.velocity();
        lanes.forEach(shape.nz(), displacementBar::clearSlab);
        trace.forward(u, seconds, displacement);
        since = clock.lap(Clock.Part.TRACE, since);
        reach = displacement.reachInZ(lanes, mostPerSlab);
        carryX.pullback(u.x(), displacement, reach, bar.velocity().x(), uBar.x(), displacementBar);
        carryY.pullback(u.y(), displacement, reach, bar.velocity().y(), uBar.y(), displacementBar);
        carryZ.pullback(u.z(), displacement, reach, bar.velocity().z(), uBar.z(), displacementBar);
        since = clock.lap(Clock.Part.CARRY_VELOCITY_BACK, since);
        trace.pullback(u, seconds, displacementBar, uBar);
        bar.set(inBar);
        clock.lap(Clock.Part.TRACE_BACK, since);
    }

    /** Where this solver's time went; whoever drives it may add parts of its own. */
    public Clock clock() {
        return clock;
    }

    /** Largest |div u| h / |u| of a velocity: 0 for a field free of divergence, about 1 for one that is not. */
    public double relativeDivergence(MacVelocity u) {
        return DivergenceKernel.relativeMax(u, scratch, lanes);
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
        lanes.forEach(4, part -> {
            MacVelocity u = state.velocity();
            java.util.Arrays.fill(part == 0 ? u.x() : part == 1 ? u.y() : part == 2 ? u.z() : state.density().values(), 0f);
        });
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

    private void feed(float[] density, int frame) {
        for (SourceCells fed : sources) {
            if (fed.source().feeds(frame)) {
                for (int n = 0; n < fed.cells().length; n++) {
                    density[fed.cells()[n]] += (float) seconds * fed.ratePerSecond()[n];
                }
            }
        }
    }
}

package org.wispwright.bench;

import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Level;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.TearDown;
import org.openjdk.jmh.annotations.Warmup;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.Interpolation;
import org.wispwright.optimize.flow.SmokeSolver;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.flow.Substep;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.MacVelocity;

/**
 * What does a second lane save of a solver substep and of its pullback, with n cells each way?
 * <p>A short chain of steps of a grown plume is walked forwards over and over, or backwards, as a solve walks it: each call but the
 * first of a walk finds its departures traced. One operation is one substep. Both sides: one lane and two, the same bits. LINEAR and
 * CUBIC are two schemes, not two sides: their answers differ by design.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.NANOSECONDS)
@Fork(value = 1, jvmArgsAppend = "-Xmx3g")
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class StepBench {
    private static final int CHAIN = 8;
    private static final Substep AT = new Substep(1001 + Plume.GROWN + 1, 0, 1);

    /** Cells each way. */
    @Param({"32", "64", "128"})
    public int n;
    /** How the density is interpolated. */
    @Param({"LINEAR", "CUBIC"})
    public Interpolation density;
    /** Lanes. */
    @Param({"1", "2"})
    public int lanes;

    private Lanes ours;
    private SmokeSolver solver;
    private SmokeState[] chain;
    private MacVelocity force;
    private MacVelocity forceBar;
    private SmokeState endBar;
    private SmokeState bar;
    private int forwards;
    private int backwards;

    /** Grows the plume and lays out the chain; then both sides. */
    @Setup(Level.Trial)
    public void sameAnswerFirst() {
        ours = new Lanes(lanes);
        FlowSetup flow = Plume.in(Plume.box(n, n, n), density);
        solver = new SmokeSolver(flow, ours);
        force = new MacVelocity(flow.grid());
        Plume.noise(force, 0.5, 1);
        forceBar = new MacVelocity(flow.grid());
        endBar = new SmokeState(flow.grid());
        Plume.noise(endBar.density().values(), 1, 2);
        Plume.noise(endBar.velocity(), 1, 3);
        bar = new SmokeState(flow.grid());
        chain = new SmokeState[CHAIN + 1];
        chain[0] = Plume.grown(flow, ours);
        for (int s = 0; s < CHAIN; s++) {
            chain[s + 1] = new SmokeState(flow.grid());
            solver.step(chain[s], force, AT, s > 0, chain[s + 1]);
        }
        bar.set(endBar);
        solver.pullback(chain[CHAIN - 1], chain[CHAIN].velocity(), AT, true, bar, forceBar);
        try (Lanes theirs = new Lanes(3 - lanes)) {
            SmokeSolver other = new SmokeSolver(flow, theirs);
            SmokeState out = new SmokeState(flow.grid());
            other.step(chain[CHAIN - 1], force, AT, false, out);
            Same.bits("substep, 1 and 2 lanes", out, chain[CHAIN]);
            out.set(endBar);
            MacVelocity otherForceBar = new MacVelocity(flow.grid());
            other.pullback(chain[CHAIN - 1], chain[CHAIN].velocity(), AT, false, out, otherForceBar);
            Same.bits("pullback of a substep, 1 and 2 lanes", out, bar);
            Same.close("pullback to the force, 1 and 2 lanes", otherForceBar.y(), forceBar.y(), 0);
        }
        forwards = 0;
        backwards = CHAIN - 1;
    }

    /** Ends the lanes. */
    @TearDown(Level.Trial)
    public void close() {
        ours.close();
    }

    /** The next substep of the chain; writes the bits that are there already. */
    @Benchmark
    public SmokeState step() {
        int s = forwards;
        forwards = (s + 1) % CHAIN;
        solver.step(chain[s], force, AT, s > 0, chain[s + 1]);
        return chain[s + 1];
    }

    /** The next pullback, from the chain's end to its start. */
    @Benchmark
    public SmokeState pullback() {
        int s = backwards;
        backwards = s == 0 ? CHAIN - 1 : s - 1;
        if (s == CHAIN - 1) {
            bar.set(endBar);
            forceBar.fill(0);
        }
        solver.pullback(chain[s], chain[s + 1].velocity(), AT, s < CHAIN - 1, bar, forceBar);
        return bar;
    }
}

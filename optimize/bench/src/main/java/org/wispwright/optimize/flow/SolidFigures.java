package org.wispwright.optimize.flow;

import java.lang.management.ManagementFactory;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.wispwright.optimize.motion.Curve;
import org.wispwright.optimize.solid.Obstacle;
import org.wispwright.optimize.solid.Solid;
import org.wispwright.optimize.solid.SolidCells;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * What do solids cost? A plume in a box of 4 m meets one thing; printed are the pressure's iterations and, for one thread, the processor
 * time of a substep and of its pullback, so that a busy machine disturbs little. The first row, without a thing, is the other side.
 * <p>Run: {@code java -cp optimize/bench/target/bench.jar org.wispwright.optimize.flow.SolidFigures 64}
 */
public final class SolidFigures {
    private static final int GROWN = 10;
    private static final int STEPS = 5;
    private static final Vec3 ZERO = new Vec3(0, 0, 0);

    private SolidFigures() { }

    /** Prints a row a scene. @param args cells each way */
    public static void main(String[] args) {
        int n = Integer.parseInt(args[0]);
        GridShape box = new GridShape(n, n, n, 4.0 / n);
        Lanes lanes = new Lanes(1);
        System.out.println("scene | iterations: first step, grown, back | step, ns a cell | back, ns a cell | back / step"
                + " | left |div u| h / |u|");
        scenes().forEach((name, things) -> row(name, flow(box, things), lanes));
    }

    /** What stands in the box, by name; nothing first. */
    public static Map<String, List<Obstacle>> scenes() {
        Vec3 over = new Vec3(2, 1.6, 2);
        Map<String, List<Obstacle>> scenes = new LinkedHashMap<>();
        scenes.put("nothing", List.of());
        scenes.put("ball, a fifth of the box", List.of(still(new Solid.Ball(0.4), over, ZERO)));
        scenes.put("plate of one cell, 2 x 2 m", List.of(still(new Solid.Box(new Vec3(1, 0.01, 1)), over, ZERO)));
        scenes.put("the same, tilted", List.of(still(new Solid.Box(new Vec3(1, 0.01, 1)), over, new Vec3(0, 0, 0.5))));
        scenes.put("wall across the box", List.of(still(new Solid.Box(new Vec3(0.01, 9, 9)), new Vec3(3.1, 2, 2), ZERO)));
        scenes.put("ball that moves", List.of(new Obstacle("thing", new Solid.Ball(0.4),
                new Curve(List.of(1001.0, 1041.0), List.of(new Vec3(1, 1.6, 2), new Vec3(3, 1.6, 2))), Curve.still(ZERO))));
        return scenes;
    }

    private static Obstacle still(Solid solid, Vec3 at, Vec3 rotation) {
        return new Obstacle("thing", solid, Curve.still(at), Curve.still(rotation));
    }

    /** A plume in a box of 4 m with these things. */
    public static FlowSetup flow(GridShape box, List<Obstacle> things) {
        Sides sides = new Sides(Side.OPEN, Side.OPEN, Side.WALL, Side.OPEN, Side.OPEN, Side.OPEN);
        return new FlowSetup(box, new FrameRange(1001, 1041, 24), 1, Interpolation.LINEAR, Interpolation.LINEAR, sides, 8, 0.1,
                List.of(new Source("pot", 2, 0.5, 2, 0.5, 0.3, 6, 1001, 1041))).withObstacles(things);
    }

    private static void row(String name, FlowSetup flow, Lanes lanes) {
        SmokeSolver solver = new SmokeSolver(flow, lanes);
        SmokeState now = new SmokeState(flow.grid());
        SmokeState next = new SmokeState(flow.grid());
        SmokeState bar = new SmokeState(flow.grid());
        MacVelocity forceBar = new MacVelocity(flow.grid());
        double[] forth = new double[STEPS];
        double[] back = new double[STEPS];
        int first = 0;
        for (int n = 0; n < GROWN + STEPS; n++) {
            long since = processorNanos();
            solver.step(now, null, flow.step(n), n > 0 && n <= GROWN, next);
            long between = processorNanos();
            first = n == 0 ? iterations(flow, next, n, lanes) : first;
            if (n >= GROWN) {
                bar.set(next);
                long backSince = processorNanos();
                solver.pullback(now, next.velocity(), flow.step(n), true, bar, forceBar);
                forth[n - GROWN] = (double) (between - since) / flow.grid().cells();
                back[n - GROWN] = (double) (processorNanos() - backSince) / flow.grid().cells();
            }
            SmokeState swap = now;
            now = next;
            next = swap;
        }
        Arrays.sort(forth);
        Arrays.sort(back);
        double f = forth[STEPS / 2];
        double b = back[STEPS / 2];
        System.out.printf("%s | %d, %d, %d | %.0f (worst %.0f) | %.0f (worst %.0f) | %.1f | %.1e%n", name, first,
                iterations(flow, now, GROWN + STEPS, lanes), iterations(flow, bar, GROWN + STEPS, lanes), f, forth[STEPS - 1], b,
                        back[STEPS - 1],
                b / f, solver.relativeDivergence(now.velocity()));
    }

    /** Iterations for a velocity under the push of its smoke. */
    private static int iterations(FlowSetup flow, SmokeState state, int n, Lanes lanes) {
        if (flow.obstacles().isEmpty()) {
            return 0;
        }
        Substep at = flow.step(n);
        SolidCells solids = new SolidCells(flow.grid(), flow.obstacles(), at.from(), at.to(), flow.frames().perSecond(), lanes);
        SolidProjection projection = new SolidProjection(flow.grid(), flow.sides(), lanes);
        MacVelocity u = state.velocity().copy();
        new Buoyancy(flow.grid(), flow.sides(), lanes).forward(state.density().values(), 8.0 / 24, u.y());
        projection.forward(u, solids, new PressureLinks(flow.grid(), flow.sides(), solids, lanes));
        return projection.lastIterations();
    }

    private static long processorNanos() {
        return ManagementFactory.getThreadMXBean().getCurrentThreadCpuTime();
    }
}

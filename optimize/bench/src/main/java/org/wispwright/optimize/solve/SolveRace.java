package org.wispwright.optimize.solve;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.force.Band;
import org.wispwright.optimize.force.ForceBasis;
import org.wispwright.optimize.force.ForceModel;
import org.wispwright.optimize.force.FreeForce;
import org.wispwright.optimize.force.HandleForce;
import org.wispwright.optimize.force.PotentialForce;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;

/**
 * How fast does the solve come down beside what else a practitioner would try, on the same loss and the same simulator? One thread, so that
 * processor seconds are what a quiet machine would take.
 * <p>Run: {@code java -cp optimize/bench/target/bench.jar org.wispwright.optimize.solve.SolveRace LEAN OWN 32 60}: scene
 * ({@link RaceScene}), method ({@link Method}, for FREE a colon and its Tikhonov share), cells along x, processor seconds. Points go to
 * {@code optimize/bench/target/race/}; pictures of them are made by {@link RacePlot}.
 */
public final class SolveRace {
    static final Path FOLDER = Path.of("optimize", "bench", "target", "race");
    /** Shares that were tried for FREE; see docs/benchmarks.md. */
    private static final double FREE_SHARE = 0.002;
    private static final int FREE_PAIRS = 5;
    private static final int CHECKED_CELLS = 16;

    private SolveRace() { }

    /** Who runs. */
    enum Method {
        /** The project's solve: rungs and bands. */ OWN("rungs and bands"),
        /** A free force in every face and frame. */ FREE("free force"),
        /** Force handles placed by hand, tuned without gradients. */ HANDLES("handles, no gradient"),
        /** The project's modes on the full grid, all bands open at once. */ MODES("all bands, no rungs"),
        /** The same, low bands first. */ BANDS("low to high, no rungs"),
        /** Vector potentials on lattices that get finer. */ LATTICE("finer lattices");

        private final String words;

        Method(String words) {
            this.words = words;
        }

        /** For a legend. */
        String words() {
            return words;
        }
    }

    /** Prints points and a row. @param args scene, method[:share], cells along x, processor seconds (600 if left out) */
    public static void main(String[] args) throws IOException {
        RaceScene scene = RaceScene.valueOf(args[0]);
        String[] how = args[1].split(":");
        Method method = Method.valueOf(how[0]);
        double share = how.length > 1 ? Double.parseDouble(how[1]) : FREE_SHARE;
        int n = Integer.parseInt(args[2]);
        double seconds = args.length > 3 ? Double.parseDouble(args[3]) : 600;
        try (Lanes lanes = new Lanes(1)) {
            SolveProblem small = scene.problem(CHECKED_CELLS);
            ModelCheck.run(small, model(method, small.flow(), lanes), lanes);
            RaceCurve curve = new RaceCurve(seconds);
            run(method, share, scene.problem(n), curve, lanes);
            Files.createDirectories(FOLDER);
            curve.write(FOLDER.resolve(String.format(Locale.ROOT, "%s-%d-%s.csv", scene, n, args[1].replace(':', '-'))));
            System.out.println(scene + " " + n + " | " + args[1] + " | " + curve.summary());
        }
    }

    private static ForceModel model(Method method, FlowSetup flow, Lanes lanes) {
        int steps = flow.frames().count() - 1;
        return switch (method) {
            case FREE -> new FreeForce(flow.grid(), steps);
            case HANDLES -> new HandleForce(flow.grid(), steps, GuessLoop.handles(flow.grid()));
            case LATTICE -> new PotentialForce(flow.grid(), steps);
            case OWN, BANDS, MODES -> Solve.basis(flow, lanes);
        };
    }

    private static void run(Method method, double share, SolveProblem problem, RaceCurve curve, Lanes lanes) {
        if (method == Method.OWN || method == Method.BANDS) {
            solve(problem, method == Method.OWN, curve, lanes);
            return;
        }
        ForceModel model = model(method, problem.flow(), lanes);
        RaceTrack track = new RaceTrack(problem, model, curve, lanes);
        switch (method) {
            case FREE -> {
                double norm = track.forceOfCells(4);
                track.descend(List.of(model.unknowns()), 2 * share * track.startLoss() / (norm * norm), FREE_PAIRS);
            }
            case HANDLES -> GuessLoop.run(track, model.unknowns());
            case LATTICE -> track.descend(((PotentialForce) model).openings(), -1, Solve.PAIRS);
            default -> {
                List<Band> bands = Solve.bands(problem.flow());
                ForceBasis basis = (ForceBasis) model;
                track.descend(List.of(basis.unknowns(Solve.open(bands, problem.flow().grid()))), -1, Solve.PAIRS);
            }
        }
    }

    private static void solve(SolveProblem problem, boolean rungs, RaceCurve curve, Lanes lanes) {
        List<GridShape> climb = rungs ? Solve.rungs(problem.flow().grid()) : List.of(problem.flow().grid());
        int[] gradients = new int[1];
        double[] fullGrid = new double[1];
        try {
            new Solve(problem, climb, true, lanes, curve::isOver).run(RaceTrack.MEMORY, StopRule.OWN, progress -> {
                double share = (double) climb.get(progress.rung() - 1).cells() / problem.flow().grid().cells();
                fullGrid[0] += share * (progress.gradients() - gradients[0]);
                gradients[0] = progress.gradients();
                if (progress.rung() == progress.rungs()) {
                    curve.point(gradients[0], fullGrid[0], 0, progress.met());
                }
            });
        } catch (SolveCancelled over) {
            return;
        }
    }
}

package org.wispwright.optimize.solve;

import com.sun.management.OperatingSystemMXBean;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * One runner's way down: the least loss so far against wall seconds, processor seconds and counts. Loss is the mean over the notes of
 * (pyramid loss now / for the original), on the shot's own grid.
 */
final class RaceCurve {
    /** Once a runner is here it may stop. */
    static final double ENOUGH = 0.02;
    private static final OperatingSystemMXBean SYSTEM = (OperatingSystemMXBean) ManagementFactory.getOperatingSystemMXBean();
    private static final String HEAD = "wall_s,processor_s,gradients,full_grid_gradients,forward_runs,loss";

    private final long wallFrom = System.nanoTime();
    private final long processorFrom = SYSTEM.getProcessCpuTime();
    private final double limit;
    private final List<Point> points = new ArrayList<>();
    private double least = 1;

    /**
     * A new least loss.
     *
     * @param wall        seconds since the start
     * @param processor   seconds of all threads since the start
     * @param gradients   computed so far, on any rung
     * @param fullGrid    the same, each counted as its rung's share of the shot's cells: work that no neighbour on the machine disturbs
     * @param forwardRuns without a gradient, so far
     */
    record Point(double wall, double processor, int gradients, double fullGrid, int forwardRuns, double loss) { }

    /** Starts the clocks. @param limit processor seconds after which the runner is stopped */
    RaceCurve(double limit) {
        this.limit = limit;
    }

    private double wall() {
        return (System.nanoTime() - wallFrom) / 1e9;
    }

    private double processor() {
        return (SYSTEM.getProcessCpuTime() - processorFrom) / 1e9;
    }

    /** Notes where a runner is, if that is lower than ever. */
    void point(int gradients, double fullGrid, int forwardRuns, List<Double> met) {
        double loss = 1 - met.stream().mapToDouble(m -> m).average().orElseThrow();
        if (points.isEmpty() || loss < least) {
            least = loss;
            points.add(new Point(wall(), processor(), gradients, fullGrid, forwardRuns, loss));
            System.out.println(row(points.get(points.size() - 1)));
        }
    }

    /** True once the time is over or the loss low enough. */
    boolean isOver() {
        return least <= ENOUGH || processor() > limit;
    }

    /** The first point that is as low as this. */
    Optional<Point> reached(double loss) {
        return points.stream().filter(p -> p.loss <= loss).findFirst();
    }

    private static String row(Point p) {
        return String.format(Locale.ROOT, "%.2f,%.2f,%d,%.1f,%d,%.5f", p.wall, p.processor, p.gradients, p.fullGrid, p.forwardRuns, p.loss);
    }

    /** Writes the points as CSV. */
    void write(Path file) throws IOException {
        List<String> lines = new ArrayList<>(List.of(HEAD));
        points.forEach(p -> lines.add(row(p)));
        Files.write(file, lines);
    }

    /** The row of a table: processor seconds (gradients of the full grid, or forward runs) to 0.1, 0.05 and 0.03, and where it ended. */
    String summary() {
        StringBuilder out = new StringBuilder();
        for (double loss : new double[] {0.1, 0.05, 0.03}) {
            out.append(reached(loss).map(p -> String.format(Locale.ROOT, "%.1f (%.1f) | ", p.processor, p.fullGrid + p.forwardRuns))
                    .orElse("- | "));
        }
        return out + String.format(Locale.ROOT, "%.4f after %.0f s, %.0f s of wall time", least, processor(), wall());
    }
}

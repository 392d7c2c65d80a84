package org.wispwright.optimize.solve;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * Draws the curves of a scene and a size as SVG: least loss so far, 1 to 0.01, against processor seconds, both on log scales. A curve that
 * begins late is of a runner that was on lower rungs before.
 * <p>Run: {@code java -cp optimize/bench/target/bench.jar org.wispwright.optimize.solve.RacePlot LEAN 32 docs/pictures/race-lean-32.svg}
 */
public final class RacePlot {
    private static final int WIDTH = 760;
    private static final int HEIGHT = 460;
    private static final int LEFT = 60;
    private static final int RIGHT = 170;
    private static final int EDGE = 30;
    private static final double LEAST_LOSS = 0.01;
    private static final double LEAST_SECONDS = 0.5;
    private static final double MOST_SECONDS = 500;
    private static final String[] COLOURS = {"#b2182b", "#2166ac", "#4d4d4d", "#e08214", "#1b7837", "#762a83"};

    private RacePlot() { }

    /** Writes the picture. @param args scene, cells along x, SVG file */
    public static void main(String[] args) throws IOException {
        List<String> svg = new ArrayList<>();
        svg.add(String.format(Locale.ROOT, "<svg xmlns=\"http://www.w3.org/2000/svg\" width=\"%d\" height=\"%d\" font-family=\"sans-serif\""
                + " font-size=\"12\"><rect width=\"100%%\" height=\"100%%\" fill=\"white\"/>", WIDTH, HEIGHT));
        for (double loss : new double[] {1, 0.5, 0.2, 0.1, 0.05, 0.03, 0.02, 0.01}) {
            line(svg, LEFT, y(loss), WIDTH - RIGHT, y(loss));
            text(svg, LEFT - 6, y(loss) + 4, "end", "black", "" + loss);
        }
        for (double seconds : new double[] {0.5, 1, 2, 5, 10, 20, 50, 100, 200, 500}) {
            line(svg, x(seconds), EDGE, x(seconds), HEIGHT - 2 * EDGE);
            text(svg, x(seconds), HEIGHT - 2 * EDGE + 16, "middle", "black", "" + seconds);
        }
        text(svg, LEFT, EDGE - 10, "start", "black", "loss, share of the original's: " + args[0] + ", " + args[1] + " cells along x");
        text(svg, WIDTH - RIGHT, HEIGHT - EDGE + 8, "end", "black", "processor seconds");
        SolveRace.Method[] methods = SolveRace.Method.values();
        for (int m = 0; m < methods.length; m++) {
            Path file = SolveRace.FOLDER.resolve(args[0] + "-" + args[1] + "-" + methods[m] + ".csv");
            if (Files.exists(file)) {
                curve(svg, Files.readAllLines(file), COLOURS[m]);
                text(svg, WIDTH - RIGHT + 14, EDGE + 20 * (m + 1), "start", COLOURS[m], methods[m].words());
            }
        }
        svg.add("</svg>");
        Files.write(Path.of(args[2]), svg);
    }

    private static void curve(List<String> svg, List<String> lines, String colour) {
        StringBuilder points = new StringBuilder();
        for (String line : lines.subList(1, lines.size())) {
            String[] cells = line.split(",");
            points.append(String.format(Locale.ROOT, "%.1f,%.1f ", x(Double.parseDouble(cells[1])),
                    y(Double.parseDouble(cells[cells.length - 1]))));
        }
        svg.add("<polyline fill=\"none\" stroke=\"" + colour + "\" stroke-width=\"2\" points=\"" + points.toString().strip() + "\"/>");
    }

    private static double x(double seconds) {
        double share = Math.log(Math.max(seconds, LEAST_SECONDS) / LEAST_SECONDS) / Math.log(MOST_SECONDS / LEAST_SECONDS);
        return LEFT + share * (WIDTH - LEFT - RIGHT);
    }

    private static double y(double loss) {
        double share = Math.log(Math.max(loss, LEAST_LOSS)) / Math.log(LEAST_LOSS);
        return EDGE + share * (HEIGHT - 3 * EDGE);
    }

    private static void line(List<String> svg, double x0, double y0, double x1, double y1) {
        svg.add(String.format(Locale.ROOT, "<line x1=\"%.1f\" y1=\"%.1f\" x2=\"%.1f\" y2=\"%.1f\" stroke=\"#ddd\"/>", x0, y0, x1, y1));
    }

    private static void text(List<String> svg, double x, double y, String anchor, String colour, String words) {
        svg.add(String.format(Locale.ROOT, "<text x=\"%.1f\" y=\"%.1f\" text-anchor=\"%s\" fill=\"%s\">%s</text>", x, y, anchor, colour,
                words));
    }
}

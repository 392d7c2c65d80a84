package org.wispwright.bench;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
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
import org.openjdk.jmh.annotations.Warmup;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Pressure;
import org.wispwright.warp.matte.Sweep;
import org.wispwright.warp.matte.Window;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.retouch.Canvas;
import org.wispwright.warp.retouch.LiveStroke;
import org.wispwright.warp.retouch.Operation;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Retoucher;
import org.wispwright.warp.retouch.Stroke;

/**
 * Can a hand be followed at 1920x1080 with a brush of 120 pixels radius? A dab within 2 ms, the pixels of a piece of a stroke within 8 ms,
 * 40 mixed strokes applied anew within 250 ms; medians and worst, one thread. Both sides: the stroke drawn and the stroke laid have the
 * same bits.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.SampleTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class BrushBench {
    private static final double ASPECT = 1920.0 / 1080;
    private static final double RADIUS = 120.0 / 1080;
    private static final int PIECES = 120;

    /** The brush; {@link #fortyStrokes} does not depend on it. */
    @Param({"ADD", "REMOVE", "SOFTEN", "RESTORE", "PUSH", "EVEN", "LIFT"})
    public Brush brush;

    private Picture original;
    private Canvas canvas;
    private LiveStroke live;
    private Retouch forty;
    private int dabs;
    private int pieces;

    /** Paints smoke; then both sides. */
    @Setup(Level.Trial)
    public void sameBitsFirst() {
        original = RetouchBench.puff(1920, 1080);
        canvas = new Canvas(original);
        live = null;
        pieces = 0;
        // A first stroke, so that restore has something to bring back.
        Stroke first = new Stroke(Brush.REMOVE, 0.3, 0.5, 0.5, List.of(new Point(0.9, 0.5)), Optional.empty());
        canvas.apply(first);
        for (int n = 0; n < 30; n++) {
            oneSegment();
        }
        Stroke drawn = live.end();
        live = null;
        if (!Arrays.equals(Retoucher.wanted(new Retouch(List.of(first, drawn)), original).rgba(), canvas.picture().rgba())) {
            throw new IllegalStateException("brush bench: " + brush + " drawn and laid differ");
        }
        forty = new Retouch(strokes());
    }

    /** All brushes, radii of 20 to 120 pixels, lines of 400 to 1,100 pixels of 12 to 60 points, a third with pressure. */
    private static List<Operation> strokes() {
        List<Operation> strokes = new ArrayList<>();
        for (int n = 0; n < 40; n++) {
            int points = 12 + 12 * (n % 5);
            List<Point> line = new ArrayList<>();
            List<Double> pressure = new ArrayList<>();
            for (int k = 0; k < points; k++) {
                double t = (double) k / (points - 1);
                line.add(new Point(0.3 + 0.025 * n + (0.1 + 0.02 * (n % 7)) * Math.sin(4 * t + n), 0.2 + 0.6 * (0.37 * n % 1) + 0.4 * (t - 0.5)));
                pressure.add(0.6 + 0.4 * Math.sin(6 * t + n));
            }
            Pressure told = n % 3 == 0 ? new Pressure(Pressure.On.values()[n / 3 % 3], pressure) : Pressure.FULL;
            strokes.add(new Stroke(Brush.values()[n % 7], new Sweep((20 + 100 * (0.61 * n % 1)) / 1080, 0.7, 0.5, line, told, 0),
                    Optional.empty()));
        }
        return strokes;
    }

    /** One dab on a canvas that has seen strokes before: coverage, surroundings, pixels, and made part of the picture. */
    @Benchmark
    public Stroke dab() {
        if (live != null) {
            live.end();
            live = null;
        }
        dabs++;
        Point place = new Point(0.4 + 1.0 * (0.618 * dabs % 1), 0.2 + 0.6 * (0.382 * dabs % 1));
        return canvas.begin(new Stroke(brush, RADIUS, 0.3, 0.5, List.of(place), Optional.empty())).end();
    }

    /** The line goes on by three points, 24 pixels in all, with pressure, and the pixels are new; a new line every {@value #PIECES}. */
    @Benchmark
    public Optional<Window> segment() {
        return oneSegment();
    }

    private Optional<Window> oneSegment() {
        if (pieces++ % PIECES == 0 || live == null) {
            if (live != null) {
                live.end();
            }
            live = canvas.begin(new Stroke(brush, new Sweep(RADIUS, 0.3, 0.5, List.of(place(0)), new Pressure(Pressure.On.STRENGTH,
                    List.of(0.5)), 0), Optional.empty()));
        }
        int n = 3 * (pieces % PIECES);
        return live.extend(List.of(place(n + 1), place(n + 2), place(n + 3)), List.of(press(n + 1), press(n + 2), press(n + 3)));
    }

    private static Point place(int n) {
        return new Point(ASPECT / 2 + 0.45 * Math.sin(0.016 * n), 0.5 + 0.3 * Math.sin(0.009 * n));
    }

    private static double press(int n) {
        return 0.6 + 0.4 * Math.sin(0.03 * n);
    }

    /** Forty strokes of all brushes on a new canvas, the copy of the picture included. */
    @Benchmark
    public Picture fortyStrokes() {
        return Retoucher.wanted(forty, original);
    }

    /** One dab on a picture that nothing is known of, its copy included. */
    @Benchmark
    public Picture firstDab() {
        return Retoucher.wanted(new Retouch(List.of(new Stroke(brush, RADIUS, 0.3, 0.5, List.of(new Point(0.9, 0.5)), Optional.empty()))),
                original);
    }
}

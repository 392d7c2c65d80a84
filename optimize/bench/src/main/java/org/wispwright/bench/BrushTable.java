package org.wispwright.bench;

import java.lang.management.ManagementFactory;
import java.lang.management.ThreadMXBean;
import java.util.Arrays;
import java.util.Locale;
import org.wispwright.warp.retouch.Brush;

/**
 * {@link BrushBench} in the processor time of the one thread that works, for a machine that others use too: median and worst, milliseconds.
 * Time that other programs take does not count, the caches that they empty do.
 */
public final class BrushTable {
    private BrushTable() {
    }

    /** Prints the table. @param arguments how many samples to take after as many, and two seconds, to warm up; 200 if there is none */
    public static void main(String[] arguments) {
        int samples = arguments.length > 0 ? Integer.parseInt(arguments[0]) : 200;
        System.out.println("| brush | dab | piece | first dab |\n|---|---|---|---|");
        BrushBench bench = new BrushBench();
        for (Brush brush : Brush.values()) {
            bench.brush = brush;
            bench.sameBitsFirst();
            System.out.println("| " + brush + " | " + row(bench::dab, samples) + " | " + row(bench::segment, samples) + " | "
                    + row(bench::firstDab, Math.max(5, samples / 10)) + " |");
        }
        System.out.println("forty strokes: " + row(bench::fortyStrokes, Math.max(5, samples / 20)));
    }

    private static String row(Runnable what, int samples) {
        ThreadMXBean threads = ManagementFactory.getThreadMXBean();
        double[] took = new double[samples];
        long warm = threads.getCurrentThreadCpuTime() + 2_000_000_000L;
        while (threads.getCurrentThreadCpuTime() < warm) {
            what.run();
        }
        for (int n = -samples; n < samples; n++) {
            long before = threads.getCurrentThreadCpuTime();
            what.run();
            took[Math.max(0, n)] = (threads.getCurrentThreadCpuTime() - before) / 1e6;
        }
        Arrays.sort(took);
        return String.format(Locale.ROOT, "%.2f / %.1f", took[samples / 2], took[samples - 1]);
    }
}

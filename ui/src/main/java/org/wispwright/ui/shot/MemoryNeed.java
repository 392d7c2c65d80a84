package org.wispwright.ui.shot;

import com.sun.management.HotSpotDiagnosticMXBean;
import java.lang.management.ManagementFactory;
import java.util.Locale;
import java.util.Optional;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.solve.Solve;
import org.wispwright.render.volume.GridShape;

/**
 * How much memory a solve takes at the least, so that a shot that cannot fit is refused before work starts.
 * <p>{@code bytes = BASE + cells * (STATE * states + STEP + SEARCH)}: a state is density and three face components, 16 bytes a cell;
 * states are kept at {@code ceil(log2(steps)) + 1} moments (binomial placement, Griewank and Walther 2000, needs no more
 * for a bounded number of repeats); one step on tape, its pullback and a picture's fields take STEP a cell; the search's pairs SEARCH,
 * counted exactly from the unknowns where they are known ({@link Solve#searchBytes}). More memory makes a solve quicker, not better.
 */
public final class MemoryNeed {
    /** The program itself, pictures and notes. */
    static final long BASE = 96L << 20;
    /** Bytes a cell of one kept state. */
    static final long STATE = 16;
    /**
     * Bytes a cell of everything that is there once. Counted: four states of the chain and the start 80, two forces 24, the solver's
     * adjoint 16, departures 48, pressure 12; the march of one view with its light 26; waves of the force about 6.
     */
    static final long STEP = 212;
    /** Bytes a cell of the search's pairs where the unknowns are not counted yet: 0.43 a cell, those of a cube of 128. */
    static final long SEARCH = 160;
    /** Bytes a cell of a plain run: three states, a force, paths and pressure. */
    static final long RUN = 110;
    /** Of the heap, what is left to the collector: 1 part in so many. */
    private static final long COLLECTORS_PART = 16;

    /** Bytes a pixel of a picture that is drawn: 16 for its values, 60 for its rays, and its file. */
    static final long PIXEL = 80;

    /** Bytes a cell of what solids add: their cells, links and pockets, and the search for their pressure. */
    static final long SOLIDS = 40;

    private MemoryNeed() {
    }

    /** Least bytes for a solve of so many cells and solver steps. Never overflows for cells up to 2^40. */
    public static long bytes(long cells, long steps) {
        return BASE + cells * bytesACell(steps);
    }

    /** Least bytes for a solve of a shot that is known, its unknowns counted. */
    public static long bytes(FlowSetup flow) {
        return ofSearchAndStep(flow) + SmokeState.bytes(flow.grid()) * states((long) flow.frames().count() * flow.substeps()) + ofMore(flow);
    }

    /**
     * What of the memory given is left for the states that a sweep keeps; at least what {@link #bytes} counts for them. The collector
     * keeps a large array in whole regions, the last of them unused to its end, and needs some room to work: both are left to it.
     *
     * @param region bytes of the collector's regions, see {@link #region}; 0 for a collector without
     */
    public static long forStates(FlowSetup flow, long memoryBytes, long region) {
        long least = SmokeState.bytes(flow) * states((long) flow.frames().count() * flow.substeps());
        double waste = waste(4L * flow.grid().cells(), region);
        double left = memoryBytes - memoryBytes / COLLECTORS_PART - waste * (ofSearchAndStep(flow) - BASE) - BASE - ofMore(flow);
        return Math.max(least, (long) (left / waste));
    }

    /**
     * What a solve that climbs to a grid holds at once: the search there with so many states, or the run of its take on the shot's own
     * grid, whichever is more.
     */
    public static long ofSolve(FlowSetup flow, GridShape top, int states) {
        FlowSetup there = flow.on(top);
        long unknowns = Solve.unknowns(flow, top);
        long search = besidesStates(top) + Solve.searchBytes(unknowns) + ofMore(there) + states * SmokeState.bytes(there);
        long run = BASE + RUN * flow.grid().cells() + ofSolids(flow.grid().cells(), !flow.obstacles().isEmpty());
        return Math.max(search, run);
    }

    /** Heap that an array of so many bytes takes, as a multiple: an array of half a region or more has whole regions to itself. */
    static double waste(long arrayBytes, long region) {
        long held = arrayBytes + 16;
        return region == 0 || held < region / 2 ? 1 : (held + region - 1) / region * region / (double) arrayBytes;
    }

    /** Bytes of the regions of this Java's collector; 0 if it has none. */
    public static long region() {
        HotSpotDiagnosticMXBean machine = ManagementFactory.getPlatformMXBean(HotSpotDiagnosticMXBean.class);
        boolean regions = machine != null && Boolean.parseBoolean(machine.getVMOption("UseG1GC").getValue());
        return regions ? Long.parseLong(machine.getVMOption("G1HeapRegionSize").getValue()) : 0;
    }

    private static long ofSearchAndStep(FlowSetup flow) {
        return besidesStates(flow.grid()) + Solve.searchBytes(Solve.unknowns(flow));
    }

    /** Bytes that a gradient takes beside the states it keeps and the search. */
    public static long besidesStates(GridShape grid) {
        return BASE + grid.cells() * STEP;
    }

    /** What a temperature takes beside all that, if there is one: a field in every state, and four at once. */
    static long ofTemperature(long cells, long steps, boolean any) {
        return any ? cells * STATE * (states(steps) + 4) / 4 : 0;
    }

    /** What solids take beside all that, if there are any. */
    static long ofSolids(long cells, boolean any) {
        return any ? SOLIDS * cells : 0;
    }

    /** What a shot's solids and temperature take beside all that. */
    public static long ofMore(FlowSetup flow) {
        long cells = flow.grid().cells();
        return ofSolids(cells, !flow.obstacles().isEmpty())
                + ofTemperature(cells, (long) flow.frames().count() * flow.substeps(), flow.heat().isCarried());
    }

    /** Least bytes to hold one picture of so many pixels, draw it and write it: 80 bytes a pixel. */
    static long ofPicture(long pixels) {
        return BASE / 4 + PIXEL * Math.min(pixels, 1L << 40);
    }

    /**
     * The largest grid of the same proportions that fits, if there is one of at least 4 cells along x and y: fewer cells by
     * the same factor along every axis.
     *
     * @param cells numbers of cells along x, y and z; nz = 1 stays 1
     * @return the same for what fits
     */
    static Optional<int[]> fitting(int[] cells, long steps, long memoryBytes) {
        double most = (double) (memoryBytes - BASE) / bytesACell(steps);
        boolean plane = cells[2] == 1;
        double ratio = most / ((double) cells[0] * cells[1] * cells[2]);
        double scale = ratio <= 0 ? 0 : plane ? Math.sqrt(ratio) : Math.cbrt(ratio);
        int[] fit = {(int) (cells[0] * scale), (int) (cells[1] * scale), plane ? 1 : (int) (cells[2] * scale)};
        for (int axis = 0; axis < 3; axis++) {
            // Whole fours: round numbers for people, and quicker transforms.
            fit[axis] = fit[axis] >= 16 ? fit[axis] / 4 * 4 : fit[axis];
        }
        return fit[0] < 4 || fit[1] < 4 || fit[2] < 1 ? Optional.empty() : Optional.of(fit);
    }

    /** Refuses a grid that does not fit. @throws ShotException saying how much it needs and what would fit */
    static void require(JsonPlace place, int[] cells, double cellMetres, long steps, long memoryBytes) {
        long need = bytes((long) cells[0] * cells[1] * cells[2], steps);
        if (need <= memoryBytes) {
            return;
        }
        String smaller = fitting(cells, steps, memoryBytes)
                .map(f -> "make it " + f[0] + " x " + f[1] + " x " + f[2] + " cells of "
                        + String.format(Locale.ROOT, "%.3g", cellMetres * cells[0] / f[0]) + " m, ")
                .orElse("");
        throw place.fault("a grid of " + cells[0] + " x " + cells[1] + " x " + cells[2] + " cells, whose solve takes " + inWords(need),
                "one that fits into " + inWords(memoryBytes), smaller + (smaller.isEmpty() ? "" : "or ") + giveMore(need));
    }

    /** The way out by more memory, in whole GiB. */
    static String giveMore(long need) {
        long whole = (need >> 30) + 1;
        return "give more memory (java -Xmx" + whole + "g and --memory " + whole + "G)";
    }

    /** Bytes for people: "2.0 GiB". */
    public static String inWords(long bytes) {
        if (bytes < 1L << 20) {
            return String.format(Locale.ROOT, "%.1f KiB", bytes / 1024.0);
        }
        return bytes < 1L << 30 ? String.format(Locale.ROOT, "%.1f MiB", bytes / (double) (1 << 20))
                : String.format(Locale.ROOT, "%.1f GiB", bytes / (double) (1 << 30));
    }

    private static long bytesACell(long solverSteps) {
        return STATE * states(solverSteps) + STEP + SEARCH;
    }

    private static long states(long solverSteps) {
        return 65 - Long.numberOfLeadingZeros(Math.max(2, solverSteps) - 1);
    }
}

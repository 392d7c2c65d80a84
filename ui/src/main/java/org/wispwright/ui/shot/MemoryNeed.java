package org.wispwright.ui.shot;

import java.util.Locale;
import java.util.Optional;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.flow.FrameRange;
import org.wispwright.render.volume.GridShape;

/**
 * How much memory a solve takes at the least, so that a shot that cannot fit is refused before work starts.
 * <p>{@code bytes = BASE + cells * (STATE * states + STEP)}: a state is density and three face components, 16 bytes a cell;
 * states are kept at {@code ceil(log2(steps)) + 1} moments (binomial placement, Griewank and Walther 2000, needs no more
 * for a bounded number of repeats); one step on tape, its pullback and the search's fields take STEP a cell. More memory
 * makes a solve quicker, not better.
 */
public final class MemoryNeed {
    /** The program itself, pictures and notes. */
    static final long BASE = 96L << 20;
    /** Bytes a cell of one kept state. */
    static final long STATE = 16;
    /** Bytes a cell of everything that is there once: 48 float fields. */
    static final long STEP = 192;

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

    /** Least bytes for a solve. */
    public static long bytes(GridShape grid, FrameRange frames, int substeps) {
        return bytes(grid.cells(), (long) frames.count() * substeps);
    }

    /** What of the memory given is left for the states that a sweep keeps; at least what {@link #bytes} counts for them. */
    public static long forStates(GridShape grid, FrameRange frames, int substeps, long memoryBytes) {
        long least = bytes(grid, frames, substeps) - besidesStates(grid);
        return Math.max(least, memoryBytes - besidesStates(grid));
    }

    /** Bytes that a gradient takes beside the states it keeps. */
    public static long besidesStates(GridShape grid) {
        return BASE + grid.cells() * STEP;
    }

    /** What a temperature takes beside all that, if there is one: a field in every state, and four at once. */
    static long ofTemperature(long cells, long steps, boolean any) {
        return any ? cells * (bytesACell(steps) - STEP + 4 * STATE) / 4 : 0;
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
        long steps = Math.max(2, solverSteps);
        long states = 65 - Long.numberOfLeadingZeros(steps - 1);
        return STATE * states + STEP;
    }
}

package org.wispwright.warp.retouch;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Objects;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Cover;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Window;

/**
 * One stroke at work on a picture, whole or while it grows; the formulas are those of {@link Brush}. Works in tiles of
 * {@value Gaussian#TILE} pixels a side, and only in those that the line reaches.
 * <p>What a pixel becomes depends on the picture before the stroke, on the line so far, and on nothing else: so a stroke that was drawn
 * point by point leaves the bits of the same stroke laid at once.
 */
final class Brushwork {
    /** Width of the blur of {@link Brush#SOFTEN}: standard deviation as a share of the stroke's radius. */
    static final double SOFTEN_SIGMA = 0.5;
    /** Narrowest kernel for the colour of added smoke, as a share of the stroke's radius. */
    static final double COLOUR_SIGMA = 0.5;
    private static final int TILE = Gaussian.TILE;

    private final Stroke stroke;
    private final Picture original;
    private final Picture before;
    private final int tilesAcross;
    private final Cover cover;
    private final Spare spare;
    private final Surroundings surroundings;
    private final Push push;
    private final float[][] mattes;
    /** By tile, the window of it that was worked on so far; null for none. */
    private final Window[] worked;
    private Point last;
    private double lastPressure;

    /**
     * A stroke without a point yet.
     *
     * @param stroke   gives brush, radius and all else but the line
     * @param original the picture before the retouch's first operation: read
     * @param before   the picture before this stroke: read
     * @param blocks   those of {@code before}
     * @param window   the part that the line may reach
     * @param coverage one a pixel of the window, all 0: overwritten
     * @param spare    where arrays come from, and go to when {@link #over} is called
     */
    Brushwork(Stroke stroke, Picture original, Picture before, Blocks blocks, Window window, float[] coverage, Spare spare) {
        this.stroke = stroke;
        this.original = original;
        this.before = before;
        tilesAcross = (before.width() + TILE - 1) / TILE;
        int tiles = tilesAcross * ((before.height() + TILE - 1) / TILE);
        cover = new Cover(stroke.sweep(), before.height(), window, coverage);
        this.spare = spare;
        surroundings = new Surroundings(stroke, before, blocks, tiles, spare);
        push = stroke.brush() == Brush.PUSH ? new Push(stroke.sweep(), before, spare) : null;
        mattes = stroke.within().isPresent() ? new float[tiles][] : null;
        worked = new Window[tiles];
    }

    /** The window of a raster that a line's points may reach with a radius in heights; null if it lies beyond the raster. */
    static Window reached(List<Point> line, double radius, int width, int height) {
        double left = Double.POSITIVE_INFINITY;
        double right = Double.NEGATIVE_INFINITY;
        double top = Double.POSITIVE_INFINITY;
        double bottom = Double.NEGATIVE_INFINITY;
        for (Point p : line) {
            left = Math.min(left, p.x());
            right = Math.max(right, p.x());
            top = Math.min(top, p.y());
            bottom = Math.max(bottom, p.y());
        }
        // A pixel more, for the edge that is never narrower than one.
        int x0 = (int) Math.max(0, Math.floor((left - radius) * height) - 1);
        int y0 = (int) Math.max(0, Math.floor((top - radius) * height) - 1);
        int x1 = (int) Math.min(width - 1, Math.ceil((right + radius) * height) + 1);
        int y1 = (int) Math.min(height - 1, Math.ceil((bottom + radius) * height) + 1);
        return x0 > x1 || y0 > y1 ? null : new Window(x0, y0, x1 - x0 + 1, y1 - y0 + 1);
    }

    /** The line goes on. */
    void extend(Point point, double pressure) {
        cover.extend(point, pressure);
        if (push != null && last != null) {
            push.extend(last, lastPressure, point, pressure);
        }
        last = point;
        lastPressure = pressure;
    }

    /** The stroke is done. */
    void over() {
        surroundings.over();
        if (push != null) {
            push.over();
        }
    }

    /** Windows that hold all pixels with coverage in what was refreshed so far; no two share a pixel. */
    List<Window> worked() {
        return Arrays.stream(worked).filter(Objects::nonNull).toList();
    }

    /** Writes the pixels of a window as the line so far leaves them; {@code picture} may be the picture before the stroke itself. */
    void refresh(Window window, Picture picture) {
        boolean once = picture == before;
        List<Window> parts = new ArrayList<>();
        List<float[]> results = new ArrayList<>();
        float[] coverage = spare.floats(1);
        for (int ty = window.top() / TILE; ty <= (window.top() + window.height() - 1) / TILE; ty++) {
            for (int tx = window.left() / TILE; tx <= (window.left() + window.width() - 1) / TILE; tx++) {
                Window part = common(window, tx, ty);
                cover.read(part, coverage);
                boolean covered = anything(coverage, part.pixels());
                if (!covered) {
                    if (!once) {
                        copy(part, picture);
                    }
                    continue;
                }
                int tile = tx + tilesAcross * ty;
                worked[tile] = worked[tile] == null ? part : worked[tile].around(part);
                float[] out = spare.floats(4);
                read(before, part, out);
                within(coverage, part, tx, ty);
                work(tx, ty, part, coverage, out);
                if (once) {
                    surroundings.done(tile);
                }
                if (once && looksAround()) {
                    // Later tiles still look at what was here.
                    parts.add(part);
                    results.add(out);
                } else {
                    write(out, part, picture);
                    spare.back(out);
                }
            }
        }
        for (int n = 0; n < parts.size(); n++) {
            write(results.get(n), parts.get(n), picture);
            spare.back(results.get(n));
        }
        spare.back(coverage);
    }

    /** Whether pixels are read beyond the tile at hand while the stroke is at work. */
    private boolean looksAround() {
        return switch (stroke.brush()) {
            case ADD, REMOVE, RESTORE -> false;
            case SOFTEN, PUSH, EVEN, LIFT -> true;
        };
    }

    private void work(int tx, int ty, Window part, float[] coverage, float[] out) {
        int tile = tx + tilesAcross * ty;
        switch (stroke.brush()) {
            case ADD -> add(part, coverage, surroundings.colour(tx, ty, tile), out);
            case REMOVE -> remove(part.pixels(), coverage, out);
            case SOFTEN -> soften(part, coverage, surroundings.blurred(tx, ty, tile), out);
            case RESTORE -> restore(part, coverage, out);
            case PUSH -> push.move(part, coverage, out);
            case EVEN -> LocalContrast.apply(part, coverage, surroundings.blurred(tx, ty, tile), surroundings.colour(tx, ty, tile), -1,
                    out);
            case LIFT -> LocalContrast.apply(part, coverage, surroundings.blurred(tx, ty, tile), surroundings.colour(tx, ty, tile), 1, out);
        }
    }

    private static void add(Window part, float[] coverage, float[] colour, float[] out) {
        for (int j = 0, n = 0; j < part.height(); j++) {
            int at = inTile(part, j);
            for (int i = 0; i < part.width(); i++, n++, at++) {
                float more = coverage[n] * (1 - out[4 * n + 3]);
                if (more > 0) {
                    out[4 * n] += more * colour[3 * at];
                    out[4 * n + 1] += more * colour[3 * at + 1];
                    out[4 * n + 2] += more * colour[3 * at + 2];
                    out[4 * n + 3] = Math.min(1f, out[4 * n + 3] + more);
                }
            }
        }
    }

    private static void remove(int pixels, float[] coverage, float[] out) {
        for (int n = 0; n < pixels; n++) {
            if (coverage[n] > 0) {
                float stays = 1 - coverage[n];
                out[4 * n] *= stays;
                out[4 * n + 1] *= stays;
                out[4 * n + 2] *= stays;
                out[4 * n + 3] *= stays;
            }
        }
    }

    private static void soften(Window part, float[] coverage, float[] blurred, float[] out) {
        for (int j = 0, n = 0; j < part.height(); j++) {
            int at = inTile(part, j);
            for (int i = 0; i < part.width(); i++, n++, at++) {
                float m = coverage[n];
                if (m > 0) {
                    out[4 * n] += m * (blurred[4 * at] - out[4 * n]);
                    out[4 * n + 1] += m * (blurred[4 * at + 1] - out[4 * n + 1]);
                    out[4 * n + 2] += m * (blurred[4 * at + 2] - out[4 * n + 2]);
                    out[4 * n + 3] = Math.min(1f, out[4 * n + 3] + m * (blurred[4 * at + 3] - out[4 * n + 3]));
                }
            }
        }
    }

    private void restore(Window part, float[] coverage, float[] out) {
        float[] was = original.rgba();
        for (int j = 0, n = 0; j < part.height(); j++) {
            int at = 4 * (part.left() + original.width() * (part.top() + j));
            for (int i = 0; i < part.width(); i++, n++, at += 4) {
                float m = coverage[n];
                for (int c = 0; m > 0 && c < 4; c++) {
                    out[4 * n + c] = m < 1 ? out[4 * n + c] + m * (was[at + c] - out[4 * n + c]) : was[at + c];
                }
            }
        }
    }

    private void within(float[] coverage, Window part, int tx, int ty) {
        if (mattes == null) {
            return;
        }
        int tile = tx + tilesAcross * ty;
        if (mattes[tile] == null) {
            Matte matte = stroke.within().get();
            mattes[tile] = matte.values(original, common(Window.all(before.width(), before.height()), tx, ty));
        }
        int row = Math.min(TILE, before.width() - tx * TILE);
        for (int j = 0, n = 0; j < part.height(); j++) {
            int at = part.left() - tx * TILE + row * (part.top() - ty * TILE + j);
            for (int i = 0; i < part.width(); i++, n++) {
                coverage[n] *= mattes[tile][at + i];
            }
        }
    }

    /** Index, in an array of a tile, of the first pixel of row j of a part of that tile. */
    static int inTile(Window part, int j) {
        return part.left() % TILE + TILE * ((part.top() + j) % TILE);
    }

    private static Window common(Window window, int tx, int ty) {
        int left = Math.max(window.left(), tx * TILE);
        int top = Math.max(window.top(), ty * TILE);
        return new Window(left, top, Math.min(window.left() + window.width(), (tx + 1) * TILE) - left,
                Math.min(window.top() + window.height(), (ty + 1) * TILE) - top);
    }

    private static boolean anything(float[] coverage, int pixels) {
        for (int n = 0; n < pixels; n++) {
            if (coverage[n] > 0) {
                return true;
            }
        }
        return false;
    }

    private void copy(Window part, Picture picture) {
        for (int j = 0; j < part.height(); j++) {
            int at = 4 * (part.left() + picture.width() * (part.top() + j));
            System.arraycopy(before.rgba(), at, picture.rgba(), at, 4 * part.width());
        }
    }

    private static void read(Picture picture, Window part, float[] out) {
        for (int j = 0; j < part.height(); j++) {
            System.arraycopy(picture.rgba(), 4 * (part.left() + picture.width() * (part.top() + j)), out, 4 * part.width() * j,
                    4 * part.width());
        }
    }

    private static void write(float[] values, Window part, Picture picture) {
        for (int j = 0; j < part.height(); j++) {
            System.arraycopy(values, 4 * part.width() * j, picture.rgba(), 4 * (part.left() + picture.width() * (part.top() + j)),
                    4 * part.width());
        }
    }
}

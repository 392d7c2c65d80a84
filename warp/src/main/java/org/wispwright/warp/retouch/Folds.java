package org.wispwright.warp.retouch;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.mesh.QuadGrid;

/**
 * Where a warp turns the picture over: there it shows one place several times, or inside out, which no flow can do.
 * <p>The map from each pixel to its source is sampled at {@value #ROWS} rows (at most {@value QuadGrid#MOST_CELLS} columns) of pixel
 * centres; a cell is folded where the least of its corner Jacobians is below 0 ({@link QuadGrid#folds}). Of an as-rigid-as-possible
 * warp the triangles are asked too: one is folded where its area, relative to rest, is 0 or less. The least size of a fold that is
 * certain to be seen is thus about a {@value #ROWS}th of the height.
 *
 * @param cells         how many cells and triangles are folded; 0 if nothing is
 * @param worstJacobian the least relative area of all those asked, 1 = as at rest; 1 if nothing moves
 * @param worst         the place of the worst fold, after the warp, in heights; empty if there is none
 * @param places        middles of the folded cells and triangles, after the warp, at most {@value #MOST_PLACES}
 */
public record Folds(int cells, double worstJacobian, Optional<Point> worst, List<Point> places) {
    /** Rows of the sampled map. */
    public static final int ROWS = 128;
    /** The most places that are kept. */
    public static final int MOST_PLACES = 2_000;
    /** No fold. */
    public static final Folds NONE = new Folds(0, 1, Optional.empty(), List.of());

    /** Copies the places. */
    public Folds {
        places = List.copyOf(places);
    }

    /**
     * Folds of one operation.
     *
     * @param original read: gives the raster, and the smoke for outlines and mattes that depend on it
     * @return {@link #NONE} for a stroke
     */
    public static Folds of(Operation operation, Picture original) {
        if (operation.changesNothing()) {
            return NONE;
        }
        if (operation instanceof MeshWarp warp) {
            return of(Bend.of(warp, original), original);
        }
        return operation instanceof OutlineWarp warp ? of(Bend.of(warp, original), original) : NONE;
    }

    /** Folds of all operations of a retouch, each by itself. */
    public static Folds of(Retouch retouch, Picture original) {
        Folds all = NONE;
        for (Operation operation : retouch.operations()) {
            all = all.and(of(operation, original));
        }
        return all;
    }

    private Folds and(Folds other) {
        Folds worse = other.worstJacobian < worstJacobian ? other : this;
        List<Point> both = new ArrayList<>(places);
        both.addAll(other.places.subList(0, Math.min(other.places.size(), MOST_PLACES - both.size())));
        return new Folds(cells + other.cells, worse.worstJacobian, worse.worst, both);
    }

    private static Folds of(Bend bend, Picture original) {
        Folds sampled = sampled(bend, original);
        return bend.map() instanceof MeshMap mesh ? sampled.and(ofTriangles(mesh)) : sampled;
    }

    private static Folds ofTriangles(MeshMap mesh) {
        int cells = 0;
        double worst = 1;
        Point where = null;
        List<Point> places = new ArrayList<>();
        for (int t = 0; t < mesh.triangles(); t++) {
            double area = mesh.painting().relativeArea(t);
            if (!(area > 0)) {
                cells++;
                double[] middle = mesh.middle(t);
                Point place = new Point(middle[0], middle[1]);
                if (where == null || area < worst) {
                    where = place;
                }
                if (places.size() < MOST_PLACES) {
                    places.add(place);
                }
            }
            worst = Math.min(worst, area);
        }
        return new Folds(cells, worst, Optional.ofNullable(where), places);
    }

    private static Folds sampled(Bend bend, Picture original) {
        int height = original.height();
        int rows = Math.min(ROWS, height);
        int columns = Math.max(1, Math.min(QuadGrid.MOST_CELLS, (int) Math.round((double) rows * original.width() / height)));
        if (rows < 2 || columns < 2) {
            return NONE;
        }
        double[] restX = new double[rows * columns];
        double[] restY = new double[rows * columns];
        double[] sourceX = new double[rows * columns];
        double[] sourceY = new double[rows * columns];
        boolean[] empty = new boolean[rows * columns];
        double[] dx = new double[original.width()];
        double[] dy = new double[original.width()];
        for (int j = 0; j < rows; j++) {
            int y = (int) ((j + 0.5) * height / rows);
            bend.displacements(y, dx, dy);
            for (int i = 0; i < columns; i++) {
                int x = (int) ((i + 0.5) * original.width() / columns);
                int n = i + columns * j;
                restX[n] = (x + 0.5) / height;
                restY[n] = (y + 0.5) / height;
                empty[n] = Double.isNaN(dx[x]) || Double.isNaN(dy[x]);
                sourceX[n] = restX[n] + (empty[n] ? 0 : dx[x] / height);
                sourceY[n] = restY[n] + (empty[n] ? 0 : dy[x] / height);
            }
        }
        QuadGrid rest = new QuadGrid(columns - 1, rows - 1, restX, restY);
        QuadGrid sources = rest.at(sourceX, sourceY);
        int cells = 0;
        double worst = 1;
        Point where = null;
        List<Point> places = new ArrayList<>();
        for (QuadGrid.Fold fold : sources.folds(rest)) {
            int n = fold.i() + columns * fold.j();
            if (fold.state() != QuadGrid.State.FOLDED || empty[n] || empty[n + 1] || empty[n + columns] || empty[n + columns + 1]) {
                continue;
            }
            cells++;
            Point place = new Point((restX[n] + restX[n + 1]) / 2, (restY[n] + restY[n + columns]) / 2);
            if (fold.worstJacobian() < worst) {
                worst = fold.worstJacobian();
                where = place;
            }
            if (places.size() < MOST_PLACES) {
                places.add(place);
            }
        }
        return new Folds(cells, cells == 0 ? least(sources, rest, empty) : worst, Optional.ofNullable(where), places);
    }

    /** The least relative Jacobian of cells whose corners all have a source. */
    private static double least(QuadGrid sources, QuadGrid rest, boolean[] empty) {
        double least = 1;
        int columns = rest.cellsX() + 1;
        double[] now = new double[4];
        double[] before = new double[4];
        for (int j = 0; j < rest.cellsY(); j++) {
            for (int i = 0; i < rest.cellsX(); i++) {
                int n = i + columns * j;
                if (!(empty[n] || empty[n + 1] || empty[n + columns] || empty[n + columns + 1])) {
                    sources.cornerJacobians(i, j, now);
                    rest.cornerJacobians(i, j, before);
                    for (int k = 0; k < 4; k++) {
                        least = Math.min(least, now[k] / before[k]);
                    }
                }
            }
        }
        return least;
    }
}

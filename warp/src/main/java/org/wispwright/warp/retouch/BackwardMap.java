package org.wispwright.warp.retouch;

import java.util.List;
import java.util.function.Function;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.mesh.MovingLeastSquares;
import org.wispwright.warp.spline.SplineLattice;
import org.wispwright.warp.spline.ThinPlateSpline;

/** Where the smoke under each pixel comes from. Keeps scratch space; one caller at a time. */
interface BackwardMap {
    /**
     * Writes the source of each pixel of a window less the pixel, in pixels; NaN where nothing comes from within the frame. A pixel has
     * the same bits in every window.
     *
     * @param height rows of the whole picture
     * @param dx     overwritten from 0, row by row
     * @param dy     overwritten from 0, row by row
     */
    void displacements(int left, int top, int width, int rows, int height, double[] dx, double[] dy);

    /** The map of a kind but the mesh, fitted from the handles' ends to their starts. */
    static BackwardMap fitted(WarpKind kind, List<Handle> handles) {
        double[][] ends = positions(handles, Handle::to);
        double[][] starts = positions(handles, Handle::from);
        return switch (kind) {
            case SPLINE -> {
                ThinPlateSpline spline = ThinPlateSpline.fit(ends, starts);
                SplineLattice[] lattice = new SplineLattice[1];
                int[] rowsOf = new int[1];
                yield (left, top, width, rows, height, dx, dy) -> {
                    if (rowsOf[0] != height) {
                        lattice[0] = new SplineLattice(spline, height);
                        rowsOf[0] = height;
                    }
                    lattice[0].displacements(left, top, width, rows, dx, dy);
                };
            }
            case AFFINE -> pointwise(new MovingLeastSquares(MovingLeastSquares.Kind.AFFINE, ends, starts));
            case SIMILARITY -> pointwise(new MovingLeastSquares(MovingLeastSquares.Kind.SIMILARITY, ends, starts));
            case RIGID -> pointwise(new MovingLeastSquares(MovingLeastSquares.Kind.RIGID, ends, starts));
            case AS_RIGID_AS_POSSIBLE -> throw new IllegalArgumentException("backward map: a mesh is solved, not fitted; use MeshMap");
        };
    }

    private static BackwardMap pointwise(MovingLeastSquares map) {
        double[] place = new double[2];
        return (left, top, width, rows, height, dx, dy) -> {
            for (int n = 0; n < width * rows; n++) {
                double x = (left + n % width + 0.5) / height;
                double y = (top + n / width + 0.5) / height;
                map.evaluate(x, y, place);
                dx[n] = (place[0] - x) * height;
                dy[n] = (place[1] - y) * height;
            }
        };
    }

    private static double[][] positions(List<Handle> handles, Function<Handle, Point> end) {
        return handles.stream().map(end).map(p -> new double[] {p.x(), p.y()}).toArray(double[][]::new);
    }
}

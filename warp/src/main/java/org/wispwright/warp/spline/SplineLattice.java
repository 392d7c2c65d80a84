package org.wispwright.warp.spline;

import java.util.Arrays;

/**
 * How far a {@link ThinPlateSpline} moves every pixel, in pixels. Between the corners of squares of {@value #CELL} pixels it is the
 * bicubic Hermite interpolant of the spline, where {@code ThinPlateSpline.hermiteError} proves that this is within
 * {@value #TOLERANCE} of a pixel; in all other squares (those near a landmark) it is the spline itself. The squares lie on the whole
 * raster, so a pixel has the same bits whichever window it is asked in.
 * <p>Source: Hermite's bicubic patch as in Ferguson (1964), J. ACM 11(2), 221-228; choosing by the bound is ours.
 * <p>Keeps its scratch space; one caller at a time.
 */
public final class SplineLattice {
    /** Pixels a side of a square. */
    public static final int CELL = 16;
    /** Farthest the interpolant may stray from the spline, in pixels. */
    public static final double TOLERANCE = 0.005;

    private final ThinPlateSpline spline;
    private final double step;
    private final double[][] rowOf = new double[2][0];
    private final int[][] known = {{0, 0, -1}, {0, 0, -1}};
    private final double[] jet = new double[8];
    private final double[] place = new double[2];
    private final double[] edge = new double[8];

    /**
     * A lattice over pictures of some height. Pixel (i,j) lies at {@code ((i + 0.5) / height, (j + 0.5) / height)} in the spline's unit.
     *
     * @param height rows of the picture, 1 or more
     */
    public SplineLattice(ThinPlateSpline spline, int height) {
        this.spline = spline;
        step = 1.0 / height;
    }

    /**
     * Writes where each pixel of a window goes, less where it is.
     *
     * @param left   first column, 0 or more
     * @param top    first row, 0 or more
     * @param width  columns
     * @param rows   rows
     * @param dx     overwritten from 0: pixels to the right, row by row
     * @param dy     overwritten from 0: pixels downwards
     */
    public void displacements(int left, int top, int width, int rows, double[] dx, double[] dy) {
        int firstColumn = left / CELL;
        int lastColumn = (left + width - 1) / CELL;
        for (int row = top / CELL; row <= (top + rows - 1) / CELL; row++) {
            double[] above = jets(row, firstColumn, lastColumn + 1);
            double[] below = jets(row + 1, firstColumn, lastColumn + 1);
            for (int column = firstColumn; column <= lastColumn; column++) {
                int x0 = Math.max(left, CELL * column);
                int x1 = Math.min(left + width, CELL * (column + 1));
                int y0 = Math.max(top, CELL * row);
                int y1 = Math.min(top + rows, CELL * (row + 1));
                double error = spline.hermiteError((CELL * column + 0.5) * step, (CELL * row + 0.5) * step, CELL * step) / step;
                for (int y = y0; y < y1; y++) {
                    int at = x0 - left + width * (y - top);
                    if (error <= TOLERANCE) {
                        patchRow(above, below, 8 * (column - firstColumn), y - CELL * row, x0 - CELL * column, x1 - x0, dx, dy, at);
                    } else {
                        exactRow(x0, y, x1 - x0, dx, dy, at);
                    }
                }
            }
        }
    }

    private void exactRow(int x0, int y, int count, double[] dx, double[] dy, int at) {
        for (int n = 0; n < count; n++) {
            double px = (x0 + n + 0.5) * step;
            double py = (y + 0.5) * step;
            spline.evaluate(px, py, place);
            dx[at + n] = (place[0] - px) / step;
            dy[at + n] = (place[1] - py) / step;
        }
    }

    /** One row of a square: first along y on its two sides, then along x between them. */
    private void patchRow(double[] above, double[] below, int corner, int row, int first, int count, double[] dx, double[] dy, int at) {
        double s = (double) row / CELL;
        double v0 = (1 + 2 * s) * (1 - s) * (1 - s);
        double m0 = s * (1 - s) * (1 - s);
        double v1 = s * s * (3 - 2 * s);
        double m1 = s * s * (s - 1);
        for (int k = 0; k < 4; k++) {
            // Value and slope along x of each axis, on the left side and on the right.
            int c = corner + (k & 1) + 4 * (k >> 1);
            for (int side = 0; side < 2; side++) {
                int n = c + 8 * side;
                edge[k + 4 * side] = v0 * above[n] + m0 * above[n + 2] + v1 * below[n] + m1 * below[n + 2];
            }
        }
        cubic(edge[0], edge[1], edge[4], edge[5], first, count, dx, at);
        cubic(edge[2], edge[3], edge[6], edge[7], first, count, dy, at);
    }

    private static void cubic(double a, double slopeA, double b, double slopeB, int first, int count, double[] out, int at) {
        double c2 = 3 * (b - a) - 2 * slopeA - slopeB;
        double c3 = 2 * (a - b) + slopeA + slopeB;
        for (int n = 0; n < count; n++) {
            double t = (double) (first + n) / CELL;
            out[at + n] = a + t * (slopeA + t * (c2 + t * c3));
        }
    }

    /** Displacements in pixels with slopes a square, at the corners of a row of squares; the last two rows are remembered. */
    private double[] jets(int row, int first, int last) {
        for (int slot = 0; slot < 2; slot++) {
            if (Arrays.equals(known[slot], new int[] {row, first, last})) {
                return rowOf[slot];
            }
        }
        int slot = row & 1;
        known[slot] = new int[] {row, first, last};
        if (rowOf[slot].length < 8 * (last - first + 1)) {
            rowOf[slot] = new double[8 * (last - first + 1)];
        }
        double[] jets = rowOf[slot];
        double py = (CELL * row + 0.5) * step;
        for (int column = first; column <= last; column++) {
            double px = (CELL * column + 0.5) * step;
            spline.jet(px, py, jet);
            int n = 8 * (column - first);
            // Slopes of the displacement: the identity's are taken away. Mixed slopes are per square along both axes.
            jets[n] = (jet[0] - px) / step;
            jets[n + 1] = CELL * (jet[1] - 1);
            jets[n + 2] = CELL * jet[2];
            jets[n + 3] = CELL * CELL * step * jet[3];
            jets[n + 4] = (jet[4] - py) / step;
            jets[n + 5] = CELL * jet[5];
            jets[n + 6] = CELL * (jet[6] - 1);
            jets[n + 7] = CELL * CELL * step * jet[7];
        }
        return jets;
    }
}

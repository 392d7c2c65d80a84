package org.wispwright.optimize.flow;

import org.jtransforms.dct.FloatDCT_1D;
import org.wispwright.optimize.product.RowProduct;
import pl.edu.icm.jlargearrays.ConcurrencyUtils;

/**
 * The eigenvectors of the 1-D pressure operator along one axis, as an orthonormal transform: cells to modes and back.
 *
 * <p>The operator is {@code (L p)[i] = p[i-1] - 2 p[i] + p[i+1]}; a wall copies the value across it
 * ({@code p[-1] = p[0]}), an open side has pressure 0 at the ghost cell's centre ({@code p[-1] = 0}). For mode m of n:
 * <pre>
 * wall, wall:  cos(theta (i + 1/2)),  theta = m pi / n,               m = 0..n-1   (DCT-II)
 * open, open:  sin(theta (i + 1)),    theta = (m + 1) pi / (n + 1),   m = 0..n-1   (DST-I)
 * wall, open:  cos(theta (i + 1/2)),  theta = (m + 1/2) pi / (n + 1/2)
 * open, wall:  the mirror image of wall, open
 * </pre>
 * each with eigenvalue {@code -4 sin^2(theta / 2)} and scaled to unit length, so the inverse is the transpose.
 * Sources: Strang (1999), SIAM Review 41(1), 135-147; LeVeque (2007), Finite Difference Methods, ch. 2.
 *
 * <p>Both directions are matrix products, which take any n and any pair of sides. With two equal sides the modes are by turns
 * even and odd about the middle, so {@code e[i] = x[i] + x[n-1-i]} and {@code o[i] = x[i] - x[n-1-i]} go through half-size
 * matrices each: half the work. (n odd: the middle value is even, {@code e = x}.) Between two walls and for powers of two from
 * {@value #FAST_FROM} on, the fast transform of JTransforms wins ({@code docs/benchmarks.md}) and takes their place.
 */
final class AxisTransform {
    /** The shortest axis for which the fast transform pays. */
    static final int FAST_FROM = 32;
    /** Columns that the fast transform copies out at a time: a cache line of them. */
    private static final int TILE = 16;

    static {
        // Threads come from Lanes alone; the library would start its own for long axes.
        ConcurrencyUtils.setNumberOfThreads(1);
    }

    private final int n;
    /** The fast transform, or null where the products serve. One is used by all threads: it keeps only tables. */
    private final FloatDCT_1D fast;
    private final ThreadLocal<float[]> tile;
    /** Even and odd parts; without symmetry "even" is everything. */
    private final int evens;
    private final int odds;
    private final boolean folded;
    private final double[] eigenvalues;
    /** Even modes by cells, then odd modes by cells; {@code cells} columns each of the half's size. */
    private final float[] evenByCells;
    private final float[] cellsByEven;
    private final float[] oddByCells;
    private final float[] cellsByOdd;

    AxisTransform(int n, Side low, Side high) {
        this(n, low, high, FAST_FROM);
    }

    /** @param fastFrom the shortest axis that may take the fast transform; the benchmark keeps it away to compare */
    AxisTransform(int n, Side low, Side high, int fastFrom) {
        this.n = n;
        boolean walls = low == Side.WALL && high == Side.WALL;
        fast = walls && n >= fastFrom && Integer.bitCount(n) == 1 ? new FloatDCT_1D(n) : null;
        tile = ThreadLocal.withInitial(() -> new float[TILE * n]);
        folded = low == high && n > 1 && fast == null;
        evens = folded ? (n + 1) / 2 : n;
        odds = n - evens;
        eigenvalues = new double[n];
        int evenSize = fast == null ? evens * evens : 0;
        evenByCells = new float[evenSize];
        cellsByEven = new float[evenSize];
        oddByCells = new float[odds * odds];
        cellsByOdd = new float[odds * odds];
        double[] mode = new double[n];
        for (int m = 0; m < n; m++) {
            double theta = angle(n, low, high, m);
            double half = Math.sin(theta / 2);
            if (fast != null) {
                eigenvalues[m] = 4 * half * half;
                continue;
            }
            double squares = 0;
            for (int i = 0; i < n; i++) {
                mode[i] = valueAt(n, low, high, theta, i);
                squares += mode[i] * mode[i];
            }
            // Position of mode m among the transformed values: evens first, then odds.
            boolean even = !folded || m % 2 == 0;
            int row = folded ? m / 2 : m;
            eigenvalues[even ? row : evens + row] = 4 * half * half;
            int size = even ? evens : odds;
            for (int i = 0; i < size; i++) {
                float value = (float) (mode[i] / Math.sqrt(squares));
                (even ? evenByCells : oddByCells)[row * size + i] = value;
                (even ? cellsByEven : cellsByOdd)[i * size + row] = value;
            }
        }
    }

    private static double angle(int n, Side low, Side high, int m) {
        if (low == Side.WALL && high == Side.WALL) {
            return m * Math.PI / n;
        }
        if (low == Side.OPEN && high == Side.OPEN) {
            return (m + 1) * Math.PI / (n + 1);
        }
        return (m + 0.5) * Math.PI / (n + 0.5);
    }

    private static double valueAt(int n, Side low, Side high, double theta, int i) {
        if (low == Side.WALL) {
            return Math.cos(theta * (i + 0.5));
        }
        return high == Side.OPEN ? Math.sin(theta * (i + 1)) : Math.cos(theta * (n - 1 - i + 0.5));
    }

    /** Eigenvalue of minus the operator for the mode at position m of the transformed values (even modes first where folded). */
    double eigenvalue(int m) {
        return eigenvalues[m];
    }

    /** Cells to modes, in place, for {@code rows} rows of n neighbouring values from {@code start}; scratch: the same range. */
    void rowsToModes(float[] values, float[] scratch, int start, int rows) {
        if (fast != null) {
            for (int r = 0; r < rows; r++) {
                fast.forward(values, start + r * n, true);
            }
            return;
        }
        if (folded) {
            for (int r = 0; r < rows; r++) {
                foldRow(values, scratch, start + r * n);
            }
        } else {
            System.arraycopy(values, start, scratch, start, rows * n);
        }
        RowProduct.multiply(scratch, start, n, rows, evens, cellsByEven, 0, evens, values, start, n, evens);
        RowProduct.multiply(scratch, start + evens, n, rows, odds, cellsByOdd, 0, odds, values, start + evens, n, odds);
    }

    /** Modes to cells, in place; the inverse of {@link #rowsToModes}. */
    void rowsToCells(float[] values, float[] scratch, int start, int rows) {
        if (fast != null) {
            for (int r = 0; r < rows; r++) {
                fast.inverse(values, start + r * n, true);
            }
            return;
        }
        RowProduct.multiply(values, start, n, rows, evens, evenByCells, 0, evens, scratch, start, n, evens);
        RowProduct.multiply(values, start + evens, n, rows, odds, oddByCells, 0, odds, scratch, start + evens, n, odds);
        if (!folded) {
            System.arraycopy(scratch, start, values, start, rows * n);
            return;
        }
        for (int r = 0; r < rows; r++) {
            unfoldRow(scratch, values, start + r * n);
        }
    }

    /**
     * Cells to modes, in place, along the slow axis: value i of column c lies at {@code i * stride + c}; columns
     * {@code start..start+count-1}; scratch: the same places.
     */
    void columnsToModes(float[] values, float[] scratch, int stride, int start, int count) {
        if (fast != null) {
            columnsFast(values, stride, start, count, false);
            return;
        }
        int last = n - 1;
        for (int i = 0; i < evens; i++) {
            int low = i * stride + start;
            int high = (folded ? last - i : i) * stride + start;
            if (low == high) {
                System.arraycopy(values, low, scratch, low, count);
            } else {
                int odd = (evens + i) * stride + start;
                for (int c = 0; c < count; c++) {
                    scratch[low + c] = values[low + c] + values[high + c];
                }
                for (int c = 0; c < count; c++) {
                    scratch[odd + c] = values[low + c] - values[high + c];
                }
            }
        }
        int middle = evens * stride + start;
        RowProduct.multiply(evenByCells, 0, evens, evens, evens, scratch, start, stride, values, start, stride, count);
        RowProduct.multiply(oddByCells, 0, odds, odds, odds, scratch, middle, stride, values, middle, stride, count);
    }

    /** Modes to cells, in place, along the slow axis; the inverse of {@link #columnsToModes}. */
    void columnsToCells(float[] values, float[] scratch, int stride, int start, int count) {
        if (fast != null) {
            columnsFast(values, stride, start, count, true);
            return;
        }
        int middle = evens * stride + start;
        RowProduct.multiply(cellsByEven, 0, evens, evens, evens, values, start, stride, scratch, start, stride, count);
        RowProduct.multiply(cellsByOdd, 0, odds, odds, odds, values, middle, stride, scratch, middle, stride, count);
        int last = n - 1;
        for (int i = 0; i < evens; i++) {
            int low = i * stride + start;
            int high = (folded ? last - i : i) * stride + start;
            if (low == high) {
                System.arraycopy(scratch, low, values, low, count);
            } else {
                int odd = (evens + i) * stride + start;
                for (int c = 0; c < count; c++) {
                    values[low + c] = scratch[low + c] + scratch[odd + c];
                }
                for (int c = 0; c < count; c++) {
                    values[high + c] = scratch[low + c] - scratch[odd + c];
                }
            }
        }
    }

    private void columnsFast(float[] values, int stride, int start, int count, boolean inverse) {
        float[] columns = tile.get();
        for (int first = start; first < start + count; first += TILE) {
            int width = Math.min(TILE, start + count - first);
            for (int i = 0; i < n; i++) {
                for (int c = 0; c < width; c++) {
                    columns[c * n + i] = values[i * stride + first + c];
                }
            }
            for (int c = 0; c < width; c++) {
                if (inverse) {
                    fast.inverse(columns, c * n, true);
                } else {
                    fast.forward(columns, c * n, true);
                }
            }
            for (int i = 0; i < n; i++) {
                for (int c = 0; c < width; c++) {
                    values[i * stride + first + c] = columns[c * n + i];
                }
            }
        }
    }

    private void foldRow(float[] from, float[] to, int at) {
        int end = at + n - 1;
        for (int i = 0; i < odds; i++) {
            to[at + i] = from[at + i] + from[end - i];
            to[at + evens + i] = from[at + i] - from[end - i];
        }
        if (evens > odds) {
            to[at + odds] = from[at + odds];
        }
    }

    private void unfoldRow(float[] from, float[] to, int at) {
        int end = at + n - 1;
        for (int i = 0; i < odds; i++) {
            to[at + i] = from[at + i] + from[at + evens + i];
            to[end - i] = from[at + i] - from[at + evens + i];
        }
        if (evens > odds) {
            to[at + odds] = from[at + odds];
        }
    }
}

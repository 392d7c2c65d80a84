package org.wispwright.render.volume;

/**
 * A box of {@code nx x ny x nz} equal cubes in the world: right-handed, metres, y up.
 * <p>Cell (i,j,k) has index {@code i + nx * (j + ny * k)}, so x runs fastest, and its centre lies at
 * {@code origin + (i + 0.5, j + 0.5, k + 0.5) * cellMetres}. {@code nz = 1} is the plane case.
 *
 * @param nx cells along x, at least 1
 * @param ny cells along y (up), at least 1
 * @param nz cells along z, at least 1
 * @param cellMetres side of a cell in metres, finite and above 0
 * @param originX world position of the box's lowest corner, metres
 * @param originY as originX
 * @param originZ as originX
 */
public record GridShape(int nx, int ny, int nz, double cellMetres, double originX, double originY, double originZ) {

    /** The most cells a grid may have: what one Java array of faces can still hold. */
    public static final long MOST_CELLS = 1L << 30;

    /** Checks the sizes. @throws IllegalArgumentException naming the number that is off */
    public GridShape {
        if (nx < 1 || ny < 1 || nz < 1) {
            throw new IllegalArgumentException("grid: got " + nx + " x " + ny + " x " + nz + " cells, needs at least 1 each way");
        }
        // By division: the product of three ints can pass the end of a long.
        if ((long) nx * ny > MOST_CELLS / nz) {
            throw new IllegalArgumentException("grid: got " + nx + " x " + ny + " x " + nz + " cells, needs at most " + MOST_CELLS);
        }
        if (!(cellMetres > 0) || Double.isInfinite(cellMetres)) {
            throw new IllegalArgumentException("grid: got a cell of " + cellMetres + " m, needs a finite size above 0");
        }
        if (!Double.isFinite(originX) || !Double.isFinite(originY) || !Double.isFinite(originZ)) {
            throw new IllegalArgumentException("grid: got origin (" + originX + ", " + originY + ", " + originZ + ") m, needs finite numbers");
        }
    }

    /** A box with its lowest corner at the world's origin. */
    public GridShape(int nx, int ny, int nz, double cellMetres) {
        this(nx, ny, nz, cellMetres, 0, 0, 0);
    }

    /** Number of cells. */
    public int cells() {
        return nx * ny * nz;
    }

    /** Number of faces square to x: {@code (nx+1) ny nz}. */
    public int xFaces() {
        return (nx + 1) * ny * nz;
    }

    /** Number of faces square to y: {@code nx (ny+1) nz}. */
    public int yFaces() {
        return nx * (ny + 1) * nz;
    }

    /** Number of faces square to z: {@code nx ny (nz+1)}. */
    public int zFaces() {
        return nx * ny * (nz + 1);
    }

    /** Index of cell (i,j,k) in {@link ScalarGrid#values()}. */
    public int cell(int i, int j, int k) {
        return i + nx * (j + ny * k);
    }

    /** Index of the x face between cells (i-1,j,k) and (i,j,k), i in 0..nx. */
    public int xFace(int i, int j, int k) {
        return i + (nx + 1) * (j + ny * k);
    }

    /** Index of the y face between cells (i,j-1,k) and (i,j,k), j in 0..ny. */
    public int yFace(int i, int j, int k) {
        return i + nx * (j + (ny + 1) * k);
    }

    /** Index of the z face between cells (i,j,k-1) and (i,j,k), k in 0..nz. */
    public int zFace(int i, int j, int k) {
        return i + nx * (j + ny * k);
    }

    /** True if nz is 1: the plane case. */
    public boolean isPlane() {
        return nz == 1;
    }

    /** "48x64x48 cells", for messages. */
    public String inWords() {
        return nx + "x" + ny + "x" + nz + " cells";
    }
}

package org.wispwright.optimize.flow;

import java.util.Arrays;
import org.wispwright.optimize.solid.SolidCells;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.volume.GridShape;

/**
 * Which faces pressure acts through when there are solids, and the pockets: fluid that no face leads out of, neither to an open side nor
 * to other fluid. In a pocket pressure is known but for a constant, and a divergence that does not sum to 0 has no pressure at all.
 */
final class PressureLinks {
    /** Bits of {@link #links}: the neighbour on that side is fluid. */
    static final int ALL = 63;

    /** A cell's fluid neighbours: bit 0 at i - 1, bit 1 at i + 1, bits 2, 3 along y, bits 4, 5 along z. 0 in solids. */
    final byte[] links;
    /** Faces of a cell that pressure acts through: the links and open sides of the box. 0 in solids. */
    final byte[] faces;
    /** Number of a cell's pocket, -1 for none; null if there are no pockets. */
    private final int[] pocket;
    private final double[] sizes;
    private final double[][] sums;
    private final GridShape shape;

    PressureLinks(GridShape shape, Sides sides, SolidCells solids, Lanes lanes) {
        this.shape = shape;
        links = new byte[shape.cells()];
        faces = new byte[shape.cells()];
        lanes.forEach(shape.nz(), k -> linkSlab(sides, solids, k));
        int[] root = roots();
        boolean[] open = new boolean[root.length];
        for (int c = 0; c < root.length; c++) {
            root[c] = root(root, c);                                           // roots come before their cells
            open[root[c]] |= faces[c] > Integer.bitCount(links[c]);
        }
        int[] number = new int[root.length];
        int[] counts = new int[root.length];
        int found = 0;
        for (int c = 0; c < root.length; c++) {
            boolean pocketed = !solids.isSolid(c) && !open[root[c]];
            if (pocketed && root[c] == c) {
                number[c] = found++;
            }
            root[c] = pocketed ? number[root[c]] : -1;
            if (pocketed) {
                counts[root[c]]++;
            }
        }
        pocket = found == 0 ? null : root;
        sizes = Arrays.stream(counts).limit(found).asDoubleStream().toArray();
        sums = new double[found == 0 ? 0 : shape.nz()][found];
    }

    private void linkSlab(Sides sides, SolidCells solids, int k) {
        int nx = shape.nx();
        int ny = shape.ny();
        int plane = nx * ny;
        boolean flat = shape.isPlane();
        for (int j = 0; j < ny; j++) {
            for (int i = 0; i < nx; i++) {
                int c = shape.cell(i, j, k);
                if (solids.isSolid(c)) {
                    continue;
                }
                int bits = 0;
                int open = 0;
                bits |= i > 0 && !solids.isSolid(c - 1) ? 1 : 0;
                bits |= i < nx - 1 && !solids.isSolid(c + 1) ? 2 : 0;
                bits |= j > 0 && !solids.isSolid(c - nx) ? 4 : 0;
                bits |= j < ny - 1 && !solids.isSolid(c + nx) ? 8 : 0;
                bits |= k > 0 && !solids.isSolid(c - plane) ? 16 : 0;
                bits |= k < shape.nz() - 1 && !solids.isSolid(c + plane) ? 32 : 0;
                open += i == 0 && sides.left() == Side.OPEN ? 1 : 0;
                open += i == nx - 1 && sides.right() == Side.OPEN ? 1 : 0;
                open += j == 0 && sides.floor() == Side.OPEN ? 1 : 0;
                open += j == ny - 1 && sides.top() == Side.OPEN ? 1 : 0;
                open += k == 0 && sides.back() == Side.OPEN && !flat ? 1 : 0;
                open += k == shape.nz() - 1 && sides.front() == Side.OPEN && !flat ? 1 : 0;
                links[c] = (byte) bits;
                faces[c] = (byte) (Integer.bitCount(bits) + open);
            }
        }
    }

    /** Cells joined by faces, as a forest whose roots are the lowest cells (Tarjan 1975, J. ACM 22(2), 215-225; path halving). */
    private int[] roots() {
        int[] parent = new int[links.length];
        int nx = shape.nx();
        int plane = nx * shape.ny();
        for (int c = 0; c < parent.length; c++) {
            parent[c] = c;
            if ((links[c] & 1) != 0) {
                join(parent, c, c - 1);
            }
            if ((links[c] & 4) != 0) {
                join(parent, c, c - nx);
            }
            if ((links[c] & 16) != 0) {
                join(parent, c, c - plane);
            }
        }
        return parent;
    }

    private static void join(int[] parent, int a, int b) {
        int ra = root(parent, a);
        int rb = root(parent, b);
        parent[Math.max(ra, rb)] = Math.min(ra, rb);
    }

    private static int root(int[] parent, int c) {
        int at = c;
        while (parent[at] != at) {
            parent[at] = parent[parent[at]];
            at = parent[at];
        }
        return at;
    }

    /** How many pockets there are. */
    int pockets() {
        return sizes.length;
    }

    /** Takes from the values of every pocket their mean; of what lies outside pockets, nothing. */
    void removeMeans(float[] values, Lanes lanes) {
        if (pocket == null) {
            return;
        }
        int plane = shape.nx() * shape.ny();
        lanes.forEach(shape.nz(), k -> {
            Arrays.fill(sums[k], 0);
            for (int c = k * plane; c < (k + 1) * plane; c++) {
                if (pocket[c] >= 0) {
                    sums[k][pocket[c]] += values[c];
                }
            }
        });
        float[] means = new float[sizes.length];
        for (int n = 0; n < means.length; n++) {
            double sum = 0;
            for (double[] slab : sums) {
                sum += slab[n];
            }
            means[n] = (float) (sum / sizes[n]);
        }
        lanes.forEach(shape.nz(), k -> {
            for (int c = k * plane; c < (k + 1) * plane; c++) {
                if (pocket[c] >= 0) {
                    values[c] -= means[pocket[c]];
                }
            }
        });
    }
}

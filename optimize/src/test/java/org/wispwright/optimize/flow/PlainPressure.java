package org.wispwright.optimize.flow;

import org.wispwright.optimize.solid.SolidCells;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/** The pressure around solids, written down cell by cell and solved by Gaussian elimination in double. Slow; for small boxes. */
final class PlainPressure {
    private PlainPressure() { }

    static void project(MacVelocity u, Sides sides, SolidCells solids) {
        GridShape s = u.shape();
        for (int k = 0; k < s.nz(); k++) {
            solids.writeFaces(u, true, k);
        }
        for (int k = 0; k < s.nz(); k++) {
            Projection.closeWalls(s, sides, u, k);
        }
        int n = s.cells();
        double[][] rows = new double[n][n + 1];
        for (int c = 0; c < n; c++) {
            int[] at = {c % s.nx(), c / s.nx() % s.ny(), c / (s.nx() * s.ny())};
            if (solids.isSolid(c)) {
                rows[c][c] = 1;
                continue;
            }
            for (int face = 0; face < 6; face++) {
                int other = neighbour(s, at, face);
                rows[c][n] += (face % 2 == 0 ? -1.0 : 1.0) * value(u, at, face);
                if (other >= 0 && !solids.isSolid(other)) {
                    rows[c][other] += 1;
                    rows[c][c] -= 1;
                } else if (other < 0 && isOpen(s, sides, face)) {
                    rows[c][c] -= 1;
                }
            }
        }
        double[] p = solve(rows);
        for (int c = 0; c < n; c++) {
            int[] at = {c % s.nx(), c / s.nx() % s.ny(), c / (s.nx() * s.ny())};
            for (int face = 0; face < 6; face++) {
                int other = neighbour(s, at, face);
                boolean inside = face % 2 == 0 && other >= 0 && !solids.isSolid(other);
                boolean outwards = other < 0 && isOpen(s, sides, face);
                if (!solids.isSolid(c) && (inside || outwards)) {
                    double before = face % 2 == 0 ? (other < 0 ? 0 : p[other]) : p[c];
                    double beyond = face % 2 == 0 ? p[c] : 0;
                    add(u, at, face, before - beyond);
                }
            }
        }
    }

    private static int neighbour(GridShape s, int[] at, int face) {
        int[] to = at.clone();
        to[face / 2] += face % 2 == 0 ? -1 : 1;
        boolean out = to[0] < 0 || to[1] < 0 || to[2] < 0 || to[0] >= s.nx() || to[1] >= s.ny() || to[2] >= s.nz();
        return out ? -1 : s.cell(to[0], to[1], to[2]);
    }

    private static boolean isOpen(GridShape s, Sides sides, int face) {
        Side[] all = {sides.left(), sides.right(), sides.floor(), sides.top(), sides.back(), sides.front()};
        return all[face] == Side.OPEN && !(face > 3 && s.isPlane());
    }

    private static double value(MacVelocity u, int[] at, int face) {
        return array(u, face)[index(u.shape(), at, face)];
    }

    private static void add(MacVelocity u, int[] at, int face, double by) {
        array(u, face)[index(u.shape(), at, face)] += (float) by;
    }

    private static float[] array(MacVelocity u, int face) {
        return face < 2 ? u.x() : face < 4 ? u.y() : u.z();
    }

    private static int index(GridShape s, int[] at, int face) {
        int beyond = face % 2;
        return face < 2 ? s.xFace(at[0] + beyond, at[1], at[2]) : face < 4 ? s.yFace(at[0], at[1] + beyond, at[2])
                : s.zFace(at[0], at[1], at[2] + beyond);
    }

    /** With complete choice of the row; a column without a pivot (the constant of a pocket) gets 0. */
    private static double[] solve(double[][] rows) {
        int n = rows.length;
        boolean[] used = new boolean[n];
        int[] rowOf = new int[n];
        for (int col = 0; col < n; col++) {
            int best = -1;
            for (int r = 0; r < n; r++) {
                best = !used[r] && (best < 0 || Math.abs(rows[r][col]) > Math.abs(rows[best][col])) ? r : best;
            }
            rowOf[col] = best >= 0 && Math.abs(rows[best][col]) > 1e-9 ? best : -1;
            if (rowOf[col] < 0) {
                continue;
            }
            used[best] = true;
            for (int r = 0; r < n; r++) {
                double by = rows[r][col] / rows[best][col];
                for (int c = col; r != best && by != 0 && c <= n; c++) {
                    rows[r][c] -= by * rows[best][c];
                }
            }
        }
        double[] x = new double[n];
        for (int col = 0; col < n; col++) {
            x[col] = rowOf[col] < 0 ? 0 : rows[rowOf[col]][n] / rows[rowOf[col]][col];
        }
        return x;
    }
}

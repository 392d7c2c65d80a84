package org.wispwright.optimize.force;

import java.util.ArrayList;
import java.util.List;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * Refinement by space instead of by frequency: the force is the discrete curl of a vector potential on the cells' edges, the sum
 * of lattices of cubic B-splines, each twice as fine as the one before: a quarter of the box's smallest side between knots, an eighth,
 * and so on down to 4 cells, about the shortest wave of {@link BandPlan}. In time each lattice has the splines of a band: 5, 10, 20.
 *
 * <p>Forward: {@code f = curl(sum over levels of scale Bz By Bx c)}, {@code c = sum over splines of q[s][r] x}. Pullback: each factor's
 * transpose in turn. The scale makes the force of a spline in the middle of a lattice have root mean square 1 over the box; splines overlap,
 * so unlike {@link ForceBasis} the unknowns' length is not the force's. Layout: levels, in each the components x, y, z, in
 * each control values (x fastest), in each its time splines.
 */
public final class PotentialForce implements ForceModel {
    private static final int COARSEST_SPANS = 4;
    private static final int LEAST_CELLS = 4;
    private static final int FIRST_SPLINES = 5;

    private final GridShape shape;
    private final List<Level> levels = new ArrayList<>();

    /** @param steps number of force steps, at least 1 */
    public PotentialForce(GridShape shape, int steps) {
        this.shape = shape;
        int side = Math.min(shape.nx(), Math.min(shape.ny(), shape.nz()));
        int splines = FIRST_SPLINES;
        for (int spans = COARSEST_SPANS; spans * LEAST_CELLS <= side; spans *= 2, splines *= 2) {
            levels.add(new Level((double) spans / side, TimeSplines.orthonormal(steps, Math.min(splines, steps)), unknowns()));
        }
    }

    /** One lattice. */
    private final class Level {
        /** Of component c along axis a. */
        final SplineTaps[][] taps = new SplineTaps[3][3];
        final double[][] time;
        final int start;
        final int end;
        double scale = 1;

        Level(double spansACell, double[][] time, int start) {
            this.time = time;
            this.start = start;
            int[] cells = {shape.nx(), shape.ny(), shape.nz()};
            int count = 0;
            for (int c = 0; c < 3; c++) {
                for (int a = 0; a < 3; a++) {
                    taps[c][a] = new SplineTaps((int) Math.round(spansACell * cells[a]), cells[a], a != c);
                }
                count += controls(c);
            }
            end = start + count * time[0].length;
            scale = 1 / middleSize();
        }

        int controls(int c) {
            return taps[c][0].controls() * taps[c][1].controls() * taps[c][2].controls();
        }

        private double middleSize() {
            SplineTaps[] t = taps[1];
            float[][] potential = zeros();
            float[] control = new float[controls(1)];
            control[t[0].controls() / 2 + t[0].controls() * (t[1].controls() / 2 + t[1].controls() * (t[2].controls() / 2))] = 1;
            addUp(1, control, potential[1]);
            MacVelocity force = new MacVelocity(shape);
            curl(potential, force);
            double squares = 0;
            for (float[] values : new float[][] {force.x(), force.y(), force.z()}) {
                for (float v : values) {
                    squares += (double) v * v;
                }
            }
            return Math.sqrt(squares / shape.cells());
        }

        private void addUp(int c, float[] control, float[] potential) {
            SplineTaps[] t = taps[c];
            float[] x = t[0].forward(control, 1);
            float[] y = t[1].forward(x, t[0].places());
            float[] z = t[2].forward(y, t[0].places() * t[1].places());
            for (int n = 0; n < z.length; n++) {
                potential[n] += z[n];
            }
        }

        void force(double[] x, int step, float[][] potential) {
            double[] q = time[step];
            int at = start;
            for (int c = 0; c < 3; c++) {
                float[] control = new float[controls(c)];
                for (int n = 0; n < control.length; n++) {
                    double amplitude = 0;
                    for (double weight : q) {
                        amplitude += weight * x[at++];
                    }
                    control[n] = (float) (scale * amplitude);
                }
                addUp(c, control, potential[c]);
            }
        }

        void pullback(float[][] potentialBar, int step, double[] xBar) {
            double[] q = time[step];
            int at = start;
            for (int c = 0; c < 3; c++) {
                SplineTaps[] t = taps[c];
                float[] y = t[2].pullback(potentialBar[c], t[0].places() * t[1].places());
                float[] x = t[1].pullback(y, t[0].places());
                float[] control = t[0].pullback(x, 1);
                for (float bar : control) {
                    for (double weight : q) {
                        xBar[at++] += weight * scale * bar;
                    }
                }
            }
        }
    }

    @Override
    public int unknowns() {
        return levels.isEmpty() ? 0 : levels.get(levels.size() - 1).end;
    }

    /** Numbers of unknowns with one level open, with two, and so on. */
    public List<Integer> openings() {
        return levels.stream().map(level -> level.end).toList();
    }

    @Override
    public void force(double[] x, int step, MacVelocity out) {
        float[][] potential = zeros();
        for (Level level : levels) {
            if (level.end <= x.length) {
                level.force(x, step, potential);
            }
        }
        curl(potential, out);
    }

    @Override
    public void pullback(MacVelocity forceBar, int step, double[] xBar) {
        float[][] potentialBar = zeros();
        curlPullback(forceBar, potentialBar);
        for (Level level : levels) {
            if (level.end <= xBar.length) {
                level.pullback(potentialBar, step, xBar);
            }
        }
    }

    private float[][] zeros() {
        int nx = shape.nx();
        int ny = shape.ny();
        int nz = shape.nz();
        return new float[][] {new float[nx * (ny + 1) * (nz + 1)], new float[(nx + 1) * ny * (nz + 1)],
            new float[(nx + 1) * (ny + 1) * nz]};
    }

    private int xEdge(int i, int j, int k) {
        return i + shape.nx() * (j + (shape.ny() + 1) * k);
    }

    private int yEdge(int i, int j, int k) {
        return i + (shape.nx() + 1) * (j + shape.ny() * k);
    }

    private int zEdge(int i, int j, int k) {
        return i + (shape.nx() + 1) * (j + (shape.ny() + 1) * k);
    }

    /** Overwrites f with the curl of a, in differences that are not divided by the cell: the level's scale sees to that. */
    private void curl(float[][] a, MacVelocity f) {
        for (int k = 0; k <= shape.nz(); k++) {
            for (int j = 0; j <= shape.ny(); j++) {
                for (int i = 0; i <= shape.nx(); i++) {
                    if (j < shape.ny() && k < shape.nz()) {
                        f.x()[shape.xFace(i, j, k)] = a[2][zEdge(i, j + 1, k)] - a[2][zEdge(i, j, k)]
                                - a[1][yEdge(i, j, k + 1)] + a[1][yEdge(i, j, k)];
                    }
                    if (i < shape.nx() && k < shape.nz()) {
                        f.y()[shape.yFace(i, j, k)] = a[0][xEdge(i, j, k + 1)] - a[0][xEdge(i, j, k)]
                                - a[2][zEdge(i + 1, j, k)] + a[2][zEdge(i, j, k)];
                    }
                    if (i < shape.nx() && j < shape.ny()) {
                        f.z()[shape.zFace(i, j, k)] = a[1][yEdge(i + 1, j, k)] - a[1][yEdge(i, j, k)]
                                - a[0][xEdge(i, j + 1, k)] + a[0][xEdge(i, j, k)];
                    }
                }
            }
        }
    }

    private void curlPullback(MacVelocity fBar, float[][] aBar) {
        for (int k = 0; k <= shape.nz(); k++) {
            for (int j = 0; j <= shape.ny(); j++) {
                for (int i = 0; i <= shape.nx(); i++) {
                    if (j < shape.ny() && k < shape.nz()) {
                        float bar = fBar.x()[shape.xFace(i, j, k)];
                        aBar[2][zEdge(i, j + 1, k)] += bar;
                        aBar[2][zEdge(i, j, k)] -= bar;
                        aBar[1][yEdge(i, j, k + 1)] -= bar;
                        aBar[1][yEdge(i, j, k)] += bar;
                    }
                    if (i < shape.nx() && k < shape.nz()) {
                        float bar = fBar.y()[shape.yFace(i, j, k)];
                        aBar[0][xEdge(i, j, k + 1)] += bar;
                        aBar[0][xEdge(i, j, k)] -= bar;
                        aBar[2][zEdge(i + 1, j, k)] -= bar;
                        aBar[2][zEdge(i, j, k)] += bar;
                    }
                    if (i < shape.nx() && j < shape.ny()) {
                        float bar = fBar.z()[shape.zFace(i, j, k)];
                        aBar[1][yEdge(i + 1, j, k)] += bar;
                        aBar[1][yEdge(i, j, k)] -= bar;
                        aBar[0][xEdge(i, j + 1, k)] -= bar;
                        aBar[0][xEdge(i, j, k)] += bar;
                    }
                }
            }
        }
    }
}

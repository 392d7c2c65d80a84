package org.wispwright.warp.retouch;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.matte.Window;
import org.wispwright.warp.mesh.AsRigidAsPossible;
import org.wispwright.warp.mesh.HandledMesh;
import org.wispwright.warp.mesh.MeshPainting;
import org.wispwright.warp.mesh.QuadGrid;

/**
 * An as-rigid-as-possible mesh with a corner at every handle, factorised once for the handles' starts, solved for any ends. The result
 * depends on the ends alone, not on how they got there.
 * <p>In a box of its own the mesh is one cell larger than the box on every side and its rim stays; over the frame it ends with the
 * frame (or the farthest handle), its rim is free, and nothing comes from beyond.
 */
final class MeshMap implements BackwardMap {
    /** Iterations from the handles' best turn and shift. */
    static final int ITERATIONS = 40;

    private final HandledMesh handled;
    private final AsRigidAsPossible solver;
    private final int handles;
    private final double[] toX;
    private final double[] toY;
    private MeshPainting painting;
    private double[] x;
    private double[] y;
    private double[] shownX;
    private double[] shownY;

    /**
     * Makes and solves the mesh.
     *
     * @param box where the mesh is and its rim stays; empty for the frame and a free rim
     */
    MeshMap(List<Handle> handles, Cells cells, Optional<Box> box, Picture frame) {
        Box over = box.orElse(Box.frame(frame));
        for (Handle handle : handles) {
            over = over.with(handle.from());
        }
        double growX = box.isPresent() ? (over.right() - over.left()) / (cells.columns() - 2) : 0;
        double growY = box.isPresent() ? (over.bottom() - over.top()) / (cells.rows() - 2) : 0;
        QuadGrid grid = QuadGrid.over(over.left() - growX, over.top() - growY, over.right() + growX, over.bottom() + growY, cells.columns(),
                cells.rows());
        handled = HandledMesh.of(grid, handles.stream().mapToDouble(h -> h.from().x()).toArray(),
                handles.stream().mapToDouble(h -> h.from().y()).toArray());
        this.handles = handles.size();
        int[] held = box.isPresent() ? withRim(handled.handles(), cells) : handled.handles();
        solver = new AsRigidAsPossible(handled.mesh(), held);
        toX = Arrays.stream(held).mapToDouble(c -> handled.mesh().x()[c]).toArray();
        toY = Arrays.stream(held).mapToDouble(c -> handled.mesh().y()[c]).toArray();
        place(handles);
        shownX = x;
        shownY = y;
    }

    /** The box that a matte gives a mesh. */
    static Optional<Box> box(Optional<Matte> within) {
        return within.flatMap(Box::of);
    }

    private static int[] withRim(int[] handles, Cells cells) {
        int columns = cells.columns() + 1;
        int corners = columns * (cells.rows() + 1);
        int[] held = Arrays.copyOf(handles, handles.length + corners);
        int count = handles.length;
        for (int c = 0; c < corners; c++) {
            if (c % columns == 0 || c % columns == cells.columns() || c < columns || c >= corners - columns) {
                held[count++] = c;
            }
        }
        return Arrays.copyOf(held, count);
    }

    /** Solves for the handles' ends; their starts are those the map was made with. */
    void place(List<Handle> now) {
        for (int h = 0; h < handles; h++) {
            toX[h] = now.get(h).to().x();
            toY[h] = now.get(h).to().y();
        }
        solver.begin(toX, toY);
        for (int n = 0; n < ITERATIONS; n++) {
            solver.step();
        }
        x = solver.x();
        y = solver.y();
        painting = new MeshPainting(handled.mesh(), handled.handles(), x, y);
    }

    @Override
    public void displacements(int left, int top, int width, int rows, int height, double[] dx, double[] dy) {
        painting.displacements(left, top, width, rows, height, dx, dy);
    }

    /** The mesh as it is now. */
    MeshPainting painting() {
        return painting;
    }

    /** How many triangles. */
    int triangles() {
        return handled.mesh().triangles().length / 3;
    }

    /** The middle of a triangle now, heights. */
    double[] middle(int triangle) {
        double[] middle = new double[2];
        for (int k = 3 * triangle; k < 3 * triangle + 3; k++) {
            middle[0] += x[handled.mesh().triangles()[k]] / 3;
            middle[1] += y[handled.mesh().triangles()[k]] / 3;
        }
        return middle;
    }

    /**
     * The pixels under triangles with a corner that is now more than a share of a pixel from where it was last shown, as they were and
     * as they are; those corners count as shown now. Empty if there is none.
     */
    Optional<Window> shown(double pixels, int width, int height) {
        int[] corners = handled.mesh().triangles();
        boolean[] moved = new boolean[x.length];
        for (int c = 0; c < x.length; c++) {
            moved[c] = Math.max(Math.abs(x[c] - shownX[c]), Math.abs(y[c] - shownY[c])) * height > pixels;
        }
        Box dirty = null;
        for (int t = 0; t < corners.length; t += 3) {
            if (moved[corners[t]] || moved[corners[t + 1]] || moved[corners[t + 2]]) {
                for (int k = t; k < t + 3; k++) {
                    int c = corners[k];
                    Box one = new Box(Math.min(x[c], shownX[c]), Math.min(y[c], shownY[c]), Math.max(x[c], shownX[c]),
                            Math.max(y[c], shownY[c]));
                    dirty = dirty == null ? one : new Box(Math.min(dirty.left(), one.left()), Math.min(dirty.top(), one.top()),
                            Math.max(dirty.right(), one.right()), Math.max(dirty.bottom(), one.bottom()));
                }
            }
        }
        double[] nextX = shownX.clone();
        double[] nextY = shownY.clone();
        for (int c = 0; c < x.length; c++) {
            if (moved[c]) {
                nextX[c] = x[c];
                nextY[c] = y[c];
            }
        }
        shownX = nextX;
        shownY = nextY;
        return dirty == null ? Optional.empty() : dirty.window(width, height);
    }
}

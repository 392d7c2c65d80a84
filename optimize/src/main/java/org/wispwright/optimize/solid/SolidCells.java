package org.wispwright.optimize.solid;

import java.util.ArrayList;
import java.util.List;
import org.wispwright.optimize.motion.Pose;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.volume.GridShape;
import org.wispwright.render.volume.MacVelocity;

/**
 * Which cells of a grid are solid at one moment, and how fast. A cell is solid when its centre is inside a thing
 * ({@link Solid#fills}); where two things overlap it is the first one's. Two bytes a cell. The same bits for any lanes.
 */
public final class SolidCells {
    /** Clearances are told up to this many cells; farther away counts as this far. */
    public static final int FAR = 8;

    private final GridShape shape;
    private final List<Pose> poses;
    /** Number of the thing that fills a cell, from 1; 0 in fluid. */
    private final byte[] owner;
    /** Largest of the three index differences to the nearest solid cell; 0 in solids, at most FAR. */
    private final byte[] clearance;

    /**
     * Fills the cells.
     *
     * @param shape           the grid
     * @param obstacles       at most {@link Obstacle#MOST}
     * @param fromFrame       start of the span at whose end the things are wanted
     * @param toFrame         its end
     * @param framesPerSecond of the shot
     */
    public SolidCells(GridShape shape, List<Obstacle> obstacles, double fromFrame, double toFrame, double framesPerSecond, Lanes lanes) {
        this.shape = shape;
        List<Pose> all = new ArrayList<>();
        owner = new byte[shape.cells()];
        for (int n = obstacles.size() - 1; n >= 0; n--) {                      // the first thing writes last
            Pose pose = obstacles.get(n).pose(fromFrame, toFrame, framesPerSecond);
            all.add(0, pose);
            fill(obstacles.get(n).solid(), pose, (byte) (n + 1), lanes);
        }
        poses = List.copyOf(all);
        clearance = clearances(lanes);
    }

    private void fill(Solid solid, Pose pose, byte number, Lanes lanes) {
        double h = shape.cellMetres();
        double reach = solid.reach(h) / h;
        Vec3 at = pose.position();
        double ci = (at.x() - shape.originX()) / h - 0.5;
        double cj = (at.y() - shape.originY()) / h - 0.5;
        double ck = (at.z() - shape.originZ()) / h - 0.5;
        int i0 = (int) Math.max(0, Math.floor(ci - reach));
        int i1 = (int) Math.min(shape.nx() - 1, Math.ceil(ci + reach));
        int j0 = (int) Math.max(0, Math.floor(cj - reach));
        int j1 = (int) Math.min(shape.ny() - 1, Math.ceil(cj + reach));
        lanes.forEach(shape.nz(), k -> {
            // A plane cuts things through their middles, wherever they are along z.
            double z = shape.isPlane() ? at.z() : shape.originZ() + (k + 0.5) * h;
            if (!shape.isPlane() && Math.abs(k - ck) > reach + 1) {
                return;
            }
            for (int j = j0; j <= j1; j++) {
                for (int i = i0; i <= i1; i++) {
                    Vec3 local = pose.toLocal(new Vec3(shape.originX() + (i + 0.5) * h, shape.originY() + (j + 0.5) * h, z));
                    if (solid.fills(local.x(), local.y(), local.z(), h)) {
                        owner[shape.cell(i, j, k)] = number;
                    }
                }
            }
        });
    }

    /** One axis after the other: the least, over cells along the axis, of the larger of what is known there and the way to it. */
    private byte[] clearances(Lanes lanes) {
        byte[] along = new byte[owner.length];
        byte[] across = new byte[owner.length];
        for (int c = 0; c < owner.length; c++) {
            across[c] = (byte) (owner[c] == 0 ? FAR : 0);
        }
        widen(across, along, 1, shape.nx(), lanes);
        widen(along, across, shape.nx(), shape.ny(), lanes);
        widen(across, along, shape.nx() * shape.ny(), shape.nz(), lanes);
        return along;
    }

    private void widen(byte[] from, byte[] to, int stride, int count, Lanes lanes) {
        int plane = shape.nx() * shape.ny();
        lanes.forEach(shape.nz(), k -> {
            for (int c = k * plane; c < (k + 1) * plane; c++) {
                int place = c / stride % count;
                int best = from[c];
                for (int way = 1; way < best; way++) {
                    if (place >= way) {
                        best = Math.min(best, Math.max(way, from[c - way * stride]));
                    }
                    if (place + way < count) {
                        best = Math.min(best, Math.max(way, from[c + way * stride]));
                    }
                }
                to[c] = (byte) best;
            }
        });
    }

    /** The grid. */
    public GridShape shape() {
        return shape;
    }

    /** True if a cell is solid. */
    public boolean isSolid(int cell) {
        return owner[cell] != 0;
    }

    /** 0 in solids, 1 beside them (corners count), and so on, at most {@link #FAR}. */
    public int clearance(int cell) {
        return clearance[cell];
    }

    /** Overwrites the values of solid cells of slab k with 0. */
    public void clear(float[] values, int k) {
        int plane = shape.nx() * shape.ny();
        for (int c = k * plane; c < (k + 1) * plane; c++) {
            if (owner[c] != 0) {
                values[c] = 0;
            }
        }
    }

    /**
     * Overwrites every face of slab k that has a solid cell on a side: with that thing's velocity across it, or with 0. Between two things
     * the one on the lower side counts. z faces between slabs k - 1 and k belong to slab k, the frontmost to the last slab.
     *
     * @param moving false writes 0 everywhere: the derivative of a velocity that is given
     */
    public void writeFaces(MacVelocity u, boolean moving, int k) {
        int nx = shape.nx();
        int ny = shape.ny();
        int plane = nx * ny;
        for (int j = 0; j < ny; j++) {
            for (int i = 0; i < nx; i++) {
                int c = shape.cell(i, j, k);
                byte here = owner[c];
                byte left = i > 0 ? owner[c - 1] : 0;
                byte below = j > 0 ? owner[c - nx] : 0;
                byte behind = k > 0 ? owner[c - plane] : 0;
                if (left != 0 || here != 0) {
                    u.x()[shape.xFace(i, j, k)] = moving ? (float) at(left != 0 ? left : here, i, j + 0.5, k + 0.5).x() : 0;
                }
                if (below != 0 || here != 0) {
                    u.y()[shape.yFace(i, j, k)] = moving ? (float) at(below != 0 ? below : here, i + 0.5, j, k + 0.5).y() : 0;
                }
                if (behind != 0 || here != 0) {
                    u.z()[shape.zFace(i, j, k)] = moving ? (float) at(behind != 0 ? behind : here, i + 0.5, j + 0.5, k).z() : 0;
                }
                if (here == 0) {
                    continue;
                }
                if (i == nx - 1) {
                    u.x()[shape.xFace(nx, j, k)] = moving ? (float) at(here, nx, j + 0.5, k + 0.5).x() : 0;
                }
                if (j == ny - 1) {
                    u.y()[shape.yFace(i, ny, k)] = moving ? (float) at(here, i + 0.5, ny, k + 0.5).y() : 0;
                }
                if (k == shape.nz() - 1) {
                    u.z()[shape.zFace(i, j, k + 1)] = moving ? (float) at(here, i + 0.5, j + 0.5, k + 1).z() : 0;
                }
            }
        }
    }

    private Vec3 at(byte number, double i, double j, double k) {
        double h = shape.cellMetres();
        return poses.get(number - 1).velocityAt(new Vec3(shape.originX() + i * h, shape.originY() + j * h, shape.originZ() + k * h));
    }
}

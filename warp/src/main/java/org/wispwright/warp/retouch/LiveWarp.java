package org.wispwright.warp.retouch;

import java.util.Optional;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.matte.Window;
import org.wispwright.warp.resample.Kernel;

/**
 * A mesh warp that follows the hand. While a handle is dragged only the pixels that may have changed are drawn again, as a draft
 * (bilinear); at rest they are drawn as {@link Retoucher} draws them, to the last bit. An as-rigid-as-possible mesh is factorised once,
 * here; a spline or moving least squares is fitted anew for each drag.
 * <p>A draft shows the solved mesh itself, except that corners which moved by under {@value #STILL} pixels wait. Knows no screen; one
 * caller at a time.
 */
public final class LiveWarp {
    /** Mesh corners that moved by no more than this many pixels since they were drawn are not drawn again in a draft. */
    public static final double STILL = 0.02;

    private final Picture before;
    private final Picture original;
    private final Picture shown;
    private Bend bend;
    private MeshWarp warp;

    /**
     * Draws the warp at rest.
     *
     * @param warp     the warp to begin with
     * @param before   read, and not to be changed while this lives: the picture that the operations before the warp left
     * @param original read: the picture before any operation, same raster
     * @throws IllegalArgumentException if the rasters differ
     */
    public LiveWarp(MeshWarp warp, Picture before, Picture original) {
        if (before.width() != original.width() || before.height() != original.height()) {
            throw new IllegalArgumentException("live warp: got pictures of " + before.width() + "x" + before.height() + " and "
                    + original.width() + "x" + original.height() + ", needs one raster");
        }
        this.warp = warp;
        this.before = before;
        this.original = original;
        shown = before.copy();
        bend = Bend.of(warp, original);
        rest();
    }

    /** The picture as it is now; the next drag or rest overwrites it. */
    public Picture shown() {
        return shown;
    }

    /** The warp as it is now. */
    public MeshWarp warp() {
        return warp;
    }

    /**
     * The place before the warp that is shown at a place now, its displacement linear between the centres of the pixels around; a handle
     * from there to the place leaves the picture as it is, but for what the kind makes of one handle more.
     *
     * @param place in heights; beyond the picture the border's displacement counts
     * @return empty where the mesh has left nothing
     */
    public Optional<Point> cameFrom(Point place) {
        int height = original.height();
        int width = original.width();
        double x = Math.max(0, Math.min(width - 1, place.x() * height - 0.5));
        double y = Math.max(0, Math.min(height - 1, place.y() * height - 0.5));
        int left = (int) Math.min(Math.max(0, width - 2), Math.floor(x));
        int right = Math.min(width - 1, left + 1);
        double[] dx = new double[width];
        double[] dy = new double[width];
        double fromX = 0;
        double fromY = 0;
        for (int row = (int) Math.floor(y); row <= Math.min(height - 1, Math.floor(y) + 1); row++) {
            double share = Math.max(0, 1 - Math.abs(y - row));
            bend.displacements(row, dx, dy);
            if (share > 0) {
                fromX += share * (dx[left] + (x - left) * (dx[right] - dx[left]));
                fromY += share * (dy[left] + (x - left) * (dy[right] - dy[left]));
            }
        }
        return Double.isNaN(fromX) || Double.isNaN(fromY) ? Optional.empty()
                : Optional.of(new Point(place.x() + fromX / height, place.y() + fromY / height));
    }

    /**
     * Pulls a handle to another place.
     *
     * @return the pixels that were drawn again, empty if none
     * @throws IllegalArgumentException if there is no such handle, or two ends then coincide or all lie on one line; nothing is then
     *                                  changed
     */
    public Optional<Window> drag(int handle, Point to) {
        MeshWarp next = warp.with(handle, to);
        Optional<Window> dirty;
        if (bend.map() instanceof MeshMap mesh) {
            mesh.place(next.handles());
            dirty = mesh.shown(STILL, original.width(), original.height());
        } else {
            bend = bend.with(BackwardMap.fitted(next.kind(), next.handles()));
            dirty = Optional.of(Window.all(original.width(), original.height()));
        }
        warp = next;
        dirty = dirty.flatMap(window -> bend.reach().flatMap(reach -> shared(window, reach)));
        dirty.ifPresent(window -> bend.paint(before, window, Kernel.LINEAR, shown));
        return dirty;
    }

    /**
     * Draws the picture of rest.
     *
     * @return the pixels that were drawn again, empty if none
     */
    public Optional<Window> rest() {
        Optional<Window> reach = bend.reach();
        if (warp.changesNothing()) {
            System.arraycopy(before.rgba(), 0, shown.rgba(), 0, before.rgba().length);
            return reach;
        }
        reach.ifPresent(window -> bend.paint(before, window, Kernel.KEYS, shown));
        return reach;
    }

    private static Optional<Window> shared(Window a, Window b) {
        int left = Math.max(a.left(), b.left());
        int top = Math.max(a.top(), b.top());
        int right = Math.min(a.left() + a.width(), b.left() + b.width());
        int bottom = Math.min(a.top() + a.height(), b.top() + b.height());
        return left < right && top < bottom ? Optional.of(new Window(left, top, right - left, bottom - top)) : Optional.empty();
    }
}

package org.wispwright.warp.paintover;

import java.util.Arrays;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.resample.Blur;
import org.wispwright.warp.resample.Kernel;
import org.wispwright.warp.resample.Resampling;
import org.wispwright.warp.resample.Resized;

/**
 * Where a person moved smoke rather than added or removed it. Patches of changed opacity that lie near each other form a region; in each
 * the {@link OpticalFlow} between the opacities is tried. A change of opacity explains any painted frame, so what is asked is whether
 * moving alone explains this one: a region counts as moved if
 * <ul>
 * <li>the frame before, moved, leaves at most {@value #LEFT} of the squared difference between the frames, in their own colours,
 * <li>smoke was neither made nor lost: {@code |gained - lost| <= } {@value #UNEVEN} {@code (gained + lost)}, sums of opacity, and
 * <li>it was carried, not stretched: {@code |det(I + grad u) - 1|}, weighted with the change of opacity, is at most {@value #STRETCHED} on
 *     average. Without this a flow draws out any smoke near by until it covers what was added.
 * </ul>
 * The rule is ours.
 */
final class Moved {
    /** Share of the squared difference that moving may leave over. */
    static final double LEFT = 0.35;
    /** Share of the changed opacity that may be gained or lost over all. */
    static final double UNEVEN = 0.35;
    /** Mean share by which areas may grow or shrink: moved blobs have about 0.4, an addition mistaken for a move 1 and more. */
    static final double STRETCHED = 0.8;
    private static final int ROWS = 96;
    /** A smaller change of opacity does not make a region. */
    private static final double SEEN = 0.02;
    /** How far changed patches may lie apart to count as one region: standard deviation in heights of the blur that joins them. */
    private static final double JOIN = 0.02;
    private static final double JOINED = 0.05;
    /** Displacements shorter than this many heights are none. */
    private static final double STILL = 2e-4;

    private final float[] u;
    private final float[] region;
    private final int movedRegions;
    private final int regions;

    private Moved(float[] u, float[] region, int movedRegions, int regions) {
        this.u = u;
        this.region = region;
        this.movedRegions = movedRegions;
        this.regions = regions;
    }

    /**
     * Tries every region.
     *
     * @param a0   our opacity before, from the frame
     * @param a1   our opacity after; equal to a0 where nothing changed
     */
    static Moved between(Picture before, Picture after, float[] background, float[] a0, float[] a1) {
        int width = before.width();
        int height = before.height();
        int rows = Math.min(ROWS, height);
        int columns = Math.max(1, (int) Math.round((double) width * rows / height));
        float[] flow = OpticalFlow.between(Resized.values(a0, 1, width, height, columns, rows),
                Resized.values(a1, 1, width, height, columns, rows), columns, rows);
        float[] changed = new float[a0.length];
        for (int p = 0; p < changed.length; p++) {
            changed[p] = Math.abs(a1[p] - a0[p]) > SEEN ? 1 : 0;
        }
        float[] near = Blur.gaussian(Resized.values(changed, 1, width, height, columns, rows), 1, columns, rows, JOIN * rows);
        boolean[] in = new boolean[near.length];
        for (int p = 0; p < in.length; p++) {
            in[p] = near[p] > JOINED;
        }
        Patches patches = Patches.of(in, columns, rows);
        float[] fine = Resized.values(flow, 2, columns, rows, width, height);
        for (int n = 0; n < fine.length; n++) {
            fine[n] *= (n & 1) == 0 ? (float) width / columns : (float) height / rows;
        }
        boolean[] moved = explained(patches, columns, rows, fine, before, after, background, a0, a1);
        float[] region = new float[near.length];
        int count = 0;
        for (int p = 0; p < region.length; p++) {
            region[p] = patches.at(p) >= 0 && moved[patches.at(p)] ? 1 : 0;
        }
        for (boolean one : moved) {
            count += one ? 1 : 0;
        }
        float[] soft = Resized.values(Blur.gaussian(region, 1, columns, rows, 1), 1, columns, rows, width, height);
        for (int p = 0; p < soft.length; p++) {
            soft[p] = Math.min(1f, Math.max(0f, soft[p]));
            float ux = fine[2 * p] * soft[p] / height;
            float uy = fine[2 * p + 1] * soft[p] / height;
            boolean still = Math.hypot(ux, uy) < STILL;
            fine[2 * p] = still ? 0 : ux;
            fine[2 * p + 1] = still ? 0 : uy;
        }
        return new Moved(fine, soft, count, patches.count());
    }

    /** Displacement of every pixel in heights, 0 outside moved regions: {@code q = p + u(p)}; two numbers a pixel, not a copy. */
    float[] displacement() {
        return u;
    }

    /** 1 in moved regions, falling to 0 around them; one number a pixel, not a copy. */
    float[] region() {
        return region;
    }

    /** How many regions were moved. */
    int movedRegions() {
        return movedRegions;
    }

    /** How many regions changed. */
    int regions() {
        return regions;
    }

    /** What is summed up over one region. */
    private static final class Sums {
        private double whole;
        private double left;
        private double gained;
        private double lost;
        private double stretched;

        private boolean isMoved() {
            return left <= LEFT * whole && Math.abs(gained - lost) <= UNEVEN * (gained + lost)
                    && stretched <= STRETCHED * (gained + lost);
        }
    }

    /** @param flow displacement in pixels of the frames' raster, two numbers a pixel */
    private static boolean[] explained(Patches patches, int columns, int rows, float[] flow, Picture before, Picture after,
            float[] background, float[] a0, float[] a1) {
        int width = before.width();
        int height = before.height();
        Sums[] sums = new Sums[patches.count()];
        Arrays.setAll(sums, n -> new Sums());
        float[] away = before.rgba().clone();
        for (int n = 0; n < away.length; n++) {
            away[n] -= background[n];
        }
        Picture smoke = new Picture(width, height, away);
        Resampling resampling = new Resampling(Kernel.KEYS);
        float[] read = new float[4];
        for (int p = 0; p < a0.length; p++) {
            int patch = patches.at(p % width * columns / width + columns * (p / width * rows / height));
            if (patch < 0) {
                continue;
            }
            Sums one = sums[patch];
            resampling.read(smoke, p % width + flow[2 * p], p / width + flow[2 * p + 1], read, 0);
            for (int c = 0; c < 4; c++) {
                double now = after.rgba()[4 * p + c];
                one.whole += Math.pow(now - before.rgba()[4 * p + c], 2);
                one.left += Math.pow(now - background[4 * p + c] - read[c], 2);
            }
            one.gained += Math.max(0, a1[p] - a0[p]);
            one.lost += Math.max(0, a0[p] - a1[p]);
            one.stretched += Math.abs(a1[p] - a0[p]) * Math.abs(area(flow, p, width) - 1);
        }
        boolean[] moved = new boolean[sums.length];
        for (int n = 0; n < moved.length; n++) {
            moved[n] = sums[n].isMoved();
        }
        return moved;
    }

    /** What a small area at pixel p becomes by {@code p + u}: the determinant of its derivative, from backward differences. */
    private static double area(float[] flow, int p, int width) {
        if (p % width == 0 || p < width) {
            return 1;
        }
        double xx = 1 + flow[2 * p] - flow[2 * (p - 1)];
        double yx = flow[2 * p + 1] - flow[2 * (p - 1) + 1];
        double xy = flow[2 * p] - flow[2 * (p - width)];
        double yy = 1 + flow[2 * p + 1] - flow[2 * (p - width) + 1];
        return xx * yy - xy * yx;
    }
}

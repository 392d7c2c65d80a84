package org.wispwright.render.march;

import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.view.Vec3;
import org.wispwright.render.view.View;

/**
 * Adds the derivatives of many rays' samples into one grid on several threads, with the same bits for any number of them and
 * no copy of the grid per thread.
 * <p>The lattice is cut into slabs of {@value #THICKNESS} cells square to one axis. A sample whose lower corner is in a slab
 * writes into that slab and the first layer of the next. Even slabs go first, then odd ones: no two at work touch the same
 * cell, and what each cell receives comes in an order that is fixed by ray, sample and parity alone.
 * <p>The axis is the one that the frame's vertical follows best (weighed by its cells), so most rays cross few slabs.
 */
final class SlabScatter {
    static final int THICKNESS = 4;

    private final RayTable rays;
    private final int axis;
    private final int slabs;

    SlabScatter(RayTable rays, View view, BorderedCells cells) {
        this.rays = rays;
        Vec3 above = view.above();
        double[] weight = {Math.abs(above.x()) * cells.acrossX(), Math.abs(above.y()) * cells.acrossY(), Math.abs(above.z()) * cells.acrossZ()};
        int[] across = {cells.acrossX(), cells.acrossY(), cells.acrossZ()};
        int best = 0;
        for (int a = 1; a < 3; a++) {
            if (weight[a] > weight[best]) {
                best = a;
            }
        }
        axis = best;
        slabs = (across[axis] + THICKNESS - 1) / THICKNESS;
    }

    /**
     * Adds the samples of rays fromRay..toRay-1.
     *
     * @param place where in the arrays ray p's first sample is: {@code place[p]}
     * @param litBar null if there is no light
     */
    void add(int fromRay, int toRay, int[] place, float[] valueBar, float[] litBar, BorderedCells densityInto, BorderedCells litInto, Lanes lanes) {
        for (int parity = 0; parity < 2; parity++) {
            int odd = parity;
            lanes.forEach((slabs + 1 - odd) / 2, piece -> {
                int slab = 2 * piece + odd;
                for (int p = fromRay; p < toRay; p++) {
                    if (place[p] >= 0) {
                        addRay(p, slab, place[p], valueBar, litBar, densityInto, litInto);
                    }
                }
            });
        }
    }

    private void addRay(int p, int slab, int first, float[] valueBar, float[] litBar, BorderedCells densityInto, BorderedCells litInto) {
        int count = rays.count[p];
        double start = rays.start[3 * p + axis];
        double advance = rays.advance[3 * p + axis];
        int low = slab * THICKNESS;
        int high = low + THICKNESS;
        int from;
        int to;
        if (advance >= 0) {
            from = firstAtOrAbove(low, start, advance, count);
            to = firstAtOrAbove(high, start, advance, count);
        } else {
            from = firstBelow(high, start, advance, count);
            to = firstBelow(low, start, advance, count);
        }
        if (from < to) {
            SampleKernel.scatter(rays, p, from, to, valueBar, litBar, first, densityInto, litInto);
        }
    }

    /** The first sample whose coordinate, rounded as in the kernels, is at least the border; count if there is none. */
    private static int firstAtOrAbove(int border, double start, double advance, int count) {
        if (start + 0.5 * advance >= border) {
            return 0;
        }
        if (!(start + (count - 0.5) * advance >= border)) {
            return count;
        }
        int n = clamp((border - start) / advance - 0.5, count);
        while (n > 0 && start + (n - 1 + 0.5) * advance >= border) {
            n--;
        }
        while (start + (n + 0.5) * advance < border) {
            n++;
        }
        return n;
    }

    /** The first sample whose coordinate is below the border, for rays that run down the axis. */
    private static int firstBelow(int border, double start, double advance, int count) {
        if (start + 0.5 * advance < border) {
            return 0;
        }
        if (!(start + (count - 0.5) * advance < border)) {
            return count;
        }
        int n = clamp((border - start) / advance - 0.5, count);
        while (n > 0 && start + (n - 1 + 0.5) * advance < border) {
            n--;
        }
        while (start + (n + 0.5) * advance >= border) {
            n++;
        }
        return n;
    }

    private static int clamp(double n, int count) {
        return (int) Math.max(0, Math.min(count - 1, n));
    }
}

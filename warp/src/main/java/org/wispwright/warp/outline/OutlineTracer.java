package org.wispwright.warp.outline;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.wispwright.warp.measure.Plane;

/**
 * Outlines of a plane at a level: marching squares. The plane is read at pixel centres, as 0 one pixel beyond the border, so every
 * outline closes. Each square of four neighbouring centres is crossed where a side has one end inside ({@code value >= level}) and
 * one outside, at the place where the value between them, taken as linear, is the level. With two opposite corners inside, the mean
 * of the four decides whether the inside joins up through the middle.
 * <p>Loops are in heights; the centre of pixel (x,y) is at {@code ((x + 0.5) / height, (y + 0.5) / height)}. The inside is on the
 * right as seen on the screen: loops around smoke have a positive {@link Loop#signedArea}, loops around holes a negative one. They
 * come in the order in which their topmost, then leftmost, crossings are met; same bits always.
 * <p>Source: Lorensen and Cline (1987), SIGGRAPH 87, 163-169, in the plane; the mean of four for the open case, Nielson and Hamann
 * (1991), Visualization 91, 83-91, ask the value at the saddle instead, which gives the same answer except near a tie.
 */
public final class OutlineTracer {
    private final int columns;
    private final int height;
    private final double level;
    private final double[] padded;
    private final int[] next;

    private OutlineTracer(Plane plane, double level) {
        columns = plane.width() + 2;
        height = plane.height();
        this.level = level;
        padded = new double[columns * (height + 2)];
        for (int y = 0; y < height; y++) {
            System.arraycopy(plane.values(), plane.width() * y, padded, 1 + columns * (y + 1), plane.width());
        }
        next = new int[2 * padded.length];
    }

    /**
     * All closed outlines.
     *
     * @param plane read: alpha or another density, 0 = nothing
     * @param level above 0, finite
     * @return none if no pixel reaches the level
     * @throws IllegalArgumentException if the level is not above 0 and finite
     */
    public static List<Loop> trace(Plane plane, double level) {
        if (!(level > 0 && level < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("outline: got level " + level + ", needs a finite number above 0 (beyond the frame there "
                    + "is nothing, which must lie outside)");
        }
        OutlineTracer tracer = new OutlineTracer(plane, level);
        tracer.march();
        return tracer.loops();
    }

    /** A side between two centres: 2 n from centre n to the one on its right, 2 n + 1 from n to the one below. */
    private void march() {
        Arrays.fill(next, -1);
        for (int y = 0; y + 1 < height + 2; y++) {
            for (int x = 0; x + 1 < columns; x++) {
                int a = x + columns * y;
                int top = 2 * a;
                int left = 2 * a + 1;
                int right = 2 * (a + 1) + 1;
                int bottom = 2 * (a + columns);
                int corners = (in(a) ? 1 : 0) | (in(a + 1) ? 2 : 0) | (in(a + 1 + columns) ? 4 : 0) | (in(a + columns) ? 8 : 0);
                // From the side where the outline enters the square to the one where it leaves, the inside on its right.
                switch (corners) {
                    case 1 -> next[top] = left;
                    case 2 -> next[right] = top;
                    case 3 -> next[right] = left;
                    case 4 -> next[bottom] = right;
                    case 6 -> next[bottom] = top;
                    case 7 -> next[bottom] = left;
                    case 8 -> next[left] = bottom;
                    case 9 -> next[top] = bottom;
                    case 11 -> next[right] = bottom;
                    case 12 -> next[left] = right;
                    case 13 -> next[top] = right;
                    case 14 -> next[left] = top;
                    case 5 -> {
                        next[top] = joined(a) ? right : left;
                        next[bottom] = joined(a) ? left : right;
                    }
                    case 10 -> {
                        next[left] = joined(a) ? top : bottom;
                        next[right] = joined(a) ? bottom : top;
                    }
                    default -> { }
                }
            }
        }
    }

    private List<Loop> loops() {
        List<Loop> loops = new ArrayList<>();
        double[] x = new double[64];
        double[] y = new double[64];
        for (int start = 0; start < next.length; start++) {
            int count = 0;
            for (int side = start; next[side] >= 0;) {
                if (count == x.length) {
                    x = Arrays.copyOf(x, 2 * count);
                    y = Arrays.copyOf(y, 2 * count);
                }
                int n = side / 2;
                int m = side % 2 == 0 ? n + 1 : n + columns;
                double t = (level - padded[n]) / (padded[m] - padded[n]);
                x[count] = (n % columns - 0.5 + (side % 2 == 0 ? t : 0)) / height;
                y[count] = (n / columns - 0.5 + (side % 2 == 0 ? 0 : t)) / height;
                // Where the level is met at a centre itself, several sides share one point.
                if (count == 0 || x[count] != x[count - 1] || y[count] != y[count - 1]) {
                    count++;
                }
                int after = next[side];
                next[side] = -1;
                side = after;
            }
            while (count > 1 && x[count - 1] == x[0] && y[count - 1] == y[0]) {
                count--;
            }
            if (count >= 3) {
                loops.add(new Loop(Arrays.copyOf(x, count), Arrays.copyOf(y, count)));
            }
        }
        return loops;
    }

    private boolean in(int n) {
        return padded[n] >= level;
    }

    private boolean joined(int a) {
        return padded[a] + padded[a + 1] + padded[a + columns] + padded[a + columns + 1] >= 4 * level;
    }
}

package org.wispwright.warp.carry;

import java.util.ArrayList;
import java.util.List;
import org.wispwright.warp.matte.Point;

/**
 * How the smoke of a picture moves across it, at every position: velocities known where smoke is, with their weight, and everywhere
 * else those of the smoke near there.
 * <p>Normalised convolution (Knutsson and Westin 1993, CVPR 93, 515-523) over boxes that double until they hold smoke (pull and push:
 * Gortler, Grzeszczuk, Szeliski and Cohen 1996, SIGGRAPH 96, 43-54). Level 0 is the picture, each next level the mean of weight and of
 * weight times velocity over 2 x 2. With W_l and V_l read bilinearly from level l at p, and the
 * largest weight of the picture W, {@code s_l = min(1, W_l / (}{@value #ENOUGH}{@code W))}:
 * <pre>
 *   v(p) = sum_l c_l V_l / W_l  /  sum_l c_l          c_l = s_l (1 - s_(l-1)) ... (1 - s_0)
 * </pre>
 * So a position on smoke moves with that smoke, one beside it with the smoke nearest, and in a picture without any it stays.
 */
public final class PictureFlow {
    /** A place with this share of the largest weight is taken at its word. */
    static final double ENOUGH = 0.05;

    private final int height;
    private final double enough;
    private final List<Level> levels = new ArrayList<>();

    /** Weight, weight times x velocity, weight times y velocity, a pixel each. */
    private record Level(int width, int height, double[] sums) {
    }

    /**
     * Takes in a field.
     *
     * @param width pixels along a row
     * @param height rows
     * @param motion read: x velocity to the right, y velocity downwards, both in heights a second, and weight, 0 or more; a pixel each,
     *     pixels in rows from the top
     * @throws IllegalArgumentException if there are not three numbers a pixel, or one is not finite, or a weight is below 0
     */
    public PictureFlow(int width, int height, float[] motion) {
        if (motion.length != 3 * width * height) {
            throw new IllegalArgumentException("picture flow: got " + motion.length + " numbers, " + width + "x" + height + " pixels need "
                    + 3 * width * height);
        }
        this.height = height;
        double[] sums = new double[motion.length];
        double largest = 0;
        for (int n = 0; n < motion.length; n += 3) {
            if (!Float.isFinite(motion[n]) || !Float.isFinite(motion[n + 1]) || !Float.isFinite(motion[n + 2]) || motion[n + 2] < 0) {
                throw new IllegalArgumentException("picture flow: pixel " + n / 3 + " moves by (" + motion[n] + ", " + motion[n + 1]
                        + ") with weight " + motion[n + 2] + ", needs finite numbers and a weight from 0");
            }
            largest = Math.max(largest, motion[n + 2]);
            sums[n] = motion[n + 2];
            sums[n + 1] = (double) motion[n + 2] * motion[n];
            sums[n + 2] = (double) motion[n + 2] * motion[n + 1];
        }
        enough = ENOUGH * largest;
        levels.add(new Level(width, height, sums));
        while (levels.get(levels.size() - 1).sums().length > 3) {
            levels.add(halved(levels.get(levels.size() - 1)));
        }
    }

    /** The velocity at a position, heights a second: x to the right, y downwards. */
    public double[] velocity(Point at) {
        double[] velocity = {0, 0};
        double[] read = new double[3];
        double taken = 0;
        double left = 1;
        for (int n = 0; n < levels.size() && left > 0; n++) {
            read(levels.get(n), at, 1 << n, read);
            double share = left * (read[0] > 0 ? Math.min(1, read[0] / enough) : 0);
            if (share > 0) {
                velocity[0] += share * read[1] / read[0];
                velocity[1] += share * read[2] / read[0];
                taken += share;
                left -= share;
            }
        }
        if (taken > 0) {
            velocity[0] /= taken;
            velocity[1] /= taken;
        }
        return velocity;
    }

    /**
     * Where a position is after some time in this field, by the midpoint rule: error of third order in the time.
     *
     * @param seconds finite; negative goes back
     */
    public Point carried(Point from, double seconds) {
        double[] start = velocity(from);
        double[] middle = velocity(moved(from, start, seconds / 2));
        return moved(from, middle, seconds);
    }

    private static Point moved(Point from, double[] velocity, double seconds) {
        return new Point(from.x() + seconds * velocity[0], from.y() + seconds * velocity[1]);
    }

    private void read(Level level, Point at, int scale, double[] out) {
        double x = Math.min(level.width - 1, Math.max(0, at.x() * height / scale - 0.5));
        double y = Math.min(level.height - 1, Math.max(0, at.y() * height / scale - 0.5));
        int i = Math.min((int) x, Math.max(0, level.width - 2));
        int j = Math.min((int) y, Math.max(0, level.height - 2));
        double fx = x - i;
        double fy = y - j;
        int right = level.width > 1 ? 3 : 0;
        int down = level.height > 1 ? 3 * level.width : 0;
        int p = 3 * (i + level.width * j);
        double[] v = level.sums;
        for (int c = 0; c < 3; c++) {
            double top = v[p + c] + fx * (v[p + right + c] - v[p + c]);
            double low = v[p + down + c] + fx * (v[p + down + right + c] - v[p + down + c]);
            out[c] = top + fy * (low - top);
        }
    }

    /** Half as many pixels each way, rounded up; what lies beyond the edge has no weight. */
    private static Level halved(Level fine) {
        int width = (fine.width + 1) / 2;
        int height = (fine.height + 1) / 2;
        double[] sums = new double[3 * width * height];
        for (int j = 0; j < fine.height; j++) {
            for (int i = 0; i < fine.width; i++) {
                for (int c = 0; c < 3; c++) {
                    sums[3 * (i / 2 + width * (j / 2)) + c] += fine.sums[3 * (i + fine.width * j) + c] / 4;
                }
            }
        }
        return new Level(width, height, sums);
    }
}

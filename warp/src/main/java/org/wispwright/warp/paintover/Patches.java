package org.wispwright.warp.paintover;

import java.util.Arrays;

/**
 * Connected patches of a raster: pixels that are in, joined over all eight neighbours. Source: Rosenfeld and Pfaltz (1966), JACM 13(4),
 * 471-494.
 */
final class Patches {
    private final int[] label;
    private final int count;

    private Patches(int[] label, int count) {
        this.label = label;
        this.count = count;
    }

    /** Labels the pixels that are in; patches are numbered in the order of their first pixel, row by row. */
    static Patches of(boolean[] in, int width, int height) {
        int[] label = new int[in.length];
        Arrays.fill(label, -1);
        int[] stack = new int[in.length];
        int count = 0;
        for (int start = 0; start < in.length; start++) {
            if (!in[start] || label[start] >= 0) {
                continue;
            }
            int depth = 0;
            stack[depth++] = start;
            label[start] = count;
            while (depth > 0) {
                int p = stack[--depth];
                for (int y = Math.max(0, p / width - 1); y <= Math.min(height - 1, p / width + 1); y++) {
                    for (int x = Math.max(0, p % width - 1); x <= Math.min(width - 1, p % width + 1); x++) {
                        int q = x + width * y;
                        if (in[q] && label[q] < 0) {
                            label[q] = count;
                            stack[depth++] = q;
                        }
                    }
                }
            }
            count++;
        }
        return new Patches(label, count);
    }

    /** How many there are. */
    int count() {
        return count;
    }

    /** Number of the patch of pixel p, -1 if it is in none. */
    int at(int p) {
        return label[p];
    }
}

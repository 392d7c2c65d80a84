package org.wispwright.warp.retouch;

import java.util.ArrayDeque;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Stream;

/**
 * Arrays as large as a tile that strokes have done with, for the next: memory that is new to the process takes longer to get than a brush
 * takes to fill it. Keeps at most {@value #KEPT} of each size, 16 MB in all. Not for several threads at once.
 */
final class Spare {
    private static final int PIXELS = Gaussian.TILE * Gaussian.TILE;
    private static final int KEPT = 80;

    /** By numbers a pixel. */
    private final List<ArrayDeque<float[]>> floats = Stream.generate(ArrayDeque<float[]>::new).limit(5).toList();
    private final ArrayDeque<double[]> doubles = new ArrayDeque<>();
    private float[] window = new float[0];

    /** An array of {@code channels} numbers, 1 to 4, for each pixel of a tile; they may be anything. */
    float[] floats(int channels) {
        float[] array = floats.get(channels).poll();
        return array == null ? new float[channels * PIXELS] : array;
    }

    /** The one who gives an array back uses it no more; null is nothing. */
    void back(float[] array) {
        if (array != null && floats.get(array.length / PIXELS).size() < KEPT) {
            floats.get(array.length / PIXELS).push(array);
        }
    }

    /** Two numbers for each pixel of a tile, all 0. */
    double[] zeros() {
        double[] array = doubles.poll();
        if (array == null) {
            return new double[2 * PIXELS];
        }
        Arrays.fill(array, 0);
        return array;
    }

    /** As for floats. */
    void back(double[] array) {
        if (array != null && doubles.size() < KEPT) {
            doubles.push(array);
        }
    }

    /** At least {@code count} numbers, the first of them 0; the same array every time, so for one stroke at a time. */
    float[] window(int count) {
        if (window.length < count) {
            window = new float[count];
        } else {
            Arrays.fill(window, 0, count, 0f);
        }
        return window;
    }
}

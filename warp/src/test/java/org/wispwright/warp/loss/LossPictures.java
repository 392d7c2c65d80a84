package org.wispwright.warp.loss;

import java.lang.management.ManagementFactory;
import java.util.Arrays;
import org.wispwright.render.picture.Picture;

/** Pictures that the tests of losses share. */
final class LossPictures {
    private LossPictures() {
    }

    /** A Gaussian blob of smoke, centre and sigma in pixels, opaque in its middle. */
    static Picture blob(int width, int height, double cx, double cy, double sigma, double peak) {
        Picture picture = new Picture(width, height);
        for (int p = 0; p < width * height; p++) {
            double dx = p % width - cx;
            double dy = p / width - cy;
            picture.rgba()[4 * p + 3] = (float) (peak * Math.exp(-(dx * dx + dy * dy) / (2 * sigma * sigma)));
        }
        return picture;
    }

    /** Smoke with no empty place: alpha a wavy function between 0.2 and 0.8. */
    static Picture waves(int width, int height, double phase) {
        Picture picture = new Picture(width, height);
        for (int p = 0; p < width * height; p++) {
            double value = .5 + .3 * Math.sin(.31 * (p % width) + phase) * Math.cos(.23 * (p / width) - phase);
            for (int c = 0; c < 4; c++) {
                picture.rgba()[4 * p + c] = (float) (c < 3 ? .7 * value : value);
            }
        }
        return picture;
    }

    static float[] ones(int width, int height) {
        float[] ones = new float[width * height];
        Arrays.fill(ones, 1f);
        return ones;
    }

    static float[] narrow(double[] values) {
        float[] out = new float[values.length];
        for (int n = 0; n < out.length; n++) {
            out[n] = (float) values[n];
        }
        return out;
    }

    static double[] widen(float[] values) {
        double[] out = new double[values.length];
        for (int n = 0; n < out.length; n++) {
            out[n] = values[n];
        }
        return out;
    }

    /** Bytes that ten warm calls take on this thread. */
    static long bytesOfTenCalls(PictureLoss loss, Picture got) {
        float[] bar = new float[got.rgba().length];
        for (int n = 0; n < 20; n++) {
            loss.valueAndPullback(got, bar, 1);
        }
        com.sun.management.ThreadMXBean threads = (com.sun.management.ThreadMXBean) ManagementFactory.getThreadMXBean();
        long before = threads.getCurrentThreadAllocatedBytes();
        for (int n = 0; n < 10; n++) {
            loss.valueAndPullback(got, bar, 1);
        }
        return threads.getCurrentThreadAllocatedBytes() - before;
    }
}

package org.wispwright.ui.report;

import org.wispwright.render.picture.Picture;

/** Smoke-like pictures without a simulation: a leaning column of soft puffs, the same bits every time. */
final class PaintedSmoke {
    private PaintedSmoke() {
    }

    /**
     * @param lean how far the head stands to the right, in heights
     * @param hole how much of the hole in the head is open, 0 to 1
     * @param tint brightness
     */
    static Picture column(int width, int height, double lean, double hole, double tint) {
        Picture picture = new Picture(width, height);
        for (int y = 0; y < height; y++) {
            for (int x = 0; x < width; x++) {
                double u = (x + 0.5) / height;
                double v = (y + 0.5) / height;
                double tau = 0;
                for (int n = 0; n < 26; n++) {
                    double rise = n / 25.0;
                    double cx = 0.5 * width / height + lean * rise * rise + 0.02 * Math.sin(2.7 * n);
                    double cy = 0.95 - 0.72 * rise;
                    double r = 0.035 + 0.085 * rise + 0.012 * Math.sin(1.3 * n);
                    double d2 = ((u - cx) * (u - cx) + (v - cy) * (v - cy)) / (r * r);
                    tau += 0.9 * Math.exp(-d2) * (1 - 0.35 * rise);
                }
                double hx = u - 0.5 * width / height - 0.55 * lean;
                double hy = v - 0.4;
                tau *= 1 - hole * Math.exp(-(hx * hx + hy * hy) / 0.006);
                double alpha = 1 - Math.exp(-tau);
                double light = tint * (0.55 + 0.45 * (1 - v)) * (0.75 + 0.25 * Math.sin(40 * u + 30 * v));
                int at = 4 * (x + width * y);
                picture.rgba()[at] = (float) (alpha * light);
                picture.rgba()[at + 1] = (float) (alpha * light * 0.97);
                picture.rgba()[at + 2] = (float) (alpha * light * 0.94);
                picture.rgba()[at + 3] = (float) alpha;
            }
        }
        return picture;
    }
}

package org.wispwright.ui.window.easel;

/**
 * A plate drawn at a scale into an array of the screen: bilinear between pixel centres, or, enlarged {@value #BLOCKY} times and more, each pixel
 * as a block so that it can be read. What lies beyond the plate keeps the surround's colour.
 */
final class ScaleKernel {
    /** Enlargement from which pixels show as blocks. */
    static final double BLOCKY = 4;

    private ScaleKernel() {
    }

    /**
     * Draws the part of the screen in {@code [x0, x1) x [y0, y1)}.
     *
     * @param left   of the plate on the screen, pixels
     * @param top    of it
     * @param zoom   the screen's pixels in one of the plate's
     * @param out    the screen, index x + outWidth * y
     * @param around colour beyond the plate
     */
    static void draw(int[] codes, int width, int height, double left, double top, double zoom, int[] out, int outWidth, int x0, int y0,
                     int x1, int y1, int around) {
        int columns = x1 - x0;
        int[] from = new int[columns];
        int[] share = new int[columns];
        boolean blocky = zoom >= BLOCKY;
        for (int n = 0; n < columns; n++) {
            double x = (x0 + n + 0.5 - left) / zoom;
            if (x < 0 || x >= width) {
                from[n] = -1;
            } else if (blocky) {
                from[n] = (int) x;
            } else {
                double c = Math.max(0, Math.min(width - 1.0, x - 0.5));
                from[n] = Math.min(width - 2, (int) c);
                share[n] = (int) (256 * (c - from[n]));
            }
        }
        int[] above = new int[columns];
        int[] below = new int[columns];
        int drawn = -2;                                                        // the plate's row that lies, stretched, in above
        for (int y = y0; y < y1; y++) {
            int at = outWidth * y + x0;
            double v = (y + 0.5 - top) / zoom;
            if (v < 0 || v >= height) {
                java.util.Arrays.fill(out, at, at + columns, around);
            } else if (blocky || width < 2 || height < 2) {
                int row = width * (int) v;
                for (int n = 0; n < columns; n++) {
                    out[at + n] = from[n] < 0 ? around : codes[row + Math.max(0, from[n])];
                }
            } else {
                double c = Math.max(0, Math.min(height - 1.0, v - 0.5));
                int row = Math.min(height - 2, (int) c);
                if (row == drawn + 1) {
                    int[] spare = above;
                    above = below;
                    below = spare;
                    stretch(codes, width * (row + 1), from, share, below);
                } else if (row != drawn) {
                    stretch(codes, width * row, from, share, above);
                    stretch(codes, width * (row + 1), from, share, below);
                }
                drawn = row;
                int down = (int) (256 * (c - row));
                for (int n = 0; n < columns; n++) {
                    out[at + n] = mix(above[n], below[n], down);
                }
                for (int n = 0; n < columns && from[n] < 0; n++) {
                    out[at + n] = around;
                }
                for (int n = columns - 1; n >= 0 && from[n] < 0; n--) {
                    out[at + n] = around;
                }
            }
        }
    }

    /** One row of the plate, mixed across; rows of the screen that lie between the same two share it. */
    private static void stretch(int[] codes, int row, int[] from, int[] share, int[] out) {
        for (int n = 0; n < from.length; n++) {
            int i = row + Math.max(0, from[n]);
            out[n] = mix(codes[i], codes[i + 1], share[n]);
        }
    }

    /** {@code a + share (b - a) / 256} in each of three bytes. */
    private static int mix(int a, int b, int share) {
        int keep = 256 - share;
        int redBlue = (a & 0xff00ff) * keep + (b & 0xff00ff) * share + 0x800080 >>> 8 & 0xff00ff;
        int green = (a & 0xff00) * keep + (b & 0xff00) * share + 0x8000 >>> 8 & 0xff00;
        return redBlue | green;
    }
}

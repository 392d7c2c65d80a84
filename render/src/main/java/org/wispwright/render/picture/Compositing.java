package org.wispwright.render.picture;

/**
 * Laying premultiplied pictures on each other: {@code result = F_A A + F_B B} in all four channels. Porter and Duff (1984),
 * "Compositing digital images", SIGGRAPH 84, 253-259; a, b are the alphas of A and B.
 */
public enum Compositing {
    /** A before B: {@code F_A = 1, F_B = 1 - a}. */
    OVER {
        @Override
        double shareOfA(double a, double b) {
            return 1;
        }

        @Override
        double shareOfB(double a, double b) {
            return 1 - a;
        }
    },
    /** A where B is: {@code F_A = b, F_B = 0}. */
    IN {
        @Override
        double shareOfA(double a, double b) {
            return b;
        }

        @Override
        double shareOfB(double a, double b) {
            return 0;
        }
    },
    /** A where B is not: {@code F_A = 1 - b, F_B = 0}. */
    OUT {
        @Override
        double shareOfA(double a, double b) {
            return 1 - b;
        }

        @Override
        double shareOfB(double a, double b) {
            return 0;
        }
    },
    /** A on what B covers: {@code F_A = b, F_B = 1 - a}. */
    ATOP {
        @Override
        double shareOfA(double a, double b) {
            return b;
        }

        @Override
        double shareOfB(double a, double b) {
            return 1 - a;
        }
    },
    /** Each where the other is not: {@code F_A = 1 - b, F_B = 1 - a}. */
    XOR {
        @Override
        double shareOfA(double a, double b) {
            return 1 - b;
        }

        @Override
        double shareOfB(double a, double b) {
            return 1 - a;
        }
    },
    /** The sum: {@code F_A = F_B = 1}. */
    PLUS {
        @Override
        double shareOfA(double a, double b) {
            return 1;
        }

        @Override
        double shareOfB(double a, double b) {
            return 1;
        }
    };

    abstract double shareOfA(double a, double b);

    abstract double shareOfB(double a, double b);

    /** One premultiplied pixel from two; arrays of (r, g, b, alpha). */
    public double[] mix(double[] a, double[] b) {
        double fa = shareOfA(a[3], b[3]);
        double fb = shareOfB(a[3], b[3]);
        return new double[] {fa * a[0] + fb * b[0], fa * a[1] + fb * b[1], fa * a[2] + fb * b[2], fa * a[3] + fb * b[3]};
    }

    /**
     * Overwrites out with A and B put together.
     *
     * @param out the same raster; may be a or b
     * @throws IllegalArgumentException if the rasters differ
     */
    public void mix(Picture a, Picture b, Picture out) {
        requireSame("compositing", a, b);
        requireSame("compositing", a, out);
        float[] from = a.rgba();
        float[] with = b.rgba();
        float[] to = out.rgba();
        for (int n = 0; n < from.length; n += 4) {
            double alphaA = from[n + 3];
            double alphaB = with[n + 3];
            double fa = shareOfA(alphaA, alphaB);
            double fb = shareOfB(alphaA, alphaB);
            for (int c = n; c < n + 4; c++) {
                to[c] = (float) (fa * from[c] + fb * with[c]);
            }
        }
    }

    /**
     * Overwrites out with a picture before an even, opaque background.
     *
     * @param out the same raster; may be the picture itself
     * @throws IllegalArgumentException if the rasters differ
     */
    public static void overEven(Picture front, Rgb background, Picture out) {
        requireSame("compositing", front, out);
        float[] from = front.rgba();
        float[] to = out.rgba();
        for (int n = 0; n < from.length; n += 4) {
            double through = 1.0 - from[n + 3];
            to[n] = (float) (from[n] + through * background.r());
            to[n + 1] = (float) (from[n + 1] + through * background.g());
            to[n + 2] = (float) (from[n + 2] + through * background.b());
            to[n + 3] = 1;
        }
    }

    static void requireSame(String what, Picture a, Picture b) {
        if (a.width() != b.width() || a.height() != b.height()) {
            throw new IllegalArgumentException(what + ": got pictures of " + a.width() + "x" + a.height() + " and " + b.width() + "x" + b.height()
                    + " pixels, needs the same raster");
        }
    }
}

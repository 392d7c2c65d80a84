package org.wispwright.warp.measure;

/**
 * The pixels that count as inside: {@code inside[x + width * y]}.
 *
 * @param width  pixels along a row, 1 or more
 * @param height rows, 1 or more
 * @param inside kept, not copied: one a pixel
 */
public record Silhouette(int width, int height, boolean[] inside) {
    /**
     * Checks the shape.
     *
     * @throws IllegalArgumentException if a side is below 1 or the count differs
     */
    public Silhouette {
        if (width < 1 || height < 1 || inside.length != Math.multiplyExact(width, height)) {
            throw new IllegalArgumentException("silhouette: got " + width + "x" + height + " pixels and " + inside.length
                    + " entries, needs sides of 1 or more and one entry a pixel");
        }
    }

    /**
     * The pixels of a plane that reach a level: {@code value >= level}.
     *
     * @throws IllegalArgumentException if the level is not finite
     */
    public static Silhouette of(Plane plane, double level) {
        if (!Double.isFinite(level)) {
            throw new IllegalArgumentException("silhouette: got level " + level + ", needs a finite number");
        }
        boolean[] inside = new boolean[plane.values().length];
        for (int p = 0; p < inside.length; p++) {
            inside[p] = plane.values()[p] >= level;
        }
        return new Silhouette(plane.width(), plane.height(), inside);
    }

    /** How many pixels are inside. */
    public int count() {
        int count = 0;
        for (boolean in : inside) {
            count += in ? 1 : 0;
        }
        return count;
    }

    /** How many pixels are inside both. */
    public int common(Silhouette other) {
        requireSame("overlap", this, other);
        int count = 0;
        for (int p = 0; p < inside.length; p++) {
            count += inside[p] && other.inside[p] ? 1 : 0;
        }
        return count;
    }

    /**
     * Intersection over union, {@code |A and B| / |A or B|} (Jaccard 1912, New Phytologist 11(2), 37-50): 1 for equal silhouettes,
     * also for two empty ones; 0 where only one is empty.
     *
     * @throws IllegalArgumentException if the rasters differ
     */
    public double intersectionOverUnion(Silhouette other) {
        int common = common(other);
        int union = count() + other.count() - common;
        return union == 0 ? 1 : (double) common / union;
    }

    /**
     * {@code 2 |A and B| / (|A| + |B|)} (Dice 1945, Ecology 26(3), 297-302): empty ones as for the intersection over union.
     *
     * @throws IllegalArgumentException if the rasters differ
     */
    public double dice(Silhouette other) {
        int common = common(other);
        int sum = count() + other.count();
        return sum == 0 ? 1 : 2.0 * common / sum;
    }

    static void requireSame(String measure, Silhouette a, Silhouette b) {
        if (a.width != b.width || a.height != b.height) {
            throw new IllegalArgumentException(measure + ": got silhouettes of " + a.width + "x" + a.height + " and " + b.width + "x"
                    + b.height + " pixels, needs one raster");
        }
    }
}

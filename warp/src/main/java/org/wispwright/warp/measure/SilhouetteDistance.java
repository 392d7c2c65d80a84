package org.wispwright.warp.measure;

/**
 * How far two silhouettes lie apart, in pixels between pixel centres, from the exact {@link DistanceTransform}. Distances run over
 * all inside pixels, not the rim alone. Divide by the height for a figure that does not depend on the raster.
 * <p>From an empty silhouette every directed distance is 0 (there is nothing to carry); to an empty one, from one that is not, it is
 * infinite.
 */
public final class SilhouetteDistance {
    private SilhouetteDistance() {
    }

    /**
     * The larger of both directed Hausdorff distances (Huttenlocher, Klanderman and Rucklidge 1993, IEEE PAMI 15(9), 850-863).
     *
     * @throws IllegalArgumentException if the rasters differ
     */
    public static double hausdorff(Silhouette a, Silhouette b) {
        return Math.max(directedHausdorff(a, b), directedHausdorff(b, a));
    }

    /**
     * {@code max over p in from of min over q in to of |p - q|}.
     *
     * @throws IllegalArgumentException if the rasters differ
     */
    public static double directedHausdorff(Silhouette from, Silhouette to) {
        Silhouette.requireSame("Hausdorff distance", from, to);
        double[] squared = DistanceTransform.squared(to);
        double farthest = 0;
        for (int p = 0; p < squared.length; p++) {
            if (from.inside()[p]) {
                farthest = Math.max(farthest, squared[p]);
            }
        }
        return Math.sqrt(farthest);
    }

    /**
     * Directed chamfer distance: {@code mean over p in from of min over q in to of |p - q|} (Barrow, Tenenbaum, Bolles and Wolf 1977,
     * IJCAI 77, 659-663; here with exact distances).
     *
     * @throws IllegalArgumentException if the rasters differ
     */
    public static double chamfer(Silhouette from, Silhouette to) {
        Silhouette.requireSame("chamfer distance", from, to);
        double[] squared = DistanceTransform.squared(to);
        double sum = 0;
        int count = 0;
        for (int p = 0; p < squared.length; p++) {
            if (from.inside()[p]) {
                sum += Math.sqrt(squared[p]);
                count++;
            }
        }
        return count == 0 ? 0 : sum / count;
    }
}

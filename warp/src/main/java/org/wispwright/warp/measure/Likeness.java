package org.wispwright.warp.measure;

import java.util.Arrays;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.loss.PictureMeasure;

/**
 * The review figures of one frame: how alike what a take shows is to what is wanted, in a region.
 *
 * @param structure         structural similarity of alpha, 1 = equal; see {@link StructuralSimilarity}; NaN where a side has under 11
 *                          pixels
 * @param meanSquare        mean squared error of alpha
 * @param peakSignalToNoise from meanSquare with peak 1, decibels; infinite where nothing differs
 * @param meanAbsolute      mean absolute error over RGBA
 * @param overlap           intersection over union of the silhouettes, 1 = equal
 * @param farthest          Hausdorff distance of the silhouettes, in heights; infinite if only one is empty
 * @param nearest           chamfer distance, the larger of both ways, in heights; infinite if only one is empty
 * @param across            W1 of the opacity summed over each column, both scaled to 1: how far smoke would have to move from side to
 *                          side, on average, in heights; 0 if there is none in either, infinite if only in one
 * @param down              the same of the rows: how far up or down
 */
public record Likeness(double structure, double meanSquare, double peakSignalToNoise, double meanAbsolute, double overlap,
                       double farthest, double nearest, double across, double down) {

    /**
     * Measures two pictures.
     *
     * @param got     read
     * @param wanted  read: same raster
     * @param weights one a pixel, finite, 0 or more: the region; silhouettes count where it is above 0
     * @param level   alpha from which a pixel belongs to the silhouette, above 0 and at most 1
     * @throws IllegalArgumentException if a raster or a number is out of range
     */
    public static Likeness of(Picture got, Picture wanted, float[] weights, double level) {
        if (!(level > 0 && level <= 1)) {
            throw new IllegalArgumentException("likeness: got silhouette level " + level + ", needs above 0 and at most 1");
        }
        Plane a = Plane.alpha(got);
        Plane b = Plane.alpha(wanted);
        boolean fits = Math.min(got.width(), got.height()) > 2 * StructuralSimilarity.REACH;
        double structure = fits ? StructuralSimilarity.of(a, b, 1, weights) : Double.NaN;
        double square = PlaneDifference.meanSquare(a, b, weights);
        Silhouette inA = within(Silhouette.of(a, level), weights);
        Silhouette inB = within(Silhouette.of(b, level), weights);
        double chamfer = Math.max(SilhouetteDistance.chamfer(inA, inB), SilhouetteDistance.chamfer(inB, inA));
        return new Likeness(structure, square, PlaneDifference.peakSignalToNoise(square, 1),
                PictureMeasure.meanAbsoluteDifference(got, wanted, weights), inA.intersectionOverUnion(inB),
                SilhouetteDistance.hausdorff(inA, inB) / got.height(), chamfer / got.height(),
                moved(sums(a, weights, true), sums(b, weights, true), got.height()),
                moved(sums(a, weights, false), sums(b, weights, false), got.height()));
    }

    /** Opacity within the region, one sum a column or a row. */
    private static double[] sums(Plane plane, float[] weights, boolean columns) {
        double[] sums = new double[columns ? plane.width() : plane.height()];
        for (int p = 0; p < weights.length; p++) {
            sums[columns ? p % plane.width() : p / plane.width()] += weights[p] * Math.max(0, plane.values()[p]);
        }
        return sums;
    }

    private static double moved(double[] a, double[] b, int height) {
        boolean none = Arrays.stream(a).sum() == 0;
        if (none || Arrays.stream(b).sum() == 0) {
            return none && Arrays.stream(b).sum() == 0 ? 0 : Double.POSITIVE_INFINITY;
        }
        return EarthMover.w1OfHistograms(a, b, 1.0 / height);
    }

    private static Silhouette within(Silhouette silhouette, float[] weights) {
        boolean[] inside = silhouette.inside().clone();
        for (int p = 0; p < inside.length; p++) {
            inside[p] &= weights[p] > 0;
        }
        return new Silhouette(silhouette.width(), silhouette.height(), inside);
    }
}

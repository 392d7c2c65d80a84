package org.wispwright.warp.measure;

import org.wispwright.render.picture.Picture;
import org.wispwright.warp.loss.PictureMeasure;

/**
 * The review figures of one frame: how alike what a take shows is to what is wanted, in a region.
 *
 * @param structure         structural similarity of alpha, 1 = equal; see {@link StructuralSimilarity}
 * @param meanSquare        mean squared error of alpha
 * @param peakSignalToNoise from meanSquare with peak 1, decibels; infinite where nothing differs
 * @param meanAbsolute      mean absolute error over RGBA
 * @param overlap           intersection over union of the silhouettes, 1 = equal
 * @param farthest          Hausdorff distance of the silhouettes, in heights; infinite if only one is empty
 * @param nearest           chamfer distance, the larger of both ways, in heights; infinite if only one is empty
 */
public record Likeness(double structure, double meanSquare, double peakSignalToNoise, double meanAbsolute, double overlap,
                       double farthest, double nearest) {

    /**
     * Measures two pictures.
     *
     * @param got     read
     * @param wanted  read: same raster, sides of 11 or more
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
        double structure = StructuralSimilarity.of(a, b, 1, weights);
        double square = PlaneDifference.meanSquare(a, b, weights);
        Silhouette inA = within(Silhouette.of(a, level), weights);
        Silhouette inB = within(Silhouette.of(b, level), weights);
        double chamfer = Math.max(SilhouetteDistance.chamfer(inA, inB), SilhouetteDistance.chamfer(inB, inA));
        return new Likeness(structure, square, PlaneDifference.peakSignalToNoise(square, 1),
                PictureMeasure.meanAbsoluteDifference(got, wanted, weights), inA.intersectionOverUnion(inB),
                SilhouetteDistance.hausdorff(inA, inB) / got.height(), chamfer / got.height());
    }

    private static Silhouette within(Silhouette silhouette, float[] weights) {
        boolean[] inside = silhouette.inside().clone();
        for (int p = 0; p < inside.length; p++) {
            inside[p] &= weights[p] > 0;
        }
        return new Silhouette(silhouette.width(), silhouette.height(), inside);
    }
}

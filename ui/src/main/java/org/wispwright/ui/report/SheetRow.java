package org.wispwright.ui.report;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.matte.Matte;
import org.wispwright.warp.retouch.Folds;
import org.wispwright.warp.retouch.Retouch;

/**
 * What a sheet shows of one note. All pictures are linear and premultiplied, as everywhere; they may differ in raster.
 *
 * @param id the note's id
 * @param words what the reviewer said
 * @param place where it is, such as "frame 1030, view front"
 * @param rendered the production renderer's frame, if there is one
 * @param retouch drawn lightly over the rendered frame, or over the original where there is none
 * @param holds mattes of what must stay, drawn dashed
 * @param weighBy the matte that the note weighs by, drawn dashed
 * @param original what the original shows there
 * @param wanted what the retouch makes of the original; same raster as original
 * @param got what the take shows there; same raster as original
 * @param folds where the retouch turns the original over
 * @param met share of the wish that is fulfilled; 1 is all of it, below 0 is worse than the original
 */
public record SheetRow(String id, String words, String place, Optional<Picture> rendered, Retouch retouch, List<Matte> holds,
                       Optional<Matte> weighBy, Picture original, Picture wanted, Picture got, Folds folds, double met) {

    /** Checks the rasters. @throws IllegalArgumentException if original, wanted and got differ in size, or met is NaN */
    public SheetRow {
        Objects.requireNonNull(rendered, "sheet row: rendered");
        Objects.requireNonNull(weighBy, "sheet row: weighBy");
        holds = List.copyOf(holds);
        for (Picture other : List.of(wanted, got)) {
            if (other.width() != original.width() || other.height() != original.height()) {
                throw new IllegalArgumentException("sheet row '" + id + "': got pictures of " + original.width() + "x" + original.height()
                        + " and "
                        + other.width() + "x" + other.height() + ", needs original, wanted and got at one raster");
            }
        }
        if (Double.isNaN(met)) {
            throw new IllegalArgumentException("sheet row '" + id + "': met is NaN");
        }
    }
}

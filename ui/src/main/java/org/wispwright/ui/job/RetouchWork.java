package org.wispwright.ui.job;

import java.io.IOException;
import java.nio.file.Path;
import java.util.regex.Pattern;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.PngFile;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.warp.loss.PictureMeasure;
import org.wispwright.warp.retouch.Retouch;
import org.wispwright.warp.retouch.Retoucher;

/** A retouch applied to one picture, and how much smoke it then shows. */
public final class RetouchWork {
    private RetouchWork() {
    }

    /**
     * What came out.
     *
     * @param wanted the wanted picture
     * @param massBefore opacity summed over the picture, in squared heights ({@link PictureMeasure#mass})
     * @param massAfter the same of the wanted picture
     */
    public record Result(Picture wanted, double massBefore, double massAfter) {
    }

    /** The wanted picture of a picture; that stays as it is. */
    public static Result of(Retouch retouch, Picture original) {
        Picture wanted = Retoucher.wanted(retouch, original);
        return new Result(wanted, PictureMeasure.mass(original), PictureMeasure.mass(wanted));
    }

    /**
     * Reads any PNG as linear, premultiplied light.
     *
     * @throws ShotException if there is no such file, or it is not a whole PNG picture
     */
    public static Picture read(Path file) {
        try {
            return PngFile.read(file);
        } catch (IOException broken) {
            String reason = String.valueOf(broken.getMessage())
                    .replaceAll("(?s)^picture file .*" + Pattern.quote(file.getFileName().toString()) + ": ", "").replaceAll("\\s+",
                            " ").replaceAll("\\.$", "");
            throw new ShotException(new Finding(file.toString(), "", "the picture " + reason + (reason.contains(";") ? "."
                    : "; give another or write it again.")), broken);
        }
    }
}

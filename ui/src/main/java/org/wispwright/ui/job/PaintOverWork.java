package org.wispwright.ui.job;

import java.io.IOException;
import java.nio.file.Path;
import java.util.function.Supplier;
import java.util.regex.Pattern;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.ExrFile;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.PngFile;
import org.wispwright.render.view.View;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.Takes;
import org.wispwright.warp.paintover.PaintOver;
import org.wispwright.warp.paintover.Painted;

/** What a person painted over a frame of a shot, told from picture files and the picture of take 0. */
public final class PaintOverWork {
    private PaintOverWork() {
    }

    /**
     * Reads a painted frame.
     *
     * @param before the frame as it was rendered, PNG or EXR, anywhere on disk
     * @param after  the same, painted over
     * @throws ShotException if a file is not a whole picture, the pictures do not fit each other or the view, take 0 is missing or of
     *         another set-up, or it shows no smoke there
     */
    public static Painted read(Shot shot, Takes takes, int frame, View view, Path before, Path after, Lanes lanes) {
        Picture first = picture(before);
        Picture second = picture(after);
        Picture original = original(shot, takes, frame, view, lanes);
        return said(first.width() == second.width() && first.height() == second.height() ? before : after,
                () -> PaintOver.read(first, second, original));
    }

    /**
     * Reads a silhouette: white where smoke is wanted, black elsewhere.
     *
     * @param matte PNG or EXR, anywhere on disk
     * @throws ShotException as {@link #read}
     */
    public static Painted silhouette(Shot shot, Takes takes, int frame, View view, Path matte, Lanes lanes) {
        Picture shape = picture(matte);
        Picture original = original(shot, takes, frame, view, lanes);
        return said(matte, () -> PaintOver.silhouette(shape, original));
    }

    private static Picture original(Shot shot, Takes takes, int frame, View view, Lanes lanes) {
        takes.requireOf(0, shot.flow());
        return PictureWork.picture(shot, takes.density(0, frame, shot.flow()), view, lanes);
    }

    private static Picture picture(Path file) {
        try {
            return ExrFile.isOne(file) ? ExrFile.read(file) : PngFile.read(file);
        } catch (IOException broken) {
            String reason = String.valueOf(broken.getMessage()).replaceAll("(?s)^picture file .*"
                    + Pattern.quote(String.valueOf(file.getFileName()))
                    + ": ", "").replaceAll("\\s+", " ").replaceAll("\\.$", "");
            throw new ShotException(new Finding(file.toString(), "", "the picture " + reason + "."), broken);
        }
    }

    private static Painted said(Path file, Supplier<Painted> reading) {
        try {
            return reading.get();
        } catch (IllegalArgumentException refused) {
            throw new ShotException(new Finding(file.toString(), "", refused.getMessage().replaceAll("^(paint-over|silhouette): ", "")
                    + "."),
                    refused);
        }
    }
}

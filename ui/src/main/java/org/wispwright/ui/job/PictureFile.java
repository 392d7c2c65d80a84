package org.wispwright.ui.job;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.wispwright.render.files.WholeFile;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.PngFile;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.ShotException;

/** Pictures that a person asked for, written whole or not at all. */
public final class PictureFile {
    private PictureFile() {
    }

    /**
     * Writes a picture as an 8-bit sRGB PNG, under its name only once it is whole.
     *
     * @throws ShotException if the place cannot be written to
     */
    public static void write(Picture picture, Path out) {
        write(picture, out, PngFile.Depth.EIGHT);
    }

    /** The same with more bits, or as many. @throws ShotException if the place cannot be written to */
    public static void write(Picture picture, Path out, PngFile.Depth depth) {
        try {
            if (Files.isDirectory(out)) {
                throw new IOException("it is a folder");
            }
            PngFile.write(picture, out, depth);
        } catch (IOException refused) {
            throw cannotWrite(out, refused);
        }
    }

    /** Writes any file, under its name only once it is whole. @throws ShotException if the place cannot be written to */
    public static void write(Path out, WholeFile.Content content) {
        try {
            WholeFile.write(out, content);
        } catch (IOException refused) {
            throw cannotWrite(out, refused);
        }
    }

    static ShotException cannotWrite(Path out, IOException refused) {
        return new ShotException(new Finding(out.toString(), "", "it cannot be written (" + refused.getClass().getSimpleName()
                .replace("Exception", "") + ": "
                + refused.getMessage() + "); give a place in a folder that exists and can be written to."), refused);
    }
}

package org.wispwright.ui.work;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
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
        whole(out, making -> PngFile.write(making, picture));
    }

    /** Something that writes a file. */
    interface Writing {
        /** Writes. */
        void to(Path file) throws IOException;
    }

    /** Writes a file beside its place and renames it when it is whole. */
    static void whole(Path out, Writing writing) {
        Path folder = out.toAbsolutePath().getParent();
        Path making = folder.resolve("." + out.getFileName() + ".making");
        try {
            if (Files.isDirectory(out)) {
                throw new IOException("it is a folder");
            }
            try {
                writing.to(making);
                Files.move(making, out, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
            } finally {
                Files.deleteIfExists(making);
            }
        } catch (IOException refused) {
            throw new ShotException(new Finding(out.toString(), "", "it cannot be written (" + refused.getClass().getSimpleName().replace("Exception", "") + ": "
                    + refused.getMessage() + "); give a file in a folder that exists and can be written to."), refused);
        }
    }
}

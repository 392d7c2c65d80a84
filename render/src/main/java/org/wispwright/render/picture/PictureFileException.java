package org.wispwright.render.picture;

import java.io.IOException;
import java.nio.file.Path;

/** A picture file that cannot be used. The message is one sentence with the path, what is wrong and what to do. */
public final class PictureFileException extends IOException {
    private static final long serialVersionUID = 1L;

    PictureFileException(Path path, String wrong) {
        super("picture file " + path + ": " + wrong);
    }

    PictureFileException(Path path, String wrong, Throwable cause) {
        super("picture file " + path + ": " + wrong, cause);
    }
}

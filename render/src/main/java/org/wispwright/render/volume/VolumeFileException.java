package org.wispwright.render.volume;

import java.io.IOException;
import java.nio.file.Path;

/** A volume file that cannot be used. The message is one sentence with the path, what is wrong and what to do. */
public final class VolumeFileException extends IOException {
    private static final long serialVersionUID = 1L;

    VolumeFileException(Path path, String wrong) {
        super("volume file " + path + ": " + wrong);
    }
}

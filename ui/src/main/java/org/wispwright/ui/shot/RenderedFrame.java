package org.wispwright.ui.shot;

import java.io.IOException;
import java.nio.file.Path;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.PngFile;

/** The PNG of a frame that the production renderer made, read from a shot folder. */
public final class RenderedFrame {
    private RenderedFrame() {
    }

    /**
     * Reads a frame.
     *
     * @param file inside the folder
     * @param pointer the value of {@code shot.json} that names the file
     * @return the picture, linear and premultiplied
     * @throws ShotException if there is no such file inside the folder, or it is not a whole PNG picture
     */
    public static Picture read(ShotFolder folder, String file, String pointer) {
        try {
            Path path = folder.file(file);
            return PngFile.read(path);
        } catch (ShotException fault) {
            throw new ShotException(new Finding("shot.json", pointer, "'" + file + "': " + fault.finding().sentence()), fault);
        } catch (IOException | IllegalArgumentException broken) {
            throw new ShotException(Finding.of("shot.json", pointer, "picture '" + file + "', which cannot be read (" + reason(broken) + ")",
                    "a whole PNG picture", "copy or render it again"), broken);
        }
    }

    private static String reason(Exception broken) {
        String words = broken.getMessage() == null ? broken.getClass().getSimpleName() : broken.getMessage();
        return words.replaceAll("\\s+", " ").replaceAll("\\.$", "");
    }
}

package org.wispwright.ui.shot;

import java.io.DataInputStream;
import java.io.EOFException;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.regex.Pattern;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.PngFile;

/** The PNG of a frame that the production renderer made, read from a shot folder. */
public final class RenderedFrame {
    private static final long PNG_SIGNATURE = 0x89504E470D0A1A0AL;
    private static final int IHDR = 0x49484452;

    private RenderedFrame() {
    }

    /** The size that a PNG file states in its first 24 bytes (ISO/IEC 15948, 11.2.2), before any of it is decoded. */
    record StatedSize(long width, long height) {
    }

    /**
     * Reads what size a frame states.
     *
     * @throws ShotException if there is no such file inside the folder, or it does not begin like a PNG picture
     */
    static StatedSize statedSize(ShotFolder folder, String file, String pointer) {
        try (DataInputStream in = new DataInputStream(Files.newInputStream(named(folder, file, pointer)))) {
            if (in.readLong() != PNG_SIGNATURE || in.readInt() != 13 || in.readInt() != IHDR) {
                throw new IOException("is not a PNG file; save the picture as PNG");
            }
            return new StatedSize(in.readInt() & 0xFFFFFFFFL, in.readInt() & 0xFFFFFFFFL);
        } catch (EOFException shorter) {
            throw unreadable(file, pointer, new IOException("is cut short, it ends within its first 24 bytes", shorter));
        } catch (IOException broken) {
            throw unreadable(file, pointer, broken);
        }
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
            return PngFile.read(named(folder, file, pointer));
        } catch (IOException broken) {
            throw unreadable(file, pointer, broken);
        }
    }

    private static Path named(ShotFolder folder, String file, String pointer) {
        try {
            return folder.file(file);
        } catch (ShotException fault) {
            throw new ShotException(new Finding("shot.json", pointer, "'" + file + "': " + fault.finding().sentence()), fault);
        }
    }

    private static ShotException unreadable(String file, String pointer, Exception broken) {
        String reason = String.valueOf(broken.getMessage())
                .replaceAll("(?s)^picture file .*" + Pattern.quote(Path.of(file).getFileName().toString()) + ": ", "")
                .replaceAll("\\s+", " ").replaceAll("\\.$", "");
        return new ShotException(new Finding("shot.json", pointer, "picture '" + file + "' " + reason
                + (reason.contains(";") ? "." : "; copy or render it again.")), broken);
    }
}

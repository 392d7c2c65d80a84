package org.wispwright.ui.shot;

import java.io.DataInputStream;
import java.io.EOFException;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.regex.Pattern;
import org.wispwright.render.picture.ExrFile;
import org.wispwright.render.picture.Picture;
import org.wispwright.render.picture.PngFile;
import org.wispwright.render.view.Raster;
import org.wispwright.render.view.View;

/** A PNG or EXR file that a shot's JSON names, read from the shot folder: a frame of the production renderer, or a matte. */
public final class RenderedFrame {
    private static final long PNG_SIGNATURE = 0x89504E470D0A1A0AL;
    private static final int IHDR = 0x49484452;

    private RenderedFrame() {
    }

    /** The size that a file states, before any of it is decoded: in a PNG file in its first 24 bytes (ISO/IEC 15948, 11.2.2). */
    record StatedSize(long width, long height) {
        /** "128x96 pixels". */
        String inWords() {
            return width + "x" + height + " pixels";
        }

        /** Refuses a picture whose aspect is off the view's by more than half a pixel of its own. */
        void requireAspect(View view, String file, String json, String pointer, String wayOut) {
            Raster raster = view.raster();
            double across = (double) height * raster.width() / raster.height();
            double down = (double) width * raster.height() / raster.width();
            if (Math.abs(width - across) > 0.5 && Math.abs(height - down) > 0.5) {
                throw new ShotException(Finding.of(json, pointer, "picture '" + file + "' of " + inWords(),
                        "the aspect of view '" + view.name() + "', " + raster.width() + "x" + raster.height(), wayOut));
            }
        }
    }

    /**
     * Reads what size a picture states.
     *
     * @param json the file that names it, for complaints
     * @param pointer the value there that names it
     *
     * @throws ShotException if there is no such file inside the folder, or it does not begin like a picture
     */
    static StatedSize statedSize(ShotFolder folder, String file, String json, String pointer) {
        Path path = named(folder, file, json, pointer);
        if (ExrFile.isOne(path)) {
            try {
                int[] size = ExrFile.statedSize(path);
                return new StatedSize(size[0], size[1]);
            } catch (IOException broken) {
                throw unreadable(file, json, pointer, broken);
            }
        }
        try (DataInputStream in = new DataInputStream(Files.newInputStream(path))) {
            if (in.readLong() != PNG_SIGNATURE || in.readInt() != 13 || in.readInt() != IHDR) {
                throw new IOException("is not a PNG or EXR file; save the picture as PNG");
            }
            return new StatedSize(in.readInt() & 0xFFFFFFFFL, in.readInt() & 0xFFFFFFFFL);
        } catch (EOFException shorter) {
            throw unreadable(file, json, pointer, new IOException("is cut short, it ends within its first 24 bytes", shorter));
        } catch (IOException broken) {
            throw unreadable(file, json, pointer, broken);
        }
    }

    /**
     * Reads a frame that shot.json names.
     *
     * @param file inside the folder
     * @param pointer the value of {@code shot.json} that names the file
     * @return the picture, linear and premultiplied
     * @throws ShotException if there is no such file inside the folder, or it is not a whole PNG or EXR picture
     */
    public static Picture read(ShotFolder folder, String file, String pointer) {
        return read(folder, file, "shot.json", pointer);
    }

    /** Reads a picture that any file of the shot names; otherwise as {@link #read(ShotFolder, String, String)}. */
    static Picture read(ShotFolder folder, String file, String json, String pointer) {
        try {
            Path path = named(folder, file, json, pointer);
            return ExrFile.isOne(path) ? ExrFile.read(path) : PngFile.read(path);
        } catch (IOException broken) {
            throw unreadable(file, json, pointer, broken);
        }
    }

    private static Path named(ShotFolder folder, String file, String json, String pointer) {
        try {
            return folder.file(file);
        } catch (ShotException fault) {
            throw new ShotException(new Finding(json, pointer, "'" + file + "': " + fault.finding().sentence()), fault);
        }
    }

    private static ShotException unreadable(String file, String json, String pointer, Exception broken) {
        String reason = String.valueOf(broken.getMessage())
                .replaceAll("(?s)^picture file .*" + Pattern.quote(Path.of(file).getFileName().toString()) + ": ", "")
                .replaceAll("\\s+", " ").replaceAll("\\.$", "");
        return new ShotException(new Finding(json, pointer, "picture '" + file + "' " + reason
                + (reason.contains(";") ? "." : "; copy or render it again.")), broken);
    }
}

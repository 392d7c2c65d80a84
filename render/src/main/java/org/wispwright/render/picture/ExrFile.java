package org.wispwright.render.picture;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.FloatBuffer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.Map;
import org.lwjgl.PointerBuffer;
import org.lwjgl.system.MemoryStack;
import org.lwjgl.system.MemoryUtil;
import org.lwjgl.util.tinyexr.EXRHeader;
import org.lwjgl.util.tinyexr.EXRImage;
import org.lwjgl.util.tinyexr.EXRVersion;
import org.lwjgl.util.tinyexr.TinyEXR;

/**
 * Pictures in EXR files (layout published by the maintainers of OpenEXR): linear light, premultiplied, Rec.709 primaries, channels R, G, B
 * and A of halves or floats; without A alpha is 1. Uncompressed, RLE, ZIPS, ZIP and PIZ are read, decoded by tinyexr. The picture is the
 * file's display window: stored pixels outside it are left out, pixels that are not stored are clear.
 */
public final class ExrFile {
    private ExrFile() {
    }

    /** True if a file begins like an EXR file; false too if it cannot be read. */
    public static boolean isOne(Path path) {
        try (var in = Files.newInputStream(path)) {
            byte[] first = in.readNBytes(4);
            return first.length == 4 && first[0] == 0x76 && first[1] == 0x2F && first[2] == 0x31 && first[3] == 0x01;
        } catch (IOException unreadable) {
            return false;
        }
    }

    /**
     * Reads a picture. Everything that the file states is checked before memory is taken.
     *
     * @throws PictureFileException if the file is missing, not an EXR, damaged, cut short, larger or of another kind than is read, or
     *         holds a number that is not finite
     * @throws IOException if it is closed to us, or this machine cannot load the decoder
     */
    public static Picture read(Path path) throws IOException {
        byte[] bytes = bytes(path);
        ExrHeader header = ExrHeader.of(path, bytes);
        if (!header.channels().contains("R") || !header.channels().contains("G") || !header.channels().contains("B")) {
            throw new PictureFileException(path, "has the channels " + String.join(", ", header.channels())
                    + ", needs R, G and B, with or without A; save it with these");
        }
        Map<String, float[]> channels = decoded(path, bytes, header);
        Picture picture = new Picture(header.picture().width(), header.picture().height());
        float[] red = channels.get("R");
        float[] green = channels.get("G");
        float[] blue = channels.get("B");
        float[] alpha = channels.get("A");
        for (int p = 0; p < red.length; p++) {
            int x = header.left() + p % header.stored().width();
            int y = header.top() + p / header.stored().width();
            if (x < 0 || y < 0 || x >= picture.width() || y >= picture.height()) {
                continue;
            }
            float a = alpha == null ? 1 : alpha[p];
            if (!Float.isFinite(red[p]) || !Float.isFinite(green[p]) || !Float.isFinite(blue[p]) || !Float.isFinite(a)) {
                throw new PictureFileException(path, "holds a number that is not finite in pixel (" + x + ", " + y
                        + "); find the pixel and render or save it again");
            }
            int n = 4 * (x + picture.width() * y);
            picture.rgba()[n] = red[p];
            picture.rgba()[n + 1] = green[p];
            picture.rgba()[n + 2] = blue[p];
            picture.rgba()[n + 3] = Math.min(1f, Math.max(0f, a));
        }
        return picture;
    }

    /**
     * The raster that a file states, checked like the rest of its head; no pixel is decoded.
     *
     * @return width and height
     * @throws IOException as {@link #read}
     */
    public static int[] statedSize(Path path) throws IOException {
        ExrHeader.Size size = ExrHeader.of(path, bytes(path)).picture();
        return new int[] {size.width(), size.height()};
    }

    /** All channels by name, width x height of the stored pixels. */
    static Map<String, float[]> channels(Path path) throws IOException {
        byte[] bytes = bytes(path);
        return decoded(path, bytes, ExrHeader.of(path, bytes));
    }

    private static byte[] bytes(Path path) throws IOException {
        if (!Files.isRegularFile(path)) {
            throw new PictureFileException(path, "does not exist; check the name");
        }
        long size = Files.size(path);
        if (size > PngFile.MOST_BYTES) {
            throw new PictureFileException(path, "has " + size + " bytes, needs at most " + PngFile.MOST_BYTES + "; save a smaller one");
        }
        return Files.readAllBytes(path);
    }

    private static Map<String, float[]> decoded(Path path, byte[] bytes, ExrHeader header) throws IOException {
        ByteBuffer memory;
        try {
            memory = MemoryUtil.memAlloc(bytes.length);
        } catch (LinkageError noNatives) {
            throw new IOException("this machine cannot load the EXR decoder (" + noNatives.getMessage()
                    + "); save the picture as 16-bit PNG",
                    noNatives);
        }
        try {
            memory.put(bytes).flip();
            return decoded(path, memory, header);
        } finally {
            MemoryUtil.memFree(memory);
        }
    }

    private static Map<String, float[]> decoded(Path path, ByteBuffer memory, ExrHeader header) throws PictureFileException {
        try (MemoryStack stack = MemoryStack.stackPush()) {
            PointerBuffer said = stack.mallocPointer(1);
            EXRVersion version = EXRVersion.malloc(stack);
            EXRHeader theirs = EXRHeader.malloc(stack);
            EXRImage image = EXRImage.malloc(stack);
            TinyEXR.InitEXRHeader(theirs);
            TinyEXR.InitEXRImage(image);
            require(path, TinyEXR.ParseEXRVersionFromMemory(version, memory), null);
            require(path, TinyEXR.ParseEXRHeaderFromMemory(theirs, version, memory, said), said);
            try {
                for (int n = 0; n < theirs.num_channels(); n++) {
                    theirs.requested_pixel_types().put(n, TinyEXR.TINYEXR_PIXELTYPE_FLOAT);
                }
                require(path, TinyEXR.LoadEXRImageFromMemory(image, theirs, memory, said), said);
                try {
                    return copied(header, theirs, image);
                } finally {
                    TinyEXR.FreeEXRImage(image);
                }
            } finally {
                TinyEXR.FreeEXRHeader(theirs);
            }
        }
    }

    private static Map<String, float[]> copied(ExrHeader header, EXRHeader theirs, EXRImage image) {
        Map<String, float[]> channels = new HashMap<>();
        int pixels = header.stored().width() * header.stored().height();
        PointerBuffer planes = image.images();
        for (int n = 0; n < theirs.num_channels(); n++) {
            FloatBuffer plane = MemoryUtil.memFloatBuffer(planes.get(n), pixels);
            float[] values = new float[pixels];
            plane.get(values);
            channels.put(theirs.channels().get(n).nameString(), values);
        }
        return channels;
    }

    private static void require(Path path, int code, PointerBuffer said) throws PictureFileException {
        if (code != TinyEXR.TINYEXR_SUCCESS) {
            long words = said == null ? 0 : said.get(0);
            String reason = words == 0 ? "code " + code : MemoryUtil.memUTF8(words).strip().replaceAll("\\.$", "");
            if (words != 0) {
                TinyEXR.nFreeEXRErrorMessage(words);
            }
            throw new PictureFileException(path, "is damaged: its pixels cannot be decoded (" + reason + "); save it again");
        }
    }
}

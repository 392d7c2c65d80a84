package org.wispwright.render.picture;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.zip.Deflater;
import org.wispwright.render.files.WholeFile;

/**
 * Writes a picture as an EXR file: channels A, B, G, R in rows, ZIP compressed in blocks of 16 rows, linear, premultiplied. A block that
 * would grow is stored plain. Layout: "OpenEXR File Layout", published by its maintainers.
 */
public final class ExrWriting {
    private static final int ROWS = 16;
    private static final int ZIP = 3;
    /** File order is alphabetical; these are the places of A, B, G, R in RGBA. */
    private static final int[] ORDER = {3, 2, 1, 0};

    private ExrWriting() {
    }

    /** Bits a number. */
    public enum Depth {
        /** 16 bits, rounded to nearest, ties to even. */
        HALF(1, 2),
        /** 32 bits, as they are. */
        FLOAT(2, 4);

        private final int type;
        private final int bytes;

        Depth(int type, int bytes) {
            this.type = type;
            this.bytes = bytes;
        }
    }

    /**
     * Writes RGBA; the file appears whole or not at all.
     *
     * @throws IllegalArgumentException if a value is NaN or infinite
     * @throws IOException if the file cannot be written
     */
    public static void write(Picture picture, Path path, Depth depth) throws IOException {
        for (int n = 0; n < picture.rgba().length; n++) {
            if (!Float.isFinite(picture.rgba()[n])) {
                throw new IllegalArgumentException("picture for " + path + ": pixel (" + n / 4 % picture.width() + ", "
                        + n / 4 / picture.width()
                        + ") holds " + picture.rgba()[n]
                        + ", needs finite numbers; look for the first bad value where the picture was made");
            }
        }
        ByteArrayOutputStream head = header(picture, depth);
        int count = (picture.height() + ROWS - 1) / ROWS;
        byte[][] blocks = new byte[count][];
        ByteBuffer offsets = little(8 * count);
        long at = head.size() + 8L * count;
        for (int b = 0; b < count; b++) {
            blocks[b] = block(picture, depth, b * ROWS, Math.min(ROWS, picture.height() - b * ROWS));
            offsets.putLong(at);
            at += 8 + blocks[b].length;
        }
        WholeFile.write(path, out -> {
            head.writeTo(out);
            out.write(offsets.array());
            for (int b = 0; b < count; b++) {
                out.write(little(8).putInt(b * ROWS).putInt(blocks[b].length).array());
                out.write(blocks[b]);
            }
        });
    }

    private static ByteArrayOutputStream header(Picture picture, Depth depth) {
        ByteArrayOutputStream head = new ByteArrayOutputStream();
        head.writeBytes(little(8).putInt(ExrHeader.MAGIC).putInt(2).array());
        ByteBuffer channels = little(4 * 18 + 1);
        for (char name : new char[] {'A', 'B', 'G', 'R'}) {
            channels.put((byte) name).put((byte) 0).putInt(depth.type).putInt(0).putInt(1).putInt(1);
        }
        attribute(head, "channels", "chlist", channels);
        attribute(head, "compression", "compression", little(1).put((byte) ZIP));
        int right = picture.width() - 1;
        int bottom = picture.height() - 1;
        attribute(head, "dataWindow", "box2i", little(16).putInt(0).putInt(0).putInt(right).putInt(bottom));
        attribute(head, "displayWindow", "box2i", little(16).putInt(0).putInt(0).putInt(right).putInt(bottom));
        attribute(head, "lineOrder", "lineOrder", little(1));
        attribute(head, "pixelAspectRatio", "float", little(4).putFloat(1));
        attribute(head, "screenWindowCenter", "v2f", little(8));
        attribute(head, "screenWindowWidth", "float", little(4).putFloat(1));
        head.write(0);
        return head;
    }

    private static void attribute(ByteArrayOutputStream head, String name, String type, ByteBuffer value) {
        head.writeBytes((name + "\0" + type + "\0").getBytes(StandardCharsets.US_ASCII));
        head.writeBytes(little(4).putInt(value.capacity()).array());
        head.writeBytes(value.array());
    }

    /** Rows of one block: bytes of even places first, then those of odd ones, each as its difference from the one before, deflated. */
    private static byte[] block(Picture picture, Depth depth, int first, int rows) {
        ByteBuffer plain = little(4 * depth.bytes * picture.width() * rows);
        for (int y = first; y < first + rows; y++) {
            for (int c : ORDER) {
                for (int x = 0; x < picture.width(); x++) {
                    float value = picture.at(x, y, c);
                    if (depth == Depth.HALF) {
                        plain.putShort(HalfFloat.bits(value));
                    } else {
                        plain.putFloat(value);
                    }
                }
            }
        }
        byte[] in = plain.array();
        byte[] sorted = new byte[in.length];
        for (int n = 0; n < in.length; n++) {
            sorted[(n & 1) * ((in.length + 1) / 2) + n / 2] = in[n];
        }
        for (int n = sorted.length - 1; n > 0; n--) {
            sorted[n] = (byte) (sorted[n] - sorted[n - 1] + 128);
        }
        Deflater deflater = new Deflater();
        try {
            deflater.setInput(sorted);
            deflater.finish();
            byte[] out = new byte[in.length];
            int size = deflater.deflate(out);
            return deflater.finished() && size < in.length ? Arrays.copyOf(out, size) : in;
        } finally {
            deflater.end();
        }
    }

    private static ByteBuffer little(int bytes) {
        return ByteBuffer.allocate(bytes).order(ByteOrder.LITTLE_ENDIAN);
    }
}

package org.wispwright.render.volume;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.wispwright.render.files.WholeFile;

/**
 * Arrays of 32-bit floats in NPY files, format 1.0 (published in the documentation of NumPy, {@code numpy.lib.format}): ten
 * bytes of magic, version and header length, a header in ASCII, then the values, little-endian, last index fastest.
 * <p>A {@link ScalarGrid} goes in as shape (nz, ny, nx). Another number type, byte order, version, or the Fortran order is refused.
 */
public final class NpyFile {
    private static final byte[] MAGIC = {(byte) 0x93, 'N', 'U', 'M', 'P', 'Y', 1, 0};
    private static final int PREFIX = 10;
    private static final int ALIGNMENT = 64;
    private static final int MOST_DIMENSIONS = 8;
    private static final long MOST_VALUES = GridShape.MOST_CELLS;
    private static final int BLOCK_FLOATS = 1 << 14;
    private static final Pattern HEADER = Pattern.compile("\\{'descr': '([^']*)', 'fortran_order': (True|False), 'shape': \\(([0-9, ]*)\\), ?\\} *\n");

    /** What a file held: sizes, slowest first, and values, last index fastest. */
    public record Contents(int[] shape, float[] values) {
    }

    private NpyFile() {
    }

    /**
     * Writes an array; the file appears whole or not at all.
     *
     * @param shape sizes, slowest first, each at least 1; 1 to {@value #MOST_DIMENSIONS} of them
     * @param values as many as the product of the sizes
     * @throws IllegalArgumentException if the counts do not match
     * @throws IOException if the file cannot be written
     */
    public static void write(Path path, int[] shape, float[] values) throws IOException {
        long count = 1;
        for (int size : shape) {
            count = size < 1 || count > MOST_VALUES ? -1 : count * size;
        }
        if (shape.length < 1 || shape.length > MOST_DIMENSIONS || count != values.length) {
            throw new IllegalArgumentException("volume file " + path + ": shape " + Arrays.toString(shape) + " does not fit "
                    + values.length + " values");
        }
        WholeFile.write(path, out -> {
            out.write(header(shape));
            writeValues(values, out);
        });
    }

    /** Writes a grid as shape (nz, ny, nx). Cell size and place are not in the file. */
    public static void write(Path path, ScalarGrid grid) throws IOException {
        GridShape shape = grid.shape();
        write(path, new int[] {shape.nz(), shape.ny(), shape.nx()}, grid.values());
    }

    /**
     * Reads an array. Every size is checked against the file's length before memory is taken; values must be finite.
     *
     * @throws VolumeFileException if the file is missing, damaged, cut short, too long or of a kind that is not read
     * @throws IOException if it is closed to us
     */
    public static Contents read(Path path) throws IOException {
        if (!Files.isRegularFile(path)) {
            throw new VolumeFileException(path, "does not exist; check the name");
        }
        long length = Files.size(path);
        try (InputStream in = Files.newInputStream(path)) {
            byte[] prefix = in.readNBytes(PREFIX);
            if (prefix.length < PREFIX || !Arrays.equals(prefix, 0, MAGIC.length, MAGIC, 0, MAGIC.length)) {
                throw new VolumeFileException(path, "is not an NPY file of format 1.0 (its first eight bytes differ); write it as such");
            }
            int headerLength = (prefix[8] & 255) | (prefix[9] & 255) << 8;
            byte[] header = in.readNBytes(headerLength);
            if (header.length < headerLength) {
                throw new VolumeFileException(path, "is cut short in its header; write the file again");
            }
            int[] shape = shape(path, new String(header, StandardCharsets.ISO_8859_1));
            long count = count(path, shape);
            long expected = PREFIX + headerLength + 4 * count;
            if (length != expected) {
                throw new VolumeFileException(path, (length < expected ? "is cut short: " : "is too long: ") + length + " bytes, shape "
                        + Arrays.toString(shape) + " needs " + expected + "; write the file again");
            }
            return new Contents(shape, readValues(path, in, (int) count));
        }
    }

    /**
     * Reads a grid of a known shape.
     *
     * @throws VolumeFileException as {@link #read(Path)}, or if the file's shape is not (nz, ny, nx)
     */
    public static ScalarGrid readGrid(Path path, GridShape shape) throws IOException {
        Contents contents = read(path);
        int[] needed = {shape.nz(), shape.ny(), shape.nx()};
        if (!Arrays.equals(needed, contents.shape())) {
            throw new VolumeFileException(path, "has shape " + Arrays.toString(contents.shape()) + ", needs (nz, ny, nx) = "
                    + Arrays.toString(needed) + "; check the shot's grid");
        }
        return new ScalarGrid(shape, contents.values());
    }

    private static byte[] header(int[] shape) {
        StringBuilder sizes = new StringBuilder();
        for (int n = 0; n < shape.length; n++) {
            sizes.append(n == 0 ? "" : ", ").append(shape[n]);
        }
        String dictionary = "{'descr': '<f4', 'fortran_order': False, 'shape': (" + sizes + (shape.length == 1 ? "," : "") + "), }";
        int total = (PREFIX + dictionary.length() + 1 + ALIGNMENT - 1) / ALIGNMENT * ALIGNMENT;
        byte[] bytes = new byte[total];
        Arrays.fill(bytes, (byte) ' ');
        System.arraycopy(MAGIC, 0, bytes, 0, MAGIC.length);
        bytes[8] = (byte) (total - PREFIX);
        bytes[9] = (byte) (total - PREFIX >> 8);
        byte[] text = dictionary.getBytes(StandardCharsets.US_ASCII);
        System.arraycopy(text, 0, bytes, PREFIX, text.length);
        bytes[total - 1] = '\n';
        return bytes;
    }

    private static int[] shape(Path path, String header) throws VolumeFileException {
        Matcher matcher = HEADER.matcher(header);
        if (!matcher.matches()) {
            throw new VolumeFileException(path, "has a header that is not NPY 1.0's; write the file again");
        }
        if (!matcher.group(1).equals("<f4")) {
            throw new VolumeFileException(path, "holds numbers of type '" + matcher.group(1) + "', needs '<f4' (32-bit floats, little-endian)");
        }
        if (matcher.group(2).equals("True")) {
            throw new VolumeFileException(path, "is in Fortran order, needs C order (last index fastest); write it again in that order");
        }
        String[] sizes = matcher.group(3).replaceAll(",? *$", "").split(", *");
        if (sizes.length > MOST_DIMENSIONS || sizes[0].isEmpty()) {
            throw new VolumeFileException(path, "has a shape of (" + matcher.group(3) + "), needs 1 to " + MOST_DIMENSIONS + " sizes");
        }
        int[] shape = new int[sizes.length];
        for (int n = 0; n < shape.length; n++) {
            if (!sizes[n].matches("[0-9]{1,9}")) {
                throw new VolumeFileException(path, "has a size of '" + sizes[n] + "' in its shape, needs whole numbers below 10^9");
            }
            shape[n] = Integer.parseInt(sizes[n]);
        }
        return shape;
    }

    private static long count(Path path, int[] shape) throws VolumeFileException {
        long count = 1;
        for (int size : shape) {
            if (size < 1 || count > MOST_VALUES / size) {
                throw new VolumeFileException(path, "has a shape of " + Arrays.toString(shape) + ", needs sizes of at least 1 and at most "
                        + MOST_VALUES + " values");
            }
            count *= size;
        }
        return count;
    }

    private static void writeValues(float[] values, OutputStream out) throws IOException {
        ByteBuffer block = ByteBuffer.allocate(4 * BLOCK_FLOATS).order(ByteOrder.LITTLE_ENDIAN);
        for (int at = 0; at < values.length; at += BLOCK_FLOATS) {
            int count = Math.min(BLOCK_FLOATS, values.length - at);
            block.asFloatBuffer().put(values, at, count);
            out.write(block.array(), 0, 4 * count);
        }
    }

    private static float[] readValues(Path path, InputStream in, int count) throws IOException {
        float[] values = new float[count];
        byte[] bytes = new byte[4 * BLOCK_FLOATS];
        ByteBuffer block = ByteBuffer.wrap(bytes).order(ByteOrder.LITTLE_ENDIAN);
        for (int at = 0; at < count; at += BLOCK_FLOATS) {
            int now = Math.min(BLOCK_FLOATS, count - at);
            if (in.readNBytes(bytes, 0, 4 * now) < 4 * now) {
                throw new VolumeFileException(path, "is cut short: it ended while it was read; write the file again");
            }
            block.asFloatBuffer().get(values, at, now);
            for (int n = at; n < at + now; n++) {
                if (!Float.isFinite(values[n])) {
                    throw new VolumeFileException(path, "holds " + values[n] + " as value " + n + ", needs finite numbers; find what made it");
                }
            }
        }
        return values;
    }
}

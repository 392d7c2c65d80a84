package org.wispwright.ui.shot;

import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import org.wispwright.render.files.WholeFile;

/**
 * The coefficients of a take's force as one NPY array of float64 (format 1.0, little-endian): 128 bytes of header, then 8 bytes a
 * coefficient. Float64, so that a force comes back with the bits it was found with.
 */
final class ForceFile {
    /** The most coefficients that are read: 128 MiB. */
    static final int MOST = 1 << 24;
    private static final int HEADER = 128;

    private ForceFile() {
    }

    static void write(Path path, double[] coefficients) throws IOException {
        ByteBuffer bytes = ByteBuffer.allocate(HEADER + 8 * coefficients.length).order(ByteOrder.LITTLE_ENDIAN);
        bytes.put(header(coefficients.length));
        for (double c : coefficients) {
            bytes.putDouble(c);
        }
        WholeFile.write(path, out -> out.write(bytes.array()));
    }

    /** Reads what {@link #write} wrote. @throws IOException if it is cut short, of another kind, or holds what is not a finite number */
    static double[] read(Path path) throws IOException {
        long size = Files.size(path);
        long count = (size - HEADER) / 8;
        if (size < HEADER || (size - HEADER) % 8 != 0 || count > MOST) {
            throw new IOException("is cut short or too long: it has " + size + " bytes");
        }
        byte[] bytes;
        try (InputStream in = Files.newInputStream(path)) {
            bytes = in.readNBytes((int) size);
        }
        if (bytes.length != size || !Arrays.equals(header((int) count), Arrays.copyOf(bytes, HEADER))) {
            throw new IOException("does not begin as NPY with " + count + " float64 values");
        }
        ByteBuffer values = ByteBuffer.wrap(bytes, HEADER, bytes.length - HEADER).order(ByteOrder.LITTLE_ENDIAN);
        double[] coefficients = new double[(int) count];
        for (int n = 0; n < coefficients.length; n++) {
            coefficients[n] = values.getDouble();
            if (!Double.isFinite(coefficients[n])) {
                throw new IOException("holds " + coefficients[n] + " at value " + n);
            }
        }
        return coefficients;
    }

    private static byte[] header(int count) {
        byte[] header = new byte[HEADER];
        Arrays.fill(header, (byte) ' ');
        byte[] start = {(byte) 0x93, 'N', 'U', 'M', 'P', 'Y', 1, 0, HEADER - 10, 0};
        byte[] words = ("{'descr': '<f8', 'fortran_order': False, 'shape': (" + count + ",), }").getBytes(StandardCharsets.US_ASCII);
        System.arraycopy(start, 0, header, 0, start.length);
        System.arraycopy(words, 0, header, start.length, words.length);
        header[HEADER - 1] = '\n';
        return header;
    }
}

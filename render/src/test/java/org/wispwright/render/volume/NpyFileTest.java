package org.wispwright.render.volume;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** NPY files, format 1.0 as published in NumPy's documentation. */
class NpyFileTest {
    @TempDir
    private Path folder;

    /** U62: the 152 bytes of a float32 2 x 3 array holding 0..5. */
    @Test
    void u62_bytesOfASmallArray() throws IOException {
        Path path = folder.resolve("six.npy");
        float[] values = {0, 1, 2, 3, 4, 5};
        NpyFile.write(path, new int[] {2, 3}, values);
        byte[] got = Files.readAllBytes(path);
        String text = "{'descr': '<f4', 'fortran_order': False, 'shape': (2, 3), }";
        String header = text + " ".repeat(128 - 10 - text.length() - 1) + "\n";
        String expected = "934e554d505901007600" + HexFormat.of().formatHex(header.getBytes(StandardCharsets.US_ASCII))
                + "000000000000803f00000040000040400000804" + "00000a040";
        assertEquals(152, got.length);
        assertEquals(expected, HexFormat.of().formatHex(got));
        NpyFile.Contents back = NpyFile.read(path);
        assertArrayEquals(new int[] {2, 3}, back.shape());
        assertArrayEquals(values, back.values());
    }

    /** U64: Fortran order is refused, not turned around: nothing that this program writes has it. */
    @Test
    void u64_fortranOrderIsRefused() throws IOException {
        refused(bytes("{'descr': '<f4', 'fortran_order': True, 'shape': (2, 3), }", 24), "Fortran order");
    }

    @Test
    void aGridGoesInWithZSlowest() throws IOException {
        GridShape shape = new GridShape(3, 4, 2, 0.1);
        ScalarGrid grid = new ScalarGrid(shape);
        for (int n = 0; n < shape.cells(); n++) {
            grid.values()[n] = n;
        }
        Path path = folder.resolve("grid.npy");
        NpyFile.write(path, grid);
        assertArrayEquals(new int[] {2, 4, 3}, NpyFile.read(path).shape());
        assertEquals(shape.cell(2, 1, 1), NpyFile.readGrid(path, shape).at(2, 1, 1));
        String message = assertThrows(VolumeFileException.class, () -> NpyFile.readGrid(path, new GridShape(4, 3, 2, 0.1))).getMessage();
        assertTrue(message.contains("needs (nz, ny, nx) = [2, 3, 4]"), message);
    }

    /** More than one block of the buffers, and a row of one size. */
    @Test
    void longArraysComeBack() throws IOException {
        float[] values = new float[40_001];
        for (int n = 0; n < values.length; n++) {
            values[n] = (float) Math.sin(n);
        }
        Path path = folder.resolve("long.npy");
        NpyFile.write(path, new int[] {values.length}, values);
        assertArrayEquals(values, NpyFile.read(path).values());
        assertArrayEquals(new int[] {values.length}, NpyFile.read(path).shape());
    }

    @Test
    void whatIsNotSoIsRefused() throws IOException {
        byte[] good = bytes("{'descr': '<f4', 'fortran_order': False, 'shape': (2, 3), }", 24);
        for (int length = 0; length < good.length; length++) {
            refused(Arrays.copyOf(good, length), length < 10 ? "NPY" : "cut short");
        }
        refused(Arrays.copyOf(good, good.length + 1), "too long");
        refused(bytes("{'descr': '>f4', 'fortran_order': False, 'shape': (2, 3), }", 24), "'<f4'");
        refused(bytes("{'descr': '<f8', 'fortran_order': False, 'shape': (3,), }", 24), "'<f4'");
        refused(bytes("{'descr': '<f4', 'fortran_order': False, 'shape': (999999999, 999999999), }", 24), "at most");
        refused(bytes("{'descr': '<f4', 'fortran_order': False, 'shape': (0, 3), }", 0), "at least 1");
        refused(bytes("{'descr': '<f4', 'fortran_order': False, 'shape': (), }", 4), "1 to 8 sizes");
        refused(bytes("{'descr': '<f4', 'fortran_order': False, 'shape': (20000, 20000), }", 24), "needs 1600000");
        refused(bytes("{'descr': '<f4'}", 24), "header");
        byte[] later = good.clone();
        later[6] = 2;
        refused(later, "format 1.0");
        byte[] nan = good.clone();
        nan[good.length - 1] = 0x7f;
        nan[good.length - 2] = (byte) 0xc0;
        refused(nan, "NaN as value 5");
        String message = assertThrows(VolumeFileException.class, () -> NpyFile.read(folder.resolve("none.npy"))).getMessage();
        assertTrue(message.contains("does not exist"), message);
        assertThrows(IllegalArgumentException.class, () -> NpyFile.write(folder.resolve("x.npy"), new int[] {2, 2}, new float[5]));
    }

    /** A file that could not be finished leaves the older one, and nothing else. */
    @Test
    void aMissingFolderIsNamed() throws IOException {
        String message = assertThrows(IOException.class, () -> NpyFile.write(folder.resolve("no/x.npy"), new int[] {1}, new float[1])).getMessage();
        assertTrue(message.contains("folder does not exist"), message);
        try (Stream<Path> files = Files.list(folder)) {
            assertEquals(0, files.count());
        }
    }

    private void refused(byte[] bytes, String part) throws IOException {
        Path path = Files.write(folder.resolve("in.npy"), bytes);
        String message = assertThrows(VolumeFileException.class, () -> NpyFile.read(path)).getMessage();
        assertTrue(message.contains(part) && message.contains(path.toString()) && message.lines().count() == 1, message);
    }

    private static byte[] bytes(String header, int dataBytes) {
        String padded = header + " ".repeat(128 - 10 - header.length() - 1) + "\n";
        byte[] out = new byte[128 + dataBytes];
        byte[] magic = HexFormat.of().parseHex("934e554d505901007600");
        System.arraycopy(magic, 0, out, 0, 10);
        System.arraycopy(padded.getBytes(StandardCharsets.US_ASCII), 0, out, 10, 118);
        return out;
    }
}

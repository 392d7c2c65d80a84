package org.wispwright.render.picture;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.image.BufferedImage;
import java.awt.image.IndexColorModel;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import java.util.zip.CRC32;
import java.util.zip.Deflater;
import javax.imageio.ImageIO;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

/** PNG files, ISO/IEC 15948: what comes in, what goes out, and what is refused. */
class PngFileTest {
    /** U52: a whole 2 x 2 file made by hand from the standard: red, green / blue, white. */
    private static final String FOUR_PIXELS = "89504E470D0A1A0A0000000D4948445200000002000000020802000000FDD49A73"
            + "00000019494441547801010E00F1FF00FF000000FF00000000FFFFFFFF1FEE05FBDEDDEC2B0000000049454E44AE426082";

    @TempDir
    private Path folder;

    /** U52: read; no alpha in the file is alpha 1. */
    @Test
    void u52_aWholeFileFromTheStandard() throws IOException {
        Picture picture = PngFile.read(file(HexFormat.of().parseHex(FOUR_PIXELS)));
        assertArrayEquals(new float[] {1, 0, 0, 1, 0, 1, 0, 1, 0, 0, 1, 1, 1, 1, 1, 1}, picture.rgba());
    }

    /** U47, U50, U51: the bytes that the standard fixes in a file of ours: signature, header, sRGB intent. */
    @Test
    void u50_headerOfWhatIsWritten() throws IOException {
        Path path = folder.resolve("out.png");
        PngFile.write(new Picture(1920, 1080), path, PngFile.Depth.EIGHT);
        String hex = HexFormat.of().formatHex(Files.readAllBytes(path), 0, 100);
        assertTrue(hex.startsWith("89504e470d0a1a0a0000000d49484452" + "00000780000004380806000000e8d3c143"), hex);
        assertTrue(hex.contains("000000017352474200aece1ce9"), "sRGB chunk, intent 0: " + hex);
    }

    /** Straight alpha in the file: code and alpha come back, whatever was multiplied in between. */
    @ParameterizedTest
    @EnumSource(PngFile.Depth.class)
    void whatIsWrittenComesBack(PngFile.Depth depth) throws IOException {
        Random random = new Random(42);
        Picture picture = new Picture(37, 23);
        float[] rgba = picture.rgba();
        for (int n = 0; n < rgba.length; n += 4) {
            float alpha = n % 5 == 0 ? 0 : n % 7 == 0 ? 1 : 0.05f + 0.95f * random.nextFloat();
            for (int c = 0; c < 3; c++) {
                rgba[n + c] = alpha * random.nextFloat();
            }
            rgba[n + 3] = alpha;
        }
        Path path = folder.resolve("round.png");
        PngFile.write(picture, path, depth);
        Picture back = PngFile.read(path);
        double largest = depth == PngFile.Depth.EIGHT ? 255 : 65535;
        for (int n = 0; n < rgba.length; n++) {
            // Half a code, times the steepest slope of the curve (2.28 at white), and alpha's half code besides.
            assertEquals(rgba[n], back.rgba()[n], 2 / largest, "value " + n);
        }
        PngFile.write(back, path, depth);
        Picture again = PngFile.read(path);
        assertArrayEquals(back.rgba(), again.rgba(), "a second round changes nothing");
    }

    /** Codes in a file of ours, read by another door of Java: 0.18 at alpha 0.5 is code 118 and alpha 128. */
    @Test
    void colourIsDividedByAlphaInTheFile() throws IOException {
        Path path = folder.resolve("straight.png");
        PngFile.write(new Picture(1, 1, new float[] {0.09f, 0.5f, 2, 0.5f}), path, PngFile.Depth.EIGHT);
        assertEquals(0x8076FFFF, ImageIO.read(path.toFile()).getRGB(0, 0));
    }

    /** Lighter values survive 16 bits that 8 bits lose. */
    @Test
    void sixteenBitsAreSixteenBits() throws IOException {
        Path path = folder.resolve("deep.png");
        PngFile.write(new Picture(2, 1, new float[] {0.5f, 0.5f, 0.5f, 1, 0.5005f, 0.5f, 0.5f, 1}), path, PngFile.Depth.SIXTEEN);
        Picture back = PngFile.read(path);
        assertEquals(0.5005f, back.at(1, 0, 0), 2e-5);
        assertEquals(0.5f, back.at(0, 0, 0), 2e-5);
    }

    @Test
    void greyAndPaletteAndAlphaOfEveryDepth() throws IOException {
        BufferedImage grey = new BufferedImage(3, 2, BufferedImage.TYPE_BYTE_GRAY);
        grey.getRaster().setSample(1, 1, 0, 118);
        Picture picture = javaPng(grey);
        assertEquals((float) Srgb.decode(118 / 255.0), picture.at(1, 1, 2));
        assertEquals(1, picture.at(0, 0, 3));
        BufferedImage deepGrey = new BufferedImage(3, 2, BufferedImage.TYPE_USHORT_GRAY);
        deepGrey.getRaster().setSample(2, 0, 0, 12_345);
        assertEquals((float) Srgb.decode(12_345 / 65_535.0), javaPng(deepGrey).at(2, 0, 1));
        BufferedImage bits = new BufferedImage(9, 2, BufferedImage.TYPE_BYTE_BINARY);
        bits.setRGB(4, 1, 0xFFFFFFFF);
        assertEquals(1, javaPng(bits).at(4, 1, 0));
        assertEquals(0, javaPng(bits).at(3, 1, 0));
        byte[] red = {0, (byte) 200};
        byte[] green = {10, 100};
        byte[] blue = {20, 50};
        byte[] alpha = {(byte) 255, 51};
        BufferedImage palette = new BufferedImage(2, 2, BufferedImage.TYPE_BYTE_INDEXED, new IndexColorModel(8, 2, red, green, blue, alpha));
        palette.getRaster().setSample(1, 0, 0, 1);
        picture = javaPng(palette);
        assertEquals(0.2f, picture.at(1, 0, 3));
        assertEquals(0.2 * Srgb.decode(200 / 255.0), picture.at(1, 0, 0), 1e-7);
        assertEquals(Srgb.decode(20 / 255.0), picture.at(0, 1, 2), 1e-7);
    }

    /** Made by hand: 16-bit grey with alpha, and interlaced 8-bit grey (Adam7) of 3 x 3 with rows of one value a pass. */
    @Test
    void kindsThatJavaDoesNotWrite() throws IOException {
        Picture picture = PngFile.read(file(png(1, 1, 16, 4, 0, new byte[] {0, 0x30, 0x39, (byte) 0x80, 0})));
        float alpha = 0x8000 / 65_535f;
        assertEquals(alpha, picture.at(0, 0, 3));
        assertEquals(alpha * (float) Srgb.decode(12_345 / 65_535.0), picture.at(0, 0, 0));
        byte[] passes = {0, 1, 0, 3, 0, 7, 9, 0, 2, 0, 8, 0, 4, 5, 6};
        picture = PngFile.read(file(png(3, 3, 8, 0, 1, passes)));
        assertEquals(Srgb.decodeByte(1), picture.at(0, 0, 0));
        assertEquals(Srgb.decodeByte(3), picture.at(2, 0, 0));
        assertEquals(Srgb.decodeByte(9), picture.at(2, 2, 0));
        assertEquals(Srgb.decodeByte(6), picture.at(2, 1, 0));
    }

    /** Cut anywhere, a file is refused in one sentence that names it. */
    @Test
    void cutShortAnywhereIsRefused() throws IOException {
        byte[] whole = HexFormat.of().parseHex(FOUR_PIXELS);
        for (int length = 0; length < whole.length; length++) {
            refused(Arrays.copyOf(whole, length), length < 8 ? "signature" : "cut short");
        }
    }

    /** One byte changed anywhere is noticed. */
    @Test
    void anyChangedByteIsRefused() throws IOException {
        byte[] whole = HexFormat.of().parseHex(FOUR_PIXELS);
        for (int n = 0; n < whole.length; n++) {
            byte[] changed = whole.clone();
            changed[n] ^= 0x41;
            refused(changed, "picture file");
        }
    }

    /** Checksums right, content wrong. */
    @Test
    void wrongInsideIsRefused() throws IOException {
        refused(png(2, 2, 8, 2, 0, new byte[7]), "unpack to 7 bytes, 2x2 pixels need 14");
        refused(png(2, 2, 8, 3, 0, new byte[6]), "no PLTE");
        refused(png(20_000, 20_000, 8, 2, 0, new byte[7]), "states 20000x20000 pixels");
        refused(png(16_000, 16_000, 8, 2, 0, new byte[7]), "at most 67108864 pixels");
        refused(png(0, 2, 8, 2, 0, new byte[7]), "states 0x2");
        refused(png(2, 2, 9, 2, 0, new byte[14]), "kind of pixel");
        refused(png(2, 2, 8, 2, 2, new byte[14]), "kind of pixel");
        byte[] key = chunks(List.of(header(1, 1, 8, 0, 0), chunk("tRNS", new byte[2]), chunk("IDAT", deflated(new byte[2])), chunk("IEND", new byte[0])));
        refused(key, "alpha channel");
        refused(chunks(List.of(header(1, 1, 8, 0, 0), chunk("IDAT", new byte[] {1, 2, 3}), chunk("IEND", new byte[0]))), "cannot be unpacked");
        refused(chunks(List.of(header(1, 1, 8, 0, 0), chunk("XYZW", new byte[0]))), "required chunk XYZW");
        refused(chunks(List.of(chunk("IEND", new byte[0]))), "not IHDR");
        refused(png(1, 1, 8, 0, 0, new byte[] {9, 0}), "damaged");
        String message = assertThrows(PictureFileException.class, () -> PngFile.read(folder.resolve("none.png"))).getMessage();
        assertTrue(message.contains("does not exist"), message);
    }

    @ParameterizedTest
    @ValueSource(floats = {Float.NaN, Float.POSITIVE_INFINITY})
    void valuesThatAreNotFiniteAreRefusedAndNothingIsWritten(float bad) throws IOException {
        Picture picture = new Picture(3, 2);
        picture.rgba()[4 * (1 + 3) + 2] = bad;
        Path path = folder.resolve("bad.png");
        String message = assertThrows(IllegalArgumentException.class, () -> PngFile.write(picture, path, PngFile.Depth.EIGHT)).getMessage();
        assertTrue(message.contains("pixel (1, 1)"), message);
        try (Stream<Path> files = Files.list(folder)) {
            assertEquals(0, files.count());
        }
    }

    private void refused(byte[] bytes, String part) throws IOException {
        Path path = file(bytes);
        String message = assertThrows(PictureFileException.class, () -> PngFile.read(path)).getMessage();
        assertTrue(message.contains(part) && message.contains(path.toString()) && message.lines().count() == 1, message);
    }

    private Picture javaPng(BufferedImage image) throws IOException {
        Path path = folder.resolve("java.png");
        ImageIO.write(image, "png", path.toFile());
        return PngFile.read(path);
    }

    private Path file(byte[] bytes) throws IOException {
        return Files.write(folder.resolve("in.png"), bytes);
    }

    private static byte[] png(int width, int height, int depth, int type, int interlace, byte[] rows) {
        return chunks(List.of(header(width, height, depth, type, interlace), chunk("IDAT", deflated(rows)), chunk("IEND", new byte[0])));
    }

    private static byte[] header(int width, int height, int depth, int type, int interlace) {
        ByteBuffer data = ByteBuffer.allocate(13).putInt(width).putInt(height);
        data.put((byte) depth).put((byte) type).put((byte) 0).put((byte) 0).put((byte) interlace);
        return chunk("IHDR", data.array());
    }

    private static byte[] chunk(String type, byte[] data) {
        ByteBuffer out = ByteBuffer.allocate(12 + data.length).putInt(data.length).put(type.getBytes()).put(data);
        CRC32 crc = new CRC32();
        crc.update(out.array(), 4, 4 + data.length);
        return out.putInt((int) crc.getValue()).array();
    }

    private static byte[] chunks(List<byte[]> chunks) {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        out.writeBytes(HexFormat.of().parseHex("89504e470d0a1a0a"));
        chunks.forEach(out::writeBytes);
        return out.toByteArray();
    }

    private static byte[] deflated(byte[] rows) {
        Deflater deflater = new Deflater();
        deflater.setInput(rows);
        deflater.finish();
        byte[] out = new byte[rows.length + 64];
        int length = deflater.deflate(out);
        deflater.end();
        return Arrays.copyOf(out, length);
    }
}

package org.wispwright.render.picture;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/** EXR files against the printed sample of their layout's description and IEEE 754-2008 binary16; and what must be refused. */
class ExrFileTest {
    /** U60: "OpenEXR File Layout", the sample file: 4 x 3 pixels, G half and Z float, no compression; 415 bytes. */
    private static final String SAMPLE =
            "762f3101020000006368616e6e656c730063686c69737400250000004700010000000000000001000000010000005a0002000000"
            + "00000000010000000100000000636f6d7072657373696f6e00636f6d7072657373696f6e000100000000646174615769"
            + "6e646f7700626f7832690010000000000000000000000003000000020000"
            + "00646973706c617957696e646f7700626f783269001000000000000000000000000300000002000000"
            + "6c696e654f72646572006c696e654f72646572000100000000"
            + "706978656c417370656374526174696f00666c6f617400040000000000803f73637265656e57696e646f7743656e746572007632660008000000"
            + "000000000000000073637265656e57696e646f77576964746800666c6f617400040000000000803f00"
            + "3f010000000000005f010000000000007f01000000000000"
            + "000000001800000000005429d535e82d5c28813acfe1343e8b0bbb3d8974f93e"
            + "010000001800000037387633743b73387fabe83e8acf543f5b6c113f2035503d"
            + "0200000018000000233a0a34023b5d3b38f39a3c4dad983e1c14083f4cf3033f";

    @TempDir
    private Path place;

    @Test
    void theSampleOfTheDescription() throws IOException {
        byte[] bytes = HexFormat.of().parseHex(SAMPLE);
        assertEquals(415, bytes.length);
        Map<String, float[]> channels = ExrFile.channels(file(bytes));
        assertEquals(2, channels.size());
        assertArrayEquals(new float[] {0, 0.0416259765625f, 0.364501953125f, 0.09228515625f, 0.52685546875f, 0.233154296875f, 0.931640625f,
            0.55615234375f, 0.76708984375f, 0.25244140625f, 0.8759765625f, 0.92041015625f}, channels.get("G"));
        assertArrayEquals(new float[] {0.000985394698f, 0.176642641f, 0.0913306102f, 0.487217218f, 0.454433411f, 0.831291795f, 0.568059623f,
            0.0508319139f, 0.0189148039f, 0.29819718f, 0.531556845f, 0.515431166f}, channels.get("Z"));
        assertRefused(file(bytes), "has the channels G, Z, needs R, G and B");
    }

    /** R40 to R46, IEEE 754-2008: value, bits, value back; the way back is the decoder's, which is not ours. */
    @ParameterizedTest
    @CsvSource({"0, 0000, 0", "-0.0, 8000, -0.0", "1, 3C00, 1", "-2, C000, -2", "0.5, 3800, 0.5", "0.1, 2E66, 0.0999755859375",
        "0.18, 31C3, 0.1800537109375", "0.33333334, 3555, 0.333251953125", "0.2126, 32CE, 0.212646484375", "1.001, 3C01, 1.0009765625",
        "3.1415927, 4248, 3.140625", "1.00048828125, 3C00, 1", "1.00146484375, 3C02, 1.001953125", "2048, 6800, 2048", "2049, 6800, 2048",
        "2051, 6802, 2052", "4097, 6C00, 4096", "65504, 7BFF, 65504", "65519.99, 7BFF, 65504", "6.103515625e-05, 0400, 6.103515625e-05",
        "6.097555160522461e-05, 03FF, 6.097555160522461e-05", "5.960464477539063e-08, 0001, 5.960464477539063e-08",
        "2.98023223876953125e-08, 0000, 0", "2.980530262e-08, 0001, 5.960464477539063e-08"})
    void halves(float value, String bits, float back) throws IOException {
        assertEquals(bits, String.format("%04X", HalfFloat.bits(value)));
        Picture picture = new Picture(1, 1, new float[] {value, 0.25f, 0, 1});
        ExrWriting.write(picture, place.resolve("half.exr"), ExrWriting.Depth.HALF);
        assertEquals(back, ExrFile.channels(place.resolve("half.exr")).get("R")[0]);
    }

    @Test
    void halvesBeyondTheLargestAreInfinite() {
        assertEquals((short) 0x7C00, HalfFloat.bits(65520));
        assertEquals((short) 0x7C00, HalfFloat.bits(1e5f));
        assertEquals((short) 0xFC00, HalfFloat.bits(Float.NEGATIVE_INFINITY));
        assertEquals(0x7E00, HalfFloat.bits(Float.NaN) & 0x7E00);
    }

    /** U56 to U59: first bytes, required attributes, alphabetical channels, blocks of 16 rows: from the layout's description. */
    @Test
    void whatIsWrittenIsLaidOutAsDescribed() throws IOException {
        Picture picture = noise(5, 35);
        ExrWriting.write(picture, place.resolve("noise.exr"), ExrWriting.Depth.FLOAT);
        byte[] bytes = Files.readAllBytes(place.resolve("noise.exr"));
        assertEquals("762f310102000000", HexFormat.of().formatHex(bytes, 0, 8));
        String text = new String(bytes, StandardCharsets.ISO_8859_1);
        int at = 8;
        for (String name : new String[] {"channels", "compression", "dataWindow", "displayWindow", "lineOrder", "pixelAspectRatio",
            "screenWindowCenter", "screenWindowWidth"}) {
            assertTrue(text.indexOf(name + "\0", at) > 0, name);
        }
        assertTrue(text.indexOf("A\0\2") < text.indexOf("B\0\2") && text.indexOf("G\0\2") < text.indexOf("R\0\2"));
        ByteBuffer file = ByteBuffer.wrap(bytes).order(ByteOrder.LITTLE_ENDIAN);
        int table = text.indexOf("screenWindowWidth\0float\0") + 24 + 4 + 4 + 1;
        for (int b = 0; b < 3; b++) {
            assertEquals(16 * b, file.getInt((int) file.getLong(table + 8 * b)));
        }
        assertArrayEquals(picture.rgba(), ExrFile.read(place.resolve("noise.exr")).rgba());
    }

    /** Noise does not shrink, so its block is stored plain; an even picture does. */
    @ParameterizedTest
    @EnumSource(ExrWriting.Depth.class)
    void evenAndNoisyPicturesComeBack(ExrWriting.Depth depth) throws IOException {
        Picture even = new Picture(64, 40);
        Arrays.fill(even.rgba(), 0.375f);
        ExrWriting.write(even, place.resolve("even.exr"), depth);
        assertTrue(Files.size(place.resolve("even.exr")) < 2000);
        assertArrayEquals(even.rgba(), ExrFile.read(place.resolve("even.exr")).rgba());
        Picture noise = noise(33, 17);
        ExrWriting.write(noise, place.resolve("noise.exr"), depth);
        assertArrayEquals(noise.rgba(), ExrFile.read(place.resolve("noise.exr")).rgba(), depth == ExrWriting.Depth.HALF ? 1f / 2048 : 0);
        assertArrayEquals(new int[] {33, 17}, ExrFile.statedSize(place.resolve("noise.exr")));
        assertTrue(ExrFile.isOne(place.resolve("noise.exr")));
        assertFalse(ExrFile.isOne(place.resolve("missing.exr")));
    }

    /** The picture is the display window; stored pixels are laid in at the data window's corner. From the layout's description. */
    @Test
    void theDisplayWindowIsThePicture() throws IOException {
        byte[] bytes = written(noise(4, 3));
        Picture stored = ExrFile.read(file(bytes));
        int display = find(bytes, "displayWindow\0box2i\0") + 20 + 4;
        ByteBuffer file = ByteBuffer.wrap(bytes).order(ByteOrder.LITTLE_ENDIAN);
        file.putInt(display, -1).putInt(display + 4, 1).putInt(display + 8, 2).putInt(display + 12, 3);
        Picture picture = ExrFile.read(file(bytes));
        assertEquals(4, picture.width());
        assertEquals(3, picture.height());
        assertEquals(0, picture.at(0, 0, 3));
        assertEquals(stored.at(0, 1, 0), picture.at(1, 0, 0));
        assertEquals(stored.at(2, 2, 2), picture.at(3, 1, 2));
        assertEquals(0, picture.at(3, 2, 3));
    }

    @Test
    void aFileWithoutAlphaIsOpaque() throws IOException {
        byte[] bytes = written(noise(4, 3));
        bytes[find(bytes, "A\0\2\0\0\0")] = 'D';
        assertEquals(1, ExrFile.read(file(bytes)).at(2, 1, 3));
    }

    @Test
    void everyCutIsRefusedAndNothingElseHappens() throws IOException {
        byte[] bytes = written(noise(9, 20));
        for (int length = 0; length < bytes.length; length += 1 + length / 40) {
            Path cut = file(Arrays.copyOf(bytes, length));
            String said = assertThrows(PictureFileException.class, () -> ExrFile.read(cut)).getMessage();
            assertFalse(said.contains("\n"), said);
        }
    }

    @Test
    void whatIsNotReadIsRefusedBeforeMemoryIsTaken() throws IOException {
        byte[] good = written(noise(4, 3));
        assertRefused(place.resolve("missing.exr"), "does not exist");
        assertRefused(file("not a picture at all".getBytes(StandardCharsets.US_ASCII)), "is not an EXR file");
        assertRefused(changed(good, 5, 0x02), "is tiled, deep, in several parts");
        assertRefused(changed(good, find(good, "compression\0compression\0") + 24 + 4, 6), "is compressed with B44");
        int window = find(good, "dataWindow\0box2i\0") + 17 + 4;
        assertRefused(changed(good, window + 10, 0x7F), "pixels as its dataWindow, needs sides of 1 to 16384");
        assertRefused(changed(good, window + 11, 0x80), "pixels as its dataWindow");
        assertRefused(changed(good, find(good, "R\0\2\0\0\0") + 2, 0), "has whole numbers in channel 'R'");
        assertRefused(changed(good, find(good, "R\0\2\0\0\0"), 'Q'), "needs R, G and B");
        assertRefused(changed(good, find(good, "R\0\2\0\0\0"), 'G'), "'G' twice");
        assertRefused(changed(good, find(good, "lineOrder\0lineOrder\0") + 20 + 4, 7), "line order 7");
        assertRefused(changed(good, find(good, "lineOrder\0"), 'x'), "has no 'lineOrder'");
    }

    @Test
    void numbersThatAreNotFiniteAreRefused() throws IOException {
        byte[] bytes = written(noise(4, 3));
        int row = bytes.length - 4 * 3 * 4 * 4;
        ByteBuffer.wrap(bytes).order(ByteOrder.LITTLE_ENDIAN).putFloat(row + 4 * 4 * 3, Float.NaN);
        // 3 rows of noise do not shrink, so the numbers stand there as they are: the first row's red begins after A, B and G.
        assertRefused(file(bytes), "holds a number that is not finite in pixel (0, 0)");
        assertThrows(IllegalArgumentException.class, () -> ExrWriting.write(new Picture(1, 1, new float[] {0, Float.NaN, 0, 1}),
                place.resolve("nan.exr"), ExrWriting.Depth.FLOAT));
        assertFalse(Files.exists(place.resolve("nan.exr")));
    }

    /** U61: colours are Rec.709's unless the file says otherwise. Rec.2020's red instead of Rec.709's, Rec. ITU-R BT.2020: 0.708, 0.292. */
    @Test
    void otherPrimariesAreRefused() throws IOException {
        byte[] bytes = written(noise(4, 3));
        ByteBuffer attribute = ByteBuffer.allocate(30 + 4 + 32).order(ByteOrder.LITTLE_ENDIAN);
        attribute.put("chromaticities\0chromaticities\0".getBytes(StandardCharsets.US_ASCII)).putInt(32);
        for (float xy : new float[] {0.708f, 0.292f, 0.17f, 0.797f, 0.131f, 0.046f, 0.3127f, 0.329f}) {
            attribute.putFloat(xy);
        }
        byte[] longer = new byte[bytes.length + attribute.capacity()];
        System.arraycopy(bytes, 0, longer, 0, 8);
        System.arraycopy(attribute.array(), 0, longer, 8, attribute.capacity());
        System.arraycopy(bytes, 8, longer, 8 + attribute.capacity(), bytes.length - 8);
        assertRefused(file(longer), "other primaries than Rec.709");
    }

    private static Picture noise(int width, int height) {
        Picture picture = new Picture(width, height);
        Random random = new Random(width);
        for (int n = 0; n < picture.rgba().length; n++) {
            picture.rgba()[n] = random.nextFloat();
        }
        return picture;
    }

    private byte[] written(Picture picture) throws IOException {
        ExrWriting.write(picture, place.resolve("written.exr"), ExrWriting.Depth.FLOAT);
        return Files.readAllBytes(place.resolve("written.exr"));
    }

    private Path file(byte[] bytes) throws IOException {
        return Files.write(place.resolve("given.exr"), bytes);
    }

    private Path changed(byte[] good, int at, int value) throws IOException {
        byte[] bytes = good.clone();
        bytes[at] = (byte) value;
        return file(bytes);
    }

    private static int find(byte[] bytes, String text) {
        return new String(bytes, StandardCharsets.ISO_8859_1).indexOf(text);
    }

    private static void assertRefused(Path file, String why) {
        String said = assertThrows(PictureFileException.class, () -> ExrFile.read(file)).getMessage();
        assertTrue(said.contains(why), said);
    }
}

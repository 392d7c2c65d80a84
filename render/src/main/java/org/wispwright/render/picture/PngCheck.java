package org.wispwright.render.picture;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.zip.CRC32;
import java.util.zip.DataFormatException;
import java.util.zip.Inflater;

/**
 * Walks a PNG file's chunks before anything is decoded: signature, lengths, CRC-32, header, palette, amount of image data,
 * end. ISO/IEC 15948 (W3C PNG, 3rd edition). What passes has all of its pixels.
 */
final class PngCheck {
    /** The most pixels a file may state: 8192 x 8192, 1 GiB as floats. */
    static final long MOST_PIXELS = 1L << 26;
    private static final long SIGNATURE = 0x89504E470D0A1A0AL;
    private static final int[] CHANNELS = {1, 0, 3, 1, 2, 0, 4};
    /** Adam7: first column and row, then steps, of each of the seven passes. */
    private static final int[][] PASSES = {{0, 0, 8, 8}, {4, 0, 8, 8}, {0, 4, 4, 8}, {2, 0, 4, 4}, {0, 2, 2, 4}, {1, 0, 2, 2}, {0, 1, 1, 2}};

    private final Path path;
    private final ByteBuffer file;
    private final Inflater inflater = new Inflater();
    private final byte[] sink = new byte[1 << 15];
    private int width;
    private int height;
    private int depth;
    private int colourType = -1;
    private boolean interlaced;
    private boolean palette;
    private boolean transparencyKey;
    private long unpacked;

    private PngCheck(Path path, byte[] bytes) {
        this.path = path;
        file = ByteBuffer.wrap(bytes);
    }

    /** Refuses a file that is damaged, cut short, too large or of a kind that is not read. */
    static void require(Path path, byte[] bytes) throws PictureFileException {
        PngCheck check = new PngCheck(path, bytes);
        try {
            check.walk();
        } finally {
            check.inflater.end();
        }
    }

    private void walk() throws PictureFileException {
        if (file.remaining() < 8 || file.getLong() != SIGNATURE) {
            throw refuse("is not a PNG file (its first eight bytes are not the PNG signature); save the picture as PNG");
        }
        String type = "";
        while (!type.equals("IEND")) {
            int at = file.position();
            if (file.remaining() < 12) {
                throw cut("the file ends at byte " + file.capacity() + ", before its end chunk");
            }
            int length = file.getInt();
            byte[] name = new byte[4];
            file.get(name);
            type = new String(name, StandardCharsets.ISO_8859_1);
            if (!type.matches("[A-Za-z]{4}")) {
                throw damaged("what should be a chunk's name at byte " + (at + 4) + " is not four letters");
            }
            if (length < 0 || length > file.remaining() - 4) {
                throw cut("chunk " + type + " at byte " + at + " states " + Integer.toUnsignedString(length) + " bytes, only "
                        + Math.max(0, file.remaining() - 4) + " follow");
            }
            int data = file.position();
            CRC32 crc = new CRC32();
            crc.update(file.array(), at + 4, length + 4);
            file.position(data + length);
            if ((int) crc.getValue() != file.getInt()) {
                throw damaged("chunk " + type + " at byte " + at + " does not match its CRC-32");
            }
            if (colourType < 0 && !type.equals("IHDR")) {
                throw damaged("it starts with chunk " + type + " and not IHDR");
            }
            chunk(type, data, length);
        }
        if (colourType == 3 && !palette) {
            throw damaged("it has palette pixels and no PLTE chunk");
        }
        long needed = imageBytes();
        if (unpacked < needed) {
            throw cut("its image data unpack to " + unpacked + " bytes, " + width + "x" + height + " pixels need " + needed);
        }
    }

    private void chunk(String type, int data, int length) throws PictureFileException {
        switch (type) {
            case "IHDR" -> header(data, length);
            case "PLTE" -> {
                if (length == 0 || length % 3 != 0 || length > 768) {
                    throw damaged("its PLTE chunk has " + length + " bytes, needs 3 to 768 in threes");
                }
                palette = true;
            }
            case "tRNS" -> transparencyKey = colourType == 0 || colourType == 2;
            case "IDAT" -> unpack(data, length);
            case "IEND" -> {
                if (transparencyKey) {
                    throw refuse("marks one colour as transparent (chunk tRNS without a palette), which is not read; save it with an alpha channel");
                }
            }
            default -> {
                if (Character.isUpperCase(type.charAt(0))) {
                    throw refuse("has a required chunk " + type + " that is not read; save it as a plain PNG");
                }
            }
        }
    }

    private void header(int data, int length) throws PictureFileException {
        if (length != 13 || colourType >= 0) {
            throw damaged(length != 13 ? "its IHDR chunk has " + length + " bytes, needs 13" : "it has two IHDR chunks");
        }
        width = file.getInt(data);
        height = file.getInt(data + 4);
        depth = file.get(data + 8);
        int type = file.get(data + 9);
        interlaced = file.get(data + 12) == 1;
        if (width < 1 || height < 1 || width > Picture.LONGEST_SIDE || height > Picture.LONGEST_SIDE || (long) width * height > MOST_PIXELS) {
            throw refuse("states " + Integer.toUnsignedString(width) + "x" + Integer.toUnsignedString(height) + " pixels, needs sides of 1 to "
                    + Picture.LONGEST_SIDE + " and at most " + MOST_PIXELS + " pixels; save a smaller one");
        }
        boolean known = switch (type) {
            case 0 -> depth == 1 || depth == 2 || depth == 4 || depth == 8 || depth == 16;
            case 3 -> depth == 1 || depth == 2 || depth == 4 || depth == 8;
            case 2, 4, 6 -> depth == 8 || depth == 16;
            default -> false;
        };
        if (!known || file.get(data + 10) != 0 || file.get(data + 11) != 0 || (file.get(data + 12) & ~1) != 0) {
            throw damaged("its header names a kind of pixel that PNG does not have (colour type " + type + ", " + depth + " bits)");
        }
        colourType = type;
    }

    private void unpack(int data, int length) throws PictureFileException {
        inflater.setInput(file.array(), data, length);
        try {
            long needed = imageBytes();
            while (!inflater.needsInput() && !inflater.finished() && unpacked <= needed) {
                int got = inflater.inflate(sink);
                if (got == 0 && inflater.needsDictionary()) {
                    throw damaged("its image data ask for a dictionary");
                }
                unpacked += got;
            }
        } catch (DataFormatException wrong) {
            throw new PictureFileException(path, "is damaged: its image data cannot be unpacked (" + wrong.getMessage()
                    + "); write the file again", wrong);
        }
    }

    /** Bytes of all rows, each with its filter byte. */
    private long imageBytes() {
        if (!interlaced) {
            return passBytes(width, height);
        }
        long sum = 0;
        for (int[] pass : PASSES) {
            int columns = (width - pass[0] + pass[2] - 1) / pass[2];
            int rows = (height - pass[1] + pass[3] - 1) / pass[3];
            if (columns > 0 && rows > 0) {
                sum += passBytes(columns, rows);
            }
        }
        return sum;
    }

    private long passBytes(int columns, int rows) {
        long bits = (long) columns * CHANNELS[colourType] * depth;
        return rows * (1 + (bits + 7) / 8);
    }

    private PictureFileException refuse(String wrong) {
        return new PictureFileException(path, wrong);
    }

    private PictureFileException damaged(String how) {
        return refuse("is damaged: " + how + "; write the file again");
    }

    private PictureFileException cut(String how) {
        return refuse("is cut short: " + how + "; write the file again");
    }
}

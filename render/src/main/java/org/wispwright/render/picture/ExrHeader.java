package org.wispwright.render.picture;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * What an EXR file states of itself, read and checked before anything is decoded: first bytes, attributes, channels, windows, and that
 * every block of rows lies inside the file. Layout: "OpenEXR File Layout", published by its maintainers. Read are single flat images in
 * rows.
 *
 * @param left    first column of the stored pixels in the picture; may be negative
 * @param top     first row of the stored pixels in the picture
 * @param stored  width and height of the stored pixels
 * @param picture width and height of the picture
 * @param channels their names, in the file's order
 */
record ExrHeader(int left, int top, Size stored, Size picture, List<String> channels) {
    /** Pixels across and down. */
    record Size(int width, int height) {
    }

    static final int MAGIC = 20000630;
    private static final int VERSION = 2;
    private static final int LONG_NAMES = 0x400;
    private static final int MOST_CHANNELS = 64;
    /** Bytes that the decoded channels may take: 2 GiB less a little, what one Java buffer can address. */
    private static final long MOST_DECODED = (1L << 31) - 16;
    private static final String[] REQUIRED = {"channels", "compression", "dataWindow", "displayWindow", "lineOrder", "pixelAspectRatio",
        "screenWindowCenter", "screenWindowWidth"};
    private static final String[] COMPRESSIONS = {"NONE", "RLE", "ZIPS", "ZIP", "PIZ", "PXR24", "B44", "B44A", "DWAA", "DWAB"};
    private static final int[] ROWS = {1, 1, 1, 16, 32};
    private static final int UINT = 0;
    private static final int FLOAT = 2;
    /** x and y of red, green, blue and white: Rec. ITU-R BT.709, item 1. */
    private static final double[] BT709 = {0.64, 0.33, 0.30, 0.60, 0.15, 0.06, 0.3127, 0.3290};
    private static final double SAME_COLOUR = 2e-3;

    /** Reads a file's head. @throws PictureFileException if it is not an EXR file, damaged, cut short, too large or of a kind not read */
    static ExrHeader of(Path path, byte[] bytes) throws PictureFileException {
        return new Reader(path, bytes).header();
    }

    /** Walks through the bytes. */
    private static final class Reader {
        private final Path path;
        private final ByteBuffer file;
        private final Map<String, ByteBuffer> attributes = new HashMap<>();
        private final List<String> channels = new ArrayList<>();

        private Reader(Path path, byte[] bytes) {
            this.path = path;
            file = ByteBuffer.wrap(bytes).order(ByteOrder.LITTLE_ENDIAN);
        }

        private ExrHeader header() throws PictureFileException {
            if (file.remaining() < 8 || file.getInt() != MAGIC) {
                throw wrong("is not an EXR file (its first four bytes are not 76 2f 31 01); save the picture as EXR");
            }
            int version = file.getInt();
            if ((version & 0xFF) != VERSION || (version & ~0xFF & ~LONG_NAMES) != 0) {
                throw wrong("is tiled, deep, in several parts or of another version (version field " + Integer.toHexString(version)
                        + "); save it as one flat picture in rows");
            }
            attributes();
            channels(attributes.get("channels"));
            int compression = attribute("compression", 1).get() & 0xFF;
            if (compression >= ROWS.length) {
                throw wrong("is compressed with " + (compression < COMPRESSIONS.length ? COMPRESSIONS[compression] : "method "
                        + compression)
                        + ", which is not read; save it with ZIP, ZIPS, PIZ, RLE or without compression");
            }
            int lineOrder = attribute("lineOrder", 1).get();
            if (lineOrder != 0 && lineOrder != 1) {
                throw wrong("states line order " + lineOrder + ", needs 0 or 1; save it again");
            }
            int[] data = window("dataWindow");
            int[] display = window("displayWindow");
            Size stored = size("dataWindow", data);
            Size picture = size("displayWindow", display);
            long decoded = 4L * stored.width() * stored.height() * channels.size();
            if (decoded > MOST_DECODED) {
                throw wrong("has " + channels.size() + " channels of " + stored.width() + "x" + stored.height() + " pixels, which take "
                        + decoded
                        + " bytes, needs at most " + MOST_DECODED + "; save red, green, blue and alpha alone");
            }
            primaries();
            blocks(stored, data[1], ROWS[compression]);
            return new ExrHeader(data[0] - display[0], data[1] - display[1], stored, picture, List.copyOf(channels));
        }

        private void attributes() throws PictureFileException {
            for (String name = text(file); !name.isEmpty(); name = text(file)) {
                text(file);
                int size = file.remaining() < 4 ? -1 : file.getInt();
                if (size < 0 || size > file.remaining()) {
                    throw wrong("is cut short in its header, in attribute '" + name + "'; copy or save it again");
                }
                ByteBuffer value = file.slice(file.position(), size).order(ByteOrder.LITTLE_ENDIAN);
                if (attributes.put(name, value) != null) {
                    throw wrong("is damaged: attribute '" + name + "' stands twice in its header; save it again");
                }
                file.position(file.position() + size);
            }
            for (String name : REQUIRED) {
                if (!attributes.containsKey(name)) {
                    throw wrong("is damaged: its header has no '" + name + "'; save it again");
                }
            }
        }

        private void channels(ByteBuffer list) throws PictureFileException {
            for (String name = text(list); !name.isEmpty(); name = text(list)) {
                if (list.remaining() < 16) {
                    throw wrong("is damaged: its list of channels ends early; save it again");
                }
                int type = list.getInt();
                list.getInt();
                int across = list.getInt();
                int down = list.getInt();
                if (type < UINT || type > FLOAT || across != 1 || down != 1) {
                    throw wrong("has a channel '" + name + "' of type " + type + ", every " + across + "x" + down
                            + " pixels, needs half or float for every pixel; save it so");
                }
                if (type == UINT && List.of("R", "G", "B", "A").contains(name)) {
                    throw wrong("has whole numbers in channel '" + name + "', needs half or float; save it so");
                }
                if (channels.size() >= MOST_CHANNELS || channels.contains(name)) {
                    throw wrong("has more than " + MOST_CHANNELS + " channels, or '" + name
                            + "' twice; save red, green, blue and alpha alone");
                }
                channels.add(name);
            }
        }

        private int[] window(String name) throws PictureFileException {
            ByteBuffer box = attribute(name, 16);
            return new int[] {box.getInt(), box.getInt(), box.getInt(), box.getInt()};
        }

        private Size size(String name, int[] box) throws PictureFileException {
            long width = (long) box[2] - box[0] + 1;
            long height = (long) box[3] - box[1] + 1;
            if (width < 1 || height < 1 || width > Picture.LONGEST_SIDE || height > Picture.LONGEST_SIDE
                    || width * height > PngCheck.MOST_PIXELS) {
                throw wrong("states " + width + "x" + height + " pixels as its " + name + ", needs sides of 1 to " + Picture.LONGEST_SIDE
                        + " and at most " + PngCheck.MOST_PIXELS + " pixels; save a smaller one");
            }
            if (Math.abs((long) box[0]) > Picture.LONGEST_SIDE || Math.abs((long) box[1]) > Picture.LONGEST_SIDE) {
                throw wrong("has a " + name + " that begins at (" + box[0] + ", " + box[1]
                        + "), farther away than any picture; save it again");
            }
            return new Size((int) width, (int) height);
        }

        private void primaries() throws PictureFileException {
            if (!attributes.containsKey("chromaticities")) {
                return;
            }
            ByteBuffer stated = attribute("chromaticities", 32);
            for (double needed : BT709) {
                float found = stated.getFloat();
                if (!(Math.abs(found - needed) <= SAME_COLOUR)) {
                    throw wrong("states other primaries than Rec.709 (" + found + " where Rec.709 has " + needed
                            + "); convert it to linear Rec.709 and save it again");
                }
            }
        }

        private void blocks(Size stored, int firstRow, int rows) throws PictureFileException {
            int count = (stored.height() + rows - 1) / rows;
            if (file.remaining() < 8L * count) {
                throw wrong("is cut short in its table of " + count + " blocks of rows; copy or save it again");
            }
            int data = file.position() + 8 * count;
            for (int n = 0; n < count; n++) {
                long at = file.getLong();
                if (at < data || at > file.capacity() - 8) {
                    throw wrong("is cut short or damaged: block " + n + " of " + count + " is not in the file; copy or save it again");
                }
                int row = file.getInt((int) at);
                int size = file.getInt((int) at + 4);
                if (row != firstRow + n * rows || size < 1 || size > file.capacity() - 8 - at) {
                    throw wrong("is cut short or damaged: block " + n + " of " + count + " states row " + row + " and " + size
                            + " bytes, and ends outside the file or is another's; copy or save it again");
                }
            }
        }

        private ByteBuffer attribute(String name, int bytes) throws PictureFileException {
            ByteBuffer value = attributes.get(name);
            if (value.capacity() != bytes) {
                throw wrong("is damaged: its '" + name + "' has " + value.capacity() + " bytes, needs " + bytes + "; save it again");
            }
            return value;
        }

        /** Bytes up to a zero, which is taken too. */
        private String text(ByteBuffer from) throws PictureFileException {
            int start = from.position();
            while (from.hasRemaining()) {
                if (from.get() == 0) {
                    byte[] bytes = new byte[from.position() - 1 - start];
                    from.get(start, bytes);
                    return new String(bytes, StandardCharsets.UTF_8);
                }
            }
            throw wrong("is cut short in its header; copy or save it again");
        }

        private PictureFileException wrong(String what) {
            return new PictureFileException(path, what);
        }
    }
}

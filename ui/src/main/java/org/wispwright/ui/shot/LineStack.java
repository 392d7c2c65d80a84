package org.wispwright.ui.shot;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.Optional;
import org.wispwright.render.files.WholeFile;

/**
 * A file of lines of which only the last is ever read, taken away or followed by another, so that each of these costs what that
 * line weighs and not what the file does. A line is on the disk when {@link #push} returns. What a crash left of a line that was
 * not yet whole has no line end and is no JSON object; it is left out, and goes with the next push.
 */
final class LineStack {
    private static final int CHUNK = 1 << 16;

    private final ShotFolder folder;
    private final String file;
    private final long mostBytes;

    /**
     * @param file inside the folder
     * @param mostBytes when a line would make the file larger, the oldest lines are dropped until half of this is left
     */
    LineStack(ShotFolder folder, String file, long mostBytes) {
        this.folder = folder;
        this.file = file;
        this.mostBytes = mostBytes;
    }

    /** The last whole line, without its end. @throws ShotException if the file cannot be read */
    Optional<String> last() {
        if (!isThere()) {
            return Optional.empty();
        }
        try (FileChannel channel = FileChannel.open(folder.file(file), StandardOpenOption.READ)) {
            long end = wholeEnd(channel);
            if (end == 0) {
                return Optional.empty();
            }
            long start = startOfLine(channel, end);
            return Optional.of(new String(read(channel, start, end), StandardCharsets.UTF_8).stripTrailing());
        } catch (IOException unreadable) {
            throw unreadable(unreadable);
        }
    }

    /** Puts a line behind the last one. @throws ShotException if it weighs more than may be kept, or the disk refuses */
    void push(String line) {
        byte[] bytes = (line + "\n").getBytes(StandardCharsets.UTF_8);
        if (bytes.length > mostBytes / 2) {
            throw new ShotException(Finding.of(file, "", bytes.length + " bytes for one change", "at most " + mostBytes / 2 + " bytes",
                    "change fewer or smaller notes at once"));
        }
        try {
            Path path = isThere() ? folder.file(file) : folder.inside(file);
            try (FileChannel channel = FileChannel.open(path, StandardOpenOption.CREATE, StandardOpenOption.READ,
                    StandardOpenOption.WRITE)) {
                long end = wholeEnd(channel);
                if (end + bytes.length <= mostBytes) {
                    append(channel, end, bytes);
                    return;
                }
                byte[] newest = newest(channel, end, mostBytes / 2 - bytes.length);
                WholeFile.write(path, out -> {
                    out.write(newest);
                    out.write(bytes);
                });
            }
        } catch (IOException refused) {
            throw NoteFiles.cannotWrite(file, refused);
        }
    }

    /** Takes the last line away. @throws ShotException if the disk refuses */
    void pop() {
        try (FileChannel channel = FileChannel.open(folder.file(file), StandardOpenOption.READ, StandardOpenOption.WRITE)) {
            long end = wholeEnd(channel);
            channel.truncate(end == 0 ? 0 : startOfLine(channel, end));
            channel.force(true);
        } catch (IOException refused) {
            throw NoteFiles.cannotWrite(file, refused);
        }
    }

    /** Takes all lines away, and the file with them. @throws ShotException if the disk refuses */
    void clear() {
        try {
            Files.deleteIfExists(folder.inside(file));
        } catch (IOException refused) {
            throw NoteFiles.cannotWrite(file, refused);
        }
    }

    private boolean isThere() {
        return Files.exists(folder.inside(file), LinkOption.NOFOLLOW_LINKS);
    }

    /** A line that was cut short by a crash is written over; one that only lacks its end, as some editors leave it, gets one. */
    private static void append(FileChannel channel, long end, byte[] bytes) throws IOException {
        channel.truncate(end);
        channel.position(end);
        boolean open = end > 0 && read(channel, end - 1, end)[0] != '\n';
        ByteBuffer rest = ByteBuffer.wrap(bytes);
        if (open) {
            channel.write(ByteBuffer.wrap(new byte[] {'\n'}));
        }
        while (rest.hasRemaining()) {
            channel.write(rest);
        }
        channel.force(true);
    }

    /** Where the last whole line ends. A line without an end is whole if it closes the object that it opened. */
    private static long wholeEnd(FileChannel channel) throws IOException {
        long size = channel.size();
        if (size == 0 || read(channel, size - 1, size)[0] == '\n') {
            return size;
        }
        long start = startOfLine(channel, size);
        return NoteJournal.isJson(new String(read(channel, start, size), StandardCharsets.UTF_8)) ? size : start;
    }

    /** Where the line begins that ends before {@code end}, its line end included. */
    private static long startOfLine(FileChannel channel, long end) throws IOException {
        for (long to = end - 1; to > 0;) {
            long from = Math.max(0, to - CHUNK);
            byte[] chunk = read(channel, from, to);
            for (int n = chunk.length - 1; n >= 0; n--) {
                if (chunk[n] == '\n') {
                    return from + n + 1;
                }
            }
            to = from;
        }
        return 0;
    }

    /** The newest lines that weigh at most so much together. */
    private static byte[] newest(FileChannel channel, long end, long mostBytes) throws IOException {
        long from = end;
        while (from > 0) {
            long earlier = startOfLine(channel, from);
            if (end - earlier > mostBytes) {
                break;
            }
            from = earlier;
        }
        return read(channel, from, end);
    }

    private static byte[] read(FileChannel channel, long from, long to) throws IOException {
        ByteBuffer bytes = ByteBuffer.allocate(Math.toIntExact(to - from));
        while (bytes.hasRemaining() && channel.read(bytes, from + bytes.position()) >= 0) {
            continue;
        }
        if (bytes.hasRemaining()) {
            throw new IOException("the file got shorter while it was read");
        }
        return bytes.array();
    }

    private ShotException unreadable(IOException unreadable) {
        return new ShotException(Finding.of(file, "", "a file that cannot be read", "a readable file", "check its permissions"),
                unreadable);
    }
}

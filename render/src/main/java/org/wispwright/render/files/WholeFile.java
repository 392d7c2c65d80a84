package org.wispwright.render.files;

import java.io.BufferedOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.channels.Channels;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.concurrent.atomic.AtomicLong;

/** A file that appears whole or not at all: written beside its place under another name, forced to disk, moved atomically. */
public final class WholeFile {
    private static final AtomicLong NUMBER = new AtomicLong();

    private WholeFile() {
    }

    /** What goes into the file. */
    @FunctionalInterface
    public interface Content {
        /** Writes everything; must not close the stream. */
        void writeTo(OutputStream out) throws IOException;
    }

    /**
     * Writes a file, over an older one of the same name if there is one. If anything fails, the older one stays as it was and
     * nothing else is left behind.
     *
     * @param path where; its folder must exist
     * @throws IOException if the folder is missing, full or closed to us, or content throws
     */
    public static void write(Path path, Content content) throws IOException {
        Path folder = path.toAbsolutePath().getParent();
        if (folder == null || !Files.isDirectory(folder)) {
            throw new IOException("cannot write " + path + ": its folder does not exist; create it first");
        }
        // Not createTempFile: that makes files which only their owner may read.
        Path beside = folder.resolve("." + path.getFileName() + "." + ProcessHandle.current().pid() + "-" + NUMBER.incrementAndGet() + ".part");
        try {
            try (FileChannel channel = FileChannel.open(beside, StandardOpenOption.CREATE_NEW, StandardOpenOption.WRITE)) {
                OutputStream out = new BufferedOutputStream(Channels.newOutputStream(channel), 1 << 16);
                content.writeTo(out);
                out.flush();
                channel.force(true);
            }
            Files.move(beside, path, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
        } finally {
            Files.deleteIfExists(beside);
        }
    }
}

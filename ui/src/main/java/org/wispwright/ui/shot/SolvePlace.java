package org.wispwright.ui.shot;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.channels.OverlappingFileLockException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.security.SecureRandom;
import java.util.stream.Stream;
import org.wispwright.optimize.solve.SolveRecords;

/**
 * Where a running solve keeps its records, {@code takes/.solving}, and the lock that keeps a second solve of the shot away. The lock is
 * the system's and goes with the process, however that ends. Closing leaves the folder only if there are records to go on with.
 */
public final class SolvePlace implements AutoCloseable {
    /** Where, inside the shot folder. */
    public static final String FOLDER = "takes/.solving";
    private static final String LOCK = "in-use.lock";
    private static final int TRIES = 10;

    private final Path folder;
    private final FileChannel lock;
    private final SolveRecords records;

    private SolvePlace(Path folder, FileChannel lock) {
        this.folder = folder;
        this.lock = lock;
        records = new SolveRecords(folder);
    }

    /**
     * Takes the place; the shot must have its original.
     *
     * @throws ShotException if another solve of this shot is at work, or the folder cannot be written to
     */
    public static SolvePlace open(ShotFolder shot) {
        Path folder = shot.inside(FOLDER);
        try {
            for (int n = 0; n < TRIES; n++) {
                Files.createDirectories(folder);
                FileChannel channel = locked(folder.resolve(LOCK));
                if (channel != null) {
                    return new SolvePlace(folder, channel);
                }
            }
            throw new IOException("its lock file keeps going");
        } catch (IOException refused) {
            throw NoteFiles.cannotWrite(FOLDER, refused);
        }
    }

    /** The records. */
    public SolveRecords records() {
        return records;
    }

    /** A path in the place for a file that goes with the solve. */
    public Path file(String name) {
        return folder.resolve(name);
    }

    @Override
    public void close() {
        try (lock) {                                                           // let go of even where the folder is out of reach
            boolean others;
            try (Stream<Path> entries = Files.list(folder)) {
                others = entries.anyMatch(p -> !p.getFileName().toString().equals(LOCK));
            }
            if (!others) {
                Files.deleteIfExists(folder.resolve(LOCK));
                Files.deleteIfExists(folder);
            }
        } catch (IOException left) {
            // An empty folder and an unlocked file disturb no later solve.
            return;
        }
    }

    /** The locked file, or null if it was taken away between opening and locking: then what was locked is no longer the place's. */
    private static FileChannel locked(Path file) throws IOException {
        FileChannel channel;
        try {
            channel = FileChannel.open(file, StandardOpenOption.CREATE, StandardOpenOption.WRITE);
        } catch (NoSuchFileException swept) {
            return null;
        }
        boolean keep = false;
        try {
            FileLock held = channel.tryLock();
            if (held == null) {
                throw busy();
            }
            String token = Long.toHexString(new SecureRandom().nextLong());
            channel.truncate(0);
            channel.write(ByteBuffer.wrap(token.getBytes(StandardCharsets.US_ASCII)), 0);
            keep = Files.exists(file) && token.equals(Files.readString(file, StandardCharsets.US_ASCII));
            return keep ? channel : null;
        } catch (OverlappingFileLockException ours) {
            throw busy();
        } catch (NoSuchFileException swept) {
            return null;
        } finally {
            if (!keep) {
                channel.close();
            }
        }
    }

    private static ShotException busy() {
        return new ShotException(Finding.of(FOLDER, "", "another solve at work on this shot", "one at a time",
                "wait until it has ended, or stop it (Ctrl-C keeps what it has found)"));
    }
}

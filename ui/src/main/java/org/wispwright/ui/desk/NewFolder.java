package org.wispwright.ui.desk;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.security.SecureRandom;
import java.util.Comparator;
import java.util.stream.Stream;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.ShotException;

/** A folder that is there whole or not at all: filled under another name, then named by one rename. Closed unfinished, it is removed. */
final class NewFolder implements AutoCloseable {
    private static final int MOST_TRIES = 1000;

    private final Path below;
    private final String name;
    private final Path making;
    private boolean over;

    private NewFolder(Path below, String name, Path making) {
        this.below = below;
        this.name = name;
        this.making = making;
    }

    /** Begins one. @throws ShotException if there cannot be one below that folder */
    static NewFolder begin(Path below, String name) {
        try {
            // Not createTempDirectory: it would hide the finished folder from everyone but its maker.
            Path making = Files.createDirectory(below.resolve("." + name + "-" + Long.toHexString(new SecureRandom().nextLong())));
            return new NewFolder(below, name, making);
        } catch (IOException refused) {
            throw cannotWrite(below, refused);
        }
    }

    /** Where its files go until it has its name. */
    Path path() {
        return making;
    }

    /**
     * Brings all files to the disk and gives the folder its name, or that name with a number where it is taken.
     *
     * @return the named folder
     * @throws ShotException if the disk refuses
     */
    Path finish() {
        try {
            try (Stream<Path> files = Files.list(making)) {
                for (Path file : (Iterable<Path>) files::iterator) {
                    try (FileChannel channel = FileChannel.open(file, StandardOpenOption.WRITE)) {
                        channel.force(true);
                    }
                }
            }
            for (int n = 1; n < MOST_TRIES; n++) {
                Path named = below.resolve(n == 1 ? name : name + "-" + n);
                if (!Files.exists(named)) {
                    Files.move(making, named, StandardCopyOption.ATOMIC_MOVE);
                    over = true;
                    return named;
                }
            }
            throw new IOException("there are " + MOST_TRIES + " of that name");
        } catch (IOException refused) {
            throw cannotWrite(refused);
        }
    }

    /** What a refusal of the disk is to a person. */
    ShotException cannotWrite(IOException refused) {
        return cannotWrite(below, refused);
    }

    private static ShotException cannotWrite(Path where, IOException refused) {
        return new ShotException(new Finding(where.toString(), "", "it cannot be written to (" + refused.getClass().getSimpleName()
                .replace("Exception", "") + ": " + refused.getMessage() + "); choose a folder that exists, is writable and has room."),
                refused);
    }

    @Override
    public void close() {
        if (over) {
            return;
        }
        try (Stream<Path> paths = Files.walk(making)) {
            for (Path path : paths.sorted(Comparator.reverseOrder()).toList()) {
                Files.deleteIfExists(path);
            }
        } catch (IOException | UncheckedIOException left) {
            return;                                                            // its name begins with a dot: it disturbs nobody
        }
    }
}

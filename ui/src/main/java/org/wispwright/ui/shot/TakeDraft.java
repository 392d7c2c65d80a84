package org.wispwright.ui.shot;

import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.channels.OverlappingFileLockException;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.security.SecureRandom;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;
import org.wispwright.optimize.flow.SmokeState;
import org.wispwright.optimize.solve.SolveRecords;
import org.wispwright.optimize.solve.SolveState;
import org.wispwright.render.files.WholeFile;

/**
 * A take that is being made, in {@code takes/.making-...}. {@link #finish} gives it its name by one atomic rename; closing it
 * unfinished removes it. A lock held on a file inside tells a draft at work from one that a crash left, so only the latter
 * is swept. One thread.
 */
public final class TakeDraft implements AutoCloseable {
    private static final String PREFIX = ".making-";
    private static final String LOCK = "in-use.lock";

    private final Path takes;
    private final boolean madeTakes;
    private final Path making;
    private final FileChannel lockChannel;
    private boolean over;

    private TakeDraft(Path takes, boolean madeTakes, Path making, FileChannel lockChannel) {
        this.takes = takes;
        this.madeTakes = madeTakes;
        this.making = making;
        this.lockChannel = lockChannel;
    }

    static TakeDraft begin(Path takes) {
        try {
            boolean there = Files.isDirectory(takes);
            if (there) {
                sweep(takes);
            } else {
                Files.createDirectory(takes);
            }
            // Not createTempDirectory: it would hide the finished take from everyone but its maker.
            Path making = Files.createDirectory(takes.resolve(PREFIX + Long.toHexString(new SecureRandom().nextLong())));
            FileChannel channel = FileChannel.open(making.resolve(LOCK), StandardOpenOption.CREATE_NEW, StandardOpenOption.WRITE);
            channel.lock();
            return new TakeDraft(takes, !there, making, channel);
        } catch (IOException refused) {
            throw cannotWrite(takes, refused);
        }
    }

    /**
     * Writes density and velocity of a frame.
     *
     * @throws ShotException if the disk refuses; the draft is then only good for closing
     */
    public void write(int frame, SmokeState state) {
        try {
            TakeVolumes.write(making, frame, state);
        } catch (IOException refused) {
            throw cannotWrite(making, refused);
        }
    }

    /** Writes the coefficients of the force, float64, in the order of its basis. */
    public void writeForce(double[] coefficients) {
        try {
            TakeVolumes.writeForce(making, coefficients);
        } catch (IOException refused) {
            throw cannotWrite(making, refused);
        }
    }

    /** Writes {@code sources.json}. */
    public void writeSources(ObjectNode strengths) {
        try {
            WholeFile.write(making.resolve("sources.json"), out -> out.write(TakeRecord.bytes(strengths)));
        } catch (IOException refused) {
            throw cannotWrite(making, refused);
        }
    }

    /** Writes where the search ended, from which a finer one can go on. */
    public void writeSearch(SolveState end) {
        try {
            new SolveRecords(making).writeOnly(end.withoutTimes());
        } catch (IOException refused) {
            throw cannotWrite(making, refused);
        }
    }

    /**
     * Completes the original as take 0.
     *
     * @throws ShotException if there is a take 0 already
     */
    public void finishAsOriginal(TakeRecord record) {
        if (!rename(record, 0)) {
            throw new ShotException(Finding.of("takes/000", "", "an original that is already there", "no take 0 yet",
                    "keep it, or move the folder takes away first"));
        }
    }

    /**
     * Completes the take under the next free number.
     *
     * @return its number, 1 or more
     * @throws ShotException if all numbers are taken or the disk refuses
     */
    public int finish(TakeRecord record) {
        for (int number = next(); number <= Takes.LAST; number++) {
            if (rename(record, number)) {
                return number;
            }
        }
        throw new ShotException(Finding.of("takes", "", "takes up to " + Takes.LAST, "a free number", "move old takes to another folder"));
    }

    /** Removes the draft if it was not finished, and the takes folder if it was made for it. */
    @Override
    public void close() {
        if (over) {
            return;
        }
        over = true;
        try {
            lockChannel.close();
            remove(making);
            if (madeTakes) {
                Files.deleteIfExists(takes);
            }
        } catch (IOException | UncheckedIOException left) {
            // What is left has no lock any more, so the next draft sweeps it.
            return;
        }
    }

    private int next() {
        try (Stream<Path> entries = Files.list(takes)) {
            return 1 + entries.map(p -> p.getFileName().toString()).filter(n -> n.matches("[0-9]{3}")).mapToInt(Integer::parseInt).max()
                    .orElse(0);
        } catch (IOException refused) {
            throw cannotWrite(takes, refused);
        }
    }

    private boolean rename(TakeRecord record, int number) {
        Path named = takes.resolve(Takes.name(number));
        if (Files.exists(named, LinkOption.NOFOLLOW_LINKS)) {
            return false;
        }
        try {
            byte[] json = record.json(number);
            WholeFile.write(making.resolve("take.json"), out -> out.write(json));
            lockChannel.close();
            Files.deleteIfExists(making.resolve(LOCK));
            try {
                Files.move(making, named, StandardCopyOption.ATOMIC_MOVE);
            } catch (FileAlreadyExistsException taken) {
                return false;
            } catch (AtomicMoveNotSupportedException never) {
                throw new IOException("this disk cannot rename a folder in one step", never);
            }
            over = true;
            return true;
        } catch (IOException refused) {
            if (Files.isDirectory(named)) {
                return false;
            }
            throw cannotWrite(takes, refused);
        }
    }

    private static void sweep(Path takes) throws IOException {
        List<Path> drafts;
        try (Stream<Path> entries = Files.list(takes)) {
            drafts = entries.filter(p -> p.getFileName().toString().startsWith(PREFIX) && Files.isDirectory(p, LinkOption.NOFOLLOW_LINKS))
                    .toList();
        }
        for (Path draft : drafts) {
            if (isLeftOver(draft)) {
                remove(draft);
            }
        }
    }

    private static boolean isLeftOver(Path draft) {
        Path lockFile = draft.resolve(LOCK);
        try {
            if (!Files.exists(lockFile)) {
                // Made a moment ago and not locked yet, or killed between the last write and the rename.
                return System.currentTimeMillis() - Files.getLastModifiedTime(draft).toMillis() > 60_000;
            }
            try (FileChannel channel = FileChannel.open(lockFile, StandardOpenOption.WRITE); FileLock lock = channel.tryLock()) {
                return lock != null;
            }
        } catch (OverlappingFileLockException ours) {
            return false;
        } catch (IOException gone) {
            return false;
        }
    }

    private static void remove(Path folder) throws IOException {
        try (Stream<Path> paths = Files.walk(folder)) {
            for (Path path : paths.sorted(Comparator.reverseOrder()).toList()) {
                Files.deleteIfExists(path);
            }
        }
    }

    private static ShotException cannotWrite(Path where, IOException refused) {
        String reason = refused.getMessage() == null ? refused.getClass().getSimpleName() : refused.getClass().getSimpleName()
                .replace("Exception", "") + ": " + refused.getMessage();
        return new ShotException(Finding.of(where.toString(), "", "a place that cannot be written to (" + reason + ")",
                "a writable folder with room on the disk",
                "check permissions and free space"), refused);
    }
}

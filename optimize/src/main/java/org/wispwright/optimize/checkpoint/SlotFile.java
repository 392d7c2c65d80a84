package org.wispwright.optimize.checkpoint;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.List;

/**
 * Snapshots on disk: a file of equal slots, each holding some arrays of float32 one after another. Written and read through one
 * buffer of {@value #CHUNK} bytes, not through a map of the file: mapped pages would count as the program's own memory, which is
 * what the disk is to save, while the system's cache makes both equally quick. Same bits back, NaN's payload included.
 * <p>The file is the caller's to place; it goes when this is closed or the process ends (on Linux even when it is killed). One thread.
 */
public final class SlotFile implements AutoCloseable {
    private static final int CHUNK = 1 << 20;

    private final Path file;
    private final FileChannel channel;
    private final long bytesPerSlot;
    private final ByteBuffer buffer = ByteBuffer.allocateDirect(CHUNK).order(ByteOrder.nativeOrder());

    /**
     * Makes the file, over one that is there.
     *
     * @param floatsPerSlot 1 or more
     * @throws UncheckedIOException     if it cannot be made
     * @throws IllegalArgumentException if floatsPerSlot is below 1
     */
    public SlotFile(Path file, long floatsPerSlot) {
        if (floatsPerSlot < 1) {
            throw new IllegalArgumentException("checkpoints: got a state of " + floatsPerSlot + " numbers, needs at least 1");
        }
        this.file = file;
        bytesPerSlot = Math.multiplyExact(floatsPerSlot, Float.BYTES);
        try {
            channel = FileChannel.open(file, StandardOpenOption.CREATE, StandardOpenOption.TRUNCATE_EXISTING, StandardOpenOption.READ,
                    StandardOpenOption.WRITE, StandardOpenOption.DELETE_ON_CLOSE);
        } catch (IOException refused) {
            throw new UncheckedIOException("checkpoints: cannot make " + file + " for snapshots; give more memory, or a folder that can be "
                    + "written to", refused);
        }
    }

    /**
     * Writes arrays into a slot, over what was there.
     *
     * @param slot   0 or more; the file grows as needed
     * @param arrays read: as many numbers in all as a slot has
     * @throws UncheckedIOException if the disk refuses (it is full); slots written before stay as they are
     */
    public void save(int slot, List<float[]> arrays) {
        requireFit(arrays);
        long at = slot * bytesPerSlot;
        try {
            for (float[] array : arrays) {
                for (int from = 0; from < array.length; from += CHUNK / Float.BYTES) {
                    int count = Math.min(CHUNK / Float.BYTES, array.length - from);
                    buffer.clear();
                    buffer.asFloatBuffer().put(array, from, count);
                    buffer.limit(count * Float.BYTES);
                    while (buffer.hasRemaining()) {
                        at += channel.write(buffer, at);
                    }
                }
            }
        } catch (IOException refused) {
            throw new UncheckedIOException("checkpoints: snapshot " + slot + " of " + bytesPerSlot + " bytes cannot be written to " + file
                    + "; free some room on that disk, or give more memory", refused);
        }
    }

    /**
     * Reads a slot into arrays.
     *
     * @param slot   one that was saved
     * @param arrays overwritten: as many numbers in all as a slot has
     * @throws UncheckedIOException if it cannot be read
     */
    public void restore(int slot, List<float[]> arrays) {
        requireFit(arrays);
        long at = slot * bytesPerSlot;
        try {
            for (float[] array : arrays) {
                for (int from = 0; from < array.length; from += CHUNK / Float.BYTES) {
                    int count = Math.min(CHUNK / Float.BYTES, array.length - from);
                    buffer.clear().limit(count * Float.BYTES);
                    while (buffer.hasRemaining()) {
                        int read = channel.read(buffer, at);
                        if (read < 0) {
                            throw new IOException("it ends at byte " + at);
                        }
                        at += read;
                    }
                    buffer.flip();
                    buffer.asFloatBuffer().get(array, from, count);
                }
            }
        } catch (IOException broken) {
            throw new UncheckedIOException("checkpoints: snapshot " + slot + " cannot be read from " + file, broken);
        }
    }

    @Override
    public void close() {
        try {
            channel.close();
        } catch (IOException left) {
            throw new UncheckedIOException(left);
        }
    }

    private void requireFit(List<float[]> arrays) {
        long floats = arrays.stream().mapToLong(a -> a.length).sum();
        if (floats * Float.BYTES != bytesPerSlot) {
            throw new IllegalArgumentException("checkpoints: got " + floats + " numbers, a slot has " + bytesPerSlot / Float.BYTES);
        }
    }
}

package org.wispwright.ui.shot;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.Optional;
import org.wispwright.render.volume.NpyFile;
import org.wispwright.warp.retouch.Repaint;

/**
 * The layers of a paint-over in a shot folder: {@code notes/ID.paint/DIGEST.npy}, float32, shape (rows, columns, 4). The name is a digest
 * of what is in it, so a file is never overwritten by another's layers, and a note that is taken back and made again finds its own.
 */
final class PaintFile {
    /** The most it may weigh: the layers and a short header. */
    private static final long MOST_BYTES = 4L * Repaint.LAYERS * Repaint.MOST_PIXELS + 4096;
    private static final int DIGITS = 16;

    private PaintFile() {
    }

    /**
     * Reads what a note names.
     *
     * @param place the value that names the file
     * @throws ShotException if there is no such file inside the folder, or it does not hold layers of a paint-over
     */
    static Repaint read(ShotFolder folder, JsonPlace place) {
        String file = ShotFolder.named(place);
        try {
            Path path = folder.file(file);
            long size = Files.size(path);
            if (size > MOST_BYTES) {
                throw place.fault("file '" + file + "' of " + size + " bytes", "at most " + MOST_BYTES + " bytes",
                        "check that it is the right file");
            }
            NpyFile.Contents contents = NpyFile.read(path);
            int[] shape = contents.shape();
            if (shape.length != 3 || shape[2] != Repaint.LAYERS) {
                throw place.fault("file '" + file + "' of shape " + Arrays.toString(shape), "(rows, columns, " + Repaint.LAYERS + ")",
                        "name the file that 'note paint-over' wrote");
            }
            return place.make(() -> new Repaint(shape[1], shape[0], contents.values(), Optional.of(file)));
        } catch (ShotException fault) {
            throw fault.finding().file().equals(place.file()) ? fault
                    : new ShotException(new Finding(place.file(), place.pointer(), "'" + file + "': " + fault.finding().sentence()), fault);
        } catch (IOException broken) {
            String reason = String.valueOf(broken.getMessage()).replaceAll("(?s)^volume file .*?: ", "").replaceAll("\\.$", "");
            throw new ShotException(new Finding(place.file(), place.pointer(), "file '" + file + "' " + reason + "."), broken);
        }
    }

    /**
     * Writes the layers of a new note, whole or not at all.
     *
     * @return the file inside the folder
     * @throws ShotException if the disk refuses
     */
    static String write(ShotFolder folder, String id, Repaint repaint) {
        float[] layers = repaint.layers();
        String file = "notes/" + id + ".paint/" + digest(repaint, layers) + ".npy";
        try {
            Files.createDirectories(folder.inside("notes/" + id + ".paint"));
            NpyFile.write(folder.inside(file), new int[] {repaint.height(), repaint.width(), Repaint.LAYERS}, layers);
        } catch (IOException refused) {
            throw NoteFiles.cannotWrite(file, refused);
        }
        return file;
    }

    /** True if the file is there already. */
    static boolean isThere(ShotFolder folder, String id, Repaint repaint) {
        return Files.exists(folder.inside("notes/" + id + ".paint/" + digest(repaint, repaint.layers()) + ".npy"),
                LinkOption.NOFOLLOW_LINKS);
    }

    /**
     * Removes a file that no note came to name, and its folder if that is empty. What cannot be removed stays: it is whole and named
     * nowhere.
     */
    static void remove(ShotFolder folder, String file) {
        try {
            Path path = folder.inside(file);
            Files.deleteIfExists(path);
            try (var left = Files.list(path.getParent())) {
                if (left.findAny().isPresent()) {
                    return;
                }
            }
            Files.delete(path.getParent());
        } catch (IOException stays) {
            return;
        }
    }

    private static String digest(Repaint repaint, float[] layers) {
        try {
            MessageDigest sha = MessageDigest.getInstance("SHA-256");
            ByteBuffer bytes = ByteBuffer.allocate(8 + 4 * layers.length).order(ByteOrder.LITTLE_ENDIAN);
            bytes.putInt(repaint.height()).putInt(repaint.width());
            bytes.asFloatBuffer().put(layers);
            return HexFormat.of().formatHex(sha.digest(bytes.array())).substring(0, DIGITS);
        } catch (NoSuchAlgorithmException impossible) {
            throw new IllegalStateException(impossible);
        }
    }
}

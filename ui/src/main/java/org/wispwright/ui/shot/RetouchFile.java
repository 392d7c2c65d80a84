package org.wispwright.ui.shot;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import org.wispwright.warp.retouch.Retouch;

/**
 * A retouch in a file of its own, anywhere on the disk: an object with {@code wispwright}, {@code retouch} and perhaps {@code holds}, as
 * in a note (docs/shot-folder.md).
 */
public final class RetouchFile {
    private final JsonPlace top;
    private final Retouch retouch;

    private RetouchFile(JsonPlace top, ShotFolder shot) {
        this.top = top.version(SetupReader.FORMAT).only("wispwright", "retouch", "holds");
        this.retouch = NoteReader.retouch(top, shot);
        HoldReader.ofNote(top, 0);
    }

    /**
     * Reads a file.
     *
     * @param shot where files that it names (image mattes, paint-overs) lie; empty refuses such
     * @throws ShotException if it is missing, too large, or not as it must be
     */
    public static RetouchFile read(Path path, Optional<ShotFolder> shot) {
        String file = path.toString();
        try {
            if (!Files.isRegularFile(path)) {
                throw new ShotException(Finding.of(file, "", "no such file", "a retouch file", "correct the name"));
            }
            long size = Files.size(path);
            if (size > NoteReader.MOST_BYTES) {
                throw new ShotException(Finding.of(file, "", size + " bytes", "at most " + NoteReader.MOST_BYTES + " bytes",
                        "check that it is the right file"));
            }
            JsonPlace top = JsonDoor.parse(file, Files.readAllBytes(path));
            if (shot.isEmpty()) {
                for (String key : new String[] {"image", "paintOver"}) {
                    if (top.object().findValue(key) != null) {
                        throw new ShotException(Finding.of(file, "", "'" + key + "', which names a file of a shot", "a retouch without one",
                                "apply it to a frame of the shot"));
                    }
                }
                return new RetouchFile(top, null);
            }
            return new RetouchFile(top.with(new MattePictures(shot.get(), Long.MAX_VALUE)), shot.get());
        } catch (IOException unreadable) {
            throw new ShotException(Finding.of(file, "", "a file that cannot be read", "a readable file", "check its permissions"),
                    unreadable);
        }
    }

    /** What it does. */
    public Retouch retouch() {
        return retouch;
    }

    /** The list of operations as it is written. */
    JsonNode operations() {
        return list("retouch").orElseThrow();
    }

    /** The list of holds as it is written, if there is one. */
    Optional<JsonNode> holds() {
        return list("holds");
    }

    private Optional<JsonNode> list(String key) {
        return Optional.ofNullable(top.object().get(key));
    }
}

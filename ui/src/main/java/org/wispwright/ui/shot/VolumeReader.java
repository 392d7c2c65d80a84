package org.wispwright.ui.shot;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.regex.Pattern;
import org.wispwright.render.volume.NpyFile;

/** Reads the NPY volumes that shot.json names. Each is small beside the memory before it is read, and of the shape that is needed. */
final class VolumeReader {
    private final ShotFolder folder;
    private final long memoryBytes;

    VolumeReader(ShotFolder folder, long memoryBytes) {
        this.folder = folder;
        this.memoryBytes = memoryBytes;
    }

    /** Three sizes, slowest first (nz, ny, nx), and the values. @throws ShotException naming the place and the file */
    NpyFile.Contents read(JsonPlace place) {
        String name = ShotFolder.named(place);
        NpyFile.Contents contents;
        try {
            Path file = folder.file(name);
            long bytes = Files.size(file);
            if (bytes > memoryBytes / 4) {
                throw place.fault("the volume '" + name + "' of " + MemoryNeed.inWords(bytes), "at most a quarter of the memory, "
                        + MemoryNeed.inWords(memoryBytes / 4), "make it coarser, or " + MemoryNeed.giveMore(4 * bytes));
            }
            contents = NpyFile.read(file);
        } catch (ShotException missing) {
            if (missing.finding().file().equals(name)) {
                throw place.fault("the file '" + name + "', which is missing or no file", "a volume inside the shot folder",
                        "put it there or correct the name");
            }
            throw missing;
        } catch (IOException broken) {
            String reason = String.valueOf(broken.getMessage())
                    .replaceAll("(?s)^volume file .*" + Pattern.quote(Path.of(name).getFileName().toString()) + ": ", "");
            throw new ShotException(new Finding(place.file(), place.pointer(), "the volume '" + name + "' " + reason.replaceAll("\\.$",
                    "") + "."),
                    broken);
        }
        if (contents.shape().length != 3) {
            throw place.fault("the volume '" + name + "' of shape " + Arrays.toString(contents.shape()), "three sizes, (nz, ny, nx)",
                    "write it as such");
        }
        return contents;
    }

    /** The values of a volume of exactly this shape. @throws ShotException naming the place and the file */
    float[] read(JsonPlace place, int nz, int ny, int nx) {
        NpyFile.Contents contents = read(place);
        int[] needed = {nz, ny, nx};
        if (!Arrays.equals(needed, contents.shape())) {
            throw place.fault("the volume '" + ShotFolder.named(place) + "' of shape " + Arrays.toString(contents.shape()),
                    "(nz, ny, nx) = " + Arrays.toString(needed), "check it against the shot's grid");
        }
        return contents.values();
    }
}

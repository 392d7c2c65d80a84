package org.wispwright.ui.job;

import java.io.IOException;
import java.net.URI;
import java.net.URISyntaxException;
import java.net.URL;
import java.nio.file.FileSystem;
import java.nio.file.FileSystems;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;

/** The sample that travels in the program. */
public final class SampleWork {
    /** Its folder's name. */
    public static final String SAMPLE = "kiln-yard";

    private SampleWork() {
    }

    /** A step that is given the sample's folder. */
    @FunctionalInterface
    public interface OnSample<T> {
        /** Runs on the folder, which may lie inside a jar and is only good until this returns. */
        T on(Path sample);
    }

    /** Runs a step on the sample. */
    public static <T> T onOwnSample(OnSample<T> step) {
        URL found = SampleWork.class.getResource("/samples/" + SAMPLE + "/shot.json");
        if (found == null) {
            throw new IllegalStateException("the sample " + SAMPLE + " is missing from the program; build it again with mvn package");
        }
        try {
            URI uri = found.toURI();
            if (!"jar".equals(uri.getScheme())) {
                return step.on(Path.of(uri).getParent());
            }
            try (FileSystem jar = FileSystems.newFileSystem(uri, Map.of())) {
                return step.on(jar.getPath("/samples/" + SAMPLE));
            }
        } catch (IOException | URISyntaxException broken) {
            throw new IllegalStateException("the sample " + SAMPLE + " cannot be read from the program; build it again with mvn package",
                    broken);
        }
    }

    /**
     * Copies the sample into a new folder below another: {@code kiln-yard}, or {@code kiln-yard-2} if that is there, and so on.
     *
     * @param below made if it is not there
     * @return the copy
     * @throws org.wispwright.ui.shot.ShotException if it cannot be written to
     */
    public static Path copyBelow(Path below) {
        Path to = below.resolve(SAMPLE);
        for (int n = 2; Files.exists(to); n++) {
            to = below.resolve(SAMPLE + "-" + n);
        }
        Path free = to;
        return onOwnSample(sample -> {
            try {
                Files.createDirectories(below);
            } catch (IOException refused) {
                throw PictureFile.cannotWrite(below, refused);
            }
            copy(sample, free);
            return free;
        });
    }

    /** Copies a folder with all in it. @throws org.wispwright.ui.shot.ShotException if the place cannot be written to */
    static void copy(Path from, Path to) {
        try (Stream<Path> paths = Files.walk(from)) {
            List<Path> all = paths.toList();
            for (Path path : all) {
                Path there = to.resolve(from.relativize(path).toString());
                if (Files.isDirectory(path)) {
                    Files.createDirectories(there);
                } else {
                    Files.copy(path, there);
                }
            }
        } catch (IOException refused) {
            throw PictureFile.cannotWrite(to, refused);
        }
    }
}

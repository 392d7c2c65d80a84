package org.wispwright.ui.window;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Stream;

/** Copies of the samples, for tests that change them. */
public final class SampleCopy {
    private SampleCopy() {
    }

    /** The kiln yard without takes, in a new folder below another. */
    public static Path kilnYard(Path below) throws IOException {
        Path sample = Path.of("..", "samples", "kiln-yard");
        Path copy = below.resolve("kiln-yard");
        try (Stream<Path> all = Files.walk(sample)) {
            for (Path from : (Iterable<Path>) all::iterator) {
                Path to = copy.resolve(sample.relativize(from).toString());
                if (from.startsWith(sample.resolve("takes"))) {
                    continue;
                }
                if (Files.isDirectory(from)) {
                    Files.createDirectories(to);
                } else {
                    Files.copy(from, to);
                }
            }
        }
        return copy;
    }
}

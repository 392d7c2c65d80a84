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

    /** The same on half as many cells each way, which is simulated and solved in a few seconds. */
    public static Path quickYard(Path below) throws IOException {
        Path shot = kilnYard(below);
        Path setup = shot.resolve("shot.json");
        String text = Files.readString(setup);
        String quick = text.replace("\"cells\": [48, 64, 48], \"cellMetres\": 0.1", "\"cells\": [24, 32, 24], \"cellMetres\": 0.2");
        if (quick.equals(text)) {
            throw new IllegalStateException("the sample's grid is not what it was; correct this test");
        }
        Files.writeString(setup, quick);
        return shot;
    }
}

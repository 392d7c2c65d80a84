package org.wispwright.render.files;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A reader finds the old file or the new one, never half of one. */
class WholeFileTest {
    @TempDir
    private Path folder;

    @Test
    void aWriteThatFailsLeavesTheOldFileAndNothingElse() throws IOException {
        Path path = folder.resolve("a.txt");
        WholeFile.write(path, out -> out.write("old".getBytes()));
        assertThrows(IOException.class, () -> WholeFile.write(path, out -> {
            out.write("ne".getBytes());
            assertEquals("old", Files.readString(path));
            throw new IOException("disk full");
        }));
        assertEquals("old", Files.readString(path));
        WholeFile.write(path, out -> out.write("new".getBytes()));
        assertEquals("new", Files.readString(path));
        try (Stream<Path> files = Files.list(folder)) {
            assertEquals(List.of(path), files.toList());
        }
    }
}

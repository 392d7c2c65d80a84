package org.wispwright.ui.shot;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.warp.retouch.Brush;
import org.wispwright.warp.matte.Point;
import org.wispwright.warp.retouch.Stroke;

/** The words that a note may name a brush with. */
class NoteReaderTest {
    @TempDir
    private Path folder;
    private final Findings findings = new Findings();

    @ParameterizedTest
    @CsvSource({"add,ADD", "remove,REMOVE", "soften,SOFTEN", "restore,RESTORE", "push,PUSH", "even,EVEN", "lift,LIFT"})
    void aBrushByItsWord(String word, Brush brush) throws IOException {
        List<Note> notes = read(word);
        assertEquals(List.of(), findings.all());
        assertEquals(new Stroke(brush, 0.1, 1, 0.5, List.of(new Point(0.3, 0.8), new Point(0.4, 0.7)), Optional.empty()),
                notes.get(0).retouch().operations().get(0));
    }

    @Test
    void anUnknownBrushIsToldTheWords() throws IOException {
        assertEquals(List.of(), read("smudge"));
        String said = findings.all().get(0).toString();
        assertTrue(said.contains("/retouch/0/stroke/brush") && said.contains("\"smudge\""), said);
        for (Brush brush : Brush.values()) {
            assertTrue(said.contains("\"" + JsonPlace.word(brush) + "\""), said);
        }
    }

    private List<Note> read(String brush) throws IOException {
        Files.createDirectories(folder.resolve("notes"));
        Files.writeString(folder.resolve("shot.json"), "{}");
        Files.writeString(folder.resolve("notes/a.json"), """
                {"wispwright": 1, "words": "As drawn.", "frame": 3, "view": "front",
                 "retouch": [{"stroke": {"brush": "%s", "radius": 0.1, "line": [[0.3, 0.8], [0.4, 0.7]]}}]}
                """.formatted(brush));
        ShotFolder shot = ShotFolder.open(folder);
        return new NoteReader(shot, new MattePictures(shot, 1L << 30), findings).read().on();
    }
}

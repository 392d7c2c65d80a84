package org.wispwright.ui.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The examples in docs/shot-folder.md are shots that work. */
class DocumentTest {
    @TempDir
    private Path place;

    @Test
    void theDocumentsExampleIsInOrder() throws IOException {
        String text = Files.readString(Path.of("..", "docs", "shot-folder.md"));
        Matcher blocks = Pattern.compile("```json\\n(.*?)```", Pattern.DOTALL).matcher(text);
        List<String> json = new ArrayList<>();
        while (blocks.find()) {
            json.add(blocks.group(1));
        }
        assertEquals(4, json.size(), "shot.json, further keys of it, a note and take.json");
        SmallShot shot = SmallShot.in(place.resolve("yard"));
        shot.delete("notes/open.json");
        shot.delete("notes/lean.json");
        String further = json.get(1).strip();
        shot.write("shot.json", json.get(0).replace("\"sources\":", further.substring(1, further.length() - 1) + ", \"sources\":"));
        shot.write("notes/lean-head.json", json.get(2));
        shot.writePng("frames/front.1036.png", 360, 480);
        Run run = Run.of("check", shot.folder().toString());
        assertEquals(0, run.code(), run.err());
        assertTrue(run.out().contains("48x64x48"), run.out());
    }

    @Test
    void everyCommandIsInItsDocument() throws IOException {
        String text = Files.readString(Path.of("..", "docs", "commands.md"));
        Matcher names = Pattern.compile("(?m)^  ([a-z]+)  ").matcher(Run.of("--help").out());
        int found = 0;
        while (names.find()) {
            found++;
            assertTrue(text.contains("| `" + names.group(1)), names.group(1) + " is not in docs/commands.md");
        }
        assertTrue(found >= 3, "commands in --help: " + found);
    }
}

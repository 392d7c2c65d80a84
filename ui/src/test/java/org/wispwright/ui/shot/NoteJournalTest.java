package org.wispwright.ui.shot;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import java.util.SortedMap;
import java.util.TreeMap;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.extension.AnnotatedElementContext;
import org.junit.jupiter.api.extension.ExtensionContext;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.api.io.TempDirFactory;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.job.CarryWork;

/** Whatever is done to notes, all of it can be taken back and made again, to the byte. */
class NoteJournalTest {
    /** Every change waits for the disk several times, and there are thousands: so in memory where Linux offers a folder there. */
    @TempDir(factory = InMemory.class)
    private Path place;
    private NoteEdits edits;
    private ShotFolder folder;
    private RetouchFile dent;

    static final class InMemory implements TempDirFactory {
        private static final Path MEMORY = Path.of("/dev/shm");

        @Override
        public Path createTempDirectory(AnnotatedElementContext element, ExtensionContext context) throws IOException {
            return Files.isWritable(MEMORY) ? Files.createTempDirectory(MEMORY, "notes") : Files.createTempDirectory("notes");
        }
    }

    @BeforeEach
    void aShot() throws IOException {
        folder = ShotFolder.open(SmallShot.in(place.resolve("yard")).folder());
        edits = NoteEdits.of(folder);
        Files.writeString(place.resolve("dent.json"), """
                {"wispwright": 1, "retouch": [{"stroke": {"brush": "remove", "radius": 0.1, "line": [[0.3, 0.5]]}}], "holds": []}
                """);
        dent = RetouchFile.read(place.resolve("dent.json"), Optional.empty());
        Files.write(folder.inside("notes/lean.sky.png"), new byte[] {(byte) 0x89, 'P', 0, (byte) 0xFF, '\n', '\r'});
        Files.writeString(folder.inside("notes/open.txt"), "\uFEFFlines\r\nof \u00f6dd text\u2028", StandardCharsets.UTF_8);
    }

    /** Ours: the states along the way are kept and compared, so a change that is lost or doubled is seen where it happens. */
    @ParameterizedTest
    @CsvSource({"20261201, 1000", "7, 200"})
    void allTakenBackAndAllMadeAgain(long seed, int count) throws IOException {
        Random random = new Random(seed);
        List<SortedMap<String, String>> states = new ArrayList<>(List.of(notes()));
        int at = 0;
        for (int done = 0; done < count; done++) {
            String what = "seed " + seed + ", change " + done;
            int kind = random.nextInt(12);
            if (kind == 0 && at > 0) {
                edits.undo();
                assertEquals(states.get(--at), notes(), what);
            } else if (kind == 1 && at + 1 < states.size()) {
                edits.redo();
                assertEquals(states.get(++at), notes(), what);
            } else if (changed(random, kind)) {
                states.subList(at + 1, states.size()).clear();
                states.add(notes());
                at++;
            } else {
                assertEquals(states.get(at), notes(), what + " was refused");
            }
        }
        assertTrue(at > count / 4, at + " changes in the end");
        for (int n = at; n > 0; n--) {
            assertTrue(edits.undo().changed());
            assertEquals(states.get(n - 1), notes(), "seed " + seed + ", taken back to " + (n - 1));
        }
        assertEquals(0, Files.size(folder.inside(NoteJournal.FILE)));
        assertThrows(ShotException.class, edits::undo);
        for (int n = 1; n < states.size(); n++) {
            edits.redo();
            assertEquals(states.get(n), notes(), "seed " + seed + ", made again up to " + n);
        }
        assertThrows(ShotException.class, edits::redo);
    }

    /** One random change. Returns false if nothing was changed, because it was so already or a name was taken. */
    private boolean changed(Random random, int kind) throws IOException {
        List<String> ids = new ArrayList<>();
        for (String file : notes().keySet()) {
            if (file.endsWith(".json")) {
                ids.add(file.substring(0, file.length() - 5));
            }
        }
        String id = ids.isEmpty() ? "none" : ids.get(random.nextInt(ids.size()));
        String fresh = "n" + random.nextInt(12);
        int frame = 1002 + random.nextInt(5);
        SortedMap<String, String> before = notes();
        try {
            if (ids.size() < 2) {
                edits.add(fresh, new NoteValues(Optional.of("Dent."), Optional.of(frame), Optional.of("side"), Optional.of(0.5),
                        Optional.of(dent)));
            } else if (ids.size() > 8 || kind == 2) {
                edits.delete(id);
            } else if (kind < 5) {
                edits.setOn(id, random.nextBoolean());
            } else if (kind < 7) {
                edits.copy(id, frame, Optional.empty(), Optional.of(fresh));
            } else if (kind < 10) {
                edits.set(id, new NoteValues(Optional.of("Words " + random.nextInt(9) + " \u00e9"), Optional.empty(),
                        Optional.of("front").filter(v -> random.nextBoolean()), Optional.of(1.0 + random.nextInt(5)),
                        Optional.of(dent).filter(d -> random.nextBoolean())));
            } else {
                NoteEdits.Listed from = edits.need(id);
                List<Note> notes = CarryWork.copies(from.note(), fresh, List.of(1003, frame == 1003 ? 1004 : frame),
                        OptionalDouble.empty());
                edits.addAll("note carry", id, notes, from.on());
            }
        } catch (ShotException refused) {
            assertTrue(refused.finding().sentence().contains("already"), refused.finding().inWords());
            return false;
        }
        return !before.equals(notes());
    }

    /** A journal of another size than the newest lines need: the oldest are forgotten, the newest still work. */
    @Test
    void theOldestLinesAreForgotten() throws IOException {
        LineStack stack = new LineStack(folder, "notes/.lines.jsonl", 1000);
        for (int n = 0; n < 100; n++) {
            stack.push("{\"n\":" + n + ",\"x\":\"" + "y".repeat(n % 50) + "\"}");
            assertTrue(Files.size(folder.inside("notes/.lines.jsonl")) <= 1000);
            assertTrue(stack.last().orElseThrow().startsWith("{\"n\":" + n + ","));
        }
        int left = 0;
        for (Optional<String> line = stack.last(); line.isPresent(); line = stack.last()) {
            assertTrue(line.get().startsWith("{\"n\":" + (99 - left) + ","), line.get());
            stack.pop();
            left++;
        }
        assertTrue(left >= 8 && left < 40, left + " lines");
        assertTrue(assertThrows(ShotException.class, () -> stack.push("x".repeat(501))).finding().sentence().contains("for one change"));
        assertEquals(Optional.empty(), stack.last());
    }

    /** Lines longer than what is read at once. */
    @Test
    void longLines() {
        LineStack stack = new LineStack(folder, "notes/.lines.jsonl", 10_000_000);
        String[] lines = {"{}", "{\"a\":\"" + "b".repeat(200_000) + "\"}", "{\"c\":\"" + "d".repeat(65_530) + "\"}", "{\"e\":1}"};
        Arrays.stream(lines).forEach(stack::push);
        for (int n = lines.length - 1; n >= 0; n--) {
            assertEquals(lines[n], stack.last().orElseThrow());
            stack.pop();
        }
        assertEquals(Optional.empty(), stack.last());
    }

    /** Every file of the notes folder but the journal, its bytes as Latin-1 so that none is lost. */
    private SortedMap<String, String> notes() throws IOException {
        SortedMap<String, String> all = new TreeMap<>();
        try (var files = Files.list(folder.inside("notes"))) {
            for (Path file : files.filter(f -> !f.toString().endsWith(".jsonl")).toList()) {
                all.put(file.getFileName().toString(), Files.readString(file, StandardCharsets.ISO_8859_1));
            }
        }
        return all;
    }
}

package org.wispwright.ui.shot;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.StreamReadConstraints;
import com.fasterxml.jackson.databind.DeserializationFeature;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.Base64;
import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;

/**
 * The changes of a shot's notes: {@code notes/.journal.jsonl} those that can be taken back, {@code notes/.taken-back.jsonl} those
 * that were and can be made again; one JSON object a line, the next to be taken on the last line.
 * <p>A change is written here before it is made. When it is taken back, or made again, its files come first, then its line is
 * written to the other file, then it is removed from this one. So after a crash every file is as before or as after, and the
 * journal knows both; a change that stands in both files is one whose move was cut short, see {@link #settle}.
 */
final class NoteJournal {
    /** Changes that can be taken back. */
    static final String FILE = "notes/.journal.jsonl";
    /** Changes that were taken back. */
    static final String TAKEN_BACK = "notes/.taken-back.jsonl";
    /** The most each may weigh: 512 MiB; beyond it the oldest changes are forgotten. */
    static final long MOST_BYTES = 512L << 20;
    private static final ObjectMapper LINES = JsonMapper.builder(JsonFactory.builder()
            .streamReadConstraints(StreamReadConstraints.builder().maxNestingDepth(8).maxStringLength((int) MOST_BYTES).build()).build())
            .enable(DeserializationFeature.FAIL_ON_TRAILING_TOKENS).build();

    private final LineStack made;
    private final LineStack takenBack;

    NoteJournal(ShotFolder folder) {
        made = new LineStack(folder, FILE, MOST_BYTES);
        takenBack = new LineStack(folder, TAKEN_BACK, MOST_BYTES);
    }

    /**
     * One file of a change.
     *
     * @param file such as {@code notes/lean.json}
     * @param before its whole content; empty if there was no such file
     * @param after the same after the change
     */
    record FileChange(String file, Optional<FileBytes> before, Optional<FileBytes> after) {
    }

    /**
     * One change: all its files or none.
     *
     * @param command what the person asked for, such as {@code note off lean}
     * @param files at least one; their names differ
     */
    record Entry(String command, List<FileChange> files) {
        Entry {
            files = List.copyOf(files);
        }
    }

    /** Adds a change as the last one; what was taken back can no longer be made again. @throws ShotException if it cannot be written */
    void add(Entry entry) {
        last();
        takenBack.clear();
        made.push(line(entry));
    }

    /** Removes the last change: it did not come about. */
    void removeLast() {
        made.pop();
    }

    /** The last change that was made and not taken back. @throws ShotException if the journal is damaged */
    Optional<Entry> last() {
        return made.last().map(line -> entry(FILE, line));
    }

    /** The change that was taken back last. @throws ShotException if the journal is damaged */
    Optional<Entry> lastTakenBack() {
        return takenBack.last().map(line -> entry(TAKEN_BACK, line));
    }

    /** Notes that the last change was taken back. */
    void movedBack(Entry entry) {
        takenBack.push(line(entry));
        made.pop();
    }

    /** Notes that the change that was taken back last was made again. */
    void movedForth(Entry entry) {
        made.push(line(entry));
        takenBack.pop();
    }

    /**
     * Ends a move that a crash cut short. A change that makes a difference cannot be the last one made and the last one taken back
     * at once, so if both say the same, one of them was still to be removed: where the files are as after the change, it was being
     * made again.
     *
     * @param isAfter tells whether all files of a change are as it leaves them
     */
    void settle(Predicate<Entry> isAfter) {
        Optional<Entry> both = last();
        if (both.isPresent() && both.equals(lastTakenBack())) {
            (isAfter.test(both.get()) ? takenBack : made).pop();
        }
    }

    /** True for one whole JSON value. */
    static boolean isJson(String line) {
        try {
            return !LINES.readTree(line).isMissingNode();
        } catch (JsonProcessingException broken) {
            return false;
        }
    }

    private static String line(Entry entry) {
        ObjectNode object = LINES.createObjectNode().put("wispwright", SetupReader.FORMAT).put("command", entry.command());
        ArrayNode files = object.putArray("files");
        for (FileChange change : entry.files()) {
            ObjectNode one = files.addObject().put("file", change.file());
            put(one, "before", change.before());
            put(one, "after", change.after());
        }
        try {
            return LINES.writeValueAsString(object);
        } catch (JsonProcessingException impossible) {
            throw new IllegalStateException(impossible);
        }
    }

    private static void put(ObjectNode object, String key, Optional<FileBytes> content) {
        if (content.isEmpty()) {
            object.putNull(key);
        } else if (content.get().text().isPresent()) {
            object.put(key, content.get().text().get());
        } else {
            object.putObject(key).put("base64", Base64.getEncoder().encodeToString(content.get().bytes()));
        }
    }

    private static Entry entry(String journal, String line) {
        JsonNode node;
        try {
            node = LINES.readTree(line);
        } catch (JsonProcessingException broken) {
            throw damaged(journal, "a last line that is not JSON");
        }
        if (!node.isObject()) {
            throw damaged(journal, "a last line that is not an object");
        }
        new JsonPlace(journal, "", node).version(SetupReader.FORMAT);
        if (!node.path("command").isTextual() || !node.path("files").isArray() || node.get("files").isEmpty()) {
            throw damaged(journal, "a last line without a command or its files");
        }
        List<FileChange> files = new ArrayList<>();
        for (JsonNode one : node.get("files")) {
            String file = one.path("file").asText();
            if (!file.matches(NoteFiles.FILE)) {
                throw damaged(journal, "a last line with a file that is no note's");
            }
            files.add(new FileChange(file, content(journal, one, "before"), content(journal, one, "after")));
        }
        return new Entry(node.get("command").textValue(), files);
    }

    private static Optional<FileBytes> content(String journal, JsonNode one, String key) {
        JsonNode value = one.path(key);
        if (value.isNull()) {
            return Optional.empty();
        }
        if (value.isTextual()) {
            return Optional.of(FileBytes.of(value.textValue()));
        }
        try {
            return Optional.of(new FileBytes(Base64.getDecoder().decode(value.required("base64").asText())));
        } catch (IllegalArgumentException broken) {
            throw damaged(journal, "a last line without the content '" + key + "'");
        }
    }

    private static ShotException damaged(String journal, String what) {
        return new ShotException(Finding.of(journal, "", what, "the lines that the program wrote",
                "move the file away; what it held can then no longer be taken back or made again"));
    }
}

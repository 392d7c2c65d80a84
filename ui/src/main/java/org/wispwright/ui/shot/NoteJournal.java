package org.wispwright.ui.shot;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.StreamReadConstraints;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.wispwright.render.files.WholeFile;

/**
 * The changes of note files that can be taken back: {@code notes/.journal.jsonl}, one JSON object a line, the oldest first.
 * A change is written here before it is made, and removed after it has been taken back, each time as a whole new file; so
 * after a crash every note file is as before or as after, and the journal knows both texts.
 */
final class NoteJournal {
    /** Where it is. */
    static final String FILE = "notes/.journal.jsonl";
    /** The most it may weigh: 64 MiB. */
    static final long MOST_BYTES = 64L << 20;
    private static final ObjectMapper LINES = JsonMapper.builder(com.fasterxml.jackson.core.JsonFactory.builder()
            .streamReadConstraints(StreamReadConstraints.builder().maxNestingDepth(4).maxStringLength((int) MOST_BYTES).build()).build())
            .build();

    private final ShotFolder folder;

    NoteJournal(ShotFolder folder) {
        this.folder = folder;
    }

    /**
     * One change.
     *
     * @param command what the person asked for, such as {@code note off lean}
     * @param file the note's file, such as {@code notes/lean.json}
     * @param before its whole text; empty if there was no such file
     * @param after the same after the change
     */
    record Entry(String command, String file, Optional<String> before, Optional<String> after) {
    }

    /** Adds a change as the last one. @throws ShotException if the journal is damaged, would get too large, or cannot be written */
    void add(Entry entry) {
        List<String> lines = new ArrayList<>(lines());
        if (!lines.isEmpty()) {
            entry(lines, lines.size() - 1);
        }
        lines.add(line(entry));
        write(lines);
    }

    /** The last change, if there is any. @throws ShotException if the journal is damaged */
    Optional<Entry> last() {
        List<String> lines = lines();
        return lines.isEmpty() ? Optional.empty() : Optional.of(entry(lines, lines.size() - 1));
    }

    /** Removes the last change. */
    void removeLast() {
        List<String> lines = lines();
        write(lines.subList(0, lines.size() - 1));
    }

    private List<String> lines() {
        if (!Files.exists(folder.inside(FILE), LinkOption.NOFOLLOW_LINKS)) {
            return List.of();
        }
        return NoteFiles.decoded(FILE, folder.bytes(FILE, MOST_BYTES)).lines().toList();
    }

    private static String line(Entry entry) {
        ObjectNode object = LINES.createObjectNode().put("wispwright", SetupReader.FORMAT).put("command", entry.command())
                .put("file", entry.file()).put("before", entry.before().orElse(null)).put("after", entry.after().orElse(null));
        try {
            return LINES.writeValueAsString(object);
        } catch (JsonProcessingException impossible) {
            throw new IllegalStateException(impossible);
        }
    }

    private static Entry entry(List<String> lines, int index) {
        String where = "line " + (index + 1);
        JsonNode node;
        try {
            node = LINES.readTree(lines.get(index));
        } catch (JsonProcessingException broken) {
            throw damaged(where + ", which is not JSON");
        }
        if (node == null || !node.isObject()) {
            throw damaged(where + ", which is not an object");
        }
        new JsonPlace(FILE, "", node).version(SetupReader.FORMAT);
        String file = node.path("file").asText();
        if (!node.path("command").isTextual() || !file.matches("notes/" + NoteReader.ID + "\\.json")) {
            throw damaged(where + " without a command or the file of a note");
        }
        for (String key : new String[] {"before", "after"}) {
            if (!node.has(key) || !node.get(key).isTextual() && !node.get(key).isNull()) {
                throw damaged(where + " without the text '" + key + "'");
            }
        }
        return new Entry(node.get("command").textValue(), file, Optional.ofNullable(node.get("before").textValue()),
                Optional.ofNullable(node.get("after").textValue()));
    }

    private static ShotException damaged(String what) {
        return new ShotException(Finding.of(FILE, "", what, "the lines that the program wrote",
                "move the file away; what it held can then no longer be taken back"));
    }

    private void write(List<String> lines) {
        StringBuilder all = new StringBuilder();
        lines.forEach(line -> all.append(line).append('\n'));
        byte[] bytes = all.toString().getBytes(StandardCharsets.UTF_8);
        if (bytes.length > MOST_BYTES) {
            throw new ShotException(Finding.of(FILE, "", bytes.length + " bytes with this change", "at most " + MOST_BYTES + " bytes",
                    "move the file away; what it held can then no longer be taken back"));
        }
        Path path = folder.inside(FILE);
        try {
            WholeFile.write(path, out -> out.write(bytes));
        } catch (IOException refused) {
            throw NoteFiles.cannotWrite(FILE, refused);
        }
    }
}

package org.wispwright.ui.shot;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.DoubleNode;
import com.fasterxml.jackson.databind.node.IntNode;
import com.fasterxml.jackson.databind.node.TextNode;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * Values for keys of a note, as a person gave them and not yet checked.
 *
 * @param words what the reviewer said
 * @param frame the frame
 * @param view the view's name
 * @param weight share among the notes
 * @param retouch operations, and holds if it has any
 */
public record NoteValues(Optional<String> words, Optional<Integer> frame, Optional<String> view, Optional<Double> weight,
        Optional<RetouchFile> retouch) {
    /** True if no value is given. */
    public boolean isEmpty() {
        return values().isEmpty();
    }

    /** Key to value, in the order in which a note has them. */
    Map<String, JsonNode> values() {
        Map<String, JsonNode> values = new LinkedHashMap<>();
        words.ifPresent(w -> values.put("words", new TextNode(w)));
        frame.ifPresent(f -> values.put("frame", new IntNode(f)));
        view.ifPresent(v -> values.put("view", new TextNode(v)));
        weight.ifPresent(w -> values.put("weight", w == Math.rint(w) && Math.abs(w) < 1e9 ? new IntNode(w.intValue()) : new DoubleNode(w)));
        retouch.ifPresent(file -> {
            values.put("retouch", file.operations());
            file.holds().ifPresent(holds -> values.put("holds", holds));
        });
        return values;
    }

    /** " --words --frame 1030": what was given, for the journal. */
    String inWords() {
        return words.map(w -> " --words").orElse("") + frame.map(f -> " --frame " + f).orElse("") + view.map(v -> " --view " + v).orElse("")
                + weight.map(w -> " --weight " + w).orElse("") + retouch.map(r -> " --retouch").orElse("");
    }
}

package org.wispwright.ui.shot;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonToken;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import com.fasterxml.jackson.databind.node.TextNode;
import java.io.IOException;
import java.util.Map;
import java.util.StringJoiner;

/**
 * Notes as JSON text. Changes one value at the top of a text and leaves every other character as the person wrote it: order,
 * spaces, line ends, a byte order mark. The text must have been read by {@link JsonDoor} before.
 */
final class NoteText {
    private static final JsonFactory JSON = new JsonFactory();

    private NoteText() {
    }

    /** A new note's text: keys a line each, and of a list every entry a line. */
    static String of(ObjectNode note) {
        StringBuilder text = new StringBuilder("{");
        String comma = "\n  ";
        for (Map.Entry<String, JsonNode> entry : note.properties()) {
            text.append(comma).append(new TextNode(entry.getKey())).append(": ").append(value(entry.getValue()));
            comma = ",\n  ";
        }
        return text.append("\n}\n").toString();
    }

    /** A value that stands at the top of a note: a list with every entry a line, anything else on one line. */
    static String value(JsonNode value) {
        if (!value.isArray() || value.isEmpty()) {
            return value.toString();
        }
        StringJoiner entries = new StringJoiner(",\n    ", "[\n    ", "\n  ]");
        value.forEach(entry -> entries.add(entry.toString()));
        return entries.toString();
    }

    /**
     * The text with {@code key} set to {@code value}. A key that is not there is written before the first one, set off by the
     * space that stands before that one.
     *
     * @param value as it is to be written, such as {@code false} or {@code "front"} with its quotes
     * @throws IllegalArgumentException if the text is not an object with a key
     */
    static String with(String text, String key, String value) {
        int mark = text.startsWith("\uFEFF") ? 1 : 0;
        try (JsonParser parser = JSON.createParser(text.substring(mark))) {
            if (parser.nextToken() != JsonToken.START_OBJECT) {
                throw new IllegalArgumentException("no object");
            }
            int open = mark + (int) parser.currentTokenLocation().getCharOffset() + 1;
            int first = -1;
            while (parser.nextToken() == JsonToken.FIELD_NAME) {
                first = first < 0 ? mark + (int) parser.currentTokenLocation().getCharOffset() : first;
                boolean here = key.equals(parser.currentName());
                JsonToken token = parser.nextToken();
                if (here) {
                    parser.finishToken();
                    int from = mark + (int) parser.currentTokenLocation().getCharOffset();
                    parser.skipChildren();
                    int end = token.isScalarValue() ? endOfValue(text, from)
                            : mark + (int) parser.currentTokenLocation().getCharOffset() + 1;
                    return text.substring(0, from) + value + text.substring(end);
                }
                parser.skipChildren();
            }
            if (first < 0) {
                throw new IllegalArgumentException("an object without a key");
            }
            String space = text.substring(open, first);
            return text.substring(0, first) + "\"" + key + "\": " + value + "," + (space.isEmpty() ? " " : space) + text.substring(first);
        } catch (IOException broken) {
            throw new IllegalArgumentException("not JSON: " + broken.getMessage(), broken);
        }
    }

    /** Where a plain value that begins at {@code from} ends: after its closing quote, or before a space, comma or bracket. */
    private static int endOfValue(String text, int from) {
        int at = from;
        if (text.charAt(from) == '"') {
            for (at++; text.charAt(at) != '"'; at++) {
                at += text.charAt(at) == '\\' ? 1 : 0;
            }
            return at + 1;
        }
        while (at < text.length() && " \t\r\n,}".indexOf(text.charAt(at)) < 0) {
            at++;
        }
        return at;
    }
}

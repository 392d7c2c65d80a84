package org.wispwright.ui.shot;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonToken;
import java.io.IOException;

/**
 * Changes one plain value at the top of a note's JSON text and leaves every other character as the person wrote it: order,
 * spaces, line ends, a byte order mark. The text must have been read by {@link JsonDoor} before.
 */
final class NoteText {
    private static final JsonFactory JSON = new JsonFactory();

    private NoteText() {
    }

    /**
     * The text with {@code key} set to {@code value}. A key that is not there is written before the first one, set off by the
     * space that stands before that one.
     *
     * @param value as it is to be written, such as {@code false} or {@code "front"} with its quotes
     * @throws IllegalArgumentException if the text is not an object with a key, or the key's value is a list or an object
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
                    if (!token.isScalarValue()) {
                        throw new IllegalArgumentException("'" + key + "' is no plain value");
                    }
                    parser.finishToken();
                    int from = mark + (int) parser.currentTokenLocation().getCharOffset();
                    return text.substring(0, from) + value + text.substring(endOfValue(text, from));
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

package org.wispwright.ui.shot;

import com.fasterxml.jackson.core.JsonLocation;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.StreamReadConstraints;
import com.fasterxml.jackson.core.StreamReadFeature;
import com.fasterxml.jackson.core.io.JsonEOFException;
import com.fasterxml.jackson.core.json.JsonReadFeature;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.DeserializationFeature;
import com.fasterxml.jackson.databind.json.JsonMapper;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;

/**
 * Reads one JSON file (RFC 8259, UTF-8) of a shot, strictly: no duplicate keys, nothing after the end, bounded size and
 * depth. Bare NaN and Infinity are let through the parser only so that {@link JsonPlace} can refuse them by place.
 */
public final class JsonDoor {
    /** The most a shot.json or take.json may weigh: 16 MiB. */
    public static final long MOST_BYTES = 16L << 20;

    private static final JsonMapper MAPPER = JsonMapper.builder(com.fasterxml.jackson.core.JsonFactory.builder()
                    .streamReadConstraints(StreamReadConstraints.builder().maxNestingDepth(64).maxNumberLength(100)
                            .maxStringLength(1 << 20).maxNameLength(1000).build())
                    .build())
            .enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION)
            .enable(JsonReadFeature.ALLOW_NON_NUMERIC_NUMBERS)
            .enable(DeserializationFeature.FAIL_ON_TRAILING_TOKENS)
            .build();

    private JsonDoor() {
    }

    /**
     * Reads a file of a shot folder.
     *
     * @param relative the file inside the folder, such as {@code shot.json}
     * @param mostBytes refused when larger, before it is read
     * @throws ShotException if the file is missing, leads out of the folder, is too large, or is not whole, strict JSON
     */
    public static JsonPlace read(ShotFolder folder, String relative, long mostBytes) {
        return parse(relative, folder.bytes(relative, mostBytes));
    }

    /** The same for bytes already in memory; {@code file} is the name that complaints use. */
    public static JsonPlace parse(String file, byte[] bytes) {
        String text = decoded(file, bytes);
        if (text.isBlank()) {
            throw new ShotException(Finding.of(file, "", "an empty file", "JSON that begins with {", "restore it from a copy"));
        }
        try (JsonParser parser = MAPPER.createParser(text)) {
            try {
                JsonNode node = MAPPER.readTree(parser);
                return new JsonPlace(file, "", node);
            } catch (JsonProcessingException broken) {
                throw new ShotException(finding(file, parser, broken), broken);
            }
        } catch (IOException unexpected) {
            throw new ShotException(Finding.of(file, "", "text that cannot be read", "JSON", "restore it from a copy"), unexpected);
        }
    }

    private static String decoded(String file, byte[] bytes) {
        try {
            String text = StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes)).toString();
            return text.startsWith("\uFEFF") ? text.substring(1) : text;
        } catch (CharacterCodingException notUtf8) {
            throw new ShotException(Finding.of(file, "", "bytes that are not UTF-8", "text in UTF-8", "save it as UTF-8 in a text editor"),
                    notUtf8);
        }
    }

    private static Finding finding(String file, JsonParser parser, JsonProcessingException broken) {
        String pointer = parser.getParsingContext().pathAsPointer().toString();
        JsonLocation at = broken.getLocation();
        String line = at == null ? "" : " in line " + at.getLineNr() + ", column " + at.getColumnNr();
        String words = broken.getOriginalMessage() == null ? "" : broken.getOriginalMessage();
        if (broken instanceof JsonEOFException || words.startsWith("Unexpected end-of-input")) {
            return Finding.of(file, pointer, "the end of the file" + line + " although brackets or quotes are still open", "whole JSON",
                    "the file was cut short, so restore it from a copy");
        }
        if (words.startsWith("Duplicate")) {
            String key = words.replaceAll("(?s)^Duplicate [Ff]ield '(.*)'.*$", "$1");
            return Finding.of(file, pointer, "the key '" + key + "' twice" + line, "every key once", "remove one of the two");
        }
        if (words.startsWith("Trailing token")) {
            return Finding.of(file, "", "more text" + line + " after the last bracket", "nothing there", "remove it");
        }
        if (words.contains("nesting depth") || words.contains("exceeds the maximum")) {
            return Finding.of(file, pointer, "a value too long or too deep" + line, "at most 64 brackets deep and 1 MiB of text a value",
                    "check which program wrote it");
        }
        return Finding.of(file, pointer, "something that is not JSON" + line + " (" + firstClause(words) + ")", "JSON",
                "correct that line");
    }

    private static String firstClause(String words) {
        String line = words.split("[\\r\\n]", 2)[0].replaceAll(":? was expecting.*$", "").replaceAll("\\(code \\d+[^)]*\\)", "")
                .replaceAll("\\s+", " ").strip();
        return line.length() > 90 ? line.substring(0, 90) + "..." : line;
    }
}

package org.wispwright.ui.shot;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Iterator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Supplier;
import java.util.stream.Collectors;

/**
 * One value of a JSON file together with where it stands, so that every complaint can say so.
 * <p>Each reading method either gives a checked value or throws a {@link ShotException} with one sentence.
 */
public final class JsonPlace {
    private final String file;
    private final String pointer;
    private final JsonNode node;
    private final MattePictures pictures;

    /** The place of a node. */
    JsonPlace(String file, String pointer, JsonNode node) {
        this(file, pointer, node, null);
    }

    private JsonPlace(String file, String pointer, JsonNode node, MattePictures pictures) {
        this.file = file;
        this.pointer = pointer;
        this.node = node;
        this.pictures = pictures;
    }

    /** The same place; it and all below it know the pictures that values here may name. */
    JsonPlace with(MattePictures those) {
        return new JsonPlace(file, pointer, node, those);
    }

    /** The pictures that values here may name. @throws IllegalStateException if none were given: this file has no say over pictures */
    MattePictures pictures() {
        if (pictures == null) {
            throw new IllegalStateException(file + ": read without a folder for its pictures; give it one by with()");
        }
        return pictures;
    }

    /** The file this place is in. */
    public String file() {
        return file;
    }

    /** Where in the file, as a JSON pointer; empty for the whole file. */
    public String pointer() {
        return pointer;
    }

    /** A complaint about this place. */
    public ShotException fault(String found, String needed, String wayOut) {
        return new ShotException(Finding.of(file, pointer, found, needed, wayOut));
    }

    /**
     * Checks that this is an object of a format we read. Call it before {@link #only}: a newer format has newer keys.
     *
     * @param known the format this program reads
     */
    public JsonPlace version(int known) {
        requireObject();
        int found = need("wispwright").whole(1, Integer.MAX_VALUE);
        if (found > known) {
            throw at("wispwright").fault("format " + found + ", written by a newer Wispwright", "format " + known + " or older",
                    "update Wispwright, or save the shot again with this version");
        }
        return this;
    }

    /** Checks that this is an object with no keys but these. */
    public JsonPlace only(String... known) {
        requireObject();
        List<String> keys = Arrays.asList(known);
        for (Iterator<String> names = node.fieldNames(); names.hasNext();) {
            String name = names.next();
            if (!keys.contains(name)) {
                String hint = NearestWord.to(name, keys).map(near -> "did you mean '" + near + "'")
                        .orElse("remove it or correct its spelling");
                throw at(name).fault("the unknown key '" + shorten(name) + "'", "one of " + String.join(", ", keys), hint);
            }
        }
        return this;
    }

    /** True if this object has the key, whatever its value. */
    public boolean has(String key) {
        return node.has(key);
    }

    /** The value of a key that must be there. */
    public JsonPlace need(String key) {
        requireObject();
        JsonNode child = node.get(key);
        if (child == null) {
            throw fault("no '" + key + "'", "the key '" + key + "' here", "add it");
        }
        return at(key);
    }

    /** The value of a key that may be missing. */
    public Optional<JsonPlace> ask(String key) {
        requireObject();
        return node.has(key) ? Optional.of(at(key)) : Optional.empty();
    }

    /** The keys of this object, in the file's order. */
    public List<String> keys() {
        requireObject();
        List<String> keys = new ArrayList<>();
        node.fieldNames().forEachRemaining(keys::add);
        return keys;
    }

    /** True for a list. */
    boolean isList() {
        return node.isArray();
    }

    /** The values of a list of {@code least} to {@code most} values. */
    public List<JsonPlace> items(int least, int most) {
        String range = least == most ? "exactly " + least : least == 0 ? "at most " + most : least + " to " + most;
        if (!node.isArray()) {
            throw fault(kind(), "a list of " + range + " values", "write it in [ ]");
        }
        if (node.size() < least || node.size() > most) {
            throw fault("a list of " + node.size() + " values", range, node.size() < least ? "add what is missing"
                    : "remove what is too much");
        }
        List<JsonPlace> items = new ArrayList<>(node.size());
        for (int n = 0; n < node.size(); n++) {
            items.add(new JsonPlace(file, pointer + "/" + n, node.get(n), pictures));
        }
        return items;
    }

    /** Words: not empty, at most {@code mostCharacters}, no control characters but line breaks and tabs. */
    public String text(int mostCharacters) {
        if (!node.isTextual()) {
            throw fault(kind(), "text", "write it in \" \"");
        }
        String text = node.textValue();
        if (text.isBlank() || text.length() > mostCharacters) {
            throw fault(text.isBlank() ? "empty text" : "text of " + text.length() + " characters", "1 to " + mostCharacters
                    + " characters",
                    text.isBlank() ? "fill it in" : "shorten it");
        }
        if (text.chars().anyMatch(c -> Character.isISOControl(c) && c != '\n' && c != '\t')) {
            throw fault("text with a control character", "plain text", "remove it");
        }
        return text;
    }

    /** True or false. */
    public boolean truth() {
        if (!node.isBoolean()) {
            throw fault(kind(), "true or false", "write one of the two without quotes");
        }
        return node.booleanValue();
    }

    /** A finite number of {@code least} to {@code most}, both allowed. */
    public double number(double least, double most) {
        String needed = "a number from " + plain(least) + " to " + plain(most);
        double value = finite(needed);
        if (!(value >= least && value <= most)) {
            throw fault(node.asText(), needed, "correct the value");
        }
        return value;
    }

    /** A finite number above 0 and at most {@code most}. */
    public double positive(double most) {
        String needed = "a number above 0, at most " + plain(most);
        double value = finite(needed);
        if (!(value > 0 && value <= most)) {
            throw fault(node.asText(), needed, "correct the value");
        }
        return value;
    }

    /** A whole number of {@code least} to {@code most}, both allowed. */
    public int whole(int least, int most) {
        String needed = "a whole number from " + least + (most == Integer.MAX_VALUE ? " up" : " to " + most);
        double value = finite(needed);
        if (value != Math.rint(value) || value < least || value > most) {
            throw fault(node.asText(), needed, "correct the value");
        }
        return (int) value;
    }

    /** A list of exactly {@code count} finite numbers of {@code least} to {@code most}. */
    public double[] numbers(int count, double least, double most) {
        return items(count, count).stream().mapToDouble(item -> item.number(least, most)).toArray();
    }

    /** One of an enum's values, written in lower case with spaces for underscores. */
    public <E extends Enum<E>> E choice(Class<E> type) {
        List<String> words = Arrays.stream(type.getEnumConstants()).map(JsonPlace::word).toList();
        String needed = words.stream().map(w -> "\"" + w + "\"").collect(Collectors.joining(" or "));
        int index = node.isTextual() ? words.indexOf(node.textValue()) : -1;
        if (index < 0) {
            String found = node.isTextual() ? "\"" + shorten(node.textValue()) + "\"" : kind();
            throw fault(found, needed, "write one of these");
        }
        return type.getEnumConstants()[index];
    }

    /** How {@link #choice} writes an enum's value. */
    public static String word(Enum<?> value) {
        return value.name().toLowerCase(Locale.ROOT).replace('_', ' ');
    }

    /** Builds a value that checks itself at birth, and gives its complaint this place. */
    public <T> T make(Supplier<T> birth) {
        try {
            return birth.get();
        } catch (IllegalArgumentException refused) {
            String words = refused.getMessage() == null ? "a value that is refused" : refused.getMessage();
            throw new ShotException(new Finding(file, pointer, words.endsWith(".") ? words : words + "."), refused);
        }
    }

    /** The same place, one key deeper, whether or not it exists. */
    public JsonPlace at(String key) {
        return new JsonPlace(file, pointer + "/" + key.replace("~", "~0").replace("/", "~1"), node.get(key), pictures);
    }

    private double finite(String needed) {
        if (!node.isNumber()) {
            throw fault(kind(), needed, node.isTextual() ? "write a number without quotes" : "write a number");
        }
        double value = node.doubleValue();
        if (!Double.isFinite(value)) {
            throw fault(Double.isNaN(value) ? "NaN, which is not a number" : "a number too large to hold (infinity)", needed,
                    "find out which program wrote it and correct the value");
        }
        return value;
    }

    /** The object itself, for parts whose names are free; all numbers in it are finite. */
    ObjectNode object() {
        requireObject();
        requireFinite();
        return (ObjectNode) node;
    }

    private void requireFinite() {
        if (node.isNumber()) {
            finite("a finite number");
        } else if (node.isObject()) {
            keys().forEach(key -> at(key).requireFinite());
        } else if (node.isArray()) {
            items(0, Integer.MAX_VALUE).forEach(JsonPlace::requireFinite);
        }
    }

    private void requireObject() {
        if (!node.isObject()) {
            throw fault(kind(), "an object with named values", "write it in { }");
        }
    }

    private String kind() {
        return switch (node.getNodeType()) {
            case ARRAY -> "a list";
            case OBJECT -> "an object";
            case BOOLEAN -> node.asText();
            case NULL, MISSING -> "null";
            case NUMBER -> "the number " + node.asText();
            case STRING -> "the text \"" + shorten(node.textValue()) + "\"";
            default -> "something else";
        };
    }

    private static String shorten(String text) {
        String line = text.replaceAll("\\p{Cntrl}", " ");
        return line.length() > 40 ? line.substring(0, 40) + "..." : line;
    }

    private static String plain(double value) {
        return value == Math.rint(value) && Math.abs(value) < 1e9 ? String.valueOf((long) value) : String.valueOf(value);
    }
}

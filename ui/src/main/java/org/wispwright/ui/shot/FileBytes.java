package org.wispwright.ui.shot;

import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.Optional;

/** The whole content of a file as a value: equal when every byte is. */
final class FileBytes {
    private final byte[] bytes;

    /** Keeps the array, which nobody may change any more. */
    FileBytes(byte[] bytes) {
        this.bytes = bytes;
    }

    /** UTF-8. */
    static FileBytes of(String text) {
        return new FileBytes(text.getBytes(StandardCharsets.UTF_8));
    }

    /** The bytes themselves, not a copy. */
    byte[] bytes() {
        return bytes;
    }

    int length() {
        return bytes.length;
    }

    /** As text, a byte order mark kept, so that the same bytes come out again; empty if it is not UTF-8 throughout. */
    Optional<String> text() {
        try {
            return Optional.of(StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes)).toString());
        } catch (CharacterCodingException notUtf8) {
            return Optional.empty();
        }
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof FileBytes same && Arrays.equals(bytes, same.bytes);
    }

    @Override
    public int hashCode() {
        return Arrays.hashCode(bytes);
    }
}

package org.wispwright.ui.shot;

import java.util.Objects;

/**
 * One thing that is wrong with a shot, said in one sentence: where, what was found, what is needed, what to do.
 *
 * @param file the file inside the shot folder, with forward slashes, or the path as the person gave it
 * @param pointer where in the file, as a JSON pointer (RFC 6901) such as {@code /views/0/aimMetres}; empty for the whole file
 * @param sentence what is wrong, without the place, ending in a full stop
 */
public record Finding(String file, String pointer, String sentence) {

    /** Checks that nothing is null. */
    public Finding {
        Objects.requireNonNull(file, "finding: file");
        Objects.requireNonNull(pointer, "finding: pointer");
        Objects.requireNonNull(sentence, "finding: sentence");
    }

    /** A sentence from its three parts. */
    public static Finding of(String file, String pointer, String found, String needed, String wayOut) {
        return new Finding(file, pointer, "found " + found + ", needs " + needed + "; " + wayOut + ".");
    }

    /** Place and sentence on one line. */
    public String inWords() {
        return (pointer.isEmpty() ? file : file + " at " + pointer) + ": " + sentence;
    }
}

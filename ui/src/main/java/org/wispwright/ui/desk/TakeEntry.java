package org.wispwright.ui.desk;

import java.nio.file.attribute.FileTime;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;

/**
 * A take in the list.
 *
 * @param number  0 for the original
 * @param parent  the take that it went on from, if it did
 * @param made    when
 * @param quality of the solve; empty for the original
 * @param met     note id to met when it was solved, 0 to 1
 * @param bytes   on disk
 * @param current false if it was made with another set-up than the shot has now: it cannot be shown
 */
public record TakeEntry(int number, OptionalInt parent, FileTime made, Optional<String> quality, Map<String, Double> met, long bytes,
                        boolean current) {
    /** Keeps a copy. */
    public TakeEntry {
        met = Map.copyOf(met);
    }

    /** The least met of its notes, if it has any. */
    public Optional<Double> leastMet() {
        return met.values().stream().min(Double::compare);
    }
}

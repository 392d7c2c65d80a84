package org.wispwright.ui.desk;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What the desk remembers from one day to the next.
 *
 * @param recent    shot folders, the last opened first, at most {@value #MOST_RECENT}
 * @param window    left, top, width, height of the window; empty for the usual
 * @param dark      the dark theme
 * @param textScale size of all text, 1 is usual, within {@value #LEAST_TEXT} and {@value #MOST_TEXT}
 * @param guided    whether the guide for the first note was seen to its end
 * @param open      the shot that is on a running desk; still there at the next start if the desk did not end by itself
 */
public record Remembered(List<Path> recent, Optional<List<Integer>> window, boolean dark, double textScale, boolean guided,
                         Optional<Path> open) {
    /** The most recent shots. */
    public static final int MOST_RECENT = 8;
    /** The smallest text. */
    public static final double LEAST_TEXT = 0.8;
    /** The largest text. */
    public static final double MOST_TEXT = 2;
    /** At the very first start. */
    public static final Remembered NOTHING = new Remembered(List.of(), Optional.empty(), true, 1, false, Optional.empty());

    /** Keeps copies and the text within its range. */
    public Remembered {
        recent = List.copyOf(recent);
        window = window.map(List::copyOf);
        textScale = textScale >= LEAST_TEXT ? Math.min(MOST_TEXT, textScale) : LEAST_TEXT;
    }

    /** A shot was opened: it comes first, and lies on the desk. */
    public Remembered opened(Path shot) {
        Path whole = shot.toAbsolutePath().normalize();
        List<Path> all = new ArrayList<>(recent);
        all.remove(whole);
        all.add(0, whole);
        return new Remembered(all.subList(0, Math.min(MOST_RECENT, all.size())), window, dark, textScale, guided, Optional.of(whole));
    }

    /** The desk ended by itself. */
    public Remembered ended(List<Integer> bounds) {
        return new Remembered(recent, Optional.of(bounds), dark, textScale, guided, Optional.empty());
    }

    /** What an earlier desk left on it is seen to. */
    public Remembered withoutOpen() {
        return new Remembered(recent, window, dark, textScale, guided, Optional.empty());
    }

    /** Another theme. */
    public Remembered withDark(boolean other) {
        return new Remembered(recent, window, other, textScale, guided, open);
    }

    /** Another size of text. */
    public Remembered withTextScale(double other) {
        return new Remembered(recent, window, dark, other, guided, open);
    }

    /** The guide was seen, or is to be shown again. */
    public Remembered withGuided(boolean seen) {
        return new Remembered(recent, window, dark, textScale, seen, open);
    }
}

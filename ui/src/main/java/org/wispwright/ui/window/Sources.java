package org.wispwright.ui.window;

import org.wispwright.ui.desk.Source;

/** What sources are called on screen. */
public final class Sources {
    private Sources() {
    }

    /** "original", "take 2", "wanted", "rendered frame". */
    public static String inWords(Source source) {
        if (source instanceof Source.Take take) {
            return take.number() == 0 ? Words.of("source.original") : Words.of("source.take", take.number());
        }
        return Words.of(source instanceof Source.Rendered ? "source.rendered" : "source.wanted");
    }
}

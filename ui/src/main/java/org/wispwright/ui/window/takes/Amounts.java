package org.wispwright.ui.window.takes;

import java.util.Locale;
import org.wispwright.ui.window.Words;

/** Shares and times for people. */
final class Amounts {
    private static final int MINUTE = 60;
    private static final int HOUR = 3600;

    private Amounts() {
    }

    /** "97 %". */
    static String percent(double share) {
        return String.format(Locale.ROOT, "%.0f %%", 100 * share);
    }

    /** "40 s", "3 min 10 s", "2 h 5 min". */
    static String duration(double seconds) {
        long whole = Math.round(seconds);
        if (whole < MINUTE) {
            return Words.of("takes.seconds", whole);
        }
        if (whole < HOUR) {
            return whole % MINUTE == 0 ? Words.of("takes.minutes.whole", whole / MINUTE)
                    : Words.of("takes.minutes", whole / MINUTE, whole % MINUTE);
        }
        return Words.of("takes.hours", whole / HOUR, whole % HOUR / MINUTE);
    }

    /** The same for what is only guessed: no finer than a tenth of it or so. */
    static String about(double seconds) {
        int step = seconds < MINUTE ? 1 : seconds < 10 * MINUTE ? 10 : MINUTE;
        return duration(step * Math.round(seconds / step));
    }
}

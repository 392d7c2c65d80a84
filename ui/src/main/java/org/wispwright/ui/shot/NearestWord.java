package org.wispwright.ui.shot;

import java.util.Collection;
import java.util.Locale;
import java.util.Optional;

/**
 * The known word that was probably meant: the one with the fewest single-letter changes (Levenshtein 1966, Soviet
 * Physics Doklady 10(8), 707-710), if these are at most a third of its letters or one word begins the other.
 */
final class NearestWord {
    private NearestWord() {
    }

    static Optional<String> to(String word, Collection<String> known) {
        String best = null;
        int bestChanges = Integer.MAX_VALUE;
        String low = word.toLowerCase(Locale.ROOT);
        if (low.length() < 2 || low.length() > 64) {
            return Optional.empty();
        }
        for (String candidate : known) {
            String other = candidate.toLowerCase(Locale.ROOT);
            boolean begins = low.length() > 2 && (other.startsWith(low) || low.startsWith(other));
            int changes = begins ? 1 : changes(low, other);
            if (changes < bestChanges && (begins || 3 * changes <= other.length() + 1)) {
                best = candidate;
                bestChanges = changes;
            }
        }
        return Optional.ofNullable(best);
    }

    static int changes(String a, String b) {
        int[] row = new int[b.length() + 1];
        for (int j = 0; j <= b.length(); j++) {
            row[j] = j;
        }
        for (int i = 1; i <= a.length(); i++) {
            int diagonal = row[0];
            row[0] = i;
            for (int j = 1; j <= b.length(); j++) {
                int swap = diagonal + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
                diagonal = row[j];
                row[j] = Math.min(swap, 1 + Math.min(row[j], row[j - 1]));
            }
        }
        return row[b.length()];
    }
}

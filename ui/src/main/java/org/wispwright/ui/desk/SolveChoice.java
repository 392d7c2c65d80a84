package org.wispwright.ui.desk;

import java.util.Objects;
import org.wispwright.ui.job.Quality;

/**
 * How the next solve is asked for.
 *
 * @param quality how far it climbs
 * @param sources whether the sources' strengths may change too
 * @param onwards true to go on from where the search of the take that is shown ended, false to begin at no force
 */
public record SolveChoice(Quality quality, boolean sources, boolean onwards) {
    /** A first look, from no force, with the sources as they are. */
    public static final SolveChoice FIRST = new SolveChoice(Quality.PREVIEW, false, false);

    /** Checks. */
    public SolveChoice {
        Objects.requireNonNull(quality, "solve choice: quality");
    }

    /** Another quality. */
    public SolveChoice with(Quality other) {
        return new SolveChoice(other, sources, onwards);
    }

    /** With sources that may change, or without. */
    public SolveChoice withSources(boolean change) {
        return new SolveChoice(quality, change, onwards);
    }

    /** From the take that is shown, or from no force. */
    public SolveChoice withOnwards(boolean from) {
        return new SolveChoice(quality, sources, from);
    }
}

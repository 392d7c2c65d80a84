package org.wispwright.ui.desk;

import java.util.Optional;
import org.wispwright.ui.shot.Finding;

/**
 * How far the edits are on disk. Each is written as soon as it is made.
 *
 * @param waiting edits that are not on disk yet
 * @param refused why the first of them could not be written; it waits to be tried again
 */
public record Saving(int waiting, Optional<Finding> refused) {
    /** All is on disk. */
    public static final Saving DONE = new Saving(0, Optional.empty());

    /** True if nothing waits. */
    public boolean isDone() {
        return waiting == 0;
    }
}

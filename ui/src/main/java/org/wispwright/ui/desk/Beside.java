package org.wispwright.ui.desk;

import java.util.Optional;
import java.util.concurrent.ExecutorService;
import org.wispwright.render.picture.Picture;
import org.wispwright.warp.outline.Outlines;
import org.wispwright.warp.retouch.Folds;
import org.wispwright.warp.retouch.Operation;

/** What is looked up beside a retouch, on a worker: the original's outlines, and where an operation turns the picture over. */
final class Beside {
    private final Following tracing;
    private final Following folding;
    private final Runnable told;
    private double traced;
    private Optional<Outlines> outlines = Optional.empty();
    private Optional<Operation> folded = Optional.empty();
    private Folds folds = Folds.NONE;

    /** @param told on the desk's thread whenever something was found */
    Beside(Workers workers, ExecutorService lane, Runnable told) {
        tracing = new Following(workers, lane);
        folding = new Following(workers, lane);
        this.told = told;
    }

    /** Traces outlines at a level, unless those were asked for last. */
    void trace(Picture original, double level) {
        if (traced != level) {
            traced = level;
            tracing.ask(() -> Outlines.of(original, level), found -> {
                outlines = Optional.of(found);
                told.run();
            });
        }
    }

    /** Finds the folds of an operation, unless they were asked for last; none without one. */
    void fold(Picture original, Optional<Operation> operation) {
        if (operation.equals(folded)) {
            return;
        }
        folded = operation;
        if (operation.isEmpty()) {
            folding.drop();
            folds = Folds.NONE;
            return;
        }
        folding.ask(() -> Folds.of(operation.get(), original), found -> {
            folds = found;
            told.run();
        });
    }

    Optional<Outlines> outlines() {
        return outlines;
    }

    Folds folds() {
        return folds;
    }

    /** Forgets all. */
    void drop() {
        tracing.drop();
        folding.drop();
        traced = 0;
        outlines = Optional.empty();
        folded = Optional.empty();
        folds = Folds.NONE;
    }
}

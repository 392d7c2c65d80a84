package org.wispwright.ui.desk;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import org.wispwright.optimize.solve.SolveRecords;
import org.wispwright.optimize.solve.SolveState;
import org.wispwright.ui.job.SolveWork;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.SolvePlace;

/**
 * A solve that was cut off and has left its records.
 *
 * @param iterations done; 0 if no record of it is sound
 * @param rung       that it stood on
 * @param sources    whether the sources' strengths might change
 * @param state      whether it can be gone on with
 * @param problem    digest of its problem
 */
public record Unfinished(int iterations, int rung, boolean sources, State state, String problem) {
    /** Whether it can be gone on with. */
    public enum State {
        /** It can. */ READY,
        /** The shot has changed since; it can again once that is taken back. */ OTHER_SHOT,
        /** No record of it is sound. */ DAMAGED
    }

    /** What a shot folder has; reads the records whole. */
    static Optional<Unfinished> in(ShotFolder folder) {
        Path place = folder.inside(SolvePlace.FOLDER);
        if (!Files.isDirectory(place)) {
            return Optional.empty();
        }
        SolveRecords.Found found;
        try {
            found = new SolveRecords(place).latest();
        } catch (IOException unreadable) {
            return Optional.of(new Unfinished(0, 1, false, State.DAMAGED, ""));
        }
        if (found.state().isEmpty()) {
            return found.damaged().isEmpty() ? Optional.empty() : Optional.of(new Unfinished(0, 1, false, State.DAMAGED, ""));
        }
        SolveState at = found.state().get();
        Unfinished cut = new Unfinished(at.search().iterations(), at.rung(), false, State.OTHER_SHOT, at.problem());
        return Optional.of(cut.lookedAtAgain(folder));
    }

    /** The same beside the shot as it is on disk now. */
    Unfinished lookedAtAgain(ShotFolder folder) {
        if (state == State.DAMAGED) {
            return this;
        }
        for (boolean change : new boolean[] {false, true}) {
            if (SolveWork.digest(folder, true, change).equals(problem)) {
                return new Unfinished(iterations, rung, change, State.READY, problem);
            }
        }
        return new Unfinished(iterations, rung, sources, State.OTHER_SHOT, problem);
    }
}

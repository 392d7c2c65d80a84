package org.wispwright.ui.desk;

import java.util.List;
import java.util.Optional;
import java.util.function.UnaryOperator;
import org.wispwright.ui.job.Estimate;
import org.wispwright.ui.job.SmokeAsked;

/**
 * Work on takes: what runs, what could be run, and what it would take.
 *
 * @param original   the frame of the original that was simulated last, while that runs
 * @param choice     how the next solve is asked for
 * @param asked      notes that want more or less smoke than there is
 * @param foretold   what a solve would take
 * @param unfinished a solve that was cut off
 * @param running    the solve that runs
 * @param writing    what is being written out
 * @param leaving    whether the desk is to be closed
 */
public record TakeWork(Optional<SolveNow.FrameOf> original, SolveChoice choice, List<SmokeAsked> asked, Foretold foretold,
                       Optional<Unfinished> unfinished, Optional<SolveNow> running, Optional<Writing> writing, Leaving leaving) {
    /** Nothing runs, nothing is known. */
    public static final TakeWork NONE = new TakeWork(Optional.empty(), SolveChoice.FIRST, List.of(), Foretold.NOTHING, Optional.empty(),
            Optional.empty(), Optional.empty(), Leaving.NO);

    /**
     * What a solve would take.
     *
     * @param estimates one a quality; empty while they are not known
     * @param measuring true while they are being found
     * @param why       why there are none
     */
    public record Foretold(List<Estimate> estimates, boolean measuring, Optional<String> why) {
        /** Nothing is known. */
        public static final Foretold NOTHING = new Foretold(List.of(), false, Optional.empty());

        /** Keeps a copy. */
        public Foretold {
            estimates = List.copyOf(estimates);
        }
    }

    /**
     * Something that is being written out.
     *
     * @param line where it is
     */
    public record Writing(String line) {
    }

    /** Whether the desk is to be closed while a solve runs. */
    public enum Leaving {
        /** It is not. */ NO,
        /** The person is being asked. */ ASKED,
        /** Once the solve has ended. */ THEN
    }

    /** Keeps a copy. */
    public TakeWork {
        asked = List.copyOf(asked);
    }

    /** For another shot: what runs goes on, and how solves are asked for stays. */
    TakeWork onAnotherShot() {
        return new TakeWork(Optional.empty(), choice.withSources(false).withOnwards(false), List.of(), Foretold.NOTHING, Optional.empty(),
                running, writing, Leaving.NO);
    }

    TakeWork withOriginal(Optional<SolveNow.FrameOf> other) {
        return new TakeWork(other, choice, asked, foretold, unfinished, running, writing, leaving);
    }

    TakeWork withChoice(SolveChoice other) {
        return new TakeWork(original, other, asked, foretold, unfinished, running, writing, leaving);
    }

    TakeWork withAsked(List<SmokeAsked> others) {
        return new TakeWork(original, choice, others, foretold, unfinished, running, writing, leaving);
    }

    TakeWork withForetold(Foretold other) {
        return new TakeWork(original, choice, asked, other, unfinished, running, writing, leaving);
    }

    TakeWork withUnfinished(Optional<Unfinished> other) {
        return new TakeWork(original, choice, asked, foretold, other, running, writing, leaving);
    }

    TakeWork withRunning(Optional<SolveNow> other) {
        return new TakeWork(original, choice, asked, foretold, unfinished, other, writing, leaving);
    }

    /** Changes the solve that runs; nothing if none does. */
    TakeWork running(UnaryOperator<SolveNow> change) {
        return withRunning(running.map(change));
    }

    TakeWork withWriting(Optional<Writing> other) {
        return new TakeWork(original, choice, asked, foretold, unfinished, running, other, leaving);
    }

    TakeWork with(Leaving other) {
        return new TakeWork(original, choice, asked, foretold, unfinished, running, writing, other);
    }
}

package org.wispwright.ui.job;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Supplier;
import java.util.stream.Collectors;
import org.wispwright.optimize.flow.FlowSetup;
import org.wispwright.optimize.solve.Solve;
import org.wispwright.optimize.solve.SolveCancelled;
import org.wispwright.optimize.solve.SolveProblem;
import org.wispwright.optimize.solve.SolveRecords;
import org.wispwright.optimize.solve.SolveResult;
import org.wispwright.optimize.solve.SolveState;
import org.wispwright.optimize.solve.StateRoom;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.render.picture.Picture;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.MemoryNeed;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.SolvePlace;
import org.wispwright.ui.shot.Takes;

/**
 * The search of one solve with its records: it takes the shot's place for solves, begins where it was told, records where it stands after
 * every accepted iteration, and leaves the records until {@link #over} says that the take is there.
 */
final class SolveSearch implements AutoCloseable {
    /** The file of the states that memory does not hold. */
    private static final String STATES = "states";

    private final SolveProblem problem;
    private final SolveWork.Manner manner;
    private final Progress progress;
    private final SolvePlace place;
    private final String digest;
    private final Optional<SolveState> from;
    private SolveState end;
    private int recorded;
    private boolean recordsFail;
    private int told;

    private SolveSearch(SolveProblem problem, SolveWork.Manner manner, Progress progress, SolvePlace place, String digest,
                        Optional<SolveState> from) {
        this.problem = problem;
        this.manner = manner;
        this.progress = progress;
        this.place = place;
        this.digest = digest;
        this.from = from;
    }

    /**
     * Takes the place and finds where to begin.
     *
     * @param digest of the problem as {@link SolveWork#digest} made it
     * @throws ShotException if another solve is at work, or there is nothing to go on from, or the shot is no longer what it was
     */
    static SolveSearch begin(ShotFolder folder, String digest, SolveProblem problem, SolveWork.Manner manner, Progress progress) {
        SolvePlace place = SolvePlace.open(folder);
        try {
            Optional<SolveState> from = switch (manner.beginning().kind()) {
                case FRESH -> fresh(place);
                case ANEW -> anew(place);
                case RESUME -> Optional.of(resumed(place, progress));
                case TAKE -> Optional.of(Takes.of(folder).search(manner.beginning().take()));
            };
            from.ifPresent(state -> requireSame(state, digest, manner, problem));
            return new SolveSearch(problem, manner, progress, place, digest, from);
        } catch (RuntimeException refused) {
            place.close();
            throw refused;
        }
    }

    /**
     * Searches to the end.
     *
     * @throws ShotException if a note wants nothing, the memory does not hold one state, or the disk refuses one; the records stay
     * @throws Cancel.Cancelled if cancelled; the records stay
     */
    SolveResult run(Lanes lanes, Cancel cancel) {
        try {
            FlowSetup flow = problem.flow();
            long forStates = MemoryNeed.forStates(flow, manner.memoryBytes(), MemoryNeed.region());
            return new Solve(problem, manner.quality().rungs(flow.grid()), manner.stay(), lanes, cancel::wished)
                    .run(new StateRoom(forStates, manner.diskBytes(), place.file(STATES)), manner.until(), new Told(cancel), digest, from,
                            this::record);
        } catch (SolveCancelled asked) {
            throw new Cancel.Cancelled();
        } catch (UncheckedIOException refused) {
            throw new ShotException(new Finding(SolvePlace.FOLDER + "/" + STATES, "", refused.getMessage() + " ("
                    + refused.getCause().getMessage() + ")" + (recorded == 0 ? "." : "; then go on by --resume, after iteration " + recorded + ".")), refused);
        } catch (IllegalArgumentException refused) {
            String words = String.valueOf(refused.getMessage());
            throw new ShotException(new Finding("shot.json", "", words.endsWith(".") ? words : words + "."), refused);
        }
    }

    /** Where the search ended; after {@link #run}. */
    SolveState end() {
        return end;
    }

    /** The take is there: the records have done their work. */
    void over() {
        try {
            place.records().clear();
        } catch (IOException left) {
            progress.warning("solve: its records could not be removed (" + left.getMessage() + "); "
                    + SolvePlace.FOLDER + " may be deleted");
        }
    }

    @Override
    public void close() {
        place.close();
    }

    private void record(SolveState state) {
        if (!state.ended().isEmpty()) {
            end = state;                                                       // only the last: each holds as much as the search
        }
        try {
            place.records().write(state);
            recorded = state.search().iterations();
            recordsFail = false;
        } catch (IOException refused) {
            if (!recordsFail) {
                progress.warning("solve: this iteration could not be recorded (" + refused.getMessage()
                        + "); the solve goes on, and could only be resumed from an earlier one");
            }
            recordsFail = true;
        }
    }

    /** What the search tells goes to the progress; what is wished of it comes from the person. */
    private final class Told implements org.wispwright.optimize.solve.Progress.Listener {
        private final Cancel cancel;
        private org.wispwright.optimize.solve.Progress now;

        Told(Cancel cancel) {
            this.cancel = cancel;
        }

        @Override
        public void iteration(org.wispwright.optimize.solve.Progress accepted) {
            now = accepted;
            tell(accepted);
        }

        @Override
        public void pictures(Supplier<List<Picture>> got) {
            progress.iteration(now, got);
        }

        @Override
        public boolean enough() {
            cancel.waitWhileHeld(progress::waits);
            return cancel.isEnough() && !cancel.wished();
        }
    }

    private void tell(org.wispwright.optimize.solve.Progress now) {
        String line = inWords(now);
        if (1000 * now.rung() + now.band() != told) {
            told = 1000 * now.rung() + now.band();
            progress.milestone(line);
        } else {
            progress.now(line);
        }
    }

    private static String inWords(org.wispwright.optimize.solve.Progress now) {
        String met = now.met().stream().map(m -> String.format(Locale.ROOT, "%.1f %%", 100 * m)).collect(Collectors.joining(", "));
        return String.format(Locale.ROOT, "solve: rung %d/%d, band %d/%d, iteration %d, loss %.4f, met %s, %.0f s, about %.0f s left",
                now.rung(), now.rungs(), now.band(), now.bands(), now.iteration(), now.loss(), met, now.seconds(), now.secondsLeft());
    }

    private static Optional<SolveState> fresh(SolvePlace place) {
        SolveRecords.Found found = found(place);
        if (found.state().isPresent()) {
            throw new ShotException(Finding.of(SolvePlace.FOLDER, "", "a solve that was cut off after iteration "
                    + found.state().get().search().iterations(), "none", "go on with it by --resume, or drop it by --anew"));
        }
        return Optional.empty();
    }

    private static Optional<SolveState> anew(SolvePlace place) {
        try {
            place.records().clear();
            return Optional.empty();
        } catch (IOException refused) {
            throw unreadable(refused);
        }
    }

    private static SolveState resumed(SolvePlace place, Progress progress) {
        SolveRecords.Found found = found(place);
        found.damaged().forEach(what -> progress.warning("solve: a record is damaged and was passed over: " + what));
        SolveState state = found.state().orElseThrow(() -> new ShotException(Finding.of(SolvePlace.FOLDER, "", found.damaged().isEmpty()
                ? "no record of an unfinished solve" : "only damaged records", "one to go on from", "solve without --resume")));
        progress.milestone("solve: going on after iteration " + state.search().iterations());
        return state;
    }

    private static SolveRecords.Found found(SolvePlace place) {
        try {
            return place.records().latest();
        } catch (IOException refused) {
            throw unreadable(refused);
        }
    }

    private static ShotException unreadable(IOException refused) {
        return new ShotException(Finding.of(SolvePlace.FOLDER, "", "records that cannot be reached (" + refused.getMessage() + ")",
                "a folder that can be read and written", "check its permissions"), refused);
    }

    private static void requireSame(SolveState state, String digest, SolveWork.Manner manner, SolveProblem problem) {
        if (!state.problem().equals(digest)) {
            throw new ShotException(Finding.of("shot.json", "", "a shot that has changed since that solve began",
                    "the very shot, notes and settings", "put it back as it was, or solve anew with --anew"));
        }
        int rungs = manner.quality().rungs(problem.flow().grid()).size();
        if (state.rung() > rungs) {
            throw new ShotException(Finding.of(SolvePlace.FOLDER, "", "a solve that has reached rung " + state.rung(),
                    "one that stands on rung " + rungs + " or below for --quality " + manner.quality().name().toLowerCase(Locale.ROOT),
                    "ask for a higher quality"));
        }
    }
}

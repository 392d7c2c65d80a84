package org.wispwright.ui.desk;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import java.util.function.UnaryOperator;
import java.util.stream.Collectors;
import org.wispwright.ui.desk.SolveNow.Phase;
import org.wispwright.ui.desk.SolveNow.Wish;
import org.wispwright.ui.desk.TakeWork.Leaving;
import org.wispwright.ui.job.Beginning;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.Comparison;
import org.wispwright.ui.job.Quality;
import org.wispwright.ui.job.SolveWork;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.SolvePlace;

/**
 * Solves from the desk: starts one, pauses it, ends it, goes on with one that was cut off. One at a time, on a thread of low priority; the
 * notes may be edited meanwhile. How it goes stands in {@link TakeWork#running}. Desk's thread.
 */
public final class Solving {
    private final Desk desk;
    private final Workers workers;
    private final ExecutorService files;
    private final ExecutorService lane;
    private final OriginalMaking originals;
    private final Foretelling foretelling;
    private Cancel running = new Cancel();
    private Optional<Runnable> onceSaved = Optional.empty();
    private OpenShot seen;
    private boolean closed;

    Solving(Desk desk, Workers workers, ExecutorService files) {
        this.desk = desk;
        this.workers = workers;
        this.files = files;
        lane = workers.lane("solve");
        originals = new OriginalMaking(desk, workers);
        foretelling = new Foretelling(desk, workers);
    }

    /** Asks for the next solve in another way. */
    public void choose(UnaryOperator<SolveChoice> change) {
        work(w -> w.withChoice(change.apply(w.choice())));
    }

    /** True if a solve can be started. */
    public static boolean canStart(DeskState s) {
        return s.shot().map(shot -> !shot.asItIs().notes().isEmpty()).orElse(false) && s.hasOriginal() && s.work().running().isEmpty()
                && s.work().unfinished().isEmpty();
    }

    /** True if the solve that was cut off can be gone on with. */
    public static boolean canResume(DeskState s) {
        return s.work().running().isEmpty() && s.hasOriginal()
                && s.work().unfinished().map(u -> u.state() == Unfinished.State.READY).orElse(false);
    }

    /** Starts a solve as it is asked for; nothing if it cannot be. */
    public void start() {
        DeskState s = desk.state();
        if (canStart(s)) {
            SolveChoice choice = s.work().choice();
            int shown = s.takeShown().map(TakeEntry::number).orElse(0);
            begin(choice, choice.onwards() && shown > 0 ? Beginning.from(shown) : Beginning.FRESH);
        }
    }

    /** Goes on with the solve that was cut off, to the quality asked for or the lowest that reaches so far. Nothing if it cannot be. */
    public void resume() {
        DeskState s = desk.state();
        if (canResume(s)) {
            Unfinished cut = s.work().unfinished().orElseThrow();
            Quality quality = s.work().choice().quality();
            while (quality.rungs(s.shot().orElseThrow().setup().flow().grid()).size() < cut.rung()) {
                quality = Quality.values()[quality.ordinal() + 1];             // the highest has every rung
            }
            begin(s.work().choice().with(quality).withSources(cut.sources()), Beginning.RESUME);
        }
    }

    /** Drops what a solve that was cut off has left. */
    public void dropUnfinished() {
        DeskState s = desk.state();
        if (s.work().unfinished().isEmpty() || s.work().running().isPresent()) {
            return;
        }
        OpenShot shot = s.shot().orElseThrow();
        files.execute(() -> {
            Optional<String> refused = Optional.empty();
            try (SolvePlace place = SolvePlace.open(shot.folder())) {
                place.records().clear();
            } catch (ShotException fault) {
                refused = Optional.of(Desk.words(fault));
            } catch (java.io.IOException fault) {
                refused = Optional.of("The records in " + SolvePlace.FOLDER + " cannot be removed (" + fault.getMessage()
                        + "); check the folder's permissions.");
            }
            Optional<String> why = refused;
            Optional<Unfinished> left = unfinished(shot.folder());
            workers.onDesk(() -> {
                ifOnDesk(shot, w -> w.withUnfinished(left));
                desk.say(why.isPresent() ? Message.Kind.FAULT : Message.Kind.DONE,
                        why.orElse("What the unfinished solve had left is dropped."));
            });
        });
    }

    /** Has the search wait after this iteration, or go on. */
    public void pause(boolean wait) {
        running.hold(wait);
        work(w -> w.running(now -> wait ? now.with(Wish.PAUSE) : now.wish() != Wish.PAUSE ? now
                : (now.phase() == Phase.PAUSED ? now.in(Phase.SEARCHING) : now).with(Wish.GO_ON)));
    }

    /** Ends the search after this iteration and makes a take of what it has. */
    public void keep() {
        running.wishEnough();
        work(w -> w.running(now -> (now.phase() == Phase.PAUSED ? now.in(Phase.SEARCHING) : now).with(Wish.KEEP)));
    }

    /** Ends the solve at once; its records stay, so that it can be gone on with. */
    public void stop() {
        running.wish();
        onceSaved.ifPresent(waiting -> over(Message.Kind.DONE, "The solve was stopped before it began."));
        work(w -> w.running(now -> now.with(Wish.STOP)));
    }

    /** Simulates the original again, after that was refused. */
    public void simulateOriginal() {
        desk.state().shot().ifPresent(originals::make);
    }

    /** True if the desk can be closed now; else the person is asked. */
    public boolean mayLeave() {
        if (desk.state().work().running().isEmpty()) {
            return true;
        }
        work(w -> w.with(Leaving.ASKED));
        return false;
    }

    /** What the person says to that: to close once the solve has ended, or to stay. */
    public void leaves(boolean leave) {
        work(w -> w.with(leave ? Leaving.THEN : Leaving.NO));
    }

    void close() {
        closed = true;
        running.wish();
        originals.drop();
        foretelling.close();
    }

    private void begin(SolveChoice choice, Beginning beginning) {
        OpenShot shot = desk.state().shot().orElseThrow();
        Cancel cancel = new Cancel();
        running = cancel;
        foretelling.drop();
        work(w -> w.withRunning(Optional.of(SolveNow.begun(shot, choice))).withUnfinished(Optional.empty()));
        onceSaved = Optional.of(() -> files.execute(() -> {
            SolveStart start;
            try {
                start = SolveStart.read(shot.folder(), choice, beginning);
            } catch (RuntimeException | Error refused) {
                failed(shot, refused);
                return;
            }
            lane.execute(() -> run(shot, start, cancel));
        }));
        goesOnOnceSaved(desk.state());
    }

    private void run(OpenShot shot, SolveStart start, Cancel cancel) {
        try {
            cancel.stopIfWished();
            SolveWork.Result result = new SolveRun(shot.folder(), start, cancel,
                    change -> workers.onDesk(() -> work(w -> w.running(change))),
                    line -> workers.onDesk(() -> desk.say(Message.Kind.NOTICE, line))).solve();
            List<TakeEntry> takes = Opening.takes(shot);
            workers.onDesk(() -> ended(shot, result, takes));
        } catch (RuntimeException | Error thrown) {
            failed(shot, thrown);
        }
    }

    private void ended(OpenShot shot, SolveWork.Result result, List<TakeEntry> takes) {
        if (isOnDesk(shot)) {
            desk.look(s -> s.withTakes(takes).withShowing(s.showing().orElseThrow().withNear(new Source.Take(result.take()))));
        }
        String met = result.comparison().notes().stream().map(Solving::met).collect(Collectors.joining(", "));
        over(Message.Kind.DONE, "Take " + result.take() + (isOnDesk(shot) ? "" : " of " + shot.setup().name()) + " is ready: " + met);
    }

    private static String met(Comparison.OfNote note) {
        return String.format(Locale.ROOT, "%s %.0f %%", note.note().id(), 100 * note.met());
    }

    /** Any thread but the desk's. */
    private void failed(OpenShot shot, Throwable thrown) {
        Optional<Unfinished> left = unfinished(shot.folder());
        boolean wished = thrown instanceof Cancel.Cancelled;
        String rest = left.filter(u -> u.iterations() > 0).map(u -> " What it had found after iteration " + u.iterations()
                + " can be gone on with.").orElse("");
        String words = wished ? "The solve was stopped." + rest : Desk.words(thrown) + rest;
        workers.onDesk(() -> {
            if (!wished) {
                work(w -> w.with(Leaving.NO));                                 // the person has to read it
            }
            ifOnDesk(shot, w -> w.withUnfinished(left));
            over(wished ? Message.Kind.DONE : Message.Kind.FAULT, words);
        });
    }

    private void over(Message.Kind kind, String words) {
        onceSaved = Optional.empty();
        work(w -> w.withRunning(Optional.empty()).with(w.leaving() == Leaving.ASKED ? Leaving.NO : w.leaving()));
        desk.say(kind, words);
    }

    private static Optional<Unfinished> unfinished(ShotFolder folder) {
        try {
            return Unfinished.in(folder);
        } catch (RuntimeException unreadable) {
            return Optional.empty();                                           // the folder is gone or closed: something else says so
        }
    }

    /** A listener may not look itself, or later listeners would hear of states in the wrong order. */
    void follow(DeskState s) {
        if (closed) {
            return;
        }
        if (s.shot().isPresent() && (seen == null || seen.folder() != s.shot().get().folder())) {
            OpenShot shot = s.shot().get();
            workers.onDesk(() -> opened(shot));
        }
        boolean saved = seen != null && s.saving().isDone() && s.shot().map(now -> !now.notes().equals(seen.notes())).orElse(false);
        if (saved && s.work().unfinished().isPresent()) {
            looksAtUnfinishedAgain(s.shot().get(), s.work().unfinished().get());
        }
        if (saved || seen == null || s.shot().isEmpty() || seen.folder() != s.shot().get().folder()) {
            seen = s.shot().orElse(null);
        }
        if (onceSaved.isPresent()) {
            workers.onDesk(() -> goesOnOnceSaved(desk.state()));
        }
        foretelling.follow(s);
    }

    private void opened(OpenShot shot) {
        if (closed) {
            return;
        }
        files.execute(() -> {
            Optional<Unfinished> left = unfinished(shot.folder());
            workers.onDesk(() -> {
                if (desk.state().work().running().filter(now -> now.shot().folder().root().equals(shot.folder().root())).isEmpty()) {
                    ifOnDesk(shot, w -> w.withUnfinished(left));
                }
            });
        });
        originals.opened(desk.state());
    }

    private void looksAtUnfinishedAgain(OpenShot shot, Unfinished cut) {
        files.execute(() -> {
            Unfinished again;
            try {
                again = cut.lookedAtAgain(shot.folder());
            } catch (RuntimeException unreadable) {
                return;
            }
            workers.onDesk(() -> ifOnDesk(shot, w -> w.unfinished().isPresent() ? w.withUnfinished(Optional.of(again)) : w));
        });
    }

    private void goesOnOnceSaved(DeskState s) {
        if (onceSaved.isEmpty()) {
            return;
        }
        Optional<Finding> refused = s.saving().refused();
        if (refused.isPresent()) {
            over(Message.Kind.FAULT, "A solve reads the notes from disk, and the last edits are not there (" + refused.get().inWords()
                    + "); write them again, then solve.");
        } else if (s.saving().isDone()) {
            Runnable go = onceSaved.get();
            onceSaved = Optional.empty();
            go.run();
        }
    }

    private boolean isOnDesk(OpenShot shot) {
        return desk.state().shot().map(now -> now.folder().root().equals(shot.folder().root())).orElse(false);
    }

    private void ifOnDesk(OpenShot shot, UnaryOperator<TakeWork> change) {
        if (isOnDesk(shot)) {
            work(change);
        }
    }

    private void work(UnaryOperator<TakeWork> change) {
        desk.look(s -> s.withWork(change));
    }
}

package org.wispwright.ui.desk;

import java.util.List;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.locks.LockSupport;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.desk.TakeWork.Foretold;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.Estimate;
import org.wispwright.ui.job.SmokeAsked;
import org.wispwright.ui.shot.Note;
import org.wispwright.ui.shot.Shot;

/**
 * Says what a solve of the notes would take, and which of them ask for smoke that is not there: anew whenever they change, once the hand
 * has rested, and not while something else computes. Desk's thread.
 */
final class Foretelling {
    private static final long REST_NANOS = 700_000_000L;
    private static final long LOOK_NANOS = 20_000_000L;

    private final Desk desk;
    private final Workers workers;
    private final Replacing asked;
    private final Replacing estimates;
    private List<Note> told;
    private OpenShot toldOf;
    private boolean closed;

    Foretelling(Desk desk, Workers workers) {
        this.desk = desk;
        this.workers = workers;
        ExecutorService lane = workers.lane("foretell");
        asked = new Replacing(workers, lane);
        estimates = new Replacing(workers, lane);
    }

    /** Begins anew if the notes are others than those that were told of. */
    void follow(DeskState s) {
        if (told != null && s.shot().map(shot -> shot.folder() != toldOf.folder()).orElse(true)) {
            told = null;
            asked.drop();
            estimates.drop();
        }
        if (s.shot().isEmpty() || !s.hasOriginal() || s.work().running().isPresent()) {
            return;
        }
        OpenShot shot = s.shot().get();
        if (told != null && (toldOf.notes() == shot.notes() || told.equals(shot.asItIs().notes()))) {
            return;
        }
        Shot now = shot.asItIs();
        told = now.notes();
        toldOf = shot;
        workers.onDesk(() -> begin(shot, now));
    }

    /** Drops all, for good. */
    void close() {
        closed = true;
        asked.drop();
        estimates.drop();
    }

    /** Drops what is being found; it is begun anew when it is of use again. */
    void drop() {
        asked.drop();
        estimates.drop();
        if (desk.state().work().foretold().measuring()) {
            told = null;
        }
        desk.look(s -> s.withWork(w -> w.withForetold(new Foretold(w.foretold().estimates(), false, w.foretold().why()))));
    }

    private void begin(OpenShot shot, Shot now) {
        if (closed || desk.state().work().running().isPresent()) {
            told = null;
            return;
        }
        if (now.notes().isEmpty()) {
            asked.drop();
            estimates.drop();
            show(List.of());
            show(Foretold.NOTHING);
            return;
        }
        desk.look(s -> s.withWork(w -> w.withForetold(new Foretold(w.foretold().estimates(), true, Optional.empty()))));
        asked.replace(cancel -> {
            rest(cancel);
            try (Lanes lanes = new Lanes(SolveRun.lanes())) {
                return now.notes().stream().flatMap(note -> SmokeAsked.known(shot.folder(), now, note, lanes).stream())
                        .filter(SmokeAsked::isWorthTelling).toList();
            }
        }, this::show, refused -> show(List.of()));
        estimates.replace(cancel -> {
            rest(cancel);
            try (Lanes lanes = new Lanes(SolveRun.lanes())) {
                return Estimate.all(now, SolveStart.memoryBytes(), 0, lanes, cancel);
            }
        }, found -> show(new Foretold(found, false, Optional.empty())),
                refused -> show(new Foretold(List.of(), false, Optional.of(Desk.words(refused)))));
    }

    private void show(List<SmokeAsked> smoke) {
        desk.look(s -> s.withWork(w -> w.withAsked(smoke)));
    }

    private void show(Foretold foretold) {
        desk.look(s -> s.withWork(w -> w.withForetold(foretold)));
    }

    private static void rest(Cancel cancel) {
        Thread.currentThread().setPriority(Thread.MIN_PRIORITY);
        long end = System.nanoTime() + REST_NANOS;
        while (System.nanoTime() < end) {
            cancel.stopIfWished();
            LockSupport.parkNanos(LOOK_NANOS);
        }
    }
}

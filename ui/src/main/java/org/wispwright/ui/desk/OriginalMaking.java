package org.wispwright.ui.desk;

import java.util.List;
import java.util.Optional;
import java.util.concurrent.ExecutorService;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.Progress;
import org.wispwright.ui.job.SimulateWork;

/** Simulates the original of a shot that has none, beside the desk. Desk's thread. */
final class OriginalMaking {
    private static final long NANOS_BETWEEN = 100_000_000L;

    private final Desk desk;
    private final Workers workers;
    private final ExecutorService lane;
    private Cancel running = new Cancel();

    OriginalMaking(Desk desk, Workers workers) {
        this.desk = desk;
        this.workers = workers;
        lane = workers.lane("original");
    }

    /** A shot was opened: its original is made if there is none. */
    void opened(DeskState s) {
        drop();
        if (s.takes().stream().noneMatch(take -> take.number() == 0)) {
            make(s.shot().orElseThrow());
        } else if (!s.hasOriginal()) {
            desk.say(Message.Kind.NOTICE, "The takes were made with another set-up than shot.json has now; move the folder takes away and "
                    + "open the shot again, or put shot.json back as it was.");
        }
    }

    /** Makes it, in place of what is being made. */
    void make(OpenShot shot) {
        drop();
        Cancel cancel = new Cancel();
        running = cancel;
        show(cancel, Optional.of(new SolveNow.FrameOf(shot.setup().flow().frames().first(), shot.setup().flow().frames().last())));
        lane.execute(() -> run(shot, cancel));
    }

    /** Stops it. */
    void drop() {
        running.wish();
    }

    private void run(OpenShot shot, Cancel cancel) {
        Thread.currentThread().setPriority(Thread.MIN_PRIORITY);
        try (Lanes lanes = new Lanes(SolveRun.lanes())) {
            cancel.stopIfWished();
            SimulateWork.run(shot.folder(), shot.setup(), lanes, new Told(cancel), cancel);
            List<TakeEntry> takes = Opening.takes(shot);
            workers.onDesk(() -> {
                if (!cancel.wished()) {
                    desk.look(s -> s.withTakes(takes).withWork(w -> w.withOriginal(Optional.empty())));
                }
            });
        } catch (Cancel.Cancelled wished) {
            return;
        } catch (RuntimeException | Error refused) {
            workers.onDesk(() -> {
                if (!cancel.wished()) {
                    show(cancel, Optional.empty());
                    desk.say(Message.Kind.FAULT, Desk.words(refused));
                }
            });
        }
    }

    private void show(Cancel of, Optional<SolveNow.FrameOf> frame) {
        if (!of.wished()) {
            desk.look(s -> s.withWork(w -> w.withOriginal(frame)));
        }
    }

    /** Tells of frames, a few times a second at the most. */
    private final class Told implements Progress {
        private final Cancel cancel;
        private long last = System.nanoTime() - NANOS_BETWEEN;

        Told(Cancel cancel) {
            this.cancel = cancel;
        }

        @Override
        public void now(String line) {
            // The desk has the figures.
        }

        @Override
        public void milestone(String line) {
            // Likewise.
        }

        @Override
        public void frame(int frame, int lastFrame) {
            long time = System.nanoTime();
            if (time - last >= NANOS_BETWEEN) {
                last = time;
                workers.onDesk(() -> show(cancel, Optional.of(new SolveNow.FrameOf(frame, lastFrame))));
            }
        }
    }
}

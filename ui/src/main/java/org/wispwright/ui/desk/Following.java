package org.wispwright.ui.desk;

import java.util.concurrent.ExecutorService;
import java.util.function.Consumer;
import java.util.function.Supplier;

/**
 * Work that follows a moving hand: what runs is finished and shown, and of all that was asked meanwhile only the newest is done next. So a
 * hand that never rests is still followed, where {@link Replacing} would show it nothing. Called on the desk's thread.
 */
final class Following {
    private final Workers workers;
    private final ExecutorService lane;
    private Runnable next;
    private boolean busy;
    private int dropped;

    /** @param lane where the work runs */
    Following(Workers workers, ExecutorService lane) {
        this.workers = workers;
        this.lane = lane;
    }

    /**
     * Has work done as soon as what runs is done, in place of what waits.
     *
     * @param work runs on the lane; what it refuses by an {@link IllegalArgumentException} is not shown, and what was shown stays
     * @param show told on the desk's thread
     */
    <T> void ask(Supplier<T> work, Consumer<T> show) {
        int asked = dropped;
        next = () -> lane.execute(() -> {
            T result;
            try {
                result = work.get();
            } catch (IllegalArgumentException refused) {
                workers.onDesk(this::done);
                return;
            }
            workers.onDesk(() -> {
                if (asked == dropped) {
                    show.accept(result);
                }
                done();
            });
        });
        if (!busy) {
            done();
        }
    }

    /** Nothing that was asked by now is shown. */
    void drop() {
        dropped++;
        next = null;
    }

    private void done() {
        busy = next != null && !lane.isShutdown();                             // put away: nothing is left to follow
        if (busy) {
            Runnable run = next;
            next = null;
            run.run();
        }
    }
}

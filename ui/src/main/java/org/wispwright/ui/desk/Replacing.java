package org.wispwright.ui.desk;

import java.util.concurrent.ExecutorService;
import java.util.concurrent.RejectedExecutionException;
import java.util.function.Consumer;
import java.util.function.Function;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.ShotException;

/**
 * Work of which only the newest counts: asking again drops what was asked before, whether it waits, runs, or is on its way back. Called on
 * the desk's thread; so are the consumers.
 */
public final class Replacing {
    private final Workers workers;
    private final ExecutorService lane;
    private Cancel running = new Cancel();

    /** @param lane where the work runs */
    public Replacing(Workers workers, ExecutorService lane) {
        this.workers = workers;
        this.lane = lane;
    }

    /**
     * Runs work in place of what was asked before.
     *
     * @param work   may ask the wish whether it is still wanted; runs on the lane
     * @param show   told of what came out, unless something newer was asked
     * @param failed told of what was thrown, likewise; never of {@link Cancel.Cancelled}
     */
    public <T> void replace(Function<Cancel, T> work, Consumer<T> show, Consumer<RuntimeException> failed) {
        running.wish();
        Cancel cancel = new Cancel();
        running = cancel;
        Runnable task = () -> {
            if (cancel.wished()) {
                return;
            }
            try {
                T result = work.apply(cancel);
                workers.onDesk(() -> {
                    if (!cancel.wished()) {
                        show.accept(result);
                    }
                });
            } catch (Cancel.Cancelled dropped) {
                return;
            } catch (RuntimeException | OutOfMemoryError thrown) {
                workers.onDesk(() -> {
                    if (!cancel.wished()) {
                        failed.accept(thrown instanceof RuntimeException ours ? ours
                                : new ShotException(new Finding("desk", "", Desk.words(thrown)), thrown));
                    }
                });
            }
        };
        try {
            lane.execute(task);
        } catch (RejectedExecutionException closed) {
            cancel.wish();                                                     // what came back late asks a desk that is put away
        }
    }

    /** Drops what was asked. */
    public void drop() {
        running.wish();
    }
}

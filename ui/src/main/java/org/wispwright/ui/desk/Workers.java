package org.wispwright.ui.desk;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executor;
import java.util.concurrent.Executors;
import java.util.concurrent.TimeUnit;

/**
 * Where the desk's work runs, and the way back to the desk's thread. A lane runs its tasks one after the other, in order, on a thread of its
 * own that does not keep the program alive.
 */
public final class Workers implements AutoCloseable {
    private static final long SECONDS_TO_END = 10;

    private final Executor desk;
    private final Map<String, ExecutorService> lanes = new LinkedHashMap<>();

    /** @param desk runs a task on the desk's thread, soon and in order; with a window, Swing's own */
    public Workers(Executor desk) {
        this.desk = desk;
    }

    /** Runs a task on the desk's thread. Any thread may ask. */
    public void onDesk(Runnable task) {
        desk.execute(task);
    }

    /** The lane of a name. */
    public synchronized ExecutorService lane(String name) {
        return lanes.computeIfAbsent(name, n -> Executors.newSingleThreadExecutor(task -> {
            Thread thread = new Thread(task, "desk-" + name);
            thread.setDaemon(true);
            return thread;
        }));
    }

    /** Ends all lanes after what they have begun or queued, some seconds at most. */
    @Override
    public synchronized void close() {
        lanes.values().forEach(ExecutorService::shutdown);
        for (ExecutorService lane : lanes.values()) {
            try {
                if (!lane.awaitTermination(SECONDS_TO_END, TimeUnit.SECONDS)) {
                    lane.shutdownNow();
                }
            } catch (InterruptedException stop) {
                lane.shutdownNow();
                Thread.currentThread().interrupt();
            }
        }
        lanes.clear();
    }
}

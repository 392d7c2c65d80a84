package org.wispwright.ui.desk;

import java.util.concurrent.BlockingQueue;
import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.TimeUnit;
import java.util.function.BooleanSupplier;

/** The test's own thread as the desk's: what workers bring back waits until the test takes it. */
public final class DeskThread {
    private static final long MOST_SECONDS = 60;
    private final BlockingQueue<Runnable> waiting = new LinkedBlockingQueue<>();

    /** Workers whose results come back here. */
    public Workers workers() {
        return new Workers(waiting::add);
    }

    /** Takes what comes back until something holds. @throws AssertionError if it does not come about */
    public void until(String what, BooleanSupplier wished) {
        long end = System.nanoTime() + MOST_SECONDS * 1_000_000_000L;
        while (!wished.getAsBoolean()) {
            try {
                Runnable task = waiting.poll(50, TimeUnit.MILLISECONDS);
                if (task != null) {
                    task.run();
                }
            } catch (InterruptedException stop) {
                throw new IllegalStateException(stop);
            }
            if (System.nanoTime() > end) {
                throw new AssertionError("waited " + MOST_SECONDS + " s and it is still not so: " + what);
            }
        }
    }
}

package org.wispwright.ui.desk;

import java.nio.file.Path;
import java.util.concurrent.BlockingQueue;
import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.TimeUnit;
import java.util.function.BooleanSupplier;

/** A desk without a window, whose thread is the test's: tasks for it wait in a queue until the test waits for something. */
final class WindowlessDesk implements AutoCloseable {
    private static final long MOST_SECONDS = 60;

    final BlockingQueue<Runnable> tasks = new LinkedBlockingQueue<>();
    final Workers workers = new Workers(tasks::add);
    final Desk desk = new Desk(workers);

    /** Opens a shot. */
    static WindowlessDesk with(Path shot) {
        WindowlessDesk made = new WindowlessDesk();
        made.desk.open(shot);
        made.until("the shot is open", () -> made.desk.state().shot().isPresent());
        return made;
    }

    /** Runs what the workers bring until something holds. @throws AssertionError if it does not come */
    void until(String what, BooleanSupplier wished) {
        long end = System.nanoTime() + TimeUnit.SECONDS.toNanos(MOST_SECONDS);
        while (!wished.getAsBoolean()) {
            if (System.nanoTime() > end) {
                throw new AssertionError("it is still not so: " + what + "; message: " + desk.state().message());
            }
            try {
                Runnable task = tasks.poll(100, TimeUnit.MILLISECONDS);
                if (task != null) {
                    task.run();
                }
            } catch (InterruptedException stop) {
                throw new IllegalStateException(stop);
            }
        }
    }

    OpenShot shot() {
        return desk.state().shot().orElseThrow();
    }

    @Override
    public void close() {
        desk.close();
    }
}

package org.wispwright.ui.desk;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.function.Consumer;
import java.util.function.Predicate;

/** A desk without a window, on a thread of its own, for tests that wait for what it does. */
public final class DeskBench implements AutoCloseable {
    private static final long MOST_SECONDS = 100;

    private final ExecutorService thread = Executors.newSingleThreadExecutor();
    private final Desk desk;

    /** An empty desk. */
    public DeskBench() {
        desk = ask(() -> new Desk(new Workers(thread)));
    }

    /** Opens a shot and waits until it is there, and its original. */
    public DeskBench open(Path folder) {
        act(d -> d.open(folder));
        await("the shot is open with its original", s -> s.shot().isPresent() && s.hasOriginal() && s.work().original().isEmpty());
        return this;
    }

    /** Does something on the desk's thread. */
    public void act(Consumer<Desk> action) {
        ask(() -> {
            action.accept(desk);
            return null;
        });
    }

    /** The state of this moment. */
    public DeskState state() {
        return ask(desk::state);
    }

    /** What was said last. */
    public String said() {
        return state().message().map(Message::words).orElse("");
    }

    /** Waits until the state is as it should be. @throws AssertionError if it never is */
    public DeskState await(String what, Predicate<DeskState> wished) {
        long end = System.nanoTime() + MOST_SECONDS * 1_000_000_000L;
        while (true) {
            DeskState now = state();
            if (wished.test(now)) {
                return now;
            }
            if (System.nanoTime() > end) {
                throw new AssertionError("waited " + MOST_SECONDS + " s and it is still not so: " + what + "; said: " + said());
            }
            pause(10);
        }
    }

    /** Lets some time pass. */
    static void pause(long millis) {
        try {
            Thread.sleep(millis);
        } catch (InterruptedException stop) {
            Thread.currentThread().interrupt();
        }
    }

    private <T> T ask(Callable<T> question) {
        try {
            return thread.submit(question).get();
        } catch (InterruptedException stop) {
            throw new IllegalStateException(stop);
        } catch (ExecutionException thrown) {
            if (thrown.getCause() instanceof RuntimeException ours) {
                throw ours;
            }
            throw new IllegalStateException(thrown.getCause());
        }
    }

    @Override
    public void close() {
        act(Desk::close);
        thread.shutdown();
    }
}

package org.wispwright.render.lanes;

import java.util.concurrent.atomic.AtomicInteger;
import java.util.concurrent.locks.LockSupport;
import java.util.function.IntConsumer;

/**
 * A fixed set of threads for loops over numbered pieces.
 * <p>Which lane takes which piece is left to chance; what a piece computes is not, so a body that writes only what its
 * number owns gives the same bits for 1, 2 or 16 lanes. Sums go into one slot per piece and are added up in piece order.
 * <p>The calling thread is one of the lanes. A waiting lane spins for a few microseconds before it sleeps, because the
 * loops of a solver step follow each other closely. One caller at a time; a body must not call {@code forEach} of its own lanes.
 */
public final class Lanes implements AutoCloseable {
    private static final int SPINS_BEFORE_SLEEP = 2_000;

    private final Thread[] helpers;
    private volatile Job job;
    private volatile boolean closed;

    /** One call of {@link #forEach}. A helper that wakes late finds its pieces gone and touches nothing, so nobody waits for it. */
    private static final class Job {
        final IntConsumer body;
        final int pieces;
        final AtomicInteger next = new AtomicInteger();
        final AtomicInteger left;
        volatile Throwable failure;

        Job(int pieces, IntConsumer body) {
            this.pieces = pieces;
            this.body = body;
            left = new AtomicInteger(pieces);
        }

        void takePieces() {
            for (int n = next.getAndIncrement(); n < pieces; n = next.getAndIncrement()) {
                if (failure == null) {
                    try {
                        body.accept(n);
                    } catch (Throwable thrown) {
                        failed(thrown);
                    }
                }
                left.decrementAndGet();
            }
        }

        private synchronized void failed(Throwable thrown) {
            if (failure == null) {
                failure = thrown;
            }
        }
    }

    /**
     * Starts {@code threads - 1} helper threads; they are daemons.
     *
     * @param threads 1 or more; 1 runs everything on the caller
     * @throws IllegalArgumentException if threads is below 1 or above 1024
     */
    public Lanes(int threads) {
        if (threads < 1 || threads > 1024) {
            throw new IllegalArgumentException("lanes: got " + threads + " threads, needs 1 to 1024");
        }
        helpers = new Thread[threads - 1];
        for (int t = 0; t < helpers.length; t++) {
            helpers[t] = new Thread(this::help, "lane-" + (t + 1));
            helpers[t].setDaemon(true);
            helpers[t].start();
        }
    }

    /** Number of lanes, the caller included. */
    public int count() {
        return helpers.length + 1;
    }

    /**
     * Runs {@code body} once for every number in {@code 0..pieces-1} and returns when all are done.
     * If a body throws, pieces not yet taken are dropped and the first failure is thrown here.
     */
    public void forEach(int pieces, IntConsumer body) {
        if (closed) {
            throw new IllegalStateException("lanes: already closed");
        }
        if (helpers.length == 0 || pieces <= 1) {
            for (int n = 0; n < pieces; n++) {
                body.accept(n);
            }
            return;
        }
        Job mine = new Job(pieces, body);
        job = mine;
        for (int t = 0; t < Math.min(helpers.length, pieces - 1); t++) {
            LockSupport.unpark(helpers[t]);
        }
        mine.takePieces();
        for (int spin = 0; mine.left.get() != 0; spin++) {
            if (spin < SPINS_BEFORE_SLEEP) {
                Thread.onSpinWait();
            } else {
                Thread.yield();
            }
        }
        if (mine.failure != null) {
            rethrow(mine.failure);
        }
    }

    /** Ends the helper threads. */
    @Override
    public void close() {
        closed = true;
        for (Thread helper : helpers) {
            LockSupport.unpark(helper);
        }
    }

    private void help() {
        Job seen = null;
        while (true) {
            for (int spin = 0; job == seen && !closed; spin++) {
                if (spin < SPINS_BEFORE_SLEEP) {
                    Thread.onSpinWait();
                } else {
                    LockSupport.park(this);
                }
            }
            if (closed) {
                return;
            }
            seen = job;
            seen.takePieces();
        }
    }

    private static void rethrow(Throwable thrown) {
        if (thrown instanceof RuntimeException unchecked) {
            throw unchecked;
        }
        if (thrown instanceof Error error) {
            throw error;
        }
        throw new IllegalStateException(thrown);
    }
}

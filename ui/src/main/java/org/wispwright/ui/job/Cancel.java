package org.wispwright.ui.job;

/** What a person wishes of a running job: to stop, to pause, to end with what it has. Made on one thread and asked about on another. */
public final class Cancel {
    private volatile boolean wished;
    private volatile boolean enough;
    private boolean held;

    /** Thrown by a job that stopped because it was asked to; nothing half done is left. */
    public static final class Cancelled extends RuntimeException {
        /** With a plain message. */
        public Cancelled() {
            super("cancelled; nothing was left half done");
        }
    }

    /** Asks the job to stop at its next chance. */
    public synchronized void wish() {
        wished = true;
        notifyAll();
    }

    /** True once {@link #wish} was called. */
    public boolean wished() {
        return wished;
    }

    /** @throws Cancelled once {@link #wish} was called */
    public void stopIfWished() {
        if (wished) {
            throw new Cancelled();
        }
    }

    /** Asks a search to end after its next iteration and to make its take of what it has. Other work goes on. */
    public synchronized void wishEnough() {
        enough = true;
        notifyAll();
    }

    /** True once {@link #wishEnough} was called. */
    public boolean isEnough() {
        return enough;
    }

    /** Asks a search to wait between two iterations, or to go on. Other work goes on. */
    public synchronized void hold(boolean wait) {
        held = wait;
        notifyAll();
    }

    /**
     * Waits while the search is to wait, unless it is to stop or to end.
     *
     * @param waits run once before it waits; not run if it need not
     */
    void waitWhileHeld(Runnable waits) {
        if (isHeld()) {
            waits.run();
        }
        synchronized (this) {
            while (isHeld()) {
                try {
                    wait();
                } catch (InterruptedException stop) {
                    wished = true;
                    Thread.currentThread().interrupt();
                }
            }
        }
    }

    private synchronized boolean isHeld() {
        return held && !wished && !enough;
    }
}

package org.wispwright.ui.job;

/** A wish to stop, made on one thread and asked about on another. */
public final class Cancel {
    private volatile boolean wished;

    /** Thrown by a job that stopped because it was asked to; nothing half done is left. */
    public static final class Cancelled extends RuntimeException {
        /** With a plain message. */
        public Cancelled() {
            super("cancelled; nothing was left half done");
        }
    }

    /** Asks the job to stop at its next chance. */
    public void wish() {
        wished = true;
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
}

package org.wispwright.optimize.solve;

/** Thrown out of a run that was asked to stop. Nothing of it is kept. */
public final class SolveCancelled extends RuntimeException {
    private static final long serialVersionUID = 1;

    /** With one plain sentence. */
    public SolveCancelled() {
        super("stopped on request; nothing was written");
    }
}

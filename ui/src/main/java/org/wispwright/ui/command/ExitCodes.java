package org.wispwright.ui.command;

/** What the program's exit code means; docs/commands.md has the same table. */
public final class ExitCodes {
    /** All done. */
    public static final int OK = 0;
    /** An error of ours: one sentence, and with {@code --verbose} the trace. */
    public static final int OURS = 1;
    /** The command line itself is wrong. */
    public static final int USAGE = 2;
    /** Something handed to us is wrong: a shot, a picture, a place to write to. */
    public static final int BAD_INPUT = 3;
    /** Stopped by Ctrl-C (128 + SIGINT). */
    public static final int CANCELLED = 130;

    private ExitCodes() {
    }
}

package org.wispwright.ui.command;

import java.io.PrintWriter;
import org.wispwright.ui.job.Progress;

/** Progress as text. */
interface ProgressLine extends Progress, AutoCloseable {
    /** Ends the line, if one is open. */
    @Override
    void close();

    /**
     * The form that suits the reader.
     *
     * @param err where it goes
     * @param terminal true if a person watches a terminal, false for a pipe or a file
     */
    static ProgressLine to(PrintWriter err, boolean terminal) {
        return terminal ? new Updating(err) : new Plain(err);
    }

    /** One line that is written over, at most ten times a second. */
    final class Updating implements ProgressLine {
        private static final int COLUMNS = 100;
        private static final long NANOS_BETWEEN = 100_000_000L;

        private final PrintWriter err;
        private int shown;
        private long last = System.nanoTime() - NANOS_BETWEEN;

        Updating(PrintWriter err) {
            this.err = err;
        }

        @Override
        public void now(String line) {
            long time = System.nanoTime();
            if (time - last < NANOS_BETWEEN) {
                return;
            }
            last = time;
            String text = line.length() > COLUMNS ? line.substring(0, COLUMNS) : line;
            err.print("\r" + text + " ".repeat(Math.max(0, shown - text.length())));
            err.flush();
            shown = text.length();
        }

        @Override
        public void milestone(String line) {
            wipe();
            err.println(line);
            err.flush();
        }

        @Override
        public void close() {
            wipe();
            err.flush();
        }

        private void wipe() {
            if (shown > 0) {
                err.print("\r" + " ".repeat(shown) + "\r");
                shown = 0;
            }
        }
    }

    /** Whole lines, and where the job is at most once in five seconds. */
    final class Plain implements ProgressLine {
        private static final long NANOS_BETWEEN = 5_000_000_000L;

        private final PrintWriter err;
        private long last = System.nanoTime();

        Plain(PrintWriter err) {
            this.err = err;
        }

        @Override
        public void now(String line) {
            long time = System.nanoTime();
            if (time - last >= NANOS_BETWEEN) {
                last = time;
                milestone(line);
            }
        }

        @Override
        public void milestone(String line) {
            err.println(line);
            err.flush();
        }

        @Override
        public void close() {
            err.flush();
        }
    }
}

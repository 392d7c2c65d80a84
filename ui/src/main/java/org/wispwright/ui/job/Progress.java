package org.wispwright.ui.job;

/** What a running job tells. Called on the job's thread; must return soon and must not throw. */
public interface Progress {
    /** Tells nobody. */
    Progress SILENT = new Progress() {
        @Override
        public void now(String line) {
        }

        @Override
        public void milestone(String line) {
        }
    };

    /** Where the job is at this moment; the next call takes its place. */
    void now(String line);

    /** Something that is worth keeping in a log, such as a finished band. */
    void milestone(String line);
}

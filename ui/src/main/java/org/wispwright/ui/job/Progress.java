package org.wispwright.ui.job;

import java.util.List;
import java.util.function.Supplier;
import org.wispwright.render.picture.Picture;

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

    /** Something that the person should know although the job goes on. Unless told otherwise, a milestone. */
    default void warning(String line) {
        milestone(line);
    }

    /** A frame of a run was written. @param frame its number @param last number of the last frame that will be */
    default void frame(int frame, int last) {
    }

    /** A solve was asked to pause and begins to wait. */
    default void waits() {
    }

    /** The search is over and its take is being written. */
    default void writesTake() {
    }

    /**
     * A solve accepted an iteration. What {@link #now} says of it in words.
     *
     * @param now where it stands; notes in the shot's order
     * @param got copies of the notes' pictures, at the solve's raster; to be asked before this returns, or not at all
     */
    default void iteration(org.wispwright.optimize.solve.Progress now, Supplier<List<Picture>> got) {
    }
}

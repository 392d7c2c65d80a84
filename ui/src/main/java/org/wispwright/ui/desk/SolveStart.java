package org.wispwright.ui.desk;

import org.wispwright.optimize.solve.SolveState;
import org.wispwright.optimize.solve.StopRule;
import org.wispwright.ui.job.Beginning;
import org.wispwright.ui.job.SolveWork;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.Takes;

/**
 * What a solve begins with, read from disk at one moment: nobody may write the shot's files meanwhile.
 *
 * @param shot   the checked shot
 * @param digest of the files that it was read from
 * @param manner how it is solved
 */
record SolveStart(Shot shot, String digest, SolveWork.Manner manner) {
    /** What of Java's memory a solve may take; pictures have a quarter, the rest is the desk's own. */
    private static final double SHARE = 0.625;

    /** Bytes that a solve may take beside an open desk. */
    static long memoryBytes() {
        return (long) (SHARE * Runtime.getRuntime().maxMemory());
    }

    /**
     * Reads it.
     *
     * @throws ShotException if the shot is not sound, does not fit, or the solve cannot begin there
     */
    static SolveStart read(ShotFolder folder, SolveChoice choice, Beginning beginning) {
        Shot shot = ShotCheck.require(folder.root(), memoryBytes());
        String digest = SolveWork.digest(folder, true, choice.sources());
        if (beginning.kind() == Beginning.Kind.TAKE) {
            requireSame(Takes.of(folder).search(beginning.take()), digest, choice, shot, beginning.take());
        }
        return new SolveStart(shot, digest, new SolveWork.Manner(memoryBytes(), 0, StopRule.OWN, true, choice.sources(), choice.quality(),
                beginning));
    }

    private static void requireSame(SolveState end, String digest, SolveChoice choice, Shot shot, int take) {
        if (!end.problem().equals(digest)) {
            throw new ShotException(new Finding("take " + take, "", "it was solved for other notes or settings than there are now; "
                    + "solve from the beginning, or take back what was changed since."));
        }
        if (end.rung() > choice.quality().rungs(shot.flow().grid()).size()) {
            throw new ShotException(new Finding("take " + take, "", "it was searched on a finer grid than this quality has; "
                    + "choose a higher quality."));
        }
    }
}

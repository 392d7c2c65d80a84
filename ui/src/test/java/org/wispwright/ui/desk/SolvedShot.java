package org.wispwright.ui.desk;

import java.nio.file.Path;
import org.wispwright.optimize.solve.StopRule;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.job.Cancel;
import org.wispwright.ui.job.Progress;
import org.wispwright.ui.job.SimulateWork;
import org.wispwright.ui.job.SolveWork;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotFolder;

/** A {@link SmallShot} with takes, for tests that look at them. */
public final class SolvedShot {
    private SolvedShot() {
    }

    /** With the original. */
    public static Path simulated(Path folder) {
        Path shot = SmallShot.in(folder).folder();
        try (Lanes lanes = new Lanes(2)) {
            SimulateWork.run(ShotFolder.open(shot), ShotCheck.require(shot, 1L << 30), lanes, Progress.SILENT, new Cancel());
        }
        return shot;
    }

    /** With the original and take 1, of a few iterations. */
    public static Path in(Path folder) {
        Path path = simulated(folder);
        Shot shot = ShotCheck.require(path, 1L << 30);
        try (Lanes lanes = new Lanes(2)) {
            SolveWork.run(ShotFolder.open(path), shot, new SolveWork.Manner(64L << 20, new StopRule(0, 1e9, 30), true), lanes,
                    Progress.SILENT, new Cancel());
        }
        return path;
    }
}

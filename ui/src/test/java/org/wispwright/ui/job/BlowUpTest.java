package org.wispwright.ui.job;

import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.wispwright.optimize.flow.Source;
import org.wispwright.render.lanes.Lanes;
import org.wispwright.ui.command.SmallShot;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.ShotFolder;

/** A simulation whose numbers overflow makes no take, and says where that began. By hand: 1e45 does not fit into float32. */
class BlowUpTest {
    @TempDir
    private Path place;

    @Test
    void noTakeOfWhatIsNotFinite() {
        Path folder = SmallShot.in(place.resolve("yard")).folder();
        Shot shot = ShotCheck.require(folder, 1L << 30);
        Source wild = new Source("wild", 1, 0.6, 1, 0.5, 0.25, 1e45, 1001, 1006);
        Shot blown = new Shot(shot.name(), shot.flow().withSources(List.of(wild)), shot.look(), shot.background(), shot.views(), shot.notes(),
                shot.off(), shot.holds());
        try (Lanes lanes = new Lanes(1)) {
            ShotException refused = assertThrows(ShotException.class,
                    () -> SimulateWork.run(ShotFolder.open(folder), blown, lanes, Progress.SILENT, new Cancel()));
            assertTrue(refused.finding().sentence().contains("blows up: density at cell (")
                    && refused.finding().sentence().contains("of frame 1002 is Infinity"), refused.finding().sentence());
        }
        assertFalse(Files.exists(folder.resolve("takes")));
    }
}

package org.wispwright.ui.command;

import java.nio.file.Path;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.ShotView;
import org.wispwright.ui.shot.Takes;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** Which shot a command works on. Mixed into the commands that run something. */
final class ShotChoice {
    @Parameters(index = "0", paramLabel = "SHOT", description = "The shot folder.")
    private Path folder;

    @Mixin
    private Means means;

    /** The folder. */
    ShotFolder folder() {
        return ShotFolder.open(folder);
    }

    /** The checked shot. @throws ShotException with the first finding */
    Shot shot() {
        return ShotCheck.require(folder, memoryBytes());
    }

    /** Bytes that the work may take. */
    long memoryBytes() {
        return means.memoryBytes();
    }

    /** Lanes to run on. */
    int threads() {
        return means.threads();
    }

    /** A view by name. @throws ShotException if the shot has none of that name */
    static ShotView view(Shot shot, String name) {
        return shot.view(name).orElseThrow(() -> new ShotException(new Finding("shot.json", "/views",
                "there is no view '" + name + "'; give one of " + String.join(", ", shot.views().stream().map(v -> v.view().name())
                        .toList()) + ".")));
    }

    /** Refuses a frame that the shot does not have. */
    static void requireFrame(Shot shot, int frame) {
        if (!shot.flow().frames().contains(frame)) {
            throw new ShotException(new Finding("shot.json", "/frames", "there is no frame " + frame + "; give one from " + shot.flow()
                    .frames().first()
                    + " to " + shot.flow().frames().last() + "."));
        }
    }

    /** The takes of the folder. */
    Takes takes() {
        return Takes.of(folder());
    }
}

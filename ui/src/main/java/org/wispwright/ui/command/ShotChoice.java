package org.wispwright.ui.command;

import java.nio.file.Path;
import org.wispwright.ui.shot.Finding;
import org.wispwright.ui.shot.Shot;
import org.wispwright.ui.shot.ShotCheck;
import org.wispwright.ui.shot.ShotException;
import org.wispwright.ui.shot.ShotFolder;
import org.wispwright.ui.shot.ShotView;
import org.wispwright.ui.shot.Takes;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Which shot a command works on, and with how much. Mixed into the commands that run something. */
final class ShotChoice {
    @Parameters(paramLabel = "SHOT", description = "The shot folder.")
    private Path folder;

    @Option(names = "--threads", paramLabel = "N", converter = ThreadCount.Converter.class,
            description = "Threads to use; the result has the same bits for any number. Default: one for each core.")
    private ThreadCount threads;

    @Option(names = "--memory", paramLabel = "SIZE", converter = ByteSize.Converter.class,
            description = "The memory that the work may take, such as 512M or 2G. Default: what Java has.")
    private ByteSize memory;

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
        return memory == null ? Runtime.getRuntime().maxMemory() : memory.bytes();
    }

    /** Lanes to run on. */
    int threads() {
        return threads == null ? Runtime.getRuntime().availableProcessors() : threads.count();
    }

    /** A view by name. @throws ShotException if the shot has none of that name */
    static ShotView view(Shot shot, String name) {
        return shot.view(name).orElseThrow(() -> new ShotException(new Finding("shot.json", "/views",
                "there is no view '" + name + "'; give one of " + String.join(", ", shot.views().stream().map(v -> v.view().name()).toList()) + ".")));
    }

    /** Refuses a frame that the shot does not have. */
    static void requireFrame(Shot shot, int frame) {
        if (!shot.flow().frames().contains(frame)) {
            throw new ShotException(new Finding("shot.json", "/frames", "there is no frame " + frame + "; give one from " + shot.flow().frames().first()
                    + " to " + shot.flow().frames().last() + "."));
        }
    }

    /** The takes of the folder. */
    Takes takes() {
        return Takes.of(folder());
    }
}

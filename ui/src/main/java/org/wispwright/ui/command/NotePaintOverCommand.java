package org.wispwright.ui.command;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.wispwright.ui.job.PaintOverWork;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** {@code note paint-over SHOT --id ID --frame F --view V --before B --after A --words WORDS}. */
@Command(name = "paint-over", sortOptions = false,
        description = "Make a note of what was painted over a rendered frame in any paint program. The frame's look and background may be"
                + " others than the shot's; take 0 must be there. If nothing changed beyond noise no note is made, and the exit code is 0.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note paint-over samples/kiln-yard --id wisp --frame 1030 --view front --before b.png --after a.png"
                    + " --words \"Let a wisp curl off the head.\""})
final class NotePaintOverCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Mixin
    private PaintedNote note;

    @Option(names = "--before", paramLabel = "FILE", required = true, description = "The frame as it was rendered: PNG or EXR.")
    private Path before;

    @Option(names = "--after", paramLabel = "FILE", required = true, description = "The same frame painted over, of the same size.")
    private Path after;

    @Override
    public Integer call() {
        return note.make("paint-over", manner, (place, lanes) -> PaintOverWork.read(place.shot(), place.choice().takes(), place.frame(),
                place.camera(), before, after, lanes));
    }
}

package org.wispwright.ui.command;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.wispwright.ui.job.PaintOverWork;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** {@code note silhouette SHOT --id ID --frame F --view V --matte M --words WORDS}. */
@Command(name = "silhouette", sortOptions = false,
        description =
                "Make a note of a silhouette: a picture that is white where smoke is wanted and black where none is. Inside, smoke that"
                + " is there stays and gaps are filled to the level near them. Take 0 must be there.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note silhouette samples/kiln-yard --id shape --frame 1030 --view front --matte shape.png"
                    + " --words \"The head as in the sketch.\""})
final class NoteSilhouetteCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Mixin
    private PaintedNote note;

    @Option(names = "--matte", paramLabel = "FILE", required = true, description = "The black and white picture: PNG or EXR.")
    private Path matte;

    @Override
    public Integer call() {
        return note.make("silhouette", manner, (place, lanes) -> PaintOverWork.silhouette(place.shot(), place.choice().takes(),
                place.frame(),
                place.camera(), matte, lanes));
    }
}

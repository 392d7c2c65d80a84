package org.wispwright.ui.command;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.wispwright.ui.shot.NoteEdits;
import org.wispwright.ui.shot.ShotFolder;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;

/** {@code note redo SHOT}. */
@Command(name = "redo", sortOptions = false,
        description = "Make again the change that 'note undo' took back last, and say which. Possible until another change is made; "
                + "refused if a file of it has been changed by hand since.",
        footer = {"", "Examples:",
            "  java -jar wispwright.jar note redo samples/kiln-yard",
            "  java -jar wispwright.jar note redo samples/kiln-yard --json"})
final class NoteRedoCommand implements Callable<Integer> {
    @Mixin
    private Manner manner;

    @Parameters(paramLabel = "SHOT", description = "The shot folder.")
    private Path shot;

    @Override
    public Integer call() {
        NoteEdits.Moved redone = NoteEdits.of(ShotFolder.open(shot)).redo();
        manner.say(NoteUndoCommand.sentence("Made again", redone, " as the change leaves it", " gone again"),
                NoteUndoCommand.object(redone));
        return ExitCodes.OK;
    }
}
